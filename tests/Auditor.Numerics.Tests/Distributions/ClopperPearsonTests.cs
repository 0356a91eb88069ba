using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.Tests.Distributions;

/// <summary>Against R 4.2.2: print(binom.test(x, n, conf.level = 1 - alpha)$conf.int, digits = 15).</summary>
public sealed class ClopperPearsonTests
{
    [Theory]
    [InlineData(0, 99, 0.05, 0, 0.0365757449834789)]
    [InlineData(3, 99, 0.05, 0.0062933472741721, 0.0860112643373795)]
    [InlineData(49, 999, 0.05, 0.0365037834904580, 0.0643298644277164)]
    [InlineData(49, 999, 0.01, 0.0331335343435806, 0.0694108522334076)]
    [InlineData(20, 20, 0.05, 0.831566529016915, 1)]
    public void Limits(int successes, int trials, double alpha, double lower, double upper)
    {
        var interval = ClopperPearson.Of(successes, trials, alpha);
        VectorFile.Near(lower, interval.Lower, 1e-11);
        VectorFile.Near(upper, interval.Upper, 1e-11);
    }
}
