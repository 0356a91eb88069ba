using System.Text;

namespace Auditor;

/// <summary>Texts that the assembly carries.</summary>
internal static class EmbeddedText
{
    /// <exception cref="InvalidOperationException">There is no such text: a fault of the build.</exception>
    public static string Read(string name)
    {
        using var stream = typeof(EmbeddedText).Assembly.GetManifestResourceStream(name)
            ?? throw new InvalidOperationException($"The assembly carries no resource {name}.");
        using var reader = new StreamReader(stream, Encoding.UTF8);
        return reader.ReadToEnd();
    }
}
