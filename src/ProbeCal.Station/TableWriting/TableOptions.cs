namespace ProbeCal.Station.TableWriting;

/// <summary>What a table shall be, in the words of a command line; null where nothing was said.</summary>
public sealed record TableOptions
{
    /// <summary>csv, json, c-float, c-double, csharp or card.</summary>
    public required string Format { get; init; }

    /// <summary>concentration, salinity-factor or vapour-pressure.</summary>
    public string? Quantity { get; init; }

    /// <summary>The gas; oxygen when nothing is said.</summary>
    public string? Gas { get; init; }

    /// <summary>The solubility equation; the default of the gas when nothing is said.</summary>
    public string? Equation { get; init; }

    /// <summary>Range of the temperatures: <c>0..40C</c>.</summary>
    public string? Temperature { get; init; }

    /// <summary>Step of the temperatures: <c>0.5K</c>; chosen when nothing is said.</summary>
    public string? TemperatureStep { get; init; }

    /// <summary>One pressure or a range of them: <c>1atm</c>, <c>600..1100hPa</c>.</summary>
    public string? Pressure { get; init; }

    /// <summary>Step of the pressures: <c>50hPa</c>; chosen when nothing is said.</summary>
    public string? PressureStep { get; init; }

    /// <summary>One salinity or a range of them: <c>0</c>, <c>0..40</c>.</summary>
    public string? Salinity { get; init; }

    /// <summary>Step of the salinities: <c>5</c>; chosen when nothing is said.</summary>
    public string? SalinityStep { get; init; }

    /// <summary>Mole fraction of the gas in dry air; its usual one when nothing is said.</summary>
    public string? MoleFraction { get; init; }

    /// <summary>Allowed interpolation error: <c>0.01mg/L</c> or <c>0.05%</c>.</summary>
    public string? Error { get; init; }

    /// <summary>Name of the table, from which file and identifiers are called.</summary>
    public string? Name { get; init; }

    /// <summary>Altitude of the site of a field card: <c>640m</c>.</summary>
    public string? SiteAltitude { get; init; }

    /// <summary>Name of the site on a field card.</summary>
    public string? Site { get; init; }

    /// <summary>Unit of the pressures of a field card: hPa, mmHg, kPa or inHg.</summary>
    public string? PressureUnit { get; init; }

    /// <summary>Name and version of the program, for the header of the table.</summary>
    public required string Program { get; init; }
}
