using System;
using System.Collections.Generic;
using System.CommandLine;
using System.Globalization;
using System.Threading;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal equilibrium</c>: what water in equilibrium with a gas phase holds there, and how far a measured concentration is from it.</summary>
internal static class EquilibriumCommand
{
    private const int UsualTrials = 1_000_000;
    private const int FewestTrials = 1_000;
    private const int MostTrials = 10_000_000;

    /// <summary>The seed where none is given: any will do, and a fixed one gives the same figures tomorrow.</summary>
    private const int UsualSeed = 1;

    private static readonly TimeSpan QuietTime = TimeSpan.FromSeconds(2);

    internal static Command Create(Terminal terminal)
    {
        EquilibriumOptions options = new();
        Option<string> monteCarlo = new("--monte-carlo") { Description = "Check the uncertainty by so many random trials (JCGM 101); 1000000 when no number is given.", HelpName = "N", Arity = ArgumentArity.ZeroOrOne };
        Option<string> seed = new("--seed") { Description = "Seed of the random trials; the same seed gives the same figures.", HelpName = "N" };
        Option<string> format = new("--format") { Description = "text or json.", DefaultValueFactory = static _ => "text", HelpName = "text|json" };
        WholeFileOptions file = new();
        Command command = new(
            "equilibrium",
            """
            What water in equilibrium with air holds of a gas, and how sure that is.

            Examples:
              probecal equilibrium --temperature 20 --salinity 0 --pressure 760mmHg
              probecal equilibrium --temperature 68F --salinity 35 --pressure 1009hPa \
                --temperature-uncertainty 0.1K
              probecal equilibrium --temperature 8.4 --salinity 0 --altitude 640m --format json
              probecal equilibrium --gas CO2 --mole-fraction 425ppm --temperature 12 --salinity 35 \
                --pressure 1013hPa
              probecal equilibrium --mixture "O2=5%, N2=95%" --temperature 25 --salinity 0 --pressure 1000hPa
              probecal equilibrium --concentration 8.1mg/L --concentration-uncertainty 0.1mg/L \
                --temperature 18 --salinity 0 --pressure 938hPa
              probecal equilibrium --temperature 20 --temperature-within 0.2K --salinity 0 \
                --pressure 938hPa --monte-carlo
              probecal equilibrium --temperature 8.4 --salinity 0 --sea-level-pressure 1021hPa \
                --altitude 640m --air-temperature 12C
              probecal equilibrium --input june.csv --output june-o2.csv \
                --column "temperature=Water temp [C]" --column "pressure=Baro [mmHg]" --salinity 0
            """);
        options.AddTo(command);
        command.Options.Add(monteCarlo);
        command.Options.Add(seed);
        command.Options.Add(format);
        file.AddTo(command);
        command.SetAction(parsed =>
        {
            if (file.IsAsked(parsed, format, monteCarlo, seed))
            {
                return file.Run(parsed, options.Entry(parsed), terminal);
            }

            bool json = OutputShape.IsJson(parsed.GetValue(format)!);
            bool wantsCheck = parsed.GetResult(monteCarlo) is not null;
            int trials = wantsCheck && parsed.GetValue(monteCarlo) is string text ? (int)Number.ParseWhole("--monte-carlo", text, FewestTrials, MostTrials) : UsualTrials;
            string? seedText = parsed.GetValue(seed);
            if (seedText is not null && !wantsCheck)
            {
                throw new InputException("--seed belongs to --monte-carlo, which is not given");
            }

            int seedNumber = seedText is null ? UsualSeed : (int)Number.ParseWhole("--seed", seedText, 0, int.MaxValue);
            GasAtEquilibrium result = GasAtEquilibrium.Compute(options.Entry(parsed).Read());
            foreach (string note in result.Asked.Notes)
            {
                terminal.Error.WriteLine("note: " + note);
            }

            MonteCarloReport? check = wantsCheck ? Check(terminal, result, trials, seedNumber) : null;
            if (json)
            {
                terminal.Output.WriteLine(EquilibriumJson.Of(result, check));
            }
            else
            {
                EquilibriumText.Write(terminal.Page(), result, check);
            }

            return ExitCode.Done;
        });
        return command;
    }

    /// <summary>Checks the values that matter most: the concentration and the partial pressure, or what was made of a measured one.</summary>
    private static MonteCarloReport Check(Terminal terminal, GasAtEquilibrium result, int trials, int seed)
    {
        EquilibriumQuantity[] wanted = result.Asked.Measured is null
            ? [EquilibriumQuantity.MilligramsPerLitre, EquilibriumQuantity.PartialPressure]
            : [EquilibriumQuantity.MeasuredPartialPressure, EquilibriumQuantity.PercentLocal];
        List<EquilibriumCheck> checks = [];
        long begun = terminal.Time.GetTimestamp();
        TimeSpan said = TimeSpan.Zero;
        foreach (EquilibriumQuantity quantity in wanted)
        {
            if (result.Find(quantity) is not null)
            {
                int before = checks.Count;
                checks.Add(result.Check(quantity, trials, seed, done => Progress(before, done), terminal.Stop));
            }
        }

        return new MonteCarloReport(seed, checks);

        void Progress(int before, int done)
        {
            TimeSpan elapsed = terminal.Time.GetElapsedTime(begun);
            if (QuietTime < elapsed - said)
            {
                said = elapsed;
                terminal.Error.WriteLine(string.Create(CultureInfo.InvariantCulture,
                    $"Monte Carlo: {100.0 * (((double)before * trials) + done) / ((double)wanted.Length * trials):F0} % of {wanted.Length} × {trials} trials"));
            }
        }
    }
}

/// <summary>What the random trials gave.</summary>
/// <param name="Seed">Where the random numbers began.</param>
/// <param name="Checks">One for each value that was checked.</param>
internal sealed record MonteCarloReport(int Seed, IReadOnlyList<EquilibriumCheck> Checks);
