using System.Linq;
using Mono.Cecil;
using ProbeCal.Nano.Tests.Campaign;
using ProbeCal.Nano.Tests.Fixtures;
using ProbeCal.Nano.Tests.Interpreter;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Nano.Tests;

/// <summary>The device gives what the desktop gives, or refuses where the desktop refuses, for every public function of Core.</summary>
public class CampaignTests(CampaignRun run, ITestOutputHelper output) : IClassFixture<CampaignRun>
{
    [Fact]
    public void The_device_agrees_with_the_desktop_bit_for_bit()
    {
        output.WriteLine(run.Summary());
        Assert.All(run.Reports, report => Assert.True(report.Mismatches == 0, $"{report.Mismatches} of {report.Inputs} (seed {Seed.Value}); first: {report.FirstMismatch}"));
    }

    [Fact]
    public void Without_deviations_the_interpreter_agrees_with_the_desktop_on_Core_too()
    {
        var driver = new Driver(new Machine(DeviceAssembly.Nano.MainModule.GetTypes(), Deviations.None));
        foreach (Member member in Surface.Members().Where(m => !Generator.Unknown(m.Device).Any()))
        {
            MemberReport report = driver.Drive(member, 1000);
            Assert.True(report.Mismatches == 0, $"{report.Mismatches} of {report.Inputs} (seed {Seed.Value}); first: {report.FirstMismatch}");
        }
    }

    [Theory]
    [InlineData(nameof(Unguarded.Quotient))]
    [InlineData(nameof(Unguarded.Selected))]
    [InlineData(nameof(Unguarded.Equality))]
    [InlineData(nameof(Unguarded.Whole))]
    [InlineData(nameof(Unguarded.Cast))]
    public void Code_that_would_go_wrong_on_the_device_is_noticed(string name)
    {
        TypeDefinition[] program = [DeviceAssembly.Tests.MainModule.GetType("ProbeCal.Nano.Tests.Fixtures.Unguarded")];
        var member = new Member(name, program[0].Methods.Single(m => m.Name == name), typeof(Unguarded).GetMethod(name)!);
        Assert.Equal(0, new Driver(new Machine(program, Deviations.None)).Drive(member, 10_000).Mismatches);
        Assert.NotEqual(0, new Driver(new Machine(program, Deviations.All)).Drive(member, 10_000).Mismatches);
    }

    [Fact]
    public void Every_public_function_is_driven_with_the_full_number_of_inputs()
    {
        Assert.True(run.NotDriven.Count == 0, "no inputs for (add a range to InputRanges, or a kind to Generator):\n" + string.Join("\n", run.NotDriven));
        Assert.Equal(Surface.Members().Count, run.Reports.Count);
        Assert.All(run.Reports.Where(r => r.Inputs != 1), report => Assert.Equal(run.InputsPerMember, report.Inputs));
    }

    [Fact]
    public void Values_are_finite_with_Ok_and_NaN_with_a_refusal()
    {
        string[] contradictions = run.Reports.Where(r => r.FirstContradiction != null).Select(r => r.FirstContradiction!).ToArray();
        Assert.True(contradictions.Length == 0, string.Join("\n", contradictions));
    }

    [Fact]
    public void Every_method_of_the_device_assembly_was_reached()
    {
        Assert.True(run.NeverCalled.Count == 0, string.Join("\n", run.NeverCalled));
    }

    [Fact]
    public void Every_function_answered_often_enough_to_be_compared()
    {
        string[] seldom = run.Reports.Where(r => r.Inputs > 1 && r.Answered < r.Inputs / 20).Select(r => $"{r.Name}: {r.Answered} of {r.Inputs}").ToArray();
        Assert.True(seldom.Length == 0, string.Join("\n", seldom));
    }
}
