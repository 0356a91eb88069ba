using System.Globalization;
using Auditor.Yaml;

namespace Auditor.Policies;

/// <summary>One line of a policy file, not yet checked.</summary>
internal sealed record PolicyEntry(string File, MapEntry Entry)
{
    public string Name => Entry.Key;

    public Problem Problem(string message) => new(File, Entry.Line, message);
}

/// <summary>From a line of a policy file to a value of the right type and within its range.</summary>
internal static class PolicyValues
{
    /// <param name="shipped">The value it replaces, which gives the type; null for a line of the shipped file itself.</param>
    public static Reading<PolicyValue> Read(PolicyEntry entry, PolicyValue? shipped)
    {
        if (entry.Entry.Value is not TextValue { Text.Length: > 0 } scalar)
        {
            return Failed(entry, $"{entry.Name} must be one value");
        }

        var fixedName = PolicyNames.Fixed.GetValueOrDefault(entry.Name);
        var type = fixedName?.Default.Type ?? shipped?.Type ?? TypeOf(entry.Name, scalar);
        return type switch
        {
            PolicyType.Text => Word(entry, scalar, fixedName),
            PolicyType.Flag => scalar.Flag() is bool flag
                ? Reading<PolicyValue>.Of(PolicyValue.Of(flag))
                : Failed(entry, $"{entry.Name} must be true or false, found '{scalar.Text}'"),
            _ => scalar.Number() is double number
                ? InRange(entry, scalar, type, number, fixedName?.Range)
                : Failed(entry, $"{entry.Name} must be a number with a decimal point, found {Quoted(scalar)}"),
        };
    }

    private static PolicyType TypeOf(string name, TextValue scalar)
    {
        if (scalar.Number() is double number)
        {
            return name.EndsWith("_share", StringComparison.Ordinal) ? PolicyType.Share
                : double.IsInteger(number) && !scalar.Text.Contains('.', StringComparison.Ordinal) ? PolicyType.Count
                : PolicyType.Number;
        }

        return scalar.Flag() is null ? PolicyType.Text : PolicyType.Flag;
    }

    private static Reading<PolicyValue> Word(PolicyEntry entry, TextValue scalar, FixedName? fixedName)
    {
        var word = scalar.Text;
        if (fixedName is null)
        {
            return Reading<PolicyValue>.Of(PolicyValue.Of(word));
        }

        var usable = string.Join(", ", fixedName.Words.Except(fixedName.NotBuilt));
        return fixedName.NotBuilt.Contains(word) ? Failed(entry, $"{entry.Name} '{word}' is not built yet; use one of {usable}")
            : fixedName.Words.Contains(word) ? Reading<PolicyValue>.Of(PolicyValue.Of(word))
            : Failed(entry, $"{entry.Name} must be one of {usable}; found '{word}'" + NearestName.DidYouMean(word, fixedName.Words));
    }

    private static Reading<PolicyValue> InRange(PolicyEntry entry, TextValue scalar, PolicyType type, double number, Between? range)
    {
        var wanted = range is not null ? Wanted(range, number) : type switch
        {
            PolicyType.Share when number is < 0 or > 1 => "from 0 to 1",
            PolicyType.Count when number < 0 || !double.IsInteger(number) || number > int.MaxValue => "a whole number of 0 or more",
            PolicyType.Number when number < 0 => "0 or more",
            _ => null,
        };
        return wanted is null
            ? Reading<PolicyValue>.Of(PolicyValue.Of(type, number))
            : Failed(entry, $"{entry.Name} must be {wanted}, found {scalar.Text}");
    }

    private static string? Wanted(Between range, double number) => range.Holds(number)
        ? null
        : string.Create(CultureInfo.InvariantCulture, $"above {range.Low} and below {range.High}");

    private static string Quoted(TextValue scalar) => scalar.IsPlain ? $"'{scalar.Text}'" : $"the text \"{scalar.Text}\"";

    private static Reading<PolicyValue> Failed(PolicyEntry entry, string message) => Reading<PolicyValue>.Failed(entry.Problem(message));
}
