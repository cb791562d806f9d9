namespace ProbeCal;

/// <summary>Pressure of the water above a probe: ρ·g·z, above that of the air.</summary>
/// <remarks>
/// g = 9.80665 m/s² (standard gravity, 3rd CGPM 1901) everywhere: latitude is ignored, ±0.27 % from equator to pole. One density from the surface down: water's compressibility
/// departs from it by 0.23 % at 1000 m. Depth 0–1000 m. Accuracy as good as the density and the depth, and these 0.3 %.
/// </remarks>
public static class HydrostaticPressure
{
    /// <summary>Greatest depth taken, m.</summary>
    public const double GreatestDepthMetres = 1000.0;
    /// <summary>Gravity, m/s².</summary>
    internal const double Gravity = 9.80665;

    /// <summary>Pressure of the water above a depth.</summary>
    /// <param name="depthMetres">Depth below the surface, 0–1000 m.</param>
    /// <param name="densityKilogramsPerCubicMetre">Density of the water, kg/m³ (<see cref="DensityEos80"/>).</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="hectopascal">Gauge pressure (without the air's), hPa; NaN unless Ok or extrapolated.</param>
    public static Status Hectopascal(double depthMetres, double densityKilogramsPerCubicMetre, RangeRule rule, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status density = InputCheck.Density(densityKilogramsPerCubicMetre);
        Status status = InputCheck.Graver(InputCheck.Depth(depthMetres, GreatestDepthMetres), density);
        if (density != Status.Ok || InputCheck.Refuses(status, rule)) { return status; }
        return InputCheck.Deliver(
            PerMetre(densityKilogramsPerCubicMetre) * depthMetres, status, Status.DepthAboveRange, out hectopascal);
    }

    /// <summary>hPa per metre of water.</summary>
    internal static double PerMetre(double densityKilogramsPerCubicMetre)
    {
        return densityKilogramsPerCubicMetre * Gravity / 100.0;
    }
}
