using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.Tests.Distributions;

/// <summary>Against 80-digit values: values/make_values.py.</summary>
public sealed class ChiSquaredTests
{
    private static List<Dictionary<string, string>> Rows => ValueFile.Rows("chi_squared.csv", 270);

    [Fact]
    public void Survival_agrees_with_high_precision_values() =>
        ValueFile.AllClose(Rows, "survival", r => ChiSquared.Survival(r.Number("x"), r.Number("df")));

    [Fact]
    public void Log_survival_agrees_with_high_precision_values() =>
        ValueFile.AllClose(Rows, "log_survival", r => ChiSquared.LogSurvival(r.Number("x"), r.Number("df")));
}
