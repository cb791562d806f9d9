namespace ProbeCal;

/// <summary>
/// Fourteen gases in pure water as 1/kH in 1/Pa, kH = f/x at infinite dilution:
/// ln(kH/p*) = A/Tr + B·(1 − Tr)^0.355/Tr + C·Tr^−0.41·exp(1 − Tr), Tr = T/647.096 K, p* the vapour pressure of Wagner and Pruss.
/// </summary>
/// <remarks>
/// Fernández-Prini, R., Alvarez, J.L., Harvey, A.H. (2003) J. Phys. Chem. Ref. Data 32, 903–916, doi:10.1063/1.1564818; the international guideline
/// IAPWS G7-04 (2004). Coefficients seen in one second-hand place; values of the guideline at 300 K are reproduced for five gases. T on ITS-90, pure water only. The published
/// range reaches to about 300 °C; here it ends at 40 °C with the density and the vapour pressure that go with it. It begins with the lowest data of each gas (from memory).
/// Accuracy about 1–2 % near ambient, a fit over a wide range; not for calibration.
/// </remarks>
internal static class FernandezPrini2003
{
    /// <summary>Highest temperature, °C.</summary>
    internal const double HighestCelsius = 40.0;
    /// <summary>Pure water only.</summary>
    internal const double HighestSalinity = 0.0;
    /// <summary>Molar mass of water, kg/mol.</summary>
    internal const double WaterKilogramsPerMole = 0.018015268;

    private const double CriticalKelvin = 647.096;
    private const double PascalPerHectopascal = 100.0;

    /// <summary>Lowest temperature of the data of a gas, °C (from memory); NaN for a gas that it does not cover.</summary>
    internal static double LowestCelsius(Gas gas)
    {
        switch (gas)
        {
            case Gas.Helium:
                return 0.06;
            case Gas.Neon:
                return 0.05;
            case Gas.Argon:
                return 0.04;
            case Gas.Krypton:
                return 0.04;
            case Gas.Xenon:
                return 0.07;
            case Gas.Hydrogen:
                return 0.0;
            case Gas.Nitrogen:
                return 4.97;
            case Gas.Oxygen:
                return 1.0;
            case Gas.CarbonMonoxide:
                return 5.0;
            case Gas.CarbonDioxide:
                return 1.04;
            case Gas.HydrogenSulfide:
                return 0.0;
            case Gas.Methane:
                return 2.31;
            case Gas.Ethane:
                return 2.29;
            case Gas.SulfurHexafluoride:
                return 9.99;
            default:
                return double.NaN;
        }
    }

    /// <summary>ln of 1/kH, 1/Pa, and its slope; NaN for a gas that it does not cover and outside 0 K to the critical point.</summary>
    internal static double FugacityLogarithm(Gas gas, double celsius, CalculationSteps? steps, out double perKelvin)
    {
        switch (gas)
        {
            case Gas.Helium:
                return Logarithm(celsius, -3.52839, 7.12983, 4.4777, steps, out perKelvin);
            case Gas.Neon:
                return Logarithm(celsius, -3.18301, 5.31448, 5.43774, steps, out perKelvin);
            case Gas.Argon:
                return Logarithm(celsius, -8.40954, 4.29587, 10.52779, steps, out perKelvin);
            case Gas.Krypton:
                return Logarithm(celsius, -8.97358, 3.61508, 11.29963, steps, out perKelvin);
            case Gas.Xenon:
                return Logarithm(celsius, -14.21635, 4.00041, 15.60999, steps, out perKelvin);
            case Gas.Hydrogen:
                return Logarithm(celsius, -4.73284, 6.08954, 6.06066, steps, out perKelvin);
            case Gas.Nitrogen:
                return Logarithm(celsius, -9.67578, 4.72162, 11.70585, steps, out perKelvin);
            case Gas.Oxygen:
                return Logarithm(celsius, -9.44833, 4.43822, 11.42005, steps, out perKelvin);
            case Gas.CarbonMonoxide:
                return Logarithm(celsius, -10.52862, 5.13259, 12.01421, steps, out perKelvin);
            case Gas.CarbonDioxide:
                return Logarithm(celsius, -8.55445, 4.01195, 9.52345, steps, out perKelvin);
            case Gas.HydrogenSulfide:
                return Logarithm(celsius, -4.51499, 5.23538, 4.42126, steps, out perKelvin);
            case Gas.Methane:
                return Logarithm(celsius, -10.44708, 4.66491, 12.12986, steps, out perKelvin);
            case Gas.Ethane:
                return Logarithm(celsius, -19.67563, 4.51222, 20.62567, steps, out perKelvin);
            case Gas.SulfurHexafluoride:
                return Logarithm(celsius, -16.56118, 2.15289, 20.3544, steps, out perKelvin);
            default:
                perKelvin = double.NaN;
                return double.NaN;
        }
    }

    private static double Logarithm(double celsius, double a, double b, double c, CalculationSteps? steps, out double perKelvin)
    {
        perKelvin = double.NaN;
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        double reduced = kelvin / CriticalKelvin;
        double rest = 1.0 - reduced;
        if (reduced <= 0.0 || rest <= 0.0) { return double.NaN; }
        if (steps != null)
        {
            steps.Add(StepQuantity.CoefficientA0, a);
            steps.Add(StepQuantity.CoefficientA1, b);
            steps.Add(StepQuantity.CoefficientA2, c);
            steps.Add(StepQuantity.Kelvin, kelvin);
            steps.Add(StepQuantity.ReducedTemperature, reduced);
        }

        double vapour = VapourWagnerPruss1993.Value(celsius, out double vapourSlope, steps) * PascalPerHectopascal;
        double root = Numerics.Pow(rest, 0.355);
        double power = c * Numerics.Pow(reduced, -0.41) * Numerics.Exp(rest);
        double logarithm = -(((a + (b * root)) / reduced) + power + Numerics.Ln(vapour));
        double reducedSlope = (-(a + (b * root) + (0.355 * b * reduced * root / rest)) / reduced / reduced) - (power * ((0.41 / reduced) + 1.0));
        perKelvin = -((reducedSlope / CriticalKelvin) + vapourSlope);
        if (steps != null)
        {
            steps.Add(StepQuantity.PureWaterVapourPascal, vapour);
            steps.Add(StepQuantity.LogarithmOfEquation, logarithm);
        }

        return logarithm;
    }
}
