using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Runtime.InteropServices;
using System.Text.Json;
using System.Text.RegularExpressions;
using System.Threading.Tasks;
using ProbeCal.Peers.Tests.Parts;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Peers.Tests;

/// <summary>The C headers that <c>probecal tables</c> writes, compiled and run: against the equation and against Core's own reader.</summary>
public class TableReaderInCTests(ITestOutputHelper output)
{
    private static readonly TimeSpan Deadline = TimeSpan.FromMinutes(2);
    private static readonly string[] Strict = ["-std=c99", "-Wall", "-Wextra", "-Werror", "-pedantic", "-O2"];

    private static readonly string[] ByPressure = ["--temperature", "0..40C", "--pressure", "600..1100hPa", "--salinity", "0", "--error", "0.01mg/L", "--name", "by-pressure"];
    private static readonly string[] BySalinity = ["--temperature", "0..40C", "--pressure", "1atm", "--salinity", "0..40", "--error", "0.02%", "--name", "by-salinity"];
    private static readonly string[] ByTemperature = ["--quantity", "vapour-pressure", "--temperature", "0..50C", "--error", "0.01hPa", "--name", "by-temperature"];

    /// <summary>The C compilers that are here; one is enough.</summary>
    private static string[] Compilers()
    {
        string[] here = [.. new[] { "gcc", "clang" }.Where(static name => Programs.Find(name) is not null)];
        Skip.If(here.Length == 0, "neither gcc nor clang is installed");
        return here;
    }

    [SkippableTheory]
    [InlineData("c-double")]
    [InlineData("c-float")]
    public async Task Reader_gives_the_equation_within_the_error_it_states_and_the_bits_of_Core(string format)
    {
        string[] compilers = Compilers();
        using TemporaryFolder folder = new();
        string type = format == "c-float" ? "float" : "double";
        foreach ((string[] table, string c) in new[] { (ByPressure, "by_pressure"), (BySalinity, "by_salinity"), (ByTemperature, "by_temperature") })
        {
            string header = await WriteAsync(folder.Path, format, table, c + ".h");
            Table read = await Table.ReadAsync(folder.Path, table, header);
            File.WriteAllText(folder["main.c"], Driver(c, type, read.ColumnCount == 1 ? "(TYPE)in[0]" : "(TYPE)in[0], (TYPE)in[1]"));
            List<(double At, double Across)> points = read.Points(type == "float");
            File.WriteAllBytes(folder["points"], MemoryMarshal.AsBytes(points.SelectMany(static p => new[] { p.At, p.Across }).ToArray().AsSpan()).ToArray());
            foreach (string compiler in compilers)
            {
                await RunAsync(compiler, [.. Strict, "-fsanitize=undefined", "-fno-sanitize-recover=all", "-I", folder.Path, "-o", folder["reader"], folder["main.c"]]);
                await RunAsync(folder["reader"], [folder["points"], folder["answers"]]);
                double[] answers = MemoryMarshal.Cast<byte, double>(File.ReadAllBytes(folder["answers"])).ToArray();
                Assert.Equal(2 * points.Count, answers.Length);
                Compare(read, points, answers, type == "float", compiler + " " + c + " " + type);
            }
        }
    }

    [SkippableFact]
    public async Task Headers_stand_beside_each_other_and_may_be_included_twice()
    {
        string[] compilers = Compilers();
        using TemporaryFolder folder = new();
        await WriteAsync(folder.Path, "c-float", ByPressure, "by_pressure.h");
        await WriteAsync(folder.Path, "c-double", BySalinity, "by_salinity.h");
        File.WriteAllText(folder["main.c"], """
            #include "by_salinity.h"
            #include "by_pressure.h"
            #include "by_pressure.h"
            #include "by_salinity.h"
            int main(void)
            {
                float fresh = -1.0f;
                double saline = -1.0;
                int below = by_pressure_lookup(-0.5f, 900.0f, &fresh);
                return !(below == PROBECAL_TABLE_TEMPERATURE_BELOW && fresh < 0.0f
                    && by_salinity_lookup(20.0, 35.0, &saline) == PROBECAL_TABLE_OK && 7.0 < saline && saline < 8.0);
            }
            """);
        foreach (string compiler in compilers)
        {
            await RunAsync(compiler, [.. Strict, "-I", folder.Path, "-o", folder["main"], folder["main.c"]]);
            await RunAsync(folder["main"], []);
        }
    }

