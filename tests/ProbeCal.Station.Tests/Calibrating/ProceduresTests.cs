using System;
using System.Collections.Generic;
using System.Linq;
using System.Text.RegularExpressions;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>
/// The guided procedures: every combination of method, further levels, zero, purpose, kind of reading and probe obeys the rules of order, has the caution where the hazard is, and names where its numbers come from.
/// </summary>
public class ProceduresTests
{
    private static readonly string[] Models = ["amperometric", "meter-display", "stern-volmer", "uchida-2008", "bittig-2018", "severinghaus", "total-gas", "linear", "quadratic"];

    /// <summary>What a text speaks of, and the caution that must stand with it in the same step.</summary>
    private static readonly (string Hazard, Regex Speaks, Regex Caution)[] Hazards =
    [
        ("sulfite", Word("sulfite|zero solution"), Word("sulfite irritates")),
        ("cylinder gas", Word(@"cylinder (?!pressure)|let the gas|keep the gas flowing"), Word("suffocates")),
        ("alkaline iodide", Word("alkaline iodide"), Word("caustic")),
        ("acid", Word("acid"), Word("acid burns")),
        ("samples at the water", Word("draw \\d|hang both"), Word("lifejacket")),
        ("mains beside water", Word("blow outdoor air"), Word("residual-current")),
    ];

    [Fact]
    public void EveryMethod_HasItsPointAndItsPreparation()
    {
        foreach (string method in MethodIds.All)
        {
            CalibrationSetup setup = Setup(method);
            IReadOnlyList<ProcedureStep> steps = Procedures.For(setup);
            ProcedureStep point = Assert.Single(steps, static step => step.Kind == Station.Calibrating.StepKind.Point && step.Role == "span");
            Assert.True(2 <= Index(steps, point), method + ": nothing prepares the point");
            Assert.NotEmpty(point.Do);
            Assert.NotEmpty(point.LookFor);
            Assert.True(0 < point.LeastMinutes, method + ": no wait");
        }
    }

    [Fact]
    public void EveryCombination_KeepsTheOrder()
    {
        int combinations = 0;
        foreach (CalibrationSetup setup in Combinations())
        {
            combinations++;
            string name = Name(setup);
            IReadOnlyList<ProcedureStep> steps = Procedures.For(setup);
            Assert.True(steps.Select(static step => step.Id).Distinct().Count() == steps.Count, name + ": an id is there twice: " + string.Join(", ", steps.Select(static step => step.Id)));

            // Every planned point once, and none that nobody planned but the one as left.
            List<string> planned = [.. setup.Plan.Select(static point => point.Role)];
            bool calibrates = setup.Purpose == CalibrationRecord.CalibrationPurpose;
            bool hasLevel = setup.Plan.Any(static point => !MethodIds.IsZero(point.Method));
            if (calibrates && hasLevel)
            {
                planned.Add("as-left");
            }

            List<string?> roles = [.. steps.Where(static step => step.Kind == Station.Calibrating.StepKind.Point).Select(static step => step.Role)];
            Assert.True(planned.Order().SequenceEqual(roles.Order()), name + ": points " + string.Join(", ", roles));

            int lastLevel = Last(steps, step => IsLevel(setup, step));
            int firstZero = First(steps, step => step.Kind == Station.Calibrating.StepKind.Point && IsZero(setup, step));
            int asLeft = First(steps, static step => step.Role == "as-left");
            int firstPoint = First(steps, static step => step.Kind == Station.Calibrating.StepKind.Point);
            Assert.True(steps[0].Id == "prepare" && 0 < firstPoint, name + ": preparation first");
            Assert.True(asLeft < 0 || lastLevel < asLeft, name + ": as left comes after every level");
            if (hasLevel)
            {
                Assert.True(steps[firstPoint].Role == "span", name + ": the 100 % point first");
            }

            if (firstZero < 0)
            {
                continue;
            }

            Assert.True(lastLevel < firstZero, name + ": 100 % before zero");
            if (asLeft >= 0)
            {
                Assert.True((setup.ZeroPlan == CalibrationIds.ZeroCheck) == (asLeft < firstZero), name + ": a zero that adjusts before the point as left, one that checks after it");
            }

            if (setup.Plan.Any(static point => point.Method == MethodIds.ZeroSolution))
            {
                int zero = Last(steps, step => step.Kind == Station.Calibrating.StepKind.Point && MethodOf(setup, step) == MethodIds.ZeroSolution);
                int rinse = First(steps, static step => step.Id == "rinse");
                int other = First(steps, static step => step.Id == "other-sensors");
                int opened = First(steps, static step => step.Id.StartsWith("zero-solution", StringComparison.Ordinal));
                Assert.True(zero < rinse, name + ": rinse after the zero solution");
                Assert.True(asLeft < 0 || asLeft < firstZero || rinse < asLeft, name + ": rinse before 100 % again");
                Assert.True(0 <= other && other < opened && other < firstPoint, name + ": other sensors before the zero solution is opened");
                Assert.True(opened < zero, name + ": the solution is made before it is used");
            }

            if (hasLevel)
            {
                int again = Math.Max(asLeft, First(steps, static step => step.Id == "again-at-100"));
                Assert.True(firstZero < again, name + ": 100 % is looked at again after a zero");
            }
        }

        Assert.True(4000 < combinations, $"only {combinations} combinations");
    }

