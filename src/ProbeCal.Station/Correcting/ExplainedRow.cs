using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Correcting;

/// <summary>One step on the way to a corrected value.</summary>
/// <param name="Name">What it gives.</param>
/// <param name="Formula">How, in the names of <paramref name="Inputs"/>; empty for what was read.</param>
/// <param name="Inputs">The numbers that went in.</param>
/// <param name="Value">What came out; NaN where nothing did.</param>
/// <param name="Unit">Its unit; empty for none.</param>
/// <param name="From">Where it comes from, in words.</param>
public sealed record CorrectionStep(string Name, string Formula, IReadOnlyList<(string Name, double Value)> Inputs, double Value, string Unit, string From);

/// <summary>How one row of a revision came about: the same computation as in the run, with its steps.</summary>
public sealed class ExplainedRow
{
    private readonly List<CorrectionStep> _steps = [];

    private ExplainedRow(string title)
    {
        Title = title;
    }

    /// <summary>Which row of which revision.</summary>
    public string Title { get; }

    /// <summary>The row as it stands in the raw table.</summary>
    public string Raw { get; private set; } = "";

    /// <summary>The steps in order.</summary>
    public IReadOnlyList<CorrectionStep> Steps => _steps;

    /// <summary>The status that the row has.</summary>
    public string Status { get; private set; } = "";

    /// <summary>Explains a row.</summary>
    /// <param name="path">The revision.</param>
    /// <param name="row">Which row under the header, from 1, blank lines not counted.</param>
    /// <param name="log">The calibration log.</param>
    /// <exception cref="InputException">There is no such revision or row, or what it rests on is not there.</exception>
    public static ExplainedRow Of(string path, long row, CalibrationLogStore log)
    {
        Revision revision = RevisionJson.Read("--revision", path);
        string input = Path.GetFullPath(Path.Combine(Path.GetDirectoryName(Path.GetFullPath(path))!, revision.Input.File));
        CorrectionRequest request = revision.Request with { Input = input };
        IReadOnlyList<CalibrationInUse> calibrations = CalibrationInUse.Of(log, revision);
        ServicePlan plan = PlanOf(revision, log);
        using RawTable table = RawTable.Open(
            input, request.Columns, RowInputs.Known, request.Separator, request.HeaderLine, request.DecimalComma, request.TimeOffset, request.TimeForm);
        RowInputs inputs = new(table, request);
        for (int i = 0; i < table.HeaderLines; i++)
        {
            table.Rows.Skip();
        }

        ExplainedRow explained = new(string.Create(CultureInfo.InvariantCulture, $"row {row} of {Wrong.Shown(revision.Input.File)}, revision {revision.Number}"));
        RowStatus status = new();
        RowCorrector corrector = new(calibrations, plan);
        long number = 0;
        bool found = false;
        while (table.Rows.Read(table.Separator))
        {
            if (!table.Rows.IsBlank && ++number == row && !found)
            {
                found = true;
                explained.Take(table, inputs, corrector, plan, status);
            }
        }

        if (!found)
        {
            throw Wrong.Input("--row", Number.Print(row), $"the table has {Number.Print(number)} rows under its header");
        }

        return table.Rows.Sha256() == revision.Input.Sha256
            ? explained
            : throw new InputException($"{Wrong.Shown(path)}: its input {Wrong.Shown(revision.Input.File)} has other bytes now, so the row cannot be explained");
    }

    /// <summary>The value of the step of a name.</summary>
    internal double ValueOf(string name)
    {
        return _steps.First(each => each.Name == name).Value;
    }

    private void Take(RawTable table, RowInputs inputs, RowCorrector corrector, ServicePlan plan, RowStatus status)
    {
        Raw = Encoding.UTF8.GetString(table.Rows.Row);
        status.Begin();
        bool corrected = inputs.Read(table.Rows, status) && Find(corrector, inputs, status);
        if (corrected)
        {
            corrector.Correct(inputs.UtcTicks, inputs.Signal, inputs.Temperature, inputs.Pressure, inputs.Salinity, inputs.DepthDecibar);
            corrected = RowFlags.Set(corrector, plan, inputs.UtcTicks, status);
            AddInputs(table, inputs);
            AddCalibration(corrector.Calibration, inputs);
            if (corrected)
            {
                AddReading(corrector, inputs);
                if (!plan.IsEmpty)
                {
                    AddDrift(corrector, plan, inputs);
                    AddFouling(corrector, plan, inputs);
                    AddRating(corrector, plan);
                }
            }
        }

        using MemoryStream text = new();
        using ByteOutput output = new(text);
        status.End(output, table.Rows.Line, default);
        output.Flush();
        Status = Encoding.UTF8.GetString(text.ToArray());
    }

