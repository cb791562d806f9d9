using System;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Sources;

namespace ProbeCal.Station.Configuration;

/// <summary>The sections "pressure" and "salinity": with the line, or fixed, or not at all; never without a source.</summary>
internal static class InputSections
{
    private const string Line = "line";
    private const string None = "none";

    internal static InputConfiguration Pressure(ConfigurationNode section, LineTemplate line, double? altitudeMetres)
    {
        ConfigurationNode source = section.Require("source", "\"line\"");
        string text = source.AsText();
        double? uncertainty = ConfigurationFile.Uncertainty(section, "standardUncertainty", QuantityKind.Pressure);
        if (text == Line || text.StartsWith(Line + ":", StringComparison.Ordinal))
        {
            RequireInLine(section, source, line.HasPressure, "{pressure}");
            return new InputConfiguration(true, null, text, uncertainty ?? UncertaintyDefaults.BarometerHectopascal);
        }

        RefuseInLine(source, line.HasPressure, "{pressure}");
        if (text == None)
        {
            RefuseValue(section);
            return new InputConfiguration(false, null, None, 0);
        }

        PressureSource from = PressureSource.Parse(source.What, text);
        double value = from.IsAltitudeOnly ? AtAltitude(section, source, altitudeMetres) : Typed(section, altitudeMetres);
        if (from.IsAltitudeOnly && uncertainty < UncertaintyDefaults.AltitudeOnlyHectopascal)
        {
            ConfigurationNode node = section.Find("standardUncertainty")!;
            throw Wrong.Input(node.What, node.Text, "an altitude alone tells the pressure no better than to 10 hPa; write 10 hPa or more, or name a barometer");
        }

        // A value typed once does not follow the weather, whatever it was read from.
        return new InputConfiguration(false, value, from.Text, uncertainty ?? UncertaintyDefaults.AltitudeOnlyHectopascal);
    }

    internal static InputConfiguration Salinity(ConfigurationNode section, LineTemplate line)
    {
        ConfigurationNode source = section.Require("source", "\"line\"");
        string text = source.AsText();
        double uncertainty = ConfigurationFile.Uncertainty(section, "standardUncertainty", QuantityKind.Salinity) ?? UncertaintyDefaults.Salinity;
        if (text == Line)
        {
            RequireInLine(section, source, line.HasSalinity, "{salinity}");
            return new InputConfiguration(true, null, text, uncertainty);
        }

        RefuseInLine(source, line.HasSalinity, "{salinity}");
        if (text == None)
        {
            RefuseValue(section);
            return new InputConfiguration(false, null, None, 0);
        }

        ConfigurationNode value = section.Require("value", "\"0.2\"");
        double salinity = Quantity.Salinity(value.What, value.AsQuantity());
        if (salinity < 0 || GarciaGordon1992.HighestSalinity < salinity)
        {
            throw Wrong.Input(value.What, value.Text, "practical salinity lies between 0 and " + Number.Print(GarciaGordon1992.HighestSalinity));
        }

        return new InputConfiguration(false, salinity, text, uncertainty);
    }

    private static double Typed(ConfigurationNode section, double? altitudeMetres)
    {
        ConfigurationNode node = section.Require("value", "\"1002.3 hPa\"");
        double pressure = Quantity.PressureHectopascal(node.What, node.AsQuantity());
        if (altitudeMetres is not { } metres)
        {
            return pressure is >= BensonKrause1984.LowestHectopascal and <= BensonKrause1984.HighestHectopascal
                ? pressure
                : throw Wrong.Input(node.What, node.Text, "no air pressure that the equations take; check the unit");
        }

        Status status = PressurePlausibility.Judge(pressure, metres, out PressureVerdict verdict, out double seaLevel);
        return status == Status.Ok && verdict is not (PressureVerdict.RefusedHigh or PressureVerdict.RefusedLow)
            ? pressure
            : throw Wrong.Input(node.What, node.Text, "impossible at " + Number.Print(metres) + " m: it would be " + Number.Fixed(seaLevel, 0) + " hPa at sea level; the absolute pressure at the station belongs here, not one reduced to sea level");
    }

    private static double AtAltitude(ConfigurationNode section, ConfigurationNode source, double? altitudeMetres)
    {
        RefuseValue(section);
        if (altitudeMetres is not { } metres)
        {
            throw Wrong.Input(source.What, source.Text, "site.altitude is missing; write for example \"altitude\": \"640 m\" there");
        }

        Status status = StandardAtmosphere.Pressure(metres, out double pressure);
        return status == Status.Ok ? pressure : throw Wrong.Input(source.What, source.Text, Number.Print(metres) + " m is outside the standard atmosphere");
    }

    private static void RequireInLine(ConfigurationNode section, ConfigurationNode source, bool has, string field)
    {
        if (!has)
        {
            throw Wrong.Input(source.What, source.Text, "the line template has no " + field + "; add it there, or give a value and where it comes from");
        }

        RefuseValue(section);
    }

    private static void RefuseInLine(ConfigurationNode source, bool has, string field)
    {
        if (has)
        {
            throw Wrong.Input(source.What, source.Text, "the line carries " + field + " too; write \"line\" here, or skip that field in the template with {}");
        }
    }

    private static void RefuseValue(ConfigurationNode section)
    {
        if (section.Find("value") is { } value)
        {
            throw Wrong.Input(value.What, value.Text, "no value belongs here with this source; leave it out");
        }
    }
}
