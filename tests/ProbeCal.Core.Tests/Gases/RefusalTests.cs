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
            // A negative conductivity has no square root, nor has a negative salinity in the density, and a negative uncertainty no meaning.
            bool below = input.Quantity != InputQuantity.Uncertainty
                && !(input.Quantity == InputQuantity.Conductance && name.StartsWith("PracticalSalinity", StringComparison.Ordinal))
                && (input.Quantity != InputQuantity.Salinity || KnowsNegativeSalinity(name));
            bool above = !name.StartsWith("VapourWagner", StringComparison.Ordinal);
            if (input.Quantity == InputQuantity.Temperature)
            {
                if (!double.IsNaN(input.Highest))
                {
                    JustOutside(function, i, Math.BitIncrement(input.Highest), RefusalReason.JustAboveRange, finite: true);
                    JustOutside(function, i, input.Highest + 0.199, RefusalReason.JustAboveRange, above);
                    OutOfRange(function, i, input.Highest + 0.201, RefusalReason.AboveRange, above);
                }

                if (!double.IsNaN(input.Lowest))
                {
                    JustOutside(function, i, Math.BitDecrement(input.Lowest), RefusalReason.JustBelowRange, below);
                    JustOutside(function, i, input.Lowest - 0.199, RefusalReason.JustBelowRange, below);
                    OutOfRange(function, i, input.Lowest - 0.201, RefusalReason.BelowRange, below);
                }

                continue;
            }

            if (!double.IsNaN(input.Highest))
            {
                OutOfRange(function, i, Math.BitIncrement(input.Highest), RefusalReason.AboveRange, finiteWhenExtrapolated: true);
                double step = input.Highest == 0.0 ? 0.01 : 0.01 * Math.Abs(input.Highest);
                OutOfRange(function, i, input.Highest + step, RefusalReason.AboveRange, finiteWhenExtrapolated: true);
            }

            if (!double.IsNaN(input.Lowest)) { OutOfRange(function, i, input.Lowest - 0.01, RefusalReason.BelowRange, below); }
        }
    }

    private static bool KnowsNegativeSalinity(string name)
    {
        // Whatever goes through the density or the freezing point does not.
        if (name.Contains("Density", StringComparison.Ordinal) || name.Contains("Freezing", StringComparison.Ordinal)) { return false; }
        if (name.Contains("EquationRelative", StringComparison.Ordinal) || name.StartsWith("Vapour", StringComparison.Ordinal)) { return true; }
        if (name.StartsWith("GarciaGordon", StringComparison.Ordinal)) { return true; }
        return !Enum.GetValues<SolubilityEquation>().Any(e => GasSolubility.IsPerKilogram(e) && name.EndsWith(" " + e, StringComparison.Ordinal));
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
        Assert.Equal(Status.TemperatureBelowRange, GarciaGordon1992.MicromolesPerKilogram(-2.21, 42.0, 1013.25, RangeRule.Refuse, out _));
        Assert.Equal(Status.Ok, GarciaGordon1992.MicromolesPerKilogram(0.0, 0.0, 1013.25, RangeRule.Refuse, out _));
        Assert.Equal(Status.TemperatureJustBelowRange, GarciaGordon1992.MicromolesPerKilogram(-0.01, 0.0, 1013.25, RangeRule.Refuse, out _));
        Assert.Equal(Status.TemperatureBelowRange, GarciaGordon1992.MicromolesPerKilogram(-0.21, 0.0, 1013.25, RangeRule.Refuse, out _));
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

    /// <summary>A pair that is not published is refused under every rule, and so is a gas that is none.</summary>
    [Fact]
    public void UnknownPair_IsRefusedUnderEveryRule()
    {
        int pairs = 0;
        Gas[] gases = [0, .. Enum.GetValues<Gas>(), (Gas)20, (Gas)(-1)];
        SolubilityEquation[] equations = [0, .. Enum.GetValues<SolubilityEquation>(), (SolubilityEquation)24, (SolubilityEquation)(-1)];
        foreach (Gas gas in gases)
        {
            foreach (SolubilityEquation equation in equations)
            {
                if (CoreFunctions.Pairs().Contains((gas, equation)))
                {
                    pairs++;
                    continue;
                }

                Status expected = Enum.IsDefined(gas) ? Status.EquationUnknown : Status.GasUnknown;
                foreach (RangeRule rule in Enum.GetValues<RangeRule>())
                {
                    Assert.Equal(expected, GasEquilibrium.MilligramsPerLitre(gas, equation, 10.0, 0.0, 1000.0, 0.2, 100.0, rule, out double a));
                    Assert.Equal(expected, GasEquilibrium.ConcentrationFromPartialPressure(gas, equation, 10.0, 0.0, 1000.0, 200.0, rule, out double b));
                    Assert.Equal(expected, GasEquilibrium.PartialPressureFromConcentration(gas, equation, 10.0, 0.0, 1000.0, 9.0, rule, out double c));
                    Assert.Equal(expected, GasUncertainty.EquationRelative(gas, equation, 10.0, 0.0, 1000.0, rule, out double d));
                    Assert.Equal(expected, HenryLaw.Constant(gas, equation, 10.0, 0.0, rule, out double e));
                    Assert.All(new[] { a, b, c, d, e }, v => Assert.True(double.IsNaN(v)));
                }
            }
        }

        // Counted by hand from the papers: O2 8, N2 5, Ar 6, Ne 6, He 5, Kr 5, Xe 4, CO2 4, N2O 3, CH4 4, CO 4, H2 4, SF6 3, CFC-11 1, CFC-12 1, H2S 2, O3 1, NH3 1, C2H6 1.
        Assert.Equal(68, pairs);
        Assert.Equal(Status.GasUnknown, GasEquilibrium.PartialPressure(0, 10.0, 0.0, 1000.0, 0.2, 100.0, RangeRule.Extrapolate, out double none));
        Assert.True(double.IsNaN(none));
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

    /// <summary>Within 0.2 K: refused, and given by either rule that lets the edge pass.</summary>
    private static void JustOutside(CoreFunction function, int index, double value, RefusalReason reason, bool finite)
    {
        OutOfRange(function, index, value, reason, finite);
        (Status flagged, double[] values) = function.Call(With(function, index, value), RangeRule.NearEdge);
        Assert.Equal(reason, StatusParts.Reason(flagged));
        if (function.Extrapolates && finite) { Assert.All(values, v => Assert.True(double.IsFinite(v), function.Name + " at " + value)); }
    }

    private static void OutOfRange(CoreFunction function, int index, double value, RefusalReason reason, bool finiteWhenExtrapolated)
    {
        double[] inputs = With(function, index, value);
        if (reason is RefusalReason.BelowRange or RefusalReason.AboveRange)
        {
            (Status edge, double[] beyond) = function.Call(inputs, RangeRule.NearEdge);
            Assert.Equal(reason, StatusParts.Reason(edge));
            Assert.All(beyond, v => Assert.True(double.IsNaN(v)));
        }

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

    private static CoreFunction Find(string name)
    {
        return CoreFunctions.Find(name);
    }

    private static double[] With(CoreFunction function, int index, double value)
    {
        double[] inputs = function.Ordinary;
        inputs[index] = value;
        return inputs;
    }
}
