using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>The steps of which procedures are made.</summary>
internal static class ProcedureSteps
{
    private const string FieldManual = "USGS TM 9-A6.2";
    private const string OceanGliders = "OceanGliders oxygen SOP";
    private const string CruiseReports = "GO-SHIP cruise reports 2021 (A20, A22)";
    private const string Common = "common practice, no source";

    /// <summary>Before a zero solution is opened.</summary>
    internal static ProcedureStep OtherSensors { get; } = new("other-sensors", StepKind.Do, "Other sensors first")
    {
        Do = ["Calibrate every other sensor of this instrument now, before a zero solution is opened: sulfite spoils conductivity, pH and redox."],
        Cautions = [Cautions.Sulfite],
        Source = FieldManual,
    };

    /// <summary>After a point in humid air.</summary>
    internal static ProcedureStep LookForDroplets { get; } = new("droplets", StepKind.Droplets, "Look for droplets")
    {
        Do = ["Take the probe out and look at membrane and thermometer."],
        LookFor = ["A drop on either spoils the point: dry them off and take the point again."],
        Source = FieldManual,
    };

    /// <summary>After a zero solution.</summary>
    internal static ProcedureStep Rinse { get; } = new("rinse", StepKind.Do, "Rinse off the zero solution")
    {
        Do =
        [
            "Rinse probe, guard and thermometer several times with clean water, each time with fresh water.",
            "Close the zero solution; put a wiper back on only after rinsing it too.",
        ],
        LookFor = ["What is left of sulfite makes the next reading low."],
        Cautions = [Cautions.Sulfite],
        Source = FieldManual + "; " + OceanGliders,
    };

    /// <summary>After a zero that comes last.</summary>
    internal static ProcedureStep LastLook(PlannedPoint span)
    {
        string point = Main(span.Method);
        return new ProcedureStep("again-at-100", StepKind.Enter, "Look at the " + point + " once more")
        {
            Do = ["Put the probe back as for the " + point + " and wait until it is steady."],
            LookFor = ["The reading must be what it was before the zero; if it is lower, rinse again."],
            WriteDown = "the reading there after the zero",
            LeastMinutes = 5,
            MostMinutes = 10,
            Source = OceanGliders + "; wait " + FieldManual,
        };
    }

    /// <summary>What comes before everything.</summary>
    internal static ProcedureStep Prepare(CalibrationSetup setup)
    {
        bool electrode = setup.Probe.Model == ModelNames.Amperometric;
        bool film = setup.Probe.Model is ModelNames.SternVolmer or ModelNames.Uchida2008 or ModelNames.Bittig2018;
        List<string> todo = ["Look at cable, membrane and its age; a probe that is damaged is repaired first."];
        if (electrode)
        {
            todo.Add("Fill in electrolyte without a bubble under the membrane, no wrinkle in it; switch on and let it polarise for 15 min, and leave it on until all is done.");
        }

        if (film)
        {
            todo.Add("A film that was stored dry is kept wet for 24 h first: dry it reads 1 to 2 % low.");
        }

        todo.Add("Compare the thermometer at the probe with one that was checked: 0.2 C is the most they may differ.");
        todo.Add("Read the barometer here, absolute and at this altitude; a value reduced to sea level is not the pressure of this place.");
        todo.Add("Keep sun and wind off probe, water and instruments.");
        return new ProcedureStep("prepare", StepKind.Do, "Probe, thermometer and barometer")
        {
            Do = todo,
            LookFor = [electrode ? "No bubble on or under the membrane, no wrinkle, no crystals." : "Nothing on the membrane or the film, no scratch, no bubble."],
            Cautions = [Cautions.OpenWater],
            LeastMinutes = electrode ? 15 : null,
            Source = "thermometer USGS TM 9-A6.8; barometer " + FieldManual + (electrode ? "; 15 min EPA 841-B-97-003" : film ? "; 24 h " + OceanGliders : ""),
        };
    }

