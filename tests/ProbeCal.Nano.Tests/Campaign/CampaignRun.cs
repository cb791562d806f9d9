using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using Mono.Cecil;
using ProbeCal.Nano.Tests.Interpreter;

namespace ProbeCal.Nano.Tests.Campaign;

/// <summary>
/// Every public function of Core, called with the same inputs on the desktop and in the interpreter with all deviations on.
/// Run once and shared by the tests that look at it.
/// </summary>
public sealed class CampaignRun
{
    private const int OrdinaryInputs = 10_000;
    private const int FullInputs = 100_000;

    public CampaignRun()
    {
        InputsPerMember = Environment.GetEnvironmentVariable("PROBECAL_FULL") == "1" ? FullInputs : OrdinaryInputs;
        var machine = new Machine(DeviceAssembly.Nano.MainModule.GetTypes(), Deviations.All);
        var driver = new Driver(machine);
        long start = Stopwatch.GetTimestamp();
        foreach (Member member in Surface.Members())
        {
            List<string> unknown = Generator.Unknown(member.Device).ToList();
            if (unknown.Count > 0)
            {
                NotDriven.Add(member.Name + ": " + string.Join(", ", unknown));
            }
            else
            {
                Reports.Add(driver.Drive(member, InputsPerMember));
            }
        }
        Seconds = Stopwatch.GetElapsedTime(start).TotalSeconds;
        NeverCalled = DeviceAssembly.Nano.MainModule.GetTypes().Where(t => t.BaseType?.FullName != "System.Attribute")
            .SelectMany(t => t.Methods).Where(m => m.HasBody && !machine.WasCalled(m) && !FillsSteps(m)).Select(m => m.DeclaringType.Name + "." + m.Name).ToList();
        if (Environment.GetEnvironmentVariable("PROBECAL_LOG_DIR") is { Length: > 0 } folder)
        {
            Directory.CreateDirectory(folder);
            File.WriteAllText(Path.Combine(folder, "device-campaign.log"), Summary());
        }
    }

    /// <summary>10,000 in the ordinary run; ten times as many with PROBECAL_FULL=1.</summary>
    public int InputsPerMember { get; }

    public double Seconds { get; }

    internal List<MemberReport> Reports { get; } = [];

    /// <summary>Members for whose parameters no values are known.</summary>
    public List<string> NotDriven { get; } = [];

    /// <summary>Methods of the device assembly that no input reached.</summary>
    public List<string> NeverCalled { get; }

    /// <summary>The steps of a computation are the desktop's: what fills them is compiled there only.</summary>
    private static bool FillsSteps(MethodDefinition method)
    {
        return method.DeclaringType.Name == "CalculationSteps" || method.CustomAttributes.Any(a => a.AttributeType.Name == "ConditionalAttribute");
    }

    public string Summary()
    {
        var text = new StringBuilder();
        text.Append(CultureInfo.InvariantCulture, $"{Reports.Count} members, {Reports.Sum(r => (long)r.Inputs)} inputs ({InputsPerMember} each), seed {Seed.Value}, {Seconds:F1} s, {Reports.Sum(r => r.Mismatches)} mismatches\n");
        foreach (MemberReport report in Reports)
        {
            text.Append(CultureInfo.InvariantCulture, $"{report.Name}: {report.Answered} answered, {report.Refused} refused\n");
        }
        return text.ToString();
    }
}
