using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>What another instrument shows of the same water.</summary>
internal sealed record CoverageDisplay(string Name, double StandardUncertainty, Func<double, double, double> Shows);

/// <summary>Each method on a membrane, and each model with one method.</summary>
internal static class CoverageCases
{
    internal const int Titres = 4;

    /// <summary>The solubility equation's own, as the program states it for nearly fresh water.</summary>
    internal const double EquationRelative = 0.001;

    private const double Joules = 22_000, JoulesUncertainty = 500;
    private const double Flask = 300, Titrant = 0.025, Blank = 0.05, TitreScatter = 0.01;
    private const string Foil = "c0=0.002848 c1=0.000114 c2=1.51e-6 c3=70.42301 c4=-0.10302 c5=-12.9462 c6=1.265377";
    private const string Range = " lowest-celsius=0 highest-celsius=40";

    internal static CoverageDisplay[] Displays { get; } =
    [
        new("standard in mg/L", 0.05, static (milligrams, _) => milligrams),
        new("gauge in hPa", 0.5, static (_, hectopascal) => hectopascal),
    ];

    private static RecordedTitration Told { get; } = TitrationText.Parse(
        "--titration", "12mL,12mL,12mL flask 300mL u 0.1mL titrant 0.025mol/L u 0.00002mol/L drawn 20C blank 0.05mL u 0.01mL");

    internal static IEnumerable<CoverageCase> All()
    {
        CoverageCase membrane = new("", MethodIds.AirSaturatedWater, Amperometric, []);
        CoverageProbe assumed = Amperometric with { ZeroIsAssumed = true };
        yield return membrane with { Name = "air-saturated water, zero assumed", Probe = assumed, Points = [Bath] };
        yield return membrane with
        {
            Name = "water-saturated air, zero assumed",
            Method = MethodIds.WaterSaturatedAir,
            Probe = assumed,
            Points = [Chamber],
            StateRelative = UncertaintyDefaults.WaterSaturatedAirRelative,
            AirToWaterRatio = new RecordedQuantity { Value = 1, Unit = "1", StandardUncertainty = UncertaintyDefaults.AirToWaterRatioRelative, Source = "entered" },
        };
        yield return membrane with { Name = "zero adjusted in sulfite", Points = [Bath, Sulfite], ZeroPlan = CalibrationIds.ZeroAdjust };
        yield return membrane with { Name = "titration", Method = MethodIds.Titration, Points = [Titrated, Sulfite], ZeroPlan = CalibrationIds.ZeroAdjust };
        yield return membrane with { Name = "gas mixtures, dry", Method = MethodIds.GasMixture, Points = [Mixture(0, 0.2095, 0.0002, false), Mixture(1, 0.05, 0.0002, false)], Reading = BetweenMixtures };
        yield return membrane with { Name = "gas mixtures, humidified", Method = MethodIds.GasMixture, Points = [Mixture(0, 0.2095, 0.0002, true), Mixture(1, 0.05, 0.0002, true)], Reading = BetweenMixtures };
        yield return membrane with { Name = "transfer standard", Method = MethodIds.TransferStandard, Points = [Transferred(0, "standard in mg/L", "mg/L"), Sulfite], ZeroPlan = CalibrationIds.ZeroAdjust };
        yield return membrane with
        {
            Name = "bath, two mixtures and zero",
            Points = [Bath, Mixture(1, 0.05, 0.0002, false), Mixture(2, 0.10, 0.0002, false), Sulfite],
            ZeroPlan = CalibrationIds.ZeroAdjust,
        };
        yield return membrane with { Name = "meter in mg/L", Probe = Meter, Points = [Bath] };
        yield return membrane with { Name = "stern-volmer", Probe = SternVolmer, Points = [Bath, Sulfite], ZeroPlan = CalibrationIds.ZeroAdjust };
        yield return membrane with { Name = "uchida-2008", Probe = Uchida, Points = [Bath, Sulfite], ZeroPlan = CalibrationIds.ZeroAdjust };
        yield return membrane with { Name = "bittig-2018", Probe = Bittig, Points = [Bath, Sulfite], ZeroPlan = CalibrationIds.ZeroAdjust };
        CoverageCase carbon = membrane with
        {
            Method = MethodIds.GasMixture,
            Gas = Gas.CarbonDioxide,
            Points = [Mixture(0, 0.05, 0.0005, false), Mixture(1, 0.01, 0.0001, false), Mixture(2, 0.025, 0.00025, false)],
            Reading = static (place, share) => (0.015 + (0.03 * share)) * place.Hectopascal,
        };
        yield return carbon with { Name = "severinghaus", Probe = Severinghaus };
        yield return carbon with { Name = "linear", Probe = Linear };
        yield return carbon with
        {
            Name = "quadratic",
            Probe = Quadratic,
            Form = "quadratic",
            Points = [Mixture(0, 0.05, 0.0005, false), Mixture(1, 0.01, 0.0001, false), Mixture(2, 0.025, 0.00025, false), Mixture(3, 0.001, 0.00002, false)],
        };
        yield return membrane with
        {
            Name = "total-gas",
            Method = MethodIds.TransferStandard,
            Probe = TotalGas,
            Points = [Transferred(0, "gauge in hPa", "hPa"), Transferred(1, "gauge in hPa", "hPa") with { Truth = static (place, _) => place.Hectopascal - 100 }],
            Reading = static (place, share) => place.Hectopascal - (90 * share),
        };
    }

