using System;
using System.Collections.Generic;
using ProbeCal.Station.Entry;
using ProbeCal.Station.WholeFiles;

namespace ProbeCal.Station.Correcting;

/// <summary>What a row holds: time, signal, temperature, pressure, salinity, from its cells or from values stated for all rows.</summary>
internal sealed class RowInputs
{
    /// <summary>What may come from a column of a table that is corrected.</summary>
    internal static IReadOnlyList<ColumnQuantity> Known { get; } =
    [
        new("time"), new("signal"), new("temperature", QuantityKind.Temperature), new("pressure", QuantityKind.Pressure), new("salinity", QuantityKind.Salinity),
        new("depth", QuantityKind.Depth),
    ];

    private const double HectopascalPerDecibar = 100;

    /// <summary>Standard pressure at 11 km, and the highest of all sea-level pressures brought down to 610 m below (ICAO standard atmosphere), hPa, rounded outwards.</summary>
    private const double LowestAir = 226, HighestAir = 1130;

    private readonly RawTable _table;
    private readonly int _time;
    private readonly int _signal;
    private readonly Input _temperature;
    private readonly Input _pressure;
    private readonly Input _salinity;
    private readonly Input _depth;
    private readonly double _altitude;

    /// <exception cref="InputException">Something is missing, or said twice.</exception>
    internal RowInputs(RawTable table, CorrectionRequest request)
    {
        _table = table;
        _time = Needed("time", "time=Time");
        _signal = Needed("signal", "signal=DO raw [nA]");
        _temperature = Of("temperature", request.Temperature, QuantityKind.Temperature, "12.5C", mayBeNone: false);
        _pressure = Of("pressure", request.Pressure, QuantityKind.Pressure, "742mmHg", mayBeNone: true);
        _salinity = Of("salinity", request.Salinity, QuantityKind.Salinity, "0", mayBeNone: true);
        HasDepth = request.Depth is not null || 0 <= table.IndexOf("depth");
        _depth = HasDepth ? Of("depth", request.Depth, QuantityKind.Depth, "9m", mayBeNone: false) : new Input(-1, null, 0);
        _altitude = request.Altitude is string text ? Quantity.AltitudeMetres("--altitude", text) : double.NaN;
        SignalUnit = Array.Find(table.Mappings, static each => each.Quantity.Name == "signal")!.UnitText;
    }

    /// <summary>Unit of the signal as the mapping says it; null where it says none.</summary>
    internal string? SignalUnit { get; }

    internal long UtcTicks { get; private set; }

    internal int OffsetMinutes { get; private set; }

    internal double Signal { get; private set; }

    internal double Temperature { get; private set; }

    /// <summary>The pressure that Core may use: NaN when there is none or it cannot be true.</summary>
    internal double Pressure { get; private set; }

    internal double Salinity { get; private set; }

    /// <summary>Pressure of the water above the probe, dbar; 0 where no depth is stated, as live.</summary>
    internal double DepthDecibar { get; private set; }

    /// <summary>True when a column or an option has a depth.</summary>
    internal bool HasDepth { get; }

    /// <summary>The cell at fault of a refused row.</summary>
    internal int FaultyCell { get; private set; } = -1;

    /// <summary>Reads a row; what is wrong stands in the status. False when the row is refused.</summary>
    /// <param name="status">Takes what is wrong.</param>
    /// <param name="row">The row.</param>
    internal bool Read(ByteRows row, RowStatus status)
    {
        FaultyCell = -1;
        if (row.IsBroken || row.Count != _table.Header.Names.Count)
        {
            status.Refuse(row.IsBroken ? "a quotation mark is opened and never closed" : row.End.IsEmpty && row.Count < _table.Header.Names.Count ? "the last line is cut off" : "other number of cells than the header");
            return false;
        }

        CellTimeOutcome time = _table.Time.Read(row.Cell(_time), out long ticks, out int offset);
        if (time != CellTimeOutcome.Read)
        {
            FaultyCell = _time;
            status.Refuse(time switch
            {
                CellTimeOutcome.Missing => "time missing",
                CellTimeOutcome.NoOffset => "time does not say its offset from UTC",
                CellTimeOutcome.OtherOffset => "time says another offset than --time-offset",
                _ => "time unreadable",
            });
            return false;
        }

        (UtcTicks, OffsetMinutes) = (ticks, offset);
        if (!TryNumber(row, _signal, null, out double signal, out bool missing))
        {
            FaultyCell = _signal;
            status.Refuse(missing ? "signal missing" : "signal unreadable");
            return false;
        }

        Signal = signal;
        if (!_temperature.TryRead(this, row, out double temperature, out missing))
        {
            FaultyCell = _temperature.Index;
            status.Refuse(missing ? "temperature missing" : "temperature unreadable");
            return false;
        }

        Temperature = temperature;
        Pressure = double.NaN;
        if (!_pressure.IsNone)
        {
            if (_pressure.TryRead(this, row, out double pressure, out missing))
            {
                Judge(pressure, status);
            }
            else
            {
                status.Flag(missing ? "pressure missing" : "pressure unreadable");
            }
        }

        Salinity = double.NaN;
        if (!_salinity.IsNone)
        {
            if (_salinity.TryRead(this, row, out double salinity, out missing))
            {
                Salinity = salinity;
            }
            else
            {
                status.Flag(missing ? "salinity missing" : "salinity unreadable");
            }
        }

        return !HasDepth || ReadDepth(row, status);
    }

