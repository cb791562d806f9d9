namespace ProbeCal;

/// <summary>A published source that steps of an explanation rest on.</summary>
public sealed class ExplanationSource
{
    private ExplanationSource(string name, string citation, string doi)
    {
        Name = name;
        Citation = citation;
        Doi = doi;
    }

    /// <summary>Authors and year.</summary>
    public string Name { get; }

    /// <summary>Full citation.</summary>
    public string Citation { get; }

    /// <summary>Digital object identifier; empty where there is none.</summary>
    public string Doi { get; }

    /// <summary>The source of a step; null for plain arithmetic.</summary>
    internal static ExplanationSource? Of(StepQuantity quantity, Gas gas, SolubilityEquation equation)
    {
        if (IsOfEquation(quantity))
        {
            EquationEntry entry = Catalogue.Equation(equation);
            return new ExplanationSource(entry.Name, entry.Citation, entry.Doi);
        }

        switch (quantity)
        {
            case StepQuantity.CelsiusIpts68:
                return FromWater("saunders-1990");
            case StepQuantity.VapourKelvin:
            case StepQuantity.VapourAtmospheres:
            case StepQuantity.VapourCoefficient0:
            case StepQuantity.VapourCoefficient1:
            case StepQuantity.VapourCoefficient2:
            case StepQuantity.VapourCoefficient3:
                return FromWater(gas == Gas.Oxygen ? "benson-krause-1980" : "weiss-price-1980");
            case StepQuantity.Theta:
            case StepQuantity.ThetaCoefficient0:
            case StepQuantity.ThetaCoefficient1:
            case StepQuantity.ThetaCoefficient2:
                return FromWater("benson-krause-1980");
            case StepQuantity.PartialMolarVolume:
            case StepQuantity.PoyntingFactor:
                return FromWater("enns-1965");
            case StepQuantity.CriticalKelvin:
            case StepQuantity.CriticalAtmospheres:
            case StepQuantity.AcentricFactor:
                return FromWater("smith-van-ness-1975");
            case StepQuantity.SecondVirial:
            case StepQuantity.CrossVirial:
            case StepQuantity.FugacityCoefficient:
            case StepQuantity.ReferenceFugacityCoefficient:
                return OfGasPhase(gas);
            case StepQuantity.CriticalPascal:
            case StepQuantity.CriticalDistance:
            case StepQuantity.PureWaterVapourPascal:
                return FromWater("wagner-pruss-1993");
            case StepQuantity.Density:
            case StepQuantity.PureWaterDensity:
            case StepQuantity.DensityTermA:
            case StepQuantity.DensityTermB:
                return FromWater("millero-poisson-1981");
            default:
                if (StepQuantity.VirialCoefficient0 <= quantity && quantity <= StepQuantity.CrossVirialCoefficient1) { return OfGasPhase(gas); }
                if (StepQuantity.PureVapourCoefficient1 <= quantity) { return FromWater("wagner-pruss-1993"); }
                return StepQuantity.DensityCoefficientW0 <= quantity ? FromWater("millero-poisson-1981") : null;
        }
    }

    private static bool IsOfEquation(StepQuantity quantity)
    {
        return (StepQuantity.Kelvin <= quantity && quantity <= StepQuantity.ReducedTemperature)
            || (StepQuantity.CoefficientA0 <= quantity && quantity <= StepQuantity.CoefficientC0)
            || quantity == StepQuantity.ReferenceMoleFraction;
    }

    private static ExplanationSource? OfGasPhase(Gas gas)
    {
        switch (gas)
        {
            case Gas.Oxygen:
                return FromWater("benson-krause-1980");
            case Gas.CarbonDioxide:
                return FromEquation(SolubilityEquation.Weiss1974);
            case Gas.NitrousOxide:
                return FromEquation(SolubilityEquation.WeissPrice1980);
            case Gas.Nitrogen:
            case Gas.Argon:
            case Gas.Helium:
                return FromWater("smith-van-ness-1975");
            default:
                return null;
        }
    }

    private static ExplanationSource FromEquation(SolubilityEquation equation)
    {
        EquationEntry entry = Catalogue.Equation(equation);
        return new ExplanationSource(entry.Name, entry.Citation, entry.Doi);
    }

    private static ExplanationSource FromWater(string name)
    {
        WaterEntry entry = Catalogue.Relation(name);
        return new ExplanationSource(entry.Name, entry.Citation, entry.Doi);
    }
}
