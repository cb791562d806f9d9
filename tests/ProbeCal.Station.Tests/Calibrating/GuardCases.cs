using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Tests.CalibrationLog;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>One situation, what a guard must say of it, and how large the error as found must be.</summary>
/// <param name="Guard">The guard.</param>
/// <param name="What">The situation in a few words.</param>
/// <param name="Now">The situation.</param>
/// <param name="Severity">The weight of the finding; null where the guard must keep quiet.</param>
/// <param name="AsFound">Error as found, mg/L, computed here and not by the library; null where no size can be given.</param>
/// <param name="Later">Error later, mg/L, where it is not just the opposite.</param>
internal sealed record GuardCase(string Guard, string What, Situation Now, FindingSeverity? Severity, double? AsFound = null, double? Later = null)
{
    public override string ToString()
    {
        return $"{Guard}: {What}";
    }
}

/// <summary>For every guard at least one situation that trips it and one, just inside, that must not.</summary>
internal static class GuardCases
{
    private const FindingSeverity Note = FindingSeverity.Note;
    private const FindingSeverity Reason = FindingSeverity.NeedsReason;
    private const FindingSeverity Refuse = FindingSeverity.Refuse;

    private static readonly DateTimeOffset Now = new(2026, 6, 2, 9, 0, 0, TimeSpan.Zero);

    /// <summary>Oxygen at saturation, mg/L: Benson and Krause 1984 with vapour pressure and second virial term, written here once more (coefficients from memory).</summary>
    internal static double Saturation(double celsius, double hectopascal, double salinity = 0)
    {
        double kelvin = celsius + 273.15;
        double standard = Math.Exp(-139.34411 + (1.575701e5 / kelvin) - (6.642308e7 / Math.Pow(kelvin, 2)) + (1.243800e10 / Math.Pow(kelvin, 3)) - (8.621949e11 / Math.Pow(kelvin, 4))
            - (salinity * (0.017674 - (10.754 / kelvin) + (2140.7 / (kelvin * kelvin)))));
        double theta = 0.000975 - (1.426e-5 * celsius) + (6.436e-8 * celsius * celsius);
        double vapour = Vapour(celsius) / 1013.25;
        double pressure = hectopascal / 1013.25;
        return standard * (pressure - vapour) * (1 - (theta * pressure)) / ((1 - vapour) * (1 - theta));
    }

    /// <summary>Vapour pressure of water, hPa: Benson and Krause 1980 (coefficients from memory).</summary>
    internal static double Vapour(double celsius)
    {
        double kelvin = celsius + 273.15;
        return 1013.25 * Math.Exp(11.8571 - (3840.70 / kelvin) - (216961 / (kelvin * kelvin)));
    }

    /// <summary>Pressure of the standard atmosphere, hPa (ICAO: T 288.15 K, 6.5 K/km, exponent 5.25588).</summary>
    private static double Standard(double metres, double seaLevel = 1013.25)
    {
        return seaLevel * Math.Pow(1 - (0.0065 * metres / 288.15), 5.25588);
    }

    internal static IReadOnlyList<GuardCase> All { get; } =
    [
        .. Pressure(), .. Temperature(), .. Salinity(), .. Bath(), .. Point(), .. Register(), .. Fit(),
    ];

