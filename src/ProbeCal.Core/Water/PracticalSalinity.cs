namespace ProbeCal;

/// <summary>
/// Practical salinity (PSS-78) from conductivity, temperature and sea pressure, with the low-salinity extension below S 2.
/// </summary>
/// <remarks>
/// Lewis, E.L. (1980) IEEE J. Oceanic Eng. OE-5, 3–8, doi:10.1109/JOE.1980.1145448; UNESCO Technical Papers in Marine Science 44
/// (1983), whose check values it meets to the printed digit. Below S 2 the extension of Hill, K.D., Dauphinee, T.M., Woods, D.J. (1986)
/// IEEE J. Oceanic Eng. OE-11, 109–112, doi:10.1109/JOE.1986.1145154 (constants from memory, held against gsw), scaled so that it meets PSS-78
/// at S 2 exactly, as the Gibbs-SeaWater toolbox does. −2 to 35 °C, S 0–42, 0–10 000 dbar. Stated accuracy 0.002–0.003 (from memory) for sea water;
/// inland waters have other ions, and their salinity may be off by a tenth of itself. Below about 1.3 µS/cm (water purer than rain) the extension turns
/// negative, by 0.0003 at most, and the salinity is 0.
/// The conductivity is the one at the temperature of the water, not compensated. A specific conductance at 25 °C goes in with 25 °C.
/// </remarks>
public static class PracticalSalinity
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = -2.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 35.0;
    /// <summary>Highest practical salinity.</summary>
    public const double HighestSalinity = 42.0;
    /// <summary>Highest sea pressure (above the atmosphere's), dbar.</summary>
    public const double HighestSeaPressureDecibar = 10000.0;
    /// <summary>Conductivity of sea water of S 35 at 15 °C (IPTS-68) and the surface, mS/cm.</summary>
    public const double ReferenceMillisiemensPerCentimetre = 42.914;

    // Where the low-salinity extension takes over.
    private const double Join = 2.0;

    private const double A0 = 0.0080;
    private const double A1 = -0.1692;
    private const double A2 = 25.3851;
    private const double A3 = 14.0941;
    private const double A4 = -7.0261;
    private const double A5 = 2.7081;

    private const double B0 = 0.0005;
    private const double B1 = -0.0056;
    private const double B2 = -0.0066;
    private const double B3 = -0.0375;
    private const double B4 = 0.0636;
    private const double B5 = -0.0144;

    private const double C0 = 0.6766097;
    private const double C1 = 2.00564e-2;
    private const double C2 = 1.104259e-4;
    private const double C3 = -6.9698e-7;
    private const double C4 = 1.0031e-9;

    private const double D1 = 3.426e-2;
    private const double D2 = 4.464e-4;
    private const double D3 = 4.215e-1;
    private const double D4 = -3.107e-3;

    private const double E1 = 2.070e-5;
    private const double E2 = -6.370e-10;
    private const double E3 = 3.989e-15;

    private const double K = 0.0162;

    /// <summary>Practical salinity.</summary>
    /// <param name="millisiemensPerCentimetre">Conductivity at the temperature of the water (not compensated), mS/cm, from 0 to what gives S 42.</param>
    /// <param name="celsius">Temperature on ITS-90, −2 to 35 °C.</param>
    /// <param name="seaPressureDecibar">Pressure of the water above the probe, dbar, 0–10 000; 0 at the surface, about one per metre.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="salinity">Practical salinity; NaN unless Ok or let pass by the rule (a negative conductivity has no value).</param>
    public static Status FromConductivity(
        double millisiemensPerCentimetre, double celsius, double seaPressureDecibar, RangeRule rule, out double salinity)
    {
        return Compute(millisiemensPerCentimetre, celsius, seaPressureDecibar, rule, out salinity, out _, out _);
    }

    /// <summary>How the salinity answers to conductivity and temperature.</summary>
    /// <param name="millisiemensPerCentimetre">Conductivity at the temperature of the water (not compensated), mS/cm, from 0 to what gives S 42.</param>
    /// <param name="celsius">Temperature on ITS-90, −2 to 35 °C.</param>
    /// <param name="seaPressureDecibar">Pressure of the water above the probe, dbar, 0–10 000.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="perMillisiemensPerCentimetre">∂S/∂C, per mS/cm; NaN unless Ok or let pass by the rule.</param>
    /// <param name="perKelvin">∂S/∂T at constant conductivity, 1/K; NaN unless Ok or let pass by the rule.</param>
    public static Status Sensitivities(
        double millisiemensPerCentimetre, double celsius, double seaPressureDecibar, RangeRule rule,
        out double perMillisiemensPerCentimetre, out double perKelvin)
    {
        return Compute(
            millisiemensPerCentimetre, celsius, seaPressureDecibar, rule, out _, out perMillisiemensPerCentimetre, out perKelvin);
    }

    /// <summary>Value and both derivatives without a range; NaN where the formula has no value.</summary>
    internal static double Value(
        double millisiemensPerCentimetre, double celsius, double seaPressureDecibar, out double perConductivity, out double perKelvin)
    {
        perConductivity = double.NaN;
        perKelvin = double.NaN;
        double t = TemperatureScale.Ipts68FromIts90(celsius);
        double bend = 1.0 + (K * (t - 15.0));
        double ratio = millisiemensPerCentimetre / ReferenceMillisiemensPerCentimetre;
        double fresh = C0 + (t * (C1 + (t * (C2 + (t * (C3 + (t * C4)))))));
        double pressureSlope = D3 + (D4 * t);
        double pressureDivisor = 1.0 + (t * (D1 + (t * D2))) + (pressureSlope * ratio);
        if (bend <= 0.0 || fresh <= 0.0 || pressureDivisor <= 0.0) { return double.NaN; }
        double pressureTerm = seaPressureDecibar * (E1 + (seaPressureDecibar * (E2 + (seaPressureDecibar * E3)))) / pressureDivisor;
        double pressureRatio = 1.0 + pressureTerm;
        double divisor = pressureRatio * fresh;
        if (divisor <= 0.0 || pressureRatio <= 0.0) { return double.NaN; }
        double relative = ratio / divisor;
        double f = (t - 15.0) / bend;
        double x = Numerics.Sqrt(relative);
        double salinity = Scale(x, f, out double perX, out double perF);
        if (salinity < Join)
        {
            salinity = Extension(salinity, x, f, ref perX, ref perF);
            if (salinity <= 0.0)
            {
                perConductivity = 0.0;
                perKelvin = 0.0;
                return 0.0;
            }
        }

        if (x <= 0.0) { return salinity; }
        double perRelative = perX / (2.0 * x);
        double byPressure = pressureTerm / pressureDivisor / pressureRatio;
        double relativePerRatio = (1.0 / divisor) + (relative * byPressure * pressureSlope);
        double freshSlope = C1 + (t * ((2.0 * C2) + (t * ((3.0 * C3) + (t * 4.0 * C4)))));
        double relativePerKelvin = relative * ((byPressure * (D1 + (2.0 * D2 * t) + (D4 * ratio))) - (freshSlope / fresh));
        perConductivity = perRelative * relativePerRatio / ReferenceMillisiemensPerCentimetre;
        perKelvin = ((perRelative * relativePerKelvin) + (perF / (bend * bend))) * TemperatureScale.Ipts68PerIts90;
        return salinity;
    }

    private static Status Compute(
        double millisiemensPerCentimetre, double celsius, double seaPressureDecibar, RangeRule rule,
        out double salinity, out double perConductivity, out double perKelvin)
    {
        salinity = double.NaN;
        perConductivity = double.NaN;
        perKelvin = double.NaN;
        Status status = Status.Ok;
        if (InputCheck.NotFinite(millisiemensPerCentimetre)) { status = Status.ConductanceNotFinite; }
        else if (millisiemensPerCentimetre < 0.0) { status = Status.ConductanceBelowRange; }
        status = InputCheck.Graver(status, InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius));
        status = InputCheck.Graver(status, InputCheck.Depth(seaPressureDecibar, HighestSeaPressureDecibar));
        if (InputCheck.Refuses(status, rule)) { return status; }
        double value = Value(millisiemensPerCentimetre, celsius, seaPressureDecibar, out double perMillisiemens, out double slope);
        if (HighestSalinity < value || double.IsNaN(value)) { status = InputCheck.Graver(status, Status.ConductanceAboveRange); }
        if (InputCheck.Refuses(status, rule)) { return status; }
        salinity = InputCheck.FiniteOrNaN(value);
        perConductivity = InputCheck.FiniteOrNaN(perMillisiemens);
        perKelvin = InputCheck.FiniteOrNaN(slope);
        return status;
    }

    /// <summary>The scale of 1978 as a function of the root of the conductivity ratio and of the temperature term.</summary>
    private static double Scale(double x, double f, out double perX, out double perF)
    {
        perF = B0 + (x * (B1 + (x * (B2 + (x * (B3 + (x * (B4 + (x * B5)))))))));
        perX = A1 + (f * B1) + (x * ((2.0 * (A2 + (f * B2))) + (x * ((3.0 * (A3 + (f * B3))) + (x * ((4.0 * (A4 + (f * B4))) + (x * 5.0 * (A5 + (f * B5)))))))));
        return A0 + (x * (A1 + (x * (A2 + (x * (A3 + (x * (A4 + (x * A5))))))))) + (f * perF);
    }

    /// <summary>What the extension takes off the scale: a0/(1 + 1.5X + X²) + b0·f/(1 + √y + y + y^1.5), X = 400x², y = 100x².</summary>
    private static double LowSalinityTerm(double x, double f, out double perX, out double perF)
    {
        double big = 400.0 * x * x;
        double first = 1.0 + (big * (1.5 + big));
        double root = 10.0 * x;
        double second = 1.0 + (root * (1.0 + (root * (1.0 + root))));
        if (second <= 0.0)
        {
            perX = double.NaN;
            perF = double.NaN;
            return double.NaN;
        }

        perF = B0 / second;
        perX = -(A0 / first / first * (1.5 + (2.0 * big)) * 800.0 * x)
            - (f * perF / second * 10.0 * (1.0 + (root * (2.0 + (3.0 * root)))));
        return (A0 / first) + (f * perF);
    }

    /// <summary>The extension below S 2, scaled to meet the scale there; the derivatives of the scale become those of the result.</summary>
    private static double Extension(double scale, double x, double f, ref double perX, ref double perF)
    {
        // The root of the ratio at S 2 lies between 0.2 and 0.3 for every temperature; four steps of Newton reach the last bit from here.
        double at = 0.26;
        double atPerX = 0.0;
        double atPerF = 0.0;
        for (int i = 0; i < 4; i++)
        {
            double miss = Scale(at, f, out atPerX, out atPerF) - Join;
            if (atPerX <= 0.0) { return double.NaN; }
            at -= miss / atPerX;
        }

        double taken = LowSalinityTerm(at, f, out double takenPerX, out double takenPerF);
        double left = Join - taken;
        if (left <= 0.0 || atPerX <= 0.0) { return double.NaN; }
        double factor = Join / left;
        double factorPerF = factor / left * (takenPerF - (takenPerX * atPerF / atPerX));
        double raw = scale - LowSalinityTerm(x, f, out double perXOff, out double perFOff);
        perX = factor * (perX - perXOff);
        perF = (factor * (perF - perFOff)) + (raw * factorPerF);
        return factor * raw;
    }
}
