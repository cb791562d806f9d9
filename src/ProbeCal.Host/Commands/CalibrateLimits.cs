using System.CommandLine;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>From options to the limits that a calibration is judged by, and to what counts as steady.</summary>
internal sealed class CalibrateLimits
{
    private const double LongestWaitSeconds = 7 * 86_400;

    private readonly CalibrateOptions _options;
    private readonly OptionReader _reader;

    internal CalibrateLimits(CalibrateOptions options, OptionReader reader)
    {
        _options = options;
        _reader = reader;
    }

    /// <summary>The limits that decide.</summary>
    /// <param name="inHectopascal">True where the published limits, which are those of dissolved oxygen, do not apply.</param>
    internal CalibrationLimits Limits(bool inHectopascal)
    {
        double? absolute = ErrorLimit(_options.Limit, inHectopascal);
        double? percent = _reader.NotNegative(_options.LimitPercent, QuantityKind.Percent);
        double? zero = ErrorLimit(_options.ZeroLimit, inHectopascal);
        (double Low, double High)? window = _reader.Range(_options.SlopeWindow);
        (double Low, double High)? zeroWindow = _reader.Range(_options.ZeroWindow);
        bool entered = absolute != null || percent != null;
        CalibrationLimits limits = new()
        {
            GuardBand = _reader.IsSet(_options.GuardBand),
            SlopeLow = window?.Low,
            SlopeHigh = window?.High,
            ZeroSignalLow = zeroWindow?.Low,
            ZeroSignalHigh = zeroWindow?.High,
        };
        return inHectopascal ? limits with { Pressure = new PressureLimits { Hectopascal = absolute, Percent = percent, ZeroHectopascal = zero } } : limits with
        {
            // Whoever enters one of the two means it: the other published one would soften it.
            SaturationMilligramsPerLitre = absolute ?? (entered ? 0 : AcceptanceLimit.SaturationMilligramsPerLitre),
            SaturationPercent = percent ?? (entered ? 0 : AcceptanceLimit.SaturationPercent),
            SaturationSource = entered ? CalibrationLimits.Entered : CalibrationLimits.FieldManual,
            ZeroMilligramsPerLitre = zero ?? AcceptanceLimit.ZeroMilligramsPerLitre,
            ZeroSource = zero == null ? CalibrationLimits.FieldManual : CalibrationLimits.Entered,
        };
    }

    private double? ErrorLimit(Option<string> option, bool inHectopascal)
    {
        QuantityKind kind = inHectopascal ? QuantityKind.Pressure : QuantityKind.MassConcentration;
        return _reader.Given(option) is string given && !Quantity.TryParse(kind, given, out _, out string? problem)
            ? throw Wrong.Input(option.Name, given, inHectopascal
                ? "errors of this gas are judged as a pressure; write for example 5hPa"
                : $"{problem}; errors of dissolved oxygen are judged in mg/L")
            : _reader.NotNegative(option, kind);
    }

    /// <summary>When a window counts as steady, by default within a quarter of the limit, and how long a step may take.</summary>
    /// <exception cref="InputException">The window does not fit into the wait.</exception>
    internal WaitingRules Waiting(CalibrationLimits limits)
    {
        WaitingRules usual = new();
        WaitingRules waiting = new()
        {
            WindowSeconds = _reader.Given(_options.Window) is string window ? Quantity.Duration("--window", window).TotalSeconds : usual.WindowSeconds,
            LeastCount = _reader.Given(_options.Samples) is string samples ? (int)Number.ParseWhole("--samples", samples, 3, 1_000_000) : usual.LeastCount,
            MilligramsPerLitre = _reader.AboveZero(_options.StableWithin, QuantityKind.MassConcentration) ?? QuarterOf(limits) ?? usual.MilligramsPerLitre,
            Kelvin = _reader.AboveZero(_options.StableTemperature, QuantityKind.TemperatureDifference) ?? usual.Kelvin,
            GiveUpAfterSeconds = _reader.Given(_options.GiveUpAfter) is string longest ? Quantity.Duration("--give-up-after", longest).TotalSeconds : usual.GiveUpAfterSeconds,
        };
        if (LongestWaitSeconds < waiting.GiveUpAfterSeconds)
        {
            throw Wrong.Input("--give-up-after", _reader.Given(_options.GiveUpAfter)!, "a point is waited for 7d at most");
        }

        return waiting.WindowSeconds < waiting.GiveUpAfterSeconds
            ? waiting
            : throw new InputException($"--window {Number.Print(waiting.WindowSeconds)} s does not fit into --give-up-after {Number.Print(waiting.GiveUpAfterSeconds)} s; make the wait longer than the window");
    }

    /// <summary>What may move follows the limit that the point is judged by; null where none in mg/L decides.</summary>
    private static double? QuarterOf(CalibrationLimits limits)
    {
        return limits.Pressure == null && 0 < limits.SaturationMilligramsPerLitre ? limits.SaturationMilligramsPerLitre / 4 : null;
    }
}
