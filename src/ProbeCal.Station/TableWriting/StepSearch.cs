using System;
using System.Collections.Generic;
using System.Threading;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.TableWriting;

/// <summary>
/// Chooses the steps of a table: the fewest nodes at steps of few decimals that keep to the allowed error, and the proof that they do.
/// </summary>
/// <remarks>
/// Interpolating along one axis and then the other errs by no more than the two errors of the single axes together, so they are estimated apart
/// and shared out. The estimate only orders the candidates; what is handed out has been proved.
/// </remarks>
internal sealed class StepSearch
{
    /// <summary>How many tables are tried that are larger than the estimate needs.</summary>
    private const int ProofsBeyond = 4;

    /// <summary>How many tables are tried at most.</summary>
    private const int ProofsTried = 24;

    /// <summary>Most decimals that a value is written with.</summary>
    private const int MostDecimals = 24;

    /// <summary>How many tables in a row may bring next to nothing.</summary>
    private const int ProofsInVain = 4;

    private readonly TableSubject _subject;
    private readonly TablePrecision _precision;
    private readonly AllowedError? _allowed;
    private readonly Action<double>? _progress;
    private readonly CancellationToken _stop;

    internal StepSearch(TableSubject subject, TablePrecision precision, AllowedError? allowed, Action<double>? progress, CancellationToken stop)
    {
        _subject = subject;
        _precision = precision;
        _allowed = allowed;
        _progress = progress;
        _stop = stop;
    }

    /// <summary>Makes the table.</summary>
    /// <param name="rows">Temperatures; a count of 0 leaves the step to the search.</param>
    /// <param name="columns">The other axis, likewise; null for none.</param>
    /// <param name="decimals">Decimals of the values; null to follow the error.</param>
    /// <exception cref="InputException">The error cannot be kept; the line says what can.</exception>
    internal (GasTable Table, ErrorProof Proof) Find(TableAxis rows, TableAxis? columns, int? decimals)
    {
        if (rows.Count != 0 && columns is not { Count: 0 })
        {
            return Fixed(rows, columns, decimals);
        }

        if (_allowed is null)
        {
            throw new InputException("--error is missing: say which interpolation error is allowed, for example --error 0.01mg/L or --error 0.05%, or give every step");
        }

        ErrorProof? best = null;
        GasTable? bestTable = null;
        int tried = 0;
        int inVain = 0;
        foreach ((int rowSteps, int columnSteps) in Candidates(rows, columns))
        {
            GasTable table = Make(rows.With(rowSteps), columns?.With(columnSteps), decimals ?? DecimalsFor(_allowed, rows, columns));
            ErrorProof proof = ErrorProof.Over(table, _progress, _stop);
            if (_allowed.IsMetBy(proof))
            {
                return (table, proof);
            }

            // Where finer steps no longer help, rounding is what is left.
            inVain = best is null || _allowed.Of(proof) < 0.9 * _allowed.Of(best) ? 0 : inVain + 1;
            if (best is null || _allowed.Of(proof) < _allowed.Of(best))
            {
                best = proof;
                bestTable = table;
            }

            if (++tried == ProofsTried || inVain == ProofsInVain)
            {
                break;
            }
        }

        throw Unreachable(best, bestTable);
    }

    private (GasTable, ErrorProof) Fixed(TableAxis rows, TableAxis? columns, int? decimals)
    {
        if (TableLimits.MostNodes < (long)rows.Count * (columns?.Count ?? 1))
        {
            throw new InputException(string.Create(System.Globalization.CultureInfo.InvariantCulture,
                $"these steps make {(long)rows.Count * (columns?.Count ?? 1)} values; a table takes at most {TableLimits.MostNodes}"));
        }

        GasTable table = Make(rows, columns, decimals ?? (_allowed is null ? DecimalsForSteps(rows, columns) : DecimalsFor(_allowed, rows, columns)));
        ErrorProof proof = ErrorProof.Over(table, _progress, _stop);
        if (100 <= proof.LargestPercent && proof.Largest <= Math.Pow(10, -MostDecimals))
        {
            throw new InputException($"the values of this table are too small to be written with {MostDecimals} decimals: all of them would be 0; look at --mole-fraction and its unit");
        }

        if (_allowed is null || _allowed.IsMetBy(proof))
        {
            return (table, proof);
        }

        throw new InputException(
            $"the steps are too coarse for --error {_allowed.Text}: the largest error found is {_allowed.Print(_allowed.Of(proof), _subject.Unit)}; take finer ones, or leave a step out and it is chosen");
    }

