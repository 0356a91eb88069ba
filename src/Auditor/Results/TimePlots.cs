namespace Auditor.Results;

/// <summary>The residuals of the final model in the declared time order. No part of the JSON record.</summary>
/// <param name="Points">In time order.</param>
/// <param name="Scale">How the times are to be written.</param>
/// <param name="Time">The column of time, or what stands in its place.</param>
/// <param name="Single">Each point is one residual; otherwise it stands for all of a period, or of several neighbouring periods.</param>
/// <param name="PeriodsOfPoint">Neighbouring periods of one point; 1 when none are put together.</param>
/// <param name="Rows">Rows.</param>
/// <param name="Units">Declared units; null when none is declared.</param>
/// <param name="Periods">Periods with a row.</param>
/// <param name="Between">Share of the residuals' sum of squares about their mean that lies between the periods' means.</param>
public sealed record TimePlot(
    IReadOnlyList<TimePoint> Points, TimeScale Scale, string Time, bool Single, int PeriodsOfPoint, int Rows, int? Units, int Periods, double Between)
{
    /// <summary>Pairs of neighbours, one unit's rows one period apart; null when neighbours cannot be told.</summary>
    public int? Neighbours { get; init; }

    /// <summary>Of them, those on the same side of zero.</summary>
    public int SameSide { get; init; }
}

/// <param name="X">Time as a number: itself, days since 0001-01-01, or the place in the file's order.</param>
/// <param name="Label">What to call the time.</param>
/// <param name="Mean">Mean residual, or the one residual.</param>
/// <param name="Lower">Lower quartile of the residuals there.</param>
/// <param name="Upper">Upper quartile.</param>
/// <param name="Count">Observations.</param>
/// <param name="Follows">The point before is its neighbour in time: no period is missing between them.</param>
public sealed record TimePoint(double X, string Label, double Mean, double Lower, double Upper, double Count, bool Follows);

/// <summary>What the numbers on an axis of time are.</summary>
public enum TimeScale
{
    /// <summary>Numbers as in the data, written without marks for thousands: years are the usual case.</summary>
    Number,

    /// <summary>Days since 0001-01-01.</summary>
    Date,
}

/// <summary>Autocorrelations of the residuals.</summary>
/// <param name="Lags">From 1 on; a lag without pairs is not among them.</param>
/// <param name="Units">Declared units; null when none is declared.</param>
/// <param name="LaggedResponse">A lag of the response stands among the terms: the band is too wide at the first lags.</param>
public sealed record AutocorrelationPlot(IReadOnlyList<LagPoint> Lags, int Rows, int? Units, bool LaggedResponse);

/// <param name="Band">Half the width of the band about 0 for independent errors, 95 of 100 samples.</param>
public sealed record LagPoint(int Lag, double Correlation, int Pairs, double Band);
