namespace ProbeCal;

/// <summary>
/// Units of oxygen concentration. Core carries mg/L; per litre means at the temperature of the water. The proportionalities
/// refuse nothing (NaN gives NaN); those by mass take the density of the water and judge it. Accuracy: rounding, and for mL/L
/// the 0.001 % to which the volume is printed.
/// </summary>
public static class OxygenUnits
{
    /// <summary>Molar mass of O2, g/mol (IUPAC atomic weights, the value of the solubility literature).</summary>
    public const double GramsPerMole = 31.9988;
    /// <summary>
    /// mg of oxygen in one mL of the real gas at 0 °C and 1 atm: 31.9988 g/mol over 22.3916 L/mol (Garcia and Gordon 1992, second-hand,
    /// as 44.6596 µmol/mL). The ideal volume would be 0.1 % off.
    /// </summary>
    public const double MilligramsPerMillilitre = 1.42905;

    private const double Thousand = 1000.0;

    /// <summary>mg/L to µmol/L.</summary>
    public static double MicromolesPerLitreFromMilligramsPerLitre(double milligramsPerLitre)
    {
        return milligramsPerLitre * Thousand / GramsPerMole;
    }

    /// <summary>µmol/L to mg/L.</summary>
    public static double MilligramsPerLitreFromMicromolesPerLitre(double micromolesPerLitre)
    {
        return micromolesPerLitre * GramsPerMole / Thousand;
    }

    /// <summary>mg/L to mL of gas (0 °C, 1 atm) per L.</summary>
    public static double MillilitresPerLitreFromMilligramsPerLitre(double milligramsPerLitre)
    {
        return milligramsPerLitre / MilligramsPerMillilitre;
    }

    /// <summary>mL of gas (0 °C, 1 atm) per L to mg/L.</summary>
    public static double MilligramsPerLitreFromMillilitresPerLitre(double millilitresPerLitre)
    {
        return millilitresPerLitre * MilligramsPerMillilitre;
    }

    /// <summary>mg/L to µmol per kg of water.</summary>
    /// <param name="milligramsPerLitre">Concentration, mg/L.</param>
    /// <param name="densityKilogramsPerCubicMetre">Density of the water at its temperature, kg/m³, above zero.</param>
    /// <param name="micromolesPerKilogram">Concentration, µmol/kg; NaN unless Ok.</param>
    public static Status MicromolesPerKilogramFromMilligramsPerLitre(
        double milligramsPerLitre, double densityKilogramsPerCubicMetre, out double micromolesPerKilogram)
    {
        micromolesPerKilogram = double.NaN;
        Status status = Check(milligramsPerLitre, densityKilogramsPerCubicMetre);
        if (status != Status.Ok) { return status; }
        return InputCheck.Deliver(
            MicromolesPerLitreFromMilligramsPerLitre(milligramsPerLitre) * Thousand / densityKilogramsPerCubicMetre,
            status, Status.ConcentrationAboveRange, out micromolesPerKilogram);
    }

    /// <summary>µmol per kg of water to mg/L.</summary>
    /// <param name="micromolesPerKilogram">Concentration, µmol/kg.</param>
    /// <param name="densityKilogramsPerCubicMetre">Density of the water at its temperature, kg/m³, above zero.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L; NaN unless Ok.</param>
    public static Status MilligramsPerLitreFromMicromolesPerKilogram(
        double micromolesPerKilogram, double densityKilogramsPerCubicMetre, out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        Status status = Check(micromolesPerKilogram, densityKilogramsPerCubicMetre);
        if (status != Status.Ok) { return status; }
        return InputCheck.Deliver(
            MilligramsPerLitreFromMicromolesPerLitre(micromolesPerKilogram * densityKilogramsPerCubicMetre / Thousand),
            status, Status.ConcentrationAboveRange, out milligramsPerLitre);
    }

    /// <summary>mg/L to mg per kg of water (parts per million by mass).</summary>
    /// <param name="milligramsPerLitre">Concentration, mg/L.</param>
    /// <param name="densityKilogramsPerCubicMetre">Density of the water at its temperature, kg/m³, above zero.</param>
    /// <param name="milligramsPerKilogram">Concentration, mg/kg; NaN unless Ok.</param>
    public static Status MilligramsPerKilogramFromMilligramsPerLitre(
        double milligramsPerLitre, double densityKilogramsPerCubicMetre, out double milligramsPerKilogram)
    {
        milligramsPerKilogram = double.NaN;
        Status status = Check(milligramsPerLitre, densityKilogramsPerCubicMetre);
        if (status != Status.Ok) { return status; }
        return InputCheck.Deliver(
            milligramsPerLitre * Thousand / densityKilogramsPerCubicMetre,
            status, Status.ConcentrationAboveRange, out milligramsPerKilogram);
    }

    private static Status Check(double concentration, double densityKilogramsPerCubicMetre)
    {
        Status finite = InputCheck.NotFinite(concentration) ? Status.ConcentrationNotFinite : Status.Ok;
        return InputCheck.Graver(finite, InputCheck.Density(densityKilogramsPerCubicMetre));
    }
}
