using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Tests.Declaration;

public sealed class FullDeclarationTests
{
    private static readonly ModelDeclaration _declaration = Read(FullDeclaration.Yaml);

    [Fact]
    public void Identity_keeps_its_text()
    {
        Assert.Equal(new ModelIdentity("tractor-lease-loss", "Loss rate on defaulted tractor leases", "2026.20", "Model development"), _declaration.Model);
        Assert.Equal("full.yaml", _declaration.File);
    }

    [Fact]
    public void Data_say_which_rows_and_what_the_columns_are()
    {
        var data = _declaration.Data;

        Assert.Equal(["leases-1.csv", "leases-2.csv"], data.Sources);
        Assert.Equal(8, data.SourceLine);
        Assert.Equal("3fa9c0de3fa9c0de3fa9c0de3fa9c0de3fa9c0de3fa9c0de3fa9c0de3fa9c0de", data.Sha256);
        Assert.Equal(["", "NA"], data.Missing);
        Assert.Equal(new ColumnMention("lease_no", 23, "data.row_label"), data.RowLabel);
        Assert.Equal(new WeightsDeclaration("exposure", WeightKind.Precision, 30), data.Weights);
        Assert.Equal(new ColumnDeclaration("region", ColumnKind.Levels, "north", null, 11), data.Columns["region"]);
        Assert.Equal((ColumnKind.Levels, null, 12), (data.Columns["grade"].Kind, data.Columns["grade"].Reference, data.Columns["grade"].Line));
        Assert.Equal(["A", "B", "C"], data.Columns["grade"].Levels);
        Assert.Equal([ColumnKind.Date, ColumnKind.Number, ColumnKind.Text], new[] { "opened", "2008", "remark" }.Select(name => data.Columns[name].Kind));
    }

    [Fact]
    public void Every_condition_of_the_filter_is_kept_with_its_texts() => Assert.Equal(
        [
            "status EqualTo closed .. 18",
            "source Not NO .. 19",
            "grade In A|C .. 20",
            "opened Between  2001-01-01..2019-12-31 21",
            "price Present  .. 22",
        ],
        _declaration.Data.Keep.Select(keep => $"{keep.Column} {keep.Test} {string.Join('|', keep.Values)} {keep.From}..{keep.To} {keep.Line}"));

    [Fact]
    public void Structure_names_order_units_and_clusters()
    {
        var structure = _declaration.Data.Structure;

        Assert.Equal(new ColumnMention("opened", 24, "data.time"), structure.Time);
        Assert.False(structure.FileOrder);
        Assert.Equal((Period.Quarter, 4), (structure.Period, structure.SerialLag));
        Assert.Equal((24, 25, 27), (structure.TimeLine, structure.PeriodLine, structure.SerialLagLine));
        Assert.Equal(new ColumnMention("dealer", 26, "data.unit"), structure.Unit);
        Assert.Equal(new SplitDeclaration("opened", "2008-09-01", null, 28), structure.Split);
        Assert.Equal(new ColumnMention("dealer_group", 29, "data.cluster"), structure.Cluster);
        Assert.Equal(["region", "grade"], structure.Segments.Select(segment => segment.Column));
    }

    [Fact]
    public void Terms_are_what_was_written_on_their_lines()
    {
        var price = new ColumnTerm("price");
        var opened = new ColumnTerm("opened");
        var advance = new ColumnTerm("advance_rate");
        Assert.Equal(new TransformTerm(NumberTransform.Log1p, new ColumnTerm("loss_rate")), _declaration.Response);
        Assert.True(_declaration.FinalModel.Intercept);
        Assert.Equal<Term>(
            [
                advance,
                new TransformTerm(NumberTransform.Log, price),
                new TransformTerm(NumberTransform.Log10, price, 0.5),
                new ColumnTerm("region"),
                new ProductTerm([advance, new ColumnTerm("region")]),
                new PowerTerm(new ColumnTerm("age"), 3),
                new PolynomialTerm(new ColumnTerm("hours"), 2),
                new SplineTerm(new ColumnTerm("weight"), [12, 36, 60]),
                new BinsTerm(new ColumnTerm("age"), [24, 48]),
                new IndicatorTerm(new ColumnTerm("grade"), "C"),
                new StepTerm(opened, "2020-04-01"),
                new PulseTerm(opened, "2008-09-01", "2009-03-31"),
            ],
            _declaration.FinalModel.Terms);
        Assert.Equal(Enumerable.Range(36, 12), _declaration.FinalModel.Terms.Select(term => term.Line));
    }

    [Fact]
    public void Left_out_groups_keep_their_terms_reasons_and_figures()
    {
        var price = new ColumnTerm("price");
        Assert.Equal(["engine condition", "calendar", "money", "tails", "past"], _declaration.LeftOut.Select(group => group.Name));
        Assert.Equal([49, 53, 57, 59, 61], _declaration.LeftOut.Select(group => group.Line));
        Assert.Equal("Not significant at 5 %.", _declaration.LeftOut[0].Because);
        Assert.Null(_declaration.LeftOut[1].Because);
        Assert.Equal<Term>([new SeasonTerm(new ColumnTerm("opened"), Period.Quarter), new TrendTerm(new ColumnTerm("opened"))], _declaration.LeftOut[1].Terms);
        Assert.Equal<Term>(
            [
                new RatioTerm(new ColumnTerm("balance"), price),
                new MinusTerm(new ColumnTerm("balance"), new TransformTerm(NumberTransform.Sqrt, price)),
                new ColumnTerm("2008"),
                new ColumnTerm("NO"),
            ],
            _declaration.LeftOut[2].Terms);
        Assert.Equal<Term>([new WinsoriseTerm(price, 0.01, 0.99), new CapTerm(price, 100, null)], _declaration.LeftOut[3].Terms);
        Assert.Equal<Term>(
            [
                new TimeOrderTerm(TimeOrderOperation.MovingAverage, price, 4),
                new TimeOrderTerm(
                    TimeOrderOperation.Lag,
                    new TimeOrderTerm(TimeOrderOperation.Change, new TransformTerm(NumberTransform.Log, price), 1),
                    1),
            ],
            _declaration.LeftOut[4].Terms);
    }

