using System.Buffers;
using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>
/// One column made of another, value by value. A value that does not exist stays one that does not exist: the cap of log(0) is no number,
/// although a limit could be put in its place.
/// </summary>
/// <param name="low">From the value to what rounding takes off its map; null when that is not known.</param>
internal sealed class BoundMap(Term term, BoundTerm of, Func<double, double> map, Func<double, double>? low = null) : BoundTerm(term)
{
    public override IReadOnlyList<string> ColumnLabels { get; } = [term.Label];

    public override IReadOnlyList<DataColumn> Sources => of.Sources;

    public override bool HasLowParts => low is not null;

    public override void Fill(ReadOnlySpan<int> rows, Span<double> into, int stride)
    {
        of.Fill(rows, into, stride);
        foreach (ref var value in into[..rows.Length])
        {
            value = double.IsFinite(value) ? map(value) : double.NaN;
        }
    }

    public override void FillLow(ReadOnlySpan<int> rows, Span<double> into, int stride)
    {
        of.Fill(rows, into, stride);
        foreach (ref var value in into[..rows.Length])
        {
            value = low is not null && double.IsFinite(value) ? low(value) : 0;
        }
    }
}

/// <summary>Several columns made of one, value by value; the columns of a value that does not exist do not exist.</summary>
/// <param name="map">From the value to the value of each column.</param>
/// <param name="low">From the value to what rounding takes off each column; null when that is not known.</param>
internal sealed class BoundSpread(
    Term term, BoundTerm of, IReadOnlyList<string> labels, Action<double, Span<double>> map, Action<double, Span<double>>? low = null) : BoundTerm(term)
{
    public override IReadOnlyList<string> ColumnLabels { get; } = labels;

    public override IReadOnlyList<DataColumn> Sources => of.Sources;

    public override bool HasLowParts => low is not null;

    public override void Fill(ReadOnlySpan<int> rows, Span<double> into, int stride) => Spread(rows, into, stride, map, double.NaN);

    public override void FillLow(ReadOnlySpan<int> rows, Span<double> into, int stride)
    {
        if (low is null)
        {
            base.FillLow(rows, into, stride);
        }
        else
        {
            Spread(rows, into, stride, low, 0);
        }
    }

    private void Spread(ReadOnlySpan<int> rows, Span<double> into, int stride, Action<double, Span<double>> by, double none)
    {
        var columns = new double[ColumnLabels.Count];
        of.Fill(rows, into, stride);
        for (var i = 0; i < rows.Length; i++)
        {
            if (double.IsFinite(into[i]))
            {
                by(into[i], columns);
            }
            else
            {
                columns.AsSpan().Fill(none);
            }

            for (var c = 0; c < columns.Length; c++)
            {
                into[(c * stride) + i] = columns[c];
            }
        }
    }
}

/// <summary>One column made of two; without a value where either has none.</summary>
internal sealed class BoundPair(Term term, BoundTerm left, BoundTerm right, Func<double, double, double> map) : BoundTerm(term)
{
    public override IReadOnlyList<string> ColumnLabels { get; } = [term.Label];

    public override IReadOnlyList<DataColumn> Sources { get; } = [.. left.Sources.Union(right.Sources)];

    public override void Fill(ReadOnlySpan<int> rows, Span<double> into, int stride)
    {
        var other = ArrayPool<double>.Shared.Rent(Math.Max(rows.Length, 1));
        left.Fill(rows, into, stride);
        right.Fill(rows, other, rows.Length);
        for (var i = 0; i < rows.Length; i++)
        {
            into[i] = double.IsFinite(into[i]) && double.IsFinite(other[i]) ? map(into[i], other[i]) : double.NaN;
        }

        ArrayPool<double>.Shared.Return(other);
    }
}

/// <summary>
/// The columns of two or more terms multiplied, each with each, from left to right; the columns of the last factor vary fastest, so
/// with factors of two and three columns the order is 1·1, 1·2, 1·3, 2·1, 2·2, 2·3.
/// </summary>
internal sealed class BoundProduct : BoundTerm
{
    private readonly IReadOnlyList<BoundTerm> _factors;

    public BoundProduct(ProductTerm term, IReadOnlyList<BoundTerm> factors)
        : base(term)
    {
        _factors = factors;
        ColumnLabels = [.. factors.Skip(1).Aggregate(
            factors[0].ColumnLabels.AsEnumerable(),
            (labels, factor) => labels.SelectMany(_ => factor.ColumnLabels, (left, right) => left + " * " + right))];
        Sources = [.. factors.SelectMany(factor => factor.Sources).Distinct()];
    }

    public override IReadOnlyList<string> ColumnLabels { get; }

    public override IReadOnlyList<DataColumn> Sources { get; }

    public override void Fill(ReadOnlySpan<int> rows, Span<double> into, int stride)
    {
        for (var c = 0; c < ColumnLabels.Count; c++)
        {
            into.Slice(c * stride, rows.Length).Fill(1);
        }

        var repeats = ColumnLabels.Count;
        foreach (var factor in _factors)
        {
            var columns = factor.ColumnLabels.Count;
            repeats = columns == 0 ? 0 : repeats / columns;
            Multiply(factor, repeats, rows, into, stride);
        }
    }

    /// <param name="repeats">How many neighbouring columns take the same column of the factor.</param>
    private void Multiply(BoundTerm factor, int repeats, ReadOnlySpan<int> rows, Span<double> into, int stride)
    {
        var columns = factor.ColumnLabels.Count;
        var values = ArrayPool<double>.Shared.Rent(Math.Max(columns * rows.Length, 1));
        factor.Fill(rows, values, rows.Length);
        for (var c = 0; c < ColumnLabels.Count; c++)
        {
            var from = values.AsSpan(c / repeats % columns * rows.Length, rows.Length);
            var to = into.Slice(c * stride, rows.Length);
            for (var i = 0; i < to.Length; i++)
            {
                to[i] *= from[i];
            }
        }

        ArrayPool<double>.Shared.Return(values);
    }
}
