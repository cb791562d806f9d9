using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// What is true at a point, by the method of the point: partial pressure, concentration, and the budget of both. Pure arithmetic on what was entered, so that it can be done
/// again years later from the record.
/// </summary>
internal static class References
{
    private const string BarometerPrefix = "barometer:";

    /// <summary>Gases of which air holds everywhere the same.</summary>
    private static readonly Gas[] SettledInAir = [Gas.Oxygen, Gas.Nitrogen, Gas.Argon, Gas.Neon, Gas.Helium, Gas.Krypton, Gas.Xenon];

    /// <summary>The reference of a point.</summary>
    /// <param name="plan">Role, method and what was entered for it.</param>
    /// <param name="setup">The set-up.</param>
    /// <param name="conditions">Temperature and pressure at the point.</param>
    /// <param name="temperatureUncertaintyKelvin">Standard uncertainty of that temperature without the thermometer's own offset, K.</param>
    /// <exception cref="InputException">No reference can be computed from what was entered; one line says why.</exception>
    internal static PointReference Of(PlannedPoint plan, CalibrationSetup setup, Conditions conditions, double temperatureUncertaintyKelvin)
    {
        ReferenceSum sum = Sum(plan, setup, conditions, temperatureUncertaintyKelvin);
        return sum.ToReference(new RecordedReference
        {
            Equipment = Equipment(plan, setup),
            Titration = plan.Method == MethodIds.Titration ? plan.Titration : null,
            Mixture = plan.Mixture,
            Transfer = plan.Method == MethodIds.TransferStandard ? plan.Transfer : null,
        });
    }

    /// <summary>The same before it is put into a record, with every input.</summary>
    internal static ReferenceSum Sum(PlannedPoint plan, CalibrationSetup setup, Conditions conditions, double temperatureUncertaintyKelvin)
    {
        Place at = new(plan, setup, conditions, temperatureUncertaintyKelvin);
        bool total = ModelNames.IsTotalPressure(setup.Probe.Model);
        switch (plan.Method)
        {
            case MethodIds.AirSaturatedWater:
            case MethodIds.WaterSaturatedAir:
                return total ? TotalPressure(at) : Air(at);
            case MethodIds.ZeroSolution:
            case MethodIds.ZeroGas:
                return Zero(at, total);
            case MethodIds.GasMixture:
                return total ? TotalPressure(at) : Mixed(at, plan.Mixture ?? throw Missing(plan, "a gas mixture has a cylinder and a mole fraction, for example --mixture \"CYL-21 20.95% u 0.02% dry\""));
            case MethodIds.TransferStandard:
                return TransferReference.Sum(at, plan.Transfer ?? throw Missing(plan, "what did the standard show? For example --transfer \"STD-3 8.41mg/L u 0.05mg/L\""));
            case MethodIds.Titration:
                return total
                    ? throw Missing(plan, "a titration says nothing of the total gas pressure")
                    : TitrationReference.Sum(at, plan.Titration ?? throw Missing(plan, "the titres are missing, for example --titration \"8.02mL,8.05mL,8.03mL flask 300.2mL titrant 0.025mol/L u 0.0001mol/L drawn 20.1C\""));
            default:
                throw Wrong.Input("method", plan.Method, $"there is no such method{NearestName.DidYouMean(plan.Method, MethodIds.All)}; there are {string.Join(", ", MethodIds.All)}");
        }
    }

    /// <summary>Air over water or water under air, both in equilibrium. A chamber whose humidity was entered goes by that.</summary>
    private static ReferenceSum Air(Place at)
    {
        if (Array.IndexOf(SettledInAir, at.Gas) < 0)
        {
            throw Missing(at.Plan, $"how much {GasNames.NameOf(at.Gas)} air holds changes from place to place; take --method gas-mixture with what was measured");
        }

        bool chamber = at.Plan.Method == MethodIds.WaterSaturatedAir && at.Plan.Mixture != null;
        if (chamber)
        {
            return Mixed(at, at.Plan.Mixture!);
        }

        ReferenceSum sum = Gaseous(at, DryAir.MoleFraction(at.Gas), 100, out Slopes slopes);
        AddPlace(sum, at, slopes);
        double state = at.StateRelative(out string source);
        sum.Add(ReferenceInputs.State, "1", 1, state, sum.Hectopascal, sum.MilligramsPerLitre, source);
        return sum;
    }

    /// <summary>x·(P − h·pw): a cylinder's gas, dry or humidified; or air of known humidity.</summary>
    private static ReferenceSum Mixed(Place at, RecordedMixture mixture)
    {
        ReferenceSum sum = Gaseous(at, mixture.MoleFraction.Value, mixture.RelativeHumidityPercent.Value, out Slopes slopes);
        sum.Add(ReferenceInputs.Fraction(mixture.Cylinder), mixture.MoleFraction, slopes.Fraction, slopes.MilligramFraction);
        sum.Add(ReferenceInputs.Humidity, mixture.RelativeHumidityPercent, slopes.Humidity, slopes.MilligramHumidity);
        AddPlace(sum, at, slopes);
        return sum;
    }

