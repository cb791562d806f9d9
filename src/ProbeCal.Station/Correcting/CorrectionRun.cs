using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using System.Threading;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Engine;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Storage;
using ProbeCal.Station.WholeFiles;

namespace ProbeCal.Station.Correcting;

/// <summary>
/// Corrects a table of recorded raw readings by the very call that live readings take. The rows come out as they are with the results behind them; what
/// was done stands in a revision beside the output. Neither the input nor an earlier output is ever written to.
/// </summary>
public static class CorrectionRun
{
    private const int RowsBetweenLooks = 1024;
    private static readonly TimeSpan BetweenProgress = TimeSpan.FromMilliseconds(200);

    /// <summary>Corrects a table.</summary>
    /// <param name="request">What is asked.</param>
    /// <param name="log">The calibration log.</param>
    /// <param name="surroundings">Clock, program and ways to tell a person.</param>
    /// <param name="stop">Stops the work; nothing is left of it then.</param>
    /// <returns>Path of the revision.</returns>
    /// <exception cref="InputException">Something in the request or the file is wrong, or no row could be corrected; nothing has been written.</exception>
    /// <exception cref="WorkFailedException">A file cannot be read or written.</exception>
    public static string Run(CorrectionRequest request, CalibrationLogStore log, CorrectionSurroundings surroundings, CancellationToken stop)
    {
        return Run(request, log, surroundings, because: [], stop);
    }

    /// <summary>The same with the reasons for a revision that follows from a changed log.</summary>
    internal static string Run(
        CorrectionRequest request, CalibrationLogStore log, CorrectionSurroundings surroundings, IReadOnlyList<string> because, CancellationToken stop)
    {
        IReadOnlyList<CalibrationInUse> calibrations = CalibrationInUse.Find(log, request);
        ServicePlan plan = ServicePlanner.Plan(log, calibrations, request);
        OutputColumn[] columns = OutputColumn.Parse(request.Write, !plan.IsEmpty);
        if (plan.IsEmpty && Array.Find(columns, static each => each.IsOfService) is OutputColumn none)
        {
            throw Wrong.Input("--write", none.Name, "no service visit and no later calibration says anything about this deployment; 'probecal visit add' records a visit");
        }

        using RawTable table = RawTable.Open(
            request.Input, request.Columns, RowInputs.Known, request.Separator, request.HeaderLine, request.DecimalComma, request.TimeOffset, request.TimeForm);
        RowInputs inputs = new(table, request);
        CheckSignalUnit(inputs, calibrations);
        RefuseExisting(request.Output);
        using ResultFile result = ResultFile.Open(request.Output, request.Input, force: false, static () => Stream.Null);
        using ByteOutput output = new(result.Stream);
        Explain(table, calibrations, plan, surroundings.Say);

        string[] headers = Headers(table.Header, calibrations[0].Record.Gas, columns);
        RowStatus status = new();
        Days days = new(table.Time.Offset ?? TimeSpan.Zero);
        Times offsets = new();
        CopyHeader(table, output, headers);
        WriteRows(table, inputs, new RowCorrector(calibrations, plan), plan, columns, output, status, days, offsets, surroundings, stop);
        if (status.Rows == status.Refused)
        {
            throw NothingCorrected(table, status, calibrations);
        }

        string outputHash = output.Sha256();
        Revision revision = Describe(request, log, surroundings, because, table, calibrations, plan, columns, headers, status, days, offsets, outputHash);
        result.Keep();
        string path = Keep(request.Output, revision);
        status.Tell(surroundings.Say);
        offsets.Tell(surroundings.Say);
        surroundings.Say(string.Create(CultureInfo.InvariantCulture, $"revision {revision.Number}: {Wrong.Shown(path)}"));
        return path;
    }

