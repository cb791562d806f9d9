namespace ProbeCal;

/// <summary>
/// The one switch over gases and equations: which belong together, their ranges, and the equation's value as mg/L or mg/L per hPa. Where a paper prints a set per litre and
/// one per kilogram, the set with the better evidence is taken (docs/decisions/0009); per kilogram goes by EOS-80 density.
/// </summary>
internal static class GasSolubility
{
    private const double PascalPerHectopascal = 100.0;

    /// <summary>Whether Core knows the gas at all.</summary>
    internal static bool Known(Gas gas)
    {
        return GasDefaults.Equation(gas) != 0;
    }

    /// <summary>Whether the equation is published for the gas.</summary>
    internal static bool Covers(Gas gas, SolubilityEquation equation)
    {
        switch (equation)
        {
            case SolubilityEquation.BensonKrause1984:
            case SolubilityEquation.GarciaGordon1992:
            case SolubilityEquation.GarciaGordon1992Combined:
            case SolubilityEquation.BensonKrause1984PerKilogram:
                return gas == Gas.Oxygen;
            case SolubilityEquation.Weiss1970:
            case SolubilityEquation.Weiss1970Bunsen:
                return gas == Gas.Oxygen || gas == Gas.Nitrogen || gas == Gas.Argon;
            case SolubilityEquation.Weiss1971:
            case SolubilityEquation.Weiss1971Bunsen:
                return gas == Gas.Helium || gas == Gas.Neon;
            case SolubilityEquation.WeissKyser1978:
            case SolubilityEquation.WeissKyser1978Bunsen:
                return gas == Gas.Krypton;
            case SolubilityEquation.WoodCaputi1966:
                return gas == Gas.Xenon;
            case SolubilityEquation.HammeEmerson2004:
                return gas == Gas.Nitrogen || gas == Gas.Argon || gas == Gas.Neon;
            case SolubilityEquation.Jenkins2019:
                return gas == Gas.Helium || gas == Gas.Neon || gas == Gas.Argon || gas == Gas.Krypton || gas == Gas.Xenon;
            case SolubilityEquation.Weiss1974:
                return gas == Gas.CarbonDioxide;
            case SolubilityEquation.WeissPrice1980:
                return gas == Gas.NitrousOxide || gas == Gas.CarbonDioxide;
            case SolubilityEquation.WeissPrice1980MoistAir:
                return gas == Gas.NitrousOxide;
            case SolubilityEquation.WiesenburgGuinasso1979:
            case SolubilityEquation.WiesenburgGuinasso1979Bunsen:
                return gas == Gas.Methane || gas == Gas.CarbonMonoxide || gas == Gas.Hydrogen;
            case SolubilityEquation.Bullister2002:
            case SolubilityEquation.Bullister2002MoistAir:
                return gas == Gas.SulfurHexafluoride;
            case SolubilityEquation.WarnerWeiss1985:
                return gas == Gas.Cfc11 || gas == Gas.Cfc12;
            case SolubilityEquation.FernandezPrini2003:
                return !double.IsNaN(FernandezPrini2003.LowestCelsius(gas));
            case SolubilityEquation.Sander2023:
                return Known(gas) && gas != Gas.SulfurHexafluoride && gas != Gas.Cfc11 && gas != Gas.Cfc12 && gas != Gas.Ethane;
            default:
                return false;
        }
    }

