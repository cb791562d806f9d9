using System;
using System.Collections.Generic;
using System.Linq;

namespace ProbeCal.Station.Reports;

/// <summary>Where a text of a drawing hangs.</summary>
internal enum TextAnchor
{
    Start,
    Middle,
    End,
}

/// <summary>Something to draw, in points from the upper left corner.</summary>
internal abstract record DrawnPart;

/// <summary>A line through places.</summary>
internal sealed record DrawnLine(PlotStroke Stroke, double Width, IReadOnlyList<(double X, double Y)> Places) : DrawnPart;

/// <summary>A mark.</summary>
internal sealed record DrawnMark(PlotMark Mark, double X, double Y, double Radius) : DrawnPart;

/// <summary>A text on its baseline; upright ones read from below upwards.</summary>
internal sealed record DrawnText(string Text, double X, double Y, double Size, TextAnchor Anchor, bool Upright) : DrawnPart;

/// <summary>
/// A plot laid out once: the page's SVG and the PDF draw the same parts at the same places. Black alone; marks differ in
/// shape and lines in stroke, so that a copy or a reader who sees no colours loses nothing.
/// </summary>
internal sealed class PlotDrawing
{
    private const double TextSize = 7;
    private const double Left = 46;
    private const double Right = 10;
    private const double Below = 25;
    private const double MarkRadius = 2.4;
    private const double LegendLine = 10;
    private readonly List<DrawnPart> _parts = [];
    private readonly ReportPlot _plot;
    private readonly double _width;
    private readonly double _height;
    private double _top;
    private double _lowX;
    private double _highX;
    private double _lowY;
    private double _highY;

    private PlotDrawing(ReportPlot plot, double width, double height)
    {
        _plot = plot;
        _width = width;
        _height = height;
    }

    /// <summary>The parts in the order in which they are drawn.</summary>
    internal static IReadOnlyList<DrawnPart> Of(ReportPlot plot, double width, double height)
    {
        PlotDrawing drawing = new(plot, width, height);
        drawing.Scale();
        drawing.Legend();
        drawing.Axes();
        drawing.Lines();
        drawing.Marks();
        return drawing._parts;
    }

    /// <summary>The range of an axis: all that is to be seen with a little room, and never of no width.</summary>
    internal static (double Low, double High) Range(IEnumerable<double> values)
    {
        double low = double.PositiveInfinity;
        double high = double.NegativeInfinity;
        foreach (double value in values.Where(double.IsFinite))
        {
            low = Math.Min(low, value);
            high = Math.Max(high, value);
        }

        if (high < low)
        {
            return (0, 1);
        }

        double room = low < high ? 0.06 * (high - low) : Math.Max(0.05 * Math.Abs(low), 1e-3);
        return (low - room, high + room);
    }

    /// <summary>All values across that the plot shows.</summary>
    internal static IEnumerable<double> AllX(ReportPlot plot)
    {
        return plot.Series.SelectMany(static series => series.Points).Concat(plot.Lines.SelectMany(static line => line.Places)).Select(static point => point.X);
    }

    /// <summary>All values upwards that the plot shows, bars included.</summary>
    internal static IEnumerable<double> AllY(ReportPlot plot)
    {
        return plot.Series.SelectMany(static series => series.Points).Concat(plot.Lines.SelectMany(static line => line.Places))
            .SelectMany(static point => new[] { point.Y - point.HalfWidth, point.Y + point.HalfWidth });
    }

    private void Scale()
    {
        (_lowX, _highX) = Range(AllX(_plot));
        (_lowY, _highY) = Range(AllY(_plot));
    }

    private void Legend()
    {
        double x = Left;
        double y = 8;
        foreach ((string whole, Action<double, double> sample) in Named())
        {
            // A name is whole in the report's table; in the legend it is cut to a line.
            string name = Cut(whole, _width - Left - Right - 22);
            double width = 22 + FontFile.Regular.Width(name, TextSize);
            if (_width - Right < x + width && Left < x)
            {
                x = Left;
                y += LegendLine;
            }

            sample(x, y - 2.5);
            _parts.Add(new DrawnText(name, x + 15, y, TextSize, TextAnchor.Start, false));
            x += width + 4;
        }

        _top = y + 6;
    }

