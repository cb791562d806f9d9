using System;
using System.Collections.Concurrent;
using System.Collections.Generic;
using System.Linq;
using System.Threading.Tasks;
using Microsoft.Extensions.Logging;

namespace ProbeCal.Station.Tests.Publishing;

/// <summary>A logger that keeps its lines, whatever category they come from.</summary>
public sealed class KeptLog : ILogger, ILoggerFactory
{
    private readonly ConcurrentQueue<string> _lines = new();
    private readonly ConcurrentQueue<(string Part, TaskCompletionSource Seen)> _awaited = new();

    public IReadOnlyCollection<string> Lines => _lines;

    /// <summary>Completes when a line with this part has been logged.</summary>
    public Task SeenAsync(string part)
    {
        TaskCompletionSource seen = new(TaskCreationOptions.RunContinuationsAsynchronously);
        _awaited.Enqueue((part, seen));
        Look();
        return seen.Task.WaitAsync(Deadline.Generous);
    }

    public ILogger CreateLogger(string categoryName)
    {
        return this;
    }

    public void AddProvider(ILoggerProvider provider)
    {
    }

    public void Dispose()
    {
    }

    public IDisposable? BeginScope<TState>(TState state)
        where TState : notnull
    {
        return null;
    }

    public bool IsEnabled(LogLevel logLevel)
    {
        return true;
    }

    public void Log<TState>(LogLevel logLevel, EventId eventId, TState state, Exception? exception, Func<TState, Exception?, string> formatter)
    {
        _lines.Enqueue(logLevel + " " + eventId.Id.ToString(System.Globalization.CultureInfo.InvariantCulture) + " " + formatter(state, exception));
        Look();
    }

    private void Look()
    {
        foreach ((string part, TaskCompletionSource seen) in _awaited)
        {
            if (_lines.Any(line => line.Contains(part, StringComparison.Ordinal)))
            {
                seen.TrySetResult();
            }
        }
    }
}
