using System.Globalization;

namespace Auditor.Declaration;

/// <summary>The columns of two or more terms multiplied, each with each; adds no main effect.</summary>
public sealed record ProductTerm(IReadOnlyList<Term> Factors) : Term
{
    public override IReadOnlyList<Term> Parts => Factors;

    /// <summary>A difference among the factors is the only one that means something else without brackets.</summary>
    public override string Label => string.Join(" * ", Factors.Select(factor => factor is MinusTerm ? factor.Operand : factor.Label));

    protected override bool IsInfix => true;

    public bool Equals(ProductTerm? other) => base.Equals(other) && Factors.SequenceEqual(other.Factors);

    public override int GetHashCode() => Factors.Aggregate(base.GetHashCode(), HashCode.Combine);
}

/// <summary>Raw powers 1 to <paramref name="Degree"/> of a one-column term: so many columns.</summary>
public sealed record PolynomialTerm(Term Of, int Degree) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label => string.Create(CultureInfo.InvariantCulture, $"polynomial({Of.Label}, {Degree})");
}

/// <summary>A natural cubic spline: K knots, the two outer ones included, give K - 1 columns, the first of them x.</summary>
public sealed record SplineTerm(Term Of, IReadOnlyList<double> Knots) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label => Of.Label + " spline";

    public bool Equals(SplineTerm? other) => base.Equals(other) && Of == other.Of && Knots.SequenceEqual(other.Knots);

    public override int GetHashCode() => HashCode.Combine(base.GetHashCode(), Of, Knots.Count);
}

/// <summary>Intervals closed on the right; the lowest is the reference, so K cuts give K columns.</summary>
public sealed record BinsTerm(Term Of, IReadOnlyList<double> Cuts) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label => Of.Label + " bins";

    public bool Equals(BinsTerm? other) => base.Equals(other) && Of == other.Of && Cuts.SequenceEqual(other.Cuts);

    public override int GetHashCode() => HashCode.Combine(base.GetHashCode(), Of, Cuts.Count);
}

/// <summary>1 where the column's cell equals the text or number, 0 elsewhere.</summary>
public sealed record IndicatorTerm(ColumnTerm Of, string EqualTo) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label => Of.Label + " = " + EqualTo;

    protected override bool IsInfix => true;
}