    private static IEnumerable<GuardCase> Pressure()
    {
        double c20 = Saturation(20, 940);
        yield return new(GuardNames.Clock, "an hour behind", At() with { Previous = SampleRecords.Of("P-1", Now.AddHours(1)) }, Refuse);
        yield return new(GuardNames.Clock, "an hour after", At() with { Previous = SampleRecords.Of("P-1", Now.AddHours(-1)) }, null);

        yield return new(GuardNames.PressureUnit, "740 mmHg taken for hPa at 250 m", At(740, 250), Refuse, Saturation(20, 740 * 1013.25 / 760) - Saturation(20, 740));
        yield return new(GuardNames.PressureUnit, "29.1 inHg taken for kPa at 150 m", At(291, 150), Refuse);
        yield return new(GuardNames.PressureUnit, "98 kPa taken for psi at 250 m", At(98 * 68.94757, 250), Refuse);
        yield return new(GuardNames.PressureUnit, "755 mmHg taken for hPa, altitude unknown", At(755, null), Reason, Saturation(20, 755 * 1013.25 / 760) - Saturation(20, 755));
        yield return new(GuardNames.PressureUnit, "740 hPa at 2600 m, where it belongs", At(740, 2600), null);
        yield return new(GuardNames.PressureUnit, "940 hPa, altitude unknown", At(940, null), null);

        yield return new(GuardNames.AltitudeUnit, "2100 ft taken for metres", At(940, 2100), Refuse);
        yield return new(GuardNames.AltitudeUnit, "feet of the last record taken for metres, no pressure", At(Standard(2100), 2100, "altitude") with { LastHere = SampleRecords.Of("P-9", Now.AddDays(-9)) }, Reason,
            Saturation(20, Standard(640)) - Saturation(20, Standard(2100)));
        yield return new(GuardNames.AltitudeUnit, "640 m", At(940, 640) with { LastHere = SampleRecords.Of("P-9", Now.AddDays(-9)) }, null);

        yield return new(GuardNames.PressureAtAltitude, "a sea-level value at 640 m", At(1015, 640), Refuse, Saturation(20, Standard(640, 1015)) - Saturation(20, 1015));
        yield return new(GuardNames.PressureAtAltitude, "a strong high", At(965, 640), Reason, Saturation(20, Standard(640, 965)) - Saturation(20, 965));
        yield return new(GuardNames.PressureAtAltitude, "a deep storm", At(876, 640), Reason, Saturation(20, Standard(640)) - Saturation(20, 876));
        yield return new(GuardNames.PressureAtAltitude, "ordinary weather", At(940, 640), null);

        yield return new(GuardNames.PressureReduced, "the airport's, 100 m up", At(1005, 100, "airport:NAME"), Reason, Saturation(20, Standard(100, 1005)) - Saturation(20, 1005));
        yield return new(GuardNames.PressureReduced, "a barometer, 100 m up", At(1005, 100), Note, Saturation(20, Standard(100, 1005)) - Saturation(20, 1005));
        yield return new(GuardNames.PressureReduced, "a barometer that fits only 1500 m", At(840, 1500), null);

        CalibrationRecord last = SampleRecords.Of("P-9", Now.AddDays(-9));
        yield return new(GuardNames.PressureHere, "31 hPa above the last one", At(last.Points[0].Pressure.Value + 31, null) with { LastHere = last }, Reason,
            Saturation(20, last.Points[0].Pressure.Value) - Saturation(20, last.Points[0].Pressure.Value + 31));
        yield return new(GuardNames.PressureHere, "29 hPa above", At(last.Points[0].Pressure.Value + 29, null) with { LastHere = last }, null);

        yield return new(GuardNames.StirringStill, "still water", With(At(), setup => setup with { Stirring = Stirring.Still }), Note, -0.1 * c20, c20 / 9);
        yield return new(GuardNames.StirringStill, "stirred", At(), null);
    }

    private static IEnumerable<GuardCase> Temperature()
    {
        yield return new(GuardNames.TemperatureRange, "68 °F typed as °C", At(celsius: 68), Refuse);
        yield return new(GuardNames.TemperatureRange, "38 °C", At(celsius: 38), null);

        yield return new(GuardNames.TemperatureTwice, "0.5 K apart", Typed(20.5) with { ProbeTemperatureCelsius = 20 }, Reason, Saturation(20, 940) - Saturation(20.5, 940));
        yield return new(GuardNames.TemperatureTwice, "0.15 K apart", Typed(20.15) with { ProbeTemperatureCelsius = 20 }, null);

        yield return new(GuardNames.TemperatureUnit, "39 °F typed as °C", Typed(39), Reason, Saturation(7 / 1.8, 940) - Saturation(39, 940));
        yield return new(GuardNames.TemperatureUnit, "a warm pond of 33 °C", Typed(33), Note, Saturation(1 / 1.8, 940) - Saturation(33, 940));
        yield return new(GuardNames.TemperatureUnit, "31 °C", Typed(31), null);
        yield return new(GuardNames.TemperatureUnit, "39 °C that the probe's own thermometer is there to judge", Typed(39) with { ProbeTemperatureCelsius = 39 }, null);

        yield return new(GuardNames.CoefficientRange, "1.9 °C, fitted from 2", At(celsius: 1.9), Refuse);
        yield return new(GuardNames.CoefficientRange, "2 °C", At(celsius: 2), null);

        // Arrhenius 22 kJ/mol, u 0.5 kJ/mol: ln gain changes by -(1/T - 1/T20)/R per J/mol, twice u is 1000 J/mol.
        double share = Math.Exp(1000 / 8.314462618 * ((1 / 276.15) - (1 / 293.15)));
        yield return new(GuardNames.TemperatureExtreme, "3 °C", At(celsius: 3), Note, Saturation(3, 940) * (share - 1), Saturation(3, 940) * ((1 / share) - 1));
        yield return new(GuardNames.TemperatureExtreme, "31 °C", At(celsius: 31), Note,
            Saturation(31, 940) * (Math.Exp(1000 / 8.314462618 * ((1 / 304.15) - (1 / 293.15))) - 1),
            Saturation(31, 940) * (Math.Exp(-1000 / 8.314462618 * ((1 / 304.15) - (1 / 293.15))) - 1));
        yield return new(GuardNames.TemperatureExtreme, "5 °C", At(celsius: 5), null);
    }

