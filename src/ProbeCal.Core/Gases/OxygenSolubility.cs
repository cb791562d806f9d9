namespace ProbeCal;

/// <summary>The one switch over the equations, in mg/L at 1 atm, without ranges except <see cref="Check"/>.</summary>
internal static partial class OxygenSolubility
{
    // µmol/kg · kg/m³ = µmol/m³; times g/mol · 10⁻⁶ = mg/L.
    private const double MilligramsPerLitreScale = OxygenUnits.GramsPerMole * 1.0e-6;

    internal static Status Check(SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal)
    {
        if (equation == SolubilityEquation.BensonKrause1984)
        {
            return BensonKrause1984.Check(celsius, salinity, pressureHectopascal);
        }
        if (equation == SolubilityEquation.GarciaGordon1992)
        {
            return GarciaGordon1992.Check(celsius, salinity, pressureHectopascal);
        }
        return Status.EquationUnknown;
    }

    internal static double OneAtmosphere(SolubilityEquation equation, double celsius, double salinity)
    {
        if (equation == SolubilityEquation.BensonKrause1984) { return BensonKrause1984.OneAtmosphere(celsius, salinity); }
        double perKilogram = GarciaGordon1992.OneAtmosphere(celsius, salinity);
        return perKilogram * DensityEos80.Value(celsius, salinity) * MilligramsPerLitreScale;
    }

    internal static void LogarithmicSlopes(
        SolubilityEquation equation, double celsius, double salinity, out double perKelvin, out double perSalinity)
    {
        if (equation == SolubilityEquation.BensonKrause1984)
        {
            BensonKrause1984.LogarithmicSlopes(celsius, salinity, out perKelvin, out perSalinity);
            return;
        }
        GarciaGordon1992.LogarithmicSlopes(celsius, salinity, out perKelvin, out perSalinity);
        double density = DensityEos80.Value(celsius, salinity);
        DensityEos80.Slopes(celsius, salinity, out double densityPerKelvin, out double densityPerSalinity);
        // Far outside the range the polynomial can reach zero, where a logarithm has no slope.
        if (density <= 0.0)
        {
            perKelvin = double.NaN;
            perSalinity = double.NaN;
            return;
        }
        perKelvin += densityPerKelvin / density;
        perSalinity += densityPerSalinity / density;
    }
}
