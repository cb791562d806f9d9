using System;
using System.IO;
using Microsoft.Extensions.Logging;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Simulation;

namespace ProbeCal.Station.Sources;

/// <summary>Address to source.</summary>
public static class SourceFactory
{
    /// <summary>Makes a source. It is opened when it is read, not here.</summary>
    /// <param name="address">Where samples come from.</param>
    /// <param name="template">How the lines read.</param>
    /// <param name="time">The clock that stamps, waits and watches.</param>
    /// <param name="logger">Where changes of state are logged besides.</param>
    /// <param name="standardInput">What <c>stdin</c> reads; needed for that address only.</param>
    /// <param name="mustOpen">
    /// True for a command that a person has just typed: when the source cannot be opened the first time, reading throws a
    /// <see cref="WorkFailedException"/> of one line. False for a running station: the source reports
    /// <see cref="SourceState.Lost"/> and tries again for as long as it takes.
    /// </param>
    /// <exception cref="InputException">The file to be read is not there, or standard input cannot be read here.</exception>
    public static ISampleSource Create(
        SourceAddress address,
        LineTemplate template,
        TimeProvider time,
        ILogger logger,
        TextReader? standardInput = null,
        bool mustOpen = false)
    {
        switch (address)
        {
            case SerialAddress serial:
                return new LineSource(new SerialOpener(serial, logger), template, time, logger, mustOpen);
            case TcpAddress tcp:
                return new LineSource(new TcpOpener(tcp, time), template, time, logger, mustOpen);
            case FileAddress file:
                if (!File.Exists(file.Path))
                {
                    throw new InputException($"source {Wrong.Shown(address.ToString())}: there is no such file; name one that holds lines");
                }

                ReplayPace? pace = file.Pace == 0 ? null : new ReplayPace(file.Pace);
                return new LineSource(new FileOpener(file), template, time, logger, mustOpen, pace);
            case StandardInputAddress:
                return standardInput is null
                    ? throw new InputException("source stdin: standard input cannot be read here; name a port, an address or a file")
                    : new LineSource(new StandardInputOpener(standardInput), template, time, logger, mustOpen);
            case SimulatedAddress simulated:
                return new SimulatedSource(simulated.Settings, template, time);
            default:
                throw new InputException($"source {Wrong.Shown(address.ToString() ?? "")}: there is nothing that reads this");
        }
    }
}
