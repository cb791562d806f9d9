using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Text.Json;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Peers.Tests.ByHand;

/// <summary>
/// Readings, titrations and lag corrections with their uncertainty, worked out once more outside the library by readings_by_hand.py, which knows no sensitivity: it moves each input and does the
/// whole chain again.
/// </summary>
public class ReadingsByHandTests(ITestOutputHelper output)
{
    private const int DefaultSeed = 20261201;

    /// <summary>Both sides do the same few dozen operations in doubles, on molar masses that are printed alike.</summary>
    private const double ValueTolerance = 1e-10;

    /// <summary>A central difference over a thousandth of an uncertainty: its rounding is some 1e-9, what it leaves out of a curve less.</summary>
    private const double UncertaintyTolerance = 1e-7;

    private static readonly int Count = Environment.GetEnvironmentVariable("PROBECAL_FULL") == "1" ? 200 : 10;
    private static readonly int Seed =
        int.TryParse(Environment.GetEnvironmentVariable("PROBECAL_SEED"), NumberStyles.Integer, CultureInfo.InvariantCulture, out int seed) ? seed : DefaultSeed;

    private static readonly TemperatureCoefficientForm[] Forms = Enum.GetValues<TemperatureCoefficientForm>();

    private readonly Random _random = new(Seed);
    private readonly Dictionary<string, double> _worst = [];

    [SkippableFact]
    public void ReadingsOfFits_ComeOutByHand()
    {
        ScipyPeer.Require();
        string[] kinds = ["amperometric", "stern-volmer", "uchida", "bittig", "severinghaus", "generic"];
        List<(object Line, Reading Reading)> cases = [.. kinds.SelectMany(kind => Enumerable.Range(0, Count).Select(i => OfFit(kind, i)))];
        Compare(cases);
    }

    [SkippableFact]
    public void ReadingsOfTwoPoints_ComeOutByHand()
    {
        ScipyPeer.Require();
        List<(object Line, Reading Reading)> cases = [.. new[] { "amperometric", "stern-volmer" }.SelectMany(kind => Enumerable.Range(0, 2 * Count).Select(i => OfTwoPoints(kind, i)))];
        Compare(cases);
    }

    [SkippableFact]
    public void Titrations_ComeOutByHand()
    {
        ScipyPeer.Require();
        List<object> lines = [];
        List<(double Value, double Uncertainty)> found = [];
        for (int i = 0; i < 5 * Count; i++)
        {
            double standard = Between(5, 15), normality = Between(0.008, 0.03), standardTitre = Between(5, 12), standardBlank = Between(-0.01, 0.03);
            double titre = Between(2, 12), blank = Between(-0.01, 0.03), flask = Between(100, 320), aliquot = flask * Between(0.3, 0.99), displaced = Between(0, 4), reagent = Between(0, 0.005);
            bool part = i % 2 == 0;
            Dictionary<string, double> u = new()
            {
                ["standard"] = 0.01,
                ["normality"] = 1e-5,
                ["standardTitre"] = 0.005,
                ["standardBlank"] = 0.003,
                ["titre"] = 0.004,
                ["blank"] = 0.002,
                ["flask"] = 0.05,
                ["aliquot"] = part ? 0.1 : 0,
                ["displaced"] = 0.03,
                ["reagent"] = 3e-4,
            };
            lines.Add(new { ask = "titration", part, u, q = new { standard, normality, standardTitre, standardBlank, titre, blank, flask, aliquot, displaced, reagent } });

            Assert.Equal(Status.Ok, WinklerTitration.Titrant(standard, normality, standardTitre, standardBlank, out double titrant));
            Assert.Equal(Status.Ok, WinklerTitration.TitrantSensitivities(standard, normality, standardTitre, standardBlank, out double ofStandard, out double ofNormality, out double ofTitre));
            double uTitrant = Root(ofStandard * u["standard"], ofNormality * u["normality"], ofTitre * u["standardTitre"], ofTitre * u["standardBlank"]);
            double titrated = part ? aliquot : double.NaN;
            Assert.Equal(Status.Ok, WinklerTitration.MilligramsPerLitre(titre, blank, titrant, flask, titrated, displaced, reagent, out double milligrams));
            Assert.Equal(Status.Ok, WinklerTitration.MilligramsPerLitreSensitivities(
                titre, blank, titrant, flask, titrated, displaced, reagent,
                out double perTitre, out double perTitrant, out double perFlask, out double perAliquot, out double perDisplaced, out double perReagent));
            found.Add((milligrams, Root(
                perTitre * u["titre"], perTitre * u["blank"], perTitrant * uTitrant, perFlask * u["flask"], perAliquot * u["aliquot"], perDisplaced * u["displaced"], perReagent * u["reagent"])));
        }

        Check("titration", found, Ask(lines), ValueTolerance);
    }

