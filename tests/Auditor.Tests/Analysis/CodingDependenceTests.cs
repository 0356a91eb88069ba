using System.Globalization;
using System.Text;

namespace Auditor.Tests.Analysis;

/// <summary>
/// A group whose terms are part of a product outside it tests a value that moves with the zero of its variables: no verdict may rest on it, however
/// the terms are written. Expected outcomes follow from the definition (no source).
/// </summary>
public sealed class CodingDependenceTests
{
    [Theory]
    [InlineData("[z, {product: [x, z]}]", "[x]", true)]
    [InlineData("[z, {product: [{center: x}, z]}]", "[x]", true)]
    [InlineData("[z, {product: [{power: {of: x, exponent: 2}}, z]}]", "[{square: x}]", true)]
    [InlineData("[x, z, w, {product: [x, z, w]}]", "[{product: [z, x]}]", true)]
    [InlineData("[x, z]", "[{product: [x, z]}]", false)]
    [InlineData("[z, {product: [w, z]}]", "[x]", false)]
    [InlineData("[z]", "[x, {product: [x, z]}]", false)]
    public void A_part_of_a_product_outside_the_group_has_no_verdict(string final, string leftOut, bool depends)
    {
        var record = AuditRunner.Record(
            $"audit: 1\nmodel: {{id: coding}}\ndata: {{source: data.csv}}\nresponse: y\nfinal_model: {{terms: {final}}}\nleft_out:\n  - {{group: part, terms: {leftOut}}}\n",
            _ => new MemoryStream(Encoding.UTF8.GetBytes(Data())));

        Assert.Equal(depends, record.Exclusions[0].Verdict == "inconclusive" && record.Exclusions[0].Reason.Contains("coded", StringComparison.Ordinal));
        Assert.Equal(depends, record.Findings.Any(finding => finding.Rule == "main-effect-beside-its-interaction"));
    }

    private static string Data()
    {
        var text = new StringBuilder("y,x,z,w\n");
        for (var i = 0; i < 60; i++)
        {
            var (x, z, w) = (Math.Sin(i * 1.3) + 3, Math.Cos(i * 0.7) + 2, Math.Sin(i * i));
            text.Append(CultureInfo.InvariantCulture, $"{(x * z) + (2 * x) + Math.Cos(i * i * 0.9)},{x},{z},{w}\n");
        }

        return text.ToString();
    }
}
