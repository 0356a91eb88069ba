using System.Text.Json.Serialization;

namespace Auditor.Results;

/// <summary>One check of the final model's residuals; nulls with the reason when it could not be computed.</summary>
public sealed record CheckResult(
    string Check,
    double? Statistic,
    double? Df,
    double? Df2,
    double? P,
    string Assumption,
    bool? Rejects,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why)
{
    [JsonPropertyName("log10_p"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? Log10P { get; init; }

    /// <summary>p by simulation, on which <see cref="Rejects"/> then rests.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? PSimulated { get; init; }

    /// <summary>Samples drawn for <see cref="PSimulated"/>.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public int? Draws { get; init; }

    /// <summary>How large what the check looks for is, by measure, whatever the number of rows.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyDictionary<string, double>? Size { get; init; }

    /// <summary>Whether the check speaks against its assumption. A unit root is a null that one wants to see rejected.</summary>
    [JsonIgnore]
    public bool? Contradicts => Check == "unit_root_residual" ? !Rejects : Rejects;

    /// <summary>p on which <see cref="Rejects"/> rests.</summary>
    [JsonIgnore]
    public double? DecisiveP => PSimulated ?? P;

    /// <summary>The row that the check is about, 1-based in the source.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public int? Row { get; init; }

    /// <summary>How the check was made or its p is to be read, where there is more than one way.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? Variant { get; init; }
}

public sealed record Influence(IReadOnlyList<int> LeverageOne, IReadOnlyList<InfluentialRow> Largest)
{
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? Why { get; init; }
}

public sealed record InfluentialRow(int Row, string? Label, double Leverage, double? StudentisedResidual, double? CooksDistance, double? Dffits);

public sealed record Collinearity(
    IReadOnlyList<TermCollinearity> Terms,
    IReadOnlyList<double> ConditionIndices,
    IReadOnlyList<VarianceProportions> VarianceProportions)
{
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? Why { get; init; }
}

public sealed record TermCollinearity(string Term, int Df, double? Gvif, double? GvifScaled);

public sealed record VarianceProportions(double ConditionIndex, IReadOnlyDictionary<string, double> Proportions);


public sealed record EntangledGroups(string Kind, IReadOnlyList<string> Groups, double? Df1, double? Df2, double? F, double? P, double? PAdjusted);
