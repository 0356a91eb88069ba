namespace Auditor.Results;

/// <summary>Evidence that an installation computes correctly: what was compared with what, and how far they agree.</summary>
/// <param name="SelfTest">Version of this format.</param>
/// <param name="Passed">Every case passed.</param>
/// <param name="Meaning">What the evidence is, and what it is not.</param>
public sealed record SelfTestRecord(int SelfTest, bool Passed, string Meaning, Installation Installation, IReadOnlyList<SelfTestCase> Cases)
{
    public const string WhatItShows =
        "This shows whether this installation computes these cases correctly. It is no approval of any model, and says nothing of data or declarations other than these.";
}

/// <summary>Where the self-test ran.</summary>
/// <param name="VectorBits">Widest vector instructions in use; results are the same with all of them.</param>
public sealed record Installation(string ToolVersion, string Runtime, string OperatingSystem, string ProcessorArchitecture, int VectorBits, string Started);

/// <summary>One audited declaration, or one file of values of a distribution.</summary>
/// <param name="Sources">Where data and expected values come from.</param>
/// <param name="Fault">Why the case could not be compared; null when it was.</param>
public sealed record SelfTestCase(string Id, string Title, IReadOnlyList<string> Sources, bool Passed, string? Fault, IReadOnlyList<SelfTestQuantity> Quantities)
{
    internal static SelfTestCase Compared(string id, string title, IReadOnlyList<string> sources, IReadOnlyList<SelfTestQuantity> quantities) =>
        new(id, title, sources, quantities.Count > 0 && quantities.All(quantity => quantity.Passed), null, quantities);

    internal static SelfTestCase Failed(string id, string fault) => new(id, id, [], false, fault, []);
}

/// <summary>One number beside what it should be.</summary>
/// <param name="Kind">What is compared; all numbers of one kind have one floor.</param>
/// <param name="Where">Which one: a coefficient, a group, a point.</param>
/// <param name="Expected">Null: the number does not exist, and none may be given.</param>
/// <param name="Log10">Both numbers are decimal logarithms, of a probability that a double cannot hold.</param>
/// <param name="Digits">Decimal digits that agree, 16 at most; null when one of the two is missing.</param>
/// <param name="Floor">Digits that must agree; null when none can.</param>
public sealed record SelfTestQuantity(string Kind, string Where, double? Expected, double? Found, bool Log10, double? Digits, int? Floor, bool Passed);