    [Fact]
    public void Droplets_AreLookedForAfterHumidAir_AndNowhereElse()
    {
        foreach (CalibrationSetup setup in Combinations())
        {
            IReadOnlyList<ProcedureStep> steps = Procedures.For(setup);
            int looks = steps.Count(static step => step.Kind == Station.Calibrating.StepKind.Droplets);
            int air = First(steps, step => step.Role != "as-left" && step.Kind == Station.Calibrating.StepKind.Point && MethodOf(setup, step) == MethodIds.WaterSaturatedAir);
            bool needed = air >= 0 && setup.Probe.Model != "total-gas";
            Assert.True(looks == (needed ? 1 : 0), Name(setup) + $": {looks} looks for droplets");
            Assert.True(!needed || steps[air + 1].Kind == Station.Calibrating.StepKind.Droplets, Name(setup) + ": the look comes right after the point");
        }
    }

    [Fact]
    public void EveryCaution_StandsWhereItsHazardIs()
    {
        HashSet<string> met = [];
        foreach (CalibrationSetup setup in Combinations())
        {
            foreach (ProcedureStep step in Procedures.For(setup))
            {
                string text = string.Join(' ', step.Do);
                string cautions = string.Join(' ', step.Cautions);
                foreach ((string hazard, Regex speaks, Regex caution) in Hazards)
                {
                    if (speaks.IsMatch(text))
                    {
                        met.Add(hazard);
                        Assert.True(caution.IsMatch(cautions), $"{Name(setup)}, step {step.Id} speaks of {hazard} without a caution: {text}");
                    }
                }
            }
        }

        Assert.Equal(Hazards.Select(static hazard => hazard.Hazard).Order(), met.Order());
    }

    [Theory]
    [InlineData(Gas.Hydrogen, "burns and can explode", true)]
    [InlineData(Gas.Methane, "burns and can explode", true)]
    [InlineData(Gas.CarbonMonoxide, "poisonous", true)]
    [InlineData(Gas.HydrogenSulfide, "poisonous", true)]
    [InlineData(Gas.CarbonDioxide, "burns and can explode", false)]
    [InlineData(Gas.Nitrogen, "poisonous", false)]
    public void GasOfACylinder_HasItsOwnCaution(Gas gas, string says, bool expected)
    {
        CalibrationSetup setup = Setup(MethodIds.GasMixture) with { Gas = gas };
        ProcedureStep point = Procedures.For(setup).Single(static step => step.Role == "span");
        Assert.Equal(expected, point.Cautions.Any(caution => caution.Contains(says, StringComparison.Ordinal)));
        Assert.Contains(point.Cautions, static caution => caution.Contains("suffocates", StringComparison.Ordinal));
    }

    [Fact]
    public void GasRichInOxygen_HasItsOwnCaution()
    {
        Assert.DoesNotContain(Cautions.Oxygen, Cautions.OfCylinder(Gas.Oxygen, 0.2095));
        Assert.Contains(Cautions.Oxygen, Cautions.OfCylinder(Gas.Oxygen, 0.95));
    }

    /// <summary>A number in a step is a limit, an amount or a wait: it says where it comes from. A wait has a least and, where it has a most, in that order.</summary>
    [Fact]
    public void EveryNumber_NamesItsSource()
    {
        foreach (CalibrationSetup setup in Combinations())
        {
            foreach (ProcedureStep step in Procedures.For(setup))
            {
                bool waits = step.LeastMinutes != null || step.MostMinutes != null;
                bool hasNumber = step.Do.Concat(step.LookFor).Any(static line => Regex.IsMatch(line, @"\d"));
                if (waits || hasNumber)
                {
                    Assert.False(string.IsNullOrWhiteSpace(step.Source), $"{Name(setup)}, step {step.Id} has a number and no source");
                }

                Assert.True(step.LeastMinutes is null or > 0, step.Id);
                Assert.True(step.MostMinutes is null || (step.LeastMinutes is double least && least < step.MostMinutes), step.Id);
            }
        }
    }

