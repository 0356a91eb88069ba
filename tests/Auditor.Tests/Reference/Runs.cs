using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>What the theories run over.</summary>
internal static class Runs
{
    public static TheoryData<string> Cases => [.. ReferenceCases.All.Select(one => one.Name)];

    /// <summary>Every case with every ending of its declarations.</summary>
    public static TheoryData<string, string> Declarations
    {
        get
        {
            TheoryData<string, string> rows = [];
            foreach (ReferenceCase one in ReferenceCases.All)
            {
                foreach (string variant in one.Variants())
                {
                    rows.Add(one.Name, variant);
                }
            }

            return rows;
        }
    }
}
