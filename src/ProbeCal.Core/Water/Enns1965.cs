namespace ProbeCal;

/// <summary>
/// What depth does to the partial pressure of a dissolved gas at constant concentration: p(z)/p(0) = exp[V·P/(R·T)], V the partial molar volume of the gas, P the
/// pressure of the water above. A membrane probe follows it; 1.3 % per 100 m for oxygen, and shallower than 20 m it may be left out (0.3 %).
/// </summary>
/// <remarks>
/// Enns, T., Scholander, P.F., Bradstreet, E.D. (1965) J. Phys. Chem. 69, 389–391, doi:10.1021/j100886a005: oxygen, nitrogen, argon, helium and carbon dioxide to 100 atm. The volume of
/// oxygen seen in two second-hand places, the others from memory. Their "about 14 % per 100 atm" is met at 25 °C. Accuracy of the volumes about 3 % (our estimate), 0.4 % of the pressure at 1000 m.
/// Hydrostatic pressure 0–101 325 hPa, 0–40 °C.
/// </remarks>
public static class Enns1965
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 40.0;
    /// <summary>Highest hydrostatic pressure, hPa: the 100 atm that were measured.</summary>
    public const double HighestHydrostaticHectopascal = 100.0 * PressureUnits.HectopascalPerAtmosphere;

    // J/(mol·K). A cm³·hPa is 10⁻⁴ J.
    private const double GasConstant = 8.314462618;
    private const double JoulePerCubicCentimetreHectopascal = 1.0e-4;

    /// <summary>Partial pressure at depth over that at the surface, the same water brought down.</summary>
    /// <param name="gas">Oxygen, nitrogen, argon, helium or carbon dioxide.</param>
    /// <param name="celsius">Temperature, 0–40 °C.</param>
    /// <param name="hydrostaticHectopascal">Pressure of the water above, hPa, 0–101 325 (<see cref="HydrostaticPressure"/>).</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="factor">Factor, 1 at the surface; NaN unless Ok or let pass by the rule. Multiply a partial pressure at the surface with it, divide one at depth by it.</param>
    public static Status Factor(Gas gas, double celsius, double hydrostaticHectopascal, RangeRule rule, out double factor)
    {
        return Compute(gas, celsius, hydrostaticHectopascal, rule, out factor, out _, out _);
    }

    /// <summary>How the factor answers to temperature and depth.</summary>
    /// <param name="gas">Oxygen, nitrogen, argon, helium or carbon dioxide.</param>
    /// <param name="celsius">Temperature, 0–40 °C.</param>
    /// <param name="hydrostaticHectopascal">Pressure of the water above, hPa, 0–101 325.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="perKelvin">∂factor/∂T, 1/K; NaN unless Ok or let pass by the rule.</param>
    /// <param name="perHectopascal">∂factor/∂P, 1/hPa; NaN unless Ok or let pass by the rule.</param>
    public static Status Sensitivities(
        Gas gas, double celsius, double hydrostaticHectopascal, RangeRule rule, out double perKelvin, out double perHectopascal)
    {
        return Compute(gas, celsius, hydrostaticHectopascal, rule, out _, out perKelvin, out perHectopascal);
    }

    private static Status Compute(
        Gas gas, double celsius, double hydrostaticHectopascal, RangeRule rule,
        out double factor, out double perKelvin, out double perHectopascal)
    {
        factor = double.NaN;
        perKelvin = double.NaN;
        perHectopascal = double.NaN;
        double volume = PartialMolarVolume.CubicCentimetresPerMole(gas);
        if (double.IsNaN(volume)) { return Status.GasUnknown; }
        Status status = InputCheck.Graver(
            InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius),
            InputCheck.Depth(hydrostaticHectopascal, HighestHydrostaticHectopascal));
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (InputCheck.Refuses(status, rule) || kelvin <= 0.0) { return status; }
        double slope = volume * JoulePerCubicCentimetreHectopascal / (GasConstant * kelvin);
        double exponent = slope * hydrostaticHectopascal;
        factor = InputCheck.FiniteOrNaN(Numerics.Exp(exponent));
        perHectopascal = InputCheck.FiniteOrNaN(factor * slope);
        perKelvin = InputCheck.FiniteOrNaN(-factor * exponent / kelvin);
        return status;
    }
}
