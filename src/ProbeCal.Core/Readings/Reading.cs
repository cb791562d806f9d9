namespace ProbeCal;

/// <summary>
/// One corrected reading: for every quantity its value, its status and its standard uncertainty with the contributions to
/// it. A buffer that is filled again and again, so that a running correction allocates nothing; used by one thread at a time.
/// </summary>
public sealed class Reading
{
    /// <summary>Number of <see cref="ReadingQuantity"/>.</summary>
    public const int QuantityCount = 6;

    /// <summary>Number of <see cref="UncertaintySource"/>.</summary>
    public const int SourceCount = 17;

    private readonly double[] values = new double[QuantityCount];
    private readonly Status[] statuses = new Status[QuantityCount];
    private readonly double[] uncertainties = new double[QuantityCount];
    private readonly double[] contributions = new double[QuantityCount * SourceCount];

    /// <summary>An empty reading: nothing is known yet.</summary>
    public Reading()
    {
        Clear();
    }

    /// <summary>Ok, or why the uncertainties are NaN although the values are not.</summary>
    public Status UncertaintyStatus { get; internal set; }

    /// <summary>The value, in the unit of the quantity; NaN unless its status allows one.</summary>
    /// <param name="quantity">Which quantity.</param>
    public double Value(ReadingQuantity quantity)
    {
        return values[(int)quantity];
    }

    /// <summary>Ok, or the input that kept the quantity from being computed, or (extrapolated) that is out of range.</summary>
    /// <param name="quantity">Which quantity.</param>
    public Status StatusOf(ReadingQuantity quantity)
    {
        return statuses[(int)quantity];
    }

    /// <summary>Combined standard uncertainty (k = 1), in the unit of the quantity; NaN where there is no value.</summary>
    /// <param name="quantity">Which quantity.</param>
    public double StandardUncertainty(ReadingQuantity quantity)
    {
        return uncertainties[(int)quantity];
    }

    /// <summary>
    /// One contribution: sensitivity times standard uncertainty, with the sensitivity's sign, in the unit of the quantity.
    /// The squares of all contributions add up to that of the combined uncertainty.
    /// </summary>
    /// <param name="source">Which contribution.</param>
    /// <param name="quantity">Which quantity.</param>
    public double Contribution(UncertaintySource source, ReadingQuantity quantity)
    {
        return contributions[((int)quantity * SourceCount) + (int)source];
    }

    internal void Set(ReadingQuantity quantity, Status status, double value)
    {
        statuses[(int)quantity] = status;
        values[(int)quantity] = value;
    }

    internal void RefuseAll(Status status)
    {
        for (int i = 0; i < QuantityCount; i++) { statuses[i] = status; }
        UncertaintyStatus = status;
    }

    internal void RefuseAllBut(ReadingQuantity kept, Status status)
    {
        for (int i = 0; i < QuantityCount; i++)
        {
            if (i != (int)kept) { statuses[i] = status; }
        }
    }

    internal void SetContribution(UncertaintySource source, ReadingQuantity quantity, double value)
    {
        contributions[((int)quantity * SourceCount) + (int)source] = value;
    }

    internal void Combine(ReadingQuantity quantity)
    {
        int start = (int)quantity * SourceCount;
        double squares = 0.0;
        for (int i = start; i < start + SourceCount; i++) { squares += contributions[i] * contributions[i]; }
        uncertainties[(int)quantity] = InputCheck.FiniteOrNaN(Numerics.Sqrt(squares));
    }

    internal void Clear()
    {
        UncertaintyStatus = Status.SignalNotFinite;
        for (int i = 0; i < QuantityCount; i++)
        {
            values[i] = double.NaN;
            statuses[i] = Status.SignalNotFinite;
            uncertainties[i] = double.NaN;
        }

        for (int i = 0; i < contributions.Length; i++) { contributions[i] = double.NaN; }
    }
}
