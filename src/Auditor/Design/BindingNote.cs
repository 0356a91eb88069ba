namespace Auditor.Design;

/// <summary>Something about the data that is no error and that a reader should know.</summary>
public abstract record BindingNote(string Column);

/// <summary>A declared level that no kept row has: it makes no column.</summary>
public sealed record LevelWithoutRows(string Column, string Level) : BindingNote(Column);

/// <summary>A levels column with one level on the kept rows: its term makes no columns.</summary>
public sealed record SingleLevel(string Column, string Level) : BindingNote(Column);

/// <summary>A value that a filter or an indicator asks for and no row has.</summary>
public sealed record ValueWithoutRows(string Column, string Value) : BindingNote(Column);
