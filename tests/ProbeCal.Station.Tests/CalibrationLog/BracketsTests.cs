using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using Xunit;

namespace ProbeCal.Station.Tests.CalibrationLog;

public class BracketsTests
{
    private static readonly DateTimeOffset Noon = SampleRecords.Noon;

    [Fact]
    public void BetweenTwoPassingChecks_AReadingIsBracketed_AndOutsideNot()
    {
        // Each sample record has 8.41 mg/L as its levels; a zero makes the range.
        Brackets brackets = Brackets.Of([Stored(1, WithZero(SampleRecords.Of("P-1", Noon))), Check(2, Noon.AddDays(7)), Check(3, Noon.AddDays(14))], "P-1");

        Assert.True(brackets.At(Noon.AddDays(3), 5).IsBracketed);
        Assert.Null(brackets.At(Noon.AddDays(3), 5).Reason);
        Assert.Equal(("T-0001", "T-0002"), Ends(brackets.At(Noon.AddDays(3), 5)));
        Assert.Equal("no check before it", brackets.At(Noon.AddDays(-3), 5).Reason);
        Assert.Equal("no check after it", brackets.At(Noon.AddDays(15), 8.4).Reason);
        Assert.Equal("taken while calibration T-0001 was made", brackets.At(Noon.AddMinutes(-3), 8.4).Reason);
    }

    [Theory]
    // Levels 0 and 8.41 mg/L; the limit of a check is 0.2 mg/L at both (2 % of 8.41 is 0.168).
    [InlineData(-0.21, false)]
    [InlineData(-0.19, true)]
    [InlineData(8.60, true)]
    [InlineData(8.62, false)]
    [InlineData(double.NaN, false)]
    public void Range_IsThatOfTheLevelsChecked_WidenedByTheLimit(double reading, bool inRange)
    {
        Brackets brackets = Brackets.Of([Stored(1, WithZero(SampleRecords.Of("P-1", Noon))), Check(2, Noon.AddDays(7))], "P-1");
        BracketVerdict verdict = brackets.At(Noon.AddDays(3), reading);
        Assert.True(verdict.InTime);
        Assert.Equal(inRange, verdict.InRange);
    }

    [Fact]
    public void AFailedCheck_TakesTheReadingsOnBothSides()
    {
        Brackets brackets = Brackets.Of([Stored(1, WithZero(SampleRecords.Of("P-1", Noon))), Check(2, Noon.AddDays(7), pass: false), Check(3, Noon.AddDays(14))], "P-1");
        Assert.Equal("the check T-0002 did not pass", brackets.At(Noon.AddDays(3), 5).Reason);
        Assert.Equal("the check T-0002 did not pass", brackets.At(Noon.AddDays(10), 5).Reason);
        Assert.False(brackets.At(Noon.AddDays(3), 5).InTime);
    }

    [Theory]
    [InlineData("pass", null)]
    [InlineData("fail", "calibration T-0002 found the probe outside its limit before the adjustment")]
    [InlineData("inconclusive", "calibration T-0002 found the probe outside its limit before the adjustment")]
    [InlineData("not-judged", "calibration T-0002 adjusted the probe and did not check it before")]
    public void TheNextCalibration_ClosesTheBracketByWhatItFound(string asFound, string? reason)
    {
        CalibrationRecord next = SampleRecords.Of("P-1", Noon.AddDays(7));
        next = next with { Limits = [.. next.Limits, new RecordedLimit { Check = "as-found", Limit = "0.2 mg/L or 2 %", Source = "TM 9-A6.2", Unit = "mg/L", Verdict = asFound, Decides = false }] };
        Brackets brackets = Brackets.Of([Stored(1, WithZero(SampleRecords.Of("P-1", Noon))), Stored(2, next)], "P-1");
        Assert.Equal(reason, brackets.At(Noon.AddDays(3), 5).Reason);
    }

    [Fact]
    public void AnotherProbesChecks_AndNone_BracketNothing()
    {
        Assert.Equal("the probe was never checked", Brackets.Of([Check(1, Noon)], "P-2").At(Noon, 8).Reason);
    }

    [Fact]
    public void AWithdrawnCheck_IsNoEvidence()
    {
        using TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        store.Append(SampleRecords.Of("P-1", Noon));
        string check = store.Append(SampleRecords.Of("P-1", Noon.AddDays(7)) with { Purpose = CalibrationRecord.CheckPurpose }).Record.Id;
        Assert.True(Brackets.Of(store, "P-1").At(Noon.AddDays(3), 8.4).IsBracketed);
        store.Append(EntryKindsTests.Withdraw(check));
        Assert.Equal("no check after it", Brackets.Of(store, "P-1").At(Noon.AddDays(3), 8.4).Reason);
    }

    /// <summary>Against the rule written the long way, over random records and readings.</summary>
    [Fact]
    public void RandomRecords_AgreeWithTheRuleReadLineByLine()
    {
        const int Seed = 20260601;
        Random random = new(Seed);
        for (int round = 0; round < 200; round++)
        {
            List<(DateTimeOffset Time, bool Pass)> checks = [];
            List<StoredCalibration> records = [];
            for (int i = 0; i < random.Next(0, 6); i++)
            {
                DateTimeOffset time = Noon.AddHours(random.Next(0, 1000));
                bool pass = random.Next(4) != 0;
                checks.Add((time, pass));
                records.Add(Check(i + 1, time, pass));
            }

            if (checks.Select(static check => check.Time).Distinct().Count() != checks.Count)
            {
                continue;
            }

            Brackets brackets = Brackets.Of(records, "P-1");
            DateTimeOffset at = Noon.AddHours(random.Next(-10, 1010)).AddMinutes(1);
            bool expected = checks.Exists(check => check.Time < at) && checks.Exists(check => at < check.Time)
                && checks.Where(check => check.Time < at).MaxBy(static check => check.Time).Pass
                && checks.Where(check => at < check.Time).MinBy(static check => check.Time).Pass;
            Assert.True(expected == brackets.At(at, 8.41).InTime, $"seed {Seed}, round {round}");
        }
    }

    private static (string?, string?) Ends(BracketVerdict verdict)
    {
        return (verdict.Before, verdict.After);
    }

    private static StoredCalibration Check(int index, DateTimeOffset time, bool pass = true)
    {
        return Stored(index, SampleRecords.Of("P-1", time, pass) with { Purpose = CalibrationRecord.CheckPurpose, CheckKind = "continuing" });
    }

    private static StoredCalibration Stored(int index, CalibrationRecord record)
    {
        return new StoredCalibration(record with { Index = index, Id = "T-" + index.ToString("0000", System.Globalization.CultureInfo.InvariantCulture) }, new string('a', 64));
    }

    private static CalibrationRecord WithZero(CalibrationRecord record)
    {
        RecordedPoint zero = record.Points[1] with { Role = "zero", ReferenceMilligramsPerLitre = 0, LastUtc = record.CompletedUtc.AddMinutes(-5) };
        return record with { Points = [record.Points[0], zero, record.Points[1]] };
    }
}
