namespace ProbeCal;

/// <summary>
/// The form that the calibrations of luminescence sensors share: x = (P0/Pc − 1)/Ksv, Ksv = c0 + c1·t + c2·t², P0 = c3 + c4·t,
/// Pc = c5 + c6·φ + c7·φ². The probes give the hPa that one unit of x stands for; what follows from signal, depth and scale is here for all of
/// them. Immutable.
/// </summary>
internal sealed class UchidaForm
{
    private readonly double c0;
    private readonly double c1;
    private readonly double c2;
    private readonly double c3;
    private readonly double c4;
    private readonly double c5;
    private readonly double c6;
    private readonly double c7;

    internal UchidaForm(double c0, double c1, double c2, double c3, double c4, double c5, double c6, double c7, double phasePerThousandDecibar)
    {
        this.c0 = c0;
        this.c1 = c1;
        this.c2 = c2;
        this.c3 = c3;
        this.c4 = c4;
        this.c5 = c5;
        this.c6 = c6;
        this.c7 = c7;
        PhasePerThousandDecibar = phasePerThousandDecibar;
    }

    /// <summary>Degrees that the phase loses per 1000 dbar.</summary>
    internal double PhasePerThousandDecibar { get; }

    /// <summary>hPa of a signal: x times the scale, whose status comes with it.</summary>
    internal Status Response(double signal, double celsius, double hydrostaticDecibar, Status ofScale, double scale, out double response)
    {
        response = double.NaN;
        if (double.IsNaN(scale)) { return ofScale; }
        Status status = Value(AtSurface(signal, hydrostaticDecibar), celsius, out double value, out _, out _);
        return status != Status.Ok ? status : InputCheck.Deliver(value * scale, ofScale, Status.SignalAboveRange, out response);
    }

    /// <summary>The signal of so many hPa: the inverse of <see cref="Response"/>.</summary>
    internal Status Signal(double response, double celsius, double hydrostaticDecibar, Status ofScale, double scale, out double signal)
    {
        signal = double.NaN;
        if (double.IsNaN(scale)) { return ofScale; }
        // A product of positive factors; the test keeps an underflow out.
        if (scale <= 0.0) { return Status.CoefficientBelowRange; }
        Status status = Phase(response / scale, celsius, out double phase);
        return status != Status.Ok
            ? status
            : InputCheck.Deliver(phase - (PhasePerThousandDecibar * hydrostaticDecibar / 1000.0), ofScale, Status.CoefficientNotFinite, out signal);
    }

    /// <summary>d response/d signal.</summary>
    internal Status ResponsePerSignal(double signal, double celsius, double hydrostaticDecibar, Status ofScale, double scale, out double responsePerSignal)
    {
        responsePerSignal = double.NaN;
        if (double.IsNaN(scale)) { return ofScale; }
        Status status = Value(AtSurface(signal, hydrostaticDecibar), celsius, out _, out double perPhase, out _);
        return status != Status.Ok ? status : InputCheck.Deliver(perPhase * scale, ofScale, Status.SignalAboveRange, out responsePerSignal);
    }

    /// <summary>d response/d temperature, of x and of the scale together.</summary>
    internal Status ResponsePerKelvin(
        double signal, double celsius, double hydrostaticDecibar, Status ofScale, double scale, double scalePerKelvin, out double perKelvin)
    {
        perKelvin = double.NaN;
        if (double.IsNaN(scale)) { return ofScale; }
        Status status = Value(AtSurface(signal, hydrostaticDecibar), celsius, out double value, out _, out double valuePerKelvin);
        return status != Status.Ok
            ? status
            : InputCheck.Deliver((valuePerKelvin * scale) + (value * scalePerKelvin), Status.Ok, Status.SignalAboveRange, out perKelvin);
    }

    private double AtSurface(double signal, double hydrostaticDecibar)
    {
        return hydrostaticDecibar == 0.0 ? signal : signal + (PhasePerThousandDecibar * hydrostaticDecibar / 1000.0);
    }

    /// <summary>x of a phase with its slopes.</summary>
    private Status Value(double phase, double celsius, out double value, out double perPhase, out double perKelvin)
    {
        value = double.NaN;
        perPhase = double.NaN;
        perKelvin = double.NaN;
        if (InputCheck.NotFinite(phase)) { return Status.SignalNotFinite; }
        Status status = AtTemperature(celsius, out double quenching, out double unquenched);
        if (status != Status.Ok) { return status; }
        double quenched = c5 + (phase * (c6 + (phase * c7)));
        // A calibrated phase of zero or below would be more oxygen than there is.
        if (quenched <= 0.0) { return Status.SignalBelowRange; }
        double x = ((unquenched / quenched) - 1.0) / quenching;
        if (InputCheck.NotFinite(x)) { return Status.SignalAboveRange; }
        double slope = -unquenched / quenched / quenched * (c6 + (2.0 * c7 * phase)) / quenching;
        double slopePerKelvin = ((c4 / quenched) - (x * (c1 + (2.0 * c2 * celsius)))) / quenching;
        if (InputCheck.NotFinite(slope) || InputCheck.NotFinite(slopePerKelvin)) { return Status.SignalAboveRange; }
        value = x;
        perPhase = slope;
        perKelvin = slopePerKelvin;
        return Status.Ok;
    }

    /// <summary>The phase of x: of the two that a curved Pc allows, the one on the branch through the line.</summary>
    private Status Phase(double value, double celsius, out double phase)
    {
        phase = double.NaN;
        if (InputCheck.NotFinite(value)) { return Status.PartialPressureNotFinite; }
        Status status = AtTemperature(celsius, out double quenching, out double unquenched);
        if (status != Status.Ok) { return status; }
        double ratio = 1.0 + (quenching * value);
        if (ratio <= 0.0) { return Status.PartialPressureBelowRange; }
        if (c6 == 0.0) { return Status.CoefficientBelowRange; }
        double linear = ((unquenched / ratio) - c5) / c6;
        double discriminant = 1.0 + (4.0 * linear * (c7 / c6));
        if (discriminant < 0.0 || InputCheck.NotFinite(discriminant)) { return Status.PartialPressureAboveRange; }
        double root = c7 == 0.0 ? linear : 2.0 * linear / (1.0 + Numerics.Sqrt(discriminant));
        return InputCheck.Deliver(root, Status.Ok, Status.PartialPressureAboveRange, out phase);
    }

    private Status AtTemperature(double celsius, out double quenching, out double unquenched)
    {
        quenching = c0 + (celsius * (c1 + (celsius * c2)));
        unquenched = c3 + (celsius * c4);
        if (InputCheck.NotFinite(celsius)) { return Status.TemperatureNotFinite; }
        if (InputCheck.NotFinite(quenching) || InputCheck.NotFinite(unquenched) || InputCheck.NotFinite(c5 + c6 + c7)) { return Status.CoefficientNotFinite; }
        return quenching <= 0.0 || unquenched <= 0.0 ? Status.CoefficientBelowRange : Status.Ok;
    }
}
