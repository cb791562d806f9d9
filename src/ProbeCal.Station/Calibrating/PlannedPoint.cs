using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Calibrating;

/// <summary>The ids of the methods by which the truth of a point is known; records use them and they never change.</summary>
public static class MethodIds
{
    /// <summary>Water in equilibrium with air.</summary>
    public const string AirSaturatedWater = "air-saturated-water";

    /// <summary>A vented chamber of air saturated with water vapour.</summary>
    public const string WaterSaturatedAir = "water-saturated-air";

    /// <summary>Water made free of oxygen by sulfite.</summary>
    public const string ZeroSolution = "zero-solution";

    /// <summary>Flowing gas without oxygen, or water swept by it.</summary>
    public const string ZeroGas = "zero-gas";

    /// <summary>Samples of the water, titrated.</summary>
    public const string Titration = "titration";

    /// <summary>A certified gas mixture.</summary>
    public const string GasMixture = "gas-mixture";

    /// <summary>Another instrument, itself calibrated, in the same water.</summary>
    public const string TransferStandard = "transfer-standard";

    /// <summary>All of them, in the order in which they are offered.</summary>
    public static string[] All { get; } = [AirSaturatedWater, WaterSaturatedAir, ZeroSolution, ZeroGas, Titration, GasMixture, TransferStandard];

    /// <summary>True for the two methods of a zero.</summary>
    public static bool IsZero(string method)
    {
        return method is ZeroSolution or ZeroGas;
    }
}

/// <summary>One point that is to be taken: its role, and how the truth there is known.</summary>
public sealed record PlannedPoint
{
    /// <summary><c>span</c>, <c>zero</c>, <c>level-1</c>, <c>level-2</c> ….</summary>
    public required string Role { get; init; }

    /// <summary>One of <see cref="MethodIds"/>.</summary>
    public required string Method { get; init; }

    /// <summary>The titration of a point by titration; it may still be missing while the samples wait to be titrated.</summary>
    public RecordedTitration? Titration { get; init; }

    /// <summary>The mixture of a point by gas mixture.</summary>
    public RecordedMixture? Mixture { get; init; }

    /// <summary>What the standard showed, for a point by transfer standard.</summary>
    public RecordedTransfer? Transfer { get; init; }
}

/// <summary>What was true at a point.</summary>
/// <param name="Hectopascal">Partial pressure of the gas, hPa.</param>
/// <param name="StandardUncertaintyHectopascal">Its standard uncertainty, hPa, the thermometer's offset counted in.</param>
/// <param name="MilligramsPerLitre">The same as a concentration in the water of the point; null where the gas has no solubility equation there.</param>
/// <param name="StandardUncertaintyMilligramsPerLitre">Its standard uncertainty, mg/L.</param>
/// <param name="Recorded">What it rests on, with its budget, for the record.</param>
internal sealed record PointReference(
    double Hectopascal,
    double StandardUncertaintyHectopascal,
    double? MilligramsPerLitre,
    double? StandardUncertaintyMilligramsPerLitre,
    RecordedReference? Recorded);
