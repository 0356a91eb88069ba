using Auditor.Numerics;
using Auditor.Numerics.GroupTests;
using Auditor.Numerics.Random;
using Auditor.Numerics.SecondPass;

namespace Auditor.Analysis;

/// <summary>The tests of one group that allow for the declared dependence; each is computed when it is asked for.</summary>
/// <param name="fit">The group on one row set.</param>
internal sealed class DependenceResults(GroupFit fit)
{
    /// <summary>Patterns drawn by the wild bootstrap.</summary>
    private const int Draws = 999;

    /// <summary>With more clusters the bootstrap adds nothing to the score form and costs much.</summary>
    private const int MostBootstrapped = 100;

    private const double BootstrapInterval = 0.05;

    private readonly Lazy<Cr2?> _cr2 = new(() => fit.Sums.Cluster is { } clusters ? Numerics.GroupTests.Cr2.Of(fit.Added, clusters) : null);
    private readonly Lazy<PeriodWald?> _periodWald = new(() => fit.Sums.Period is { } periods ? PeriodWald.Of(fit.Added, periods) : null);
    private readonly Lazy<TestResult?> _bootstrap = new(() => Bootstrapped(fit));
    private readonly Lazy<LevelOfVariation?> _level = new(() => LevelOfVariation.Of(fit.Added, fit.Sums));

    public TestResult? Cluster => Clusters is { } clusters ? ClusterF.Of(fit.Added, clusters) : null;

    public TestResult? ClusterCeiling => Clusters is { } clusters ? ClusterF.Ceiling(fit.Added, clusters) : null;

    public TestResult? Cr1 => Clusters is { } clusters ? Numerics.GroupTests.Cr1.Of(fit.Added, clusters) : null;

    public Cr2? Cr2 => _cr2.Value;

    public TestResult? WildBootstrap => _bootstrap.Value;

    public TestResult? Time => Periods is { } periods ? PeriodF.Of(fit.Added, periods) : null;

    public TestResult? TimeCeiling => Periods is { } periods ? PeriodF.Ceiling(fit.Added, periods) : null;

    public PeriodWald? PeriodWald => _periodWald.Value;

    public TestResult? NeweyWest => Periods is { } periods ? Numerics.GroupTests.NeweyWest.Of(fit.Added, periods, fit.Dependence.SerialLag).Test : null;

    public LevelOfVariation? Level => _level.Value;

    /// <summary>How many equal clusters those that a basis sums over are worth for this group, else the declared ones; null where there are none.</summary>
    public double? EffectiveClusters(SummedOver over) =>
        (over.HasFlag(SummedOver.Unit) ? fit.Sums.Unit : Clusters) is { } clusters ? Numerics.GroupTests.EffectiveClusters.Of(fit.Added, clusters)?.Uncorrelated : null;

    private ClassSums? Clusters => fit.Sums.Cluster;

    private ClassSums? Periods => fit.Sums.Period;

    private static TestResult? Bootstrapped(GroupFit fit) => fit.Sums.Cluster switch
    {
        null => null,
        { Count: > MostBootstrapped } => TestResult.None(Impediment.ManyClusters),
        var clusters => Numerics.GroupTests.WildBootstrap.Of(
            fit.Added, clusters, Draws, BootstrapInterval, new Generator(Stream(fit))),
    };

    /// <summary>A stream of each group's own, by its name: nothing depends on what other groups there are, on their order or on threads.</summary>
    private static ulong Stream(GroupFit fit) => unchecked((ulong)fit.Dependence.Seed * 0x9E3779B97F4A7C15UL) ^ Hash(fit.Name);

    /// <summary>FNV-1a of the name's UTF-16 units, the same on every machine.</summary>
    private static ulong Hash(string name) => name.Aggregate(14695981039346656037UL, (hash, unit) => unchecked((hash ^ unit) * 1099511628211UL));
}
