using ProbeCal.Station.Entry;

namespace ProbeCal.Station.TableWriting;

/// <summary>What runs along a side of a table.</summary>
internal enum AxisQuantity
{
    /// <summary>Water temperature, °C (ITS-90).</summary>
    Temperature,
    /// <summary>Absolute station pressure, hPa.</summary>
    Pressure,
    /// <summary>Practical salinity.</summary>
    Salinity,
}

/// <summary>One side of a table: evenly spaced nodes from the first to the last, both of them among the nodes.</summary>
internal sealed record TableAxis(AxisQuantity Quantity, double First, double Last, int Count)
{
    /// <summary>Most decimals of a step, so that nodes are numbers a person can read.</summary>
    private const int StepDecimals = 4;

    internal double Step => (Last - First) / (Count - 1);

    /// <summary>Nodes per unit, in the very form in which <see cref="TableLookup"/> computes it.</summary>
    internal double PerUnit => (Count - 1) / (Last - First);

    /// <summary>The value at a node; one rounding, so that 0.3 is 0.3.</summary>
    internal double Node(int index)
    {
        return (((Count - 1 - index) * First) + (index * Last)) / (Count - 1);
    }

    internal string Text(int index)
    {
        return Number.Significant(Node(index), 10);
    }

    internal string Unit => Quantity switch
    {
        AxisQuantity.Temperature => "°C",
        AxisQuantity.Pressure => "hPa",
        _ => "",
    };

    internal string Name => Quantity switch
    {
        AxisQuantity.Temperature => "water temperature",
        AxisQuantity.Pressure => "absolute station pressure",
        _ => "practical salinity",
    };

    /// <summary>A value with its unit: <c>938 hPa</c>, <c>8.5 °C</c>, <c>salinity 35</c>.</summary>
    internal string Place(double value)
    {
        string number = Number.Significant(value, 6);
        return Quantity == AxisQuantity.Salinity ? "salinity " + number : number + " " + Unit;
    }

    /// <summary>The axis with another number of steps.</summary>
    internal TableAxis With(int steps)
    {
        return this with { Count = steps + 1 };
    }

    /// <summary>Does the range fall into this many steps of few decimals?</summary>
    internal bool IsReadable(int steps)
    {
        decimal length = (decimal)Last - (decimal)First;
        decimal step = length / steps;
        return decimal.Round(step, StepDecimals) == step;
    }

    /// <summary>How many steps of that length the range falls into; null when the last one would not end at its end.</summary>
    internal int? StepsOf(double step)
    {
        if (Last - First < step)
        {
            return null;
        }

        decimal steps = ((decimal)Last - (decimal)First) / (decimal)step;
        return steps == decimal.Truncate(steps) && 1 <= steps && steps <= TableLimits.MostSteps ? (int)steps : null;
    }
}

/// <summary>How large a table may become.</summary>
internal static class TableLimits
{
    internal const int MostSteps = 4000;
    internal const int MostNodes = 100_000;
}
