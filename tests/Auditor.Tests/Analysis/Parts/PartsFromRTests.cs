using System.Text.Json;
using Auditor.Reporting;
using Auditor.Results;
using Auditor.Tests.Reference;

namespace Auditor.Tests.Analysis.Parts;

/// <summary>
/// Left-out groups in parts of two public datasets, whole audits against R (values/make_values.R): lm, anova and HC3 in segments, with an interaction for the difference; the forms
/// over clusters and periods in halves of the time span against the same written out with dense matrices.
/// </summary>
public sealed class PartsFromRTests
{
    private const double Tolerance = 1e-9;

    private const string Prestige = """
        audit: 1
        model: {id: prestige}
        data: {source: data.csv, columns: {type: {kind: levels}}, segments: [type]}
        response: prestige
        final_model: {terms: [education, log_income]}
        left_out:
          - {group: added, terms: [TERMS]}
        """;

    private const string Panel = """
        audit: 1
        model: {id: panel}
        data: {source: data.csv, time: year, keep: [{column: firm, to: 60}], STRUCTURE}
        response: y
        final_model: {terms: [x]}
        left_out:
          - {group: square, terms: [{square: x}]}
        """;

    private static readonly JsonElement Values = JsonDocument.Parse(
        File.ReadAllText(Path.Combine(TestFolders.Root, "tests", "Auditor.Tests", "Analysis", "Parts", "values", "parts.json"))).RootElement;

    [Theory]
    [InlineData("women", "women")]
    [InlineData("shape", "women, {square: education}")]
    public void Segments_agree_with_R(string name, string terms)
    {
        var division = Assert.Single(Record("prestige", Prestige.Replace("TERMS", terms, StringComparison.Ordinal)).Exclusions[0].InParts);
        Assert.Equal(("type", Divisions.Segment, null), (division.By, division.Kind, division.Why));
        Same(Values.GetProperty("prestige").GetProperty(name), division, "hc3");
        Assert.Equal(["bc", "prof", "wc"], division.Parts.Select(part => part.Part));
        Assert.All(division.Parts, part => Assert.InRange(part.PartialRSquared.Estimate!.Value, part.PartialRSquared.Lower!.Value, part.PartialRSquared.Upper!.Value));
    }

    [Theory]
    [InlineData("cluster", "cluster: firm")]
    [InlineData("time", "row_label: firm")]
    public void Halves_of_the_span_agree_with_R(string basis, string structure)
    {
        var division = Assert.Single(Record("petersen_panel", Panel.Replace("STRUCTURE", structure, StringComparison.Ordinal)).Exclusions[0].InParts);
        Assert.Equal(("halves of the time span", Divisions.Halves), (division.By, division.Kind));
        Assert.Equal(["up to year 5", "after year 5"], division.Parts.Select(part => part.Part));
        Same(Values.GetProperty("panel").GetProperty(basis), division, basis);
    }

    [Fact]
    public void A_declared_split_takes_the_place_of_the_halves()
    {
        var declared = Panel.Replace("STRUCTURE", "cluster: firm, split: {column: year, at: 5}", StringComparison.Ordinal);
        var division = Assert.Single(Record("petersen_panel", declared).Exclusions[0].InParts);
        Assert.Equal(("split at year 5", Divisions.Split), (division.By, division.Kind));
        Assert.Equal(["up to year 5", "after year 5"], division.Parts.Select(part => part.Part));
        Same(Values.GetProperty("panel").GetProperty("cluster"), division, "cluster");
    }

    private static AuditRecord Record(string dataset, string declaration) =>
        AuditRunner.Record(declaration, name => File.OpenRead(ReferenceFiles.FullPath(dataset + "/" + name)));

    private static void Same(JsonElement expected, GroupInParts found, string basis)
    {
        var parts = expected.GetProperty("parts").EnumerateArray().ToList();
        Assert.Equal(parts.Select(part => part.GetProperty("rows").GetInt32()), found.Parts.Select(part => part.Rows));
        Assert.All(found.Parts, part => Assert.Equal(basis, part.Basis));
        Assert.All(parts.Zip(found.Parts), pair => Same(pair.First.GetProperty("basis"), pair.Second.Test!));
        Assert.All(parts.Zip(found.Parts), pair => Same(pair.First.GetProperty("classical"), pair.Second.Classical!));
        var difference = expected.GetProperty("difference");
        Assert.Equal((basis, parts.Count), (found.Difference.Basis, found.Difference.PartsCompared));
        Same(difference.GetProperty("basis"), found.Difference.Test!);
        Same(difference.GetProperty("classical"), found.Difference.Classical!);
    }

    private static void Same(JsonElement expected, TestFigures found)
    {
        Assert.Equal((expected.GetProperty("df1").GetDouble(), expected.GetProperty("df2").GetDouble()), (found.Df1, found.Df2));
        Assert.Equal(1, found.F!.Value / expected.GetProperty("f").GetDouble(), Tolerance);
        Assert.Equal(1, found.P!.Value / expected.GetProperty("p").GetDouble(), Tolerance);
    }
}
