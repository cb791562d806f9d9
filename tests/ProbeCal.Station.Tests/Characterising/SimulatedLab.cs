using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;

namespace ProbeCal.Station.Tests.Characterising;

/// <summary>A laboratory run of a probe whose truth is known: signal = zero + S·f(T)·flow·p, read with noise, written as tables.</summary>
internal sealed class SimulatedLab(string folder, Random random)
{
    internal const double Zero = 0.42;
    internal const double Sensitivity = 0.31;
    internal const double Coefficient = 0.029;
    internal const double TauUp = 14.0;
    internal const double TauDown = 19.5;
    internal const double StirringRatio = 1.22;

    internal const double RelativeNoise = 0.004;
    internal const double Noise = 0.05;

    /// <summary>The factor by the exponential form, 1 at 25 °C.</summary>
    internal static double Exponential(double celsius)
    {
        return Math.Exp(Coefficient * (celsius - 25.0));
    }

    internal string ZeroRun(int count = 12)
    {
        return Write("zero.csv", "I [nA]", Enumerable.Range(0, count).Select(_ => new[] { Zero + (Noise * Normal()) }));
    }

    /// <summary>Air-saturated water at each temperature, three readings each.</summary>
    internal string TemperatureRun(Func<double, double> factor, params double[] temperatures)
    {
        List<double[]> rows = [];
        foreach (double celsius in temperatures.SelectMany(static t => new[] { t, t + 0.1, t - 0.1 }))
        {
            OxygenEquilibrium.PartialPressure(celsius, 1003.0, RangeRule.Refuse, out double p);
            rows.Add([Zero + (Sensitivity * factor(celsius) * p * (1.0 + (RelativeNoise * Normal()))), celsius, 1003.0]);
        }

        return Write("temperature.csv", "I [nA],T [C],Baro [hPa]", rows);
    }

    internal string LinearityRun(double bend, params double[] levels)
    {
        return Write("linearity.csv", "I [nA],pO2 [hPa]", levels.SelectMany(static p => new[] { p, p }).Select(p => new[] { Zero + (Sensitivity * p) + (bend * p * p) + (Noise * Normal()), p }));
    }

    internal string StepRun(bool up, double seconds = 120.0, double interval = 1.0)
    {
        double from = up ? 5.0 : 65.0;
        double to = up ? 65.0 : 5.0;
        double tau = up ? TauUp : TauDown;
        int count = (int)(seconds / interval);
        return Write(up ? "up.csv" : "down.csv", "I [nA],t [s]", Enumerable.Range(0, count).Select(i => new[] { to + ((from - to) * Math.Exp(-i * interval / tau)) + (Noise * Normal()), 100.0 + (i * interval) }));
    }

    internal string StirringRun(int count = 8)
    {
        StringBuilder text = new("I [nA],Stirrer\n");
        for (int i = 0; i < count; i++)
        {
            text.Append(Text(Zero + (50.0 * (1.0 + (RelativeNoise * Normal()))))).Append(",stirred\n");
            text.Append(Text(Zero + (50.0 / StirringRatio * (1.0 + (RelativeNoise * Normal()))))).Append(",Still\n");
        }

        return Write("stirring.csv", text.ToString());
    }

    internal string Write(string name, string text)
    {
        string path = Path.Combine(folder, name);
        File.WriteAllText(path, text);
        return path;
    }

    private string Write(string name, string header, IEnumerable<double[]> rows)
    {
        return Write(name, header + "\n" + string.Concat(rows.Select(static row => string.Join(',', row.Select(Text)) + "\n")));
    }

    private double Normal()
    {
        return Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
    }

    private static string Text(double value)
    {
        return value.ToString("R", CultureInfo.InvariantCulture);
    }
}
