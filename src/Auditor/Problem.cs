namespace Auditor;

/// <summary>Something in the input that cannot be used: an expected failure, so a value and not an exception.</summary>
/// <param name="File">The file as the person named it.</param>
/// <param name="Line">1-based line, when the problem has one.</param>
/// <param name="Message">What was found, what was expected, and the nearest right name where there is one.</param>
public sealed record Problem(string File, int? Line, string Message)
{
    public override string ToString() => Line is int line
        ? string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{File}:{line}: {Message}")
        : $"{File}: {Message}";
}
