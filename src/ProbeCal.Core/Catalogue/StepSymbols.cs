namespace ProbeCal;

/// <summary>What each quantity of a computation is called: letter, words, unit, and whether it is given, brought along or computed.</summary>
internal static class StepSymbols
{
    private const string None = "";

    internal static StepKind Kind(StepQuantity quantity)
    {
        switch (quantity)
        {
            case StepQuantity.Celsius:
            case StepQuantity.Salinity:
            case StepQuantity.PressureHectopascal:
            case StepQuantity.MoleFraction:
            case StepQuantity.HumidityPercent:
            case StepQuantity.GivenPartialPressureHectopascal:
            case StepQuantity.GivenMilligramsPerLitre:
                return StepKind.Input;
            case StepQuantity.GramsPerMole:
            case StepQuantity.MilligramsPerMillilitre:
            case StepQuantity.UnitFactor:
            case StepQuantity.ReferenceMoleFraction:
            case StepQuantity.PartialMolarVolume:
            case StepQuantity.CriticalKelvin:
            case StepQuantity.CriticalAtmospheres:
            case StepQuantity.AcentricFactor:
            case StepQuantity.CriticalPascal:
                return StepKind.Coefficient;
            default:
                return StepQuantity.CoefficientA0 <= quantity ? StepKind.Coefficient : StepKind.Computed;
        }
    }

    /// <summary>Letter, words and unit, except the unit of the equation's value, which is the equation's.</summary>
    internal static void Describe(StepQuantity quantity, out string symbol, out string name, out string unit)
    {
        unit = None;
        switch (quantity)
        {
            case StepQuantity.Celsius: symbol = "t"; name = "temperature (ITS-90)"; unit = "°C"; return;
            case StepQuantity.Salinity: symbol = "S"; name = "practical salinity"; return;
            case StepQuantity.PressureHectopascal: symbol = "P"; name = "total pressure"; unit = "hPa"; return;
            case StepQuantity.MoleFraction: symbol = "x"; name = "mole fraction of the gas in the dry gas phase"; return;
            case StepQuantity.HumidityPercent: symbol = "h"; name = "relative humidity of the gas phase"; unit = "%"; return;
            case StepQuantity.GivenPartialPressureHectopascal: symbol = "p"; name = "partial pressure of the gas, as given"; unit = "hPa"; return;
            case StepQuantity.GivenMilligramsPerLitre: symbol = "C"; name = "concentration, as given"; unit = "mg/L"; return;
            case StepQuantity.CelsiusIpts68: symbol = "t68"; name = "temperature on IPTS-68"; unit = "°C"; return;
            case StepQuantity.Kelvin: symbol = "T"; name = "absolute temperature in the equation"; unit = "K"; return;
            case StepQuantity.ReciprocalKelvin: symbol = "r"; name = "its reciprocal"; unit = "1/K"; return;
            case StepQuantity.HundredKelvin: symbol = "τ"; name = "a hundredth of it"; unit = "K"; return;
            case StepQuantity.ScaledTemperature: symbol = "Ts"; name = "scaled temperature"; return;
            case StepQuantity.ReducedTemperature: symbol = "Tr"; name = "temperature over the critical one of water"; return;
            case StepQuantity.FreshTerm: symbol = "f"; name = "fresh-water part of the logarithm"; return;
            case StepQuantity.SaltTerm: symbol = "g"; name = "what salinity adds to it"; return;
            case StepQuantity.LogarithmOfEquation: symbol = "L"; name = "natural logarithm of the equation's value"; return;
            case StepQuantity.EquationValue: symbol = "E"; name = "the equation's value"; return;
            case StepQuantity.Density: symbol = "ρ"; name = "density of the water"; unit = "kg/m³"; return;
            case StepQuantity.GramsPerMole: symbol = "M"; name = "molar mass of the gas"; unit = "g/mol"; return;
            case StepQuantity.MilligramsPerMillilitre: symbol = "m"; name = "mass of 1 mL of the gas at 0 °C and 1 atm"; unit = "mg/mL"; return;
            case StepQuantity.UnitFactor: symbol = "k"; name = "what is left of the units"; return;
            case StepQuantity.ReferenceMilligramsPerLitre: symbol = "Cr"; name = "concentration at the reference, moist air at 1 atm"; unit = "mg/L"; return;
            case StepQuantity.ReferenceSolubility: symbol = "K"; name = "solubility at low pressure"; unit = "mg/(L·hPa)"; return;
            case StepQuantity.Solubility: symbol = "s"; name = "solubility at this pressure"; unit = "mg/(L·hPa)"; return;
            case StepQuantity.ReferenceMoleFraction: symbol = "xr"; name = "mole fraction that the equation is tied to"; return;
            case StepQuantity.Atmospheres: symbol = "Patm"; name = "total pressure"; unit = "atm"; return;
            case StepQuantity.VapourAtmospheres: symbol = "u"; name = "vapour pressure over the water"; unit = "atm"; return;
            case StepQuantity.VapourKelvin: symbol = "Tu"; name = "absolute temperature in the vapour formula"; unit = "K"; return;
            case StepQuantity.CriticalDistance: symbol = "v"; name = "distance from the critical temperature of water"; return;
            case StepQuantity.PureWaterDensity: symbol = "ρw"; name = "density of pure water"; unit = "kg/m³"; return;
            case StepQuantity.DensityTermA: symbol = "a"; name = "first salinity term of the density"; unit = "kg/m³"; return;
            case StepQuantity.DensityTermB: symbol = "b"; name = "second salinity term of the density"; unit = "kg/m³"; return;
            case StepQuantity.CriticalPascal: symbol = "pc"; name = "critical pressure of water"; unit = "Pa"; return;
            case StepQuantity.VapourHectopascal: symbol = "uh"; name = "the same"; unit = "hPa"; return;
            case StepQuantity.Theta: symbol = "θ"; name = "virial term of oxygen"; unit = "1/atm"; return;
            case StepQuantity.PressureFactor: symbol = "F"; name = "pressure factor on the value at 1 atm"; return;
            case StepQuantity.SecondVirial: symbol = "Bv"; name = "second virial coefficient of the gas"; unit = "cm³/mol"; return;
            case StepQuantity.CrossVirial: symbol = "δ"; name = "cross-virial term with air"; unit = "cm³/mol"; return;
            case StepQuantity.FugacityCoefficient: symbol = "φ"; name = "fugacity coefficient"; return;
            case StepQuantity.ReferenceFugacityCoefficient: symbol = "φ1"; name = "fugacity coefficient at 1 atm"; return;
            case StepQuantity.PoyntingFactor: symbol = "Y"; name = "Poynting factor"; return;
            case StepQuantity.PartialMolarVolume: symbol = "V"; name = "partial molar volume of the dissolved gas"; unit = "cm³/mol"; return;
            case StepQuantity.PureWaterVapourPascal: symbol = "pw"; name = "vapour pressure of pure water in the equation"; unit = "Pa"; return;
            case StepQuantity.GasKelvin: symbol = "T90"; name = "absolute temperature in the gas phase"; unit = "K"; return;
            case StepQuantity.WetMoleFraction: symbol = "y"; name = "mole fraction of the gas, vapour counted"; return;
            case StepQuantity.CriticalKelvin: symbol = "Tc"; name = "critical temperature of the gas"; unit = "K"; return;
            case StepQuantity.CriticalAtmospheres: symbol = "Pc"; name = "critical pressure of the gas"; unit = "atm"; return;
            case StepQuantity.AcentricFactor: symbol = "ω"; name = "acentric factor of the gas"; return;
            case StepQuantity.ExcessAtmospheres: symbol = "ΔP"; name = "total pressure above 1.1 atm"; unit = "atm"; return;
            case StepQuantity.PartialPressureHectopascal: symbol = "p"; name = "partial pressure of the gas"; unit = "hPa"; return;
            case StepQuantity.MilligramsPerLitre: symbol = "C"; name = "concentration"; unit = "mg/L"; return;
            case StepQuantity.PercentLocal: symbol = "sat"; name = "saturation against the gas phase at this pressure"; unit = "%"; return;
            default:
                symbol = Coefficient(quantity);
                name = "coefficient";
                return;
        }
    }

