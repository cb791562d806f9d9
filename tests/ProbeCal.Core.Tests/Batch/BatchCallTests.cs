using System;
using Xunit;

namespace ProbeCal.Core.Tests.Batch;

/// <summary>The public batch calls: the right scalar function behind each, nothing allocated, bad spans refused in one line.</summary>
public class BatchCallTests
{
    private const int Length = 701;

    private static readonly double[] Celsius = Fill(static i => -1.0 + (i * 0.06));
    private static readonly double[] Salinity = Fill(static i => i % 41);
    private static readonly double[] Pressure = Fill(static i => 600.0 + (i % 490));
    private static readonly double[] Partial = Fill(static i => i % 260);
    private static readonly double[] Milligrams = Fill(static i => i % 23);

    [Theory]
    [InlineData(SolubilityEquation.BensonKrause1984)]
    [InlineData(SolubilityEquation.GarciaGordon1992)]
    [InlineData(SolubilityEquation.GarciaGordon1992Combined)]
    [InlineData(SolubilityEquation.Weiss1970)]
    [InlineData(SolubilityEquation.Sander2023)]
    public void Oxygen_calls_give_the_scalar_values(SolubilityEquation equation)
    {
        double[] values = new double[Length];
        Status[] statuses = new Status[Length];
        int notOk = OxygenBatch.MilligramsPerLitre(equation, Celsius, Salinity, Pressure, RangeRule.NearEdge, values, statuses);
        Compare(notOk, values, statuses, (int i, out double value) =>
            OxygenEquilibrium.MilligramsPerLitre(equation, Celsius[i], Salinity[i], Pressure[i], RangeRule.NearEdge, out value));

        notOk = OxygenBatch.ConcentrationFromPartialPressure(equation, Celsius, Salinity, Pressure, Partial, RangeRule.Refuse, values, statuses);
        Compare(notOk, values, statuses, (int i, out double value) =>
            OxygenEquilibrium.ConcentrationFromPartialPressure(equation, Celsius[i], Salinity[i], Pressure[i], Partial[i], RangeRule.Refuse, out value));

        notOk = OxygenBatch.PartialPressureFromConcentration(equation, Celsius, Salinity, Pressure, Milligrams, RangeRule.Extrapolate, values, statuses);
        Compare(notOk, values, statuses, (int i, out double value) =>
            OxygenEquilibrium.PartialPressureFromConcentration(equation, Celsius[i], Salinity[i], Pressure[i], Milligrams[i], RangeRule.Extrapolate, out value));
    }

    [Fact]
    public void Garcia_Gordon_and_partial_pressure_give_the_scalar_values()
    {
        double[] values = new double[Length];
        Status[] statuses = new Status[Length];
        int notOk = OxygenBatch.GarciaGordon1992MicromolesPerKilogramAtOneAtmosphere(Celsius, Salinity, RangeRule.Refuse, values, statuses);
        Compare(notOk, values, statuses, static (int i, out double value) =>
            GarciaGordon1992.MicromolesPerKilogramAtOneAtmosphere(Celsius[i], Salinity[i], RangeRule.Refuse, out value));

        notOk = OxygenBatch.GarciaGordon1992MicromolesPerKilogram(Celsius, Salinity, Pressure, RangeRule.Refuse, values, statuses);
        Compare(notOk, values, statuses, static (int i, out double value) =>
            GarciaGordon1992.MicromolesPerKilogram(Celsius[i], Salinity[i], Pressure[i], RangeRule.Refuse, out value));

        notOk = OxygenBatch.PartialPressure(Celsius, Pressure, RangeRule.Refuse, values, statuses);
        Compare(notOk, values, statuses, static (int i, out double value) =>
            OxygenEquilibrium.PartialPressure(Celsius[i], Pressure[i], RangeRule.Refuse, out value));
    }

    [Theory]
    [InlineData(Gas.Oxygen, SolubilityEquation.BensonKrause1984, 0.20946)]
    [InlineData(Gas.Nitrogen, SolubilityEquation.HammeEmerson2004, 0.78084)]
    [InlineData(Gas.Nitrogen, SolubilityEquation.BensonKrause1984, 0.78084)]
    public void Any_gas_gives_the_scalar_values(Gas gas, SolubilityEquation equation, double moleFraction)
    {
        double[] values = new double[Length];
        Status[] statuses = new Status[Length];
        int notOk = GasBatch.MilligramsPerLitre(gas, equation, Celsius, Salinity, Pressure, moleFraction, 100.0, RangeRule.NearEdge, values, statuses);
        Compare(notOk, values, statuses, (int i, out double value) =>
            GasEquilibrium.MilligramsPerLitre(gas, equation, Celsius[i], Salinity[i], Pressure[i], moleFraction, 100.0, RangeRule.NearEdge, out value));
    }

    /// <summary>F(1013.25 hPa) is 1 to the last bit: the call without a pressure is the one with that pressure.</summary>
    [Fact]
    public void One_atmosphere_is_1013_25_hPa()
    {
        for (int i = 0; i < Length; i++)
        {
            Status status = GarciaGordon1992.MicromolesPerKilogramAtOneAtmosphere(Celsius[i], Salinity[i], RangeRule.Refuse, out double value);
            Assert.Equal(GarciaGordon1992.MicromolesPerKilogram(Celsius[i], Salinity[i], 1013.25, RangeRule.Refuse, out double same), status);
            Assert.Equal(BitConverter.DoubleToInt64Bits(same), BitConverter.DoubleToInt64Bits(value));
        }
    }

