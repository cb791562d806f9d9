using System;
using System.Globalization;
using System.IO;
using System.Threading;
using Microsoft.Extensions.Logging;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host;

/// <summary>
/// The log of a command as lines on standard error: time, level, event id, category, text. Standard output stays free for
/// results.
/// </summary>
internal sealed class TerminalLog : ILoggerProvider
{
    private readonly TextWriter _error;
    private readonly TimeProvider _time;
    private readonly Lock _line = new();
    private long _dropped;

    internal TerminalLog(Terminal terminal)
    {
        _error = terminal.Error;
        _time = terminal.Time;
    }

    /// <summary>A factory that logs to a terminal from <paramref name="least"/> on.</summary>
    internal static ILoggerFactory FactoryFor(Terminal terminal, LogLevel least = LogLevel.Information)
    {
        return LoggerFactory.Create(builder => builder.SetMinimumLevel(least).AddProvider(new TerminalLog(terminal)));
    }

    public ILogger CreateLogger(string categoryName)
    {
        return new Category(this, categoryName);
    }

    public void Dispose()
    {
    }

    private void Write(string line)
    {
        lock (_line)
        {
            try
            {
                if (_dropped != 0)
                {
                    _error.WriteLine(string.Create(CultureInfo.InvariantCulture, $"({_dropped} lines of this log could not be written)"));
                    _dropped = 0;
                }

                _error.WriteLine(line);
            }
            catch (IOException)
            {
                // A log on a full disk must not end the stream whose state it tells; how much is missing is told when there is room.
                _dropped++;
            }
        }
    }

    private static string Word(LogLevel level)
    {
        return level switch
        {
            LogLevel.Critical or LogLevel.Error => "error",
            LogLevel.Warning => "warn",
            LogLevel.Information => "info",
            _ => "debug",
        };
    }

    private sealed class Category(TerminalLog log, string name) : ILogger
    {
        public IDisposable? BeginScope<TState>(TState state)
            where TState : notnull
        {
            return null;
        }

        public bool IsEnabled(LogLevel logLevel)
        {
            return logLevel != LogLevel.None;
        }

        public void Log<TState>(LogLevel logLevel, EventId eventId, TState state, Exception? exception, Func<TState, Exception?, string> formatter)
        {
            string time = log._time.GetUtcNow().UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss.fff'Z'", CultureInfo.InvariantCulture);
            string text = formatter(state, exception).ReplaceLineEndings(" ");
            string cause = exception == null ? "" : " (" + exception.GetType().Name + ": " + exception.Message.ReplaceLineEndings(" ") + ")";

            // A line of a device or a broker may be quoted in it: the terminal shows that and does not obey it.
            log.Write(Wrong.OneLine(string.Create(CultureInfo.InvariantCulture, $"{time} {Word(logLevel)} {eventId.Id} {name}: {text}{cause}")));
        }
    }
}
