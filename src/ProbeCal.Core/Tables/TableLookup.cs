namespace ProbeCal;

/// <summary>
/// Looks a value up in a table of evenly spaced nodes, linear between them: for a controller that cannot afford the equations.
/// </summary>
/// <remarks>
/// The arrays come from <c>probecal tables</c>, whose output says the largest error found over a dense grid with this very
/// interpolation. The C reader that the same command writes does the same operations in the same order, so that its double
/// form gives the same bits. Nothing is extrapolated and nothing clamped: a table ends where it ends. Allocates nothing.
/// </remarks>
public static class TableLookup
{
    /// <summary>Value at a temperature, linear between the two nodes beside it.</summary>
    /// <param name="values">Values at evenly spaced temperatures, the first at <paramref name="firstCelsius"/>; two or more.</param>
    /// <param name="firstCelsius">Temperature of the first value, °C.</param>
    /// <param name="lastCelsius">Temperature of the last value, °C, above the first.</param>
    /// <param name="celsius">Temperature asked for, °C, inside the table.</param>
    /// <param name="value">The value in the table's unit; NaN unless Ok.</param>
    /// <returns>
    /// The input at fault; PointsDegenerate for axes that do not run upwards, PointsBelowRange for fewer values than the table
    /// must have, PointsNotFinite where a value beside the point asked for is not finite.
    /// </returns>
    public static Status ByTemperature(double[] values, double firstCelsius, double lastCelsius, double celsius, out double value)
    {
        value = double.NaN;
        if (values == null) { return Status.PointsBelowRange; }
        Status status = Temperature(firstCelsius, lastCelsius, celsius);
        if (status != Status.Ok) { return status; }
        if (values.Length < 2) { return Status.PointsBelowRange; }
        double at = Position(firstCelsius, lastCelsius, values.Length, celsius);
        int row = Cell(at, values.Length);
        double low = values[row];
        return InputCheck.Deliver(low + ((values[row + 1] - low) * (at - row)), Status.Ok, Status.PointsNotFinite, out value);
    }

    /// <summary>Value at a temperature and a pressure, linear between the four nodes around it.</summary>
    /// <param name="values">Values row by row: one row a temperature, in it one value a pressure; two or more of each.</param>
    /// <param name="columns">Number of pressures, two or more.</param>
    /// <param name="firstCelsius">Temperature of the first row, °C.</param>
    /// <param name="lastCelsius">Temperature of the last row, °C, above the first.</param>
    /// <param name="firstHectopascal">Pressure of the first column, hPa.</param>
    /// <param name="lastHectopascal">Pressure of the last column, hPa, above the first.</param>
    /// <param name="celsius">Temperature asked for, °C, inside the table.</param>
    /// <param name="hectopascal">Absolute station pressure asked for, hPa, inside the table.</param>
    /// <param name="value">The value in the table's unit; NaN unless Ok.</param>
    /// <returns>As of <see cref="ByTemperature"/>; PointsBelowRange also when the values do not fill their rows.</returns>
    public static Status ByTemperatureAndPressure(
        double[] values, int columns, double firstCelsius, double lastCelsius, double firstHectopascal, double lastHectopascal,
        double celsius, double hectopascal, out double value)
    {
        value = double.NaN;
        if (!RunsUpwards(firstHectopascal, lastHectopascal)) { return Status.PointsDegenerate; }
        Status status = InputCheck.Graver(
            Temperature(firstCelsius, lastCelsius, celsius), InputCheck.Pressure(hectopascal, firstHectopascal, lastHectopascal));
        if (status != Status.Ok) { return status; }
        return Between(values, columns, firstCelsius, lastCelsius, firstHectopascal, lastHectopascal, celsius, hectopascal, out value);
    }

    /// <summary>Value at a temperature and a salinity, linear between the four nodes around it.</summary>
    /// <param name="values">Values row by row: one row a temperature, in it one value a salinity; two or more of each.</param>
    /// <param name="columns">Number of salinities, two or more.</param>
    /// <param name="firstCelsius">Temperature of the first row, °C.</param>
    /// <param name="lastCelsius">Temperature of the last row, °C, above the first.</param>
    /// <param name="firstSalinity">Practical salinity of the first column.</param>
    /// <param name="lastSalinity">Practical salinity of the last column, above the first.</param>
    /// <param name="celsius">Temperature asked for, °C, inside the table.</param>
    /// <param name="salinity">Practical salinity asked for, inside the table.</param>
    /// <param name="value">The value in the table's unit; NaN unless Ok.</param>
    /// <returns>As of <see cref="ByTemperature"/>; PointsBelowRange also when the values do not fill their rows.</returns>
    public static Status ByTemperatureAndSalinity(
        double[] values, int columns, double firstCelsius, double lastCelsius, double firstSalinity, double lastSalinity,
        double celsius, double salinity, out double value)
    {
        value = double.NaN;
        if (!RunsUpwards(firstSalinity, lastSalinity)) { return Status.PointsDegenerate; }
        Status ofSalinity = Status.Ok;
        if (InputCheck.NotFinite(salinity)) { ofSalinity = Status.SalinityNotFinite; }
        else if (salinity < firstSalinity) { ofSalinity = Status.SalinityBelowRange; }
        else if (lastSalinity < salinity) { ofSalinity = Status.SalinityAboveRange; }
        Status status = InputCheck.Graver(Temperature(firstCelsius, lastCelsius, celsius), ofSalinity);
        if (status != Status.Ok) { return status; }
        return Between(values, columns, firstCelsius, lastCelsius, firstSalinity, lastSalinity, celsius, salinity, out value);
    }

    // The ends are checked before: both axes run upwards and the point is inside them.
    private static Status Between(
        double[] values, int columns, double firstCelsius, double lastCelsius, double firstColumn, double lastColumn,
        double celsius, double across, out double value)
    {
        value = double.NaN;
        if (values == null || columns < 2) { return Status.PointsBelowRange; }
        int rows = values.Length / columns;
        if (rows < 2 || rows * columns != values.Length) { return Status.PointsBelowRange; }
        double down = Position(firstCelsius, lastCelsius, rows, celsius);
        double along = Position(firstColumn, lastColumn, columns, across);
        int row = Cell(down, rows);
        int column = Cell(along, columns);
        int upper = (row * columns) + column;
        int lower = upper + columns;
        double part = along - column;
        double above = values[upper] + ((values[upper + 1] - values[upper]) * part);
        double below = values[lower] + ((values[lower + 1] - values[lower]) * part);
        return InputCheck.Deliver(above + ((below - above) * (down - row)), Status.Ok, Status.PointsNotFinite, out value);
    }

    private static Status Temperature(double first, double last, double celsius)
    {
        if (!RunsUpwards(first, last)) { return Status.PointsDegenerate; }
        return InputCheck.Temperature(celsius, first, last);
    }

    /// <summary>False also where an end is NaN or the axis is too long for its length to be a number.</summary>
    private static bool RunsUpwards(double first, double last)
    {
        return first < last && !InputCheck.NotFinite(last - first);
    }

    /// <summary>Where the point lies, counted in nodes from the first.</summary>
    private static double Position(double first, double last, int count, double at)
    {
        return (at - first) * ((count - 1) / (last - first));
    }

    /// <summary>The node at or before the point, but never the last: a point on the end belongs to the last cell.</summary>
    private static int Cell(double position, int count)
    {
        int last = count - 2;
        return position < last ? (int)position : last;
    }
}
