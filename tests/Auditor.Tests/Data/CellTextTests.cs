using System.Globalization;
using Auditor.Data;
using CsCheck;

namespace Auditor.Tests.Data;

public sealed class CellTextTests
{
    /// <summary>Source: the number parser of the platform, held to finite values, for texts that are nearly numbers.</summary>
    [Fact]
    public void Reads_what_the_platform_reads_and_nothing_else() =>
        Gen.String[Gen.Char["0123456789012345678901234567890123456789....+-eE ,\tinfatyNI%$_x'"], 0, 9].Sample(
            text =>
            {
                var expected = double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out var number) && double.IsFinite(number);

                Assert.Equal(expected, CellText.TryNumber(text, out var found));
                Assert.True(!expected || BitConverter.DoubleToInt64Bits(number) == BitConverter.DoubleToInt64Bits(found));
            },
            iter: 200_000);

    [Theory]
    [InlineData("26a")]
    [InlineData("3.,4")]
    [InlineData("34 2")]
    [InlineData("12\0")]
    [InlineData("1e400")]
    [InlineData("-1e400")]
    [InlineData("Infinity")]
    [InlineData("NaN")]
    [InlineData("1,000")]
    [InlineData("(5)")]
    [InlineData("")]
    [InlineData(" ")]
    public void Is_no_number(string text) => Assert.False(CellText.TryNumber(text, out _));
}
