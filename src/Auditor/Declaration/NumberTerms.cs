namespace Auditor.Declaration;

/// <summary>A data column taken as it is: a number, or levels in treatment coding against the reference.</summary>
public sealed record ColumnTerm(string Column) : Term
{
    public override string Label => Column;

    public override IReadOnlyList<Term> Parts => [];

    public override IEnumerable<ColumnTerm> Columns => [this];
}

/// <summary>Transforms of one number. All but center (minus the mean over the kept rows) look at one row only.</summary>
public enum NumberTransform
{
    Log,
    Log10,
    Log1p,
    Sqrt,
    Square,
    Inverse,
    Exp,
    Abs,
    Center,
}

/// <summary>A number transform of a one-column term, after adding <paramref name="Plus"/> (0 when not declared).</summary>
public sealed record TransformTerm(NumberTransform Transform, Term Of, double Plus = 0) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label => Transform switch
    {
        NumberTransform.Square => InnerOperand + "^2",
        NumberTransform.Inverse => "1 / " + InnerOperand,
        _ => TermWords.Name(Transform) + "(" + Inner + ")",
    };

    protected override bool IsInfix => Transform is NumberTransform.Square or NumberTransform.Inverse;

    private string Inner => Plus == 0 ? Of.Label : TermWords.Sum(Of, Plus);

    private string InnerOperand => Plus == 0 ? Of.Operand : "(" + Inner + ")";
}

/// <summary>A one-column term raised to a power.</summary>
public sealed record PowerTerm(Term Of, double Exponent) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label => Of.Operand + "^" + TermWords.Number(Exponent);

    protected override bool IsInfix => true;
}

/// <summary>The quotient of two one-column terms.</summary>
public sealed record RatioTerm(Term Numerator, Term Denominator) : Term
{
    public override IReadOnlyList<Term> Parts => [Numerator, Denominator];

    public override string Label => Numerator.Operand + " / " + Denominator.Operand;

    protected override bool IsInfix => true;
}

/// <summary>The difference of two one-column terms.</summary>
public sealed record MinusTerm(Term Left, Term Right) : Term
{
    public override IReadOnlyList<Term> Parts => [Left, Right];

    public override string Label => Left.Operand + " - " + Right.Operand;

    protected override bool IsInfix => true;
}

/// <summary>Values below and above two quantiles of the kept rows (Hyndman and Fan's type 7) are set to them.</summary>
public sealed record WinsoriseTerm(Term Of, double Lower, double Upper) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label => "winsorise(" + Of.Label + ")";
}

/// <summary>Values below and above two fixed limits are set to them; either limit may be absent.</summary>
public sealed record CapTerm(Term Of, double? Lower, double? Upper) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label => "cap(" + Of.Label + ")";
}
