namespace Auditor.Declaration;

/// <summary>
/// A declaration that passed every check that needs no data: what the author claims, one model a file.
/// The reader is the only maker; what it could not accept never gets this type.
/// </summary>
/// <param name="File">The declaration as the person named it, for messages.</param>
public sealed record ModelDeclaration(
    string File,
    ModelIdentity Model,
    DataDeclaration Data,
    Term Response,
    FinalModelDeclaration FinalModel,
    IReadOnlyList<LeftOutGroup> LeftOut,
    EliminationDeclaration? Elimination,
    ReportedFigures? Reported);

/// <summary>Who the model is. <paramref name="Id"/> (letters, digits, hyphens) names the output files.</summary>
public sealed record ModelIdentity(string Id, string? Title, string? Version, string? PreparedBy);

/// <summary>Intercept or not, and the terms that stayed in.</summary>
public sealed record FinalModelDeclaration(bool Intercept, IReadOnlyList<Term> Terms);

/// <summary>A group of terms that the report left out, tested jointly.</summary>
/// <param name="Because">The author's reason, as written.</param>
public sealed record LeftOutGroup(string Name, IReadOnlyList<Term> Terms, string? Because, ReportedTest? Reported, int Line);

/// <summary>A figure as the report printed it: its digits are part of the claim.</summary>
public sealed record ReportedFigure(string Text, int Line)
{
    /// <summary>What the digits say; the reader takes no text without it.</summary>
    public PrintedNumber Number => PrintedNumber.Read(Text) ?? throw new InvalidOperationException($"'{Text}' is no printed number");
}

/// <summary>The figures printed for one test; df holds one or two numbers.</summary>
public sealed record ReportedTest(ReportedFigure? F, IReadOnlyList<ReportedFigure> Df, ReportedFigure? P);

/// <summary>The author's own path from the largest model to the final one.</summary>
public sealed record EliminationDeclaration(
    EliminationRule Rule, bool ByTerm, IReadOnlyList<Term> Forced, IReadOnlyList<EliminationStep> Steps, int Line);

/// <summary>How the author decided what to drop.</summary>
public enum EliminationCriterion
{
    DropAbove,
    DropWorseAic,
    DropWorseBic,
    Judgement,
}

/// <param name="Bound">The p above which a group is dropped (drop_above), else null.</param>
/// <param name="Why">The author's words (judgement), else null.</param>
public sealed record EliminationRule(EliminationCriterion Criterion, double? Bound, string? Why);

public sealed record EliminationStep(string Drop, ReportedTest? Reported, int Line);

/// <summary>The figures the report prints for the final model, digits kept.</summary>
public sealed record ReportedFigures(
    ReportedFigure? RowsUsed,
    ReportedFigure? RSquared,
    ReportedFigure? AdjustedRSquared,
    ReportedFigure? ResidualSd,
    ReportedFigure? F,
    IReadOnlyList<ReportedCoefficient> Coefficients);

public sealed record ReportedCoefficient(string Label, ReportedFigure? Estimate, ReportedFigure? StandardError, ReportedFigure? P, int Line);
