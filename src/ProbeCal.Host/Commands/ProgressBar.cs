using System;
using System.Globalization;
using ProbeCal.Station.Correcting;

namespace ProbeCal.Host.Commands;

/// <summary>
/// How far a long work is, on standard error, from two seconds on: a bar that is drawn over itself where a person looks on, a line every ten seconds where
/// a file does.
/// </summary>
internal sealed class ProgressBar
{
    private const int Width = 30;
    private static readonly TimeSpan QuietTime = TimeSpan.FromSeconds(2);
    private static readonly TimeSpan BetweenLines = TimeSpan.FromSeconds(10);

    private readonly Terminal _terminal;
    private TimeSpan _nextLine = QuietTime;
    private bool _drawn;

    internal ProgressBar(Terminal terminal)
    {
        _terminal = terminal;
    }

    /// <summary>A line for a person, below the bar.</summary>
    internal void Say(string line)
    {
        Clear();
        _terminal.Error.WriteLine(line);
    }

    /// <summary>Shows how far the work is.</summary>
    internal void Show(CorrectionProgress progress)
    {
        if (progress.Elapsed < QuietTime || progress.TotalBytes <= 0)
        {
            return;
        }

        double share = Math.Min(1, (double)progress.Bytes / progress.TotalBytes);
        double seconds = progress.Elapsed.TotalSeconds;
        string figures = string.Create(
            CultureInfo.InvariantCulture,
            $"{100 * share:F0} %, {progress.Rows} rows, {progress.Rows / seconds:F0} rows/s, {(share == 0 ? 0 : seconds * (1 - share) / share):F0} s left");
        if (_terminal.IsInteractive)
        {
            int full = (int)Math.Round(share * Width);
            _terminal.Error.Write("\r[" + new string('#', full) + new string('.', Width - full) + "] " + figures.PadRight(60));
            _terminal.Error.Flush();
            _drawn = true;
        }
        else if (_nextLine <= progress.Elapsed)
        {
            _terminal.Error.WriteLine("  " + figures);
            _nextLine = progress.Elapsed + BetweenLines;
        }
    }

    private void Clear()
    {
        if (_drawn)
        {
            _terminal.Error.Write("\r" + new string(' ', Width + 62) + "\r");
            _terminal.Error.Flush();
            _drawn = false;
        }
    }
}
