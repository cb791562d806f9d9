using System.Globalization;

namespace ProbeCal.Station.TableWriting;

/// <summary>
/// What the C reader of a float table computes, operation by operation in 32-bit numbers, so that the error that is proved holds for it too.
/// </summary>
internal sealed class SingleLookup
{
    private readonly GasTable _table;
    private readonly float[] _values;

    internal SingleLookup(GasTable table)
    {
        _table = table;
        _values = new float[table.Texts.Length];
        for (int i = 0; i < _values.Length; i++)
        {
            _values[i] = float.Parse(table.Texts[i], NumberStyles.Float, CultureInfo.InvariantCulture);
        }
    }

    /// <summary>The value inside the table; the inputs are rounded to 32 bits first.</summary>
    internal double Read(double celsius, double across)
    {
        float down = Position(_table.Rows, (float)celsius);
        int row = Cell(down, _table.Rows.Count);
        float fraction = (float)(down - (float)row);
        if (_table.Columns is not TableAxis columns)
        {
            return Between(_values[row], _values[row + 1], fraction);
        }

        float along = Position(columns, (float)across);
        int column = Cell(along, columns.Count);
        float part = (float)(along - (float)column);
        int at = (row * columns.Count) + column;
        float above = Between(_values[at], _values[at + 1], part);
        float below = Between(_values[at + columns.Count], _values[at + columns.Count + 1], part);
        return Between(above, below, fraction);
    }

    private static float Between(float low, float high, float part)
    {
        return (float)(low + (float)((float)(high - low) * part));
    }

    private static float Position(TableAxis axis, float at)
    {
        return (float)((float)(at - (float)axis.First) * (float)axis.PerUnit);
    }

    private static int Cell(float position, int count)
    {
        return position < count - 2 ? (int)position : count - 2;
    }
}
