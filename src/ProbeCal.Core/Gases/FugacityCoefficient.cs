namespace ProbeCal;

/// <summary>
/// Fugacity over partial pressure of a gas in the gas phase, φ.
/// Oxygen: 1 − θ·P up to 1.1 atm, the virial term of the oxygen equations, and (1 − θ·1.1 atm)·exp[−θ·(P − 1.1 atm)] above.
/// Carbon dioxide and nitrous oxide: exp{[B + 2δ·(1 − x)²]·P/(R·T)} at every pressure, x the mole fraction in the gas phase.
/// Nitrogen, argon, helium: 1 up to 1.1 atm, where the equations were measured, and exp[B·(P − 1.1 atm)/(R·T)] above. Other gases: 1.
/// </summary>
/// <remarks>
/// θ: Benson, B.B., Krause, D. (1980) Limnol. Oceanogr. 25(4), 662–671. Carbon dioxide: Weiss, R.F. (1974) Mar. Chem. 2, 203–215, coefficients seen in four second-hand places.
/// Nitrous oxide: Weiss, R.F., Price, B.A. (1980) Mar. Chem. 8, 347–359, seen in one. The others: B by the Pitzer–Abbott correlation,
/// B·Pc/(R·Tc) = 0.083 − 0.422/Tr^1.6 + ω·(0.139 − 0.172/Tr^4.2), with critical constants (both from memory; helium with the effective constants of a quantum gas).
/// The correlation gives the θ of oxygen within 0.55 cm³/mol, 2.7 % (0–40 °C, a test). Temperature as given: the scales differ by less than 1e-6 in φ.
/// </remarks>
internal static class FugacityCoefficient
{
    /// <summary>Gas constant, cm³·atm/(mol·K), the value of Weiss 1974.</summary>
    internal const double CubicCentimetreAtmospheresPerKelvin = 82.05746;

    /// <summary>φ and the slopes of its logarithm; NaN at or below absolute zero.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="celsius">Temperature, °C.</param>
    /// <param name="atmospheres">Total pressure, atm.</param>
    /// <param name="moleFraction">Mole fraction in the gas phase, vapour counted: partial over total pressure.</param>
    /// <param name="steps">Filled when not null.</param>
    /// <param name="logPerKelvin">∂(ln φ)/∂T, 1/K.</param>
    /// <param name="logPerAtmosphere">∂(ln φ)/∂P at constant mole fraction, 1/atm.</param>
    /// <param name="logPerMoleFraction">∂(ln φ)/∂x.</param>
    internal static double Value(
        Gas gas, double celsius, double atmospheres, double moleFraction, CalculationSteps? steps,
        out double logPerKelvin, out double logPerAtmosphere, out double logPerMoleFraction)
    {
        logPerMoleFraction = 0.0;
        switch (gas)
        {
            case Gas.Oxygen:
                return Oxygen(celsius, atmospheres, steps, out logPerKelvin, out logPerAtmosphere);
            case Gas.CarbonDioxide:
                return Mixed(
                    celsius, atmospheres, moleFraction, -1636.75, 12.0408, -0.0327957, 3.16528e-05, 57.7, -0.118,
                    steps, out logPerKelvin, out logPerAtmosphere, out logPerMoleFraction);
            case Gas.NitrousOxide:
                return Mixed(
                    celsius, atmospheres, moleFraction, -905.95, 4.1685, -0.0052734, 0.0, 65.0, -0.1338,
                    steps, out logPerKelvin, out logPerAtmosphere, out logPerMoleFraction);
            case Gas.Nitrogen:
                return Above(celsius, atmospheres, 126.2, 33.5, 0.038, steps, out logPerKelvin, out logPerAtmosphere);
            case Gas.Argon:
                return Above(celsius, atmospheres, 150.9, 48.3, 0.0, steps, out logPerKelvin, out logPerAtmosphere);
            case Gas.Helium:
                return Above(celsius, atmospheres, 10.3, 6.43, 0.0, steps, out logPerKelvin, out logPerAtmosphere);
            default:
                logPerKelvin = 0.0;
                logPerAtmosphere = 0.0;
                return 1.0;
        }
    }

    /// <summary>True for a gas whose φ depends on its mole fraction, so that partial pressure and concentration are not proportional.</summary>
    internal static bool DependsOnMoleFraction(Gas gas)
    {
        return gas == Gas.CarbonDioxide || gas == Gas.NitrousOxide;
    }

    /// <summary>Second virial coefficient by the Pitzer–Abbott correlation, cm³/mol, and its slope per K; NaN at or below absolute zero.</summary>
    internal static double Abbott(double kelvin, double criticalKelvin, double criticalAtmospheres, double acentricFactor, out double perKelvin)
    {
        perKelvin = double.NaN;
        if (kelvin <= 0.0 || criticalKelvin <= 0.0 || criticalAtmospheres <= 0.0) { return double.NaN; }
        double reduced = kelvin / criticalKelvin;
        double simple = 0.422 * Numerics.Pow(reduced, -1.6);
        double acentric = 0.172 * acentricFactor * Numerics.Pow(reduced, -4.2);
        double scale = CubicCentimetreAtmospheresPerKelvin * criticalKelvin / criticalAtmospheres;
        perKelvin = scale * ((1.6 * simple) + (4.2 * acentric)) / kelvin;
        return scale * (0.083 - simple + (0.139 * acentricFactor) - acentric);
    }

