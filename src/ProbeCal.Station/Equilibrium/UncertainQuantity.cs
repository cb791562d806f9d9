using System;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>An input with how well it is known.</summary>
/// <param name="Value">The value, in the unit of its quantity.</param>
/// <param name="StandardUncertainty">Standard uncertainty (k = 1), the same unit; 0 for what is taken as exact.</param>
/// <param name="IsRectangular">
/// True when it was stated as limits (a specification: all values within ± a alike, u = a/√3; JCGM 100:2008, 4.3.7); false for a normal distribution.
/// </param>
public readonly record struct UncertainQuantity(double Value, double StandardUncertainty, bool IsRectangular = false)
{
    /// <summary>What is said where stated uncertainties lead to no number.</summary>
    internal const string TooLarge = "the stated uncertainties are too large to be worked with; look at their units";

    /// <summary>Half-width of the limits behind a rectangular distribution: √3 times the standard uncertainty.</summary>
    public double HalfWidth => StandardUncertainty * Math.Sqrt(3);

    /// <summary>True when nobody stated an uncertainty.</summary>
    public bool IsExact => StandardUncertainty == 0;

    /// <summary>Reads how well a value is known: a standard uncertainty or limits, not both; exact when neither is given.</summary>
    /// <param name="value">The value itself.</param>
    /// <param name="kind">What both texts are quantities of.</param>
    /// <param name="option">The option of the value, <c>--temperature</c>; the two others are named after it.</param>
    /// <param name="uncertainty">What stands behind <c>--temperature-uncertainty</c>, or null.</param>
    /// <param name="within">What stands behind <c>--temperature-within</c>, or null.</param>
    /// <exception cref="InputException">One cannot be read or is negative, or both are given.</exception>
    public static UncertainQuantity Read(double value, QuantityKind kind, string option, string? uncertainty, string? within)
    {
        if (uncertainty is not null && within is not null)
        {
            throw new InputException($"{option}-uncertainty (one standard deviation) and {option}-within (limits) say the same thing in two ways; give one of them");
        }

        return within is not null
            ? new UncertainQuantity(value, NotNegative(kind, option + "-within", within, "limits are zero or above, the same to both sides") / Math.Sqrt(3), true)
            : new UncertainQuantity(value, uncertainty is null ? 0 : NotNegative(kind, option + "-uncertainty", uncertainty, "a standard uncertainty is zero or above"));
    }

    /// <summary>Reads a quantity that is zero or above.</summary>
    /// <exception cref="InputException">It cannot be read or is negative.</exception>
    internal static double NotNegative(QuantityKind kind, string option, string text, string right)
    {
        double value = Quantity.Parse(kind, option, text);
        return 0 <= value ? value : throw Wrong.Input(option, text, right);
    }
}
