using System;
using System.Collections.Generic;
using System.Linq;
using System.Runtime.CompilerServices;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>
/// A probe of which everything is known, in whatever water or gas a step puts it: 0.45 per hPa at 25 °C, 0.35 at zero, no lag, a
/// little noise from a seeded generator. It is a source and the person beside it at once.
/// </summary>
internal sealed class KnownProbe : ISampleSource
{
    internal const double Slope = 0.45, Zero = 0.35, Celsius = 20, Pressure = 940;

    private readonly Random _random;
    private readonly IProbeModel _model;
    private DateTimeOffset _time;

    internal KnownProbe(DateTimeOffset startUtc, RecordedProbe probe, int seed = 1)
    {
        _time = startUtc;
        _random = new Random(seed);
        _model = RecordConversion.Model(probe);
    }

    /// <summary>True partial pressure at the probe, hPa.</summary>
    internal double Hectopascal { get; set; } = AirHectopascal;

    /// <summary>Oxygen of water-saturated air at 20 °C and 940 hPa: (940 − 23.38) × 0.20946 hPa (vapour pressure of water at 20 °C from the tables of the field manual, 17.54 mmHg).</summary>
    internal static double AirHectopascal => (Pressure - 23.38) * 0.20946;

    /// <summary>Half width of the noise, in units of signal.</summary>
    internal double Noise { get; init; } = 0.01;

    internal double SlopeNow { get; set; } = Slope;

    internal double ZeroNow { get; set; } = Zero;

    public string Description => "known probe";

    public async IAsyncEnumerable<SourceEvent> ReadAsync([EnumeratorCancellation] CancellationToken cancellationToken)
    {
        while (true)
        {
            cancellationToken.ThrowIfCancellationRequested();
            _time = _time.AddSeconds(1);
            _model.Gain(Celsius, RangeRule.Refuse, out double gain);
            double response = ZeroNow + (SlopeNow * gain * (_model.IsLogarithmic ? Math.Log10(Hectopascal) : Hectopascal));
            _model.Signal(response, Celsius, Pressure, 0, RangeRule.Refuse, out double signal);
            yield return new RawSample(_time, "", signal + (Noise * ((2 * _random.NextDouble()) - 1)))
            {
                TimeUtc = _time,
                TemperatureCelsius = Celsius + (0.002 * ((2 * _random.NextDouble()) - 1)),
                PressureHectopascal = Pressure,
            };
            await Task.CompletedTask;
        }
    }

    public ValueTask DisposeAsync()
    {
        return ValueTask.CompletedTask;
    }
}

/// <summary>Set-ups of every method, with the truth that belongs to each of their points.</summary>
internal static class MethodBench
{
    /// <summary>Oxygen in fresh water in equilibrium with air at 20 °C and 940 hPa, mg/L: 9.09 at 1013.25 hPa (field manual's table) times (940 − 23.4)/(1013.25 − 23.4).</summary>
    internal const double Saturation = 9.09 * (940 - 23.4) / (1013.25 - 23.4);

    internal static CalibrationSetup Setup(string method, string purpose = CalibrationRecord.CalibrationPurpose, string zero = CalibrationIds.ZeroKeep, string zeroMethod = MethodIds.ZeroSolution, int levels = 0)
    {
        bool zeroAlone = MethodIds.IsZero(method);
        List<PlannedPoint> plan = [Planned(zeroAlone ? CalibrationIds.ZeroPoint : CalibrationIds.SpanPoint, method, 20.95)];
        for (int i = 1; i <= levels; i++)
        {
            plan.Add(Planned(CalibrationIds.LevelPrefix + i, MethodIds.GasMixture, 5 * i));
        }

        if (!zeroAlone && zero is CalibrationIds.ZeroCheck or CalibrationIds.ZeroAdjust)
        {
            plan.Add(Planned(CalibrationIds.ZeroPoint, zeroMethod, 0));
        }

        return Bench.Setup with
        {
            Method = method,
            Purpose = purpose,
            ZeroPlan = zeroAlone ? CalibrationIds.ZeroCheck : zero,
            Plan = plan,
            AirToWaterRatio = method == MethodIds.WaterSaturatedAir ? new RecordedQuantity { Value = 1, Unit = "1", StandardUncertainty = 0.002, Source = "entered" } : null,
        };
    }

    internal static PlannedPoint Planned(string role, string method, double percent)
    {
        PlannedPoint point = new() { Role = role, Method = method };
        return method switch
        {
            MethodIds.GasMixture => point with { Mixture = MixtureText.Parse("--mixture", FormattableString.Invariant($"CYL-{percent:0} {percent}% u 0.02% dry"), Gas.Oxygen) },
            MethodIds.TransferStandard => point with { Transfer = TransferText.Parse("--transfer", FormattableString.Invariant($"STD-3 {Saturation:F3}mg/L u 0.03mg/L")) },
            MethodIds.Titration => point with { Titration = Titration },
            _ => point,
        };
    }

    /// <summary>
    /// Titres that stand for the saturation: by the definition of the method 1 mL of 0.025 mol/L thiosulfate takes up 0.2 mg of oxygen
    /// (8 mg to the milliequivalent), here of 298 mL of sample after 2 mL of reagents; the oxygen that the reagents brought is added.
    /// </summary>
    internal static RecordedTitration Titration
    {
        get
        {
            RecordedTitration blank = TitrationText.Parse("--titration", "12mL,12mL,12mL flask 300mL u 0.1mL titrant 0.025mol/L u 0.00002mol/L drawn 20C blank 0mL u 0.01mL");
            double milligrams = (Saturation * (blank.Flask.Value - blank.Displaced.Value) / 1000) + blank.ReagentOxygenMilligrams.Value;
            double titre = milligrams / (8 * blank.Titrant.Value);
            return blank with { TitreMillilitres = [titre - 0.005, titre, titre + 0.005] };
        }
    }

    /// <summary>What is true at a step, hPa of oxygen.</summary>
    internal static double Truth(CalibrationSetup setup, ProcedureStep step)
    {
        PlannedPoint planned = setup.PlannedFor(step.Role!);
        return planned switch
        {
            { Mixture: RecordedMixture mixture } => mixture.MoleFraction.Value * KnownProbe.Pressure,
            _ when MethodIds.IsZero(planned.Method) => 0,
            _ => KnownProbe.AirHectopascal,
        };
    }

    /// <summary>Every plan: methods, zeros and their ways, levels, calibration and check.</summary>
    internal static IEnumerable<CalibrationSetup> AllPlans()
    {
        foreach (string purpose in new[] { CalibrationRecord.CalibrationPurpose, CalibrationRecord.CheckPurpose })
        {
            foreach (string method in MethodIds.All.Where(method => purpose == CalibrationRecord.CheckPurpose || !MethodIds.IsZero(method)))
            {
                foreach (string zero in new[] { CalibrationIds.ZeroKeep, CalibrationIds.ZeroCheck, CalibrationIds.ZeroAdjust })
                {
                    foreach (string zeroMethod in new[] { MethodIds.ZeroSolution, MethodIds.ZeroGas })
                    {
                        foreach (int levels in new[] { 0, 2 })
                        {
                            bool impossible = (zero == CalibrationIds.ZeroAdjust && purpose == CalibrationRecord.CheckPurpose) || (levels != 0 && MethodIds.IsZero(method));
                            if (!impossible)
                            {
                                yield return Setup(method, purpose, zero, zeroMethod, levels);
                            }
                        }
                    }
                }
            }
        }
    }
}
