namespace Auditor.Tests;

public sealed class GoldenTests
{
    [Theory]
    [InlineData("a\nb", "a\nc", "line 2 differs\n  expected: b\n  actual:   c")]
    [InlineData("a", "a\nc", "line 2 differs\n  expected: (the text has ended)\n  actual:   c")]
    [InlineData("a\nb", "a\nb", null)]
    public void The_first_difference_is_told_with_its_line(string expected, string actual, string? message) =>
        Assert.Equal(message, Golden.FirstDifference(expected, actual));
}
