using System;
using System.Globalization;
using System.IO;
using System.IO.Ports;
using System.Linq;
using System.Net.Sockets;
using System.Threading;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>probecal simulate</c> as others call it.</summary>
public sealed class SimulateTests : IDisposable
{
    private static readonly TimeSpan Deadline = TimeSpan.FromSeconds(30);

    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-simulate-").FullName;

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
    }

    [Fact]
    public async Task Standard_output_carries_lines_and_nothing_else()
    {
        Run run = await Run.OfAsync("simulate", "--count", "5", "--faster", "0", "--altitude", "640m");
        Assert.Equal(0, run.ExitCode);
        string[] lines = run.Output.TrimEnd('\n').Split('\n');
        Assert.Equal(5, lines.Length);
        foreach (string line in lines)
        {
            string[] fields = line.Split(',');
            Assert.Equal(4, fields.Length);
            Assert.True(DateTimeOffset.TryParseExact(fields[0], "yyyy-MM-ddTHH:mm:ss.FFFFFFF'Z'", CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal, out _), fields[0]);
            // 938.7 hPa: U.S. Standard Atmosphere 1976 at 640 m, and up to 0.5 hPa of the simulated barometer.
            Assert.InRange(double.Parse(fields[3], CultureInfo.InvariantCulture), 938.2, 939.8);
        }

        Assert.Contains("nothing here is measured", run.Error, StringComparison.Ordinal);
        Assert.Contains("pressure: hPa unless the line gives a unit", run.Error, StringComparison.Ordinal);
        Assert.EndsWith("5 simulated lines written\n", run.Error.ReplaceLineEndings("\n"), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Truth_stands_beside_each_line()
    {
        string truth = Path.Combine(_folder, "truth.csv");
        Run run = await Run.OfAsync("simulate", "--duration", "10min", "--rate", "6/min", "--faster", "0", "--phase", "air-saturated-water", "--truth", truth, "--line", "{signal};{time}");
        Assert.Equal(0, run.ExitCode);
        string[] lines = run.Output.TrimEnd('\n').Split('\n');
        string[] rows = await File.ReadAllLinesAsync(truth);
        Assert.Equal("# format: probecal-truth/1", rows[0]);
        Assert.StartsWith("sequence,timeUtc,phase,", rows[1], StringComparison.Ordinal);
        Assert.Equal(60, lines.Length);
        Assert.Equal(62, rows.Length);
        for (int i = 0; i < lines.Length; i++)
        {
            string[] row = rows[i + 2].Split(',');
            Assert.Equal((i.ToString(CultureInfo.InvariantCulture), lines[i].Split(';')[1]), (row[0], row[1]));
            // Noise of 0.03 nA: five standard deviations and the lag of what little changes in ten minutes.
            double settled = double.Parse(row[9], CultureInfo.InvariantCulture);
            Assert.InRange(double.Parse(lines[i].Split(';')[0], CultureInfo.InvariantCulture) - settled, -0.16, 0.16);
        }
    }

    [Fact]
    public async Task Same_seed_gives_the_same_signals_in_every_culture()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            string[] arguments = ["simulate", "--count", "50", "--faster", "0", "--seed", "7", "--phase", "air-saturated-water", "--line", "{signal} {temperature}"];
            Run first = await Run.OfAsync(arguments);
            CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo("de-DE");
            Run second = await Run.OfAsync(arguments);
            Assert.Equal(first.Output, second.Output);
            Run other = await Run.OfAsync([.. arguments[..6], "8", .. arguments[7..]]);
            Assert.NotEqual(first.Output, other.Output);
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Theory]
    [InlineData("--pressure 760", "probecal: --pressure 760: a pressure carries its unit; write for example 760mmHg or 1013.25hPa (units: hPa, mbar, kPa, Pa, bar, atm, mmHg, Torr, inHg, psi)")]
    [InlineData("--temperature 8,3", "probecal: --temperature 8,3: a comma is no decimal mark here; write 8.3")]
    [InlineData("--temperature NaN", "probecal: --temperature NaN: NaN and infinity are no values here; write a finite number, for example 8.3")]
    [InlineData("--temperature 68", "probecal: simulate temperature 68 C: simulated water is from 1 to 38 C, so that day and night stay within the equations")]
    [InlineData("--altitude 640", "probecal: --altitude 640: an altitude carries its unit; write for example 640m or 2100ft (units: m, ft, km)")]
    [InlineData("--altitude 40000m", "probecal: --altitude 40000m: the standard atmosphere is used from -610 to 11000 m")]
    [InlineData("--altitude 640m --pressure 940hPa", "probecal: --pressure and --altitude: the one gives the other; leave one out")]
    [InlineData("--phase lke", "probecal: --phase lke: there is no place lke (did you mean lake?); the places are lake, lake-still, air-saturated-water, air, zero")]
    [InlineData("--rate 1", "probecal: --rate 1: a rate carries its unit; write for example 1Hz or 6/min (units: Hz, mHz, kHz, /min, /h)")]
    [InlineData("--faster -1", "probecal: --faster -1: this takes 0 or a number above it, for example 60")]
    [InlineData("--count 0", "probecal: --count 0: this takes a whole number from 1 to 9223372036854775807")]
    [InlineData("--line {sginal}", "probecal: --line {sginal}: there is no field {sginal} (did you mean signal?); the fields are time, date, signal, temperature, pressure, salinity, skip, and {} skips one")]
    [InlineData("--pty a --tcp 1", "probecal: --pty and --tcp: the lines go to one place; leave one out")]
    public async Task Wrong_input_is_one_line_and_exit_2(string arguments, string message)
    {
        Run run = await Run.OfAsync(["simulate", .. arguments.Split(' ')]);
        Assert.Equal((2, "", message), (run.ExitCode, run.Output, run.ErrorLine));
    }

    [Fact]
    public async Task Stop_ends_the_stream_with_exit_0()
    {
        using CancellationTokenSource stop = new();
        SignallingWriter output = new();
        Task<int> running = Program.RunAsync(["simulate", "--rate", "100Hz"], TerminalWith(output, TextWriter.Null, stop.Token));
        await output.FirstLine.WaitAsync(Deadline);
        await stop.CancelAsync();
        Assert.Equal(0, await running.WaitAsync(Deadline));
    }

    [SkippableFact]
    public async Task Pseudo_terminal_is_a_serial_port_to_others()
    {
        Skip.IfNot(OperatingSystem.IsLinux(), "pseudo-terminals are made on Linux only");
        string link = Path.Combine(_folder, "probe");
        using CancellationTokenSource stop = new();
        SignallingWriter error = new();
        Task<int> running = Program.RunAsync(["simulate", "--rate", "100Hz", "--pty", link], TerminalWith(TextWriter.Null, error, stop.Token));
        await error.FirstLine.WaitAsync(Deadline);
        using (SerialPort port = new(link, 9600) { ReadTimeout = (int)Deadline.TotalMilliseconds, NewLine = "\r\n" })
        {
            port.Open();
            Assert.Equal([4, 4, 4], Enumerable.Range(0, 3).Select(_ => port.ReadLine().Split(',').Length));
        }

        await stop.CancelAsync();
        Assert.Equal(0, await running.WaitAsync(Deadline));
        Assert.Null(new FileInfo(link).LinkTarget);
    }

    [Fact]
    public async Task Tcp_serves_whoever_connects()
    {
        using CancellationTokenSource stop = new();
        SignallingWriter error = new();
        Task<int> running = Program.RunAsync(["simulate", "--rate", "100Hz", "--tcp", "0"], TerminalWith(TextWriter.Null, error, stop.Token));
        string said = await error.FirstLine.WaitAsync(Deadline);
        int port = int.Parse(said[(said.LastIndexOf(':') + 1)..], CultureInfo.InvariantCulture);
        using (TcpClient client = new())
        {
            await client.ConnectAsync("127.0.0.1", port).WaitAsync(Deadline);
            using StreamReader reader = new(client.GetStream());
            for (int i = 0; i < 3; i++)
            {
                Assert.Equal(4, (await reader.ReadLineAsync().WaitAsync(Deadline))!.Split(',').Length);
            }
        }

        await stop.CancelAsync();
        Assert.Equal(0, await running.WaitAsync(Deadline));
    }

    private static Terminal TerminalWith(TextWriter output, TextWriter error, CancellationToken stop)
    {
        return new Terminal { Input = TextReader.Null, Output = output, Error = error, Time = TimeProvider.System, Stop = stop };
    }

    /// <summary>Tells when the first line has been written to it, and which.</summary>
    private sealed class SignallingWriter : StringWriter
    {
        private readonly TaskCompletionSource<string> _firstLine = new(TaskCreationOptions.RunContinuationsAsynchronously);

        internal SignallingWriter() : base(CultureInfo.InvariantCulture)
        {
        }

        internal Task<string> FirstLine => _firstLine.Task;

        public override void WriteLine(string? value)
        {
            base.WriteLine(value);
            _firstLine.TrySetResult(value ?? "");
        }

        public override async Task WriteAsync(string? value)
        {
            await base.WriteAsync(value);
            _firstLine.TrySetResult(value ?? "");
        }
    }
}
