using System;
using System.Globalization;
using System.IO;
using System.Security.Cryptography;
using System.Text;
using System.Text.Json;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// The saved state of one probe's calibration, in a file that is replaced whole: a kill leaves either the old state or the
/// new one.
/// </summary>
internal sealed class SessionFile
{
    private readonly string _path;
    private readonly TimeProvider _time;

    internal SessionFile(string folder, string probeId, TimeProvider time)
    {
        _path = Path.Combine(folder, FileName(probeId));
        _time = time;
    }

    /// <summary>The state saved last, or null. A damaged file is renamed and told about, never read over.</summary>
    /// <param name="say">Takes one line for people.</param>
    /// <exception cref="InputException">The file is from a newer version; it is untouched.</exception>
    /// <exception cref="WorkFailedException">The system refuses to read or rename it.</exception>
    internal SessionState? Load(Action<string> say)
    {
        try
        {
            if (!File.Exists(_path))
            {
                return null;
            }

            byte[] bytes = File.ReadAllBytes(_path);
            try
            {
                return Read(bytes);
            }
            catch (Exception damage) when (damage is JsonException or NotSupportedException)
            {
                string kept = SetAside("damaged");
                say($"the saved state of the calibration is damaged ({damage.Message.ReplaceLineEndings(" ")}); it is kept as {kept} and the calibration begins anew");
                return null;
            }
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            throw new WorkFailedException($"{_path}: {fault.Message}", fault);
        }
    }

    /// <summary>Saves the state; it is on the disk when this returns.</summary>
    /// <exception cref="WorkFailedException">It could not be saved.</exception>
    internal void Save(SessionState state)
    {
        try
        {
            Directory.CreateDirectory(Path.GetDirectoryName(_path)!);
            string fresh = _path + ".new";
            using (FileStream file = new(fresh, FileMode.Create, FileAccess.Write, FileShare.None))
            {
                JsonSerializer.Serialize(file, state, SessionJsonContext.Readable.SessionState);
                file.Flush(flushToDisk: true);
            }

            File.Move(fresh, _path, overwrite: true);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            throw new WorkFailedException($"{_path}: the state of the calibration could not be saved: {fault.Message}", fault);
        }
    }

    /// <summary>Renames the file so that a new calibration can begin and the old state is kept.</summary>
    /// <returns>The name it now has.</returns>
    internal string SetAside(string why)
    {
        string stamp = _time.GetUtcNow().ToString("yyyyMMdd'T'HHmmss'Z'", CultureInfo.InvariantCulture);
        string target = $"{_path}.{why}-{stamp}";
        for (int n = 2; File.Exists(target); n++)
        {
            target = string.Create(CultureInfo.InvariantCulture, $"{_path}.{why}-{stamp}-{n}");
        }

        File.Move(_path, target);
        return target;
    }

    /// <summary>Removes the state of a calibration whose record is in the log.</summary>
    internal void Delete()
    {
        try
        {
            File.Delete(_path);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            throw new WorkFailedException($"{_path}: the record is in the log, but the saved state could not be removed: {fault.Message}", fault);
        }
    }

    private SessionState Read(byte[] bytes)
    {
        RecordHead head = JsonSerializer.Deserialize(bytes, SessionJsonContext.Readable.RecordHead) ?? new RecordHead();
        if (head.Format != SessionState.FormatName)
        {
            throw new JsonException($"its format is '{head.Format}'");
        }

        if (SessionState.CurrentVersion < head.Version)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture,
                $"{_path}: version {head.Version} of the saved state is newer than this program, which knows up to {SessionState.CurrentVersion}; use the newer program or move the file away, nothing was changed"));
        }

        SessionState state = JsonSerializer.Deserialize(bytes, SessionJsonContext.Readable.SessionState) ?? throw new JsonException("it is empty");
        return state.Version < 2 ? state.WithStepsOfVersion1() : state;
    }

    /// <summary>A file name of any probe id: what a file system might refuse is replaced, and a hash keeps such ids apart.</summary>
    private static string FileName(string probeId)
    {
        StringBuilder name = new();
        foreach (char c in probeId)
        {
            name.Append(char.IsAsciiLetterOrDigit(c) || c is '-' or '_' ? c : '_');
        }

        string plain = name.ToString();
        bool same = plain == probeId && plain.Length is > 0 and <= 64;
        string hash = Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(probeId)))[..8];
        return (same ? plain : plain[..Math.Min(plain.Length, 48)] + "-" + hash) + ".calibration.json";
    }
}
