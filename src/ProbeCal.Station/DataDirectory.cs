using System;
using System.IO;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station;

/// <summary>
/// The folder that holds everything a station or a calibration keeps: <c>journal.db</c>, <c>calibrations.db</c>,
/// <c>sessions/</c> and <c>lock</c>. One program writes at a time; reading needs no lock.
/// </summary>
public sealed class DataDirectory : IDisposable
{
    private readonly FileStream? _lock;

    private DataDirectory(string path, FileStream? held)
    {
        Path = path;
        _lock = held;
    }

    /// <summary>The folder, absolute.</summary>
    public string Path { get; }

    /// <summary>The journal of a station: raw samples, readings, outbox.</summary>
    public string JournalFile => System.IO.Path.Combine(Path, "journal.db");

    /// <summary>The append-only calibration log.</summary>
    public string CalibrationLogFile => System.IO.Path.Combine(Path, "calibrations.db");

    /// <summary>Saved states of calibrations under way.</summary>
    public string SessionsFolder => System.IO.Path.Combine(Path, "sessions");

    /// <summary>Opens the folder for writing, making it when it is not there, and keeps other writers out until disposed.</summary>
    /// <exception cref="WorkFailedException">Another program writes there, or the folder cannot be made.</exception>
    public static DataDirectory OpenForWriting(string path)
    {
        string full = Absolute(path);
        try
        {
            Directory.CreateDirectory(full);
            FileStream held = new(System.IO.Path.Combine(full, "lock"), FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.None);
            return new DataDirectory(full, held);
        }
        catch (UnauthorizedAccessException fault)
        {
            throw new WorkFailedException($"--data {path}: no permission to write there; choose a folder that you own", fault);
        }
        catch (IOException fault) when (File.Exists(System.IO.Path.Combine(full, "lock")) && !IsReadOnly(fault))
        {
            throw new WorkFailedException($"--data {path}: another probecal is writing there; stop it first or choose another folder", fault);
        }
        catch (IOException fault)
        {
            throw new WorkFailedException($"--data {path}: {fault.Message}; name a folder that can be written", fault);
        }
    }

    /// <summary>Opens an existing folder for reading beside whoever writes.</summary>
    /// <exception cref="InputException">There is no such folder.</exception>
    public static DataDirectory OpenForReading(string path)
    {
        string full = Absolute(path);
        if (!Directory.Exists(full))
        {
            throw new InputException($"--data {path}: there is no such folder; name the one a calibration or a station has written to");
        }

        return new DataDirectory(full, null);
    }

    private static string Absolute(string path)
    {
        return path.Length == 0 || path.Contains('\0', StringComparison.Ordinal)
            ? throw Wrong.Input("--data", path, "name a folder, for example ./north-pier")
            : System.IO.Path.GetFullPath(path);
    }

    /// <summary>A disk that is mounted for reading only holds the lock file too, and nobody need be writing there.</summary>
    private static bool IsReadOnly(IOException fault)
    {
        const int ReadOnlyFileSystem = 30; // EROFS, the same number on Linux and macOS; Windows answers with a refused access
        return fault.HResult == ReadOnlyFileSystem;
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        _lock?.Dispose();
    }
}