    /// <summary>The published waits and limits, once: TM 9-A6.2 (30 min aeration, 5 to 10 min at each point, 0.2 mg/L or 2 %), EPA 841-B-97-003 (15 min), OceanGliders SOP (3 to 5 min of nitrogen), as in the practice notes.</summary>
    [Fact]
    public void WaitsAndLimits_AreThePublishedOnes()
    {
        IReadOnlyList<ProcedureStep> water = Procedures.For(Setup(MethodIds.AirSaturatedWater));
        Assert.Equal(30, Step(water, "aerate").LeastMinutes);
        Assert.Equal((5.0, 10.0), Wait(water, "point-span"));
        Assert.Contains("0.2 mg/L or 2 %", string.Join(' ', Step(water, "point-as-left").LookFor), StringComparison.Ordinal);
        Assert.Equal(15, Step(water, "prepare").LeastMinutes);
        Assert.Equal((5.0, 10.0), Wait(Procedures.For(Setup(MethodIds.WaterSaturatedAir)), "point-span"));
        CalibrationSetup zero = Setup(MethodIds.AirSaturatedWater) with { ZeroPlan = CalibrationIds.ZeroCheck, Plan = [Point("span", MethodIds.AirSaturatedWater), Point("zero", MethodIds.ZeroGas)] };
        Assert.Equal((3.0, 5.0), Wait(Procedures.For(zero), "point-zero"));
        CalibrationSetup solution = Setup(MethodIds.AirSaturatedWater) with { ZeroPlan = CalibrationIds.ZeroCheck };
        Assert.Equal((5.0, 10.0), Wait(Procedures.For(solution), "point-zero"));
        Assert.Contains("about 2 g", string.Join(' ', Step(Procedures.For(solution), "zero-solution").Do), StringComparison.Ordinal);
        Assert.Contains("about 20 g", string.Join(' ', Step(Procedures.For(solution with { ZeroPlan = CalibrationIds.ZeroAdjust }), "zero-solution").Do), StringComparison.Ordinal);
    }

    /// <summary>Plain sentences that any terminal and printer shows, with no mark of the machine they were written on.</summary>
    [Fact]
    public void Texts_ArePlain()
    {
        Regex machine = new(@"[/\\](work|home|root|tmp|usr|Users)\b|[A-Z]:\\|https?:|\t|\{\d|\bNaN\b");
        HashSet<string> lines = [];
        foreach (CalibrationSetup setup in Combinations())
        {
            foreach (ProcedureStep step in Procedures.For(setup))
            {
                lines.UnionWith([step.Title, .. step.Do, .. step.LookFor, .. step.Cautions]);
                lines.UnionWith(new[] { step.WriteDown, step.Source }.OfType<string>());
                Assert.Matches("^[a-z0-9-]+$", step.Id);
                Assert.All(step.Do.Concat(step.LookFor).Concat(step.Cautions), static line => Assert.EndsWith(".", line, StringComparison.Ordinal));
            }
        }

        Assert.All(lines, line => Assert.True(line.All(static c => c is >= ' ' and <= '~'), "not plain: " + line));
        Assert.All(lines, line => Assert.False(machine.IsMatch(line), "a mark of a machine: " + line));
        Assert.All(lines, static line => Assert.True(line.Length <= 240, "too long: " + line));
    }

    /// <summary>A meter is set before it is read as left; a probe on a line is not.</summary>
    [Fact]
    public void Meter_IsSetBeforeItIsReadAgain()
    {
        CalibrationSetup setup = Setup(MethodIds.WaterSaturatedAir);
        Assert.Contains("Set the meter", string.Join(' ', Step(Procedures.For(setup with { Readings = CalibrationIds.Typed }), "point-as-left").Do), StringComparison.Ordinal);
        Assert.DoesNotContain("Set the meter", string.Join(' ', Step(Procedures.For(setup), "point-as-left").Do), StringComparison.Ordinal);
        Assert.DoesNotContain(Procedures.For(setup with { Purpose = CalibrationRecord.CheckPurpose }), static step => step.Role == "as-left");
    }

    /// <summary>Each cylinder is connected once, before its point.</summary>
    [Fact]
    public void EveryCylinder_IsConnected()
    {
        CalibrationSetup setup = Setup(MethodIds.GasMixture) with
        {
            Plan =
            [
                Mixture("span", "CYL-21"), Mixture("level-1", "CYL-10"), Mixture("level-2", "CYL-10"), Mixture("level-3", "CYL-5"),
            ],
        };
        string[] ids = [.. Procedures.For(setup).Select(static step => step.Id)];
        Assert.Equal(["prepare", "cylinder", "point-span", "cylinder-level-1", "point-level-1", "point-level-2", "cylinder-level-3", "point-level-3", "point-as-left"], ids);
    }

