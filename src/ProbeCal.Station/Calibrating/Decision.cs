using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>The decision rule: what was found, its expanded uncertainty and the limit make a verdict. The names are those of the record.</summary>
public static class Decision
{
    /// <summary>The limit was kept.</summary>
    public const string Pass = "pass";

    /// <summary>The limit was not kept.</summary>
    public const string Fail = "fail";

    /// <summary>The limit was kept, but by less than the guard band.</summary>
    public const string Inconclusive = "inconclusive";

    /// <summary>There is nothing to judge.</summary>
    public const string NotJudged = "not-judged";

    /// <summary>Coverage factor of every expanded uncertainty that is judged by: about 95 % of a normal distribution.</summary>
    internal const double CoverageFactor = 2;

    /// <summary>The rule in words, as records keep it.</summary>
    internal static string RuleOf(CalibrationLimits limits)
    {
        return limits.GuardBand
            ? "guard band w = U (k = 2): an error within its limit less U passes, one between that and the limit is inconclusive, one beyond the limit fails"
            : Judgement.DecisionRule;
    }

    /// <summary>The verdict of a whole record from those of its limits that decide: fail before inconclusive before pass.</summary>
    /// <param name="limits">The limits of the record.</param>
    public static string Of(IReadOnlyList<RecordedLimit> limits)
    {
        string[] verdicts = [.. limits.Where(static limit => limit.Decides).Select(static limit => limit.Verdict)];
        return verdicts.Any(static verdict => verdict is Fail or NotJudged) ? Fail : verdicts.Contains(Inconclusive) ? Inconclusive : Pass;
    }

    /// <summary>The verdict of a record in one word. Records of version 1 know pass and fail.</summary>
    /// <param name="record">The record.</param>
    public static string Of(CalibrationRecord record)
    {
        return record.Result.Pass ? Pass : Of(record.Limits) == Inconclusive ? Inconclusive : Fail;
    }

    /// <summary>A limit judged: the verdict, with U, its ratio and the guard band.</summary>
    /// <param name="limit">The limit with what was found; its verdict is filled in here.</param>
    /// <param name="width">The limit in figures, either sign, in its unit.</param>
    /// <param name="standardUncertainty">Standard uncertainty of what was found; null where it is not known.</param>
    /// <param name="guardBand">True to draw the limit in by U.</param>
    internal static RecordedLimit Judged(RecordedLimit limit, double width, double? standardUncertainty, bool guardBand)
    {
        double? expanded = CoverageFactor * standardUncertainty;
        RecordedLimit known = limit with
        {
            ExpandedUncertainty = expanded,
            CoverageFactor = expanded == null ? null : CoverageFactor,
            LimitToUncertainty = 0 < expanded ? width / expanded : null,
        };
        if (limit.Found is not double found || !double.IsFinite(width))
        {
            return known with { Verdict = NotJudged };
        }

        if (!AcceptanceLimit.Passes(found, width))
        {
            return known with { Verdict = Fail };
        }

        if (!guardBand)
        {
            return known with { Verdict = Pass };
        }

        // No guard band where nothing of the limit would be left, or where U is not known: neither pass nor fail can be said.
        return expanded is not double u || width <= u
            ? known with { Verdict = Inconclusive, Applied = $"{limit.Applied}{(limit.Applied == null ? "" : "; ")}{NoBand(width, expanded, limit.Unit)}" }
            : known with { GuardBand = u, Verdict = Math.Abs(found) <= width - u ? Pass : Inconclusive };
    }

    /// <summary>Why there can be no guard band, in one line with both figures.</summary>
    internal static string NoBand(double width, double? expanded, string unit)
    {
        return expanded is double u
            ? $"no guard band: U {Number.Fixed(u, 3)} {unit} (k = 2) is not below the limit {Number.Fixed(width, 3)} {unit}, so that nothing could pass"
            : "no guard band: the uncertainty is not known";
    }
}