    private static void WriteRows(
        RawTable table, RowInputs inputs, RowCorrector corrector, ServicePlan plan, OutputColumn[] columns, ByteOutput output, RowStatus status, Days days,
        Times offsets, CorrectionSurroundings surroundings, CancellationToken stop)
    {
        ByteRows rows = table.Rows;
        byte separator = table.Separator;
        int cellsOfHeader = table.Header.Names.Count;
        byte[] lineEnd = Encoding.Latin1.GetBytes(table.Header.LineEnd);
        long last = long.MinValue;
        long started = surroundings.Time.GetTimestamp();
        TimeSpan next = BetweenProgress;
        while (rows.Read(separator))
        {
            if (rows.IsBlank)
            {
                status.Blank++;
                output.Write(rows.Row);
                output.Write(rows.End.IsEmpty ? lineEnd : rows.End);
                continue;
            }

            status.Begin();
            bool corrected = inputs.Read(rows, status);
            if (status.Rows == 0)
            {
                RefuseUnstatedOffset(table, inputs, rows);
            }

            if (corrected)
            {
                Order(inputs.UtcTicks, ref last, status);
                corrected = Correct(inputs, corrector, plan, status);
                offsets.Count(inputs.UtcTicks, inputs.OffsetMinutes, corrected);
            }

            WriteRow(rows, cellsOfHeader, separator, output);
            for (int i = 0; i < columns.Length; i++)
            {
                output.Write(separator);
                if (corrected)
                {
                    WriteColumn(columns[i], inputs, corrector, plan, table.DecimalMark, output);
                }
            }

            output.Write(separator);
            status.End(output, rows.Line, inputs.FaultyCell < 0 || !status.IsRefused ? default : rows.Cell(inputs.FaultyCell));
            output.Write(rows.End.IsEmpty ? lineEnd : rows.End);
            if (corrected && !plan.IsEmpty && !double.IsNaN(corrector.Corrected))
            {
                days.Add(inputs.UtcTicks, corrector.Rating, corrector.SumOfCorrections);
            }

            if (status.Rows % RowsBetweenLooks == 0)
            {
                stop.ThrowIfCancellationRequested();
                TimeSpan elapsed = surroundings.Time.GetElapsedTime(started);
                if (next <= elapsed)
                {
                    next = elapsed + BetweenProgress;
                    surroundings.Progress(new CorrectionProgress(rows.BytesTaken, table.Length, status.Rows, elapsed));
                }
            }
        }

        surroundings.Progress(new CorrectionProgress(rows.BytesTaken, table.Length, status.Rows, surroundings.Time.GetElapsedTime(started)));
        if (status.Rows == 0)
        {
            throw new InputException($"{table.Name}: there is no row under the header");
        }
    }

    /// <summary>Corrects what was read; false when the row is refused.</summary>
    private static bool Correct(RowInputs inputs, RowCorrector corrector, ServicePlan plan, RowStatus status)
    {
        if (!corrector.Find(inputs.UtcTicks))
        {
            status.Refuse("no calibration was in force then");
            return false;
        }

        corrector.Calibration.Rows++;
        corrector.Correct(inputs.UtcTicks, inputs.Signal, inputs.Temperature, inputs.Pressure, inputs.Salinity, inputs.DepthDecibar);
        return RowFlags.Set(corrector, plan, inputs.UtcTicks, status);
    }

    private static void Order(long ticks, ref long last, RowStatus status)
    {
        if (ticks == last)
        {
            status.Flag("time repeats");
        }
        else if (ticks < last)
        {
            status.Flag("time goes back");
        }
        else
        {
            last = ticks;
        }
    }

    private static void WriteRow(ByteRows rows, int cellsOfHeader, byte separator, ByteOutput output)
    {
        int cells = rows.Count;
        if (rows.IsBroken && rows.Count == 1)
        {
            // As it stands it would take what follows into its open cell.
            output.Write((byte)'"');
            foreach (byte each in rows.Row)
            {
                output.Write(each);
                if (each == (byte)'"')
                {
                    output.Write(each);
                }
            }

            output.Write((byte)'"');
        }
        else
        {
            output.Write(rows.Row);
        }

        for (; cells < cellsOfHeader; cells++)
        {
            output.Write(separator);
        }
    }

