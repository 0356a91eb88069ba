using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>All reference cases, each read once.</summary>
internal static class ReferenceCases
{
    private static readonly Lazy<Dictionary<string, ReferenceCase>> Cases = new(() =>
        ReferenceCase.Names(ReferenceFiles.ReadText).ToDictionary(name => name, name => ReferenceCase.Read(name, ReferenceFiles.ReadText)));

    public static IEnumerable<ReferenceCase> All => Cases.Value.Values;

    public static ReferenceCase Named(string name) => Cases.Value[name];

    /// <summary>Endings of the declarations of a case.</summary>
    public static IEnumerable<string> Variants(this ReferenceCase one) => one.IsPolynomial() ? ["", "-largest", "-powers", "-largest-powers"] : ["", "-largest"];

    private static bool IsPolynomial(this ReferenceCase one) => File.Exists(Path.Combine(TestFolders.Reference, one.Name, "declaration-powers.yaml"));
}
