namespace ProbeCal;

/// <summary>Volume that a mole of dissolved gas takes up in water: what hydrostatic pressure works against.</summary>
/// <remarks>
/// Enns, T., Scholander, P.F., Bradstreet, E.D. (1965) J. Phys. Chem. 69, 389–391, doi:10.1021/j100886a005. Oxygen seen in two second-hand places, the others
/// from memory. Taken as the same at every temperature.
/// </remarks>
internal static class PartialMolarVolume
{
    /// <summary>cm³/mol; NaN for a gas without a value.</summary>
    internal static double CubicCentimetresPerMole(Gas gas)
    {
        switch (gas)
        {
            case Gas.Oxygen:
            case Gas.Argon:
                return 31.7;
            case Gas.Nitrogen:
                return 33.1;
            case Gas.Helium:
                return 29.7;
            case Gas.CarbonDioxide:
                return 31.2;
            default:
                return double.NaN;
        }
    }
}
