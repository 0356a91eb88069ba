namespace Auditor;

/// <summary>A value read from input, or the problems that kept it from being read.</summary>
/// <param name="Value">Null when there is a problem.</param>
public sealed record Reading<T>(T? Value, IReadOnlyList<Problem> Problems)
    where T : class
{
    public static Reading<T> Of(T value) => new(value, []);

    public static Reading<T> Failed(params IReadOnlyList<Problem> problems) => new(null, problems);
}
