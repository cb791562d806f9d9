using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>One page of a PDF: text, lines and marks, measured in points from its upper left corner.</summary>
internal sealed class PdfPage(double width, double height)
{
    private readonly StringBuilder _content = new();
    private readonly Dictionary<FontFile, HashSet<Rune>> _shown = new() { [FontFile.Regular] = [], [FontFile.Bold] = [] };

    /// <summary>Width, points.</summary>
    internal double Width => width;

    /// <summary>Height, points.</summary>
    internal double Height => height;

    /// <summary>The operators, as PDF has them.</summary>
    internal string Content => _content.ToString();

    /// <summary>The characters shown in a face.</summary>
    internal IEnumerable<Rune> Shown(FontFile font)
    {
        return _shown[font].OrderBy(static rune => rune.Value);
    }

    /// <summary>A text on its baseline. It must be <see cref="FontFile.Showable"/>.</summary>
    internal void Text(FontFile font, double size, double x, double y, string text, bool upright = false)
    {
        StringBuilder glyphs = new();
        foreach (Rune rune in text.EnumerateRunes())
        {
            _shown[font].Add(rune);
            glyphs.Append(CultureInfo.InvariantCulture, $"{font.Glyph(rune):X4}");
        }

        string turned = upright ? "0 1 -1 0" : "1 0 0 1";
        _content.Append(CultureInfo.InvariantCulture, $"BT /{(font == FontFile.Bold ? "F1" : "F0")} {N(size)} Tf {turned} {N(x)} {N(height - y)} Tm <{glyphs}> Tj ET\n");
    }

    /// <summary>A line through places.</summary>
    internal void Line(PlotStroke stroke, double thickness, IReadOnlyList<(double X, double Y)> places)
    {
        string dashes = stroke switch
        {
            PlotStroke.Dashed => "[5 3]",
            PlotStroke.Dotted => "[1 2]",
            _ => "[]",
        };
        _content.Append(CultureInfo.InvariantCulture, $"{dashes} 0 d {N(thickness)} w {Path(places)} S\n");
    }

    /// <summary>An empty box.</summary>
    internal void Box(double x, double y, double wide, double high, double thickness)
    {
        _content.Append(CultureInfo.InvariantCulture, $"[] 0 d {N(thickness)} w {N(x)} {N(height - y - high)} {N(wide)} {N(high)} re S\n");
    }

    /// <summary>A plot with its upper left corner here.</summary>
    internal void Plot(ReportPlot plot, double left, double top, double wide, double high)
    {
        foreach (DrawnPart part in PlotDrawing.Of(plot, wide, high))
        {
            switch (part)
            {
                case DrawnLine line:
                    Line(line.Stroke, line.Width, [.. line.Places.Select(place => (left + place.X, top + place.Y))]);
                    break;
                case DrawnMark mark:
                    Mark(mark with { X = left + mark.X, Y = top + mark.Y });
                    break;
                case DrawnText text:
                    Hang(text, left, top);
                    break;
            }
        }
    }

    private void Hang(DrawnText text, double left, double top)
    {
        string shown = FontFile.Regular.Showable(text.Text);
        double back = FontFile.Regular.Width(shown, text.Size) * (text.Anchor switch { TextAnchor.Middle => 0.5, TextAnchor.End => 1, _ => 0 });
        Text(FontFile.Regular, text.Size, left + text.X - (text.Upright ? 0 : back), top + text.Y + (text.Upright ? back : 0), shown, text.Upright);
    }

    private void Mark(DrawnMark mark)
    {
        _content.Append("[] 0 d 0.9 w 0 g 0 G ");
        if (mark.Mark is PlotMark.Ring or PlotMark.Disc)
        {
            Circle(mark);
        }
        else
        {
            foreach (IReadOnlyList<(double X, double Y)> stroke in MarkShapes.Strokes(mark))
            {
                _content.Append(mark.Mark switch
                {
                    PlotMark.Cross => Path(stroke) + " S ",
                    PlotMark.Diamond => Path(stroke) + " b ",
                    _ => "1 g " + Path(stroke) + " b ",
                });
            }
        }

        _content.Append("0 g\n");
    }

    private void Circle(DrawnMark mark)
    {
        // A quarter circle as a cubic curve: 4/3·(√2 − 1) of the radius.
        double r = mark.Radius;
        double k = 0.5522847498 * r;
        double x = mark.X;
        double y = height - mark.Y;
        _content.Append(CultureInfo.InvariantCulture,
            $"{(mark.Mark == PlotMark.Ring ? "1 g " : "")}{N(x + r)} {N(y)} m {N(x + r)} {N(y + k)} {N(x + k)} {N(y + r)} {N(x)} {N(y + r)} c {N(x - k)} {N(y + r)} {N(x - r)} {N(y + k)} {N(x - r)} {N(y)} c {N(x - r)} {N(y - k)} {N(x - k)} {N(y - r)} {N(x)} {N(y - r)} c {N(x + k)} {N(y - r)} {N(x + r)} {N(y - k)} {N(x + r)} {N(y)} c b ");
    }

    private string Path(IReadOnlyList<(double X, double Y)> places)
    {
        return string.Join(' ', places.Select((place, i) => $"{N(place.X)} {N(height - place.Y)} {(i == 0 ? "m" : "l")}"));
    }

    private static string N(double value)
    {
        return Number.Print(Math.Round(value, 2));
    }
}
