using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Characterising;

/// <summary>The temperature factor as it was fitted or given.</summary>
/// <param name="Reference">Temperature at which it is 1, °C.</param>
/// <param name="Form">The form; null for the powers of a polynomial.</param>
/// <param name="Coefficients">One coefficient, or those of a polynomial in T − Tref under the exponential.</param>
internal sealed record ProbeGain(double Reference, TemperatureCoefficientForm? Form, double[] Coefficients)
{
    internal static ProbeGain Of(RecordedTemperatureCoefficient coefficient)
    {
        return new ProbeGain(coefficient.ReferenceCelsius, RecordNames.Form(coefficient.Form), [coefficient.Value]);
    }

    /// <summary>The factor; NaN where the form has none.</summary>
    internal double At(double celsius)
    {
        if (Form is TemperatureCoefficientForm form)
        {
            return TemperatureCoefficient.Factor(form, Coefficients[0], Reference, celsius, celsius, celsius, RangeRule.Refuse, out double factor) == Status.Ok ? factor : double.NaN;
        }

        double difference = celsius - Reference;
        double sum = 0;
        for (int k = Coefficients.Length - 1; 0 <= k; k--)
        {
            sum = (sum + Coefficients[k]) * difference;
        }

        return System.Math.Exp(sum);
    }
}
