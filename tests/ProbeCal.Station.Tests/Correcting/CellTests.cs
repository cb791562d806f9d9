using System;
using System.Globalization;
using System.Text;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Correcting;

/// <summary>Cells to numbers and times and back: the fast ways agree with the slow ones of the whole program, bit for bit.</summary>
public class CellTests
{
    private const int Seed = 20260620;

    [Fact]
    public void Number_of_a_cell_is_the_number_that_everything_else_reads()
    {
        Random random = new(Seed);
        for (int i = 0; i < 200_000; i++)
        {
            string text = RandomNumber(random);
            bool expected = Number.TryParse(text, out double slow, out _);
            bool found = CellNumber.TryParse(Encoding.UTF8.GetBytes(text), (byte)'.', out double fast);
            Assert.True(expected == found, $"seed {Seed}: '{text}' is read as {found} and not as {expected}");
            Assert.True(BitConverter.DoubleToInt64Bits(slow) == BitConverter.DoubleToInt64Bits(fast), $"seed {Seed}: '{text}' gives {fast:R} and not {slow:R}");
        }
    }

    [Theory]
    [InlineData("8,31", 8.31)]
    [InlineData(" -0,070 ", -0.070)]
    [InlineData("1,5E-3", 0.0015)]
    public void Comma_is_the_mark_where_it_is_said_so(string text, double expected)
    {
        Assert.True(CellNumber.TryParse(Encoding.UTF8.GetBytes(text), (byte)',', out double value));
        Assert.Equal(expected, value);
        Assert.False(CellNumber.TryParse(Encoding.UTF8.GetBytes(text), (byte)'.', out _));
    }

    [Theory]
    [InlineData("")]
    [InlineData("-")]
    [InlineData("NaN")]
    [InlineData("Infinity")]
    [InlineData("1.2.3")]
    [InlineData("8.3 mg/L")]
    [InlineData("1e999")]
    [InlineData("1e-999")]
    [InlineData("0x10")]
    [InlineData("1e")]
    [InlineData("\u22121")]
    public void What_is_no_finite_number_is_none(string text)
    {
        Assert.False(CellNumber.TryParse(Encoding.UTF8.GetBytes(text), (byte)'.', out double value));
        Assert.True(double.IsNaN(value));
    }

    [Fact]
    public void Fixed_decimals_are_the_exact_ones()
    {
        Random random = new(Seed);
        byte[] text = new byte[FixedText.LongestText];
        for (int i = 0; i < 200_000; i++)
        {
            double value = RandomValue(random, i);
            int decimals = random.Next(0, FixedText.MostDecimals + 1);
            int length = FixedText.Write(value, decimals, (byte)'.', text);
            string found = Encoding.ASCII.GetString(text, 0, length);
            Assert.True(Number.Fixed(value, decimals) == found, $"seed {Seed}: {value:R} with {decimals} decimals gives {found} and not {Number.Fixed(value, decimals)}");
        }
    }

    [Fact]
    public void Shortest_text_reads_back_as_the_same_number()
    {
        Random random = new(Seed);
        byte[] text = new byte[FixedText.LongestText];
        for (int i = 0; i < 50_000; i++)
        {
            double value = RandomValue(random, i);
            int length = FixedText.Write(value, FixedText.Shortest, (byte)'.', text);
            string found = Encoding.ASCII.GetString(text, 0, length);
            Assert.Equal(Number.Print(value), found);
            Assert.Equal(BitConverter.DoubleToInt64Bits(value), BitConverter.DoubleToInt64Bits(double.Parse(found, CultureInfo.InvariantCulture)));
        }
    }

    [Fact]
    public void Halves_round_as_their_exact_digits_say()
    {
        byte[] text = new byte[FixedText.LongestText];
        foreach (double value in new[] { 0.125, 0.375, 2.5, 1.005, 8.345, -0.0005, 0.0005, 999.9995, 1e15 + 0.5, -0.0001 })
        {
            for (int decimals = 0; decimals <= 4; decimals++)
            {
                int length = FixedText.Write(value, decimals, (byte)',', text);
                Assert.Equal(Number.Fixed(value, decimals).Replace('.', ','), Encoding.ASCII.GetString(text, 0, length));
            }
        }
    }

