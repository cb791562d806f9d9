namespace ProbeCal;

/// <content>Derivatives, apart from the values so that the value signatures never change.</content>
public static partial class GasEquilibrium
{
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
        Status status = CheckPhase(gas, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent);
        if (InputCheck.Refuses(status, rule)) { return status; }
        GasPhase.PartialPressure(
            gas, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent, null,
            out perKelvin, out perSalinity, out perMoleFraction, out perHumidityPercent);
        perKelvin = InputCheck.FiniteOrNaN(perKelvin);
        perSalinity = InputCheck.FiniteOrNaN(perSalinity);
        perHectopascal = moleFraction;
        perMoleFraction = InputCheck.FiniteOrNaN(perMoleFraction);
        perHumidityPercent = InputCheck.FiniteOrNaN(perHumidityPercent);
        return status;
    }

    /// <summary>How <c>MilligramsPerLitre</c> answers to each of its inputs.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute pressure of the gas phase at the water surface, 506.625–1114.575 hPa; to 10 132.5 hPa for gases with fugacity data (HighestHectopascal).</param>
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
        Status status = CheckEquilibrium(gas, equation, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent);
        if (InputCheck.Refuses(status, rule)) { return status; }
        // C = s(T, S, P, p)·p(T, S, P, x, h), for the moist-air equations too.
        double partialPressure = GasPhase.PartialPressure(
            gas, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent, null,
            out double pPerKelvin, out double pPerSalinity, out double pPerMoleFraction, out double pPerHumidityPercent);
        double solubility = Solubility(
            gas, equation, celsius, salinity, pressureHectopascal, partialPressure, null,
            out double logPerKelvin, out double logPerSalinity, out double logPerHectopascal, out double logPerPartialPressure);
        double concentration = solubility * partialPressure;
        double perPartialPressure = solubility + (concentration * logPerPartialPressure);
        perKelvin = InputCheck.FiniteOrNaN((concentration * logPerKelvin) + (perPartialPressure * pPerKelvin));
        perSalinity = InputCheck.FiniteOrNaN((concentration * logPerSalinity) + (perPartialPressure * pPerSalinity));
        perHectopascal = InputCheck.FiniteOrNaN((concentration * logPerHectopascal) + (perPartialPressure * moleFraction));
        perMoleFraction = InputCheck.FiniteOrNaN(perPartialPressure * pPerMoleFraction);
        perHumidityPercent = InputCheck.FiniteOrNaN(perPartialPressure * pPerHumidityPercent);
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
        Status status = CheckGiven(gas, equation, celsius, salinity, pressureHectopascal, partialPressureHectopascal);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double solubility = Solubility(
            gas, equation, celsius, salinity, pressureHectopascal, partialPressureHectopascal, null,
            out double logPerKelvin, out double logPerSalinity, out double logPerHectopascal, out double logPerPartialPressure);
        double concentration = solubility * partialPressureHectopascal;
        if (InputCheck.NotFinite(concentration)) { return status == Status.Ok ? Status.PartialPressureBelowRange : status; }
        perKelvin = InputCheck.FiniteOrNaN(concentration * logPerKelvin);
        perSalinity = InputCheck.FiniteOrNaN(concentration * logPerSalinity);
        perHectopascal = InputCheck.FiniteOrNaN(concentration * logPerHectopascal);
        perPartialPressure = InputCheck.FiniteOrNaN(solubility + (concentration * logPerPartialPressure));
        return status;
    }

    /// <summary>How <c>PartialPressureFromConcentration</c> answers to each of its inputs.</summary>
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
        Status status = CheckConcentration(
            gas, equation, celsius, salinity, pressureHectopascal, milligramsPerLitre, rule, out double estimate);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double solubility = Solubility(
            gas, equation, celsius, salinity, pressureHectopascal, estimate, null,
            out double logPerKelvin, out double logPerSalinity, out double logPerHectopascal, out double logPerPartialPressure);
        if (double.IsNaN(solubility) || solubility <= 0.0) { return status; }
        double partialPressure = milligramsPerLitre / solubility;
        // ln C = ln s(p) + ln p: dp/p = (dC/C − d(ln s) at constant p)/(1 + p·∂(ln s)/∂p).
        double response = 1.0 + (partialPressure * logPerPartialPressure);
        if (InputCheck.NotFinite(partialPressure)) { return status == Status.Ok ? Status.ConcentrationBelowRange : status; }
        if (double.IsNaN(response) || response <= 0.0) { return status; }
        double scaled = -partialPressure / response;
        perKelvin = InputCheck.FiniteOrNaN(scaled * logPerKelvin);
        perSalinity = InputCheck.FiniteOrNaN(scaled * logPerSalinity);
        perHectopascal = InputCheck.FiniteOrNaN(scaled * logPerHectopascal);
        perMilligramPerLitre = InputCheck.FiniteOrNaN(1.0 / solubility / response);
        return status;
    }
}