    private GasTable Make(TableAxis rows, TableAxis? columns, int decimals)
    {
        return GasTable.Make(_subject, rows, columns, decimals, _precision);
    }

    /// <summary>
    /// Pairs of steps in the order of their number of values, from those that either axis alone would allow to those that the sum of both errors allows.
    /// </summary>
    private IEnumerable<(int Rows, int Columns)> Candidates(TableAxis rows, TableAxis? columns)
    {
        List<int> rowSteps = Steps(rows);
        List<int> columnSteps = columns is null ? [0] : Steps(columns);
        double allowed = _allowed!.Value;
        List<(long Nodes, int Row, int Column)> possible = [];
        long safe = TableLimits.MostNodes;
        for (int column = 0; column < columnSteps.Count; column++)
        {
            _stop.ThrowIfCancellationRequested();
            long across = columnSteps[column] + 1L;
            double error = columns is null ? 0 : Across(columns.With(columnSteps[column]), rows);
            int first = error <= allowed ? Coarsest(rowSteps, rows, columns, allowed) : -1;
            if (first < 0) { continue; }
            int last = error < allowed ? Coarsest(rowSteps, rows, columns, allowed - error) : -1;
            if (0 <= last) { safe = Math.Min(safe, (rowSteps[last] + 1L) * across); }
            // The estimate may be a little low: two finer ones are kept in hand.
            int end = last < 0 ? rowSteps.Count - 1 : Math.Min(last + 2, rowSteps.Count - 1);
            for (int row = first; row <= end && (rowSteps[row] + 1L) * across <= TableLimits.MostNodes; row++)
            {
                possible.Add(((rowSteps[row] + 1L) * across, row, column));
            }
        }

        possible.Sort();
        int beyond = 0;
        foreach ((long nodes, int row, int column) in possible)
        {
            (int Rows, int Columns) steps = (rowSteps[row], columnSteps[column]);
            if (IsWorthProving(rows.With(steps.Rows), columns?.With(steps.Columns)))
            {
                yield return steps;
                beyond += safe < nodes ? 1 : 0;
            }

            if (beyond == ProofsBeyond) { yield break; }
        }

        // Nothing fits by the estimate: the finest there is tells what is the best that can be found.
        if (possible.Count == 0)
        {
            int column = Math.Max(0, columnSteps.FindLastIndex(static steps => steps <= 64));
            for (int back = 0; back < 3; back++)
            {
                int row = rowSteps.FindLastIndex(steps => (steps + 1L) * (columnSteps[column] + 1L) <= TableLimits.MostNodes >> (2 * back));
                if (0 <= row) { yield return (rowSteps[row], columnSteps[column]); }
            }
        }
    }

    /// <summary>A quick look at some cells, in their middles and on their sides, before the whole is compared.</summary>
    private bool IsWorthProving(TableAxis rows, TableAxis? columns)
    {
        const int Cells = 40;
        if (columns is null) { return true; }
        int down = Math.Max(1, (rows.Count - 1) / Cells);
        int along = Math.Max(1, (columns.Count - 1) / Cells);
        for (int row = 0; row < rows.Count - 1; row += down)
        {
            for (int column = 0; column < columns.Count - 1; column += along)
            {
                double t = rows.Node(row), t2 = rows.Node(row + 1), a = columns.Node(column), a2 = columns.Node(column + 1);
                double v00 = At(t, a), v01 = At(t, a2), v10 = At(t2, a), v11 = At(t2, a2);
                if (Misses(0.5 * (v00 + v10), 0.5 * (t + t2), a) || Misses(0.5 * (v00 + v01), t, 0.5 * (a + a2))
                    || Misses(0.25 * (v00 + v01 + v10 + v11), 0.5 * (t + t2), 0.5 * (a + a2)))
                {
                    return false;
                }
            }
        }

        return true;

        double At(double celsius, double across) => _subject.Value(celsius, columns.Quantity, across);

        bool Misses(double read, double celsius, double across)
        {
            double truth = At(celsius, across);
            double error = Math.Abs(read - truth);
            return _allowed!.Value < (_allowed.IsPercent ? 100 * error / Math.Abs(truth) : error);
        }
    }

