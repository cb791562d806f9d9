using System;
using System.Diagnostics;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using Xunit;

namespace ProbeCal.Peers.Tests;

/// <summary>
/// The Gibbs-SeaWater toolbox (Debian package python3-gsw) as an independent witness. It is asked through a Python that has it: columns of
/// numbers in, one column out, in round-trip digits.
/// </summary>
internal static class GswPeer
{
    // The distribution's Python first: a second interpreter earlier in the path does not see distribution packages.
    private static readonly string[] Pythons = ["/usr/bin/python3", "python3"];
    private static readonly Lazy<string?> Found = new(Find);

    /// <summary>Skips the test, saying why, when no Python here has gsw.</summary>
    internal static void Require()
    {
        Skip.If(Found.Value is null, "gsw is absent: install the Debian package python3-gsw");
    }

    /// <summary>Version of the toolbox.</summary>
    internal static string Version()
    {
        return Run(Found.Value!, "import gsw; print(gsw.__version__)", "").Trim();
    }

    /// <summary>Evaluates an expression over columns of numbers, called a, b, c (numpy arrays), with gsw imported.</summary>
    internal static double[] Evaluate(string expression, params double[][] columns)
    {
        StringBuilder input = new();
        for (int i = 0; i < columns[0].Length; i++)
        {
            input.AppendJoin(' ', columns.Select(column => column[i].ToString("R", CultureInfo.InvariantCulture))).Append('\n');
        }

        string program = "import sys, numpy, gsw\n"
            + string.Join(", ", "abc"[..columns.Length].AsEnumerable()) + " = numpy.loadtxt(sys.stdin, ndmin=2).T\n"
            + "for v in " + expression + ": print(repr(float(v)))\n";
        double[] values = Run(Found.Value!, program, input.ToString())
            .Split('\n', StringSplitOptions.RemoveEmptyEntries)
            .Select(v => double.Parse(v, NumberStyles.Float, CultureInfo.InvariantCulture)).ToArray();
        Assert.Equal(columns[0].Length, values.Length);
        return values;
    }

    private static string? Find()
    {
        return Array.Find(Pythons, HasGsw);
    }

    private static bool HasGsw(string python)
    {
        try
        {
            using Process process = Start(python, "import gsw");
            process.StandardInput.Close();
            process.StandardOutput.ReadToEnd();
            process.WaitForExit();
            return process.ExitCode == 0;
        }
        catch (System.ComponentModel.Win32Exception)
        {
            // No such interpreter: the same as one without the toolbox.
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
        ProcessStartInfo start = new(python)
        {
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            UseShellExecute = false,
        };
        start.ArgumentList.Add("-c");
        start.ArgumentList.Add(program);
        return Process.Start(start) ?? throw new InvalidOperationException("cannot start " + python);
    }
}
