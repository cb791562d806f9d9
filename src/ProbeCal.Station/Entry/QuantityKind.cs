using System;
using System.Collections.Generic;

namespace ProbeCal.Station.Entry;

/// <summary>
/// What sort of quantity a text stands for: its units, the canonical unit that its value comes out in, and what a number
/// without a unit means, where that is safe to say. Unit names are told apart by case (mbar, Mbar); common other
/// spellings are listed one by one.
/// </summary>
public sealed class QuantityKind
{
    private readonly QuantityUnit[] _units;

    private QuantityKind(string name, string article, string example, QuantityUnit? bareUnit, params QuantityUnit[] units)
    {
        Name = name;
        Article = article;
        Example = example;
        BareUnit = bareUnit;
        _units = units;
    }

    /// <summary>
    /// Water temperature, canonical °C (ITS-90). A bare number is °C. Conversions are exact by definition
    /// (0 °C = 273.15 K; 1 °F = 5/9 K, 32 °F = 0 °C).
    /// </summary>
    public static QuantityKind Temperature { get; } = WithBare(
        "temperature", "a", "20C or 68F",
        new QuantityUnit("C", 1, 1, 0, "degC", "deg C", "°C", "° C", "ºC", "℃", "Cel", "c", "celsius", "Celsius"),
        new QuantityUnit("F", 5, 9, -32, "degF", "deg F", "°F", "° F", "ºF", "℉", "f", "fahrenheit", "Fahrenheit"),
        new QuantityUnit("K", 1, 1, -273.15, "kelvin", "Kelvin"));

    /// <summary>A difference of temperatures (a limit, an uncertainty), canonical K. The unit must be given.</summary>
    public static QuantityKind TemperatureDifference { get; } = WithUnit(
        "temperature difference", "a", "0.05C or 0.1F",
        new QuantityUnit("K", 1, 1, 0, "kelvin", "Kelvin"),
        new QuantityUnit("C", 1, 1, 0, "degC", "deg C", "°C", "° C", "ºC", "℃", "c"),
        new QuantityUnit("F", 5, 9, 0, "degF", "deg F", "°F", "° F", "ºF", "℉", "f"));

    /// <summary>
    /// Pressure, total or partial, absolute, canonical hPa. The unit must be given. The factors are those of
    /// <see cref="PressureUnits"/>: 1 mmHg = 1 Torr = 1013.25/760 hPa, so that 760 mmHg is one atmosphere exactly.
    /// </summary>
    public static QuantityKind Pressure { get; } = WithUnit(
        "pressure", "a", "760mmHg or 1013.25hPa",
        new QuantityUnit("hPa", 1, 1, 0, "hpa", "HPA", "hectopascal"),
        new QuantityUnit("mbar", 1, 1, 0, "millibar", "mb"),
        new QuantityUnit("kPa", PressureUnits.HectopascalPerKilopascal, 1, 0, "kpa", "KPA", "kilopascal"),
        new QuantityUnit("Pa", 1, 100, 0, "pascal"),
        new QuantityUnit("bar", PressureUnits.HectopascalPerBar, 1, 0),
        new QuantityUnit("atm", PressureUnits.HectopascalPerAtmosphere, 1, 0),
        new QuantityUnit("mmHg", PressureUnits.HectopascalPerAtmosphere, PressureUnits.MillimetresOfMercuryPerAtmosphere, 0, "mmhg", "mm Hg", "mmHG"),
        new QuantityUnit("Torr", PressureUnits.HectopascalPerAtmosphere, PressureUnits.MillimetresOfMercuryPerAtmosphere, 0, "torr"),
        new QuantityUnit("inHg", PressureUnits.HectopascalPerAtmosphere * PressureUnits.MillimetresPerInch, PressureUnits.MillimetresOfMercuryPerAtmosphere, 0, "inhg", "in Hg", "inHG"),
        new QuantityUnit("psi", PressureUnits.HectopascalPerPsi, 1, 0, "psia", "PSI"));

    /// <summary>Height above sea level, canonical m. The unit must be given: feet taken for metres cost 20 % at 1500 m.</summary>
    public static QuantityKind Altitude { get; } = WithUnit(
        "altitude", "an", "640m or 2100ft",
        new QuantityUnit("m", 1, 1, 0, "metre", "metres", "meter", "meters"),
        new QuantityUnit("ft", 0.3048, 1, 0, "foot", "feet"),
        new QuantityUnit("km", 1000, 1, 0));

    /// <summary>Depth below the surface, canonical m. The unit must be given.</summary>
    public static QuantityKind Depth { get; } = WithUnit(
        "depth", "a", "15m or 50ft",
        new QuantityUnit("m", 1, 1, 0, "metre", "metres", "meter", "meters"),
        new QuantityUnit("ft", 0.3048, 1, 0, "foot", "feet"));

