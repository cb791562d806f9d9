using System;
using System.Diagnostics;
using System.IO;
using Xunit;

namespace ProbeCal.Peers.Tests.Parts;

/// <summary>A real file system of few bytes in memory, that can be filled and made larger. Only root may mount one.</summary>
internal sealed class SmallDisk : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    private SmallDisk()
    {
    }

    internal string Path => _folder["disk"];

    /// <summary>Mounts one, or skips the calling test and says why.</summary>
    internal static SmallDisk Mount(string size)
    {
        Skip.IfNot(OperatingSystem.IsLinux(), "a small file system in memory is mounted on Linux only");
        Skip.If(Environment.UserName != "root", "only root may mount a small file system");
        SmallDisk disk = new();
        Directory.CreateDirectory(disk.Path);
        int code = Run("mount", "-t", "tmpfs", "-o", "size=" + size, "tmpfs", disk.Path);
        if (code != 0)
        {
            disk._folder.Dispose();
            Skip.If(true, "this machine does not let a small file system be mounted (mount ended with " + code + ")");
        }

        return disk;
    }

    internal void Resize(string size)
    {
        Assert.Equal(0, Run("mount", "-o", "remount,size=" + size, Path));
    }

    /// <summary>Writes a file until no byte is left.</summary>
    internal void Fill(string file)
    {
        using FileStream filler = new(System.IO.Path.Combine(Path, file), FileMode.Create, FileAccess.Write, FileShare.None, bufferSize: 0);
        byte[] block = new byte[4096];
        Action writeForEver = () =>
        {
            while (true)
            {
                filler.Write(block);
            }
        };
        Assert.Throws<IOException>(writeForEver);
    }

    public void Dispose()
    {
        // Lazily: a program that a failed test left behind may still have a file open there.
        _ = Run("umount", "-l", Path);
        _folder.Dispose();
    }

    private static int Run(string program, params string[] arguments)
    {
        using Process process = Process.Start(Programs.Find(program)!, arguments);
        process.WaitForExit();
        return process.ExitCode;
    }
}
