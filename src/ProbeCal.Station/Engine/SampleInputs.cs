using ProbeCal.Station.Configuration;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Journal;

namespace ProbeCal.Station.Engine;

/// <summary>What one sample is corrected with: from the line, from the configuration, or missing; and what is wrong with it.</summary>
internal sealed class SampleInputs
{
    private const string Line = "line";
    private const string None = "none";

    internal required SourcedValue Temperature { get; init; }

    internal required SourcedValue Pressure { get; init; }

    internal required SourcedValue Salinity { get; init; }

    /// <summary>What the altitude says about the pressure; a pass when there is nothing to say.</summary>
    internal required Judged PressureVerdict { get; init; }

    /// <summary>The pressure that Core may use: NaN when there is none or it cannot be true.</summary>
    internal double UsablePressure => PressureVerdict.Flag == Quality.Fail ? double.NaN : Pressure.Value ?? double.NaN;

    internal static SampleInputs Of(RawSample raw, StationConfiguration configuration)
    {
        SourcedValue pressure = Resolve(configuration.Pressure, raw.PressureHectopascal);
        return new SampleInputs
        {
            Temperature = new SourcedValue(raw.TemperatureCelsius, raw.TemperatureCelsius == null ? None : Line),
            Pressure = pressure,
            Salinity = Resolve(configuration.Salinity, raw.Salinity),
            PressureVerdict = Judge(pressure.Value, configuration.AltitudeMetres),
        };
    }

    private static SourcedValue Resolve(InputConfiguration input, double? fromLine)
    {
        return input.FromLine ? new SourcedValue(fromLine, input.Source) : new SourcedValue(input.Value, input.Source);
    }

    private static Judged Judge(double? pressure, double? altitudeMetres)
    {
        if (pressure is not { } hectopascal || altitudeMetres is not { } metres)
        {
            return Judged.Pass;
        }

        Status status = PressurePlausibility.Judge(hectopascal, metres, out PressureVerdict verdict, out double seaLevel);
        string would = " at " + Number.Print(metres) + " m: it would be " + Number.Fixed(seaLevel, 0) + " hPa at sea level";
        return verdict switch
        {
            _ when status != Status.Ok => new Judged(Quality.Fail, "the pressure is no air pressure"),
            ProbeCal.PressureVerdict.Plausible => Judged.Pass,
            ProbeCal.PressureVerdict.ConfirmHigh or ProbeCal.PressureVerdict.ConfirmLow => new Judged(Quality.Suspect, "the pressure is unusual" + would),
            _ => new Judged(Quality.Fail, "the pressure is impossible" + would),
        };
    }
}
