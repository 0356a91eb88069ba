using Auditor.Findings;
using Auditor.Reporting;
using Serilog;

namespace Auditor.Cli;

/// <summary>Audits one declaration: reads files, runs the audit, writes the outputs, says the answer.</summary>
internal static class AuditCommand
{
    public static int Run(AuditRequest request)
    {
        var inputs = InputFiles.Read(request);
        if (inputs.Value is null)
        {
            return Complaint.Unusable(inputs.Problems);
        }

        Log.Debug("Auditing {Model} on {Rows} rows", inputs.Value.Declaration.Model.Id, inputs.Value.Table.RowCount);
        var audited = Audit.Run(inputs.Value);
        if (audited.Value is not { } record)
        {
            return Complaint.Unusable(audited.Problems);
        }

        var written = OutputFiles.Write(request, record);
        if (written.Value is null)
        {
            return Complaint.Unusable(written.Problems);
        }

        if (!request.Quiet)
        {
            Console.Out.Write(Terminal.Safe(ConsoleSummary.Of(record)));
            foreach (var file in written.Value)
            {
                Console.Out.WriteLine("Written: " + file);
            }
        }

        return Status(record, request.FailOn);
    }

    private static int Status(AuditRecord record, Severity? failOn) =>
        failOn is { } least && record.Findings.Any(finding => finding.Accepted is null && finding.Severity >= least)
            ? ExitStatus.Found
            : ExitStatus.Audited;
}
