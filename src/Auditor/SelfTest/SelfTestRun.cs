using System.Text.Json;
using Auditor.Policies;
using Auditor.Reporting;
using Auditor.Results;

namespace Auditor.SelfTest;

/// <summary>
/// Audits the declarations of the reference cases as any other, and compares every number of the records with certified values, other programs' and 100-digit
/// arithmetic; compares distributions with 80-digit values. A case that cannot be compared has failed; the others go on.
/// </summary>
/// <param name="open">Opens a shipped file by its path below the folder of the cases.</param>
/// <param name="policy">The policy under which the expected values were computed.</param>
public sealed class SelfTestRun(Func<string, Stream> open, Policy policy)
{
    public SelfTestRecord Run(Installation installation)
    {
        var plan = SelfTestPlan.Read(Text);
        var floors = FloorTable.Read(Text("floors.json"));
        SelfTestCase[] cases =
        [
            .. plan.Audits.Select(planned => Guarded(planned.Id, () => Audited(planned, floors[planned.Id], installation))),
            .. plan.Distributions.Select(file => Guarded(file, () => Distribution(file, floors[FloorTable.Distribution(file)]))),
        ];
        return new SelfTestRecord(1, cases.Length > 0 && cases.All(one => one.Passed), SelfTestRecord.WhatItShows, installation, cases);
    }

    private static SelfTestCase Guarded(string id, Func<SelfTestCase> compare)
    {
        try
        {
            return compare();
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or JsonException or KeyNotFoundException or InvalidOperationException
            or FormatException or ArgumentException or InvalidDataException or IndexOutOfRangeException)
        {
            return SelfTestCase.Failed(id, fault.Message);
        }
    }

    private SelfTestCase Audited(PlannedAudit planned, IReadOnlyDictionary<string, int> floors, Installation installation)
    {
        var provenance = new Provenance("", "", "", planned.Declaration, "", installation.ToolVersion, 1, installation.Started);
        var inputs = CaseInputs.Read(Text(planned.Declaration), planned.Declaration, name => open($"{planned.Case}/{name}"), policy, [], provenance);
        var audited = inputs.Value is null ? Reading<AuditRecord>.Failed(inputs.Problems) : Audit.Run(inputs.Value);
        if (audited.Value is not { } record)
        {
            return SelfTestCase.Failed(planned.Id, string.Join("; ", audited.Problems));
        }

        using var json = JsonDocument.Parse(JsonRecord.Write(record));
        var run = new CaseRun(ReferenceCase.Read(planned.Case, Text), planned.Variant, new RecordView(json.RootElement));
        return SelfTestCase.Compared(planned.Id, run.Case.Title, SourceTable.Of(Text("SOURCES.md"), run), QuantityCheck.Of(run.Figures(), floors));
    }

    private SelfTestCase Distribution(string file, IReadOnlyDictionary<string, int> floors)
    {
        var text = Text($"distributions/{file}.csv");
        var source = DistributionValues.Source(text);
        var title = source[..source.IndexOf('.', StringComparison.Ordinal)];
        return SelfTestCase.Compared(file, char.ToUpperInvariant(title[0]) + title[1..], [source], QuantityCheck.Of(DistributionValues.Worst(file, text), floors));
    }

    private string Text(string name)
    {
        using var reader = new StreamReader(open(name));
        return reader.ReadToEnd();
    }
}
