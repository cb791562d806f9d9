using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>Every guard has a situation that trips it and one that must not; sizes and directions against arithmetic of the tests' own.</summary>
public class GuardPairTests
{
    public static TheoryData<int, string> Cases()
    {
        TheoryData<int, string> cases = [];
        for (int i = 0; i < GuardCases.All.Count; i++)
        {
            cases.Add(i, GuardCases.All[i].ToString());
        }

        return cases;
    }

    [Theory]
    [MemberData(nameof(Cases))]
    public void Guard_TripsOrKeepsQuiet_AndSaysHowLarge(int number, string what)
    {
        GuardCase expected = GuardCases.All[number];
        Guard guard = Assert.Single(Guards.All, guard => guard.Name == expected.Guard);
        Finding? finding = guard.Look(expected.Now);
        Assert.True(expected.Severity == finding?.Severity, $"{what}: {finding?.Sentence ?? "nothing said"}");
        if (finding == null)
        {
            return;
        }

        Assert.Equal(guard.Name, finding.Guard);
        Assert.Contains(finding.Severity, guard.Severities);
        if (expected.AsFound is double asFound)
        {
            // Our own equation differs from the library's by rounding of the coefficients only; 2 % of the size is for densities and a salinity from memory.
            double tolerance = 0.003 + (0.02 * Math.Abs(asFound));
            Assert.Equal(asFound, finding.Error.AsFound!.Value, tolerance);
            double later = expected.Later ?? -asFound;
            Assert.Equal(later, finding.Error.Later!.Value, 0.003 + (0.02 * Math.Abs(later)));
            Assert.True(finding.Error.AsFound * finding.Error.Later < 0, "as found and later have opposite signs");
        }
    }

    [Fact]
    public void EveryGuard_HasACaseForEachOfItsWeights_AndOneThatMustNotTrip()
    {
        List<string> missing = [];
        foreach (Guard guard in Guards.All)
        {
            GuardCase[] own = [.. GuardCases.All.Where(one => one.Guard == guard.Name)];
            missing.AddRange(guard.Severities.Where(severity => own.All(one => one.Severity != severity)).Select(severity => $"{guard.Name}: nothing trips it as {severity}"));
            if (own.All(static one => one.Severity != null))
            {
                missing.Add(guard.Name + ": no case that must not trip it");
            }
        }

        Assert.Empty(missing);
        Assert.Empty(GuardCases.All.Select(static one => one.Guard).Except(Guards.All.Select(static guard => guard.Name)));
    }

    [Fact]
    public void EveryFinding_SaysWhatWasSeen_HowLargeOrWhyNot_AndWhatToDo()
    {
        foreach (GuardCase one in GuardCases.All.Where(static one => one.Severity != null))
        {
            Finding finding = Guards.All.Single(guard => guard.Name == one.Guard).Look(one.Now)!;
            Assert.NotEmpty(finding.Saw);
            Assert.NotEmpty(finding.WhatToDo);
            bool sized = finding.Error.AsFound != null && finding.Error.Later != null;
            Assert.True(sized != (finding.Error.WhyUnknown != null), one.ToString());
            Assert.DoesNotContain('\n', finding.Sentence);
            Assert.DoesNotContain("NaN", finding.Sentence, StringComparison.Ordinal);
            RecordedFinding kept = finding.ToRecord("looked at it twice");
            Assert.Equal(finding.Error.AsFound, kept.ErrorAsFoundMilligramsPerLitre);
            Assert.Equal(finding.Error.Later, kept.ErrorLaterMilligramsPerLitre);
            Assert.Equal(finding.WhatToDo, kept.WhatToDo);
            Assert.Equal(finding.Severity == FindingSeverity.NeedsReason ? "looked at it twice" : null, kept.Reason);
        }
    }

    [Theory]
    [InlineData(0.11, -0.11, "if so, the probe looks 0.11 mg/L too high as found, and once adjusted here its later readings are 0.11 mg/L too low")]
    [InlineData(-0.034, 0.034, "if so, the probe looks 0.034 mg/L too low as found, and once adjusted here its later readings are 0.034 mg/L too high")]
    public void Direction_IsSaidInOneWording(double asFound, double later, string words)
    {
        Assert.Equal(words, PossibleError.Known(asFound, later).Words);
        Finding finding = new("x", FindingSeverity.Note, "saw", PossibleError.Known(asFound, later), "do");
        Assert.Equal(words, PossibleError.WordsOf(finding.ToRecord(null)));
        Assert.Equal($"saw; {words}; do", finding.Sentence);
    }

    [Fact]
    public void Sentence_JoinsAnErrorTakenAsAnExampleToItsSize()
    {
        Finding finding = new("x", FindingSeverity.Note, "seen; were it 1 hPa too high", PossibleError.Known(-0.11, 0.11), "do");
        Assert.Equal("seen; were it 1 hPa too high, the probe would look 0.11 mg/L too low as found, and once adjusted here its later readings would be 0.11 mg/L too high; do", finding.Sentence);
        Assert.Equal("seen; were it 1 hPa too high", finding.ToRecord(null).Saw);
    }

    [Fact]
    public void EveryName_IsThatOfAGuard_AndReasonsAreTakenForThoseThatAskForOne()
    {
        Assert.Equal(Guards.All.Count, Guards.All.Select(static guard => guard.Name).Distinct().Count());
        Assert.All(Guards.All, static guard => Assert.Equal(guard.Severities.Contains(FindingSeverity.NeedsReason), GuardNames.WithReason.Contains(guard.Name)));
        Assert.Contains(GuardNames.PressureUnit, GuardNames.OnPressureWithReason);
        Assert.DoesNotContain(GuardNames.Slope, GuardNames.OnPressureWithReason);
    }
}
