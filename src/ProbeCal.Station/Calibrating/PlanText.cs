using System;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>What the truth of planned points rests on, from the texts of a command line.</summary>
public static class PlanText
{
    /// <summary>A planned point from the text that its method takes; without a text where the method needs none, or may wait for it.</summary>
    /// <param name="what">The option it was given for.</param>
    /// <param name="planned">Role and method.</param>
    /// <param name="text">The text; null where there is none.</param>
    /// <param name="gas">The gas of the probe.</param>
    /// <param name="register">Certified values by the id of the equipment; null for one that is not there.</param>
    /// <exception cref="InputException">The text is wrong, or the method has no use for one.</exception>
    public static PlannedPoint Read(string what, PlannedPoint planned, string? text, Gas gas, EquipmentValues register)
    {
        return (planned.Method, text) switch
        {
            (MethodIds.GasMixture, null) => throw new InputException($"{what} is missing: a gas mixture has a cylinder, a content and is dry or humid, for example 'CYL-21 20.95% u 0.02% dry'"),
            (_, null) => planned,
            (MethodIds.GasMixture or MethodIds.ZeroGas or MethodIds.WaterSaturatedAir, _) => planned with { Mixture = MixtureText.Parse(what, text, gas, register.MoleFraction) },
            (MethodIds.TransferStandard, _) => planned with { Transfer = TransferText.Parse(what, text, register.Correction) },
            (MethodIds.Titration, _) => planned with { Titration = TitrationText.Parse(what, text, register.Concentration) },
            _ => throw Wrong.Input(what, text, $"{planned.Method} takes no value of its own; leave it out"),
        };
    }

    /// <summary>A further level, <c>METHOD: TEXT</c>.</summary>
    /// <param name="what">The option it was given for.</param>
    /// <param name="role">Role of the level.</param>
    /// <param name="text">What was given.</param>
    /// <param name="gas">The gas of the probe.</param>
    /// <param name="register">Certified values by the id of the equipment.</param>
    /// <exception cref="InputException">There is no such method, or its text is wrong.</exception>
    public static PlannedPoint Level(string what, string role, string text, Gas gas, EquipmentValues register)
    {
        int colon = text.IndexOf(':', StringComparison.Ordinal);
        string method = (colon < 0 ? text : text[..colon]).Trim();
        if (Array.IndexOf(MethodIds.All, method) < 0)
        {
            throw Wrong.Input(what, text, $"there is no method '{Wrong.Shown(method)}'{NearestName.DidYouMean(method, MethodIds.All)}; write METHOD: TEXT, for example 'gas-mixture: CYL-22 10.02% u 0.02% dry'; there are {string.Join(", ", MethodIds.All)}");
        }

        if (MethodIds.IsZero(method))
        {
            throw Wrong.Input(what, text, "a zero is asked for by --zero check or --zero adjust");
        }

        string rest = colon < 0 ? "" : text[(colon + 1)..].Trim();
        return Read(what, new PlannedPoint { Role = role, Method = method }, rest.Length == 0 ? null : rest, gas, register);
    }

    /// <summary>A probe with the response model of a text, <c>MODEL NAME=VALUE …</c>.</summary>
    /// <param name="what">The option it was given for.</param>
    /// <param name="text">What was given.</param>
    /// <param name="probe">The probe so far.</param>
    /// <exception cref="InputException">The model or a coefficient is unknown, missing, or no number.</exception>
    public static RecordedProbe WithModel(string what, string text, RecordedProbe probe)
    {
        return ModelText.Apply(what, text, probe);
    }

    /// <summary>True when the model of a text takes a temperature coefficient of its own; also where the text names no model.</summary>
    /// <param name="text">What was given for the model.</param>
    public static bool TakesTemperatureCoefficient(string text)
    {
        string model = text.Trim().Split(' ')[0].ToLowerInvariant();
        return Array.IndexOf(ModelNames.All, model) < 0 || ModelCoefficients.HasTemperatureCoefficient(model);
    }
}
