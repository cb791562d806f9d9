using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>The names by which records call what Core calls by an enum, both ways. They never change.</summary>
internal static class RecordNames
{
    /// <summary>Source of a temperature that came with the signal.</summary>
    internal const string FromLine = "line";

    /// <summary>Form of the temperature coefficient of a model that has none.</summary>
    internal const string NoForm = "none";

    /// <summary>The stirring's name.</summary>
    public static string Of(Stirring stirring)
    {
        return stirring switch
        {
            Stirring.Still => "still",
            Stirring.FlowInsensitive => "flow-insensitive",
            _ => "stirred",
        };
    }

    /// <summary>The form's name.</summary>
    public static string Of(TemperatureCoefficientForm form)
    {
        return form switch
        {
            TemperatureCoefficientForm.Compound => "compound",
            TemperatureCoefficientForm.Linear => "linear",
            TemperatureCoefficientForm.Arrhenius => "arrhenius",
            TemperatureCoefficientForm.Polynomial => "polynomial",
            _ => "exponential",
        };
    }

    /// <summary>The name of what a meter shows.</summary>
    public static string Of(MeterScale scale)
    {
        return scale switch
        {
            MeterScale.PercentLocal => "%local",
            MeterScale.PercentOneAtmosphere => "%1atm",
            _ => "mg/L",
        };
    }

    /// <summary>The method's id.</summary>
    public static string Of(CalibrationMethod method)
    {
        return method == CalibrationMethod.WaterSaturatedAir ? "water-saturated-air" : "air-saturated-water";
    }

    /// <summary>The stirring of that name.</summary>
    /// <exception cref="InputException">There is none.</exception>
    public static Stirring StirringOf(string name)
    {
        return name switch
        {
            "stirred" => Stirring.Stirred,
            "still" => Stirring.Still,
            "flow-insensitive" => Stirring.FlowInsensitive,
            _ => throw Unknown("stirring", name),
        };
    }

    /// <summary>The form of that name.</summary>
    /// <exception cref="InputException">There is none.</exception>
    public static TemperatureCoefficientForm Form(string name)
    {
        return name switch
        {
            "exponential" => TemperatureCoefficientForm.Exponential,
            "compound" => TemperatureCoefficientForm.Compound,
            "linear" => TemperatureCoefficientForm.Linear,
            "arrhenius" => TemperatureCoefficientForm.Arrhenius,
            "polynomial" => TemperatureCoefficientForm.Polynomial,
            // A polynomial without terms is 1 everywhere.
            NoForm => TemperatureCoefficientForm.Polynomial,
            _ => throw Unknown("temperature coefficient", name),
        };
    }

    /// <summary>The scale of that name.</summary>
    /// <exception cref="InputException">There is none.</exception>
    public static MeterScale Scale(string name)
    {
        return name switch
        {
            "mg/L" => MeterScale.MilligramsPerLitre,
            "%local" => MeterScale.PercentLocal,
            "%1atm" => MeterScale.PercentOneAtmosphere,
            _ => throw Unknown("scale of a meter", name),
        };
    }

    /// <summary>The method of that id.</summary>
    /// <exception cref="InputException">There is none.</exception>
    public static CalibrationMethod Method(string name)
    {
        return name switch
        {
            "air-saturated-water" => CalibrationMethod.AirSaturatedWater,
            "water-saturated-air" => CalibrationMethod.WaterSaturatedAir,
            _ => throw Unknown("method", name),
        };
    }

    private static InputException Unknown(string what, string name)
    {
        return new InputException($"calibration record: the {what} '{Wrong.Shown(name)}' is not known to this program; use a newer probecal");
    }
}
