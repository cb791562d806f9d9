using System.IO;
using System.Text;

namespace ProbeCal.Host;

/// <summary>
/// Folds lines that are longer than a narrow terminal is wide, between words, under the start of their own text: a phone
/// shows every screen without words cut in two. A page ends every line, so nothing is left in it; what a program reads goes past it.
/// </summary>
internal sealed class FoldingWriter(TextWriter inner, int width) : TextWriter
{
    /// <summary>A terminal narrower than this is left to break lines itself.</summary>
    internal const int Narrowest = 20;

    /// <summary>Further lines start at most so far in.</summary>
    private const int DeepestIndent = 8;

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

        Fold(_line.ToString().TrimEnd('\r'));
        _line.Clear();
    }

    private void Fold(string line)
    {
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

        inner.WriteLine(rest);
    }
}
