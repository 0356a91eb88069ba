using System.Globalization;
using Auditor.Reporting;
using CsCheck;

namespace Auditor.Tests.Reporting;

/// <summary>Expected texts are rounded by hand.</summary>
public sealed class NumberTextTests
{
    private const double Level = 0.05;

    [Theory]
    [InlineData(0.434112, null, "0.434")]
    [InlineData(0.0119325, null, "0.0119")]
    [InlineData(0.00041251, null, "0.000413")]
    [InlineData(0.0000999, null, "< 0.0001")]
    [InlineData(0.0001, null, "0.000100")]
    [InlineData(3.04e-12, null, "< 0.0001")]
    [InlineData(0.99961, null, "> 0.999")]
    [InlineData(1, null, "1")]
    [InlineData(0, null, "< 0.0001")]
    [InlineData(0.04999, null, "0.0500")]
    [InlineData(0.05, null, "0.0500")]
    [InlineData(0.050004, null, "0.050004")]
    public void A_probability_is_never_zero_and_stays_on_its_side_of_the_level(double p, double? log10, string text) =>
        Assert.Equal(text, Plain(NumberText.Probability(p, log10, Level)));

    /// <summary>Where the level itself is that small, a p must show on which side it lies.</summary>
    [Theory]
    [InlineData(0, null, "< 10⁻³⁰⁰")]
    [InlineData(0, -345.2, "6.3 × 10⁻³⁴⁶")]
    [InlineData(3.04e-12, null, "3.0 × 10⁻¹²")]
    [InlineData(0.0000499999, null, "5.0 × 10⁻⁵")]
    [InlineData(0.0000500001, null, "5.00001 × 10⁻⁵")]
    public void Below_a_level_that_small_the_power_of_ten_is_shown(double p, double? log10, string text) =>
        Assert.Equal(text, Plain(NumberText.Probability(p, log10, 0.00005)));

    [Fact]
    public void Any_probability_reads_back_on_the_same_side_of_the_level() =>
        Gen.Double[-300, 0].Select(power => Math.Pow(10, power)).Sample(p =>
        {
            double read = Read(NumberText.Probability(p, null, p < 0.0001 ? 0.00001 : Level));
            return read > 0 && (read <= (p < 0.0001 ? 0.00001 : Level)) == (p <= (p < 0.0001 ? 0.00001 : Level)) && Math.Abs((read / p) - 1) < 0.051;
        });

    [Theory]
    [InlineData(38.4203138, "38.42")]
    [InlineData(-0.0054729236, "−0.005473")]
    [InlineData(0.0000582017, "5.820 × 10⁻⁵")]
    [InlineData(-3635.174706, "−3,635")]
    [InlineData(1234567.8, "1,234,568")]
    [InlineData(2.5e12, "2.500 × 10¹²")]
    [InlineData(0, "0")]
    [InlineData(9.99996, "10.00")]
    public void A_number_has_four_significant_digits(double value, string text) => Assert.Equal(text, Plain(NumberText.Number(value)));

    [Theory]
    [InlineData(123456.789, 3.4, "1.23 × 10⁵")]
    [InlineData(0.312449, 2.0, "0.31")]
    [InlineData(0.312449, 15.9, "0.3124")]
    [InlineData(0.312449, null, "0.3124")]
    [InlineData(0.312449, 0.9, "no digit can be trusted")]
    [InlineData(0.312449, -2.0, "no digit can be trusted")]
    public void No_digit_is_printed_that_cannot_be_trusted(double value, double? trusted, string text) =>
        Assert.Equal(text, Plain(NumberText.Trusted(value, trusted)));

    [Theory]
    [InlineData(2614, "2,614")]
    [InlineData(1234567, "1,234,567")]
    [InlineData(37.44, "37.4")]
    [InlineData(0, "0")]
    public void Counts_have_their_thousands_set_apart(double value, string text) => Assert.Equal(text, Plain(NumberText.Count(value)));

    [Theory]
    [InlineData(0.9, "90 %")]
    [InlineData(0.95, "95 %")]
    [InlineData(0.975, "97.5 %")]
    public void Shares_read_as_percentages(double value, string text) => Assert.Equal(text, Plain(NumberText.Percent(value)));

    /// <summary>Spaces that do not break are hard to see in a test.</summary>
    private static string Plain(string text) => text.Replace('\u00A0', ' ');

    private static double Read(string text)
    {
        if (text.StartsWith('>'))
        {
            return 1;
        }

        string plain = Plain(text);
        int times = plain.IndexOf(" × 10", StringComparison.Ordinal);
        return times < 0
            ? double.Parse(plain, CultureInfo.InvariantCulture)
            : double.Parse(plain[..times] + "E" + string.Concat(plain[(times + 5)..].Select(Lowered)), CultureInfo.InvariantCulture);
    }

    private static char Lowered(char sign) => sign == '⁻' ? '-' : (char)('0' + "⁰¹²³⁴⁵⁶⁷⁸⁹".IndexOf(sign, StringComparison.Ordinal));
}
