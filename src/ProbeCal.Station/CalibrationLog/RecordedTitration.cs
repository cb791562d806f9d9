namespace ProbeCal.Station.CalibrationLog;

/// <summary>A reference titration (Winkler) as entered, replicates and all.</summary>
public sealed record RecordedTitration
{
    /// <summary>Titrant in each replicate, mL.</summary>
    public required double[] TitreMillilitres { get; init; }

    /// <summary>Blank, mL of titrant; its uncertainty with it.</summary>
    public required RecordedQuantity Blank { get; init; }

    /// <summary>Amount concentration of the thiosulfate, mol/L (which is its normality), from the standardisation or entered.</summary>
    public required RecordedQuantity Titrant { get; init; }

    /// <summary>Standardisation that gave <see cref="Titrant"/>; none when it was entered.</summary>
    public RecordedStandardisation? Standardisation { get; init; }

    /// <summary>Volume of the flask, mL.</summary>
    public required RecordedQuantity Flask { get; init; }

    /// <summary>Volume that was titrated, mL; none when the whole flask was.</summary>
    public RecordedQuantity? Aliquot { get; init; }

    /// <summary>Volume of the sample that the fixing reagents displaced, mL.</summary>
    public required RecordedQuantity Displaced { get; init; }

    /// <summary>Oxygen brought in by the reagents, mg for the whole flask; subtracted.</summary>
    public required RecordedQuantity ReagentOxygenMilligrams { get; init; }

    /// <summary>Standard uncertainty of one reading of the burette, mL.</summary>
    public required double BuretteStandardUncertaintyMillilitres { get; init; }

    /// <summary>Temperature at which the samples were drawn, °C.</summary>
    public required double DrawCelsius { get; init; }
}

/// <summary>Standardisation of thiosulfate against iodate or biiodate.</summary>
public sealed record RecordedStandardisation
{
    /// <summary>Volume of the standard in each replicate, mL.</summary>
    public required RecordedQuantity StandardVolume { get; init; }

    /// <summary>Concentration of the standard as equivalents of electrons, mol/L (normality).</summary>
    public required RecordedQuantity StandardNormality { get; init; }

    /// <summary>Titrant in each replicate, mL.</summary>
    public required double[] TitreMillilitres { get; init; }

    /// <summary>Blank of the standardisation, mL.</summary>
    public required RecordedQuantity Blank { get; init; }
}
