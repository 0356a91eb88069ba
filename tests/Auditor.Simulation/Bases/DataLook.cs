using Auditor.Numerics;
using Auditor.Numerics.Factor;
using Auditor.Numerics.GroupTests;
using Auditor.Numerics.ResidualChecks;
using Auditor.Numerics.SecondPass;

namespace Auditor.Simulation.Bases;

/// <summary>All groups of one data set, and what is asked of the data as a whole.</summary>
internal sealed class DataLook
{
    private readonly MemoryRows _design;
    private readonly FinalFactor _final;
    private readonly RowPassResult _pass;
    private readonly ResidualStore _residuals;

    public DataLook(MemoryRows design, DependenceStructure? structure)
    {
        (_design, _final) = (design, FinalFactor.Of(FactorBuilder.Build(design)));
        AddedGroup[] groups = [.. design.Layout.Groups.Select(range => AddedGroup.Of(_final, [.. range.Indices]))];
        _residuals = new ResidualStore(_final.Factor.Totals.Rows);
        _pass = RowPass.Run(design, _final, groups, [_residuals], structure);
        Groups = [.. groups.Zip(_pass.Groups, (group, sums) => new Look(group, sums))];
    }

    public IReadOnlyList<Look> Groups { get; }

    public Look Group => Groups[0];

    /// <summary>The Breusch–Pagan check of F + group, by which a tempting shortcut chooses between HC3 and the classical test.</summary>
    public bool VarianceCheckRejects(double level)
    {
        var rows = new Regrouped(_design);
        var final = FinalFactor.Of(FactorBuilder.Build(rows));
        var store = new ResidualStore(final.Factor.Totals.Rows);
        var fit = new Fit(final, RowPass.Run(rows, final, [], [store]));
        return BreuschPagan.Studentised(new CheckedFit(rows, final, fit, store, sampling: false)) is CheckStatistic check && check.P <= level;
    }

    /// <summary>The residual of the final model, one series, is shown to have no unit root.</summary>
    /// <param name="drifting">Columns of the final model that may drift.</param>
    public bool HasNoUnitRoot(int drifting, double level)
    {
        var fit = new CheckedFit(_design, _final, new Fit(_final, _pass), _residuals, sampling: false);
        var serial = new SerialFit(fit, SerialOrder.Of([.. Enumerable.Range(0, _residuals.Count)]), laggedResponse: false);
        return UnitRootResidual.Of(serial, Deterministic.Constant, drifting) is CheckStatistic check && check.P <= level;
    }

    /// <summary>Any of the first groups rejects after Holm's adjustment over these.</summary>
    public bool AnyAfterHolm(int groups, Func<Look, TestResult> test, double level)
    {
        PValue[] family = [.. Groups.Take(groups).Select(test).OfType<FTest>().Select(f => new PValue(f.Probability, f.LogP))];
        return AdjustedP.Holm(family).Any(p => p.P <= level);
    }
}
