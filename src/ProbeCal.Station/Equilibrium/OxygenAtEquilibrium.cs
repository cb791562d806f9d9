using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>The water and the air above it, as well as they are known.</summary>
/// <param name="TemperatureCelsius">Water temperature, °C (ITS-90).</param>
/// <param name="Salinity">Practical salinity.</param>
/// <param name="PressureHectopascal">Absolute station pressure, hPa.</param>
/// <param name="PressureSource">Where the pressure came from: <c>given</c> or <c>altitude</c>.</param>
/// <param name="TemperatureUncertaintyKelvin">Standard uncertainty of the temperature, K.</param>
/// <param name="SalinityUncertainty">Standard uncertainty of the salinity.</param>
/// <param name="PressureUncertaintyHectopascal">Standard uncertainty of the pressure, hPa.</param>
public sealed record WaterConditions(
    double TemperatureCelsius,
    double Salinity,
    double PressureHectopascal,
    string PressureSource,
    double TemperatureUncertaintyKelvin,
    double SalinityUncertainty,
    double PressureUncertaintyHectopascal);

/// <summary>What water in equilibrium with water-saturated air holds of oxygen, in every unit, with its standard uncertainty.</summary>
public sealed record OxygenAtEquilibrium
{
    private OxygenAtEquilibrium() { }

    /// <summary>The solubility equation.</summary>
    public required SolubilityEquation Equation { get; init; }

    /// <summary>What it was computed for.</summary>
    public required WaterConditions Conditions { get; init; }

    /// <summary>Vapour pressure of the water, hPa (Benson and Krause 1980, the form inside the pressure factor).</summary>
    public required double VapourPressureHectopascal { get; init; }

    /// <summary>Partial pressure of oxygen, hPa.</summary>
    public required double PartialPressureHectopascal { get; init; }

    /// <summary>Standard uncertainty of the partial pressure, hPa.</summary>
    public required double PartialPressureUncertaintyHectopascal { get; init; }

    /// <summary>Concentration, mg/L.</summary>
    public required double MilligramsPerLitre { get; init; }

    /// <summary>Standard uncertainty of the concentration, mg/L.</summary>
    public required double MilligramsPerLitreUncertainty { get; init; }

    /// <summary>Concentration, µmol/L.</summary>
    public required double MicromolesPerLitre { get; init; }

    /// <summary>Concentration, µmol/kg, with the density of EOS-80.</summary>
    public required double MicromolesPerKilogram { get; init; }

    /// <summary>Concentration, mL/L of the real gas at 0 °C and 1 atm.</summary>
    public required double MillilitresPerLitre { get; init; }

    /// <summary>This water against water in equilibrium with air at 1 atm, %: how far the local pressure moves "100 %".</summary>
    public required double PercentOfOneAtmosphere { get; init; }

    /// <summary>Change of the concentration with temperature, mg/L per K.</summary>
    public required double MilligramsPerLitrePerKelvin { get; init; }

    /// <summary>Change of the concentration with pressure, mg/L per hPa.</summary>
    public required double MilligramsPerLitrePerHectopascal { get; init; }

    /// <summary>Change of the concentration with practical salinity, mg/L per unit.</summary>
    public required double MilligramsPerLitrePerSalinity { get; init; }

