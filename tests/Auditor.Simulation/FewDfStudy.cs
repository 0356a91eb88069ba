using System.Globalization;
using System.Text;
using Auditor.Numerics;
using Auditor.Numerics.GroupTests;
using Auditor.Numerics.Random;

namespace Auditor.Simulation;

/// <summary>
/// The negligible-effect test where all its assumptions hold but few degrees of freedom stand behind the covariance: u normal with covariance I and a mean whose length is that of an effect
/// exactly at the bound (noncentrality lambda), V a Wishart matrix on nu degrees of freedom, F = (nu - q + 1)/(nu q) u'V^-1 u on (q, nu - q + 1) as the forms over periods and CR2 give it. Effective
/// rows come from V, as in the audit. Counted: p at most 0.05, the effect wrongly shown to be below the bound.
/// </summary>
internal sealed class FewDfStudy(ulong seed, int draws)
{
    private const double Bound = 0.01;
    private const double Level = 0.05;

    public static readonly IReadOnlyList<int> Columns = [1, 2, 4, 8];
    public static readonly IReadOnlyList<int> Df = [1, 2, 3, 4, 5, 6, 8, 10, 20, 40];
    public static readonly IReadOnlyList<double> Lambdas = [1, 2, 5, 10, 20, 50, 200];

    public string Table(RunFacts run)
    {
        var text = new StringBuilder("# The negligible-effect test on few degrees of freedom\n\n");
        text.Append(CultureInfo.InvariantCulture, $"{run.Draws} draws a cell, seed {run.Seed}. Written by `dotnet run -c Release --project tests/Auditor.Simulation -- few-df --write`; what is simulated: README.md.\n");
        text.Append("Per cent of draws in which an effect exactly at the bound is shown to be below it, at level 0.05; df2 = nu - q + 1. The last column is the power of the test itself at lambda 10.\n\n");
        text.Append(CultureInfo.InvariantCulture, $"| columns | df2 | {string.Join(" | ", Lambdas.Select(lambda => "lambda " + lambda.ToString(CultureInfo.InvariantCulture)))} | power at 10 |\n|---|---|{string.Concat(Lambdas.Select(_ => "---|"))}---|\n");
        foreach (var q in Columns)
        {
            foreach (var df2 in Df)
            {
                var wrong = Lambdas.Select((lambda, cell) => (100 * Wrong(q, df2, lambda, cell)).ToString("0.0", CultureInfo.InvariantCulture));
                text.Append(CultureInfo.InvariantCulture, $"| {q} | {df2} | {string.Join(" | ", wrong)} | {100 * Power.AtBound(q, df2, 990, Bound, Level):0.0} |\n");
            }
        }

        return text.ToString();
    }

    private double Wrong(int q, int df2, double lambda, int cell)
    {
        var wrong = 0;
        for (var draw = 0; draw < draws; draw++)
        {
            var random = new Generator(seed ^ ((((((ulong)q * 64) + (ulong)df2) * 64) + (ulong)cell) * 1_000_003) ^ ((ulong)draw * 0x9E3779B97F4A7C15UL));
            wrong += P(random, q, df2, lambda) <= Level ? 1 : 0;
        }

        return (double)wrong / draws;
    }

    private static double P(Generator random, int q, int df2, double lambda)
    {
        var nu = df2 + q - 1;
        var u = Enumerable.Range(0, q).Select(a => random.Normal() + (a == 0 ? Math.Sqrt(lambda) : 0)).ToArray();
        var v = new double[q, q];
        for (var j = 0; j < nu; j++)
        {
            var row = Enumerable.Range(0, q).Select(_ => random.Normal()).ToArray();
            for (var a = 0; a < q; a++)
            {
                for (var b = 0; b < q; b++)
                {
                    v[a, b] += row[a] * row[b] / nu;
                }
            }
        }

        // lambda = D/(1 - D) n with the true covariance I: n = (df1 + df2 + 1) s² of the classical fit, lambda_max(I) = 1.
        var rows = lambda * (1 - Bound) / Bound;
        return Quadratic.Form(u, v) is double wald
            && TestResult.F((double)df2 / (nu * q) * wald, q, df2) is FTest f
            && EffectiveRows.Of(v, rows / (q + 1000.0 + 1), q, 1000) is { } effective
                ? NegligibleEffect.P(f, effective, Bound)
                : 1;
    }
}