    private static string Cut(string name, double room)
    {
        string shown = FontFile.Regular.Showable(name);
        while (room < FontFile.Regular.Width(shown, TextSize))
        {
            shown = shown[..^2].TrimEnd('…') + "…";
        }

        return shown;
    }

    private IEnumerable<(string Name, Action<double, double> Sample)> Named()
    {
        foreach (PlotSeries series in _plot.Series)
        {
            yield return (series.Name, (x, y) => _parts.Add(new DrawnMark(series.Mark, x + 7, y, MarkRadius)));
        }

        foreach (PlotLine line in _plot.Lines.Where(static line => line.Name.Length != 0).DistinctBy(static line => line.Name))
        {
            yield return (line.Name, (x, y) => _parts.Add(new DrawnLine(line.Stroke, 0.8, [(x, y), (x + 13, y)])));
        }
    }

    private void Axes()
    {
        double bottom = _height - Below;
        _parts.Add(new DrawnLine(PlotStroke.Solid, 0.6, [(Left, _top), (Left, bottom), (_width - Right, bottom)]));
        foreach ((double at, string text) in PlotTicks.Of(_lowX, _highX, _plot.X.IsTime, Math.Max(2, (int)((_width - Left - Right) / (_plot.X.IsTime ? 62 : 42)))))
        {
            _parts.Add(new DrawnLine(PlotStroke.Solid, 0.6, [(X(at), bottom), (X(at), bottom + 3)]));
            _parts.Add(new DrawnText(text, X(at), bottom + 10, TextSize, TextAnchor.Middle, false));
        }

        foreach ((double at, string text) in PlotTicks.Of(_lowY, _highY, false, Math.Max(2, (int)((bottom - _top) / 18))))
        {
            _parts.Add(new DrawnLine(PlotStroke.Solid, 0.6, [(Left - 3, Y(at)), (Left, Y(at))]));
            _parts.Add(new DrawnText(text, Left - 5, Y(at) + 2.5, TextSize, TextAnchor.End, false));
        }

        _parts.Add(new DrawnText(_plot.X.Name, Left + ((_width - Left - Right) / 2), _height - 4, TextSize, TextAnchor.Middle, false));
        _parts.Add(new DrawnText(_plot.Y.Name, 8, _top + ((bottom - _top) / 2), TextSize, TextAnchor.Middle, true));
    }

    private void Lines()
    {
        foreach (PlotLine line in _plot.Lines)
        {
            _parts.Add(new DrawnLine(line.Stroke, line.Stroke == PlotStroke.Thin ? 0.4 : 0.8, [.. line.Places.Select(place => (X(place.X), Y(place.Y)))]));
        }
    }

    private void Marks()
    {
        foreach (PlotSeries series in _plot.Series)
        {
            foreach (PlotPoint point in series.Points)
            {
                if (0 < point.HalfWidth)
                {
                    double x = X(point.X);
                    double high = Y(point.Y + point.HalfWidth);
                    double low = Y(point.Y - point.HalfWidth);
                    _parts.Add(new DrawnLine(PlotStroke.Thin, 0.5, [(x, high), (x, low)]));
                    _parts.Add(new DrawnLine(PlotStroke.Thin, 0.5, [(x - 2, high), (x + 2, high)]));
                    _parts.Add(new DrawnLine(PlotStroke.Thin, 0.5, [(x - 2, low), (x + 2, low)]));
                }

                _parts.Add(new DrawnMark(series.Mark, X(point.X), Y(point.Y), MarkRadius));
            }
        }
    }

    private double X(double value)
    {
        return Left + ((value - _lowX) / (_highX - _lowX) * (_width - Left - Right));
    }

    private double Y(double value)
    {
        return _height - Below - ((value - _lowY) / (_highY - _lowY) * (_height - Below - _top));
    }
}
