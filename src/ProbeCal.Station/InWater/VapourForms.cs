using System.Collections.Generic;

namespace ProbeCal.Station.InWater;

/// <summary>The published forms of the vapour pressure with their names, in the order in which they are told.</summary>
internal static class VapourForms
{
    /// <summary>Each form, its name by author and year, and whether it has a term for salt.</summary>
    internal static IReadOnlyList<(VapourEquation Equation, string Name, bool TakesSalt)> All { get; } =
    [
        (VapourEquation.WagnerPruss1993, "wagner-pruss-1993", false),
        (VapourEquation.Dickson2007, "dickson-2007", true),
        (VapourEquation.WeissPrice1980, "weiss-price-1980", true),
        (VapourEquation.BensonKrause1980, "benson-krause-1980", false),
        (VapourEquation.GreenCarritt1967, "green-carritt-1967", true),
        (VapourEquation.Hardy1998, "hardy-1998", false),
        (VapourEquation.Buck1981, "buck-1981", false),
        (VapourEquation.Buck1996, "buck-1996", false),
        (VapourEquation.Sonntag1990, "sonntag-1990", false),
        (VapourEquation.Murray1967, "murray-1967", false),
        (VapourEquation.Antoine8111, "antoine-81-11", false),
    ];
}
