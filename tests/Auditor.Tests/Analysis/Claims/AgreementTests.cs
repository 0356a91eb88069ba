using Auditor.Analysis.Claims;
using Auditor.Declaration;

namespace Auditor.Tests.Analysis.Claims;

/// <summary>The rule of comparison, by hand: a number agrees when it rounds to the figure, half-way to either neighbour.</summary>
public sealed class AgreementTests
{
    private const string Agrees = "agrees";
    private const string Last = "differs_in_the_last_digit";
    private const string Differs = "differs";

    [Theory]
    [InlineData("0.310", 0.3095, Agrees)]
    [InlineData("0.310", 0.3105, Agrees)]
    [InlineData("0.311", 0.3105, Agrees)]
    [InlineData("0.310", 0.30949, Last)]
    [InlineData("0.310", 0.3115, Last)]
    [InlineData("0.310", 0.31151, Differs)]
    [InlineData("0.310", -0.310, Differs)]
    [InlineData("2.675", 2.6745, Agrees)]
    [InlineData("1.005", 1.0055, Agrees)]
    [InlineData("0.000", 0.00049, Agrees)]
    [InlineData("0.000", -0.0004, Agrees)]
    [InlineData("0.000", 1e-300, Agrees)]
    [InlineData("0.000", 0.0012, Last)]
    [InlineData("0.000", 0.0021, Differs)]
    [InlineData("-0.000", 0.0002, Last)]
    [InlineData("< 0.001", 0.00099, Agrees)]
    [InlineData("< 0.001", 0, Agrees)]
    [InlineData("< 0.001", 0.001, Last)]
    [InlineData("< 0.001", 0.0014, Last)]
    [InlineData("< 0.001", 0.0016, Differs)]
    [InlineData("<= 0.001", 0.001, Agrees)]
    [InlineData("> 0.05", 0.0501, Agrees)]
    [InlineData("> 0.05", 0.046, Last)]
    [InlineData("> 0.05", 0.04, Differs)]
    [InlineData("≥ 0.05", 0.05, Agrees)]
    [InlineData("41.3 %", 0.4134, Agrees)]
    [InlineData("41.3 %", 0.4139, Last)]
    [InlineData("1.2e-5", 1.249e-5, Agrees)]
    [InlineData("1.2e-5", 1.26e-5, Last)]
    [InlineData("15.0618722713733", 15.06187227137329, Agrees)]
    public void A_figure_is_compared_at_its_digits(string text, double number, string outcome) =>
        Assert.Equal(outcome, Agreement.Of(PrintedNumber.Read(text)!, number, counted: false, digits: 15));

    [Theory]
    [InlineData("512", 512, Agrees)]
    [InlineData("512", 511, Differs)]
    [InlineData("17", 17.4, Agrees)]
    [InlineData("17", 17.6, Last)]
    public void Whole_counts_are_the_same_or_differ(string text, double number, string outcome) =>
        Assert.Equal(outcome, Agreement.Of(PrintedNumber.Read(text)!, number, counted: true, digits: 15));

    [Fact]
    public void Digits_that_the_data_cannot_carry_are_not_held_against_the_author()
    {
        var printed = PrintedNumber.Read("1.00000001")!;
        Assert.Equal(Differs, Agreement.Of(printed, 1.000001, counted: false, digits: 12));
        Assert.Equal(Agrees, Agreement.Of(printed, 1.000001, counted: false, digits: 5));
    }

    [Theory]
    [InlineData("0.310", 0.31249, "0.312")]
    [InlineData("41.3 %", 0.4134, "41.3 %")]
    [InlineData("3079", 3079, "3079")]
    [InlineData("1.20e-05", 1.249e-5, "1.25e-05")]
    [InlineData("< 0.001", 0.000192824, "0.000193")]
    [InlineData("0,31", -0.5, "-0.50")]
    public void The_recomputed_number_is_written_as_the_figure_is(string like, double number, string text) =>
        Assert.Equal(text, AsPrinted.Of(PrintedNumber.Read(like)!, number));
}
