namespace Auditor.Results;

/// <summary>What the pictures of the final model's residuals show: already few enough points to draw. No part of the JSON record.</summary>
/// <param name="Why">Why there is nothing to draw; null when there is.</param>
public sealed record PlotData(ResidualPlots? Plots, string? Why)
{
    /// <summary>Pictures of each left-out group, in the groups' order; null where a group has none.</summary>
    public IReadOnlyList<GroupPlots?> Groups { get; init; } = [];
}

/// <summary>The pictures of one left-out group on the rows of its test. Residuals are those of the final model, times sqrt(w) in a weighted fit.</summary>
/// <param name="Added">Residual against what the group adds.</param>
/// <param name="Columns">Residual against left-out columns as declared.</param>
/// <param name="ColumnsNotDrawn">Further columns of the group.</param>
public sealed record GroupPlots(AddedVariablePlot Added, IReadOnlyList<ColumnPlot> Columns, int ColumnsNotDrawn);

/// <param name="Slope">Slope of the least-squares line through the origin.</param>
/// <param name="Column">The one column that adds a direction, drawn as its part orthogonal to the final model; null: the fitted part of several.</param>
public sealed record AddedVariablePlot(PointCloud Cloud, double Slope, string? Column);

public sealed record ColumnPlot(string Column, PointCloud Cloud);

/// <param name="PartialRSquared">An effect.</param>
/// <param name="Power">Chance that the basis test rejects it at the policy's significance, not adjusted.</param>
public sealed record PowerPoint(double PartialRSquared, double Power);

/// <param name="Fitted">Residual against fitted value, both in the response's units (the residual times sqrt(w) in a weighted fit).</param>
/// <param name="Normal">Standardised residual, e / (s sqrt(1 - h)), against the normal quantile of its place in the order.</param>
/// <param name="Scale">Square root of the absolute studentised residual against the fitted value.</param>
/// <param name="Leverage">Studentised residual against leverage.</param>
/// <param name="HighLeverage">2 r / n.</param>
/// <param name="AboveHighLeverage">Rows with a leverage above that.</param>
/// <param name="Weighted">Residuals are sqrt(w) e.</param>
/// <param name="LeverageOne">Rows without a studentised residual, which only the first picture can show.</param>
public sealed record ResidualPlots(
    PointCloud Fitted, NormalPlot Normal, PointCloud Scale, PointCloud Leverage,
    IReadOnlyList<NamedPoint> Named, double HighLeverage, int AboveHighLeverage, bool Weighted, int LeverageOne)
{
    /// <summary>Residuals in time order; null where no time is declared.</summary>
    public TimePlot? InTime { get; init; }

    /// <summary>Null where the rows have no order in time, or nothing can be correlated.</summary>
    public AutocorrelationPlot? Autocorrelations { get; init; }
}

/// <summary>Points of a picture; when there are too many, most stand for all points of a cell of a grid, at their mean.</summary>
/// <param name="Rows">How many rows the points stand for.</param>
/// <param name="Trend">Mean of y within runs of rows ordered by x; empty when there are few rows.</param>
public sealed record PointCloud(IReadOnlyList<PlotPoint> Points, int Rows, bool Binned, IReadOnlyList<PlotPoint> Trend)
{
    /// <summary>Of so many neighbouring rows one is drawn; 1: all.</summary>
    public int OneIn { get; init; } = 1;
}

/// <param name="Count">How many observations the point stands for.</param>
public sealed record PlotPoint(double X, double Y, double Count);

/// <param name="Points">In ascending order; of many observations a selection that holds all of both ends.</param>
/// <param name="N">Observations.</param>
/// <param name="Outside">Points outside the envelope.</param>
public sealed record NormalPlot(IReadOnlyList<NormalPoint> Points, double N, int Outside);

/// <param name="Z">Median of the normal order statistic of that rank.</param>
/// <param name="Lower">Its 2.5 % quantile.</param>
/// <param name="Upper">Its 97.5 % quantile.</param>
public sealed record NormalPoint(double Z, double Residual, double Lower, double Upper);

/// <param name="Row">1-based in the source.</param>
public sealed record NamedPoint(int Row, string? Label, double X, double Y, double CooksDistance);
