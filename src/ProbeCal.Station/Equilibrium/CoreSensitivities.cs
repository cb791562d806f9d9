namespace ProbeCal.Station.Equilibrium;

/// <summary>Core's own sensitivities of a case, as they are printed.</summary>
internal static class CoreSensitivities
{
    internal static EquilibriumSensitivities OfConcentration(EquilibriumCase asked)
    {
        EquilibriumSensitivities core = OfWater(asked, out double milligrams);
        if (asked.Water.Brine is not Brine brine)
        {
            return core;
        }

        brine.Factor(asked.Gas, asked.Temperature.Value, RangeRule.NearEdge, out double factor, out double perKelvin);
        return new EquilibriumSensitivities(
            (core.PerKelvin * factor) + (milligrams * perKelvin), double.NaN, core.PerHectopascal * factor, core.PerMoleFraction * factor,
            core.PerHumidityPercent * factor, core.PerPartialPressureHectopascal * factor);
    }

    private static EquilibriumSensitivities OfWater(EquilibriumCase asked, out double milligrams)
    {
        double perKelvin;
        double perSalinity;
        double perHectopascal;
        if (asked.Phase.Kind == GasPhaseKind.PartialPressure)
        {
            GasEquilibrium.ConcentrationFromPartialPressure(
                asked.Gas, asked.Equation, asked.Temperature.Value, asked.Water.Salinity, asked.Pressure.Value,
                asked.Phase.PartialPressureHectopascal.Value, RangeRule.NearEdge, out milligrams);
            GasEquilibrium.ConcentrationSensitivities(
                asked.Gas, asked.Equation, asked.Temperature.Value, asked.Water.Salinity, asked.Pressure.Value,
                asked.Phase.PartialPressureHectopascal.Value, RangeRule.NearEdge,
                out perKelvin, out perSalinity, out perHectopascal, out double perPartialPressure);
            return new EquilibriumSensitivities(perKelvin, perSalinity, perHectopascal, double.NaN, double.NaN, perPartialPressure);
        }

        GasEquilibrium.MilligramsPerLitre(
            asked.Gas, asked.Equation, asked.Temperature.Value, asked.Water.Salinity, asked.Pressure.Value,
            asked.Phase.MoleFraction.Value, asked.Phase.HumidityPercent.Value, RangeRule.NearEdge, out milligrams);
        GasEquilibrium.MilligramsPerLitreSensitivities(
            asked.Gas, asked.Equation, asked.Temperature.Value, asked.Water.Salinity, asked.Pressure.Value,
            asked.Phase.MoleFraction.Value, asked.Phase.HumidityPercent.Value, RangeRule.NearEdge,
            out perKelvin, out perSalinity, out perHectopascal, out double perFraction, out double perHumidity);
        return new EquilibriumSensitivities(perKelvin, perSalinity, perHectopascal, perFraction, perHumidity, double.NaN);
    }

    internal static EquilibriumSensitivities OfPartialPressure(EquilibriumCase asked)
    {
        if (asked.Phase.Kind == GasPhaseKind.PartialPressure)
        {
            return new EquilibriumSensitivities(0, 0, 0, double.NaN, double.NaN, 1);
        }

        GasEquilibrium.PartialPressureSensitivities(
            asked.Gas, asked.Temperature.Value, asked.Water.Salinity, asked.Pressure.Value,
            asked.Phase.MoleFraction.Value, asked.Phase.HumidityPercent.Value, RangeRule.NearEdge,
            out double perKelvin, out double perSalinity, out double perHectopascal, out double perFraction, out double perHumidity);
        return new EquilibriumSensitivities(perKelvin, perSalinity, perHectopascal, perFraction, perHumidity, double.NaN);
    }
}