    private static IEnumerable<GuardCase> Salinity()
    {
        CalibrationRecord bay = SaltyRecord(27.2, "Invented Bay");
        // 38 mS/cm at 20 °C is S 27.02 (PSS-78 evaluated outside the library, coefficients from memory).
        yield return new(GuardNames.SalinityUnit, "38 mS/cm typed where the last salinity was 27.2", Salty(38) with { LastHere = bay }, Reason, Saturation(20, 940, 27.02) - Saturation(20, 940, 38));
        yield return new(GuardNames.SalinityUnit, "53 mS/cm typed", Salty(53), Refuse);
        yield return new(GuardNames.SalinityUnit, "28 where the last was 27.2", Salty(28) with { LastHere = bay }, null);

        double share = Saturation(20, 940, 35) / Saturation(20, 940);
        yield return new(GuardNames.SalinityTwice, "35 in the meter and 35 entered", Meter(Salty(35), "mg/L", 35), Reason, Saturation(20, 940, 35) * (share - 1), Saturation(20, 940, 35) * ((1 / share) - 1));
        yield return new(GuardNames.SalinityTwice, "35 entered, 0 in the meter", Meter(Salty(35), "mg/L", 0), null);
        yield return new(GuardNames.SalinityTwice, "a percentage, in which there is no salinity", Meter(Salty(35), "%local", 35), null);

        yield return new(GuardNames.SalinityLeftOver, "35 in the meter, fresh water", Meter(At(), "mg/L", 35), Reason, Saturation(20, 940) * (share - 1), Saturation(20, 940) * ((1 / share) - 1));
        yield return new(GuardNames.SalinityLeftOver, "the bay's figure at the tarn", Salty(27.2) with { Previous = bay }, Reason, Saturation(20, 940) - Saturation(20, 940, 27.2));
        yield return new(GuardNames.SalinityLeftOver, "another figure at the tarn", Salty(27.3) with { Previous = bay }, null);
        yield return new(GuardNames.SalinityLeftOver, "the bay's figure at the bay", With(Salty(27.2), setup => setup with { Site = bay.Site }) with { Previous = bay }, null);
    }

