using System.Collections.Concurrent;
using Json.Schema;

namespace ProbeCal.Station.Tests.Engine;

/// <summary>The published schemas, each read once: the library keeps a registry and takes none twice.</summary>
internal static class Schemas
{
    private static readonly ConcurrentDictionary<string, JsonSchema> _read = new();

    internal static JsonSchema Of(string name)
    {
        return _read.GetOrAdd(name, static each => JsonSchema.FromFile(Repository.File("docs", "schemas", each + ".schema.json")));
    }
}
