using Auditor.Numerics.Parts;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Tests.Parts;

/// <summary>Rows in parts, fitted two ways: part by part, and at once with the columns of both models written out.</summary>
internal sealed class PartRows
{
    private readonly double[][] _final;
    private readonly double[][] _group;
    private readonly double[] _response;
    private readonly int[] _part;
    private readonly double[]? _weights;
    private readonly double[]? _copies;

    /// <param name="final">Without the constant.</param>
    /// <param name="part">0 to K - 1.</param>
    public PartRows(double[][] final, double[][] group, double[] response, int[] part, DependenceStructure? structure = null, double[]? weights = null, double[]? copies = null)
    {
        (_final, _group, _response, _part, Structure, _weights, _copies) = (final, group, response, part, structure, weights, copies);
        Parts = [.. Enumerable.Range(0, part.Max() + 1).Select(Fitted)];
        Contrast = EffectContrast.Of([.. Parts.Select(one => one.Groups[0])])!;
    }

    public DependenceStructure? Structure { get; }

    public IReadOnlyList<GroupAnalysis> Parts { get; }

    public EffectContrast Contrast { get; }

    public IReadOnlyList<GroupSums> Sums => [.. Parts.Select(part => part.Sums(0))];

    public ContrastSums Clusters => Over(Structure!.Cluster!, sums => sums.Cluster!);

    public ContrastSums Periods => Over(Structure!.Period!, sums => sums.Period!);

    /// <summary>
    /// The reduced model F x part + Z with the group Z x part of every part after the first: the same test by the code for groups, on all rows at once. The first
    /// columns of the reduced model are the parts' dummies, so it has no constant.
    /// </summary>
    public GroupAnalysis AtOnce()
    {
        double[] In(double[] column, int part) => [.. column.Select((value, i) => _part[i] == part ? value : 0)];
        double[] ones = [.. _response.Select(_ => 1.0)];
        var parts = Enumerable.Range(0, Parts.Count).ToArray();
        return new GroupAnalysis(
            new MatrixDesign(
                false,
                [.. parts.SelectMany(part => _final.Prepend(ones).Select(column => In(column, part))), .. _group],
                [[.. parts.Skip(1).SelectMany(part => _group.Select(column => In(column, part)))]],
                _response,
                _weights,
                _copies),
            Structure);
    }

    private GroupAnalysis Fitted(int part)
    {
        int[] rows = RowsOf(part);
        double[] Here(double[] column) => [.. rows.Select(row => column[row])];
        RowClasses? Classes(RowClasses? all) => all is null ? null : RowClasses.Ranked([.. CodesOf(all, part)]);
        return new GroupAnalysis(
            new MatrixDesign(
                true, [.. _final.Select(Here)], [[.. _group.Select(Here)]], Here(_response), _weights is null ? null : Here(_weights), _copies is null ? null : Here(_copies)),
            Structure is null ? null : new DependenceStructure { Cluster = Classes(Structure.Cluster), Period = Classes(Structure.Period) });
    }

    private int[] RowsOf(int part) => [.. Enumerable.Range(0, _part.Length).Where(row => _part[row] == part)];

    private int[] CodesOf(RowClasses all, int part)
    {
        int[] codes = all.Codes.ToArray();
        return [.. RowsOf(part).Select(row => codes[row])];
    }

    private ContrastSums Over(RowClasses all, Func<GroupSums, ClassSums> sums) => ContrastSums.Of(
        Contrast, [.. Sums.Select((one, part) => new PartClasses(sums(one), [.. CodesOf(all, part).Distinct().Order()]))], all.Count)!;
}
