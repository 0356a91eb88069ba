using Auditor.Numerics.ResidualChecks;

namespace Auditor.Analysis;

/// <summary>What the checks of the order and of a split need to know of the rows that the shown fit uses, and of the final model's terms.</summary>
/// <param name="Order">The rows in time, within units; null with the reason.</param>
/// <param name="WhyNoOrder">Null when there is an order.</param>
/// <param name="LaggedResponse">Whether a lag of the response stands among the final model's terms.</param>
/// <param name="Part">Which functions of time the final model holds.</param>
/// <param name="Drifting">Columns of the final model that are no function of time alone: neither intercept, trend, season, step, pulse nor a constant.</param>
/// <param name="Second">Whether each used row lies in the second part of the declared split; null with the reason.</param>
/// <param name="WhyNoSplit">Null when there is a split.</param>
internal sealed record SerialInputs(
    SerialOrder? Order,
    string? WhyNoOrder,
    bool LaggedResponse,
    Deterministic Part,
    int Drifting,
    IReadOnlyList<bool>? Second,
    string? WhyNoSplit)
{
    public const string NoOrder = "no time order declared";
    public const string SharedPeriod = "several rows of one unit fall into one period, so they have no order; declare a unit, or a finer time";
    public const string NoSplit = "no split declared";

    public static SerialInputs NothingDeclared { get; } = new(null, NoOrder, false, Deterministic.None, 0, null, NoSplit);
}
