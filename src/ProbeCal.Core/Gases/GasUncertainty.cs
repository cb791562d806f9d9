namespace ProbeCal;

/// <summary>
/// What the solubility equation itself adds to the uncertainty of a value, for any gas; and what lying near the edge of its range or above 1.1 atm adds.
/// Contributions of the inputs are sensitivity times standard uncertainty (<see cref="GasEquilibrium"/> has the sensitivities).
/// </summary>
/// <remarks>Skeleton: oxygen only; the other gases follow.</remarks>
public static class GasUncertainty
{
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
        if (gas != Gas.Oxygen) { return Status.GasUnknown; }
        return OxygenUncertainty.EquationRelative(equation, salinity, rule, out relative);
    }

    /// <summary>Root of the sum of squares of a value's contributions (JCGM 100:2008, independent inputs).</summary>
    /// <param name="fromTemperature">Sensitivity times standard uncertainty, in the unit of the value; so the others.</param>
    /// <param name="fromSalinity">Part of the salinity.</param>
    /// <param name="fromPressure">Part of the pressure.</param>
    /// <param name="fromMoleFraction">Part of the mole fraction.</param>
    /// <param name="fromHumidity">Part of the humidity.</param>
    /// <param name="fromEquation">Part of the equation.</param>
    /// <param name="standardUncertainty">Combined standard uncertainty; NaN unless Ok.</param>
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
}
