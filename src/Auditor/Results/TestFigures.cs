using System.Text.Json.Serialization;

namespace Auditor.Results;

/// <summary>One test as the record shows it.</summary>
/// <param name="F">Null when the statistic has no finite value; <paramref name="Why"/> then says so.</param>
/// <param name="CeilingP">Of a score form: where its p ends as the effect grows without limit.</param>
/// <param name="P">Upper tail probability; 0 when below 1e-300, and then <paramref name="Log10P"/> holds it.</param>
public sealed record TestFigures(
    double? F,
    double? Df1,
    double? Df2,
    double? P,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] double? Log10P = null,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why = null,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] double? CeilingP = null);

/// <summary>Every test of one group. One not computed is null and <see cref="Exclusion.TestsNotComputed"/> says why under its record name.</summary>
public sealed record GroupTests(
    TestFigures? Classical,
    TestFigures? Hc0,
    TestFigures? Hc1,
    TestFigures? Hc2,
    TestFigures? Hc3,
    TestFigures? Score,
    TestFigures? Cluster,
    TestFigures? Cr1,
    TestFigures? Cr2,
    TestFigures? Time,
    TestFigures? TimeUnrestricted,
    TestFigures? NeweyWest,
    PermutationFigures? Permutation,
    PermutationFigures? WildBootstrap,
    TestFigures? LastIn,
    TestFigures? LargestModelDenominator);

public sealed record PermutationFigures(double? F, double? P, double? PLower, double? PUpper, int Draws);