    private static IEnumerable<GuardCase> Bath()
    {
        // Density of fresh water at 20 °C 998.2 kg/m³ (Kell 1975, from memory), g 9.80665 m/s².
        double Excess(double depth)
        {
            return 998.2 * 9.80665 * depth / 100 / (940 - Vapour(20)) * Saturation(20, 940);
        }

        yield return new(GuardNames.BubblesAtDepth, "a stone at 0.3 m", Around(new Surroundings { StoneDepthMetres = 0.3 }), Reason, Excess(0.3));
        yield return new(GuardNames.BubblesAtDepth, "a stone at 0.03 m", Around(new Surroundings { StoneDepthMetres = 0.03 }), Note, Excess(0.03));
        yield return new(GuardNames.BubblesAtDepth, "no stone stated", Around(new Surroundings()), null);

        yield return new(GuardNames.WarmedWater, "tap water of 12 °C, now 20", Around(new Surroundings { EquilibratedCelsius = 12 }) with { Point = Taken() }, Reason, Saturation(12, 940) - Saturation(20, 940));
        yield return new(GuardNames.WarmedWater, "0.2 K warmer than at the point before", At() with { Point = Taken("as-left"), Span = Taken(celsius: 19.8) }, Note, Saturation(19.8, 940) - Saturation(20, 940));
        yield return new(GuardNames.WarmedWater, "0.05 K warmer", Around(new Surroundings { EquilibratedCelsius = 19.95 }) with { Point = Taken() }, null);
        yield return new(GuardNames.WarmedWater, "cooled", Around(new Surroundings { EquilibratedCelsius = 24 }) with { Point = Taken() }, null);

        double Warm(double air)
        {
            return Saturation(20, 940) * (((940 - Vapour(air)) / (940 - Vapour(20))) - 1);
        }

        yield return new(GuardNames.CupTemperature, "air at 26 °C, probe at 20", Cup(new Surroundings { AirCelsius = 26 }, Taken()), Reason, Warm(26));
        yield return new(GuardNames.CupTemperature, "air at 17 °C", Cup(new Surroundings { AirCelsius = 17 }, Taken()), Note, Warm(17));
        yield return new(GuardNames.CupTemperature, "air at 20.4 °C", Cup(new Surroundings { AirCelsius = 20.4 }, Taken()), null);

        // Dry air at 20 °C holds pv/(P - pv) more: 2.5 % at 940 hPa.
        double dry = Vapour(20) / (940 - Vapour(20)) * Saturation(20, 940);
        yield return new(GuardNames.CupDry, "too high by all of dry air", Cup(null, Off(dry)), Reason, dry);
        yield return new(GuardNames.CupDry, "too high by half of it, in cold air", Cup(null, Off(0.07, celsius: 10)), Note, 0.07);
        yield return new(GuardNames.CupDry, "too high by a quarter", Cup(null, Off(dry / 4)), null);
        yield return new(GuardNames.CupDry, "too high by twice", Cup(null, Off(2 * dry)), null);
        yield return new(GuardNames.CupDry, "too low", Cup(null, Off(-dry)), null);
        yield return new(GuardNames.CupDry, "the same in water", At() with { Point = Off(dry) }, null);
    }

    private static IEnumerable<GuardCase> Point()
    {
        RecordedPoint point = Taken();
        yield return new(GuardNames.DeadInput, "all samples alike", At() with { Point = point with { Signal = point.Signal with { Minimum = 113.25, Maximum = 113.25, StandardDeviation = 0 } } }, Refuse);
        yield return new(GuardNames.DeadInput, "moving", At() with { Point = point }, null);
        yield return new(GuardNames.SaturatedInput, "at 500 nA, the end of the input", At() with { Point = point with { Signal = point.Signal with { Maximum = 500 } } }, Refuse);
        yield return new(GuardNames.SaturatedInput, "inside", At() with { Point = point }, null);

        double perHour = 0.3 / 3; // K a minute over a window of 3 min
        yield return new(GuardNames.Steady, "the signal steady, temperature moving 0.3 K", At() with { Point = point with { TemperatureStatistics = point.TemperatureStatistics! with { SlopePerMinute = perHour } } }, Refuse,
            Saturation(20.3, 940) - Saturation(20, 940));
        // 1 % of the signal over the window is 1 % of the reference, less the zero of 0.
        yield return new(GuardNames.Steady, "temperature steady, the signal rising 1 %", At() with { Point = point with { Signal = point.Signal with { SlopePerMinute = 1.1325 / 3 } } }, Refuse, -0.01 * point.ReferenceMilligramsPerLitre);
        yield return new(GuardNames.Steady, "temperature typed and not watched", At() with { Point = point with { TemperatureStatistics = null } }, Reason, Saturation(20.2, 940) - Saturation(20, 940));
        yield return new(GuardNames.Steady, "both steady", At() with { Point = point }, null);

        double c20 = Saturation(20, 940);
        yield return new(GuardNames.DisplayUnit, "98 where mg/L was stated", Meter(At(), "mg/L", 0) with { Point = Shows(98) }, Reason, 100 - c20, c20 * ((c20 / 100) - 1));
        yield return new(GuardNames.DisplayUnit, "8.4 where % was stated", Meter(At(), "%local", 0) with { Point = Shows(8.4) }, Reason, c20 * ((c20 / 100) - 1), c20 * ((100 / c20) - 1));
        yield return new(GuardNames.DisplayUnit, "8.4 mg/L", Meter(At(), "mg/L", 0) with { Point = Shows(8.4) }, null);

        double one = (940 - Vapour(20)) / (1013.25 - Vapour(20));
        yield return new(GuardNames.PercentScale, "92.6 % where local was stated", Meter(At(), "%local", 0) with { Point = Shows(92.6) }, Note, c20 * (one - 1), c20 * ((1 / one) - 1));
        yield return new(GuardNames.PercentScale, "100.2 % where 1 atm was stated", Meter(At(), "%1atm", 0) with { Point = Shows(100.2) }, Note, c20 * ((1 / one) - 1), c20 * (one - 1));
        yield return new(GuardNames.PercentScale, "99 % local", Meter(At(), "%local", 0) with { Point = Shows(99) }, null);

        RecordedPoint titrated = point with { Method = MethodIds.Titration };
        // 20 µmol/kg is 0.64 mg/L; titrations at sea are good to 0.02 mL/L, 0.0286 mg/L.
        yield return new(GuardNames.TitrationLow, "0.6 mg/L titrated", At() with { Point = titrated with { ReferenceMilligramsPerLitre = 0.6 } }, Reason, -0.0286);
        yield return new(GuardNames.TitrationLow, "0.7 mg/L titrated", At() with { Point = titrated with { ReferenceMilligramsPerLitre = 0.7 } }, null);
    }

