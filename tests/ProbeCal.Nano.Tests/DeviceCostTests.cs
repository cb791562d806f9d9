using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using Mono.Cecil;
using ProbeCal.Nano.Tests.Interpreter;
using Xunit;

namespace ProbeCal.Nano.Tests;

/// <summary>The costs that the docs name are those that the interpreter counts.</summary>
public class DeviceCostTests
{
    private const string Start = "<!-- device costs: written by PROBECAL_UPDATE=1 -->\n";
    private const string End = "<!-- end of device costs -->";

    private const double Celsius = 20.0;
    private const double Salinity = 35.0;
    private const double Hectopascal = 1013.25;

    private static readonly string Document = Path.Combine(DeviceAssembly.Root, "docs", "accuracy.md");

    private readonly Machine machine = new(DeviceAssembly.Nano.MainModule.GetTypes(), Deviations.All);

    [Fact]
    public void The_docs_name_the_counted_costs()
    {
        string text = File.ReadAllText(Document);
        int start = text.IndexOf(Start, StringComparison.Ordinal) + Start.Length;
        int end = text.IndexOf(End, StringComparison.Ordinal);
        Assert.True(start >= Start.Length && end >= start, "docs/accuracy.md lacks the marks around the table of costs");
        string table = Table();
        if (DeviceAssembly.UpdateRequested)
        {
            text = text[..start] + table + text[end..];
            File.WriteAllText(Document, text);
            end = start + table.Length;
        }
        Assert.Equal(table, text[start..end]);
    }

    [Fact]
    public void Counting_counts_each_operation_once()
    {
        TypeDefinition type = DeviceAssembly.Tests.MainModule.GetType("ProbeCal.Nano.Tests.Fixtures.Divisions");
        var counting = new Machine([type], Deviations.All);
        MethodDefinition method = type.Methods.Single(m => m.Name == nameof(Fixtures.Divisions.ByArgument));
        OperationCount count = counting.Count(method, [Value.OfDouble(1.0), Value.OfDouble(2.0), Value.OfDouble(3.0)]);
        Assert.Equal(new OperationCount(DoubleOperations: 3, Divisions: 1, Calls: 0, Instructions: 4), count);
    }

    private string Table()
    {
        var rows = new List<string> { "| call | double operations | of them divisions | calls |", "|---|---|---|---|" };
        void Row(string name, OperationCount count)
        {
            rows.Add(string.Create(CultureInfo.InvariantCulture, $"| `{name}` | {count.DoubleOperations} | {count.Divisions} | {count.Calls} |"));
        }

        Row("Numerics.Exp(1.5)", Count("Numerics", "Exp", 1.5));
        Row("Numerics.Ln(1.5)", Count("Numerics", "Ln", 1.5));
        Row("Numerics.Pow(1.5, 2.5)", Count("Numerics", "Pow", 1.5, 2.5));
        Row("Numerics.Sqrt(1.5)", Count("Numerics", "Sqrt", 1.5));
        Row("BensonKrause1984.MilligramsPerLitre", Count("BensonKrause1984", "MilligramsPerLitre", Celsius, Salinity, Hectopascal, RangeRule.Refuse));
        Row("GarciaGordon1992.MicromolesPerKilogram", Count("GarciaGordon1992", "MicromolesPerKilogram", Celsius, Salinity, Hectopascal, RangeRule.Refuse));
        Row("DensityEos80.Density", Count("DensityEos80", "Density", Celsius, Salinity, RangeRule.Refuse));
        Value calibration = Calibration();
        Row("Correction.PartialPressure", Count("Correction", "PartialPressure", calibration, 1.0, 65.0, Celsius, Hectopascal, 0.0, RangeRule.Refuse));
        Row("Correction.Correct, every quantity with its uncertainty", Count(
            "Correction", "Correct", calibration, Conditions(), 65.0, Celsius, Hectopascal, Salinity, 0.0, RangeRule.Refuse, Create("Reading")));
        string parts = string.Join(" and ", DeviceAssembly.Parts.Select(part => string.Create(
            CultureInfo.InvariantCulture,
            $"{part.Name.Name} {(part.MainModule.GetTypes().SelectMany(t => t.Methods).Where(m => m.HasBody).Sum(m => m.Body.CodeSize) + 1023) / 1024} KB")));
        return string.Join("\n", rows) + $"\n\nCore's code for the device in KB of IL: {parts}. One assembly may hold 64 KB, and the tests refuse more than 48 KB.\n";
    }

    /// <summary>A probe of 0.4 units per hectopascal, calibrated in air-saturated water.</summary>
    private Value Calibration()
    {
        Value probe = Create("AmperometricProbe", TemperatureCoefficientForm.Exponential, 0.03, 25.0, 0.0, 40.0);
        Value point = Create(
            "CalibrationPoint", CalibrationMethod.AirSaturatedWater, 70.0, 0.02, Celsius, 0.1, Hectopascal, 1.0, Stirring.Stirred, 1.0, 1.0, 0.0, 0.002);
        Value zero = Create("ZeroPoint", true, 0.1, 0.01, Celsius, Hectopascal);
        Value[] given = [default];
        Value status = machine.Call(Method("ProbeCalibration", "Create"), [probe, point, zero, Value.OfDouble(0.05), Value.OfDouble(0.001), Value.OfAddress(given, 0)]);
        Assert.Equal((long)Status.Ok, status.I);
        return given[0];
    }

    private Value Conditions()
    {
        return Create("ReadingConditions", SolubilityEquation.BensonKrause1984, 0.02, true, 0.05, 0.1, 1.0, 0.1, Stirring.Stirred, 1.0, 0.005);
    }

    private Value Create(string type, params object[] arguments)
    {
        MethodDefinition constructor = DeviceAssembly.Nano.MainModule.GetType("ProbeCal." + type).Methods
            .Single(m => m.IsConstructor && !m.IsStatic && m.Parameters.Count == arguments.Length);
        return machine.Create(constructor, arguments.Select(Slot).ToArray());
    }

    private OperationCount Count(string type, string name, params object[] arguments)
    {
        MethodDefinition method = Method(type, name);
        IEnumerable<Value> outputs = method.Parameters.Where(p => p.IsOut).Select(_ => Value.OfAddress(new Value[1], 0));
        return machine.Count(method, arguments.Select(Slot).Concat(outputs).ToArray());
    }

    private static MethodDefinition Method(string type, string name)
    {
        return DeviceAssembly.Nano.MainModule.GetType("ProbeCal." + type).Methods.Single(m => m.Name == name);
    }

    private static Value Slot(object argument)
    {
        return argument switch
        {
            Value value => value,
            double number => Value.OfDouble(number),
            bool flag => Value.OfInteger(flag ? 1 : 0),
            _ => Value.OfInteger(Convert.ToInt64(argument, CultureInfo.InvariantCulture)),
        };
    }
}
