using System;
using System.Collections.Generic;
using System.Threading;

namespace ProbeCal.Station.TableWriting;

/// <summary>The largest distance between a table, read as it will be read, and its equation.</summary>
/// <param name="Largest">Largest error found, in the unit of the values.</param>
/// <param name="At">Where: the temperature.</param>
/// <param name="AtAcross">Where: the other axis; 0 for a table by temperature alone.</param>
/// <param name="LargestPercent">Largest error found as a share of the value, %.</param>
/// <param name="PercentAt">Where: the temperature.</param>
/// <param name="PercentAtAcross">Where: the other axis.</param>
/// <param name="RowPoints">Number of temperatures tried.</param>
/// <param name="ColumnPoints">Number of places tried on the other axis, each at every temperature.</param>
internal sealed record ErrorProof(
    double Largest, double At, double AtAcross, double LargestPercent, double PercentAt, double PercentAtAcross, int RowPoints, int ColumnPoints)
{
    /// <summary>Least parts of a cell, even so that its middle is among them.</summary>
    private const int LeastParts = 8;

    /// <summary>Least points along an axis, however few its cells.</summary>
    private const int LeastPoints = 200;

    /// <summary>
    /// Compares over a dense grid: the nodes, points inside every cell with its middle, and the numbers next to each node on both sides,
    /// where a rounded position could fall into the wrong cell.
    /// </summary>
    internal static ErrorProof Over(GasTable table, Action<double>? progress, CancellationToken stop)
    {
        bool single = table.Precision == TablePrecision.Single;
        Func<double, double, double> read = single ? new SingleLookup(table).Read : table.Read;
        double[] temperatures = Points(table.Rows, single);
        double[] others = table.Columns is null ? [0] : Points(table.Columns, single);
        AxisQuantity across = table.Columns?.Quantity ?? AxisQuantity.Temperature;
        double largest = -1;
        double percent = -1;
        double at = 0, atAcross = 0, percentAt = 0, percentAtAcross = 0;
        for (int i = 0; i < temperatures.Length; i++)
        {
            stop.ThrowIfCancellationRequested();
            progress?.Invoke((double)i / temperatures.Length);
            foreach (double other in others)
            {
                double truth = table.Subject.Value(temperatures[i], across, other);
                double error = Math.Abs(read(temperatures[i], other) - truth);
                double share = 100 * error / Math.Abs(truth);
                // Written so that a NaN counts as the largest error and not as none.
                if (!(error <= largest)) { (largest, at, atAcross) = (error, temperatures[i], other); }
                if (!(share <= percent)) { (percent, percentAt, percentAtAcross) = (share, temperatures[i], other); }
            }
        }

        return new ErrorProof(largest, at, atAcross, percent, percentAt, percentAtAcross, temperatures.Length, others.Length);
    }

    private static double[] Points(TableAxis axis, bool single)
    {
        int cells = axis.Count - 1;
        int parts = Math.Max(LeastParts, 2 * (int)Math.Ceiling(LeastPoints / (2.0 * cells)));
        SortedSet<double> points = [];
        for (int cell = 0; cell <= cells; cell++)
        {
            double node = axis.Node(cell);
            Add(single ? MathF.BitDecrement((float)node) : Math.BitDecrement(node));
            Add(single ? MathF.BitIncrement((float)node) : Math.BitIncrement(node));
            for (int part = 0; part < (cell == cells ? 1 : parts); part++)
            {
                double inside = node + (axis.Step * part / parts);
                Add(single ? (float)inside : inside);
            }
        }

        return [.. points];

        void Add(double point)
        {
            if (axis.First <= point && point <= axis.Last) { points.Add(point); }
        }
    }
}
