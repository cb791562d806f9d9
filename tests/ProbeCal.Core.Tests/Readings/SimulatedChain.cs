using System;
using Xunit;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>
/// One way of calibrating and reading, with known truth and known uncertainties: draws the errors of every input, calibrates
/// with the erroneous values, reads with the erroneous values, and tells how far each quantity is from the truth.
/// </summary>
internal sealed class SimulatedChain
{
    private const double Coefficient = 0.03;
    private const double ReferenceCelsius = 25.0;
    private const double TrueSlope = 0.31;

    public CalibrationMethod Method { get; init; } = CalibrationMethod.AirSaturatedWater;
    public MeterScale? Meter { get; init; }
    public double TemperatureSet { get; init; } = double.NaN;
    public bool SameThermometer { get; init; } = true;
    public bool ZeroMeasured { get; init; } = true;
    public SolubilityEquation Equation { get; init; } = SolubilityEquation.BensonKrause1984;
    public double CalibrationTemperature { get; init; } = 21.0;
    public double CalibrationPressure { get; init; } = 985.0;
    public double Temperature { get; init; } = 9.0;
    public double Pressure { get; init; } = 990.0;
    public double Salinity { get; init; } = 12.0;
    public double Truth { get; init; } = 150.0;

    public double UOffset { get; init; } = UncertaintyDefaults.ThermometerOffsetKelvin;
    public double UTemperature { get; init; } = UncertaintyDefaults.TemperatureKelvin;
    public double UPressure { get; init; } = UncertaintyDefaults.BarometerHectopascal;
    public double USalinity { get; init; } = UncertaintyDefaults.Salinity;
    public double UCoefficient { get; init; } = UncertaintyDefaults.TemperatureCoefficientPerKelvin;
    public double UStirring { get; init; } = UncertaintyDefaults.StirredRelative;
    public double RelativeSignalNoise { get; init; } = 0.002;

    private double URatio => Method == CalibrationMethod.WaterSaturatedAir ? UncertaintyDefaults.AirToWaterRatioRelative : 0.0;

    private double UState => UncertaintyDefaults.ReferenceStateRelative(Method);

