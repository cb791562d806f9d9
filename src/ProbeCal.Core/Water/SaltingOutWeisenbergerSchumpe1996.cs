namespace ProbeCal;

/// <summary>
/// How dissolved ions drive a gas out of water: log10(c₀/c) = Σ (hᵢ + h_G)·cᵢ, h_G = h_G0 + h_T·(T − 298.15 K), cᵢ in mol/L. For brines that are not sea salt; c₀ is the value of a
/// fresh-water equation at the same partial pressure. The caller adds up one term an ion.
/// </summary>
/// <remarks>
/// Weisenberger, S., Schumpe, A. (1996) AIChE J. 42(1), 298–300, doi:10.1002/aic.690420130; constants seen in two second-hand places. 0–90 °C; krypton, ammonia, hydrogen sulfide and sulfur
/// hexafluoride have no h_T and stand for 25 °C alone. To about 5 mol/L (2 for many salts). Stated standard uncertainty of a salt's constant Σ(hᵢ + h_G) 0.026 L/mol (from memory), so 6 % of c for each mol/L of salt.
/// For sea salt of S 35 it gives oxygen 1.3 % above the sea-water equation at 5 °C and 0.4 % below at 25 °C, helium 3.8 % above: sea water has equations of its own.
/// </remarks>
public static class SaltingOutWeisenbergerSchumpe1996
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 90.0;
    /// <summary>The one temperature of a gas without a temperature constant, °C.</summary>
    public const double ReferenceCelsius = 25.0;
    /// <summary>Highest concentration of an ion taken, mol/L.</summary>
    public const double HighestMolesPerLitre = 5.0;
    /// <summary>Standard uncertainty of the constant of a whole salt, L/mol (from memory).</summary>
    public const double ConstantUncertaintyLitresPerMole = 0.026;

    private const double LnTen = 2.302585092994046;

    /// <summary>One ion's term (hᵢ + h_G)·cᵢ of log10(c₀/c).</summary>
    /// <param name="ion">The ion.</param>
    /// <param name="gas">The dissolved gas.</param>
    /// <param name="celsius">Temperature, 0–90 °C; 25 °C for a gas without a temperature constant.</param>
    /// <param name="molesPerLitre">Concentration of the ion, mol/L, 0–5.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="term">The term, a common logarithm (unit 1); NaN unless Ok or let pass by the rule. Add those of all ions.</param>
    public static Status Term(Ion ion, Gas gas, double celsius, double molesPerLitre, RangeRule rule, out double term)
    {
        return Compute(ion, gas, celsius, molesPerLitre, rule, out term, out _);
    }

    /// <summary>How one ion's term answers to temperature. To concentration it answers with the term of 1 mol/L.</summary>
    /// <param name="ion">The ion.</param>
    /// <param name="gas">The dissolved gas.</param>
    /// <param name="celsius">Temperature, 0–90 °C; 25 °C for a gas without a temperature constant.</param>
    /// <param name="molesPerLitre">Concentration of the ion, mol/L, 0–5.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="termPerKelvin">∂term/∂T, 1/K; NaN unless Ok or let pass by the rule.</param>
    public static Status Sensitivity(Ion ion, Gas gas, double celsius, double molesPerLitre, RangeRule rule, out double termPerKelvin)
    {
        return Compute(ion, gas, celsius, molesPerLitre, rule, out _, out termPerKelvin);
    }

    /// <summary>What the ions leave of the fresh-water value: c/c₀ = 10^(−sum).</summary>
    /// <param name="sumOfTerms">Sum of the terms of all ions, a common logarithm (unit 1).</param>
    /// <param name="factor">Factor on the fresh-water concentration at the same partial pressure; NaN unless the status is Ok.</param>
    public static Status Factor(double sumOfTerms, out double factor)
    {
        factor = double.NaN;
        if (InputCheck.NotFinite(sumOfTerms)) { return Status.CoefficientNotFinite; }
        return InputCheck.Deliver(Numerics.Exp(-LnTen * sumOfTerms), Status.Ok, Status.CoefficientBelowRange, out factor);
    }

    private static Status Compute(
        Ion ion, Gas gas, double celsius, double molesPerLitre, RangeRule rule, out double term, out double termPerKelvin)
    {
        term = double.NaN;
        termPerKelvin = double.NaN;
        double ofIon = OfIon(ion);
        double ofGas = OfGas(gas);
        if (double.IsNaN(ofIon)) { return Status.IonUnknown; }
        if (double.IsNaN(ofGas)) { return Status.GasUnknown; }
        double slope = SlopeOfGas(gas);
        bool hasSlope = !double.IsNaN(slope);
        Status status = InputCheck.Temperature(
            celsius, hasSlope ? LowestCelsius : ReferenceCelsius, hasSlope ? HighestCelsius : ReferenceCelsius);
        status = InputCheck.Graver(status, Check(molesPerLitre));
        if (InputCheck.Refuses(status, rule)) { return status; }
        if (!hasSlope) { slope = 0.0; }
        term = InputCheck.FiniteOrNaN((ofIon + ofGas + (slope * (celsius - ReferenceCelsius))) * molesPerLitre);
        termPerKelvin = InputCheck.FiniteOrNaN(slope * molesPerLitre);
        return status;
    }

    private static Status Check(double molesPerLitre)
    {
        if (InputCheck.NotFinite(molesPerLitre)) { return Status.ConcentrationNotFinite; }
        if (molesPerLitre < 0.0) { return Status.ConcentrationBelowRange; }
        return HighestMolesPerLitre < molesPerLitre ? Status.ConcentrationAboveRange : Status.Ok;
    }

    /// <summary>hᵢ in L/mol; NaN for an ion that is none.</summary>
    private static double OfIon(Ion ion)
    {
        return ion switch
        {
            Ion.Hydrogen => 0.0,
            Ion.Lithium => 0.0754,
            Ion.Sodium => 0.1143,
            Ion.Potassium => 0.0922,
            Ion.Rubidium => 0.0839,
            Ion.Caesium => 0.0759,
            Ion.Ammonium => 0.0556,
            Ion.Magnesium => 0.1694,
            Ion.Calcium => 0.1762,
            Ion.Strontium => 0.1881,
            Ion.Barium => 0.2168,
            Ion.Manganese => 0.1463,
            Ion.Iron2 => 0.1523,
            Ion.Cobalt => 0.168,
            Ion.Nickel => 0.1654,
            Ion.Copper => 0.1675,
            Ion.Zinc => 0.1537,
            Ion.Cadmium => 0.1869,
            Ion.Aluminium => 0.2174,
            Ion.Chromium3 => 0.0648,
            Ion.Iron3 => 0.1161,
            Ion.Lanthanum => 0.2297,
            Ion.Cerium3 => 0.2406,
            Ion.Thorium => 0.2709,
            Ion.Hydroxide => 0.0839,
            Ion.Hydrosulfide => 0.0851,
            Ion.Fluoride => 0.092,
            Ion.Chloride => 0.0318,
            Ion.Bromide => 0.0269,
            Ion.Iodide => 0.0039,
            Ion.Nitrite => 0.0795,
            Ion.Nitrate => 0.0128,
            Ion.Chlorate => 0.1348,
            Ion.Bromate => 0.1116,
            Ion.Iodate => 0.0913,
            Ion.Perchlorate => 0.0492,
            Ion.Periodate => 0.1464,
            Ion.Cyanide => 0.0679,
            Ion.Thiocyanate => 0.0627,
            Ion.Hydrogenchromate => 0.0401,
            Ion.Bicarbonate => 0.0967,
            Ion.DihydrogenPhosphate => 0.0906,
            Ion.Bisulfite => 0.0549,
            Ion.Carbonate => 0.1423,
            Ion.HydrogenPhosphate => 0.1499,
            Ion.Sulfite => 0.127,
            Ion.Sulfate => 0.1117,
            Ion.Thiosulfate => 0.1149,
            Ion.Phosphate => 0.2119,
            Ion.Hexacyanoferrate2 => 0.3574,
            _ => double.NaN,
        };
    }

    /// <summary>h_G0 in L/mol; NaN for a gas without one.</summary>
    private static double OfGas(Gas gas)
    {
        return gas switch
        {
            Gas.Hydrogen => -0.0218,
            Gas.Helium => -0.0353,
            Gas.Neon => -0.008,
            Gas.Argon => 0.0057,
            Gas.Krypton => -0.0071,
            Gas.Xenon => 0.0133,
            Gas.Nitrogen => -0.001,
            Gas.Oxygen => 0.0,
            Gas.NitrousOxide => -0.0085,
            Gas.Ammonia => -0.0481,
            Gas.CarbonDioxide => -0.0172,
            Gas.Methane => 0.0022,
            Gas.Ethane => 0.012,
            Gas.HydrogenSulfide => -0.0333,
            Gas.SulfurHexafluoride => 0.01,
            _ => double.NaN,
        };
    }

    /// <summary>h_T in L/(mol·K); NaN for a gas without one.</summary>
    private static double SlopeOfGas(Gas gas)
    {
        return gas switch
        {
            Gas.Hydrogen => -0.000299,
            Gas.Helium => 0.000464,
            Gas.Neon => -0.000913,
            Gas.Argon => -0.000485,
            Gas.Xenon => -0.000329,
            Gas.Nitrogen => -0.000605,
            Gas.Oxygen => -0.000334,
            Gas.NitrousOxide => -0.000479,
            Gas.CarbonDioxide => -0.000338,
            Gas.Methane => -0.000524,
            Gas.Ethane => -0.000601,
            _ => double.NaN,
        };
    }
}