    [Fact]
    public void Reported_figures_keep_their_digits()
    {
        var test = _declaration.LeftOut[0].Reported!;
        Assert.Equal(["0.710", "2", "480", "< 0.001"], [test.F!.Text, .. test.Df.Select(df => df.Text), test.P!.Text]);
        Assert.Equal(new ReportedFigure("0.710", 52), test.F);

        var reported = _declaration.Reported!;
        Assert.Equal(
            ["512", "0.410", ".407", "1e-05", "61.2"],
            new[] { reported.RowsUsed, reported.RSquared, reported.AdjustedRSquared, reported.ResidualSd, reported.F }.Select(figure => figure!.Text));
        Assert.Equal(
            new ReportedCoefficient("advance_rate", new("0.3120", 79), new("0.041", 79), new("< 0.001", 79), 79),
            reported.Coefficients[0]);
        Assert.Equal(new ReportedCoefficient("region = south", new("-0.022", 80), null, null, 80), reported.Coefficients[1]);
    }

    [Fact]
    public void The_elimination_path_is_kept()
    {
        var path = _declaration.Elimination!;

        Assert.Equal(new EliminationRule(EliminationCriterion.DropAbove, 0.05, null), path.Rule);
        Assert.True(path.ByTerm);
        Assert.Equal(["advance_rate", "region * advance_rate"], path.Forced.Select(term => term.Label));
        Assert.Equal([("money", 70), ("engine condition", 71)], path.Steps.Select(step => (step.Drop, step.Line)));
        Assert.Equal("4.9e-01", path.Steps[0].Reported!.P!.Text);
    }

    [Theory]
    [InlineData("{drop_worse: aic}", EliminationCriterion.DropWorseAic, null)]
    [InlineData("{drop_worse: bic}", EliminationCriterion.DropWorseBic, null)]
    [InlineData("{judgement: signs}", EliminationCriterion.Judgement, "signs")]
    public void Other_rules_of_elimination(string rule, EliminationCriterion criterion, string? why)
    {
        var path = Declared.Good("elimination: {rule: " + rule + "}").Elimination!;

        Assert.Equal(new EliminationRule(criterion, null, why), path.Rule);
        Assert.False(path.ByTerm);
        Assert.Equal((0, 0), (path.Forced.Count, path.Steps.Count));
    }

    [Fact]
    public void What_is_not_declared_has_its_default()
    {
        var least = Declared.Good();

        Assert.Equal(DataDeclaration.DefaultMissing, least.Data.Missing);
        Assert.True(least.FinalModel.Intercept);
        Assert.Equal(new ModelIdentity("lease", null, null, null), least.Model);
        Assert.Equal((0, 0, 0), (least.LeftOut.Count, least.Data.Keep.Count, least.Data.Columns.Count));
        Assert.Null(least.Elimination);
        Assert.Null(least.Reported);
        Assert.Null(least.Data.Structure.TimeLine);
    }

    [Fact]
    public void The_files_own_order_and_a_split_row_can_be_declared()
    {
        var structure = Declared.Good("data: {source: leases.csv, time: {file_order: true}, split: {row: 60}}").Data.Structure;

        Assert.True(structure.FileOrder);
        Assert.Null(structure.Time);
        Assert.Equal((3, new SplitDeclaration(null, null, 60, 3)), (structure.TimeLine, structure.Split));
    }

    [Theory]
    [InlineData("left_out:")]
    [InlineData("left_out: []")]
    [InlineData("final_model: {terms: []}")]
    [InlineData("final_model: {intercept: false, terms: [price]}")]
    [InlineData("final_model:\n  terms:")]
    [InlineData("data: {source: leases.csv, columns: , keep: , segments: }")]
    public void Lists_may_be_empty_where_that_means_something(string declared) => Declared.Good(declared);

    [Theory]
    [InlineData("\uFEFF", "\n")]
    [InlineData("", "\r\n")]
    [InlineData("", "\r")]
    public void Byte_order_mark_and_line_ends_change_nothing(string before, string lineEnd)
    {
        var declaration = Read(before + FullDeclaration.Yaml.ReplaceLineEndings(lineEnd));

        Assert.Equal("tractor-lease-loss", declaration.Model.Id);
        Assert.Equal(80, declaration.Reported!.Coefficients[1].Line);
    }

    [Theory]
    [InlineData("de-DE")]
    [InlineData("tr-TR")]
    public void The_culture_changes_nothing(string culture)
    {
        var declaration = Cultures.In(culture, () => Read(FullDeclaration.Yaml));

        Assert.Equal(_declaration.FinalModel.Terms, declaration.FinalModel.Terms);
        Assert.Equal("log10(price + 0.5)", Cultures.In(culture, () => declaration.FinalModel.Terms[2].Label));
    }

    private static ModelDeclaration Read(string yaml)
    {
        var reading = DeclarationReader.Read(yaml, "full.yaml");
        Assert.Equal([], reading.Problems.Select(problem => problem.ToString()));
        return reading.Declaration!;
    }
}
