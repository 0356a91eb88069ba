using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>
/// Sums over the rows for the sandwich covariances of the final model's own coefficients, in the coordinates of its orthonormal Q_F (r x r matrices):
/// each is sum_i c_i omega_i q_i q_i' with c_i the copies of the row. They serve to reproduce what an author printed.
/// </summary>
public sealed class CoefficientScores : IMergeable
{
    private readonly int _rank;
    private double[] _weight = [];
    private double[] _scaled = [];

    public CoefficientScores(FinalFactor final)
    {
        Final = final;
        _rank = final.Rank;
        (Hc0, Hc2, Hc3) = (new double[_rank, _rank], new double[_rank, _rank], new double[_rank, _rank]);
    }

    /// <summary>Some row has leverage 1: its residual is 0 whatever the response, and HC2 and HC3 do not exist.</summary>
    public bool LeverageOne { get; private set; }

    internal FinalFactor Final { get; }

    /// <summary>omega = e² (White 1980).</summary>
    internal double[,] Hc0 { get; }

    /// <summary>omega = e² / (1 - h).</summary>
    internal double[,] Hc2 { get; }

    /// <summary>omega = e² / (1 - h)² (MacKinnon and White 1985).</summary>
    internal double[,] Hc3 { get; }

    public void Add(ResidualBlock block)
    {
        if (_weight.Length < block.Rows)
        {
            (_weight, _scaled) = (new double[block.Rows], new double[block.Rows]);
        }

        AddProducts(Hc0, block, 0);
        AddProducts(Hc2, block, 1);
        AddProducts(Hc3, block, 2);
    }

    public IMergeable Fork() => new CoefficientScores(Final);

    public void Merge(IMergeable next)
    {
        var other = (CoefficientScores)next;
        SquareSums.Add(Hc0, other.Hc0);
        SquareSums.Add(Hc2, other.Hc2);
        SquareSums.Add(Hc3, other.Hc3);
        LeverageOne |= other.LeverageOne;
    }

    /// <param name="power">Of 1 - h in the denominator.</param>
    private void AddProducts(double[,] into, ResidualBlock block, int power)
    {
        for (var i = 0; i < block.Rows; i++)
        {
            _weight[i] = Omega(block, i, power);
        }

        var scaled = _scaled.AsSpan(0, block.Rows);
        for (var a = 0; a < _rank; a++)
        {
            BlockKernels.Multiply(block.QColumn(a), _weight.AsSpan(0, block.Rows), scaled);
            for (var b = 0; b <= a; b++)
            {
                into[a, b] += BlockKernels.Dot(scaled, block.QColumn(b));
                into[b, a] = into[a, b];
            }
        }
    }

    private double Omega(ResidualBlock block, int i, int power)
    {
        var complement = 1 - block.Leverages[i];
        if (complement <= GroupAccumulator.LeverageOne)
        {
            LeverageOne = true;
            return 0;
        }

        var copies = block.Copies?[i] ?? 1;
        return copies * block.Residuals[i] * block.Residuals[i] / Math.Pow(complement, power);
    }
}
