using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using static ProbeCal.Station.Calibrating.Finding;

namespace ProbeCal.Station.Calibrating;

/// <summary>The guards on reference equipment and on what was done to the probe, by the register and the service events.</summary>
internal static class EquipmentGuards
{
    /// <summary>A barometer is checked at least this often, days: yearly (TM 9-A6.2).</summary>
    public const int BarometerCheckDays = 365;

    /// <summary>A zero solution is made fresh within this many days: the week (TM 9-A6.2).</summary>
    public const double ZeroSolutionDays = 7;

    /// <summary>Age of a membrane that is noted where no life was entered, days: they are commonly changed every 6 to 24 months (common practice, no source).</summary>
    public const double MembraneNoteDays = 183;

    /// <summary>Time after switching on polarisation before calibrating, min (EPA 841-B-97-003).</summary>
    public const double PolarisationMinutes = 15;

    /// <summary>Time in water after dry storage, h (OceanGliders oxygen SOP).</summary>
    public const double RewettingHours = 24;

    /// <summary>What a film that was stored dry keeps of its signal: 1 to 2 % low (OceanGliders oxygen SOP), the larger.</summary>
    private const double DrySignal = 0.98;

    // Errors that the size of the effect is shown for; they are no limits.
    private const double ShownHectopascal = 1;
    private const double ShownKelvin = 0.2;
    private const double ShownPercent = 1;
    private const double ShownZeroMilligramsPerLitre = AcceptanceLimit.ZeroMilligramsPerLitre;

    /// <summary>All of them.</summary>
    public static IReadOnlyList<Guard> All { get; } =
    [
        new(GuardNames.BarometerUnchecked, "the barometer, checked against a reference first", Barometer)
        {
            Limit = "checked within 365 days; one that is not in the register is noted",
            Source = LimitSources.FieldManual,
            Severities = [FindingSeverity.Note, FindingSeverity.NeedsReason],
        },
        new(GuardNames.ThermometerUnchecked, "the thermometer, checked against a reference first", Thermometer)
        {
            Limit = "a check on record; one that is not in the register is noted",
            Source = LimitSources.Multiparameter,
            Severities = [FindingSeverity.Note, FindingSeverity.NeedsReason],
        },
        new(GuardNames.EquipmentOverdue, "reference equipment whose certificate or life has run out", Overdue)
        {
            Limit = "the due date or the life in the register",
            Source = LimitSources.Entered,
            Severities = [FindingSeverity.NeedsReason],
        },
        new(GuardNames.ZeroSolutionAge, "the age of the zero solution", ZeroSolution)
        {
            Limit = "7 days, or the life in the register",
            Source = LimitSources.FieldManual,
            Severities = [FindingSeverity.NeedsReason],
        },
        new(GuardNames.MembraneLife, "the age of the membrane or cap", Membrane)
        {
            Limit = "the life in the register wants a reason; without one a note after 183 days",
            Source = "changed every 6 to 24 months: " + LimitSources.CommonPractice,
            Severities = [FindingSeverity.Note, FindingSeverity.NeedsReason],
        },
        new(GuardNames.Polarisation, "the time since polarisation was switched on, or membrane or electrolyte changed", Polarisation)
        {
            Limit = "15 min",
            Source = LimitSources.VolunteerManual,
            Severities = [FindingSeverity.NeedsReason],
        },
        new(GuardNames.Rewetting, "the time in water since the probe was stored dry", Rewetting)
        {
            Limit = "24 h",
            Source = LimitSources.OceanGliders,
            Severities = [FindingSeverity.NeedsReason],
        },
    ];

    private static Finding? Barometer(Situation now)
    {
        string source = now.Setup.Pressure.Source;
        if (now.Register is not { } register || !source.StartsWith("barometer:", StringComparison.Ordinal))
        {
            return null;
        }

        string id = source["barometer:".Length..];
        return Checked(now, GuardNames.BarometerUnchecked, "barometer " + id, Find(register, id), BarometerCheckDays, Text($"were it {Number.Print(ShownHectopascal)} hPa too high"),
            PossibleError.OfReference(now.SaturationMilligramsPerLitre, now.SaturationAt(now.TemperatureCelsius, now.PressureHectopascal - ShownHectopascal)));
    }