    /// <summary>Lowest temperature of a pair that belongs together, °C. A salinity without a freezing point counts as fresh.</summary>
    internal static double LowestCelsius(Gas gas, SolubilityEquation equation, double salinity)
    {
        switch (equation)
        {
            case SolubilityEquation.GarciaGordon1992:
            case SolubilityEquation.GarciaGordon1992Combined:
                return GarciaGordon1992.LowestLiquidCelsius(salinity);
            case SolubilityEquation.Weiss1970:
            case SolubilityEquation.Weiss1970Bunsen:
                return Weiss1970.LowestCelsius;
            case SolubilityEquation.Weiss1971:
            case SolubilityEquation.Weiss1971Bunsen:
                return Weiss1971.LowestCelsius;
            case SolubilityEquation.WeissKyser1978:
            case SolubilityEquation.WeissKyser1978Bunsen:
                return WeissKyser1978.LowestCelsius;
            case SolubilityEquation.Jenkins2019:
                return Jenkins2019.LowestCelsius;
            case SolubilityEquation.Weiss1974:
                return Weiss1974.LowestCelsius;
            case SolubilityEquation.WeissPrice1980:
            case SolubilityEquation.WeissPrice1980MoistAir:
                return WeissPrice1980.LowestCelsius;
            case SolubilityEquation.WiesenburgGuinasso1979:
            case SolubilityEquation.WiesenburgGuinasso1979Bunsen:
                return WiesenburgGuinasso1979.LowestCelsius;
            case SolubilityEquation.Bullister2002:
            case SolubilityEquation.Bullister2002MoistAir:
                return Bullister2002.LowestCelsius;
            case SolubilityEquation.WarnerWeiss1985:
                return WarnerWeiss1985.LowestCelsius;
            case SolubilityEquation.FernandezPrini2003:
                return FernandezPrini2003.LowestCelsius(gas);
            case SolubilityEquation.Sander2023:
                return Sander2023.LowestCelsius;
            case SolubilityEquation.WoodCaputi1966:
                return WoodCaputi1966.LowestCelsius;
            case SolubilityEquation.HammeEmerson2004:
                return HammeEmerson2004.LowestCelsius;
            default:
                return BensonKrause1984.LowestCelsius;
        }
    }

    /// <summary>Highest temperature of an equation, °C.</summary>
    internal static double HighestCelsius(SolubilityEquation equation)
    {
        switch (equation)
        {
            case SolubilityEquation.WoodCaputi1966:
                return WoodCaputi1966.HighestCelsius;
            case SolubilityEquation.HammeEmerson2004:
                return HammeEmerson2004.HighestCelsius;
            case SolubilityEquation.Jenkins2019:
                return Jenkins2019.HighestCelsius;
            case SolubilityEquation.WiesenburgGuinasso1979:
            case SolubilityEquation.WiesenburgGuinasso1979Bunsen:
                return WiesenburgGuinasso1979.HighestCelsius;
            default:
                return BensonKrause1984.HighestCelsius;
        }
    }

    /// <summary>Highest practical salinity of an equation.</summary>
    internal static double HighestSalinity(SolubilityEquation equation)
    {
        switch (equation)
        {
            case SolubilityEquation.GarciaGordon1992:
            case SolubilityEquation.GarciaGordon1992Combined:
                return GarciaGordon1992.HighestSalinity;
            case SolubilityEquation.WoodCaputi1966:
                return WoodCaputi1966.HighestSalinity;
            case SolubilityEquation.HammeEmerson2004:
                return HammeEmerson2004.HighestSalinity;
            case SolubilityEquation.FernandezPrini2003:
            case SolubilityEquation.Sander2023:
                return FernandezPrini2003.HighestSalinity;
            default:
                return BensonKrause1984.HighestSalinity;
        }
    }

    /// <summary>The pair, and the ranges of temperature and salinity.</summary>
    internal static Status Check(Gas gas, SolubilityEquation equation, double celsius, double salinity)
    {
        if (!Known(gas)) { return Status.GasUnknown; }
        if (!Covers(gas, equation)) { return Status.EquationUnknown; }
        return InputCheck.Graver(
            InputCheck.Temperature(celsius, LowestCelsius(gas, equation, salinity), HighestCelsius(equation)),
            InputCheck.Salinity(salinity, HighestSalinity(equation)));
    }

    /// <summary>True where the equation gives the concentration under moist air at 1 atm, false where it gives the solubility.</summary>
    internal static bool IsMoistAir(Gas gas, SolubilityEquation equation)
    {
        switch (equation)
        {
            case SolubilityEquation.Weiss1970Bunsen:
            case SolubilityEquation.Weiss1971Bunsen:
            case SolubilityEquation.WeissKyser1978Bunsen:
            case SolubilityEquation.Weiss1974:
            case SolubilityEquation.WiesenburgGuinasso1979Bunsen:
            case SolubilityEquation.Bullister2002:
            case SolubilityEquation.FernandezPrini2003:
            case SolubilityEquation.Sander2023:
                return false;
            case SolubilityEquation.WeissPrice1980:
                return gas == Gas.CarbonDioxide;
            default:
                return true;
        }
    }

