namespace ProbeCal;

/// <summary>
/// What a total-gas (membrane tensiometer) reading says: ΔP is the pressure of all dissolved gases and the vapour less that of the air. Total gas pressure in %,
/// compensation depth, and with oxygen known the nitrogen and argon that are left.
/// </summary>
/// <remarks>
/// Colt, J. (1984) Computation of dissolved gas concentrations in water as functions of temperature, salinity, and pressure, Am. Fish. Soc. Spec. Publ. 14; Standard Methods 2810 B (both
/// from memory). The oxygen is this library's (<see cref="OxygenEquilibrium"/>), the vapour that of Weiss and Price 1980 with salinity; by Colt's own constants pO2 comes out 0.5 % apart at most. Percentages stand
/// on the fractions 0.20946 and 0.79018 of dry air (printed as 0.2095 and 0.7902). What is not oxygen, vapour or given carbon dioxide counts as nitrogen and argon, so that water in equilibrium with air
/// reads 100.05 % for them: the 0.0425 % of carbon dioxide and 0.0025 % of neon and helium are in it. Accuracy as good as ΔP: 1 hPa is 0.13 % of nitrogen and argon.
/// </remarks>
public static class TotalDissolvedGas
{
    /// <summary>Mole fraction of nitrogen and argon together in dry air (Glueckauf 1951).</summary>
    public const double NitrogenArgonMoleFraction = 0.78084 + 0.00934;

    /// <summary>Greatest ΔP taken, either way, hPa: 10 atm.</summary>
    public const double GreatestDeltaHectopascal = 10.0 * PressureUnits.HectopascalPerAtmosphere;

    /// <summary>Total gas pressure in % of the air's: 100·(BP + ΔP)/BP.</summary>
    /// <param name="deltaHectopascal">ΔP, hPa, negative in water that holds less than the air; above −BP, at most 10 132.5.</param>
    /// <param name="barometricHectopascal">Absolute station pressure BP, hPa, above zero.</param>
    /// <param name="percent">Total gas pressure, %; NaN unless the status is Ok.</param>
    public static Status Percent(double deltaHectopascal, double barometricHectopascal, out double percent)
    {
        percent = double.NaN;
        Status status = CheckTotal(deltaHectopascal, barometricHectopascal);
        if (status != Status.Ok || barometricHectopascal <= 0.0) { return status; }
        return InputCheck.Deliver(
            100.0 * (barometricHectopascal + deltaHectopascal) / barometricHectopascal, status, Status.PressureAboveRange, out percent);
    }

    /// <summary>Depth at which the water above holds the gas in solution: ΔP/(ρ·g). Below it no bubble forms.</summary>
    /// <param name="deltaHectopascal">ΔP, hPa.</param>
    /// <param name="densityKilogramsPerCubicMetre">Density of the water, kg/m³ (<see cref="DensityEos80"/>).</param>
    /// <param name="depthMetres">Depth, m; negative where ΔP is: no depth is needed. NaN unless the status is Ok.</param>
    public static Status CompensationDepth(double deltaHectopascal, double densityKilogramsPerCubicMetre, out double depthMetres)
    {
        depthMetres = double.NaN;
        Status status = InputCheck.Graver(CheckDelta(deltaHectopascal), InputCheck.Density(densityKilogramsPerCubicMetre));
        double perMetre = HydrostaticPressure.PerMetre(densityKilogramsPerCubicMetre);
        if (status != Status.Ok) { return status; }
        // A density so small that the product is zero.
        if (perMetre <= 0.0) { return Status.DensityBelowRange; }
        return InputCheck.Deliver(deltaHectopascal / perMetre, status, Status.PressureAboveRange, out depthMetres);
    }

