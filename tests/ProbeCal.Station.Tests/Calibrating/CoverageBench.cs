using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>
/// Errors in units of what the program states, drawn once for each input by its name: what a person enters or reads is the truth
/// plus the error of its name. A second set, drawn the same way, is one Monte Carlo trial.
/// </summary>
internal sealed class Errors(Random random)
{
    private readonly Dictionary<string, double> _drawn = [];

    /// <summary>Error of an input with a normal distribution.</summary>
    internal double Normal(string name, double standardUncertainty)
    {
        return standardUncertainty * Drawn(name, () => Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble()));
    }

    /// <summary>Error of an input with a rectangular distribution.</summary>
    internal double Rectangular(string name, double standardUncertainty)
    {
        return standardUncertainty * Drawn(name, () => Math.Sqrt(3) * ((2 * random.NextDouble()) - 1));
    }

    private double Drawn(string name, Func<double> draw)
    {
        if (!_drawn.TryGetValue(name, out double value))
        {
            value = draw();
            _drawn.Add(name, value);
        }

        return value;
    }
}

/// <summary>
/// Nature, in arithmetic of the tests' own; from memory where nothing else is said. Vapour pressure: Buck (1996). Oxygen in water:
/// the equation of TM 9-A6.2 (Benson and Krause 1980 and 1984), in mg/L under 1 atm of moist air.
/// </summary>
internal static class Nature
{
    internal const double OxygenOfAir = 0.20946;

    internal static double Vapour(double celsius)
    {
        return 6.1121 * Math.Exp((18.678 - (celsius / 234.5)) * (celsius / (257.14 + celsius)));
    }

    /// <summary>mg/L per hPa of oxygen.</summary>
    internal static double MilligramsPerHectopascal(double celsius, double salinity)
    {
        double t = celsius + 273.15;
        double saturated = Math.Exp(
            -139.34411 + (1.575701e5 / t) - (6.642308e7 / (t * t)) + (1.2438e10 / (t * t * t)) - (8.621949e11 / (t * t * t * t))
            - (salinity * (0.017674 - (10.754 / t) + (2140.7 / (t * t)))));
        return saturated / (OxygenOfAir * (1013.25 - Vapour(celsius)));
    }

    /// <summary>Permeability of a membrane by its activation energy, 1 at 25 °C.</summary>
    internal static double Arrhenius(double joulesPerMole, double celsius)
    {
        return Math.Exp(-joulesPerMole / 8.314462618 * ((1 / (celsius + 273.15)) - (1 / 298.15)));
    }
}

/// <summary>One point that a person takes: its true partial pressure and how the program is told of it.</summary>
/// <param name="Plan">Role and method, with what certificates and titres say; the errors are those of what is entered.</param>
/// <param name="Truth">True partial pressure of the gas at the membrane, from true pressure, temperature and salinity.</param>
internal sealed record CoveragePoint(Func<Entered, Errors?, PlannedPoint> Plan, Func<Place, Errors, double> Truth)
{
    /// <summary>Factor on the reference by its state (saturation of the bath, ratio in air): what it is uncertain by, 1 without error.</summary>
    internal Func<Errors, double> State { get; init; } = static _ => 1;

    /// <summary>What is at the membrane beyond the reference, hPa: oxygen left at zero, for a temperature in °C.</summary>
    internal Func<Errors, double, double> Left { get; init; } = static (_, _) => 0;

    /// <summary>True where a concentration is turned into a partial pressure, so that the solubility equation counts.</summary>
    internal bool TakesEquation { get; init; }
}

/// <summary>True conditions.</summary>
internal sealed record Place(double Celsius, double Hectopascal, double Salinity);

/// <summary>What a person read and typed: all that the program gets.</summary>
internal sealed record Entered
{
    internal required double[] Signals { get; init; }

    internal required double[] Celsius { get; init; }

    internal required double Hectopascal { get; init; }

    internal required double Salinity { get; init; }

    internal required double ReadingSignal { get; init; }

    internal required double ReadingCelsius { get; init; }

    /// <summary>Certificates, titres and displays, by name.</summary>
    internal required Dictionary<string, double> Values { get; init; }
}

/// <summary>A probe: what it answers by nature, and how the program knows it.</summary>
/// <param name="Signal">Signal before noise, by true partial pressure, true temperature, temperature that its own thermometer shows, and what the stated temperature coefficient has too much.</param>
/// <param name="Noise">Standard uncertainty of the mean signal of a window.</param>
/// <param name="Describe">The probe as the program is told of it; the argument is what its temperature coefficient has too much.</param>
internal sealed record CoverageProbe(Func<double, double, double, double, double> Signal, double Noise, Func<double, RecordedProbe> Describe)
{
    /// <summary>Standard uncertainty of the temperature coefficient, in its unit.</summary>
    internal double CoefficientUncertainty { get; init; }

