using System;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary>Command lines that cannot be read: one line that says what would be right.</summary>
public sealed class UsageTests
{
    [Theory]
    [InlineData("equilibirum --temperature 20", "there is no command 'equilibirum' (did you mean equilibrium?)", "'probecal --help'")]
    [InlineData("equilibrium --temperature 20 --salinity 0 --presure 760mmHg", "there is no option --presure (did you mean --pressure?)", "'probecal equilibrium --help'")]
    [InlineData("equilibrium --temperature 20 --salinity 0 --pressure 760 mmHg", "'mmHg' is not understood there; a value with blanks in it wants quotes", "'probecal equilibrium --help'")]
    [InlineData("calibrations", "name a command: list, show", "'probecal calibrations --help'")]
    [InlineData("calibrations shwo", "(did you mean show?)", "'probecal calibrations --help'")]
    [InlineData("calibrations show", "ID", "'probecal calibrations show --help'")]
    public async Task WrongCommandLine_IsOneLineWithTheNearestName(string line, string says, string help)
    {
        Run run = await Run.OfAsync(line.Split(' '));
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.StartsWith("probecal: ", run.ErrorLine, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', run.ErrorLine);
        Assert.Contains(says, run.ErrorLine, StringComparison.Ordinal);
        Assert.Contains(help, run.ErrorLine, StringComparison.Ordinal);
    }

    [Fact]
    public async Task NothingGiven_ShowsTheCommands()
    {
        Run run = await Run.OfAsync();
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.Contains("equilibrium", run.Error, StringComparison.Ordinal);
        Assert.Contains("probecal calibrate ", run.Error, StringComparison.Ordinal);
        Assert.DoesNotContain("Examples", run.Error, StringComparison.Ordinal);
    }
}
