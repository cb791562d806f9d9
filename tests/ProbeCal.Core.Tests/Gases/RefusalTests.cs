using System;
using System.Linq;
using Xunit;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>The rules that every function keeps: what is refused, how it is named, and what the value is then.</summary>
public class RefusalTests
{
    public static TheoryData<string> Names => new(CoreFunctions.All().Select(f => f.Name));

    [Theory]
    [MemberData(nameof(Names))]
    public void NotFinite_IsNamedAndNeverGivesAValue(string name)
    {
        CoreFunction function = Find(name);
        for (int i = 0; i < function.Inputs.Length; i++)
        {
            foreach (double bad in new[] { double.NaN, double.PositiveInfinity, double.NegativeInfinity })
            {
                foreach (RangeRule rule in Enum.GetValues<RangeRule>())
                {
                    (Status status, double[] values) = function.Call(With(function, i, bad), rule);
                    Assert.Equal(function.Inputs[i].Quantity, StatusParts.Input(status));
                    Assert.Equal(RefusalReason.NotFinite, StatusParts.Reason(status));
                    Assert.All(values, v => Assert.True(double.IsNaN(v)));
                }
            }
        }
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void NotFinite_OutranksARangeFaultOfAnotherInput(string name)
    {
        CoreFunction function = Find(name);
        for (int i = 0; i < function.Inputs.Length; i++)
        {
            for (int j = 0; j < function.Inputs.Length; j++)
            {
                if (i == j || double.IsNaN(function.Inputs[j].Highest)) { continue; }
                double[] inputs = With(function, i, double.NaN);
                inputs[j] = function.Inputs[j].Highest + 1.0;
                (Status status, _) = function.Call(inputs, RangeRule.Extrapolate);
                Assert.Equal(function.Inputs[i].Quantity, StatusParts.Input(status));
                Assert.Equal(RefusalReason.NotFinite, StatusParts.Reason(status));
            }
        }
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void RangeEnds_BelongToTheRange(string name)
    {
        CoreFunction function = Find(name);
        Assert.Equal(Status.Ok, function.Call(function.Ordinary, RangeRule.Refuse).Status);
        for (int i = 0; i < function.Inputs.Length; i++)
        {
            foreach (double end in new[] { function.Inputs[i].Lowest, function.Inputs[i].Highest })
            {
                if (double.IsNaN(end)) { continue; }
                (Status status, double[] values) = function.Call(With(function, i, end), RangeRule.Refuse);
                Assert.Equal(Status.Ok, status);
                Assert.All(values, v => Assert.True(double.IsFinite(v)));
            }
        }
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void OutOfRange_IsRefusedOrFlagged(string name)
    {
        CoreFunction function = Find(name);
        for (int i = 0; i < function.Inputs.Length; i++)
        {
            Input input = function.Inputs[i];
            if (!double.IsNaN(input.Highest))
            {
                // A vapour formula has no value above the critical point.
                bool goesOn = !name.StartsWith("VapourWagner", StringComparison.Ordinal);
                OutOfRange(function, i, Math.BitIncrement(input.Highest), Above(input), finiteWhenExtrapolated: true);
                OutOfRange(function, i, input.Highest + Math.Max(0.01 * Math.Abs(input.Highest), 0.3), RefusalReason.AboveRange, goesOn);
                if (input.Quantity == InputQuantity.Temperature)
                {
                    OutOfRange(function, i, input.Highest + 0.199, RefusalReason.JustAboveRange, goesOn);
                    OutOfRange(function, i, input.Highest + 0.201, RefusalReason.AboveRange, goesOn);
                }
            }

            if (!double.IsNaN(input.Lowest))
            {
                // A negative salinity or conductivity has no square root, and a negative uncertainty no meaning.
                bool finite = input.Quantity != InputQuantity.Uncertainty
                    && !(input.Quantity == InputQuantity.Conductance && name.StartsWith("PracticalSalinity", StringComparison.Ordinal))
                    && !(input.Quantity == InputQuantity.Salinity && name.Contains("Density", StringComparison.Ordinal))
                    && !(input.Quantity == InputQuantity.Salinity && name.Contains("Freezing", StringComparison.Ordinal))
                    && !(input.Quantity == InputQuantity.Salinity && name.Contains("GarciaGordon", StringComparison.Ordinal) && !name.StartsWith("GarciaGordon", StringComparison.Ordinal)
                        && !name.Contains("EquationRelative", StringComparison.Ordinal));
                bool edge = input.Quantity == InputQuantity.Temperature;
                OutOfRange(function, i, input.Lowest - 0.01, edge ? RefusalReason.JustBelowRange : RefusalReason.BelowRange, finite);
                if (edge)
                {
                    OutOfRange(function, i, input.Lowest - 0.199, RefusalReason.JustBelowRange, finite);
                    OutOfRange(function, i, input.Lowest - 0.201, RefusalReason.BelowRange, finite);
                }
            }
        }
    }

    /// <summary>Extrapolating far away gives a finite number or NaN, never an infinity, and never an Ok.</summary>
    [Theory]
    [MemberData(nameof(Names))]
    public void FarAway_NeverInfiniteAndNeverOk(string name)
    {
        CoreFunction function = Find(name);
        double[] far = [-1.0e308, -1.0e6, -273.15, -300.0, 99.0, 100.0, 298.15, 1.0e3, 1.0e6, 1.0e308];
        for (int i = 0; i < function.Inputs.Length; i++)
        {
            Input input = function.Inputs[i];
            foreach (double value in far)
            {
                (Status status, double[] values) = function.Call(With(function, i, value), RangeRule.Extrapolate);
                Assert.All(values, v => Assert.False(double.IsInfinity(v)));
                bool outside = value < input.Lowest || input.Highest < value;
                if (outside) { Assert.Equal(input.Quantity, StatusParts.Input(status)); }
                if (outside && !function.Extrapolates) { Assert.All(values, v => Assert.True(double.IsNaN(v))); }
            }
        }
    }

    [Fact]
    public void GarciaGordon_BeginsAtTheFreezingPoint()
    {
        Assert.Equal(Status.Ok, FreezingPoint.Celsius(35.0, RangeRule.Refuse, out double freezing));
        Assert.Equal(Status.Ok, GarciaGordon1992.MicromolesPerKilogram(freezing, 35.0, 1013.25, RangeRule.Refuse, out _));
        Assert.Equal(Status.TemperatureJustBelowRange, GarciaGordon1992.MicromolesPerKilogram(
            Math.BitDecrement(freezing), 35.0, 1013.25, RangeRule.Refuse, out double refused));
        Assert.True(double.IsNaN(refused));
        Assert.Equal(Status.Ok, GarciaGordon1992.MicromolesPerKilogram(-2.0, 42.0, 1013.25, RangeRule.Refuse, out _));
        Assert.Equal(Status.TemperatureJustBelowRange, GarciaGordon1992.MicromolesPerKilogram(-2.01, 42.0, 1013.25, RangeRule.Refuse, out _));
        Assert.Equal(Status.Ok, GarciaGordon1992.MicromolesPerKilogram(0.0, 0.0, 1013.25, RangeRule.Refuse, out _));
        Assert.Equal(Status.TemperatureJustBelowRange, GarciaGordon1992.MicromolesPerKilogram(-0.01, 0.0, 1013.25, RangeRule.Refuse, out _));
        Assert.Equal(Status.TemperatureBelowRange, GarciaGordon1992.MicromolesPerKilogram(-0.21, 0.0, 1013.25, RangeRule.NearEdge, out refused));
        Assert.True(double.IsNaN(refused));
    }

    [Theory]
    [InlineData(0)]
    [InlineData(3)]
    [InlineData(-1)]
    public void UnknownEquation_IsRefusedUnderEveryRule(int number)
    {
        SolubilityEquation equation = (SolubilityEquation)number;
        foreach (RangeRule rule in Enum.GetValues<RangeRule>())
        {
            Assert.Equal(Status.EquationUnknown, OxygenEquilibrium.MilligramsPerLitre(equation, 10.0, 0.0, 1000.0, rule, out double a));
            Assert.Equal(Status.EquationUnknown, OxygenEquilibrium.ConcentrationFromPartialPressure(equation, 10.0, 0.0, 1000.0, 200.0, rule, out double b));
            Assert.Equal(Status.EquationUnknown, OxygenEquilibrium.PartialPressureFromConcentration(equation, 10.0, 0.0, 1000.0, 9.0, rule, out double c));
            Assert.Equal(Status.EquationUnknown, OxygenUncertainty.EquationRelative(equation, 0.0, rule, out double d));
            Assert.All(new[] { a, b, c, d }, v => Assert.True(double.IsNaN(v)));
        }
    }

    [Fact]
    public void Amounts_AreLimitedByPureOxygen()
    {
        Assert.Equal(Status.ConcentrationAboveRange, OxygenEquilibrium.PartialPressureFromConcentration(
            SolubilityEquation.BensonKrause1984, 20.0, 0.0, 1000.0, 60.0, RangeRule.Refuse, out double refused));
        Assert.True(double.IsNaN(refused));
        Assert.Equal(Status.ConcentrationAboveRange, OxygenEquilibrium.PartialPressureFromConcentration(
            SolubilityEquation.BensonKrause1984, 20.0, 0.0, 1000.0, 60.0, RangeRule.Extrapolate, out double flagged));
        Assert.InRange(flagged, 1200.0, 1500.0);
        Assert.Equal(Status.SaturationAboveRange, ProbeCal.Saturation.PartialPressureFromPercentLocal(600.0, 20.0, 1000.0, RangeRule.Refuse, out refused));
        Assert.True(double.IsNaN(refused));
        Assert.Equal(Status.SaturationAboveRange, ProbeCal.Saturation.PartialPressureFromPercentLocal(600.0, 20.0, 1000.0, RangeRule.Extrapolate, out flagged));
        Assert.InRange(flagged, 1200.0, 1260.0);
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(-1.0e-3)]
    public void Divisors_MustBePositive(double value)
    {
        Assert.Equal(Status.CoefficientBelowRange, HenryLaw.MolesPerLitre(value, 200.0, out _));
        Assert.Equal(Status.CoefficientBelowRange, HenryLaw.GramsPerLitre(1.0, 200.0, value, out _));
        Assert.Equal(Status.CoefficientBelowRange, HenryLaw.PartialPressure(value, 1.0, out _));
        Assert.Equal(Status.DensityBelowRange, OxygenUnits.MicromolesPerKilogramFromMilligramsPerLitre(8.0, value, out _));
        Assert.Equal(Status.DensityBelowRange, OxygenUnits.MilligramsPerLitreFromMicromolesPerKilogram(8.0, value, out _));
        Assert.Equal(Status.DensityBelowRange, OxygenUnits.MilligramsPerKilogramFromMilligramsPerLitre(8.0, value, out _));
        Assert.Equal(Status.PressureBelowRange, StandardAtmosphere.ReduceToSeaLevel(value, 100.0, out _));
        Assert.Equal(Status.PressureBelowRange, StandardAtmosphere.FromSeaLevel(value, 100.0, out _));
        Assert.Equal(Status.PressureBelowRange, SeaLevelReduction.StationPressure(value, 100.0, 15.0, out _));
        Assert.Equal(Status.DensityBelowRange, HydrostaticPressure.Hectopascal(10.0, value, RangeRule.Extrapolate, out _));
    }

    private static void OutOfRange(CoreFunction function, int index, double value, RefusalReason reason, bool finiteWhenExtrapolated)
    {
        double[] inputs = With(function, index, value);
        (Status refused, double[] none) = function.Call(inputs, RangeRule.Refuse);
        Assert.Equal(function.Inputs[index].Quantity, StatusParts.Input(refused));
        Assert.Equal(reason, StatusParts.Reason(refused));
        Assert.All(none, v => Assert.True(double.IsNaN(v)));

        (Status flagged, double[] values) = function.Call(inputs, RangeRule.Extrapolate);
        Assert.Equal(refused, flagged);
        bool finite = function.Extrapolates && finiteWhenExtrapolated;
        if (finite) { Assert.All(values, v => Assert.True(double.IsFinite(v), function.Name + " at " + value)); }
        else { Assert.Contains(values, double.IsNaN); }

        // Near the edge gives what extrapolating gives, bit for bit, and nothing further out.
        (Status near, double[] nearby) = function.Call(inputs, RangeRule.NearEdge);
        Assert.Equal(refused, near);
        bool just = reason is RefusalReason.JustBelowRange or RefusalReason.JustAboveRange;
        if (just) { Assert.Equal(values, nearby); }
        else { Assert.All(nearby, v => Assert.True(double.IsNaN(v), function.Name + " at " + value)); }
    }

    private static RefusalReason Above(Input input)
    {
        return input.Quantity == InputQuantity.Temperature ? RefusalReason.JustAboveRange : RefusalReason.AboveRange;
    }

    private static CoreFunction Find(string name)
    {
        return CoreFunctions.All().Single(f => f.Name == name);
    }

    private static double[] With(CoreFunction function, int index, double value)
    {
        double[] inputs = function.Ordinary;
        inputs[index] = value;
        return inputs;
    }
}
