using Auditor.Declaration;
using Auditor.Numerics;

namespace Auditor.Design;

/// <summary>Binds terms that are made of one number, value by value.</summary>
internal static class NumberBinding
{
    public static BoundTerm? Of(BindingScope scope, Term term, BoundTerm of) => term switch
    {
        TransformTerm { Transform: NumberTransform.Center } => Fixed(scope, term, of, values => KeptValues.Mean(values) is var mean ? x => x - mean : null!),
        TransformTerm transform => new BoundMap(term, of, Map(transform.Transform, transform.Plus), Low(transform)),
        PowerTerm power => new BoundMap(term, of, x => Powers.Of(x, power.Exponent), x => Powers.LowOf(x, power.Exponent)),
        CapTerm cap => new BoundMap(term, of, Between(cap.Lower ?? double.NegativeInfinity, cap.Upper ?? double.PositiveInfinity)),
        WinsoriseTerm winsorise => Fixed(scope, term, of, values => Winsorise(winsorise, values)),
        PolynomialTerm polynomial => Polynomial(polynomial, of),
        SplineTerm spline => Spline(spline, of),
        BinsTerm bins => Bins(bins, of),
        _ => throw new ArgumentException($"no binding for {term.GetType().Name}", nameof(term)),
    };

    private static Func<double, double> Map(NumberTransform transform, double plus) => transform switch
    {
        NumberTransform.Log => x => Math.Log(x + plus),
        NumberTransform.Log10 => x => Math.Log10(x + plus),
        NumberTransform.Log1p => x => Log1p(x + plus),
        NumberTransform.Sqrt => x => Math.Sqrt(x + plus),
        NumberTransform.Square => x => (x + plus) * (x + plus),
        NumberTransform.Inverse => x => 1 / (x + plus),
        NumberTransform.Exp => x => Math.Exp(x + plus),
        _ => x => Math.Abs(x + plus),
    };

    /// <summary>What rounding takes off a square.</summary>
    private static Func<double, double>? Low(TransformTerm term) =>
        term.Transform == NumberTransform.Square ? x => Powers.LowOf(x + term.Plus, 2) : null;

    /// <summary>log(1 + x) without losing the digits of a small x; the platform's function computes 1 + x and loses them.</summary>
    /// <remarks>The error of the rounded sum is divided out again (Goldberg 1991, What every computer scientist should know about floating-point arithmetic, theorem 4).</remarks>
    private static double Log1p(double x)
    {
        var sum = 1 + x;
        return sum == 1 ? x : Math.Log(sum) * (x / (sum - 1));
    }

    private static Func<double, double> Between(double lower, double upper) => x => Math.Clamp(x, lower, upper);

    private static Func<double, double> Winsorise(WinsoriseTerm term, double[] values)
    {
        Array.Sort(values);
        return Between(KeptValues.Quantile(values, term.Lower), KeptValues.Quantile(values, term.Upper));
    }

    /// <summary>A map that depends on the values of the kept rows, of which there must be one.</summary>
    private static BoundTerm? Fixed(BindingScope scope, Term term, BoundTerm of, Func<double[], Func<double, double>> map) =>
        KeptValues.Of(of, scope.KeptRows) is { Length: > 0 } values
            ? new BoundMap(term, of, map(values))
            : scope.Refuse(term, $"{term.Label}: no kept row has a value of {term.Parts[0].Label}");

    private static BoundSpread Polynomial(PolynomialTerm term, BoundTerm of)
    {
        var powers = Enumerable.Range(1, term.Degree).ToList();
        string[] labels = [.. powers.Select(power => power == 1 ? term.Of.Label : term.Of.Operand + "^" + TermWords.Number(power))];
        return new BoundSpread(term, of, labels, Each(Powers.Of), Each(Powers.LowOf));

        Action<double, Span<double>> Each(Func<double, double, double> power) => (x, into) =>
        {
            for (var c = 0; c < into.Length; c++)
            {
                into[c] = power(x, powers[c]);
            }
        };
    }

    private static BoundSpread Spline(SplineTerm term, BoundTerm of) => new(
        term,
        of,
        [.. Enumerable.Range(1, term.Knots.Count - 1).Select(column => term.Of.Label + " spline " + TermWords.Number(column))],
        (x, into) => NaturalSpline.Columns(x, term.Knots, into));

    private static BoundSpread Bins(BinsTerm term, BoundTerm of)
    {
        var cuts = term.Cuts;
        var inner = cuts.Zip(cuts.Skip(1), (from, to) => $"{term.Of.Label} in ({TermWords.Number(from)}, {TermWords.Number(to)}]");
        return new BoundSpread(term, of, [.. inner, $"{term.Of.Label} over {TermWords.Number(cuts[^1])}"], (x, into) =>
        {
            for (var c = 0; c < into.Length; c++)
            {
                into[c] = x > cuts[c] && (c + 1 == cuts.Count || x <= cuts[c + 1]) ? 1 : 0;
            }
        });
    }
}
