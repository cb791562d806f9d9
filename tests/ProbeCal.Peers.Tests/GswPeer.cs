using System;
using System.Globalization;
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
    private static readonly Lazy<string?> Found = new(static () => PythonPeer.With("gsw"));

    /// <summary>Skips the test, saying why, when no Python here has gsw.</summary>
    internal static void Require()
    {
        Skip.If(Found.Value is null, "gsw is absent: install the Debian package python3-gsw");
    }

    /// <summary>Version of the toolbox.</summary>
    internal static string Version()
    {
        return PythonPeer.Run(Found.Value!, "import gsw; print(gsw.__version__)", "").Trim();
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
        double[] values = PythonPeer.Run(Found.Value!, program, input.ToString())
            .Split('\n', StringSplitOptions.RemoveEmptyEntries)
            .Select(v => double.Parse(v, NumberStyles.Float, CultureInfo.InvariantCulture)).ToArray();
        Assert.Equal(columns[0].Length, values.Length);
        return values;
    }
}