    private static string Coefficient(StepQuantity quantity)
    {
        return Numbered(quantity, StepQuantity.CoefficientA0, 6, "A")
            ?? Numbered(quantity, StepQuantity.CoefficientB0, 4, "B")
            ?? Numbered(quantity, StepQuantity.CoefficientC0, 1, "C")
            ?? Numbered(quantity, StepQuantity.VirialCoefficient0, 4, "b")
            ?? Numbered(quantity, StepQuantity.CrossVirialCoefficient0, 2, "d")
            ?? Numbered(quantity, StepQuantity.ThetaCoefficient0, 3, "θ")
            ?? Numbered(quantity, StepQuantity.VapourCoefficient0, 4, "W")
            ?? Numbered(quantity, StepQuantity.PureVapourCoefficient1 - 1, 7, "w")
            ?? Numbered(quantity, StepQuantity.DensityCoefficientW0, 6, "ρ")
            ?? Numbered(quantity, StepQuantity.DensityCoefficientA0, 5, "a")
            ?? Numbered(quantity, StepQuantity.DensityCoefficientB0, 3, "β")
            ?? Numbered(quantity, StepQuantity.DensityCoefficientC0, 1, "c")
            ?? quantity.ToString();
    }

    private static string? Numbered(StepQuantity quantity, StepQuantity first, int count, string letter)
    {
        int index = quantity - first;
        return 0 <= index && index < count ? letter + CatalogueText.Number(index) : null;
    }
}
