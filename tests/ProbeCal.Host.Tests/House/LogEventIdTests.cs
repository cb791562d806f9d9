using System.Collections.Generic;
using System.Linq;
using System.Reflection;
using Microsoft.Extensions.Logging;
using ProbeCal.Station;
using Xunit;

namespace ProbeCal.Host.Tests.House;

/// <summary>An event id in a log names one thing.</summary>
public class LogEventIdTests
{
    private const BindingFlags Any = BindingFlags.Static | BindingFlags.Public | BindingFlags.NonPublic;

    [Fact]
    public void Event_ids_are_given_once()
    {
        List<int> ids = [];
        foreach (Assembly assembly in new[] { typeof(RawSample).Assembly, typeof(Program).Assembly })
        {
            ids.AddRange(assembly.GetTypes().SelectMany(static type => type.GetMethods(Any))
                .Select(static method => method.GetCustomAttribute<LoggerMessageAttribute>()?.EventId).OfType<int>());
            ids.AddRange(assembly.GetTypes().SelectMany(static type => type.GetFields(Any))
                .Where(static field => field.FieldType == typeof(EventId)).Select(static field => ((EventId)field.GetValue(null)!).Id));
        }

        Assert.True(12 < ids.Count, "the search found too few");
        Assert.Equal(ids.Count, ids.Distinct().Count());
        Assert.All(ids, static id => Assert.InRange(id, 2000, 2999));
    }
}