    internal static IEnumerable<CalibrationSetup> Combinations()
    {
        string[] levels = [MethodIds.AirSaturatedWater, MethodIds.WaterSaturatedAir, MethodIds.Titration, MethodIds.GasMixture, MethodIds.TransferStandard];
        string?[] zeros = [null, MethodIds.ZeroSolution, MethodIds.ZeroGas];
        string?[] further = [null, .. levels];
        foreach (string span in levels)
        {
            foreach (string? level in further)
            {
                foreach (string? zero in zeros)
                {
                    foreach (string zeroPlan in zero == null ? new[] { CalibrationIds.ZeroKeep } : [CalibrationIds.ZeroCheck, CalibrationIds.ZeroAdjust])
                    {
                        List<PlannedPoint> plan = [Point("span", span)];
                        if (level != null)
                        {
                            plan.Add(Point("level-1", level));
                        }

                        if (zero != null)
                        {
                            // Wherever a zero stands in the plan, it comes last but for what follows it.
                            plan.Insert(plan.Count - 1, Point("zero", zero));
                        }

                        foreach (string model in Models)
                        {
                            foreach (string purpose in new[] { CalibrationRecord.CalibrationPurpose, CalibrationRecord.CheckPurpose })
                            {
                                foreach (string readings in new[] { CalibrationIds.Live, CalibrationIds.Typed })
                                {
                                    yield return Bench.Setup with
                                    {
                                        Probe = Bench.Setup.Probe with { Model = model },
                                        Method = span,
                                        Plan = plan,
                                        ZeroPlan = zeroPlan,
                                        Purpose = purpose,
                                        Readings = readings,
                                    };
                                }
                            }
                        }
                    }
                }
            }
        }

        // A check or an adjustment of the zero alone.
        foreach (string zero in new[] { MethodIds.ZeroSolution, MethodIds.ZeroGas })
        {
            yield return Bench.Setup with { Method = zero, Plan = [Point("zero", zero)], ZeroPlan = CalibrationIds.ZeroCheck, Purpose = CalibrationRecord.CheckPurpose };
            yield return Bench.Setup with { Method = zero, Plan = [Point("zero", zero)], ZeroPlan = CalibrationIds.ZeroAdjust };
        }
    }

    private static CalibrationSetup Setup(string method)
    {
        return Bench.Setup with { Method = method };
    }

    private static PlannedPoint Point(string role, string method)
    {
        return new PlannedPoint { Role = role, Method = method };
    }

    private static PlannedPoint Mixture(string role, string cylinder)
    {
        return Point(role, MethodIds.GasMixture) with { Mixture = MixtureText.Parse("--mixture", cylinder + " 10% u 0.1% dry", Gas.Oxygen) };
    }

    private static string Name(CalibrationSetup setup)
    {
        return $"{setup.Purpose} of {setup.Probe.Model}, {setup.Readings}, {string.Join(" + ", setup.Plan.Select(static point => point.Role + " by " + point.Method))}, zero {setup.ZeroPlan}";
    }

    private static string MethodOf(CalibrationSetup setup, ProcedureStep step)
    {
        return setup.PlannedFor(step.Role!).Method;
    }

    private static bool IsZero(CalibrationSetup setup, ProcedureStep step)
    {
        return MethodIds.IsZero(MethodOf(setup, step));
    }

    private static bool IsLevel(CalibrationSetup setup, ProcedureStep step)
    {
        return step.Kind == Station.Calibrating.StepKind.Point && step.Role != "as-left" && !IsZero(setup, step);
    }

    private static int First(IReadOnlyList<ProcedureStep> steps, Predicate<ProcedureStep> match)
    {
        return steps.ToList().FindIndex(match);
    }

    private static int Last(IReadOnlyList<ProcedureStep> steps, Predicate<ProcedureStep> match)
    {
        return steps.ToList().FindLastIndex(match);
    }

    private static int Index(IReadOnlyList<ProcedureStep> steps, ProcedureStep step)
    {
        return steps.ToList().IndexOf(step);
    }

    private static ProcedureStep Step(IReadOnlyList<ProcedureStep> steps, string id)
    {
        return steps.Single(step => step.Id == id);
    }

    private static (double? Least, double? Most) Wait(IReadOnlyList<ProcedureStep> steps, string id)
    {
        ProcedureStep step = Step(steps, id);
        return (step.LeastMinutes, step.MostMinutes);
    }

    private static Regex Word(string pattern)
    {
        return new Regex(pattern, RegexOptions.IgnoreCase | RegexOptions.Compiled);
    }
}
