using Auditor.Declaration;
using Auditor.Results;

namespace Auditor.Analysis.Claims;

/// <summary>One figure against the numbers it may be, in order of preference: the first that it agrees with, else the first of all.</summary>
internal sealed class ClaimJudgement(double significance)
{
    /// <param name="why">Why there may be no number.</param>
    public ClaimResult Of(ClaimedFigure claim, IReadOnlyList<Reproduction> candidates, string? why)
    {
        if (candidates.Count == 0)
        {
            return Result(claim, null, ClaimOutcomes.CannotBeRecomputed, null) with { Why = why ?? "no value of it exists" };
        }

        var found = candidates.FirstOrDefault(candidate => Outcome(claim, claim.Printed, candidate) == ClaimOutcomes.Agrees);
        var used = found ?? candidates[0];
        var outcome = Outcome(claim, claim.Printed, used);
        return Result(claim, used, outcome, AsPrintedFor(claim, used, outcome)) with
        {
            ReproducedBy = found?.By,
            Rows = found is { OtherRows: true } ? ClaimResult.OtherRows : null,
            Why = found is null ? OtherReading(claim, candidates) : null,
            OtherSideOfSignificance = found is null && claim.Kind == ClaimKinds.P && OtherSide(claim.Printed, used.Value),
            OtherSign = found is null && claim is { Kind: ClaimKinds.Estimate, Printed.Digits.IsZero: false } && Math.Sign(claim.Printed.Value) == -Math.Sign(used.Value),
        };
    }

    public static bool Agrees(ClaimedFigure claim, Reproduction candidate) => Outcome(claim, claim.Printed, candidate) == ClaimOutcomes.Agrees;

    private static string Outcome(ClaimedFigure claim, PrintedNumber printed, Reproduction candidate) =>
        Agreement.Of(printed, candidate.Value, claim.Kind is ClaimKinds.Rows or ClaimKinds.Df, candidate.Digits);

    private static ClaimResult Result(ClaimedFigure claim, Reproduction? used, string outcome, string? printed) =>
        new(claim.Path, claim.What, claim.Figure.Text, used?.Value, outcome) { Kind = claim.Kind, Line = claim.Figure.Line, RecomputedAsPrinted = printed };

    /// <summary>A p is never shown as 0. Half-way between two figures both are right: then one digit more shows why.</summary>
    private static string AsPrintedFor(ClaimedFigure claim, Reproduction used, string outcome)
    {
        var text = AsPrinted.Of(claim.Printed, used.Value);
        if (claim.Kind == ClaimKinds.P && !text.Any(sign => sign is >= '1' and <= '9'))
        {
            return PlainNumber.P(used.Value);
        }

        var same = claim.Printed.Relation != PrintedRelation.Rounded || (PrintedNumber.Read(text) is { } read && read.Value == claim.Printed.Value);
        return same == (outcome == ClaimOutcomes.Agrees) ? text : PlainNumber.Digits(used.Value, claim.Printed.Digits.ToString(System.Globalization.CultureInfo.InvariantCulture).Length + 2);
    }

    /// <summary>A figure that would agree if its comma or per cent sign meant something else is not called wrong without saying so.</summary>
    private static string? OtherReading(ClaimedFigure claim, IReadOnlyList<Reproduction> candidates)
    {
        bool WouldAgree(PrintedNumber? reading) => reading is not null && candidates.Any(candidate => Outcome(claim, reading, candidate) == ClaimOutcomes.Agrees);
        return WouldAgree(claim.Printed.AsThousands) ? "the comma was read as a decimal comma; as a thousands mark the figure would agree: write it without"
            : WouldAgree(claim.Printed.WithoutPercent) ? "the per cent sign was read as hundredths; without it the figure would agree"
            : null;
    }

    /// <summary>Whether all numbers that the figure can mean lie on the other side of the level than the recomputed p.</summary>
    private bool OtherSide(PrintedNumber printed, double p) => printed.Relation switch
    {
        PrintedRelation.Below or PrintedRelation.AtMost => printed.Value <= significance && p > significance,
        PrintedRelation.Above or PrintedRelation.AtLeast => printed.Value >= significance && p <= significance,
        _ => printed.Value <= significance != p <= significance,
    };
}
