using Auditor.Declaration;
using CsCheck;

namespace Auditor.Tests.Declaration;

/// <summary>A valid declaration with lines and characters removed, repeated and changed: never an exception, always an answer.</summary>
public sealed class DeclarationFuzzTests
{
    private const string Characters = " \t\n\r-:,[]{}#&*!|>'\"%@`?<.~\\\0\u0085\uFEFF\uD800aZ0é";

    private static readonly Gen<Func<string, string>> _dropLine = Line((lines, at) => lines.RemoveAt(at));

    private static readonly Gen<Func<string, string>> _repeatLine = Line((lines, at) => lines.Insert(at, lines[at]));

    private static readonly Gen<Func<string, string>> _swapLines = Line((lines, at) => (lines[at], lines[0]) = (lines[0], lines[at]));

    private static readonly Gen<Func<string, string>> _indentLine = Line((lines, at) => lines[at] = "  " + lines[at]);

    private static readonly Gen<Func<string, string>> _putCharacter = Character((text, at, c) => text[..at] + c + text[(at + 1)..]);

    private static readonly Gen<Func<string, string>> _addCharacter = Character((text, at, c) => text[..at] + c + text[at..]);

    private static readonly Gen<Func<string, string>> _swapCharacters = Character((text, at, _) =>
        at + 1 < text.Length ? text[..at] + text[at + 1] + text[at] + text[(at + 2)..] : text);

    private static readonly Gen<Func<string, string>> _cut = Character((text, at, _) => text[..at]);

    private static readonly Gen<string> _mutated =
        Gen.OneOf(_dropLine, _repeatLine, _swapLines, _indentLine, _putCharacter, _addCharacter, _swapCharacters, _cut)
            .Array[1, 4]
            .Select(changes => changes.Aggregate(FullDeclaration.Yaml, (text, change) => change(text)));

    [Fact]
    public void A_damaged_declaration_is_read_or_refused()
    {
        var (read, refused) = (0, 0);
        _mutated.Sample(
            yaml =>
            {
                Interlocked.Increment(ref DeclarationReader.Read(yaml, "x.yaml").Declaration is null ? ref refused : ref read);
                return Answers(yaml);
            },
            iter: 2_000);

        // Damage that is always or never noticed would test one half only.
        Assert.InRange(read, 50, 1_950);
        Assert.InRange(refused, 50, 1_950);
    }

    [Fact]
    public void Any_text_is_refused() => Gen.String[Gen.Char[Characters], 0, 60].Sample(yaml => Answers(yaml) && Refused(yaml), iter: 2_000);

    private static bool Refused(string yaml) => DeclarationReader.Read(yaml, "x.yaml").Declaration is null;

    /// <summary>A declaration with no problem, or problems with lines in order that are in the file (the parser counts one line beyond its end).</summary>
    private static bool Answers(string yaml)
    {
        var reading = DeclarationReader.Read(yaml, "x.yaml");
        var lines = reading.Problems.Select(problem => problem.Line ?? 0).ToList();
        var lineCount = 2 + yaml.ReplaceLineEndings("\n").Count(c => c == '\n');
        return reading.Declaration is null == reading.Problems.Count > 0
            && lines.SequenceEqual(lines.Order())
            && lines.TrueForAll(line => line <= lineCount)
            && reading.Problems.All(problem => problem.Message.Length > 0 && !problem.Message.Contains('\n', StringComparison.Ordinal));
    }

    private static Gen<Func<string, string>> Line(Action<List<string>, int> change) => Gen.Int[0, int.MaxValue].Select<int, Func<string, string>>(at => text =>
    {
        var lines = text.Split('\n').ToList();
        change(lines, at % lines.Count);
        return string.Join('\n', lines);
    });

    private static Gen<Func<string, string>> Character(Func<string, int, char, string> change) =>
        Gen.Select(Gen.Int[0, int.MaxValue], Gen.Char[Characters])
            .Select<(int At, char C), Func<string, string>>(pair => text => text.Length == 0 ? text : change(text, pair.At % text.Length, pair.C));
}
