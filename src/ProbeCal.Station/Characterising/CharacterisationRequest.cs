using System.Collections.Generic;

namespace ProbeCal.Station.Characterising;

/// <summary>What is asked of a laboratory run, as texts of options.</summary>
public sealed record CharacterisationRequest
{
    /// <summary>The files with their parts: <c>temperature=temps.csv</c>, once for each file.</summary>
    public required IReadOnlyList<string> Inputs { get; init; }

    /// <summary>Which quantity is which column: <c>signal=I [nA]</c>. A quantity may be named for several files; the column that a file has is taken.</summary>
    public required IReadOnlyList<string> Columns { get; init; }

    /// <summary><c>comma</c>, <c>semicolon</c> or <c>tab</c>; null to tell it from each header.</summary>
    public string? Separator { get; init; }

    /// <summary>True when commas are the decimal marks of the files.</summary>
    public bool DecimalComma { get; init; }

    /// <summary>Id of the probe or its type, for the report; null when nobody stated one.</summary>
    public string? Probe { get; init; }

    /// <summary>Form of the temperature coefficient: <c>exponential</c>, <c>compound</c>, <c>linear</c>, <c>arrhenius</c>, <c>polynomial-2</c> or <c>polynomial-3</c>.</summary>
    public required string Form { get; init; }

    /// <summary>Temperature at which the factor is 1: <c>25C</c>.</summary>
    public required string ReferenceTemperature { get; init; }

    /// <summary>A temperature coefficient that is known already, for runs without a temperature part; null for none.</summary>
    public string? Coefficient { get; init; }

    /// <summary>Signal at zero partial pressure where no zero run is given, with an uncertainty if there is one: <c>0.4 u 0.1</c>; null for none.</summary>
    public string? Zero { get; init; }

    /// <summary>Rows of a step before this time are left out: <c>12s</c> after the first row; null for none.</summary>
    public string? StepAfter { get; init; }
}
