using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Threading;
using Microsoft.Extensions.Time.Testing;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Tests.CalibrationLog;
using ProbeCal.Station.Tests.Storage;

namespace ProbeCal.Station.Tests.Correcting;

/// <summary>A calibrated probe at an invented place, its log, and tables of what it recorded.</summary>
internal sealed class Deployment : IDisposable
{
    internal const string Probe = "do-1";
    internal const string Header = "Time;Raw [nA];Water temp;Baro;Salt;Remark";

    private readonly TemporaryLog _log = new();
    private readonly TemporaryFolder _folder = new();

    internal Deployment(bool calibrated = true)
    {
        Log = _log.Write();
        if (calibrated)
        {
            Log.Append(SampleRecords.Of(Probe, SampleRecords.Noon));
        }
    }

    internal CalibrationLogStore Log { get; }

    internal FakeTimeProvider Time { get; } = new(SampleRecords.Noon.AddDays(60));

    /// <summary>What was said to a person.</summary>
    internal List<string> Said { get; } = [];

    internal static CorrectionRequest Asked { get; } = new()
    {
        Input = "",
        Output = "",
        Columns = ["time=Time", "signal=Raw [nA]", "temperature=Water temp [C]", "pressure=Baro [hPa]", "salinity=Salt"],
        Probe = Probe,
    };

    internal string Path(string name)
    {
        return _folder.File(name);
    }

    internal string Write(string name, params string[] lines)
    {
        File.WriteAllText(Path(name), string.Concat(lines.Select(static line => line + "\n")));
        return Path(name);
    }

    /// <summary>Corrects <c>raw.csv</c> to an output of that name and gives its rows as cells by column.</summary>
    internal List<Dictionary<string, string>> Correct(string output = "out.csv", Func<CorrectionRequest, CorrectionRequest>? change = null)
    {
        CorrectionRequest request = Asked with { Input = Path("raw.csv"), Output = Path(output) };
        CorrectionRun.Run(change == null ? request : change(request), Log, Surroundings, CancellationToken.None);
        return Rows(output);
    }

    internal CorrectionSurroundings Surroundings => new(Time, "probecal 9.9.9", Said.Add, static _ => { });

    internal List<Dictionary<string, string>> Rows(string output)
    {
        string[] lines = File.ReadAllLines(Path(output));
        string[] names = lines[0].Split(';');
        return [.. lines.Skip(1).Where(static line => line.Length != 0).Select(line => line.Split(';').Zip(names).ToDictionary(static pair => pair.Second, static pair => pair.First))];
    }

    internal Revision RevisionOf(string output = "out.csv")
    {
        return RevisionJson.Read("--revision", Revision.PathFor(Path(output)));
    }

    internal VisitRecord Visit(Func<VisitEntry, VisitEntry> change)
    {
        VisitEntry entry = new() { Probe = Probe, Before = "2026-06-21T12:00Z", After = "2026-06-21T12:30Z", Software = "probecal 9.9.9" };
        return (VisitRecord)Log.Append(change(entry).Read(DateTimeOffset.MaxValue)).Entry;
    }

    /// <summary>A row of the table.</summary>
    internal static string Row(DateTimeOffset time, double signal, double temperature = 18.25, double pressure = 941.5, double salinity = 0.3, string remark = "")
    {
        return string.Create(CultureInfo.InvariantCulture, $"{time.UtcDateTime:yyyy-MM-dd'T'HH:mm:ss}Z;{signal:R};{temperature:R};{pressure:R};{salinity:R};{remark}");
    }

    internal static double Value(Dictionary<string, string> row, string column)
    {
        return double.Parse(row[column], CultureInfo.InvariantCulture);
    }

    public void Dispose()
    {
        Log.Dispose();
        _log.Dispose();
        _folder.Dispose();
    }
}
