using System;
using System.Collections.Generic;
using System.CommandLine;
using System.Globalization;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;
using ProbeCal.Station.Sources;

namespace ProbeCal.Host.Commands;

/// <summary>From options, and answers where options are missing, to a set-up.</summary>
internal sealed class CalibrateSetup
{
    private const string UnnamedThermometer = "not named";

    private static readonly string[] Forms = ["line", "quadratic"];
    private static readonly string[] CheckKinds = [CalibrationIds.Initial, CalibrationIds.Continuing, CalibrationIds.EndOfDay];
    private static readonly string[] Stirrings = ["stirred", "still", "flow-insensitive"];
    private static readonly string[] Scales = ["mg/L", "%local", "%1atm"];

    // A typical membrane, needed only for how a thermometer error acts on a meter that compensates by itself.
    private static readonly RecordedTemperatureCoefficient TypicalMembrane =
        CoefficientText.Parse("typical membrane", "exponential 0.03/K at 25C fitted 0..40C") with { Source = "typical membrane (from memory); serves the uncertainty only" };

    private readonly CalibrateOptions _options;
    private readonly string _purpose;
    private readonly EquipmentValues _register;
    private readonly OptionReader _reader;

    /// <param name="options">The options.</param>
    /// <param name="purpose">Calibration or check.</param>
    /// <param name="register">What the register knows of reference equipment.</param>
    /// <param name="parsed">What was given.</param>
    /// <param name="questions">Who asks for what is missing; null refuses instead.</param>
    internal CalibrateSetup(CalibrateOptions options, string purpose, EquipmentValues register, ParseResult parsed, Questions? questions)
    {
        _options = options;
        _purpose = purpose;
        _register = register;
        _reader = new OptionReader(parsed, questions);
    }

    /// <summary>Options and answers of the questions that were asked, as words of a command line.</summary>
    internal IReadOnlyList<string> Answered => _reader.Answered;

