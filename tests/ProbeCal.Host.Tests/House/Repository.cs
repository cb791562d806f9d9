using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.IO;
using System.Linq;

namespace ProbeCal.Host.Tests.House;

/// <summary>The checkout the tests were built from.</summary>
internal static class Repository
{
    internal static string Root { get; } = FindRoot();

    /// <summary>Files that git tracks, with forward slashes, relative to the root.</summary>
    internal static IReadOnlyList<string> TrackedFiles()
    {
        ProcessStartInfo start = new("git", "ls-files -z") { WorkingDirectory = Root, RedirectStandardOutput = true };
        using Process git = Process.Start(start)!;
        string listing = git.StandardOutput.ReadToEnd();
        git.WaitForExit();
        if (git.ExitCode != 0)
        {
            throw new InvalidOperationException("git ls-files failed with " + git.ExitCode);
        }

        return [.. listing.Split('\0', StringSplitOptions.RemoveEmptyEntries)];
    }

    internal static IEnumerable<string> SourceFiles(string folder)
    {
        return Directory.EnumerateFiles(Path.Combine(Root, folder), "*.cs", SearchOption.AllDirectories)
            .Where(static path => !path.Contains("/obj/", StringComparison.Ordinal) && !path.Contains("/bin/", StringComparison.Ordinal));
    }

    private static string FindRoot()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "ProbeCal.sln")))
        {
            folder = folder.Parent;
        }

        return folder?.FullName ?? throw new InvalidOperationException("no ProbeCal.sln above " + AppContext.BaseDirectory);
    }
}
