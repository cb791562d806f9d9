using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;

namespace ProbeCal.Host.Commands;

/// <summary>Runs the program's own commands for the demo, as a person would type them.</summary>
internal sealed class DemoShell(Terminal terminal, DemoScreen screen, CancellationToken stop) : IDisposable
{
    private readonly List<Task<int>> _background = [];
    private readonly StringWriter _errors = new();

    /// <summary>The last thing a command in the background complained of, or null.</summary>
    internal string? Complaint => _errors.ToString().Split('\n').LastOrDefault(static line => line.StartsWith("probecal: ", StringComparison.Ordinal));

    /// <summary>Shows a command and what it prints, and returns its exit code.</summary>
    internal async Task<int> ShowAsync(params string[] arguments)
    {
        screen.Command(arguments);
        // Another thread, so that a command that computes without a pause does not hold up the others.
        int code = await Task.Run(() => Program.RunAsync(arguments, With(terminal.Output, terminal.Error)), CancellationToken.None).ConfigureAwait(false);
        stop.ThrowIfCancellationRequested();
        return code;
    }

    /// <summary>Shows a command and lets it run on; it is stopped with the demo.</summary>
    internal Task<int> InBackgroundAsync(params string[] arguments)
    {
        screen.Command(arguments);
        Task<int> running = Task.Run(() => Program.RunAsync(arguments, With(TextWriter.Null, TextWriter.Synchronized(_errors))), CancellationToken.None);
        _background.Add(running);
        return running;
    }

    /// <summary>Waits until everything in the background has ended.</summary>
    internal Task FinishAsync()
    {
        return Task.WhenAll(_background);
    }

    public void Dispose()
    {
        _errors.Dispose();
    }

    private Terminal With(TextWriter output, TextWriter error)
    {
        return new Terminal { Input = TextReader.Null, Output = output, Error = error, Time = terminal.Time, Stop = stop };
    }
}
