namespace Auditor.Design;

/// <summary>
/// The natural cubic spline on K rising knots t, the two outer ones included: K - 1 columns, x first, cubic between the knots, linear beyond the outer ones.
/// </summary>
/// <remarks>
/// Truncated powers as in Hastie, Tibshirani and Friedman, The Elements of Statistical Learning, 2nd edition, equations 5.4 and 5.5, each column
/// multiplied by (t[K] - t[k]) and divided by (t[K] - t[1])², which leaves the space as it is and makes the columns of about the size of x (Harrell, Regression
/// Modeling Strategies, section 2.4.5). Verified: the space against R's splines::ns, the columns against values by the equation in R.
/// </remarks>
internal static class NaturalSpline
{
    public static void Columns(double x, IReadOnlyList<double> knots, Span<double> into)
    {
        var (last, before) = (knots[^1], knots[^2]);
        var range = last - knots[0];
        into[0] = x;
        for (var k = 0; k < knots.Count - 2; k++)
        {
            into[k + 1] = Column(x, knots[k], before, last) / (range * range);
        }
    }

    private static double Column(double x, double knot, double before, double last)
    {
        // Beyond the last knot the three cubes cancel to a line, written out here so that nothing is lost.
        if (x >= last)
        {
            return (last - knot) * (before - knot) * ((x - knot) + (x - before) + (x - last));
        }

        return Cube(x - knot) - (Cube(x - before) * (last - knot) / (last - before));
    }

    private static double Cube(double above) => above > 0 ? above * above * above : 0;
}
