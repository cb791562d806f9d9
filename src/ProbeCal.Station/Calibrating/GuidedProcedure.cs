using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>The guided procedure of a method, to be read before anything is set up.</summary>
public static class GuidedProcedure
{
    /// <summary>The steps of a calibration or a check by a method.</summary>
    /// <param name="method">One of <see cref="MethodIds"/>.</param>
    /// <param name="purpose">Calibration or check.</param>
    /// <param name="zero">What is done about the zero, see <see cref="CalibrationIds"/>.</param>
    /// <param name="zeroMethod">How the zero is made; null for the usual way.</param>
    /// <param name="levels">Number of further levels.</param>
    /// <param name="typed">True for a meter that a person reads.</param>
    public static IReadOnlyList<ProcedureStep> Of(string method, string purpose, string zero, string? zeroMethod, int levels, bool typed)
    {
        bool zeroAlone = MethodIds.IsZero(method);
        List<PlannedPoint> plan = [new PlannedPoint { Role = zeroAlone ? CalibrationIds.ZeroPoint : CalibrationIds.SpanPoint, Method = method }];
        for (int i = 0; i < levels; i++)
        {
            plan.Add(new PlannedPoint { Role = CalibrationIds.LevelPrefix + Number.Print(i + 1), Method = method });
        }

        bool reads = !zeroAlone && zero is CalibrationIds.ZeroCheck or CalibrationIds.ZeroAdjust;
        if (reads)
        {
            plan.Add(new PlannedPoint { Role = CalibrationIds.ZeroPoint, Method = zeroMethod ?? MethodIds.ZeroSolution });
        }

        return Procedures.For(new CalibrationSetup
        {
            Purpose = purpose,
            Plan = plan,
            Method = method,
            ZeroPlan = zeroAlone ? CalibrationIds.ZeroCheck : zero,
            Readings = typed ? CalibrationIds.Typed : CalibrationIds.Live,
            Probe = new RecordedProbe
            {
                Id = "",
                Model = typed ? ModelNames.MeterDisplay : ModelNames.Amperometric,
                SignalUnit = "",
                TemperatureCoefficient = CoefficientText.Parse("", "exponential 0.03/K at 25C fitted 0..40C"),
                Thermometer = new RecordedThermometer { Id = "", CommonStandardUncertaintyCelsius = 0, Source = "" },
            },
            Source = "",
            Simulated = true,
            Equation = EquationNames.Default,
            Pressure = new EnteredPressure { Source = "", StandardUncertaintyHectopascal = 0 },
            Salinity = new RecordedQuantity { Value = 0, Unit = "1", StandardUncertainty = 0, Source = "" },
            Stirring = Stirring.Stirred,
            ReferenceStateRelative = 0,
        });
    }
}
