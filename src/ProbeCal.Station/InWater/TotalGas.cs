using System;
using System.Globalization;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Station.InWater;

/// <summary>A total-gas reading as it was understood.</summary>
public sealed record TotalGasReading
{
    /// <summary>The pressure of the air and where it came from.</summary>
    public required StationPressure Air { get; init; }

    /// <summary>True where the total pressure was measured and ΔP is the difference to the air's.</summary>
    public required bool IsTotalMeasured { get; init; }

    /// <summary>ΔP, hPa; the uncertainty is that of what was measured.</summary>
    public required UncertainQuantity Delta { get; init; }

    /// <summary>Water temperature, °C.</summary>
    public required UncertainQuantity Temperature { get; init; }

    /// <summary>Practical salinity.</summary>
    public required UncertainQuantity Salinity { get; init; }

    /// <summary>The oxygen in the water; null when not given.</summary>
    public MeasuredConcentration? Oxygen { get; init; }

    /// <summary>Partial pressure of carbon dioxide, hPa; null where it is neglected.</summary>
    public double? CarbonDioxideHectopascal { get; init; }

    /// <summary>A depth at which ΔP is wanted, m; null for none.</summary>
    public double? DepthMetres { get; init; }
}

/// <summary>How a total is split between oxygen and the rest.</summary>
/// <param name="OxygenMilligramsPerLitre">Oxygen, mg/L.</param>
/// <param name="OxygenHectopascal">Partial pressure of oxygen, hPa.</param>
/// <param name="OxygenPercent">Its saturation against air under the local pressure, %.</param>
/// <param name="NitrogenArgonHectopascal">Partial pressure of nitrogen and argon together, hPa.</param>
/// <param name="NitrogenArgonPercent">Their saturation against air under the local pressure, %.</param>
public sealed record TotalGasParts(
    UncertainQuantity OxygenMilligramsPerLitre, UncertainQuantity OxygenHectopascal, UncertainQuantity OxygenPercent,
    UncertainQuantity NitrogenArgonHectopascal, UncertainQuantity NitrogenArgonPercent);

/// <summary>
/// What a total-gas reading says of the water, by <see cref="TotalDissolvedGas"/>: how far it is over the air's pressure, how deep it must lie to hold that, and,
/// with its oxygen known, how much is nitrogen and argon.
/// </summary>
public sealed record TotalGas
{
    /// <summary>
    /// Total gas pressure above which the caution is told, %: shallow water from about 103 %, lakes and rivers from about 110 % (common practice, no source).
    /// </summary>
    public const double CautionPercent = 103;

    private const SolubilityEquation Equation = SolubilityEquation.BensonKrause1984;
    private const RangeRule NearEdge = RangeRule.NearEdge;

    private TotalGas() { }

    /// <summary>What it was computed for.</summary>
    public required TotalGasReading Reading { get; init; }

    /// <summary>Total pressure of the dissolved gases, hPa.</summary>
    public required UncertainQuantity Total { get; init; }

    /// <summary>ΔP, hPa.</summary>
    public required UncertainQuantity Delta { get; init; }

    /// <summary>Total gas pressure in % of the air's.</summary>
    public required UncertainQuantity Percent { get; init; }

    /// <summary>Vapour pressure of the water, hPa (Weiss and Price 1980).</summary>
    public required double VapourHectopascal { get; init; }

    /// <summary>Density, kg/m³ (EOS-80).</summary>
    public required double DensityKilogramsPerCubicMetre { get; init; }

    /// <summary>Depth at which the water above holds the gas in solution, m; negative where the water holds less than the air.</summary>
    public required UncertainQuantity CompensationDepthMetres { get; init; }

    /// <summary>ΔP left at the depth that was asked for, hPa; null for none.</summary>
    public required UncertainQuantity? DeltaAtDepth { get; init; }

    /// <summary>How the total is split; null without the oxygen.</summary>
    public required TotalGasParts? Parts { get; init; }

    /// <summary>True where a temperature just outside a range was let pass.</summary>
    public required bool IsNearEdge { get; init; }

    /// <summary>A caution common in the trade; null where there is none.</summary>
    public string? Caution => CautionPercent < Percent.Value
        ? "supersaturated: fish can get gas bubble disease, in shallow water from about 103 %, in lakes and rivers from about 110 % (common practice, no source; local rules decide)"
        : null;

