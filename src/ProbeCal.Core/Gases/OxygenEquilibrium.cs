namespace ProbeCal;

/// <summary>
/// Oxygen between water and water-saturated air: partial pressure (what a membrane senses) and concentration, in hPa and mg/L.
/// </summary>
/// <remarks>
/// Dry air over its vapour (Dalton) with the fraction, the vapour formula and the pressure terms of Benson, B.B., Krause, D. (1980)
/// Limnol. Oceanogr. 25(4), 662–671 and (1984) 29(3), 620–632. Accuracy: pO2 as good as P and T, the vapour formula adds less than
/// 0.01 %; concentration as the equation chosen. Ranges stand with each function.
/// pO2 at equilibrium = 0.20946·(P − u) with the vapour pressure u of fresh water; salinity never enters it. Sea water of S 35
/// lowers u by 1.9 %, which would raise pO2 by 0.01 % at 0 °C, 0.06 % at 25 °C and 0.15 % at 40 °C; the equations are tied to
/// the fresh-water form, so that it cancels between calibration and reading. Concentration and partial pressure belong together through
/// C = C*(T, S, 1 atm)·pO2/[0.20946·(1 atm − u)]·(1 − θP)/(1 − θ): at the equilibrium pO2 this is the equation with its full pressure
/// factor. P is the station pressure; where it is unknown, 1013.25 hPa costs at most 0.05 % (0.5 atm, 0 °C).
/// A negative partial pressure or concentration (a probe's reading in anoxic water) passes through and is never clipped.
/// </remarks>
public static partial class OxygenEquilibrium
{
    /// <summary>Lowest temperature of the partial pressure, °C. Below 0 °C the vapour formula is continued, an effect below 0.001 % on pO2.</summary>
    public const double LowestCelsius = -2.0;
    /// <summary>Highest temperature of the partial pressure, °C.</summary>
    public const double HighestCelsius = 40.0;
    /// <summary>Highest partial pressure that is turned into a concentration, hPa: pure oxygen at 1.1 atm, the end of the virial term.</summary>
    public const double HighestPartialPressureHectopascal = BensonKrause1984.HighestHectopascal;

    /// <summary>Partial pressure of oxygen in water-saturated air.</summary>
    /// <param name="celsius">Temperature, −2 to 40 °C.</param>
    /// <param name="pressureHectopascal">Absolute pressure, 506.625–1114.575 hPa.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="partialPressureHectopascal">Partial pressure, hPa; NaN unless Ok or extrapolated.</param>
    public static Status PartialPressure(
        double celsius, double pressureHectopascal, RangeRule rule, out double partialPressureHectopascal)
    {
        partialPressureHectopascal = double.NaN;
        Status status = CheckAir(celsius, pressureHectopascal);
        if (InputCheck.Refuses(status, rule)) { return status; }
        partialPressureHectopascal = InputCheck.FiniteOrNaN(AirPartialPressure(celsius, pressureHectopascal));
        return status;
    }

    /// <summary>Concentration at equilibrium with water-saturated air.</summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="celsius">Temperature, the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute pressure at the water surface, 506.625–1114.575 hPa.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L; NaN unless Ok or extrapolated. With Garcia and Gordon by way of EOS-80 density.</param>
    public static Status MilligramsPerLitre(
        SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, RangeRule rule,
        out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        Status status = OxygenSolubility.Check(equation, celsius, salinity, pressureHectopascal);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double factor = OxygenPressureFactor.Value(celsius, PressureUnits.AtmospheresFromHectopascal(pressureHectopascal));
        milligramsPerLitre = InputCheck.FiniteOrNaN(OxygenSolubility.OneAtmosphere(equation, celsius, salinity) * factor);
        return status;
    }