    private static void WriteColumn(OutputColumn column, RowInputs inputs, RowCorrector corrector, ServicePlan plan, byte mark, ByteOutput output)
    {
        switch (column.Kind)
        {
            case OutputKind.Value: output.Write(corrector.Reading.Value(column.Quantity), column.Decimals, mark); break;
            case OutputKind.Uncertainty: output.Write(corrector.Reading.StandardUncertainty(column.Quantity), column.Decimals, mark); break;
            case OutputKind.Drift: output.Write(corrector.Drift, column.Decimals, mark); break;
            case OutputKind.Fouling: output.Write(corrector.Fouling, column.Decimals, mark); break;
            case OutputKind.Corrected: output.Write(corrector.Corrected, column.Decimals, mark); break;
            case OutputKind.Calibration: output.Write(corrector.Calibration.IdBytes); break;
            case OutputKind.Time: WriteTime(inputs.UtcTicks, output); break;
            case OutputKind.Rating:
                if (!double.IsNaN(corrector.Corrected) && !plan.IsEmpty)
                {
                    output.Write(Days.Bytes(corrector.Rating));
                }

                break;
            default: break;
        }
    }

    private static void WriteTime(long utcTicks, ByteOutput output)
    {
        DateTime time = new(utcTicks, DateTimeKind.Utc);
        Span<byte> text = stackalloc byte[32];
        time.TryFormat(text, out int length, utcTicks % TimeSpan.TicksPerSecond == 0 ? "yyyy-MM-dd'T'HH:mm:ss'Z'" : "yyyy-MM-dd'T'HH:mm:ss.ffffff'Z'", CultureInfo.InvariantCulture);
        output.Write(text[..length]);
    }

    private static void CopyHeader(RawTable table, ByteOutput output, string[] headers)
    {
        byte[] lineEnd = Encoding.Latin1.GetBytes(table.Header.LineEnd);
        for (int i = 1; i <= table.HeaderLines; i++)
        {
            table.Rows.Skip();
            output.Write(table.Rows.Row);
            if (i == table.HeaderLines)
            {
                foreach (string header in headers)
                {
                    output.Write(table.Separator);
                    output.Write(Encoding.UTF8.GetBytes(header));
                }
            }

            output.Write(table.Rows.End.IsEmpty ? lineEnd : table.Rows.End);
        }
    }

    /// <summary>An output may be an input again: its columns keep their names, the new ones are numbered.</summary>
    private static string[] Headers(TableHeader header, string gas, OutputColumn[] columns)
    {
        List<string> names = [];
        foreach (string wanted in columns.Select(each => each.Header(gas)).Append("status"))
        {
            string name = wanted;
            for (int number = 2; header.Names.Contains(name) || names.Contains(name); number++)
            {
                name = string.Create(CultureInfo.InvariantCulture, $"{wanted} #{number}");
            }

            names.Add(name);
        }

        return [.. names];
    }

    private static void CheckSignalUnit(RowInputs inputs, IReadOnlyList<CalibrationInUse> calibrations)
    {
        foreach (CalibrationInUse each in calibrations)
        {
            string unit = each.Record.Probe.SignalUnit;
            if (inputs.SignalUnit is string stated && unit.Length != 0 && stated != unit)
            {
                throw Wrong.Input("--column", "signal", $"the column is said to be in {Wrong.Shown(stated)}, and calibration {each.Record.Id} was made in {unit}; they must be the same");
            }
        }
    }

    private static void RefuseExisting(string output)
    {
        if (output == "-" || string.IsNullOrWhiteSpace(output))
        {
            throw Wrong.Input("--output", output, "name the file that the rows go into: its revision stands beside it");
        }

        if (File.Exists(output) || File.Exists(Revision.PathFor(output)))
        {
            throw Wrong.Input("--output", output, "this is there already, and a revision is never overwritten; give the new one another name");
        }
    }