    internal static double Membrane(double celsius, double coefficientTooMuch)
    {
        return Nature.Arrhenius(Joules - coefficientTooMuch, celsius);
    }

    /// <summary>8 mg of oxygen to the milliequivalent; what is entered of flask, titrant and reagents has its errors, and so has the burette.</summary>
    internal static double Titre(double milligrams, Errors errors, string name)
    {
        double flask = Flask - errors.Normal("flask", 0.1);
        double displaced = Told.Displaced.Value - errors.Rectangular("displaced", Told.Displaced.StandardUncertainty);
        double reagents = Told.ReagentOxygenMilligrams.Value - errors.Rectangular("reagents", Told.ReagentOxygenMilligrams.StandardUncertainty);
        double titrant = Titrant - errors.Normal("titrant", 0.00002);
        double blank = Blank - errors.Normal("blank", 0.01);
        double titre = (((milligrams * (flask - displaced) / 1000) + reagents) / (8 * titrant)) + blank;
        return (titre * (1 + errors.Rectangular("burette", MethodDefaults.BuretteRelative))) + errors.Normal("titre " + name, TitreScatter);
    }

    private static double InAir(Place place)
    {
        return Nature.OxygenOfAir * (place.Hectopascal - Nature.Vapour(place.Celsius));
    }

    private static double BetweenMixtures(Place place, double share)
    {
        return (0.06 + (0.13 * share)) * place.Hectopascal;
    }

    private static CoveragePoint Bath { get; } = new(
        static (_, _) => new PlannedPoint { Role = CalibrationIds.SpanPoint, Method = MethodIds.AirSaturatedWater }, static (place, _) => InAir(place))
    {
        State = static errors => 1 + errors.Normal("state", UncertaintyDefaults.AirSaturatedWaterRelative),
    };

    private static CoveragePoint Chamber { get; } = new(
        static (_, _) => new PlannedPoint { Role = CalibrationIds.SpanPoint, Method = MethodIds.WaterSaturatedAir }, static (place, _) => InAir(place))
    {
        State = static errors => (1 + errors.Rectangular("state", UncertaintyDefaults.WaterSaturatedAirRelative)) * (1 + errors.Normal("ratio", UncertaintyDefaults.AirToWaterRatioRelative)),
    };

    private static CoveragePoint Sulfite { get; } = new(
        static (_, _) => new PlannedPoint { Role = CalibrationIds.ZeroPoint, Method = MethodIds.ZeroSolution }, static (_, _) => 0)
    {
        Left = static (errors, celsius) => errors.Normal("left", MethodDefaults.ZeroMilligramsPerLitre) / Nature.MilligramsPerHectopascal(celsius, 5),
    };

