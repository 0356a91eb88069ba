using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>An auxiliary regression with an intercept: n observations, rank r; what it explains of its response.</summary>
/// <param name="Df">r - 1.</param>
/// <param name="Explained">Explained sum of squares about the mean.</param>
/// <param name="RSquared">Share explained, 0 when the response does not vary.</param>
internal sealed record AuxiliaryRegression(double N, int Df, double Explained, double RSquared)
{
    /// <param name="columns">Columns beside the intercept; <paramref name="fill"/> fills columns 1 to that number and the response, which is last.</param>
    public static AuxiliaryRegression Of(IDesignRows source, int columns, Action<RowBlock, RowBlock> fill)
    {
        var derived = new DerivedRows(source, new DesignLayout(true, columns + 1, []), keepWeights: false, fill);
        var final = FinalFactor.Of(FactorBuilder.Build(derived));
        var explained = final.Explained(final.Factor.Layout.Response)[1..];
        var sum = BlockKernels.Dot(explained, explained);
        var total = sum + final.Rss;
        return new AuxiliaryRegression(final.Factor.Totals.N, final.Rank - 1, sum, total > 0 ? sum / total : 0);
    }
}
