namespace ProbeCal;

/// <summary>
/// Standard uncertainty (k = 1) of what a total-gas reading says, by the law of propagation (JCGM 100:2008) for independent inputs; an input that enters twice (temperature by solubility and
/// vapour, pressure by air and water) is carried once, with the sum of its sensitivities.
/// </summary>
/// <remarks>
/// ΔP counts as measured (a differential instrument). Where the total pressure was measured and ΔP is what is left over the barometer, say so: the two then share the barometer's error. Accuracy: first order.
/// The vapour formula's own 0.1 % (0.03 hPa at 25 °C) is left out.
/// </remarks>
public static class TotalDissolvedGasUncertainty
{
    /// <summary>Of the total gas pressure in %.</summary>
    /// <param name="deltaHectopascal">ΔP, hPa.</param>
    /// <param name="barometricHectopascal">Absolute station pressure, hPa, above zero.</param>
    /// <param name="isTotalMeasured">True where the total pressure was measured and ΔP is the difference; its uncertainty is then the next.</param>
    /// <param name="deltaUncertaintyHectopascal">Standard uncertainty of ΔP (or of the total pressure), hPa.</param>
    /// <param name="barometricUncertaintyHectopascal">Standard uncertainty of the station pressure, hPa.</param>
    /// <param name="percent">Standard uncertainty, %; NaN unless the status is Ok.</param>
    public static Status Percent(
        double deltaHectopascal, double barometricHectopascal, bool isTotalMeasured,
        double deltaUncertaintyHectopascal, double barometricUncertaintyHectopascal, out double percent)
    {
        percent = double.NaN;
        Status status = TotalDissolvedGas.CheckTotal(deltaHectopascal, barometricHectopascal);
        status = InputCheck.Graver(status, InputCheck.Uncertainty(deltaUncertaintyHectopascal));
        status = InputCheck.Graver(status, InputCheck.Uncertainty(barometricUncertaintyHectopascal));
        if (status != Status.Ok || barometricHectopascal <= 0.0) { return status; }
        double perDelta = 100.0 / barometricHectopascal;
        double perBarometric = -perDelta * deltaHectopascal / barometricHectopascal;
        double squares = Squares(perDelta, perBarometric, isTotalMeasured, deltaUncertaintyHectopascal, barometricUncertaintyHectopascal);
        return InputCheck.Deliver(Numerics.Sqrt(squares), status, Status.UncertaintyAboveRange, out percent);
    }

