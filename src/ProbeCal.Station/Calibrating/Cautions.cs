using System.Collections.Generic;

namespace ProbeCal.Station.Calibrating;

/// <summary>The cautions of the procedures, one for each hazard; docs/safety.md says more about each. Reminders, no procedure.</summary>
internal static class Cautions
{
    internal const string OpenWater = "At open water wear a lifejacket, do not work alone, and look at flow, ice and weather first.";
    internal const string Mains = "Keep mains-powered pumps, heaters and stirrers behind a residual-current device and out of reach of the water.";
    internal const string Sulfite = "Sulfite irritates, and some people react strongly to it: gloves and goggles, read its safety data sheet, keep acid away from it.";
    internal const string Cobalt = "Leave cobalt salt out of the zero solution: it is toxic and must not be poured away.";
    internal const string Cylinder = "Gas from a cylinder takes the place of air and suffocates without warning: ventilate, use an oxygen alarm, chain the cylinder, use the regulator made for the gas.";
    internal const string Oxygen = "Gas rich in oxygen feeds fire: no oil, grease, flame or spark near it.";
    internal const string Flammable = "This gas burns and can explode in air: no flame or spark, lead the outlet outdoors, use a gas alarm.";
    internal const string Toxic = "This gas is poisonous, and its smell is no warning: lead the outlet away, use a gas alarm, keep to the local exposure limit.";
    internal const string AlkalineIodide = "Alkaline iodide is caustic, and azide in it is a strong poison that forms explosive salts with lead and copper pipes: gloves and goggles, never down a drain.";
    internal const string Acid = "Acid burns, and with azide it sets free a poisonous gas: add it slowly, in a hood or in moving air, and collect the waste.";

    /// <summary>What to beware of with a gas from a cylinder.</summary>
    /// <param name="gas">The gas of the probe.</param>
    /// <param name="moleFraction">Its mole fraction in the cylinder; NaN when nobody said.</param>
    internal static IReadOnlyList<string> OfCylinder(Gas gas, double moleFraction)
    {
        List<string> cautions = [Cylinder];
        if (gas == Gas.Oxygen && 0.235 < moleFraction)
        {
            cautions.Add(Oxygen);
        }

        if (IsFlammable(gas))
        {
            cautions.Add(Flammable);
        }

        if (gas is Gas.CarbonMonoxide or Gas.HydrogenSulfide or Gas.Ozone or Gas.Ammonia)
        {
            cautions.Add(Toxic);
        }

        return cautions;
    }

    /// <summary>True for a gas that burns in air.</summary>
    internal static bool IsFlammable(Gas gas)
    {
        return gas is Gas.Hydrogen or Gas.Methane or Gas.CarbonMonoxide or Gas.HydrogenSulfide or Gas.Ammonia or Gas.Ethane;
    }
}
