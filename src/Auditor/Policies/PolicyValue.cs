namespace Auditor.Policies;

/// <summary>What a policy value is; a firm's own value must be of the same type as the shipped one.</summary>
public enum PolicyType
{
    /// <summary>A number of 0 or more.</summary>
    Number,

    /// <summary>A whole number of 0 or more.</summary>
    Count,

    /// <summary>A number from 0 to 1 (names that end in <c>_share</c>).</summary>
    Share,

    Flag,

    Text,
}

/// <summary>One value of the policy: the member that <paramref name="Type"/> calls for is set, the others are null.</summary>
/// <param name="Number">For <see cref="PolicyType.Number"/>, <see cref="PolicyType.Count"/> and <see cref="PolicyType.Share"/>.</param>
public sealed record PolicyValue(PolicyType Type, double? Number, bool? Flag, string? Text)
{
    public static PolicyValue Of(PolicyType type, double number) => new(type, number, null, null);

    public static PolicyValue Of(bool flag) => new(PolicyType.Flag, null, flag, null);

    public static PolicyValue Of(string text) => new(PolicyType.Text, null, null, text);

    /// <summary>The value as the record shows it: a double, a long, a bool or a string.</summary>
    public object Shown => Type switch
    {
        PolicyType.Count => (long)Number!.Value,
        PolicyType.Flag => Flag!.Value,
        PolicyType.Text => Text!,
        _ => Number!.Value,
    };
}
