using System;
using System.Globalization;
using CsCheck;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Entry;

public class QuantityTests
{
    private static readonly string[] Cultures = ["", "en-US", "de-DE", "fr-FR", "tr-TR", "fa-IR", "ar-SA", "sv-SE"];

    /// <summary>Exact pairs by definition of the units; the rest is arithmetic on them, to the rounding of a double.</summary>
    [Theory]
    [InlineData("760mmHg", 1013.25)]
    [InlineData("760 mmHg", 1013.25)]
    [InlineData("760 mm Hg", 1013.25)]
    [InlineData("760Torr", 1013.25)]
    [InlineData("1013.25hPa", 1013.25)]
    [InlineData("1013.25 mbar", 1013.25)]
    [InlineData("101.325 kPa", 1013.25)]
    [InlineData("101325 Pa", 1013.25)]
    [InlineData("1.01325bar", 1013.25)]
    [InlineData("1 atm", 1013.25)]
    [InlineData("380mmHg", 506.625)]
    [InlineData("1.01325e3 hPa", 1013.25)]
    [InlineData("+1013.25hPa", 1013.25)]
    [InlineData(" 1013.25 hPa ", 1013.25)]
    public void Pressure_ComesOutExactly(string text, double hectopascal)
    {
        Assert.Equal(hectopascal, Quantity.PressureHectopascal("--pressure", text));
    }

    /// <summary>29.92126 inHg and 14.695949 psi are one atmosphere, rounded (25.4 mm in an inch; NIST SP 811 for psi).</summary>
    [Theory]
    [InlineData("29.92126inHg", 1013.25, 1e-4)]
    [InlineData("14.695949psi", 1013.25, 1e-4)]
    [InlineData("100psi", 6894.757293, 1e-6)]
    public void Pressure_InInchesAndPounds(string text, double hectopascal, double tolerance)
    {
        Assert.InRange(Quantity.PressureHectopascal("--pressure", text) - hectopascal, -tolerance, tolerance);
    }

    [Theory]
    [InlineData("20", 20)]
    [InlineData("20C", 20)]
    [InlineData("20 degC", 20)]
    [InlineData("20 °C", 20)]
    [InlineData("20ºC", 20)]
    [InlineData("20℃", 20)]
    [InlineData("68F", 20)]
    [InlineData("68 °F", 20)]
    [InlineData("32F", 0)]
    [InlineData("-40F", -40)]
    [InlineData("212 degF", 100)]
    [InlineData("293.15K", 20)]
    [InlineData("-0.5", -0.5)]
    [InlineData(".5C", 0.5)]
    [InlineData("2e1", 20)]
    public void Temperature_IsCelsiusUnlessItSaysOtherwise(string text, double celsius)
    {
        Assert.Equal(celsius, Quantity.TemperatureCelsius("--temperature", text));
    }

    [Fact]
    public void OtherKinds_ComeOutInTheirCanonicalUnit()
    {
        Assert.Equal(640, Quantity.AltitudeMetres("--altitude", "640m"));
        Assert.Equal(640.08, Quantity.AltitudeMetres("--altitude", "2100ft"), 10);
        Assert.Equal(-430, Quantity.AltitudeMetres("--altitude", "-430 m"));
        Assert.Equal(35, Quantity.Salinity("--salinity", "35"));
        Assert.Equal(35, Quantity.Salinity("--salinity", "35 PSU"));
        Assert.Equal(TimeSpan.FromMinutes(3), Quantity.Duration("--window", "3min"));
        Assert.Equal(TimeSpan.FromMinutes(3), Quantity.Duration("--window", "180s"));
        Assert.Equal(TimeSpan.FromMilliseconds(250), Quantity.Duration("--window", "250 ms"));
        Assert.Equal(0.1, Quantity.FrequencyHertz("--rate", "6/min"));
        Assert.Equal(1, Quantity.FrequencyHertz("--rate", "1Hz"));
        Assert.Equal(8.3, Quantity.Parse(QuantityKind.MassConcentration, "meter", "8.3 mg/L"));
        Assert.Equal(0.0083, Quantity.Parse(QuantityKind.MassConcentration, "meter", "8.3 ug/L"), 15);
        Assert.Equal(280, Quantity.Parse(QuantityKind.AmountConcentration, "meter", "0.28 mmol/L"), 10);
        Assert.Equal(1.5, Quantity.Parse(QuantityKind.Percent, "ratio", "1.5 %"));
        Assert.Equal(0.05, Quantity.Parse(QuantityKind.TemperatureDifference, "limit", "0.05 °C"));
        Assert.Equal(1, Quantity.Parse(QuantityKind.TemperatureDifference, "limit", "1.8F"), 15);
    }