    private static CoveragePoint Titrated { get; } = new(
        static (entered, trial) =>
        {
            double[] titres = [.. Enumerable.Range(0, Titres).Select(titre => entered.Values[FormattableString.Invariant($"titre 0 {titre}")])];
            double burette = MethodDefaults.BuretteRelative * titres.Average();
            RecordedTitration told = Told with { TitreMillilitres = titres, BuretteStandardUncertaintyMillilitres = burette, DrawCelsius = entered.Celsius[0] };
            if (trial != null)
            {
                // The mean of a few titres follows Student's distribution with one degree of freedom less than there are of them (JCGM 101, 6.4.9).
                double mean = titres.Average();
                double deviation = Math.Sqrt(titres.Sum(titre => (titre - mean) * (titre - mean)) / (Titres - 1));
                double squares = Enumerable.Range(1, Titres - 1).Sum(i => Math.Pow(trial.Normal(FormattableString.Invariant($"student {i}"), 1), 2));
                double shift = (deviation / Math.Sqrt(Titres) * trial.Normal("student 0", 1) / Math.Sqrt(squares / (Titres - 1))) + trial.Rectangular("burette", burette);
                told = told with
                {
                    TitreMillilitres = [.. titres.Select(titre => titre - shift)],
                    Flask = told.Flask with { Value = Flask - trial.Normal("flask", 0.1) },
                    Displaced = told.Displaced with { Value = told.Displaced.Value - trial.Rectangular("displaced", told.Displaced.StandardUncertainty) },
                    ReagentOxygenMilligrams = told.ReagentOxygenMilligrams with
                    {
                        Value = told.ReagentOxygenMilligrams.Value - trial.Rectangular("reagents", told.ReagentOxygenMilligrams.StandardUncertainty),
                    },
                    Titrant = told.Titrant with { Value = Titrant - trial.Normal("titrant", 0.00002) },
                    Blank = told.Blank with { Value = Blank - trial.Normal("blank", 0.01) },
                };
            }

            return new PlannedPoint { Role = CalibrationIds.SpanPoint, Method = MethodIds.Titration, Titration = told };
        },
        static (place, _) => 0.93 * InAir(place))
    {
        TakesEquation = true,
    };

    private static CoveragePoint Mixture(int index, double fraction, double uncertainty, bool humid)
    {
        string cylinder = FormattableString.Invariant($"CYL-{index}");
        RecordedMixture certified = MixtureText.Parse(
            "--mixture", FormattableString.Invariant($"{cylinder} {100 * fraction:0.####}% u {100 * uncertainty:0.####}% {(humid ? "humid" : "dry")}"), Gas.Oxygen);
        double wet = MethodDefaults.HumidifiedPercent;
        double wetUncertainty = humid ? MethodDefaults.HumidifiedUncertaintyPercent : 0;
        string washing = FormattableString.Invariant($"humidity {index}");
        return new CoveragePoint(
            (_, trial) => new PlannedPoint
            {
                Role = index == 0 ? CalibrationIds.SpanPoint : CalibrationIds.LevelPrefix + index,
                Method = MethodIds.GasMixture,
                Mixture = trial == null ? certified : certified with
                {
                    MoleFraction = certified.MoleFraction with { Value = fraction - trial.Normal(cylinder, uncertainty) },
                    RelativeHumidityPercent = certified.RelativeHumidityPercent with { Value = humid ? wet - trial.Rectangular(washing, wetUncertainty) : 0 },
                },
            },
            (place, errors) => (fraction - errors.Normal(cylinder, uncertainty))
                * (place.Hectopascal - (humid ? (wet - errors.Rectangular(washing, wetUncertainty)) / 100 * Nature.Vapour(place.Celsius) : 0)));
    }

    private static CoveragePoint Transferred(int index, string display, string unit)
    {
        double uncertainty = Displays.Single(each => each.Name == display).StandardUncertainty;
        string name = FormattableString.Invariant($"{display} {index}");
        RecordedTransfer shown = TransferText.Parse("--transfer", FormattableString.Invariant($"STD-3 9{unit} u {uncertainty}{unit}"));
        return new CoveragePoint(
            (entered, trial) => new PlannedPoint
            {
                Role = index == 0 ? CalibrationIds.SpanPoint : CalibrationIds.LevelPrefix + index,
                Method = MethodIds.TransferStandard,
                Transfer = shown with { Shown = shown.Shown with { Value = entered.Values[name] - (trial?.Normal(display + index, uncertainty) ?? 0) } },
            },
            (place, _) => unit == "hPa" ? place.Hectopascal : 0.93 * InAir(place))
        {
            TakesEquation = unit == "mg/L",
        };
    }

    private static CoverageProbe Amperometric { get; } = new(
        static (hectopascal, celsius, _, tooMuch) => 0.45 * Membrane(celsius, tooMuch) * hectopascal, 0.05, static tooMuch => WithMembrane(tooMuch))
    {
        CoefficientUncertainty = JoulesUncertainty,
        StirringUncertainty = UncertaintyDefaults.StirredRelative,
    };