    /// <summary>Of the partial pressures and saturations, with oxygen measured as a concentration.</summary>
    /// <param name="equation">Solubility equation of oxygen.</param>
    /// <param name="deltaHectopascal">ΔP, hPa.</param>
    /// <param name="barometricHectopascal">Absolute station pressure, 506.625–1114.575 hPa.</param>
    /// <param name="celsius">Temperature, 0–40 °C.</param>
    /// <param name="salinity">Practical salinity, 0–40.</param>
    /// <param name="milligramsPerLitre">Concentration of oxygen, mg/L.</param>
    /// <param name="carbonDioxideHectopascal">Partial pressure of carbon dioxide, hPa, taken as exact; 0 to leave it out.</param>
    /// <param name="isTotalMeasured">True where the total pressure was measured and ΔP is the difference.</param>
    /// <param name="deltaUncertaintyHectopascal">Standard uncertainty of ΔP (or of the total pressure), hPa.</param>
    /// <param name="barometricUncertaintyHectopascal">Standard uncertainty of the station pressure, hPa.</param>
    /// <param name="temperatureUncertaintyKelvin">Standard uncertainty of the temperature, K.</param>
    /// <param name="salinityUncertainty">Standard uncertainty of the salinity.</param>
    /// <param name="oxygenUncertaintyMilligramsPerLitre">Standard uncertainty of the oxygen, mg/L.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="oxygenHectopascal">Standard uncertainty of the partial pressure of oxygen, hPa.</param>
    /// <param name="oxygenPercent">Standard uncertainty of the saturation with oxygen, %.</param>
    /// <param name="nitrogenArgonHectopascal">Standard uncertainty of the partial pressure of nitrogen and argon, hPa.</param>
    /// <param name="nitrogenArgonPercent">Standard uncertainty of their saturation, %.</param>
    public static Status Components(
        SolubilityEquation equation, double deltaHectopascal, double barometricHectopascal, double celsius, double salinity,
        double milligramsPerLitre, double carbonDioxideHectopascal, bool isTotalMeasured,
        double deltaUncertaintyHectopascal, double barometricUncertaintyHectopascal, double temperatureUncertaintyKelvin,
        double salinityUncertainty, double oxygenUncertaintyMilligramsPerLitre, RangeRule rule,
        out double oxygenHectopascal, out double oxygenPercent, out double nitrogenArgonHectopascal, out double nitrogenArgonPercent)
    {
        oxygenHectopascal = double.NaN;
        oxygenPercent = double.NaN;
        nitrogenArgonHectopascal = double.NaN;
        nitrogenArgonPercent = double.NaN;
        Status inputs = InputCheck.Graver(InputCheck.Uncertainty(deltaUncertaintyHectopascal), InputCheck.Uncertainty(barometricUncertaintyHectopascal));
        inputs = InputCheck.Graver(inputs, InputCheck.Uncertainty(temperatureUncertaintyKelvin));
        inputs = InputCheck.Graver(inputs, InputCheck.Uncertainty(salinityUncertainty));
        inputs = InputCheck.Graver(inputs, InputCheck.Uncertainty(oxygenUncertaintyMilligramsPerLitre));
        Status ofOxygen = GasEquilibrium.PartialPressureFromConcentration(
            Gas.Oxygen, equation, celsius, salinity, barometricHectopascal, milligramsPerLitre, RangeRule.Extrapolate, out double oxygen);
        Status status = TotalDissolvedGas.NitrogenArgonSensitivities(
            deltaHectopascal, barometricHectopascal, celsius, salinity, double.IsNaN(oxygen) ? 0.0 : oxygen, carbonDioxideHectopascal, rule,
            out double vapourTerm, out double saltTerm, out double perDelta, out double perBarometric, out double perKelvin, out double perSalinity);
        status = InputCheck.Graver(InputCheck.Graver(ofOxygen, status), inputs);
        if (inputs != Status.Ok || InputCheck.Refuses(status, rule)) { return status; }
        GasEquilibrium.PartialPressureFromConcentrationSensitivities(
            Gas.Oxygen, equation, celsius, salinity, barometricHectopascal, milligramsPerLitre, rule,
            out double oxygenPerKelvin, out double oxygenPerSalinity, out double oxygenPerHectopascal, out double oxygenPerMilligram);
        GasUncertainty.EquationRelative(Gas.Oxygen, equation, celsius, salinity, barometricHectopascal, rule, out double relative);
        Saturation.PercentLocalSensitivities(
            oxygen, celsius, barometricHectopascal, rule,
            out double percentPerOxygen, out double percentPerKelvin, out double percentPerHectopascal);

        double ofConcentration = Square(oxygenPerMilligram * oxygenUncertaintyMilligramsPerLitre) + Square(oxygen * relative);
        oxygenHectopascal = Root(
            ofConcentration + Square(oxygenPerKelvin * temperatureUncertaintyKelvin) + Square(oxygenPerSalinity * salinityUncertainty)
            + Square(oxygenPerHectopascal * barometricUncertaintyHectopascal));
        oxygenPercent = Root(
            (Square(percentPerOxygen) * ofConcentration)
            + Square(((percentPerOxygen * oxygenPerKelvin) + percentPerKelvin) * temperatureUncertaintyKelvin)
            + Square(percentPerOxygen * oxygenPerSalinity * salinityUncertainty)
            + Square(((percentPerOxygen * oxygenPerHectopascal) + percentPerHectopascal) * barometricUncertaintyHectopascal));
        nitrogenArgonHectopascal = Root(
            ofConcentration + Square((vapourTerm - oxygenPerKelvin) * temperatureUncertaintyKelvin)
            + Square((saltTerm - oxygenPerSalinity) * salinityUncertainty)
            + Squares(1.0, 1.0 - oxygenPerHectopascal, isTotalMeasured, deltaUncertaintyHectopascal, barometricUncertaintyHectopascal));
        nitrogenArgonPercent = Root(
            (Square(perDelta) * ofConcentration)
            + Square((perKelvin - (perDelta * oxygenPerKelvin)) * temperatureUncertaintyKelvin)
            + Square((perSalinity - (perDelta * oxygenPerSalinity)) * salinityUncertainty)
            + Squares(
                perDelta, perBarometric - (perDelta * oxygenPerHectopascal), isTotalMeasured,
                deltaUncertaintyHectopascal, barometricUncertaintyHectopascal));
        if (!double.IsNaN(oxygenHectopascal + oxygenPercent + nitrogenArgonHectopascal + nitrogenArgonPercent)) { return status; }
        // One that overflowed takes the others with it: a refusal never leaves part of an answer.
        oxygenHectopascal = double.NaN;
        oxygenPercent = double.NaN;
        nitrogenArgonHectopascal = double.NaN;
        nitrogenArgonPercent = double.NaN;
        return status == Status.Ok ? Status.UncertaintyAboveRange : status;
    }

    /// <summary>The part of ΔP and of the barometer. With a measured total pressure a barometer that reads too high makes ΔP too small by as much.</summary>
    private static double Squares(double perDelta, double perBarometric, bool isTotalMeasured, double ofDelta, double ofBarometric)
    {
        double barometric = isTotalMeasured ? perBarometric - perDelta : perBarometric;
        return Square(perDelta * ofDelta) + Square(barometric * ofBarometric);
    }

    private static double Square(double value)
    {
        return value * value;
    }

    private static double Root(double squares)
    {
        return InputCheck.FiniteOrNaN(Numerics.Sqrt(squares));
    }
}
