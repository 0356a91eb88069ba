using Auditor.Numerics.Factor;

namespace Auditor.Numerics.Tests.Factor;

/// <summary>A polynomial of degree 10 on a narrow range, which costs a factor in double most of its digits.</summary>
public sealed class PreciseFactorTests
{
    private const int Degree = 10;

    private static readonly double[] _x = [.. Enumerable.Range(0, 40).Select(i => -8.75 + (0.137 * i))];
    private static readonly double[] _y = [.. _x.Select(x => 0.8 + (0.01 * Math.Sin(9 * x)) + (0.02 * x))];

    /// <summary>Source: products of the exact powers less the first row's, by whole-number arithmetic.</summary>
    [Fact]
    public void Products_of_the_factor_are_those_of_the_exact_powers()
    {
        var factor = FactorBuilder.Build(new PowerRows(_x, Degree, _y));
        Assert.True(factor.IsExtended);
        Dyadic[][] columns = [.. Enumerable.Range(0, Degree + 1).Select(power => Column(power, factor.Shifts[power]))];
        for (var a = 0; a < columns.Length; a++)
        {
            for (var b = 0; b <= a; b++)
            {
                var actual = Dyadic.Dot(Dyadic.Exact(factor.Precise!.Column(a)), Dyadic.Exact(factor.Precise.Column(b)));
                Dyadic.Near(
                    Dyadic.Dot(columns[a], columns[b]), actual, (Dyadic.Dot(columns[a], columns[a]).Bits + Dyadic.Dot(columns[b], columns[b]).Bits) / 2, 90);
            }
        }
    }

    /// <summary>The diagonal of the hat matrix adds up to the rank, and its rows are orthonormal columns' rows: true of the exact values, lost in double.</summary>
    [Fact]
    public void Leverages_add_up_to_the_rank()
    {
        var analysis = new GroupAnalysis(new PowerRows(_x, Degree, _y));
        Assert.Equal(Degree + 1, analysis.Final.Rank);
        var leverages = new Leverages();
        SecondPass.RowPass.Run(new PowerRows(_x, Degree, _y), analysis.Final, [], [leverages]);
        Assert.Equal(Degree + 1, leverages.Sum, 1e-12);
    }

    [Fact]
    public void A_well_conditioned_design_stays_in_double() => Assert.False(FactorBuilder.Build(new PowerRows([-1, -0.5, 0, 0.5, 1, 0.3], 2, [1, 2, 3, 4, 5, 6])).IsExtended);

    private static Dyadic[] Column(int power, double shift) =>
        [.. _x.Select(x => power == 0 ? Dyadic.Of(1.0) : Dyadic.Power(x, power) - Dyadic.Of(shift))];

    private sealed class Leverages : SecondPass.IAccumulator
    {
        public double Sum { get; private set; }

        public void Add(SecondPass.ResidualBlock block)
        {
            foreach (var leverage in block.Leverages)
            {
                Sum += leverage;
            }
        }
    }
}
