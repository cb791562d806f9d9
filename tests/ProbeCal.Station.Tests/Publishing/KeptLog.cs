using System;
using System.Collections.Concurrent;
using System.Collections.Generic;
using Microsoft.Extensions.Logging;

namespace ProbeCal.Station.Tests.Publishing;

/// <summary>A logger that keeps its lines.</summary>
public sealed class KeptLog : ILogger
{
    private readonly ConcurrentQueue<string> _lines = new();

    public IReadOnlyCollection<string> Lines => _lines;

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
    }
}
