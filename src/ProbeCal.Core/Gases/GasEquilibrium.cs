using System.Diagnostics;

namespace ProbeCal;

/// <summary>
/// Any gas that Core knows between water and a gas phase of given pressure, dry mole fraction and humidity: partial pressure in hPa and
/// concentration in mg/L.
/// </summary>
/// <remarks>
/// Moist-air equations: C = C*·[(P − h·u)·φ(P)]/[(1 atm − u)·φ(1 atm)]·(x/xref). Solubility, Bunsen and Henry equations: C = K·p·φ(P), p = x·(P − h·u).
/// u is the vapour pressure over the water (oxygen: fresh water, Benson and Krause 1980; others: Weiss and Price 1980), φ the fugacity coefficient, and above 1.1 atm a Poynting factor is added
/// (volumes of Enns 1965), for oxygen, nitrogen, argon, helium and carbon dioxide; other gases end at 1.1 atm. For oxygen in water-saturated air up to 1.1 atm
/// all of it is <see cref="OxygenEquilibrium"/> to the bit. The mole fraction in φ is p/P, within 0 and 1. Accuracy: <see cref="GasUncertainty"/>. Ranges are those of the equation (docs/methods.md);
/// partial pressures: −2 to 40 °C, S 0–42. Negative partial pressures and concentrations pass through and are never clipped.
/// </remarks>
public static partial class GasEquilibrium
{
    /// <summary>Lowest temperature of a partial pressure, °C.</summary>
    public const double LowestCelsius = OxygenEquilibrium.LowestCelsius;
    /// <summary>Highest temperature of a partial pressure, °C.</summary>
    public const double HighestCelsius = OxygenEquilibrium.HighestCelsius;
    /// <summary>Highest practical salinity of a partial pressure. The vapour formula is stated to 40 and continued from there, an effect below 0.001 %.</summary>
    public const double HighestSalinity = DensityEos80.HighestSalinity;
    /// <summary>Lowest total pressure, hPa: 0.5 atm.</summary>
    public const double LowestHectopascal = BensonKrause1984.LowestHectopascal;

    private const double HighestHectopascalByFugacity = 10.0 * PressureUnits.HectopascalPerAtmosphere;

    private const int NewtonPasses = 4;