    /// <summary>Practical salinity (PSS-78). It has no unit; the letters PSU are allowed because many write them.</summary>
    public static QuantityKind Salinity { get; } = WithBare(
        "practical salinity", "a", "35",
        new QuantityUnit("", 1, 1, 0, "PSU", "psu", "PSS-78"));

    /// <summary>Mass concentration, canonical mg/L. The unit must be given.</summary>
    public static QuantityKind MassConcentration { get; } = WithUnit(
        "concentration", "a", "8.3mg/L",
        new QuantityUnit("mg/L", 1, 1, 0, "mg/l", "g/m3", "g/m³"),
        new QuantityUnit("µg/L", 1, 1000, 0, "ug/L", "ug/l", "µg/l", "μg/L", "μg/l"),
        new QuantityUnit("g/L", 1000, 1, 0, "g/l", "kg/m3", "kg/m³"));

    /// <summary>Amount concentration, canonical µmol/L. The unit must be given.</summary>
    public static QuantityKind AmountConcentration { get; } = WithUnit(
        "concentration", "a", "280umol/L",
        new QuantityUnit("µmol/L", 1, 1, 0, "umol/L", "umol/l", "µmol/l", "μmol/L", "μmol/l", "mmol/m3", "mmol/m³"),
        new QuantityUnit("nmol/L", 1, 1000, 0, "nmol/l"),
        new QuantityUnit("pmol/L", 1, 1e6, 0, "pmol/l"),
        new QuantityUnit("mmol/L", 1000, 1, 0, "mmol/l"),
        new QuantityUnit("mol/L", 1e6, 1, 0, "mol/l"));

    /// <summary>Amount per kilogram of water, canonical µmol/kg. The unit must be given.</summary>
    public static QuantityKind AmountPerKilogram { get; } = WithUnit(
        "concentration", "a", "280umol/kg",
        new QuantityUnit("µmol/kg", 1, 1, 0, "umol/kg", "μmol/kg"),
        new QuantityUnit("nmol/kg", 1, 1000, 0),
        new QuantityUnit("pmol/kg", 1, 1e6, 0),
        new QuantityUnit("mmol/kg", 1000, 1, 0),
        new QuantityUnit("mol/kg", 1e6, 1, 0));

    /// <summary>Volume of the gas (0 °C, 1 atm) per litre of water, canonical mL/L. The unit must be given.</summary>
    public static QuantityKind VolumeConcentration { get; } = WithUnit(
        "concentration", "a", "6.3mL/L",
        new QuantityUnit("mL/L", 1, 1, 0, "ml/L", "ml/l", "cm3/dm3"),
        new QuantityUnit("µL/L", 1, 1000, 0, "uL/L", "ul/L", "ul/l", "μL/L"));

    /// <summary>Mole fraction, canonical mol/mol. A bare number is the fraction itself: 0.21. Parts per trillion are written pmol/mol, for ppt also means parts per thousand.</summary>
    public static QuantityKind MoleFraction { get; } = WithBare(
        "mole fraction", "a", "420ppm or 21%",
        new QuantityUnit("", 1, 1, 0, "mol/mol"),
        new QuantityUnit("%", 1, 100, 0, "percent"),
        new QuantityUnit("ppm", 1, 1e6, 0, "umol/mol", "µmol/mol", "μmol/mol"),
        new QuantityUnit("ppb", 1, 1e9, 0, "nmol/mol"),
        new QuantityUnit("pmol/mol", 1, 1e12, 0));

    /// <summary>Electrical conductivity, canonical mS/cm. The unit must be given: mS and µS differ a thousandfold.</summary>
    public static QuantityKind Conductivity { get; } = WithUnit(
        "conductivity", "a", "42mS/cm or 500uS/cm",
        new QuantityUnit("mS/cm", 1, 1, 0, "ms/cm", "dS/m"),
        new QuantityUnit("µS/cm", 1, 1000, 0, "uS/cm", "us/cm", "μS/cm"),
        new QuantityUnit("mS/m", 1, 100, 0),
        new QuantityUnit("S/m", 10, 1, 0));

    /// <summary>Chlorinity, canonical g/kg. A bare number is g/kg.</summary>
    public static QuantityKind Chlorinity { get; } = WithBare(
        "chlorinity", "a", "19.4",
        new QuantityUnit("g/kg", 1, 1, 0, "‰"));

    /// <summary>A share in percent, canonical %. The sign must be given, or else 1.5 could mean 150 %.</summary>
    public static QuantityKind Percent { get; } = WithUnit(
        "share", "a", "1.5%",
        new QuantityUnit("%", 1, 1, 0, "percent"));

