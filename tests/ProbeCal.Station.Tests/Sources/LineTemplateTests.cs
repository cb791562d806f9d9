using System;
using System.Globalization;
using System.Linq;
using CsCheck;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Sources;
using ProbeCal.Station.Tests.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Sources;

public class LineTemplateTests
{
    private static readonly DateTimeOffset Received = new(2026, 6, 1, 12, 0, 5, TimeSpan.Zero);

    [Fact]
    public void UsualTemplate_ReadsALine()
    {
        RawSample sample = Sample(LineTemplate.UsualText, "2026-06-01T12:00:00Z,93.12,18.25,1009.1");
        Assert.Equal(93.12, sample.Signal);
        Assert.Equal(18.25, sample.TemperatureCelsius);
        Assert.Equal(1009.1, sample.PressureHectopascal);
        Assert.Null(sample.Salinity);
        Assert.Equal(new DateTimeOffset(2026, 6, 1, 12, 0, 0, TimeSpan.Zero), sample.TimeUtc);
        Assert.True(sample.TimeFromLine);
        Assert.Equal(Received, sample.ReceivedUtc);
        Assert.Equal("2026-06-01T12:00:00Z,93.12,18.25,1009.1", sample.RawText);
    }

    [Theory]
    [InlineData("{signal},{temperature:F}", "93.12,68", 93.12, 20.0, null, null)]
    [InlineData("{signal:nA*0.001},{temperature:K*0.1}", "93120,2931.5", 93.12, 20.0, null, null)]
    [InlineData("{signal} {pressure:mmHg}", "93.12  760", 93.12, null, 1013.25, null)]
    [InlineData("{signal} {pressure}", "93.12\t760mmHg", 93.12, null, 1013.25, null)]
    [InlineData("{signal};{pressure:kPa}", " 93.12 ; 101.325 kPa ", 93.12, null, 1013.25, null)]
    [InlineData("{signal},{pressure},{}", "93.12,1000,17,18,19", 93.12, null, 1000.0, null)]
    [InlineData("{},{signal},{skip},{salinity}", "x,93.12,\"a,b\",35", 93.12, null, null, 35.0)]
    [InlineData("{signal},{temperature}", "\"93.12\" , \"20 C\"", 93.12, 20.0, null, null)]
    [InlineData("O2={signal} nA; T={temperature} °C", "O2=93.12 nA; T=18 °C", 93.12, 18.0, null, null)]
    [InlineData("{{{signal}}} {temperature}", "{93.12} 18", 93.12, 18.0, null, null)]
    [InlineData("{signal}\\t{temperature}\\t{salinity}", "93.12\t\t35", 93.12, null, null, 35.0)]
    [InlineData("{signal}\\t{temperature}\\t{salinity}", "93.12\t18\t", 93.12, 18.0, null, null)]
    [InlineData("{signal},{temperature}", "93.12,NaN", 93.12, null, null, null)]
    [InlineData("{signal},{temperature}", "93.12,---", 93.12, null, null, null)]
    [InlineData("{signal},{temperature|-9999|x}", "93.12,-9999", 93.12, null, null, null)]
    [InlineData("{signal},{temperature}", "-0.07,18", -0.07, 18.0, null, null)]
    public void Template_ReadsWhatItSays(string template, string line, double signal, double? celsius, double? hectopascal, double? salinity)
    {
        RawSample sample = Sample(template, line);
        Assert.Equal(signal, sample.Signal, 12);
        Assert.Equal(celsius ?? double.NaN, sample.TemperatureCelsius ?? double.NaN, 9);
        Assert.Equal(hectopascal, sample.PressureHectopascal);
        Assert.Equal(salinity, sample.Salinity);
        Assert.Equal(Received, sample.TimeUtc);
        Assert.False(sample.TimeFromLine);
    }

