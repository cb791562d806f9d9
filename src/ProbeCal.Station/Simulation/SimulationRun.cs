using System;
using System.Collections.Generic;
using System.IO;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Simulation;

/// <summary>Sends simulated lines to an output, with the truth beside each where it is asked for.</summary>
public static class SimulationRun
{
    /// <summary>First line of a truth file.</summary>
    public const string TruthFormat = "# format: probecal-truth/1";

    /// <summary>Names of the columns of a truth file; units are in the names.</summary>
    public const string TruthHeader =
        "sequence,timeUtc,phase,temperatureCelsius,pressureHectopascal,salinity,partialPressureHectopascal,milligramsPerLitre,percentLocal,settledSignalNanoampere";

    /// <summary>Runs until enough lines are sent or it is cancelled.</summary>
    /// <param name="source">The simulation.</param>
    /// <param name="output">Where lines go.</param>
    /// <param name="truth">Where the truth goes as CSV; null for nowhere.</param>
    /// <param name="count">How many lines; null for no end.</param>
    /// <param name="cancellationToken">Ends it; what was begun is finished.</param>
    /// <returns>How many lines were sent.</returns>
    public static async Task<long> WriteAsync(
        SimulatedSource source, ILineOutput output, TextWriter? truth, long? count, CancellationToken cancellationToken)
    {
        if (truth is not null)
        {
            await truth.WriteAsync(TruthFormat + "\n" + TruthHeader + "\n").ConfigureAwait(false);
        }

        long sent = 0;
        if (count == 0)
        {
            return sent;
        }

        await foreach (SimulatedLine line in source.LinesAsync(cancellationToken).ConfigureAwait(false))
        {
            // The truth first: whoever has seen a line finds its truth.
            if (truth is not null)
            {
                await truth.WriteAsync(TruthRow(line) + "\n").ConfigureAwait(false);
                await truth.FlushAsync(CancellationToken.None).ConfigureAwait(false);
            }

            await output.WriteAsync(line.Text).ConfigureAwait(false);
            sent++;
            if (sent == count)
            {
                break;
            }
        }

        return sent;
    }

    /// <summary>One row of a truth file, every number so that it reads back as the same double.</summary>
    public static string TruthRow(SimulatedLine line)
    {
        SimulatedTruth truth = line.Truth;
        List<string> columns =
        [
            line.Sequence.ToString(System.Globalization.CultureInfo.InvariantCulture),
            truth.TimeUtc.UtcDateTime.ToString("yyyy-MM-ddTHH:mm:ss.FFFFFFF'Z'", System.Globalization.CultureInfo.InvariantCulture),
            SimulationScript.Name(truth.Phase),
        ];
        double[] values =
        [
            truth.TemperatureCelsius, truth.PressureHectopascal, truth.Salinity, truth.PartialPressureHectopascal,
            truth.MilligramsPerLitre, truth.PercentLocal, truth.SettledSignalNanoampere,
        ];
        columns.AddRange(Array.ConvertAll(values, Number.Print));
        return string.Join(',', columns);
    }
}
