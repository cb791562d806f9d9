using System.Collections.Generic;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>Brackets as lines for people.</summary>
public static class BracketReport
{
    /// <summary>What a calibration or check brackets: the time before it and the time after it, a line each.</summary>
    public static IReadOnlyList<string> Around(CalibrationLogStore log, CalibrationRecord record)
    {
        if (!log.Holds(record.Id) || record.LogId != log.LogId)
        {
            return [];
        }

        Brackets brackets = Brackets.Of(log, record.Probe.Id);
        return [.. brackets.Around(record)];
    }
}
