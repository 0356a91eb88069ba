namespace Auditor.Simulation.Bases;

/// <summary>A table: its rows are settings, its columns measures.</summary>
/// <param name="Name">As the summary names it.</param>
/// <param name="Says">What is simulated and on what the verdict rests.</param>
/// <param name="Headings">Of the settings' labels.</param>
internal sealed record World(string Name, string Says, IReadOnlyList<string> Headings, IReadOnlyList<Setting> Settings, IReadOnlyList<Measure> Measures);
