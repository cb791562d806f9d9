using System;

namespace ProbeCal;

/// <summary>What still keeps a window from being accepted; several may hold at once. Zero is a stable window.</summary>
[Flags]
public enum StabilityFinding
{
    /// <summary>Nothing: the window may be accepted.</summary>
    Stable = 0,
    /// <summary>Fewer samples than the criterion asks for.</summary>
    TooFewSamples = 0x0001,
    /// <summary>The samples do not span the window yet.</summary>
    WindowTooShort = 0x0002,
    /// <summary>The signal's trend over the window is not below its limit.</summary>
    SignalDrifts = 0x0004,
    /// <summary>The signal scatters more than its limit.</summary>
    SignalScatters = 0x0008,
    /// <summary>The signal's trend is not known well enough: its standard error over the window is not below the limit.</summary>
    SignalTrendUncertain = 0x0010,
    /// <summary>The temperature's trend over the window is not below its limit.</summary>
    TemperatureDrifts = 0x0020,
    /// <summary>The temperature scatters more than its limit.</summary>
    TemperatureScatters = 0x0040,
    /// <summary>The temperature's trend is not known well enough.</summary>
    TemperatureTrendUncertain = 0x0080,
    /// <summary>Refused: the signal moves less than the converter's resolution. A disconnected input is perfectly stable.</summary>
    SignalDead = 0x0100,
    /// <summary>Refused: the signal touches an end of the converter's range.</summary>
    SignalSaturated = 0x0200,
    /// <summary>Refused: a sample or time is NaN or infinite, times do not rise, or the limits cannot be expressed in the signal's unit.</summary>
    Unusable = 0x0400,
}