    /// <summary>Each refusal is one line that names option, value, fault and what would be right.</summary>
    [Theory]
    [InlineData("760", "--pressure 760: a pressure carries its unit; write for example 760mmHg or 1013.25hPa (units: hPa, mbar, kPa, Pa, bar, atm, mmHg, Torr, inHg, psi)")]
    [InlineData("760 mHg", "--pressure 760 mHg: mHg is no unit of a pressure (did you mean mmHg?); write for example 760mmHg or 1013.25hPa (units: hPa, mbar, kPa, Pa, bar, atm, mmHg, Torr, inHg, psi)")]
    [InlineData("1013,25hPa", "--pressure 1013,25hPa: a comma is no decimal mark here; write 1013.25hPa")]
    [InlineData("1,013hPa", "--pressure 1,013hPa: a comma is no decimal mark here and groups no digits; write 1.013hPa or 1013hPa")]
    [InlineData("1,013.25hPa", "--pressure 1,013.25hPa: digits are not grouped here; write 1013.25hPa")]
    [InlineData("1 013.25hPa", "--pressure 1 013.25hPa: digits are not grouped here; write the number in one piece with a point as decimal mark, for example 760mmHg or 1013.25hPa")]
    [InlineData("1'013.25hPa", "--pressure 1'013.25hPa: digits are not grouped here; write the number in one piece with a point as decimal mark, for example 760mmHg or 1013.25hPa")]
    [InlineData("", "--pressure '': there is nothing there; write for example 760mmHg or 1013.25hPa")]
    [InlineData("hPa", "--pressure hPa: this is no number; write one with a point as decimal mark, for example 8.3")]
    [InlineData("NaN", "--pressure NaN: NaN and infinity are no values here; write a finite number, for example 8.3")]
    [InlineData("-inf hPa", "--pressure -inf hPa: NaN and infinity are no values here; write a finite number, for example 8.3")]
    [InlineData("1e999hPa", "--pressure 1e999hPa: the number is too large")]
    [InlineData("1e308bar", "--pressure 1e308bar: the number is too large")]
    public void Pressure_IsRefusedInOneLine(string text, string message)
    {
        InputException wrong = Assert.Throws<InputException>(() => Quantity.PressureHectopascal("--pressure", text));
        Assert.Equal(message, wrong.Message);
    }

    [Theory]
    [InlineData("8,3", "a comma is no decimal mark here; write 8.3")]
    [InlineData("0,125", "a comma is no decimal mark here; write 0.125")]
    [InlineData("1,234,567", "digits are not grouped here; write 1234567")]
    [InlineData("−8.3", "the minus sign is another character; write -8.3")]
    [InlineData("∞", "NaN and infinity are no values here; write a finite number, for example 8.3")]
    [InlineData("0x10", "this is no number; write one with a point as decimal mark, for example 8.3")]
    [InlineData("٣", "this is no number; write one with a point as decimal mark, for example 8.3")]
    [InlineData("8.3.1", "this is no number; write one with a point as decimal mark, for example 8.3")]
    [InlineData("1e-999", "the number is too small to be told from 0; write 0 if that is meant")]
    public void Number_IsRefusedWithAdvice(string text, string problem)
    {
        Assert.False(Number.TryParse(text, out double value, out string? given));
        Assert.Equal(problem, given);
        Assert.True(double.IsNaN(value));
    }

    [Theory]
    [InlineData("20X", "X is no unit of a temperature; write for example 20C or 68F (units: C, F, K)")]
    [InlineData("35 g/kg", "a practical salinity has no unit; write the bare number, for example 35")]
    public void UnknownUnits_AreRefused(string text, string problem)
    {
        QuantityKind kind = text.StartsWith("20", StringComparison.Ordinal) ? QuantityKind.Temperature : QuantityKind.Salinity;
        Assert.False(Quantity.TryParse(kind, text, out _, out string? given));
        Assert.Equal(problem, given);
    }

