using System;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>From a record to what Core corrects readings with. Live and re-corrected data pass through the same call.</summary>
internal static class RecordConversion
{
    /// <summary>The calibration that the record describes. The same record gives the same bits.</summary>
    /// <exception cref="InputException">The record names something that this program does not know.</exception>
    /// <exception cref="WorkFailedException">Core refuses its figures: they make no calibration.</exception>
    public static ProbeCalibration ToProbeCalibration(this CalibrationRecord record)
    {
        if (record.Fit is RecordedFit fit)
        {
            return Fitted(record, fit);
        }

        RecordedPoint slopePoint = Array.Find(record.Points, point => point.Role == record.SlopeFrom)
            ?? throw new WorkFailedException($"calibration {record.Id}: it has no point '{record.SlopeFrom}' to take the slope from");
        Status status = ProbeCalibration.Create(
            Model(record.Probe),
            Point(record.Method, slopePoint, record.AirToWaterRatio, record.ReferenceState.StandardUncertainty),
            Zero(record.Zero),
            record.Probe.Thermometer.CommonStandardUncertaintyCelsius,
            record.Probe.TemperatureCoefficient.StandardUncertainty,
            out ProbeCalibration? calibration);
        return calibration ?? throw new WorkFailedException($"calibration {record.Id}: its figures make no calibration ({status})");
    }

    /// <summary>The probe's response model.</summary>
    public static IProbeModel Model(RecordedProbe probe)
    {
        RecordedTemperatureCoefficient coefficient = probe.TemperatureCoefficient;
        TemperatureCoefficientForm form = RecordNames.Form(coefficient.Form);
        if (probe.MeterSettings is RecordedMeterSettings meter)
        {
            return new MeterDisplay(
                RecordNames.Scale(meter.Shows),
                EquationNames.Parse("calibration record: equation", meter.Equation),
                meter.Salinity,
                meter.PressureHectopascal ?? double.NaN,
                meter.TemperatureCelsius ?? double.NaN,
                form,
                coefficient.Value,
                coefficient.ReferenceCelsius,
                coefficient.FittedLowCelsius,
                coefficient.FittedHighCelsius);
        }

        double Given(string name)
        {
            return ModelCoefficients.Value(probe, name);
        }

        double low = coefficient.FittedLowCelsius;
        double high = coefficient.FittedHighCelsius;
        switch (probe.Model)
        {
            case ModelNames.Amperometric:
                return new AmperometricProbe(
                    form, coefficient.Value, Given(ModelCoefficients.Second), Given(ModelCoefficients.Third), coefficient.ReferenceCelsius, low, high,
                    Given(ModelCoefficients.Pressure), Given(ModelCoefficients.Residual), Given(ModelCoefficients.ResidualPerKelvin), Given(ModelCoefficients.Flow));
            case ModelNames.SternVolmer:
                return new SternVolmerProbe(
                    (LuminescenceSignal)Given(ModelCoefficients.SignalKind), form, coefficient.Value, Given(ModelCoefficients.Second), Given(ModelCoefficients.Third),
                    Given(ModelCoefficients.LifetimePerKelvin), Given(ModelCoefficients.LifetimePerSquareKelvin), Given(ModelCoefficients.Pressure),
                    coefficient.ReferenceCelsius, low, high);
            case ModelNames.Uchida2008:
                return new Uchida2008Probe(
                    Given("c0"), Given("c1"), Given("c2"), Given("c3"), Given("c4"), Given("c5"), Given("c6"),
                    Given(ModelCoefficients.Solubility) == 1 ? SolubilityEquation.BensonKrause1984 : SolubilityEquation.GarciaGordon1992,
                    (OptodePressureCorrection)Given(ModelCoefficients.DepthCorrection), Given(ModelCoefficients.PhasePerDepth),
                    Given(ModelCoefficients.Lowest), Given(ModelCoefficients.Highest));
            case ModelNames.Bittig2018:
                return new Bittig2018Probe(
                    Given("c0"), Given("c1"), Given("c2"), Given("c3"), Given("c4"), Given("c5"), Given("c6"), Given("c7"),
                    (OptodePressureCorrection)Given(ModelCoefficients.DepthCorrection), Given(ModelCoefficients.PhasePerDepth),
                    Given(ModelCoefficients.Lowest), Given(ModelCoefficients.Highest));
            case ModelNames.Severinghaus:
                return new SeveringhausProbe(
                    Given(ModelCoefficients.ZeroPerKelvin), Given(ModelCoefficients.Reference), Given(ModelCoefficients.Lowest), Given(ModelCoefficients.Highest));
            case ModelNames.TotalGas:
                return new TotalGasProbe(Given(ModelCoefficients.Lowest), Given(ModelCoefficients.Highest));
            case ModelNames.Linear:
            case ModelNames.Quadratic:
                return new GenericProbe(
                    Given(ModelCoefficients.PerKelvin), Given(ModelCoefficients.Reference), Given(ModelCoefficients.Lowest), Given(ModelCoefficients.Highest));
            default:
                throw new InputException(
                    $"calibration record: the model '{Wrong.Shown(probe.Model)}' is not known to this program{NearestName.DidYouMean(probe.Model, ModelNames.All)}; use a newer probecal");
        }
    }

    /// <summary>The calibration of a fit through several points. A point in air stands for stirred water by its ratio, which the fit has in it.</summary>
    private static ProbeCalibration Fitted(CalibrationRecord record, RecordedFit fit)
    {
        RecordedPoint? water = Array.FindLast(record.Points, static point => !(point.Role is "zero" or "as-found"));
        bool inAir = water == null || (water.Method ?? record.Method) == "water-saturated-air";
        Status status = FitConversion.Create(
            record.Probe,
            Model(record.Probe).IsTotalPressure ? Gas.Oxygen : GasNames.Parse("calibration record: gas", record.Gas),
            fit,
            inAir ? Stirring.Stirred : RecordNames.StirringOf(water!.Stirring),
            inAir ? 1 : water!.FlowFactor,
            out ProbeCalibration? calibration);
        return calibration ?? throw new WorkFailedException($"calibration {record.Id}: its fit makes no calibration ({status})");
    }

    /// <summary>A recorded point as Core takes it.</summary>
    /// <param name="method">The method's id.</param>
    /// <param name="point">The point.</param>
    /// <param name="airToWaterRatio">The ratio of an air point; null for water.</param>
    /// <param name="referenceStateRelative">Relative standard uncertainty of the state of the reference.</param>
    public static CalibrationPoint Point(string method, RecordedPoint point, RecordedQuantity? airToWaterRatio, double referenceStateRelative)
    {
        double ratio = airToWaterRatio?.Value ?? 1;
        return new CalibrationPoint(
            RecordNames.Method(method),
            point.Signal.Mean,
            point.SignalStandardUncertainty,
            point.Temperature.Value,
            point.Temperature.StandardUncertainty,
            point.Pressure.Value,
            point.Pressure.StandardUncertainty,
            RecordNames.StirringOf(point.Stirring),
            point.FlowFactor,
            ratio,
            airToWaterRatio == null ? 0 : airToWaterRatio.StandardUncertainty / ratio,
            referenceStateRelative);
    }

    /// <summary>A recorded zero as Core takes it.</summary>
    public static ZeroPoint Zero(RecordedZero zero)
    {
        return new ZeroPoint(zero.IsMeasured, zero.Signal, zero.SignalStandardUncertainty, zero.TemperatureCelsius, zero.PressureHectopascal);
    }
}