    /// <summary>What is made ready for the first point of a method.</summary>
    internal static IEnumerable<ProcedureStep> Before(CalibrationSetup setup, PlannedPoint point)
    {
        switch (point.Method)
        {
            case MethodIds.AirSaturatedWater:
                yield return new ProcedureStep("aerate", StepKind.Do, "Aerate the water")
                {
                    Do =
                    [
                        "Fill a bucket to three quarters with clean water near room temperature and blow outdoor air through it for 30 min or more.",
                        "Then stop the air, take the stone out and stir gently, with the surface open, until the bubbles are gone.",
                    ],
                    LookFor =
                    [
                        "Bubbles let go under water dissolve under more than the air's pressure: 0.3 m down that is up to 3 % too much oxygen.",
                        "Water that was just warmed holds too much oxygen, for it has not yet given it off.",
                    ],
                    Cautions = [Cautions.Mains],
                    LeastMinutes = 30,
                    Source = "30 min " + FieldManual + "; stone out and lift test " + OceanGliders + "; 3 % computed",
                };
                break;
            case MethodIds.WaterSaturatedAir when ModelNames.IsTotalPressure(setup.Probe.Model):
                yield return new ProcedureStep("open-air", StepKind.Do, "Probe in open air")
                {
                    Do = ["Take the probe out of the water, dry its face without pressing on it, and hang it in open air in the shade."],
                    LookFor = ["No drop and no bubble on the face; the difference to the barometer goes to zero."],
                    Source = "Standard Methods 2810, introduction",
                };
                break;
            case MethodIds.WaterSaturatedAir:
                yield return new ProcedureStep("chamber", StepKind.Do, "Make the chamber humid")
                {
                    Do =
                    [
                        "Wet the chamber, drain it to a film and leave a few drops at its bottom (or wrap two full turns of a wet towel around the probe's guard).",
                        "Wipe drops off membrane and thermometer, put the probe in and leave the cap loose: a closed chamber has a pressure of its own.",
                    ],
                    LookFor = ["The chamber is at the temperature of the probe, out of sun and wind."],
                    Source = FieldManual,
                };
                break;
            case MethodIds.Titration:
                yield return new ProcedureStep("flasks", StepKind.Enter, "Flasks and reagents for the titration")
                {
                    Do =
                    [
                        "Set out 4 to 6 flasks of known volume, manganese solution, alkaline iodide, acid, titrant and its standard.",
                        "Titrate the standard and a blank today: thiosulfate loses strength.",
                    ],
                    LookFor = ["What is in the water: chlorine, sulfite, nitrite without azide, iron, colour or sludge spoil a titration."],
                    WriteDown = "flask volumes, and date and result of standard and blank",
                    Cautions = [Cautions.AlkalineIodide, Cautions.Acid],
                    Source = "samples " + OceanGliders + "; standards and blanks daily " + CruiseReports + "; interferents EPA method 360.1",
                };
                break;
            case MethodIds.GasMixture:
                yield return GasLine(setup, point, point.Role == CalibrationIds.SpanPoint ? "cylinder" : "cylinder-" + point.Role, "Cylinder and gas line");
                break;
            case MethodIds.TransferStandard:
                yield return new ProcedureStep("standard", StepKind.Enter, "The standard beside the probe")
                {
                    Do =
                    [
                        "Check that the standard's own calibration is in date, and set its salinity and pressure to those of this water.",
                        "Hang both in the same moving water, side by side and at one depth, and leave them for 5 min.",
                    ],
                    LookFor = ["Neither stands in bubbles, near the bottom or in the other's wake."],
                    WriteDown = "id of the standard and date of its calibration",
                    Cautions = [Cautions.OpenWater],
                    LeastMinutes = 5,
                    Source = "first soak " + FieldManual + "; side by side: " + Common,
                };
                break;
            case MethodIds.ZeroSolution:
                yield return ZeroSolution(setup, point);
                break;
            case MethodIds.ZeroGas:
                yield return GasLine(setup, point, IdOf("zero-gas", point), "Zero gas");
                break;
            default:
                break;
        }
    }

