namespace ProbeCal;

/// <summary>Composition of dry air as the solubility equations assume it.</summary>
public static class DryAir
{
    /// <summary>
    /// Mole fraction of oxygen. Benson and Krause, and the fits to their data, are tied to 0.20946; the air of today holds about
    /// 0.20939 (from memory), 0.033 % less. Every conversion between partial pressure and concentration uses the value of the equations, so that it cancels.
    /// </summary>
    public const double OxygenMoleFraction = 0.20946;

    /// <summary>
    /// Usual mole fraction of a gas in dry air; NaN for a gas that air holds no settled amount of. Oxygen, nitrogen and the noble gases: Glueckauf (1951), to which the equations
    /// are tied. The trace gases: clean air of about 2025, from memory, good to a few per cent; where they matter, measure and give the fraction.
    /// </summary>
    public static double MoleFraction(Gas gas)
    {
        switch (gas)
        {
            case Gas.Oxygen:
                return OxygenMoleFraction;
            case Gas.Nitrogen:
                return 0.78084;
            case Gas.Argon:
                return 0.00934;
            case Gas.Neon:
                return 1.818e-5;
            case Gas.Helium:
                return 5.24e-6;
            case Gas.Krypton:
                return 1.14e-6;
            case Gas.Xenon:
                return 8.7e-8;
            case Gas.CarbonDioxide:
                return 4.25e-4;
            case Gas.Methane:
                return 1.93e-6;
            case Gas.NitrousOxide:
                return 3.38e-7;
            case Gas.Hydrogen:
                return 5.3e-7;
            case Gas.CarbonMonoxide:
                return 1.0e-7;
            case Gas.SulfurHexafluoride:
                return 1.2e-11;
            case Gas.Cfc11:
                return 2.15e-10;
            case Gas.Cfc12:
                return 4.85e-10;
            default:
                return double.NaN;
        }
    }
}
