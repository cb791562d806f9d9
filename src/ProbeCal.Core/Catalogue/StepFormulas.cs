using System.Collections.Generic;

namespace ProbeCal;

/// <summary>
/// How a step follows from earlier ones, as text in their symbols. The arithmetic itself stands in the equations; a test computes every step again from
/// its text and compares, so that a text that says something else than the code fails.
/// </summary>
internal sealed class StepFormulas
{
    /// <summary>Partial pressure in the gas phase that a saturation is told against.</summary>
    internal const string OfGasPhase = "x*(P - h/100*uh)";

    private const string GasConstant = "82.05746";

    private readonly Gas _gas;
    private readonly SolubilityEquation _equation;
    private readonly Dictionary<StepQuantity, double> _earlier = [];

    internal StepFormulas(Gas gas, SolubilityEquation equation)
    {
        _gas = gas;
        _equation = equation;
    }

    internal void Add(StepQuantity quantity, double value)
    {
        _earlier[quantity] = value;
    }

    /// <summary>The formula; empty for inputs and coefficients.</summary>
    internal string Of(StepQuantity quantity)
    {
        switch (quantity)
        {
            case StepQuantity.CelsiusIpts68: return "1.00024*t";
            case StepQuantity.Kelvin: return Celsius() + " + 273.15";
            case StepQuantity.ReciprocalKelvin: return "1/T";
            case StepQuantity.HundredKelvin: return "T/100";
            case StepQuantity.ScaledTemperature: return "ln((298.15 - " + Celsius() + ")/(273.15 + " + Celsius() + "))";
            case StepQuantity.ReducedTemperature: return "T/647.096";
            case StepQuantity.FreshTerm: return Fresh();
            case StepQuantity.SaltTerm: return Salt();
            case StepQuantity.LogarithmOfEquation: return Logarithm();
            case StepQuantity.EquationValue: return "exp(L)";
            case StepQuantity.ReferenceMilligramsPerLitre:
            case StepQuantity.ReferenceSolubility: return "E" + Times(StepQuantity.Density) + Times(StepQuantity.GramsPerMole) + Times(StepQuantity.MilligramsPerMillilitre) + "*k";
            case StepQuantity.Solubility: return Solubility();
            case StepQuantity.Atmospheres: return "P/1013.25";
            case StepQuantity.VapourKelvin: return _gas == Gas.Oxygen ? "t + 273.15" : "1.00024*t + 273.15";
            case StepQuantity.VapourAtmospheres: return _gas == Gas.Oxygen ? "exp(W0 + W1/Tu + W2/Tu^2)" : "exp(W0 + W1*100/Tu + W2*ln(Tu/100) + W3*S)";
            case StepQuantity.PureWaterVapourPascal: return "pc*exp((w1*v + w2*v^1.5 + w3*v^3 + w4*v^3.5 + w5*v^4 + w6*v^7.5)/Tr)";
            case StepQuantity.CriticalDistance: return "1 - Tr";
            case StepQuantity.PureWaterDensity: return Polynomial(StepQuantity.DensityCoefficientW0, 6, "t68");
            case StepQuantity.DensityTermA: return Polynomial(StepQuantity.DensityCoefficientA0, 5, "t68");
            case StepQuantity.DensityTermB: return Polynomial(StepQuantity.DensityCoefficientB0, 3, "t68");
            case StepQuantity.Density: return "ρw + S*(a + b*S^0.5 + c0*S)";
            case StepQuantity.VapourHectopascal: return "1013.25*u";
            case StepQuantity.Theta: return Polynomial(StepQuantity.ThetaCoefficient0, 3, "t");
            case StepQuantity.ExcessAtmospheres: return "Patm - 1.1";
            case StepQuantity.GasKelvin: return "t + 273.15";
            case StepQuantity.SecondVirial: return SecondVirial();
            case StepQuantity.CrossVirial: return Polynomial(StepQuantity.CrossVirialCoefficient0, 2, "T90");
            case StepQuantity.WetMoleFraction: return "p/P";
            case StepQuantity.FugacityCoefficient: return Fugacity();
            case StepQuantity.ReferenceFugacityCoefficient: return _gas == Gas.Oxygen ? "1 - θ" : Has(StepQuantity.CrossVirial) ? "exp((Bv + 2*δ)/(" + GasConstant + "*T90))" : "1";
            case StepQuantity.PoyntingFactor: return "exp(-V*ΔP/(" + GasConstant + "*T90))";
            case StepQuantity.PressureFactor: return "(Patm - h/100*u)" + Times(StepQuantity.FugacityCoefficient) + "/((1 - u)*φ1)" + Times(StepQuantity.PoyntingFactor);
            case StepQuantity.PartialPressureHectopascal: return Has(StepQuantity.GivenMilligramsPerLitre) ? "C/s" : OfGasPhase;
            case StepQuantity.MilligramsPerLitre: return Has(StepQuantity.PressureFactor) ? "Cr*F*x/xr" : "p*s";
            case StepQuantity.PercentLocal: return "100*p/pe";
            default: return "";
        }
    }

