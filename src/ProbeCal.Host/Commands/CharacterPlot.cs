using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Reports;

namespace ProbeCal.Host.Commands;

/// <summary>A small plot in characters, for a terminal: a character for each kind of mark, the ends of the axes in figures.</summary>
internal static class CharacterPlot
{
    private const int Wide = 60;
    private const int High = 11;

    internal static void Write(TextWriter output, ReportPlot plot, string indent)
    {
        PlotPoint[] all = [.. plot.Series.SelectMany(static series => series.Points).Concat(plot.Lines.SelectMany(static line => line.Places))];
        if (all.Length == 0)
        {
            output.WriteLine(indent + plot.Title + ": nothing to show");
            return;
        }

        (double lowX, double highX) = Ends(all.Select(static point => point.X));
        (double lowY, double highY) = Ends(all.Select(static point => point.Y));
        char[][] grid = [.. Enumerable.Range(0, High).Select(static _ => new string(' ', Wide).ToCharArray())];
        foreach (PlotLine line in plot.Lines)
        {
            for (int i = 1; i < line.Places.Count; i++)
            {
                Stretch(line.Places[i - 1], line.Places[i], line.Stroke switch { PlotStroke.Dotted => '.', PlotStroke.Dashed => '-', _ => '_' });
            }
        }

        foreach (PlotSeries series in plot.Series)
        {
            foreach (PlotPoint point in series.Points)
            {
                Put(point.X, point.Y, Sign(series.Mark));
            }
        }

        output.WriteLine(indent + plot.Y.Name);
        string upper = Number.Significant(highY, 4);
        string lower = Number.Significant(lowY, 4);
        int margin = Math.Max(upper.Length, lower.Length);
        for (int row = 0; row < High; row++)
        {
            string label = row == 0 ? upper : row == High - 1 ? lower : "";
            output.WriteLine((indent + label.PadLeft(margin) + " |" + new string(grid[row])).TrimEnd());
        }

        string left = Axis(lowX, plot.X.IsTime);
        string right = Axis(highX, plot.X.IsTime);
        string below = new(' ', indent.Length + margin + 2);
        output.WriteLine(indent + new string(' ', margin) + " +" + new string('-', Wide));
        output.WriteLine(below + left + right.PadLeft(Wide - left.Length));
        output.WriteLine(below + plot.X.Name + ";  " + string.Join("  ", plot.Series.Select(static series => $"{Sign(series.Mark)} {Wrong.OneLine(series.Name)}")));

        void Stretch(PlotPoint from, PlotPoint to, char sign)
        {
            for (int i = 0; i <= Wide; i++)
            {
                double part = i / (double)Wide;
                Put(from.X + (part * (to.X - from.X)), from.Y + (part * (to.Y - from.Y)), sign);
            }
        }

        void Put(double x, double y, char sign)
        {
            int column = (int)Math.Round((x - lowX) / (highX - lowX) * (Wide - 1));
            int row = (int)Math.Round((highY - y) / (highY - lowY) * (High - 1));
            grid[Math.Clamp(row, 0, High - 1)][Math.Clamp(column, 0, Wide - 1)] = sign;
        }
    }

    private static (double Low, double High) Ends(IEnumerable<double> values)
    {
        double low = values.Min();
        double high = values.Max();
        double room = low < high ? 0 : Math.Max(0.05 * Math.Abs(low), 1e-3);
        return (low - room, high + room);
    }

    private static string Axis(double at, bool isTime)
    {
        return isTime ? DateTime.UnixEpoch.AddDays(at).ToString("yyyy-MM-dd", CultureInfo.InvariantCulture) : Number.Significant(at, 4);
    }

    private static char Sign(PlotMark mark)
    {
        return mark switch
        {
            PlotMark.Ring => 'o',
            PlotMark.Disc => '*',
            PlotMark.Square => '#',
            PlotMark.Diamond => '+',
            PlotMark.Triangle => '^',
            _ => 'x',
        };
    }
}
