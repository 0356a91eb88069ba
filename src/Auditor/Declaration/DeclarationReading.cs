namespace Auditor.Declaration;

/// <summary>What came of reading a declaration: the checked declaration, or every problem in it.</summary>
/// <param name="Declaration">Null when there is a problem.</param>
/// <param name="Problems">All of them, in the order of their lines.</param>
/// <param name="Mentions">Every data column named anywhere, also when there are problems, so that they can be held against the data in the same go.</param>
/// <param name="Sources">The data paths as written, empty when they could not be read.</param>
public sealed record DeclarationReading(
    ModelDeclaration? Declaration,
    IReadOnlyList<Problem> Problems,
    IReadOnlyList<ColumnMention> Mentions,
    IReadOnlyList<string> Sources);
