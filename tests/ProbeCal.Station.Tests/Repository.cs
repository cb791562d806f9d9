using System;
using System.IO;

namespace ProbeCal.Station.Tests;

/// <summary>Files of the repository that tests hold the code to.</summary>
internal static class Repository
{
    internal static string Root { get; } = Find();

    internal static string File(params string[] parts)
    {
        return Path.Combine([Root, .. parts]);
    }

    private static string Find()
    {
        string? folder = AppContext.BaseDirectory;
        while (folder != null && !System.IO.File.Exists(Path.Combine(folder, "ProbeCal.sln")))
        {
            folder = Path.GetDirectoryName(folder);
        }

        return folder ?? throw new InvalidOperationException("no ProbeCal.sln above " + AppContext.BaseDirectory);
    }
}
