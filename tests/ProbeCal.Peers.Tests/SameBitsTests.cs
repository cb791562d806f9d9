using System;
using System.Collections.Generic;
using System.IO;
using System.Threading.Tasks;
using ProbeCal.Peers.Tests.Parts;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Peers.Tests;

/// <summary>Core gives the same bits whatever instructions the machine has.</summary>
public class SameBitsTests(ITestOutputHelper output)
{
    private const string Program = "ProbeCal.SameBits.dll";

    /// <summary>Set by tests/run.sh: the folder of the program published for linux-arm64.</summary>
    private const string Arm64Variable = "PROBECAL_ARM64";

    private static readonly TimeSpan Deadline = TimeSpan.FromMinutes(4);

    [Theory]
    [InlineData("DOTNET_EnableAVX512", "0")]
    [InlineData("DOTNET_EnableAVX2", "0")]
    [InlineData("DOTNET_EnableHWIntrinsic", "0")]
    [InlineData("DOTNET_TieredCompilation", "0")]
    [InlineData("DOTNET_JITMinOpts", "1")]
    public async Task Vector_width_and_optimiser_do_not_change_a_bit(string variable, string value)
    {
        Dictionary<string, string> changed = new() { [variable] = value };
        Assert.Equal(await HereAsync([]), await HereAsync(changed));
    }

    [SkippableFact]
    public async Task Arm64_gives_the_bits_of_x64()
    {
        string? emulator = Programs.Find("qemu-aarch64");
        string? folder = Environment.GetEnvironmentVariable(Arm64Variable);
        Skip.If(emulator is null, "qemu-aarch64 is not installed");
        Skip.If(folder is null || !File.Exists(Path.Combine(folder, "ProbeCal.SameBits")), Arm64Variable + " names no program published for linux-arm64 (tests/run.sh makes one)");
        // The emulator does not take pages that are writable and executable in turn.
        using OutsideProcess arm = OutsideProcess.Start(
            emulator, ["-L", "/usr/aarch64-linux-gnu", "-E", "DOTNET_EnableWriteXorExecute=0", Path.Combine(folder, "ProbeCal.SameBits")]);
        string there = await ResultAsync(arm);
        Assert.Contains(arm.Error(), static line => line.StartsWith("Arm64", StringComparison.Ordinal));
        Assert.Equal(await HereAsync([]), there);
    }

    private async Task<string> HereAsync(Dictionary<string, string> environment)
    {
        using OutsideProcess here = OutsideProcess.Start(Programs.Find("dotnet")!, [Path.Combine(AppContext.BaseDirectory, Program)], environment);
        return await ResultAsync(here);
    }

    private async Task<string> ResultAsync(OutsideProcess program)
    {
        Assert.True(await program.ExitCodeAsync(Deadline) == 0, program.Tail());
        output.WriteLine("campaign: same bits on " + program.Error()[0]);
        Assert.Equal(5, program.Output().Count);
        Assert.Equal("self-check True", program.Output()[0]);
        return string.Join('\n', program.Output());
    }
}
