using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>The state machine over every plan: each step once, in the order of the procedure, whatever is killed in between.</summary>
public class ProcedureSessionTests(ITestOutputHelper output)
{
    [Fact]
    public void KilledAfterEveryStep_OfEveryPlan_DoesEachStepOnceAndInOrder()
    {
        int plans = 0;
        int steps = 0;
        foreach (CalibrationSetup setup in MethodBench.AllPlans())
        {
            using Bench bench = new();
            if (setup.Purpose == CalibrationRecord.CheckPurpose)
            {
                Finish(bench, MethodBench.Setup(MethodIds.AirSaturatedWater, zero: CalibrationIds.ZeroAdjust), kill: false);
                bench.Time.Advance(TimeSpan.FromHours(1));
            }

            IReadOnlyList<ProcedureStep> plan = Procedures.For(setup);
            CalibrationRecord record = Finish(bench, setup, kill: true);

            Assert.Equal(plan.Select(step => step.Id), record.Steps.Select(done => done.Step));
            Assert.Equal(plan.Where(step => step.Role != null).Select(step => step.Role), record.Points.Select(point => point.Role));
            Assert.Equal(setup.Purpose, record.Purpose);
            Assert.Empty(Directory.GetFiles(bench.Data.SessionsFolder));
            plans++;
            steps += plan.Count;
        }

        output.WriteLine($"{plans} plans, {steps} steps, killed after each");
        Assert.True(60 <= plans, $"{plans} plans");
    }

    [Fact]
    public void StepsOfEveryPlan_HaveIdsAndRolesOfTheirOwn()
    {
        foreach (CalibrationSetup setup in MethodBench.AllPlans())
        {
            IReadOnlyList<ProcedureStep> plan = Procedures.For(setup);
            Assert.Equal(plan.Count, plan.Select(step => step.Id).Distinct().Count());
            string[] roles = [.. plan.Select(step => step.Role).OfType<string>()];
            Assert.Equal(roles.Length, roles.Distinct().Count());
            Assert.All(setup.Plan, point => Assert.Contains(point.Role, roles));
        }
    }

    [Fact]
    public void HalfWrittenState_BesideTheWholeOne_IsPassedOver()
    {
        using Bench bench = new();
        CalibrationSetup setup = MethodBench.Setup(MethodIds.AirSaturatedWater);
        using CalibrationLogStore log = bench.Log();
        List<string> said = [];
        CalibrationSession session = CalibrationSession.Begin(setup, bench.Data, log, bench.Time, false, said.Add);
        Do(session, setup, bench);
        string whole = Directory.GetFiles(bench.Data.SessionsFolder).Single();
        File.WriteAllText(whole + ".new", "{\"format\":\"probecal-calibration-sess");

        CalibrationSession again = CalibrationSession.Begin(setup, bench.Data, log, bench.Time, false, said.Add);
        Assert.Single(again.State.Steps);
        Assert.Contains(said, line => line.Contains("1 step done and no point taken yet", StringComparison.Ordinal));
    }

    [Fact]
    public void Droplets_TakeThePointBeforeThemAgain_AndNothingElse()
    {
        using Bench bench = new();
        CalibrationSetup setup = MethodBench.Setup(MethodIds.WaterSaturatedAir);
        using CalibrationLogStore log = bench.Log();
        CalibrationSession session = CalibrationSession.Begin(setup, bench.Data, log, bench.Time, false, _ => { });
        while (session.State.Next!.Id != "droplets")
        {
            Do(session, setup, bench);
        }

        session.TakeDroplets(session.State.Next!, Droplets.Seen);
        Assert.Equal(CalibrationIds.SpanPoint, session.State.Next!.Role);
        Assert.Empty(session.State.Points);
        Assert.Contains(session.State.Steps, done => done.Step == "prepare");
        Assert.DoesNotContain(session.State.Steps, done => done.Step == "point-span");
    }

    private static CalibrationRecord Finish(Bench bench, CalibrationSetup setup, bool kill)
    {
        using CalibrationLogStore log = bench.Log();
        CalibrationSession session = CalibrationSession.Begin(setup, bench.Data, log, bench.Time, false, _ => { });
        while (session.State.Next != null)
        {
            string next = session.State.Next.Id;
            if (kill)
            {
                // What was in memory is gone; the file is all there is.
                session = CalibrationSession.Begin(setup, bench.Data, log, bench.Time, false, _ => { });
            }

            Assert.Equal(next, session.State.Next!.Id);
            Do(session, setup, bench);
        }

        if (kill)
        {
            session = CalibrationSession.Begin(setup, bench.Data, log, bench.Time, false, _ => { });
        }

        return session.Finish(Bench.Version).Record;
    }

    private static void Do(CalibrationSession session, CalibrationSetup setup, Bench bench)
    {
        bench.Time.Advance(TimeSpan.FromMinutes(1));
        ProcedureStep step = session.State.Next!;
        if (step.Role != null)
        {
            TemperatureCoefficient.Factor(
                TemperatureCoefficientForm.Arrhenius, 22_000, 25, 2, 38, KnownProbe.Celsius, RangeRule.Refuse, out double gain);
            double signal = KnownProbe.Zero + (KnownProbe.Slope * gain * MethodBench.Truth(setup, step));
            RecordedStatistics once = new()
            {
                Count = 30,
                Mean = signal,
                StandardDeviation = 0.01,
                SlopePerMinute = 0,
                SlopeStandardErrorPerMinute = 0.001,
                Minimum = signal - 0.02,
                Maximum = signal + 0.02,
                WindowSeconds = 180,
            };
            TakenReading reading = new()
            {
                Role = step.Role,
                FirstUtc = bench.Time.GetUtcNow().AddMinutes(-3),
                LastUtc = bench.Time.GetUtcNow(),
                Typed = false,
                Signal = once,
                SignalStandardUncertainty = 0.005,
                TemperatureStatistics = once with { Mean = KnownProbe.Celsius },
                TemperatureCelsius = KnownProbe.Celsius,
                TemperatureSource = "line",
                TemperatureStandardUncertaintyKelvin = 0.03,
                PressureHectopascal = KnownProbe.Pressure,
            };
            session.Take(step, PointMaker.Make(reading, setup.PlannedFor(step.Role), setup));
        }
        else if (step.Kind == Station.Calibrating.StepKind.Droplets)
        {
            session.TakeDroplets(step, Droplets.NoneSeen);
        }
        else
        {
            session.Done(step, "noted");
        }
    }
}