    /// <summary>Dry mole fraction that a moist-air equation is tied to: that of the air of its time, or 1 where the equation gives C/x.</summary>
    internal static double ReferenceMoleFraction(Gas gas, SolubilityEquation equation)
    {
        switch (equation)
        {
            case SolubilityEquation.WeissPrice1980:
            case SolubilityEquation.WeissPrice1980MoistAir:
            case SolubilityEquation.WiesenburgGuinasso1979:
            case SolubilityEquation.Bullister2002MoistAir:
            case SolubilityEquation.WarnerWeiss1985:
                return 1.0;
            default:
                return DryAir.MoleFraction(gas);
        }
    }

    /// <summary>The equation's own value in its own unit, with the slopes of its logarithm; without a range.</summary>
    internal static double EquationValue(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, CalculationSteps? steps, out double logPerKelvin, out double logPerSalinity)
    {
        double value;
        if (equation == SolubilityEquation.BensonKrause1984)
        {
            BensonKrause1984.LogarithmicSlopes(celsius, salinity, out logPerKelvin, out logPerSalinity);
            value = BensonKrause1984.OneAtmosphere(celsius, salinity, steps);
        }
        else if (equation == SolubilityEquation.GarciaGordon1992)
        {
            GarciaGordon1992.LogarithmicSlopes(celsius, salinity, out logPerKelvin, out logPerSalinity);
            value = GarciaGordon1992.OneAtmosphere(celsius, salinity, steps);
        }
        else
        {
            value = Numerics.Exp(Logarithm(gas, equation, celsius, salinity, steps, out logPerKelvin, out logPerSalinity));
        }

        steps?.Add(StepQuantity.EquationValue, value);
        return value;
    }

    /// <summary>
    /// mg/L under moist air of the reference mole fraction at 1 atm, or mg/L per hPa of fugacity, with the slopes of its logarithm; without a range.
    /// </summary>
    internal static double Reference(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, CalculationSteps? steps, out double logPerKelvin, out double logPerSalinity)
    {
        double value = EquationValue(gas, equation, celsius, salinity, steps, out logPerKelvin, out logPerSalinity);
        if (IsPerKilogram(equation))
        {
            double density = DensityEos80.Value(celsius, salinity, steps);
            steps?.Add(StepQuantity.Density, density);
            DensityEos80.Slopes(celsius, salinity, out double densityPerKelvin, out double densityPerSalinity);
            // Far outside the range the polynomial can reach zero, where a logarithm has no slope.
            if (density <= 0.0) { return HundredKelvinForm.None(out logPerKelvin, out logPerSalinity); }
            logPerKelvin += densityPerKelvin / density;
            logPerSalinity += densityPerSalinity / density;
            value *= density;
        }

        double factor = UnitFactor(gas, equation);
        steps?.Add(StepQuantity.UnitFactor, factor);
        value *= Mass(gas, equation, steps) * factor;
        steps?.Add(IsMoistAir(gas, equation) ? StepQuantity.ReferenceMilligramsPerLitre : StepQuantity.ReferenceSolubility, value);
        return value;
    }

    /// <summary>True where the equation counts per kilogram of water.</summary>
    internal static bool IsPerKilogram(SolubilityEquation equation)
    {
        switch (equation)
        {
            case SolubilityEquation.BensonKrause1984:
            case SolubilityEquation.Weiss1970:
            case SolubilityEquation.Weiss1970Bunsen:
            case SolubilityEquation.Weiss1971Bunsen:
            case SolubilityEquation.WeissKyser1978Bunsen:
            case SolubilityEquation.WiesenburgGuinasso1979Bunsen:
            case SolubilityEquation.Bullister2002:
            case SolubilityEquation.Bullister2002MoistAir:
            case SolubilityEquation.WarnerWeiss1985:
            case SolubilityEquation.Sander2023:
                return false;
            default:
                return true;
        }
    }

    /// <summary>g/mol where the equation counts moles, mg/mL where it counts gas volumes, 1 where it counts mg.</summary>
    private static double Mass(Gas gas, SolubilityEquation equation, CalculationSteps? steps)
    {
        double mass;
        switch (equation)
        {
            case SolubilityEquation.BensonKrause1984:
                return 1.0;
            case SolubilityEquation.Weiss1970:
            case SolubilityEquation.Weiss1970Bunsen:
            case SolubilityEquation.Weiss1971:
            case SolubilityEquation.Weiss1971Bunsen:
            case SolubilityEquation.WeissKyser1978:
            case SolubilityEquation.WeissKyser1978Bunsen:
            case SolubilityEquation.WiesenburgGuinasso1979Bunsen:
                mass = GasUnits.MilligramsPerMillilitre(gas);
                steps?.Add(StepQuantity.MilligramsPerMillilitre, mass);
                return mass;
            default:
                mass = GasUnits.GramsPerMole(gas);
                steps?.Add(StepQuantity.GramsPerMole, mass);
                return mass;
        }
    }

