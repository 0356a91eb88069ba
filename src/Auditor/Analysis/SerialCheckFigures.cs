using Auditor.Numerics.ResidualChecks;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>The checks that need a time order or a split.</summary>
internal static class SerialCheckFigures
{
    public const string UnitRoot = "unit_root_residual";

    private static readonly (string Name, string Assumption, Func<SerialFit, SerialInputs, CheckOutcome> Check)[] Order =
    [
        ("durbin_watson", Assumptions.Independence, (fit, _) => DurbinWatson.Of(fit)),
        ("breusch_godfrey_1", Assumptions.Independence, (fit, _) => BreuschGodfrey.Of(fit, 1)),
        ("breusch_godfrey_4", Assumptions.Independence, (fit, _) => BreuschGodfrey.Of(fit, 4)),
        ("ljung_box_4", Assumptions.Independence, (fit, _) => LjungBox.Of(fit, 4)),
        (UnitRoot, Assumptions.StationaryResidual, (fit, inputs) => UnitRootResidual.Of(fit, inputs.Part, inputs.Drifting)),
    ];

    public static IEnumerable<CheckResult> OfOrder(CheckedFit fit, SerialInputs inputs, CheckFigure figure)
    {
        var serial = inputs.Order is { } order ? new SerialFit(fit, order, inputs.LaggedResponse) : null;
        return Order.Select(one => serial is null
            ? CheckFigure.Missing(one.Name, one.Assumption, inputs.WhyNoOrder ?? SerialInputs.NoOrder)
            : figure.Of(one.Name, one.Assumption, one.Check(serial, inputs)));
    }

    public static CheckResult OfSplit(CheckedFit fit, SerialInputs inputs, CheckFigure figure) => inputs.Second is { } second
        ? figure.Of("chow", Assumptions.StableCoefficients, Chow.Of(fit, second))
        : CheckFigure.Missing("chow", Assumptions.StableCoefficients, inputs.WhyNoSplit ?? SerialInputs.NoSplit);

    /// <summary>
    /// A unit root of the residual is not rejected: unrelated series that drift then look related, so a group with a term that is not a change can be neither
    /// supported nor contradicted.
    /// </summary>
    public static bool ResidualMayDrift(IEnumerable<CheckResult> checks) => checks.Any(check => check is { Check: UnitRoot, Rejects: false });
}