    /// <summary>A share of saturation at the local pressure, canonical %. The convention must be given.</summary>
    internal static QuantityKind PercentLocal { get; } = WithUnit(
        "share of local saturation", "a", "98.2%local",
        new QuantityUnit("%local", 1, 1, 0));

    /// <summary>A share of saturation at one atmosphere, canonical %. The convention must be given.</summary>
    internal static QuantityKind PercentOneAtmosphere { get; } = WithUnit(
        "share of saturation at one atmosphere", "a", "92.1%1atm",
        new QuantityUnit("%1atm", 1, 1, 0));

    /// <summary>Volume of glassware, canonical mL. The unit must be given.</summary>
    internal static QuantityKind Volume { get; } = WithUnit(
        "volume", "a", "8.02mL",
        new QuantityUnit("mL", 1, 1, 0, "ml", "cm3", "cm³"),
        new QuantityUnit("µL", 1, 1000, 0, "uL", "ul", "μL"),
        new QuantityUnit("L", 1000, 1, 0, "l"));

    /// <summary>Concentration of a titrant or its standard in equivalents of electrons, canonical mol/L. The unit must be given; N is the same.</summary>
    internal static QuantityKind TitrantConcentration { get; } = WithUnit(
        "concentration", "a", "0.025mol/L",
        new QuantityUnit("mol/L", 1, 1, 0, "mol/l", "M", "N", "eq/L"),
        new QuantityUnit("mmol/L", 1, 1000, 0, "mmol/l", "mM", "mN", "meq/L"));

    /// <summary>A small mass, canonical mg. The unit must be given.</summary>
    internal static QuantityKind Mass { get; } = WithUnit(
        "mass", "a", "0.0024mg",
        new QuantityUnit("mg", 1, 1, 0),
        new QuantityUnit("µg", 1, 1000, 0, "ug", "μg"),
        new QuantityUnit("g", 1000, 1, 0));

    /// <summary>Duration, canonical s. The unit must be given; <c>m</c> alone is refused, for it also means metres.</summary>
    public static QuantityKind Duration { get; } = WithUnit(
        "duration", "a", "3min or 180s",
        new QuantityUnit("s", 1, 1, 0, "sec", "second", "seconds"),
        new QuantityUnit("ms", 1, 1000, 0),
        new QuantityUnit("min", 60, 1, 0, "minute", "minutes"),
        new QuantityUnit("h", 3600, 1, 0, "hour", "hours"),
        new QuantityUnit("d", 86400, 1, 0, "day", "days"));

    /// <summary>How often something happens, canonical Hz. The unit must be given.</summary>
    public static QuantityKind Frequency { get; } = WithUnit(
        "rate", "a", "1Hz or 6/min",
        new QuantityUnit("Hz", 1, 1, 0, "hz", "/s"),
        new QuantityUnit("mHz", 1, 1000, 0),
        new QuantityUnit("kHz", 1000, 1, 0),
        new QuantityUnit("/min", 1, 60, 0),
        new QuantityUnit("/h", 1, 3600, 0));

    /// <summary>What it is called in a message.</summary>
    public string Name { get; }

    /// <summary>The units, the canonical one first.</summary>
    public IReadOnlyList<QuantityUnit> Units => _units;

    /// <summary>The unit that values come out in.</summary>
    public QuantityUnit CanonicalUnit => _units[0];

    /// <summary>What a number without a unit is taken in; null when that is refused.</summary>
    public QuantityUnit? BareUnit { get; }

    internal string Article { get; }

    internal string Example { get; }

    /// <summary>The unit of that name, or null.</summary>
    public QuantityUnit? Unit(ReadOnlySpan<char> name)
    {
        foreach (QuantityUnit unit in _units)
        {
            if (unit.IsCalled(name))
            {
                return unit;
            }
        }

        return null;
    }

    /// <summary>The printed names of the units in one list, for messages.</summary>
    internal string UnitList()
    {
        List<string> names = [];
        foreach (QuantityUnit unit in _units)
        {
            if (unit.Name.Length != 0)
            {
                names.Add(unit.Name);
            }
        }

        return string.Join(", ", names);
    }

    /// <summary>Every spelling of every unit, for the search of the nearest.</summary>
    internal IEnumerable<string> Spellings()
    {
        foreach (QuantityUnit unit in _units)
        {
            if (unit.Name.Length != 0)
            {
                yield return unit.Name;
            }
        }

        foreach (QuantityUnit unit in _units)
        {
            foreach (string other in unit.OtherNames)
            {
                yield return other;
            }
        }
    }

    private static QuantityKind WithUnit(string name, string article, string example, params QuantityUnit[] units)
    {
        return new QuantityKind(name, article, example, null, units);
    }

    private static QuantityKind WithBare(string name, string article, string example, params QuantityUnit[] units)
    {
        return new QuantityKind(name, article, example, units[0], units);
    }
}