    [Fact]
    public void Nothing_is_allocated()
    {
        double[] values = new double[Length];
        Status[] statuses = new Status[Length];
        RunAll(values, statuses);
        long before = GC.GetAllocatedBytesForCurrentThread();
        int notOk = RunAll(values, statuses);
        Assert.Equal(0, GC.GetAllocatedBytesForCurrentThread() - before);
        // The water below 0 °C is out of the range of the default equation: the way of the refused lanes has been gone as well.
        Assert.True(0 < notOk);
    }

    [Fact]
    public void Spans_of_different_lengths_are_refused_in_one_line()
    {
        ArgumentException e = Assert.Throws<ArgumentException>(static () => OxygenBatch.PartialPressure(
            new double[3], new double[5], RangeRule.Refuse, new double[3], new Status[3]));
        Assert.Equal("pressureHectopascal has 5 values and celsius has 3: all spans of a batch must have one length (Parameter 'pressureHectopascal')", e.Message);
        e = Assert.Throws<ArgumentException>(static () => OxygenBatch.PartialPressure(
            new double[3], new double[3], RangeRule.Refuse, new double[2], new Status[3]));
        Assert.StartsWith("partialPressureHectopascal has 2 values", e.Message, StringComparison.Ordinal);
        e = Assert.Throws<ArgumentException>(static () => GasBatch.MilligramsPerLitre(
            Gas.Oxygen, SolubilityEquation.BensonKrause1984, new double[3], new double[3], new double[3], 0.2, 100.0, RangeRule.Refuse, new double[3], new Status[4]));
        Assert.StartsWith("statuses has 4 values", e.Message, StringComparison.Ordinal);
        e = Assert.Throws<ArgumentException>(static () => OxygenBatch.ConcentrationFromPartialPressure(
            SolubilityEquation.BensonKrause1984, new double[3], new double[3], new double[3], new double[4], RangeRule.Refuse, new double[3], new Status[3]));
        Assert.StartsWith("partialPressureHectopascal has 4 values", e.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_shifted_overlap_is_refused_in_one_line()
    {
        double[] memory = new double[12];
        ArgumentException e = Assert.Throws<ArgumentException>(() => OxygenBatch.PartialPressure(
            memory.AsSpan(0, 10), new double[10], RangeRule.Refuse, memory.AsSpan(1, 10), new Status[10]));
        Assert.Equal(
            "partialPressureHectopascal lies 1 values from the start of celsius in the same memory: it must be the very same span or lie apart (Parameter 'partialPressureHectopascal')",
            e.Message);
    }

    private delegate Status Scalar(int index, out double value);

    private static void Compare(int notOk, double[] values, Status[] statuses, Scalar scalar)
    {
        int expectedNotOk = 0;
        for (int i = 0; i < Length; i++)
        {
            Status status = scalar(i, out double value);
            Assert.Equal(status, statuses[i]);
            Assert.Equal(BitConverter.DoubleToInt64Bits(value), BitConverter.DoubleToInt64Bits(values[i]));
            if (status != Status.Ok) { expectedNotOk++; }
        }

        Assert.Equal(expectedNotOk, notOk);
    }

    // A field: making the list on the stack allocates in an unoptimised build, in the test itself.
    private static readonly SolubilityEquation[] Equations = [SolubilityEquation.BensonKrause1984, SolubilityEquation.GarciaGordon1992, SolubilityEquation.Weiss1970];

    private static int RunAll(double[] values, Status[] statuses)
    {
        int notOk = 0;
        foreach (SolubilityEquation equation in Equations)
        {
            notOk += OxygenBatch.MilligramsPerLitre(equation, Celsius, Salinity, Pressure, RangeRule.NearEdge, values, statuses);
            notOk += OxygenBatch.ConcentrationFromPartialPressure(equation, Celsius, Salinity, Pressure, Partial, RangeRule.Refuse, values, statuses);
            notOk += OxygenBatch.PartialPressureFromConcentration(equation, Celsius, Salinity, Pressure, Milligrams, RangeRule.Extrapolate, values, statuses);
        }

        notOk += OxygenBatch.GarciaGordon1992MicromolesPerKilogramAtOneAtmosphere(Celsius, Salinity, RangeRule.Refuse, values, statuses);
        notOk += OxygenBatch.GarciaGordon1992MicromolesPerKilogram(Celsius, Salinity, Pressure, RangeRule.Refuse, values, statuses);
        notOk += OxygenBatch.PartialPressure(Celsius, Pressure, RangeRule.Refuse, values, statuses);
        notOk += GasBatch.MilligramsPerLitre(
            Gas.Nitrogen, SolubilityEquation.HammeEmerson2004, Celsius, Salinity, Pressure, 0.78084, 100.0, RangeRule.Refuse, values, statuses);
        return notOk;
    }

    private static double[] Fill(Func<int, double> value)
    {
        double[] values = new double[Length];
        for (int i = 0; i < Length; i++) { values[i] = value(i); }
        return values;
    }
}
