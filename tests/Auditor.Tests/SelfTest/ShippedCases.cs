using System.Text;
using Auditor.Policies;
using Auditor.Results;
using Auditor.SelfTest;
using Auditor.Tests.Reference;

namespace Auditor.Tests.SelfTest;

/// <summary>The self-test on the files that ship, read where the repository keeps them; a test may replace the text of one.</summary>
internal static class ShippedCases
{
    private const string Distributions = "distributions/";

    public static Installation Installation { get; } = new("1.2.3", "a runtime", "a system", "X64", 256, "2026-01-01T00:00:00Z");

    public static SelfTestRecord Run(string? replaced = null, Func<string, string>? change = null)
    {
        Stream Open(string name)
        {
            string text = Text(name);
            return new MemoryStream(Encoding.UTF8.GetBytes(name == replaced ? change!(text) : text));
        }

        return new SelfTestRun(Open, ReferencePolicy()).Run(Installation);
    }

    public static string Text(string name) => name.StartsWith(Distributions, StringComparison.Ordinal)
        ? Repository.Text("tests", "Auditor.Numerics.Tests", "Distributions", "values", name[Distributions.Length..])
        : ReferenceFiles.ReadText(name);

    private static Policy ReferencePolicy() =>
        PolicyReader.Read(Repository.Text("rules", "policy.yaml"), "policy.yaml", ReferenceFiles.ReadText("policy-reference.yaml"), "policy-reference.yaml").Value!;
}
