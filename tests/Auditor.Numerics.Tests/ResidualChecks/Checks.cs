using Auditor.Numerics.Factor;
using Auditor.Numerics.ResidualChecks;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Tests.ResidualChecks;

/// <summary>Fits to be checked, from columns in memory; all checks of one fit; what came out.</summary>
internal static class Checks
{
    public static CheckedFit Fit(
        double[][] columns, double[] y, double[]? weights = null, double[]? copies = null, bool sampling = false, bool intercept = true)
    {
        var design = new MatrixDesign(intercept, columns, [], y, weights, copies);
        var final = FinalFactor.Of(FactorBuilder.Build(design));
        var store = new ResidualStore(final.Factor.Totals.Rows);
        var pass = RowPass.Run(design, final, [], [store]);
        return new CheckedFit(design, final, new Fit(final, pass), store, sampling);
    }

    public static CheckOutcome[] All(CheckedFit fit) =>
    [
        BreuschPagan.Studentised(fit), BreuschPagan.Original(fit), White.Of(fit), JarqueBera.Of(fit, 1), ShapiroWilk.Of(fit), AndersonDarling.Of(fit), Reset.Of(fit),
        Largest(fit),
    ];

    public static CheckOutcome Largest(CheckedFit fit) => LargestResidual.Of(fit, InfluenceSummary.Of(fit, 10));

    public static CheckStatistic Statistic(CheckOutcome outcome) => Assert.IsType<CheckStatistic>(outcome);

    public static CheckImpediment Why(CheckOutcome outcome) => Assert.IsType<NoCheck>(outcome).Why;
}
