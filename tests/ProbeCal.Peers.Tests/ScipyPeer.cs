using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Text;
using Xunit;

namespace ProbeCal.Peers.Tests;

/// <summary>
/// numpy and scipy (Debian package python3-scipy) as independent witnesses of fits. Each case is a line of numbers in; each answer a line of numbers out, in round-trip digits.
/// </summary>
internal static class ScipyPeer
{
    private static readonly Lazy<string?> Found = new(static () => PythonPeer.With("scipy.odr"));

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
        double[][] answers = [.. PythonPeer.Run(Found.Value!, program, input.ToString()).Split('\n', StringSplitOptions.RemoveEmptyEntries)
            .Select(static line => line.Split(' ').Select(static word => double.Parse(word, NumberStyles.Float, CultureInfo.InvariantCulture)).ToArray())];
        Assert.Equal(cases.Count, answers.Length);
        return answers;
    }
}
