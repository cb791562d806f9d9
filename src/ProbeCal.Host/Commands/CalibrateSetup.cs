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
    private const double LongestWaitSeconds = 7 * 86_400;

    private const string UnnamedThermometer = "not named";

    private static readonly string[] ZeroMethods = [MethodIds.ZeroSolution, MethodIds.ZeroGas];
    private static readonly string[] Forms = ["line", "quadratic"];
    private static readonly string[] CheckKinds = [CalibrationIds.Initial, CalibrationIds.Continuing, CalibrationIds.EndOfDay];
    private static readonly string[] ZeroPlans = [CalibrationIds.ZeroKeep, CalibrationIds.ZeroAssume, CalibrationIds.ZeroCheck, CalibrationIds.ZeroAdjust];
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
        IReadOnlyList<PlannedPoint> plan = await PlanAsync(method, gas, cancellationToken).ConfigureAwait(false);
        RecordedProbe recorded = await ProbeAsync(probe, line, manual, temperature != null, cancellationToken).ConfigureAwait(false);
        CalibrationLimits limits = Limits(ErrorScale.IsHectopascal(GasNames.NameOf(gas), recorded.Model));
        return new CalibrationSetup
        {
            Purpose = _purpose,
            CheckKind = _reader.Given(_options.As) is string kind ? OptionReader.Choice(_options.As, CheckKinds)(kind) : null,
            Gas = gas,
            Plan = plan,
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
            ZeroPlan = ZeroPlan(manual, method),
            Limits = limits,
            Surroundings = Surroundings(),
            Waiting = Waiting(limits),
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

    /// <param name="inHectopascal">True where the published limits, which are those of dissolved oxygen, do not apply.</param>
    private CalibrationLimits Limits(bool inHectopascal)
    {
        double? absolute = ErrorLimit(_options.Limit, inHectopascal);
        double? percent = _reader.NotNegative(_options.LimitPercent, QuantityKind.Percent);
        double? zero = ErrorLimit(_options.ZeroLimit, inHectopascal);
        (double Low, double High)? window = _reader.Range(_options.SlopeWindow);
        (double Low, double High)? zeroWindow = _reader.Range(_options.ZeroWindow);
        bool entered = absolute != null || percent != null;
        CalibrationLimits limits = new()
        {
            GuardBand = _reader.IsSet(_options.GuardBand),
            SlopeLow = window?.Low,
            SlopeHigh = window?.High,
            ZeroSignalLow = zeroWindow?.Low,
            ZeroSignalHigh = zeroWindow?.High,
        };
        return inHectopascal ? limits with { Pressure = new PressureLimits { Hectopascal = absolute, Percent = percent, ZeroHectopascal = zero } } : limits with
        {
            // Whoever enters one of the two means it: the other published one would soften it.
            SaturationMilligramsPerLitre = absolute ?? (entered ? 0 : AcceptanceLimit.SaturationMilligramsPerLitre),
            SaturationPercent = percent ?? (entered ? 0 : AcceptanceLimit.SaturationPercent),
            SaturationSource = entered ? CalibrationLimits.Entered : CalibrationLimits.FieldManual,
            ZeroMilligramsPerLitre = zero ?? AcceptanceLimit.ZeroMilligramsPerLitre,
            ZeroSource = zero == null ? CalibrationLimits.FieldManual : CalibrationLimits.Entered,
        };
    }

    private double? ErrorLimit(Option<string> option, bool inHectopascal)
    {
        QuantityKind kind = inHectopascal ? QuantityKind.Pressure : QuantityKind.MassConcentration;
        return _reader.Given(option) is string given && !Quantity.TryParse(kind, given, out _, out string? problem)
            ? throw Wrong.Input(option.Name, given, inHectopascal
                ? "errors of this gas are judged as a pressure; write for example 5hPa"
                : $"{problem}; errors of dissolved oxygen are judged in mg/L")
            : _reader.NotNegative(option, kind);
    }

    private WaitingRules Waiting(CalibrationLimits limits)
    {
        WaitingRules usual = new();
        WaitingRules waiting = new()
        {
            WindowSeconds = _reader.Given(_options.Window) is string window ? Quantity.Duration("--window", window).TotalSeconds : usual.WindowSeconds,
            LeastCount = _reader.Given(_options.Samples) is string samples ? (int)Number.ParseWhole("--samples", samples, 3, 1_000_000) : usual.LeastCount,
            MilligramsPerLitre = _reader.AboveZero(_options.StableWithin, QuantityKind.MassConcentration) ?? QuarterOf(limits) ?? usual.MilligramsPerLitre,
            Kelvin = _reader.AboveZero(_options.StableTemperature, QuantityKind.TemperatureDifference) ?? usual.Kelvin,
            GiveUpAfterSeconds = _reader.Given(_options.GiveUpAfter) is string longest ? Quantity.Duration("--give-up-after", longest).TotalSeconds : usual.GiveUpAfterSeconds,
        };
        if (LongestWaitSeconds < waiting.GiveUpAfterSeconds)
        {
            throw Wrong.Input("--give-up-after", _reader.Given(_options.GiveUpAfter)!, "a point is waited for 7d at most");
        }

        return waiting.WindowSeconds < waiting.GiveUpAfterSeconds
            ? waiting
            : throw new InputException($"--window {Number.Print(waiting.WindowSeconds)} s does not fit into --give-up-after {Number.Print(waiting.GiveUpAfterSeconds)} s; make the wait longer than the window");
    }

    /// <summary>What may move follows the limit that the point is judged by; null where none in mg/L decides.</summary>
    private static double? QuarterOf(CalibrationLimits limits)
    {
        return limits.Pressure == null && 0 < limits.SaturationMilligramsPerLitre ? limits.SaturationMilligramsPerLitre / 4 : null;
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

    private string ZeroPlan(bool manual, string method)
    {
        if (MethodIds.IsZero(method))
        {
            return CalibrationIds.ZeroCheck;
        }

        string plan = _reader.Given(_options.Zero) is string given ? OptionReader.Choice(_options.Zero, ZeroPlans)(given) : CalibrationIds.ZeroKeep;
        if (plan == CalibrationIds.ZeroAdjust && _purpose == CalibrationRecord.CheckPurpose)
        {
            throw new InputException("--zero adjust: a check changes nothing; use check to read and judge the zero");
        }

        return manual && plan == CalibrationIds.ZeroAdjust
            ? throw new InputException("--zero adjust: the zero of a meter is adjusted in the meter; use check to read and judge it")
            : plan;
    }

    /// <summary>The points in the order of the options: the main one, further levels, a zero. One point by one of the two usual methods is the usual plan.</summary>
    private async Task<IReadOnlyList<PlannedPoint>> PlanAsync(string method, Gas gas, CancellationToken cancellationToken)
    {
        bool zeroAlone = MethodIds.IsZero(method);
        PlannedPoint main = new() { Role = zeroAlone ? CalibrationIds.ZeroPoint : CalibrationIds.SpanPoint, Method = method };
        (Option<string>? option, string question) = method switch
        {
            MethodIds.GasMixture => (_options.Mixture, "The mixture (for example CYL-21 20.95% u 0.02% dry)?"),
            MethodIds.TransferStandard => (_options.Transfer, ""),
            MethodIds.Titration => (_options.Titration, ""),
            MethodIds.ZeroGas => (_options.ZeroMixture, ""),
            MethodIds.WaterSaturatedAir => (_options.Mixture, ""),
            _ => ((Option<string>?)null, ""),
        };
        RefuseOthers(method, option);
        if (question.Length != 0 && _reader.CanAsk)
        {
            main = await _reader.NeedAsync(option!, question, text => PlanText.Read(option!.Name, main, text, gas, _register), cancellationToken).ConfigureAwait(false);
        }
        else if (option != null)
        {
            main = PlanText.Read(option.Name, main, _reader.Given(option), gas, _register);
        }

        List<PlannedPoint> plan = [main];
        string[] levels = _reader.Many(_options.Level);
        for (int i = 0; i < levels.Length; i++)
        {
            plan.Add(PlanText.Level("--level", CalibrationIds.LevelPrefix + Number.Print(i + 1), levels[i], gas, _register));
        }

        string? zeroMethod = _reader.Given(_options.ZeroMethod) is string given ? OptionReader.Choice(_options.ZeroMethod, ZeroMethods)(given) : null;
        bool readsZero = !zeroAlone && _reader.Given(_options.Zero) is CalibrationIds.ZeroCheck or CalibrationIds.ZeroAdjust;
        if (readsZero && (zeroMethod != null || plan.Count != 1 || !IsUsual(method)))
        {
            PlannedPoint zero = new() { Role = CalibrationIds.ZeroPoint, Method = zeroMethod ?? MethodIds.ZeroSolution };
            plan.Add(PlanText.Read("--zero-mixture", zero, zero.Method == MethodIds.ZeroGas ? _reader.Given(_options.ZeroMixture) : null, gas, _register));
        }

        // The usual plan is left to the set-up, so that a state saved by an older program is taken up again.
        return plan.Count == 1 && IsUsual(method) && main.Mixture == null ? [] : plan;
    }

    private static bool IsUsual(string method)
    {
        return method is MethodIds.AirSaturatedWater or MethodIds.WaterSaturatedAir;
    }

    /// <summary>An option of another method would be passed over in silence.</summary>
    private void RefuseOthers(string method, Option<string>? own)
    {
        foreach (Option<string> other in new[] { _options.Mixture, _options.Transfer, _options.Titration })
        {
            if (other != own && _reader.Given(other) is string given)
            {
                throw Wrong.Input(other.Name, given, $"the method {method} has no use for it; leave it out, or take the method it belongs to");
            }
        }
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
