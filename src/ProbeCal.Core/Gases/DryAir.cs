namespace ProbeCal;

/// <summary>Composition of dry air as the solubility equations assume it.</summary>
public static class DryAir
{
    /// <summary>
    /// Mole fraction of oxygen. Benson and Krause, and the fits to their data, are tied to 0.20946; the air of today holds about
    /// 0.20939 (from memory), 0.033 % less. Every conversion between partial pressure and concentration uses the value of the equations, so that it cancels.
    /// </summary>
    public const double OxygenMoleFraction = 0.20946;

    /// <summary>Usual mole fraction of a gas in dry air; NaN for a gas that air holds no settled amount of.</summary>
    public static double MoleFraction(Gas gas)
    {
        return gas == Gas.Oxygen ? OxygenMoleFraction : double.NaN;
    }
}
