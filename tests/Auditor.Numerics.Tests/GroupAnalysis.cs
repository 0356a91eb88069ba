using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Tests;

/// <summary>Both passes over a design, for tests: every group added to the final model, then all groups jointly.</summary>
internal sealed class GroupAnalysis
{
    public GroupAnalysis(IDesignRows design, DependenceStructure? structure = null)
    {
        Final = FinalFactor.Of(FactorBuilder.Build(design));
        Groups = [.. design.Layout.Groups.Select(range => AddedGroup.Of(Final, [.. range.Indices]))];
        All = AddedGroup.Of(Final, [.. design.Layout.Groups.SelectMany(range => range.Indices)]);
        Pass = RowPass.Run(design, Final, [.. Groups, All], [], structure);
        Fit = new Fit(Final, Pass);
    }

    public FinalFactor Final { get; }

    public IReadOnlyList<AddedGroup> Groups { get; }

    public AddedGroup All { get; }

    public RowPassResult Pass { get; }

    public Fit Fit { get; }

    public GroupSums Sums(int group) => Pass.Groups[group];
}