    /// <summary>The point itself.</summary>
    internal static ProcedureStep Point(CalibrationSetup setup, PlannedPoint point)
    {
        string title = point.Role switch
        {
            CalibrationIds.SpanPoint when MethodIds.IsZero(point.Method) => "Zero point",
            CalibrationIds.SpanPoint => Main(point.Method) is "100 % point" ? "100 % point" : "Main point",
            CalibrationIds.ZeroPoint => "Zero point",
            _ => "Point " + point.Role,
        };
        ProcedureStep step = new("point-" + point.Role, StepKind.Point, title + ", " + Words(point.Method)) { Role = point.Role };
        switch (point.Method)
        {
            case MethodIds.AirSaturatedWater:
                return step with
                {
                    Do =
                    [
                        "Put the probe in, not over bubbles, with none on the membrane, and keep the water moving as a probe of this kind needs it.",
                        "Wait until temperature and signal are both steady, then take the point.",
                    ],
                    LookFor = ["Lift the probe to just above the surface: the reading must not change, or the water is not in equilibrium with the air."],
                    LeastMinutes = 5,
                    MostMinutes = 10,
                    Source = "wait " + FieldManual + "; lift test " + OceanGliders,
                };
            case MethodIds.WaterSaturatedAir when ModelNames.IsTotalPressure(setup.Probe.Model):
                return step with
                {
                    Do = ["Wait until the pressure is steady, then take the point: it should be the barometer's."],
                    LookFor = ["The membrane passes gas slowly: minutes to tens of minutes."],
                    LeastMinutes = 10,
                    MostMinutes = 30,
                    Source = "slow response Standard Methods 2810, introduction; minutes: " + Common,
                };
            case MethodIds.WaterSaturatedAir:
                return step with
                {
                    Do = ["Wait until vapour, temperature and signal are all steady, then take the point."],
                    LookFor = ["A slow drift to one side means that probe and chamber differ in temperature; 2 to 3 % too high means that the chamber is dry."],
                    LeastMinutes = 5,
                    MostMinutes = 10,
                    Source = FieldManual + "; dry chamber computed",
                };
            case MethodIds.Titration:
                return step with
                {
                    Do =
                    [
                        "Put the probe into the water that is sampled and wait until temperature and signal are steady.",
                        "Draw 4 to 6 samples beside the probe, 5 to 10 min apart: rinse each flask three times, fill it through a tube from the bottom, let three volumes overflow, and read its temperature.",
                        "Fix each at once: 1 mL of manganese solution and 1 mL of alkaline iodide under the surface, stopper without a bubble, shake; shake again after 30 to 60 min.",
                        "Titrate 2 to 12 h later: add the acid, stir until it is clear, titrate the whole flask (or a measured part of it).",
                        "Enter the titres when asked; the reading of the probe is kept until then.",
                    ],
                    LookFor =
                    [
                        "The signal stays steady while the samples are drawn.",
                        "No bubble in a flask; brown precipitate all through it.",
                        "Below 20 umol/kg (0.64 mg/L) a titration is not for use.",
                    ],
                    WriteDown = "temperature at drawing, titre of each flask, blank, titrant",
                    Cautions = [Cautions.AlkalineIodide, Cautions.Acid, Cautions.OpenWater],
                    LeastMinutes = 5,
                    MostMinutes = 10,
                    Source = "wait " + FieldManual + "; drawing, fixing and titration " + CruiseReports + "; samples, spacing and least oxygen " + OceanGliders,
                };
            case MethodIds.GasMixture:
                return step with
                {
                    Do =
                    [
                        "Let the gas" + CylinderOf(point) + " flow over the membrane (or through the water in which the probe stands) and keep it flowing.",
                        "Leave the outlet open, so that the gas is at the barometer's pressure; wait until temperature and signal are steady, then take the point.",
                    ],
                    LookFor =
                    [
                        "More flow changes nothing any more: if it does, air comes in from outside or the gas pushes up the pressure.",
                        "No drop on the membrane when the gas is humid.",
                        .. PlanCheck.IsProportional(setup.Probe)
                            ? ["In gas the signal is 1 to 3 % higher than in stirred water of the same partial pressure: let the gas through water where that counts."]
                            : Array.Empty<string>(),
                    ],
                    Cautions = Cautions.OfCylinder(setup.Gas, point.Mixture?.MoleFraction.Value ?? double.NaN),
                    LeastMinutes = 5,
                    Source = "through 100 mL of water or less 3 to 5 min " + OceanGliders + "; over a membrane: " + Common + "; 1 to 3 % from memory",
                };
            case MethodIds.TransferStandard:
                return step with
                {
                    Do = ["Wait until both are steady, take the point, and read the standard at the same time: the middle of three readings."],
                    LookFor = ["Probe and standard move together; if one lags, wait for quieter water."],
                    WriteDown = "what the standard showed, with its unit",
                    Cautions = [Cautions.OpenWater],
                    LeastMinutes = 1,
                    Source = "60 s and median of three USGS TM 9-A6.8",
                };
            case MethodIds.ZeroSolution:
                return step with
                {
                    Do =
                    [
                        "Take wiper and sponge off, put the probe into the zero solution without a bubble on the membrane, and cover the beaker.",
                        "Wait until temperature and signal are steady, then take the point.",
                    ],
                    LookFor = ["More than 0.2 mg/L: make the solution fresh once; if it stays, the membrane or the film needs service."],
                    Cautions = [Cautions.Sulfite],
                    LeastMinutes = 5,
                    MostMinutes = 10,
                    Source = FieldManual,
                };
            default:
                return step with
                {
                    Do = ["Keep the gas flowing all the time; wait until temperature and signal are steady, then take the point."],
                    LookFor = ["More than 0.2 mg/L: air leaks in; close the vessel better and let more gas through."],
                    Cautions = Cautions.OfCylinder(setup.Gas, point.Mixture?.MoleFraction.Value ?? double.NaN),
                    LeastMinutes = 3,
                    MostMinutes = 5,
                    Source = "time " + OceanGliders + "; limit " + FieldManual,
                };
        }
    }

