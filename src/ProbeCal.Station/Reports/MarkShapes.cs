using System.Collections.Generic;

namespace ProbeCal.Station.Reports;

/// <summary>The marks that are made of straight strokes.</summary>
internal static class MarkShapes
{
    /// <summary>The corners of each stroke of a square, diamond, triangle or cross.</summary>
    internal static IEnumerable<IReadOnlyList<(double X, double Y)>> Strokes(DrawnMark mark)
    {
        double r = mark.Radius;
        (double x, double y) = (mark.X, mark.Y);
        return mark.Mark switch
        {
            PlotMark.Square => [[(x - r, y - r), (x + r, y - r), (x + r, y + r), (x - r, y + r)]],
            PlotMark.Diamond => [[(x, y - (1.3 * r)), (x + (1.3 * r), y), (x, y + (1.3 * r)), (x - (1.3 * r), y)]],
            PlotMark.Triangle => [[(x, y - (1.2 * r)), (x + (1.1 * r), y + (0.8 * r)), (x - (1.1 * r), y + (0.8 * r))]],
            _ => [[(x - r, y - r), (x + r, y + r)], [(x - r, y + r), (x + r, y - r)]],
        };
    }
}
