namespace ProbeCal.Station.Uncertainty;

/// <summary>One input of a value, how well it is known, and what that does to the value.</summary>
/// <param name="Name">What the input is called where the budget is printed, such as <c>temperature</c>.</param>
/// <param name="Unit">Unit of the input; empty for a number without one.</param>
/// <param name="Estimate">The input itself. The equation's own error enters as a factor of estimate 1.</param>
/// <param name="StandardUncertainty">Standard uncertainty (k = 1) of the input, in its unit; 0 for one that is taken as exact.</param>
/// <param name="Distribution">How the input may lie about its estimate.</param>
/// <param name="Sensitivity">Change of the value for one unit of the input.</param>
internal sealed record UncertaintyContribution(
    string Name, string Unit, double Estimate, double StandardUncertainty, Distribution Distribution, double Sensitivity)
{
    /// <summary>Sensitivity times standard uncertainty, with its sign, in the unit of the value.</summary>
    public double Part => Sensitivity * StandardUncertainty;

    /// <summary>How well the uncertainty itself is known: degrees of freedom of the readings it comes from; infinite for one that is taken as known.</summary>
    public double DegreesOfFreedom { get; init; } = double.PositiveInfinity;

    /// <summary>Share of the variance of the value, 0–1; NaN until the contribution stands in a budget.</summary>
    public double Share { get; internal init; } = double.NaN;
}
