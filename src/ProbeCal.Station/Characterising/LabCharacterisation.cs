using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Characterising;

/// <summary>From the files of a laboratory run to what they say of the probe.</summary>
public static class LabCharacterisation
{
    private static readonly string[] PartNames = [ZeroPart.Name, TemperaturePart.Name, LinearityPart.Name, StepPart.Up, StepPart.Down, StirringPart.Name];

    /// <summary>Reads, fits, judges.</summary>
    /// <exception cref="InputException">A file, a column or the run itself cannot be used; one line says why.</exception>
    /// <exception cref="WorkFailedException">A file cannot be read.</exception>
    public static Characterisation Run(CharacterisationRequest request)
    {
        Dictionary<string, string> files = Files(request.Inputs);
        TemperaturePart.FormOf(request.Form);
        double reference = Quantity.Parse(QuantityKind.Temperature, "--reference-temperature", request.ReferenceTemperature);
        double after = request.StepAfter is null ? 0 : Quantity.Parse(QuantityKind.Duration, "--step-after", request.StepAfter);
        List<CharacterisedPart> parts = [];
        List<LabRun> runs = [];
        LabRun? Read(string part, params string[] required)
        {
            if (!files.TryGetValue(part, out string? path))
            {
                return null;
            }

            LabRun run = LabRun.Read(part, path, request, required);
            runs.Add(run);
            return run;
        }

        ZeroSignal? zero = request.Zero is null ? null : ZeroPart.Parse(request.Zero);
        if (Read(ZeroPart.Name, LabRun.Signal) is LabRun zeroRun)
        {
            zero = zero is null ? null : throw new InputException("--zero and --input zero=… say the same thing; leave one out");
            parts.Add(ZeroPart.Fit(zeroRun, out zero));
        }

        RecordedTemperatureCoefficient? recorded = request.Coefficient is null ? null : CoefficientText.Parse("--coefficient", request.Coefficient);
        ProbeGain? gain = recorded is null ? null : ProbeGain.Of(recorded);
        string? text = null;
        if (Read(TemperaturePart.Name, LabRun.Signal, LabRun.Temperature, LabRun.PartialPressure + "|" + LabRun.Pressure) is LabRun warm)
        {
            recorded = recorded is null ? null : throw new InputException("--coefficient and --input temperature=… say the same thing; leave one out");
            CharacterisedPart part = TemperaturePart.Fit(warm, request.Form, reference, Needed(zero, warm), out ProbeGain fitted);
            parts.Add(part);
            gain = fitted;
            recorded = Recorded(part, fitted, warm);
            text = recorded is null ? null : CoefficientText.Print(recorded);
        }

        if (Read(LinearityPart.Name, LabRun.Signal, LabRun.PartialPressure + "|" + LabRun.Pressure) is LabRun levels)
        {
            parts.Add(LinearityPart.Fit(levels, gain));
        }

        foreach (string direction in new[] { StepPart.Up, StepPart.Down })
        {
            if (Read(direction, LabRun.Signal, LabRun.Time) is LabRun step)
            {
                parts.Add(StepPart.Fit(step, after));
            }
        }

        if (Read(StirringPart.Name, LabRun.Signal, LabRun.Stirring) is LabRun stirring)
        {
            parts.Add(StirringPart.Fit(stirring, Needed(zero, stirring), gain));
        }

        string[] units = [.. runs.Select(static run => run.SignalUnit).Distinct()];
        return 1 < units.Length
            ? throw new InputException($"the signal comes in different units ({string.Join(", ", units.Select(static unit => unit.Length == 0 ? "none" : Wrong.Shown(unit)))}); name one unit for all files")
            : new Characterisation
            {
                Probe = request.Probe,
                SignalUnit = units[0],
                InputPaths = [.. files.Values],
                Files = [.. runs.Select(static run => (run.Part, run.Name))],
                Parts = parts,
                TemperatureCoefficient = text is null ? null : recorded,
                CoefficientText = text,
                Firmware = Firmware(parts, gain, files.ContainsKey(TemperaturePart.Name), runs),
                FirmwareTexts = files.ContainsKey(TemperaturePart.Name) ? [("temperature-form", request.Form.ToLowerInvariant())] : [],
            };
    }

    private static Dictionary<string, string> Files(IReadOnlyList<string> inputs)
    {
        Dictionary<string, string> files = [];
        foreach (string input in inputs)
        {
            int equals = input.IndexOf('=', StringComparison.Ordinal);
            string part = equals < 0 ? input : input[..equals].Trim();
            if (equals <= 0 || input.Length == equals + 1)
            {
                throw Wrong.Input("--input", input, $"write which part of the run the file holds, for example temperature=temps.csv; the parts are {string.Join(", ", PartNames)}");
            }

            if (!PartNames.Contains(part))
            {
                throw Wrong.Input("--input", input, $"there is no part {Wrong.Shown(part)}{NearestName.DidYouMean(part, PartNames)}; the parts are {string.Join(", ", PartNames)}");
            }

            if (!files.TryAdd(part, input[(equals + 1)..]))
            {
                throw Wrong.Input("--input", input, $"the {part} part is given twice; put its rows into one file");
            }
        }

        return files.Count != 0 ? files : throw new InputException($"--input is missing: say which part of the run is in which file, for example --input temperature=temps.csv; the parts are {string.Join(", ", PartNames)}");
    }

    private static ZeroSignal Needed(ZeroSignal? zero, LabRun run)
    {
        return zero ?? throw new InputException($"{run.Name}: the {run.Part} part needs the signal without the gas; add --input zero=FILE, or --zero VALUE");
    }

    private static RecordedTemperatureCoefficient? Recorded(CharacterisedPart part, ProbeGain gain, LabRun run)
    {
        if (gain.Form is not TemperatureCoefficientForm form)
        {
            return null;
        }

        Estimate coefficient = part.Parameters[1];
        return new RecordedTemperatureCoefficient
        {
            Form = RecordNames.Of(form),
            Value = coefficient.Value,
            Unit = coefficient.Unit,
            StandardUncertainty = coefficient.StandardUncertainty,
            ReferenceCelsius = gain.Reference,
            FittedLowCelsius = run.Rows.Min(static row => row.Celsius),
            FittedHighCelsius = run.Rows.Max(static row => row.Celsius),
            Source = "characterised",
        };
    }

    private static List<Estimate> Firmware(List<CharacterisedPart> parts, ProbeGain? gain, bool fitted, List<LabRun> runs)
    {
        List<Estimate> all = [];
        if (fitted)
        {
            LabRun warm = runs.First(static run => run.Part == TemperaturePart.Name);
            all.Add(new("temperature-reference", gain!.Reference, 0, "C"));
            all.Add(new("temperature-low", warm.Rows.Min(static row => row.Celsius), 0, "C"));
            all.Add(new("temperature-high", warm.Rows.Max(static row => row.Celsius), 0, "C"));
        }

        foreach (CharacterisedPart part in parts)
        {
            // The end and the jump of a step belong to the record, not to the probe.
            all.AddRange(part.Parameters.Where(static each => each.Name is not ("end" or "jump")));
            all.AddRange(part.Derived);
        }

        return all;
    }
}