    [SkippableFact]
    public void PartialPressuresOfConcentrations_ComeOutByHand()
    {
        ScipyPeer.Require();
        List<object> lines = [];
        List<(double Value, double Uncertainty)> found = [];
        for (int i = 0; i < 3 * Count; i++)
        {
            double t = Between(1, 35), s = Between(1, 38), hpa = Between(700, 1050), mg = Between(0.1, 14);
            Dictionary<string, double> u = new() { ["t"] = 0.1, ["s"] = 0.2, ["hpa"] = 1, ["mg"] = 0.05, ["equation"] = 0.002 };
            lines.Add(new { ask = "from-concentration", gas = "O2", equation = "garcia-gordon-1992", t, s, hpa, mg, u });
            Assert.Equal(Status.Ok, GasEquilibrium.PartialPressureFromConcentration(Gas.Oxygen, SolubilityEquation.GarciaGordon1992, t, s, hpa, mg, RangeRule.Refuse, out double p));
            Assert.Equal(Status.Ok, GasEquilibrium.PartialPressureFromConcentrationSensitivities(
                Gas.Oxygen, SolubilityEquation.GarciaGordon1992, t, s, hpa, mg, RangeRule.Refuse, out double perKelvin, out double perSalinity, out double perHectopascal, out double perMilligram));
            found.Add((p, Root(perKelvin * u["t"], perSalinity * u["s"], perHectopascal * u["hpa"], perMilligram * u["mg"], p * u["equation"])));
        }

        Check("hPa of mg/L", found, Ask(lines), ValueTolerance);
    }

    [SkippableFact]
    public void LagCorrections_ComeOutByHand()
    {
        ScipyPeer.Require();
        List<object> lines = [];
        List<double[]> found = [];
        for (int i = 0; i < 3 * Count; i++)
        {
            double tau = Between(0, 60), before = Between(0.5, 20), after = Between(0.5, 20);
            double[] y = [Between(-1, 12), Between(-1, 12), Between(-1, 12)];
            lines.Add(new { ask = "lag", tau, before, after, y });
            Assert.Equal(Status.Ok, LagCorrection.Central(tau, before, after, y[0], y[1], y[2], out double central, out double noise));
            Assert.Equal(Status.Ok, LagCorrection.Backward(tau, before, y[0], y[1], out double backward, out double backwardNoise));
            found.Add([central, noise, backward, backwardNoise]);
        }

        List<double[]> hand = Ask(lines);
        for (int i = 0; i < found.Count; i++)
        {
            // A parabola by linear algebra keeps ten of sixteen digits of weights that cancel.
            double scale = 12 * hand[i][1];
            for (int k = 0; k < 4; k++) { Assert.Equal(hand[i][k], found[i][k], 1e-10 * (k == 2 ? 12 * hand[i][3] : scale)); }
        }
    }