    internal async Task<CalibrationSetup> BuildAsync(SourceAddress? address, LineTemplate? line, CancellationToken cancellationToken)
    {
        bool manual = address == null;
        string method = await _reader.NeedChoiceAsync(_options.Method, "Method:", MethodIds.All, cancellationToken).ConfigureAwait(false);
        bool air = method == MethodIds.WaterSaturatedAir;
        // In gas, as in air, nobody stirs and the salinity only says at which salinity the errors are expressed in mg/L.
        bool inGas = air || method is MethodIds.GasMixture or MethodIds.ZeroGas;
        Gas gas = _reader.Given(_options.GasOption) is string named ? GasNames.Parse("--gas", named) : Gas.Oxygen;
        string probe = await _reader.NeedAsync(_options.Probe, "Probe id?", OptionReader.Id(_options.Probe), cancellationToken).ConfigureAwait(false);
        double? temperature = Temperature(line, manual);
        if (temperature == null && line is not { HasTemperature: true })
        {
            temperature = await _reader.NeedAsync(_options.Temperature, "Temperature at the probe (for example 20.1C)?", text => Quantity.TemperatureCelsius("--temperature", text), cancellationToken).ConfigureAwait(false);
        }

        PressureSource pressureSource = await _reader.NeedAsync(
            _options.PressureSource,
            line is { HasPressure: true } ? "Who measures the pressure in the lines (barometer:ID; or weather-service:NAME, airport:NAME)?" : "Where does the pressure come from (barometer:ID, weather-service:NAME, airport:NAME, telephone, or altitude without any)?",
            static text => PressureSource.Parse("--pressure-source", text),
            cancellationToken).ConfigureAwait(false);
        string? height = await HeightAsync(pressureSource, cancellationToken).ConfigureAwait(false);
        RecordedQuantity? altitude = height == null ? null : Measured(Quantity.AltitudeMetres("--altitude", height), "m", 5, "typed");
        EnteredPressure pressure = await PressureAsync(pressureSource, line, height, altitude, cancellationToken).ConfigureAwait(false);
        double salinity = _reader.Given(_options.Salinity) == null && inGas
            ? 0
            : await _reader.NeedAsync(_options.Salinity, "Practical salinity of the water (0 for fresh)?", text => Quantity.Salinity("--salinity", text), cancellationToken).ConfigureAwait(false);
        Stirring stirring = _reader.Given(_options.StirringOption) == null && inGas
            ? Stirring.Stirred
            : StirringOf(await _reader.NeedChoiceAsync(_options.StirringOption, "The water at the probe:", Stirrings, cancellationToken).ConfigureAwait(false));
        CalibratePlan plan = new(_options, _purpose, _register, _reader);
        IReadOnlyList<PlannedPoint> points = await plan.PointsAsync(method, gas, cancellationToken).ConfigureAwait(false);
        RecordedProbe recorded = await ProbeAsync(probe, line, manual, temperature != null, cancellationToken).ConfigureAwait(false);
        CalibrateLimits judged = new(_options, _reader);
        CalibrationLimits limits = judged.Limits(ErrorScale.IsHectopascal(GasNames.NameOf(gas), recorded.Model));
        return new CalibrationSetup
        {
            Purpose = _purpose,
            CheckKind = _reader.Given(_options.As) is string kind ? OptionReader.Choice(_options.As, CheckKinds)(kind) : null,
            Gas = gas,
            Plan = points,
            FitForm = _reader.Given(_options.Form) is string form ? OptionReader.Choice(_options.Form, Forms)(form) : "line",
            Equipment = [.. _reader.Many(_options.Equipment).Select(static id => PlainText.Id("--equipment", id))],
            Probe = recorded,
            Method = method,
            Readings = manual ? CalibrationIds.Typed : CalibrationIds.Live,
            Source = address?.ToString() ?? "the display of the meter",
            Simulated = address is SimulatedAddress || _reader.IsSet(_options.Simulated),
            Equation = _reader.Given(_options.Equation) is string equation ? EquationNames.Parse("--equation", equation) : EquationNames.Default,
            Pressure = pressure,
            TypedTemperatureCelsius = temperature,
            TemperatureStandardUncertaintyKelvin = _reader.NotNegative(_options.TemperatureUncertainty, QuantityKind.TemperatureDifference) ?? UncertaintyDefaults.TemperatureKelvin,
            Salinity = Measured(salinity, "1", _reader.NotNegative(_options.SalinityUncertainty, QuantityKind.Salinity) ?? UncertaintyDefaults.Salinity, "typed"),
            Altitude = altitude,
            Stirring = stirring,
            AirToWaterRatio = air ? Ratio() : null,
            ReferenceStateRelative = (_reader.NotNegative(_options.ReferenceUncertainty, QuantityKind.Percent) / 100)
                ?? UncertaintyDefaults.ReferenceStateRelative(air ? CalibrationMethod.WaterSaturatedAir : CalibrationMethod.AirSaturatedWater),
            ZeroPlan = plan.Zero(manual, method),
            Limits = limits,
            Surroundings = Surroundings(),
            Waiting = judged.Waiting(limits),
            Reasons = Reasons(),
            By = _reader.Given(_options.By),
            Site = _reader.Given(_options.Site),
            Remarks = _reader.Given(_options.Remarks),
        };
    }

    private double? Temperature(LineTemplate? line, bool manual)
    {
        if (_reader.Given(_options.Temperature) is string given)
        {
            return Quantity.TemperatureCelsius("--temperature", given);
        }

        bool needed = manual || line is not { HasTemperature: true };
        return needed && !_reader.CanAsk
            ? throw new InputException(manual
                ? "--temperature is missing: a typed calibration needs the temperature of the water, for example --temperature 20.1C"
                : "--temperature is missing: the lines carry no {temperature}, so it has to be given, for example --temperature 20.1C")
            : null;
    }

    private async Task<EnteredPressure> PressureAsync(PressureSource source, LineTemplate? line, string? height, RecordedQuantity? altitude, CancellationToken cancellationToken)
    {
        double? uncertainty = _reader.NotNegative(_options.PressureUncertainty, QuantityKind.Pressure);
        double? value;
        if (source.IsAltitudeOnly)
        {
            value = FromAltitude(altitude);
            uncertainty = uncertainty == null ? null : Math.Max(uncertainty.Value, UncertaintyDefaults.AltitudeOnlyHectopascal);
        }
        else
        {
            bool fromLine = _reader.Given(_options.Pressure) == null && line is { HasPressure: true };
            value = fromLine
                ? null
                : await _reader.NeedAsync(_options.Pressure, "Absolute station pressure with its unit (for example 742mmHg)?", text => Pressure(text, height, altitude), cancellationToken).ConfigureAwait(false);
        }

        EnteredPressure pressure = new()
        {
            Hectopascal = value,
            Source = source.Text,
            StandardUncertaintyHectopascal = uncertainty ?? source.DefaultUncertaintyHectopascal,
            UncertaintySource = uncertainty == null ? source.DefaultUncertaintySource : null,
        };
        return _register.CorrectionOfPressure(source.Text) is RecordedQuantity correction ? pressure.Corrected(correction) : pressure;
    }

