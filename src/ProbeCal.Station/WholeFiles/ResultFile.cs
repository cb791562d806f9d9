using System;
using System.IO;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.WholeFiles;

/// <summary>
/// The output while it is being made: a file beside the one that is meant, which takes its place at the end. Whoever pulls
/// the plug leaves the old file whole.
/// </summary>
internal sealed class ResultFile : IDisposable
{
    private const string Dash = "-";

    private readonly string _path;
    private readonly string? _temporary;
    private bool _kept;

    private ResultFile(string path, string? temporary, Stream stream)
    {
        _path = path;
        _temporary = temporary;
        Stream = stream;
    }

    /// <summary>Where to write.</summary>
    internal Stream Stream { get; }

    /// <summary>Opens the output, or refuses it before anything is done.</summary>
    /// <param name="output">The path, or <c>-</c> for standard output.</param>
    /// <param name="input">The path of the input, which is never overwritten.</param>
    /// <param name="force">True to replace an existing file at the end.</param>
    /// <param name="standardOutput">What <c>-</c> is.</param>
    /// <exception cref="InputException">It is the input, exists already or is no file.</exception>
    /// <exception cref="WorkFailedException">It cannot be made.</exception>
    internal static ResultFile Open(string output, string input, bool force, Func<Stream> standardOutput)
    {
        if (output == Dash)
        {
            return new ResultFile(output, null, standardOutput());
        }

        string path = Target(output);
        if (input != Dash && string.Equals(path, Target(input), OperatingSystem.IsWindows() ? StringComparison.OrdinalIgnoreCase : StringComparison.Ordinal))
        {
            throw Wrong.Input("--output", output, "this is the input, which is never overwritten; give the result another name");
        }

        if (Directory.Exists(path) || path.StartsWith("/dev/", StringComparison.Ordinal))
        {
            throw Wrong.Input("--output", output, "this is no file; name one, or - for standard output");
        }

        if (File.Exists(path) && !force)
        {
            throw Wrong.Input("--output", output, "this file exists already; give another name, or --force to replace it");
        }

        string temporary = path + "." + Path.GetRandomFileName() + ".partial";
        try
        {
            return new ResultFile(path, temporary, new FileStream(temporary, FileMode.CreateNew, FileAccess.Write, FileShare.Read, 1 << 16));
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            throw new WorkFailedException($"--output {Wrong.Shown(output)}: cannot be written ({fault.Message})", fault);
        }
    }

    /// <summary>Puts the finished output in its place.</summary>
    internal void Keep()
    {
        if (_temporary is null)
        {
            Stream.Flush();
        }
        else
        {
            ((FileStream)Stream).Flush(flushToDisk: true);
            Stream.Dispose();
            File.Move(_temporary, _path, overwrite: true);
        }

        _kept = true;
    }

    /// <summary>Without <see cref="Keep"/>, what was written goes.</summary>
    public void Dispose()
    {
        if (_temporary is null)
        {
            return;
        }

        Stream.Dispose();
        if (!_kept)
        {
            File.Delete(_temporary);
        }
    }

    /// <summary>The file behind a path, through links.</summary>
    private static string Target(string path)
    {
        string full = Path.GetFullPath(path);
        return File.Exists(full) ? File.ResolveLinkTarget(full, returnFinalTarget: true)?.FullName ?? full : full;
    }
}
