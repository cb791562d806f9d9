namespace ProbeCal;

/// <summary>
/// What the solubility equation itself adds to the uncertainty of a value, for any gas; and what lying near the edge of its range or above 1.1 atm adds.
/// Contributions of the inputs are sensitivity times standard uncertainty (<see cref="GasEquilibrium"/> has the sensitivities).
/// </summary>
/// <remarks>
/// What a paper states is taken as one standard uncertainty (our choice, on the safe side); only the oxygen figure depends on the salinity. Where nothing is stated
/// (Weiss 1970 for nitrogen and argon) the distance to Hamme and Emerson 2004 stands in, and for sulfur hexafluoride by Fernández-Prini 2003 10 % for the
/// 8 to 18 % that part it from Bullister 2002 above 25 °C. Outside the range of temperature |∂(ln C)/∂T| times the distance is added, above 1.1 atm
/// 5 cm³/mol·(P − 1.1 atm)/(R·T) for the volume of the dissolved gas and the virial coefficients (our choices), all as root of the sum of squares.
/// </remarks>
public static class GasUncertainty
{
    /// <summary>What the Poynting and virial terms together may be off by above 1.1 atm, cm³/mol (our choice).</summary>
    private const double VolumeUncertainty = 5.0;

    /// <summary>Relative standard uncertainty (k = 1) of the equation at these conditions, a fraction.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), °C.</param>
    /// <param name="salinity">Practical salinity.</param>
    /// <param name="pressureHectopascal">Absolute total pressure, hPa.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="relative">Relative standard uncertainty, a fraction; NaN unless Ok or let pass by the rule.</param>
    public static Status EquationRelative(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, RangeRule rule, out double relative)
    {
        relative = double.NaN;
        Status status = InputCheck.Graver(
            GasSolubility.Check(gas, equation, celsius, salinity),
            InputCheck.Pressure(pressureHectopascal, GasEquilibrium.LowestHectopascal, GasEquilibrium.HighestHectopascal(gas)));
        if (InputCheck.Refuses(status, rule)) { return status; }
        double stated = Stated(gas, equation, salinity);
        double squares = stated * stated;
        double below = GasSolubility.LowestCelsius(gas, equation, salinity) - celsius;
        double above = celsius - GasSolubility.HighestCelsius(equation);
        double outside = above < below ? below : above;
        if (0.0 < outside)
        {
            GasSolubility.Reference(gas, equation, celsius, salinity, null, out double logPerKelvin, out _);
            squares += logPerKelvin * outside * logPerKelvin * outside;
        }

        double excess = PressureUnits.AtmospheresFromHectopascal(pressureHectopascal) - PoyntingFactor.HighestAtmospheresWithout;
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (0.0 < excess && 0.0 < kelvin)
        {
            double compressed = VolumeUncertainty * excess / (FugacityCoefficient.CubicCentimetreAtmospheresPerKelvin * kelvin);
            squares += compressed * compressed;
        }

        relative = InputCheck.FiniteOrNaN(Numerics.Sqrt(squares));
        return status;
    }

    /// <summary>Root of the sum of squares of a value's contributions (JCGM 100:2008, independent inputs).</summary>
    /// <param name="fromTemperature">Sensitivity times standard uncertainty, in the unit of the value; so the others.</param>
    /// <param name="fromSalinity">Part of the salinity, in the same unit.</param>
    /// <param name="fromPressure">Part of the pressure, in the same unit.</param>
    /// <param name="fromMoleFraction">Part of the mole fraction, in the same unit.</param>
    /// <param name="fromHumidity">Part of the humidity, in the same unit.</param>
    /// <param name="fromEquation">Part of the equation, in the same unit.</param>
    /// <param name="standardUncertainty">Combined standard uncertainty, in the same unit; NaN unless Ok.</param>
    public static Status Combined(
        double fromTemperature, double fromSalinity, double fromPressure, double fromMoleFraction, double fromHumidity, double fromEquation,
        out double standardUncertainty)
    {
        double squares = (fromTemperature * fromTemperature) + (fromSalinity * fromSalinity) + (fromPressure * fromPressure)
            + (fromMoleFraction * fromMoleFraction) + (fromHumidity * fromHumidity) + (fromEquation * fromEquation);
        if (double.IsNaN(squares))
        {
            standardUncertainty = double.NaN;
            return Status.UncertaintyNotFinite;
        }

        return InputCheck.Deliver(Numerics.Sqrt(squares), Status.Ok, Status.UncertaintyAboveRange, out standardUncertainty);
    }

    /// <summary>The stated relative accuracy, taken as one standard uncertainty.</summary>
    private static double Stated(Gas gas, SolubilityEquation equation, double salinity)
    {
        switch (equation)
        {
            case SolubilityEquation.Weiss1970:
            case SolubilityEquation.Weiss1970Bunsen:
                if (gas == Gas.Nitrogen) { return 0.012; }
                return gas == Gas.Oxygen ? 0.004 : 0.005;
            case SolubilityEquation.Weiss1971:
            case SolubilityEquation.Weiss1971Bunsen:
                return 0.005;
            case SolubilityEquation.WeissKyser1978:
            case SolubilityEquation.WeissKyser1978Bunsen:
                return 0.004;
            case SolubilityEquation.WoodCaputi1966:
                return 0.02;
            case SolubilityEquation.HammeEmerson2004:
                if (gas == Gas.Neon) { return 0.0030; }
                return gas == Gas.Nitrogen ? 0.0014 : 0.0013;
            case SolubilityEquation.Jenkins2019:
                return 0.003;
            case SolubilityEquation.Weiss1974:
                return 0.002;
            case SolubilityEquation.WeissPrice1980:
                return gas == Gas.CarbonDioxide ? 0.003 : 0.0014;
            case SolubilityEquation.WeissPrice1980MoistAir:
                return 0.0014;
            case SolubilityEquation.WiesenburgGuinasso1979:
            case SolubilityEquation.WiesenburgGuinasso1979Bunsen:
                return gas == Gas.CarbonMonoxide ? 0.02 : 0.01;
            case SolubilityEquation.Bullister2002:
            case SolubilityEquation.Bullister2002MoistAir:
                return 0.02;
            case SolubilityEquation.WarnerWeiss1985:
                return 0.015;
            case SolubilityEquation.FernandezPrini2003:
                return gas == Gas.SulfurHexafluoride ? 0.10 : 0.02;
            case SolubilityEquation.Sander2023:
                return 0.05;
            default:
                return OxygenUncertainty.Relative(salinity);
        }
    }
}
