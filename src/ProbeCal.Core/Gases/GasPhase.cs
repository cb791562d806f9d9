namespace ProbeCal;

/// <summary>The gas above the water: its vapour, and what is left for the dry gases (Dalton). Without ranges.</summary>
internal static class GasPhase
{
    private const double PerCent = 100.0;

    /// <summary>
    /// Saturation vapour pressure, atm, and the slopes of its logarithm. Oxygen: over fresh water by Benson and Krause 1980, which its equations are tied to; the other gases:
    /// by Weiss and Price 1980 with the salinity, continued below 0 °C.
    /// </summary>
    internal static double VapourAtmospheres(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double logPerKelvin, out double logPerSalinity)
    {
        double vapour;
        if (gas == Gas.Oxygen)
        {
            logPerKelvin = VapourBensonKrause1980.LogarithmicSlope(celsius);
            logPerSalinity = 0.0;
            vapour = VapourBensonKrause1980.Atmospheres(celsius, steps);
        }
        else
        {
            vapour = VapourWeissPrice1980.Atmospheres(celsius, salinity, out logPerKelvin, out logPerSalinity, steps);
        }

        steps?.Add(StepQuantity.VapourAtmospheres, vapour);
        return vapour;
    }

    /// <summary>x·(P − h·u), hPa, and its slopes.</summary>
    internal static double PartialPressure(
        Gas gas, double celsius, double salinity, double pressureHectopascal, double moleFraction, double humidityPercent, CalculationSteps? steps,
        out double perKelvin, out double perSalinity, out double perMoleFraction, out double perHumidityPercent)
    {
        double vapour = VapourAtmospheres(gas, celsius, salinity, steps, out double logPerKelvin, out double logPerSalinity)
            * PressureUnits.HectopascalPerAtmosphere;
        double moist = humidityPercent / PerCent * vapour;
        double partialPressure = moleFraction * (pressureHectopascal - moist);
        perKelvin = -moleFraction * moist * logPerKelvin;
        perSalinity = -moleFraction * moist * logPerSalinity;
        perMoleFraction = pressureHectopascal - moist;
        perHumidityPercent = -moleFraction * vapour / PerCent;
        steps?.Add(StepQuantity.VapourHectopascal, vapour);
        steps?.Add(StepQuantity.PartialPressureHectopascal, partialPressure);
        return partialPressure;
    }
}
