using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Station.InWater;

/// <summary>A vapour pressure by one published form.</summary>
/// <param name="Equation">Its name by author and year.</param>
/// <param name="FreshHectopascal">Over fresh water, hPa; null outside the range of the form.</param>
/// <param name="DeviationPercent">Over fresh water against Wagner and Pruss 1993, %; null outside either range.</param>
/// <param name="TakesSalt">True when the form has a term for salt.</param>
/// <param name="SaltHectopascal">Over this water, hPa, by a form that has a term for salt; null for the others, for fresh water and outside its range.</param>
public sealed record VapourByForm(string Equation, double? FreshHectopascal, double? DeviationPercent, bool TakesSalt, double? SaltHectopascal);

/// <summary>A value that may be absent outside the range of its equation.</summary>
/// <param name="Value">The value; null outside the range.</param>
/// <param name="Uncertainty">Its standard uncertainty in the same unit; null with the value.</param>
public readonly record struct WaterValue(double? Value, double? Uncertainty);

/// <summary>What a water of a temperature and a salinity is like at the surface, by published equations, with standard uncertainties.</summary>
public sealed record WaterProperties
{
    /// <summary>Lowest temperature taken, °C.</summary>
    public const double LowestCelsius = -2.2;

    /// <summary>Highest temperature taken, °C: the highest range of any of the forms of the vapour pressure but one.</summary>
    public const double HighestCelsius = 100;

    private const RangeRule NearEdge = RangeRule.NearEdge;

    private WaterProperties() { }

    /// <summary>Temperature, °C.</summary>
    public required double TemperatureCelsius { get; init; }

    /// <summary>Its standard uncertainty, K; 0 when it was given as exact.</summary>
    public required double TemperatureUncertaintyKelvin { get; init; }

    /// <summary>The salinity and what it was taken from.</summary>
    public required WaterSalt Salt { get; init; }

    /// <summary>Density by EOS-80, kg/m³.</summary>
    public required WaterValue Density { get; init; }

    /// <summary>Density of pure air-free water at this temperature by Tanaka 2001, kg/m³.</summary>
    public required WaterValue PureWaterDensity { get; init; }

    /// <summary>Freezing point by Millero and Leung 1976, °C.</summary>
    public required WaterValue FreezingPoint { get; init; }

    /// <summary>Vapour pressure over this water, hPa, by <see cref="VapourEquation"/>.</summary>
    public required WaterValue VapourPressure { get; init; }

    /// <summary>Name of the form that <see cref="VapourPressure"/> is by.</summary>
    public required string VapourEquation { get; init; }

    /// <summary>The vapour pressure by every form.</summary>
    public required IReadOnlyList<VapourByForm> VapourForms { get; init; }

    /// <summary>What lies outside a range or near its edge, one line each.</summary>
    public required IReadOnlyList<string> Notes { get; init; }

    internal static WaterProperties Compute(double celsius, double uCelsius, WaterSalt salt)
    {
        List<string> notes = [];
        double salinity = salt.Salinity;
        VapourEquation form = salinity == 0 ? ProbeCal.VapourEquation.WagnerPruss1993 : ProbeCal.VapourEquation.Dickson2007;
        WaterProperties properties = new()
        {
            TemperatureCelsius = celsius,
            TemperatureUncertaintyKelvin = uCelsius,
            Salt = salt,
            Density = DensityOf(celsius, uCelsius, salt, notes),
            PureWaterDensity = Propagated("density by Tanaka 2001", t => (DensityTanaka2001.Density(t, NearEdge, out double value), value), celsius, uCelsius, 0.001, notes),
            // Stated accuracy 0.004 K (from memory).
            FreezingPoint = Propagated("freezing point", s => (ProbeCal.FreezingPoint.Celsius(s, RangeRule.Refuse, out double value), value), salinity, salt.Uncertainty, 0.004, notes),
            VapourPressure = VapourOf(form, celsius, uCelsius, salt, notes),
            VapourEquation = InWater.VapourForms.All.First(each => each.Equation == form).Name,
            VapourForms = [.. InWater.VapourForms.All.Select(each => ByForm(each.Equation, each.Name, each.TakesSalt, celsius, salinity))],
            Notes = notes,
        };
        WaterValue[] values = [properties.Density, properties.PureWaterDensity, properties.FreezingPoint, properties.VapourPressure];
        if (!double.IsFinite(salt.Uncertainty) || Array.Exists(values, static each => each.Uncertainty is double sure && !double.IsFinite(sure)))
        {
            throw new InputException(UncertainQuantity.TooLarge);
        }

        if (properties.FreezingPoint.Value is double freezing && celsius < freezing)
        {
            notes.Add(FormattableString.Invariant($"the water is colder than its freezing point of {freezing:F2} °C: super-cooled, or temperature or salinity are wrong"));
        }

        return properties;
    }