    private static IEnumerable<GuardCase> Register()
    {
        double hectopascal = Saturation(20, 939) - Saturation(20, 940);
        double kelvin = Saturation(19.8, 940) - Saturation(20, 940);
        DateOnly today = new(2026, 6, 2);
        yield return new(GuardNames.BarometerUnchecked, "not in the register", Registered(), Note, hectopascal);
        yield return new(GuardNames.BarometerUnchecked, "never checked", Registered(Item("B-1", "barometer")), Reason, hectopascal);
        yield return new(GuardNames.BarometerUnchecked, "checked 366 days ago", Registered(Item("B-1", "barometer") with { CalibratedOn = today.AddDays(-366) }), Reason, hectopascal);
        yield return new(GuardNames.BarometerUnchecked, "checked 365 days ago", Registered(Item("B-1", "barometer") with { CalibratedOn = today.AddDays(-365) }), null);
        yield return new(GuardNames.ThermometerUnchecked, "not in the register", Registered(), Note, kelvin);
        yield return new(GuardNames.ThermometerUnchecked, "never checked", Registered(Item("P-1", "thermometer")), Reason, kelvin);
        yield return new(GuardNames.ThermometerUnchecked, "checked", Registered(Item("P-1", "thermometer") with { CalibratedOn = today.AddDays(-900) }), null);

        yield return new(GuardNames.EquipmentOverdue, "a barometer due yesterday", Registered(Item("B-1", "barometer") with { DueOn = today.AddDays(-1) }), Reason, hectopascal);
        yield return new(GuardNames.EquipmentOverdue, "a thermometer whose life is over", Registered(Item("P-1", "thermometer") with { MadeOn = today.AddDays(-31), LifeDays = 30 }), Reason, kelvin);
        yield return new(GuardNames.EquipmentOverdue, "a titrant due yesterday, used", With(Registered(Item("T-1", "titrant") with { DueOn = today.AddDays(-1) }), setup => setup with { Equipment = ["T-1"] }), Reason, -0.01 * Saturation(20, 940));
        yield return new(GuardNames.EquipmentOverdue, "the same titrant, not used", Registered(Item("T-1", "titrant") with { DueOn = today.AddDays(-1) }), null);
        yield return new(GuardNames.EquipmentOverdue, "a barometer due today", Registered(Item("B-1", "barometer") with { DueOn = today }), null);

        Situation Zero(EquipmentRecord item)
        {
            return With(Registered(item), setup => setup with { Equipment = ["Z-1"], ZeroPlan = CalibrationIds.ZeroAdjust });
        }

        yield return new(GuardNames.ZeroSolutionAge, "8 days old", Zero(Item("Z-1", "zero-solution") with { MadeOn = today.AddDays(-8) }), Reason, 0.2);
        yield return new(GuardNames.ZeroSolutionAge, "7 days old", Zero(Item("Z-1", "zero-solution") with { MadeOn = today.AddDays(-7) }), null);
        yield return new(GuardNames.ZeroSolutionAge, "8 days old, no zero planned", With(Zero(Item("Z-1", "zero-solution") with { MadeOn = today.AddDays(-8) }), setup => setup with { ZeroPlan = CalibrationIds.ZeroKeep }), null);

        Situation Membrane(int days, double? life)
        {
            RecordedMembrane membrane = new() { Id = "M-1", InstalledOn = today.AddDays(-days) };
            EquipmentRecord[] register = life is double entered ? [Item("M-1", "membrane") with { LifeDays = entered }] : [];
            return With(Registered(register), setup => setup with { Probe = setup.Probe with { Membrane = membrane } });
        }

        yield return new(GuardNames.MembraneLife, "91 days, life 90", Membrane(91, 90), Reason);
        yield return new(GuardNames.MembraneLife, "90 days, life 90", Membrane(90, 90), null);
        yield return new(GuardNames.MembraneLife, "200 days, life not known", Membrane(200, null), Note);
        yield return new(GuardNames.MembraneLife, "183 days, life not known", Membrane(183, null), null);

        yield return new(GuardNames.Polarisation, "14 min after polarisation", Serviced(ServiceRecord.PolarisationStarted, 14), Reason);
        yield return new(GuardNames.Polarisation, "14 min after a new membrane", Serviced(ServiceRecord.MembraneChanged, 14), Reason);
        yield return new(GuardNames.Polarisation, "15 min after polarisation", Serviced(ServiceRecord.PolarisationStarted, 15), null);
        yield return new(GuardNames.Polarisation, "an optical probe", With(Serviced(ServiceRecord.MembraneChanged, 5), setup => setup with { Probe = setup.Probe with { Model = "stern-volmer" } }), null);

        double c20 = Saturation(20, 940);
        yield return new(GuardNames.Rewetting, "wetted 23 h ago", Serviced(ServiceRecord.Rewetted, 23 * 60), Reason, -0.02 * c20, c20 * ((1 / 0.98) - 1));
        yield return new(GuardNames.Rewetting, "stored dry and not wetted", Serviced(ServiceRecord.StoredDry, 90_000), Reason, -0.02 * c20, c20 * ((1 / 0.98) - 1));
        yield return new(GuardNames.Rewetting, "wetted 24 h ago", Serviced(ServiceRecord.Rewetted, 24 * 60), null);
    }