    /// <summary>True where only an assumed zero is known: up to 1 % of the signal in air, rectangular.</summary>
    internal bool ZeroIsAssumed { get; init; }

    /// <summary>What the flow past the membrane is uncertain by; 0 for a probe that takes nothing from the water.</summary>
    internal double StirringUncertainty { get; init; }

    /// <summary>True for a meter, which has used its own thermometer and temperature coefficient before it showed anything.</summary>
    internal bool IsMeter { get; init; }
}

/// <summary>A method on a model, repeated.</summary>
internal sealed record CoverageCase(string Name, string Method, CoverageProbe Probe, CoveragePoint[] Points)
{
    internal Gas Gas { get; init; } = Gas.Oxygen;

    internal string ZeroPlan { get; init; } = CalibrationIds.ZeroKeep;

    internal string Form { get; init; } = "line";

    internal RecordedQuantity? AirToWaterRatio { get; init; }

    internal double StateRelative { get; init; } = UncertaintyDefaults.AirSaturatedWaterRelative;

    /// <summary>True partial pressure of the reading at a true place.</summary>
    internal Func<Place, double, double> Reading { get; init; } = static (place, share) => (0.02 + (0.98 * share)) * Nature.OxygenOfAir * (place.Hectopascal - Nature.Vapour(place.Celsius));
}

/// <summary>How often the truth lay in the interval, and how wide that was on average.</summary>
internal sealed class Coverage(int count)
{
    private int _byBudget;
    private int _byTrials;
    private double _halfWidths;
    private double _trialHalfWidths;
    private double _squares;

    internal double ByBudget => (double)_byBudget / count;

    internal double ByTrials => (double)_byTrials / count;

    internal double HalfWidth => _halfWidths / count;

    internal double TrialHalfWidth => _trialHalfWidths / count;

    /// <summary>Root mean square of error over standard uncertainty.</summary>
    internal double Ratio => Math.Sqrt(_squares / count);

    internal void Add(double truth, double value, double standardUncertainty, double low, double high)
    {
        double halfWidth = Station.Uncertainty.CoverageFactor.Normal * standardUncertainty;
        _byBudget += Math.Abs(value - truth) <= halfWidth ? 1 : 0;
        _byTrials += low <= truth && truth <= high ? 1 : 0;
        _halfWidths += halfWidth;
        _trialHalfWidths += (high - low) / 2;
        _squares += (value - truth) * (value - truth) / (standardUncertainty * standardUncertainty);
    }
}

/// <summary>A partial pressure in hPa and a concentration in mg/L, each with its standard uncertainty.</summary>
internal readonly record struct Corrected(double Hectopascal, double HectopascalUncertainty, double Milligrams, double MilligramsUncertainty);

/// <summary>Draws a truth, calibrates with what is read there, corrects a reading elsewhere, and sees whether the truth lies in the interval.</summary>
internal static class CoverageBench
{
    internal const double OffsetKelvin = 0.1, BarometerHectopascal = 0.77, SalinityUncertainty = 0.1;

    /// <summary>The smallest and largest of 39 trials leave the truth outside once in 20 times, when it is one more draw of the same: JCGM 101's interval without its smoothing, exact in coverage.</summary>
    internal const int Trials = 39;

    private static readonly DateTimeOffset Start = new(2026, 6, 1, 9, 0, 0, TimeSpan.Zero);

    internal static (Coverage Hectopascal, Coverage Milligrams) Run(CoverageCase what, int count, int seed)
    {
        Random random = new(seed);
        Coverage hectopascal = new(count);
        Coverage milligrams = new(count);
        for (int i = 0; i < count; i++)
        {
            (Entered entered, double truth, double truthInMilligrams) = Live(what, random);
            Corrected read = Measure(what, entered, null, withRecord: i == 0);
            Corrected low = new(double.PositiveInfinity, 0, double.PositiveInfinity, 0);
            Corrected high = new(double.NegativeInfinity, 0, double.NegativeInfinity, 0);
            for (int trial = 0; trial < Trials; trial++)
            {
                Corrected again = Measure(what, entered, new Errors(random), withRecord: false);
                low = new Corrected(Math.Min(low.Hectopascal, again.Hectopascal), 0, Math.Min(low.Milligrams, again.Milligrams), 0);
                high = new Corrected(Math.Max(high.Hectopascal, again.Hectopascal), 0, Math.Max(high.Milligrams, again.Milligrams), 0);
            }

            hectopascal.Add(truth, read.Hectopascal, read.HectopascalUncertainty, low.Hectopascal, high.Hectopascal);
            milligrams.Add(truthInMilligrams, read.Milligrams, read.MilligramsUncertainty, low.Milligrams, high.Milligrams);
        }

        return (hectopascal, milligrams);
    }

