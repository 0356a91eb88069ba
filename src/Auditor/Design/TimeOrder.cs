namespace Auditor.Design;

/// <summary>The declared order of the rows as terms that look at earlier periods use it; sorted when the first one does.</summary>
/// <param name="axis">Null when the declared time cannot be one, which is a problem of its own.</param>
/// <param name="line">Where time is declared.</param>
public sealed class TimeOrder(TimeAxis? axis, ClassedRows? units, int? line)
{
    private readonly Lazy<TimeSteps?> _steps = new(() =>
        axis?.Steps is { } steps ? TimeSteps.Of(steps, units, row => axis.Periods.Label(axis.Periods[row])) : null);

    public int? Line { get; } = line;

    /// <summary>Null when there are problems, or no time at all.</summary>
    internal TimeSteps? Steps => _steps.Value is { Problems.Count: 0 } steps ? steps : null;

    /// <summary>Why terms cannot look at earlier periods.</summary>
    internal IReadOnlyList<string> Problems =>
        axis?.NoSteps is { } why ? ["data.time: lag, change and moving_average count periods, but " + why]
        : [.. (_steps.Value?.Problems ?? []).Select(message => "data.time: " + message)];
}
