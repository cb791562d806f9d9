namespace ProbeCal;

/// <summary>The published relations about water as data.</summary>
internal static class WaterList
{
    private const string VapourOverWater = "vapour pressure over water";
    private const string NoValue = "no published value in hand";

    internal static readonly WaterEntry[] All =
    [
        new("wagner-pruss-1993", VapourOverWater, "hPa",
            "Wagner, W., Pruss, A. (1993) J. Phys. Chem. Ref. Data 22, 783–787, Eq. 1; IAPWS SR1-86(1992)", "10.1063/1.1461829",
            Between(VapourWagnerPruss1993.LowestCelsius, VapourWagnerPruss1993.HighestCelsius),
            "0.01–0.02 % near ambient (from memory)", Places(4, "values recalled from memory come out"), "the reference for pure water; inside fernandez-prini-2003"),
        new("benson-krause-1980", VapourOverWater + ", and the virial term θ of oxygen", "atm",
            "Benson, B.B., Krause, D. (1980) The concentration and isotopic fractionation of gases dissolved in freshwater in equilibrium with the atmosphere: 1. Oxygen. Limnol. Oceanogr. 25(4), 662–671", "10.4319/lo.1980.25.4.0662",
            Between(VapourBensonKrause1980.LowestCelsius, VapourBensonKrause1980.HighestCelsius),
            "not stated in hand", Places(3, "a published value of the pressure factor, second-hand, comes out"), "inside every oxygen function, for it belongs to the pressure factor"),
        new("weiss-price-1980", VapourOverWater + ", fresh and sea", "atm",
            "Weiss, R.F., Price, B.A. (1980) Nitrous oxide solubility in water and seawater. Mar. Chem. 8, 347–359, Eq. 10", "10.1016/0304-4203(80)90024-9",
            Between(VapourWeissPrice1980.LowestCelsius, VapourWeissPrice1980.HighestCelsius) + ", " + Salinities(VapourWeissPrice1980.HighestSalinity),
            "0.015 % from its parent formula (second-hand)", Places(4, NoValue), "over the water for every gas but oxygen"),
        new("millero-poisson-1981", "density at 1 atm", "kg/m³",
            "Millero, F.J., Poisson, A. (1981) International one-atmosphere equation of state of seawater. Deep-Sea Res. 28A, 625–629; UNESCO Tech. Pap. Mar. Sci. 44 (1983)", "10.1016/0198-0149(81)90122-9",
            Between(DensityEos80.LowestCelsius, DensityEos80.HighestCelsius) + ", " + Salinities(DensityEos80.HighestSalinity),
            "0.0036 kg/m³ (read)", Read("its four published values, read, come out to the printed digit"), "between per litre and per kilogram", "eos-80"),
        new("millero-leung-1976", "freezing point at 1 atm", "°C",
            "Millero, F.J., Leung, W.H. (1976) The thermodynamics of seawater at one atmosphere. Am. J. Sci. 276, 1035–1077; UNESCO Tech. Pap. Mar. Sci. 44 (1983)", "10.2475/ajs.276.9.1035",
            Salinities(FreezingPoint.HighestSalinity), "0.004 K (from memory)", Memory("within 0.003 K of gsw"), "lower end of garcia-gordon-1992"),
        new("saunders-1990", "IPTS-68 from ITS-90", "°C",
            "Saunders, P.M. (1990) The International Temperature Scale of 1990, ITS-90. WOCE Newsletter 10", "",
            "−2 to 40 °C", "not stated in hand", Places(2, "gsw converts the same way"), "for equations that were written on IPTS-68"),
        new("enns-1965", "partial molar volume of a dissolved gas", "cm³/mol",
            "Enns, T., Scholander, P.F., Bradstreet, E.D. (1965) Effect of hydrostatic pressure on gases dissolved in water. J. Phys. Chem. 69, 389–391", "10.1021/j100886a005",
            "to 100 atm", "about 3 % (our estimate)", Places(2, "oxygen in two places, the others in one; a value recalled from memory comes out"), "what pressure above 1.1 atm does to the dissolved gas"),
        new("smith-van-ness-1975", "second virial coefficient from critical constants", "cm³/mol",
            "Abbott's form of Pitzer's correlation, in Smith, J.M., Van Ness, H.C. (1975) Introduction to Chemical Engineering Thermodynamics, 3rd ed., McGraw-Hill", "",
            "above 1.1 atm", "not stated in hand", Memory("within 6 % of the virial term of oxygen"), "fugacity of N2, Ar and He above 1.1 atm"),
        new("usgs-2020", "salinity from specific conductance at 25 °C", "",
            "US Geological Survey (2020) National Field Manual, Dissolved oxygen, Techniques and Methods 9-A6.2", "10.3133/tm9A6.2",
            "0 to " + CatalogueText.Number(SpecificConductance.HighestMicrosiemensPerCentimetre) + " µS/cm", "not stated",
            Places(3, "1242 cells of the manual's factor table, read, come out"), "field water whose ions are not known"),
        new("us-standard-atmosphere-1976", "pressure from altitude", "hPa",
            "US Standard Atmosphere, 1976; ISO 2533; ICAO Doc 7488", "",
            CatalogueText.Number(StandardAtmosphere.LowestAltitudeMetres) + " to " + CatalogueText.Number(StandardAtmosphere.HighestAltitudeMetres) + " m", "the weather moves the real pressure by ±3 % about it (from memory)",
            Places(3, "table values recalled from memory come out"), "in place of a barometer, second best"),
    ];

    private static string Between(double lowest, double highest)
    {
        return CatalogueText.Number(lowest) + " to " + CatalogueText.Number(highest) + " °C";
    }

    private static string Salinities(double highest)
    {
        return "S 0 to " + CatalogueText.Number(highest);
    }

    private static Evidence Places(int places, string check)
    {
        return new Evidence(EvidenceGrade.SecondHand, places, check);
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
