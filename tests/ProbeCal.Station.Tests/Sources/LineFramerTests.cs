using System;
using System.Collections.Generic;
using System.Linq;
using System.Text;
using CsCheck;
using ProbeCal.Station.Sources;
using ProbeCal.Station.Tests.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Sources;

public class LineFramerTests
{
    [Theory]
    [InlineData("a\nb\n", "a|b")]
    [InlineData("a\r\nb\r\n", "a|b")]
    [InlineData("a\rb\r", "a|b")]
    [InlineData("\n\r\n a \n\n\nb\r", " a |b")]
    [InlineData("a\nb", "a|b!it may be cut, for it has no line end")]
    [InlineData("", "")]
    [InlineData("\n", "")]
    public void Lines_EndAtCrOrLf(string bytes, string lines)
    {
        Assert.Equal(lines, string.Join('|', Frame(new LineFramer(false), [Encoding.UTF8.GetBytes(bytes)]).Select(Shown)));
    }

    [Theory]
    [InlineData("2.34,18\n12.34,18\n", "2.34,18!it may be cut at its start, for the source was opened in the middle of it|12.34,18")]
    [InlineData("\n12.34,18\n", "12.34,18")]
    [InlineData("2.3", "2.3!it may be cut at its start, for the source was opened in the middle of it")]
    public void FirstLine_IsNotTrustedWhereItMayBeHalf(string bytes, string lines)
    {
        Assert.Equal(lines, string.Join('|', Frame(new LineFramer(true), [Encoding.UTF8.GetBytes(bytes)]).Select(Shown)));
    }

    [Fact]
    public void FirstLine_IsTrustedAfterAQuietStart()
    {
        LineFramer framer = new(true);
        framer.StartsWhole();
        Assert.Equal([new FramedLine("12.34", null)], Frame(framer, ["12.34\n"u8.ToArray()]));
    }

    [Fact]
    public void OverlongLine_IsCutAndTheNextOneIsWhole()
    {
        byte[] bytes = [.. Enumerable.Repeat((byte)'x', 5000), (byte)'\n', (byte)'a', (byte)'\n'];
        List<FramedLine> lines = Frame(new LineFramer(false), [bytes]);
        Assert.Equal(2, lines.Count);
        Assert.Equal(new string('x', 1024), lines[0].Text);
        Assert.Equal("it is longer than 1024 bytes and was cut there", lines[0].Defect);
        Assert.Equal(new FramedLine("a", null), lines[1]);
        Assert.Null(Frame(new LineFramer(false), [[.. Enumerable.Repeat((byte)'x', 1024), (byte)'\n']])[0].Defect);
    }

    [Fact]
    public void Bytes_BecomeTextWithoutLoss()
    {
        Assert.Equal("18 °C", Frame(new LineFramer(false), ["18 °C\n"u8.ToArray()])[0].Text);
        Assert.Equal("18 °C", Frame(new LineFramer(false), [[(byte)'1', (byte)'8', (byte)' ', 0xB0, (byte)'C', (byte)'\n']])[0].Text);
        Assert.Equal("a", Frame(new LineFramer(false), [[0xEF, 0xBB, 0xBF, (byte)'a', (byte)'\n']])[0].Text);
    }

    /// <summary>However a stream of any bytes is cut into reads, the lines are the same, none is longer than the cap, and each gives a sample or a reason.</summary>
    [Fact]
    public void AnyBytes_InAnyPiecesGiveTheSameLines()
    {
        LineTemplate template = LineTemplate.Parse("l", "{signal},{}");
        Gen<byte> some = Gen.Frequency((6, Gen.Byte), (1, Gen.Const((byte)'\n')), (1, Gen.Const((byte)'\r')));
        Gen.Select(some.Array[0, 3000], Gen.Int[5, 400], Gen.Bool).Sample((bytes, piece, middle) =>
        {
            List<FramedLine> whole = Frame(new LineFramer(middle), [bytes]);
            List<FramedLine> pieces = Frame(new LineFramer(middle), bytes.Chunk(piece));
            int ends = bytes.Count(b => b is (byte)'\n' or (byte)'\r');
            bool isRead = whole.All(line => template.Read(line.Text, DateTimeOffset.UnixEpoch) is RawSample or RejectedLine { Reason.Length: > 0 });
            return isRead && whole.SequenceEqual(pieces) && whole.All(line => line.Text.Length <= LineTemplate.LongestLine) && whole.Count <= ends + 1;
        }, iter: Fuzz.Count(10_000));
    }

    [Fact]
    public void EndlessLine_TakesNoMemory()
    {
        LineFramer framer = new(false);
        byte[] noise = new byte[4096];
        Array.Fill(noise, (byte)'7');
        List<FramedLine> found = [];
        Action<FramedLine> add = found.Add;
        framer.Push(noise, add);
        long before = GC.GetAllocatedBytesForCurrentThread();
        for (int i = 0; i < 10_000; i++)
        {
            framer.Push(noise, add);
        }

        Assert.True(GC.GetAllocatedBytesForCurrentThread() - before < 10_000);
        framer.End(add);
        Assert.Equal(1024, Assert.Single(found).Text.Length);
    }

    private static string Shown(FramedLine line)
    {
        return line.Defect is null ? line.Text : line.Text + "!" + line.Defect;
    }

    private static List<FramedLine> Frame(LineFramer framer, IEnumerable<byte[]> pieces)
    {
        List<FramedLine> lines = [];
        foreach (byte[] piece in pieces)
        {
            framer.Push(piece, lines.Add);
        }

        framer.End(lines.Add);
        return lines;
    }
}
