namespace Auditor.Facts;

/// <summary>The value of one fact, or the reason why there is none.</summary>
public abstract record FactValue
{
    private FactValue()
    {
    }

    public static FactValue Of(double? value, string why) =>
        value is not double number ? new NotComputable(why)
        : double.IsFinite(number) ? new Number(number)
        : new NotComputable("the value is not finite");

    public static FactValue Of(long? value, string why) => value is long count ? new Count(count) : new NotComputable(why);

    public static FactValue Of(bool? value, string why) => value is bool flag ? new Flag(flag) : new NotComputable(why);

    public static FactValue Of(string? value, string why) => value is not null ? new Text(value) : new NotComputable(why);

    public sealed record Number(double Value) : FactValue;

    public sealed record Count(long Value) : FactValue;

    public sealed record Text(string Value) : FactValue;

    public sealed record Flag(bool Value) : FactValue;

    /// <summary>No value; a rule that needs it stays undecided.</summary>
    public sealed record NotComputable(string Why) : FactValue;
}
