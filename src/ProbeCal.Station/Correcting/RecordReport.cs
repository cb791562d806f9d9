using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading;
using ProbeCal.Station.Entry;
using ProbeCal.Station.WholeFiles;

namespace ProbeCal.Station.Correcting;

/// <summary>What is asked of a report, as texts of options.</summary>
public sealed record RecordReportRequest
{
    /// <summary>The table; it is only read.</summary>
    public required string Input { get; init; }

    /// <summary>Which quantity is which column: time, concentration, percent, temperature, pressure, salinity.</summary>
    public required IReadOnlyList<string> Columns { get; init; }

    /// <summary>As in <see cref="CorrectionRequest"/>.</summary>
    public string? TimeOffset { get; init; }

    /// <summary>As in <see cref="CorrectionRequest"/>.</summary>
    public string? TimeForm { get; init; }

    /// <summary>As in <see cref="CorrectionRequest"/>.</summary>
    public string? Separator { get; init; }

    /// <summary>As in <see cref="CorrectionRequest"/>.</summary>
    public string? HeaderLine { get; init; }

    /// <summary>As in <see cref="CorrectionRequest"/>.</summary>
    public bool DecimalComma { get; init; }

    /// <summary>Pressure of all rows; null when a column has it or there is none.</summary>
    public string? Pressure { get; init; }

    /// <summary>Salinity of all rows; null when a column has it.</summary>
    public string? Salinity { get; init; }
}

/// <summary>
/// What a table of oxygen readings shows of itself: gaps, times that repeat or go back, a plateau below zero (the probe's zero offset, where the water had no
/// oxygen), and whether its % column stands on 1 atm or on the local pressure.
/// </summary>
public sealed class RecordReport
{
    /// <summary>A plateau lasts at least so long: our choice; a dip of a few samples is none.</summary>
    private static readonly TimeSpan ShortestPlateau = TimeSpan.FromHours(6);

    private static readonly ColumnQuantity[] Known =
    [
        new("time"), new("concentration", QuantityKind.MassConcentration), new("percent"), new("temperature", QuantityKind.Temperature),
        new("pressure", QuantityKind.Pressure), new("salinity", QuantityKind.Salinity),
    ];

    /// <summary>Rows under the header.</summary>
    public long Rows { get; private set; }

    /// <summary>Rows whose time could not be read.</summary>
    public long WithoutTime { get; private set; }

    /// <summary>Rows that repeat the time before them.</summary>
    public long Repeats { get; private set; }

    /// <summary>Rows whose time goes back.</summary>
    public long Backward { get; private set; }

    /// <summary>First and last time, UTC.</summary>
    public (DateTimeOffset First, DateTimeOffset Last) Span { get; private set; }

    /// <summary>The usual time from row to row: the median.</summary>
    public TimeSpan Interval { get; private set; }

    /// <summary>Gaps longer than one and a half usual intervals: from the last row before to the first after.</summary>
    public IReadOnlyList<(DateTimeOffset From, DateTimeOffset To)> Gaps { get; private set; } = [];

    /// <summary>Rows with a concentration.</summary>
    public long Concentrations { get; private set; }

    /// <summary>Rows with one below zero.</summary>
    public long BelowZero { get; private set; }

    /// <summary>The longest run of values below zero; null when none lasts <see cref="ShortestPlateau"/>.</summary>
    public Plateau? LongestPlateau { get; private set; }

    /// <summary>The % column against 1 atm; null when there is none.</summary>
    public PercentComparison? AgainstOneAtmosphere { get; private set; }

    /// <summary>The % column against the local pressure; null when there is none, or no pressure.</summary>
    public PercentComparison? AgainstLocal { get; private set; }

    /// <summary>Reads a table.</summary>
    /// <exception cref="InputException">A column or an option is wrong.</exception>
    public static RecordReport Of(RecordReportRequest request, CancellationToken stop)
    {
        using RawTable table = RawTable.Open(
            request.Input, request.Columns, Known, request.Separator, request.HeaderLine, request.DecimalComma, request.TimeOffset, request.TimeForm);
        RecordReport report = new();
        report.Read(table, request, stop);
        return report;
    }