    /// <summary>Computes it.</summary>
    /// <exception cref="InputException">A condition is outside the range of the equation; nothing is extrapolated.</exception>
    public static OxygenAtEquilibrium Compute(SolubilityEquation equation, WaterConditions conditions)
    {
        double t = conditions.TemperatureCelsius;
        double s = conditions.Salinity;
        double p = conditions.PressureHectopascal;
        const RangeRule Refuse = RangeRule.Refuse;

        Expect(OxygenEquilibrium.MilligramsPerLitre(equation, t, s, p, Refuse, out double mgPerL), equation, conditions);
        Expect(OxygenEquilibrium.PartialPressure(t, p, Refuse, out double pO2), equation, conditions);
        Expect(OxygenEquilibrium.MilligramsPerLitreSensitivities(equation, t, s, p, Refuse, out double perKelvin, out double perSalinity, out double perHectopascal), equation, conditions);
        Expect(OxygenUncertainty.MilligramsPerLitre(equation, t, s, p, conditions.TemperatureUncertaintyKelvin, conditions.SalinityUncertainty, conditions.PressureUncertaintyHectopascal, Refuse, out double uMgPerL), equation, conditions);
        Expect(OxygenUncertainty.PartialPressure(t, p, conditions.TemperatureUncertaintyKelvin, conditions.PressureUncertaintyHectopascal, Refuse, out double uPO2), equation, conditions);
        Expect(DensityEos80.Density(t, s, Refuse, out double density), equation, conditions);
        Expect(OxygenUnits.MicromolesPerKilogramFromMilligramsPerLitre(mgPerL, density, out double umolPerKg), equation, conditions);
        Expect(Saturation.PercentOneAtmosphere(pO2, t, Refuse, out double percentOneAtmosphere), equation, conditions);
        // Below 0 °C the vapour formula is continued, as the equations themselves do: an effect below 0.001 % on pO2.
        VapourBensonKrause1980.Pressure(t, RangeRule.Extrapolate, out double vapour);
        return new OxygenAtEquilibrium
        {
            Equation = equation,
            Conditions = conditions,
            VapourPressureHectopascal = vapour,
            PartialPressureHectopascal = pO2,
            PartialPressureUncertaintyHectopascal = uPO2,
            MilligramsPerLitre = mgPerL,
            MilligramsPerLitreUncertainty = uMgPerL,
            MicromolesPerLitre = OxygenUnits.MicromolesPerLitreFromMilligramsPerLitre(mgPerL),
            MicromolesPerKilogram = umolPerKg,
            MillilitresPerLitre = OxygenUnits.MillilitresPerLitreFromMilligramsPerLitre(mgPerL),
            PercentOfOneAtmosphere = percentOneAtmosphere,
            MilligramsPerLitrePerKelvin = perKelvin,
            MilligramsPerLitrePerSalinity = perSalinity,
            MilligramsPerLitrePerHectopascal = perHectopascal,
        };
    }

    private static void Expect(Status status, SolubilityEquation equation, WaterConditions conditions)
    {
        if (status != Status.Ok)
        {
            throw new InputException(Refusal(status, equation, conditions));
        }
    }

    private static string Refusal(Status status, SolubilityEquation equation, WaterConditions c)
    {
        string name = EquationNames.NameOf(equation);
        bool bensonKrause = equation == SolubilityEquation.BensonKrause1984;
        switch (StatusParts.Input(status))
        {
            case InputQuantity.Temperature:
                string range = bensonKrause ? "0 to 40 °C" : "the freezing point to 40 °C";
                string advice = 40 < c.TemperatureCelsius ? "; if it was read in °F, write for example 68F" : "";
                return Invariant($"--temperature {c.TemperatureCelsius} °C is outside {name}, which holds from {range}{advice}");
            case InputQuantity.Salinity:
                return Invariant($"--salinity {c.Salinity} is outside {name}, which holds from 0 to {(bensonKrause ? BensonKrause1984.HighestSalinity : GarciaGordon1992.HighestSalinity)}");
            case InputQuantity.Pressure:
                return Invariant($"the pressure {c.PressureHectopascal} hPa is outside {name}, which holds from {BensonKrause1984.LowestHectopascal} to {BensonKrause1984.HighestHectopascal} hPa (0.5 to 1.1 atm)");
            case InputQuantity.Uncertainty:
                return "a standard uncertainty is zero or above, in the unit of its quantity";
            default:
                return Invariant($"{status}: T {c.TemperatureCelsius} °C, S {c.Salinity}, P {c.PressureHectopascal} hPa");
        }
    }

    private static string Invariant(System.FormattableString text)
    {
        return text.ToString(CultureInfo.InvariantCulture);
    }
}
