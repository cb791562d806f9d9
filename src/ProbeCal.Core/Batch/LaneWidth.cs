using System.Runtime.Intrinsics;

namespace ProbeCal;

/// <summary>How many bits of doubles a batch takes in one step.</summary>
internal enum LaneWidth
{
    /// <summary>One value at a time.</summary>
    Scalar = 64,
    /// <summary>Two values.</summary>
    Bits128 = 128,
    /// <summary>Four values.</summary>
    Bits256 = 256,
    /// <summary>Eight values.</summary>
    Bits512 = 512,
}

/// <summary>What this machine has.</summary>
internal static class LaneWidths
{
    /// <summary>The widest that the machine computes with in hardware.</summary>
    internal static LaneWidth Widest =>
        Vector512.IsHardwareAccelerated ? LaneWidth.Bits512
        : Vector256.IsHardwareAccelerated ? LaneWidth.Bits256
        : Vector128.IsHardwareAccelerated ? LaneWidth.Bits128
        : LaneWidth.Scalar;
}
