using System.Globalization;
using Auditor.Numerics.Distributions;

namespace Auditor.SelfTest;

/// <summary>Files of values of distributions at 80 digits: a comment line that says how they were made, a line of names, then one point a row.</summary>
internal static class DistributionValues
{
    /// <summary>A subnormal number has no digits to compare; its logarithm stands beside it.</summary>
    private const double Subnormal = 1e-305;

    private static readonly Function[] Functions =
    [
        new("fisher_f", "survival", p => FisherF.Survival(p["f"], p["df1"], p["df2"])),
        new("fisher_f", "cumulative", p => FisherF.Cumulative(p["f"], p["df1"], p["df2"])),
        new("fisher_f", "log_survival", p => FisherF.LogSurvival(p["f"], p["df1"], p["df2"])),
        new("fisher_f_quantile", "f", p => FisherF.UpperQuantile(p["p"], p["df1"], p["df2"])),
        new("student_t", "two_sided", p => StudentT.TwoSided(p["t"], p["df"])),
        new("student_t", "log_two_sided", p => StudentT.LogTwoSided(p["t"], p["df"])),
        new("student_t_quantile", "t", p => StudentT.UpperQuantile(p["p"], p["df"])),
        new("chi_squared", "survival", p => ChiSquared.Survival(p["x"], p["df"])),
        new("chi_squared", "log_survival", p => ChiSquared.LogSurvival(p["x"], p["df"])),
        new("noncentral_f", "cumulative", p => NoncentralF.Cumulative(p["f"], p["df1"], p["df2"], p["lambda"])),
        new("noncentral_f", "survival", p => NoncentralF.Survival(p["f"], p["df1"], p["df2"], p["lambda"])),
        new("noncentral_f_inverse", "lambda", p => p.Kind == "power"
            ? NoncentralF.NoncentralityForPower(p["f"], p["df1"], p["df2"], p["p"])
            : NoncentralF.Noncentrality(p["f"], p["df1"], p["df2"], p["p"])),
    ];

    private sealed record Function(string File, string Column, Func<Point, double?> Compute);

    /// <summary>How the values were made.</summary>
    public static string Source(string text) => text[..text.IndexOf('\n', StringComparison.Ordinal)].TrimStart('#', ' ').TrimEnd();

    /// <summary>For each function of the file the point where the fewest digits agree.</summary>
    public static IReadOnlyList<Figure> Worst(string file, string text)
    {
        var lines = text.Split('\n', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries);
        var names = lines[1].Split(',');
        var points = lines.Skip(2).Select(line => new Point(names, line.Split(','))).ToList();
        return [.. Functions.Where(function => function.File == file).Select(function => Worst(function, points))];
    }

    private static Figure Worst(Function function, IReadOnlyList<Point> points)
    {
        var figures = points.Select(point => Of(function, point)).OfType<Figure>().ToList();
        var worst = figures.MinBy(figure => figure.CorrectDigits) ?? throw new InvalidDataException(function.File + " holds no point");
        return worst with { Where = string.Create(CultureInfo.InvariantCulture, $"worst of {figures.Count} points: {worst.Where}") };
    }

    private static Figure? Of(Function function, Point point)
    {
        var exact = Quantity.Parse(point.Text(function.Column));
        if (exact.Number != 0 && Math.Abs(exact.Number) < Subnormal)
        {
            return null;
        }

        Quantity? found = function.Compute(point) is double value ? new Quantity(value) : null;
        return new Figure(function.Column, point.Describe(function.Column), null, exact with { Log10 = null }, found);
    }

    private sealed class Point(string[] names, string[] cells)
    {
        public string? Kind => names[0] == "kind" ? cells[0] : null;

        public double this[string name] => double.Parse(Text(name), NumberStyles.Float, CultureInfo.InvariantCulture);

        public string Text(string name) => cells[Array.IndexOf(names, name)];

        /// <summary>The arguments: what stands before the first value, and for an inverse the probability.</summary>
        public string Describe(string column) => string.Join(", ", names.Zip(cells).TakeWhile(pair => pair.First != column && pair.First is not ("survival" or "two_sided" or "cumulative")).Select(pair => pair.First + " " + pair.Second));
    }
}
