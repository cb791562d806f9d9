using System;
using System.Collections.Generic;
using System.Globalization;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>Compares value after value, remembers the worst, and fails with every row that misses its tolerance.</summary>
internal sealed class Deviations(string name, ITestOutputHelper output)
{
    private readonly List<string> _misses = [];
    private double _worstAbsolute;
    private double _worstRelative;
    private string _worstRow = "";
    private int _count;

    internal void Compare(double actual, double expected, double tolerance, object row)
    {
        _count++;
        double difference = Math.Abs(actual - expected);
        if (!(difference <= tolerance))
        {
            _misses.Add(string.Create(CultureInfo.InvariantCulture, $"{row}: {actual:R} for {expected:R}, off by {difference:E2}, allowed {tolerance:E2}"));
        }

        if (_worstAbsolute < difference || double.IsNaN(difference))
        {
            _worstAbsolute = difference;
            _worstRow = row.ToString() ?? "";
        }

        if (expected != 0.0)
        {
            _worstRelative = Math.Max(_worstRelative, difference / Math.Abs(expected));
        }
    }

    internal void Finish()
    {
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"{name}: {_count} values, worst {_worstAbsolute:E2} ({100.0 * _worstRelative:G3} % at most) at {_worstRow}"));
        Assert.NotEqual(0, _count);
        Assert.True(_misses.Count == 0, name + ": " + _misses.Count + " of " + _count + " miss\n" + string.Join('\n', _misses));
    }
}
