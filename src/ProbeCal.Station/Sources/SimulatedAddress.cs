using System;
using System.Collections.Generic;
using System.Globalization;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Simulation;

namespace ProbeCal.Station.Sources;

/// <summary>A simulated probe in simulated water.</summary>
public sealed record SimulatedAddress(SimulationSettings Settings) : SourceAddress
{
    private static readonly string[] Keys = ["seed", "rate", "faster", "temperature", "salinity", "pressure", "phase"];

    /// <inheritdoc/>
    public override string ToString()
    {
        return string.Create(CultureInfo.InvariantCulture, $"simulated?seed={Settings.Seed}&rate={Number.Print(1 / Settings.Interval.TotalSeconds)}Hz&faster={Number.Print(Settings.Faster)}")
            + $"&temperature={Number.Print(Settings.TemperatureCelsius)}C&salinity={Number.Print(Settings.Salinity)}"
            + $"&pressure={Number.Print(Settings.PressureHectopascal)}hPa&phase={SimulationScript.Print(Settings.Script)}";
    }

    internal static SimulatedAddress From(AddressOptions options)
    {
        options.Allow(Keys);
        SimulationSettings usual = new();
        double hertz = options.Quantity(QuantityKind.Frequency, "rate", 1 / usual.Interval.TotalSeconds);
        IReadOnlyList<SimulationStep> script = options.Text("phase") is string text
            ? SimulationScript.Parse(options.Name("phase"), text)
            : usual.Script;
        SimulationSettings settings = usual with
        {
            Seed = (int)options.Whole("seed", usual.Seed, 0, int.MaxValue),
            Interval = SimulationSettings.IntervalOf(options.Name("rate"), hertz),
            Faster = options.Number("faster", usual.Faster, 0, 1e6),
            TemperatureCelsius = options.Quantity(QuantityKind.Temperature, "temperature", usual.TemperatureCelsius),
            Salinity = options.Quantity(QuantityKind.Salinity, "salinity", usual.Salinity),
            PressureHectopascal = options.Quantity(QuantityKind.Pressure, "pressure", usual.PressureHectopascal),
            Script = script,
        };
        return new SimulatedAddress(settings.Checked(options.What));
    }
}