    private static double Oxygen(double celsius, double atmospheres, CalculationSteps? steps, out double logPerKelvin, out double logPerAtmosphere)
    {
        double theta = OxygenPressureFactor.Theta(celsius, steps);
        double thetaSlope = OxygenPressureFactor.ThetaSlope(celsius);
        logPerKelvin = double.NaN;
        logPerAtmosphere = double.NaN;
        double low = atmospheres;
        double excess = atmospheres - PoyntingFactor.HighestAtmospheresWithout;
        if (0.0 < excess) { low = PoyntingFactor.HighestAtmospheresWithout; }
        double phi = 1.0 - (theta * low);
        if (phi <= 0.0) { return double.NaN; }
        logPerKelvin = -thetaSlope * low / phi;
        logPerAtmosphere = -theta / phi;
        if (0.0 < excess)
        {
            phi *= Numerics.Exp(-theta * excess);
            logPerKelvin -= thetaSlope * excess;
            logPerAtmosphere = -theta;
            steps?.Add(StepQuantity.ExcessAtmospheres, excess);
        }

        steps?.Add(StepQuantity.FugacityCoefficient, phi);
        return phi;
    }

    private static double Mixed(
        double celsius, double atmospheres, double moleFraction, double b0, double b1, double b2, double b3, double d0, double d1,
        CalculationSteps? steps, out double logPerKelvin, out double logPerAtmosphere, out double logPerMoleFraction)
    {
        logPerKelvin = double.NaN;
        logPerAtmosphere = double.NaN;
        logPerMoleFraction = double.NaN;
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return double.NaN; }
        double virial = b0 + (kelvin * (b1 + (kelvin * (b2 + (kelvin * b3)))));
        double cross = d0 + (d1 * kelvin);
        double rest = 1.0 - moleFraction;
        double sum = virial + (2.0 * cross * rest * rest);
        double sumSlope = b1 + (kelvin * ((2.0 * b2) + (kelvin * 3.0 * b3))) + (2.0 * d1 * rest * rest);
        double perSum = atmospheres / (CubicCentimetreAtmospheresPerKelvin * kelvin);
        double phi = Numerics.Exp(sum * perSum);
        logPerKelvin = perSum * (sumSlope - (sum / kelvin));
        logPerAtmosphere = sum / (CubicCentimetreAtmospheresPerKelvin * kelvin);
        logPerMoleFraction = -4.0 * cross * rest * perSum;
        if (steps != null)
        {
            steps.Add(StepQuantity.GasKelvin, kelvin);
            steps.Add(StepQuantity.VirialCoefficient0, b0);
            steps.Add(StepQuantity.VirialCoefficient1, b1);
            steps.Add(StepQuantity.VirialCoefficient2, b2);
            steps.Add(StepQuantity.VirialCoefficient3, b3);
            steps.Add(StepQuantity.CrossVirialCoefficient0, d0);
            steps.Add(StepQuantity.CrossVirialCoefficient1, d1);
            steps.Add(StepQuantity.SecondVirial, virial);
            steps.Add(StepQuantity.CrossVirial, cross);
            steps.Add(StepQuantity.WetMoleFraction, moleFraction);
            steps.Add(StepQuantity.FugacityCoefficient, phi);
        }

        return phi;
    }

    private static double Above(
        double celsius, double atmospheres, double criticalKelvin, double criticalAtmospheres, double acentricFactor,
        CalculationSteps? steps, out double logPerKelvin, out double logPerAtmosphere)
    {
        logPerKelvin = 0.0;
        logPerAtmosphere = 0.0;
        double excess = atmospheres - PoyntingFactor.HighestAtmospheresWithout;
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (excess <= 0.0 || kelvin <= 0.0) { return 1.0; }
        double virial = Abbott(kelvin, criticalKelvin, criticalAtmospheres, acentricFactor, out double virialSlope);
        double perVirial = excess / (CubicCentimetreAtmospheresPerKelvin * kelvin);
        double phi = Numerics.Exp(virial * perVirial);
        logPerKelvin = perVirial * (virialSlope - (virial / kelvin));
        logPerAtmosphere = virial / (CubicCentimetreAtmospheresPerKelvin * kelvin);
        if (steps != null)
        {
            steps.Add(StepQuantity.GasKelvin, kelvin);
            steps.Add(StepQuantity.ExcessAtmospheres, excess);
            steps.Add(StepQuantity.CriticalKelvin, criticalKelvin);
            steps.Add(StepQuantity.CriticalAtmospheres, criticalAtmospheres);
            steps.Add(StepQuantity.AcentricFactor, acentricFactor);
            steps.Add(StepQuantity.SecondVirial, virial);
            steps.Add(StepQuantity.FugacityCoefficient, phi);
        }

        return phi;
    }
}