    /// <summary>What is read and typed where everything is exact; only for points that need no certificate.</summary>
    internal static Entered Exact(CoverageCase what, Place place)
    {
        // Errors of a generator that always gives the middle are none.
        Errors none = new(new Middle());
        double[] signals = [.. what.Points.Select(point => what.Probe.Signal(point.Truth(place, none), place.Celsius, place.Celsius, 0))];
        return new Entered
        {
            Signals = signals,
            Celsius = [.. signals.Select(_ => place.Celsius)],
            Hectopascal = place.Hectopascal,
            Salinity = place.Salinity,
            ReadingSignal = signals[0],
            ReadingCelsius = place.Celsius,
            Values = [],
        };
    }

    /// <summary>The calibration that the program makes of what was read and typed.</summary>
    internal static ProbeCalibration Calibrate(CoverageCase what, Entered entered)
    {
        return Calibrate(what, entered, null, withRecord: true).Calibration;
    }

    /// <summary>Nature and the person: true inputs, and what is read of them.</summary>
    private static (Entered Entered, double Hectopascal, double Milligrams) Live(CoverageCase what, Random random)
    {
        Errors errors = new(random);
        double pressure = 880 + (140 * random.NextDouble());
        double salinity = 3 + (4 * random.NextDouble());
        double offset = errors.Normal("thermometer", OffsetKelvin);
        double coefficient = errors.Normal("coefficient", what.Probe.CoefficientUncertainty);
        double bath = 8 + (20 * random.NextDouble());
        Dictionary<string, double> values = [];
        double[] signals = new double[what.Points.Length];
        double[] celsius = new double[what.Points.Length];
        double residual = 0;
        for (int i = 0; i < signals.Length; i++)
        {
            Place place = new(bath + (0.5 * random.NextDouble()), pressure, salinity);
            double truth = what.Points[i].Truth(place, errors);
            double atMembrane = (truth * what.Points[i].State(errors)) + what.Points[i].Left(errors, place.Celsius);
            celsius[i] = place.Celsius + offset + errors.Rectangular("celsius " + i, UncertaintyDefaults.TemperatureKelvin);
            double signal = what.Probe.Signal(atMembrane, place.Celsius, celsius[i], coefficient);
            if (what.Probe.ZeroIsAssumed)
            {
                residual = signal * errors.Rectangular("zero", UncertaintyDefaults.AssumedZeroRelative);
                signal += residual;
            }

            signals[i] = signal + errors.Normal("signal " + i, what.Probe.Noise);
            Told(values, i, place, truth, errors);
        }

        Place there = new(8 + (20 * random.NextDouble()), pressure, salinity);
        double wanted = what.Reading(there, random.NextDouble());
        // Water past the membrane at the reading, against that of the calibration.
        double flow = 1 + errors.Normal("stirring", what.Probe.StirringUncertainty);
        double shown = there.Celsius + offset + errors.Rectangular("celsius of the reading", UncertaintyDefaults.TemperatureKelvin);
        double read = what.Probe.Signal(wanted * flow, there.Celsius, shown, coefficient) + residual + errors.Normal("signal of the reading", what.Probe.Noise);
        Entered entered = new()
        {
            Signals = signals,
            Celsius = celsius,
            Hectopascal = pressure + errors.Normal("barometer", BarometerHectopascal),
            Salinity = salinity + errors.Normal("salinity", SalinityUncertainty),
            ReadingSignal = read,
            ReadingCelsius = shown,
            Values = values,
        };
        double milligrams = wanted * Nature.MilligramsPerHectopascal(there.Celsius, salinity) * (1 + errors.Normal("equation", CoverageCases.EquationRelative));
        return (entered, wanted, milligrams);
    }

    /// <summary>Notes what titres and displays show of a true place: the points' own text asks for them by name.</summary>
    private static void Told(Dictionary<string, double> values, int index, Place place, double truth, Errors errors)
    {
        double milligrams = truth * Nature.MilligramsPerHectopascal(place.Celsius, place.Salinity) * (1 + errors.Normal("equation", CoverageCases.EquationRelative));
        values[FormattableString.Invariant($"milligrams {index}")] = milligrams;
        values[FormattableString.Invariant($"hectopascal {index}")] = truth;
        for (int titre = 0; titre < CoverageCases.Titres; titre++)
        {
            values[FormattableString.Invariant($"titre {index} {titre}")] = CoverageCases.Titre(milligrams, errors, FormattableString.Invariant($"{index} {titre}"));
        }

        foreach (CoverageDisplay display in CoverageCases.Displays)
        {
            values[FormattableString.Invariant($"{display.Name} {index}")] = display.Shows(milligrams, truth) + errors.Normal(display.Name + index, display.StandardUncertainty);
        }
    }

