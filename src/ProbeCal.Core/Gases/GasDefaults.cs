namespace ProbeCal;

/// <summary>The equation taken for a gas where none is named; why it is the default stands in docs/methods.md.</summary>
public static class GasDefaults
{
    /// <summary>The default equation; zero for a gas that Core does not know.</summary>
    public static SolubilityEquation Equation(Gas gas)
    {
        switch (gas)
        {
            case Gas.Oxygen:
                return SolubilityEquation.BensonKrause1984;
            case Gas.Nitrogen:
            case Gas.Argon:
            case Gas.Neon:
                return SolubilityEquation.HammeEmerson2004;
            case Gas.Helium:
            case Gas.Krypton:
            case Gas.Xenon:
                return SolubilityEquation.Jenkins2019;
            case Gas.CarbonDioxide:
                return SolubilityEquation.Weiss1974;
            case Gas.NitrousOxide:
                return SolubilityEquation.WeissPrice1980;
            case Gas.Methane:
            case Gas.CarbonMonoxide:
            case Gas.Hydrogen:
                return SolubilityEquation.WiesenburgGuinasso1979;
            case Gas.SulfurHexafluoride:
                return SolubilityEquation.Bullister2002;
            case Gas.Cfc11:
            case Gas.Cfc12:
                return SolubilityEquation.WarnerWeiss1985;
            case Gas.HydrogenSulfide:
            case Gas.Ozone:
            case Gas.Ammonia:
                return SolubilityEquation.Sander2023;
            case Gas.Ethane:
                return SolubilityEquation.FernandezPrini2003;
            default:
                return 0;
        }
    }
}