    [Theory]
    [InlineData("{time}", "2026-06-01T14:00:00+02:00")]
    [InlineData("{time}", "2026-06-01 12:00:00Z")]
    [InlineData("{time}", "2026-06-01T12:00Z")]
    [InlineData("{time}", "2026-06-01T12:00:00.000Z")]
    [InlineData("{time}", "2026-06-01T08:30:00-0330")]
    [InlineData("{time:utc}", "2026-06-01 12:00:00")]
    [InlineData("{time:utc}", "2026-06-01T14:00:00+02")]
    [InlineData("{time:+02:00}", "2026-06-01T14:00:00")]
    [InlineData("{time:-05:00}", "2026/06/01 07:00:00")]
    [InlineData("{time:epoch}", "1780315200")]
    [InlineData("{time:epochms}", "1780315200000")]
    [InlineData("{date},{time:utc}", "2026-06-01,12:00:00")]
    [InlineData("{date} {time}", "2026-06-01 12:00:00Z")]
    public void Time_BecomesUtc(string template, string text)
    {
        RawSample sample = Sample(template + ";{signal}", text + ";1");
        Assert.Equal(new DateTimeOffset(2026, 6, 1, 12, 0, 0, TimeSpan.Zero), sample.TimeUtc);
        Assert.Equal(TimeSpan.Zero, sample.TimeUtc.Offset);
        Assert.True(sample.TimeFromLine);
    }

    /// <summary>A clock that was never set, and no clock at all: the time of receipt stands in and the sample tells so.</summary>
    [Theory]
    [InlineData("1970-01-01T00:00:12Z")]
    [InlineData("2000-01-01T00:00:12Z")]
    [InlineData("")]
    public void Time_ThatCannotBeTrustedIsTheReceiptsTime(string text)
    {
        RawSample sample = Sample("{time};{signal}", text + ";1");
        Assert.Equal(Received, sample.TimeUtc);
        Assert.False(sample.TimeFromLine);
    }

    [Theory]
    [InlineData("2026-06-01T12:00:00,93.1,18,1000", "time: 2026-06-01T12:00:00 does not say its offset from UTC; end it with Z or +02:00, or write {time:utc} in the template")]
    [InlineData("1780315200,93.1,18,1000", "time: 1780315200 is no time; write 2026-06-01T12:30:00Z, or {time:epoch} in the template for seconds since 1970")]
    [InlineData("2026-02-30T12:00:00Z,93.1,18,1000", "time: 2026-02-30T12:00:00Z is no time; write 2026-06-01T12:30:00Z, or {time:epoch} in the template for seconds since 1970")]
    [InlineData("2026-06-01T12:00:00Z,NaN,18,1000", "signal: the value is missing")]
    [InlineData("2026-06-01T12:00:00Z,,18,1000", "signal: the value is missing")]
    [InlineData("2026-06-01T12:00:00Z,inf,18,1000", "signal: inf: NaN and infinity are no values here; write a finite number, for example 8.3")]
    [InlineData("2026-06-01T12:00:00Z,93.1,18", "temperature: the line ends too early: ',' is missing after it")]
    [InlineData("2026-06-01T12:00:00Z,93.1,18,", null)]
    [InlineData("2026-06-01T12:00:00Z,93.1,18,1000,7", "pressure: 1000,7: a comma is no decimal mark here; write 1000.7")]
    [InlineData("2026-06-01T12:00:00Z,93.1,18x,1000", "temperature: 18x: x is no unit of a temperature; write for example 20C or 68F (units: C, F, K)")]
    [InlineData("2026-06-01T12:00:00Z,93.1,180,1000", "temperature: 180: 180 °C is no temperature of water")]
    [InlineData("2026-06-01T12:00:00Z,93.1,-20,1000", "temperature: -20: -20 °C is no temperature of water")]
    [InlineData("2026-06-01T12:00:00Z,93.1,18,101.3", "pressure: 101.3: 101.3 hPa is no air pressure; name the unit that the line gives, for example {pressure:mmHg}")]
    [InlineData("2026-06-01T12:00:00Z,93.1,18,29.9", "pressure: 29.9: 29.9 hPa is no air pressure; name the unit that the line gives, for example {pressure:mmHg}")]
    [InlineData("2026-06-01T12:00:00Z,93.1,18,101325", "pressure: 101325: 101325 hPa is no air pressure; name the unit that the line gives, for example {pressure:mmHg}")]
    [InlineData("2026-06-01T12:00:00Z,93.1,\"18,1000", "temperature: the quote is not closed")]
    [InlineData("2026-06-01T12:00:00Z,9\u00003.1,18,1000", "character 23 is no text (\\x00): noise on the line, or a wrong baud rate")]
    [InlineData("", "time: the line ends too early: ',' is missing after it")]
    public void Misfit_IsRejectedWithItsReason(string line, string? reason)
    {
        SourceEvent read = LineTemplate.Parse("--line", LineTemplate.UsualText).Read(line, Received);
        Assert.Equal(reason, (read as RejectedLine)?.Reason);
        if (read is RejectedLine rejected)
        {
            Assert.Equal(line, rejected.RawText);
        }
    }

