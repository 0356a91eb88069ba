using System.Text.Json;
using Auditor.Results;
using Auditor.SelfTest;
using Auditor.Tests.Reference;

namespace Auditor.Tests.Elimination;

/// <summary>Every reference case's sequential_path (R's anova of successive models, on the common rows) as the author's steps.</summary>
public sealed class SequentialPathTests
{
    /// <summary>Case, step: where R's model and the declared columns differ in ways that floors.json allows for elsewhere, digits are fewer.</summary>
    private const double AtLeast = 1e-7;

    [Theory]
    [MemberData(nameof(Runs.Cases), MemberType = typeof(Runs))]
    public void Steps_are_those_of_R(string name)
    {
        var one = ReferenceCases.Named(name);
        if (one.Values.GetProperty("weights_column").ValueKind == JsonValueKind.String && ReferenceFiles.ReadText(name + "/declaration.yaml").Contains("sampling", StringComparison.Ordinal))
        {
            return;
        }

        var expected = one.Values.GetProperty("sequential_path").EnumerateArray().ToList();
        var steps = Steps(name, expected);
        Assert.Equal(expected.Count, steps.Count);
        foreach (var (step, found) in expected.Zip(steps))
        {
            Assert.Equal(step.Text("dropped"), found.Drop);
            Assert.False(found.BreaksRule);
            if (step.Number("F") is { } f)
            {
                Assert.Equal((step.GetProperty("df1").GetDouble(), step.GetProperty("df2").GetDouble()), (found.Df1!.Value, found.Df2!.Value));
                Near(f.Number, found.F!.Value, Math.Max(one.Tolerance, AtLeast));
                Near(step.Number("p", "log10_p")!.Value.Number, found.P!.Value, Math.Max(one.Tolerance, AtLeast));
            }
            else
            {
                Assert.Null(found.F);
                Assert.NotNull(found.Why);
            }
        }
    }

    private static IReadOnlyList<StepResult> Steps(string name, IReadOnlyList<JsonElement> path)
    {
        var steps = string.Join(", ", path.Select(step => $"{{drop: {step.Text("dropped")}}}"));
        var declaration = ReferenceFiles.ReadText(name + "/declaration.yaml") + "elimination: {rule: {judgement: listed order}, steps: [" + steps + "]}\n";
        return AuditRunner.Record(declaration, file => File.OpenRead(ReferenceFiles.FullPath(name + "/" + file)), ReferenceFiles.ReadText("policy-reference.yaml")).Elimination;
    }

    private static void Near(double expected, double actual, double tolerance) =>
        Assert.True(Math.Abs(expected - actual) <= tolerance * Math.Abs(expected) || (expected < 1e-290 && actual == 0), $"expected {expected:R}, found {actual:R}");
}
