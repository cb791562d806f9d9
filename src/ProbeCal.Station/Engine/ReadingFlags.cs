namespace ProbeCal.Station.Engine;

/// <summary>From Core's statuses to flags with reasons: one per quantity, and one per input.</summary>
internal static class ReadingFlags
{
    internal static Judged Temperature(SampleInputs inputs, Reading reading)
    {
        return OfInput(inputs.Temperature.Value, InputQuantity.Temperature, reading.StatusOf(ReadingQuantity.PartialPressure));
    }

    internal static Judged Salinity(SampleInputs inputs, Reading reading)
    {
        return OfInput(inputs.Salinity.Value, InputQuantity.Salinity, reading.StatusOf(ReadingQuantity.MilligramsPerLitre));
    }

    internal static Judged Pressure(SampleInputs inputs, Reading reading)
    {
        return inputs.PressureVerdict.Flag != Quality.Pass
            ? inputs.PressureVerdict
            : OfInput(inputs.Pressure.Value, InputQuantity.Pressure, reading.StatusOf(ReadingQuantity.PercentLocal));
    }

    /// <summary>A quantity of the reading.</summary>
    /// <param name="quantity">Which.</param>
    /// <param name="inputs">What it was made with.</param>
    /// <param name="reading">What Core made.</param>
    /// <param name="doubt">A reason to doubt the whole reading, or empty.</param>
    internal static Judged Of(ReadingQuantity quantity, SampleInputs inputs, Reading reading, string doubt)
    {
        Status status = reading.StatusOf(quantity);
        if (double.IsNaN(reading.Value(quantity)))
        {
            return Unusable(status, inputs);
        }

        if (status != Status.Ok)
        {
            return new Judged(Quality.Suspect, Explain(status) + ", extrapolated");
        }

        if (doubt.Length != 0)
        {
            return new Judged(Quality.Suspect, doubt);
        }

        bool restsOnPressure = quantity == ReadingQuantity.PercentLocal;
        return restsOnPressure ? inputs.PressureVerdict : Judged.Pass;
    }

    private static Judged OfInput(double? value, InputQuantity input, Status status)
    {
        if (value == null)
        {
            return new Judged(Quality.Missing, Name(input) + " is missing");
        }

        return StatusParts.Input(status) == input ? new Judged(Quality.Suspect, Explain(status)) : Judged.Pass;
    }

    private static Judged Unusable(Status status, SampleInputs inputs)
    {
        InputQuantity input = StatusParts.Input(status);
        double? given = input switch
        {
            InputQuantity.Temperature => inputs.Temperature.Value,
            InputQuantity.Salinity => inputs.Salinity.Value,
            InputQuantity.Pressure => inputs.Pressure.Value,
            _ => 0,
        };
        if (given == null)
        {
            return new Judged(Quality.Missing, Name(input) + " is missing");
        }

        return input == InputQuantity.Pressure && inputs.PressureVerdict.Flag == Quality.Fail
            ? inputs.PressureVerdict
            : new Judged(Quality.Fail, Explain(status));
    }

    /// <summary>A status in words.</summary>
    internal static string Explain(Status status)
    {
        string what = Name(StatusParts.Input(status));
        return StatusParts.Reason(status) switch
        {
            RefusalReason.NotFinite => what + " is not a number",
            RefusalReason.BelowRange => what + " is below its range",
            RefusalReason.AboveRange => what + " is above its range",
            RefusalReason.JustBelowRange => what + " is just below its range",
            RefusalReason.JustAboveRange => what + " is just above its range",
            _ => what + " is unusable",
        };
    }

    private static string Name(InputQuantity input)
    {
        return input switch
        {
            InputQuantity.PartialPressure => "partial pressure",
            _ => input.ToString().ToLowerInvariant(),
        };
    }
}