    /// <summary>A probe of total gas pressure in gas or in water at equilibrium feels the station pressure, whatever the gas is.</summary>
    private static ReferenceSum TotalPressure(Place at)
    {
        ReferenceSum sum = new() { Hectopascal = at.Pressure };
        sum.Add(ReferenceInputs.Pressure, "hPa", at.Pressure, at.PressureUncertainty, 1, 0, at.PressureSource);
        if (at.Plan.Method == MethodIds.AirSaturatedWater)
        {
            double state = at.StateRelative(out string source);
            sum.Add(ReferenceInputs.State, "1", 1, state, at.Pressure, 0, source);
        }

        return sum;
    }

    /// <summary>No oxygen, but for what may be left of it; a zero gas of stated purity goes by that.</summary>
    private static ReferenceSum Zero(Place at, bool total)
    {
        if (total)
        {
            throw Missing(at.Plan, "a probe of total gas pressure has no zero in a solution or a gas; check it against a gauge");
        }

        if (at.Plan.Mixture is RecordedMixture purity)
        {
            return at.Plan.Method == MethodIds.ZeroGas
                ? Mixed(at, purity)
                : throw Missing(at.Plan, "a cylinder belongs to a zero under gas; say --zero-method zero-gas");
        }

        if (at.Gas != Gas.Oxygen)
        {
            throw Missing(at.Plan, at.Plan.Method == MethodIds.ZeroSolution
                ? $"sulfite takes oxygen out of water and leaves {GasNames.NameOf(at.Gas)} in it; take zero-gas"
                : $"say how much {GasNames.NameOf(at.Gas)} the zero gas may hold, for example --zero-mixture \"CYL-2 0ppm u 1ppm dry\"");
        }

        double perMilligram = 1 / at.MilligramsPerHectopascal();
        ReferenceSum sum = new() { Hectopascal = 0, MilligramsPerLitre = 0 };
        sum.Add(ReferenceInputs.ZeroOxygen, "mg/L", 0, MethodDefaults.ZeroMilligramsPerLitre, perMilligram, 1, MethodDefaults.ZeroSource);
        return sum;
    }

    /// <summary>The gas phase through Core: values and slopes of both quantities.</summary>
    private static ReferenceSum Gaseous(Place at, double fraction, double humidity, out Slopes slopes)
    {
        at.Require(GasEquilibrium.PartialPressure(at.Gas, at.Celsius, at.Salinity, at.Pressure, fraction, humidity, RangeRule.Refuse, out double hectopascal));
        at.Require(GasEquilibrium.PartialPressureSensitivities(
            at.Gas, at.Celsius, at.Salinity, at.Pressure, fraction, humidity, RangeRule.Refuse,
            out double kelvin, out double salinity, out double pressure, out double perFraction, out double perHumidity));
        ReferenceSum sum = new() { Hectopascal = hectopascal };
        Status dissolved = GasEquilibrium.MilligramsPerLitre(
            at.Gas, at.Equation, at.Celsius, at.Salinity, at.Pressure, fraction, humidity, RangeRule.Refuse, out double milligrams);
        if (dissolved == Status.Ok)
        {
            at.Require(GasEquilibrium.MilligramsPerLitreSensitivities(
                at.Gas, at.Equation, at.Celsius, at.Salinity, at.Pressure, fraction, humidity, RangeRule.Refuse,
                out double milligramKelvin, out double milligramSalinity, out double milligramPressure, out double milligramFraction, out double milligramHumidity));
            sum.MilligramsPerLitre = milligrams;
            slopes = new Slopes(
                kelvin, salinity, pressure, perFraction, perHumidity, milligramKelvin, milligramSalinity, milligramPressure, milligramFraction, milligramHumidity);
            return sum;
        }

        // In gas from a cylinder the water's equation is beside the point; over and in water it must hold.
        if (at.Plan.Method is MethodIds.AirSaturatedWater or MethodIds.WaterSaturatedAir)
        {
            at.Require(dissolved);
        }

        slopes = new Slopes(kelvin, salinity, pressure, perFraction, perHumidity, 0, 0, 0, 0, 0);
        return sum;
    }

    private static void AddPlace(ReferenceSum sum, Place at, Slopes slopes)
    {
        at.Add(sum, slopes.Kelvin, slopes.MilligramKelvin, slopes.Salinity, slopes.MilligramSalinity, slopes.Pressure, slopes.MilligramPressure);
        if (!double.IsNaN(sum.MilligramsPerLitre))
        {
            at.AddEquation(sum, 0, sum.MilligramsPerLitre);
        }
    }

    private static string[] Equipment(PlannedPoint plan, CalibrationSetup setup)
    {
        List<string> ids = [];
        if (setup.Pressure.Source.StartsWith(BarometerPrefix, StringComparison.Ordinal))
        {
            ids.Add(setup.Pressure.Source[BarometerPrefix.Length..]);
        }

        if (plan.Mixture is RecordedMixture mixture && mixture.Cylinder != MixtureText.Air)
        {
            ids.Add(mixture.Cylinder);
        }

        if (plan.Method == MethodIds.TransferStandard && plan.Transfer is RecordedTransfer transfer)
        {
            ids.Add(transfer.Standard);
        }

        return [.. ids];
    }

