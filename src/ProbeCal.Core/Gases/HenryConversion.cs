namespace ProbeCal;

/// <summary>
/// Converts the forms of a Henry's-law constant into one another, by way of Hcp:
/// Hcc = Ostwald = Hcp·R·T, Bunsen = Hcp·R·273.15 K, Hbp = Hcp/ρ, Hxp = Hcp·M/ρ, Kpc = 1/Hcp, Kpx = 1/Hxp, Kcc = 1/Hcc.
/// </summary>
/// <remarks>
/// Sander, R. (2023) Atmos. Chem. Phys. 23, 10901–12440, doi:10.5194/acp-23-10901-2023 (table of conversions, from memory). R = 8.314462618 J/(mol·K) (CODATA 2018), M = 0.018015268 kg/mol
/// for water. Accuracy: dilute solution, ideal gas; the gas volumes of Bunsen and Ostwald are ideal, up to 1 % off for a heavy gas.
/// </remarks>
public static class HenryConversion
{
    /// <summary>Gas constant, J/(mol·K).</summary>
    public const double JoulesPerMoleKelvin = 8.314462618;

    /// <summary>One form into another.</summary>
    /// <param name="from">The form given.</param>
    /// <param name="to">The form wanted.</param>
    /// <param name="constant">The constant in the SI unit of its form, above zero.</param>
    /// <param name="celsius">Temperature, °C, above −273.15.</param>
    /// <param name="densityKilogramsPerCubicMetre">Density of the water at that temperature, kg/m³, above zero.</param>
    /// <param name="converted">The constant in the SI unit of the form wanted; NaN unless Ok.</param>
    public static Status Convert(
        HenryForm from, HenryForm to, double constant, double celsius, double densityKilogramsPerCubicMetre, out double converted)
    {
        converted = double.NaN;
        if (!Known(from) || !Known(to)) { return Status.CoefficientUnknown; }
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        Status status = InputCheck.NotFinite(constant) ? Status.CoefficientNotFinite : Status.Ok;
        if (status == Status.Ok && constant <= 0.0) { status = Status.CoefficientBelowRange; }
        Status temperature = InputCheck.NotFinite(celsius) ? Status.TemperatureNotFinite : Status.Ok;
        if (temperature == Status.Ok && kelvin <= 0.0) { temperature = Status.TemperatureBelowRange; }
        status = InputCheck.Graver(InputCheck.Graver(status, temperature), InputCheck.Density(densityKilogramsPerCubicMetre));
        if (status != Status.Ok) { return status; }
        double fromFactor = PerHcp(from, kelvin, densityKilogramsPerCubicMetre);
        double toFactor = PerHcp(to, kelvin, densityKilogramsPerCubicMetre);
        if (fromFactor <= 0.0 || toFactor <= 0.0) { return Status.DensityAboveRange; }
        if (InputCheck.NotFinite(JoulesPerMoleKelvin * kelvin)) { return Status.TemperatureAboveRange; }
        if (InputCheck.NotFinite(fromFactor) || InputCheck.NotFinite(toFactor)) { return Status.DensityBelowRange; }
        if (from == to)
        {
            converted = constant;
            return status;
        }

        double solubility = constant / fromFactor;
        if (IsVolatility(from))
        {
            double product = constant * fromFactor;
            if (product <= 0.0) { return Status.CoefficientBelowRange; }
            if (InputCheck.NotFinite(product)) { return Status.CoefficientAboveRange; }
            solubility = 1.0 / product;
        }

        double value = solubility * toFactor;
        // So small that nothing of it is left: a zero would pass for a gas that does not dissolve.
        if (value <= 0.0) { return Status.CoefficientBelowRange; }
        if (IsVolatility(to)) { value = 1.0 / value; }

        return InputCheck.Deliver(value, status, Status.CoefficientAboveRange, out converted);
    }

    private static bool Known(HenryForm form)
    {
        return HenryForm.Hcp <= form && form <= HenryForm.Ostwald;
    }

    private static bool IsVolatility(HenryForm form)
    {
        return form == HenryForm.Kpc || form == HenryForm.Kpx || form == HenryForm.Kcc;
    }

    /// <summary>What Hcp is multiplied with; the volatilities are one over that.</summary>
    private static double PerHcp(HenryForm form, double kelvin, double density)
    {
        switch (form)
        {
            case HenryForm.Hcc:
            case HenryForm.Ostwald:
            case HenryForm.Kcc:
                return JoulesPerMoleKelvin * kelvin;
            case HenryForm.Bunsen:
                return JoulesPerMoleKelvin * TemperatureScale.KelvinAtZeroCelsius;
            case HenryForm.Hbp:
                return density <= 0.0 ? double.NaN : 1.0 / density;
            case HenryForm.Hxp:
            case HenryForm.Kpx:
                return density <= 0.0 ? double.NaN : FernandezPrini2003.WaterKilogramsPerMole / density;
            default:
                return 1.0;
        }
    }
}