    /// <summary>The 100 % point again, after the adjustment.</summary>
    internal static ProcedureStep AsLeft(CalibrationSetup setup, PlannedPoint span, bool moved)
    {
        bool typed = setup.Readings == CalibrationIds.Typed;
        string main = Main(span.Method);
        List<string> todo =
        [
            moved ? "Put the probe back as for the " + main + "." : "Leave the probe as it stood for the " + main + "; put it back if it was taken out.",
            typed ? "Set the meter to the value that is shown, wait until it is steady, and read it again." : "Wait: fresh readings now check the new calibration (as left).",
        ];
        if (span.Method == MethodIds.Titration)
        {
            todo.Add("The water must still be that of the samples, closed off and within 0.2 C; otherwise draw and titrate again.");
        }

        bool oxygen = setup.Gas == Gas.Oxygen && !ModelNames.IsTotalPressure(setup.Probe.Model);
        ProcedureStep point = Point(setup, span);
        return new ProcedureStep("point-" + CalibrationIds.AsLeftPoint, StepKind.Point, (main is "100 % point" ? main : "Main point") + " as left")
        {
            Role = CalibrationIds.AsLeftPoint,
            Do = todo,
            LookFor = [oxygen ? "Within 0.2 mg/L or 2 % of the reference, whichever is larger." : "The reading is the reference within what the work needs."],
            Cautions = span.Method == MethodIds.GasMixture ? point.Cautions : [],
            LeastMinutes = point.LeastMinutes,
            MostMinutes = point.MostMinutes,
            Source = (oxygen ? "limit " + FieldManual + "; " : "") + WaitSource(setup, span.Method),
        };
    }

