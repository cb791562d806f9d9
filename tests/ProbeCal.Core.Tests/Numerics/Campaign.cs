using System;
using System.Globalization;
using System.IO;
using System.Text;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests;

/// <summary>
/// How much a measurement of errors does, and where it reports. PROBECAL_FULL=1 asks for the full count, PROBECAL_SEED for another
/// seed, PROBECAL_LOG_DIR for a directory that gets one text file a measurement.
/// </summary>
internal sealed class Campaign
{
    private const int DefaultSeed = 20240607;
    private readonly ITestOutputHelper _output;
    private readonly string _name;
    private readonly StringBuilder _log = new();

    internal Campaign(ITestOutputHelper output, string name, int ordinary, int full)
    {
        _output = output;
        _name = name;
        bool isFull = Environment.GetEnvironmentVariable("PROBECAL_FULL") == "1";
        Count = isFull ? full : ordinary;
        string? seed = Environment.GetEnvironmentVariable("PROBECAL_SEED");
        Seed = string.IsNullOrEmpty(seed) ? DefaultSeed : int.Parse(seed, CultureInfo.InvariantCulture);
        Random = new Random(Seed);
        Say($"{name}: {Count} random inputs a class ({100.0 * Count / full:0.#} % of the full figure), seed {Seed}");
    }

    internal int Count { get; }

    internal int Seed { get; }

    internal Random Random { get; }

    internal void Say(FormattableString line)
    {
        string text = FormattableString.Invariant(line);
        _output.WriteLine(text);
        _log.AppendLine(text);
    }

    /// <summary>Writes what was said to the log directory, when one is given.</summary>
    internal void Close()
    {
        string? directory = Environment.GetEnvironmentVariable("PROBECAL_LOG_DIR");
        if (!string.IsNullOrEmpty(directory))
        {
            Directory.CreateDirectory(directory);
            File.WriteAllText(Path.Combine(directory, _name + ".txt"), _log.ToString());
        }
    }
}

/// <summary>The largest error of one function over one class of inputs.</summary>
internal sealed class WorstCase
{
    private double _x;
    private double _y = double.NaN;

    internal long Count { get; private set; }

    internal double Error { get; private set; }

    internal void Add(double error, double x)
    {
        Add(error, x, double.NaN);
    }

    internal void Add(double error, double x, double y)
    {
        Count++;
        if (Math.Abs(error) > Error)
        {
            Error = Math.Abs(error);
            _x = x;
            _y = y;
        }
    }

    internal string Text()
    {
        string second = double.IsNaN(_y) ? string.Empty : ", " + Text(_y);
        return string.Create(CultureInfo.InvariantCulture, $"max {Error:0.0000} ulp in {Count} at {Text(_x)}{second}");
    }

    private static string Text(double x)
    {
        return string.Create(CultureInfo.InvariantCulture, $"{x:R} (0x{BitConverter.DoubleToInt64Bits(x):X16})");
    }
}
