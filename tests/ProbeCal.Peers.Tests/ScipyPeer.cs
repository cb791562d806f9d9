using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using Xunit;

namespace ProbeCal.Peers.Tests;

/// <summary>
/// numpy and scipy (Debian package python3-scipy) as independent witnesses of fits. Each case is a line of numbers in; each answer a line of numbers out, in round-trip digits.
/// </summary>
internal static class ScipyPeer
{
    // The distribution's Python first: a second interpreter earlier in the path does not see distribution packages.
    private static readonly string[] Pythons = ["/usr/bin/python3", "python3"];
    private static readonly Lazy<string?> Found = new(() => Array.Find(Pythons, Has));

    /// <summary>The Python that has scipy; of use after <see cref="Require"/>.</summary>
    internal static string Python => Found.Value!;

    /// <summary>Skips the test, saying why, when no Python here has scipy.</summary>
    internal static void Require()
    {
        Skip.If(Found.Value is null, "scipy is absent: install the Debian package python3-scipy");
    }

    /// <summary>Runs a program that reads lines of numbers (the list v) and sets the list r for each.</summary>
    internal static double[][] Evaluate(string body, IReadOnlyList<double[]> cases)
    {
        StringBuilder input = new();
        foreach (double[] each in cases)
        {
            input.AppendJoin(' ', each.Select(static value => value.ToString("R", CultureInfo.InvariantCulture))).Append('\n');
        }

        string program = "import sys, warnings, numpy as np\nfrom scipy import odr, stats\nwarnings.simplefilter('ignore')\nfor line in sys.stdin:\n    v = np.array([float(x) for x in line.split()])\n"
            + string.Concat(body.Split('\n').Select(static line => "    " + line + "\n")) + "    print(' '.join(repr(float(x)) for x in r))\n";
        double[][] answers = [.. Run(Found.Value!, program, input.ToString()).Split('\n', StringSplitOptions.RemoveEmptyEntries)
            .Select(static line => line.Split(' ').Select(static word => double.Parse(word, NumberStyles.Float, CultureInfo.InvariantCulture)).ToArray())];
        Assert.Equal(cases.Count, answers.Length);
        return answers;
    }

    private static bool Has(string python)
    {
        try
        {
            using Process process = Start(python, "import scipy.odr");
            process.StandardInput.Close();
            process.StandardOutput.ReadToEnd();
            process.WaitForExit();
            return process.ExitCode == 0;
        }
        catch (System.ComponentModel.Win32Exception)
        {
            // No such interpreter: the same as one without scipy.
            return false;
        }
    }

    private static string Run(string python, string program, string input)
    {
        using Process process = Start(python, program);
        // Read while writing: a long answer would otherwise fill its pipe and stop both sides.
        System.Threading.Tasks.Task<string> output = process.StandardOutput.ReadToEndAsync();
        System.Threading.Tasks.Task<string> errors = process.StandardError.ReadToEndAsync();
        using (StreamWriter writer = process.StandardInput) { writer.Write(input); }
        string answer = output.GetAwaiter().GetResult();
        process.WaitForExit();
        Assert.True(process.ExitCode == 0, errors.GetAwaiter().GetResult());
        return answer;
    }

    private static Process Start(string python, string program)
    {
        ProcessStartInfo start = new(python) { RedirectStandardInput = true, RedirectStandardOutput = true, RedirectStandardError = true, UseShellExecute = false };
        start.ArgumentList.Add("-c");
        start.ArgumentList.Add(program);
        return Process.Start(start) ?? throw new InvalidOperationException("cannot start " + python);
    }
}