    /// <summary>What is left between the equation's unit and mg/L (or mg/L per hPa) after the mass and, per kilogram, the density in kg/m³.</summary>
    private static double UnitFactor(Gas gas, SolubilityEquation equation)
    {
        switch (equation)
        {
            case SolubilityEquation.GarciaGordon1992:
            case SolubilityEquation.GarciaGordon1992Combined:
            case SolubilityEquation.BensonKrause1984PerKilogram:
            case SolubilityEquation.WoodCaputi1966:
                return 1.0e-6;
            case SolubilityEquation.HammeEmerson2004:
                return gas == Gas.Neon ? 1.0e-9 : 1.0e-6;
            case SolubilityEquation.WiesenburgGuinasso1979:
                return 1.0e-9;
            case SolubilityEquation.Weiss1971:
            case SolubilityEquation.WeissKyser1978:
                return 1.0e-3;
            case SolubilityEquation.Bullister2002MoistAir:
            case SolubilityEquation.WarnerWeiss1985:
                return 1.0e3;
            case SolubilityEquation.Weiss1970Bunsen:
            case SolubilityEquation.Weiss1971Bunsen:
            case SolubilityEquation.WeissKyser1978Bunsen:
            case SolubilityEquation.WiesenburgGuinasso1979Bunsen:
            case SolubilityEquation.Bullister2002:
                return 1.0e3 / PressureUnits.HectopascalPerAtmosphere;
            case SolubilityEquation.Weiss1974:
                return 1.0 / PressureUnits.HectopascalPerAtmosphere;
            case SolubilityEquation.WeissPrice1980:
                return gas == Gas.CarbonDioxide ? 1.0 : 1.0 / PressureUnits.HectopascalPerAtmosphere;
            case SolubilityEquation.FernandezPrini2003:
                return PascalPerHectopascal / FernandezPrini2003.WaterKilogramsPerMole;
            case SolubilityEquation.Sander2023:
                return PascalPerHectopascal;
            default:
                return 1.0;
        }
    }

    private static double Logarithm(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (equation)
        {
            case SolubilityEquation.GarciaGordon1992Combined:
                return GarciaGordon1992Combined.AirLogarithm(celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.BensonKrause1984PerKilogram:
                return BensonKrause1984PerKilogram.AirLogarithm(celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.Weiss1970:
                return Weiss1970.AirLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.Weiss1970Bunsen:
                return Weiss1970.BunsenLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.Weiss1971:
                return Weiss1971.AirLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.Weiss1971Bunsen:
                return Weiss1971.BunsenLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.WeissKyser1978:
                return WeissKyser1978.AirLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.WeissKyser1978Bunsen:
                return WeissKyser1978.BunsenLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.WoodCaputi1966:
                return WoodCaputi1966.AirLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.HammeEmerson2004:
                return HammeEmerson2004.AirLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.Jenkins2019:
                return Jenkins2019.AirLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.Weiss1974:
                return Weiss1974.FugacityLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.WeissPrice1980:
                return gas == Gas.CarbonDioxide
                    ? WeissPrice1980.AirLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity)
                    : WeissPrice1980.FugacityLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.WeissPrice1980MoistAir:
                return WeissPrice1980.AirLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.WiesenburgGuinasso1979:
                return WiesenburgGuinasso1979.AirLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.WiesenburgGuinasso1979Bunsen:
                return WiesenburgGuinasso1979.BunsenLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.Bullister2002:
                return Bullister2002.PressureLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.Bullister2002MoistAir:
                return Bullister2002.AirLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.WarnerWeiss1985:
                return WarnerWeiss1985.AirLogarithm(gas, celsius, salinity, steps, out perKelvin, out perSalinity);
            case SolubilityEquation.FernandezPrini2003:
                perSalinity = 0.0;
                return FernandezPrini2003.FugacityLogarithm(gas, celsius, steps, out perKelvin);
            case SolubilityEquation.Sander2023:
                perSalinity = 0.0;
                return Sander2023.PressureLogarithm(gas, celsius, steps, out perKelvin);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }
}
