using System.Globalization;
using Auditor.Acceptances;
using Auditor.Declaration;
using Auditor.Reporting;
using Serilog;

namespace Auditor.Cli;

/// <summary>Reads everything an audit depends on; all problems of all files at once, as far as one does not hide another.</summary>
internal static class InputFiles
{
    public static Reading<AuditInputs> Read(AuditRequest request, ColumnPlace place, RunProgress progress)
    {
        progress.Begin("Declaration, rules and the file's hash");
        var file = FileText.Read(request.Declaration);
        var rules = RuleFiles.Read(request.RulesFolder, request.PolicyFile);
        var acceptances = AcceptanceFile.Read(request.Acceptances.File, rules.Value);
        if (file.Value is not { } text)
        {
            return Reading<AuditInputs>.Failed([.. file.Problems, .. rules.Problems, .. acceptances.Problems]);
        }

        var reading = DeclarationReader.Read(text.Text, request.Declaration);
        var data = DataFile.Find(reading, request, place, progress);
        var problems = reading.Problems
            .Concat(data.Problems)
            .OrderBy(problem => problem.Line ?? 0)
            .Concat(rules.Problems)
            .Concat(acceptances.Problems)
            .ToList();
        return problems.Count > 0 || reading.Declaration is null
            ? Reading<AuditInputs>.Failed(problems)
            : Read(request, reading, text, data.Value!, rules.Value!, acceptances.Value!, place, progress);
    }

    private static Reading<AuditInputs> Read(
        AuditRequest request, DeclarationReading reading, FileText text, DataFile data, RuleFiles rules, AcceptanceFile acceptances, ColumnPlace place, RunProgress progress)
    {
        progress.Begin("Data read");
        var declaration = reading.Declaration!;
        var table = data.Source.Read(ColumnCheck.Requests(declaration, reading.Mentions), declaration.Data.Missing);
        if (table.Value is null)
        {
            return Reading<AuditInputs>.Failed(table.Problems);
        }

        var asOf = request.Acceptances.AsOf ?? Clock.Day(request.Moment);
        var provenance = new Provenance(
            data.Sha256,
            declaration.Data.Sources[0],
            text.Sha256,
            Path.GetFileName(request.Declaration),
            rules.Sha256,
            CommandLine.Version,
            request.Seed,
            Clock.Text(request.Moment))
        {
            Acceptances = acceptances.Name,
            AcceptancesSha256 = acceptances.Sha256,
            AsOf = acceptances.Name is null && request.Acceptances.AsOf is null ? null : asOf.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture),
        };
        Log.Debug(
            "{Count} acceptances, {Others} of them for other models", acceptances.Entries.Count, acceptances.Entries.Count(entry => entry.Model != declaration.Model.Id));
        return Reading<AuditInputs>.Of(new AuditInputs(declaration, reading.Mentions, table.Value, rules.Policy, rules.Rules, provenance, request.Threads)
        {
            Acceptances = new AcceptancesOfRun(acceptances.Entries, asOf),
            Pictures = request.Formats.Contains("html"),
            Store = place.Chosen,
        });
    }
}
