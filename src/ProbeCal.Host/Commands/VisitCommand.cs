using System;
using System.Collections.Generic;
using System.CommandLine;
using System.Linq;
using ProbeCal.Station;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal visit</c>: service visits to a deployed probe, kept in the calibration log.</summary>
internal static class VisitCommand
{
    internal static Command Create(Terminal terminal)
    {
        return new Command("visit", "Service visits of a deployment: cleaning, field meter, standards; 'correct' takes fouling and drift from them.")
        {
            Add(terminal),
            List(terminal),
        };
    }

    private static Command Add(Terminal terminal)
    {
        Option<string> probe = new("--probe") { Description = "Id of the probe.", Required = true, HelpName = "ID" };
        Option<string> site = new("--site") { Description = "The site.", HelpName = "NAME" };
        Option<string> before = new("--before") { Description = "When the probe was read before cleaning, with its offset: 2026-06-20T09:10+02:00.", Required = true, HelpName = "TIME" };
        Option<string> after = new("--after") { Description = "When it was back in the water, cleaned.", Required = true, HelpName = "TIME" };
        Option<string[]> monitorBefore = new("--monitor-before") { Description = "Probe before cleaning, Mb: 7.90mg/L. Once for each level.", HelpName = "C" };
        Option<string[]> monitorAfter = new("--monitor-after") { Description = "Probe after cleaning, Ma.", HelpName = "C" };
        Option<string[]> fieldBefore = new("--field-before") { Description = "Field meter beside it at the first, Fs.", HelpName = "C" };
        Option<string[]> fieldAfter = new("--field-after") { Description = "Field meter at the second, Fe.", HelpName = "C" };
        Option<string> fieldMeter = new("--field-meter") { Description = "Its id. It shows how the water changed and is never a standard.", HelpName = "ID" };
        Option<bool> inBucket = new("--in-bucket") { Description = "Compared in a bucket of site water, which does not change: no field meter needed." };
        Option<string[]> standards = new("--standard") { Description = "The cleaned probe in a standard: \"8.97mg/L read 8.61mg/L from air-saturated-water at 20.1C salinity 0\". Once for each level.", HelpName = "TEXT" };
        Option<string> standardsAt = new("--standards-at") { Description = "When the standards were read; at --after when left out.", HelpName = "TIME" };
        Option<string> foulingOnset = new("--fouling-onset") { Description = "When fouling began, where an event shows it; the last visit or calibration when left out.", HelpName = "TIME" };
        Option<string> driftOnset = new("--drift-onset") { Description = "When the drift began; the last calibration when left out.", HelpName = "TIME" };
        Option<bool> badCalibration = new("--bad-calibration") { Description = "The last calibration was bad: the whole error over the whole interval." };
        Option<string> by = new("--by") { Description = "Who was there.", HelpName = "NAME" };
        Option<string> remarks = new("--remarks") { Description = "Remarks, among them what an onset was told from.", HelpName = "TEXT" };
        Option<string> data = new("--data") { Description = "Folder of the calibration log (default probecal-data).", HelpName = "DIR" };
        Command command = new(
            "add",
            """
            Records a service visit (USGS TM 1-D3): fouling error (Ma - Mb) - (Fe - Fs), drift error standard less reading.

            Examples:
              probecal visit add --probe do-1 --before 2026-06-20T09:10+02:00 \
                --after 2026-06-20T09:40+02:00 --monitor-before 7.90mg/L --monitor-after 8.25mg/L \
                --field-before 8.31mg/L --field-after 8.35mg/L --field-meter FM-2
              probecal visit add --probe do-1 --before 2026-06-20T07:10Z --after 2026-06-20T07:40Z \
                --standard "8.97mg/L read 8.61mg/L from air-saturated-water at 20.1C salinity 0" \
                --standard "0mg/L read 0.08mg/L from zero-solution at 20.1C salinity 0"
            """)
        {
            probe, before, after, monitorBefore, monitorAfter, fieldBefore, fieldAfter, fieldMeter, inBucket, standards, standardsAt, foulingOnset, driftOnset,
            badCalibration, site, by, remarks, data,
        };
        command.SetAction(parsed =>
        {
            VisitRecord visit = new VisitEntry
            {
                Probe = parsed.GetValue(probe)!,
                Site = parsed.GetValue(site),
                Before = parsed.GetValue(before)!,
                After = parsed.GetValue(after)!,
                MonitorBefore = parsed.GetValue(monitorBefore) ?? [],
                MonitorAfter = parsed.GetValue(monitorAfter) ?? [],
                FieldBefore = parsed.GetValue(fieldBefore) ?? [],
                FieldAfter = parsed.GetValue(fieldAfter) ?? [],
                FieldMeter = parsed.GetValue(fieldMeter),
                InBucket = parsed.GetValue(inBucket),
                Standards = parsed.GetValue(standards) ?? [],
                StandardsAt = parsed.GetValue(standardsAt),
                FoulingOnset = parsed.GetValue(foulingOnset),
                DriftOnset = parsed.GetValue(driftOnset),
                BadCalibration = parsed.GetValue(badCalibration),
                By = parsed.GetValue(by),
                Remarks = parsed.GetValue(remarks),
                Software = ProgramIdentity.Text,
            }.Read(terminal.Time.GetUtcNow());
            using DataDirectory folder = DataDirectory.OpenForWriting(parsed.GetValue(data) ?? CalibrateCommand.UsualData);
            using CalibrationLogStore log = CalibrationLogStore.OpenForWriting(folder.CalibrationLogFile, terminal.Time, Guid.NewGuid);
            string[] probes = [.. log.Records.Select(static each => each.Record.Probe.Id).Distinct()];
            if (Array.IndexOf(probes, visit.Probe) < 0)
            {
                throw Wrong.Input("--probe", visit.Probe, $"no calibration of it is in this log{NearestName.DidYouMean(visit.Probe, probes)}; a visit belongs to a calibrated probe");
            }

            VisitRecord stored = (VisitRecord)log.Append(visit).Entry;
            terminal.Output.WriteLine($"recorded as {stored.Id}{VisitText.Errors(stored)}");
            return ExitCode.Done;
        });
        return command;
    }

    private static Command List(Terminal terminal)
    {
        Option<string> probe = new("--probe") { Description = "Only this probe.", HelpName = "ID" };
        Option<string> data = new("--data") { Description = "Folder of the calibration log (default probecal-data).", HelpName = "DIR" };
        Command command = new("list", "One line for each visit, oldest first, with its fouling and drift errors.") { probe, data };
        command.SetAction(parsed =>
        {
            using DataDirectory folder = DataDirectory.OpenForReading(parsed.GetValue(data) ?? CalibrateCommand.UsualData);
            using CalibrationLogStore log = CalibrationLogStore.OpenForReading(folder.CalibrationLogFile);
            List<string[]> rows = [["id", "time (UTC)", "probe", "fouling mg/L", "drift mg/L", "withdrawn"]];
            foreach (VisitRecord visit in log.Entries.Select(static each => each.Entry).OfType<VisitRecord>().OrderBy(static each => each.BeforeUtc))
            {
                if (parsed.GetValue(probe) is not string only || visit.Probe == only)
                {
                    (string fouling, string drift) = VisitText.Columns(visit);
                    rows.Add([visit.Id, CalibrationText.Time(visit.BeforeUtc), visit.Probe, fouling, drift, log.IsWithdrawn(visit.Id) ? "yes" : ""]);
                }
            }

            TextTable.Write(terminal.Output, rows, "");
            return ExitCode.Done;
        });
        return command;
    }
}
