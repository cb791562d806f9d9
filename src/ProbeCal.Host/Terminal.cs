using System;
using System.IO;
using System.Threading;

namespace ProbeCal.Host;

/// <summary>
/// Where a command reads, writes and takes the time. Tests hand in their own; the process has one made of its standard
/// streams and the system clock, the only place in the project that touches either.
/// </summary>
internal sealed class Terminal
{
    internal required TextReader Input { get; init; }

    /// <summary>The bytes behind <see cref="Input"/>, for a command that reads a file from there.</summary>
    internal Func<Stream> InputBytes { get; init; } = static () => Stream.Null;

    /// <summary>The bytes behind <see cref="Output"/>, for a command that writes a file there.</summary>
    internal Func<Stream> OutputBytes { get; init; } = static () => Stream.Null;

    /// <summary>Results only.</summary>
    internal required TextWriter Output { get; init; }

    /// <summary>Progress, logs and errors.</summary>
    internal required TextWriter Error { get; init; }

    internal required TimeProvider Time { get; init; }

    /// <summary>True when a person can answer a question here.</summary>
    internal bool IsInteractive { get; init; }

    /// <summary>Characters in a line of the window that shows <see cref="Output"/>; null when no window does.</summary>
    internal int? Width { get; init; }

    /// <summary>Cancelled by Ctrl-C, SIGTERM or a test: the command ends in order.</summary>
    internal CancellationToken Stop { get; init; }

    /// <summary>Where a page for people goes: <see cref="Output"/>, its lines folded when the window is narrow.</summary>
    internal TextWriter Page()
    {
        return Width is int width && FoldingWriter.Narrowest <= width ? new FoldingWriter(Output, width) : Output;
    }

    internal static Terminal OfProcess(CancellationToken stop)
    {
        return new Terminal
        {
            Input = Console.In,
            InputBytes = Console.OpenStandardInput,
            OutputBytes = Console.OpenStandardOutput,
            Output = Console.Out,
            Error = Console.IsErrorRedirected || Console.WindowWidth < FoldingWriter.Narrowest ? Console.Error : TextWriter.Synchronized(new FoldingWriter(Console.Error, Console.WindowWidth)),
            Time = TimeProvider.System,
            IsInteractive = !Console.IsInputRedirected && !Console.IsOutputRedirected,
            Width = Console.IsOutputRedirected ? null : Console.WindowWidth,
            Stop = stop,
        };
    }
}
