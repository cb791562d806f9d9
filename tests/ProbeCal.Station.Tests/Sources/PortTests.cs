using System;
using System.IO;
using System.Linq;
using System.Text;
using System.Threading.Tasks;
using Microsoft.Extensions.Logging.Abstractions;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Simulation;
using ProbeCal.Station.Sources;
using Xunit;

namespace ProbeCal.Station.Tests.Sources;

/// <summary>Against real pseudo-terminals and real sockets, on the real clock.</summary>
public sealed class PortTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-ports-").FullName;

    private string Link => Path.Combine(_folder, "probe");

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
    }

    [SkippableFact]
    public async Task SerialPort_DeliversWhatTheCableCarries()
    {
        Skip.IfNot(OperatingSystem.IsLinux(), "pseudo-terminals are made on Linux only");
        await using PseudoTerminalOutput cable = PseudoTerminalOutput.Open("--pty", Link);
        await using SourceWatch watch = new(Serial(Link));
        await watch.StateAsync(SourceState.Open);
        await cable.WriteAsync("9.5,18");
        await cable.WriteAsync("2.5,18 °C");
        await cable.WriteAsync("rubbish \u0001");
        await cable.WriteAsync("3.5,19");
        Assert.Equal(2.5, (await watch.SampleAsync()).Signal);
        Assert.Equal(3.5, (await watch.SampleAsync()).Signal);
        Assert.Equal(["9.5,18", "rubbish \u0001"], watch.Seen.OfType<RejectedLine>().Select(line => line.RawText));
    }

    /// <summary>The cable is pulled, and put in again under another device name, which the steady link then leads to.</summary>
    [SkippableFact]
    public async Task SerialPort_PulledOutIsNoticedAndOpenedAgain()
    {
        Skip.IfNot(OperatingSystem.IsLinux(), "pseudo-terminals are made on Linux only");
        PseudoTerminalOutput first = PseudoTerminalOutput.Open("--pty", Link);
        await using SourceWatch watch = new(Serial(Link));
        await watch.StateAsync(SourceState.Open);
        await first.WriteAsync("1,18");
        await first.WriteAsync("2,18");
        await first.WriteAsync("half a li");
        await watch.SampleAsync();

        await first.DisposeAsync();
        await watch.StateAsync(SourceState.Lost);
        await using PseudoTerminalOutput second = PseudoTerminalOutput.Open("--pty", Link);
        await watch.StateAsync(SourceState.Open);
        await second.WriteAsync("3,18");
        await second.WriteAsync("4,18");
        Assert.Equal(4, (await watch.SampleAsync()).Signal);
    }

    [SkippableFact]
    public async Task SerialPort_KeepsASecondReaderOutUntilItIsFree()
    {
        Skip.IfNot(OperatingSystem.IsLinux(), "pseudo-terminals are made on Linux only");
        await using PseudoTerminalOutput cable = PseudoTerminalOutput.Open("--pty", Link);
        string device = new FileInfo(Link).LinkTarget!;
        await using (SourceWatch first = new(Serial(Link)))
        {
            await first.StateAsync(SourceState.Open);

            // By its other name, too.
            SourceWatch second = new(Serial(device, mustOpen: true));
            await second.NextAsync();
            WorkFailedException refused = await Assert.ThrowsAsync<WorkFailedException>(second.NextAsync);
            Assert.Equal($"serial {device} 9600 Bd: another program is reading {device}; stop it first", refused.Message);

            await cable.WriteAsync("1,18");
            await cable.WriteAsync("2,18");
            await first.SampleAsync();
        }

        await using SourceWatch third = new(Serial(device, mustOpen: true));
        await third.StateAsync(SourceState.Open);
    }

    [Fact]
    public async Task SerialPort_ThatIsNotThereIsOneClearLine()
    {
        SourceWatch watch = new(Serial(Link, mustOpen: true));
        await watch.NextAsync();
        WorkFailedException failed = await Assert.ThrowsAsync<WorkFailedException>(watch.NextAsync);
        Assert.Equal($"serial {Link} 9600 Bd: there is no such port; is the cable in, and is the name right?", failed.Message);
    }

    [SkippableFact]
    public async Task SerialPort_ThatComesLaterIsWaitedFor()
    {
        Skip.IfNot(OperatingSystem.IsLinux(), "pseudo-terminals are made on Linux only");
        await using SourceWatch watch = new(Serial(Link));
        Assert.Equal("there is no such port; is the cable in, and is the name right?", (await watch.StateAsync(SourceState.Lost)).Reason);
        await using PseudoTerminalOutput cable = PseudoTerminalOutput.Open("--pty", Link);
        await watch.StateAsync(SourceState.Open);
    }

    /// <summary>A pseudo-terminal refuses DTR: the port must open all the same.</summary>
    [SkippableFact]
    public async Task SerialPort_ThatRefusesDtrOpensAllTheSame()
    {
        Skip.IfNot(OperatingSystem.IsLinux(), "pseudo-terminals are made on Linux only");
        await using PseudoTerminalOutput cable = PseudoTerminalOutput.Open("--pty", Link);
        SerialAddress address = new(Link) { DataTerminalReady = true, RequestToSend = true };
        await using SourceWatch watch = new(SourceFactory.Create(address, Template, TimeProvider.System, NullLogger.Instance, mustOpen: true));
        await watch.StateAsync(SourceState.Open);
    }

    [Fact]
    public async Task Tcp_IsConnectedAgainAfterTheServerCameBack()
    {
        TcpOutput first = TcpOutput.Open("--tcp", 0);
        int port = first.Port;
        await using SourceWatch watch = new(SourceFactory.Create(new TcpAddress("127.0.0.1", port), Template, TimeProvider.System, NullLogger.Instance));
        await watch.StateAsync(SourceState.Open);
        Assert.Equal(2, (await SendUntilSampleAsync(first, watch, ["1,18", "2,18"])).Signal);
        await first.DisposeAsync();
        await watch.StateAsync(SourceState.Lost);
        await using TcpOutput second = TcpOutput.Open("--tcp", port);
        await watch.StateAsync(SourceState.Open);
        Assert.Equal(4, (await SendUntilSampleAsync(second, watch, ["3,18", "4,18"])).Signal);
    }

    [Fact]
    public async Task Tcp_WithoutAServerIsOneClearLine()
    {
        int port;
        await using (TcpOutput free = TcpOutput.Open("--tcp", 0))
        {
            port = free.Port;
        }

        SourceWatch watch = new(SourceFactory.Create(new TcpAddress("127.0.0.1", port), Template, TimeProvider.System, NullLogger.Instance, mustOpen: true));
        await watch.NextAsync();
        WorkFailedException failed = await Assert.ThrowsAsync<WorkFailedException>(watch.NextAsync);
        Assert.Equal($"tcp 127.0.0.1 port {port}: no connection: Connection refused", failed.Message);
    }

    [Fact]
    public async Task TcpOutput_TakesNoPortThatIsTaken()
    {
        await using TcpOutput first = TcpOutput.Open("--tcp", 0);
        Assert.StartsWith("--tcp " + first.Port, Assert.Throws<WorkFailedException>(() => TcpOutput.Open("--tcp", first.Port)).Message, StringComparison.Ordinal);
    }

    [SkippableFact]
    public void PseudoTerminal_LosesWhatNobodyReads()
    {
        Skip.IfNot(OperatingSystem.IsLinux(), "pseudo-terminals are made on Linux only");
        using PseudoTerminal terminal = PseudoTerminal.Open();
        Assert.False(terminal.IsListenedTo);
        Assert.False(terminal.TryWrite("old\n"u8));
        using (FileStream reader = new(terminal.DevicePath, FileMode.Open, FileAccess.Read, FileShare.ReadWrite, 0))
        {
            Assert.True(terminal.IsListenedTo);
            Assert.True(terminal.TryWrite("new\r\n"u8));
            byte[] buffer = new byte[64];
            Assert.Equal("new\r\n", Encoding.UTF8.GetString(buffer, 0, reader.Read(buffer)));
        }

        Assert.False(terminal.IsListenedTo);
    }

    [Fact]
    public void PseudoTerminalOutput_TouchesNothingThatIsNoLink()
    {
        File.WriteAllText(Link, "mine");
        Assert.Equal($"--pty {Link}: something else stands there; name a path that is free", Assert.Throws<InputException>(() => PseudoTerminalOutput.Open("--pty", Link)).Message);
        Assert.Equal("mine", File.ReadAllText(Link));
    }

    private static LineTemplate Template { get; } = LineTemplate.Parse("--line", "{signal},{temperature}");

    private static ISampleSource Serial(string path, bool mustOpen = false)
    {
        return SourceFactory.Create(new SerialAddress(path), Template, TimeProvider.System, NullLogger.Instance, mustOpen: mustOpen);
    }

    /// <summary>The server may let a client in a moment after the client is through: lines are sent until one arrives.</summary>
    private static async Task<RawSample> SendUntilSampleAsync(TcpOutput server, SourceWatch watch, string[] lines)
    {
        await server.ClientLetInAsync().WaitAsync(TimeSpan.FromSeconds(30));
        foreach (string line in lines)
        {
            await server.WriteAsync(line);
        }

        return await watch.SampleAsync();
    }
}
