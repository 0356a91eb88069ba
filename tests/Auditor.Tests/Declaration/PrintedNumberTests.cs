using Auditor.Declaration;

namespace Auditor.Tests.Declaration;

/// <summary>What the digits of a printed figure claim, by hand from the rule that a figure stands for all numbers that round to it.</summary>
public sealed class PrintedNumberTests
{
    [Theory]
    [InlineData("0.310", 0.3095, 0.3105)]
    [InlineData("0,310", 0.3095, 0.3105)]
    [InlineData(".31", 0.305, 0.315)]
    [InlineData("31", 30.5, 31.5)]
    [InlineData("-0.779", -0.7795, -0.7785)]
    [InlineData("−0.779", -0.7795, -0.7785)]
    [InlineData("+2.0", 1.95, 2.05)]
    [InlineData("0.000", -0.0005, 0.0005)]
    [InlineData("-0.00", -0.005, 0)]
    [InlineData("41.3 %", 0.4125, 0.4135)]
    [InlineData("41,3%", 0.4125, 0.4135)]
    [InlineData("1.2e-5", 1.15e-5, 1.25e-5)]
    [InlineData("1,20E+03", 1195, 1205)]
    [InlineData("-0.670191154593408E-01", -0.06701911545934085, -0.06701911545934075)]
    [InlineData("1,234", 1.2335, 1.2345)]
    public void A_figure_stands_for_what_rounds_to_it(string text, double lower, double upper)
    {
        var number = PrintedNumber.Read(text)!;
        Assert.Equal((PrintedRelation.Rounded, lower, upper), (number.Relation, number.Lower, number.Upper));
    }

    [Theory]
    [InlineData("< 0.001", PrintedRelation.Below, 0.001)]
    [InlineData("<0,001", PrintedRelation.Below, 0.001)]
    [InlineData("≤ 5 %", PrintedRelation.AtMost, 0.05)]
    [InlineData("<= .05", PrintedRelation.AtMost, 0.05)]
    [InlineData("> 1e3", PrintedRelation.Above, 1000)]
    [InlineData(">= 0.9", PrintedRelation.AtLeast, 0.9)]
    public void A_bound_is_read(string text, PrintedRelation relation, double value)
    {
        var number = PrintedNumber.Read(text)!;
        Assert.Equal((relation, value), (number.Relation, number.Value));
    }

    [Theory]
    [InlineData("")]
    [InlineData(".")]
    [InlineData("x")]
    [InlineData("0.4.1")]
    [InlineData("1,234.5")]
    [InlineData("1.234,5")]
    [InlineData("1,234,567")]
    [InlineData("54 000")]
    [InlineData("< < 1")]
    [InlineData("1e999")]
    [InlineData("NaN")]
    [InlineData("0.01***")]
    public void What_is_no_number_or_has_thousands_marks_is_not_read(string text) => Assert.Null(PrintedNumber.Read(text));

    [Fact]
    public void Another_reading_of_a_comma_or_per_cent_sign_is_kept_beside()
    {
        Assert.Equal(1234, PrintedNumber.Read("1,234")!.AsThousands!.Value);
        Assert.Equal(8.1, PrintedNumber.Read("8.1 %")!.WithoutPercent!.Value);
        Assert.All(new[] { "0,123", "1.234", "1,23", "1234,567", "1,234e2" }, text => Assert.Null(PrintedNumber.Read(text)!.AsThousands));
    }

    [Theory]
    [InlineData("54,000")]
    [InlineData("54.000")]
    [InlineData("54 000")]
    [InlineData("512.0")]
    [InlineData("< 500")]
    [InlineData("5 %")]
    public void Rows_are_whole_numbers_without_marks(string text) => Assert.Equal(
        [$"6: reported.rows_used: expected a whole number such as 54000, without thousands marks, found '{text}'"],
        Declared.Problems($"reported: {{rows_used: \"{text}\"}}"));

    [Theory]
    [InlineData("3,067")]
    [InlineData("> 100")]
    [InlineData("5 %")]
    [InlineData("-1")]
    public void Degrees_of_freedom_that_can_be_read_in_two_ways_are_refused(string text) => Assert.Equal(
        [$"6: left_out \"a\".reported.df: expected degrees of freedom such as 2, 54000 or 17.3, without thousands marks, found '{text}'"],
        Declared.Problems($"left_out: [{{group: a, terms: [b], reported: {{df: [1, \"{text}\"]}}}}]"));
}
