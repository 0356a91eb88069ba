namespace Auditor.Numerics;

/// <summary>A p-value with its natural logarithm, which keeps order and digits where p itself underflows.</summary>
/// <param name="P">0 when it underflows.</param>
/// <param name="Log">Minus infinity for a p of exactly 0 (a perfect fit).</param>
public readonly record struct PValue(double P, double Log)
{
    public static PValue Of(double p) => new(p, Math.Log(p));

    /// <summary>p times a factor, at most 1.</summary>
    public PValue Times(double factor)
    {
        var log = Log + Math.Log(factor);
        return log >= 0 ? new PValue(1, 0) : new PValue(Math.Min(1, P * factor), log);
    }

    public static PValue Larger(PValue a, PValue b) => a.Log >= b.Log ? a : b;

    public static PValue Smaller(PValue a, PValue b) => a.Log <= b.Log ? a : b;
}
