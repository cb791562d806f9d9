namespace ProbeCal;

/// <summary>The published solubility equations as data, in the order of their numbers.</summary>
internal static class EquationList
{
    private const string BensonKrause = "Benson, B.B., Krause, D. (1984) The concentration and isotopic fractionation of oxygen dissolved in freshwater and seawater in equilibrium with the atmosphere. Limnol. Oceanogr. 29(3), 620–632";
    private const string GarciaGordon = "Garcia, H.E., Gordon, L.I. (1992) Oxygen solubility in seawater: better fitting equations. Limnol. Oceanogr. 37(6), 1307–1312; erratum Limnol. Oceanogr. 38, 656 (1993)";
    private const string Weiss70 = "Weiss, R.F. (1970) The solubility of nitrogen, oxygen and argon in water and seawater. Deep-Sea Res. 17, 721–735";
    private const string Weiss71 = "Weiss, R.F. (1971) Solubility of helium and neon in water and seawater. J. Chem. Eng. Data 16(2), 235–241";
    private const string WeissKyser = "Weiss, R.F., Kyser, T.K. (1978) Solubility of krypton in water and seawater. J. Chem. Eng. Data 23(1), 69–72";
    private const string WeissPrice = "Weiss, R.F., Price, B.A. (1980) Nitrous oxide solubility in water and seawater. Mar. Chem. 8, 347–359";
    private const string WiesenburgGuinasso = "Wiesenburg, D.A., Guinasso, N.L. (1979) Equilibrium solubilities of methane, carbon monoxide, and hydrogen in water and sea water. J. Chem. Eng. Data 24(4), 356–360";
    private const string Bullister = "Bullister, J.L., Wisegarver, D.P., Menzia, F.A. (2002) The solubility of sulfur hexafluoride in water and seawater. Deep-Sea Res. I 49, 175–187";

    internal static readonly EquationEntry[] All =
    [
        new(SolubilityEquation.BensonKrause1984, "benson-krause-1984", BensonKrause + ", Eq. 32", "10.4319/lo.1984.29.3.0620"),
        new(SolubilityEquation.GarciaGordon1992, "garcia-gordon-1992", GarciaGordon + "; Eq. 8, Benson–Krause column", "10.4319/lo.1992.37.6.1307"),
        new(SolubilityEquation.GarciaGordon1992Combined, "garcia-gordon-1992-combined", GarciaGordon + "; Eq. 8, combined fit", "10.4319/lo.1992.37.6.1307"),
        new(SolubilityEquation.BensonKrause1984PerKilogram, "benson-krause-1984-per-kilogram", BensonKrause + ", Eq. 31", "10.4319/lo.1984.29.3.0620"),
        new(SolubilityEquation.Weiss1970, "weiss-1970", Weiss70 + "; solubility from moist air", "10.1016/0011-7471(70)90037-9"),
        new(SolubilityEquation.Weiss1970Bunsen, "weiss-1970-bunsen", Weiss70 + "; Bunsen coefficients", "10.1016/0011-7471(70)90037-9"),
        new(SolubilityEquation.Weiss1971, "weiss-1971", Weiss71 + "; solubility from moist air", "10.1021/je60049a019"),
        new(SolubilityEquation.Weiss1971Bunsen, "weiss-1971-bunsen", Weiss71 + "; Bunsen coefficients", "10.1021/je60049a019"),
        new(SolubilityEquation.WeissKyser1978, "weiss-kyser-1978", WeissKyser + "; solubility from moist air", "10.1021/je60076a014"),
        new(SolubilityEquation.WeissKyser1978Bunsen, "weiss-kyser-1978-bunsen", WeissKyser + "; Bunsen coefficient", "10.1021/je60076a014"),
        new(SolubilityEquation.WoodCaputi1966, "wood-caputi-1966", "Wood, D., Caputi, R. (1966) USNRDL-TR-988, as refitted by Hamme and used in Hamme, R.C., Severinghaus, J.P. (2007) Deep-Sea Res. I 54, 939–950", "10.1016/j.dsr.2007.03.008"),
        new(SolubilityEquation.HammeEmerson2004, "hamme-emerson-2004", "Hamme, R.C., Emerson, S.R. (2004) The solubility of neon, nitrogen and argon in distilled water and seawater. Deep-Sea Res. I 51(11), 1517–1528", "10.1016/j.dsr.2004.06.009"),
        new(SolubilityEquation.Jenkins2019, "jenkins-2019", "Jenkins, W.J., Lott, D.E., Cahill, K.L. (2019) A determination of atmospheric helium, neon, argon, krypton, and xenon solubility concentrations in water and seawater. Mar. Chem. 211, 94–107", "10.1016/j.marchem.2019.03.007", "jenkins-lott-cahill-2019"),
        new(SolubilityEquation.Weiss1974, "weiss-1974", "Weiss, R.F. (1974) Carbon dioxide in water and seawater: the solubility of a non-ideal gas. Mar. Chem. 2, 203–215", "10.1016/0304-4203(74)90015-2"),
        new(SolubilityEquation.WeissPrice1980, "weiss-price-1980", WeissPrice, "10.1016/0304-4203(80)90024-9"),
        new(SolubilityEquation.WeissPrice1980MoistAir, "weiss-price-1980-moist-air", WeissPrice + "; moist-air function F", "10.1016/0304-4203(80)90024-9"),
        new(SolubilityEquation.WiesenburgGuinasso1979, "wiesenburg-guinasso-1979", WiesenburgGuinasso + ", Table VI", "10.1021/je60083a006"),
        new(SolubilityEquation.WiesenburgGuinasso1979Bunsen, "wiesenburg-guinasso-1979-bunsen", WiesenburgGuinasso + ", Table I", "10.1021/je60083a006"),
        new(SolubilityEquation.Bullister2002, "bullister-2002", Bullister + ", Table 2", "10.1016/S0967-0637(01)00051-6", "bullister-wisegarver-menzia-2002"),
        new(SolubilityEquation.Bullister2002MoistAir, "bullister-2002-moist-air", Bullister + ", Table 3", "10.1016/S0967-0637(01)00051-6"),
        new(SolubilityEquation.WarnerWeiss1985, "warner-weiss-1985", "Warner, M.J., Weiss, R.F. (1985) Solubilities of chlorofluorocarbons 11 and 12 in water and seawater. Deep-Sea Res. 32(12), 1485–1497, Table 5", "10.1016/0198-0149(85)90099-8"),
        new(SolubilityEquation.FernandezPrini2003, "fernandez-prini-2003", "Fernández-Prini, R., Alvarez, J.L., Harvey, A.H. (2003) Henry's constants and vapor–liquid distribution constants for gaseous solutes in H2O and D2O at high temperatures. J. Phys. Chem. Ref. Data 32, 903–916; IAPWS G7-04", "10.1063/1.1564818", "iapws-g7-04"),
        new(SolubilityEquation.Sander2023, "sander-2023", "Sander, R. (2023) Compilation of Henry's law constants (version 5.0.0) for water as solvent. Atmos. Chem. Phys. 23, 10901–12440", "10.5194/acp-23-10901-2023"),
    ];
}
