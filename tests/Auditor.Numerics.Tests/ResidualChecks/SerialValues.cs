using System.Text.Json;
using Auditor.Numerics.ResidualChecks;
using static Auditor.Numerics.Tests.ResidualChecks.Checks;

namespace Auditor.Numerics.Tests.ResidualChecks;

/// <summary>values/serial.json and fits of its cases; values/make_serial_values.py makes it and its text says with which versions.</summary>
internal static class SerialValues
{
    private static readonly Lazy<JsonElement> Root = new(() => JsonDocument.Parse(File.ReadAllText(
        Path.Combine(AppContext.BaseDirectory, "ResidualChecks", "values", "serial.json"))).RootElement);

    public static JsonElement List(string name) => Root.Value.GetProperty(name);

    public static JsonElement Case(string list, string name) => List(list).EnumerateArray().Single(one => one.GetProperty("name").GetString() == name);

    public static TheoryData<string> Names(string list) => [.. List(list).EnumerateArray().Select(one => one.GetProperty("name").GetString()!)];

    public static double[] Numbers(JsonElement one, string name) => VectorFile.Doubles(one.GetProperty(name));

    public static double[][] Columns(JsonElement one) => [.. one.GetProperty("columns").EnumerateArray().Select(VectorFile.Doubles)];

    /// <summary>Rows as they stand, one series.</summary>
    public static SerialFit InOrder(CheckedFit fit, bool laggedResponse = false) =>
        new(fit, SerialOrder.Of([.. Enumerable.Range(0, fit.Store.Residuals.Count)]), laggedResponse);

    public static SerialFit Ordered(JsonElement one) => new(Fit(Columns(one), Numbers(one, "response")), Order(one), false);

    private static SerialOrder Order(JsonElement one) => SerialOrder.Of(
        [.. Numbers(one, "units").Select(unit => (int)unit)], [.. Numbers(one, "periods").Select(period => (long)period)])!;
}
