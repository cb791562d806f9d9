using System;
using System.IO;
using System.Text;
using System.Threading;
using Microsoft.Extensions.Time.Testing;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Tests.Storage;
using ProbeCal.Station.WholeFiles;
using Xunit;

namespace ProbeCal.Station.Tests.WholeFiles;

/// <summary>A table goes through row by row: each comes out as it went in, with its results behind it.</summary>
public class WholeFileTests
{
    private static readonly string[] Usual = ["temperature=T [C]", "pressure=P [mmHg]"];

    [Fact]
    public void EveryRow_KeepsItsCells_AndGainsResultsAndStatus()
    {
        Worked worked = Worked.Of("when,T,P,remark\n8:00,12.5,760,calm\n9:00,8,741.2,\n10:00,41,760,hot\n", Usual);

        Assert.Equal(
            "when,T,P,remark,pressure [hPa],above ten [K],status\n"
            + "8:00,12.5,760,calm,1013.25,2.5,ok\n"
            + "9:00,8,741.2,,988.1853947368421,-2,flagged: cold\n"
            + "10:00,41,760,hot,,,refused: too warm; 41C is too warm\n", worked.Output);
        Assert.Equal(
        [
            "standard input: 4 columns separated by comma (told from the header), header in line 1",
            "  temperature from column 2, C; pressure from column 3, mmHg",
            "3 rows: 2 computed, 1 of them flagged, 1 refused",
            "  flagged: 1 row, cold",
            "  refused: 1 row, too warm",
        ], worked.Said);
    }

    /// <summary>Each bad row costs itself only: the row behind it is computed.</summary>
    [Theory]
    [InlineData("x,,760", "temperature missing")]
    [InlineData("x,NA,760", "temperature missing; the cell says NA")]
    [InlineData("x,12.5,---", "pressure missing; the cell says ---")]
    [InlineData("x,warm,760", "temperature unreadable; warm: this is no number; write one with a point as decimal mark, for example 8.3")]
    [InlineData("x,\"12,5\",760", "temperature unreadable; 12,5: a comma is no decimal mark unless --decimal-comma says so")]
    [InlineData("x,54.5F,760", "temperature unreadable; 54.5F: the cell says F and the mapping C; one of them is wrong")]
    [InlineData("x,1e999,760", "temperature unreadable; 1e999: the number is too large")]
    [InlineData("x,12.5", "other number of cells than the header; 2 where the header has 3")]
    [InlineData("x,12.5,760,1", "other number of cells than the header; 4 where the header has 3")]
    [InlineData("x,\"12.5\"0,760", "there is text behind a closing quotation mark")]
    [InlineData("\"x,12.5,760", "a quotation mark is opened and never closed")]
    public void BadRow_StopsNothing(string row, string reason)
    {
        Worked worked = Worked.Of($"id,T,P\n{row}\ny,11,760\n", Usual);

        string[] lines = worked.Output.Split('\n');
        Assert.Equal("y,11,760,1013.25,1,ok", lines[2]);
        Assert.Contains("refused: " + reason, Unquoted(lines[1]), StringComparison.Ordinal);
        Assert.Contains("2 rows: 1 computed, 1 refused", worked.Said);
    }

    [Fact]
    public void RowThatIsNeverClosed_IsKeptAsOneCell_SoThatTheOutputStaysATable()
    {
        Worked worked = Worked.Of("id,T,P\n\"x,12.5,760\ny,11,760\n", Usual);
        Assert.Equal("\"\"\"x,12.5,760\",,,,,refused: a quotation mark is opened and never closed", worked.Output.Split('\n')[1]);
    }

    [Fact]
    public void ShortRow_IsFilledUp_SoThatResultsStandUnderTheirNames()
    {
        Assert.Equal("x,12.5,,,,", Worked.Of("id,T,P\nx,12.5\n", Usual).Output.Split('\n')[1][..10]);
    }

    [Theory]
    [InlineData("T;P\n12,5;760\n", "T;P;pressure [hPa];above ten [K];status\n12,5;760;1013,25;2,5;ok\n")]
    [InlineData("T\tP\n12,5\t760\n", "T\tP\tpressure [hPa]\tabove ten [K]\tstatus\n12,5\t760\t1013,25\t2,5\tok\n")]
    [InlineData("T,P\n\"12,5\",760\n", "T,P,pressure [hPa],above ten [K],status\n\"12,5\",760,\"1013,25\",\"2,5\",ok\n")]
    public void DecimalComma_IsReadAndWritten_WhenAskedFor(string input, string output)
    {
        Assert.Equal(output, Worked.Of(input, Usual, decimalComma: true).Output);
    }

