namespace ProbeCal;

/// <summary>Where the number of a step comes from.</summary>
public enum StepKind
{
    /// <summary>Given by the caller.</summary>
    Input = 0,
    /// <summary>A number that the equation, or the table of molar masses, brings along.</summary>
    Coefficient = 1,
    /// <summary>Computed from earlier steps by <see cref="ExplainedStep.Formula"/>.</summary>
    Computed = 2,
    /// <summary>Found by iteration, so that <see cref="ExplainedStep.Formula"/> holds with the later steps too.</summary>
    Iterated = 3,
}

/// <summary>One number on the way to a result, as a person would write it down.</summary>
public sealed class ExplainedStep
{
    internal ExplainedStep(
        StepQuantity quantity, StepKind kind, string symbol, string name, string unit, double value, string formula, string withNumbers, string source)
    {
        Quantity = quantity;
        Kind = kind;
        Symbol = symbol;
        Name = name;
        Unit = unit;
        Value = value;
        Formula = formula;
        WithNumbers = withNumbers;
        Source = source;
    }

    /// <summary>Which quantity it is.</summary>
    public StepQuantity Quantity { get; }

    /// <summary>Given, brought along, or computed.</summary>
    public StepKind Kind { get; }

    /// <summary>The letter it has in the formulas.</summary>
    public string Symbol { get; }

    /// <summary>What it is, in words.</summary>
    public string Name { get; }

    /// <summary>Its unit; empty for a ratio, a logarithm or a coefficient.</summary>
    public string Unit { get; }

    /// <summary>The number that the computation used, in <see cref="Unit"/>.</summary>
    public double Value { get; }

    /// <summary>How it follows from earlier symbols: + - * / ^, ln, exp and brackets. Empty for inputs and coefficients.</summary>
    public string Formula { get; }

    /// <summary>The formula with the numbers put in, each in the digits that read back as the very same double.</summary>
    public string WithNumbers { get; }

    /// <summary>Name of the published source in <see cref="Explanation.Sources"/>; empty for arithmetic.</summary>
    public string Source { get; }
}
