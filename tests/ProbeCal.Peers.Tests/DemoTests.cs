using System;
using System.Globalization;
using System.Linq;
using System.Text.RegularExpressions;
using System.Threading.Tasks;
using ProbeCal.Peers.Tests.Parts;
using Xunit;

namespace ProbeCal.Peers.Tests;

/// <summary>The first thing that a new person runs.</summary>
public class DemoTests
{
    private static readonly TimeSpan Deadline = TimeSpan.FromMinutes(3);

    [Fact]
    public async Task Demo_does_the_whole_job_and_ends_by_itself()
    {
        using OutsideProcess demo = Programs.ProbeCal(["demo", "--readings", "12"]);
        Assert.True(await demo.ExitCodeAsync(Deadline) == 0, demo.Tail());

        Match[] rows = [.. demo.Output().Select(static line => Regex.Match(line, @"^\d\d:\d\d:\d\d .* (\d+\.\d\d) ± (\d+\.\d\d)  (\d+\.\d\d)  \d+\.\d  1 pass$")).Where(static row => row.Success)];
        Assert.Equal(12, rows.Length);
        Assert.All(rows, static row => Assert.InRange(Number(row, 1), Number(row, 3) - Number(row, 2), Number(row, 3) + Number(row, 2)));
        Assert.Contains(demo.Output(), static line => line.Contains("SIMULATED", StringComparison.Ordinal));
        Assert.Contains(demo.Output(), static line => line.Contains("PASS", StringComparison.Ordinal));
    }

    [SkippableFact]
    public async Task Sigterm_ends_the_demo_in_order()
    {
        Skip.If(OperatingSystem.IsWindows(), "there is no SIGTERM");
        using OutsideProcess demo = Programs.ProbeCal(["demo", "--readings", "100000"]);
        await demo.WaitForOutputAsync(static lines => lines.Count(static line => line.EndsWith("1 pass", StringComparison.Ordinal)) >= 3, "three readings", Deadline);
        Assert.True(await demo.TerminateAsync(Deadline) == 0, demo.Tail());
        Assert.Contains(demo.Output(), static line => line.StartsWith("The demo has ended", StringComparison.Ordinal));
        Assert.DoesNotContain(demo.Error(), static line => line.Contains("Unhandled", StringComparison.Ordinal));
    }

    private static double Number(Match row, int group)
    {
        return double.Parse(row.Groups[group].Value, CultureInfo.InvariantCulture);
    }
}
