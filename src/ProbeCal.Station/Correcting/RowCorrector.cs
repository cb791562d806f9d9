using System;
using System.Collections.Generic;

namespace ProbeCal.Station.Correcting;

/// <summary>
/// One raw sample to its corrected value: calibration, drift, fouling. What came about on the way stays here until the next sample, so that the value and
/// its explanation are one computation. Allocates nothing; not for concurrent use.
/// </summary>
internal sealed class RowCorrector
{
    private readonly IReadOnlyList<CalibrationInUse> _calibrations;
    private readonly ServicePlan _plan;
    private int _last;

    internal RowCorrector(IReadOnlyList<CalibrationInUse> calibrations, ServicePlan plan)
    {
        _calibrations = calibrations;
        _plan = plan;
    }

    /// <summary>What Core made of the sample.</summary>
    internal Reading Reading { get; } = new();

    /// <summary>The calibration in force; of use after <see cref="Find"/> found one.</summary>
    internal CalibrationInUse Calibration => _calibrations[_last];

    /// <summary>What is known of the drift at that time; null when nothing is.</summary>
    internal ErrorRamp? DriftRamp { get; private set; }

    /// <summary>How much of the drift had come about, 0 to 1.</summary>
    internal double DriftShare { get; private set; }

    /// <summary>Slope at that time over the calibration's.</summary>
    internal double DriftSlope { get; private set; }

    /// <summary>Response in gas-free water at that time less the calibration's.</summary>
    internal double DriftZero { get; private set; }

    /// <summary>Response per hPa of the calibration at that temperature; NaN where the zero did not move.</summary>
    internal double ResponsePerHectopascal { get; private set; }

    /// <summary>Drift correction, mg/L.</summary>
    internal double Drift { get; private set; }

    /// <summary>Concentration after drift, mg/L.</summary>
    internal double AfterDrift { get; private set; }

    /// <summary>What is known of fouling at that time; null when nothing is.</summary>
    internal ErrorRamp? FoulingRamp { get; private set; }

    /// <summary>How much of the fouling had come about, 0 to 1.</summary>
    internal double FoulingShare { get; private set; }

    /// <summary>Reading over truth through the fouling.</summary>
    internal double FoulingSlope { get; private set; }

    /// <summary>Reading in gas-free water through the fouling, mg/L.</summary>
    internal double FoulingZero { get; private set; }

    /// <summary>Fouling correction, mg/L.</summary>
    internal double Fouling { get; private set; }

    /// <summary>Concentration after drift and fouling, mg/L.</summary>
    internal double Corrected { get; private set; }

    /// <summary>Sum of the absolute corrections, mg/L.</summary>
    internal double SumOfCorrections { get; private set; }

    /// <summary>The rating by that sum.</summary>
    internal Rating Rating { get; private set; }

    /// <summary>Finds the calibration for a time; false when none was in force.</summary>
    internal bool Find(long utcTicks)
    {
        // Times mostly go on, so the last one is tried first.
        if (Calibration.FromTicks <= utcTicks && utcTicks < Calibration.ToTicks)
        {
            return true;
        }

        for (int i = 0; i < _calibrations.Count; i++)
        {
            if (_calibrations[i].FromTicks <= utcTicks && utcTicks < _calibrations[i].ToTicks)
            {
                _last = i;
                return true;
            }
        }

        return false;
    }

    /// <summary>Corrects a sample by the calibration that <see cref="Find"/> found.</summary>
    /// <returns>The status of the partial pressure, as live.</returns>
    internal Status Correct(long utcTicks, double signal, double temperature, double pressure, double salinity, double depthDecibar)
    {
        CalibrationInUse calibration = Calibration;
        Status status = Correction.Correct(
            calibration.Core, calibration.Conditions, signal, temperature, pressure, salinity, depthDecibar, RangeRule.NearEdge, Reading);
        calibration.Loaded.Growth.Add(
            new DateTimeOffset(utcTicks, TimeSpan.Zero), ErrorRamp.At(_plan.Drift, utcTicks) is not null, ErrorRamp.At(_plan.Fouling, utcTicks) is not null, Reading);
        if (!_plan.IsEmpty)
        {
            TakeBack(calibration, utcTicks, temperature, pressure, salinity);
        }

        return status;
    }

