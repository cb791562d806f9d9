using System.Collections.Generic;

namespace ProbeCal.Nano.Tests.Gate;

/// <summary>What Core may use of the device's mscorlib, each with the reason why it is safe there.</summary>
internal static class AllowedMembers
{
    /// <summary>Types that may stand in a signature, a local, a base or an allocation.</summary>
    public static readonly IReadOnlyDictionary<string, string> Types = new Dictionary<string, string>
    {
        ["System.Void"] = "no value",
        ["System.Boolean"] = "an integer on the device",
        ["System.Byte"] = "an integer on the device",
        ["System.Int32"] = "the device's own integer",
        ["System.UInt32"] = "as long as it is never cast to a signed type (rule sign-cast)",
        ["System.Int64"] = "exact on the device",
        ["System.UInt64"] = "as long as it is never cast to a signed type (rule sign-cast)",
        ["System.Double"] = "IEEE double in + - * /, apart from what the other rules refuse",
        ["System.Object"] = "base of every class",
        ["System.Array"] = "base of every array",
        ["System.Enum"] = "base of every enumeration",
        ["System.ValueType"] = "base of every enumeration",
        ["System.Attribute"] = "base of the attributes that the compiler adds",
    };

    /// <summary>Methods and constructors that may be called.</summary>
    public static readonly IReadOnlyDictionary<string, string> Members = new Dictionary<string, string>
    {
        ["System.Object::.ctor()"] = "every class calls it",
        ["System.Attribute::.ctor()"] = "the attributes that the compiler adds call it",
        ["System.Double::IsNaN(System.Double)"] = "right on the device",
        ["System.Double::IsInfinity(System.Double)"] = "right on the device, unlike a comparison of infinities",
        ["System.Double::IsPositiveInfinity(System.Double)"] = "right on the device, unlike a comparison of infinities",
        ["System.Double::IsNegativeInfinity(System.Double)"] = "right on the device, unlike a comparison of infinities",
        ["System.BitConverter::DoubleToInt64Bits(System.Double)"] = "exact on the device",
        ["System.BitConverter::Int64BitsToDouble(System.Int64)"] = "exact on the device",
        ["System.Runtime.CompilerServices.RuntimeHelpers::InitializeArray(System.Array,System.RuntimeFieldHandle)"] = "static array initialisers work on the device",
    };
}
