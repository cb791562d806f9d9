using System;
using System.Globalization;

namespace ProbeCal;

/// <summary>
/// Properties of water and air for desktop callers: the value is returned, a refused input throws
/// <see cref="InputRefusedException"/>. Units, ranges and sources are those of the functions named.
/// </summary>
public static class WaterOrThrow
{
    /// <summary><see cref="VapourBensonKrause1980.Pressure"/>.</summary>
    /// <exception cref="InputRefusedException">The temperature is not finite or out of range.</exception>
    public static double VapourPressureBensonKrause1980(double celsius)
    {
        Status status = VapourBensonKrause1980.Pressure(celsius, RangeRule.Refuse, out double value);
        return status == Status.Ok
            ? value
            : throw Refusal(status, celsius, $"{VapourBensonKrause1980.LowestCelsius} to {VapourBensonKrause1980.HighestCelsius} °C");
    }

    /// <summary><see cref="VapourWagnerPruss1993.Pressure"/>.</summary>
    /// <exception cref="InputRefusedException">The temperature is not finite or out of range.</exception>
    public static double VapourPressureWagnerPruss1993(double celsius)
    {
        Status status = VapourWagnerPruss1993.Pressure(celsius, RangeRule.Refuse, out double value);
        return status == Status.Ok
            ? value
            : throw Refusal(status, celsius, $"{VapourWagnerPruss1993.LowestCelsius} to {VapourWagnerPruss1993.HighestCelsius} °C");
    }

    /// <summary><see cref="DensityEos80.Density"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range.</exception>
    public static double Density(double celsius, double salinity)
    {
        Status status = DensityEos80.Density(celsius, salinity, RangeRule.Refuse, out double value);
        if (status == Status.Ok) { return value; }
        throw Refusal(
            status,
            StatusParts.Input(status) == InputQuantity.Salinity ? salinity : celsius,
            $"{DensityEos80.LowestCelsius} to {DensityEos80.HighestCelsius} °C, salinity 0 to {DensityEos80.HighestSalinity}");
    }

    /// <summary><see cref="DensityTanaka2001.Density"/>.</summary>
    /// <exception cref="InputRefusedException">The temperature is not finite or out of range.</exception>
    public static double PureDensity(double celsius)
    {
        Status status = DensityTanaka2001.Density(celsius, RangeRule.Refuse, out double value);
        return status == Status.Ok
            ? value
            : throw Refusal(status, celsius, $"{DensityTanaka2001.LowestCelsius} to {DensityTanaka2001.HighestCelsius} °C");
    }

    /// <summary><see cref="VapourPressure.Hectopascal"/>.</summary>
    /// <exception cref="InputRefusedException">The form is not known, or an input is not finite or out of its range.</exception>
    public static double Vapour(VapourEquation equation, double celsius, double salinity)
    {
        Status status = VapourPressure.Hectopascal(equation, celsius, salinity, RangeRule.Refuse, out double value);
        if (status == Status.Ok) { return value; }
        throw StatusParts.Input(status) switch
        {
            InputQuantity.Salinity => Refusal(status, salinity, $"the range of {equation}; a form for pure water takes salinity 0 alone"),
            InputQuantity.Temperature => Refusal(status, celsius, $"the range of {equation}"),
            _ => Refusal(status, (int)equation, $"{(int)VapourEquation.WagnerPruss1993} ({VapourEquation.WagnerPruss1993}) to {(int)VapourEquation.Antoine8111} ({VapourEquation.Antoine8111})"),
        };
    }

    /// <summary><see cref="PracticalSalinity.FromConductivity"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range.</exception>
    public static double PracticalSalinityFromConductivity(double millisiemensPerCentimetre, double celsius, double seaPressureDecibar)
    {
        Status status = PracticalSalinity.FromConductivity(
            millisiemensPerCentimetre, celsius, seaPressureDecibar, RangeRule.Refuse, out double value);
        if (status == Status.Ok) { return value; }
        throw StatusParts.Input(status) switch
        {
            InputQuantity.Temperature => Refusal(status, celsius, $"{PracticalSalinity.LowestCelsius} to {PracticalSalinity.HighestCelsius} °C"),
            InputQuantity.Depth => Refusal(status, seaPressureDecibar, $"0 to {PracticalSalinity.HighestSeaPressureDecibar} dbar"),
            _ => Refusal(status, millisiemensPerCentimetre, $"0 mS/cm to what gives salinity {PracticalSalinity.HighestSalinity}"),
        };
    }