    private static Finding? Thermometer(Situation now)
    {
        if (now.Register is not { } register)
        {
            return null;
        }

        string id = now.Setup.Probe.Thermometer.Id;
        string name = id == now.Setup.Probe.Id ? "the probe's own thermometer" : "thermometer " + id;
        return Checked(now, GuardNames.ThermometerUnchecked, name, Find(register, id), null, Text($"were it {Number.Print(ShownKelvin)} K too high"),
            TooWarm(now));
    }

    /// <summary>A finding when no check is on record, or the last one is too long ago.</summary>
    private static Finding? Checked(Situation now, string guard, string name, EquipmentRecord? known, int? longest, string were, PossibleError error)
    {
        string advice = "check it against a reference and enter the day with 'register add' and --calibrated; its error goes into every reading";
        if (known == null)
        {
            return new Finding(guard, FindingSeverity.Note, Text($"{name} is not in the register, so no check against a reference is on record; {were}"), error, advice);
        }

        if (known.CalibratedOn is not DateOnly day)
        {
            return new Finding(guard, FindingSeverity.NeedsReason, Text($"{name} is in the register without a check against a reference; {were}"), error, advice);
        }

        int days = now.Today.DayNumber - day.DayNumber;
        return longest is int most && most < days
            ? new Finding(guard, FindingSeverity.NeedsReason, Text($"{name} was last checked {days} days ago, on {day:yyyy-MM-dd} (limit {most} days, TM 9-A6.2); {were}"), error, advice)
            : null;
    }

    private static Finding? Overdue(Situation now)
    {
        EquipmentRecord[] overdue = [.. InUse(now).Where(item => item.EquipmentKind is not ("membrane" or "zero-solution") && item.LastDay < now.Today)];
        if (overdue.Length == 0)
        {
            return null;
        }

        (string were, PossibleError error) = overdue[0].EquipmentKind switch
        {
            "barometer" => (Text($"were it {Number.Print(ShownHectopascal)} hPa too high"),
                PossibleError.OfReference(now.SaturationMilligramsPerLitre, now.SaturationAt(now.TemperatureCelsius, now.PressureHectopascal - ShownHectopascal))),
            "thermometer" or "probe" => (Text($"were it {Number.Print(ShownKelvin)} K too high"), TooWarm(now)),
            _ => (Text($"were its value {Number.Print(ShownPercent)} % too high"), PossibleError.OfExcess(now.SaturationMilligramsPerLitre, -ShownPercent)),
        };
        string all = string.Join(", ", overdue.Select(static item => Text($"{item.EquipmentKind} {item.Equipment} (last day {item.LastDay:yyyy-MM-dd})")));
        return new Finding(GuardNames.EquipmentOverdue, FindingSeverity.NeedsReason, $"overdue: {all}; {were}", error,
            "use equipment that is in date, or have it calibrated and enter that with the command register");
    }

    private static PossibleError TooWarm(Situation now)
    {
        return PossibleError.OfReference(now.SaturationMilligramsPerLitre, now.SaturationAt(now.TemperatureCelsius - ShownKelvin, now.PressureHectopascal));
    }

    private static Finding? ZeroSolution(Situation now)
    {
        bool planned = now.Setup.Plan.Any(static point => point.Method == MethodIds.ZeroSolution);
        EquipmentRecord? solution = !planned ? null : InUse(now).FirstOrDefault(static item => item.EquipmentKind == "zero-solution");
        if (solution?.MadeOn is not DateOnly made)
        {
            return null;
        }

        double life = solution.LifeDays ?? ZeroSolutionDays;
        int days = now.Today.DayNumber - made.DayNumber;
        return days <= life ? null : new Finding(GuardNames.ZeroSolutionAge, FindingSeverity.NeedsReason, Text(
            $"zero solution {solution.Equipment} is {days} days old (limit {Number.Print(life)} days, {(solution.LifeDays == null ? "TM 9-A6.2" : "from the register")}); had it taken up {Number.Print(ShownZeroMilligramsPerLitre)} mg/L of oxygen again"),
            PossibleError.Known(ShownZeroMilligramsPerLitre, -ShownZeroMilligramsPerLitre),
            "make fresh zero solution");
    }