    [Theory]
    [InlineData("3m")]
    [InlineData("3")]
    [InlineData("0s")]
    [InlineData("-3min")]
    [InlineData("1e9d")]
    public void Duration_RefusesWhatIsNone(string text)
    {
        Assert.StartsWith("--window " + text + ": ", Assert.Throws<InputException>(() => Quantity.Duration("--window", text)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Message_StaysOneLineWhateverWasTyped()
    {
        string message = Assert.Throws<InputException>(() => Quantity.TemperatureCelsius("--temperature", "20\r\nC\u001b[31m" + new string('x', 500))).Message;
        Assert.DoesNotContain(message, char.IsControl);
        Assert.True(message.Length < 400, message);
    }

    [Fact]
    public void EveryCulture_ReadsAndPrintsTheSame()
    {
        // The check is void on a machine whose cultures are all the invariant one.
        Assert.Equal("1,5", 1.5.ToString(CultureInfo.GetCultureInfo("de-DE")));
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            foreach (string culture in Cultures)
            {
                CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
                Assert.Equal(1013.25, Quantity.PressureHectopascal("p", "1013.25hPa"));
                Assert.Equal(-0.5, Quantity.TemperatureCelsius("t", "-0.5"));
                Assert.Equal(1.5, Number.Parse("x", "1.5"));
                Assert.False(Number.TryParse("1,5", out _, out _));
                Assert.Equal("1013.25 hPa", Quantity.Print(QuantityKind.Pressure, 1013.25));
                Assert.Equal("-0.5", Number.Print(-0.5));
                Assert.Equal("-1234567.50", Number.Fixed(-1234567.5, 2));
                Assert.Equal("INHG is no unit of a pressure (did you mean inHg?)", Problem("29.92INHG")[..50]);
            }
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void Significant_KeepsSoManyDigits_AndWritesThemShort()
    {
        Assert.Equal("0.44871", Number.Significant(0.448712345, 5));
        Assert.Equal("123460", Number.Significant(123456.7, 5));
        Assert.Equal("1.5E-05", Number.Significant(1.5e-5, 5));
        Assert.Equal("0.1", Number.Significant(0.1, 5));
    }

    [Fact]
    public void Fixed_RoundsToZeroWithoutAMinusSign()
    {
        Assert.Equal("0.00", Number.Fixed(-0.001, 2));
        Assert.Equal("-0.01", Number.Fixed(-0.009, 2));
        Assert.Equal("760.0 mmHg", Quantity.Print(1013.25, QuantityKind.Pressure.Unit("mmHg")!, 1));
        Assert.Equal("1.5%", Quantity.Print(QuantityKind.Percent, 1.5));
    }

    [Fact]
    public void Print_ReadsBackAsTheSameDouble()
    {
        QuantityKind[] kinds =
        [
            QuantityKind.Temperature, QuantityKind.TemperatureDifference, QuantityKind.Pressure, QuantityKind.Altitude, QuantityKind.Salinity,
            QuantityKind.MassConcentration, QuantityKind.AmountConcentration, QuantityKind.Percent, QuantityKind.Duration, QuantityKind.Frequency,
        ];
        Gen.Select(Gen.Double, Gen.Int[0, kinds.Length - 1]).Where(pair => double.IsFinite(pair.Item1)).Sample(
            (value, kind) => Quantity.Parse(kinds[kind], "x", Quantity.Print(kinds[kind], value)) == value,
            iter: Fuzz.Count(200_000));
    }

    [Fact]
    public void EveryUnit_ConvertsThereAndBack()
    {
        QuantityKind[] kinds = [QuantityKind.Temperature, QuantityKind.Pressure, QuantityKind.Altitude, QuantityKind.Duration, QuantityKind.Frequency, QuantityKind.MassConcentration];
        foreach (QuantityKind kind in kinds)
        {
            foreach (QuantityUnit unit in kind.Units)
            {
                foreach (double value in new[] { -12.5, 0, 1, 20, 760, 1013.25 })
                {
                    Assert.Equal(value, unit.FromCanonical(unit.ToCanonical(value)), 10);
                }
            }
        }
    }

    [Fact]
    public void AnyText_GivesAValueOrAProblem()
    {
        Gen.String.Sample(text =>
        {
            bool good = Quantity.TryParse(QuantityKind.Pressure, text, out double value, out string? problem);
            return good ? double.IsFinite(value) && problem is null : double.IsNaN(value) && !string.IsNullOrEmpty(problem);
        }, iter: Fuzz.Count(200_000));
    }

    [Theory]
    [InlineData("presure", "pressure")]
    [InlineData("TEMPERATURE", "temperature")]
    [InlineData("tmeperature", "temperature")]
    [InlineData("salinty", "salinity")]
    [InlineData("xyz", null)]
    [InlineData("", null)]
    public void NearestName_FindsWhatWasMeant(string given, string? meant)
    {
        Assert.Equal(meant, NearestName.Find(given, ["temperature", "pressure", "salinity", "altitude"]));
    }

    private static string Problem(string text)
    {
        Assert.False(Quantity.TryParse(QuantityKind.Pressure, text, out _, out string? problem));
        return problem!;
    }
}
