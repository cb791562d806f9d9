using System;
using System.Runtime.InteropServices;
using System.Text;
using Microsoft.Win32.SafeHandles;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Simulation;

/// <summary>
/// A pair of terminals joined back to back (Linux): this side writes, a program that opens <see cref="DevicePath"/> takes it
/// for a serial port. Disposing is a pulled cable: the device vanishes under whoever has it open.
/// </summary>
/// <remarks>Like a serial line it keeps nothing for later: what nobody reads is lost. Not thread-safe.</remarks>
internal sealed partial class PseudoTerminal : IDisposable
{
    private const int ReadWrite = 0x2, NoControllingTerminal = 0x100, NonBlocking = 0x800, CloseOnExec = 0x80000;
    private const short HangUp = 0x10;

    private readonly SafeFileHandle _master;

    private PseudoTerminal(SafeFileHandle master, string devicePath)
    {
        _master = master;
        DevicePath = devicePath;
    }

    /// <summary>Path of the device for the other side, for example <c>/dev/pts/4</c>.</summary>
    public string DevicePath { get; }

    /// <summary>True while a program has the device open.</summary>
    public bool IsListenedTo
    {
        get
        {
            PollEntry entry = new() { Descriptor = Descriptor };
            return Poll(ref entry, 1, 0) >= 0 && (entry.Happened & HangUp) == 0;
        }
    }

    private int Descriptor => (int)_master.DangerousGetHandle();

    /// <summary>Makes a pair, set to pass bytes through as they are.</summary>
    /// <exception cref="WorkFailedException">This system has none, or none is left.</exception>
    public static PseudoTerminal Open()
    {
        if (!OperatingSystem.IsLinux())
        {
            throw new WorkFailedException("pseudo-terminals are made on Linux only; use a TCP port here");
        }

        int descriptor = OpenMaster(ReadWrite | NoControllingTerminal | NonBlocking | CloseOnExec);
        if (descriptor < 0)
        {
            throw Failed("open a pseudo-terminal");
        }

        SafeFileHandle master = new(descriptor, ownsHandle: true);
        try
        {
            byte[] name = new byte[128];
            if (Grant(descriptor) != 0 || Unlock(descriptor) != 0 || NameOfOtherSide(descriptor, name, (nuint)name.Length) != 0)
            {
                throw Failed("set up a pseudo-terminal");
            }

            MakeRaw(descriptor);
            string device = Encoding.UTF8.GetString(name, 0, Array.IndexOf(name, (byte)0));

            // Until it has been opened and closed once, the system does not tell that nobody has it open.
            int once = OpenDevice(device, ReadWrite | NoControllingTerminal | CloseOnExec);
            new SafeFileHandle(once, ownsHandle: true).Dispose();
            return new PseudoTerminal(master, device);
        }
        catch (WorkFailedException)
        {
            master.Dispose();
            throw;
        }
    }

    /// <summary>Sends bytes to whoever has the device open.</summary>
    /// <returns>False when nobody has, or when they read too slowly: the bytes are lost then, whole or in part.</returns>
    public bool TryWrite(ReadOnlySpan<byte> bytes)
    {
        return IsListenedTo && Write(Descriptor, bytes, (nuint)bytes.Length) == bytes.Length;
    }

    /// <summary>Pulls the cable.</summary>
    public void Dispose()
    {
        _master.Dispose();
    }

    /// <summary>
    /// No echo, no line editing, no translation of line ends. The settings travel as an opaque block that the C library
    /// fills and changes, so that its layout need not be known here; it is far smaller than the room for it.
    /// </summary>
    private static void MakeRaw(int descriptor)
    {
        byte[] settings = new byte[512];
        if (GetSettings(descriptor, settings) != 0)
        {
            throw Failed("read the settings of a pseudo-terminal");
        }

        SetRaw(settings);
        if (SetSettings(descriptor, 0, settings) != 0)
        {
            throw Failed("change the settings of a pseudo-terminal");
        }
    }

    private static WorkFailedException Failed(string what)
    {
        return new WorkFailedException($"could not {what}: {Marshal.GetLastPInvokeErrorMessage()}");
    }

    [StructLayout(LayoutKind.Sequential)]
    private struct PollEntry
    {
        internal int Descriptor;
        internal short Wanted;
        internal short Happened;
    }

    [LibraryImport("libc", EntryPoint = "posix_openpt", SetLastError = true)]
    private static partial int OpenMaster(int flags);

    [LibraryImport("libc", EntryPoint = "grantpt", SetLastError = true)]
    private static partial int Grant(int descriptor);

    [LibraryImport("libc", EntryPoint = "unlockpt", SetLastError = true)]
    private static partial int Unlock(int descriptor);

    [LibraryImport("libc", EntryPoint = "ptsname_r", SetLastError = true)]
    private static partial int NameOfOtherSide(int descriptor, [Out] byte[] name, nuint length);

    [LibraryImport("libc", EntryPoint = "tcgetattr", SetLastError = true)]
    private static partial int GetSettings(int descriptor, [In, Out] byte[] settings);

    [LibraryImport("libc", EntryPoint = "cfmakeraw")]
    private static partial void SetRaw([In, Out] byte[] settings);

    [LibraryImport("libc", EntryPoint = "tcsetattr", SetLastError = true)]
    private static partial int SetSettings(int descriptor, int when, [In] byte[] settings);

    [LibraryImport("libc", EntryPoint = "open", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    private static partial int OpenDevice(string path, int flags);

    [LibraryImport("libc", EntryPoint = "poll", SetLastError = true)]
    private static partial int Poll(ref PollEntry entries, nuint count, int milliseconds);

    [LibraryImport("libc", EntryPoint = "write", SetLastError = true)]
    private static partial nint Write(int descriptor, ReadOnlySpan<byte> bytes, nuint count);
}
