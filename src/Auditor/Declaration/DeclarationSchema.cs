namespace Auditor.Declaration;

/// <summary>The JSON Schema (draft 2020-12) of a declaration, with which editors complete and check one while it is written. The reader checks more.</summary>
public static class DeclarationSchema
{
    public static string Text { get; } = EmbeddedText.Read("Auditor.Declaration.declaration.schema.json");
}
