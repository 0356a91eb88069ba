using Auditor.Yaml;

namespace Auditor.Tests.Yaml;

public sealed class NearestNameTests
{
    /// <summary>
    /// Worked by hand from the definition; kitten and saturday are textbook cases of the Levenshtein distance. "CA" to "ABC" is the standard case (3) in which the
    /// optimal string alignment differs from the unrestricted Damerau–Levenshtein distance (2): Boytsov, ACM JEA 16 (2011), from memory.
    /// </summary>
    [Theory]
    [InlineData("", "", 0)]
    [InlineData("", "abc", 3)]
    [InlineData("abc", "", 3)]
    [InlineData("abc", "abc", 0)]
    [InlineData("kitten", "sitting", 3)]
    [InlineData("saturday", "sunday", 3)]
    [InlineData("ab", "ba", 1)]
    [InlineData("CA", "ABC", 3)]
    [InlineData("abcdef", "bacdfe", 2)]
    public void Distance_counts_slips(string a, string b, int slips)
    {
        Assert.Equal(slips, NearestName.Distance(a, b));
        Assert.Equal(slips, NearestName.Distance(b, a));
    }

    [Theory]
    [InlineData("colums", "columns")]
    [InlineData("COLUMNS", "columns")]
    [InlineData("tiem", "time")]
    [InlineData("prise", "price")]
    [InlineData("pricex", "price")]
    [InlineData("advanc_rat", "advance_rate")]
    [InlineData("of", "df")]
    [InlineData("x", null)]
    [InlineData("P", "p")]
    [InlineData("f", "df")]
    [InlineData("q", null)]
    [InlineData("wholly_different", null)]
    [InlineData("", null)]
    public void The_nearest_is_the_one_that_was_meant(string name, string? meant) =>
        Assert.Equal(meant, NearestName.Of(name, ["columns", "time", "price", "advance_rate", "p", "df"]));

    [Fact]
    public void The_first_of_equals_is_taken() => Assert.Equal("bat", NearestName.Of("cat", ["dog", "bat", "hat"]));

    [Fact]
    public void A_hint_names_one_or_the_few_known()
    {
        Assert.Equal("; did you mean 'price'?", NearestName.Hint("prise", ["age", "price"]));
        Assert.Equal("; known: age, price", NearestName.Hint("wholly", ["age", "price"]));
        Assert.Equal("", NearestName.Hint("wholly", [.. Enumerable.Range(0, 13).Select(number => "column" + (char)('a' + number))]));
        Assert.Equal("", NearestName.Hint("wholly", []));
        Assert.Equal("", NearestName.DidYouMean("wholly", ["age", "price"]));
    }

    /// <summary>What slips alone do not find: the beginning of a name, and a name with its last words in another way.</summary>
    [Theory]
    [InlineData("prec", "precision")]
    [InlineData("Sam", "sampling")]
    [InlineData("pr", null)]
    [InlineData("effect", "effect-differs")]
    [InlineData("efect-differ", "effect-differs")]
    [InlineData("effect-difers-not", "effect-differs")]
    [InlineData("partial_r2", null)]
    [InlineData("small_partial_r2", "small_partial_r_squared")]
    [InlineData("small_r_squared_of_all", null)]
    public void A_hint_also_takes_beginnings_and_words(string name, string? meant)
    {
        string[] known = ["effect-differs-everywhere", "effect-differs", "precision", "sampling", "small_partial_r_squared"];
        Assert.Equal(meant is null ? "" : $"; did you mean '{meant}'?", NearestName.DidYouMean(name, known));
    }

    [Fact]
    public void A_very_long_name_costs_nothing() => Assert.Equal("", NearestName.DidYouMean(new string('x', 1_000_000), [.. Enumerable.Repeat("price", 10_000)]));
}
