using System.Globalization;

namespace Auditor.Yaml;

/// <summary>
/// A node and the keys that lead to it. Each reading gives the value, or null after adding a problem that says what was expected and what was found.
/// </summary>
internal sealed record Place(YamlValue Node, string Path, ProblemList Problems)
{
    private const NumberStyles NumberStyle = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;

    /// <summary>The whole file, whose name is left out before its keys.</summary>
    public bool IsDocument { get; private init; }

    public int Line => Node.Line;

    /// <param name="name">What the file is, for messages about the whole of it.</param>
    public static Place Document(YamlValue root, string name, ProblemList problems) => new(root, name, problems) { IsDocument = true };

    /// <summary>A key with nothing after it.</summary>
    public bool IsNothing => Node is TextValue { IsPlain: true, Text: "" };

    public void Add(string message) => Problems.Add(Line, Path + ": " + message);

    public void Refuse(string expected) => Add($"expected {expected}, found {Words.Found(Node)}");

    /// <summary>The text as written, not empty.</summary>
    public string? Text(string expected = "a text")
    {
        if (Node is TextValue { Text.Length: > 0 } scalar)
        {
            return scalar.Text;
        }

        Refuse(expected);
        return null;
    }

    /// <summary>The text as written; an empty one must be in quotation marks.</summary>
    public string? AnyText() => Node is TextValue { IsPlain: false } quoted ? quoted.Text : Text();

    public double? Number(string expected = "a number", Func<double, bool>? holds = null)
    {
        if (Node is TextValue scalar
            && double.TryParse(scalar.Text, NumberStyle, CultureInfo.InvariantCulture, out var number)
            && double.IsFinite(number)
            && holds?.Invoke(number) != false)
        {
            return number;
        }

        Refuse(expected);
        return null;
    }

    public int? Whole(int least, int most)
    {
        if (Node is TextValue scalar
            && int.TryParse(scalar.Text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out var number)
            && number >= least
            && number <= most)
        {
            return number;
        }

        Refuse(string.Create(CultureInfo.InvariantCulture, $"a whole number from {least} to {most}"));
        return null;
    }

    public bool? TrueOrFalse()
    {
        if (Node is TextValue scalar && bool.TryParse(scalar.Text, out var value))
        {
            return value;
        }

        Refuse("true or false");
        return null;
    }

    /// <summary>One of a few words.</summary>
    public T? OneOf<T>(params IReadOnlyList<(string Word, T Value)> choices)
        where T : struct
    {
        foreach (var (word, value) in choices)
        {
            if (Node is TextValue scalar && scalar.Text == word)
            {
                return value;
            }
        }

        string[] words = [.. choices.Select(choice => choice.Word)];
        var hint = Node is TextValue { Text: var text } ? NearestName.DidYouMean(text, words) : "";
        Add($"expected {Words.Or(words)}, found {Words.Found(Node)}{hint}");
        return null;
    }

    /// <summary>The items of a list, of which there must be at least so many; a key with nothing after it is an empty list.</summary>
    public IReadOnlyList<Place>? Items(string of, int least = 0)
    {
        if (Node is not ListValue && !IsNothing)
        {
            Refuse("a list of " + of);
            return null;
        }

        IReadOnlyList<YamlValue> items = Node is ListValue list ? list.Items : [];
        if (items.Count >= least)
        {
            return [.. items.Select(item => this with { Node = item })];
        }

        Add(least == 1
            ? $"expected a list of {of}, found an empty one"
            : string.Create(CultureInfo.InvariantCulture, $"expected a list of at least {least} {of}, found {items.Count}"));
        return null;
    }

    /// <summary>The values of a list's items, null when the list or one of its items could not be read; all items are read.</summary>
    public IReadOnlyList<T>? List<T>(string of, Func<Place, T?> read, int least = 0)
        where T : class
    {
        var values = Items(of, least)?.Select(read).ToList();
        return values?.Contains(null) == false ? values.Select(value => value!).ToList() : null;
    }
}
