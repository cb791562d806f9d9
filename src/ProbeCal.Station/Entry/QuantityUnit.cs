using System;

namespace ProbeCal.Station.Entry;

/// <summary>
/// One unit of a kind of quantity. Canonical value = (value + <see cref="Offset"/>) × <see cref="Multiplier"/> ÷
/// <see cref="Divisor"/>; multiplier and divisor stay apart so that exact pairs give exact results (760 mmHg × 1013.25 ÷ 760).
/// </summary>
public sealed class QuantityUnit
{
    internal QuantityUnit(string name, double multiplier, double divisor, double offset, params string[] otherNames)
    {
        Name = name;
        Multiplier = multiplier;
        Divisor = divisor;
        Offset = offset;
        OtherNames = otherNames;
    }

    /// <summary>The name it is printed with.</summary>
    public string Name { get; }

    internal double Multiplier { get; }

    internal double Divisor { get; }

    internal double Offset { get; }

    internal string[] OtherNames { get; }

    /// <summary>From this unit to the canonical unit of its kind.</summary>
    public double ToCanonical(double value)
    {
        return (value + Offset) * Multiplier / Divisor;
    }

    /// <summary>From the canonical unit of its kind to this unit.</summary>
    public double FromCanonical(double canonical)
    {
        return (canonical * Divisor / Multiplier) - Offset;
    }

    internal bool IsCalled(ReadOnlySpan<char> text)
    {
        if (text.SequenceEqual(Name))
        {
            return true;
        }

        foreach (string other in OtherNames)
        {
            if (text.SequenceEqual(other))
            {
                return true;
            }
        }

        return false;
    }
}
