using System;
using System.Collections.Concurrent;
using Json.Schema;

namespace ProbeCal.Station.Tests.Engine;

/// <summary>The published schemas, each read once: the library keeps a registry and takes none twice.</summary>
internal static class Schemas
{
    // Lazy: two tests at once may both make an entry, and only one of them is looked into.
    private static readonly ConcurrentDictionary<string, Lazy<JsonSchema>> _read = new();

    internal static JsonSchema Of(string name)
    {
        return _read.GetOrAdd(name, static each => new Lazy<JsonSchema>(() => JsonSchema.FromFile(Repository.File("docs", "schemas", each + ".schema.json")))).Value;
    }
}
