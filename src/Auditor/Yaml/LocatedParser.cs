using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace Auditor.Yaml;

/// <summary>
/// The library's parser, with every failure as one that has a position. On some broken texts it throws other exceptions without one:
/// InvalidOperationException at a bracket that is not closed before a line with a colon, ArgumentException at a tag that is no address.
/// </summary>
internal sealed class LocatedParser(string yaml) : IParser
{
    private readonly Parser _parser = new(new Scanner(new StringReader(yaml), skipComments: true));

    public ParsingEvent? Current => _parser.Current;

    public bool MoveNext()
    {
        try
        {
            return _parser.MoveNext();
        }
        catch (Exception fault) when (fault is not (YamlException or OutOfMemoryException))
        {
            var at = Current?.End ?? Mark.Empty;
            throw new YamlException(at, at, "the text after this is not YAML", fault);
        }
    }
}