    private string Celsius()
    {
        return Has(StepQuantity.CelsiusIpts68) ? "t68" : "t";
    }

    private string Fresh()
    {
        if (Has(StepQuantity.ReciprocalKelvin)) { return Polynomial(StepQuantity.CoefficientA0, 5, "r"); }
        if (Has(StepQuantity.ScaledTemperature)) { return Polynomial(StepQuantity.CoefficientA0, 6, "Ts"); }
        string last = _earlier[StepQuantity.CoefficientA4] == 0.0 ? "" : " + A4*τ" + (TakesSquare() ? "^2" : "");
        return "A1 + A2/τ + A3*ln(τ)" + last;
    }

    private string Salt()
    {
        if (Has(StepQuantity.ReciprocalKelvin)) { return "-S*(" + Polynomial(StepQuantity.CoefficientB0, 3, "r") + ")"; }
        string sum = Has(StepQuantity.ScaledTemperature) ? Polynomial(StepQuantity.CoefficientB0, 4, "Ts") : "B1 + B2*τ + B3*τ^2";
        return "S*(" + sum + (_earlier[StepQuantity.CoefficientC0] == 0.0 ? "" : " + C0*S") + ")";
    }

    /// <summary>A4 multiplies (T/100)² in the moist-air functions of 1980 and 1985, T/100 everywhere else.</summary>
    private bool TakesSquare()
    {
        return _equation == SolubilityEquation.WeissPrice1980 || _equation == SolubilityEquation.WeissPrice1980MoistAir
            || _equation == SolubilityEquation.WarnerWeiss1985;
    }

    private string Logarithm()
    {
        switch (_equation)
        {
            case SolubilityEquation.FernandezPrini2003: return "-(A0/Tr + A1*(1 - Tr)^0.355/Tr + A2*Tr^(-0.41)*exp(1 - Tr) + ln(pw))";
            case SolubilityEquation.Sander2023: return "ln(A0) + A1*(1/T - 1/298.15)";
            default: return "f + g";
        }
    }

    private string Solubility()
    {
        string pressure = Times(StepQuantity.FugacityCoefficient) + Times(StepQuantity.PoyntingFactor);
        return Has(StepQuantity.ReferenceMilligramsPerLitre)
            ? "Cr" + pressure + "/(xr*1013.25*(1 - u)*φ1)"
            : "K" + pressure;
    }

    private string SecondVirial()
    {
        return Has(StepQuantity.CriticalKelvin)
            ? GasConstant + "*Tc/Pc*(0.083 - 0.422/(T90/Tc)^1.6 + ω*(0.139 - 0.172/(T90/Tc)^4.2))"
            : Polynomial(StepQuantity.VirialCoefficient0, 4, "T90");
    }

    private string Fugacity()
    {
        if (_gas == Gas.Oxygen) { return Has(StepQuantity.ExcessAtmospheres) ? "(1 - 1.1*θ)*exp(-θ*ΔP)" : "1 - θ*Patm"; }
        return Has(StepQuantity.CrossVirial)
            ? "exp((Bv + 2*δ*(1 - y)^2)*Patm/(" + GasConstant + "*T90))"
            : "exp(Bv*ΔP/(" + GasConstant + "*T90))";
    }

    /// <summary>c0 + c1*v + c2*v^2 …, without the terms whose coefficient is zero.</summary>
    private string Polynomial(StepQuantity first, int count, string variable)
    {
        string text = "";
        for (int i = 0; i < count; i++)
        {
            if (!_earlier.TryGetValue(first + i, out double value) || value == 0.0) { continue; }
            StepSymbols.Describe(first + i, out string symbol, out _, out _);
            string power = i == 0 ? "" : i == 1 ? "*" + variable : "*" + variable + "^" + CatalogueText.Number(i);
            text += (text.Length == 0 ? "" : " + ") + symbol + power;
        }

        return text;
    }

    private string Times(StepQuantity quantity)
    {
        if (!Has(quantity)) { return ""; }
        StepSymbols.Describe(quantity, out string symbol, out _, out _);
        return "*" + symbol;
    }

    private bool Has(StepQuantity quantity)
    {
        return _earlier.ContainsKey(quantity);
    }
}
