using System;
using System.Diagnostics;
using System.IO;
using System.Linq;
using System.Text;
using System.Threading.Tasks;
using ProbeCal.Peers.Tests.Parts;
using Xunit;

namespace ProbeCal.Peers.Tests;

/// <summary>A whole file on the real program: pulled plug, pipes.</summary>
public sealed class WholeFileTests
{
    private const int Rows = 50_000;

    private static readonly TimeSpan Deadline = StationSite.Deadline;

    /// <summary>The program is killed outright while it writes: the old output is whole, and the next run makes the new one.</summary>
    [Fact]
    public async Task Pulled_plug_leaves_the_old_output_whole()
    {
        using TemporaryFolder folder = new();
        string pipe = folder["season.csv"], output = folder["result.csv"];
        await File.WriteAllTextAsync(output, "the old one\n");
        using (Process made = Process.Start("mkfifo", [pipe]))
        {
            await made.WaitForExitAsync();
            Assert.Equal(0, made.ExitCode);
        }

        string[] command = ["equilibrium", "--input", pipe, "--output", output, "--force", "--column", "temperature=T [C]", "--salinity", "0", "--pressure", "938hPa"];
        byte[] rows = Encoding.ASCII.GetBytes("T\n" + string.Concat(Enumerable.Repeat("12.5\n", Rows)));
        using (OutsideProcess program = Programs.ProbeCal(command))
        {
            await using FileStream writer = new(pipe, FileMode.Open, FileAccess.Write);
            // Five bytes a row, and a pipe holds 64 KB: when this returns most rows are computed and have left the buffers.
            await writer.WriteAsync(rows);
            await writer.FlushAsync();
            string partial = Assert.Single(Directory.GetFiles(folder.Path, "*.partial"));
            Assert.True(1_000_000 < new FileInfo(partial).Length, "nothing had reached the disk");
            await program.KillAsync();
        }

        Assert.Equal("the old one\n", await File.ReadAllTextAsync(output));

        File.Delete(pipe);
        await File.WriteAllBytesAsync(pipe, rows);
        using OutsideProcess again = Programs.ProbeCal(command);
        Assert.Equal(0, await again.ExitCodeAsync(Deadline));
        Assert.Equal(Rows + 1, File.ReadLines(output).Count());
        Assert.EndsWith(",ok", File.ReadLines(output).Last(), StringComparison.Ordinal);
    }

    /// <summary>
    /// The file system takes no more of the output: no space is left on standard output, or the file is larger than it may be (here by a limit of the process). One line,
    /// the old output whole, nothing left beside it.
    /// </summary>
    [Fact]
    public async Task Full_disk_leaves_the_old_output_whole()
    {
        using TemporaryFolder folder = new();
        string input = folder["season.csv"], output = folder["result.csv"];
        await File.WriteAllTextAsync(input, "T\n" + string.Concat(Enumerable.Repeat("12.5\n", Rows)));
        await File.WriteAllTextAsync(output, "the old one\n");
        string[] line = Programs.CommandLine(["equilibrium", "--input", input, "--output", output, "--force", "--column", "temperature=T [C]", "--salinity", "0", "--pressure", "938hPa"]);
        // The runtime maps its own code through a file, which the limit would meet too.
        using (OutsideProcess limited = OutsideProcess.Start("/bin/sh", ["-c", "trap '' XFSZ; ulimit -f 500; export DOTNET_EnableWriteXorExecute=0; exec \"$@\"", "sh", .. line]))
        {
            Assert.Equal(1, await limited.ExitCodeAsync(Deadline));
            Assert.Equal($"probecal: --output {output}: cannot be written (the file would be larger than its file system takes)", limited.Error()[^1]);
        }

        Assert.Equal("the old one\n", await File.ReadAllTextAsync(output));
        Assert.Equal(2, Directory.GetFiles(folder.Path).Length);

        string[] toOutput = Programs.CommandLine(["equilibrium", "--input", input, "--output", "-", "--column", "temperature=T [C]", "--salinity", "0", "--pressure", "938hPa"]);
        using OutsideProcess full = OutsideProcess.Start("/bin/sh", ["-c", "\"$@\" > /dev/full", "sh", .. toOutput]);
        Assert.Equal(1, await full.ExitCodeAsync(Deadline));
        Assert.StartsWith("probecal: the system refused to read or write: ", full.Error()[^1], StringComparison.Ordinal);
    }

    [Fact]
    public async Task Dashes_read_and_write_the_standard_streams()
    {
        string[] line = Programs.CommandLine(["equilibrium", "--input", "-", "--output", "-", "--column", "temperature=T", "--salinity", "0", "--altitude", "640m"]);
        using OutsideProcess shell = OutsideProcess.Start("/bin/sh", ["-c", "printf 'T;x\\n12.5;1\\n;2\\n' | \"$@\"", "sh", .. line]);
        Assert.Equal(0, await shell.ExitCodeAsync(Deadline));
        Assert.Equal(3, shell.Output().Count);
        Assert.StartsWith("12.5;1;", shell.Output()[1], StringComparison.Ordinal);
        Assert.EndsWith(";refused: temperature missing", shell.Output()[2], StringComparison.Ordinal);
        Assert.Contains("2 rows: 1 computed, 1 refused", shell.Error());
    }
}