    [Theory]
    [InlineData("2026-06-01 12:30", "+02:00", "2026-06-01T10:30:00.0000000Z")]
    [InlineData("2026-06-01T12:30:05.25", "-03:30", "2026-06-01T16:00:05.2500000Z")]
    [InlineData("2026/06/01 00:10:00", "+14:00", "2026-05-31T10:10:00.0000000Z")]
    [InlineData("2026-06-01T12:30:00Z", null, "2026-06-01T12:30:00.0000000Z")]
    [InlineData("2026-06-01T12:30:00+0200", null, "2026-06-01T10:30:00.0000000Z")]
    [InlineData("2026-06-01T12:30:00 -04", null, "2026-06-01T16:30:00.0000000Z")]
    [InlineData("2026-06-01T12:30:00+02:00", "+02:00", "2026-06-01T10:30:00.0000000Z")]
    public void Time_of_a_cell_is_UTC(string text, string? offset, string expected)
    {
        Assert.Equal(CellTimeOutcome.Read, new CellTime(Offset(offset), null).Read(Encoding.UTF8.GetBytes(text), out long ticks, out _));
        Assert.Equal(expected, new DateTime(ticks, DateTimeKind.Utc).ToString("o", CultureInfo.InvariantCulture));
    }

    [Theory]
    [InlineData("2026-06-01 12:30", null, "NoOffset")]
    [InlineData("2026-06-01T12:30Z", "+02:00", "OtherOffset")]
    [InlineData("", "+02:00", "Missing")]
    [InlineData("2026-02-30 12:30", "+02:00", "Unreadable")]
    [InlineData("01/06/2026 12:30", "+02:00", "Unreadable")]
    [InlineData("2026-06-01 24:30", "+02:00", "Unreadable")]
    [InlineData("2026-06-01 12:30+25:00", null, "Unreadable")]
    [InlineData("2026-06-01", "+02:00", "Unreadable")]
    [InlineData("noon", "+02:00", "Unreadable")]
    public void Time_that_cannot_be_told_is_not_guessed(string text, string? offset, string expected)
    {
        Assert.Equal(expected, new CellTime(Offset(offset), null).Read(Encoding.UTF8.GetBytes(text), out _, out _).ToString());
    }

    [Theory]
    [InlineData("06/01/2026 14:30", "MM/dd/yyyy HH:mm")]
    [InlineData("01.06.2026 14:30", "dd.MM.yyyy HH:mm")]
    public void Pattern_says_which_is_the_month(string text, string pattern)
    {
        Assert.Equal(CellTimeOutcome.Read, new CellTime(TimeSpan.Zero, pattern).Read(Encoding.UTF8.GetBytes(text), out long ticks, out _));
        Assert.Equal(new DateTime(2026, 6, 1, 14, 30, 0, DateTimeKind.Utc).Ticks, ticks);
    }

    [Fact]
    public void Seconds_since_1970_are_UTC()
    {
        Assert.Equal(CellTimeOutcome.Read, new CellTime(null, "epoch").Read("1780317000.5"u8, out long ticks, out _));
        Assert.Equal(new DateTimeOffset(2026, 6, 1, 12, 30, 0, 500, TimeSpan.Zero).UtcTicks, ticks);
        Assert.Equal(CellTimeOutcome.OtherOffset, new CellTime(TimeSpan.FromHours(2), "epoch").Read("1780317000"u8, out _, out _));
    }

    private static TimeSpan? Offset(string? text)
    {
        return text is null ? null : TimeSpan.Parse(text.TrimStart('+'), CultureInfo.InvariantCulture);
    }

    private static double RandomValue(Random random, int i)
    {
        return (i % 4) switch
        {
            0 => Math.Round((random.NextDouble() - 0.2) * 1000, random.Next(0, 8)),
            1 => (random.NextDouble() - 0.5) * Math.Pow(10, random.Next(-12, 18)),
            // Halves of the last decimal, where rounding is decided by the last bit.
            2 => random.Next(-100_000, 100_000) / 2000.0,
            _ => BitConverter.Int64BitsToDouble(random.NextInt64(0x3000000000000000, 0x4600000000000000)),
        };
    }

    private static string RandomNumber(Random random)
    {
        StringBuilder text = new();
        text.Append(random.Next(6) switch { 0 => "-", 1 => "+", 2 => " ", _ => "" });
        Digits(random, text, random.Next(0, 9));
        if (random.Next(4) != 0)
        {
            text.Append('.');
            Digits(random, text, random.Next(0, random.Next(5) == 0 ? 24 : 7));
        }

        if (random.Next(6) == 0)
        {
            text.Append(random.Next(2) == 0 ? 'e' : 'E').Append(random.Next(-30, 31).ToString(CultureInfo.InvariantCulture));
        }

        return text.Append(random.Next(10) == 0 ? "x" : "").ToString();
    }

    private static void Digits(Random random, StringBuilder text, int count)
    {
        for (int i = 0; i < count; i++)
        {
            text.Append((char)('0' + random.Next(10)));
        }
    }
}
