using System;
using System.Diagnostics;
using System.IO;
using Xunit;

namespace ProbeCal.Station.Tests.Storage;

/// <summary>A file system of one megabyte in memory, for tests that fill a disk. Only root may mount one.</summary>
public sealed class SmallDisk : IDisposable
{
    private SmallDisk(string path)
    {
        Path = path;
    }

    public string Path { get; }

    /// <summary>Mounts one, or skips the calling test where that is not allowed.</summary>
    public static SmallDisk TryMount()
    {
        Skip.IfNot(OperatingSystem.IsLinux() && Environment.UserName == "root", "mounting a small file system needs Linux and root");
        string path = Directory.CreateTempSubdirectory("probecal-disk-").FullName;
        bool mounted = Run("mount", "-t", "tmpfs", "-o", "size=1m", "tmpfs", path);
        if (!mounted)
        {
            Directory.Delete(path);
        }

        Skip.IfNot(mounted, "this machine does not let root mount a tmpfs (a container without the right)");
        return new SmallDisk(path);
    }

    public void Dispose()
    {
        Run("umount", "-l", Path);
        Directory.Delete(Path);
    }

    private static bool Run(string program, params string[] arguments)
    {
        using Process process = Process.Start(new ProcessStartInfo(program, arguments) { RedirectStandardError = true })!;
        process.WaitForExit();
        return process.ExitCode == 0;
    }
}
