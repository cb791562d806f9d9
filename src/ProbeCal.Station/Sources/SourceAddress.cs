using System;
using System.Collections.Generic;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Sources;

/// <summary>
/// Where samples come from, as one text: <c>serial:/dev/ttyUSB0?baud=9600</c>, <c>tcp:192.0.2.7:4001</c>,
/// <c>file:lines.txt?pace=10</c>, <c>stdin</c>, <c>simulated?seed=7</c>. The grammar is in <c>docs/protocols.md</c>.
/// </summary>
public abstract record SourceAddress
{
    /// <summary>How long a live source may be silent before it counts as suspect, unless the address says otherwise.</summary>
    public static TimeSpan UsualSilence { get; } = TimeSpan.FromSeconds(60);

    private static readonly string[] Schemes = ["serial", "tcp", "file", "stdin", "simulated"];

    /// <summary>Reads an address.</summary>
    /// <param name="what">The option or key that it was given for.</param>
    /// <param name="text">The address.</param>
    /// <exception cref="InputException">It is none; the message says what is wrong.</exception>
    public static SourceAddress Parse(string what, string text)
    {
        PlainText.OneLine(what, text);
        int question = text.IndexOf('?', StringComparison.Ordinal);
        string body = (question < 0 ? text : text[..question]).Trim();
        int colon = body.IndexOf(':', StringComparison.Ordinal);
        string scheme = colon < 0 ? body : body[..colon];
        string rest = colon < 0 ? "" : body[(colon + 1)..];
        AddressOptions options = AddressOptions.Parse(what, text, question < 0 ? "" : text[(question + 1)..]);
        SourceAddress address = scheme switch
        {
            "serial" => SerialAddress.From(what, text, rest, options),
            "tcp" => TcpAddress.From(what, text, rest, options),
            "file" => FileAddress.From(what, text, rest, options),
            "stdin" => rest.Length == 0 ? new StandardInputAddress() : throw Wrong.Input(what, text, "stdin takes nothing after it"),
            "simulated" => rest.Length == 0 ? SimulatedAddress.From(options) : throw Wrong.Input(what, text, "write its settings after a question mark, for example simulated?seed=7"),
            _ => throw Unknown(what, text, scheme),
        };
        options.RefuseLeftOver();
        return address;
    }

    private static InputException Unknown(string what, string text, string scheme)
    {
        if (text.StartsWith("/dev/", StringComparison.Ordinal) || text.StartsWith("COM", StringComparison.OrdinalIgnoreCase))
        {
            return Wrong.Input(what, text, "say what it is; write serial:" + Wrong.Shown(text));
        }

        return Wrong.Input(what, text, $"this is no source{NearestName.DidYouMean(scheme, Schemes)}; write for example serial:/dev/ttyUSB0?baud=9600, tcp:HOST:PORT, file:PATH, stdin or simulated");
    }
}

/// <summary>Number of stop bits on a serial line.</summary>
public enum SerialStopBits
{
    /// <summary>One.</summary>
    One,
    /// <summary>One and a half.</summary>
    OneAndHalf,
    /// <summary>Two.</summary>
    Two,
}

/// <summary>Parity on a serial line.</summary>
public enum SerialParity
{
    /// <summary>None.</summary>
    None,
    /// <summary>Even.</summary>
    Even,
    /// <summary>Odd.</summary>
    Odd,
}

/// <summary>Flow control on a serial line.</summary>
public enum SerialFlow
{
    /// <summary>None.</summary>
    None,
    /// <summary>RTS and CTS lines.</summary>
    Hardware,
    /// <summary>XON and XOFF characters.</summary>
    Software,
}

/// <summary>A serial port, by any path that leads to it.</summary>
public sealed record SerialAddress(string Port) : SourceAddress
{
    private static readonly string[] Keys = ["baud", "data", "parity", "stop", "flow", "dtr", "rts", "silence"];

    /// <summary>Bits per second.</summary>
    /// <value>The default is 9600.</value>
    public int Baud { get; init; } = 9600;

    /// <summary>Data bits, 7 or 8.</summary>
    /// <value>The default is 8.</value>
    public int DataBits { get; init; } = 8;

    /// <summary>Parity.</summary>
    /// <value>The default is none.</value>
    public SerialParity Parity { get; init; }

    /// <summary>Stop bits.</summary>
    /// <value>The default is 1.</value>
    public SerialStopBits StopBits { get; init; }

    /// <summary>Flow control.</summary>
    /// <value>The default is none.</value>
    public SerialFlow Flow { get; init; }

    /// <summary>Whether DTR is raised: some converters are powered by it. Opening a port may toggle it all the same.</summary>
    /// <value>The default is off.</value>
    public bool DataTerminalReady { get; init; }

    /// <summary>Whether RTS is raised; it has no effect under hardware flow control.</summary>
    /// <value>The default is off.</value>
    public bool RequestToSend { get; init; }

