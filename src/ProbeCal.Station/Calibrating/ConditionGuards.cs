using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using static ProbeCal.Station.Calibrating.Finding;

namespace ProbeCal.Station.Calibrating;

/// <summary>The guards on what was entered and on the conditions, before the wait for any point.</summary>
internal static class ConditionGuards
{
    /// <summary>All of them.</summary>
    public static IReadOnlyList<Guard> All { get; } =
    [
        new(GuardNames.Clock, "the clock against the last calibration of this probe", Clock)
        {
            Limit = "not before it",
            Source = LimitSources.Nature,
            Severities = [FindingSeverity.Refuse],
        },
        .. TemperatureGuards.All,
        .. PressureGuards.All,
        .. SalinityGuards.All,
        new(GuardNames.StirringStill, "still water with a probe that needs stirring", StillWater)
        {
            Limit = "any still water",
            Source = "10 to 50 % low: from memory",
            Severities = [FindingSeverity.Note],
        },
        BathGuards.Bubbles,
        .. EquipmentGuards.All,
    ];

    private static Finding? Clock(Situation now)
    {
        if (now.Previous is not CalibrationRecord previous || previous.CompletedUtc <= now.NowUtc)
        {
            return null;
        }

        return new Finding(GuardNames.Clock, FindingSeverity.Refuse, Text(
            $"the clock says {now.NowUtc:yyyy-MM-dd HH:mm}Z and the last calibration of this probe is from {previous.CompletedUtc:yyyy-MM-dd HH:mm}Z"),
            PossibleError.Unknown("readings would be computed by the wrong calibration, so no size can be given"),
            "set the clock right first");
    }

    private static Finding? StillWater(Situation now)
    {
        bool still = now.Setup.Stirring == Stirring.Still && now.Setup.Method == CalibrationIds.AirSaturatedWater;
        return still ? new Finding(GuardNames.StirringStill, FindingSeverity.Note,
            "the water is still, in which an amperometric probe reads 10 to 50 % low (from memory); at 10 %",
            PossibleError.OfSignal(now.SaturationMilligramsPerLitre, 0.9),
            "keep the water moving as it does where the probe will hang; readings in moving water will be flagged against this calibration") : null;
    }
}
