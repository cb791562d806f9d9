using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Threading.Tasks;
using ProbeCal.Peers.Tests.Parts;
using Xunit;

namespace ProbeCal.Peers.Tests.ByHand;

/// <summary>One line for the script by_hand.py: what an equilibrium value is asked for.</summary>
internal sealed record ByHandCase(
    string Gas, string Equation, double Celsius, double Salinity, double Hectopascal, double MoleFraction, double HumidityPercent,
    double UCelsius, double USalinity, double UHectopascal, double UEquation)
{
    internal string Line()
    {
        double[] numbers = [Celsius, Salinity, Hectopascal, MoleFraction, HumidityPercent, UCelsius, USalinity, UHectopascal, UEquation];
        return Gas + " " + Equation + " " + string.Join(' ', numbers.Select(static n => n.ToString("R", CultureInfo.InvariantCulture)));
    }
}

/// <summary>What the script answers.</summary>
internal sealed record ByHandAnswer(
    double VapourHectopascal, double PartialHectopascal, double MilligramsPerLitre, double MicromolesPerLitre, double MicromolesPerKilogram,
    double MillilitresPerLitre, double PartialUncertainty, double MilligramsUncertainty);

/// <summary>Runs by_hand.py, which holds none of the library's code.</summary>
internal static class ByHandScript
{
    /// <summary>Skips the test, saying why, without a Python.</summary>
    internal static void Require()
    {
        Skip.If(Programs.Find("python3") is null, "python3 is absent");
    }

    internal static List<ByHandAnswer> Ask(IReadOnlyCollection<ByHandCase> cases)
    {
        return [.. Run(Programs.Find("python3")!, "by_hand.py", cases.Select(static each => each.Line()), cases.Count).Select(Read)];
    }

    /// <summary>Gives a script of this folder lines and takes as many lines of numbers.</summary>
    internal static List<double[]> Run(string python, string script, IEnumerable<string> lines, int count)
    {
        ProcessStartInfo start = new(python, [Path.Combine(AppContext.BaseDirectory, "ByHand", script)])
        {
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            UseShellExecute = false,
        };
        using Process process = Process.Start(start)!;
        // Read while writing: a long answer would otherwise fill its pipe and stop both sides.
        Task<string> output = process.StandardOutput.ReadToEndAsync();
        Task<string> errors = process.StandardError.ReadToEndAsync();
        using (StreamWriter writer = process.StandardInput)
        {
            foreach (string line in lines) { writer.WriteLine(line); }
        }

        string answer = output.GetAwaiter().GetResult();
        process.WaitForExit();
        Assert.True(process.ExitCode == 0, errors.GetAwaiter().GetResult());
        List<double[]> answers = [.. answer.Split('\n', StringSplitOptions.RemoveEmptyEntries)
            .Select(static line => line.Split(' ').Select(static v => double.Parse(v, NumberStyles.Float, CultureInfo.InvariantCulture)).ToArray())];
        Assert.Equal(count, answers.Count);
        return answers;
    }

    private static ByHandAnswer Read(double[] n)
    {
        return new ByHandAnswer(n[0], n[1], n[2], n[3], n[4], n[5], n[6], n[7]);
    }
}
