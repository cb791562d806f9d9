using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>An equilibrium as it was asked for, and the chain of numbers that gives it.</summary>
/// <param name="Asked">What was asked for.</param>
/// <param name="What">What is explained, in words.</param>
/// <param name="Explanation">The chain; its last step is the result.</param>
public sealed record ExplainedEquilibrium(EquilibriumCase Asked, string What, Explanation Explanation)
{
    /// <summary>True when the temperature is just outside the range of the equation.</summary>
    public bool NearEdge => Explanation.Status != Status.Ok;

    /// <summary>Explains the concentration at equilibrium, or what a measured concentration stands for.</summary>
    /// <exception cref="InputException">A condition is outside the range of the equation; nothing is extrapolated.</exception>
    public static ExplainedEquilibrium Of(EquilibriumCase asked)
    {
        // Refuses what it would not answer, with the range and the source that sets it, and turns a measured concentration into mg/L.
        GasAtEquilibrium answer = GasAtEquilibrium.Compute(asked);
        if (answer.SaltingOutFactor is double factor)
        {
            throw new InputException($"--ions: the chain is explained for fresh and sea water; explain it with --salinity 0, and for this brine take the concentration times {Number.Significant(factor, 6)} (what the ions leave, weisenberger-schumpe-1996)");
        }

        double t = asked.Temperature.Value;
        double s = asked.Water.Salinity;
        double p = asked.Pressure.Value;
        double x = asked.Phase.MoleFraction.Value;
        double h = asked.Phase.HumidityPercent.Value;
        bool partialPressureGiven = asked.Phase.Kind == GasPhaseKind.PartialPressure;
        if (asked.Measured is null)
        {
            return partialPressureGiven
                ? new ExplainedEquilibrium(asked, "from a partial pressure to the concentration",
                    Explanation.OfPartialPressure(asked.Gas, asked.Equation, t, s, p, asked.Phase.PartialPressureHectopascal.Value, RangeRule.NearEdge))
                : new ExplainedEquilibrium(asked, "concentration in equilibrium with " + (asked.Phase.Kind == GasPhaseKind.Air ? "air" : "a gas mixture"),
                    Explanation.OfEquilibrium(asked.Gas, asked.Equation, t, s, p, x, h, RangeRule.NearEdge));
        }

        double measured = answer.Value(EquilibriumQuantity.MeasuredMilligramsPerLitre).Value;
        return partialPressureGiven || answer.Find(EquilibriumQuantity.PercentLocal) is null
            ? new ExplainedEquilibrium(asked, "from a concentration to the partial pressure",
                Explanation.OfConcentration(asked.Gas, asked.Equation, t, s, p, measured, RangeRule.NearEdge))
            : new ExplainedEquilibrium(asked, "from a concentration to partial pressure and saturation",
                Explanation.OfSaturation(asked.Gas, asked.Equation, t, s, p, measured, x, h, RangeRule.NearEdge));
    }
}
