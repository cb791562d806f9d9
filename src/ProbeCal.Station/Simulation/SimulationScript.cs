using System;
using System.Collections.Generic;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Simulation;

/// <summary>Where the simulated probe is.</summary>
public enum SimulationPhase
{
    /// <summary>In the lake, with a current past the membrane; oxygen and temperature follow the day.</summary>
    Lake,
    /// <summary>In the lake without any movement of the water: the probe reads low.</summary>
    LakeStill,
    /// <summary>In a stirred bath of air-saturated water at a steady temperature.</summary>
    AirSaturatedWater,
    /// <summary>In water-saturated air at the temperature of the bath.</summary>
    Air,
    /// <summary>In a stirred solution without oxygen, at the temperature of the bath.</summary>
    Zero,
}

/// <summary>One step of a script: a place, and how long the probe stays; null is for ever.</summary>
public sealed record SimulationStep(SimulationPhase Phase, TimeSpan? Stay);

/// <summary>Text form of a script: <c>air-saturated-water:15min,zero:10min,lake</c>.</summary>
public static class SimulationScript
{
    private static readonly (SimulationPhase Phase, string Name)[] Names =
    [
        (SimulationPhase.Lake, "lake"),
        (SimulationPhase.LakeStill, "lake-still"),
        (SimulationPhase.AirSaturatedWater, "air-saturated-water"),
        (SimulationPhase.Air, "air"),
        (SimulationPhase.Zero, "zero"),
    ];

    /// <summary>Name of a phase as scripts and truth files write it.</summary>
    public static string Name(SimulationPhase phase)
    {
        return Array.Find(Names, known => known.Phase == phase).Name ?? "lake";
    }

    /// <summary>Reads a script. Every step but the last needs its duration; the last stays for ever without one.</summary>
    /// <param name="what">The option or key that it was given for.</param>
    /// <param name="text">The script.</param>
    /// <exception cref="InputException">It is none.</exception>
    public static IReadOnlyList<SimulationStep> Parse(string what, string text)
    {
        List<SimulationStep> steps = [];
        string[] parts = text.Split(',', StringSplitOptions.TrimEntries);
        for (int i = 0; i < parts.Length; i++)
        {
            int colon = parts[i].IndexOf(':', StringComparison.Ordinal);
            string name = colon < 0 ? parts[i] : parts[i][..colon];
            TimeSpan? stay = colon < 0 ? null : Quantity.Duration(what + " " + Wrong.Shown(name), parts[i][(colon + 1)..]);
            if (stay is null && i < parts.Length - 1)
            {
                throw Wrong.Input(what, text, $"{Wrong.Shown(name)} needs a duration because more follows; write for example air-saturated-water:15min,lake");
            }

            steps.Add(new SimulationStep(Phase(what, text, name), stay));
        }

        return steps;
    }

    /// <summary>Prints a script so that it reads back the same.</summary>
    public static string Print(IReadOnlyList<SimulationStep> steps)
    {
        StringBuilder text = new();
        foreach (SimulationStep step in steps)
        {
            text.Append(text.Length == 0 ? "" : ",").Append(Name(step.Phase));
            if (step.Stay is TimeSpan stay)
            {
                text.Append(':').Append(Number.Print(stay.TotalSeconds)).Append('s');
            }
        }

        return text.ToString();
    }

    private static SimulationPhase Phase(string what, string text, string name)
    {
        foreach ((SimulationPhase phase, string known) in Names)
        {
            if (known == name)
            {
                return phase;
            }
        }

        string[] names = Array.ConvertAll(Names, known => known.Name);
        throw Wrong.Input(what, text, $"there is no place {Wrong.Shown(name)}{NearestName.DidYouMean(name, names)}; the places are {string.Join(", ", names)}");
    }
}