    /// <summary>ΔP that is left at a depth: ΔP − ρ·g·z. What a fish at that depth feels.</summary>
    /// <param name="deltaHectopascal">ΔP at the surface, hPa.</param>
    /// <param name="depthMetres">Depth, 0–1000 m.</param>
    /// <param name="densityKilogramsPerCubicMetre">Density of the water, kg/m³.</param>
    /// <param name="uncompensatedHectopascal">What is left, hPa; NaN unless the status is Ok.</param>
    public static Status UncompensatedDelta(
        double deltaHectopascal, double depthMetres, double densityKilogramsPerCubicMetre, out double uncompensatedHectopascal)
    {
        uncompensatedHectopascal = double.NaN;
        Status status = HydrostaticPressure.Hectopascal(depthMetres, densityKilogramsPerCubicMetre, RangeRule.Refuse, out double water);
        status = InputCheck.Graver(CheckDelta(deltaHectopascal), status);
        if (status != Status.Ok) { return status; }
        return InputCheck.Deliver(deltaHectopascal - water, status, Status.PressureAboveRange, out uncompensatedHectopascal);
    }

    /// <summary>
    /// Partial pressure of nitrogen and argon together, BP + ΔP − pO2 − pCO2 − vapour, and their saturation against air. The oxygen's comes from
    /// <see cref="OxygenEquilibrium.PartialPressureFromConcentration"/> and <see cref="Saturation.PercentLocal"/>.
    /// </summary>
    /// <param name="deltaHectopascal">ΔP, hPa.</param>
    /// <param name="barometricHectopascal">Absolute station pressure BP, 506.625–1114.575 hPa.</param>
    /// <param name="celsius">Temperature, 0–40 °C.</param>
    /// <param name="salinity">Practical salinity, 0–40.</param>
    /// <param name="oxygenHectopascal">Partial pressure of oxygen, hPa, −1114.575 to 1114.575; a little below zero in anoxic water passes through.</param>
    /// <param name="carbonDioxideHectopascal">Partial pressure of carbon dioxide, hPa; 0 to leave it out, as is usual.</param>
    /// <param name="rule">Refuse, near edge or extrapolate. More oxygen than there is pressure is named as a partial pressure above its range.</param>
    /// <param name="nitrogenArgonHectopascal">Partial pressure of nitrogen and argon, hPa; NaN unless Ok or let pass by the rule.</param>
    /// <param name="percent">Their saturation against air under the local pressure, %; NaN unless Ok or let pass by the rule.</param>
    public static Status NitrogenArgon(
        double deltaHectopascal, double barometricHectopascal, double celsius, double salinity, double oxygenHectopascal,
        double carbonDioxideHectopascal, RangeRule rule, out double nitrogenArgonHectopascal, out double percent)
    {
        nitrogenArgonHectopascal = double.NaN;
        percent = double.NaN;
        Status status = Compute(
            deltaHectopascal, barometricHectopascal, celsius, salinity, oxygenHectopascal, carbonDioxideHectopascal,
            out double rest, out double inAir, out _, out _);
        if (InputCheck.Refuses(status, rule) || inAir <= 0.0) { return status; }
        nitrogenArgonHectopascal = InputCheck.FiniteOrNaN(rest);
        percent = InputCheck.FiniteOrNaN(100.0 * rest / inAir);
        return status;
    }

