using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;

namespace ProbeCal.Peers.Tests.Parts;

/// <summary>
/// A real program started by a test: its lines are kept, a test waits for one of them (never for a time), and it can be
/// asked to stop or killed outright.
/// </summary>
internal sealed class OutsideProcess : IDisposable
{
    private readonly Lock _gate = new();
    private readonly List<string> _output = [];
    private readonly List<string> _error = [];
    private readonly Process _process;
    private TaskCompletionSource _changed = new(TaskCreationOptions.RunContinuationsAsynchronously);

    private OutsideProcess(Process process)
    {
        _process = process;
    }

    internal int Id => _process.Id;

    internal static OutsideProcess Start(string program, IEnumerable<string> arguments, IReadOnlyDictionary<string, string>? environment = null)
    {
        ProcessStartInfo start = new(program, arguments) { RedirectStandardInput = true, RedirectStandardOutput = true, RedirectStandardError = true };
        foreach ((string key, string value) in environment ?? new Dictionary<string, string>())
        {
            start.Environment[key] = value;
        }

        Process process = new() { StartInfo = start };
        OutsideProcess outside = new(process);
        process.OutputDataReceived += (_, line) => outside.Keep(outside._output, line.Data);
        process.ErrorDataReceived += (_, line) => outside.Keep(outside._error, line.Data);
        process.Start();
        process.BeginOutputReadLine();
        process.BeginErrorReadLine();
        return outside;
    }

    internal IReadOnlyList<string> Output()
    {
        lock (_gate)
        {
            return [.. _output];
        }
    }

    internal IReadOnlyList<string> Error()
    {
        lock (_gate)
        {
            return [.. _error];
        }
    }

    internal Task WaitForErrorLineAsync(string part, TimeSpan deadline)
    {
        return WaitAsync(() => _error.Exists(line => line.Contains(part, StringComparison.Ordinal)), "a line on standard error with '" + part + "'", deadline);
    }

    internal Task WaitForErrorAsync(Func<IReadOnlyList<string>, bool> enough, string what, TimeSpan deadline)
    {
        return WaitAsync(() => enough(_error), what, deadline);
    }

    internal Task WaitForOutputAsync(Func<IReadOnlyList<string>, bool> enough, string what, TimeSpan deadline)
    {
        return WaitAsync(() => enough(_output), what, deadline);
    }

    /// <summary>Waits until the program ends by itself and gives its exit code.</summary>
    internal async Task<int> ExitCodeAsync(TimeSpan deadline)
    {
        using CancellationTokenSource late = new(deadline);
        try
        {
            await _process.WaitForExitAsync(late.Token);
        }
        catch (OperationCanceledException)
        {
            throw new TimeoutException($"{_process.StartInfo.FileName} did not end within {deadline}.\n{Tail()}");
        }

        return _process.ExitCode;
    }

    /// <summary>SIGTERM, as a service manager sends it.</summary>
    internal async Task<int> TerminateAsync(TimeSpan deadline)
    {
        using Process kill = Process.Start("kill", ["-TERM", Id.ToString(System.Globalization.CultureInfo.InvariantCulture)]);
        await kill.WaitForExitAsync();
        return await ExitCodeAsync(deadline);
    }

    /// <summary>SIGKILL: the program gets no chance to flush anything.</summary>
    internal async Task KillAsync()
    {
        _process.Kill(entireProcessTree: true);
        await _process.WaitForExitAsync();
    }

    internal string Tail()
    {
        lock (_gate)
        {
            return "output:\n" + string.Join('\n', _output.TakeLast(15)) + "\nerror:\n" + string.Join('\n', _error.TakeLast(30));
        }
    }

    public void Dispose()
    {
        if (!_process.HasExited)
        {
            _process.Kill(entireProcessTree: true);
            _process.WaitForExit();
        }

        _process.Dispose();
    }

    private void Keep(List<string> lines, string? line)
    {
        TaskCompletionSource changed;
        lock (_gate)
        {
            if (line is not null)
            {
                lines.Add(line);
            }

            changed = _changed;
            _changed = new TaskCompletionSource(TaskCreationOptions.RunContinuationsAsynchronously);
        }

        changed.TrySetResult();
    }

    private async Task WaitAsync(Func<bool> met, string what, TimeSpan deadline)
    {
        using CancellationTokenSource late = new(deadline);
        while (true)
        {
            Task next;
            lock (_gate)
            {
                if (met())
                {
                    return;
                }

                next = _changed.Task;
            }

            if (_process.HasExited)
            {
                // The last lines may still be on their way: WaitForExit without a limit waits for the readers as well.
                _process.WaitForExit();
                lock (_gate)
                {
                    if (met())
                    {
                        return;
                    }
                }

                throw new InvalidOperationException($"{_process.StartInfo.FileName} ended with {_process.ExitCode} before {what}.\n{Tail()}");
            }

            try
            {
                await Task.WhenAny(next, _process.WaitForExitAsync(late.Token)).WaitAsync(late.Token);
            }
            catch (OperationCanceledException)
            {
                throw new TimeoutException($"no {what} within {deadline}.\n{Tail()}");
            }
        }
    }
}
