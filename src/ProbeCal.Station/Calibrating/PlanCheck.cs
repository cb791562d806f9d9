using System;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>What a set-up's planned points can and cannot make, told before anybody has waited for one.</summary>
internal static class PlanCheck
{
    /// <summary>Refuses a plan that can make no calibration, or a check of nothing.</summary>
    /// <param name="setup">The set-up.</param>
    /// <param name="inForce">The calibration in force of the probe; null when there is none.</param>
    /// <exception cref="InputException">In one line: what is planned, and what would do.</exception>
    internal static void Require(CalibrationSetup setup, CalibrationRecord? inForce)
    {
        RequireRoles(setup);
        RequireALimit(setup);
        if (setup.Purpose == CalibrationRecord.CheckPurpose)
        {
            RequireSomethingToCheck(setup, inForce);
            return;
        }

        if (IsOnePoint(setup))
        {
            return;
        }

        int unknowns = Unknowns(setup);
        int known = setup.Plan.Count(point => !MethodIds.IsZero(point.Method) || setup.ZeroPlan == CalibrationIds.ZeroAdjust) + (NeedsAZero(setup) ? 1 : 0);
        if (known < unknowns)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture,
                $"{known} {(known == 1 ? "point" : "points")} for a {setup.FitForm} with {unknowns} unknowns ({(unknowns == 3 ? "zero, slope and curvature" : "zero and slope")}): add {unknowns - known} more with --level, at another partial pressure"));
        }

        RequireDifferentMixtures(setup, unknowns);
    }

    /// <summary>True for the 100 % point in equilibrium with air, with a zero or without: slope and zero come from these two alone.</summary>
    internal static bool IsOnePoint(CalibrationSetup setup)
    {
        return setup.Gas == Gas.Oxygen
            && setup.FitForm == "line"
            && setup.Method is MethodIds.AirSaturatedWater or MethodIds.WaterSaturatedAir
            && !ModelNames.IsLogarithmic(setup.Probe.Model) && !ModelNames.IsTotalPressure(setup.Probe.Model)
            && setup.Plan.All(static point => point.Role is CalibrationIds.SpanPoint or CalibrationIds.ZeroPoint);
    }

    /// <summary>True when the points of a line lack one and a zero stands in: measured before, or assumed.</summary>
    internal static bool NeedsAZero(CalibrationSetup setup)
    {
        // A film with its maker's coefficients gives a partial pressure already, whose zero is 0 as well.
        bool hasZero = IsProportional(setup.Probe) || setup.Probe.Model is ModelNames.Uchida2008 or ModelNames.Bittig2018;
        return hasZero && setup.FitForm == "line"
            && setup.Plan.Count(static point => !MethodIds.IsZero(point.Method)) == 1
            && !(setup.ZeroPlan == CalibrationIds.ZeroAdjust && HasZero(setup));
    }

    /// <summary>True for a probe whose signal is next to nothing without the gas, so that an assumed zero makes sense and shares of a signal mean something.</summary>
    internal static bool IsProportional(RecordedProbe probe)
    {
        return probe.Model is ModelNames.Amperometric or ModelNames.MeterDisplay;
    }

    /// <summary>True for dissolved oxygen, which the published limits speak of; false for another gas and for total gas pressure, which are judged in hPa.</summary>
    internal static bool IsOxygen(CalibrationSetup setup)
    {
        return !ErrorScale.IsHectopascal(GasNames.NameOf(setup.Gas), setup.Probe.Model);
    }

    /// <summary>True when nobody has said yet what the truth of a point rests on.</summary>
    internal static bool IsMissingItsReference(PlannedPoint planned)
    {
        return planned.Method switch
        {
            MethodIds.Titration => planned.Titration == null,
            MethodIds.TransferStandard => planned.Transfer == null,
            _ => false,
        };
    }

    private static int Unknowns(CalibrationSetup setup)
    {
        return setup.FitForm == "quadratic" ? 3 : 2;
    }

    private static bool HasZero(CalibrationSetup setup)
    {
        return setup.Plan.Any(static point => MethodIds.IsZero(point.Method));
    }

    private static void RequireRoles(CalibrationSetup setup)
    {
        string? twice = setup.Plan.GroupBy(static point => point.Role).FirstOrDefault(static group => 1 < group.Count())?.Key;
        if (twice != null)
        {
            throw new InputException($"the point {twice} is planned twice; name each point once");
        }

        foreach (PlannedPoint point in setup.Plan)
        {
            bool zero = point.Role == CalibrationIds.ZeroPoint;
            bool impossible = ModelNames.IsLogarithmic(setup.Probe.Model) && MethodIds.IsZero(point.Method);
            if (impossible)
            {
                throw new InputException($"{point.Role} by {point.Method}: the signal of this probe follows the logarithm of the partial pressure, and there is none of zero; use two gas mixtures");
            }

            if (zero && !MethodIds.IsZero(point.Method))
            {
                throw new InputException($"zero by {point.Method}: a zero is read in {MethodIds.ZeroSolution} or {MethodIds.ZeroGas}");
            }
        }
    }

    /// <summary>Nothing is measured that could not be judged afterwards, and no limit is made up.</summary>
    private static void RequireALimit(CalibrationSetup setup)
    {
        if (IsOxygen(setup))
        {
            return;
        }

        string what = ModelNames.IsTotalPressure(setup.Probe.Model) ? "total gas pressure" : GasNames.NameOf(setup.Gas);
        PressureLimits limits = setup.Limits.Pressure ?? new PressureLimits();
        if (limits.Hectopascal == null && limits.Percent == null && setup.Plan.Any(static point => point.Role != CalibrationIds.ZeroPoint))
        {
            throw new InputException($"there is no published limit for {what}, and none was entered: say how far a reading may be off, with --limit in hPa (for example --limit 5hPa) or --limit-percent in % of the reference (for example --limit-percent 3%)");
        }

        if (limits.AtZero == null && HasZero(setup))
        {
            throw new InputException($"there is no published limit for {what} at zero, where a share of the reference says nothing: enter one in hPa, for example --zero-limit 1hPa");
        }
    }

    private static void RequireSomethingToCheck(CalibrationSetup setup, CalibrationRecord? inForce)
    {
        bool meter = setup.Probe.MeterSettings != null && setup.Readings == CalibrationIds.Typed;
        if (inForce == null)
        {
            throw new InputException($"probe {setup.Probe.Id} has no calibration to check; calibrate it first{(meter ? ", also a meter that was set elsewhere: its first calibration notes how it reads" : "")}");
        }

        if (!Fitting.IsComparable(inForce.Probe, setup.Probe))
        {
            throw new InputException($"calibration {inForce.Id} is of a {inForce.Probe.Model} probe in {Unit(inForce.Probe)}, and the check is of {setup.Probe.Model} in {Unit(setup.Probe)}: they cannot be compared; give the probe as it was calibrated");
        }
    }

    /// <summary>Mixtures that are all the same leave the line undetermined, however often they are read.</summary>
    private static void RequireDifferentMixtures(CalibrationSetup setup, int unknowns)
    {
        bool allMixtures = setup.Plan.All(static point => point.Mixture != null);
        int different = setup.Plan.Select(static point => point.Mixture?.MoleFraction.Value).Distinct().Count();
        if (allMixtures && different + (NeedsAZero(setup) ? 1 : 0) < unknowns)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture,
                $"{setup.Plan.Count} points at {different} different {(different == 1 ? "mixture" : "mixtures")} for {unknowns} unknowns: reading the same gas again tells nothing new; take a mixture of another content"));
        }
    }

    private static string Unit(RecordedProbe probe)
    {
        return probe.SignalUnit.Length == 0 ? "an unnamed unit" : probe.SignalUnit;
    }
}
