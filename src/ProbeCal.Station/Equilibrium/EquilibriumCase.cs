using System.Collections.Generic;

namespace ProbeCal.Station.Equilibrium;

/// <summary>One equilibrium as it was understood: the gas, the equation, the water, the gas phase, and how well each is known.</summary>
public sealed record EquilibriumCase
{
    /// <summary>The gas.</summary>
    public required Gas Gas { get; init; }

    /// <summary>The solubility equation.</summary>
    public required SolubilityEquation Equation { get; init; }

    /// <summary>True when the equation is the default of the gas and nobody named it.</summary>
    public bool EquationAssumed { get; init; }

    /// <summary>Water temperature, °C (ITS-90).</summary>
    public required UncertainQuantity Temperature { get; init; }

    /// <summary>The water: its salinity and where that comes from.</summary>
    public required WaterSalinity Water { get; init; }

    /// <summary>Absolute station pressure, hPa.</summary>
    public required UncertainQuantity Pressure { get; init; }

    /// <summary>Where the pressure came from: <c>given</c>, <c>sea-level</c> or <c>altitude</c>.</summary>
    public required string PressureSource { get; init; }

    /// <summary>What stands over the water.</summary>
    public required GasPhase Phase { get; init; }

    /// <summary>What was measured in the water; null when only the equilibrium is asked for.</summary>
    public MeasuredConcentration? Measured { get; init; }

    /// <summary>Depth of a probe, m; null when it is not asked for.</summary>
    public double? DepthMetres { get; init; }

    /// <summary>What a person should look at again, one line each.</summary>
    public IReadOnlyList<string> Notes { get; init; } = [];
}
