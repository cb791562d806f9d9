namespace ProbeCal;

/// <summary>One gas by one equation: what the equation gives, how good it is said to be, and what speaks for it.</summary>
public sealed class SolubilityEntry
{
    internal SolubilityEntry(Gas gas, EquationEntry equation, string quantity, string unit, string statedAccuracy, Evidence evidence, string why)
    {
        Gas = gas;
        Source = equation;
        Quantity = quantity;
        Unit = unit;
        StatedAccuracy = statedAccuracy;
        Evidence = evidence;
        Why = why;
    }

    /// <summary>The gas.</summary>
    public Gas Gas { get; }

    /// <summary>The equation.</summary>
    public SolubilityEquation Equation => Source.Equation;

    /// <summary>The equation's name, citation and DOI.</summary>
    public EquationEntry Source { get; }

    /// <summary>What the published formula gives.</summary>
    public string Quantity { get; }

    /// <summary>The unit of the published formula.</summary>
    public string Unit { get; }

    /// <summary>Accuracy as its authors or users state it, and how that statement is known.</summary>
    public string StatedAccuracy { get; }

    /// <summary>Where the coefficients were seen and what they reproduce.</summary>
    public Evidence Evidence { get; }

    /// <summary>Is it the one taken where none is named?</summary>
    public bool IsDefault => GasDefaults.Equation(Gas) == Equation;

    /// <summary>Why it is the default, or what the alternative is for.</summary>
    public string Why { get; }
}
