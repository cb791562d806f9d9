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

    /// <summary>Lowest temperature at a salinity, °C: the freezing point where the range begins with it.</summary>
    /// <param name="salinity">Practical salinity.</param>
    public double LowestCelsius(double salinity)
    {
        return GasSolubility.LowestCelsius(Gas, Equation, salinity);
    }

    /// <summary>Highest temperature, °C.</summary>
    public double HighestCelsius => GasSolubility.HighestCelsius(Equation);

    /// <summary>Highest practical salinity; 0 for an equation of fresh water.</summary>
    public double HighestSalinity => GasSolubility.HighestSalinity(Equation);

    /// <summary>Highest total pressure, hPa.</summary>
    public double HighestHectopascal => GasEquilibrium.HighestHectopascal(Gas);

    /// <summary>The ranges in words: temperature and salinity.</summary>
    public string Range
    {
        get
        {
            double fresh = LowestCelsius(0.0);
            double salt = LowestCelsius(HighestSalinity);
            string lowest = salt < fresh ? "freezing (≥ " + CatalogueText.Number(salt) + ")" : CatalogueText.Number(fresh);
            string salinity = HighestSalinity == 0.0 ? "fresh water" : "S 0 to " + CatalogueText.Number(HighestSalinity);
            return lowest + " to " + CatalogueText.Number(HighestCelsius) + " °C, " + salinity;
        }
    }

    /// <summary>Does the equation give the concentration under moist air at 1 atm? Else it gives the solubility of the pure gas.</summary>
    public bool IsOfMoistAir => GasSolubility.IsMoistAir(Gas, Equation);

    /// <summary>Accuracy as its authors or users state it, and how that statement is known.</summary>
    public string StatedAccuracy { get; }

    /// <summary>Where the coefficients were seen and what they reproduce.</summary>
    public Evidence Evidence { get; }

    /// <summary>Is it the one taken where none is named?</summary>
    public bool IsDefault => GasDefaults.Equation(Gas) == Equation;

    /// <summary>Why it is the default, or what the alternative is for.</summary>
    public string Why { get; }
}