    /// <summary>A meter whose setting is 3 % off, in mg/L by its own thermometer, fresh water set.</summary>
    private static CoverageProbe Meter { get; } = new(
        static (hectopascal, celsius, shown, tooMuch) => 0.97 * hectopascal * Membrane(celsius, tooMuch) / Membrane(shown, 0) * Nature.MilligramsPerHectopascal(shown, 0),
        0.01,
        static _ => WithMembrane(0) with
        {
            Model = "meter-display",
            SignalUnit = "mg/L",
            MeterSettings = new RecordedMeterSettings { Shows = "mg/L", Equation = "benson-krause-1984", Salinity = 0, Resolution = 0.01 },
        })
    {
        CoefficientUncertainty = JoulesUncertainty,
        StirringUncertainty = UncertaintyDefaults.StirredRelative,
        ZeroIsAssumed = true,
        IsMeter = true,
    };

    /// <summary>Phase in degrees: its cotangent is one over lifetime, which falls with oxygen and with temperature.</summary>
    private static CoverageProbe SternVolmer { get; } = new(
        static (hectopascal, celsius, _, tooMuch) =>
            Math.Atan(1 / ((0.6 + (0.009 * Membrane(celsius, tooMuch) * hectopascal)) / (1 - (0.003 * (celsius - 25))))) * 180 / Math.PI,
        0.01,
        static tooMuch => ModelText.Apply("--model", "stern-volmer signal-kind=phase lifetime-per-kelvin=-0.003", WithMembrane(tooMuch)))
    {
        CoefficientUncertainty = JoulesUncertainty,
    };

    /// <summary>The maker's film shows 2 % and 0.5 hPa too much.</summary>
    private static CoverageProbe Uchida { get; } = new(
        static (hectopascal, celsius, _, _) => Phase(((1.02 * hectopascal) + 0.5) * Nature.MilligramsPerHectopascal(celsius, 0) / 0.031998, celsius),
        0.01,
        static _ => ModelText.Apply("--model", "uchida-2008 " + Foil + " solubility-equation=benson-krause-1984" + Range, Bench.Setup.Probe));

    private static CoverageProbe Bittig { get; } = new(
        static (hectopascal, celsius, _, _) => Phase((1.02 * hectopascal) + 0.5, celsius),
        0.01,
        static _ => ModelText.Apply("--model", "bittig-2018 " + Foil + Range, Bench.Setup.Probe));

    private static CoverageProbe Severinghaus { get; } = new(
        static (hectopascal, celsius, _, _) => -110 - (0.2 * (celsius - 25)) + (57 * (celsius + 273.15) / 298.15 * Math.Log10(hectopascal)),
        0.1,
        static _ => ModelText.Apply("--model", "severinghaus zero-per-kelvin=-0.2" + Range, Bench.Setup.Probe with { SignalUnit = "mV" }));

    private static CoverageProbe Linear { get; } = new(
        static (hectopascal, _, _, _) => 5 + (0.8 * hectopascal), 0.1, static _ => ModelText.Apply("--model", "linear" + Range, Bench.Setup.Probe));

    private static CoverageProbe Quadratic { get; } = new(
        static (hectopascal, _, _, _) => 5 + (0.8 * hectopascal) + (0.002 * hectopascal * hectopascal), 0.1, static _ => ModelText.Apply("--model", "quadratic" + Range, Bench.Setup.Probe));

    private static CoverageProbe TotalGas { get; } = new(
        static (hectopascal, _, _, _) => 3 + (1.004 * hectopascal), 0.3, static _ => ModelText.Apply("--model", "total-gas" + Range, Bench.Setup.Probe with { SignalUnit = "hPa" }));

    /// <summary>Phase of the form that both films share, in the unit of its coefficients.</summary>
    private static double Phase(double amount, double celsius)
    {
        double quenching = 0.002848 + (0.000114 * celsius) + (1.51e-6 * celsius * celsius);
        return (((70.42301 - (0.10302 * celsius)) / (1 + (quenching * amount))) + 12.9462) / 1.265377;
    }

    private static RecordedProbe WithMembrane(double tooMuch)
    {
        RecordedProbe probe = Bench.Setup.Probe;
        return tooMuch == 0 ? probe : probe with { TemperatureCoefficient = probe.TemperatureCoefficient with { Value = probe.TemperatureCoefficient.Value - tooMuch } };
    }
}
