namespace ProbeCal;

/// <summary>
/// Any gas that Core knows between water and a gas phase of given pressure, dry mole fraction and humidity: partial pressure in hPa and
/// concentration in mg/L.
/// </summary>
/// <remarks>
/// Skeleton: oxygen in water-saturated air only; the other gases follow.
/// </remarks>
public static class GasEquilibrium
{
    /// <summary>Partial pressure of the gas in the gas phase: x·(P − humidity·vapour pressure over the water).</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="celsius">Temperature (ITS-90), °C.</param>
    /// <param name="salinity">Practical salinity of the water under the gas.</param>
    /// <param name="pressureHectopascal">Absolute pressure of the gas phase, hPa.</param>
    /// <param name="moleFraction">Mole fraction of the gas in the dry gas phase, 0–1.</param>
    /// <param name="humidityPercent">Relative humidity of the gas phase, 0–100 %.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="partialPressureHectopascal">Partial pressure, hPa; NaN unless Ok or let pass by the rule.</param>
    public static Status PartialPressure(
        Gas gas, double celsius, double salinity, double pressureHectopascal, double moleFraction, double humidityPercent, RangeRule rule,
        out double partialPressureHectopascal)
    {
        partialPressureHectopascal = double.NaN;
        Status status = Supported(gas, moleFraction, humidityPercent);
        if (status != Status.Ok) { return status; }
        return OxygenEquilibrium.PartialPressure(celsius, pressureHectopascal, rule, out partialPressureHectopascal);
    }

    /// <summary>Concentration of water in equilibrium with the gas phase.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute pressure of the gas phase at the water surface, 506.625–1114.575 hPa; to 10 132.5 hPa for gases with fugacity data.</param>
    /// <param name="moleFraction">Mole fraction of the gas in the dry gas phase, 0–1.</param>
    /// <param name="humidityPercent">Relative humidity of the gas phase, 0–100 %.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L; NaN unless Ok or let pass by the rule.</param>
    public static Status MilligramsPerLitre(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double moleFraction,
        double humidityPercent, RangeRule rule, out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        Status status = Supported(gas, moleFraction, humidityPercent);
        if (status != Status.Ok) { return status; }
        return OxygenEquilibrium.MilligramsPerLitre(equation, celsius, salinity, pressureHectopascal, rule, out milligramsPerLitre);
    }

    /// <summary>Concentration of water in which the gas has a given partial pressure.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute total pressure, hPa.</param>
    /// <param name="partialPressureHectopascal">Partial pressure of the gas, hPa; negative values pass through.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L; NaN unless Ok or let pass by the rule.</param>
    public static Status ConcentrationFromPartialPressure(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double partialPressureHectopascal, RangeRule rule, out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        if (gas != Gas.Oxygen) { return Status.GasUnknown; }
        return OxygenEquilibrium.ConcentrationFromPartialPressure(
            equation, celsius, salinity, pressureHectopascal, partialPressureHectopascal, rule, out milligramsPerLitre);
    }

    /// <summary>Partial pressure of the gas in water of a given concentration: the inverse of <see cref="ConcentrationFromPartialPressure"/>.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute total pressure, hPa.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L; negative values pass through.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="partialPressureHectopascal">Partial pressure, hPa; NaN unless Ok or let pass by the rule.</param>
    public static Status PartialPressureFromConcentration(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double milligramsPerLitre, RangeRule rule, out double partialPressureHectopascal)
    {
        partialPressureHectopascal = double.NaN;
        if (gas != Gas.Oxygen) { return Status.GasUnknown; }
        return OxygenEquilibrium.PartialPressureFromConcentration(
            equation, celsius, salinity, pressureHectopascal, milligramsPerLitre, rule, out partialPressureHectopascal);
    }