    /// <summary>Concentration of water in which oxygen has a given partial pressure.</summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="celsius">Temperature, the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute station pressure, 506.625–1114.575 hPa; 1013.25 when there is no barometer.</param>
    /// <param name="partialPressureHectopascal">Partial pressure of oxygen, hPa, at most 1114.575; negative values pass through.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L; NaN unless Ok or extrapolated.</param>
    public static Status ConcentrationFromPartialPressure(
        SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double partialPressureHectopascal, RangeRule rule, out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        Status status = InputCheck.Graver(
            OxygenSolubility.Check(equation, celsius, salinity, pressureHectopascal),
            InputCheck.PartialPressure(partialPressureHectopascal, HighestPartialPressureHectopascal));
        if (InputCheck.Refuses(status, rule)) { return status; }
        double solubility = Solubility(equation, celsius, salinity, pressureHectopascal);
        milligramsPerLitre = InputCheck.FiniteOrNaN(solubility * partialPressureHectopascal);
        return status;
    }

    /// <summary>Partial pressure of oxygen in water of a given concentration: the inverse of <see cref="ConcentrationFromPartialPressure"/>.</summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="celsius">Temperature, the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute station pressure, 506.625–1114.575 hPa; 1013.25 when there is no barometer.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L, at most what pure oxygen at 1.1 atm gives; negative values pass through.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="partialPressureHectopascal">Partial pressure, hPa; NaN unless Ok or extrapolated.</param>
    public static Status PartialPressureFromConcentration(
        SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double milligramsPerLitre, RangeRule rule, out double partialPressureHectopascal)
    {
        partialPressureHectopascal = double.NaN;
        Status status = CheckConcentration(
            equation, celsius, salinity, pressureHectopascal, milligramsPerLitre, rule, out double solubility);
        if (InputCheck.Refuses(status, rule) || double.IsNaN(solubility)) { return status; }
        return InputCheck.Deliver(
            milligramsPerLitre / solubility, status, Status.ConcentrationBelowRange, out partialPressureHectopascal);
    }

    /// <summary>Ranges of the partial pressure of air.</summary>
    internal static Status CheckAir(double celsius, double pressureHectopascal)
    {
        return InputCheck.Graver(
            InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius),
            InputCheck.Pressure(pressureHectopascal, BensonKrause1984.LowestHectopascal, BensonKrause1984.HighestHectopascal));
    }

    /// <summary>0.20946·(P − u) in hPa, without a range.</summary>
    internal static double AirPartialPressure(double celsius, double pressureHectopascal)
    {
        double vapour = VapourBensonKrause1980.Atmospheres(celsius) * PressureUnits.HectopascalPerAtmosphere;
        return DryAir.OxygenMoleFraction * (pressureHectopascal - vapour);
    }

    /// <summary>mg/L per hPa of oxygen, without a range; NaN where it does not exist.</summary>
    internal static double Solubility(SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal)
    {
        double theta = OxygenPressureFactor.Theta(celsius);
        double atmospheres = PressureUnits.AtmospheresFromHectopascal(pressureHectopascal);
        double denominator = AirPartialPressure(celsius, PressureUnits.HectopascalPerAtmosphere) * (1.0 - theta);
        if (denominator <= 0.0) { return double.NaN; }
        return OxygenSolubility.OneAtmosphere(equation, celsius, salinity) * (1.0 - (theta * atmospheres)) / denominator;
    }

    /// <summary>The ranges of a concentration, and the solubility (NaN when the status refuses it or it cannot divide).</summary>
    private static Status CheckConcentration(
        SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double milligramsPerLitre, RangeRule rule, out double solubility)
    {
        solubility = double.NaN;
        Status finite = InputCheck.NotFinite(milligramsPerLitre) ? Status.ConcentrationNotFinite : Status.Ok;
        Status status = InputCheck.Graver(
            OxygenSolubility.Check(equation, celsius, salinity, pressureHectopascal), finite);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double perHectopascal = Solubility(equation, celsius, salinity, pressureHectopascal);
        if (perHectopascal <= 0.0) { return status; }
        solubility = perHectopascal;
        if (perHectopascal * HighestPartialPressureHectopascal < milligramsPerLitre)
        {
            status = InputCheck.Graver(status, Status.ConcentrationAboveRange);
        }
        return status;
    }
}
