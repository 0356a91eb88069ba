using Auditor.Declaration;
using Auditor.Reporting;

namespace Auditor.Cli;

/// <summary>Reads everything an audit depends on; all problems of all files at once, as far as one does not hide another.</summary>
internal static class InputFiles
{
    public static Reading<AuditInputs> Read(AuditRequest request)
    {
        var file = FileText.Read(request.Declaration);
        var rules = RuleFiles.Read(request.RulesFolder, request.PolicyFile);
        if (file.Value is not { } text)
        {
            return Reading<AuditInputs>.Failed([.. file.Problems, .. rules.Problems]);
        }

        var reading = DeclarationReader.Read(text.Text, request.Declaration);
        var data = DataFile.Find(reading, request);
        var problems = reading.Problems
            .Concat(reading.Declaration is { } checkedOne ? NotBuiltYet.In(checkedOne) : [])
            .Concat(data.Problems)
            .OrderBy(problem => problem.Line ?? 0)
            .Concat(rules.Problems)
            .ToList();
        return problems.Count > 0 || reading.Declaration is not { } declaration
            ? Reading<AuditInputs>.Failed(problems)
            : Read(request, declaration, reading.Mentions, text, data.Value!, rules.Value!);
    }

    private static Reading<AuditInputs> Read(
        AuditRequest request, ModelDeclaration declaration, IReadOnlyList<ColumnMention> mentions, FileText text, DataFile data, RuleFiles rules)
    {
        var table = data.Source.Read(ColumnCheck.Requests(declaration, mentions), declaration.Data.Missing);
        if (table.Value is null)
        {
            return Reading<AuditInputs>.Failed(table.Problems);
        }

        var provenance = new Provenance(
            data.Sha256,
            declaration.Data.Sources[0],
            text.Sha256,
            Path.GetFileName(request.Declaration),
            rules.Sha256,
            CommandLine.Version,
            request.Seed,
            Clock.Started);
        return Reading<AuditInputs>.Of(new AuditInputs(declaration, mentions, table.Value, rules.Policy, rules.Rules, provenance, request.Threads)
        {
            Pictures = request.Formats.Contains("html"),
        });
    }
}
