using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Correcting;

/// <summary>The errors of a visit in words: one figure for each level.</summary>
public static class VisitText
{
    /// <summary>Behind the id of a visit: <c>: fouling 0.310 mg/L, drift 0.360 mg/L</c>.</summary>
    public static string Errors(VisitRecord visit)
    {
        (string fouling, string drift) = Columns(visit);
        return (fouling == "-" ? "" : ": fouling error " + fouling + " mg/L") + (drift == "-" ? "" : (fouling == "-" ? ": " : ", ") + "drift error " + drift + " mg/L");
    }

    /// <summary>Fouling and drift errors, mg/L; a dash where one was not determined.</summary>
    public static (string Fouling, string Drift) Columns(VisitRecord visit)
    {
        string fouling = string.Join("; ", visit.Cleaning.Select(static each => Number.Fixed(
            ServiceErrors.Fouling(each.MonitorBefore, each.MonitorAfter, each.FieldBefore ?? 0, each.FieldAfter ?? 0), 3)));
        string drift = string.Join("; ", visit.Standards.Select(static each => Number.Fixed(ServiceErrors.Drift(each.Standard, each.Reading), 3)));
        return (fouling.Length == 0 ? "-" : fouling, drift.Length == 0 ? "-" : drift);
    }
}
