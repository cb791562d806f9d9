using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>A plot as SVG: a title and a description for readers who hear it, black lines and marks for those who see it.</summary>
internal static class PlotSvg
{
    /// <summary>Typefaces of pages and pictures: what most systems have, nothing fetched.</summary>
    internal const string Faces = "\"Liberation Sans\", Arial, Helvetica, \"DejaVu Sans Condensed\", sans-serif";

    /// <summary>The element, without an XML head.</summary>
    /// <param name="plot">What to show.</param>
    /// <param name="width">Width, points.</param>
    /// <param name="height">Height, points.</param>
    /// <param name="unit">Unit of both in the element; none within another picture, whose own units would be enlarged by it.</param>
    internal static string Element(ReportPlot plot, double width, double height, string unit = "pt")
    {
        StringBuilder svg = new();
        string id = PageText.Escape(plot.Id);
        svg.Append(CultureInfo.InvariantCulture, $"<svg xmlns=\"http://www.w3.org/2000/svg\" role=\"img\" aria-labelledby=\"{id}-title {id}-description\" viewBox=\"0 0 {N(width)} {N(height)}\" width=\"{N(width)}{unit}\" height=\"{N(height)}{unit}\">\n");
        svg.Append(CultureInfo.InvariantCulture, $"<title id=\"{id}-title\">{PageText.Escape(plot.Title)}</title>\n<desc id=\"{id}-description\">{PageText.Escape(plot.Description)}</desc>\n");
        svg.Append(CultureInfo.InvariantCulture, $"<g fill=\"none\" stroke=\"#000\" font-family='{Faces}'>\n");
        foreach (DrawnPart part in PlotDrawing.Of(plot, width, height))
        {
            svg.Append(Part(part)).Append('\n');
        }

        return svg.Append("</g>\n</svg>\n").ToString();
    }

    private static string Part(DrawnPart part)
    {
        return part switch
        {
            DrawnLine line => $"<polyline stroke-width=\"{N(line.Width)}\"{Dashes(line.Stroke)} points=\"{Places(line.Places)}\"/>",
            DrawnMark mark => Mark(mark),
            DrawnText text => $"<text fill=\"#000\" stroke=\"none\" font-size=\"{N(text.Size)}\" text-anchor=\"{Anchor(text.Anchor)}\"{Place(text)}>{PageText.Escape(text.Text)}</text>",
            _ => "",
        };
    }

    private static string Place(DrawnText text)
    {
        return text.Upright ? $" transform=\"translate({N(text.X)} {N(text.Y)}) rotate(-90)\"" : $" x=\"{N(text.X)}\" y=\"{N(text.Y)}\"";
    }

    private static string Mark(DrawnMark mark)
    {
        return mark.Mark is PlotMark.Ring or PlotMark.Disc
            ? $"<circle cx=\"{N(mark.X)}\" cy=\"{N(mark.Y)}\" r=\"{N(mark.Radius)}\" stroke-width=\"0.9\" fill=\"{(mark.Mark == PlotMark.Disc ? "#000" : "#fff")}\"/>"
            : $"<path stroke-width=\"0.9\" fill=\"{Fill(mark.Mark)}\" d=\"{string.Concat(MarkShapes.Strokes(mark).Select(Stroke))}\"/>";

        string Stroke(IReadOnlyList<(double X, double Y)> places)
        {
            return "M" + Places(places) + (mark.Mark == PlotMark.Cross ? "" : "Z");
        }
    }

    private static string Fill(PlotMark mark)
    {
        return mark switch
        {
            PlotMark.Diamond => "#000",
            PlotMark.Cross => "none",
            _ => "#fff",
        };
    }

    private static string Dashes(PlotStroke stroke)
    {
        return stroke switch
        {
            PlotStroke.Dashed => " stroke-dasharray=\"5 3\"",
            PlotStroke.Dotted => " stroke-dasharray=\"1 2\"",
            _ => "",
        };
    }

    private static string Anchor(TextAnchor anchor)
    {
        return anchor switch
        {
            TextAnchor.Middle => "middle",
            TextAnchor.End => "end",
            _ => "start",
        };
    }

    private static string Places(IReadOnlyList<(double X, double Y)> places)
    {
        return string.Join(' ', places.Select(static place => N(place.X) + "," + N(place.Y)));
    }

    private static string N(double value)
    {
        return Number.Fixed(value, 2);
    }
}
