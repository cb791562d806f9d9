using System;
using System.Collections.Generic;
using System.Linq;

namespace ProbeCal.Station.Calibrating;

/// <summary>One guard: what it watches and by which limit, and how it looks at a situation.</summary>
/// <param name="Name">One of <see cref="GuardNames"/>.</param>
/// <param name="Watches">What it watches, for people.</param>
/// <param name="Look">Gives a finding, or null when there is nothing to say or not enough known.</param>
internal sealed record Guard(string Name, string Watches, Func<Situation, Finding?> Look)
{
    /// <summary>The limit by which it speaks, for people.</summary>
    public required string Limit { get; init; }

    /// <summary>Where that limit comes from: one of <see cref="LimitSources"/>, or the words that stand in for one.</summary>
    public required string Source { get; init; }

    /// <summary>The weights that its findings may have, the lightest first.</summary>
    public required FindingSeverity[] Severities { get; init; }
}

/// <summary>All guards, stage by stage.</summary>
internal static class Guards
{
    /// <summary>Every guard once, in the order in which they look.</summary>
    public static IReadOnlyList<Guard> All { get; } = [.. ConditionGuards.All, .. BeforePointGuards.All, .. FitGuards.All];

    /// <summary>The names of those that a reason can get past.</summary>
    public static IReadOnlyList<string> WithReason { get; } = NamesOf(All);

    /// <summary>The same for the guards on the pressure.</summary>
    public static IReadOnlyList<string> OnPressureWithReason { get; } = NamesOf(PressureGuards.All);

    private static string[] NamesOf(IEnumerable<Guard> guards)
    {
        return [.. guards.Where(static guard => guard.Severities.Contains(FindingSeverity.NeedsReason)).Select(static guard => guard.Name)];
    }
}

/// <summary>Where limits come from, as tables and records name it.</summary>
internal static class LimitSources
{
    public const string FieldManual = "USGS 2020, National Field Manual A6.2 (TM 9-A6.2)";
    public const string Multiparameter = "USGS 2023, National Field Manual A6.8 (TM 9-A6.8)";
    public const string OceanGliders = "OceanGliders oxygen SOP";
    public const string VolunteerManual = "USEPA 1997, EPA 841-B-97-003, ch. 5.2";
    public const string Computed = "computed from the equations";
    public const string OurChoice = "our choice, no source";
    public const string CommonPractice = "common practice, no source";
    public const string Entered = "entered, or from the register";
    public const string Nature = "cannot be otherwise";
}
