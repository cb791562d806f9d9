using System;
using System.IO;
using System.Linq;
using Xunit;

namespace ProbeCal.Host.Tests.House;

/// <summary>The code that README shows is code that compiles, and gives what README says.</summary>
public sealed class ReadmeTests
{
    [Fact]
    public void CorrectingAReading_GivesWhatReadmeSays()
    {
        // Shown from here
        var probe = new AmperometricProbe(TemperatureCoefficientForm.Exponential, 0.03, 25.0, 5.0, 35.0);
        var point = new CalibrationPoint(CalibrationMethod.AirSaturatedWater,
            63.69, 0.05, 18.2, 0.03, 939.1, 0.8, Stirring.Stirred, 1.0, 1.0, 0.0, 0.0075);   // signal, °C, hPa, each with its u
        var zero = new ZeroPoint(false, 0.0, 0.37, 18.2, 939.1);                              // assumed, not measured
        Status fitted = ProbeCalibration.Create(probe, point, zero, 0.12, 0.00024, out ProbeCalibration? calibration);

        var conditions = new ReadingConditions(SolubilityEquation.BensonKrause1984, 0.05, true, 0.0, 0.03, 0.8, 0.1, Stirring.Stirred, 1.0, 0.0);
        var reading = new Reading();   // made once, filled for every sample
        Status corrected = Correction.Correct(calibration!, conditions, 45.2, 12.4, 941.0, 0.0, 0.0, RangeRule.Refuse, reading);
        double oxygen = reading.Value(ReadingQuantity.MilligramsPerLitre);
        double u = reading.StandardUncertainty(ReadingQuantity.MilligramsPerLitre);
        // to here

        Assert.Equal((Status.Ok, Status.Ok), (fitted, corrected));
        Shown("// Shown from here", "// to here", FormattableString.Invariant($"// {oxygen:F2} ± {u:F2} mg/L") + " (k = 1)");
    }

    [Fact]
    public void AnyGas_GivesWhatReadmeSays()
    {
        // Gases from here
        Status other = GasEquilibrium.MilligramsPerLitre(
            Gas.CarbonDioxide, SolubilityEquation.Weiss1974, 12.0, 35.0, 1013.0, 420e-6, 100.0, RangeRule.Refuse, out double carbonDioxide);
        Status henry = HenryLaw.Constant(Gas.Methane, GasDefaults.Equation(Gas.Methane), 25.0, 0.0, RangeRule.Refuse, out double hcp);
        Status form = HenryConversion.Convert(HenryForm.Hcp, HenryForm.Kpx, hcp, 25.0, 997.05, out double kpx);
        // gases to here

        Assert.Equal((Status.Ok, Status.Ok, Status.Ok), (other, henry, form));
        Shown("// Gases from here", "// gases to here", FormattableString.Invariant($"// {carbonDioxide:F3} mg/L"));
        Assert.InRange(kpx, 3.5e9, 4.5e9);   // a handbook has 4.0e4 bar, from memory
        Shown("// Gases from here", "// gases to here", FormattableString.Invariant($"// {kpx:0.00E+00} Pa"));
    }

    /// <summary>README shows the lines of this file between two marks, and says what they give.</summary>
    private static void Shown(string from, string to, string said)
    {
        string[] readme = File.ReadAllLines(Path.Combine(Repository.Root, "README.md"));
        Assert.Contains(readme, line => line.Contains(said, StringComparison.Ordinal));
        string[] own = File.ReadAllLines(Path.Combine(Repository.Root, "tests", "ProbeCal.Host.Tests", "House", "ReadmeTests.cs"));
        int first = Array.FindIndex(own, line => line.Trim() == from) + 1;
        int last = Array.FindIndex(own, line => line.Trim() == to);
        Assert.InRange(last - first, 4, 20);
        foreach (string line in own[first..last].Select(static line => line.Trim()).Where(static line => line.Length != 0))
        {
            Assert.Contains(readme, shown => shown.Trim().StartsWith(line, StringComparison.Ordinal));
        }
    }
}
