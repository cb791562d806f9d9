using System;
using System.Collections.Generic;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>What Core refused, in the one line that a person reads: the value, the range, the source that sets it, and what would take it.</summary>
internal static class EquilibriumRefusal
{
    /// <summary>Lets a good status and a near edge pass.</summary>
    /// <exception cref="InputException">Anything else.</exception>
    internal static void Expect(Status status, EquilibriumCase asked)
    {
        if (status != Status.Ok && !EquilibriumModel.IsNearEdge(status))
        {
            throw new InputException(Line(status, asked));
        }
    }

    private static string Line(Status status, EquilibriumCase asked)
    {
        EquationRange range = EquationRange.Of(asked.Gas, asked.Equation, asked.Water.Salinity);
        string equation = EquationNames.NameOf(asked.Equation);
        string gas = GasNames.NameOf(asked.Gas);
        string source = Invariant($"{equation}, which holds for {gas} from");
        switch (StatusParts.Input(status))
        {
            case InputQuantity.Temperature:
                double celsius = asked.Temperature.Value;
                if (asked.Water.Brine is not null && range.LowestCelsius <= celsius && celsius <= range.HighestCelsius)
                {
                    return Invariant($"--temperature {celsius:G10} °C is outside the salting-out constants of {gas} (weisenberger-schumpe-1996), which hold from {SaltingOutWeisenbergerSchumpe1996.LowestCelsius} to {SaltingOutWeisenbergerSchumpe1996.HighestCelsius} °C, for some gases at {SaltingOutWeisenbergerSchumpe1996.ReferenceCelsius} °C alone");
                }

                string advice = range.HighestCelsius < celsius && celsius is > 40 and < 110 ? "; if it was read in °F, write for example " + Number.Print(celsius) + "F" : "";
                return Invariant($"--temperature {celsius:G10} °C is outside {source} {range.Temperatures}{Instead(asked)}{advice}");
            case InputQuantity.Salinity:
                return Invariant($"{asked.Water.Described} is outside {source} 0 to {range.HighestSalinity}{Instead(asked)}");
            case InputQuantity.Pressure:
                return Invariant($"the pressure {asked.Pressure.Value} hPa is outside what is computed for {gas}, {EquationRange.LowestHectopascal} to {range.HighestHectopascal} hPa ({EquationRange.LowestHectopascal / PressureUnits.HectopascalPerAtmosphere} to {range.HighestHectopascal / PressureUnits.HectopascalPerAtmosphere:0.##} atm)")
                    + (range.HighestHectopascal <= EquationRange.HighestMoistAirHectopascal && range.HighestHectopascal < asked.Pressure.Value
                        ? ": above it the volume of the dissolved gas would be needed, which is not known here for " + gas : "");
            case InputQuantity.PartialPressure:
                return asked.Phase.Kind == GasPhaseKind.PartialPressure
                    ? Invariant($"--partial-pressure {asked.Phase.PartialPressureHectopascal.Value} hPa is more than is computed for {gas}, at most {range.HighestHectopascal} hPa")
                    : Invariant($"--concentration {asked.Measured?.Text} stands for a partial pressure above {range.HighestHectopascal} hPa, more than is computed for {gas}");
            case InputQuantity.Concentration:
                return $"--concentration {asked.Measured?.Text} is more than {equation} turns into a partial pressure of {gas}; look at its unit";
            case InputQuantity.Equation:
                return $"--equation {equation} does not cover {gas}";
            case InputQuantity.Gas when asked.Water.Brine is not null:
                return $"--ions: there are no salting-out constants for {gas} (weisenberger-schumpe-1996)";
            case InputQuantity.Gas:
                return $"--gas {gas}: there is no data for it here";
            default:
                return Invariant($"{status}: T {asked.Temperature.Value} °C, S {asked.Water.Salinity}, P {asked.Pressure.Value} hPa");
        }
    }

    /// <summary>Which other equations of the gas would take this water.</summary>
    private static string Instead(EquilibriumCase asked)
    {
        List<string> names = [];
        foreach (SolubilityEntry entry in Catalogue.SolubilitiesOf(asked.Gas))
        {
            Status status = GasUncertainty.EquationRelative(
                asked.Gas, entry.Equation, asked.Temperature.Value, asked.Water.Salinity, asked.Pressure.Value, RangeRule.Refuse, out _);
            if (status == Status.Ok)
            {
                names.Add(entry.Source.Name);
            }
        }

        return names.Count == 0 ? "" : "; --equation " + string.Join(" or ", names) + " takes it";
    }

    private static string Invariant(FormattableString text)
    {
        return text.ToString(CultureInfo.InvariantCulture);
    }
}
