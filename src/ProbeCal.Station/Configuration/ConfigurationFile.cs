using System;
using System.Globalization;
using System.IO;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Sources;

namespace ProbeCal.Station.Configuration;

/// <summary>Reads a station's configuration file and judges it as a whole.</summary>
public static class ConfigurationFile
{
    /// <summary>No configuration is longer, bytes; a wrong file may be.</summary>
    private const int LongestFile = 1_000_000;

    private const int UsualKeepDays = 400;
    private const int UsualRejectedLines = 10_000;

    /// <summary>A probe that may lose its whole reading in a day tells nothing (our choice, no source).</summary>
    private const double HighestPercentPerDay = 100;
    private const int UsualBrokerPort = 1883;

    /// <summary>Reads a file.</summary>
    /// <param name="path">The file. Paths in it are relative to its folder.</param>
    /// <exception cref="InputException">It cannot be read, is from a newer version, or something in it is wrong: one line with place, value and what would be right.</exception>
    public static StationConfiguration Read(string path)
    {
        try
        {
            FileInfo file = new(path);
            if (LongestFile < file.Length)
            {
                throw new InputException($"--config {path}: the file is too long for a configuration; name the right one");
            }

            return Parse(path, File.ReadAllBytes(path), file.DirectoryName!);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or ArgumentException)
        {
            throw new InputException($"--config {Wrong.Shown(path)}: {Wrong.OneLine(fault.Message)}", fault);
        }
    }

    /// <summary>Reads the content of a file.</summary>
    /// <param name="name">What the file is called in messages.</param>
    /// <param name="bytes">Its content.</param>
    /// <param name="folder">Where paths in it begin.</param>
    /// <exception cref="InputException">Something in it is wrong.</exception>
    public static StationConfiguration Parse(string name, ReadOnlySpan<byte> bytes, string folder)
    {
        ConfigurationNode root = ConfigurationNode.Parse(name, bytes);
        CheckFormat(root);
        root.AllowKeys(ConfigurationKeys.Root);
        ConfigurationNode? site = Section(root, "site");
        LineTemplate line = Line(root);
        double? altitude = Altitude(site);
        StationConfiguration configuration = new()
        {
            Station = Id(root, "station", "\"north-pier\""),
            SiteName = site?.Find("name")?.AsText() ?? "",
            AltitudeMetres = altitude,
            Probe = Id(root, "probe", "\"do-1\""),
            Source = Source(root),
            Line = line,
            Simulated = root.Find("simulated")?.AsFlag() ?? false,
            SignalUncertainty = SignalUncertainty(root),
            Thermometer = Thermometer(root),
            Pressure = InputSections.Pressure(SectionOf(root, "pressure", "{ \"source\": \"line\" }"), line, altitude),
            Salinity = InputSections.Salinity(SectionOf(root, "salinity", "{ \"source\": \"survey of May\", \"value\": \"0.2\" }"), line),
            Stirring = StirringOf(root),
            Drift = Rate(root, "drift"),
            Fouling = Rate(root, "fouling"),
            Calibration = Calibration(root),
            Equation = root.Find("equation") is { } equation ? EquationNames.Parse(equation.What, equation.AsText()) : EquationNames.Default,
            Broker = BrokerSection.Read(Section(root, "broker"), folder),
            EmbeddedBrokerPort = (int)(Section(root, "embeddedBroker")?.Find("port")?.AsWhole(1, 65535) ?? UsualBrokerPort),
            KeepFor = Duration(Section(root, "journal"), "keep") ?? TimeSpan.FromDays(UsualKeepDays),
            RejectedLinesKept = (int)(Section(root, "journal")?.Find("rejectedLines")?.AsWhole(0, 1_000_000) ?? UsualRejectedLines),
            GapAfter = Duration(root, "gapAfter"),
        };
        RefuseTwoBrokers(root);
        return configuration;
    }

    /// <summary>A positive quantity that is a standard uncertainty, or null when it is not given.</summary>
    internal static double? Uncertainty(ConfigurationNode? section, string key, QuantityKind kind)
    {
        double? value = Find(section, key, kind);
        return value is null or >= 0 ? value : throw new InputException(section!.Find(key)!.What + " " + section.Find(key)!.Text + ": an uncertainty is not negative");
    }

    internal static double? Find(ConfigurationNode? section, string key, QuantityKind kind)
    {
        return section?.Find(key) is { } node ? Quantity.Parse(kind, node.What, node.AsQuantity()) : null;
    }