    private void TakeBack(CalibrationInUse calibration, long utcTicks, double temperature, double pressure, double salinity)
    {
        double concentration = Reading.Value(ReadingQuantity.MilligramsPerLitre);
        DriftRamp = ErrorRamp.At(_plan.Drift, utcTicks);
        (DriftShare, DriftSlope, DriftZero, ResponsePerHectopascal) = (0, 1, 0, double.NaN);
        Drift = 0;
        if (DriftRamp is ErrorRamp drift)
        {
            DriftShare = ServiceErrors.Prorated(utcTicks, drift.OnsetTicks, drift.VisitTicks);
            Drift = _plan.DriftForm switch
            {
                CorrectionForms.Constant => Between(drift.Start.MilligramsPerLitre, drift.End.MilligramsPerLitre, DriftShare),
                CorrectionForms.Percent => concentration * Between(drift.Start.Percent, drift.End.Percent, DriftShare) / 100,
                _ => WithoutDrift(calibration, drift, concentration, temperature, pressure, salinity) - concentration,
            };
        }

        AfterDrift = concentration + Drift;
        FoulingRamp = ErrorRamp.At(_plan.Fouling, utcTicks);
        (FoulingShare, FoulingSlope, FoulingZero) = (0, 1, 0);
        Fouling = 0;
        if (FoulingRamp is ErrorRamp fouling)
        {
            FoulingShare = ServiceErrors.Prorated(utcTicks, fouling.OnsetTicks, fouling.VisitTicks);
            FoulingSlope = Between(fouling.Start.Slope, fouling.End.Slope, FoulingShare);
            FoulingZero = Between(fouling.Start.Zero, fouling.End.Zero, FoulingShare);
            // The published forms add to the reading as it was recorded, the form in slope and zero undoes one after the other.
            Fouling = _plan.FoulingForm switch
            {
                CorrectionForms.Constant => Between(fouling.Start.MilligramsPerLitre, fouling.End.MilligramsPerLitre, FoulingShare),
                CorrectionForms.Percent => concentration * Between(fouling.Start.Percent, fouling.End.Percent, FoulingShare) / 100,
                _ => ServiceErrors.Undo(AfterDrift, FoulingSlope, FoulingZero) - AfterDrift,
            };
        }

        Corrected = AfterDrift + Fouling;
        SumOfCorrections = Math.Abs(Drift) + Math.Abs(Fouling);
        Rating = ServiceErrors.Rate(SumOfCorrections, concentration, _plan.Limits);
    }

    /// <summary>
    /// The concentration that a probe with the slope and zero of that time read: response = (zero + dz) + k·slope·p, so that
    /// p = (p by the calibration − dz/(slope·flow·gain))/k.
    /// </summary>
    private double WithoutDrift(CalibrationInUse calibration, ErrorRamp drift, double concentration, double temperature, double pressure, double salinity)
    {
        DriftSlope = Between(drift.Start.Slope, drift.End.Slope, DriftShare);
        DriftZero = Between(drift.Start.Zero, drift.End.Zero, DriftShare);
        if (DriftZero == 0)
        {
            return ServiceErrors.Undo(concentration, DriftSlope, 0);
        }

        if (calibration.Core.Model.Gain(temperature, RangeRule.Extrapolate, out double gain) != Status.Ok && double.IsNaN(gain))
        {
            return double.NaN;
        }

        ResponsePerHectopascal = calibration.Core.Slope * calibration.Conditions.FlowFactor * gain;
        double partialPressure = ServiceErrors.Undo(Reading.Value(ReadingQuantity.PartialPressure), DriftSlope, DriftZero / ResponsePerHectopascal);
        return partialPressure * PerHectopascal(calibration, concentration, temperature, pressure, salinity);
    }

    /// <summary>mg/L per hPa in that water; a concentration is proportional to its partial pressure.</summary>
    internal double PerHectopascal(CalibrationInUse calibration, double concentration, double temperature, double pressure, double salinity)
    {
        double partialPressure = Reading.Value(ReadingQuantity.PartialPressure);
        if (partialPressure != 0)
        {
            return concentration / partialPressure;
        }

        double usable = double.IsNaN(pressure) ? PressureUnits.HectopascalPerAtmosphere : pressure;
        OxygenEquilibrium.ConcentrationFromPartialPressure(
            calibration.Conditions.Equation, temperature, salinity, usable, 1, RangeRule.NearEdge, out double one);
        return one;
    }

    internal static double Between(double start, double end, double share)
    {
        return start + (share * (end - start));
    }
}
