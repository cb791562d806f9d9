namespace ProbeCal;

/// <summary>
/// Specific conductance at 25 °C from a conductivity at the temperature of the water. Exactly once: a meter that shows "at 25 °C" has done it already,
/// and <see cref="PracticalSalinity"/> takes the conductivity as it is.
/// </summary>
/// <remarks>
/// Linear: K25 = K/[1 + 0.0191·(t − 25)], the common practice of field manuals (Standard Methods 2510 B, from memory), 1–2 % off far from 25 °C.
/// Natural waters: K25 = K·f25(t) of ISO 7888:1985 (EN 27888:1993). Its factors at 0, 5, … 35 °C are recalled from memory; one reproduction gives the same
/// values. Between them stands ln f25 as a polynomial of fourth degree in t − 25, fitted here: it meets every remembered factor within 0.00014, a third of their last digit.
/// The linear form lies 1.6 % below the other at 15 °C and up to 2.1 % from it between 10 and 35 °C. The accuracy of the factors for a given water is about 1 % (from memory).
/// </remarks>
public static class ConductivityCompensation
{
    /// <summary>Coefficient of the linear form, 1/K.</summary>
    public const double LinearPerKelvin = 0.0191;
    /// <summary>Lowest temperature of both forms, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature of the linear form, °C.</summary>
    public const double HighestLinearCelsius = 40.0;
    /// <summary>Highest temperature of the natural-water form, °C.</summary>
    public const double HighestNaturalCelsius = 35.0;
    /// <summary>Lowest conductivity that the natural-water form was made for, µS/cm.</summary>
    public const double LowestNaturalMicrosiemensPerCentimetre = 60.0;
    /// <summary>Highest conductivity that the natural-water form was made for, µS/cm.</summary>
    public const double HighestNaturalMicrosiemensPerCentimetre = 1000.0;

    private const double F1 = -2.11433049e-2;
    private const double F2 = 1.55599863e-4;
    private const double F3 = -6.04904021e-7;
    private const double F4 = 4.09729269e-8;

    /// <summary>Specific conductance at 25 °C by the linear form.</summary>
    /// <param name="microsiemensPerCentimetre">Conductivity at the temperature of the water, µS/cm, 0 or more.</param>
    /// <param name="celsius">Temperature of the water, 0–40 °C.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="at25MicrosiemensPerCentimetre">Specific conductance at 25 °C, µS/cm; NaN unless Ok or let pass by the rule.</param>
    public static Status Linear(double microsiemensPerCentimetre, double celsius, RangeRule rule, out double at25MicrosiemensPerCentimetre)
    {
        at25MicrosiemensPerCentimetre = double.NaN;
        Status status = Check(microsiemensPerCentimetre, 0.0, double.MaxValue, celsius, HighestLinearCelsius);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double divisor = 1.0 + (LinearPerKelvin * (celsius - 25.0));
        // Only far below zero: there the linear form has no sense.
        if (divisor <= 0.0) { return status; }
        return InputCheck.Deliver(
            microsiemensPerCentimetre / divisor, status, Status.ConductanceAboveRange, out at25MicrosiemensPerCentimetre);
    }

    /// <summary>Specific conductance at 25 °C of a natural water (lake, river, ground water).</summary>
    /// <param name="conductivityMicrosiemensPerCentimetre">Conductivity at the temperature of the water, 60–1000 µS/cm.</param>
    /// <param name="celsius">Temperature of the water, 0–35 °C.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="at25MicrosiemensPerCentimetre">Specific conductance at 25 °C, µS/cm; NaN unless Ok or let pass by the rule.</param>
    public static Status NaturalWater(double conductivityMicrosiemensPerCentimetre, double celsius, RangeRule rule, out double at25MicrosiemensPerCentimetre)
    {
        at25MicrosiemensPerCentimetre = double.NaN;
        Status status = Check(
            conductivityMicrosiemensPerCentimetre, LowestNaturalMicrosiemensPerCentimetre, HighestNaturalMicrosiemensPerCentimetre,
            celsius, HighestNaturalCelsius);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double d = celsius - 25.0;
        double factor = Numerics.Exp(d * (F1 + (d * (F2 + (d * (F3 + (d * F4)))))));
        at25MicrosiemensPerCentimetre = InputCheck.FiniteOrNaN(conductivityMicrosiemensPerCentimetre * factor);
        return status;
    }

    private static Status Check(double conductivity, double lowest, double highest, double celsius, double highestCelsius)
    {
        Status status = Status.Ok;
        if (InputCheck.NotFinite(conductivity)) { status = Status.ConductanceNotFinite; }
        else if (conductivity < lowest) { status = Status.ConductanceBelowRange; }
        else if (highest < conductivity) { status = Status.ConductanceAboveRange; }
        return InputCheck.Graver(status, InputCheck.Temperature(celsius, LowestCelsius, highestCelsius));
    }
}
