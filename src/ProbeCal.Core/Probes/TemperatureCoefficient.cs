namespace ProbeCal;

/// <summary>
/// How a membrane's temperature coefficient is written. A bare figure in %/K says nothing without the form: 15 K from the
/// reference temperature the forms differ by tens of percent.
/// </summary>
public enum TemperatureCoefficientForm
{
    /// <summary>f = exp(b·(T − Tref)); coefficient b in 1/K.</summary>
    Exponential = 1,
    /// <summary>f = (1 + a)^(T − Tref); coefficient a in 1/K, as compound interest.</summary>
    Compound = 2,
    /// <summary>f = 1 + a·(T − Tref); coefficient a in 1/K.</summary>
    Linear = 3,
    /// <summary>f = exp(−(E/R)·(1/T − 1/Tref)), T in kelvin; coefficient E (activation energy) in J/mol.</summary>
    Arrhenius = 4,
    /// <summary>ln f = c1·d + c2·d² + c3·d³, d = T − Tref; c1 in 1/K, c2 in 1/K², c3 in 1/K³. With c1 alone it is the exponential form.</summary>
    Polynomial = 5,
}

/// <summary>
/// The temperature factor f(T) of a membrane: how much more signal one hPa of gas gives at T than at the reference
/// temperature, where f is 1. Valid inside the range of temperatures over which the coefficient was fitted.
/// </summary>
/// <remarks>
/// Permeation through a polymer follows the Arrhenius law; the other three are its usual short forms. A rate of r per kelvin
/// at the reference is E = r·R·Tref² (22 kJ/mol is 3.0 %/K at 25 °C). Rounding of f is a few units in the last place. The functions
/// with one coefficient take it as c1 of a polynomial; those named polynomial take all three.
/// </remarks>
public static class TemperatureCoefficient
{
    /// <summary>Molar gas constant, J/(mol·K): exact by the 2019 definition of the SI (CODATA 2018).</summary>
    public const double GasConstant = 8.31446261815324;

    private const double ZeroCelsius = 273.15;

    /// <summary>The temperature factor f(T), dimensionless.</summary>
    /// <param name="form">The form that the coefficient belongs to.</param>
    /// <param name="coefficient">1/K, or J/mol for <see cref="TemperatureCoefficientForm.Arrhenius"/>.</param>
    /// <param name="referenceCelsius">Temperature at which f is 1, °C.</param>
    /// <param name="lowestCelsius">Lower end of the fitted range, °C.</param>
    /// <param name="highestCelsius">Upper end of the fitted range, °C.</param>
    /// <param name="temperatureCelsius">Temperature of the membrane, °C.</param>
    /// <param name="rule">What to do outside the fitted range.</param>
    /// <param name="factor">f(T), always positive; NaN unless the status allows a value.</param>
    /// <returns>
    /// <see cref="Status.CoefficientUnknown"/> for an unknown form; <see cref="Status.CoefficientBelowRange"/> or
    /// <see cref="Status.CoefficientAboveRange"/> where the form gives no positive finite factor (a linear form that has
    /// reached zero).
    /// </returns>
    public static Status Factor(
        TemperatureCoefficientForm form,
        double coefficient,
        double referenceCelsius,
        double lowestCelsius,
        double highestCelsius,
        double temperatureCelsius,
        RangeRule rule,
        out double factor)
    {
        factor = double.NaN;
        if (InputCheck.NotFinite(lowestCelsius) || InputCheck.NotFinite(highestCelsius)) { return Status.CoefficientNotFinite; }
        Status status = InputCheck.Temperature(temperatureCelsius, lowestCelsius, highestCelsius);
        if (InputCheck.Refuses(status, rule)) { return status; }
        Status refused = Evaluate(form, coefficient, referenceCelsius, temperatureCelsius, out double value);
        if (refused != Status.Ok) { return refused; }
        factor = value;
        return status;
    }

    /// <summary>d ln f/dT at T, 1/K. Needs no fitted range: it is a sensitivity of a value that has already been judged.</summary>
    /// <param name="form">The form that the coefficient belongs to.</param>
    /// <param name="coefficient">1/K, or J/mol for <see cref="TemperatureCoefficientForm.Arrhenius"/>.</param>
    /// <param name="referenceCelsius">Temperature at which f is 1, °C.</param>
    /// <param name="temperatureCelsius">Temperature of the membrane, °C.</param>
    /// <param name="perKelvin">d ln f/dT, 1/K; NaN unless Ok.</param>
    /// <returns>As <see cref="Factor"/>, without the range.</returns>
    public static Status LogDerivative(
        TemperatureCoefficientForm form,
        double coefficient,
        double referenceCelsius,
        double temperatureCelsius,
        out double perKelvin)
    {
        perKelvin = double.NaN;
        Status status = Evaluate(form, coefficient, referenceCelsius, temperatureCelsius, out double factor);
        if (status != Status.Ok) { return status; }

        double value;
        switch (form)
        {
            case TemperatureCoefficientForm.Exponential:
            case TemperatureCoefficientForm.Polynomial:
                value = coefficient;
                break;
            case TemperatureCoefficientForm.Compound:
                value = Numerics.Ln(1.0 + coefficient);
                break;
            case TemperatureCoefficientForm.Linear:
                // Evaluate has shown that the factor is positive.
                value = coefficient / factor;
                break;
            default:
                // Evaluate has shown that the absolute temperature is positive.
                double kelvin = temperatureCelsius + ZeroCelsius;
                value = coefficient / (GasConstant * kelvin * kelvin);
                break;
        }

        return InputCheck.Deliver(value, status, Status.CoefficientAboveRange, out perKelvin);
    }

