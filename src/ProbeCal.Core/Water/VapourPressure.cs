namespace ProbeCal;

/// <summary>
/// Vapour pressure over water by any of the published forms. It moves an oxygen value little: all forms agree within 0.4 % of the vapour, which is 0.01 % of
/// the air's pressure at 20 °C. Ranges, source and accuracy are those of the form (from 1967 to 2007).
/// </summary>
/// <remarks>
/// Default for pure water <see cref="VapourEquation.WagnerPruss1993"/>, for sea water <see cref="VapourEquation.Dickson2007"/>. The solubility equations keep the form they
/// were made with, whatever is chosen here.
/// </remarks>
public static class VapourPressure
{
    /// <summary>Vapour pressure over water of a salinity.</summary>
    /// <param name="equation">The form.</param>
    /// <param name="celsius">Temperature, °C, the range of the form.</param>
    /// <param name="salinity">Practical salinity, the range of the form; a form for pure water takes 0 alone.</param>
    /// <param name="rule">Refuse, near edge or extrapolate. A salinity other than 0 is refused by a form for pure water under every rule: it has no term for it.</param>
    /// <param name="hectopascal">Vapour pressure, hPa; NaN unless Ok or let pass by the rule.</param>
    public static Status Hectopascal(VapourEquation equation, double celsius, double salinity, RangeRule rule, out double hectopascal)
    {
        switch (equation)
        {
            case VapourEquation.Dickson2007: return VapourDickson2007.Pressure(celsius, salinity, rule, out hectopascal);
            case VapourEquation.WeissPrice1980: return VapourWeissPrice1980.Pressure(celsius, salinity, rule, out hectopascal);
            case VapourEquation.GreenCarritt1967: return VapourGreenCarritt1967.Pressure(celsius, salinity, rule, out hectopascal);
            default: break;
        }

        hectopascal = double.NaN;
        Status fresh = InputCheck.Salinity(salinity, 0.0);
        Status status = Pure(equation, celsius, fresh == Status.Ok ? rule : RangeRule.Refuse, out double value);
        if (fresh != Status.Ok) { return InputCheck.Graver(status, fresh); }
        hectopascal = value;
        return status;
    }

    private static Status Pure(VapourEquation equation, double celsius, RangeRule rule, out double hectopascal)
    {
        switch (equation)
        {
            case VapourEquation.WagnerPruss1993: return VapourWagnerPruss1993.Pressure(celsius, rule, out hectopascal);
            case VapourEquation.BensonKrause1980: return VapourBensonKrause1980.Pressure(celsius, rule, out hectopascal);
            case VapourEquation.Hardy1998: return VapourHardy1998.Pressure(celsius, rule, out hectopascal);
            case VapourEquation.Buck1981: return VapourBuck1981.Pressure(celsius, rule, out hectopascal);
            case VapourEquation.Buck1996: return VapourBuck1996.Pressure(celsius, rule, out hectopascal);
            case VapourEquation.Sonntag1990: return VapourSonntag1990.Pressure(celsius, rule, out hectopascal);
            case VapourEquation.Murray1967: return VapourMurray1967.Pressure(celsius, rule, out hectopascal);
            case VapourEquation.Antoine8111: return VapourAntoine8111.Pressure(celsius, rule, out hectopascal);
            default:
                hectopascal = double.NaN;
                return Status.EquationUnknown;
        }
    }
}