    /// <summary>The altitude as typed. A person is asked for it, since a sea-level pressure shows against nothing else.</summary>
    private Task<string?> HeightAsync(PressureSource source, CancellationToken cancellationToken)
    {
        const string Question = "Altitude of the site (for example 640m or 2100ft";
        return source.IsAltitudeOnly && _reader.CanAsk
            ? _reader.NeedAsync<string?>(_options.Altitude, Question + ")?", Checked, cancellationToken)
            : _reader.WishAsync(_options.Altitude, Question + "; Enter if not known)?", static text => Checked(text), cancellationToken);

        static string Checked(string text)
        {
            Quantity.AltitudeMetres("--altitude", text);
            return text;
        }
    }

    /// <summary>Reads a pressure; one that cannot be at the altitude is asked for again while the person is still there.</summary>
    private double Pressure(string text, string? height, RecordedQuantity? altitude)
    {
        double hectopascal = Quantity.PressureHectopascal("--pressure", text);
        if (_reader.Given(_options.Pressure) == null && altitude != null)
        {
            // What is unusual and not impossible is asked about by the guards, which keep the reason.
            StationPressure.Judge(text, hectopascal, height!, altitude.Value);
        }

        return hectopascal;
    }

    private double FromAltitude(RecordedQuantity? altitude)
    {
        if (_reader.Given(_options.Pressure) is string given)
        {
            throw new InputException($"--pressure {given}: with --pressure-source altitude the pressure comes from --altitude; leave one of them out");
        }

        if (altitude == null)
        {
            throw new InputException("--pressure-source altitude: give the altitude too, for example --altitude 640m");
        }

        Status status = StandardAtmosphere.Pressure(altitude.Value, out double hectopascal);
        return status == Status.Ok
            ? hectopascal
            : throw new InputException($"--altitude {Number.Print(altitude.Value)} m is outside the standard atmosphere ({Number.Print(StandardAtmosphere.LowestAltitudeMetres)} to {Number.Print(StandardAtmosphere.HighestAltitudeMetres)} m)");
    }

    private async Task<RecordedProbe> ProbeAsync(string id, LineTemplate? line, bool manual, bool temperatureTyped, CancellationToken cancellationToken)
    {
        RecordedMeterSettings? meter = manual ? Meter(await _reader.NeedChoiceAsync(_options.MeterShows, "The meter shows (%local: 100 % at the pressure here, %1atm: 100 % at 1 atm):", Scales, cancellationToken).ConfigureAwait(false)) : null;
        string? model = _reader.Given(_options.Model);
        bool needsNone = meter is { TemperatureCelsius: null } || (model != null && !PlanText.TakesTemperatureCoefficient(model));
        RecordedTemperatureCoefficient coefficient = needsNone && _reader.Given(_options.Coefficient) == null
            ? TypicalMembrane
            : await _reader.NeedAsync(_options.Coefficient, "Temperature coefficient of the membrane, from its maker (for example: exponential 0.03/K at 25C fitted 5..35C)?", text => CoefficientText.Parse("--coefficient", text), cancellationToken).ConfigureAwait(false);
        (double Low, double High)? range = _reader.Range(_options.SignalRange);
        double? common = _reader.NotNegative(_options.ThermometerUncertainty, QuantityKind.TemperatureDifference);
        string signalUnit = meter?.Shows ?? (line is { SignalUnit.Length: > 0 } ? line.SignalUnit : _reader.Given(_options.SignalUnit) ?? "");
        RecordedProbe probe = new()
        {
            Id = id,
            Model = manual ? ModelNames.MeterDisplay : ModelNames.Amperometric,
            SignalUnit = signalUnit,
            TemperatureCoefficient = coefficient,
            MeterSettings = meter,
            SignalResolution = _reader.Positive(_options.SignalResolution),
            SignalLow = range?.Low,
            SignalHigh = range?.High,
            Membrane = Membrane(),
            Thermometer = new RecordedThermometer
            {
                // A temperature typed beside live signals was read elsewhere; its offset is not that of the readings to come.
                Id = _reader.Given(_options.Thermometer) ?? (temperatureTyped && !manual ? UnnamedThermometer : id),
                CommonStandardUncertaintyCelsius = common ?? UncertaintyDefaults.ThermometerOffsetKelvin,
                Source = common == null ? "passed a check of 0.2 C, rectangular (TM 9-A6.8)" : "entered",
            },
        };
        return model == null ? probe : PlanText.WithModel("--model", model, probe);
    }

