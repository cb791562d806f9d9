using System;

namespace ProbeCal.Nano.Tests.Interpreter;

/// <summary>
/// Where the device's interpreter computes otherwise than the standard says. With none of them the interpreter must give what
/// the desktop gives.
/// </summary>
[Flags]
public enum Deviations
{
    None = 0,

    /// <summary>A zero divisor throws a plain System.Exception, for doubles (-0.0 too) as for integers.</summary>
    ZeroDivisorThrows = 1,

    /// <summary>The order of two doubles is -1, 0 or +1, and +1 when either is NaN: so <c>NaN &gt; x</c> holds.</summary>
    NaNOrdersAsGreater = 2,

    /// <summary>Two infinities are equal, whatever their signs.</summary>
    InfinitiesCompareEqual = 4,

    /// <summary>All static initialisers run at start-up in the order of the type names; one that throws leaves its fields as they are.</summary>
    EagerInitialisers = 8,

    /// <summary>A cast that changes only the sign is no instruction: the value stays unsigned for a later &gt;&gt;, % or widening.</summary>
    UnsignedSurvivesCasts = 16,

    /// <summary>
    /// A double outside the range of the integer it is cast to wraps on one device and saturates on another. No result is right
    /// for all, so the interpreter refuses.
    /// </summary>
    ConversionsOutOfRangeRefused = 32,

    /// <summary>Checked arithmetic wraps.</summary>
    CheckedNeverThrows = 64,

    /// <summary>The device.</summary>
    All = 127,
}