    /// <summary>d ln f/d coefficient at T: K for the forms in 1/K, mol/J for the Arrhenius form. Zero at the reference temperature.</summary>
    /// <param name="form">The form that the coefficient belongs to.</param>
    /// <param name="coefficient">1/K, or J/mol for <see cref="TemperatureCoefficientForm.Arrhenius"/>.</param>
    /// <param name="referenceCelsius">Temperature at which f is 1, °C.</param>
    /// <param name="temperatureCelsius">Temperature of the membrane, °C.</param>
    /// <param name="perCoefficient">d ln f/d coefficient, K or mol/J; NaN unless Ok.</param>
    /// <returns>As <see cref="Factor"/>, without the range.</returns>
    public static Status CoefficientDerivative(
        TemperatureCoefficientForm form,
        double coefficient,
        double referenceCelsius,
        double temperatureCelsius,
        out double perCoefficient)
    {
        perCoefficient = double.NaN;
        Status status = Evaluate(form, coefficient, referenceCelsius, temperatureCelsius, out double factor);
        if (status != Status.Ok) { return status; }

        double difference = temperatureCelsius - referenceCelsius;
        double value;
        switch (form)
        {
            case TemperatureCoefficientForm.Exponential:
            case TemperatureCoefficientForm.Polynomial:
                value = difference;
                break;
            case TemperatureCoefficientForm.Compound:
                // Evaluate has shown that 1 + a is positive.
                value = difference / (1.0 + coefficient);
                break;
            case TemperatureCoefficientForm.Linear:
                value = difference / factor;
                break;
            default:
                // Evaluate has shown that both absolute temperatures are positive.
                value = difference / (GasConstant * (temperatureCelsius + ZeroCelsius) * (referenceCelsius + ZeroCelsius));
                break;
        }

        return InputCheck.Deliver(value, status, Status.CoefficientAboveRange, out perCoefficient);
    }

    /// <summary>The factor of the polynomial form: f = exp(c1·d + c2·d² + c3·d³), d = T − Tref.</summary>
    /// <param name="first">c1, 1/K.</param>
    /// <param name="second">c2, 1/K².</param>
    /// <param name="third">c3, 1/K³.</param>
    /// <param name="referenceCelsius">Temperature at which f is 1, °C.</param>
    /// <param name="lowestCelsius">Lower end of the fitted range, °C.</param>
    /// <param name="highestCelsius">Upper end of the fitted range, °C.</param>
    /// <param name="temperatureCelsius">Temperature of the membrane, °C.</param>
    /// <param name="rule">What to do outside the fitted range.</param>
    /// <param name="factor">f(T), always positive; NaN unless the status allows a value.</param>
    /// <returns>As <see cref="Factor"/>.</returns>
    public static Status PolynomialFactor(
        double first, double second, double third, double referenceCelsius, double lowestCelsius, double highestCelsius,
        double temperatureCelsius, RangeRule rule, out double factor)
    {
        double difference = temperatureCelsius - referenceCelsius;
        // The range, the reference and the first coefficient are judged by the form with that alone.
        Status status = Factor(
            TemperatureCoefficientForm.Polynomial, first, referenceCelsius, lowestCelsius, highestCelsius, temperatureCelsius, rule, out double judged);
        factor = double.NaN;
        if (double.IsNaN(judged)) { return status; }
        if (InputCheck.NotFinite(second) || InputCheck.NotFinite(third)) { return Status.CoefficientNotFinite; }
        double value = Numerics.Exp(difference * (first + (difference * (second + (difference * third)))));
        if (value <= 0.0) { return Status.CoefficientBelowRange; }
        return InputCheck.Deliver(value, status, Status.CoefficientAboveRange, out factor);
    }