    [Theory]
    [InlineData("{signal},{pressure:mmHg}", "1,1013hPa", "pressure: 1013hPa: the line says hPa and the template mmHg; one of them is wrong")]
    [InlineData("{signal};{temperature}", "8,3;20,1", "signal: 8,3: a comma is no decimal mark here; write 8.3")]
    [InlineData("$P,{signal}", "$Q,1", "'$P,' should stand at character 1")]
    [InlineData("{signal},E", "1,E,2", "the line goes on after the template's end at character 4; add {} to the template to skip the rest")]
    [InlineData("{signal},{salinity}", "1,-40", "salinity: -40: -40 is no practical salinity")]
    [InlineData("{signal*1e300},{temperature}", "1e300,18", "signal: 1e300: with its scale the number is too large")]
    public void OtherMisfits_AreRejectedToo(string template, string line, string reason)
    {
        Assert.Equal(reason, Assert.IsType<RejectedLine>(LineTemplate.Parse("--line", template).Read(line, Received)).Reason);
    }

    [Theory]
    [InlineData("{time},{temperature}", "{signal} is missing; a line without the probe's signal says nothing")]
    [InlineData("{signal}{temperature}", "nothing stands between {temperature} and the field before it; put what separates them in the line there, for example a comma")]
    [InlineData("{signal},{signal}", "{signal} stands twice; skip one with {}")]
    [InlineData("{sginal}", "there is no field {sginal} (did you mean signal?); the fields are time, date, signal, temperature, pressure, salinity, skip, and {} skips one")]
    [InlineData("{signal},{temperature:G}", "G is no unit of temperature; the units are C, F, K")]
    [InlineData("{signal},{pressure:mHg}", "mHg is no unit of pressure (did you mean mmHg?); the units are hPa, mbar, kPa, Pa, bar, atm, mmHg, Torr, inHg, psi")]
    [InlineData("{signal", "the brace at character 1 is not closed; write {signal}, or {{ for a brace in the line")]
    [InlineData("{signal}}", "there is a closing brace at character 9 and nothing that it closes; write }} for a brace in the line")]
    [InlineData("{signal*0}", "a scale of 0 would lose the value")]
    [InlineData("{time:local},{signal}", "local is no form of time; write {time} where the line says its offset, {time:utc}, {time:+02:00}, {time:epoch} or {time:epochms}")]
    [InlineData("{date},{signal}", "{date} needs a {time}, for example {date},{time:utc},{signal}")]
    [InlineData("{signal},{temperature|}", "there is nothing after the bar; name what stands for a missing value, for example {temperature|-9999}")]
    [InlineData("{signal}\\n", "after a backslash only t (a tab) or another backslash may stand")]
    public void BadTemplates_AreRefusedInOneLine(string template, string problem)
    {
        Assert.Equal("--line " + template + ": " + problem, Assert.Throws<InputException>(() => LineTemplate.Parse("--line", template)).Message);
    }

    [Fact]
    public void Explanation_SaysWhatBareNumbersMean()
    {
        LineTemplate template = LineTemplate.Parse("--line", "{time},{signal:nA},{temperature:F},{pressure},{salinity}");
        Assert.Equal(
            [
                "time: ISO 8601 with Z or an offset",
                "signal: nA",
                "temperature: F",
                "pressure: hPa unless the line gives a unit, absolute at the station, not reduced to sea level",
                "salinity: practical salinity",
            ],
            template.Explanation);
        Assert.Equal("nA", template.SignalUnit);
    }

