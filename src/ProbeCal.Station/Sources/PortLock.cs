using System;
using System.IO;

namespace ProbeCal.Station.Sources;

/// <summary>
/// Keeps a second program that asks the same way off a serial port: two readers of one port each get half of every line, and
/// the operating system lets them. Held as a lock on a file beside the port, released when the process ends however it ends.
/// </summary>
internal sealed class PortLock : IDisposable
{
    private readonly FileStream _file;

    private PortLock(FileStream file)
    {
        _file = file;
    }

    /// <summary>Takes the port.</summary>
    /// <param name="device">The device itself, links followed, so that two names of one port meet in one lock.</param>
    /// <exception cref="ChannelException">Another program has it.</exception>
    internal static PortLock Take(string device)
    {
        string path = PathFor(device);
        try
        {
            // For reading: a lock file left by another user can be locked, though not written. An existing file is opened
            // without asking for creation, which the kernel refuses for foreign files in a shared folder.
            FileMode mode = File.Exists(path) ? FileMode.Open : FileMode.OpenOrCreate;
            return new PortLock(new FileStream(path, mode, FileAccess.Read, FileShare.None));
        }
        catch (UnauthorizedAccessException fault)
        {
            throw new ChannelException($"the lock file {path} cannot be opened; remove it when no program uses {device}", fault);
        }
        catch (IOException fault)
        {
            throw new ChannelException($"another program is reading {device}; stop it first", fault);
        }
    }

    public void Dispose()
    {
        _file.Dispose();
    }

    private static string PathFor(string device)
    {
        string folder = Directory.Exists("/run/lock") ? "/run/lock" : Path.GetTempPath();
        char[] name = device.ToCharArray();
        for (int i = 0; i < name.Length; i++)
        {
            if (!char.IsAsciiLetterOrDigit(name[i]))
            {
                name[i] = '-';
            }
        }

        return Path.Combine(folder, "probecal" + new string(name) + ".lock");
    }
}