    /// <summary>The program's way from what was read and typed to a calibration; the errors are those of a trial, taken off what was read.</summary>
    private static (ProbeCalibration Calibration, CalibrationSetup Setup) Calibrate(CoverageCase what, Entered entered, Errors? trial, bool withRecord)
    {
        double Off(string name, double u, bool rectangular = false)
        {
            return trial == null ? 0 : rectangular ? trial.Rectangular(name, u) : trial.Normal(name, u);
        }

        double offset = Off("thermometer", OffsetKelvin);
        double coefficient = Off("coefficient", what.Probe.CoefficientUncertainty);
        CalibrationSetup setup = Bench.Setup with
        {
            Probe = what.Probe.Describe(what.Probe.IsMeter ? 0 : coefficient),
            Gas = what.Gas,
            Method = what.Method,
            FitForm = what.Form,
            ZeroPlan = what.ZeroPlan,
            AirToWaterRatio = what.AirToWaterRatio,
            ReferenceStateRelative = what.StateRelative,
            Altitude = null,
            Pressure = Bench.Setup.Pressure with { Hectopascal = entered.Hectopascal - Off("barometer", BarometerHectopascal), StandardUncertaintyHectopascal = BarometerHectopascal },
            Salinity = Bench.Setup.Salinity with { Value = entered.Salinity - Off("salinity", SalinityUncertainty), StandardUncertainty = SalinityUncertainty },
            Plan = [.. what.Points.Select(point => point.Plan(entered, trial))],
        };
        List<RecordedPoint> points = [];
        for (int i = 0; i < what.Points.Length; i++)
        {
            double mean = entered.Signals[i] - Off("signal " + i, what.Probe.Noise);
            if (trial != null && what.Probe.ZeroIsAssumed)
            {
                mean -= entered.Signals[i] * trial.Rectangular("zero", UncertaintyDefaults.AssumedZeroRelative);
            }

            double moved = entered.Celsius[i] - offset - Off("celsius " + i, UncertaintyDefaults.TemperatureKelvin, rectangular: true);
            DateTimeOffset at = Start.AddMinutes(10 * i);
            TakenReading reading = new()
            {
                Role = setup.Plan[i].Role,
                FirstUtc = at,
                LastUtc = at.AddMinutes(2),
                Typed = false,
                Signal = new RecordedStatistics
                {
                    Count = 120,
                    Mean = mean,
                    StandardDeviation = what.Probe.Noise * Math.Sqrt(120),
                    SlopePerMinute = 0,
                    SlopeStandardErrorPerMinute = 0,
                    Minimum = mean - (3 * what.Probe.Noise),
                    Maximum = mean + (3 * what.Probe.Noise),
                    WindowSeconds = 120,
                },
                SignalStandardUncertainty = what.Probe.Noise,
                TemperatureCelsius = what.Probe.IsMeter ? entered.Celsius[i] : moved,
                TemperatureSource = "line",
                TemperatureStandardUncertaintyKelvin = UncertaintyDefaults.TemperatureKelvin,
                PressureHectopascal = setup.Pressure.Hectopascal!.Value,
            };
            RecordedPoint made = PointMaker.Make(reading, setup.Plan[i], setup);
            if (trial != null)
            {
                made = Moved(what, setup, points, made, i, trial);
                made = what.Probe.IsMeter ? ByMeter(made, moved, coefficient) : made;
            }

            points.Add(made);
        }

        Fit fit = Fitting.Of(setup, points, null);
        ProbeCalibration calibration = fit.Calibration ?? throw new InvalidOperationException(what.Name + ": " + fit.Status + " " + fit.Why);
        if (withRecord)
        {
            SessionState state = new() { Setup = setup, StartedUtc = Start, SavedUtc = Start, Points = points };
            ProbeCalibration loaded = RecordBuilder.Build(state, fit, null, Start.AddHours(1), Bench.Version).ToProbeCalibration();
            Xunit.Assert.Equal((calibration.Slope, calibration.ZeroResponse), (loaded.Slope, loaded.ZeroResponse));
            calibration = loaded;
        }

        return (calibration, setup);
    }

