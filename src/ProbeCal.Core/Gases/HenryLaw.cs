namespace ProbeCal;

/// <summary>
/// Henry's law in its direct form, C = kH·p, for any gas whose constant is given: no temperature, no salinity, no vapour and
/// no virial term; and the constant behind an equation. As good as the constant; handbook constants of two figures are 1–5 % off. Never a substitute for an equilibrium equation.
/// </summary>
/// <remarks>
/// Henry, W. (1803) Phil. Trans. R. Soc. 93, 29–42; constant as mol/(L·atm), the form called Hcp (Sander, R. 2023, Atmos. Chem. Phys.
/// 23, 10901–12440, doi:10.5194/acp-23-10901-2023). Negative partial pressures pass through.
/// </remarks>
public static class HenryLaw
{
    private const double PascalPerHectopascal = 100.0;

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

    /// <summary>
    /// Henry's-law constant Hcp that an equation of a gas amounts to: the limit at low pressure, where fugacity and partial pressure are the same. A moist-air equation is
    /// divided by what its air held. Other forms: <see cref="HenryConversion"/>.
    /// </summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), °C, the range of the equation.</param>
    /// <param name="salinity">Practical salinity, the range of the equation.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="molesPerCubicMetrePascal">Hcp, mol/(m³·Pa), per volume of this water; NaN unless Ok or let pass by the rule.</param>
    public static Status Constant(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, RangeRule rule, out double molesPerCubicMetrePascal)
    {
        molesPerCubicMetrePascal = double.NaN;
        Status status = GasSolubility.Check(gas, equation, celsius, salinity);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double molarMass = GasUnits.GramsPerMole(gas);
        if (molarMass <= 0.0) { return status; }
        double solubility = GasEquilibrium.Solubility(gas, equation, celsius, salinity, 0.0, 0.0, null, out _, out _, out _, out _);
        molesPerCubicMetrePascal = InputCheck.FiniteOrNaN(solubility / PascalPerHectopascal / molarMass);
        return status;
    }

    private static Status CheckCoefficient(double coefficient)
    {
        if (InputCheck.NotFinite(coefficient)) { return Status.CoefficientNotFinite; }
        if (coefficient <= 0.0) { return Status.CoefficientBelowRange; }
        return Status.Ok;
    }
}