    private int Coarsest(List<int> steps, TableAxis rows, TableAxis? columns, double allowed)
    {
        int low = 0;
        int high = steps.Count - 1;
        if (allowed < Down(rows.With(steps[high]), columns))
        {
            return -1;
        }

        while (low < high)
        {
            int half = (low + high) / 2;
            if (Down(rows.With(steps[half]), columns) <= allowed) { high = half; } else { low = half + 1; }
        }

        return low;
    }

    private static List<int> Steps(TableAxis axis)
    {
        if (axis.Count != 0)
        {
            return [axis.Count - 1];
        }

        List<int> steps = [];
        for (int count = 1; count <= TableLimits.MostSteps; count++)
        {
            if (axis.IsReadable(count)) { steps.Add(count); }
        }

        return steps;
    }

    /// <summary>Error of interpolating over temperature alone, estimated in the columns at the ends and in the middle.</summary>
    private double Down(TableAxis rows, TableAxis? columns)
    {
        double largest = 0;
        foreach (double at in columns is null ? [0.0] : new[] { columns.First, 0.5 * (columns.First + columns.Last), columns.Last })
        {
            largest = Math.Max(largest, Estimate(rows, t => _subject.Value(t, columns?.Quantity ?? AxisQuantity.Temperature, at)));
        }

        return largest;
    }

    private double Across(TableAxis columns, TableAxis rows)
    {
        double largest = 0;
        foreach (double celsius in new[] { rows.First, 0.5 * (rows.First + rows.Last), rows.Last })
        {
            largest = Math.Max(largest, Estimate(columns, at => _subject.Value(celsius, columns.Quantity, at)));
        }

        return largest;
    }

    private double Estimate(TableAxis axis, Func<double, double> value)
    {
        // Smooth functions bend alike in neighbouring cells: of a fine table a part is enough.
        int stride = Math.Max(1, (axis.Count - 1) / 200);
        double largest = 0;
        for (int cell = 0; cell < axis.Count - 1; cell += stride)
        {
            double from = axis.Node(cell);
            double to = axis.Node(cell + 1);
            double low = value(from);
            double high = value(to);
            foreach (double part in new[] { 0.25, 0.5, 0.75 })
            {
                double truth = value(from + (part * (to - from)));
                double error = Math.Abs(low + (part * (high - low)) - truth);
                largest = Math.Max(largest, _allowed is { IsPercent: true } ? 100 * error / Math.Abs(truth) : error);
            }
        }

        return largest;
    }

    /// <summary>Decimals whose rounding costs at most a fiftieth of the allowed error.</summary>
    private int DecimalsFor(AllowedError allowed, TableAxis rows, TableAxis? columns)
    {
        double absolute = allowed.IsPercent ? allowed.Value / 100 * Smallest(rows, columns) : allowed.Value;
        return DecimalsOf(absolute / 25);
    }

    private int DecimalsForSteps(TableAxis rows, TableAxis? columns)
    {
        double error = Math.Max(Down(rows, columns), columns is null ? 0 : Across(columns, rows));
        return DecimalsOf(Math.Max(error / 25, Smallest(rows, columns) * 1e-12));
    }

    private static int DecimalsOf(double step)
    {
        return Math.Clamp((int)Math.Ceiling(-Math.Log10(step)), 0, MostDecimals);
    }

    /// <summary>The smallest value at the corners; the quantities here are monotone along each axis.</summary>
    internal double Smallest(TableAxis rows, TableAxis? columns)
    {
        double smallest = double.PositiveInfinity;
        foreach (double celsius in new[] { rows.First, 0.5 * (rows.First + rows.Last), rows.Last })
        {
            foreach (double at in columns is null ? [0.0] : new[] { columns.First, columns.Last })
            {
                smallest = Math.Min(smallest, Math.Abs(_subject.Value(celsius, columns?.Quantity ?? AxisQuantity.Temperature, at)));
            }
        }

        return smallest;
    }

    private InputException Unreachable(ErrorProof? best, GasTable? table)
    {
        string values = _precision == TablePrecision.Single ? "float values" : "a table of at most " + Number.Print(TableLimits.MostNodes) + " values";
        string advice = _precision == TablePrecision.Single ? "; take double values (--format c-double) or allow more" : "; allow more";
        return best is null || table is null
            ? new InputException($"--error {_allowed!.Text} cannot be reached with {values} at these steps{advice}")
            : new InputException(
                $"--error {_allowed!.Text} cannot be reached with {values}: the best found is {_allowed.Print(_allowed.Of(best), _subject.Unit)}{advice}");
    }
}
