using Auditor.Declaration;
using Auditor.Results;

namespace Auditor.Analysis.Claims.Relations;

/// <summary>Values that a figure cannot have whatever the data: listed only when one is claimed.</summary>
internal static class PossibleValues
{
    public static IEnumerable<ClaimRelation> Of(IEnumerable<ClaimedFigure> figures) => figures.SelectMany(Of);

    private static IEnumerable<ClaimRelation> Of(ClaimedFigure figure)
    {
        var (least, most) = figure.Kind switch
        {
            ClaimKinds.P => (0.0, 1.0),
            ClaimKinds.RSquared => (figure.Path == DeclaredClaims.AdjustedPath ? double.NegativeInfinity : 0, 1),
            ClaimKinds.Estimate => (double.NegativeInfinity, double.PositiveInfinity),
            _ => (0, double.PositiveInfinity),
        };
        var possible = new Interval(least, most);
        var claimed = figure.Printed.Relation switch
        {
            PrintedRelation.Below or PrintedRelation.AtMost => new Interval(double.NegativeInfinity, figure.Printed.Value),
            PrintedRelation.Above or PrintedRelation.AtLeast => new Interval(figure.Printed.Value, double.PositiveInfinity),
            _ => new Interval(figure.Printed.Lower, figure.Printed.Upper),
        };
        if (!possible.Meets(claimed))
        {
            yield return new ClaimRelation([figure.Path], $"{figure.What} is {possible}, whatever the data", false, $"{figure.Figure.Text} is printed");
        }
    }
}
