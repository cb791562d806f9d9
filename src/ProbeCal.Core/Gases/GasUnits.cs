namespace ProbeCal;

/// <summary>Molar mass and molar volume of each gas, and the concentration units that follow from them. Per litre means at the temperature of the water.</summary>
/// <remarks>
/// The proportionalities refuse nothing: NaN gives NaN, and so does a gas that Core does not know. Accuracy: rounding of the constants, 0.001 % or better in molar mass;
/// for mL/L what stands with <see cref="LitresPerMole"/>.
/// </remarks>
public static class GasUnits
{
    private const double IdealLitresPerMole = 22.414;

    /// <summary>Molar mass, g/mol, from IUPAC atomic weights (2007 table, from memory; oxygen as in the solubility literature).</summary>
    public static double GramsPerMole(Gas gas)
    {
        switch (gas)
        {
            case Gas.Oxygen:
                return OxygenUnits.GramsPerMole;
            case Gas.Nitrogen:
                return 28.0134;
            case Gas.Argon:
                return 39.948;
            case Gas.Neon:
                return 20.1797;
            case Gas.Helium:
                return 4.002602;
            case Gas.Krypton:
                return 83.798;
            case Gas.Xenon:
                return 131.293;
            case Gas.CarbonDioxide:
                return 44.0095;
            case Gas.NitrousOxide:
                return 44.0128;
            case Gas.Methane:
                return 16.04246;
            case Gas.CarbonMonoxide:
                return 28.0101;
            case Gas.Hydrogen:
                return 2.01588;
            case Gas.SulfurHexafluoride:
                return 146.0554;
            case Gas.Cfc11:
                return 137.3681;
            case Gas.Cfc12:
                return 120.9135;
            case Gas.HydrogenSulfide:
                return 34.0809;
            case Gas.Ozone:
                return 47.9982;
            case Gas.Ammonia:
                return 17.0305;
            case Gas.Ethane:
                return 30.0690;
            default:
                return double.NaN;
        }
    }

    /// <summary>
    /// Molar volume at 0 °C and 1 atm, L/mol. Real gas for oxygen (Garcia and Gordon 1992), nitrogen, argon and carbon dioxide (from the gas densities 1.25043, 1.78419 and
    /// 1.97681 g/L, from memory), helium and krypton (the values that go with the equations, second-hand). The ideal 22.414 for all others, which is up to 1 % off for the heavy ones.
    /// </summary>
    public static double LitresPerMole(Gas gas)
    {
        switch (gas)
        {
            case Gas.Oxygen:
                return 22.3916;
            case Gas.Nitrogen:
                return 22.403;
            case Gas.Argon:
                return 22.390;
            case Gas.CarbonDioxide:
                return 22.263;
            case Gas.Helium:
                return 22.4258;
            case Gas.Krypton:
                return 22.3511;
            default:
                return GasSolubility.Known(gas) ? IdealLitresPerMole : double.NaN;
        }
    }

    /// <summary>Mass of one mL of the gas at 0 °C and 1 atm, mg: molar mass over molar volume, for oxygen the printed 1.42905.</summary>
    public static double MilligramsPerMillilitre(Gas gas)
    {
        if (gas == Gas.Oxygen) { return OxygenUnits.MilligramsPerMillilitre; }
        double volume = LitresPerMole(gas);
        return volume == 0.0 ? double.NaN : GramsPerMole(gas) / volume;
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
