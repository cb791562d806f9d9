namespace ProbeCal;

/// <summary>
/// Salinity of field water from its specific conductance at 25 °C: S = 5.572·10⁻⁴·SC + 2.02·10⁻⁹·SC².
/// </summary>
/// <remarks>
/// US Geological Survey, National Field Manual, Techniques and Methods 9-A6.2 (2020), doi:10.3133/tm9A6.2, the relation behind
/// its salinity-factor table. Range 0–59 000 µS/cm (the table's). It gives 35.26 where practical salinity is 35, and 0.559 at
/// 1000 µS/cm where sea salt would be 0.492: 0.04 % of an oxygen value.
/// </remarks>
public static class SpecificConductance
{
    /// <summary>Highest specific conductance of the table, µS/cm at 25 °C.</summary>
    public const double HighestMicrosiemensPerCentimetre = 59000.0;

    private const double C1 = 5.572e-4;
    private const double C2 = 2.02e-9;

    /// <summary>Salinity from specific conductance.</summary>
    /// <param name="microsiemensPerCentimetre">Specific conductance compensated to 25 °C, 0–59 000 µS/cm.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="salinity">Salinity (parts per thousand, used as practical salinity); NaN unless Ok or extrapolated.</param>
    public static Status Salinity(double microsiemensPerCentimetre, RangeRule rule, out double salinity)
    {
        salinity = double.NaN;
        Status status = Check(microsiemensPerCentimetre);
        if (InputCheck.Refuses(status, rule)) { return status; }
        salinity = InputCheck.FiniteOrNaN(microsiemensPerCentimetre * (C1 + (C2 * microsiemensPerCentimetre)));
        return status;
    }

    private static Status Check(double microsiemensPerCentimetre)
    {
        if (InputCheck.NotFinite(microsiemensPerCentimetre)) { return Status.ConductanceNotFinite; }
        if (microsiemensPerCentimetre < 0.0) { return Status.ConductanceBelowRange; }
        if (HighestMicrosiemensPerCentimetre < microsiemensPerCentimetre) { return Status.ConductanceAboveRange; }
        return Status.Ok;
    }
}
