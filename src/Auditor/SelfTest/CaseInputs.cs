using Auditor.Data;
using Auditor.Declaration;
using Auditor.Policies;
using Auditor.Reporting;
using Auditor.Rules;

namespace Auditor.SelfTest;

/// <summary>The inputs of an audit from a declaration's text and its data as a stream.</summary>
internal static class CaseInputs
{
    /// <param name="open">Opens the data by the name that the declaration gives.</param>
    public static Reading<AuditInputs> Read(string yaml, string file, Func<string, Stream> open, Policy policy, IReadOnlyList<Rule> rules, Provenance provenance)
    {
        var reading = DeclarationReader.Read(yaml, file);
        if (reading.Declaration is not { } declaration)
        {
            return Reading<AuditInputs>.Failed(reading.Problems);
        }

        var name = declaration.Data.Sources[0];
        var source = new CsvSource(name, () => open(name), DelimitedFormat.FromFileName(name)!);
        var table = source.Read(ColumnCheck.Requests(declaration, reading.Mentions), declaration.Data.Missing);
        return table.Value is null
            ? Reading<AuditInputs>.Failed(table.Problems)
            : Reading<AuditInputs>.Of(new AuditInputs(declaration, reading.Mentions, table.Value, policy, rules, provenance));
    }
}
