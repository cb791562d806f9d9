using System;
using System.IO;
using System.Text;

namespace ProbeCal.Host;

/// <summary>
/// Folds lines that are longer than a narrow terminal is wide, between words, under the start of their own text: a phone
/// shows every screen without words cut in two. A question has no end of line: flushing shows it. A command to be copied, and
/// a line that is drawn over itself, stay as they are; what a program reads goes past it.
/// </summary>
internal sealed class FoldingWriter(TextWriter inner, int width) : TextWriter
{
    /// <summary>A terminal narrower than this is left to break lines itself.</summary>
    internal const int Narrowest = 20;

    /// <summary>Further lines start at most so far in.</summary>
    private const int DeepestIndent = 8;

    /// <summary>How a line begins that a person copies back to the prompt: a break in it would end the command there.</summary>
    private const string Command = "probecal ";

    private readonly StringBuilder _line = new();

    /// <inheritdoc/>
    public override Encoding Encoding => inner.Encoding;

    /// <inheritdoc/>
    public override void Write(char value)
    {
        if (value != '\n')
        {
            _line.Append(value);
            return;
        }

        inner.WriteLine(Fold(_line.ToString().TrimEnd('\r')));
        _line.Clear();
    }

    /// <inheritdoc/>
    public override void Flush()
    {
        inner.Write(Fold(_line.ToString()));
        _line.Clear();
        inner.Flush();
    }

    /// <summary>Writes all but the last of the lines that a line is folded into, and gives that one back.</summary>
    private string Fold(string line)
    {
        if (line.Contains('\r', StringComparison.Ordinal) || line.StartsWith(Command, StringComparison.Ordinal))
        {
            return line;
        }

        int indent = 0;
        while (indent < line.Length && line[indent] == ' ')
        {
            indent++;
        }

        string further = new(' ', int.Min(indent + 2, DeepestIndent));
        string rest = line;
        while (width < rest.Length)
        {
            // The last blank that leaves a word before it; a word longer than the window is wide stays whole, to be copied.
            int at = rest.LastIndexOf(' ', width);
            if (at < 0 || string.IsNullOrWhiteSpace(rest[..at]))
            {
                at = rest.IndexOf(' ', rest.Length - rest.TrimStart().Length);
            }

            if (at < 0)
            {
                break;
            }

            inner.WriteLine(rest[..at].TrimEnd());
            rest = further + rest[at..].TrimStart();
        }

        return rest;
    }
}