    private bool ReadDepth(ByteRows row, RowStatus status)
    {
        if (!_depth.TryRead(this, row, out double depth, out bool missing))
        {
            FaultyCell = _depth.Index;
            status.Refuse(missing ? "depth missing" : "depth unreadable");
            return false;
        }

        // Without a salinity the water is taken as fresh: 3 % of the water's pressure at most.
        DensityEos80.Density(Temperature, double.IsNaN(Salinity) ? 0 : Salinity, RangeRule.Extrapolate, out double density);
        Status ofDepth = HydrostaticPressure.Hectopascal(depth, density, RangeRule.Refuse, out double hectopascal);
        DepthDecibar = hectopascal / HectopascalPerDecibar;
        if (ofDepth != Status.Ok)
        {
            FaultyCell = _depth.Index;
            status.Refuse("depth out of range");
        }

        return ofDepth == Status.Ok;
    }

    private void Judge(double pressure, RowStatus status)
    {
        Pressure = pressure;
        if (double.IsNaN(_altitude))
        {
            // Without an altitude the highest and the deepest place decide: a slip of unit or sign shows against them.
            if (!(LowestAir <= pressure && pressure <= HighestAir))
            {
                status.Flag("pressure is no air pressure");
                Pressure = double.NaN;
            }

            return;
        }

        // As live: a pressure that cannot be true at this altitude is not used.
        Status ofJudgement = PressurePlausibility.Judge(pressure, _altitude, out PressureVerdict verdict, out _);
        if (ofJudgement == Status.Ok && verdict == PressureVerdict.Plausible)
        {
            return;
        }

        bool usable = ofJudgement == Status.Ok && verdict is PressureVerdict.ConfirmHigh or PressureVerdict.ConfirmLow;
        status.Flag(usable ? "pressure unusual at this altitude" : "pressure impossible at this altitude");
        Pressure = usable ? pressure : double.NaN;
    }

    private bool TryNumber(ByteRows row, int index, QuantityUnit? unit, out double value, out bool missing)
    {
        ReadOnlySpan<byte> cell = row.Cell(index);
        missing = false;
        if (CellNumber.TryParse(cell, _table.DecimalMark, out value))
        {
            value = unit is null ? value : unit.ToCanonical(value);
            return double.IsFinite(value);
        }

        missing = RawTable.IsMissing(cell);
        return false;
    }

    private int Needed(string quantity, string example)
    {
        int index = _table.IndexOf(quantity);
        return 0 <= index ? index : throw new InputException($"--column {quantity}=... is missing: say which column holds the {quantity}, for example --column \"{example}\" (columns: {string.Join(", ", _table.Header.Names)})");
    }

    private Input Of(string quantity, string? text, QuantityKind kind, string example, bool mayBeNone)
    {
        int index = _table.IndexOf(quantity);
        if (0 <= index)
        {
            return text is null ? new Input(index, _table.UnitOf(quantity), double.NaN) : throw Wrong.Input("--" + quantity, text, $"a column holds the {quantity} too; leave one out");
        }

        if (text is null)
        {
            throw new InputException($"the {quantity} is missing: map its column, or say one for all rows, for example --{quantity} {example}{(mayBeNone ? $" (--{quantity} none goes without)" : "")}");
        }

        return mayBeNone && text == "none" ? new Input(-1, null, double.NaN) : new Input(-1, null, Quantity.Parse(kind, "--" + quantity, text));
    }

    private readonly record struct Input(int Index, QuantityUnit? Unit, double Fixed)
    {
        internal bool IsNone => Index < 0 && double.IsNaN(Fixed);

        internal bool TryRead(RowInputs inputs, ByteRows row, out double value, out bool missing)
        {
            if (0 <= Index)
            {
                return inputs.TryNumber(row, Index, Unit, out value, out missing);
            }

            (value, missing) = (Fixed, false);
            return true;
        }
    }
}
