namespace ProbeCal;

/// <summary>
/// Standard uncertainty (k = 1) of oxygen values in equilibrium with air, combined as JCGM 100:2008 (GUM) for independent inputs:
/// u² = (∂T·u(T))² + (∂S·u(S))² + (∂P·u(P))² + (value·equation)².
/// </summary>
/// <remarks>
/// Left out: how far "air-saturated" water really is from equilibrium (0.5–1 %, from memory), which belongs to the method of calibration; and the drift of the
/// oxygen fraction of air (−0.033 %), which cancels between calibration and reading. Inputs that share an error (one thermometer
/// for calibration and reading) need the sensitivities and the covariance, not this sum.
/// </remarks>
public static class OxygenUncertainty
{
    /// <summary>Relative standard uncertainty of either equation in fresh water. The stated ±0.1 % (from memory) taken as one standard uncertainty, on the safe side.</summary>
    public const double EquationRelativeFresh = 0.001;
    /// <summary>Relative standard uncertainty of either equation at salinity 40. The stated ±0.2 % (from memory) taken as one standard uncertainty; linear in between (our choice).</summary>
    public const double EquationRelativeSaline = 0.002;

    private const double SalineReference = 40.0;

    /// <summary>The equation's own relative standard uncertainty: 0.1 % in fresh water, rising linearly to 0.2 % at salinity 40.</summary>
    /// <param name="equation">Solubility equation. The two rest on the same data (0.03 % apart), so they share the figure.</param>
    /// <param name="salinity">Practical salinity, 0 to the highest of the equation.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="relative">Relative standard uncertainty, a fraction; NaN unless Ok or extrapolated.</param>
    public static Status EquationRelative(SolubilityEquation equation, double salinity, RangeRule rule, out double relative)
    {
        relative = double.NaN;
        Status status = CheckSalinity(equation, salinity);
        if (InputCheck.Refuses(status, rule)) { return status; }
        relative = InputCheck.FiniteOrNaN(Relative(salinity));
        return status;
    }

    /// <summary>Combined standard uncertainty of the equilibrium concentration.</summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="celsius">Temperature, the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute pressure at the water surface, 506.625–1114.575 hPa.</param>
    /// <param name="temperatureUncertaintyKelvin">Standard uncertainty of the temperature, K, not negative.</param>
    /// <param name="salinityUncertainty">Standard uncertainty of the salinity, not negative.</param>
    /// <param name="pressureUncertaintyHectopascal">Standard uncertainty of the pressure, hPa, not negative.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="milligramsPerLitre">Combined standard uncertainty, mg/L; NaN unless Ok or extrapolated.</param>
    public static Status MilligramsPerLitre(
        SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double temperatureUncertaintyKelvin, double salinityUncertainty, double pressureUncertaintyHectopascal, RangeRule rule,
        out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        Status status = OxygenEquilibrium.MilligramsPerLitreSensitivities(
            equation, celsius, salinity, pressureHectopascal, rule,
            out double perKelvin, out double perSalinity, out double perHectopascal);
        Status uncertainties = InputCheck.Graver(
            InputCheck.Uncertainty(temperatureUncertaintyKelvin),
            InputCheck.Graver(InputCheck.Uncertainty(salinityUncertainty), InputCheck.Uncertainty(pressureUncertaintyHectopascal)));
        status = InputCheck.Graver(status, uncertainties);
        // A negative uncertainty has no meaning to extrapolate to.
        if (uncertainties != Status.Ok || InputCheck.Refuses(status, rule)) { return status; }
        OxygenEquilibrium.MilligramsPerLitre(equation, celsius, salinity, pressureHectopascal, rule, out double value);
        double fromTemperature = perKelvin * temperatureUncertaintyKelvin;
        double fromSalinity = perSalinity * salinityUncertainty;
        double fromPressure = perHectopascal * pressureUncertaintyHectopascal;
        double fromEquation = value * Relative(salinity);
        double squares = (fromTemperature * fromTemperature) + (fromSalinity * fromSalinity)
            + (fromPressure * fromPressure) + (fromEquation * fromEquation);
        return InputCheck.Deliver(Numerics.Sqrt(squares), status, Status.UncertaintyAboveRange, out milligramsPerLitre);
    }

    /// <summary>
    /// Combined standard uncertainty of the partial pressure of oxygen in water-saturated air. No solubility equation stands behind it; the
    /// vapour formula's own 0.1 % adds less than 0.01 % and is left out.
    /// </summary>
    /// <param name="celsius">Temperature, −2 to 40 °C.</param>
    /// <param name="pressureHectopascal">Absolute pressure, 506.625–1114.575 hPa.</param>
    /// <param name="temperatureUncertaintyKelvin">Standard uncertainty of the temperature, K, not negative.</param>
    /// <param name="pressureUncertaintyHectopascal">Standard uncertainty of the pressure, hPa, not negative.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="hectopascal">Combined standard uncertainty, hPa; NaN unless Ok or extrapolated.</param>
    public static Status PartialPressure(
        double celsius, double pressureHectopascal, double temperatureUncertaintyKelvin, double pressureUncertaintyHectopascal, RangeRule rule,
        out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = OxygenEquilibrium.PartialPressureSensitivities(
            celsius, pressureHectopascal, rule, out double perKelvin, out double perHectopascal);
        Status uncertainties = InputCheck.Graver(
            InputCheck.Uncertainty(temperatureUncertaintyKelvin), InputCheck.Uncertainty(pressureUncertaintyHectopascal));
        status = InputCheck.Graver(status, uncertainties);
        if (uncertainties != Status.Ok || InputCheck.Refuses(status, rule)) { return status; }
        double fromTemperature = perKelvin * temperatureUncertaintyKelvin;
        double fromPressure = perHectopascal * pressureUncertaintyHectopascal;
        double squares = (fromTemperature * fromTemperature) + (fromPressure * fromPressure);
        return InputCheck.Deliver(Numerics.Sqrt(squares), status, Status.UncertaintyAboveRange, out hectopascal);
    }

    /// <summary>The figure without a range.</summary>
    internal static double Relative(double salinity)
    {
        return EquationRelativeFresh + ((EquationRelativeSaline - EquationRelativeFresh) * salinity / SalineReference);
    }

    private static Status CheckSalinity(SolubilityEquation equation, double salinity)
    {
        if (equation == SolubilityEquation.BensonKrause1984)
        {
            return InputCheck.Salinity(salinity, BensonKrause1984.HighestSalinity);
        }
        if (equation == SolubilityEquation.GarciaGordon1992)
        {
            return InputCheck.Salinity(salinity, GarciaGordon1992.HighestSalinity);
        }
        return Status.EquationUnknown;
    }
}