    private static IEnumerable<GuardCase> Fit()
    {
        double c20 = Saturation(20, 940);
        yield return new(GuardNames.Zero, "above the 100 % point", Fitted(75, 80), Refuse);
        yield return new(GuardNames.Zero, "below it", Fitted(75, 0.35), null);

        // The slope of this fit, 0.452 nA/hPa, is asserted in GuardTests.
        double slope = Fitted(75, 0.35).Fit!.Slope;
        yield return new(GuardNames.MakerWindow, "slope above 0.4", With(Fitted(75, 0.35), setup => setup with { Limits = new CalibrationLimits { SlopeLow = 0.3, SlopeHigh = 0.4 } }), Note, c20 * ((slope / 0.4) - 1), c20 * ((0.4 / slope) - 1));
        yield return new(GuardNames.MakerWindow, "zero above 0.2", With(Fitted(75, 0.35), setup => setup with { Limits = new CalibrationLimits { ZeroSignalLow = 0, ZeroSignalHigh = 0.2 } }), Note, 0.15 / 74.65 * 8.41);
        yield return new(GuardNames.MakerWindow, "inside both", With(Fitted(75, 0.35), setup => setup with { Limits = new CalibrationLimits { SlopeLow = 0.3, SlopeHigh = 0.5, ZeroSignalLow = 0, ZeroSignalHigh = 0.4 } }), null);
        yield return new(GuardNames.MakerWindow, "none entered", Fitted(75, 0.35), null);

        yield return new(GuardNames.Slope, "27 % below the last", Fitted(75, 0.35) with { Previous = SampleRecords.Of("P-1", Now.AddDays(-30), slope: slope / 0.73) }, Reason, -0.27 * c20, c20 * ((1 / 0.73) - 1));
        yield return new(GuardNames.Slope, "23 % below the last", Fitted(75, 0.35) with { Previous = SampleRecords.Of("P-1", Now.AddDays(-30), slope: slope / 0.77) }, null);

        // Median 1.05 times this slope; distances 0.01, 0, 0.01, 0.02 and 0.01 of it: their median, times 1.4826, is the spread.
        double[] around = [1.04, 1.05, 1.06, 1.03, 1.06];
        yield return new(GuardNames.SlopeHistory, "3.4 spreads below the median of five", Fitted(75, 0.35) with { History = History(around.Select(x => x * slope)) }, Reason, c20 * ((1 / 1.05) - 1), 0.05 * c20);
        yield return new(GuardNames.SlopeHistory, "2 spreads below", Fitted(75, 0.35) with { History = History(around.Select(x => (x - 0.02) * slope)) }, null);
        yield return new(GuardNames.SlopeHistory, "only three earlier ones", Fitted(75, 0.35) with { History = History(around.Take(3).Select(x => x * slope)) }, null);
        yield return new(GuardNames.SlopeHistory, "five on another membrane", With(Fitted(75, 0.35) with { History = History(around.Select(x => x * slope)) }, setup => setup with { Probe = setup.Probe with { Membrane = new RecordedMembrane { Id = "M-2" } } }), null);

        // The floor of the spread is 0.02 mg/L of 8.41 over a span of 74.4 nA: 0.177 nA, three of which are 0.53 nA.
        yield return new(GuardNames.ZeroHistory, "0.6 nA above the median of four", Fitted(75, 0.6) with { History = Zeros(0, 0, 0, 0) }, Reason, 0.6 / 74.4 * 8.41);
        yield return new(GuardNames.ZeroHistory, "0.5 nA above", Fitted(75, 0.5) with { History = Zeros(0, 0, 0, 0) }, null);

        RecordedPoint span = SampleRecords.Of("P-1", Now).Points[0];
        yield return new(GuardNames.AsFound, "6 % low", At() with { Span = span with { ErrorMilligramsPerLitre = -0.06 * span.ReferenceMilligramsPerLitre } }, Note, -0.06 * span.ReferenceMilligramsPerLitre);
        yield return new(GuardNames.AsFound, "4 % low", At() with { Span = span with { ErrorMilligramsPerLitre = -0.04 * span.ReferenceMilligramsPerLitre } }, null);

        Situation Banded(double uncertainty)
        {
            CalibrationSetup setup = Bench.Setup with { Limits = new CalibrationLimits { GuardBand = true } };
            RecordedPoint point = Taken() with { ReferencePartialPressureUncertaintyHectopascal = uncertainty };
            return Fitted(75, 0.35) with { Setup = setup, Span = point };
        }

        // 1 hPa is 0.0438 mg/L here (8.41 over 191.9): U is 0.2 mg/L at 2.28 hPa.
        yield return new(GuardNames.GuardBand, "U 0.21 mg/L with a limit of 0.2", Banded(2.4), Refuse);
        yield return new(GuardNames.GuardBand, "U 0.18 mg/L", Banded(2.0), null);
        yield return new(GuardNames.GuardBand, "the same U without a guard band", Fitted(75, 0.35) with { Span = Taken() with { ReferencePartialPressureUncertaintyHectopascal = 2.4 } }, null);
    }

