using System;
using System.Collections.Generic;
using System.Linq;
using System.Reflection;
using Xunit;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>
/// Every public static function of these rooms that takes plain numbers gets NaN and both infinities in each of them: it must
/// refuse, name a status, and hand out NaN. A function without good arguments in the list below fails the test.
/// </summary>
public class BoundaryTests
{
    private static readonly Type[] Types =
    [
        typeof(TemperatureCoefficient), typeof(AmperometricProbe), typeof(MeterDisplay), typeof(AcceptanceLimit), typeof(PressurePlausibility),
        typeof(CalibrationFit), typeof(ExpectedEffect), typeof(ResponseCurve),
    ];

    private static readonly Dictionary<string, double> Good = new()
    {
        ["coefficient"] = 0.03,
        ["first"] = 0.03,
        ["second"] = -2e-4,
        ["third"] = 1e-6,
        ["curvature"] = 1e-4,
        ["referenceCelsius"] = 25.0,
        ["lowestCelsius"] = 0.0,
        ["highestCelsius"] = 40.0,
        ["temperatureCelsius"] = 15.0,
        ["ratePerKelvin"] = 0.03,
        ["response"] = 50.0,
        ["zero"] = 0.4,
        ["zeroResponse"] = 0.4,
        ["slope"] = 0.3,
        ["flow"] = 1.0,
        ["flowFactor"] = 1.0,
        ["gain"] = 0.8,
        ["partialPressureHectopascal"] = 180.0,
        ["salinity"] = 5.0,
        ["pressureHectopascal"] = 980.0,
        ["referenceMilligramsPerLitre"] = 9.0,
        ["absoluteMilligramsPerLitre"] = 0.2,
        ["percent"] = 2.0,
        ["altitudeMetres"] = 200.0,
        ["airToWaterRatio"] = 1.0,
        ["referenceHectopascal"] = 200.0,
        ["rightCelsius"] = 15.0,
        ["rightHectopascal"] = 980.0,
        ["takenCelsius"] = 16.0,
        ["takenHectopascal"] = 990.0,
        ["relativeHumidityPercent"] = 80.0,
    };

    public static TheoryData<string> Functions()
    {
        var names = new TheoryData<string>();
        foreach (MethodInfo method in Candidates()) { names.Add(method.DeclaringType!.Name + "." + method.Name); }
        return names;
    }

    [Theory]
    [MemberData(nameof(Functions))]
    public void NotFinite_IsRefused_WhateverTheRule(string function)
    {
        MethodInfo method = Candidates().Single(m => m.DeclaringType!.Name + "." + m.Name == function);
        ParameterInfo[] parameters = method.GetParameters();
        int tried = 0;
        foreach (Enum rule in Enum.GetValues<RangeRule>())
        {
            Assert.Equal(Status.Ok, Invoke(method, rule, -1, 0.0, out object?[] good));
            Assert.All(Outputs(parameters, good), value => Assert.True(double.IsFinite(value)));
            for (int i = 0; i < parameters.Length; i++)
            {
                if (parameters[i].ParameterType != typeof(double)) { continue; }
                foreach (double bad in new[] { double.NaN, double.PositiveInfinity, double.NegativeInfinity })
                {
                    Status status = Invoke(method, rule, i, bad, out object?[] arguments);
                    tried++;
                    // The pressure of a meter in mg/L may be missing: it then stands at 1 atm, as its documentation says.
                    if (method.Name == nameof(MeterDisplay.PartialPressurePerUnit) && parameters[i].Name == "pressureHectopascal" && double.IsNaN(bad))
                    {
                        Assert.Equal(Status.Ok, status);
                        continue;
                    }

                    Assert.Equal(RefusalReason.NotFinite, StatusParts.Reason(status));
                    Assert.All(Outputs(parameters, arguments), value => Assert.True(double.IsNaN(value)));
                }
            }
        }

        Assert.True(tried >= 6);
    }

    [Fact]
    public void List_CoversTheRooms()
    {
        string[] found = Candidates().Select(m => m.DeclaringType!.Name + "." + m.Name).ToArray();
        Assert.Contains("TemperatureCoefficient.Factor", found);
        Assert.Contains("CalibrationFit.Slope", found);
        Assert.Contains("MeterDisplay.PartialPressurePerUnit", found);
        Assert.Equal(17, found.Length);
    }

    private static IEnumerable<MethodInfo> Candidates()
    {
        return Types.SelectMany(t => t.GetMethods(BindingFlags.Public | BindingFlags.Static | BindingFlags.DeclaredOnly))
            .Where(m => m.ReturnType == typeof(Status))
            .Where(m => m.GetParameters().All(p => p.IsOut || p.ParameterType == typeof(double) || p.ParameterType == typeof(bool) || p.ParameterType.IsEnum))
            .OrderBy(m => m.DeclaringType!.Name + m.Name, StringComparer.Ordinal);
    }

    private static Status Invoke(MethodInfo method, Enum rule, int badIndex, double bad, out object?[] arguments)
    {
        ParameterInfo[] parameters = method.GetParameters();
        arguments = new object?[parameters.Length];
        for (int i = 0; i < parameters.Length; i++)
        {
            Type type = parameters[i].ParameterType;
            if (parameters[i].IsOut) { arguments[i] = null; }
            else if (type == typeof(RangeRule)) { arguments[i] = rule; }
            else if (type == typeof(bool)) { arguments[i] = false; }
            else if (type.IsEnum) { arguments[i] = Enum.ToObject(type, 1); }
            else { arguments[i] = i == badIndex ? bad : Good[parameters[i].Name!]; }
        }

        return (Status)method.Invoke(null, arguments)!;
    }

    private static IEnumerable<double> Outputs(ParameterInfo[] parameters, object?[] arguments)
    {
        return parameters.Where(p => p.IsOut && p.ParameterType == typeof(double).MakeByRefType()).Select(p => (double)arguments[p.Position]!);
    }
}
