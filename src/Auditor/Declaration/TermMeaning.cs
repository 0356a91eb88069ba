namespace Auditor.Declaration;

/// <summary>
/// One way of writing for terms that say the same thing in different words: a product in another order, a square as a power of 2.
/// Equal terms of this form are the same term; their labels may differ.
/// </summary>
internal static class TermMeaning
{
    public static Term Of(Term term) => term switch
    {
        TransformTerm { Transform: NumberTransform.Square, Plus: 0 } square => Power(square.Of, 2),
        TransformTerm { Transform: NumberTransform.Inverse, Plus: 0 } inverse => Power(inverse.Of, -1),
        TransformTerm { Transform: NumberTransform.Sqrt, Plus: 0 } root => Power(root.Of, 0.5),
        TransformTerm transform => transform with { Of = Of(transform.Of) },
        PowerTerm power => Power(power.Of, power.Exponent),
        PolynomialTerm { Degree: 1 } straight => Of(straight.Of),
        PolynomialTerm polynomial => polynomial with { Of = Of(polynomial.Of) },
        ProductTerm product => new ProductTerm([.. Factors(product).OrderBy(factor => factor.Label, StringComparer.Ordinal)]),
        _ => term,
    };

    private static Term Power(Term of, double exponent) => exponent == 1 ? Of(of) : new PowerTerm(Of(of), exponent);

    private static IEnumerable<Term> Factors(ProductTerm product) =>
        product.Factors.Select(Of).SelectMany(factor => factor is ProductTerm inner ? inner.Factors : [factor]);
}
