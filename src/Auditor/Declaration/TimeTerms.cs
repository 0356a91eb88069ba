using System.Globalization;

namespace Auditor.Declaration;

/// <summary>0 before a date or number, 1 from then on.</summary>
public sealed record StepTerm(ColumnTerm Of, string From) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label => Of.Label + " from " + From;

    protected override bool IsInfix => true;
}

/// <summary>1 from one date or number to another, both included, 0 elsewhere.</summary>
public sealed record PulseTerm(ColumnTerm Of, string From, string To) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label => Of.Label + " from " + From + " to " + To;

    protected override bool IsInfix => true;
}

/// <summary>The unit in which time is counted.</summary>
public enum Period
{
    Day,
    Week,
    Month,
    Quarter,
    Year,
}

/// <summary>The quarter (1 to 4) or month (1 to 12) of a date column as levels.</summary>
public sealed record SeasonTerm(ColumnTerm Of, Period By) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label => (By == Period.Month ? "month(" : "quarter(") + Of.Label + ")";
}

/// <summary>Whole periods since the first kept row.</summary>
public sealed record TrendTerm(ColumnTerm Of) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label => "trend(" + Of.Label + ")";
}

/// <summary>What a term in time order computes from earlier rows of the same unit.</summary>
public enum TimeOrderOperation
{
    Lag,
    Change,
    MovingAverage,
}

/// <summary>A one-column term seen <paramref name="Steps"/> periods back, as a change over them, or averaged over them.</summary>
public sealed record TimeOrderTerm(TimeOrderOperation Operation, Term Of, int Steps) : Term
{
    public override IReadOnlyList<Term> Parts => [Of];

    public override string Label =>
        string.Create(CultureInfo.InvariantCulture, $"{TermWords.Name(Operation)}({Of.Label}, {Steps})");
}