    private static Finding? Membrane(Situation now)
    {
        if (now.Setup.Probe.Membrane is not RecordedMembrane membrane)
        {
            return null;
        }

        EquipmentRecord? known = now.Register == null ? null : Find(now.Register, membrane.Id);
        DateOnly? changed = now.Service.LastOrDefault(done => done.Event == ServiceRecord.MembraneChanged && done.Membrane == membrane.Id) is ServiceRecord service
            ? DateOnly.FromDateTime(service.At.UtcDateTime)
            : null;
        if ((membrane.InstalledOn ?? changed ?? known?.MadeOn) is not DateOnly day)
        {
            return null;
        }

        int days = now.Today.DayNumber - day.DayNumber;
        PossibleError ageing = PossibleError.Unknown("an old membrane loses signal: the loss so far is adjusted away here, and later readings drift low by what is still to come, which is its own");
        const string Advice = "look at it for wrinkles, bubbles and damage, and change it, or calibrate more often";
        if (known?.LifeDays is double life)
        {
            return days <= life ? null : new Finding(GuardNames.MembraneLife, FindingSeverity.NeedsReason, Text(
                $"membrane {membrane.Id} is {days} days old, and its life in the register is {Number.Print(life)} days"), ageing, Advice);
        }

        return days <= MembraneNoteDays ? null : new Finding(GuardNames.MembraneLife, FindingSeverity.Note, Text(
            $"membrane {membrane.Id} is {days} days old; they are commonly changed every 6 to 24 months (common practice, no source), and the register knows no life of this one"), ageing, Advice);
    }

    private static Finding? Polarisation(Situation now)
    {
        bool polarised = now.Setup.Probe.Model == ModelNames.Amperometric || now.Setup.Probe.MeterSettings != null;
        ServiceRecord? last = !polarised ? null : now.Service.LastOrDefault(done => done.At <= now.NowUtc
            && done.Event is ServiceRecord.PolarisationStarted or ServiceRecord.MembraneChanged or ServiceRecord.ElectrolyteChanged);
        double minutes = last == null ? double.NaN : (now.NowUtc - last.At).TotalMinutes;
        return !(minutes < PolarisationMinutes) ? null : new Finding(GuardNames.Polarisation, FindingSeverity.NeedsReason, Text(
            $"{Number.Fixed(Math.Floor(minutes), 0)} min since {last!.Event} (limit {Number.Print(PolarisationMinutes)} min, EPA 841-B-97-003)"),
            PossibleError.Unknown("the current still falls: the probe looks too high as found, and once adjusted here its later readings are too low by what it still falls, which is its own"),
            "wait, leave it switched on, and start then");
    }

    private static Finding? Rewetting(Situation now)
    {
        ServiceRecord? last = now.Service.LastOrDefault(done => done.At <= now.NowUtc && done.Event is ServiceRecord.StoredDry or ServiceRecord.Rewetted);
        bool dry = last?.Event == ServiceRecord.StoredDry;
        double hours = last == null ? double.NaN : (now.NowUtc - last.At).TotalHours;
        bool tooSoon = dry || hours < RewettingHours;
        return !tooSoon ? null : new Finding(GuardNames.Rewetting, FindingSeverity.NeedsReason, Text(
            $"the probe was stored dry and {(dry ? "not put into water since, by the log" : Text($"put into water {Number.Fixed(hours, 1)} h ago"))} (limit {Number.Print(RewettingHours)} h, OceanGliders oxygen SOP); at 2 % of signal"),
            PossibleError.OfSignal(now.SaturationMilligramsPerLitre, DrySignal),
            "keep it in water for a day first, and enter that with the command service");
    }

    /// <summary>What the register knows of the equipment that this calibration uses, named or implied.</summary>
    private static IEnumerable<EquipmentRecord> InUse(Situation now)
    {
        string source = now.Setup.Pressure.Source;
        HashSet<string?> used =
        [
            now.Setup.Probe.Thermometer.Id,
            source[(source.IndexOf(':', StringComparison.Ordinal) + 1)..],
            .. now.Setup.Equipment,
            .. now.Setup.Plan.Select(static point => point.Mixture?.Cylinder),
            .. now.Setup.Plan.Select(static point => point.Transfer?.Standard),
        ];
        return (now.Register ?? []).Where(item => used.Contains(item.Equipment));
    }

    private static EquipmentRecord? Find(IEnumerable<EquipmentRecord> register, string id)
    {
        return register.FirstOrDefault(item => item.Equipment == id);
    }
}
