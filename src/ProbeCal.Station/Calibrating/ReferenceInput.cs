using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Uncertainty;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// What the inputs of a reference are called in its budget. Two points whose budgets carry the same name with the same value share that
/// input, unless the name says that it belongs to one point alone.
/// </summary>
internal static class ReferenceInputs
{
    internal const string ThermometerOffset = "thermometer offset";
    internal const string Temperature = "temperature at the point";
    internal const string Pressure = "pressure";
    internal const string Salinity = "salinity";
    internal const string Equation = "solubility equation";
    internal const string State = "state of the reference";
    internal const string Humidity = "humidity";
    internal const string ZeroOxygen = "oxygen left at zero";
    internal const string Titre = "titre (scatter)";
    internal const string Burette = "burette";
    internal const string Blank = "blank";
    internal const string Titrant = "titrant";
    internal const string Flask = "flask";
    internal const string Aliquot = "aliquot";
    internal const string Displaced = "sample displaced";
    internal const string ReagentOxygen = "oxygen in the reagents";
    internal const string AirToWaterRatio = "air-to-water ratio";

    private const string FractionOf = "mole fraction of ";
    private const string CorrectionOf = "correction of ";

    /// <summary>The mole fraction on one cylinder's certificate: the same cylinder at two points is the same input.</summary>
    internal static string Fraction(string cylinder)
    {
        return FractionOf + cylinder;
    }

    /// <summary>What a standard showed at one point.</summary>
    internal static string Shown(string standard)
    {
        return "reading of " + standard;
    }

    /// <summary>The correction on a standard's certificate.</summary>
    internal static string Correction(string standard)
    {
        return CorrectionOf + standard;
    }

    /// <summary>
    /// True for an input that errs alike at every point that has it: one barometer, one cylinder, one titrant and its burette. The thermometer's offset
    /// errs alike as well, but a fit keeps it apart, because readings share it too.
    /// </summary>
    internal static bool IsCommon(string input)
    {
        return input is Pressure or Salinity or Equation or Burette or Blank or Titrant or Flask or Aliquot or Displaced or ReagentOxygen or AirToWaterRatio
            || input.StartsWith(FractionOf, StringComparison.Ordinal)
            || input.StartsWith(CorrectionOf, StringComparison.Ordinal);
    }
}

/// <summary>One input of a reference: how well it is known, and what it does to the partial pressure and to the concentration.</summary>
/// <param name="Name">One of <see cref="ReferenceInputs"/>.</param>
/// <param name="Unit">Its unit; empty for a number without one.</param>
/// <param name="Value">The input itself.</param>
/// <param name="StandardUncertainty">Standard uncertainty (k = 1), in its unit.</param>
/// <param name="Distribution">How it may lie about its value.</param>
/// <param name="PerHectopascal">∂p/∂(input), hPa per unit.</param>
/// <param name="PerMilligram">∂C/∂(input), mg/L per unit.</param>
/// <param name="Source">Where value and uncertainty come from.</param>
internal sealed record ReferenceInput(
    string Name, string Unit, double Value, double StandardUncertainty, Distribution Distribution, double PerHectopascal, double PerMilligram, string Source);

/// <summary>A reference under construction: the two values and their inputs, and the point reference that comes of them.</summary>
internal sealed class ReferenceSum
{
    /// <summary>A source with this word in it states limits: all values between them alike (JCGM 100, 4.3.7).</summary>
    private const string Rectangular = "rectangular";

    private readonly List<ReferenceInput> _inputs = [];

    /// <summary>Partial pressure, hPa.</summary>
    internal double Hectopascal { get; set; }

    /// <summary>Concentration, mg/L; NaN where there is none.</summary>
    internal double MilligramsPerLitre { get; set; } = double.NaN;

    internal IReadOnlyList<ReferenceInput> Inputs => _inputs;

    internal void Add(string name, string unit, double value, double uncertainty, double perHectopascal, double perMilligram, string source)
    {
        Distribution distribution = source.Contains(Rectangular, StringComparison.Ordinal) ? Distribution.Rectangular : Distribution.Normal;
        _inputs.Add(new ReferenceInput(name, unit, value, uncertainty, distribution, perHectopascal, perMilligram, source));
    }

    internal void Add(string name, RecordedQuantity quantity, double perHectopascal, double perMilligram)
    {
        Add(name, quantity.Unit, quantity.Value, quantity.StandardUncertainty, perHectopascal, perMilligram, quantity.UncertaintySource ?? quantity.Source);
    }

    /// <summary>The budget of the partial pressure.</summary>
    internal UncertaintyBudget OfHectopascal()
    {
        return UncertaintyBudget.Of(Hectopascal, "hPa", [.. _inputs.Select(static input =>
            new UncertaintyContribution(input.Name, input.Unit, input.Value, input.StandardUncertainty, input.Distribution, input.PerHectopascal))]);
    }

    /// <summary>The budget of the concentration.</summary>
    internal UncertaintyBudget OfMilligramsPerLitre()
    {
        return UncertaintyBudget.Of(MilligramsPerLitre, "mg/L", [.. _inputs.Select(static input =>
            new UncertaintyContribution(input.Name, input.Unit, input.Value, input.StandardUncertainty, input.Distribution, input.PerMilligram))]);
    }

    internal PointReference ToReference(RecordedReference recorded)
    {
        bool dissolved = !double.IsNaN(MilligramsPerLitre);
        RecordedReferenceContribution[] budget =
        [
            .. _inputs.Where(static input => input.PerHectopascal * input.StandardUncertainty != 0)
                .OrderByDescending(static input => Math.Abs(input.PerHectopascal * input.StandardUncertainty))
                .Select(static input => new RecordedReferenceContribution
                {
                    Input = input.Name,
                    Value = input.Value,
                    StandardUncertainty = input.StandardUncertainty,
                    Unit = input.Unit,
                    Distribution = input.Distribution == Distribution.Rectangular ? "rectangular" : "normal",
                    Hectopascal = input.PerHectopascal * input.StandardUncertainty,
                    Source = input.Source,
                }),
        ];
        return new PointReference(
            Hectopascal,
            OfHectopascal().StandardUncertainty,
            dissolved ? MilligramsPerLitre : null,
            dissolved ? OfMilligramsPerLitre().StandardUncertainty : null,
            recorded with { Budget = budget });
    }
}