    /// <summary>How <see cref="PartialPressure"/> answers to each of its inputs.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="celsius">Temperature (ITS-90), °C.</param>
    /// <param name="salinity">Practical salinity of the water under the gas.</param>
    /// <param name="pressureHectopascal">Absolute pressure of the gas phase, hPa.</param>
    /// <param name="moleFraction">Mole fraction of the gas in the dry gas phase, 0–1.</param>
    /// <param name="humidityPercent">Relative humidity of the gas phase, 0–100 %.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="perKelvin">∂p/∂T, hPa per K.</param>
    /// <param name="perSalinity">∂p/∂S, hPa per unit of salinity.</param>
    /// <param name="perHectopascal">∂p/∂P, hPa per hPa.</param>
    /// <param name="perMoleFraction">∂p/∂x, hPa per unit of mole fraction.</param>
    /// <param name="perHumidityPercent">∂p/∂h, hPa per % of humidity.</param>
    public static Status PartialPressureSensitivities(
        Gas gas, double celsius, double salinity, double pressureHectopascal, double moleFraction, double humidityPercent, RangeRule rule,
        out double perKelvin, out double perSalinity, out double perHectopascal, out double perMoleFraction, out double perHumidityPercent)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        perHectopascal = double.NaN;
        perMoleFraction = double.NaN;
        perHumidityPercent = double.NaN;
        Status status = Supported(gas, moleFraction, humidityPercent);
        if (status != Status.Ok) { return status; }
        status = OxygenEquilibrium.PartialPressureSensitivities(celsius, pressureHectopascal, rule, out perKelvin, out perHectopascal);
        if (double.IsNaN(perKelvin)) { return status; }
        perSalinity = 0.0;
        OxygenEquilibrium.PartialPressure(celsius, pressureHectopascal, rule, out double partialPressure);
        perMoleFraction = partialPressure / DryAir.OxygenMoleFraction;
        perHumidityPercent = (partialPressure - (DryAir.OxygenMoleFraction * pressureHectopascal)) / 100.0;
        return status;
    }

    /// <summary>How <see cref="MilligramsPerLitre"/> answers to each of its inputs.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute pressure of the gas phase at the water surface, 506.625–1114.575 hPa; to 10 132.5 hPa for gases with fugacity data.</param>
    /// <param name="moleFraction">Mole fraction of the gas in the dry gas phase, 0–1.</param>
    /// <param name="humidityPercent">Relative humidity of the gas phase, 0–100 %.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="perKelvin">∂C/∂T, mg/L per K.</param>
    /// <param name="perSalinity">∂C/∂S, mg/L per unit of salinity.</param>
    /// <param name="perHectopascal">∂C/∂P, mg/L per hPa.</param>
    /// <param name="perMoleFraction">∂C/∂x, mg/L per unit of mole fraction.</param>
    /// <param name="perHumidityPercent">∂C/∂h, mg/L per % of humidity.</param>
    public static Status MilligramsPerLitreSensitivities(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double moleFraction,
        double humidityPercent, RangeRule rule,
        out double perKelvin, out double perSalinity, out double perHectopascal, out double perMoleFraction, out double perHumidityPercent)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        perHectopascal = double.NaN;
        perMoleFraction = double.NaN;
        perHumidityPercent = double.NaN;
        Status status = Supported(gas, moleFraction, humidityPercent);
        if (status != Status.Ok) { return status; }
        status = OxygenEquilibrium.MilligramsPerLitreSensitivities(
            equation, celsius, salinity, pressureHectopascal, rule, out perKelvin, out perSalinity, out perHectopascal);
        if (double.IsNaN(perKelvin)) { return status; }
        OxygenEquilibrium.MilligramsPerLitre(equation, celsius, salinity, pressureHectopascal, rule, out double milligrams);
        perMoleFraction = milligrams / DryAir.OxygenMoleFraction;
        perHumidityPercent = 0.0;
        return status;
    }

    /// <summary>How <see cref="ConcentrationFromPartialPressure"/> answers to each of its inputs.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute total pressure, hPa.</param>
    /// <param name="partialPressureHectopascal">Partial pressure of the gas, hPa.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="perKelvin">∂C/∂T, mg/L per K.</param>
    /// <param name="perSalinity">∂C/∂S, mg/L per unit of salinity.</param>
    /// <param name="perHectopascal">∂C/∂P, mg/L per hPa.</param>
    /// <param name="perPartialPressure">∂C/∂p, mg/L per hPa.</param>
    public static Status ConcentrationSensitivities(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double partialPressureHectopascal, RangeRule rule,
        out double perKelvin, out double perSalinity, out double perHectopascal, out double perPartialPressure)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        perHectopascal = double.NaN;
        perPartialPressure = double.NaN;
        if (gas != Gas.Oxygen) { return Status.GasUnknown; }
        return OxygenEquilibrium.ConcentrationSensitivities(
            equation, celsius, salinity, pressureHectopascal, partialPressureHectopascal, rule,
            out perKelvin, out perSalinity, out perHectopascal, out perPartialPressure);
    }

    /// <summary>How <see cref="PartialPressureFromConcentration"/> answers to each of its inputs.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute total pressure, hPa.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="perKelvin">∂p/∂T, hPa per K.</param>
    /// <param name="perSalinity">∂p/∂S, hPa per unit of salinity.</param>
    /// <param name="perHectopascal">∂p/∂P, hPa per hPa.</param>
    /// <param name="perMilligramPerLitre">∂p/∂C, hPa per mg/L.</param>
    public static Status PartialPressureFromConcentrationSensitivities(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double milligramsPerLitre, RangeRule rule,
        out double perKelvin, out double perSalinity, out double perHectopascal, out double perMilligramPerLitre)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        perHectopascal = double.NaN;
        perMilligramPerLitre = double.NaN;
        if (gas != Gas.Oxygen) { return Status.GasUnknown; }
        return OxygenEquilibrium.PartialPressureFromConcentrationSensitivities(
            equation, celsius, salinity, pressureHectopascal, milligramsPerLitre, rule,
            out perKelvin, out perSalinity, out perHectopascal, out perMilligramPerLitre);
    }

    private static Status Supported(Gas gas, double moleFraction, double humidityPercent)
    {
        if (gas != Gas.Oxygen) { return Status.GasUnknown; }
        Status status = InputCheck.Graver(InputCheck.MoleFraction(moleFraction), InputCheck.Humidity(humidityPercent));
        if (status != Status.Ok) { return status; }
        if (moleFraction != DryAir.OxygenMoleFraction) { return Status.MoleFractionAboveRange; }
        return humidityPercent != 100.0 ? Status.HumidityBelowRange : Status.Ok;
    }
}
