using Auditor.Declaration;
using Auditor.Results;

namespace Auditor.Analysis.Claims;

/// <summary>
/// Compares a printed figure with a number at the digits printed. The number agrees when it rounds to the figure (half-way to either neighbour), differs
/// in the last digit when it rounds to a neighbour, else differs. Whole counts are not rounded figures: they are the same or differ.
/// </summary>
internal static class Agreement
{
    /// <summary>A few units of a double's last place, so that decimals with no exact double do not decide.</summary>
    private const double Rounding = 1e-15;

    /// <summary>Half units of the last digit within which a neighbour rounds.</summary>
    private const double Neighbour = 3;

    /// <param name="digits">Decimal digits to which the number can be trusted; what is printed beyond them is not held against the author.</param>
    public static string Of(PrintedNumber printed, double number, bool counted, double digits)
    {
        var slack = Math.Abs(number) * Math.Max(Rounding, Math.Pow(10, -digits));
        return printed.Relation switch
        {
            PrintedRelation.Below => Bound(number < printed.Value, number <= printed.Upper + slack),
            PrintedRelation.AtMost => Bound(number <= printed.Value + slack, number <= printed.Upper + slack),
            PrintedRelation.Above => Bound(number > printed.Value, number >= printed.Lower - slack),
            PrintedRelation.AtLeast => Bound(number >= printed.Value - slack, number >= printed.Lower - slack),
            _ => Rounded(printed, number, counted && number == Math.Floor(number), slack),
        };
    }

    private static string Bound(bool holds, bool nearly) => holds ? ClaimOutcomes.Agrees : nearly ? ClaimOutcomes.LastDigit : ClaimOutcomes.Differs;

    private static string Rounded(PrintedNumber printed, double number, bool whole, double slack)
    {
        var reach = (Neighbour * printed.HalfUnit) + slack;
        return printed.Lower - slack <= number && number <= printed.Upper + slack ? ClaimOutcomes.Agrees
            : !whole && Math.Abs(number - printed.Value) <= reach ? ClaimOutcomes.LastDigit
            : ClaimOutcomes.Differs;
    }
}
