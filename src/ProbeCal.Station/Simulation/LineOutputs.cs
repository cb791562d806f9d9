using System;
using System.Collections.Generic;
using System.IO;
using System.Net;
using System.Net.Sockets;
using System.Text;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Simulation;

/// <summary>Where simulated lines go.</summary>
public interface ILineOutput : IAsyncDisposable
{
    /// <summary>What it is and how to listen to it, for people.</summary>
    string Description { get; }

    /// <summary>Writes one line and its end.</summary>
    ValueTask WriteAsync(string line);
}

/// <summary>Lines as text, each flushed, so that a reader sees it at once.</summary>
/// <param name="writer">Where they go; it is left open.</param>
public sealed class TextOutput(TextWriter writer) : ILineOutput
{
    /// <inheritdoc/>
    public string Description => "standard output";

    /// <inheritdoc/>
    public async ValueTask WriteAsync(string line)
    {
        await writer.WriteAsync(line + "\n").ConfigureAwait(false);
        await writer.FlushAsync().ConfigureAwait(false);
    }

    /// <inheritdoc/>
    public ValueTask DisposeAsync()
    {
        return ValueTask.CompletedTask;
    }
}

/// <summary>Lines on a pseudo-terminal, which a link makes known under a steady name. Nobody listening loses them, as on a cable.</summary>
public sealed class PseudoTerminalOutput : ILineOutput
{
    private readonly PseudoTerminal _terminal;
    private readonly string _link;

    private PseudoTerminalOutput(PseudoTerminal terminal, string link)
    {
        _terminal = terminal;
        _link = link;
    }

    /// <inheritdoc/>
    public string Description => $"pseudo-terminal {_terminal.DevicePath}; listen with --source serial:{_link}";

    /// <summary>Makes the pair and the link. A link that is left from before is replaced; anything else is not touched.</summary>
    /// <param name="what">The option that the path was given for.</param>
    /// <param name="link">Path of the link.</param>
    /// <exception cref="InputException">Something that is no link stands there.</exception>
    /// <exception cref="WorkFailedException">The pair or the link cannot be made.</exception>
    public static PseudoTerminalOutput Open(string what, string link)
    {
        if (link.Length == 0)
        {
            throw Wrong.Input(what, link, "the path of the link is missing; write for example ./probe");
        }

        FileInfo there = new(link);
        if (there.LinkTarget is null && (there.Exists || Directory.Exists(link)))
        {
            throw Wrong.Input(what, link, "something else stands there; name a path that is free");
        }

        PseudoTerminal terminal = PseudoTerminal.Open();
        try
        {
            File.Delete(link);
            File.CreateSymbolicLink(link, terminal.DevicePath);
            return new PseudoTerminalOutput(terminal, link);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            terminal.Dispose();
            throw new WorkFailedException($"{what} {Wrong.Shown(link)}: the link cannot be made: {fault.Message}", fault);
        }
    }

    /// <inheritdoc/>
    public ValueTask WriteAsync(string line)
    {
        // Whether anyone has heard it is not the sender's business on a serial line.
        _ = _terminal.TryWrite(Encoding.UTF8.GetBytes(line + "\r\n"));
        return ValueTask.CompletedTask;
    }

    /// <inheritdoc/>
    public ValueTask DisposeAsync()
    {
        if (new FileInfo(_link).LinkTarget == _terminal.DevicePath)
        {
            File.Delete(_link);
        }

        _terminal.Dispose();
        return ValueTask.CompletedTask;
    }
}

/// <summary>Lines to everyone who connects to a port of this machine. Who reads too slowly is disconnected.</summary>
public sealed class TcpOutput : ILineOutput
{
    private readonly TcpListener _listener;
    private readonly List<Socket> _clients = [];
    private readonly CancellationTokenSource _stop = new();
    private readonly TaskCompletionSource _letIn = new(TaskCreationOptions.RunContinuationsAsynchronously);
    private readonly Task _accepting;

    private TcpOutput(TcpListener listener)
    {
        _listener = listener;
        _accepting = AcceptAsync();
    }

    /// <summary>The port that is listened on.</summary>
    public int Port => ((IPEndPoint)_listener.LocalEndpoint).Port;

    /// <inheritdoc/>
    public string Description => FormattableString.Invariant($"TCP port {Port} on this machine; listen with --source tcp:127.0.0.1:{Port}");

    /// <summary>Completes when the first client is in and gets the lines from now on.</summary>
    public Task ClientLetInAsync()
    {
        return _letIn.Task;
    }

    /// <summary>Listens on the loopback address only.</summary>
    /// <param name="what">The option that the port was given for.</param>
    /// <param name="port">The port; 0 takes a free one.</param>
    /// <exception cref="WorkFailedException">The port is taken.</exception>
    public static TcpOutput Open(string what, int port)
    {
        TcpListener listener = new(IPAddress.Loopback, port);
        try
        {
            listener.Start();
            return new TcpOutput(listener);
        }
        catch (SocketException fault)
        {
            listener.Dispose();
            throw new WorkFailedException(FormattableString.Invariant($"{what} {port}: {fault.Message}; choose another port"), fault);
        }
    }

    /// <inheritdoc/>
    public ValueTask WriteAsync(string line)
    {
        byte[] bytes = Encoding.UTF8.GetBytes(line + "\r\n");
        lock (_clients)
        {
            _clients.RemoveAll(client =>
            {
                int sent = client.Send(bytes, 0, bytes.Length, SocketFlags.None, out SocketError error);
                bool gone = error != SocketError.Success || sent != bytes.Length;
                if (gone)
                {
                    client.Dispose();
                }

                return gone;
            });
        }

        return ValueTask.CompletedTask;
    }

    /// <inheritdoc/>
    public async ValueTask DisposeAsync()
    {
        await _stop.CancelAsync().ConfigureAwait(false);
        await _accepting.ConfigureAwait(false);
        _listener.Dispose();
        _stop.Dispose();
        lock (_clients)
        {
            _clients.ForEach(client => client.Dispose());
        }
    }

    private async Task AcceptAsync()
    {
        while (!_stop.IsCancellationRequested)
        {
            try
            {
                Socket client = await _listener.AcceptSocketAsync(_stop.Token).ConfigureAwait(false);
                client.Blocking = false;
                lock (_clients)
                {
                    _clients.Add(client);
                }

                _letIn.TrySetResult();
            }
            catch (Exception fault) when (fault is OperationCanceledException or SocketException)
            {
                // Either it is over, or a client hung up before it was let in: the next one is awaited.
                continue;
            }
        }
    }
}