    /// <summary>Highest total pressure and partial pressure of a gas, hPa: 10 132.5 (10 atm) with fugacity and Poynting data, else 1114.575 (1.1 atm).</summary>
    public static double HighestHectopascal(Gas gas)
    {
        return double.IsNaN(PartialMolarVolume.CubicCentimetresPerMole(gas)) ? BensonKrause1984.HighestHectopascal : HighestHectopascalByFugacity;
    }

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
        return PartialPressureSteps(
            gas, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent, rule, null, out partialPressureHectopascal);
    }

    /// <summary>Concentration of water in equilibrium with the gas phase.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute pressure of the gas phase at the water surface, 506.625–1114.575 hPa; to 10 132.5 hPa for gases with fugacity data (HighestHectopascal).</param>
    /// <param name="moleFraction">Mole fraction of the gas in the dry gas phase, 0–1.</param>
    /// <param name="humidityPercent">Relative humidity of the gas phase, 0–100 %.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L; NaN unless Ok or let pass by the rule.</param>
    public static Status MilligramsPerLitre(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double moleFraction,
        double humidityPercent, RangeRule rule, out double milligramsPerLitre)
    {
        return MilligramsPerLitre(
            gas, equation, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent, rule, null, out milligramsPerLitre);
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
        return ConcentrationFromPartialPressureSteps(
            gas, equation, celsius, salinity, pressureHectopascal, partialPressureHectopascal, rule, null, out milligramsPerLitre);
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
        return PartialPressureFromConcentration(
            gas, equation, celsius, salinity, pressureHectopascal, milligramsPerLitre, rule, null, out partialPressureHectopascal);
    }

    /// <summary>The public function with its steps.</summary>
    internal static Status PartialPressureSteps(
        Gas gas, double celsius, double salinity, double pressureHectopascal, double moleFraction, double humidityPercent, RangeRule rule,
        CalculationSteps? steps, out double partialPressureHectopascal)
    {
        partialPressureHectopascal = double.NaN;
        Status status = CheckPhase(gas, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent);
        if (InputCheck.Refuses(status, rule)) { return status; }
        AddInputs(steps, celsius, salinity, pressureHectopascal);
        steps?.Add(StepQuantity.MoleFraction, moleFraction);
        steps?.Add(StepQuantity.HumidityPercent, humidityPercent);
        partialPressureHectopascal = InputCheck.FiniteOrNaN(GasPhase.PartialPressure(
            gas, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent, steps, out _, out _, out _, out _));
        return status;
    }

    /// <summary>The public function with its steps.</summary>
    internal static Status ConcentrationFromPartialPressureSteps(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double partialPressureHectopascal, RangeRule rule, CalculationSteps? steps, out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        Status status = CheckGiven(gas, equation, celsius, salinity, pressureHectopascal, partialPressureHectopascal);
        if (InputCheck.Refuses(status, rule)) { return status; }
        AddInputs(steps, celsius, salinity, pressureHectopascal);
        steps?.Add(StepQuantity.GivenPartialPressureHectopascal, partialPressureHectopascal);
        double solubility = Solubility(
            gas, equation, celsius, salinity, pressureHectopascal, partialPressureHectopascal, steps, out _, out _, out _, out _);
        status = InputCheck.Deliver(
            solubility * partialPressureHectopascal, status, Status.PartialPressureBelowRange, out milligramsPerLitre);
        steps?.Add(StepQuantity.MilligramsPerLitre, milligramsPerLitre);
        return status;
    }

    /// <summary>The public function with its steps.</summary>
    internal static Status MilligramsPerLitre(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double moleFraction,
        double humidityPercent, RangeRule rule, CalculationSteps? steps, out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        Status status = CheckEquilibrium(gas, equation, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent);
        if (InputCheck.Refuses(status, rule)) { return status; }
        AddInputs(steps, celsius, salinity, pressureHectopascal);
        steps?.Add(StepQuantity.MoleFraction, moleFraction);
        steps?.Add(StepQuantity.HumidityPercent, humidityPercent);
        double partialPressure = GasPhase.PartialPressure(
            gas, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent, steps, out _, out _, out _, out _);
        double value;
        if (GasSolubility.IsMoistAir(gas, equation))
        {
            double reference = GasSolubility.Reference(gas, equation, celsius, salinity, steps, out _, out _);
            double factor = PressureFactor(gas, celsius, salinity, pressureHectopascal, partialPressure, humidityPercent, steps);
            double referenceFraction = GasSolubility.ReferenceMoleFraction(gas, equation);
            steps?.Add(StepQuantity.ReferenceMoleFraction, referenceFraction);
            if (referenceFraction == 0.0) { return status; }
            value = reference * factor * (moleFraction / referenceFraction);
        }
        else
        {
            value = partialPressure * Solubility(
                gas, equation, celsius, salinity, pressureHectopascal, partialPressure, steps, out _, out _, out _, out _);
        }

        milligramsPerLitre = InputCheck.FiniteOrNaN(value);
        steps?.Add(StepQuantity.MilligramsPerLitre, milligramsPerLitre);
        return status;
    }

    /// <summary>The public function with its steps.</summary>
    internal static Status PartialPressureFromConcentration(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double milligramsPerLitre, RangeRule rule, CalculationSteps? steps, out double partialPressureHectopascal)
    {
        partialPressureHectopascal = double.NaN;
        Status status = CheckConcentration(
            gas, equation, celsius, salinity, pressureHectopascal, milligramsPerLitre, rule, out double estimate);
        if (InputCheck.Refuses(status, rule)) { return status; }
        AddInputs(steps, celsius, salinity, pressureHectopascal);
        steps?.Add(StepQuantity.GivenMilligramsPerLitre, milligramsPerLitre);
        double solubility = Solubility(
            gas, equation, celsius, salinity, pressureHectopascal, estimate, steps, out _, out _, out _, out _);
        if (double.IsNaN(solubility) || solubility <= 0.0) { return status; }
        status = InputCheck.Deliver(milligramsPerLitre / solubility, status, Status.ConcentrationBelowRange, out partialPressureHectopascal);
        steps?.Add(StepQuantity.PartialPressureHectopascal, partialPressureHectopascal);
        return status;
    }

    /// <summary>
    /// mg/L per hPa of partial pressure, and the slopes of its logarithm: at constant partial pressure, and (where φ knows the mole fraction) along it. Without a range; NaN where
    /// it does not exist.
    /// </summary>
    internal static double Solubility(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double partialPressureHectopascal,
        CalculationSteps? steps,
        out double logPerKelvin, out double logPerSalinity, out double logPerHectopascal, out double logPerPartialPressure)
    {
        logPerHectopascal = double.NaN;
        logPerPartialPressure = double.NaN;
        double value = GasSolubility.Reference(gas, equation, celsius, salinity, steps, out logPerKelvin, out logPerSalinity);
        double atmospheres = PressureUnits.AtmospheresFromHectopascal(pressureHectopascal);
        steps?.Add(StepQuantity.Atmospheres, atmospheres);
        double wetMoleFraction = WetMoleFraction(gas, pressureHectopascal, partialPressureHectopascal);
        double phi = FugacityCoefficient.Value(
            gas, celsius, atmospheres, wetMoleFraction, steps, out double phiPerKelvin, out double phiPerAtmosphere, out double phiPerMoleFraction);
        double poynting = PoyntingFactor.Value(gas, celsius, atmospheres, steps, out double poyntingPerKelvin, out double poyntingPerAtmosphere);
        logPerKelvin += phiPerKelvin + poyntingPerKelvin;
        logPerHectopascal = (phiPerAtmosphere + poyntingPerAtmosphere) / PressureUnits.HectopascalPerAtmosphere;
        logPerPartialPressure = 0.0;
        if (0.0 < wetMoleFraction && 0.0 < pressureHectopascal)
        {
            logPerPartialPressure = phiPerMoleFraction / pressureHectopascal;
            logPerHectopascal -= logPerPartialPressure * wetMoleFraction;
        }

        value *= phi;
        if (GasSolubility.IsMoistAir(gas, equation))
        {
            double vapour = GasPhase.VapourAtmospheres(gas, celsius, salinity, steps, out double vapourPerKelvin, out double vapourPerSalinity);
            double phiOne = FugacityCoefficient.Value(gas, celsius, 1.0, 0.0, null, out double phiOnePerKelvin, out _, out _);
            double referenceFraction = GasSolubility.ReferenceMoleFraction(gas, equation);
            double denominator = referenceFraction
                * (PressureUnits.HectopascalPerAtmosphere - (vapour * PressureUnits.HectopascalPerAtmosphere)) * phiOne;
            steps?.Add(StepQuantity.ReferenceFugacityCoefficient, phiOne);
            steps?.Add(StepQuantity.ReferenceMoleFraction, referenceFraction);
            double dry = 1.0 - vapour;
            if (denominator <= 0.0 || dry <= 0.0) { return double.NaN; }
            value /= denominator;
            logPerKelvin += (vapour * vapourPerKelvin / dry) - phiOnePerKelvin;
            logPerSalinity += vapour * vapourPerSalinity / dry;
        }

        value *= poynting;
        steps?.Add(StepQuantity.Solubility, value);
        return value;
    }

    /// <summary>Ranges of a partial pressure in the gas phase.</summary>
    private static Status CheckPhase(
        Gas gas, double celsius, double salinity, double pressureHectopascal, double moleFraction, double humidityPercent)
    {
        if (!GasSolubility.Known(gas)) { return Status.GasUnknown; }
        Status status = InputCheck.Graver(
            InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius), InputCheck.Salinity(salinity, HighestSalinity));
        return InputCheck.Graver(status, CheckMixture(gas, pressureHectopascal, moleFraction, humidityPercent));
    }

    /// <summary>Ranges of a concentration under a gas phase.</summary>
    private static Status CheckEquilibrium(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double moleFraction, double humidityPercent)
    {
        return InputCheck.Graver(
            GasSolubility.Check(gas, equation, celsius, salinity), CheckMixture(gas, pressureHectopascal, moleFraction, humidityPercent));
    }

    private static Status CheckMixture(Gas gas, double pressureHectopascal, double moleFraction, double humidityPercent)
    {
        return InputCheck.Graver(
            InputCheck.Pressure(pressureHectopascal, LowestHectopascal, HighestHectopascal(gas)),
            InputCheck.Graver(InputCheck.MoleFraction(moleFraction), InputCheck.Humidity(humidityPercent)));
    }

    /// <summary>Ranges of a concentration from a given partial pressure.</summary>
    private static Status CheckGiven(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double partialPressureHectopascal)
    {
        Status status = InputCheck.Graver(
            GasSolubility.Check(gas, equation, celsius, salinity),
            InputCheck.Pressure(pressureHectopascal, LowestHectopascal, HighestHectopascal(gas)));
        return InputCheck.Graver(status, InputCheck.PartialPressure(partialPressureHectopascal, HighestHectopascal(gas)));
    }

    /// <summary>
    /// Ranges of a partial pressure from a given concentration, and the partial pressure that the solubility is to be taken at: the solution where φ knows the mole fraction,
    /// else zero. At most what the gas gives at its highest pressure.
    /// </summary>
    private static Status CheckConcentration(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double milligramsPerLitre, RangeRule rule, out double estimate)
    {
        estimate = 0.0;
        Status status = InputCheck.Graver(
            GasSolubility.Check(gas, equation, celsius, salinity),
            InputCheck.Pressure(pressureHectopascal, LowestHectopascal, HighestHectopascal(gas)));
        status = InputCheck.Graver(status, InputCheck.NotFinite(milligramsPerLitre) ? Status.ConcentrationNotFinite : Status.Ok);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double highest = HighestHectopascal(gas);
        double solubility = Solubility(gas, equation, celsius, salinity, pressureHectopascal, highest, null, out _, out _, out _, out _);
        if (solubility * highest < milligramsPerLitre)
        {
            status = InputCheck.Graver(status, Status.ConcentrationAboveRange);
            if (InputCheck.Refuses(status, rule)) { return status; }
        }

        if (!FugacityCoefficient.DependsOnMoleFraction(gas)) { return status; }
        // Newton on p·s(p) = C. p changes s by at most 4 % over the whole range, so that each pass squares an error that begins below that.
        for (int pass = 0; pass < NewtonPasses; pass++)
        {
            solubility = Solubility(
                gas, equation, celsius, salinity, pressureHectopascal, estimate, null, out _, out _, out _, out double logPerPartialPressure);
            double slope = solubility * (1.0 + (estimate * logPerPartialPressure));
            if (double.IsNaN(slope) || slope <= 0.0) { return status; }
            estimate -= ((estimate * solubility) - milligramsPerLitre) / slope;
        }

        return status;
    }

    /// <summary>[(P − h·u)·φ(P)]/[(1 atm − u)·φ(1 atm)], above 1.1 atm times the Poynting factor.</summary>
    private static double PressureFactor(
        Gas gas, double celsius, double salinity, double pressureHectopascal, double partialPressureHectopascal, double humidityPercent, CalculationSteps? steps)
    {
        double atmospheres = PressureUnits.AtmospheresFromHectopascal(pressureHectopascal);
        steps?.Add(StepQuantity.Atmospheres, atmospheres);
        double vapour = GasPhase.VapourAtmospheres(gas, celsius, salinity, null, out _, out _);
        double phi = FugacityCoefficient.Value(
            gas, celsius, atmospheres, WetMoleFraction(gas, pressureHectopascal, partialPressureHectopascal), steps, out _, out _, out _);
        double phiOne = FugacityCoefficient.Value(gas, celsius, 1.0, 0.0, null, out _, out _, out _);
        steps?.Add(StepQuantity.ReferenceFugacityCoefficient, phiOne);
        double poynting = PoyntingFactor.Value(gas, celsius, atmospheres, steps, out _, out _);
        double denominator = (1.0 - vapour) * phiOne;
        if (denominator <= 0.0) { return double.NaN; }
        double factor = (atmospheres - (humidityPercent / 100.0 * vapour)) * phi / denominator * poynting;
        steps?.Add(StepQuantity.PressureFactor, factor);
        return factor;
    }

    /// <summary>
    /// p/P for φ, within 0 and 1: water may hold more gas than the total pressure carries (the gas phase that φ speaks of is the pure gas then), and a measured value may lie below zero.
    /// </summary>
    private static double WetMoleFraction(Gas gas, double pressureHectopascal, double partialPressureHectopascal)
    {
        if (!FugacityCoefficient.DependsOnMoleFraction(gas) || pressureHectopascal <= 0.0 || partialPressureHectopascal <= 0.0) { return 0.0; }
        double fraction = partialPressureHectopascal / pressureHectopascal;
        return 1.0 < fraction ? 1.0 : fraction;
    }

    [Conditional("PROBECAL_STEPS")]
    private static void AddInputs(CalculationSteps? steps, double celsius, double salinity, double pressureHectopascal)
    {
        if (steps == null) { return; }
        steps.Add(StepQuantity.Celsius, celsius);
        steps.Add(StepQuantity.Salinity, salinity);
        steps.Add(StepQuantity.PressureHectopascal, pressureHectopascal);
    }
}
