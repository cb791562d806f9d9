using System;
using System.IO;
using System.Text;
using System.Threading;
using System.Threading.Tasks;
using Microsoft.Extensions.Logging;
using ProbeCal.Host.Commands;
using Xunit;

namespace ProbeCal.Host.Tests;

public class TerminalLogTests
{
    [Fact]
    public void TextOfADeviceOrABroker_IsShownAndNotObeyed()
    {
        using StringWriter error = new();
        using ILoggerFactory logs = TerminalLog.FactoryFor(Over(error));
        logs.CreateLogger("source").LogWarning("it says {Text}", "\u001b[2Jx\u009b\n\u202e");
        Assert.EndsWith(" warn 0 source: it says \\x1B[2Jx\\x9B \\x202E" + Environment.NewLine, error.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void ALogThatCannotBeWritten_EndsNothing_AndTellsHowMuchIsMissing()
    {
        using FullDisk error = new();
        using ILoggerFactory logs = TerminalLog.FactoryFor(Over(error));
        ILogger log = logs.CreateLogger("station");
        error.IsFull = true;
        log.LogInformation("first");
        log.LogInformation("second");
        error.IsFull = false;
        log.LogInformation("third");
        string[] lines = error.Written.ToString().Split('\n', StringSplitOptions.RemoveEmptyEntries);
        Assert.Equal("(2 lines of this log could not be written)", lines[0].TrimEnd());
        Assert.EndsWith("station: third", lines[1].TrimEnd(), StringComparison.Ordinal);
        Assert.Equal(2, lines.Length);
    }

    [Fact]
    public void ReadingsThatCannotBePrinted_AreToldOnce_AndPrintedAgainWhenTheyCan()
    {
        using FullDisk output = new();
        using StringWriter error = new();
        using ILoggerFactory logs = TerminalLog.FactoryFor(Over(error));
        ReadingPrinter printer = new(output, logs.CreateLogger("print"));
        output.IsFull = true;
        printer.Print("{1}"u8.ToArray());
        printer.Print("{2}"u8.ToArray());
        output.IsFull = false;
        printer.Print("{3}"u8.ToArray());
        Assert.Equal("{3}", output.Written.ToString().Trim());
        Assert.Single(error.ToString().Split('\n', StringSplitOptions.RemoveEmptyEntries));
        Assert.Contains("warn 2301 print: readings cannot be printed: no room", error.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task AResultThatCannotBeWritten_IsAFailureWithOneLine()
    {
        using FullDisk output = new() { IsFull = true };
        using StringWriter error = new();
        string[] arguments = ["equilibrium", "--temperature", "20", "--salinity", "0", "--pressure", "760mmHg"];
        Assert.Equal(1, await Program.RunAsync(arguments, Over(error, output)));
        Assert.Equal("probecal: the system refused to read or write: no room", error.ToString().TrimEnd());
    }

    private static Terminal Over(TextWriter error, TextWriter? output = null)
    {
        return new Terminal { Input = TextReader.Null, Output = output ?? TextWriter.Null, Error = error, Time = TimeProvider.System, Stop = CancellationToken.None };
    }

    private sealed class FullDisk : TextWriter
    {
        internal bool IsFull { get; set; }

        internal StringBuilder Written { get; } = new();

        public override Encoding Encoding => Encoding.UTF8;

        public override void Write(char value)
        {
            if (IsFull)
            {
                throw new IOException("no room");
            }

            Written.Append(value);
        }
    }
}
