namespace ProbeCal;

/// <summary>
/// Henry's law in its direct form, C = kH·p, for any gas whose constant is given: no temperature, no salinity, no vapour and
/// no virial term. As good as the constant; handbook constants of two figures are 1–5 % off. Never a substitute for an equilibrium equation.
/// </summary>
/// <remarks>
/// Henry, W. (1803) Phil. Trans. R. Soc. 93, 29–42; constant as mol/(L·atm), the form called Hcp (Sander, R. 2023, Atmos. Chem. Phys.
/// 23, 10901–12440, doi:10.5194/acp-23-10901-2023). Negative partial pressures pass through.
/// </remarks>
public static class HenryLaw
{
    /// <summary>Concentration from partial pressure.</summary>
    /// <param name="molesPerLitreAtmosphere">Henry's-law constant, mol/(L·atm), above zero.</param>
    /// <param name="partialPressureHectopascal">Partial pressure of the gas, hPa.</param>
    /// <param name="molesPerLitre">Concentration, mol/L; NaN unless Ok.</param>
    public static Status MolesPerLitre(double molesPerLitreAtmosphere, double partialPressureHectopascal, out double molesPerLitre)
    {
        molesPerLitre = double.NaN;
        Status status = InputCheck.Graver(
            CheckCoefficient(molesPerLitreAtmosphere),
            InputCheck.NotFinite(partialPressureHectopascal) ? Status.PartialPressureNotFinite : Status.Ok);
        if (status != Status.Ok) { return status; }
        return InputCheck.Deliver(
            molesPerLitreAtmosphere * PressureUnits.AtmospheresFromHectopascal(partialPressureHectopascal),
            status, Status.CoefficientAboveRange, out molesPerLitre);
    }

    /// <summary>Mass concentration from partial pressure.</summary>
    /// <param name="molesPerLitreAtmosphere">Henry's-law constant, mol/(L·atm), above zero.</param>
    /// <param name="partialPressureHectopascal">Partial pressure of the gas, hPa.</param>
    /// <param name="gramsPerMole">Molar mass of the gas, g/mol, above zero.</param>
    /// <param name="gramsPerLitre">Concentration, g/L; NaN unless Ok.</param>
    public static Status GramsPerLitre(
        double molesPerLitreAtmosphere, double partialPressureHectopascal, double gramsPerMole, out double gramsPerLitre)
    {
        gramsPerLitre = double.NaN;
        Status status = InputCheck.Graver(
            MolesPerLitre(molesPerLitreAtmosphere, partialPressureHectopascal, out double molesPerLitre),
            CheckCoefficient(gramsPerMole));
        if (status != Status.Ok) { return status; }
        return InputCheck.Deliver(molesPerLitre * gramsPerMole, status, Status.CoefficientAboveRange, out gramsPerLitre);
    }

    /// <summary>Partial pressure from concentration.</summary>
    /// <param name="molesPerLitreAtmosphere">Henry's-law constant, mol/(L·atm), above zero.</param>
    /// <param name="molesPerLitre">Concentration, mol/L.</param>
    /// <param name="partialPressureHectopascal">Partial pressure of the gas, hPa; NaN unless Ok.</param>
    public static Status PartialPressure(double molesPerLitreAtmosphere, double molesPerLitre, out double partialPressureHectopascal)
    {
        partialPressureHectopascal = double.NaN;
        Status status = InputCheck.Graver(
            CheckCoefficient(molesPerLitreAtmosphere),
            InputCheck.NotFinite(molesPerLitre) ? Status.ConcentrationNotFinite : Status.Ok);
        if (status != Status.Ok) { return status; }
        return InputCheck.Deliver(
            PressureUnits.HectopascalFromAtmospheres(molesPerLitre / molesPerLitreAtmosphere),
            status, Status.CoefficientBelowRange, out partialPressureHectopascal);
    }

    private static Status CheckCoefficient(double coefficient)
    {
        if (InputCheck.NotFinite(coefficient)) { return Status.CoefficientNotFinite; }
        if (coefficient <= 0.0) { return Status.CoefficientBelowRange; }
        return Status.Ok;
    }
}
