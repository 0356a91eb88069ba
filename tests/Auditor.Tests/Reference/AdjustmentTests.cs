using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>Adjusted p-values against R's p.adjust over the classical p (case.json).</summary>
public sealed class AdjustmentTests
{
    private static readonly string[] Adjustments = ["holm", "hochberg", "benjamini_hochberg"];

    public static TheoryData<string, string> Rows
    {
        get
        {
            TheoryData<string, string> rows = [];
            foreach (ReferenceCase one in ReferenceCases.All)
            {
                foreach (string adjustment in Adjustments)
                {
                    rows.Add(one.Name, adjustment);
                }
            }

            return rows;
        }
    }

    [Theory]
    [MemberData(nameof(Rows))]
    public void Adjusted_p_values_agree(string name, string adjustment)
    {
        CaseRun run = CaseRuns.Of(name, policyLine: adjustment == "holm" ? "" : "adjustment: " + adjustment);
        Report.AssertAllHold([.. AdjustmentFigures.Of(run, adjustment)], run.Case.Tolerance);
    }
}