    private (object Line, Reading Reading) OfFit(string kind, int number)
    {
        bool carbonDioxide = kind == "severinghaus";
        (IProbeModel model, Dictionary<string, object> described) = Model(kind, number);
        double[] parameters = kind switch
        {
            "amperometric" => [Between(-0.3, 0.6), Between(0.2, 0.4), number % 3 == 0 ? 0 : Between(-1e-4, 2e-4)],
            "stern-volmer" => [Between(0.8, 1.2), Between(0.008, 0.015), number % 3 == 0 ? 0 : Between(-5e-6, 0)],
            "severinghaus" => [Between(-130, -90), Between(54, 59), number % 3 == 0 ? 0 : Between(-0.5, 0.5)],
            "generic" => [Between(80, 100), Between(-0.5, -0.3), number % 3 == 0 ? 0 : Between(0, 2e-4)],
            _ => [Between(-0.5, 0.5), Between(0.95, 1.05), 0],
        };
        double[][] half = [.. Enumerable.Range(0, 3).Select(_ => Enumerable.Range(0, 3).Select(_ => Between(-1, 1)).ToArray())];
        double[] size = [3e-3, 3e-3 * Math.Abs(parameters[1]), parameters[2] == 0 ? 0 : 3e-6 * Math.Abs(parameters[1])];
        double[][] covariance = [.. Enumerable.Range(0, 3).Select(i => Enumerable.Range(0, 3).Select(j => size[i] * size[j] * half[i].Zip(half[j], static (a, b) => a * b).Sum()).ToArray())];
        double[] perKelvin = [Between(-1, 1) * 1e-2, Between(-1, 1) * 1e-2 * parameters[1], parameters[2] == 0 ? 0 : Between(-1, 1) * 1e-6];
        double coefficientSize = 1 / (double)described["coefficientSize"];
        double[] perCoefficient = [Between(-1, 1) * 0.01 * coefficientSize, Between(-1, 1) * 0.1 * parameters[1] * coefficientSize, 0];
        (double lowest, double highest) = carbonDioxide ? (0.05, 50) : (0, 400);
        FittedResponse fit = new(
            parameters[0], parameters[1], parameters[2], covariance[0][0], covariance[0][1], covariance[1][1], covariance[0][2], covariance[1][2], covariance[2][2],
            perKelvin[0], perKelvin[1], perKelvin[2], perCoefficient[0], perCoefficient[1], perCoefficient[2], lowest, highest);

        Place at = DrawPlace(number);
        double uCoefficient = 0.01 * (double)described["coefficientSize"];
        Gas gas = carbonDioxide ? Gas.CarbonDioxide : Gas.Oxygen;
        Assert.Equal(Status.Ok, ProbeCalibration.CreateFitted(model, gas, fit, Stirring.Stirred, 1, at.OffsetThen, uCoefficient, out ProbeCalibration? calibration));
        double truth = carbonDioxide ? Between(0.2, 20) : Between(5, 250);
        Assert.Equal(Status.Ok, model.Gain(at.Celsius, RangeRule.Refuse, out double gain));
        Assert.Equal(Status.Ok, ResponseCurve.ResponseTo(truth, parameters[0], parameters[1], parameters[2], at.Flow, gain, carbonDioxide, out double response));
        double signal = SignalOf(model, response, at);
        SolubilityEquation equation = carbonDioxide ? SolubilityEquation.Weiss1974 : SolubilityEquation.BensonKrause1984;
        double uSignal = 1e-3 * Math.Abs(signal);
        return (
            new
            {
                ask = "fitted",
                model = described,
                gas = carbonDioxide ? "CO2" : "O2",
                equation = carbonDioxide ? "weiss-1974" : "benson-krause-1984",
                trace = carbonDioxide,
                fit = new { parameters, covariance, perKelvin, perCoefficient },
                signal,
                t = at.Celsius,
                s = at.Salinity,
                hpa = at.Hectopascal,
                dbar = at.Decibar,
                flow = at.Flow,
                u = Uncertainties(at, gas, equation, uSignal, uCoefficient),
            },
            Read(calibration!, at, equation, signal, uSignal));
    }

