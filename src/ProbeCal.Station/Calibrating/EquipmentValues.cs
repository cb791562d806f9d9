using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>What the register says of reference equipment at one time, by the ids of the equipment. Immutable.</summary>
public sealed class EquipmentValues
{
    private const string BarometerPrefix = "barometer:";

    private readonly Dictionary<string, EquipmentRecord> _register;

    private EquipmentValues(IEnumerable<EquipmentRecord> register)
    {
        _register = register.ToDictionary(static each => each.Equipment, StringComparer.Ordinal);
    }

    /// <summary>The register in a data folder as it stands at a time; empty where there is no log yet.</summary>
    /// <exception cref="InputException">The log is from a newer version, or of another kind.</exception>
    /// <exception cref="WorkFailedException">The log is damaged, or the system refuses it.</exception>
    public static EquipmentValues In(string folder, DateTimeOffset atUtc)
    {
        if (!Directory.Exists(folder))
        {
            return new EquipmentValues([]);
        }

        using DataDirectory data = DataDirectory.OpenForReading(folder);
        if (!File.Exists(data.CalibrationLogFile))
        {
            return new EquipmentValues([]);
        }

        using CalibrationLogStore log = CalibrationLogStore.OpenForReading(data.CalibrationLogFile);
        return new EquipmentValues(log.AllEquipment(atUtc));
    }

    /// <summary>Certified mole fraction of a cylinder, 0 to 1; null where the register holds none.</summary>
    public RecordedQuantity? MoleFraction(string id)
    {
        return Of(id)?.CertificateValue is { Unit: "1" } certified ? certified with { Source = "register:" + id } : null;
    }

    /// <summary>Concentration of a titrant, mol/L; null where the register holds none.</summary>
    public RecordedQuantity? Concentration(string id)
    {
        return Of(id)?.CertificateValue is { Unit: "mol/L" } certified ? certified with { Source = "register:" + id } : null;
    }

    /// <summary>What is added to what an instrument shows; null where the register holds none.</summary>
    public RecordedQuantity? Correction(string id)
    {
        return Of(id)?.Correction is { } correction ? correction with { Source = "register:" + id } : null;
    }

    /// <summary>Correction of the barometer that a pressure source names, hPa; null where it names none, or the register holds none.</summary>
    public RecordedQuantity? CorrectionOfPressure(string pressureSource)
    {
        int at = pressureSource.IndexOf(BarometerPrefix, StringComparison.Ordinal);
        return at < 0 ? null : Correction(pressureSource[(at + BarometerPrefix.Length)..]) is { Unit: "hPa" } correction ? correction : null;
    }

    private EquipmentRecord? Of(string id)
    {
        return _register.GetValueOrDefault(id);
    }
}