    /// <summary>For a small controller: single precision stays single, and the object asks for no function of any library.</summary>
    [SkippableFact]
    public async Task Float_reader_compiles_for_a_microcontroller_and_calls_nothing()
    {
        const string Compiler = "arm-none-eabi-gcc";
        Skip.If(Programs.Find(Compiler) is null, Compiler + " is not installed");
        using TemporaryFolder folder = new();
        await WriteAsync(folder.Path, "c-float", ByPressure, "by_pressure.h");
        File.WriteAllText(folder["main.c"], """
            #include "by_pressure.h"
            int oxygen(float celsius, float hectopascal, float *mg_per_l);
            int oxygen(float celsius, float hectopascal, float *mg_per_l) { return by_pressure_lookup(celsius, hectopascal, mg_per_l); }
            """);
        string[] target = ["-mcpu=cortex-m4", "-mthumb", "-mfloat-abi=hard", "-mfpu=fpv4-sp-d16", "-ffreestanding", "-Wdouble-promotion", "-Os"];
        await RunAsync(Compiler, [.. Strict, .. target, "-c", "-I", folder.Path, "-o", folder["main.o"], folder["main.c"]]);
        Assert.Empty(await RunAsync("arm-none-eabi-nm", ["-u", folder["main.o"]]));
        string size = (await RunAsync("arm-none-eabi-size", [folder["main.o"]]))[1];
        output.WriteLine("Cortex-M4F, -Os: text data bss = " + size.Trim());
        string[] numbers = size.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries);
        // Everything is constant: it lies in flash, and no byte of RAM is taken.
        Assert.Equal(["0", "0"], numbers[1..3]);
        Assert.InRange(int.Parse(numbers[0], CultureInfo.InvariantCulture), 200, 700);
    }

    private void Compare(Table table, List<(double At, double Across)> points, double[] answers, bool single, string what)
    {
        double worst = 0;
        int inside = 0;
        int[] seen = new int[10];
        for (int i = 0; i < points.Count; i++)
        {
            (double at, double across) = single ? ((float)points[i].At, (float)points[i].Across) : points[i];
            int status = (int)answers[2 * i];
            double value = answers[(2 * i) + 1];
            seen[status]++;
            Status expected = table.Look(at, across, out double own);
            if (status != 0)
            {
                Assert.NotEqual(Status.Ok, expected);
                Assert.Equal(CodeOf(table.Alone(at, true), table.Alone(across, false)), status);
                // What the caller had put there is still there.
                Assert.Equal(-1.0, value);
                continue;
            }

            inside++;
            Assert.Equal(Status.Ok, expected);
            double same = single ? table.LookSingle((float)at, (float)across) : own;
            Assert.True(BitConverter.DoubleToInt64Bits(same) == BitConverter.DoubleToInt64Bits(value),
                string.Create(CultureInfo.InvariantCulture, $"{what} at {at:R}, {across:R}: {value:R}, Core's reader {same:R}"));
            Assert.Equal(Status.Ok, table.Equation(at, across, out double truth));
            double error = Math.Abs(value - truth);
            worst = Math.Max(worst, table.IsPercent ? 100 * error / truth : error);
        }

        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{what}: {inside} points, worst {worst:E3}, stated {table.Stated:E3}"));
        Assert.InRange(worst, 0.9 * table.Stated, table.Stated);
        Assert.All(table.ColumnCount == 1 ? new[] { 0, 1, 2, 3 } : table.IsSalinity ? [0, 1, 2, 3, 7, 8, 9] : [0, 1, 2, 3, 4, 5, 6], code => Assert.NotEqual(0, seen[code]));
    }

    /// <summary>What C answers to the two findings: what is no number first, then temperature before the other.</summary>
    private static int CodeOf(Status temperature, Status other)
    {
        bool otherFirst = temperature == Status.Ok
            || (StatusParts.Reason(other) == RefusalReason.NotFinite && StatusParts.Reason(temperature) != RefusalReason.NotFinite);
        Status status = otherFirst ? other : temperature;
        int of = StatusParts.Input(status) switch { InputQuantity.Temperature => 1, InputQuantity.Pressure => 4, _ => 7 };
        return of + StatusParts.Reason(status) switch
        {
            RefusalReason.NotFinite => 0,
            RefusalReason.BelowRange or RefusalReason.JustBelowRange => 1,
            _ => 2,
        };
    }

    /// <summary>Reads points (two doubles each), asks the reader under test and writes status and value of each.</summary>
    private static string Driver(string name, string type, string arguments)
    {
        return $$"""
            #include <stdio.h>
            #include "{{name}}.h"
            #define TYPE {{type}}
            int main(int argc, char **argv)
            {
                double in[2], answer[2];
                FILE *points, *answers;
                if (argc != 3) { return 2; }
                points = fopen(argv[1], "rb");
                answers = fopen(argv[2], "wb");
                if (!points || !answers) { return 3; }
                while (fread(in, sizeof in, 1, points) == 1) {
                    TYPE value = (TYPE)-1;
                    answer[0] = {{name}}_lookup({{arguments}}, &value);
                    answer[1] = (double)value;
                    if (fwrite(answer, sizeof answer, 1, answers) != 1) { return 4; }
                }
                return fclose(points) || fclose(answers);
            }
            """;
    }

    private static async Task<string> WriteAsync(string folder, string format, string[] table, string file)
    {
        using OutsideProcess program = Programs.ProbeCal(["tables", "--format", format, "--output", folder, "--force", .. table]);
        Assert.True(await program.ExitCodeAsync(Deadline) == 0, program.Tail());
        return File.ReadAllText(Path.Combine(folder, file));
    }

    private static async Task<IReadOnlyList<string>> RunAsync(string program, string[] arguments)
    {
        using OutsideProcess run = OutsideProcess.Start(Programs.Find(program) ?? program, arguments);
        Assert.True(await run.ExitCodeAsync(Deadline) == 0, run.Tail());
        return run.Output();
    }

    /// <summary>The same table from its JSON form, with Core's reader over it.</summary>
    private sealed record Table(double[] Values, double First, double Last, double FirstColumn, double LastColumn, int ColumnCount, bool IsSalinity, bool IsPercent, double Stated)
    {
        private int RowCount => Values.Length / ColumnCount;

        internal static async Task<Table> ReadAsync(string folder, string[] options, string header)
        {
            // The steps that were chosen for the header are given to the JSON form, whose numbers may have other bits.
            Match rows = Regex.Match(header, @"rows: .* in steps of ([0-9.]+)");
            Match columns = Regex.Match(header, @"columns: (\w+).* in steps of ([0-9.]+)");
            List<string> fixedSteps = ["--temperature-step", rows.Groups[1].Value + "K"];
            bool salinity = columns.Success && columns.Groups[1].Value == "practical";
            if (columns.Success) { fixedSteps.AddRange(salinity ? ["--salinity-step", columns.Groups[2].Value] : ["--pressure-step", columns.Groups[2].Value + "hPa"]); }
            string file = options[^1] + ".json";
            string text = await WriteAsync(folder, "json", [.. options[..^2], .. fixedSteps, .. options[^2..]], file);
            using JsonDocument json = JsonDocument.Parse(text);
            JsonElement root = json.RootElement;
            (double First, double Last) Axis(string name) => root.TryGetProperty(name, out JsonElement axis) ? (axis.GetProperty("first").GetDouble(), axis.GetProperty("last").GetDouble()) : (0, 1);
            double[] values = [.. root.GetProperty("values").EnumerateArray().SelectMany(static row => row.EnumerateArray()).Select(static v => v.GetDouble())];
            int count = root.GetProperty("values")[0].GetArrayLength();
            Match found = Regex.Match(header, @"largest error found: ([0-9.E-]+)(%?)");
            return new Table(values, Axis("rows").First, Axis("rows").Last, Axis("columns").First, Axis("columns").Last, count, salinity,
                found.Groups[2].Value == "%", double.Parse(found.Groups[1].Value, CultureInfo.InvariantCulture));
        }

        internal Status Look(double at, double across, out double value)
        {
            if (ColumnCount == 1) { return TableLookup.ByTemperature(Values, First, Last, Finite(at), out value); }
            return IsSalinity
                ? TableLookup.ByTemperatureAndSalinity(Values, ColumnCount, First, Last, FirstColumn, LastColumn, Finite(at), Finite(across), out value)
                : TableLookup.ByTemperatureAndPressure(Values, ColumnCount, First, Last, FirstColumn, LastColumn, Finite(at), Finite(across), out value);
        }

        /// <summary>The finding about one input, the other being in the middle.</summary>
        internal Status Alone(double value, bool isTemperature)
        {
            double middle = 0.5 * (First + Last);
            double middleAcross = 0.5 * (FirstColumn + LastColumn);
            return isTemperature ? Look(value, middleAcross, out _) : Look(middle, value, out _);
        }

        internal Status Equation(double at, double across, out double value)
        {
            if (ColumnCount == 1) { return VapourWagnerPruss1993.Pressure(at, RangeRule.Refuse, out value); }
            return IsSalinity
                ? BensonKrause1984.MilligramsPerLitre(at, across, 1013.25, RangeRule.Refuse, out value)
                : BensonKrause1984.MilligramsPerLitre(at, 0, across, RangeRule.Refuse, out value);
        }

        /// <summary>The same interpolation in 32-bit numbers.</summary>
        internal double LookSingle(float at, float across)
        {
            (int row, float down) = Cell(at, (float)First, (float)((RowCount - 1) / (Last - First)), RowCount);
            if (ColumnCount == 1) { return Between((float)Values[row], (float)Values[row + 1], down); }
            (int column, float part) = Cell(across, (float)FirstColumn, (float)((ColumnCount - 1) / (LastColumn - FirstColumn)), ColumnCount);
            int upper = (row * ColumnCount) + column;
            float above = Between((float)Values[upper], (float)Values[upper + 1], part);
            float below = Between((float)Values[upper + ColumnCount], (float)Values[upper + ColumnCount + 1], part);
            return Between(above, below, down);
        }

        /// <summary>Nodes, both neighbours of each, points between, points outside, and what is no number.</summary>
        internal List<(double At, double Across)> Points(bool single)
        {
            double[] temperatures = Along(First, Last, RowCount, single);
            double[] others = ColumnCount == 1 ? [0] : Along(FirstColumn, LastColumn, ColumnCount, single);
            return [.. temperatures.SelectMany(_ => others, static (t, o) => (t, o))];
        }

        private static double[] Along(double first, double last, int count, bool single)
        {
            int cells = count - 1;
            int parts = Math.Max(10, 120 / cells);
            List<double> points = [double.NaN, double.NegativeInfinity, double.PositiveInfinity, first - 1, last + 1, first - 0.1, last + 0.1];
            for (int i = 0; i <= cells * parts; i++)
            {
                double point = first + ((last - first) * i / (cells * parts));
                points.Add(point);
                if (i % parts == 0)
                {
                    points.AddRange(single
                        ? [MathF.BitDecrement((float)point), MathF.BitIncrement((float)point)]
                        : [Math.BitDecrement(point), Math.BitIncrement(point)]);
                }
            }

            return [.. points];
        }

        private static (int Node, float Part) Cell(float at, float first, float perUnit, int count)
        {
            float position = (float)((float)(at - first) * perUnit);
            int node = position < count - 2 ? (int)position : count - 2;
            return (node, (float)(position - (float)node));
        }

        private static float Between(float low, float high, float part)
        {
            return (float)(low + (float)((float)(high - low) * part));
        }

        /// <summary>An infinity is beyond the table for C and no number for Core.</summary>
        private static double Finite(double value)
        {
            return double.IsInfinity(value) ? Math.CopySign(1e9, value) : value;
        }
    }
}