    private static bool Find(RowCorrector corrector, RowInputs inputs, RowStatus status)
    {
        bool found = corrector.Find(inputs.UtcTicks);
        if (!found)
        {
            status.Refuse("no calibration was in force then");
        }

        return found;
    }

    private void AddInputs(RawTable table, RowInputs inputs)
    {
        Read("signal", inputs.Signal, inputs.SignalUnit ?? "", From(table, "signal") + " at " + CalibrationInUse.Utc(inputs.UtcTicks));
        Read("temperature", inputs.Temperature, "degC", From(table, "temperature"));
        Read("pressure", inputs.Pressure, "hPa", From(table, "pressure"));
        Read("salinity", inputs.Salinity, "", From(table, "salinity"));
        Read("water above", inputs.DepthDecibar, "dbar", inputs.HasDepth ? From(table, "depth") + ", depth at the density of this water" : "no depth stated, so the surface, as live");
    }

    private void AddCalibration(CalibrationInUse calibration, RowInputs inputs)
    {
        string from = $"calibration {calibration.Record.Id} of {CalibrationInUse.Utc(calibration.Record.CompletedUtc.UtcTicks)}, record SHA-256 {calibration.Stored.Sha256[..12]}...";
        Read("slope", calibration.Core.Slope, "response/hPa", from);
        Read("zero", calibration.Core.ZeroResponse, "response", from);
        Read("flow factor", calibration.Conditions.FlowFactor, "", from);
        calibration.Core.Model.Response(inputs.Signal, inputs.Temperature, inputs.Pressure, inputs.DepthDecibar, RangeRule.Extrapolate, out double response);
        calibration.Core.Model.Gain(inputs.Temperature, RangeRule.Extrapolate, out double gain);
        _steps.Add(new CorrectionStep("response", "the signal on the scale of the probe's model", [("signal", inputs.Signal)], response, "response", "model " + calibration.Record.Probe.Model));
        _steps.Add(new CorrectionStep("gain", "response per hPa at this temperature over that at the reference temperature", [("temperature", inputs.Temperature)], gain, "", "temperature coefficient, " + calibration.Record.Probe.TemperatureCoefficient.Form));
    }

    private void AddReading(RowCorrector corrector, RowInputs inputs)
    {
        CalibrationInUse calibration = corrector.Calibration;
        double pressure = corrector.Reading.Value(ReadingQuantity.PartialPressure);
        bool isLine = calibration.Record.Fit is not { Curvature: not 0 } && !ModelNames.IsLogarithmic(calibration.Record.Probe.Model);
        _steps.Add(new CorrectionStep(
            "partial pressure",
            isLine ? "(response - zero)/(slope * flow factor * gain)" : "where the fitted response has this value",
            [("response", ValueOf("response")), ("zero", calibration.Core.ZeroResponse), ("slope", calibration.Core.Slope), ("flow factor", calibration.Conditions.FlowFactor), ("gain", ValueOf("gain"))],
            pressure, "hPa", "Correction of Core, as live"));
        double concentration = corrector.Reading.Value(ReadingQuantity.MilligramsPerLitre);
        double per = corrector.PerHectopascal(calibration, concentration, inputs.Temperature, inputs.Pressure, inputs.Salinity);
        Read("mg/L per hPa", per, "mg/L/hPa", $"{EquationNames.NameOf(calibration.Conditions.Equation)} at this temperature, salinity and pressure ('probecal explain' goes into it)");
        _steps.Add(new CorrectionStep("concentration", "partial pressure * mg/L per hPa", [("partial pressure", pressure), ("mg/L per hPa", per)], concentration, "mg/L", "Correction of Core, as live"));
        Read("% of local air", corrector.Reading.Value(ReadingQuantity.PercentLocal), "%", "Correction of Core, as live");
        Read("% of air at 1 atm", corrector.Reading.Value(ReadingQuantity.PercentOneAtmosphere), "%", "Correction of Core, as live");
    }