    private void Read(RawTable table, RecordReportRequest request, CancellationToken stop)
    {
        int time = table.IndexOf("time");
        if (time < 0)
        {
            throw new InputException("--column time=... is missing: say which column holds the time, for example --column time=Time");
        }

        double fixedPressure = request.Pressure is string pressureText ? Quantity.PressureHectopascal("--pressure", pressureText) : double.NaN;
        double fixedSalinity = request.Salinity is string salinityText ? Quantity.Salinity("--salinity", salinityText) : double.NaN;
        bool hasPercent = 0 <= table.IndexOf("percent");
        if (hasPercent && (table.IndexOf("concentration") < 0 || table.IndexOf("temperature") < 0 || (table.IndexOf("salinity") < 0 && double.IsNaN(fixedSalinity))))
        {
            throw new InputException("a % column is judged beside concentration, temperature and salinity: map their columns, or say --salinity 0 for fresh water");
        }

        List<long> steps = [];
        List<(long Ticks, double Value)> run = [], longest = [];
        List<(DateTimeOffset, DateTimeOffset)> gaps = [];
        List<(long From, long To)> pairs = [];
        PercentSums oneAtmosphere = new(), local = new();
        long last = long.MinValue, first = 0;
        for (int i = 0; i < table.HeaderLines; i++)
        {
            table.Rows.Skip();
        }

        while (table.Rows.Read(table.Separator))
        {
            if (table.Rows.IsBlank)
            {
                continue;
            }

            Rows++;
            stop.ThrowIfCancellationRequested();
            if (table.Rows.Count != table.Header.Names.Count)
            {
                WithoutTime++;
                continue;
            }

            CellTimeOutcome outcome = table.Time.Read(table.Rows.Cell(time), out long ticks, out _);
            if (outcome == CellTimeOutcome.NoOffset)
            {
                throw new InputException($"{table.Name}: the times do not say their offset from UTC; say how the clock was set, for example --time-offset -04:00");
            }

            if (outcome != CellTimeOutcome.Read)
            {
                WithoutTime++;
                continue;
            }

            if (last != long.MinValue && ticks <= last)
            {
                Repeats += ticks == last ? 1 : 0;
                Backward += ticks < last ? 1 : 0;
            }
            else
            {
                if (last != long.MinValue)
                {
                    steps.Add(ticks - last);
                    pairs.Add((last, ticks));
                }

                first = last == long.MinValue ? ticks : first;
                last = ticks;
            }

            double concentration = Cell(table, "concentration");
            if (!double.IsNaN(concentration))
            {
                Concentrations++;
                BelowZero += concentration < 0 ? 1 : 0;
                if (concentration < 0)
                {
                    run.Add((ticks, concentration));
                }
                else
                {
                    (run, longest) = ([], Longer(run, longest));
                }
            }

            if (hasPercent)
            {
                Compare(table, concentration, fixedPressure, fixedSalinity, oneAtmosphere, local);
            }
        }

        if (steps.Count == 0)
        {
            throw new InputException($"{table.Name}: fewer than two times follow one another; there is nothing to report");
        }

        steps.Sort();
        Interval = TimeSpan.FromTicks(steps[steps.Count / 2]);
        foreach ((long from, long to) in pairs)
        {
            if (Interval.Ticks * 3 / 2 < to - from)
            {
                gaps.Add((new DateTimeOffset(from, TimeSpan.Zero), new DateTimeOffset(to, TimeSpan.Zero)));
            }
        }

        Gaps = gaps;
        Span = (new DateTimeOffset(first, TimeSpan.Zero), new DateTimeOffset(last, TimeSpan.Zero));
        LongestPlateau = PlateauOf(Longer(run, longest));
        AgainstOneAtmosphere = oneAtmosphere.ToComparison();
        AgainstLocal = local.ToComparison();
    }

    private static List<(long Ticks, double Value)> Longer(List<(long Ticks, double Value)> one, List<(long Ticks, double Value)> other)
    {
        return Length(other) < Length(one) ? one : other;
    }

