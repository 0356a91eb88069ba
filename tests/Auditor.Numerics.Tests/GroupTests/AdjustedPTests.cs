using Auditor.Numerics.GroupTests;
using CsCheck;

namespace Auditor.Numerics.Tests.GroupTests;

public sealed class AdjustedPTests
{
    private static readonly double[] P = [0.0401, 0.0008, 0.7, 0.009, 0.041, 0.012, 0.27];

    /// <summary>Values from R 4.2.2, p.adjust(c(0.0401, 0.0008, 0.7, 0.009, 0.041, 0.012, 0.27), method).</summary>
    public static TheoryData<string, double[]> FromR => new()
    {
        { "holm", [0.1604, 0.0056, 0.7, 0.054, 0.1604, 0.06, 0.54] },
        { "hochberg", [0.123, 0.0056, 0.7, 0.054, 0.123, 0.06, 0.54] },
        { "BH", [0.0574, 0.0056, 0.7, 0.028, 0.0574, 0.028, 0.315] },
        { "BY", [0.14883, 0.01452, 1, 0.0726, 0.14883, 0.0726, 0.81675] },
    };

    [Theory]
    [MemberData(nameof(FromR))]
    public void Agrees_with_R(string method, double[] expected)
    {
        var adjusted = Adjust(method, P);
        Assert.All(expected.Zip(adjusted), pair => VectorFile.Near(pair.First, pair.Second, 1e-12));
    }

    [Fact]
    public void Orders_p_values_below_the_least_double()
    {
        var adjusted = AdjustedP.Holm([new PValue(0, -2000), new PValue(0, -3000), PValue.Of(0.3)]);
        Assert.Equal(Math.Log(2) - 2000, adjusted[0].Log, 1e-12);
        Assert.Equal(Math.Log(3) - 3000, adjusted[1].Log, 1e-12);
        Assert.Equal((0, 0.3), (adjusted[0].P, adjusted[2].P));
    }

    /// <summary>Common practice, no source: no method makes a p smaller, and none reorders two of them.</summary>
    [Fact]
    public void Never_smaller_and_never_reordered() =>
        Gen.Double[1e-8, 1].Array[1, 12].Sample(p =>
        {
            foreach (var method in new[] { "holm", "hochberg", "BH", "BY" })
            {
                var adjusted = Adjust(method, p);
                for (var i = 0; i < p.Length; i++)
                {
                    Assert.True(adjusted[i] >= p[i]);
                    Assert.All(Enumerable.Range(0, p.Length).Where(j => p[j] > p[i]), j => Assert.True(adjusted[j] >= adjusted[i]));
                }
            }
        });

    private static double[] Adjust(string method, double[] p)
    {
        PValue[] log = [.. p.Select(PValue.Of)];
        var adjusted = method switch
        {
            "holm" => AdjustedP.Holm(log),
            "hochberg" => AdjustedP.Hochberg(log),
            "BH" => AdjustedP.BenjaminiHochberg(log),
            _ => AdjustedP.BenjaminiYekutieli(log),
        };
        return [.. adjusted.Select(value => value.P)];
    }
}
