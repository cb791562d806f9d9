namespace ProbeCal;

/// <content>Derivatives, apart from the values so that the value signatures never change.</content>
public static partial class OxygenEquilibrium
{
    /// <summary>How the partial pressure of water-saturated air answers to temperature and pressure.</summary>
    /// <param name="celsius">Temperature, −2 to 40 °C.</param>
    /// <param name="pressureHectopascal">Absolute pressure, 506.625–1114.575 hPa.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="perKelvin">∂pO2/∂T, hPa per K; NaN unless Ok or extrapolated.</param>
    /// <param name="perHectopascal">∂pO2/∂P, hPa per hPa; NaN unless Ok or extrapolated.</param>
    public static Status PartialPressureSensitivities(
        double celsius, double pressureHectopascal, RangeRule rule, out double perKelvin, out double perHectopascal)
    {
        perKelvin = double.NaN;
        perHectopascal = double.NaN;
        Status status = CheckAir(celsius, pressureHectopascal);
        if (InputCheck.Refuses(status, rule)) { return status; }
        perKelvin = InputCheck.FiniteOrNaN(AirPartialPressureSlope(celsius));
        perHectopascal = DryAir.OxygenMoleFraction;
        return status;
    }

    /// <summary>How the equilibrium concentration answers to temperature, salinity and pressure.</summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="celsius">Temperature, the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute pressure at the water surface, 506.625–1114.575 hPa.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="perKelvin">∂C/∂T, mg/L per K; NaN unless Ok or extrapolated.</param>
    /// <param name="perSalinity">∂C/∂S, mg/L per unit of salinity; NaN unless Ok or extrapolated.</param>
    /// <param name="perHectopascal">∂C/∂P, mg/L per hPa; NaN unless Ok or extrapolated.</param>
    public static Status MilligramsPerLitreSensitivities(
        SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, RangeRule rule,
        out double perKelvin, out double perSalinity, out double perHectopascal)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        perHectopascal = double.NaN;
        Status status = OxygenSolubility.Check(equation, celsius, salinity, pressureHectopascal);
        if (InputCheck.Refuses(status, rule)) { return status; }
        OxygenSolubility.LogarithmicSlopes(equation, celsius, salinity, out double logPerKelvin, out double logPerSalinity);
        ScaleSlopes(
            OxygenSolubility.OneAtmosphere(equation, celsius, salinity), logPerKelvin, logPerSalinity, celsius, pressureHectopascal,
            out perKelvin, out perSalinity, out perHectopascal);
        return status;
    }

    /// <summary>How <see cref="ConcentrationFromPartialPressure"/> answers to each of its inputs.</summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="celsius">Temperature, the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute station pressure, 506.625–1114.575 hPa.</param>
    /// <param name="partialPressureHectopascal">Partial pressure of oxygen, hPa, at most 1114.575.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="perKelvin">∂C/∂T at constant pO2, mg/L per K; NaN unless Ok or extrapolated.</param>
    /// <param name="perSalinity">∂C/∂S, mg/L per unit of salinity; NaN unless Ok or extrapolated.</param>
    /// <param name="perHectopascal">∂C/∂P at constant pO2, mg/L per hPa (small); NaN unless Ok or extrapolated.</param>
    /// <param name="perPartialPressure">∂C/∂pO2, mg/L per hPa; NaN unless Ok or extrapolated.</param>
    public static Status ConcentrationSensitivities(
        SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double partialPressureHectopascal, RangeRule rule,
        out double perKelvin, out double perSalinity, out double perHectopascal, out double perPartialPressure)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        perHectopascal = double.NaN;
        perPartialPressure = double.NaN;
        Status status = InputCheck.Graver(
            OxygenSolubility.Check(equation, celsius, salinity, pressureHectopascal),
            InputCheck.PartialPressure(partialPressureHectopascal, HighestPartialPressureHectopascal));
        if (InputCheck.Refuses(status, rule)) { return status; }
        double solubility = Solubility(equation, celsius, salinity, pressureHectopascal);
        SolubilityLogarithmicSlopes(
            equation, celsius, salinity, pressureHectopascal,
            out double logPerKelvin, out double logPerSalinity, out double logPerHectopascal);
        double concentration = solubility * partialPressureHectopascal;
        perKelvin = InputCheck.FiniteOrNaN(concentration * logPerKelvin);
        perSalinity = InputCheck.FiniteOrNaN(concentration * logPerSalinity);
        perHectopascal = InputCheck.FiniteOrNaN(concentration * logPerHectopascal);
        perPartialPressure = InputCheck.FiniteOrNaN(solubility);
        return status;
    }

    /// <summary>How <see cref="PartialPressureFromConcentration"/> answers to each of its inputs.</summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="celsius">Temperature, the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute station pressure, 506.625–1114.575 hPa.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="perKelvin">∂pO2/∂T at constant concentration, hPa per K; NaN unless Ok or extrapolated.</param>
    /// <param name="perSalinity">∂pO2/∂S, hPa per unit of salinity; NaN unless Ok or extrapolated.</param>
    /// <param name="perHectopascal">∂pO2/∂P at constant concentration, hPa per hPa (small); NaN unless Ok or extrapolated.</param>
    /// <param name="perMilligramPerLitre">∂pO2/∂C, hPa per mg/L; NaN unless Ok or extrapolated.</param>
    public static Status PartialPressureFromConcentrationSensitivities(
        SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double milligramsPerLitre, RangeRule rule,
        out double perKelvin, out double perSalinity, out double perHectopascal, out double perMilligramPerLitre)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        perHectopascal = double.NaN;
        perMilligramPerLitre = double.NaN;
        Status status = CheckConcentration(
            equation, celsius, salinity, pressureHectopascal, milligramsPerLitre, rule, out double solubility);
        if (InputCheck.Refuses(status, rule) || double.IsNaN(solubility)) { return status; }
        SolubilityLogarithmicSlopes(
            equation, celsius, salinity, pressureHectopascal,
            out double logPerKelvin, out double logPerSalinity, out double logPerHectopascal);
        double partialPressure = milligramsPerLitre / solubility;
        if (InputCheck.NotFinite(partialPressure)) { return status == Status.Ok ? Status.ConcentrationBelowRange : status; }
        perKelvin = InputCheck.FiniteOrNaN(-partialPressure * logPerKelvin);
        perSalinity = InputCheck.FiniteOrNaN(-partialPressure * logPerSalinity);
        perHectopascal = InputCheck.FiniteOrNaN(-partialPressure * logPerHectopascal);
        perMilligramPerLitre = InputCheck.FiniteOrNaN(1.0 / solubility);
        return status;
    }

    /// <summary>d[0.20946·(P − u)]/dT in hPa/K, without a range.</summary>
    internal static double AirPartialPressureSlope(double celsius)
    {
        double vapour = VapourBensonKrause1980.Atmospheres(celsius) * PressureUnits.HectopascalPerAtmosphere;
        return -DryAir.OxygenMoleFraction * vapour * VapourBensonKrause1980.LogarithmicSlope(celsius);
    }

    /// <summary>Derivatives of C(1 atm)·F(P) from those of ln C(1 atm).</summary>
    internal static void ScaleSlopes(
        double oneAtmosphere, double logPerKelvin, double logPerSalinity, double celsius, double pressureHectopascal,
        out double perKelvin, out double perSalinity, out double perHectopascal)
    {
        double atmospheres = PressureUnits.AtmospheresFromHectopascal(pressureHectopascal);
        double factor = OxygenPressureFactor.Value(celsius, atmospheres);
        OxygenPressureFactor.Slopes(celsius, atmospheres, out double factorPerKelvin, out double factorPerAtmosphere);
        perKelvin = InputCheck.FiniteOrNaN(oneAtmosphere * ((logPerKelvin * factor) + factorPerKelvin));
        perSalinity = InputCheck.FiniteOrNaN(oneAtmosphere * logPerSalinity * factor);
        perHectopascal = InputCheck.FiniteOrNaN(oneAtmosphere * factorPerAtmosphere / PressureUnits.HectopascalPerAtmosphere);
    }

    private static void SolubilityLogarithmicSlopes(
        SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        out double perKelvin, out double perSalinity, out double perHectopascal)
    {
        perHectopascal = double.NaN;
        OxygenSolubility.LogarithmicSlopes(equation, celsius, salinity, out perKelvin, out perSalinity);
        double atmospheres = PressureUnits.AtmospheresFromHectopascal(pressureHectopascal);
        double theta = OxygenPressureFactor.Theta(celsius);
        double thetaSlope = OxygenPressureFactor.ThetaSlope(celsius);
        double u = VapourBensonKrause1980.Atmospheres(celsius);
        double dry = 1.0 - u;
        double virial = 1.0 - (theta * atmospheres);
        double virialOne = 1.0 - theta;
        if (dry <= 0.0 || virial <= 0.0 || virialOne <= 0.0)
        {
            perKelvin = double.NaN;
            return;
        }
        perKelvin += (u * VapourBensonKrause1980.LogarithmicSlope(celsius) / dry)
            + (thetaSlope / virialOne) - (thetaSlope * atmospheres / virial);
        perHectopascal = -theta / virial / PressureUnits.HectopascalPerAtmosphere;
    }
}