    /// <summary>Silence after which the source counts as suspect.</summary>
    /// <value>The default is 60 s.</value>
    public TimeSpan Silence { get; init; } = UsualSilence;

    /// <inheritdoc/>
    public override string ToString()
    {
        string parity = Parity switch { SerialParity.Even => "even", SerialParity.Odd => "odd", _ => "none" };
        string stop = StopBits switch { SerialStopBits.Two => "2", SerialStopBits.OneAndHalf => "1.5", _ => "1" };
        string flow = Flow switch { SerialFlow.Hardware => "hardware", SerialFlow.Software => "software", _ => "none" };
        return string.Create(CultureInfo.InvariantCulture, $"serial:{Port}?baud={Baud}&data={DataBits}&parity={parity}&stop={stop}&flow={flow}")
            + (DataTerminalReady ? "&dtr=on" : "") + (RequestToSend ? "&rts=on" : "") + AddressOptions.SilenceText(Silence);
    }

    internal static SerialAddress From(string what, string text, string port, AddressOptions options)
    {
        if (port.Length == 0)
        {
            throw Wrong.Input(what, text, "the port is missing; write for example serial:/dev/ttyUSB0 or serial:/dev/serial/by-id/NAME");
        }

        options.Allow(Keys);
        return new SerialAddress(port)
        {
            Baud = (int)options.Whole("baud", 9600, 50, 4_000_000),
            DataBits = (int)options.Whole("data", 8, 7, 8),
            Parity = options.Choice("parity", SerialParity.None, ("none", SerialParity.None), ("even", SerialParity.Even), ("odd", SerialParity.Odd)),
            StopBits = options.Choice("stop", SerialStopBits.One, ("1", SerialStopBits.One), ("1.5", SerialStopBits.OneAndHalf), ("2", SerialStopBits.Two)),
            Flow = options.Choice("flow", SerialFlow.None, ("none", SerialFlow.None), ("hardware", SerialFlow.Hardware), ("software", SerialFlow.Software)),
            DataTerminalReady = options.Choice("dtr", false, ("on", true), ("off", false)),
            RequestToSend = options.Choice("rts", false, ("on", true), ("off", false)),
            Silence = options.Duration("silence", UsualSilence),
        };
    }
}

/// <summary>A TCP server that sends lines: a logger, a serial-to-network converter.</summary>
public sealed record TcpAddress(string Host, int Port) : SourceAddress
{
    private static readonly string[] Keys = ["silence"];

    /// <summary>Silence after which the source counts as suspect.</summary>
    /// <value>The default is 60 s.</value>
    public TimeSpan Silence { get; init; } = UsualSilence;

    /// <inheritdoc/>
    public override string ToString()
    {
        string host = Host.Contains(':', StringComparison.Ordinal) ? "[" + Host + "]" : Host;
        string silence = AddressOptions.SilenceText(Silence);
        return string.Create(CultureInfo.InvariantCulture, $"tcp:{host}:{Port}") + (silence.Length == 0 ? "" : "?" + silence[1..]);
    }

    internal static TcpAddress From(string what, string text, string rest, AddressOptions options)
    {
        int colon = rest.LastIndexOf(':');
        string host = colon < 0 ? "" : rest[..colon];
        bool bracketed = host.StartsWith('[') && host.EndsWith(']');
        if (host.Length == 0 || (!bracketed && host.Contains(':', StringComparison.Ordinal)))
        {
            throw Wrong.Input(what, text, "write host and port, for example tcp:192.0.2.7:4001 or tcp:[2001:db8::7]:4001");
        }

        options.Allow(Keys);
        int port = (int)Number.ParseWhole(what + " " + Wrong.Shown(text) + ": port", rest[(colon + 1)..], 1, 65535);
        return new TcpAddress(bracketed ? host[1..^1] : host, port) { Silence = options.Duration("silence", UsualSilence) };
    }
}

/// <summary>A file of lines, read once from start to end.</summary>
internal sealed record FileAddress(string Path) : SourceAddress
{
    private static readonly string[] Keys = ["pace"];

    /// <summary>Speed of the replay against the times in the lines: 1 is as recorded, 10 ten times as fast; 0 is without waiting.</summary>
    /// <value>The default is 0.</value>
    public double Pace { get; init; }

    /// <inheritdoc/>
    public override string ToString()
    {
        return "file:" + Path + (Pace == 0 ? "" : "?pace=" + Number.Print(Pace));
    }

    internal static FileAddress From(string what, string text, string path, AddressOptions options)
    {
        if (path.Length == 0)
        {
            throw Wrong.Input(what, text, "the file is missing; write for example file:lines.txt");
        }

        options.Allow(Keys);
        return new FileAddress(path) { Pace = options.Number("pace", 0, 0, 1e6) };
    }
}

/// <summary>Lines on standard input.</summary>
public sealed record StandardInputAddress : SourceAddress
{
    /// <inheritdoc/>
    public override string ToString()
    {
        return "stdin";
    }
}