    /// <summary>The same, and on to a corrected reading.</summary>
    private static Corrected Measure(CoverageCase what, Entered entered, Errors? trial, bool withRecord)
    {
        double Off(string name, double u, bool rectangular = false)
        {
            return trial == null ? 0 : rectangular ? trial.Rectangular(name, u) : trial.Normal(name, u);
        }

        (ProbeCalibration calibration, CalibrationSetup setup) = Calibrate(what, entered, trial, withRecord);
        double offset = Off("thermometer", OffsetKelvin);
        double coefficient = Off("coefficient", what.Probe.CoefficientUncertainty);
        double celsius = entered.ReadingCelsius - offset - Off("celsius of the reading", UncertaintyDefaults.TemperatureKelvin, rectangular: true);
        double flow = 1 + Off("stirring", what.Probe.StirringUncertainty);
        if (trial != null && what.Probe.IsMeter)
        {
            flow *= CoverageCases.Membrane(celsius, coefficient) / CoverageCases.Membrane(entered.ReadingCelsius, 0);
            celsius = entered.ReadingCelsius;
        }

        double residual = trial != null && what.Probe.ZeroIsAssumed ? entered.Signals[0] * trial.Rectangular("zero", UncertaintyDefaults.AssumedZeroRelative) : 0;
        ReadingConditions conditions = new(
            setup.Equation, what.Probe.Noise, hasSameThermometer: true, OffsetKelvin, UncertaintyDefaults.TemperatureKelvin, BarometerHectopascal, SalinityUncertainty,
            Stirring.Stirred, flow, what.Probe.StirringUncertainty);
        Reading result = new();
        _ = Correction.Correct(
            calibration, conditions, entered.ReadingSignal - residual - Off("signal of the reading", what.Probe.Noise), celsius,
            setup.Pressure.Hectopascal!.Value, setup.Salinity.Value, 0, RangeRule.Extrapolate, result);
        return new Corrected(
            result.Value(ReadingQuantity.PartialPressure),
            result.StandardUncertainty(ReadingQuantity.PartialPressure),
            // What a trial's solubility makes of a reference is the other way round for a reading.
            result.Value(ReadingQuantity.MilligramsPerLitre) / (1 + Off("equation", CoverageCases.EquationRelative)),
            result.StandardUncertainty(ReadingQuantity.MilligramsPerLitre));
    }

    /// <summary>A trial of what nobody can enter: another state of the reference, oxygen left at zero, another solubility.</summary>
    private static RecordedPoint Moved(CoverageCase what, CalibrationSetup setup, List<RecordedPoint> before, RecordedPoint made, int index, Errors trial)
    {
        CoveragePoint point = what.Points[index];
        double left = point.Left(trial, made.Temperature.Value);
        double equation = point.TakesEquation ? 1 + trial.Normal("equation", CoverageCases.EquationRelative) : 1;
        RecordedPoint moved = made with
        {
            FlowFactor = made.FlowFactor * point.State(trial),
            ReferencePartialPressureHectopascal = (made.ReferencePartialPressureHectopascal * equation) + left,
        };
        if (left == 0 || !PlanCheck.IsOnePoint(setup))
        {
            return moved;
        }

        // A zero that belongs to one point is a signal: what it would have been without the rest of oxygen.
        IProbeModel model = RecordConversion.Model(setup.Probe);
        model.Response(made.Signal.Mean, made.Temperature.Value, made.Pressure.Value, 0, RangeRule.Extrapolate, out double zero);
        model.Response(before[0].Signal.Mean, before[0].Temperature.Value, made.Pressure.Value, 0, RangeRule.Extrapolate, out double span);
        double without = zero - ((span - zero) * left / before[0].ReferencePartialPressureHectopascal);
        model.Signal(without, made.Temperature.Value, made.Pressure.Value, 0, RangeRule.Extrapolate, out double signal);
        return moved with { Signal = made.Signal with { Mean = signal } };
    }

    /// <summary>A trial of a meter: it divided by its membrane's gain at what its thermometer showed, while the true gain and the true reference are those of another temperature.</summary>
    private static RecordedPoint ByMeter(RecordedPoint made, double celsius, double coefficient)
    {
        double gain = CoverageCases.Membrane(celsius, coefficient) / CoverageCases.Membrane(made.Temperature.Value, 0);
        double reference = (made.Pressure.Value - Nature.Vapour(celsius)) / (made.Pressure.Value - Nature.Vapour(made.Temperature.Value));
        return made with { FlowFactor = made.FlowFactor * gain * reference };
    }

    private sealed class Middle : Random
    {
        public override double NextDouble()
        {
            return 0.25;
        }
    }
}