    internal static TotalGas Compute(TotalGasReading r)
    {
        double air = r.Air.Hectopascal;
        double uAir = r.Air.UncertaintyHectopascal;
        double delta = r.Delta.Value;
        double celsius = r.Temperature.Value;
        double salinity = r.Salinity.Value;
        Expect(VapourWeissPrice1980.Pressure(celsius, salinity, NearEdge, out double vapour), vapour, r);
        Expect(DensityEos80.Density(celsius, salinity, NearEdge, out double density), density, r);
        if (!(vapour < air + delta))
        {
            throw new InputException(Invariant($"a total pressure of {air + delta:F1} hPa is no more than the vapour's {vapour:F1} hPa: look at the units, and whether it is ΔP, which is --delta-p"));
        }

        Expect(TotalDissolvedGas.Percent(delta, air, out double percent), percent, r);
        Expect(TotalDissolvedGasUncertainty.Percent(delta, air, r.IsTotalMeasured, r.Delta.StandardUncertainty, uAir, out double uPercent), uPercent, r);
        Expect(TotalDissolvedGas.CompensationDepth(delta, density, out double depth), depth, r);
        double uDelta = r.IsTotalMeasured ? Hypot(r.Delta.StandardUncertainty, uAir) : r.Delta.StandardUncertainty;
        double uTotal = r.IsTotalMeasured ? r.Delta.StandardUncertainty : Hypot(r.Delta.StandardUncertainty, uAir);
        TotalDissolvedGas.CompensationDepth(1, density, out double metresPerHectopascal);
        return new TotalGas
        {
            Reading = r,
            Total = new UncertainQuantity(air + delta, uTotal),
            Delta = new UncertainQuantity(delta, uDelta),
            Percent = new UncertainQuantity(percent, uPercent),
            VapourHectopascal = vapour,
            DensityKilogramsPerCubicMetre = density,
            CompensationDepthMetres = new UncertainQuantity(depth, uDelta * metresPerHectopascal),
            DeltaAtDepth = r.DepthMetres is double metres ? new UncertainQuantity(AtDepth(r, metres, density), uDelta) : null,
            Parts = r.Oxygen is null ? null : PartsOf(r, density),
            IsNearEdge = VapourWeissPrice1980.Pressure(celsius, salinity, RangeRule.Refuse, out _) != Status.Ok,
        };
    }

    private static double AtDepth(TotalGasReading r, double metres, double density)
    {
        Expect(TotalDissolvedGas.UncompensatedDelta(r.Delta.Value, metres, density, out double left), left, r);
        return left;
    }

    private static TotalGasParts PartsOf(TotalGasReading r, double density)
    {
        double air = r.Air.Hectopascal;
        double celsius = r.Temperature.Value;
        double salinity = r.Salinity.Value;
        double carbonDioxide = r.CarbonDioxideHectopascal ?? 0;
        UncertainQuantity oxygen = new(MilligramsPerLitre(r.Oxygen!.Given.Value), MilligramsPerLitre(r.Oxygen.Given.StandardUncertainty));
        Expect(GasEquilibrium.PartialPressureFromConcentration(Gas.Oxygen, Equation, celsius, salinity, air, oxygen.Value, NearEdge, out double pO2), pO2, r);
        Expect(Saturation.PercentLocal(pO2, celsius, air, NearEdge, out double percentO2), percentO2, r);
        Status status = TotalDissolvedGas.NitrogenArgon(r.Delta.Value, air, celsius, salinity, pO2, carbonDioxide, NearEdge, out double rest, out double percentRest);
        if (StatusParts.Input(status) == InputQuantity.PartialPressure)
        {
            throw new InputException(Invariant($"--concentration {r.Oxygen!.Text} is a partial pressure of {pO2:F1} hPa{(carbonDioxide == 0 ? "" : " with the carbon dioxide")}: more than the total of {air + r.Delta.Value:F1} hPa leaves beside the vapour; one of them is wrong"));
        }

        Expect(status, rest, r);
        Expect(
            TotalDissolvedGasUncertainty.Components(
                Equation, r.Delta.Value, air, celsius, salinity, oxygen.Value, carbonDioxide, r.IsTotalMeasured, r.Delta.StandardUncertainty, r.Air.UncertaintyHectopascal,
                r.Temperature.StandardUncertainty, r.Salinity.StandardUncertainty, oxygen.StandardUncertainty, NearEdge,
                out double uO2, out double uPercentO2, out double uRest, out double uPercentRest),
            uRest, r);
        return new TotalGasParts(
            oxygen, new UncertainQuantity(pO2, uO2), new UncertainQuantity(percentO2, uPercentO2),
            new UncertainQuantity(rest, uRest), new UncertainQuantity(percentRest, uPercentRest));

        double MilligramsPerLitre(double given) => MeasuredConcentration.MilligramsPerLitre(Gas.Oxygen, r.Oxygen!.Kind, given, density);
    }

    private static void Expect(Status status, double value, TotalGasReading r)
    {
        if (status == Status.Ok || !double.IsNaN(value))
        {
            return;
        }

        throw new InputException(StatusParts.Input(status) switch
        {
            InputQuantity.Uncertainty => UncertainQuantity.TooLarge,
            InputQuantity.Temperature => Invariant($"--temperature {r.Temperature.Value} °C: total gas is computed from {VapourWeissPrice1980.LowestCelsius} to {VapourWeissPrice1980.HighestCelsius} °C"),
            InputQuantity.Salinity => Invariant($"--salinity {r.Salinity.Value}: total gas is computed from 0 to {VapourWeissPrice1980.HighestSalinity}"),
            InputQuantity.Pressure => Invariant($"the pressure of the air of {r.Air.Hectopascal} hPa is outside what is computed, {BensonKrause1984.LowestHectopascal} to {BensonKrause1984.HighestHectopascal} hPa"),
            InputQuantity.Concentration or InputQuantity.PartialPressure => $"--concentration {r.Oxygen?.Text} is more oxygen than is computed; look at its unit",
            _ => Invariant($"{status}: T {r.Temperature.Value} °C, S {r.Salinity.Value}, P {r.Air.Hectopascal} hPa"),
        });
    }

    private static double Hypot(double a, double b)
    {
        return Math.Sqrt((a * a) + (b * b));
    }

    private static string Invariant(FormattableString text)
    {
        return text.ToString(CultureInfo.InvariantCulture);
    }
}