    [Fact]
    public void EveryCulture_ReadsTheSameLine()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            foreach (string culture in new[] { "de-DE", "fr-FR", "tr-TR", "fa-IR", "th-TH", "ar-SA" })
            {
                CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
                RawSample sample = Sample(LineTemplate.UsualText, "2026-06-01T12:00:00Z,93.12,18.25,1009.1");
                Assert.Equal((93.12, 18.25, 1009.1), (sample.Signal, sample.TemperatureCelsius!.Value, sample.PressureHectopascal!.Value));
                Assert.Equal("2026-06-01T12:00:00Z,93.12,18.25,1009.1", LineTemplate.Parse("l", LineTemplate.UsualText).Write(sample));
            }
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    /// <summary>What is written with every digit reads back as the same sample, whatever the template.</summary>
    [Fact]
    public void Write_ReadsBackAsTheSameSample()
    {
        LineTemplate[] templates =
        [
            LineTemplate.Parse("l", "{time},{signal},{temperature},{pressure},{salinity}"),
            LineTemplate.Parse("l", "O2={signal:nA} nA; T={temperature}; p={pressure}; S={salinity}; {time} end"),
            LineTemplate.Parse("l", "{date}\\t{time}\\t{signal}\\t{temperature}\\t{pressure}\\t{salinity}"),
        ];
        Gen<double?> optional(double least, double most) => Gen.Select(Gen.Int[0, 4], Gen.Double[least, most]).Select((one, value) => one == 0 ? (double?)null : value);
        Gen.Select(Gen.Double, optional(-5, 100), optional(300, 1300), optional(0, 300), Gen.Long[0, 3_000_000_000_000], Gen.Int[0, templates.Length - 1])
            .Where(t => double.IsFinite(t.Item1))
            .Sample((signal, celsius, hectopascal, salinity, milliseconds, index) =>
            {
                RawSample sample = new(Received, "", signal)
                {
                    TimeUtc = LineTimeStart.AddMilliseconds(milliseconds),
                    TimeFromLine = true,
                    TemperatureCelsius = celsius,
                    PressureHectopascal = hectopascal,
                    Salinity = salinity,
                };
                string line = templates[index].Write(sample);
                SourceEvent read = templates[index].Read(line, Received);
                return read is RawSample back && back == sample with { RawText = line };
            }, iter: Fuzz.Count(200_000));
    }

    [Fact]
    public void AnyLine_GivesASampleOrAReason()
    {
        LineTemplate[] templates =
        [
            LineTemplate.Parse("l", LineTemplate.UsualText), LineTemplate.Parse("l", "{} {signal} {temperature:F} {}"),
            LineTemplate.Parse("l", "{time:epoch};{signal*0.1};{pressure:psi}"), LineTemplate.Parse("l", "{signal}"),
        ];
        Gen<string> pieces = Pieces("2026-06-01T12:00:00Z", ",", ";", " ", "\t", "\"", "\"\"", "1e308", "-", "NaN", "18.2", "760mmHg", "é", "\0", "+", "99999999999999999999", "T", "Z");
        Gen.Select(Gen.Frequency((1, Gen.String), (3, pieces)), Gen.Int[0, templates.Length - 1]).Sample(
            (line, index) => templates[index].Read(line, Received) switch
            {
                RawSample sample => double.IsFinite(sample.Signal) && sample.TemperatureCelsius is null or (>= -5 and <= 100)
                    && sample.PressureHectopascal is null or (>= 300 and <= 1300),
                RejectedLine rejected => rejected.Reason.Length is > 0 and < 600 && !rejected.Reason.Any(char.IsControl) && rejected.RawText == line,
                _ => false,
            },
            iter: Fuzz.Count(500_000));
    }

    [Fact]
    public void AnyTemplate_IsReadOrRefused()
    {
        Gen<string> pieces = Pieces("{signal}", "{", "}", "{{", "}}", ",", ":", "*", "|", "{time:utc}", "temperature", "\\t", "\\", "mmHg", "1e5", " ");
        pieces.Sample(text =>
        {
            try
            {
                LineTemplate template = LineTemplate.Parse("l", text);
                _ = template.Read("1,2,3", Received);
                return template.Explanation.Count > 0;
            }
            catch (InputException wrong)
            {
                return wrong.Message.StartsWith("l ", StringComparison.Ordinal) && !wrong.Message.Any(char.IsControl);
            }
        }, iter: Fuzz.Count(200_000));
    }

    private static DateTimeOffset LineTimeStart { get; } = new(2001, 1, 1, 0, 0, 0, TimeSpan.Zero);

    private static Gen<string> Pieces(params string[] pieces)
    {
        return Gen.Int[0, pieces.Length - 1].Array[0, 30].Select(which => string.Concat(which.Select(i => pieces[i])));
    }

    private static RawSample Sample(string template, string line)
    {
        SourceEvent read = LineTemplate.Parse("--line", template).Read(line, Received);
        return read is RawSample sample ? sample : throw new Xunit.Sdk.XunitException(((RejectedLine)read).Reason);
    }
}