    /// <summary>Runs the chain with every error drawn from <paramref name="random"/>, or with none for null.</summary>
    /// <returns>Deviation from the truth for each quantity; the reading keeps value and uncertainty.</returns>
    public double[] Run(Random? random, Reading reading)
    {
        double Normal() => random is null ? 0.0 : Draw.Gaussian(random);
        double Flat() => random is null ? 0.0 : Draw.Rectangular(random);

        double offsetAtPoint = UOffset * Flat();
        double offset = SameThermometer ? offsetAtPoint : UOffset * Flat();
        double membrane = Coefficient + (UCoefficient * Normal());
        double uZero = ZeroMeasured ? 0.003 * 60.0 : UncertaintyDefaults.AssumedZeroRelative * 60.0;
        // A measured zero is a truth that was read with an error; an assumed one is nothing where there is something.
        double trueZero = ZeroMeasured ? (Meter is null ? 0.4 : 0.0) : uZero * Flat();
        double takenZero = ZeroMeasured ? trueZero + (uZero * Normal()) : 0.0;

        double pointAir = Bench.Air(CalibrationTemperature, CalibrationPressure) * (1.0 + (UState * Normal()));
        double takenPointTemperature = CalibrationTemperature + offsetAtPoint + (UTemperature * Normal());
        double takenPointPressure = CalibrationPressure + (UPressure * Flat());
        double takenTemperature = Temperature + offset + (UTemperature * Normal());
        double takenPressure = Pressure + (UPressure * Flat());
        double takenSalinity = Salinity + (USalinity * Normal());
        double ratio = Method == CalibrationMethod.WaterSaturatedAir ? 1.0 + (URatio * Normal()) : 1.0;
        double flow = 1.0 + (UStirring * Normal());

        IProbeModel model = Model();
        double pointCurrent = trueZero + (TrueSlope * Membrane(membrane, CalibrationTemperature) * ratio * pointAir);
        double current = trueZero + (TrueSlope * Membrane(membrane, Temperature) * flow * Truth);
        double pointSignal = Shown(pointCurrent, takenPointTemperature, takenPointPressure);
        double signal = Shown(current, takenTemperature, takenPressure);
        double zeroSignal = Shown(takenZero, takenPointTemperature, takenPointPressure);
        double perCurrentAtPoint = Shown(1.0, takenPointTemperature, takenPointPressure);
        double uPointSignal = RelativeSignalNoise * 60.0 * perCurrentAtPoint;
        double uSignal = RelativeSignalNoise * 60.0 * Shown(1.0, Temperature, Pressure);

        var point = new CalibrationPoint(
            Method, pointSignal + (uPointSignal * Normal()), uPointSignal, takenPointTemperature, UTemperature, takenPointPressure, UPressure,
            Stirring.Stirred, 1.0, 1.0, URatio, UState);
        var zero = new ZeroPoint(ZeroMeasured, zeroSignal, uZero * perCurrentAtPoint, takenPointTemperature, takenPointPressure);
        ProbeCalibration calibration = Bench.Calibrate(model, point, zero, UOffset, UCoefficient);
        var conditions = new ReadingConditions(
            Equation, uSignal, SameThermometer, UOffset, UTemperature, UPressure, USalinity, Stirring.Stirred, 1.0, UStirring);
        Assert.Equal(Status.Ok, Correction.Correct(
            calibration, conditions, signal + (uSignal * Normal()), takenTemperature, takenPressure, takenSalinity, 0.0, RangeRule.Extrapolate, reading));
        Assert.Equal(Status.Ok, reading.UncertaintyStatus);

        OxygenUncertainty.EquationRelative(Equation, Salinity, RangeRule.Refuse, out double equationRelative);
        OxygenEquilibrium.ConcentrationFromPartialPressure(Equation, Temperature, Salinity, Pressure, Truth, RangeRule.Refuse, out double milligrams);
        milligrams *= 1.0 + (equationRelative * Normal());
        DensityEos80.Density(Temperature, Salinity, RangeRule.Refuse, out double density);
        double[] truths =
        [
            Truth,
            milligrams,
            milligrams / 0.0319988,
            milligrams / 0.0319988 * 1000.0 / density,
            100.0 * Truth / Bench.Air(Temperature, Pressure),
            100.0 * Truth / Bench.Air(Temperature, 1013.25),
        ];
        for (int i = 0; i < truths.Length; i++) { truths[i] = reading.Value((ReadingQuantity)i) - truths[i]; }
        return truths;
    }

    private IProbeModel Model()
    {
        return Meter is MeterScale scale
            ? new MeterDisplay(
                scale, Equation, 5.0, double.NaN, TemperatureSet, TemperatureCoefficientForm.Exponential, Coefficient, ReferenceCelsius, 0.0, 40.0)
            : new AmperometricProbe(TemperatureCoefficientForm.Exponential, Coefficient, ReferenceCelsius, 0.0, 40.0);
    }

    // What is read of a current: the current itself, or what a meter makes of it with its own thermometer (or the set value).
    private double Shown(double current, double temperature, double pressure)
    {
        if (Meter is not MeterScale scale) { return current; }
        double meterTemperature = double.IsNaN(TemperatureSet) ? temperature : TemperatureSet;
        double partialPressure = current / (TrueSlope * Membrane(Coefficient, meterTemperature));
        Assert.Equal(Status.Ok, MeterDisplay.PartialPressurePerUnit(
            scale, Equation, meterTemperature, 5.0, pressure, RangeRule.Refuse, out double perUnit));
        return partialPressure / perUnit;
    }

    private static double Membrane(double coefficient, double temperature)
    {
        return Math.Exp(coefficient * (temperature - ReferenceCelsius));
    }
}
