using System.Collections.Generic;
using System.CommandLine;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>From options to the points of a calibration and what is true at each.</summary>
internal sealed class CalibratePlan
{
    private static readonly string[] ZeroMethods = [MethodIds.ZeroSolution, MethodIds.ZeroGas];
    private static readonly string[] ZeroPlans = [CalibrationIds.ZeroKeep, CalibrationIds.ZeroAssume, CalibrationIds.ZeroCheck, CalibrationIds.ZeroAdjust];

    private readonly CalibrateOptions _options;
    private readonly string _purpose;
    private readonly EquipmentValues _register;
    private readonly OptionReader _reader;

    internal CalibratePlan(CalibrateOptions options, string purpose, EquipmentValues register, OptionReader reader)
    {
        _options = options;
        _purpose = purpose;
        _register = register;
        _reader = reader;
    }

    /// <summary>What is done about the zero.</summary>
    /// <exception cref="InputException">It would change what may not be changed.</exception>
    internal string Zero(bool manual, string method)
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
    internal async Task<IReadOnlyList<PlannedPoint>> PointsAsync(string method, Gas gas, CancellationToken cancellationToken)
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
}