    private static void RefuseUnstatedOffset(RawTable table, RowInputs inputs, ByteRows rows)
    {
        int time = table.IndexOf("time");
        if (inputs.FaultyCell == time && table.Time.Offset is null && !rows.IsBroken && time < rows.Count
            && table.Time.Read(rows.Cell(time), out _, out _) == CellTimeOutcome.NoOffset)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{table.Name}, line {rows.Line}: the time '{Wrong.Shown(Encoding.UTF8.GetString(rows.Cell(time)))}' does not say its offset from UTC; say how the clock was set, for example --time-offset +02:00 (or UTC)"));
        }
    }

    private static InputException NothingCorrected(RawTable table, RowStatus status, IReadOnlyList<CalibrationInUse> calibrations)
    {
        (string _, string text, long rows, long _) = status.Reasons.First();
        return rows == status.Rows && text == "no calibration was in force then"
            ? new InputException($"{table.Name}: none of its {Number.Print(rows)} rows lies in the time of a calibration; the first, {calibrations[0].Record.Id}, holds from {CalibrationInUse.Utc(calibrations[0].FromTicks)} on (check --time-offset, or name one with --calibration)")
            : new InputException($"{table.Name}: none of its {Number.Print(status.Rows)} rows can be corrected; {status.FirstRefusal}{(status.HasCommaNumber ? " (a comma is no decimal mark unless --decimal-comma says so)" : "")}");
    }

    private static void Explain(RawTable table, IReadOnlyList<CalibrationInUse> calibrations, ServicePlan plan, Action<string> say)
    {
        say($"{table.Name}: {table.Header.Explanation}");
        say("  " + string.Join("; ", table.Mappings.Select(static each => each.Explanation)));
        foreach (CalibrationInUse each in calibrations)
        {
            string until = each.ToTicks == long.MaxValue ? "" : " to " + CalibrationInUse.Utc(each.ToTicks);
            say($"  calibration {each.Record.Id}{(each.FromTicks == 0 ? ", for all rows" : " from " + CalibrationInUse.Utc(each.FromTicks) + until)}");
        }

        foreach (ServiceFinding each in plan.Findings)
        {
            string fouling = double.IsNaN(each.Fouling) ? "" : ", fouling " + Number.Fixed(each.Fouling, 3) + " mg/L";
            string drift = double.IsNaN(each.Drift) ? "" : ", drift " + Number.Fixed(each.Drift, 3) + " mg/L";
            say($"  {each.Entry} at {CalibrationInUse.Utc(each.AtTicks)}{fouling}{drift}: {(each.Applied ? "taken back" : $"not taken back, {Number.Fixed(each.Total, 3)} mg/L is not above {Number.Print(plan.Limits.ApplyAbove)} mg/L")}");
        }
    }

    private static Revision Describe(
        CorrectionRequest request, CalibrationLogStore log, CorrectionSurroundings surroundings, IReadOnlyList<string> because, RawTable table,
        IReadOnlyList<CalibrationInUse> calibrations, ServicePlan plan, OutputColumn[] columns, string[] headers, RowStatus status, Days days, Times offsets, string outputHash)
    {
        string folder = Path.GetDirectoryName(Path.GetFullPath(request.Output))!;
        string input = Path.GetRelativePath(folder, Path.GetFullPath(request.Input));
        string inputHash = table.Rows.Sha256();
        string subject = request.Probe ?? calibrations[0].Record.Probe.Id;
        (string Path, Revision Revision, byte[] Bytes)[] earlier = [.. RevisionJson.In(folder)
            .Where(each => each.Revision.Input.Sha256 == inputHash && each.Revision.Probe == subject)
            .OrderBy(static each => each.Revision.Number)];
        (string Path, Revision Revision, byte[] Bytes)? previous = earlier.Length == 0 ? null : earlier[^1];
        return new Revision
        {
            Number = previous is null ? 1 : previous.Value.Revision.Number + 1,
            Previous = previous is null ? null : new RevisionFile(Path.GetFileName(previous.Value.Path), Convert.ToHexStringLower(System.Security.Cryptography.SHA256.HashData(previous.Value.Bytes))),
            Because = [.. because],
            MadeUtc = surroundings.Time.GetUtcNow(),
            Software = surroundings.Software,
            Probe = subject,
            Input = new RevisionFile(input, inputHash),
            Output = new RevisionFile(Path.GetFileName(request.Output), outputHash),
            FirstUtc = Time(offsets.FirstTicks),
            LastUtc = Time(offsets.LastTicks),
            Request = request with { Input = input, Output = Path.GetFileName(request.Output) },
            Log = new RevisionLog(log.LogId, log.Chain.Count, log.Chain.HeadSha256),
            Calibrations = [.. calibrations.Select(static each => new RevisionCalibration(
                each.Record.Id, each.Stored.Sha256, each.FromTicks == 0 ? null : Time(each.FromTicks), each.ToTicks == long.MaxValue ? null : Time(each.ToTicks), each.Rows))],
            Columns = [.. columns.Select((each, i) => new RevisionColumn(each.Name, headers[i], each.Unit.Length == 0 || each.Decimals == FixedText.Shortest ? null : each.Decimals)).Append(new RevisionColumn("status", headers[^1], null))],
            Service = Describe(request, plan),
            Counts = new RevisionCounts(status.Rows, status.Rows - status.Refused, status.FlaggedRows, status.Refused, status.Blank, [.. status.Reasons.Select(static each => new RevisionReason(each.Word, each.Text, each.Rows, each.FirstLine))]),
            Days = days.ToRevision(),
        };
    }

    private static RevisionService Describe(CorrectionRequest request, ServicePlan plan)
    {
        return new RevisionService
        {
            DriftForm = plan.DriftForm,
            DriftFrom = request.DriftFrom,
            FoulingForm = plan.FoulingForm,
            Limits = plan.Limits,
            Findings = [.. plan.Findings.Select(static each => new RevisionFinding(
                each.Entry, each.Sha256, Time(each.AtTicks), Known(each.Fouling), Known(each.FoulingPercent), Known(each.Drift), Known(each.DriftPercent), each.Total, each.Applied))],
            Drift = [.. plan.Drift.Select(Describe)],
            Fouling = [.. plan.Fouling.Select(Describe)],
            AtService = [.. plan.AtService.Select(static each => new RevisionSpan(Time(each.FromTicks), Time(each.ToTicks)))],
            LastVisitUtc = plan.LastVisitTicks == 0 ? null : Time(plan.LastVisitTicks),
        };
    }

    private static RevisionRamp Describe(ErrorRamp ramp)
    {
        return new RevisionRamp(
            Time(ramp.FromTicks), ramp.ToTicks == long.MaxValue ? null : Time(ramp.ToTicks), Time(ramp.OnsetTicks), Time(ramp.VisitTicks), ramp.Start, ramp.End, ramp.Found, ramp.Held);
    }

    private static double? Known(double value)
    {
        return double.IsNaN(value) ? null : value;
    }

    private static DateTimeOffset Time(long ticks)
    {
        return new DateTimeOffset(ticks, TimeSpan.Zero);
    }

    private static string Keep(string output, Revision revision)
    {
        string path = Revision.PathFor(output);
        bool kept = false;
        try
        {
            using NewFile file = new(Path.GetFullPath(path));
            file.Stream.Write(RevisionJson.ToBytes(revision));
            kept = file.Keep(replace: false);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            throw new WorkFailedException($"{Wrong.Shown(path)}: cannot be written ({fault.Message})", fault);
        }
        finally
        {
            // An output without its revision could not be explained.
            if (!kept)
            {
                File.Delete(output);
            }
        }

        return kept ? path : throw Wrong.Input("--output", output, "a revision of that name has come there meanwhile; give the new one another name");
    }
}
