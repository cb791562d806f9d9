using System.Collections.Generic;

namespace ProbeCal.Station.Equilibrium;

/// <summary>One value with its uncertainty budget.</summary>
/// <param name="Quantity">Which value, and with it the unit.</param>
/// <param name="Value">The value.</param>
/// <param name="StandardUncertainty">Combined standard uncertainty (k = 1), the same unit.</param>
/// <param name="CoverageFactor">How many of them hold 95 %.</param>
/// <param name="Low">Low end of the interval that holds 95 %.</param>
/// <param name="High">High end of it.</param>
/// <param name="Parts">What each input adds.</param>
/// <param name="Note">What a reader must know about the interval; null where it is the ordinary one.</param>
public sealed record EquilibriumResult(
    EquilibriumQuantity Quantity,
    double Value,
    double StandardUncertainty,
    double CoverageFactor,
    double Low,
    double High,
    IReadOnlyList<EquilibriumPart> Parts,
    string? Note);

/// <summary>What one input adds to the uncertainty of a value.</summary>
/// <param name="Input">The input: <c>temperature</c>.</param>
/// <param name="Unit">Its unit; empty for a number without one.</param>
/// <param name="StandardUncertainty">Its standard uncertainty, in its unit.</param>
/// <param name="IsRectangular">True for limits, false for a normal distribution.</param>
/// <param name="Sensitivity">Change of the value for one unit of the input.</param>
/// <param name="Part">Sensitivity times standard uncertainty, with its sign, in the unit of the value.</param>
/// <param name="Share">Share of the variance of the value, 0–1.</param>
public sealed record EquilibriumPart(string Input, string Unit, double StandardUncertainty, bool IsRectangular, double Sensitivity, double Part, double Share);

/// <summary>How a value answers to its conditions, at constant values of the others; NaN for one that plays no part.</summary>
/// <param name="PerKelvin">Per K.</param>
/// <param name="PerSalinity">Per unit of practical salinity.</param>
/// <param name="PerHectopascal">Per hPa of total pressure.</param>
/// <param name="PerMoleFraction">Per unit of mole fraction.</param>
/// <param name="PerHumidityPercent">Per % of humidity.</param>
/// <param name="PerPartialPressureHectopascal">Per hPa of a given partial pressure.</param>
public sealed record EquilibriumSensitivities(
    double PerKelvin, double PerSalinity, double PerHectopascal, double PerMoleFraction, double PerHumidityPercent, double PerPartialPressureHectopascal);

/// <summary>Something unusual that was let pass, and what it costs.</summary>
/// <param name="Code">For programs: <c>temperature-just-below-range</c>, <c>temperature-just-above-range</c>, <c>fugacity</c>, <c>pressure-from-sea-level</c>, <c>pressure-from-altitude</c>.</param>
/// <param name="Text">For people, one line.</param>
public sealed record EquilibriumFlag(string Code, string Text);

/// <summary>What the Monte Carlo check (JCGM 101:2008) gave for one value.</summary>
/// <param name="Quantity">Which value.</param>
/// <param name="Trials">How many were drawn.</param>
/// <param name="Refused">Trials in which the model had no value.</param>
/// <param name="Mean">Mean of the values.</param>
/// <param name="StandardDeviation">Their standard deviation.</param>
/// <param name="Low">Low end of the interval that holds 95 %.</param>
/// <param name="High">High end of it.</param>
public sealed record EquilibriumCheck(EquilibriumQuantity Quantity, int Trials, int Refused, double Mean, double StandardDeviation, double Low, double High);