    private (object Line, Reading Reading) OfTwoPoints(string kind, int number)
    {
        (IProbeModel model, Dictionary<string, object> described) = Model(kind, number);
        (double zeroResponse, double perHectopascal) = kind == "amperometric" ? (Between(-0.2, 0.6), Between(0.2, 0.4)) : (Between(0.8, 1.2), Between(0.008, 0.015));
        Place then = DrawPlace(0) with { Decibar = 0, Flow = 1 };
        double zeroCelsius = then.Celsius - 1.5;
        double ratio = number % 3 == 0 ? 1.02 : 1;
        Assert.Equal(Status.Ok, OxygenEquilibrium.PartialPressure(then.Celsius, then.Hectopascal, RangeRule.Refuse, out double air));
        Assert.Equal(Status.Ok, model.Gain(then.Celsius, RangeRule.Refuse, out double gain));
        double pointSignal = SignalOf(model, zeroResponse + (perHectopascal * gain * ratio * air), then);
        double zeroSignal = SignalOf(model, zeroResponse, then with { Celsius = zeroCelsius });
        double uPoint = 1e-3 * Math.Abs(pointSignal), uZero = 1e-3 * Math.Abs(zeroSignal), uCoefficient = 0.01 * (double)described["coefficientSize"];
        CalibrationPoint point = new(
            CalibrationMethod.WaterSaturatedAir, pointSignal, uPoint, then.Celsius, 0.03, then.Hectopascal, 0.8, Stirring.Stirred, 1, ratio, ratio == 1 ? 0 : 0.01, 0.005);
        Place at = DrawPlace(number);
        Assert.Equal(Status.Ok, ProbeCalibration.Create(
            model, point, new ZeroPoint(true, zeroSignal, uZero, zeroCelsius, then.Hectopascal), at.OffsetThen, uCoefficient, out ProbeCalibration? calibration));
        // Every fourth reading is in water that is nearly without oxygen, where the zero is all that counts.
        double truth = number % 4 == 3 ? Between(0.1, 1) : Between(20, 250);
        Assert.Equal(Status.Ok, model.Gain(at.Celsius, RangeRule.Refuse, out double gainNow));
        double signal = SignalOf(model, zeroResponse + (perHectopascal * gainNow * at.Flow * truth), at);
        double uSignal = 1e-3 * Math.Abs(signal);
        Dictionary<string, double> u = Uncertainties(at, Gas.Oxygen, SolubilityEquation.BensonKrause1984, uSignal, uCoefficient);
        foreach ((string name, double value) in new[]
        {
            ("t1", 0.03), ("hpa1", 0.8), ("signal1", uPoint), ("zero", uZero), ("ratio", ratio == 1 ? 0 : 0.01), ("state", 0.005),
        })
        {
            u[name] = value;
        }

        return (
            new
            {
                ask = "two-points",
                model = described,
                gas = "O2",
                equation = "benson-krause-1984",
                point = new { signal = pointSignal, t = then.Celsius, hpa = then.Hectopascal, zero = zeroSignal, tz = zeroCelsius, ratio },
                signal,
                t = at.Celsius,
                s = at.Salinity,
                hpa = at.Hectopascal,
                dbar = at.Decibar,
                flow = at.Flow,
                u,
            },
            Read(calibration!, at, SolubilityEquation.BensonKrause1984, signal, uSignal));
    }

