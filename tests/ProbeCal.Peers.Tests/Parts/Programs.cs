using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using Xunit;

namespace ProbeCal.Peers.Tests.Parts;

/// <summary>Where the programs are that these tests run.</summary>
internal static class Programs
{
    private static readonly string[] Folders = [.. (Environment.GetEnvironmentVariable("PATH") ?? "").Split(Path.PathSeparator), "/usr/sbin", "/usr/local/sbin"];

    /// <summary>Full path of a program, or null when the machine does not have it.</summary>
    internal static string? Find(string name)
    {
        return Folders.Select(folder => Path.Combine(folder, name)).FirstOrDefault(File.Exists);
    }

    /// <summary>Starts <c>probecal</c> as a person does, from the build the tests were made with.</summary>
    internal static OutsideProcess ProbeCal(IEnumerable<string> arguments, IReadOnlyDictionary<string, string>? environment = null)
    {
        string[] line = CommandLine(arguments);
        return OutsideProcess.Start(line[0], line[1..], environment);
    }

    /// <summary>The words that start <c>probecal</c>, for a test that starts it through a shell.</summary>
    internal static string[] CommandLine(IEnumerable<string> arguments)
    {
        string dotnet = Find("dotnet") ?? throw new InvalidOperationException("dotnet is not on PATH");
        string program = Path.Combine(AppContext.BaseDirectory, "probecal.dll");
        Assert.True(File.Exists(program), program + " was not built");
        return [dotnet, program, .. arguments];
    }
}

/// <summary>A folder that is gone when the test is.</summary>
internal sealed class TemporaryFolder : IDisposable
{
    internal string Path { get; } = Directory.CreateTempSubdirectory("probecal-").FullName;

    internal string this[string name] => System.IO.Path.Combine(Path, name);

    public void Dispose()
    {
        Directory.Delete(Path, recursive: true);
    }
}
