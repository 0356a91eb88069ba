using Auditor.Findings;
using Auditor.Reporting;
using Serilog;

namespace Auditor.Cli;

/// <summary>Audits one declaration: reads files, runs the audit, writes the outputs, says the answer.</summary>
internal static class AuditCommand
{
    public static int Run(AuditRequest request)
    {
        var progress = new RunProgress(request);
        var done = progress.Around(() => Work(request, progress));
        if (done.Value is not { } outcome)
        {
            return Complaint.Unusable(done.Problems);
        }

        if (!request.Quiet)
        {
            Console.Out.Write(Terminal.Safe(ConsoleSummary.Of(outcome.Record)));
            foreach (var file in outcome.Files)
            {
                Console.Out.WriteLine("Written: " + file);
            }
        }

        return Status(outcome.Record, request.FailOn);
    }

    private static Reading<Outcome> Work(AuditRequest request, RunProgress progress)
    {
        using var place = new ColumnPlace(request.MemoryBytes, request.OutputFolder);
        try
        {
            return Work(request, place, progress);
        }
        catch (Exception fault) when (SpillFault.In(fault) is { } spilling)
        {
            return Reading<Outcome>.Failed(spilling.Problem);
        }
    }

    private static Reading<Outcome> Work(AuditRequest request, ColumnPlace place, RunProgress progress)
    {
        var inputs = InputFiles.Read(request, place, progress);
        if (inputs.Value is null)
        {
            return Reading<Outcome>.Failed(inputs.Problems);
        }

        Log.Debug("Auditing {Model} on {Rows} rows", inputs.Value.Declaration.Model.Id, inputs.Value.Table.RowCount);
        var audited = Audit.Run(inputs.Value with { Steps = progress });
        if (audited.Value is not { } record)
        {
            return Reading<Outcome>.Failed(audited.Problems);
        }

        progress.Begin("Outputs");
        var written = OutputFiles.Write(request, record);
        return written.Value is { } files ? Reading<Outcome>.Of(new Outcome(record, files)) : Reading<Outcome>.Failed(written.Problems);
    }

    private static int Status(AuditRecord record, Severity? failOn) =>
        failOn is { } least && record.Findings.Any(finding => finding.Accepted is null && finding.Severity >= least)
            ? ExitStatus.Found
            : ExitStatus.Audited;

    private sealed record Outcome(AuditRecord Record, IReadOnlyList<string> Files);
}
