using System;
using Xunit;

namespace ProbeCal.Core.Tests.Tables;

/// <summary>Look-up in tables handed in as arrays.</summary>
public class TableLookupTests
{
    // Three temperatures (10, 20, 30 °C) by two columns; the figures are arbitrary and halve without rounding.
    private static readonly double[] Values = [8.0, 16.0, 4.0, 12.0, 2.0, 6.0];

    [Theory]
    [InlineData(10.0, 700.0, 8.0)]
    [InlineData(10.0, 900.0, 16.0)]
    [InlineData(30.0, 700.0, 2.0)]
    [InlineData(30.0, 900.0, 6.0)]
    [InlineData(20.0, 800.0, 8.0)]
    [InlineData(15.0, 700.0, 6.0)]
    [InlineData(15.0, 800.0, 10.0)]
    [InlineData(27.5, 850.0, 6.25)]
    public void Pressure_NodesAreMetAndBetweenThemItIsLinear(double celsius, double hectopascal, double expected)
    {
        // 27.5 °C, 850 hPa by hand: 4 + 0.75·8 = 10 in the row of 20 °C, 2 + 0.75·4 = 5 in that of 30 °C, 10 + 0.75·(5 − 10) = 6.25.
        Assert.Equal(Status.Ok, TableLookup.ByTemperatureAndPressure(Values, 2, 10.0, 30.0, 700.0, 900.0, celsius, hectopascal, out double value));
        Assert.Equal(expected, value);
        Assert.Equal(Status.Ok, TableLookup.ByTemperatureAndSalinity(Values, 2, 10.0, 30.0, 0.0, 40.0, celsius, (hectopascal - 700.0) / 5.0, out double saline));
        Assert.Equal(expected, saline, 12);
    }

    [Theory]
    [InlineData(10.0, 8.0)]
    [InlineData(15.0, 6.0)]
    [InlineData(30.0, 2.0)]
    [InlineData(22.5, 3.5)]
    public void Temperature_NodesAreMetAndBetweenThemItIsLinear(double celsius, double expected)
    {
        Assert.Equal(Status.Ok, TableLookup.ByTemperature([8.0, 4.0, 2.0], 10.0, 30.0, celsius, out double value));
        Assert.Equal(expected, value);
    }

    [Theory]
    [InlineData(double.NaN, 800.0, Status.TemperatureNotFinite)]
    [InlineData(double.PositiveInfinity, 800.0, Status.TemperatureNotFinite)]
    [InlineData(9.5, 800.0, Status.TemperatureBelowRange)]
    [InlineData(9.9, 800.0, Status.TemperatureJustBelowRange)]
    [InlineData(30.1, 800.0, Status.TemperatureJustAboveRange)]
    [InlineData(31.0, 800.0, Status.TemperatureAboveRange)]
    [InlineData(20.0, double.NaN, Status.PressureNotFinite)]
    [InlineData(20.0, 699.9, Status.PressureBelowRange)]
    [InlineData(20.0, 900.1, Status.PressureAboveRange)]
    [InlineData(9.0, double.NaN, Status.PressureNotFinite)]
    public void OutsideTheTable_IsRefusedAndNeverClamped(double celsius, double hectopascal, Status expected)
    {
        Assert.Equal(expected, TableLookup.ByTemperatureAndPressure(Values, 2, 10.0, 30.0, 700.0, 900.0, celsius, hectopascal, out double value));
        Assert.True(double.IsNaN(value));
    }

    [Theory]
    [InlineData(double.NaN, Status.SalinityNotFinite)]
    [InlineData(-0.1, Status.SalinityBelowRange)]
    [InlineData(40.1, Status.SalinityAboveRange)]
    public void SalinityOutsideTheTable_IsRefused(double salinity, Status expected)
    {
        Assert.Equal(expected, TableLookup.ByTemperatureAndSalinity(Values, 2, 10.0, 30.0, 0.0, 40.0, 20.0, salinity, out double value));
        Assert.True(double.IsNaN(value));
    }

    [Theory]
    [InlineData(4, 10.0, 30.0, 700.0, 900.0, Status.PointsBelowRange)]
    [InlineData(1, 10.0, 30.0, 700.0, 900.0, Status.PointsBelowRange)]
    [InlineData(6, 10.0, 30.0, 700.0, 900.0, Status.PointsBelowRange)]
    [InlineData(-1, 10.0, 30.0, 700.0, 900.0, Status.PointsBelowRange)]
    [InlineData(int.MaxValue, 10.0, 30.0, 700.0, 900.0, Status.PointsBelowRange)]
    [InlineData(2, 30.0, 10.0, 700.0, 900.0, Status.PointsDegenerate)]
    [InlineData(2, double.NaN, 30.0, 700.0, 900.0, Status.PointsDegenerate)]
    [InlineData(2, -1e308, 1e308, 700.0, 900.0, Status.PointsDegenerate)]
    [InlineData(2, 10.0, 30.0, 900.0, 900.0, Status.PointsDegenerate)]
    [InlineData(2, 10.0, 30.0, 700.0, double.PositiveInfinity, Status.PointsDegenerate)]
    public void TableThatIsNone_IsRefused(int columns, double first, double last, double firstColumn, double lastColumn, Status expected)
    {
        Assert.Equal(expected, TableLookup.ByTemperatureAndPressure(Values, columns, first, last, firstColumn, lastColumn, 20.0, 800.0, out double value));
        Assert.True(double.IsNaN(value));
    }

    [Fact]
    public void ValueThatIsNotFinite_IsRefusedWhereItCounts()
    {
        double[] holed = [8.0, 16.0, 4.0, double.NaN, 2.0, 6.0];
        Assert.Equal(Status.PointsNotFinite, TableLookup.ByTemperatureAndPressure(holed, 2, 10.0, 30.0, 700.0, 900.0, 15.0, 800.0, out double value));
        Assert.True(double.IsNaN(value));
        Assert.Equal(Status.PointsBelowRange, TableLookup.ByTemperature(null!, 10.0, 30.0, 20.0, out _));
        Assert.Equal(Status.PointsBelowRange, TableLookup.ByTemperature([1.0], 10.0, 30.0, 20.0, out _));
    }

    [Fact]
    public void LookingUp_AllocatesNothing()
    {
        for (int i = 0; i < 2; i++)
        {
            long before = GC.GetAllocatedBytesForCurrentThread();
            double sum = 0.0;
            for (int step = 0; step <= 1000; step++)
            {
                TableLookup.ByTemperatureAndPressure(Values, 2, 10.0, 30.0, 700.0, 900.0, 10.0 + (0.02 * step), 700.0 + (0.2 * step), out double value);
                sum += value;
            }

            long allocated = GC.GetAllocatedBytesForCurrentThread() - before;
            Assert.True(0.0 < sum);
            if (i == 1) { Assert.Equal(0, allocated); }
        }
    }
}
