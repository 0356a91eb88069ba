using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>Checks the weights of the kept rows: present, not negative, whole where they count copies.</summary>
internal static class BoundWeightsReader
{
    private const int MostShown = 5;
    private const double SmallestWeight = 1e-50;
    private const double LargestWeight = 1e50;
    private const double MostObservations = int.MaxValue;

    public static BoundWeights? Read(ModelDeclaration declaration, DataTable table, RowSubset rows, List<Problem> problems)
    {
        if (declaration.Data.Weights is not { } declared)
        {
            return null;
        }

        if (table[declared.Column] is not NumberColumn column)
        {
            problems.Add(new Problem(declaration.File, declared.Line, $"weights: column {declared.Column} holds {table[declared.Column].Kind.ToString().ToLowerInvariant()}, weights are numbers"));
            return null;
        }

        var faults = rows.Select(row => (Row: row, Fault: Fault(column.Values[row], declared.Kind))).Where(pair => pair.Fault is not null).ToList();
        problems.AddRange(faults.Take(MostShown).Select(pair => new Problem(
            declaration.File, declared.Line, string.Create(System.Globalization.CultureInfo.InvariantCulture, $"weights: column {declared.Column}, row {pair.Row + 1}: {pair.Fault}"))));
        if (faults.Count > MostShown)
        {
            problems.Add(new Problem(declaration.File, declared.Line, string.Create(System.Globalization.CultureInfo.InvariantCulture, $"weights: {faults.Count - MostShown} more rows like these")));
        }

        if (declared.Kind == WeightKind.Frequency && rows.Sum(row => column.Values[row]) > MostObservations)
        {
            problems.Add(new Problem(declaration.File, declared.Line, $"weights: the frequencies of column {declared.Column} add up to more than 2,147,483,647 observations"));
        }

        return new BoundWeights(column, declared.Kind, declared);
    }

    private static string? Fault(double weight, WeightKind kind) => weight switch
    {
        double.NaN => "the weight is missing; give one, or take the row out with data.keep",
        < 0 => "the weight is negative",
        > 0 and < SmallestWeight => "the weight is smaller than 1e-50; weights may be rescaled by any factor",
        > LargestWeight => "the weight is larger than 1e50; weights may be rescaled by any factor",
        _ when kind == WeightKind.Frequency && !double.IsInteger(weight) => "a frequency must be a whole number",
        _ => null,
    };
}
