using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>Reads what stands after the name of a term kind; null after adding a problem.</summary>
internal delegate Term? TermKind(TermReader reader, Place argument);

/// <summary>Reads terms: a column name, or a map with one key that names the kind of the term.</summary>
/// <param name="where">As in <see cref="ColumnMention.Where"/>.</param>
internal sealed class TermReader(ColumnNames columns, string where)
{
    private static readonly Dictionary<string, TermKind> _kinds =
        new[] { NumberTermKinds.All, SeveralColumnTermKinds.All, TimeTermKinds.All }
            .SelectMany(kinds => kinds)
            .ToDictionary(kind => kind.Name, kind => kind.Read, StringComparer.Ordinal);

    public Term? Read(Place place)
    {
        var term = place.Node is MapValue map ? OfKind(place, map) : Column(place);
        return term is null ? null : term with { Line = place.Line };
    }

    /// <summary>A term that must yield one number a row. Whether a plain column does is known once its kind is.</summary>
    /// <param name="needing">What needs it, for the message.</param>
    public Term? ReadOneColumn(Place place, string needing)
    {
        var term = Read(place);
        if (term is null || YieldsOneNumber(term))
        {
            return term;
        }

        place.Add($"{needing} needs a term that yields one number; '{Words.Short(term.Label)}' yields several columns");
        return null;
    }

    /// <summary>A column, where no other term can stand.</summary>
    public ColumnTerm? ReadColumn(Place place) =>
        columns.Read(place, where) is { } mention ? new ColumnTerm(mention.Column) { Line = mention.Line } : null;

    private static bool YieldsOneNumber(Term term) => term switch
    {
        PolynomialTerm or SplineTerm or BinsTerm or SeasonTerm => false,
        ProductTerm product => product.Factors.All(YieldsOneNumber),
        _ => true,
    };

    private ColumnTerm? Column(Place place)
    {
        if (place.Node is TextValue)
        {
            return ReadColumn(place);
        }

        place.Refuse("a column name or one term such as {log: price}");
        return null;
    }

    private Term? OfKind(Place place, MapValue map)
    {
        if (map.Entries is not [var only])
        {
            var found = map.Entries.Count == 0 ? "an empty map" : "a map with the keys " + Words.Short(string.Join(", ", map.Entries.Select(entry => entry.Key)));
            place.Add("expected a column name or one term such as {log: price}, found " + found);
            return null;
        }

        if (_kinds.TryGetValue(only.Key, out var read))
        {
            return read(this, place with { Node = only.Value, Path = place.Path + ", " + only.Key });
        }

        var near = NearestName.Of(only.Key, _kinds.Keys);
        place.Add($"unknown term '{Words.Short(only.Key)}'" + (near is null ? "; the terms are " + string.Join(", ", _kinds.Keys) : $"; did you mean '{near}'?"));
        return null;
    }
}
