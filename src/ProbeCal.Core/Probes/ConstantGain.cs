namespace ProbeCal;

/// <summary>The gain of a probe whose response carries the temperature already: 1 inside the range of temperatures that its coefficients hold for.</summary>
internal static class ConstantGain
{
    internal static Status Inside(double lowestCelsius, double highestCelsius, double temperatureCelsius, RangeRule rule, out double gain)
    {
        gain = double.NaN;
        if (InputCheck.NotFinite(lowestCelsius) || InputCheck.NotFinite(highestCelsius)) { return Status.CoefficientNotFinite; }
        Status status = InputCheck.Temperature(temperatureCelsius, lowestCelsius, highestCelsius);
        if (!InputCheck.Refuses(status, rule)) { gain = 1.0; }
        return status;
    }
}
