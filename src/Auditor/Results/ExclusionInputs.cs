namespace Auditor.Results;

/// <summary>What an exclusion's facts need beside its result.</summary>
/// <param name="ProductsElsewhere">Labels of the products outside the group that hold one of its terms.</param>
/// <param name="OwnRows">Rows whose leverage is 1 with the group and below 1 without it: the group holds their own dummies.</param>
public sealed record ExclusionInputs(IReadOnlyList<string> ProductsElsewhere, IReadOnlyList<int> OwnRows)
{
    /// <summary>A stated rule of elimination that looks at the data (by p, AIC or BIC) drops the group, as far as it can be replayed.</summary>
    public bool LeftOutByRule { get; init; }

    /// <summary>The group's p can be read: no product outside it holds one of its terms, and no unit root of the residual keeps its series from being told from drift.</summary>
    public bool Stands { get; init; } = true;

    /// <summary>How many left-out groups have a p: the family that the adjustment allows for.</summary>
    public int Groups { get; init; } = 1;
}