    private (IProbeModel Model, Dictionary<string, object> Described) Model(string kind, int number)
    {
        const double Reference = 20;
        TemperatureCoefficientForm form = Forms[number % Forms.Length];
        double coefficient = form == TemperatureCoefficientForm.Arrhenius ? Between(15_000, 30_000) : Between(0.015, 0.035);
        double[] more = form == TemperatureCoefficientForm.Polynomial ? [Between(-2e-4, 2e-4), Between(-2e-6, 2e-6)] : [0, 0];
        double depth = Between(-0.02, 0.02);
        Dictionary<string, object> described = new()
        {
            ["kind"] = kind,
            ["reference"] = Reference,
            ["form"] = form.ToString().ToLowerInvariant(),
            ["coefficient"] = coefficient,
            ["more"] = more,
            ["depth"] = depth,
            ["coefficientSize"] = coefficient,
        };
        switch (kind)
        {
            case "amperometric":
                double residual = number % 2 == 0 ? Between(0.1, 2) : 0, residualPerKelvin = Between(0.02, 0.08);
                (described["residual"], described["residualPerKelvin"]) = (residual, residualPerKelvin);
                return (new AmperometricProbe(form, coefficient, more[0], more[1], Reference, 0, 40, depth, residual, residualPerKelvin, 1), described);
            case "stern-volmer":
                double a = Between(-0.005, -0.001), b = Between(-2e-5, 2e-5);
                LuminescenceSignal signal = number % 2 == 0 ? LuminescenceSignal.PhaseDegrees : LuminescenceSignal.Lifetime;
                (described["a"], described["b"], described["signal"]) = (a, b, signal == LuminescenceSignal.PhaseDegrees ? "phase" : "lifetime");
                return (new SternVolmerProbe(signal, form, coefficient, more[0], more[1], a, b, depth, Reference, 0, 40), described);
            case "uchida":
            case "bittig":
                // The coefficients of the ported vector, each a little off.
                double[] c = [.. new[] { 2.848e-3, 1.14e-4, 1.51e-6, 70.42301, -0.10302, -12.9462, 1.265377 }.Select(v => v * Between(0.97, 1.03)), kind == "uchida" ? 0 : Between(-1e-4, 1e-4)];
                OptodePressureCorrection correction = number % 2 == 0 ? OptodePressureCorrection.Uchida2008 : OptodePressureCorrection.Bittig2015;
                (described["c"], described["correction"], described["lost"]) = (c, number % 2 == 0 ? "uchida" : "bittig", 0.1);
                described["equation"] = "garcia-gordon-1992";
                return (kind == "uchida"
                    ? new Uchida2008Probe(c[0], c[1], c[2], c[3], c[4], c[5], c[6], SolubilityEquation.GarciaGordon1992, correction, 0.1, 0, 40)
                    : new Bittig2018Probe(c[0], c[1], c[2], c[3], c[4], c[5], c[6], c[7], correction, 0.1, 0, 40), described);
            case "severinghaus":
                double perKelvin = Between(-0.5, 0.5);
                described["perKelvin"] = perKelvin;
                return (new SeveringhausProbe(perKelvin, Reference, 0, 40), described);
            default:
                described["coefficient"] = described["coefficientSize"] = 0.004;
                return (new GenericProbe(0.004, Reference, 0, 40), described);
        }
    }

    private static double SignalOf(IProbeModel model, double response, Place at)
    {
        Assert.Equal(Status.Ok, model.Signal(response, at.Celsius, at.Hectopascal, at.Decibar, RangeRule.Refuse, out double signal));
        return signal;
    }

    private static Reading Read(ProbeCalibration calibration, Place at, SolubilityEquation equation, double signal, double uSignal)
    {
        ReadingConditions conditions = new(equation, uSignal, at.IsSameThermometer, at.OtherOffset, at.UCelsius, 1.1, 0.25, Stirring.Stirred, at.Flow, 0.01);
        Reading reading = new();
        Assert.Equal(Status.Ok, Correction.Correct(calibration, conditions, signal, at.Celsius, at.Hectopascal, at.Salinity, at.Decibar, RangeRule.Refuse, reading));
        Assert.Equal(Status.Ok, reading.UncertaintyStatus);
        return reading;
    }