    private void AddDrift(RowCorrector corrector, ServicePlan plan, RowInputs inputs)
    {
        double concentration = ValueOf("concentration");
        if (corrector.DriftRamp is not ErrorRamp ramp)
        {
            _steps.Add(new CorrectionStep("after drift", "concentration", [("concentration", concentration)], corrector.AfterDrift, "mg/L", "no drift above the limit is known at this time, or none is asked for"));
            return;
        }

        Share("share of the drift", ramp, corrector.DriftShare, inputs);
        switch (plan.DriftForm)
        {
            case CorrectionForms.Constant:
                Published("after drift", "concentration + start + share * (end - start)", concentration, ramp.Start.MilligramsPerLitre, ramp.End.MilligramsPerLitre, corrector.DriftShare, corrector.AfterDrift);
                break;
            case CorrectionForms.Percent:
                Published("after drift", "concentration * (1 + (start + share * (end - start))/100)", concentration, ramp.Start.Percent, ramp.End.Percent, corrector.DriftShare, corrector.AfterDrift);
                break;
            default:
                Moved("drifted slope over slope", ramp.Start.Slope, ramp.End.Slope, corrector.DriftShare, corrector.DriftSlope, "");
                Moved("drifted zero less zero", ramp.Start.Zero, ramp.End.Zero, corrector.DriftShare, corrector.DriftZero, "response");
                double perResponse = double.IsNaN(corrector.ResponsePerHectopascal) ? 1 : corrector.ResponsePerHectopascal;
                _steps.Add(new CorrectionStep(
                    "after drift", "(partial pressure - zero moved/response per hPa)/slope moved * mg/L per hPa",
                    [
                        ("partial pressure", ValueOf("partial pressure")), ("zero moved", corrector.DriftZero), ("response per hPa", perResponse),
                        ("slope moved", corrector.DriftSlope), ("mg/L per hPa", ValueOf("mg/L per hPa")),
                    ],
                    corrector.AfterDrift, "mg/L", "drift in slope and zero"));
                break;
        }

        _steps.Add(new CorrectionStep("drift correction", "after drift - concentration", [("after drift", corrector.AfterDrift), ("concentration", concentration)], corrector.Drift, "mg/L", "found by " + ramp.Found));
    }

    private void AddFouling(RowCorrector corrector, ServicePlan plan, RowInputs inputs)
    {
        if (corrector.FoulingRamp is not ErrorRamp ramp)
        {
            _steps.Add(new CorrectionStep("corrected", "after drift", [("after drift", corrector.AfterDrift)], corrector.Corrected, "mg/L", "no fouling above the limit is known at this time, or none is asked for"));
            return;
        }

        Share("share of the fouling", ramp, corrector.FoulingShare, inputs);
        switch (plan.FoulingForm)
        {
            case CorrectionForms.Constant:
                Published("corrected", "after drift + start + share * (end - start)", corrector.AfterDrift, ramp.Start.MilligramsPerLitre, ramp.End.MilligramsPerLitre, corrector.FoulingShare, corrector.Corrected);
                break;
            case CorrectionForms.Percent:
                _steps.Add(new CorrectionStep(
                    "corrected", "after drift + concentration * (start + share * (end - start))/100",
                    [("after drift", corrector.AfterDrift), ("concentration", ValueOf("concentration")), ("start", ramp.Start.Percent), ("end", ramp.End.Percent), ("share", corrector.FoulingShare)],
                    corrector.Corrected, "mg/L", "TM 1-D3"));
                break;
            default:
                Moved("fouled slope over clean", ramp.Start.Slope, ramp.End.Slope, corrector.FoulingShare, corrector.FoulingSlope, "");
                Moved("fouled zero", ramp.Start.Zero, ramp.End.Zero, corrector.FoulingShare, corrector.FoulingZero, "mg/L");
                _steps.Add(new CorrectionStep(
                    "corrected", "(after drift - zero moved)/slope moved",
                    [("after drift", corrector.AfterDrift), ("zero moved", corrector.FoulingZero), ("slope moved", corrector.FoulingSlope)],
                    corrector.Corrected, "mg/L", "fouling in slope and zero"));
                break;
        }

        _steps.Add(new CorrectionStep("fouling correction", "corrected - after drift", [("corrected", corrector.Corrected), ("after drift", corrector.AfterDrift)], corrector.Fouling, "mg/L", "found by " + ramp.Found));
    }

