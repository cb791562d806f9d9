using System;
using System.Collections.Generic;
using System.Text;

namespace ProbeCal.Station.Reports;

/// <summary>Breaks text into lines of a width.</summary>
internal static class TextFlow
{
    /// <summary>The lines; a word that no line holds is broken within.</summary>
    /// <param name="font">The face.</param>
    /// <param name="size">Its size, points.</param>
    /// <param name="text">The text, <see cref="FontFile.Showable"/>.</param>
    /// <param name="width">Width of a line, points.</param>
    internal static List<string> Lines(FontFile font, double size, string text, double width)
    {
        List<string> lines = [];
        string line = "";
        foreach (string word in text.Split(' ', StringSplitOptions.RemoveEmptyEntries))
        {
            foreach (string piece in Pieces(font, size, word, width))
            {
                bool begins = line.Length == 0;
                string longer = begins ? piece : line + " " + piece;
                if (!begins && width < font.Width(longer, size))
                {
                    lines.Add(line);
                    longer = piece;
                }

                line = longer;
            }
        }

        lines.Add(line);
        return lines;
    }

    private static IEnumerable<string> Pieces(FontFile font, double size, string word, double width)
    {
        if (font.Width(word, size) <= width)
        {
            yield return word;
            yield break;
        }

        StringBuilder piece = new();
        foreach (Rune rune in word.EnumerateRunes())
        {
            if (piece.Length != 0 && width < font.Width(piece.ToString() + rune, size))
            {
                yield return piece.ToString();
                piece.Clear();
            }

            piece.Append(rune.ToString());
        }

        yield return piece.ToString();
    }
}
