namespace ProbeCal;

/// <summary>
/// Each gas by each equation that covers it, as data. The evidence is what was found when the coefficients were compiled: in how many places besides
/// memory they were seen, and which outside value they give.
/// </summary>
internal static class SolubilityList
{
    private const string MoistAir = "concentration from moist air at 1 atm";
    private const string Bunsen = "Bunsen coefficient";
    private const string MoistAirFunction = "moist-air function F at 1 atm, per mole fraction";
    private const string PureGas = "solubility K0 of the pure gas";
    private const string HenryCompiled = "Henry's constant Hcp";
    private const string HenryWide = "inverse x/f of Henry's constant";
    private const string Reproduced = "published value second-hand, reproduced";
    private const string NoValue = "no published value in hand";
    private const string TwoFigures = "two figures: about 5 % (common practice, no source)";
    private const string PerLitreAtmosphere = "L/(L·atm)";
    private const string BunsenUse = "the form that tables of Bunsen coefficients use";
    private const string FitAtOneAtmosphere = "fugacity and vapour at 1 atm are inside the fit: for comparison with data reduced that way";
    private const string CompiledUse = "for comparison only: two figures, off by up to several percent away from 25 °C";
    private const string WideUse = "fresh water over a wide range of temperature; not for calibration";

    internal static readonly SolubilityEntry[] All =
    [
        Row(Gas.Oxygen, SolubilityEquation.BensonKrause1984, MoistAir, "mg/L",
            "about ±0.1 % fresh, ±0.2 % sea water (from memory)", Places(3, "the public field manual's tables, read, come out to every printed digit"), "the tables of the public field standards are made with it"),
        Row(Gas.Oxygen, SolubilityEquation.GarciaGordon1992, MoistAir, "µmol/kg",
            "±0.1–0.3 % (from memory)", Places(4, Reproduced), "for sea water, below 0 °C, and wherever µmol/kg are compared with oceanographic data"),
        Row(Gas.Oxygen, SolubilityEquation.GarciaGordon1992Combined, MoistAir, "µmol/kg",
            "±0.1–0.3 % (from memory)", Places(4, Reproduced), "for compatibility with records made with the combined fit"),
        Row(Gas.Oxygen, SolubilityEquation.BensonKrause1984PerKilogram, MoistAir, "µmol/kg",
            "about ±0.1 % fresh, ±0.2 % sea water (from memory)", Places(4, NoValue + "; agrees with garcia-gordon-1992"), "the per-kilogram twin of the default; needs a density to give mg/L"),
        Row(Gas.Oxygen, SolubilityEquation.Weiss1970, MoistAir, "mL/L",
            "0.02 mL/L (second-hand); ideal molar volume, so about 0.1 % low", Places(3, Reproduced), "for compatibility with older records"),
        Row(Gas.Oxygen, SolubilityEquation.Weiss1970Bunsen, Bunsen, PerLitreAtmosphere,
            "not stated in hand", OnePlace(NoValue + "; agrees with weiss-1970"), BunsenUse),
        Row(Gas.Oxygen, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace("the guideline's printed ln kH, second-hand, comes out"), WideUse),
        Row(Gas.Oxygen, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Read("two figures, so the check is the coefficient itself"), CompiledUse),
        Row(Gas.Nitrogen, SolubilityEquation.HammeEmerson2004, MoistAir, "µmol/kg",
            "0.14 % (second-hand)", Places(4, Reproduced), "the newest measurement, one laboratory for N2, Ar and Ne"),
        Row(Gas.Nitrogen, SolubilityEquation.Weiss1970, MoistAir, "mL/L",
            "not stated in hand", Places(3, Reproduced), "for compatibility with older records"),
        Row(Gas.Nitrogen, SolubilityEquation.Weiss1970Bunsen, Bunsen, PerLitreAtmosphere,
            "not stated in hand", OnePlace(NoValue + "; 0.36 % from weiss-1970"), BunsenUse),
        Row(Gas.Nitrogen, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace("the guideline's printed ln kH, second-hand, comes out"), WideUse),
        Row(Gas.Nitrogen, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Read("two figures, so the check is the coefficient itself"), CompiledUse),
        Row(Gas.Argon, SolubilityEquation.HammeEmerson2004, MoistAir, "µmol/kg",
            "0.13 % (second-hand)", Places(4, Reproduced), "the same laboratory as nitrogen, so that the ratio N2/Ar holds"),
        Row(Gas.Argon, SolubilityEquation.Jenkins2019, MoistAir, "mol/kg",
            "0.1–0.3 % (from memory)", Places(4, NoValue), "newer, one data set for all noble gases"),
        Row(Gas.Argon, SolubilityEquation.Weiss1970, MoistAir, "mL/L",
            "not stated in hand", Places(3, Reproduced), "for compatibility with older records"),
        Row(Gas.Argon, SolubilityEquation.Weiss1970Bunsen, Bunsen, PerLitreAtmosphere,
            "not stated in hand", OnePlace(NoValue + "; agrees with weiss-1970"), BunsenUse),
        Row(Gas.Argon, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace("the guideline's printed ln kH, second-hand, comes out"), WideUse),
        Row(Gas.Argon, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Read("two figures, so the check is the coefficient itself"), CompiledUse),
        Row(Gas.Neon, SolubilityEquation.HammeEmerson2004, MoistAir, "nmol/kg",
            "0.30 % (second-hand)", Places(4, Reproduced), "the same laboratory as nitrogen and argon, so that ratios to neon hold"),
        Row(Gas.Neon, SolubilityEquation.Jenkins2019, MoistAir, "mol/kg",
            "0.1–0.3 % (from memory)", Places(4, NoValue), "newer, one data set for all noble gases"),
        Row(Gas.Neon, SolubilityEquation.Weiss1971, MoistAir, "mL/kg",
            "0.5 % (second-hand)", Places(2, NoValue), "for compatibility with older records"),
        Row(Gas.Neon, SolubilityEquation.Weiss1971Bunsen, Bunsen, PerLitreAtmosphere,
            "0.5 % (second-hand)", OnePlace(NoValue), BunsenUse),
        Row(Gas.Neon, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace("the guideline's printed ln kH, second-hand, comes out"), WideUse),
        Row(Gas.Neon, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Memory(NoValue), CompiledUse),
        Row(Gas.Helium, SolubilityEquation.Jenkins2019, MoistAir, "mol/kg",
            "0.1–0.3 % (from memory)", Places(4, Reproduced), "the newest, one data set for all noble gases"),
        Row(Gas.Helium, SolubilityEquation.Weiss1971, MoistAir, "mL/kg",
            "0.5 % (second-hand)", Places(4, NoValue), "for compatibility with older records"),
        Row(Gas.Helium, SolubilityEquation.Weiss1971Bunsen, Bunsen, PerLitreAtmosphere,
            "0.5 % (second-hand)", OnePlace(NoValue), BunsenUse),
        Row(Gas.Helium, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace("the guideline's printed ln kH, second-hand, comes out"), WideUse),
        Row(Gas.Helium, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Read("two figures, so the check is the coefficient itself"), CompiledUse),
        Row(Gas.Krypton, SolubilityEquation.Jenkins2019, MoistAir, "mol/kg",
            "0.1–0.3 % (from memory)", Places(4, Reproduced), "the newest, one data set for all noble gases"),
        Row(Gas.Krypton, SolubilityEquation.WeissKyser1978, MoistAir, "mL/kg",
            "0.4 % (second-hand)", Places(4, "output of a library comes out; no published value in hand"), "for compatibility with older records"),
        Row(Gas.Krypton, SolubilityEquation.WeissKyser1978Bunsen, Bunsen, PerLitreAtmosphere,
            "0.4 % (second-hand)", Places(2, NoValue), BunsenUse),
        Row(Gas.Krypton, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace("the guideline's printed ln kH, second-hand, comes out"), WideUse),
        Row(Gas.Krypton, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Memory(NoValue), CompiledUse),
        Row(Gas.Xenon, SolubilityEquation.Jenkins2019, MoistAir, "mol/kg",
            "0.1–0.3 % (from memory)", Places(4, Reproduced + " to 0.006 %"), "the newest, one data set for all noble gases"),
        Row(Gas.Xenon, SolubilityEquation.WoodCaputi1966, MoistAir, "µmol/kg",
            "about 1–2 % (second-hand)", Places(2, NoValue), "for compatibility with older records"),
        Row(Gas.Xenon, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace("the guideline's printed ln kH, second-hand, comes out"), WideUse),
        Row(Gas.Xenon, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Read("two figures, so the check is the coefficient itself"), CompiledUse),
        Row(Gas.CarbonDioxide, SolubilityEquation.Weiss1974, PureGas, "mol/(kg·atm)",
            "0.2 % (second-hand)", Places(4, "the paper's table of K0, second-hand, comes out"), "holds at any pressure of its range, because fugacity and vapour are separate terms"),
        Row(Gas.CarbonDioxide, SolubilityEquation.WeissPrice1980, MoistAirFunction, "mol/(kg·atm)",
            "0.3 % (second-hand)", Places(3, Reproduced), FitAtOneAtmosphere),
        Row(Gas.CarbonDioxide, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace("the guideline's printed ln kH, second-hand, comes out"), WideUse),
        Row(Gas.CarbonDioxide, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Read("two figures, so the check is the coefficient itself"), CompiledUse),
        Row(Gas.NitrousOxide, SolubilityEquation.WeissPrice1980, PureGas, "mol/(kg·atm)",
            "0.14 % (second-hand)", Places(4, NoValue + "; its virial terms rest on one place"), "holds at any pressure of its range, because fugacity and vapour are separate terms"),
        Row(Gas.NitrousOxide, SolubilityEquation.WeissPrice1980MoistAir, MoistAirFunction, "mol/(kg·atm)",
            "0.14 % (second-hand)", Places(2, Reproduced), FitAtOneAtmosphere),
        Row(Gas.NitrousOxide, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Read("two figures, so the check is the coefficient itself"), CompiledUse),
        Row(Gas.Methane, SolubilityEquation.WiesenburgGuinasso1979, MoistAir + ", per mole fraction", "nmol/kg",
            "about 1 % (second-hand)", Places(4, Reproduced), "the usual one in fresh and sea water"),
        Row(Gas.Methane, SolubilityEquation.WiesenburgGuinasso1979Bunsen, Bunsen, PerLitreAtmosphere,
            "about 1 % (second-hand)", Places(3, NoValue), BunsenUse),
        Row(Gas.Methane, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace("the guideline's printed ln kH, second-hand, comes out"), WideUse),
        Row(Gas.Methane, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Read("two figures, so the check is the coefficient itself"), CompiledUse),
        Row(Gas.CarbonMonoxide, SolubilityEquation.WiesenburgGuinasso1979, MoistAir + ", per mole fraction", "nmol/kg",
            "about 1–2 % (second-hand)", Places(2, Reproduced), "the usual one in fresh and sea water"),
        Row(Gas.CarbonMonoxide, SolubilityEquation.WiesenburgGuinasso1979Bunsen, Bunsen, PerLitreAtmosphere,
            "about 1–2 % (second-hand)", Places(2, NoValue), BunsenUse),
        Row(Gas.CarbonMonoxide, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace(NoValue), WideUse),
        Row(Gas.CarbonMonoxide, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Read("two figures, so the check is the coefficient itself"), CompiledUse),
        Row(Gas.Hydrogen, SolubilityEquation.WiesenburgGuinasso1979, MoistAir + ", per mole fraction", "nmol/kg",
            "about 1 % (second-hand)", Places(2, Reproduced + " to 0.017 %"), "the usual one in fresh and sea water"),
        Row(Gas.Hydrogen, SolubilityEquation.WiesenburgGuinasso1979Bunsen, Bunsen, PerLitreAtmosphere,
            "about 1 % (second-hand)", Places(2, NoValue), BunsenUse),
        Row(Gas.Hydrogen, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace("the guideline's printed ln kH, second-hand, comes out"), WideUse),
        Row(Gas.Hydrogen, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Read("two figures, so the check is the coefficient itself"), CompiledUse),
        Row(Gas.SulfurHexafluoride, SolubilityEquation.Bullister2002, "solubility K0′ of the pure gas", "mol/(L·atm)",
            "2 % (second-hand)", Places(3, Reproduced + " to 0.05 %"), "the only measurement good enough in fresh and sea water"),
        Row(Gas.SulfurHexafluoride, SolubilityEquation.Bullister2002MoistAir, MoistAirFunction, "mol/(L·atm)",
            "2 % (second-hand)", Places(4, NoValue), "vapour at 1 atm is inside the fit: for comparison with data reduced that way"),
        Row(Gas.SulfurHexafluoride, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "not stated for this gas near ambient; 8 % above bullister-2002 at 25 °C, 18 % at 40 °C (measured)", OnePlace("the guideline's printed ln kH, second-hand, comes out"),
            "not to be used near ambient: far from the default there"),
        Row(Gas.Cfc11, SolubilityEquation.WarnerWeiss1985, MoistAirFunction, "mol/(L·atm)",
            "1.5 % (second-hand)", Places(3, NoValue), "the only measurement of its kind in fresh and sea water"),
        Row(Gas.Cfc12, SolubilityEquation.WarnerWeiss1985, MoistAirFunction, "mol/(L·atm)",
            "1.5 % (second-hand)", Places(3, NoValue), "the only measurement of its kind in fresh and sea water"),
        Row(Gas.HydrogenSulfide, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Read("two figures, so the check is the coefficient itself"), "the usual handbook constant; flagged with its 5 %"),
        Row(Gas.HydrogenSulfide, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace("the guideline's printed ln kH, second-hand, comes out"), "for a wide range of temperature; fresh water"),
        Row(Gas.Ozone, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Read("two figures, so the check is the coefficient itself"), "the only one for this gas here; flagged with its 5 %"),
        Row(Gas.Ammonia, SolubilityEquation.Sander2023, HenryCompiled, "mol/(m³·Pa)",
            TwoFigures, Memory(NoValue), "the only one for this gas here; flagged with its 5 %"),
        Row(Gas.Ethane, SolubilityEquation.FernandezPrini2003, HenryWide, "1/Pa",
            "about 1–2 % near ambient (second-hand)", OnePlace("the guideline's printed ln kH, second-hand, comes out"), "the only one for this gas here"),
    ];

    private static SolubilityEntry Row(
        Gas gas, SolubilityEquation equation, string quantity, string unit, string statedAccuracy, Evidence evidence, string why)
    {
        return new SolubilityEntry(gas, Catalogue.Equation(equation), quantity, unit, statedAccuracy, evidence, why);
    }

    private static Evidence Places(int places, string check)
    {
        return new Evidence(EvidenceGrade.SecondHand, places, check);
    }

    private static Evidence OnePlace(string check)
    {
        return new Evidence(EvidenceGrade.OnePlace, 1, check);
    }

    private static Evidence Read(string check)
    {
        return new Evidence(EvidenceGrade.Read, 1, check);
    }

    private static Evidence Memory(string check)
    {
        return new Evidence(EvidenceGrade.Memory, 0, check);
    }
}