    private static Situation At(double hectopascal = 940, double? altitude = 640, string source = "barometer:B-1", double celsius = 20)
    {
        CalibrationSetup setup = Bench.Setup with
        {
            Pressure = new EnteredPressure { Hectopascal = hectopascal, Source = source, StandardUncertaintyHectopascal = 1 },
            Altitude = altitude is double metres ? new RecordedQuantity { Value = metres, Unit = "m", StandardUncertainty = 5, Source = "typed" } : null,
        };
        return new Situation { Setup = setup, NowUtc = Now, TemperatureCelsius = celsius, PressureHectopascal = hectopascal };
    }

    private static Situation With(Situation now, Func<CalibrationSetup, CalibrationSetup> change)
    {
        return now with { Setup = change(now.Setup) };
    }

    private static Situation Typed(double celsius)
    {
        return With(At(celsius: celsius), setup => setup with { TypedTemperatureCelsius = celsius });
    }

    private static Situation Salty(double salinity)
    {
        return With(At(), setup => setup with { Salinity = setup.Salinity with { Value = salinity } });
    }

    private static CalibrationRecord SaltyRecord(double salinity, string site)
    {
        CalibrationRecord record = SampleRecords.Of("P-1", Now.AddDays(-2));
        return record with { Site = site, Points = [record.Points[0] with { Salinity = record.Points[0].Salinity with { Value = salinity } }] };
    }