    private void AddRating(RowCorrector corrector, ServicePlan plan)
    {
        _steps.Add(new CorrectionStep(
            "sum of corrections", "|drift correction| + |fouling correction|", [("drift correction", corrector.Drift), ("fouling correction", corrector.Fouling)],
            corrector.SumOfCorrections, "mg/L", $"rated {ServiceLimits.RatingNames[(int)corrector.Rating]}; limits: {plan.Limits.Source}"));
    }

    private void Share(string name, ErrorRamp ramp, double share, RowInputs inputs)
    {
        double ahead = (double)(inputs.UtcTicks - ramp.OnsetTicks) / TimeSpan.TicksPerSecond;
        double whole = (double)(ramp.VisitTicks - ramp.OnsetTicks) / TimeSpan.TicksPerSecond;
        _steps.Add(new CorrectionStep(
            name, "seconds since onset/seconds from onset to visit, from 0 to 1", [("seconds since onset", ahead), ("seconds from onset to visit", whole)], share, "",
            $"onset {CalibrationInUse.Utc(ramp.OnsetTicks)}, found {CalibrationInUse.Utc(ramp.VisitTicks)}{(ramp.Held ? ", held since" : "")}"));
    }

    private void Moved(string name, double start, double end, double share, double value, string unit)
    {
        _steps.Add(new CorrectionStep(name, "start + share * (end - start)", [("start", start), ("end", end), ("share", share)], value, unit, "linear in time"));
    }

    private void Published(string name, string formula, double concentration, double start, double end, double share, double value)
    {
        _steps.Add(new CorrectionStep(name, formula, [(formula.Split(' ', 2)[0] == "after" ? "after drift" : "concentration", concentration), ("start", start), ("end", end), ("share", share)], value, "mg/L", "TM 1-D3"));
    }

    private void Read(string name, double value, string unit, string from)
    {
        _steps.Add(new CorrectionStep(name, "", [], value, unit, from));
    }

    private static string From(RawTable table, string quantity)
    {
        int index = table.IndexOf(quantity);
        return index < 0 ? "stated for all rows" : $"column '{Wrong.Shown(table.Header.Names[index])}'";
    }

    private static ServicePlan PlanOf(Revision revision, CalibrationLogStore log)
    {
        RevisionService service = revision.Service;
        return new ServicePlan
        {
            DriftForm = service.DriftForm,
            FoulingForm = service.FoulingForm,
            Limits = service.Limits,
            Drift = [.. service.Drift.Select(Ramp)],
            Fouling = [.. service.Fouling.Select(Ramp)],
            Findings = [.. service.Findings.Select(static each => new ServiceFinding(
                each.Entry, each.Sha256, each.AtUtc.UtcTicks, each.FoulingMilligramsPerLitre ?? double.NaN, each.FoulingPercent ?? double.NaN,
                each.DriftMilligramsPerLitre ?? double.NaN, each.DriftPercent ?? double.NaN, each.TotalMilligramsPerLitre, each.Applied))],
            AtService = [.. service.AtService.Select(static each => (each.FromUtc.UtcTicks, each.ToUtc.UtcTicks))],
            LastVisitTicks = service.LastVisitUtc?.UtcTicks ?? 0,
            Brackets = Brackets.Of(log, revision.Probe),
        };
    }

    private static ErrorRamp Ramp(RevisionRamp ramp)
    {
        return new ErrorRamp(ramp.FromUtc.UtcTicks, ramp.ToUtc?.UtcTicks ?? long.MaxValue, ramp.OnsetUtc.UtcTicks, ramp.FoundUtc.UtcTicks, ramp.Start, ramp.End, ramp.Found, ramp.Held);
    }
}