    /// <summary>Only water and air in equilibrium are at 100 %.</summary>
    private static string Main(string method)
    {
        return method is MethodIds.AirSaturatedWater or MethodIds.WaterSaturatedAir ? "100 % point" : "main point";
    }

    private static string WaitSource(CalibrationSetup setup, string method)
    {
        return "wait " + method switch
        {
            MethodIds.WaterSaturatedAir when ModelNames.IsTotalPressure(setup.Probe.Model) => Common,
            MethodIds.GasMixture => OceanGliders + ", over a membrane " + Common,
            MethodIds.TransferStandard => "USGS TM 9-A6.8",
            _ => FieldManual,
        };
    }

    private static ProcedureStep ZeroSolution(CalibrationSetup setup, PlannedPoint point)
    {
        bool adjusts = setup.ZeroPlan == CalibrationIds.ZeroAdjust;
        string grams = adjusts ? "about 20 g, so that some stays undissolved," : "about 2 g";
        return new ProcedureStep(IdOf("zero-solution", point), StepKind.Enter, adjusts ? "Zero solution for an adjustment" : "Zero solution for a check")
        {
            Do = ["Dissolve " + grams + " of sodium sulfite in 1 L of clean water; make it fresh, and keep it closed."],
            LookFor =
            [
                adjusts
                    ? "An adjusted zero can spoil a good one from the factory: adjust when less than 2 mg/L is expected and the check failed, or when the data need it."
                    : "Solution older than a week has taken up oxygen.",
            ],
            WriteDown = "lot of the sulfite and when the solution was made",
            Cautions = [Cautions.Sulfite, Cautions.Cobalt],
            Source = adjusts ? "20 g " + OceanGliders + "; when to adjust " + FieldManual : FieldManual,
        };
    }

    private static ProcedureStep GasLine(CalibrationSetup setup, PlannedPoint point, string id, string title)
    {
        bool humid = point.Mixture is { RelativeHumidityPercent.Value: > 0 };
        List<string> todo = ["Connect the cylinder" + CylinderOf(point) + " by a line that lets no air in, and purge line and vessel with five times their volume."];
        if (MethodIds.IsZero(point.Method))
        {
            todo.Insert(0, setup.Gas == Gas.Oxygen ? "Take nitrogen that holds next to no oxygen." : "Take a gas that holds none of the gas of the probe, nitrogen or air without it.");
        }

        if (humid)
        {
            todo.Add("Lead the gas through a washing bottle of clean water at the temperature of the probe, with no drop carried over.");
        }

        return new ProcedureStep(id, StepKind.Enter, title)
        {
            Do = todo,
            LookFor = ["The certificate is in date and names this cylinder; the gas comes out at the temperature of the room."],
            WriteDown = "number of the certificate, its date, and the pressure left in the cylinder",
            Cautions = Cautions.OfCylinder(setup.Gas, point.Mixture?.MoleFraction.Value ?? double.NaN),
            Source = "purging: " + Common,
        };
    }

    private static string CylinderOf(PlannedPoint point)
    {
        return point.Mixture is RecordedMixture mixture ? " " + mixture.Cylinder : "";
    }

    /// <summary>Ids stay unique where a plan has two zeros by one method.</summary>
    private static string IdOf(string id, PlannedPoint point)
    {
        return point.Role == CalibrationIds.ZeroPoint ? id : id + "-" + point.Role;
    }

    private static string Words(string method)
    {
        return method switch
        {
            MethodIds.AirSaturatedWater => "air-saturated water",
            MethodIds.WaterSaturatedAir => "water-saturated air",
            MethodIds.Titration => "titration",
            MethodIds.GasMixture => "gas mixture",
            MethodIds.TransferStandard => "transfer standard",
            MethodIds.ZeroSolution => "zero solution",
            _ => "zero gas",
        };
    }
}