    private static Dictionary<string, double> Uncertainties(Place at, Gas gas, SolubilityEquation equation, double uSignal, double uCoefficient)
    {
        Assert.Equal(Status.Ok, GasUncertainty.EquationRelative(gas, equation, at.Celsius, at.Salinity, at.Hectopascal, RangeRule.Refuse, out double relative));
        return new()
        {
            ["offset"] = at.IsSameThermometer ? at.OffsetThen : 0,
            ["offsetThen"] = at.IsSameThermometer ? 0 : at.OffsetThen,
            ["t"] = at.IsSameThermometer ? at.UCelsius : Root(at.UCelsius, at.OtherOffset),
            ["coefficient"] = uCoefficient,
            ["signal"] = uSignal,
            ["flow"] = 0.01,
            ["hpa"] = 1.1,
            ["s"] = 0.25,
            ["equation"] = relative,
        };
    }

    private void Compare(List<(object Line, Reading Reading)> cases)
    {
        List<double[]> hand = Ask([.. cases.Select(static each => each.Line)]);
        for (int i = 0; i < cases.Count; i++)
        {
            (object line, Reading reading) = cases[i];
            Same("hPa", reading.Value(ReadingQuantity.PartialPressure), hand[i][0], ValueTolerance, line);
            Same("u of hPa", reading.StandardUncertainty(ReadingQuantity.PartialPressure), hand[i][1], UncertaintyTolerance, line);
            Same("mg/L", reading.Value(ReadingQuantity.MilligramsPerLitre), hand[i][2], ValueTolerance, line);
            Same("u of mg/L", reading.StandardUncertainty(ReadingQuantity.MilligramsPerLitre), hand[i][3], UncertaintyTolerance, line);
        }

        Report(cases.Count);
    }

    private void Check(string what, List<(double Value, double Uncertainty)> found, List<double[]> hand, double tolerance)
    {
        for (int i = 0; i < found.Count; i++)
        {
            Same(what, found[i].Value, hand[i][0], tolerance, i);
            Same("u of " + what, found[i].Uncertainty, hand[i][1], UncertaintyTolerance, i);
        }

        Report(found.Count);
    }

    private void Same(string what, double found, double hand, double tolerance, object at)
    {
        double off = Math.Abs((found / hand) - 1);
        Assert.True(off <= tolerance, string.Create(CultureInfo.InvariantCulture, $"{what}: {found:R}, by hand {hand:R} ({off:E2}), seed {Seed}, at {JsonSerializer.Serialize(at)}"));
        _worst[what] = Math.Max(off, _worst.GetValueOrDefault(what));
    }

    private void Report(int count)
    {
        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{count} cases, seed {Seed}: {string.Join(", ", _worst.Select(static each => string.Create(CultureInfo.InvariantCulture, $"{each.Key} {each.Value:E1}")))}"));
    }

    private static List<double[]> Ask(List<object> lines)
    {
        return ByHandScript.Run(ScipyPeer.Python, "readings_by_hand.py", lines.Select(static line => JsonSerializer.Serialize(line)), lines.Count);
    }

    private Place DrawPlace(int number)
    {
        return new Place(
            Between(2, 34), Between(1, 36), Between(750, 1050), number % 2 == 0 ? 0 : Between(1, 500), Between(0.9, 1.05), number % 4 < 2, Between(0.02, 0.3), Between(0.02, 0.3), Between(0.02, 0.1));
    }

    private double Between(double low, double high)
    {
        return low + ((high - low) * _random.NextDouble());
    }

    private static double Root(params double[] parts)
    {
        return Math.Sqrt(parts.Sum(static part => part * part));
    }

    /// <summary>Where a reading is made, and by which thermometer.</summary>
    private sealed record Place(
        double Celsius, double Salinity, double Hectopascal, double Decibar, double Flow, bool IsSameThermometer, double OffsetThen, double OtherOffset, double UCelsius);
}
