using System;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Net;
using System.Net.Sockets;
using System.Text.Json;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station;
using Xunit;

namespace ProbeCal.Host.Tests;

public sealed class StationCommandTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-").FullName;
    private readonly StringWriter _output = new();
    private readonly StringWriter _error = new();
    private CancellationTokenSource _stop = new();
    private readonly TaskCompletionSource _firstLine = new(TaskCreationOptions.RunContinuationsAsynchronously);

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
        _stop.Dispose();
    }

    [Fact]
    public async Task Replay_PrintsOnlyReadings_LogsOnStandardError_AndEndsWithZero()
    {
        File.WriteAllText(InFolder("lines.txt"), "100.5,18.2\n\nnonsense\n100.6,18.3\n");
        WriteConfiguration("file:" + InFolder("lines.txt"));

        int exit = await RunAsync("--print");

        Assert.Equal(0, exit);
        string[] lines = _output.ToString().Split('\n', StringSplitOptions.RemoveEmptyEntries);
        Assert.Equal([1, 2], lines.Select(line => JsonDocument.Parse(line).RootElement.GetProperty("sequence").GetInt32()));
        Assert.Contains(" info 2201 station: station pier, probe do-1", _error.ToString());
        Assert.Contains(" warn 2203 station: rejected line 1: ", _error.ToString());
        Assert.Contains(" info 2202 station: stopped: 2 samples and 1 rejected lines journaled", _error.ToString());
    }

    [Fact]
    public async Task WithoutPrint_StandardOutputStaysEmpty()
    {
        File.WriteAllText(InFolder("lines.txt"), "100.5,18.2\n");
        WriteConfiguration("file:" + InFolder("lines.txt"));
        Assert.Equal(0, await RunAsync());
        Assert.Equal("", _output.ToString());
    }

    [Fact]
    public async Task Stop_EndsALiveStreamWithZero_AndNumbersGoOnAtTheNextStart()
    {
        WriteConfiguration("simulated?rate=100Hz");
        Task<int> run = RunAsync("--print");
        await _firstLine.Task.WaitAsync(TimeSpan.FromSeconds(30));
        await _stop.CancelAsync();
        Assert.Equal(0, await run.WaitAsync(TimeSpan.FromSeconds(30)));
        int last = LastSequence();

        _stop.Dispose();
        _stop = new CancellationTokenSource();
        Assert.Equal(0, await RunAsync("--print", "--duration", "200ms"));
        Assert.True(last < LastSequence());
    }

    [Fact]
    public async Task SecondStart_OnTheSameFolder_IsRefused()
    {
        WriteConfiguration("stdin");
        using DataDirectory held = DataDirectory.OpenForWriting(_folder);
        Assert.Equal(1, await RunAsync());
        Assert.Contains("another probecal is writing there", OneLine());
    }

    [Fact]
    public async Task NoCalibration_IsRefused_WithWhatToDo()
    {
        WriteConfiguration("stdin", calibration: "latest");
        Assert.Equal(2, await RunAsync());
        Assert.Contains("run 'probecal calibrate' first", OneLine());
    }

    [Theory]
    [InlineData("{ \"format\": \"probecal-station-configuration\", \"version\": 1, }", "line 1 column 1: station is missing")]
    [InlineData("{ \"format\": ", "this is no JSON")]
    [InlineData("", "this is no JSON")]
    [InlineData("\0\0\0\0", "this is no JSON")]
    public async Task DamagedConfiguration_IsRefusedInOneLine_AndNothingIsMade(string content, string problem)
    {
        File.WriteAllText(InFolder("station.json"), content);
        Assert.Equal(2, await RunAsync());
        Assert.Contains(problem, OneLine());
        Assert.Equal([InFolder("station.json")], Directory.GetFiles(_folder));
    }

    [Theory]
    [InlineData("10", "carries its unit")]
    [InlineData("0s", "1ms to 3652d")]
    public async Task WrongDuration_IsRefused(string duration, string problem)
    {
        WriteConfiguration("stdin");
        Assert.Equal(2, await RunAsync("--duration", duration));
        Assert.StartsWith("probecal: --duration " + duration, OneLine());
        Assert.Contains(problem, OneLine());
    }

    [Fact]
    public async Task MissingOption_IsRefused_AndHelpShowsAnExample()
    {
        Assert.Equal(2, await Program.RunAsync(["station"], Terminal()));
        Assert.Contains("--config", OneLine());
        Assert.Equal(0, await Program.RunAsync(["station", "--help"], Terminal()));
        Assert.Contains("probecal station --config station.json --data ./north-pier", _output.ToString());
    }

    private Task<int> RunAsync(params string[] more)
    {
        return Program.RunAsync(["station", "--config", InFolder("station.json"), "--data", _folder, .. more], Terminal());
    }

    private Terminal Terminal()
    {
        return new Terminal
        {
            Input = TextReader.Null,
            Output = TextWriter.Synchronized(new Watched(_output, _firstLine)),
            Error = TextWriter.Synchronized(_error),
            Time = TimeProvider.System,
            Stop = _stop.Token,
        };
    }

    private void WriteConfiguration(string source, string calibration = "none")
    {
        int port = FreePort();
        File.WriteAllText(InFolder("station.json"), string.Create(CultureInfo.InvariantCulture, $$"""
            {
              "format": "probecal-station-configuration",
              "version": 1,
              "station": "pier",
              "probe": "do-1",
              "source": {{JsonSerializer.Serialize(source)}},
              "line": "{signal},{temperature}",
              "pressure": { "source": "none" },
              "salinity": { "source": "none" },
              "stirring": "stirred",
              "calibration": "{{calibration}}",
              "embeddedBroker": { "port": {{port}} }
            }
            """));
    }

    private static int FreePort()
    {
        using TcpListener listener = new(IPAddress.Loopback, 0);
        listener.Start();
        return ((IPEndPoint)listener.LocalEndpoint).Port;
    }

    private string InFolder(string name)
    {
        return Path.Combine(_folder, name);
    }

    private int LastSequence()
    {
        return JsonDocument.Parse(_output.ToString().TrimEnd().Split('\n')[^1]).RootElement.GetProperty("sequence").GetInt32();
    }

    private string OneLine()
    {
        string text = _error.ToString().TrimEnd('\n');
        Assert.DoesNotContain('\n', text);
        return text;
    }

    /// <summary>Tells when the first line was written.</summary>
    private sealed class Watched(TextWriter to, TaskCompletionSource first) : StringWriter
    {
        public override void WriteLine(string? value)
        {
            to.WriteLine(value);
            first.TrySetResult();
        }

        public override void Write(char value)
        {
            to.Write(value);
        }

        public override void Write(string? value)
        {
            to.Write(value);
        }
    }
}
