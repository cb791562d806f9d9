using System;
using System.Collections.Generic;
using System.CommandLine;
using System.IO;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal equations</c>: which gases and equations there are, where they hold and what speaks for them.</summary>
internal static class EquationsCommand
{
    private static readonly string[] Formats = ["text", "markdown", "json"];

    internal static Command Create(Terminal terminal)
    {
        Option<string> gas = new("--gas") { Description = "Only this gas: O2, nitrogen, CFC-11.", HelpName = "GAS" };
        Option<string> format = new("--format") { Description = "text, markdown or json.", DefaultValueFactory = static _ => "text", HelpName = "text|markdown|json" };
        Command command = new(
            "equations",
            """
            The gases and their solubility equations: range, stated accuracy, evidence, which is the default and why.

            Examples:
              probecal equations
              probecal equations --gas N2
              probecal equations --format json
            """)
        {
            gas, format,
        };
        command.SetAction(parsed =>
        {
            string shape = parsed.GetValue(format)!;
            if (Array.IndexOf(Formats, shape) < 0)
            {
                throw Wrong.Input("--format", shape, $"there is no such form{NearestName.DidYouMean(shape, Formats)}; there are text, markdown and json");
            }

            Gas? only = parsed.GetValue(gas) is string given ? GasNames.Parse("--gas", given) : null;
            GasEntry[] gases = [.. Catalogue.Gases.Where(entry => only is null || entry.Gas == only)];
            switch (shape)
            {
                case "json":
                    terminal.Output.WriteLine(EquationsJson.Of(gases));
                    break;
                case "markdown":
                    WriteMarkdown(terminal.Output, gases);
                    break;
                default:
                    WriteText(terminal.Page(), gases, only is not null);
                    break;
            }

            return ExitCode.Done;
        });
        return command;
    }

    private static void WriteText(TextWriter output, GasEntry[] gases, bool atLength)
    {
        foreach (GasEntry gas in gases)
        {
            output.WriteLine($"{gas.Symbol}  {gas.Name}, {Number.Print(gas.GramsPerMole)} g/mol, {InAir(gas)}");
            List<string[]> rows = [];
            foreach (SolubilityEntry entry in Catalogue.SolubilitiesOf(gas.Gas))
            {
                rows.Add([entry.IsDefault ? "*" : "", entry.Source.Name, entry.Range, entry.StatedAccuracy]);
            }

            TextTable.Write(output, rows, "  ");
            if (atLength)
            {
                output.WriteLine();
                foreach (SolubilityEntry entry in Catalogue.SolubilitiesOf(gas.Gas))
                {
                    output.WriteLine("  " + entry.Source.Name);
                    TextTable.Write(output, Facts(entry), "    ");
                }
            }

            output.WriteLine();
        }

        output.WriteLine(atLength ? "* the default" : "* the default of the gas; 'probecal equations --gas O2' gives citation, evidence and reasons");
    }

    private static List<string[]> Facts(SolubilityEntry entry)
    {
        return
        [
            ["gives", entry.Quantity + (entry.Unit.Length == 0 ? "" : ", " + entry.Unit)],
            ["range", entry.Range + ", " + Pressures(entry)],
            ["accuracy", entry.StatedAccuracy],
            ["evidence", entry.Evidence.Words],
            [entry.IsDefault ? "default" : "alternative", entry.Why],
            ["source", entry.Source.Citation + ", doi:" + entry.Source.Doi],
        ];
    }

    private static void WriteMarkdown(TextWriter output, GasEntry[] gases)
    {
        output.WriteLine("| gas | equation | gives | range | stated accuracy | evidence | default |");
        output.WriteLine("|---|---|---|---|---|---|---|");
        foreach (SolubilityEntry entry in gases.SelectMany(static gas => Catalogue.SolubilitiesOf(gas.Gas)))
        {
            output.WriteLine($"| {GasNames.NameOf(entry.Gas)} | {entry.Source.Name} | {entry.Quantity}, {entry.Unit} | {entry.Range} | {entry.StatedAccuracy} | {entry.Evidence.Words} | {(entry.IsDefault ? "default: " : "")}{entry.Why} |");
        }
    }

    private static string Pressures(SolubilityEntry entry)
    {
        return Number.Print(GasEquilibrium.LowestHectopascal) + " to " + Number.Print(entry.HighestHectopascal) + " hPa";
    }

    private static string InAir(GasEntry gas)
    {
        return double.IsNaN(gas.DryAirMoleFraction) ? "no settled amount in air" : Number.Significant(gas.DryAirMoleFraction * 1e6, 6) + " ppm of dry air";
    }
}