    private static Situation Meter(Situation now, string shows, double salinity)
    {
        RecordedMeterSettings meter = new() { Shows = shows, Equation = "benson-krause-1984", Salinity = salinity, Resolution = 0.01 };
        return With(now, setup => setup with { Probe = setup.Probe with { Model = "meter-display", MeterSettings = meter } });
    }

    private static Situation Around(Surroundings surroundings)
    {
        return With(At(), setup => setup with { Surroundings = surroundings });
    }

    private static Situation Cup(Surroundings? surroundings, RecordedPoint point)
    {
        return With(At(), setup => setup with { Method = CalibrationIds.WaterSaturatedAir, Surroundings = surroundings }) with { Point = point };
    }

    /// <summary>A steady point at 940 hPa.</summary>
    private static RecordedPoint Taken(string role = "span", double celsius = 20)
    {
        RecordedPoint point = SampleRecords.Of("P-1", Now).Points[0];
        RecordedStatistics steady = point.Signal with { Mean = celsius, StandardDeviation = 0.002, SlopePerMinute = 0.001, Minimum = celsius - 0.01, Maximum = celsius + 0.01 };
        return point with
        {
            Role = role,
            Signal = point.Signal with { StandardDeviation = 0.1 },
            Temperature = point.Temperature with { Value = celsius },
            TemperatureStatistics = steady,
            Pressure = point.Pressure with { Value = 940 },
        };
    }

    private static RecordedPoint Off(double error, double celsius = 20)
    {
        return Taken(celsius: celsius) with { ReferenceMilligramsPerLitre = Saturation(celsius, 940), ErrorMilligramsPerLitre = error };
    }

    private static RecordedPoint Shows(double value)
    {
        RecordedPoint point = Taken();
        return point with { Typed = true, Signal = point.Signal with { Mean = value } };
    }

    private static EquipmentRecord Item(string id, string kind)
    {
        return new EquipmentRecord { Equipment = id, EquipmentKind = kind, Software = "test" };
    }

    private static Situation Registered(params EquipmentRecord[] register)
    {
        return At() with { Register = register };
    }

    private static Situation Serviced(string what, double minutesAgo)
    {
        return At() with { Service = [new ServiceRecord { Probe = "P-1", Event = what, At = Now.AddMinutes(-minutesAgo), Software = "test" }] };
    }

    private static Situation Fitted(double spanSignal, double zeroSignal)
    {
        CalibrationRecord record = SampleRecords.Of("P-1", Now);
        RecordedPoint span = record.Points[0] with { Signal = record.Points[0].Signal with { Mean = spanSignal } };
        RecordedPoint zero = span with { Role = CalibrationIds.ZeroPoint, Signal = span.Signal with { Mean = zeroSignal } };
        CalibrationSetup setup = Bench.Setup with { ZeroPlan = CalibrationIds.ZeroAdjust };
        Fit fit = Fitting.Of(setup, new List<RecordedPoint> { span, zero }, null);
        return At() with { Setup = setup, Span = span, Fit = fit.Calibration, FitStatus = fit.Status };
    }

    /// <summary>Earlier calibrations that can be compared with those of the bench.</summary>
    private static CalibrationRecord[] History(IEnumerable<double> slopes)
    {
        return [.. slopes.Select((slope, i) => Comparable(i) with { Result = Comparable(i).Result with { Slope = slope } })];
    }

    private static CalibrationRecord[] Zeros(params double[] signals)
    {
        return [.. signals.Select((signal, i) => Comparable(i) with { Zero = Comparable(i).Zero with { Source = "measured", IsMeasured = true, Signal = signal } })];
    }

    private static CalibrationRecord Comparable(int i)
    {
        return SampleRecords.Of("P-1", Now.AddDays(i - 100)) with { Probe = Bench.Setup.Probe };
    }
}
