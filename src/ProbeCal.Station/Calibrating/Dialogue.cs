using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Calibrating;

/// <summary>What the look for droplets can give, as records keep it.</summary>
public static class Droplets
{
    /// <summary>None on membrane or thermometer.</summary>
    public const string NoneSeen = "none-seen";

    /// <summary>Some: the point is taken again.</summary>
    public const string Seen = "seen";

    /// <summary>Nobody looked.</summary>
    public const string NotChecked = "not-checked";

    /// <summary>The point was in water.</summary>
    public const string NotNeeded = "not-needed";
}

/// <summary>
/// Who a calibration talks to: a person at a terminal, or nobody. It is called by one calibration at a time, from whatever
/// thread that runs on.
/// </summary>
public interface ICalibrationDialogue
{
    /// <summary>One line for people.</summary>
    void Say(string line);

    /// <summary>How far a wait has come; many times a minute.</summary>
    void Report(WaitProgress progress);

    /// <summary>A point was taken.</summary>
    void Taken(RecordedPoint point);

    /// <summary>
    /// Shows a step and returns when it is done (of a point: when the probe is in place); at once when nobody is there.
    /// </summary>
    /// <returns>What the person wrote down where the step asks for it; null when nothing.</returns>
    Task<string?> DoAsync(ProcedureStep step, CancellationToken cancellationToken);

    /// <summary>Asks for droplets on membrane and thermometer: one of <see cref="Droplets"/>.</summary>
    Task<string> DropletsAsync(ProcedureStep step, CancellationToken cancellationToken);

    /// <summary>Asks for the reason for going on past a finding; null refuses.</summary>
    Task<string?> ReasonAsync(Finding finding, CancellationToken cancellationToken);

    /// <summary>Asks for what the meter shows, in its unit; null when nobody can say.</summary>
    Task<double?> ReadingAsync(ProcedureStep step, string unit, CancellationToken cancellationToken);

    /// <summary>
    /// Asks for what the truth of a point rests on, where the set-up does not say it yet: the titration of samples that were
    /// drawn beside the reading just taken. Null when nobody can say it now; the reading then waits.
    /// </summary>
    Task<PlannedPoint?> ReferenceAsync(ProcedureStep step, PlannedPoint planned, CancellationToken cancellationToken);
}