    [Fact]
    public void Point_IsNoDecimalMark_WhereCommasArePromised()
    {
        Assert.Contains("refused: temperature unreadable; 12.5: a point where --decimal-comma promises commas", Worked.Of("T;P\n12.5;760\n", Usual, decimalComma: true).Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("T,P\r\n12.5,760\r\n\r\n8,760", "T,P,pressure [hPa],above ten [K],status\r\n12.5,760,1013.25,2.5,ok\r\n\r\n8,760,1013.25,-2,flagged: cold\r\n")]
    [InlineData("T,P\r12.5,760\r", "T,P,pressure [hPa],above ten [K],status\r12.5,760,1013.25,2.5,ok\r")]
    [InlineData("\uFEFFT,P\n12.5,760\n", "\u00EF\u00BB\u00BFT,P,pressure [hPa],above ten [K],status\n12.5,760,1013.25,2.5,ok\n")]
    [InlineData("# logger 7\n\nT,P\n12.5,760\n", "# logger 7\n\nT,P,pressure [hPa],above ten [K],status\n12.5,760,1013.25,2.5,ok\n")]
    [InlineData("T,P,note\n12.5,760,\"two\nlines, \"\"quoted\"\"\"\n", "T,P,note,pressure [hPa],above ten [K],status\n12.5,760,\"two\nlines, \"\"quoted\"\"\",1013.25,2.5,ok\n")]
    [InlineData("\"T\",\"P\"\n\" 12.5 \",\"760\"\n", "\"T\",\"P\",pressure [hPa],above ten [K],status\n\" 12.5 \",\"760\",1013.25,2.5,ok\n")]
    [InlineData("T,P,status,status #2\n12.5,760,good,x\n", "T,P,status,status #2,pressure [hPa],above ten [K],status #3\n12.5,760,good,x,1013.25,2.5,ok\n")]
    public void Forms_OfTablesThatThereAre(string input, string output)
    {
        Assert.Equal(output, Worked.Of(input, Usual).Output);
    }

    [Fact]
    public void HeaderLine_SkipsWhatALoggerWritesBefore()
    {
        Worked worked = Worked.Of("Logger;4711\nsite;pier\nT;P\n12.5;760\n", Usual, headerLine: "3");
        Assert.Equal("Logger;4711\nsite;pier\nT;P;pressure [hPa];above ten [K];status\n12.5;760;1013.25;2.5;ok\n", worked.Output);
    }

    /// <summary>The bytes of a file in another encoding come out as they went in; names and messages are read by it.</summary>
    [Fact]
    public void Encodings_ArePassedThroughByteForByte()
    {
        byte[] latin = Encoding.Latin1.GetBytes("Höhe;T °C;P\nä;warm°;760\n");
        Worked worked = Worked.Of(latin, ["temperature=T °C [C]", "pressure=P [mmHg]"]);
        Assert.StartsWith("Höhe;T °C;P;", worked.Output, StringComparison.Ordinal);
        Assert.Contains("ä;warm°;760;;;\"refused: temperature unreadable; warm°: this", worked.Output.Split('\n')[1], StringComparison.Ordinal);

        Worked utf8 = Worked.Of("Höhe;T °C;P\nä;warm°;760\n", ["temperature=T °C [C]", "pressure=P [mmHg]"]);
        Assert.Contains("ä;warm°;760;;;\"refused: temperature unreadable; warm°: this", Encoding.UTF8.GetString(Encoding.Latin1.GetBytes(utf8.Output)), StringComparison.Ordinal);
    }

    /// <summary>Every refusal of the request is one line, before anything is written.</summary>
    [Theory]
    [InlineData("T,P\n1,2\n", "--column temprature=T: temprature is no quantity that a column can hold (did you mean temperature?); there are temperature, pressure, salinity, concentration", "temprature=T")]
    [InlineData("T,P\n1,2\n", "--column temperature: write which quantity is which column, for example \"temperature=Water temp [C]\"", "temperature")]
    [InlineData("T,P\n1,2\n", "--column temperature=Temp: there is no column Temp; there are T, P", "temperature=Temp")]
    [InlineData("Tem,P\n1,2\n", "--column temperature=Temp: there is no column Temp (did you mean Tem?); there are Tem, P", "temperature=Temp")]
    [InlineData("T,P\n1,2\n", "--column pressure=P: the unit is missing; write for example \"pressure=P [hPa]\" (units: hPa, mbar, kPa, Pa, bar, atm, mmHg, Torr, inHg, psi)", "pressure=P")]
    [InlineData("T,P\n1,2\n", "--column pressure=P [mHg]: mHg is no unit of pressure (did you mean mmHg?); there are hPa, mbar, kPa, Pa, bar, atm, mmHg, Torr, inHg, psi", "pressure=P [mHg]")]
    [InlineData("T,P\n1,2\n", "--column salinity=P [g/kg]: a salinity has no unit; write \"salinity=P\"", "salinity=P [g/kg]")]
    [InlineData("T,T\n1,2\n", "--column temperature=T: 2 columns are called T; say which by its number, for example \"temperature=#1\"", "temperature=T")]
    [InlineData("T,P\n1,2\n", "--column temperature=#3: the header has 2 columns", "temperature=#3")]
    [InlineData("T,P\n1,2\n", "--column temperature=P: temperature is mapped twice; leave one out", "temperature=T", "temperature=P")]
    [InlineData("T;x,P\n1,2\n", "standard input: the header T;x,P could be separated by comma or semicolon; say which with --separator", "temperature=#1")]
    [InlineData("\n# only\n", "standard input: there is no header; the first line that is neither blank nor a comment (#) names the columns", "temperature=T")]
    [InlineData("T\0,P\n", "standard input: this is UTF-16 or no text at all; save it as CSV in UTF-8", "temperature=T")]
    [InlineData("\"T,P\n", "standard input, line 1: a quotation mark in the header is never closed", "temperature=T")]
    public void Request_IsRefusedInOneLine(string input, string message, params string[] columns)
    {
        Assert.Equal(message, Assert.Throws<InputException>(() => Worked.Of(input, columns)).Message);
    }

    [Fact]
    public void Separator_IsRefusedWithThoseThatThereAre()
    {
        Assert.Equal("--separator semicolons: no such separator (did you mean semicolon?); there are comma, semicolon, tab",
            Assert.Throws<InputException>(() => Worked.Of("T,P\n", Usual, separator: "semicolons")).Message);
        Assert.Equal("T;P,x", Worked.Of("T;P,x\n1;2,3\n", ["temperature=T"], separator: "semicolon").Output.Split('\n')[0][..5]);
    }

    [Theory]
    [InlineData("temperature=#2")]
    [InlineData("temperature=Temp [C]")]
    [InlineData("temperature=Temp [C] [C]")]
    public void Column_IsFoundByNumber_OrByItsNameWithBrackets(string column)
    {
        Assert.Equal("x,12.5,,2.5,ok", Worked.Of("id,Temp [C]\nx,12.5\n", [column]).Output.Split('\n')[1]);
    }

    [Fact]
    public void LineWithoutEnd_IsRefused_BeforeItFillsTheMemory()
    {
        byte[] line = new byte[3 << 20];
        Array.Fill(line, (byte)'x');
        Assert.Contains("longer than 1048576 bytes", Assert.Throws<InputException>(() => Worked.Of(line, Usual)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Output_OfOtherFiles_IsNeverTouched()
    {
        using TemporaryFolder folder = new();
        string input = folder.File("in.csv"), output = folder.File("out.csv"), link = folder.File("link.csv");
        File.WriteAllText(input, "T\n12.5\n");
        File.WriteAllText(output, "precious");
        File.CreateSymbolicLink(link, input);

        Assert.StartsWith("--output " + output + ": this file exists already", Refused(input, output, force: false), StringComparison.Ordinal);
        Assert.StartsWith("--output " + input + ": this is the input", Refused(input, input, force: true), StringComparison.Ordinal);
        Assert.StartsWith("--output " + link + ": this is the input", Refused(input, link, force: true), StringComparison.Ordinal);
        Assert.StartsWith("--output " + folder.Path + ": this is no file", Refused(input, folder.Path, force: true), StringComparison.Ordinal);
        Assert.StartsWith("--output /dev/null: this is no file", Refused(input, "/dev/null", force: true), StringComparison.Ordinal);
        Assert.Equal(("precious", "T\n12.5\n"), (File.ReadAllText(output), File.ReadAllText(input)));
        Assert.Equal(3, Directory.GetFiles(folder.Path).Length);
    }

    /// <summary>Whatever ends the work before its end, the old output stays whole and nothing is left beside it.</summary>
    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void WorkThatEndsEarly_LeavesTheOldOutputWhole(bool byStop)
    {
        using TemporaryFolder folder = new();
        string input = folder.File("in.csv"), output = folder.File("out.csv");
        StringBuilder rows = new("T\n");
        for (int i = 0; i < 100_000; i++)
        {
            rows.Append("12.5\n");
        }

        File.WriteAllText(input, rows.ToString());
        File.WriteAllText(output, "the old one");
        using CancellationTokenSource stop = new();
        PlainFormula formula = new()
        {
            AtRow = row =>
            {
                if (row == 90_000)
                {
                    // By then much has gone to the disk.
                    Assert.Equal(3, Directory.GetFiles(folder.Path).Length);
                    if (!byStop)
                    {
                        throw new IOException("disk gone");
                    }

                    stop.Cancel();
                }
            },
        };
        Exception? ended = Record.Exception(() => Run(input, output, true, formula, stop.Token));
        Assert.Equal(byStop ? typeof(OperationCanceledException) : typeof(IOException), ended?.GetType());
        Assert.Equal(90_000, formula.Rows);
        Assert.Equal("the old one", File.ReadAllText(output));
        Assert.Equal(2, Directory.GetFiles(folder.Path).Length);

        Run(input, output, true, new PlainFormula(), CancellationToken.None);
        Assert.Equal(100_001, File.ReadAllLines(output).Length);
        Assert.Equal(2, Directory.GetFiles(folder.Path).Length);
    }

    [Fact]
    public void Progress_IsToldWhenItTakesLong()
    {
        FakeTimeProvider time = new();
        PlainFormula formula = new() { AtRow = row => time.Advance(TimeSpan.FromMilliseconds(row <= 512 ? 5 : 0)) };
        StringBuilder rows = new("T\n");
        for (int i = 0; i < 2000; i++)
        {
            rows.Append("12.5\n");
        }

        System.Collections.Generic.List<string> said = [];
        byte[] input = Encoding.UTF8.GetBytes(rows.ToString());
        WholeFile.Run(
            new WholeFileRequest { Input = "-", Output = "-", Columns = ["temperature=T"] }, formula,
            new WholeFileSurroundings(() => new MemoryStream(input), () => new MemoryStream(), said.Add, time), CancellationToken.None);
        // 5 ms a row: two seconds are over at row 400, which is seen at the next multiple of 256; then the clock stands.
        Assert.Equal("  512 rows so far", said[2]);
        Assert.Equal("2000 rows: 2000 computed, 0 refused", said[3]);
    }

    [Fact]
    public void MissingInput_IsOneLine()
    {
        using TemporaryFolder folder = new();
        Assert.Equal("--input nowhere.csv: there is no such file", Refused("nowhere.csv", folder.File("out.csv"), false));
        Assert.Equal($"--input {folder.Path}: this is a folder; name a file with columns", Refused(folder.Path, folder.File("out.csv"), false));
        Assert.Empty(Directory.GetFiles(folder.Path));
    }

    private static string Refused(string input, string output, bool force)
    {
        return Assert.Throws<InputException>(() => Run(input, output, force, new PlainFormula(), CancellationToken.None)).Message;
    }

    private static void Run(string input, string output, bool force, PlainFormula formula, CancellationToken stop)
    {
        WholeFileRequest request = new() { Input = input, Output = output, Columns = ["temperature=T"], Force = force };
        WholeFile.Run(request, formula, new WholeFileSurroundings(() => Stream.Null, () => Stream.Null, static _ => { }, TimeProvider.System), stop);
    }

    private static string Unquoted(string line)
    {
        return line.Replace("\"", "", StringComparison.Ordinal);
    }
}
