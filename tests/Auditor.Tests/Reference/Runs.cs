namespace Auditor.Tests.Reference;

/// <summary>What the theories run over.</summary>
internal static class Runs
{
    public static TheoryData<string> Cases => [.. ReferenceCase.All.Select(one => one.Name)];

    /// <summary>Every case with every ending of its declarations.</summary>
    public static TheoryData<string, string> Declarations
    {
        get
        {
            TheoryData<string, string> rows = [];
            foreach (ReferenceCase one in ReferenceCase.All)
            {
                foreach (string variant in one.Variants)
                {
                    rows.Add(one.Name, variant);
                }
            }

            return rows;
        }
    }

    /// <summary>The figures of one record that case.json or exact.json holds; intervals, power and adjusted p are theories of their own.</summary>
    public static IReadOnlyList<Figure> Figures(CaseRun run) =>
    [
        .. FitFigures.Of(run),
        .. CoefficientFigures.Of(run),
        .. GroupFigures.Of(run),
        .. Certified(run),
    ];

    /// <summary>The certified figures, on the declaration whose final model is the certified one.</summary>
    public static IEnumerable<Figure> Certified(CaseRun run)
    {
        bool isCertified = run.Case.Name.StartsWith("nist_", StringComparison.Ordinal) && run.IsLargest == run.Case.Name is not ("nist_norris" or "nist_noint1");
        return isCertified ? CertifiedFigures.Of(run) : [];
    }
}
