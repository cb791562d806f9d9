namespace ProbeCal;

/// <summary>Molar mass and molar volume of each gas, and the concentration units that follow from them. Per litre means at the temperature of the water.</summary>
/// <remarks>Skeleton: oxygen only; the other gases follow. NaN for a gas that Core does not know.</remarks>
public static class GasUnits
{
    /// <summary>Molar mass, g/mol.</summary>
    public static double GramsPerMole(Gas gas)
    {
        return gas == Gas.Oxygen ? OxygenUnits.GramsPerMole : double.NaN;
    }

    /// <summary>Mass of one mL of the gas at 0 °C and 1 atm, mg.</summary>
    public static double MilligramsPerMillilitre(Gas gas)
    {
        return gas == Gas.Oxygen ? OxygenUnits.MilligramsPerMillilitre : double.NaN;
    }

    /// <summary>mg/L to µmol/L.</summary>
    public static double MicromolesPerLitreFromMilligramsPerLitre(Gas gas, double milligramsPerLitre)
    {
        double molarMass = GramsPerMole(gas);
        return molarMass == 0.0 ? double.NaN : milligramsPerLitre * 1000.0 / molarMass;
    }

    /// <summary>µmol/L to mg/L.</summary>
    public static double MilligramsPerLitreFromMicromolesPerLitre(Gas gas, double micromolesPerLitre)
    {
        return micromolesPerLitre * GramsPerMole(gas) / 1000.0;
    }

    /// <summary>mg/L to mL of gas (0 °C, 1 atm) per L.</summary>
    public static double MillilitresPerLitreFromMilligramsPerLitre(Gas gas, double milligramsPerLitre)
    {
        double density = MilligramsPerMillilitre(gas);
        return density == 0.0 ? double.NaN : milligramsPerLitre / density;
    }

    /// <summary>mL of gas (0 °C, 1 atm) per L to mg/L.</summary>
    public static double MilligramsPerLitreFromMillilitresPerLitre(Gas gas, double millilitresPerLitre)
    {
        return millilitresPerLitre * MilligramsPerMillilitre(gas);
    }
}
