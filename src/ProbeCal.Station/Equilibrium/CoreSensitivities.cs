namespace ProbeCal.Station.Equilibrium;

/// <summary>Core's own sensitivities of a case, as they are printed.</summary>
internal static class CoreSensitivities
{
    internal static EquilibriumSensitivities OfConcentration(EquilibriumCase asked)
    {
        double perKelvin;
        double perSalinity;
        double perHectopascal;
        if (asked.Phase.Kind == GasPhaseKind.PartialPressure)
        {
            GasEquilibrium.ConcentrationSensitivities(
                asked.Gas, asked.Equation, asked.Temperature.Value, asked.Water.Salinity, asked.Pressure.Value,
                asked.Phase.PartialPressureHectopascal.Value, RangeRule.NearEdge,
                out perKelvin, out perSalinity, out perHectopascal, out double perPartialPressure);
            return new EquilibriumSensitivities(perKelvin, perSalinity, perHectopascal, double.NaN, double.NaN, perPartialPressure);
        }

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
