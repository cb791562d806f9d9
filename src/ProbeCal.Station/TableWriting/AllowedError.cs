using System;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.TableWriting;

/// <summary>The interpolation error that a table must keep to: in the unit of its values, or a share of them.</summary>
/// <param name="Text">As it was given.</param>
/// <param name="Value">In the unit of the values, or %.</param>
/// <param name="IsPercent">True for a share of the value.</param>
internal sealed record AllowedError(string Text, double Value, bool IsPercent)
{
    internal static AllowedError Parse(string text, TableSubject subject)
    {
        if (text.TrimEnd().EndsWith('%'))
        {
            return Checked(text, Quantity.Parse(QuantityKind.Percent, "--error", text), true);
        }

        double value = subject.Unit switch
        {
            "mg/L" => Quantity.Parse(QuantityKind.MassConcentration, "--error", text),
            "hPa" => Quantity.PressureHectopascal("--error", text),
            _ => Number.Parse("--error", text),
        };
        return Checked(text, value, false);
    }

    /// <summary>The error of one proof that counts against this.</summary>
    internal double Of(ErrorProof proof)
    {
        return IsPercent ? proof.LargestPercent : proof.Largest;
    }

    internal bool IsMetBy(ErrorProof proof)
    {
        return Of(proof) <= Value;
    }

    /// <summary>An error in the form of this one: <c>0.0031 mg/L</c> or <c>0.021%</c>.</summary>
    internal string Print(double error, string unit)
    {
        string number = Rounding.Up(error, 3);
        return IsPercent ? number + "%" : unit.Length == 0 ? number : number + " " + unit;
    }

    private static AllowedError Checked(string text, double value, bool percent)
    {
        return 0 < value ? new AllowedError(text.Trim(), value, percent) : throw Wrong.Input("--error", text, "an error that is allowed is above zero");
    }
}

/// <summary>An error that is printed is never smaller than the one that was found.</summary>
internal static class Rounding
{
    internal static string Up(double value, int digits)
    {
        if (value == 0 || !double.IsFinite(value))
        {
            return value.ToString("R", CultureInfo.InvariantCulture);
        }

        string text = Number.Significant(value, digits);
        if (value <= double.Parse(text, CultureInfo.InvariantCulture))
        {
            return text;
        }

        double unit = Math.Pow(10, Math.Floor(Math.Log10(value)) - digits + 1);
        return Number.Significant(value + unit / 2, digits);
    }
}
