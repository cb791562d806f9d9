using System;

namespace ProbeCal.Station.Simulation;

/// <summary>
/// A probe of any response model that knows the truth: partial pressure in, raw signal out, by the inverse of the very model that reads it. Immutable.
/// </summary>
/// <param name="Model">The response model, with the probe's true coefficients.</param>
/// <param name="Zero">True response at zero partial pressure (at 1 hPa for a logarithmic probe).</param>
/// <param name="Slope">True response per hPa at gain 1 (per decade for a logarithmic probe).</param>
/// <param name="Curvature">True response per hPa²; 0 for a line.</param>
internal sealed record ModelInWater(IProbeModel Model, double Zero, double Slope, double Curvature)
{
    /// <summary>The signal that the probe settles at.</summary>
    /// <param name="partialPressureHectopascal">True partial pressure at the probe, or total pressure for a total-gas probe, hPa.</param>
    /// <param name="temperatureCelsius">True temperature, °C.</param>
    /// <param name="pressureHectopascal">True station pressure, hPa.</param>
    /// <param name="flowFactor">True flow factor, 1 in stirred water; the air-to-water ratio in air.</param>
    /// <param name="hydrostaticDecibar">Pressure of the water above, dbar.</param>
    /// <exception cref="ArgumentOutOfRangeException">The model has no such signal.</exception>
    public double Signal(double partialPressureHectopascal, double temperatureCelsius, double pressureHectopascal, double flowFactor = 1, double hydrostaticDecibar = 0)
    {
        Require(Model.Gain(temperatureCelsius, RangeRule.Refuse, out double gain), nameof(temperatureCelsius), temperatureCelsius);
        Status status = ResponseCurve.ResponseTo(partialPressureHectopascal, Zero, Slope, Curvature, flowFactor, gain, Model.IsLogarithmic, out double response);
        Require(status, nameof(partialPressureHectopascal), partialPressureHectopascal);
        status = Model.Signal(response, temperatureCelsius, pressureHectopascal, hydrostaticDecibar, RangeRule.Refuse, out double signal);
        Require(status, nameof(partialPressureHectopascal), partialPressureHectopascal);
        return signal;
    }

    private static void Require(Status status, string name, double value)
    {
        if (status != Status.Ok)
        {
            throw new ArgumentOutOfRangeException(name, value, "the simulated probe gives no signal there (" + status + ")");
        }
    }
}
