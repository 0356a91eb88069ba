using Auditor.Results;
using Auditor.SelfTest;

namespace Auditor.Tests.SelfTest;

public sealed class SelfTestRunTests
{
    private static readonly Lazy<SelfTestRecord> Record = new(() => ShippedCases.Run());

    [Fact]
    public void Every_shipped_case_agrees_here()
    {
        Assert.Empty(Record.Value.Cases.Where(one => !one.Passed).SelectMany(one => one.Quantities.Where(quantity => !quantity.Passed).Select(quantity => $"{one.Id} {quantity}").Append(one.Fault)));
        Assert.True(Record.Value.Passed);
        Assert.Equal(22, Record.Value.Cases.Count);
        Assert.True(Record.Value.Cases.Sum(one => one.Quantities.Count) >= 1330);
    }

    [Fact]
    public void Every_case_names_its_sources() =>
        Assert.All(Record.Value.Cases, one => Assert.NotEmpty(one.Sources));

    [Fact]
    public void Certified_cases_say_who_certified_them()
    {
        IReadOnlyList<string> certified = Record.Value.Cases.Where(one => one.Sources.Any(source => source.Contains("certified by NIST", StringComparison.Ordinal))).Select(one => one.Id).ToList();
        Assert.Equal(
            ["nist_filip-largest", "nist_filip-largest-powers", "nist_longley-largest", "nist_noint1", "nist_norris", "nist_norris-powers", "nist_wampler1-largest", "nist_wampler4-largest"],
            certified.Order(StringComparer.Ordinal));
    }

    [Fact]
    public void No_floor_asks_for_less_than_six_digits() =>
        Assert.All(
            Record.Value.Cases.SelectMany(one => one.Quantities).Where(quantity => quantity.Expected is not null),
            quantity => Assert.True(quantity.Floor >= 6, quantity.ToString()));

    [Fact]
    public void A_test_that_cannot_exist_counts_only_when_none_is_given()
    {
        var absent = Record.Value.Cases.SelectMany(one => one.Quantities).Where(quantity => quantity.Expected is null).ToList();
        Assert.NotEmpty(absent);
        Assert.All(absent, quantity => Assert.Null(quantity.Found));
    }

    [Fact]
    public void A_spoiled_expected_value_fails_its_case_alone()
    {
        // The certified slope of Norris is 1.00211681802045 (NIST StRD).
        SelfTestRecord spoiled = ShippedCases.Run("nist_norris/case.json", text => Replaced(text, "\"1.00211681802045\"", "\"1.00211691802045\""));

        Assert.False(spoiled.Passed);
        Assert.Equal(["nist_norris", "nist_norris-powers"], spoiled.Cases.Where(one => !one.Passed).Select(one => one.Id));
        SelfTestQuantity wrong = Assert.Single(spoiled.Cases[0].Quantities, quantity => !quantity.Passed);
        Assert.Equal("certified estimate", wrong.Kind);
        Assert.InRange(wrong.Digits!.Value, 6.9, 7.1);
    }

    [Fact]
    public void Spoiled_data_fail_their_case()
    {
        SelfTestRecord spoiled = ShippedCases.Run("swiss_fertility/data.csv", text => Replaced(text, "80.2", "80.3"));

        Assert.Equal(["swiss_fertility"], spoiled.Cases.Where(one => !one.Passed).Select(one => one.Id));
    }

    [Theory]
    [InlineData("prestige/case.json", "{", "prestige")]
    [InlineData("prestige/declaration.yaml", "audit: 1\n", "prestige")]
    [InlineData("distributions/student_t.csv", "", "student_t")]
    [InlineData("distributions/student_t.csv", "# made.\nt,df,two_sided,log_two_sided\n", "student_t")]
    public void A_case_that_cannot_be_compared_fails_and_says_why(string file, string text, string id)
    {
        SelfTestCase failed = Assert.Single(ShippedCases.Run(file, _ => text).Cases, one => !one.Passed);

        Assert.Equal(id, failed.Id);
        Assert.False(string.IsNullOrEmpty(failed.Fault));
    }

    [Fact]
    public void A_kind_of_quantity_that_vanished_fails()
    {
        var checks = QuantityCheck.Of([new Figure("a", "", new Quantity(1), null, new Quantity(1))], new Dictionary<string, int> { ["a"] = 9, ["b"] = 9 });

        Assert.Equal([true, false], checks.Select(check => check.Passed));
    }

    [Fact]
    public void A_quantity_without_a_floor_fails() =>
        Assert.False(Assert.Single(QuantityCheck.Of([new Figure("a", "", new Quantity(1), null, new Quantity(1))], new Dictionary<string, int>())).Passed);

    [Fact]
    public void A_value_that_is_no_number_fails() =>
        Assert.False(Assert.Single(QuantityCheck.Of([new Figure("a", "", new Quantity(1), null, new Quantity(double.NaN))], new Dictionary<string, int> { ["a"] = 9 })).Passed);

    private static string Replaced(string text, string old, string with)
    {
        Assert.Contains(old, text, StringComparison.Ordinal);
        int at = text.IndexOf(old, StringComparison.Ordinal);
        return text[..at] + with + text[(at + old.Length)..];
    }
}
