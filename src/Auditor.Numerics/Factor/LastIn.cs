namespace Auditor.Numerics.Factor;

/// <summary>
/// Every group added after all the others. The groups are halved again and again: each half goes on with the other half factored and taken out, so that every
/// leaf has all but its own group before it, and all leaves together cost about as much as two factorisations of all groups, whatever their number.
/// </summary>
/// <remarks>Compared with factoring the others anew for each group in the tests.</remarks>
public static class LastIn
{
    /// <param name="groups">Design columns of each group.</param>
    /// <param name="threads">Most threads to use; no result depends on it.</param>
    /// <returns>One for each group, in their order.</returns>
    public static IReadOnlyList<AddedGroup> Of(FinalFactor final, IReadOnlyList<IReadOnlyList<int>> groups, int threads = 1)
    {
        var leaves = new AddedGroup[groups.Count];
        if (groups.Count > 0)
        {
            var columns = groups.SelectMany(group => group).Append(final.Factor.Layout.Response).ToArray();
            Split(new Branch(final, groups, 0, groups.Count, columns, final.OrthogonalPart(columns), final.PreciseOrthogonal(columns), 0), threads, leaves);
        }

        return leaves;
    }

    private static void Split(Branch branch, int threads, AddedGroup[] leaves)
    {
        if (branch.End - branch.First == 1)
        {
            leaves[branch.First] = branch.Leaf();
            return;
        }

        var middle = (branch.First + branch.End) / 2;
        void Left(int most) => Split(branch.Keep(branch.First, middle), most, leaves);
        void Right(int most) => Split(branch.Keep(middle, branch.End), most, leaves);
        if (threads > 1)
        {
            Parallel.Invoke(() => Left(threads / 2), () => Right(threads - (threads / 2)));
        }
        else
        {
            Left(1);
            Right(1);
        }
    }

    /// <summary>Groups First to End - 1 and the response, orthogonal to the final model and to all other groups.</summary>
    /// <param name="Columns">Design columns of the matrix: the groups' in order, then the response.</param>
    /// <param name="RankOutside">Rank that the other groups add to the final model.</param>
    private sealed record Branch(
        FinalFactor Final, IReadOnlyList<IReadOnlyList<int>> Groups, int First, int End, int[] Columns, ColumnMatrix Matrix, DoubleDoubleMatrix? Precise, int RankOutside)
    {
        public AddedGroup Leaf() => AddedGroup.LastIn(Final, Groups[First], Reduce(Matrix.Select(Range(0, Columns.Length)), Precise?.Copy(), Columns, Columns.Length - 1), RankOutside);

        /// <summary>The branch of some of the groups, the others of this branch taken out.</summary>
        public Branch Keep(int first, int end)
        {
            var (start, stop) = (Width(First, first), Width(First, end));
            int[] kept = [.. Range(start, stop - start), Columns.Length - 1];
            int[] order = [.. Range(0, start), .. Range(stop, Columns.Length - 1 - stop), .. kept];
            var others = order.Length - kept.Length;
            var reduction = Reduce(Matrix.Select(order), Precise?.Select(order, 0, Precise.Rows), [.. order.Select(position => Columns[position])], others);
            var (rank, left) = (reduction.Kept.Count, Range(others, kept.Length));
            return this with
            {
                First = first,
                End = end,
                Columns = [.. kept.Select(position => Columns[position])],
                Matrix = reduction.Rotated.Select(left, rank, Matrix.Rows - rank),
                Precise = reduction.Precise?.Select(left, rank, Matrix.Rows - rank),
                RankOutside = RankOutside + rank,
            };
        }

        private Reduction Reduce(ColumnMatrix matrix, DoubleDoubleMatrix? precise, int[] columns, int candidates) =>
            Reduction.Of(Final.Factor, matrix, precise, candidates, 0, position => columns[position]);

        private int Width(int from, int to) => Enumerable.Range(from, to - from).Sum(group => Groups[group].Count);

        private static int[] Range(int start, int count) => [.. Enumerable.Range(start, count)];
    }
}
