using Auditor.Declaration;

namespace Auditor.Tests.Declaration;

public sealed class NotBuiltYetTests
{
    [Fact]
    public void What_cannot_be_computed_is_named_with_its_line() => Assert.Equal(
        ["full.yaml:31: not built yet: data.segments"],
        NotBuiltYet.In(DeclarationReader.Read(FullDeclaration.Yaml, "full.yaml").Declaration!).Select(problem => problem.ToString()));

    [Theory]
    [InlineData("precision")]
    [InlineData("frequency")]
    [InlineData("sampling")]
    public void Every_kind_of_weights_passes(string kind) =>
        Assert.Empty(NotBuiltYet.In(Declared.Good("data: {source: leases.csv, time: {file_order: true}, cluster: b, split: {row: 9}, weights: {column: w, kind: " + kind + "}}")));

    [Fact]
    public void What_is_built_passes() => Assert.Empty(NotBuiltYet.In(Declared.Good(
        "data: {source: leases.csv, time: {file_order: true}, cluster: b, split: {row: 9}, weights: {column: w, kind: precision}, columns: {region: {reference: north}}, keep: [{column: a, equals: 1}]}",
        "final_model: {terms: [region, {log: a}, {product: [region, a]}, {power: {of: a, exponent: 3}}, {polynomial: {of: b, degree: 2}}, {indicator: {of: c, equals: 1}}]}",
        "elimination: {rule: {drop_above: 0.05}}",
        "reported: {f: 1.0}")));
}
