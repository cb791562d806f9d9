using System;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.InWater;

/// <summary>How salty a water is, and what that was taken from.</summary>
public sealed record WaterSalt
{
    /// <summary>Stated accuracy of the practical salinity scale, taken as one standard uncertainty (from memory).</summary>
    private const double PracticalSalinityUncertainty = 0.003;

    private WaterSalt() { }

    /// <summary>Practical salinity.</summary>
    public required double Salinity { get; init; }

    /// <summary>Its standard uncertainty; 0 when it was given as exact.</summary>
    public required double Uncertainty { get; init; }

    /// <summary><c>given</c>, <c>conductivity</c>, <c>specific-conductance</c> or <c>chlorinity</c>.</summary>
    public required string Source { get; init; }

    /// <summary>Conductivity at the temperature of the water, mS/cm; null unless given.</summary>
    public double? ConductivityMillisiemensPerCentimetre { get; private init; }

    /// <summary>Specific conductance at 25 °C by linear compensation, or as given, µS/cm; null where there is none.</summary>
    public double? LinearAt25MicrosiemensPerCentimetre { get; private init; }

    /// <summary>Specific conductance at 25 °C by the compensation of natural waters, µS/cm; null outside its range.</summary>
    public double? NaturalAt25MicrosiemensPerCentimetre { get; private init; }

    /// <summary>Salinity by the field manual's relation from the linear specific conductance, where that was not the way taken; null elsewhere.</summary>
    public double? FieldRelationSalinity { get; private init; }

    /// <summary>Chlorinity, g/kg.</summary>
    public double ChlorinityGramsPerKilogram => Salinity / Chlorinity.SalinityPerGramPerKilogram;

    internal static WaterSalt Given(string text, double uncertainty)
    {
        double salinity = Quantity.Salinity("--salinity", text);
        return Checked("--salinity", text, salinity, new WaterSalt { Salinity = salinity, Uncertainty = uncertainty, Source = "given" });
    }

    internal static WaterSalt OfChlorinity(string text)
    {
        double chlorinity = Quantity.Parse(QuantityKind.Chlorinity, "--chlorinity", text);
        return Chlorinity.Salinity(chlorinity, RangeRule.Refuse, out double salinity) == Status.Ok
            ? new WaterSalt { Salinity = salinity, Uncertainty = 0, Source = "chlorinity" }
            : throw Wrong.Input("--chlorinity", text, string.Create(CultureInfo.InvariantCulture, $"sea water has 0 to {Chlorinity.HighestGramsPerKilogram:F1} g/kg"));
    }

    internal static WaterSalt OfConductivity(string text, double uncertainty, double celsius, string temperature, double uCelsius)
    {
        double conductivity = Quantity.Parse(QuantityKind.Conductivity, "--conductivity", text);
        Status status = PracticalSalinity.FromConductivity(conductivity, celsius, 0, RangeRule.NearEdge, out double salinity);
        if (double.IsNaN(salinity))
        {
            throw StatusParts.Input(status) == InputQuantity.Temperature
                ? Wrong.Input("--temperature", temperature, string.Create(CultureInfo.InvariantCulture, $"a conductivity gives a practical salinity from {PracticalSalinity.LowestCelsius} to {PracticalSalinity.HighestCelsius} °C"))
                : Wrong.Input("--conductivity", text, string.Create(CultureInfo.InvariantCulture, $"the scale holds from 0 to what makes a salinity of {PracticalSalinity.HighestSalinity} (is the unit right? mS/cm and uS/cm differ a thousandfold)"));
        }

        PracticalSalinity.Sensitivities(conductivity, celsius, 0, RangeRule.NearEdge, out double perConductivity, out double perKelvin);
        double micro = conductivity * 1000;
        Status linear = ConductivityCompensation.Linear(micro, celsius, RangeRule.NearEdge, out double at25);
        Status natural = ConductivityCompensation.NaturalWater(micro, celsius, RangeRule.NearEdge, out double naturalAt25);
        Status field = SpecificConductance.Salinity(at25, RangeRule.Refuse, out double fieldSalinity);
        return new WaterSalt
        {
            Salinity = salinity,
            Uncertainty = Math.Sqrt(Square(perConductivity * uncertainty) + Square(perKelvin * uCelsius) + Square(PracticalSalinityUncertainty)),
            Source = "conductivity",
            ConductivityMillisiemensPerCentimetre = conductivity,
            LinearAt25MicrosiemensPerCentimetre = ValueOf(linear, at25),
            NaturalAt25MicrosiemensPerCentimetre = ValueOf(natural, naturalAt25),
            FieldRelationSalinity = ValueOf(field, fieldSalinity),
        };
    }

    internal static WaterSalt OfSpecificConductance(string text, double uncertainty)
    {
        double conductance = Quantity.Parse(QuantityKind.Conductivity, "--specific-conductance", text) * 1000;
        if (SpecificConductance.Salinity(conductance, RangeRule.Refuse, out double salinity) != Status.Ok)
        {
            throw Wrong.Input("--specific-conductance", text, string.Create(CultureInfo.InvariantCulture,
                $"the relation of the field manual (TM 9-A6.2) holds from 0 to {SpecificConductance.HighestMicrosiemensPerCentimetre} uS/cm at 25 °C"));
        }

        // A parabola: the difference over one step to either side is its slope.
        SpecificConductance.Salinity(conductance + 1, RangeRule.Extrapolate, out double above);
        SpecificConductance.Salinity(conductance - 1, RangeRule.Extrapolate, out double below);
        double perMicro = (above - below) / 2;
        // What the relation departs from practical salinity by: 0.07 at 1000 µS/cm, 0.26 at S 35.
        double own = Math.Sqrt(Square(0.07) + Square(0.007 * salinity));
        return new WaterSalt
        {
            Salinity = salinity,
            Uncertainty = Math.Sqrt(Square(perMicro * uncertainty * 1000) + Square(own)),
            Source = "specific-conductance",
            LinearAt25MicrosiemensPerCentimetre = conductance,
        };
    }

    private static WaterSalt Checked(string option, string text, double salinity, WaterSalt salt)
    {
        return 0 <= salinity && salinity <= DensityEos80.HighestSalinity
            ? salt
            : throw Wrong.Input(option, text, string.Create(CultureInfo.InvariantCulture, $"water is described here for practical salinities of 0 to {DensityEos80.HighestSalinity}"));
    }

    private static double? ValueOf(Status status, double value)
    {
        return status != Status.Ok && double.IsNaN(value) ? null : value;
    }

    private static double Square(double value)
    {
        return value * value;
    }
}