    private RecordedMembrane? Membrane()
    {
        DateOnly? installed = _reader.Day(_options.MembraneInstalled);
        if (_reader.Given(_options.Membrane) is string id)
        {
            return new RecordedMembrane { Id = id, InstalledOn = installed };
        }

        return installed == null ? null : throw new InputException("--membrane-installed: say which one it is as well, for example --membrane M-4");
    }

    private RecordedMeterSettings Meter(string shows)
    {
        return new RecordedMeterSettings
        {
            Shows = shows,
            Equation = EquationNames.NameOf(_reader.Given(_options.Equation) is string equation ? EquationNames.Parse("--equation", equation) : EquationNames.Default),
            Salinity = _reader.Given(_options.MeterSalinity) is string salinity ? Quantity.Salinity("--meter-salinity", salinity) : 0,
            PressureHectopascal = _reader.Given(_options.MeterPressure) is string pressure ? Quantity.PressureHectopascal("--meter-pressure", pressure) : null,
            TemperatureCelsius = _reader.Given(_options.MeterTemperature) is string temperature ? Quantity.TemperatureCelsius("--meter-temperature", temperature) : null,
            Resolution = _reader.Positive(_options.MeterResolution) ?? (shows == "mg/L" ? 0.01 : 0.1),
        };
    }

    private RecordedQuantity Ratio()
    {
        double? ratio = _reader.Positive(_options.AirToWaterRatio);
        double? uncertainty = _reader.NotNegative(_options.AirToWaterUncertainty, QuantityKind.Percent) / 100;
        return new RecordedQuantity
        {
            Value = ratio ?? 1,
            Unit = "1",
            StandardUncertainty = (uncertainty ?? UncertaintyDefaults.AirToWaterRatioRelative) * (ratio ?? 1),
            Source = ratio == null ? "default (from memory)" : "entered",
            UncertaintySource = uncertainty == null ? "1.5 % (from memory)" : null,
        };
    }

    private Surroundings? Surroundings()
    {
        Surroundings around = new()
        {
            StoneDepthMetres = _reader.NotNegative(_options.StoneDepth, QuantityKind.Depth),
            EquilibratedCelsius = _reader.Given(_options.EquilibratedAt) is string water ? Quantity.TemperatureCelsius("--equilibrated-at", water) : null,
            AirCelsius = _reader.Given(_options.AirTemperature) is string air ? Quantity.TemperatureCelsius("--air-temperature", air) : null,
        };
        return around == new Surroundings() ? null : around;
    }

    private Dictionary<string, string> Reasons()
    {
        Dictionary<string, string> reasons = [];
        foreach (string given in _reader.Many(_options.Confirm))
        {
            int equals = given.IndexOf('=', StringComparison.Ordinal);
            string guard = equals < 0 ? given : given[..equals].Trim();
            string reason = equals < 0 ? "" : given[(equals + 1)..].Trim();
            if (!GuardNames.WithReason.Contains(guard))
            {
                throw Wrong.Input("--confirm", given, $"there is no guard '{guard}'{NearestName.DidYouMean(guard, GuardNames.WithReason)}; the message that asked for a reason names it");
            }

            reasons[guard] = reason.Length == 0 ? throw Wrong.Input("--confirm", given, $"the reason is missing; write {guard}=\"REASON\"") : reason;
        }

        if (_reader.Given(_options.ConfirmPressure) is string why)
        {
            string reason = OptionReader.NotEmpty(_options.ConfirmPressure)(why);
            foreach (string guard in GuardNames.OnPressureWithReason)
            {
                reasons.TryAdd(guard, reason);
            }
        }

        return reasons;
    }

    private static Stirring StirringOf(string text)
    {
        return text switch
        {
            "stirred" => Stirring.Stirred,
            "still" => Stirring.Still,
            _ => Stirring.FlowInsensitive,
        };
    }

    private static RecordedQuantity Measured(double value, string unit, double uncertainty, string source)
    {
        return new RecordedQuantity { Value = value, Unit = unit, StandardUncertainty = uncertainty, Source = source };
    }
}
