using YamlDotNet.Core;

namespace Auditor.Yaml;

/// <summary>
/// Reads a YAML text into nodes, from the library's parser events and not its own node model: a duplicate key is then one problem among
/// others instead of the end of reading, nesting is limited before anything recurses, and an alias is never written out.
/// </summary>
internal static class YamlFile
{
    /// <summary>The first document, or null when the text cannot be read as YAML. Duplicate keys and a second document are problems, but do not end it.</summary>
    public static YamlValue? Read(string text, ProblemList problems)
    {
        if (YamlCharacters.Checked(text, problems) is not { } yaml)
        {
            return null;
        }

        var tree = new YamlTree(new LocatedParser(yaml), problems);
        try
        {
            return tree.ReadDocument();
        }
        catch (YamlException fault)
        {
            YamlFault.Explain(yaml, fault, tree.OpenBracket, problems);
            return null;
        }
    }
}
