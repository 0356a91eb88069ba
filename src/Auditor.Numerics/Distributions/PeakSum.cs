namespace Auditor.Numerics.Distributions;

/// <summary>
/// The sum of positive terms that rise to one peak and fall again, with the sum of their steps beside it, on a scale that follows the terms.
/// </summary>
internal struct PeakSum
{
    /// <summary>Below this share of the sum a falling term, and all after it, no longer count.</summary>
    public const double Negligible = 1e-18;

    private const double Large = 1e200;

    private readonly double _firstStep;
    private double _terms;
    private double _steps;

    public PeakSum((double LogTerm, double LogStep) first)
    {
        Scale = first.LogTerm;
        Term = 1;
        Step = double.IsNegativeInfinity(Scale) ? 0 : Math.Min(Math.Exp(first.LogStep - Scale), Large);
        _firstStep = Step;
        _terms = Term;
        _steps = Step;
    }

    /// <summary>The last term and step, over exp(Scale).</summary>
    public double Term { get; private set; }

    public double Step { get; private set; }

    public double Scale { get; private set; }

    /// <summary>log of the sum of the terms, and half the sum of the steps over it.</summary>
    public readonly (double LogTail, double Rate) Result => (Scale + Math.Log(_terms), _steps / _terms / 2);

    /// <summary>Goes back to the first term, to sum away from it in the other direction. Only while no rescaling was needed.</summary>
    public void BackToFirst() => (Term, Step) = (1, _firstStep);

    /// <summary>Adds a term; false when it falls and no longer counts.</summary>
    public bool Add(double term, double step)
    {
        if (!double.IsFinite(term + step))
        {
            return false; // only where the logarithm of the sum is so far below 0 that its own rounding overflows: the sum is 0
        }

        bool counts = term >= Term || term >= _terms * Negligible;
        (Term, Step) = (term, step);
        _terms += term;
        _steps += step;
        if (_terms > Large)
        {
            (Term, Step, _terms, _steps) = (Term / Large, Step / Large, _terms / Large, _steps / Large);
            Scale += Math.Log(Large);
        }

        return counts;
    }
}
