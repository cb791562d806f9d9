namespace ProbeCal.Station.CalibrationLog;

/// <summary>A certified gas mixture over or through which the probe was calibrated.</summary>
public sealed record RecordedMixture
{
    /// <summary>Id of the cylinder in the register, or as entered.</summary>
    public required string Cylinder { get; init; }

    /// <summary>Mole fraction of the gas in the dry mixture, 1.</summary>
    public required RecordedQuantity MoleFraction { get; init; }

    /// <summary>Relative humidity at the probe, %: 0 for dry gas, 100 when bubbled through water.</summary>
    public required RecordedQuantity RelativeHumidityPercent { get; init; }
}

/// <summary>A reading of another probe or meter that was itself calibrated and stands beside the probe.</summary>
public sealed record RecordedTransfer
{
    /// <summary>Id of the standard in the register, or as entered.</summary>
    public required string Standard { get; init; }

    /// <summary>What it showed, in its unit: <c>mg/L</c>, <c>%local</c>, <c>%1atm</c>, <c>hPa</c> or <c>umol/L</c>.</summary>
    public required RecordedQuantity Shown { get; init; }

    /// <summary>Correction that was added to what it showed, from its certificate, same unit.</summary>
    public RecordedQuantity? Correction { get; init; }
}