    private static long Length(List<(long Ticks, double Value)> run)
    {
        return run.Count == 0 ? -1 : run[^1].Ticks - run[0].Ticks;
    }

    private static Plateau? PlateauOf(List<(long Ticks, double Value)> run)
    {
        if (Length(run) < ShortestPlateau.Ticks)
        {
            return null;
        }

        double[] values = [.. run.Select(static each => each.Value).Order()];
        double mean = values.Average();
        double deviation = Math.Sqrt(values.Sum(each => (each - mean) * (each - mean)) / Math.Max(1, values.Length - 1));
        return new Plateau(new DateTimeOffset(run[0].Ticks, TimeSpan.Zero), new DateTimeOffset(run[^1].Ticks, TimeSpan.Zero), values.Length, values[values.Length / 2], mean, deviation, values[0], values[^1]);
    }

    private static void Compare(RawTable table, double concentration, double fixedPressure, double fixedSalinity, PercentSums oneAtmosphere, PercentSums local)
    {
        double percent = Cell(table, "percent");
        double temperature = Cell(table, "temperature");
        double salinity = table.IndexOf("salinity") < 0 ? fixedSalinity : Cell(table, "salinity");
        double pressure = table.IndexOf("pressure") < 0 ? fixedPressure : Cell(table, "pressure");
        if (double.IsNaN(percent) || double.IsNaN(concentration))
        {
            return;
        }

        oneAtmosphere.Add(percent, concentration, temperature, salinity, PressureUnits.HectopascalPerAtmosphere);
        if (!double.IsNaN(pressure))
        {
            local.Add(percent, concentration, temperature, salinity, pressure);
        }
    }

    private static double Cell(RawTable table, string quantity)
    {
        int index = table.IndexOf(quantity);
        if (index < 0 || !CellNumber.TryParse(table.Rows.Cell(index), table.DecimalMark, out double value))
        {
            return double.NaN;
        }

        return table.UnitOf(quantity) is QuantityUnit unit ? unit.ToCanonical(value) : value;
    }

    private sealed class PercentSums
    {
        private long _rows;
        private double _largest;
        private double _largestAt = double.NaN;
        private double _squares;

        /// <summary>Adds a row: % = 100 C/C*(T, S, P), Benson and Krause 1984.</summary>
        internal void Add(double percent, double concentration, double temperature, double salinity, double pressure)
        {
            Status status = BensonKrause1984.MilligramsPerLitre(temperature, salinity, pressure, RangeRule.Refuse, out double full);
            if (status != Status.Ok || full <= 0)
            {
                return;
            }

            double difference = percent - (100 * concentration / full);
            _rows++;
            _squares += difference * difference;
            if (_rows == 1 || Math.Abs(_largest) < Math.Abs(difference))
            {
                (_largest, _largestAt) = (difference, percent);
            }
        }

        internal PercentComparison? ToComparison()
        {
            return _rows == 0 ? null : new PercentComparison(_rows, _largest, _largestAt, Math.Sqrt(_squares / _rows));
        }
    }
}

/// <summary>A run of values below zero.</summary>
/// <param name="From">Its first row, UTC.</param>
/// <param name="To">Its last.</param>
/// <param name="Rows">Values in it.</param>
/// <param name="Median">Their median, mg/L: the zero offset, where the water had no oxygen.</param>
/// <param name="Mean">Their mean, mg/L.</param>
/// <param name="StandardDeviation">Their standard deviation, mg/L.</param>
/// <param name="Lowest">The lowest, mg/L.</param>
/// <param name="Highest">The highest, mg/L.</param>
public sealed record Plateau(DateTimeOffset From, DateTimeOffset To, long Rows, double Median, double Mean, double StandardDeviation, double Lowest, double Highest);

/// <summary>A % column against % computed from mg/L, temperature and salinity.</summary>
/// <param name="Rows">Rows compared.</param>
/// <param name="Largest">The largest difference, column less computed, % points.</param>
/// <param name="At">What the column says there.</param>
/// <param name="RootMeanSquare">Root of the mean square of all differences, % points.</param>
public sealed record PercentComparison(long Rows, double Largest, double At, double RootMeanSquare);