    /// <summary>d ln f/dT of the polynomial form at T, 1/K: c1 + 2·c2·d + 3·c3·d².</summary>
    /// <param name="first">c1, 1/K.</param>
    /// <param name="second">c2, 1/K².</param>
    /// <param name="third">c3, 1/K³.</param>
    /// <param name="referenceCelsius">Temperature at which f is 1, °C.</param>
    /// <param name="temperatureCelsius">Temperature of the membrane, °C.</param>
    /// <param name="perKelvin">1/K; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status PolynomialLogDerivative(
        double first, double second, double third, double referenceCelsius, double temperatureCelsius, out double perKelvin)
    {
        perKelvin = double.NaN;
        if (InputCheck.NotFinite(temperatureCelsius)) { return Status.TemperatureNotFinite; }
        if (InputCheck.NotFinite(referenceCelsius)) { return Status.CoefficientNotFinite; }
        double difference = temperatureCelsius - referenceCelsius;
        double value = first + (difference * ((2.0 * second) + (3.0 * difference * third)));
        return InputCheck.Deliver(value, Status.Ok, Status.CoefficientNotFinite, out perKelvin);
    }

    /// <summary>
    /// The coefficient that a bare rate per kelvin would mean under each form: the rate itself, or E = r·R·Tref². With
    /// <see cref="Factor"/> it shows a person who typed a bare %/K how far the forms lie apart.
    /// </summary>
    /// <param name="form">The form.</param>
    /// <param name="ratePerKelvin">Relative change per kelvin at the reference temperature, 1/K (3 %/K is 0.03).</param>
    /// <param name="referenceCelsius">Reference temperature, °C, above absolute zero.</param>
    /// <param name="coefficient">1/K, or J/mol for <see cref="TemperatureCoefficientForm.Arrhenius"/>; NaN unless Ok.</param>
    /// <returns><see cref="Status.CoefficientUnknown"/>, <see cref="Status.CoefficientNotFinite"/> or a status of the temperature.</returns>
    public static Status FromRate(TemperatureCoefficientForm form, double ratePerKelvin, double referenceCelsius, out double coefficient)
    {
        coefficient = double.NaN;
        if (!IsKnown(form)) { return Status.CoefficientUnknown; }
        if (InputCheck.NotFinite(ratePerKelvin)) { return Status.CoefficientNotFinite; }
        if (InputCheck.NotFinite(referenceCelsius)) { return Status.TemperatureNotFinite; }
        double kelvin = referenceCelsius + ZeroCelsius;
        if (kelvin <= 0.0) { return Status.TemperatureBelowRange; }
        double value = form == TemperatureCoefficientForm.Arrhenius ? ratePerKelvin * GasConstant * kelvin * kelvin : ratePerKelvin;
        if (double.IsInfinity(value)) { return Status.CoefficientNotFinite; }
        coefficient = value;
        return Status.Ok;
    }

    /// <summary>True for the forms that Core knows.</summary>
    /// <param name="form">The form to test.</param>
    public static bool IsKnown(TemperatureCoefficientForm form)
    {
        return form == TemperatureCoefficientForm.Exponential || form == TemperatureCoefficientForm.Compound
            || form == TemperatureCoefficientForm.Linear || form == TemperatureCoefficientForm.Arrhenius
            || form == TemperatureCoefficientForm.Polynomial;
    }

    private static Status Evaluate(
        TemperatureCoefficientForm form,
        double coefficient,
        double referenceCelsius,
        double temperatureCelsius,
        out double factor)
    {
        factor = double.NaN;
        if (!IsKnown(form)) { return Status.CoefficientUnknown; }
        if (InputCheck.NotFinite(coefficient)) { return Status.CoefficientNotFinite; }
        if (InputCheck.NotFinite(referenceCelsius)) { return Status.CoefficientNotFinite; }
        if (InputCheck.NotFinite(temperatureCelsius)) { return Status.TemperatureNotFinite; }

        double difference = temperatureCelsius - referenceCelsius;
        double value;
        switch (form)
        {
            case TemperatureCoefficientForm.Exponential:
            case TemperatureCoefficientForm.Polynomial:
                value = Numerics.Exp(coefficient * difference);
                break;
            case TemperatureCoefficientForm.Compound:
                if (1.0 + coefficient <= 0.0) { return Status.CoefficientBelowRange; }
                value = Numerics.Exp(difference * Numerics.Ln(1.0 + coefficient));
                break;
            case TemperatureCoefficientForm.Linear:
                value = 1.0 + (coefficient * difference);
                break;
            default:
                double kelvin = temperatureCelsius + ZeroCelsius;
                double referenceKelvin = referenceCelsius + ZeroCelsius;
                if (referenceKelvin <= 0.0) { return Status.CoefficientBelowRange; }
                if (kelvin <= 0.0) { return Status.TemperatureBelowRange; }
                // 1/Tref − 1/T as one quotient: no cancellation near the reference. A positive sum with 273.15 is at least a unit
                // in its last place, 6e-14, so the product cannot underflow to zero.
                double denominator = GasConstant * kelvin * referenceKelvin;
                value = Numerics.Exp(coefficient * (difference / denominator));
                break;
        }

        if (double.IsNaN(value)) { return Status.CoefficientAboveRange; }
        if (value <= 0.0) { return Status.CoefficientBelowRange; }
        if (double.IsInfinity(value)) { return Status.CoefficientAboveRange; }
        factor = value;
        return Status.Ok;
    }
}