    private static WaterValue DensityOf(double celsius, double uCelsius, WaterSalt salt, List<string> notes)
    {
        // Stated standard error of EOS-80.
        const double Own = 0.0036;
        Status status = DensityEos80.Density(celsius, salt.Salinity, NearEdge, out double density);
        if (Missing("density by EOS-80", status, density, notes))
        {
            return default;
        }

        DensityEos80.Sensitivities(celsius, salt.Salinity, NearEdge, out double perKelvin, out double perSalinity);
        return new WaterValue(density, Hypot(Hypot(perKelvin * uCelsius, perSalinity * salt.Uncertainty), Own));
    }

    private static WaterValue VapourOf(VapourEquation form, double celsius, double uCelsius, WaterSalt salt, List<string> notes)
    {
        // Wagner and Pruss 0.02 %, and as much again for the salt.
        double own = salt.Salinity == 0 ? 2e-4 : 3e-4;
        WaterValue byTemperature = Propagated("vapour pressure", t => (ProbeCal.VapourPressure.Hectopascal(form, t, salt.Salinity, NearEdge, out double value), value), celsius, uCelsius, 0, notes);
        if (byTemperature.Value is not double vapour)
        {
            return default;
        }

        double bySalt = salt.Uncertainty == 0 ? 0 : Slope(s => (ProbeCal.VapourPressure.Hectopascal(form, celsius, s, NearEdge, out double value), value), salt.Salinity) * salt.Uncertainty;
        return new WaterValue(vapour, Hypot(Hypot(byTemperature.Uncertainty!.Value, bySalt), own * vapour));
    }

    private static VapourByForm ByForm(VapourEquation equation, string name, bool takesSalt, double celsius, double salinity)
    {
        ProbeCal.VapourPressure.Hectopascal(equation, celsius, 0, NearEdge, out double fresh);
        ProbeCal.VapourPressure.Hectopascal(ProbeCal.VapourEquation.WagnerPruss1993, celsius, 0, NearEdge, out double reference);
        double salt = double.NaN;
        if (takesSalt && salinity != 0)
        {
            ProbeCal.VapourPressure.Hectopascal(equation, celsius, salinity, NearEdge, out salt);
        }

        return new VapourByForm(name, OrNull(fresh), OrNull(100 * (fresh - reference) / reference), takesSalt, OrNull(salt));
    }

    /// <summary>A value of one input with what the input's uncertainty and the form's own make of it.</summary>
    private static WaterValue Propagated(string what, Func<double, (Status Status, double Value)> form, double input, double uInput, double own, List<string> notes)
    {
        (Status status, double value) = form(input);
        return Missing(what, status, value, notes) ? default : new WaterValue(value, uInput == 0 ? own : Hypot(Slope(form, input) * uInput, own));
    }

    /// <summary>The slope over a step of 0.01 to either side, or to the one where the other has no value.</summary>
    private static double Slope(Func<double, (Status Status, double Value)> form, double input)
    {
        const double Step = 0.01;
        (double low, double high) = (form(input - Step).Value, form(input + Step).Value);
        (double left, double right) = (Step, Step);
        if (double.IsNaN(low))
        {
            (low, left) = (form(input).Value, 0);
        }

        if (double.IsNaN(high))
        {
            (high, right) = (form(input).Value, 0);
        }

        return (high - low) / (left + right);
    }

    private static bool Missing(string what, Status status, double value, List<string> notes)
    {
        if (status == Status.Ok)
        {
            return false;
        }

        string input = StatusParts.Input(status) == InputQuantity.Salinity ? "salinity" : "temperature";
        bool near = !double.IsNaN(value);
        notes.Add(near ? $"{what}: the {input} is just outside the range of the equation" : $"{what}: none, the {input} is outside the range of the equation");
        return !near;
    }

    private static double? OrNull(double value)
    {
        return double.IsNaN(value) ? null : value;
    }

    private static double Hypot(double a, double b)
    {
        return Math.Sqrt((a * a) + (b * b));
    }
}
