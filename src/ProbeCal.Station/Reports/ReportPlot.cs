using System.Collections.Generic;

namespace ProbeCal.Station.Reports;

/// <summary>A picture as data. Whatever it shows stands in a table or a sentence of the same report as well.</summary>
/// <param name="Id">As <see cref="ReportField.Id"/>.</param>
/// <param name="Title">What it shows, in a few words.</param>
/// <param name="Description">What is to be seen, in words, for whoever cannot see it.</param>
/// <param name="X">The axis across.</param>
/// <param name="Y">The axis upwards.</param>
/// <param name="Series">The points, told apart by the shape of their marks.</param>
/// <param name="Lines">Lines, told apart by their strokes.</param>
public sealed record ReportPlot(
    string Id, string Title, string Description, PlotAxis X, PlotAxis Y, IReadOnlyList<PlotSeries> Series, IReadOnlyList<PlotLine> Lines) : ReportBlock;

/// <summary>An axis of a plot.</summary>
/// <param name="Name">The quantity with its unit.</param>
/// <param name="IsTime">True when the values are days since 1970-01-01 UTC.</param>
public sealed record PlotAxis(string Name, bool IsTime);

/// <summary>Points of one kind.</summary>
/// <param name="Name">What they are.</param>
/// <param name="Mark">Their shape.</param>
/// <param name="Points">The points.</param>
public sealed record PlotSeries(string Name, PlotMark Mark, IReadOnlyList<PlotPoint> Points);

/// <summary>A point of a plot.</summary>
/// <param name="X">Across.</param>
/// <param name="Y">Upwards.</param>
/// <param name="HalfWidth">Half the length of its uncertainty bar; 0 for none.</param>
public sealed record PlotPoint(double X, double Y, double HalfWidth);

/// <summary>A line through some places.</summary>
/// <param name="Name">What it is; empty for a line that the legend leaves out.</param>
/// <param name="Stroke">How it is drawn.</param>
/// <param name="Places">The places in order.</param>
public sealed record PlotLine(string Name, PlotStroke Stroke, IReadOnlyList<PlotPoint> Places);

/// <summary>Shapes of marks; the terminal has a character for each.</summary>
public enum PlotMark
{
    /// <summary>A ring.</summary>
    Ring,

    /// <summary>A filled disc.</summary>
    Disc,

    /// <summary>A square.</summary>
    Square,

    /// <summary>A filled diamond.</summary>
    Diamond,

    /// <summary>A triangle.</summary>
    Triangle,

    /// <summary>Two strokes crossed: what does not count.</summary>
    Cross,
}

/// <summary>Strokes of lines.</summary>
public enum PlotStroke
{
    /// <summary>Thin and whole: an axis at zero.</summary>
    Thin,

    /// <summary>Whole.</summary>
    Solid,

    /// <summary>Dashes.</summary>
    Dashed,

    /// <summary>Dots.</summary>
    Dotted,
}
