using System;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>A value and its standard uncertainty for people: in a unit that needs no row of zeros, with as many digits as the uncertainty leaves a meaning to.</summary>
internal sealed class UncertainNumber
{
    /// <summary>Digits of a value that is taken as exact.</summary>
    private const int ExactDigits = 5;

    /// <summary>What is left below this in the smallest unit is written with an exponent.</summary>
    private const double Negligible = 1e-6;

    /// <summary>Most digits of any value: nobody reads more, and the JSON has them all.</summary>
    private const int MostDigits = 6;

    /// <summary>Below this the next smaller unit is taken.</summary>
    private const double Smallest = 0.1;

    private static readonly (string Unit, (string Unit, double Factor)[] Smaller)[] Ladders =
    [
        ("mg/L", [("µg/L", 1e3), ("ng/L", 1e6), ("pg/L", 1e9)]),
        ("µmol/L", [("nmol/L", 1e3), ("pmol/L", 1e6), ("fmol/L", 1e9)]),
        ("µmol/kg", [("nmol/kg", 1e3), ("pmol/kg", 1e6), ("fmol/kg", 1e9)]),
        ("mL/L", [("µL/L", 1e3), ("nL/L", 1e6), ("pL/L", 1e9)]),
        ("hPa", [("Pa", 1e2), ("mPa", 1e5), ("µPa", 1e8), ("nPa", 1e11)]),
    ];

    /// <param name="value">The value.</param>
    /// <param name="standardUncertainty">Its standard uncertainty, the same unit.</param>
    /// <param name="unit">The unit.</param>
    internal UncertainNumber(double value, double standardUncertainty, string unit)
    {
        (Unit, Factor) = Fitting(Math.Abs(value), unit);
        double scaled = value * Factor;
        double sure = standardUncertainty * Factor;
        Decimals = sure == 0 ? DecimalsFor(scaled, static _ => ExactDigits) : DecimalsFor(sure, static leading => leading < '3' ? 2 : 1);
        Decimals = Math.Min(Decimals, scaled == 0 ? Decimals : DecimalsFor(scaled, static _ => MostDigits));
        Value = 0 < Math.Abs(scaled) && Math.Abs(scaled) < Negligible ? Number.Significant(scaled, ExactDigits) : Number.Fixed(scaled, Decimals);
        // Where the value is cut before its uncertainty begins, that is rounded up to the last digit.
        Uncertainty = sure == 0 ? null : Number.Fixed(Math.Max(sure, Math.Pow(10, -Decimals)), Decimals);
    }

    /// <summary>The unit it is printed in.</summary>
    internal string Unit { get; }

    /// <summary>What the unit given is multiplied by to come to <see cref="Unit"/>.</summary>
    internal double Factor { get; }

    /// <summary>Decimals of both.</summary>
    internal int Decimals { get; }

    /// <summary>The value.</summary>
    internal string Value { get; }

    /// <summary>Its standard uncertainty; null for a value taken as exact.</summary>
    internal string? Uncertainty { get; }

    /// <summary>Another value of the same kind, with the same unit and one digit more: the end of an interval.</summary>
    internal string Beside(double value)
    {
        return Number.Fixed(value * Factor, Decimals);
    }

    private static (string Unit, double Factor) Fitting(double size, string unit)
    {
        if (size == 0 || Smallest <= size)
        {
            return (unit, 1);
        }

        foreach ((string known, (string Unit, double Factor)[] smaller) in Ladders)
        {
            if (known == unit)
            {
                foreach ((string name, double factor) in smaller)
                {
                    if (Smallest <= size * factor)
                    {
                        return (name, factor);
                    }
                }

                return smaller[^1];
            }
        }

        return (unit, 1);
    }

    /// <summary>Decimals that show so many significant digits as the leading digit calls for; none for whole numbers.</summary>
    private static int DecimalsFor(double value, Func<char, int> digits)
    {
        if (value == 0)
        {
            return 1;
        }

        // Rounded first: 0.996 begins with a one.
        string rounded = Math.Abs(value).ToString("E1", CultureInfo.InvariantCulture);
        int exponent = int.Parse(rounded.AsSpan(rounded.IndexOf('E', StringComparison.Ordinal) + 1), CultureInfo.InvariantCulture);
        return Math.Clamp(digits(rounded[0]) - 1 - exponent, 0, 12);
    }
}
