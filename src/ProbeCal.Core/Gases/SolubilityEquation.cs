namespace ProbeCal;

/// <summary>
/// The published solubility equations, called author and year. Each covers one or more gases; a pair that is not published is refused with
/// <see cref="Status.EquationUnknown"/>. Zero is none of them, so that none is taken by default. The numbers never change: records keep them.
/// </summary>
public enum SolubilityEquation
{
    /// <summary>Benson and Krause 1984, Eq. 32: oxygen, mg/L. Behind the tables of the public field standards.</summary>
    BensonKrause1984 = 1,
    /// <summary>Garcia and Gordon 1992, Benson–Krause column: oxygen, µmol/kg. Also below 0 °C in sea water.</summary>
    GarciaGordon1992 = 2,
    /// <summary>Garcia and Gordon 1992, combined fit: oxygen, µmol/kg. For compatibility with older records.</summary>
    GarciaGordon1992Combined = 3,
    /// <summary>Benson and Krause 1984, Eq. 31: oxygen, µmol/kg.</summary>
    BensonKrause1984PerKilogram = 4,
    /// <summary>Weiss 1970: oxygen, nitrogen, argon from moist air, mL/L.</summary>
    Weiss1970 = 5,
    /// <summary>Weiss 1970: Bunsen coefficients of oxygen, nitrogen, argon.</summary>
    Weiss1970Bunsen = 6,
    /// <summary>Weiss 1971: helium, neon from moist air, mL/kg.</summary>
    Weiss1971 = 7,
    /// <summary>Weiss 1971: Bunsen coefficients of helium, neon.</summary>
    Weiss1971Bunsen = 8,
    /// <summary>Weiss and Kyser 1978: krypton from moist air, mL/kg.</summary>
    WeissKyser1978 = 9,
    /// <summary>Weiss and Kyser 1978: Bunsen coefficient of krypton.</summary>
    WeissKyser1978Bunsen = 10,
    /// <summary>Wood and Caputi 1966 as refitted by Hamme: xenon, µmol/kg.</summary>
    WoodCaputi1966 = 11,
    /// <summary>Hamme and Emerson 2004: nitrogen, argon, neon, µmol/kg and nmol/kg.</summary>
    HammeEmerson2004 = 12,
    /// <summary>Jenkins, Lott and Cahill 2019: helium, neon, argon, krypton, xenon, mol/kg.</summary>
    Jenkins2019 = 13,
    /// <summary>Weiss 1974: carbon dioxide as K0 with its virial correction.</summary>
    Weiss1974 = 14,
    /// <summary>Weiss and Price 1980: nitrous oxide as K0 with its virial correction; carbon dioxide as the moist-air function F at 1 atm.</summary>
    WeissPrice1980 = 15,
    /// <summary>Weiss and Price 1980: nitrous oxide as the moist-air function F at 1 atm.</summary>
    WeissPrice1980MoistAir = 16,
    /// <summary>Wiesenburg and Guinasso 1979: methane, carbon monoxide, hydrogen from moist air, nmol/kg.</summary>
    WiesenburgGuinasso1979 = 17,
    /// <summary>Wiesenburg and Guinasso 1979: Bunsen coefficients of methane, carbon monoxide, hydrogen.</summary>
    WiesenburgGuinasso1979Bunsen = 18,
    /// <summary>Bullister, Wisegarver and Menzia 2002: sulfur hexafluoride as K0′.</summary>
    Bullister2002 = 19,
    /// <summary>Bullister, Wisegarver and Menzia 2002: sulfur hexafluoride as the moist-air function F at 1 atm.</summary>
    Bullister2002MoistAir = 20,
    /// <summary>Warner and Weiss 1985: CFC-11, CFC-12 as the moist-air function F.</summary>
    WarnerWeiss1985 = 21,
    /// <summary>Fernández-Prini, Alvarez and Harvey 2003 (IAPWS G7-04): Henry's constants of fourteen gases in pure water, wide in temperature.</summary>
    FernandezPrini2003 = 22,
    /// <summary>Sander 2023: Henry's-law constants with temperature dependence, two figures.</summary>
    Sander2023 = 23,
}
