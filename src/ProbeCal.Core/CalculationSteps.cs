using System.Diagnostics;

namespace ProbeCal;

/// <summary>
/// What a computation did, filled by the very code that yields the value: each step's quantity and number in the order of computing. The
/// functions take it as an optional last argument and a null costs one comparison; only the desktop makes one (Catalogue).
/// </summary>
internal sealed class CalculationSteps
{
    /// <summary>More than the longest chain needs; a chain that would not fit is noticed by <see cref="Overflowed"/>.</summary>
    internal const int Capacity = 160;

    private readonly StepQuantity[] _quantities = new StepQuantity[Capacity];
    private readonly double[] _values = new double[Capacity];

    internal int Count { get; private set; }

    internal bool Overflowed { get; private set; }

    internal StepQuantity QuantityAt(int index)
    {
        return _quantities[index];
    }

    internal double ValueAt(int index)
    {
        return _values[index];
    }

    /// <summary>Notes a step. The device knows no steps: where the symbol is not defined, the calls are not compiled at all.</summary>
    [Conditional("PROBECAL_STEPS")]
    internal void Add(StepQuantity quantity, double value)
    {
        if (Count == Capacity)
        {
            Overflowed = true;
            return;
        }

        _quantities[Count] = quantity;
        _values[Count] = value;
        Count++;
    }
}
