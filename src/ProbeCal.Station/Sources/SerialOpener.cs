using System;
using System.IO;
using System.IO.Ports;
using System.Threading;
using System.Threading.Tasks;
using Microsoft.Extensions.Logging;

namespace ProbeCal.Station.Sources;

/// <summary>Opens a serial port by any path, a link such as <c>/dev/serial/by-id/…</c> included, and keeps others off it.</summary>
internal sealed class SerialOpener(SerialAddress address, ILogger logger) : IByteChannelOpener
{
    public string Description => "serial " + address.Port + " " + address.Baud.ToString(System.Globalization.CultureInfo.InvariantCulture) + " Bd";

    public bool EndsForGood => false;

    public bool MayStartInTheMiddle => true;

    public TimeSpan? Silence => address.Silence;

    public Task<IByteChannel> OpenAsync(CancellationToken cancellationToken)
    {
        // Opening asks the driver and may block.
        return Task.Run(Open, cancellationToken);
    }

    /// <summary>Whether the device is there. On Windows ports have names, elsewhere paths.</summary>
    internal static bool Exists(string device)
    {
        return OperatingSystem.IsWindows()
            ? Array.Exists(SerialPort.GetPortNames(), name => string.Equals(name, device, StringComparison.OrdinalIgnoreCase))
            : File.Exists(device);
    }

    private IByteChannel Open()
    {
        string device = Resolve(address.Port);
        if (!Exists(device))
        {
            throw new ChannelException("there is no such port; is the cable in, and is the name right?");
        }

        PortLock held = PortLock.Take(device);
        SerialPort port = new(device, address.Baud, ParityOf(address.Parity), address.DataBits, StopBitsOf(address.StopBits))
        {
            Handshake = HandshakeOf(address.Flow),
        };
        try
        {
            port.Open();
            SetLines(port);

            // What arrived before the opening would get the wrong time.
            port.DiscardInBuffer();
            return new SerialChannel(port, held, device);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or ArgumentException or InvalidOperationException or NotSupportedException)
        {
            held.Dispose();
            port.Dispose();
            throw new ChannelException(Reason(fault), fault);
        }
    }

    /// <summary>The device behind links, so that its disappearance can be seen and two names of it share one lock.</summary>
    private static string Resolve(string port)
    {
        if (OperatingSystem.IsWindows())
        {
            return port;
        }

        try
        {
            return File.ResolveLinkTarget(port, returnFinalTarget: true)?.FullName ?? Path.GetFullPath(port);
        }
        catch (IOException)
        {
            // A link to nothing, or no link: whether it is there is asked next.
            return Path.GetFullPath(port);
        }
    }

    private void SetLines(SerialPort port)
    {
        try
        {
            // After the opening, for a port that refuses DTR cannot be opened with DTR set; the system raises both while opening.
            if (address.DataTerminalReady)
            {
                port.DtrEnable = true;
            }

            if (address.Flow != SerialFlow.Hardware)
            {
                port.RtsEnable = address.RequestToSend;
            }
        }
        catch (IOException fault)
        {
            if (address.DataTerminalReady || address.RequestToSend)
            {
                logger.LogWarning(SourceEventIds.LineSettings, fault, "{Port}: this port cannot set DTR or RTS; a converter powered by them stays dark", address.Port);
            }
        }
    }

    private string Reason(Exception fault)
    {
        return fault switch
        {
            UnauthorizedAccessException => "no permission or in use; on Linux the user must be in the group dialout",
            ArgumentException => $"the port does not take {address.Baud} Bd with these settings",
            _ => Entry.Wrong.Shown(fault.Message),
        };
    }

    private static Parity ParityOf(SerialParity parity)
    {
        return parity switch { SerialParity.Even => Parity.Even, SerialParity.Odd => Parity.Odd, _ => Parity.None };
    }

    private static StopBits StopBitsOf(SerialStopBits stop)
    {
        return stop switch { SerialStopBits.Two => StopBits.Two, SerialStopBits.OneAndHalf => StopBits.OnePointFive, _ => StopBits.One };
    }

    private static Handshake HandshakeOf(SerialFlow flow)
    {
        return flow switch { SerialFlow.Hardware => Handshake.RequestToSend, SerialFlow.Software => Handshake.XOnXOff, _ => Handshake.None };
    }

    /// <summary>
    /// The open port. Read through its stream: the events and the blocking reads of SerialPort miss a pulled cable, and its
    /// text decoding loses bytes.
    /// </summary>
    private sealed class SerialChannel(SerialPort port, PortLock held, string device) : IByteChannel
    {
        private readonly Stream _stream = port.BaseStream;

        public bool IsPresent => Exists(device);

        public ValueTask<int> ReadAsync(Memory<byte> buffer, CancellationToken cancellationToken)
        {
            return _stream.ReadAsync(buffer, cancellationToken);
        }

        public ValueTask DisposeAsync()
        {
            // The lock goes first: closing may hang, and the port must be free to be opened anew.
            held.Dispose();
            port.Dispose();
            return ValueTask.CompletedTask;
        }
    }
}