    private static void CheckFormat(ConfigurationNode root)
    {
        ConfigurationNode format = root.Require("format", "\"" + ConfigurationKeys.Format + "\"");
        if (format.AsText() != ConfigurationKeys.Format)
        {
            throw Wrong.Input(format.What, format.Text, "this is no station configuration, whose format is \"" + ConfigurationKeys.Format + "\"");
        }

        ConfigurationNode version = root.Require("version", ConfigurationKeys.Version.ToString(CultureInfo.InvariantCulture));
        if (ConfigurationKeys.Version < version.AsWhole(1, int.MaxValue))
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{version.What} {version.Text}: this program knows up to version {ConfigurationKeys.Version}; use the newer program, nothing was changed"));
        }
    }

    /// <summary>A section, with its keys checked, or null.</summary>
    private static ConfigurationNode? Section(ConfigurationNode root, string name)
    {
        ConfigurationNode? section = root.Find(name);
        section?.AllowKeys(ConfigurationKeys.Sections[name]);
        return section;
    }

    private static ConfigurationNode SectionOf(ConfigurationNode root, string name, string example)
    {
        ConfigurationNode section = root.Require(name, example);
        section.AllowKeys(ConfigurationKeys.Sections[name]);
        return section;
    }

    /// <summary>An id that may be a part of a topic, a file name and a key.</summary>
    private static string Id(ConfigurationNode root, string key, string example)
    {
        ConfigurationNode node = root.Require(key, example);
        return PlainText.Id(node.What, node.AsText());
    }

    private static SourceAddress Source(ConfigurationNode root)
    {
        ConfigurationNode node = root.Require("source", "\"serial:/dev/ttyUSB0?baud=9600\"");
        return SourceAddress.Parse(node.What, node.AsText());
    }

    private static double? Altitude(ConfigurationNode? site)
    {
        double? metres = Find(site, "altitude", QuantityKind.Altitude);
        return metres is null or (>= StandardAtmosphere.LowestAltitudeMetres and <= StandardAtmosphere.HighestAltitudeMetres)
            ? metres
            : throw Wrong.Input(site!.Find("altitude")!.What, site.Find("altitude")!.Text, "pressures are judged by the standard atmosphere, which is used from "
                + Number.Print(StandardAtmosphere.LowestAltitudeMetres) + " to " + Number.Print(StandardAtmosphere.HighestAltitudeMetres) + " m");
    }

    private static LineTemplate Line(ConfigurationNode root)
    {
        return root.Find("line") is { } node ? LineTemplate.Parse(node.What, node.AsText()) : LineTemplate.Parse("line", LineTemplate.UsualText);
    }

    private static double? SignalUncertainty(ConfigurationNode root)
    {
        if (root.Find("signalStandardUncertainty") is not { } node)
        {
            return null;
        }

        // The signal's unit is a label that belongs to the line, so the bare number is in it.
        double value = Number.Parse(node.What, node.AsQuantity());
        return 0 <= value ? value : throw Wrong.Input(node.What, node.Text, "an uncertainty is not negative");
    }

    private static RateConfiguration? Rate(ConfigurationNode root, string name)
    {
        if (Section(root, name) is not { } section)
        {
            return null;
        }

        ConfigurationNode rate = section.Require("perDay", "\"0.05 %\"");
        ConfigurationNode source = section.Require("source", "\"post-deployment checks of 2025\"");
        double percent = Quantity.Parse(QuantityKind.Percent, rate.What, rate.AsQuantity());
        return percent is >= 0 and <= HighestPercentPerDay
            ? new RateConfiguration(percent / 100, source.AsText())
            : throw Wrong.Input(rate.What, rate.Text, "a standard uncertainty per day lies between 0 % and " + Number.Print(HighestPercentPerDay) + " %, for example \"0.05 %\"");
    }

    private static ThermometerConfiguration Thermometer(ConfigurationNode root)
    {
        ConfigurationNode? section = Section(root, "thermometer");
        return new ThermometerConfiguration(
            section?.Find("id")?.AsText(),
            Uncertainty(section, "standardUncertainty", QuantityKind.TemperatureDifference) ?? UncertaintyDefaults.TemperatureKelvin,
            Uncertainty(section, "offsetStandardUncertainty", QuantityKind.TemperatureDifference) ?? UncertaintyDefaults.ThermometerOffsetKelvin);
    }

    private static Stirring StirringOf(ConfigurationNode root)
    {
        ConfigurationNode node = root.Require("stirring", "\"stirred\"");
        string[] names = ["stirred", "still", "flow-insensitive"];
        return Array.IndexOf(names, node.AsText()) switch
        {
            0 => Stirring.Stirred,
            1 => Stirring.Still,
            2 => Stirring.FlowInsensitive,
            _ => throw Wrong.Input(node.What, node.Text, "this takes stirred, still or flow-insensitive" + NearestName.DidYouMean(node.Text, names)),
        };
    }

    private static CalibrationChoice Calibration(ConfigurationNode root)
    {
        return root.Find("calibration")?.AsText() switch
        {
            null or "latest" => new CalibrationChoice(false, null),
            "none" => new CalibrationChoice(true, null),
            string id => new CalibrationChoice(false, id),
        };
    }

    private static TimeSpan? Duration(ConfigurationNode? section, string key)
    {
        return section?.Find(key) is { } node ? Quantity.Duration(node.What, node.AsQuantity()) : null;
    }

    private static void RefuseTwoBrokers(ConfigurationNode root)
    {
        if (root.Find("broker") != null && root.Find("embeddedBroker") is { } embedded)
        {
            throw new InputException(embedded.What + ": broker names another one already; leave one of the two out");
        }
    }
}
