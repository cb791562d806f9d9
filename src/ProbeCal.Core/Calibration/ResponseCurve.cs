namespace ProbeCal;

/// <summary>
/// The curve that a fit gives, both ways: response = zero + flow·gain·(slope·x + curvature·x²), with x the partial pressure in hPa or, for a
/// logarithmic probe, log10 of it. The slope may have either sign.
/// </summary>
/// <remarks>
/// A quadratic meets a response twice; the answer is the one on the branch through x = 0, which is the line's when the curvature
/// vanishes. It is found without cancellation: x = 2u/(1 + √(1 + 4·u·curvature/slope)), u = (response − zero)/(flow·gain·slope).
/// </remarks>
public static class ResponseCurve
{
    private const double LnTen = 2.302585092994046;

    /// <summary>Partial pressure from a response.</summary>
    /// <param name="response">The response.</param>
    /// <param name="zero">Response at x = 0.</param>
    /// <param name="slope">Response per unit of x at gain 1 and flow 1, not zero.</param>
    /// <param name="curvature">Response per square of x; 0 for a line.</param>
    /// <param name="flow">Flow factor, positive.</param>
    /// <param name="gain">Temperature factor, positive.</param>
    /// <param name="isLogarithmic">True when x is log10 of the partial pressure in hPa.</param>
    /// <param name="partialPressureHectopascal">Partial pressure, hPa; NaN unless Ok.</param>
    /// <returns>The input at fault; <see cref="Status.SignalAboveRange"/> for a response that the curve does not reach.</returns>
    public static Status PartialPressure(
        double response, double zero, double slope, double curvature, double flow, double gain, bool isLogarithmic, out double partialPressureHectopascal)
    {
        partialPressureHectopascal = double.NaN;
        if (InputCheck.NotFinite(response)) { return Status.SignalNotFinite; }
        Status status = Check(zero, slope, curvature, flow, gain);
        if (status != Status.Ok) { return status; }
        double perUnit = slope * flow * gain;
        if (perUnit == 0.0) { return Status.SlopeBelowRange; }
        if (double.IsInfinity(perUnit)) { return Status.SlopeAboveRange; }
        double value = (response - zero) / perUnit;
        if (curvature != 0.0)
        {
            double discriminant = 1.0 + (4.0 * value * (curvature / slope));
            if (discriminant < 0.0 || InputCheck.NotFinite(discriminant)) { return Status.SignalAboveRange; }
            value = 2.0 * value / (1.0 + Numerics.Sqrt(discriminant));
        }

        if (isLogarithmic) { value = Numerics.Exp(value * LnTen); }
        return InputCheck.Deliver(value, Status.Ok, Status.SignalAboveRange, out partialPressureHectopascal);
    }

    /// <summary>The response to a partial pressure.</summary>
    /// <param name="partialPressureHectopascal">Partial pressure, hPa; above 0 for a logarithmic probe.</param>
    /// <param name="zero">Response at x = 0.</param>
    /// <param name="slope">Response per unit of x at gain 1 and flow 1, not zero.</param>
    /// <param name="curvature">Response per square of x; 0 for a line.</param>
    /// <param name="flow">Flow factor, positive.</param>
    /// <param name="gain">Temperature factor, positive.</param>
    /// <param name="isLogarithmic">True when x is log10 of the partial pressure in hPa.</param>
    /// <param name="response">The response; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status ResponseTo(
        double partialPressureHectopascal, double zero, double slope, double curvature, double flow, double gain, bool isLogarithmic, out double response)
    {
        response = double.NaN;
        Status status = Abscissa(partialPressureHectopascal, isLogarithmic, out double x, out _);
        if (status != Status.Ok) { return status; }
        status = Check(zero, slope, curvature, flow, gain);
        if (status != Status.Ok) { return status; }
        double value = zero + (slope * flow * gain * x);
        if (curvature != 0.0) { value += curvature * flow * gain * x * x; }
        return InputCheck.Deliver(value, Status.Ok, Status.PartialPressureAboveRange, out response);
    }

    /// <summary>x of a partial pressure, and hPa per unit of x there.</summary>
    internal static Status Abscissa(double partialPressureHectopascal, bool isLogarithmic, out double x, out double hectopascalPerUnit)
    {
        x = double.NaN;
        hectopascalPerUnit = double.NaN;
        if (InputCheck.NotFinite(partialPressureHectopascal)) { return Status.PartialPressureNotFinite; }
        if (!isLogarithmic)
        {
            x = partialPressureHectopascal;
            hectopascalPerUnit = 1.0;
            return Status.Ok;
        }

        if (partialPressureHectopascal <= 0.0) { return Status.PartialPressureBelowRange; }
        x = Numerics.Ln(partialPressureHectopascal) / LnTen;
        hectopascalPerUnit = InputCheck.FiniteOrNaN(partialPressureHectopascal * LnTen);
        return Status.Ok;
    }

    private static Status Check(double zero, double slope, double curvature, double flow, double gain)
    {
        if (InputCheck.NotFinite(zero)) { return Status.ZeroNotFinite; }
        if (InputCheck.NotFinite(slope)) { return Status.SlopeNotFinite; }
        if (slope == 0.0) { return Status.SlopeBelowRange; }
        if (InputCheck.NotFinite(curvature) || InputCheck.NotFinite(flow) || InputCheck.NotFinite(gain)) { return Status.CoefficientNotFinite; }
        if (flow <= 0.0 || gain <= 0.0) { return Status.CoefficientBelowRange; }
        return Status.Ok;
    }
}
