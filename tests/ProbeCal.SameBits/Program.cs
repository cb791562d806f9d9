using System;
using System.Globalization;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using ProbeCal;

// Prints one digest for each part of Core over a fixed set of inputs. Wherever it runs, the digests must be the same.
int count = args.Length > 0 ? int.Parse(args[0], CultureInfo.InvariantCulture) : 20_000;
Console.Error.WriteLine($"{RuntimeInformation.ProcessArchitecture}, vectors: 128 {Vector128.IsHardwareAccelerated}, 256 {Vector256.IsHardwareAccelerated}, 512 {Vector512.IsHardwareAccelerated}");
Console.WriteLine("self-check " + Numerics.SelfCheck());

Digest elementary = new();
Inputs inputs = new();
for (int i = 0; i < count; i++)
{
    double x = inputs.Between(-700, 700), y = inputs.Positive();
    elementary.Add(Numerics.Exp(x));
    elementary.Add(Numerics.Ln(y));
    elementary.Add(Numerics.Sqrt(y));
    elementary.Add(Numerics.Pow(y, inputs.Between(-3, 3)));
}

Console.WriteLine("elementary functions " + elementary);

Digest equilibrium = new();
for (int i = 0; i < count; i++)
{
    double t = inputs.Between(0, 40), s = inputs.Between(0, 40), p = inputs.Between(510, 1110);
    foreach (SolubilityEquation equation in new[] { SolubilityEquation.BensonKrause1984, SolubilityEquation.GarciaGordon1992 })
    {
        equilibrium.Add(OxygenEquilibrium.MilligramsPerLitre(equation, t, s, p, RangeRule.Refuse, out double milligrams), milligrams);
        equilibrium.Add(OxygenUncertainty.MilligramsPerLitre(equation, t, s, p, 0.1, 0.1, 1, RangeRule.Refuse, out double u), u);
    }

    equilibrium.Add(DensityEos80.Density(t, s, RangeRule.Refuse, out double density), density);
    equilibrium.Add(VapourWagnerPruss1993.Pressure(t, RangeRule.Refuse, out double vapour), vapour);
    equilibrium.Add(StandardAtmosphere.Pressure(inputs.Between(0, 5000), out double standard), standard);
}

Console.WriteLine("equilibrium " + equilibrium);

Digest batch = new();
double[] celsius = new double[count], salinity = new double[count], pressure = new double[count], fourth = new double[count], values = new double[count];
Status[] statuses = new Status[count];
for (int i = 0; i < count; i++)
{
    // Some of it out of range, so that the lanes that are not Ok are among the rest.
    celsius[i] = inputs.Between(-3, 41);
    salinity[i] = inputs.Between(-1, 43);
    pressure[i] = inputs.Between(500, 1120);
    fourth[i] = inputs.Between(-1, 60);
}

foreach (RangeRule rule in new[] { RangeRule.Refuse, RangeRule.NearEdge, RangeRule.Extrapolate })
{
    foreach (SolubilityEquation equation in new[] { SolubilityEquation.BensonKrause1984, SolubilityEquation.GarciaGordon1992 })
    {
        batch.Add(OxygenBatch.MilligramsPerLitre(equation, celsius, salinity, pressure, rule, values, statuses), values, statuses);
        batch.Add(OxygenBatch.ConcentrationFromPartialPressure(equation, celsius, salinity, pressure, fourth, rule, values, statuses), values, statuses);
        batch.Add(OxygenBatch.PartialPressureFromConcentration(equation, celsius, salinity, pressure, fourth, rule, values, statuses), values, statuses);
    }

    batch.Add(OxygenBatch.GarciaGordon1992MicromolesPerKilogramAtOneAtmosphere(celsius, salinity, rule, values, statuses), values, statuses);
    batch.Add(OxygenBatch.GarciaGordon1992MicromolesPerKilogram(celsius, salinity, pressure, rule, values, statuses), values, statuses);
    batch.Add(OxygenBatch.PartialPressure(celsius, pressure, rule, values, statuses), values, statuses);
}

Console.WriteLine("batch " + batch);

Digest readings = new();
AmperometricProbe probe = new(TemperatureCoefficientForm.Arrhenius, 22000, 25, 0, 40);
CalibrationPoint point = new(CalibrationMethod.AirSaturatedWater, 66.17, 0.01, 16, 0.03, 939, 0.8, Stirring.Stirred, 1, 1, 0, 0.0075);
Status made = ProbeCalibration.Create(probe, point, ZeroPoint.Assume(point), 0.1, 180, out ProbeCalibration? calibration);
if (made != Status.Ok || calibration is null)
{
    Console.Error.WriteLine("the calibration could not be made: " + made);
    return 1;
}

ReadingConditions conditions = new(SolubilityEquation.BensonKrause1984, 0.03, true, 0.1, 0.03, 0.8, 0.1, Stirring.Stirred, 1, 0.01);
Reading reading = new();
for (int i = 0; i < count; i++)
{
    readings.Add(Correction.Correct(calibration, conditions, inputs.Between(-1, 120), inputs.Between(0, 40), inputs.Between(550, 1100), inputs.Between(0, 40), 0.0, RangeRule.Refuse, reading), 0);
    for (int quantity = 0; quantity < Reading.QuantityCount; quantity++)
    {
        readings.Add(reading.Value((ReadingQuantity)quantity));
        readings.Add(reading.StandardUncertainty((ReadingQuantity)quantity));
    }
}

Console.WriteLine("readings " + readings);
return 0;

/// <summary>Inputs made by integer arithmetic alone, so that they are the same everywhere.</summary>
internal sealed class Inputs
{
    private ulong _state = 0x9E3779B97F4A7C15;

    internal double Between(double low, double high)
    {
        return low + ((high - low) * ((Next() >> 11) * (1.0 / (1L << 53))));
    }

    /// <summary>Any positive double, subnormals included.</summary>
    internal double Positive()
    {
        return BitConverter.UInt64BitsToDouble(Next() % 0x7FF0000000000000);
    }

    private ulong Next()
    {
        _state ^= _state << 13;
        _state ^= _state >> 7;
        return _state ^= _state << 17;
    }
}

/// <summary>FNV-1a over the bits of doubles; every NaN counts as one and the same.</summary>
internal sealed class Digest
{
    private ulong _hash = 14695981039346656037;

    internal void Add(double value)
    {
        ulong bits = BitConverter.DoubleToUInt64Bits(double.IsNaN(value) ? double.NaN : value);
        for (int i = 0; i < 64; i += 8)
        {
            _hash = (_hash ^ ((bits >> i) & 0xFF)) * 1099511628211;
        }
    }

    internal void Add(Status status, double value)
    {
        Add((double)(int)status);
        Add(value);
    }

    internal void Add(int notOk, double[] values, Status[] statuses)
    {
        Add((double)notOk);
        for (int i = 0; i < values.Length; i++) { Add(statuses[i], values[i]); }
    }

    public override string ToString()
    {
        return _hash.ToString("X16", CultureInfo.InvariantCulture);
    }
}
