using System.Globalization;

namespace ProbeCal;

/// <summary>The published relations about water as data.</summary>
internal static class WaterList
{
    private const string VapourOverWater = "vapour pressure over water";
    private const string RecalledValues = "values recalled from memory come out";
    private const string NoValue = "no published value in hand";

    internal static readonly WaterEntry[] All =
    [
        new("wagner-pruss-1993", VapourOverWater, "hPa",
            "Wagner, W., Pruss, A. (1993) J. Phys. Chem. Ref. Data 22, 783–787, Eq. 1; IAPWS SR1-86(1992)", "10.1063/1.1461829",
            Between(VapourWagnerPruss1993.LowestCelsius, VapourWagnerPruss1993.HighestCelsius),
            "0.01–0.02 % near ambient (from memory)", Places(4, RecalledValues), "the reference for pure water; inside fernandez-prini-2003"),
        new("benson-krause-1980", VapourOverWater + ", and the virial term θ of oxygen", "atm",
            "Benson, B.B., Krause, D. (1980) The concentration and isotopic fractionation of gases dissolved in freshwater in equilibrium with the atmosphere: 1. Oxygen. Limnol. Oceanogr. 25(4), 662–671", "10.4319/lo.1980.25.4.0662",
            Between(VapourBensonKrause1980.LowestCelsius, VapourBensonKrause1980.HighestCelsius),
            "not stated in hand", Places(3, "a published value of the pressure factor, second-hand, comes out"), "inside every oxygen function, for it belongs to the pressure factor"),
        new("weiss-price-1980", VapourOverWater + ", fresh and sea", "atm",
            "Weiss, R.F., Price, B.A. (1980) Nitrous oxide solubility in water and seawater. Mar. Chem. 8, 347–359, Eq. 10", "10.1016/0304-4203(80)90024-9",
            Between(VapourWeissPrice1980.LowestCelsius, VapourWeissPrice1980.HighestCelsius) + ", " + Salinities(VapourWeissPrice1980.HighestSalinity),
            "0.015 % from its parent formula (second-hand)", Places(4, NoValue), "over the water for every gas but oxygen"),
        new("dickson-2007", VapourOverWater + ", sea", "hPa",
            "Dickson, A.G., Sabine, C.L., Christian, J.R. (2007) Guide to best practices for ocean CO2 measurements. PICES Special Publication 3, ch. 5; osmotic coefficient after Millero (1974)", "",
            Between(VapourDickson2007.LowestCelsius, VapourDickson2007.HighestCelsius) + ", " + Salinities(VapourDickson2007.HighestSalinity),
            "about 0.02 % for the salt (our estimate)", OnePlace(NoValue), "sea water on the reference form"),
        new("green-carritt-1967", VapourOverWater + ", fresh and sea", "atm",
            "Green, E.J., Carritt, D.E. (1967) New tables for oxygen saturation of seawater. J. Mar. Res. 25, 140–147", "",
            Between(VapourGreenCarritt1967.LowestCelsius, VapourGreenCarritt1967.HighestCelsius) + ", " + Salinities(VapourGreenCarritt1967.HighestSalinity),
            "not stated in hand", OnePlace(NoValue), "for compatibility with older oxygen tables"),
        new("hardy-1998", VapourOverWater, "Pa",
            "Hardy, B. (1998) ITS-90 formulations for vapor pressure, frostpoint temperature, dewpoint temperature, and enhancement factors. Proc. 3rd Int. Symp. Humidity and Moisture, 214–221", "",
            Between(VapourHardy1998.LowestCelsius, VapourHardy1998.HighestCelsius), "0.01 % (from memory)", Places(4, RecalledValues), "humidity of air"),
        new("buck-1981", VapourOverWater, "hPa",
            "Buck, A.L. (1981) New equations for computing vapor pressure and enhancement factor. J. Appl. Meteorol. 20, 1527–1532", "10.1175/1520-0450(1981)020<1527:NEFCVP>2.0.CO;2",
            Between(VapourBuck1981.LowestCelsius, VapourBuck1981.HighestCelsius), "0.05 % (second-hand)", OnePlace(NoValue), "short form of instruments"),
        new("buck-1996", VapourOverWater, "hPa",
            "Buck (1996), revision of Buck (1981) in a research manual", "",
            Between(VapourBuck1996.LowestCelsius, VapourBuck1996.HighestCelsius), "0.02 % at 0–50 °C (second-hand)", Places(2, RecalledValues), "short form of instruments"),
        new("sonntag-1990", VapourOverWater, "hPa",
            "WMO-No. 8, after Sonntag, D. (1990) Z. Meteorol. 70, 340–344", "",
            Between(VapourSonntag1990.LowestCelsius, VapourSonntag1990.HighestCelsius), "0.3 % at 0–50 °C (second-hand)", Places(3, NoValue), "as weather services compute it"),
        new("murray-1967", VapourOverWater, "hPa",
            "Murray, F.W. (1967) On the computation of saturation vapor pressure. J. Appl. Meteorol. 6, 203–204", "10.1175/1520-0450(1967)006<0203:OTCOSV>2.0.CO;2",
            Between(VapourMurray1967.LowestCelsius, VapourMurray1967.HighestCelsius), "0.2 % (second-hand)", Places(3, NoValue), "for compatibility with older programs"),
        new("antoine-8111", VapourOverWater, "mmHg",
            "US Geological Survey, Quality of Water Branch Technical Memorandum 81.11 (1981)", "",
            Between(VapourAntoine8111.LowestCelsius, VapourAntoine8111.HighestCelsius), "not stated in hand", Places(3, RecalledValues), "for compatibility with older field tables"),
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
            Between(Enns1965.LowestCelsius, Enns1965.HighestCelsius) + ", to 100 atm", "about 3 % (our estimate)", Places(2, "oxygen alone, the other gases from memory; a value recalled from memory comes out"), "what pressure above 1.1 atm, and depth, do to a dissolved gas"),
        new("smith-van-ness-1975", "second virial coefficient from critical constants", "cm³/mol",
            "Abbott's form of Pitzer's correlation, in Smith, J.M., Van Ness, H.C. (1975) Introduction to Chemical Engineering Thermodynamics, 3rd ed., McGraw-Hill", "",
            "above 1.1 atm", "not stated in hand", Memory("within 2.7 % of the virial term of oxygen"), "fugacity of N2, Ar and He above 1.1 atm"),
        new("usgs-2020", "salinity from specific conductance at 25 °C", "",
            "US Geological Survey (2020) National Field Manual, Dissolved oxygen, Techniques and Methods 9-A6.2", "10.3133/tm9A6.2",
            "0 to " + CatalogueText.Number(SpecificConductance.HighestMicrosiemensPerCentimetre) + " µS/cm", "not stated",
            Places(3, "1242 cells of the manual's factor table, read, come out"), "field water whose ions are not known"),
        new("us-standard-atmosphere-1976", "pressure from altitude", "hPa",
            "US Standard Atmosphere, 1976; ISO 2533; ICAO Doc 7488", "",
            CatalogueText.Number(StandardAtmosphere.LowestAltitudeMetres) + " to " + CatalogueText.Number(StandardAtmosphere.HighestAltitudeMetres) + " m", "the weather moves the real pressure by ±3 % about it (from memory)",
            Places(3, "table values recalled from memory come out"), "in place of a barometer, second best"),
        new("tanaka-2001", "density of pure water at 1 atm", "kg/m³",
            "Tanaka, M., Girard, G., Davis, R., Peuto, A., Bignell, N. (2001) Recommended table for the density of water between 0 °C and 40 °C. Metrologia 38, 301–309", "10.1088/0026-1394/38/4/3",
            Between(DensityTanaka2001.LowestCelsius, DensityTanaka2001.HighestCelsius), "0.001 kg/m³ (second-hand)", Places(3, "output of a library comes out"), "pure water, where the density itself is wanted"),
        new("kell-1975", "density of pure water at 1 atm", "kg/m³",
            "Kell, G.S. (1975) Density, thermal expansivity, and compressibility of liquid water from 0° to 150 °C. J. Chem. Eng. Data 20, 97–105", "10.1021/je60064a005",
            Between(DensityKell1975.LowestCelsius, DensityKell1975.HighestCelsius), "not stated in hand", Places(3, "a published value, second-hand, comes out"), "above 40 °C, and for compatibility"),
        new("lewis-1980", "practical salinity from conductivity (PSS-78)", "",
            "Lewis, E.L. (1980) The Practical Salinity Scale 1978 and its antecedents. IEEE J. Oceanic Eng. OE-5, 3–8; UNESCO Tech. Pap. Mar. Sci. 44 (1983)", "10.1109/JOE.1980.1145448",
            Between(PracticalSalinity.LowestCelsius, PracticalSalinity.HighestCelsius) + ", " + Salinities(PracticalSalinity.HighestSalinity) + ", to " + CatalogueText.Number(PracticalSalinity.HighestSeaPressureDecibar) + " dbar",
            "0.002–0.003 (from memory)", Places(3, "its published check values, read, come out"), "salinity of sea water and its dilutions", "pss-78"),
        new("hill-1986", "practical salinity below 2", "",
            "Hill, K.D., Dauphinee, T.M., Woods, D.J. (1986) The extension of the Practical Salinity Scale 1978 to low salinities. IEEE J. Oceanic Eng. OE-11, 109–112", "10.1109/JOE.1986.1145154",
            "S 0 to 2", "not stated in hand", Memory("agrees with gsw"), "sea water diluted below S 2; inland waters have other ions"),
        new("wooster-1969", "salinity from chlorinity", "",
            "Wooster, W.S., Lee, A.J., Dietrich, G. (1969) Redefinition of salinity. Deep-Sea Res. 16, 321–322", "",
            "0 to " + Chlorinity.HighestGramsPerKilogram.ToString("0.##", CultureInfo.InvariantCulture) + " g/kg", "by definition, for sea salt", Memory(NoValue), "where a chlorinity is given"),
        new("iso-7888-1985", "specific conductance at 25 °C of natural water", "µS/cm",
            "ISO 7888:1985 (EN 27888:1993), table of factors, here as a polynomial of ln f25", "",
            Between(ConductivityCompensation.LowestCelsius, ConductivityCompensation.HighestNaturalCelsius), "about 1 % (from memory)", Memory("the recalled factors come out within a third of their last digit"), "conductivity of lakes and rivers"),
        new("standard-methods-2510", "specific conductance at 25 °C, linear", "µS/cm",
            "Standard Methods for the Examination of Water and Wastewater, 2510 B: 1.91 % per K", "",
            Between(ConductivityCompensation.LowestCelsius, ConductivityCompensation.HighestLinearCelsius), "1–2 % far from 25 °C (from memory)", Memory(NoValue), "as meters without a table compute it"),
        new("weisenberger-schumpe-1996", "salting-out by ions", "",
            "Weisenberger, S., Schumpe, A. (1996) Estimation of gas solubilities in salt solutions at temperatures from 273 K to 363 K. AIChE J. 42(1), 298–300", "10.1002/aic.690420130",
            Between(SaltingOutWeisenbergerSchumpe1996.LowestCelsius, SaltingOutWeisenbergerSchumpe1996.HighestCelsius) + ", to " + CatalogueText.Number(SaltingOutWeisenbergerSchumpe1996.HighestMolesPerLitre) + " mol/L",
            "0.026 L/mol in the constant of a salt (from memory)", Places(2, NoValue + "; sea salt of S 35 within 1.3 % of the sea-water equation of oxygen"), "brines that are not sea salt"),
        new("colt-1984", "total dissolved gas", "",
            "Colt, J. (1984) Computation of dissolved gas concentrations in water as functions of temperature, salinity, and pressure. Am. Fish. Soc. Spec. Publ. 14; Standard Methods 2810 B", "",
            "that of the oxygen equation", "as good as ΔP", Memory("a value recalled from memory comes out"), "ΔP, total gas pressure, nitrogen with argon"),
        new("wmo-8", "station pressure from a sea-level pressure", "hPa",
            "WMO-No. 8, Guide to Instruments and Methods of Observation, reduction of pressure to sea level", "",
            CatalogueText.Number(StandardAtmosphere.LowestAltitudeMetres) + " to " + CatalogueText.Number(StandardAtmosphere.HighestAltitudeMetres) + " m", "0.2 % at 1000 m, 0.4 % at 2000 m (our choice)", Memory(NoValue), "where only a weather service's pressure is known; second best"),
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
