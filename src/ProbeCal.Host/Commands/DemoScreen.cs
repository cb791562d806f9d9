using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using Spectre.Console;

namespace ProbeCal.Host.Commands;

/// <summary>What the demo shows: its steps, the commands, and the readings as they come back from the broker.</summary>
internal sealed class DemoScreen
{
    private const int RowsShown = 12;

    private readonly Terminal _terminal;
    private readonly IAnsiConsole _console;

    internal DemoScreen(Terminal terminal)
    {
        _terminal = terminal;
        _console = AnsiConsole.Create(new AnsiConsoleSettings { Out = new AnsiConsoleOutput(terminal.Output) });
    }

    internal void Title(string site)
    {
        _console.MarkupLineInterpolated($"[bold]ProbeCal demo at {site}[/]");
        _console.MarkupLine("[bold]Everything below is SIMULATED. Nothing is measured.[/]");
    }

    internal void Step(int number, string what)
    {
        _terminal.Output.WriteLine();
        _console.MarkupLineInterpolated($"[bold]{number}. {what}[/]");
    }

    internal void Command(IEnumerable<string> arguments)
    {
        // Past Spectre, which would break the line: what stands here is to be copied.
        _terminal.Output.WriteLine("> probecal " + string.Join(' ', arguments.Select(Quoted)));
    }

    internal void End(string? complaint)
    {
        if (complaint is not null)
        {
            _terminal.Error.WriteLine(complaint);
        }

        _console.WriteLine();
        _console.WriteLine("The demo has ended and left nothing behind. Next: README.md, or probecal --help.");
    }

    /// <summary>Shows readings until there were enough of them.</summary>
    internal async Task WatchAsync(IAsyncEnumerable<DemoReading> readings, DemoTruth truth, long enough, CancellationToken stop)
    {
        if (_terminal.IsInteractive)
        {
            await _console.Live(Table([])).StartAsync(context => ShowAsync(readings, truth, enough, rows => context.UpdateTarget(Table(rows)), stop)).ConfigureAwait(false);
        }
        else
        {
            _terminal.Output.WriteLine(string.Join("  ", Columns));
            await ShowAsync(readings, truth, enough, rows => _terminal.Output.WriteLine(string.Join("  ", rows[^1])), stop).ConfigureAwait(false);
        }
    }

    private static readonly string[] Columns = ["time (UTC)", "raw nA", "°C", "hPa", "mg/L ± U (k = 2)", "true mg/L", "% local", "flag"];

    private static async Task ShowAsync(IAsyncEnumerable<DemoReading> readings, DemoTruth truth, long enough, Action<List<string[]>> show, CancellationToken stop)
    {
        List<string[]> rows = [];
        long count = 0;
        await foreach (DemoReading reading in readings.WithCancellation(stop).ConfigureAwait(false))
        {
            rows.Add(Row(reading, truth.At(reading.Time)));
            if (RowsShown < rows.Count)
            {
                rows.RemoveAt(0);
            }

            show(rows);
            if (enough <= ++count)
            {
                return;
            }
        }
    }

    private static string[] Row(DemoReading r, double? truth)
    {
        return
        [
            r.Time.ToString("HH:mm:ss", CultureInfo.InvariantCulture),
            Fixed(r.Signal, "F3"),
            Fixed(r.Temperature, "F2"),
            Fixed(r.Pressure, "F1"),
            Fixed(r.MilligramsPerLitre, "F2") + " ± " + Fixed(2 * r.Uncertainty, "F2"),
            Fixed(truth, "F2"),
            Fixed(r.PercentLocal, "F1"),
            r.Flag switch { 1 => "1 pass", 3 => "3 suspect", 4 => "4 fail", 9 => "9 missing", _ => "2 not evaluated" },
        ];
    }

    private static Table Table(List<string[]> rows)
    {
        Table table = new Table().Border(TableBorder.Horizontal).Title("corrected readings from the broker, SIMULATED").Caption("Ctrl-C ends the demo");
        foreach (string column in Columns)
        {
            table.AddColumn(new TableColumn(column) { Alignment = Justify.Right });
        }

        foreach (string[] row in rows)
        {
            table.AddRow(row);
        }

        return table;
    }

    private static string Fixed(double? value, string format)
    {
        return value is double number && double.IsFinite(number) ? number.ToString(format, CultureInfo.InvariantCulture) : "—";
    }

    private static string Quoted(string argument)
    {
        return argument.AsSpan().IndexOfAny(" {}()") < 0 ? argument : "\"" + argument + "\"";
    }
}
