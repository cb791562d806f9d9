namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// What the truth of a point rests on, beyond temperature and pressure: a titration, a gas mixture, a reading of a transfer
/// standard. As entered, so that the point can be computed again years later.
/// </summary>
public sealed record RecordedReference
{
    /// <summary>Equipment that gave the truth, by the ids of the register: barometer, cylinder, titrant, standard.</summary>
    public string[] Equipment { get; init => field = value ?? []; } = [];

    /// <summary>A reference titration; none for another method.</summary>
    public RecordedTitration? Titration { get; init; }

    /// <summary>A certified gas mixture; none for another method.</summary>
    public RecordedMixture? Mixture { get; init; }

    /// <summary>A reading of a transfer standard; none for another method.</summary>
    public RecordedTransfer? Transfer { get; init; }

    /// <summary>What contributes to the uncertainty of the reference, largest first.</summary>
    public RecordedReferenceContribution[] Budget { get; init => field = value ?? []; } = [];
}

/// <summary>One contribution to the uncertainty of a point's reference.</summary>
public sealed record RecordedReferenceContribution
{
    /// <summary>The input.</summary>
    public required string Input { get; init; }

    /// <summary>Its value, in <see cref="Unit"/>.</summary>
    public required double Value { get; init; }

    /// <summary>Its standard uncertainty, in <see cref="Unit"/>.</summary>
    public required double StandardUncertainty { get; init; }

    /// <summary>Unit of the input.</summary>
    public required string Unit { get; init; }

    /// <summary><c>normal</c>, <c>rectangular</c> or <c>triangular</c>.</summary>
    public required string Distribution { get; init; }

    /// <summary>Contribution to the reference partial pressure, hPa, with its sign (k = 1).</summary>
    public required double Hectopascal { get; init; }

    /// <summary>Where it comes from.</summary>
    public required string Source { get; init; }
}