    internal static InputException Missing(PlannedPoint plan, string problem)
    {
        return new InputException($"point {plan.Role} by {plan.Method}: {problem}");
    }

    private readonly record struct Slopes(
        double Kelvin, double Salinity, double Pressure, double Fraction, double Humidity,
        double MilligramKelvin, double MilligramSalinity, double MilligramPressure, double MilligramFraction, double MilligramHumidity);

    /// <summary>Where the point is: conditions with their uncertainties, gas and equation.</summary>
    internal sealed class Place(PlannedPoint plan, CalibrationSetup setup, Conditions conditions, double temperatureUncertaintyKelvin)
    {
        internal PlannedPoint Plan => plan;

        internal Gas Gas => setup.Gas;

        internal SolubilityEquation Equation { get; } = setup.Gas == Gas.Oxygen ? setup.Equation : GasDefaults.Equation(setup.Gas);

        internal double Celsius => conditions.TemperatureCelsius;

        internal double Pressure => conditions.PressureHectopascal;

        internal double PressureUncertainty => setup.Pressure.StandardUncertaintyHectopascal;

        internal string PressureSource => setup.Pressure.UncertaintySource ?? setup.Pressure.Source;

        internal double Salinity => setup.Salinity.Value;

        internal bool IsTotalPressure => ModelNames.IsTotalPressure(setup.Probe.Model);

        /// <summary>The state of saturation: as entered for the main method, else the usual one of this method.</summary>
        internal double StateRelative(out string source)
        {
            source = plan.Method == MethodIds.WaterSaturatedAir
                ? "humidity of 95 to 100 % in a wet chamber, rectangular (computed)"
                : "aerated baths are typically within 0.5 to 1 % of saturation (from memory)";
            double usual = UncertaintyDefaults.ReferenceStateRelative(
                plan.Method == MethodIds.WaterSaturatedAir ? CalibrationMethod.WaterSaturatedAir : CalibrationMethod.AirSaturatedWater);
            if (plan.Method != setup.Method || setup.ReferenceStateRelative == usual)
            {
                return usual;
            }

            source = "entered";
            return setup.ReferenceStateRelative;
        }

        /// <summary>mg/L that one hPa of the gas stands for in this water.</summary>
        internal double MilligramsPerHectopascal()
        {
            Require(GasEquilibrium.ConcentrationFromPartialPressure(Gas, Equation, Celsius, Salinity, Pressure, 1, RangeRule.Refuse, out double milligrams));
            return milligrams;
        }

        /// <summary>The equation's own relative standard uncertainty.</summary>
        internal double EquationRelative()
        {
            Require(GasUncertainty.EquationRelative(Gas, Equation, Celsius, Salinity, Pressure, RangeRule.Refuse, out double relative));
            return relative;
        }

        /// <summary>Temperature by its two parts, salinity and pressure.</summary>
        internal void Add(ReferenceSum sum, double kelvin, double milligramKelvin, double salinity, double milligramSalinity, double pressure, double milligramPressure)
        {
            RecordedThermometer thermometer = setup.Probe.Thermometer;
            sum.Add(ReferenceInputs.ThermometerOffset, "K", 0, thermometer.CommonStandardUncertaintyCelsius, kelvin, milligramKelvin, thermometer.Source);
            sum.Add(ReferenceInputs.Temperature, "degC", Celsius, temperatureUncertaintyKelvin, kelvin, milligramKelvin, TemperatureSource());
            sum.Add(ReferenceInputs.Salinity, setup.Salinity, salinity, milligramSalinity);
            sum.Add(ReferenceInputs.Pressure, "hPa", Pressure, PressureUncertainty, pressure, milligramPressure, PressureSource);
        }

        internal void AddEquation(ReferenceSum sum, double perHectopascal, double perMilligram)
        {
            sum.Add(ReferenceInputs.Equation, "1", 1, EquationRelative(), perHectopascal, perMilligram, "stated for the solubility equation (docs/methods.md)");
        }

        internal void Require(Status status)
        {
            if (status == Status.Ok)
            {
                return;
            }

            string where = $"temperature {Number.Print(Celsius)} C, salinity {Number.Print(Salinity)}, pressure {Number.Print(Pressure)} hPa: no reference for {GasNames.NameOf(Gas)} can be computed there ({status})";
            throw new InputException(Gas == Gas.Oxygen ? where + "; the equation holds from 0 to 40 C and from 507 hPa" : where);
        }

        private string TemperatureSource()
        {
            return temperatureUncertaintyKelvin == UncertaintyDefaults.TemperatureKelvin
                ? "read to 0.1 C, rectangular (TM 9-A6.2)"
                : "reading and scatter over the window";
        }
    }
}
