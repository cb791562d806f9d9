using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Characterising;

/// <summary>A fitted or averaged value.</summary>
/// <param name="Name">What it is called in files: <c>temperature-coefficient</c>, <c>tau-up</c>.</param>
/// <param name="Value">The value.</param>
/// <param name="StandardUncertainty">Its standard uncertainty (k = 1), from the scatter of the run.</param>
/// <param name="Unit">Unit of both; empty for a ratio.</param>
public sealed record Estimate(string Name, double Value, double StandardUncertainty, string Unit)
{
    /// <summary>How many standard uncertainties hold 95 %, where it is another figure than that of the part.</summary>
    public double? CoverageFactor { get; init; }
}

/// <summary>One part of the run: what was found, with covariance and how well it fits.</summary>
public sealed record CharacterisedPart
{
    /// <summary>The part: <c>temperature</c>, <c>linearity</c>, <c>step-up</c>, <c>step-down</c>, <c>zero</c>, <c>stirring</c>.</summary>
    public required string Part { get; init; }

    /// <summary>The model in words or as a formula.</summary>
    public required string Model { get; init; }

    /// <summary>What was fitted, in the order of the covariance.</summary>
    public required IReadOnlyList<Estimate> Parameters { get; init; }

    /// <summary>Covariance of the parameters, row by row.</summary>
    public required IReadOnlyList<double> Covariance { get; init; }

    /// <summary>What follows from the parameters: t90, the error of linearity.</summary>
    public IReadOnlyList<Estimate> Derived { get; init; } = [];

    /// <summary>Rows read.</summary>
    public required int Rows { get; init; }

    /// <summary>Points in the fit: rows, or levels where rows were averaged.</summary>
    public required int Points { get; init; }

    /// <summary>Points less parameters.</summary>
    public required int DegreesOfFreedom { get; init; }

    /// <summary>Standard deviation of the residuals.</summary>
    public required double ResidualStandardDeviation { get; init; }

    /// <summary>Unit of it; <c>relative</c> for a fit of logarithms.</summary>
    public required string ResidualUnit { get; init; }

    /// <summary>How many standard uncertainties hold 95 %: Student's t for the degrees of freedom.</summary>
    public required double CoverageFactor { get; init; }

    /// <summary>Probability that repeats would scatter so little if the model were right (F test of ISO 11095); none without repeats.</summary>
    public double? LackOfFitProbability { get; init; }

    /// <summary>What a reader must know.</summary>
    public IReadOnlyList<string> Notes { get; init; } = [];
}

/// <summary>What a laboratory run says of a probe.</summary>
public sealed record Characterisation
{
    /// <summary>Name of the format.</summary>
    public const string FormatName = "probecal-characterisation";

    /// <summary>The version this program writes.</summary>
    public const int CurrentVersion = 1;

    /// <summary>Id of the probe or its type; none when not stated.</summary>
    public string? Probe { get; init; }

    /// <summary>Unit of the signal as the column names it; empty when it names none.</summary>
    public required string SignalUnit { get; init; }

    /// <summary>The files, by part.</summary>
    public required IReadOnlyList<(string Part, string File)> Files { get; init; }

    /// <summary>Where they were read from, so that no result is written over one of them.</summary>
    internal IReadOnlyList<string> InputPaths { get; init; } = [];

    /// <summary>The parts, in the order in which they rest on each other.</summary>
    public required IReadOnlyList<CharacterisedPart> Parts { get; init; }

    /// <summary>The temperature coefficient as records keep it; none without a temperature part, or for a polynomial.</summary>
    public RecordedTemperatureCoefficient? TemperatureCoefficient { get; init; }

    /// <summary>The temperature coefficient as <c>calibrate --coefficient</c> takes it; none without a temperature part.</summary>
    public string? CoefficientText { get; init; }

    /// <summary>The coefficients that a firmware loads, each with its unit.</summary>
    public required IReadOnlyList<Estimate> Firmware { get; init; }

    /// <summary>Texts beside <see cref="Firmware"/>: the form of the temperature coefficient.</summary>
    public required IReadOnlyList<(string Name, string Value)> FirmwareTexts { get; init; }
}