    /// <summary><see cref="FreezingPoint.Celsius"/>.</summary>
    /// <exception cref="InputRefusedException">The salinity is not finite or out of range.</exception>
    public static double FreezingCelsius(double salinity)
    {
        Status status = FreezingPoint.Celsius(salinity, RangeRule.Refuse, out double value);
        return status == Status.Ok ? value : throw Refusal(status, salinity, $"salinity 0 to {FreezingPoint.HighestSalinity}");
    }

    /// <summary><see cref="SpecificConductance.Salinity"/>.</summary>
    /// <exception cref="InputRefusedException">The conductance is not finite or out of range.</exception>
    public static double SalinityFromSpecificConductance(double microsiemensPerCentimetre)
    {
        Status status = SpecificConductance.Salinity(microsiemensPerCentimetre, RangeRule.Refuse, out double value);
        return status == Status.Ok
            ? value
            : throw Refusal(status, microsiemensPerCentimetre, $"0 to {SpecificConductance.HighestMicrosiemensPerCentimetre} µS/cm");
    }

    /// <summary><see cref="StandardAtmosphere.Pressure"/>.</summary>
    /// <exception cref="InputRefusedException">The altitude is not finite or out of range.</exception>
    public static double StandardPressure(double altitudeMetres)
    {
        Status status = StandardAtmosphere.Pressure(altitudeMetres, out double value);
        return status == Status.Ok ? value : throw AltitudeRefusal(status, double.NaN, altitudeMetres);
    }

    /// <summary><see cref="StandardAtmosphere.ReduceToSeaLevel"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range.</exception>
    public static double SeaLevelPressure(double stationHectopascal, double altitudeMetres)
    {
        Status status = StandardAtmosphere.ReduceToSeaLevel(stationHectopascal, altitudeMetres, out double value);
        return status == Status.Ok ? value : throw AltitudeRefusal(status, stationHectopascal, altitudeMetres);
    }

    /// <summary><see cref="StandardAtmosphere.FromSeaLevel"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range.</exception>
    public static double StationPressure(double seaLevelHectopascal, double altitudeMetres)
    {
        Status status = StandardAtmosphere.FromSeaLevel(seaLevelHectopascal, altitudeMetres, out double value);
        return status == Status.Ok ? value : throw AltitudeRefusal(status, seaLevelHectopascal, altitudeMetres);
    }

    /// <summary><see cref="SeaLevelReduction.StationPressure"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range.</exception>
    public static double StationPressure(double seaLevelHectopascal, double altitudeMetres, double airCelsius)
    {
        Status status = SeaLevelReduction.StationPressure(seaLevelHectopascal, altitudeMetres, airCelsius, out double value);
        if (status == Status.Ok) { return value; }
        throw StatusParts.Input(status) == InputQuantity.Temperature
            ? Refusal(status, airCelsius, $"{SeaLevelReduction.LowestCelsius} to {SeaLevelReduction.HighestCelsius} °C")
            : AltitudeRefusal(status, seaLevelHectopascal, altitudeMetres);
    }

    private static InputRefusedException AltitudeRefusal(Status status, double hectopascal, double altitudeMetres)
    {
        return Refusal(
            status,
            StatusParts.Input(status) == InputQuantity.Pressure ? hectopascal : altitudeMetres,
            $"{StandardAtmosphere.LowestAltitudeMetres} to {StandardAtmosphere.HighestAltitudeMetres} m, pressure above 0 hPa");
    }

    private static InputRefusedException Refusal(Status status, double value, FormattableString allowed)
    {
        return new InputRefusedException(status, value, allowed.ToString(CultureInfo.InvariantCulture));
    }
}