    /// <summary>
    /// How nitrogen and argon answer to the inputs. Their partial pressure follows ΔP and BP one to one and the partial pressures of oxygen and carbon dioxide with −1; in % these two count −1 times the answer to ΔP.
    /// </summary>
    /// <param name="deltaHectopascal">ΔP, hPa.</param>
    /// <param name="barometricHectopascal">Absolute station pressure BP, 506.625–1114.575 hPa.</param>
    /// <param name="celsius">Temperature, 0–40 °C.</param>
    /// <param name="salinity">Practical salinity, 0–40.</param>
    /// <param name="oxygenHectopascal">Partial pressure of oxygen, hPa, −1114.575 to 1114.575; a little below zero in anoxic water passes through.</param>
    /// <param name="carbonDioxideHectopascal">Partial pressure of carbon dioxide, hPa; 0 to leave it out.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="perKelvin">∂p/∂T, hPa per K.</param>
    /// <param name="perSalinity">∂p/∂S, hPa per unit of salinity.</param>
    /// <param name="percentPerDelta">∂%/∂ΔP, % per hPa.</param>
    /// <param name="percentPerBarometric">∂%/∂BP at constant ΔP, % per hPa.</param>
    /// <param name="percentPerKelvin">∂%/∂T, % per K.</param>
    /// <param name="percentPerSalinity">∂%/∂S, % per unit of salinity.</param>
    public static Status NitrogenArgonSensitivities(
        double deltaHectopascal, double barometricHectopascal, double celsius, double salinity, double oxygenHectopascal,
        double carbonDioxideHectopascal, RangeRule rule,
        out double perKelvin, out double perSalinity,
        out double percentPerDelta, out double percentPerBarometric, out double percentPerKelvin, out double percentPerSalinity)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        percentPerDelta = double.NaN;
        percentPerBarometric = double.NaN;
        percentPerKelvin = double.NaN;
        percentPerSalinity = double.NaN;
        Status status = Compute(
            deltaHectopascal, barometricHectopascal, celsius, salinity, oxygenHectopascal, carbonDioxideHectopascal,
            out double rest, out double inAir, out double vapourPerKelvin, out double vapourPerSalinity);
        if (InputCheck.Refuses(status, rule) || inAir <= 0.0) { return status; }
        double share = 100.0 / inAir;
        // In air the partial pressure is x·(BP − u), so what BP and the vapour change in the divisor comes off.
        double perDry = share * rest / inAir * NitrogenArgonMoleFraction;
        perKelvin = InputCheck.FiniteOrNaN(-vapourPerKelvin);
        perSalinity = InputCheck.FiniteOrNaN(-vapourPerSalinity);
        percentPerDelta = InputCheck.FiniteOrNaN(share);
        percentPerBarometric = InputCheck.FiniteOrNaN(share - perDry);
        percentPerKelvin = InputCheck.FiniteOrNaN(vapourPerKelvin * (perDry - share));
        percentPerSalinity = InputCheck.FiniteOrNaN(vapourPerSalinity * (perDry - share));
        return status;
    }

    internal static Status CheckTotal(double delta, double barometric)
    {
        Status status = InputCheck.Graver(StandardAtmosphere.CheckPressure(barometric), CheckDelta(delta));
        return status == Status.Ok && barometric + delta <= 0.0 ? Status.PressureBelowRange : status;
    }

    internal static Status CheckDelta(double delta)
    {
        return InputCheck.Pressure(delta, -GreatestDeltaHectopascal, GreatestDeltaHectopascal);
    }

    /// <summary>A probe in anoxic water may read a little below zero; what lies as far below as pure oxygen lies above is no reading.</summary>
    private static Status CheckPartial(double hectopascal)
    {
        return hectopascal < -OxygenEquilibrium.HighestPartialPressureHectopascal && !InputCheck.NotFinite(hectopascal)
            ? Status.PartialPressureBelowRange
            : InputCheck.PartialPressure(hectopascal, OxygenEquilibrium.HighestPartialPressureHectopascal);
    }

    /// <summary>What is left for nitrogen and argon, what air holds of them, and the slopes of the vapour; values even when the status names a range.</summary>
    internal static Status Compute(
        double delta, double barometric, double celsius, double salinity, double oxygen, double carbonDioxide,
        out double rest, out double inAir, out double vapourPerKelvin, out double vapourPerSalinity)
    {
        double vapour = PressureUnits.HectopascalPerAtmosphere
            * VapourWeissPrice1980.Atmospheres(celsius, salinity, out double logPerKelvin, out double logPerSalinity);
        vapourPerKelvin = vapour * logPerKelvin;
        vapourPerSalinity = vapour * logPerSalinity;
        rest = barometric + delta - oxygen - carbonDioxide - vapour;
        inAir = NitrogenArgonMoleFraction * (barometric - vapour);
        Status status = InputCheck.Graver(
            InputCheck.Pressure(barometric, BensonKrause1984.LowestHectopascal, BensonKrause1984.HighestHectopascal), CheckDelta(delta));
        status = InputCheck.Graver(
            status, InputCheck.Temperature(celsius, VapourWeissPrice1980.LowestCelsius, VapourWeissPrice1980.HighestCelsius));
        status = InputCheck.Graver(status, InputCheck.Salinity(salinity, VapourWeissPrice1980.HighestSalinity));
        status = InputCheck.Graver(status, CheckPartial(oxygen));
        status = InputCheck.Graver(status, CheckPartial(carbonDioxide));
        return rest < 0.0 ? InputCheck.Graver(status, Status.PartialPressureAboveRange) : status;
    }
}
