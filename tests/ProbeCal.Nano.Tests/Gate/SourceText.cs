using System;
using System.Collections.Concurrent;
using System.IO;

namespace ProbeCal.Nano.Tests.Gate;

/// <summary>The lines of the source files that the symbols name.</summary>
internal static class SourceText
{
    private static readonly ConcurrentDictionary<string, string[]> Files = new();

    /// <summary>A file's lines. A deterministic build may have replaced the folder in its path: then the part below the root counts.</summary>
    public static string[] Lines(string path)
    {
        return Files.GetOrAdd(path, static p => File.ReadAllLines(File.Exists(p) ? p : InThisFolder(p)));
    }

    private static string InThisFolder(string path)
    {
        string normal = path.Replace('\\', '/');
        int start = Math.Max(normal.LastIndexOf("/src/", StringComparison.Ordinal), normal.LastIndexOf("/tests/", StringComparison.Ordinal));
        return Path.Combine(DeviceAssembly.Root, normal[(start + 1)..]);
    }
}
