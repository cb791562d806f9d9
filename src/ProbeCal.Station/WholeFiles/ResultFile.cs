using System;
using System.IO;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Storage;

namespace ProbeCal.Station.WholeFiles;

/// <summary>
/// The output of a whole file: a <see cref="NewFile"/> that is never the input, or standard output.
/// </summary>
internal sealed class ResultFile : IDisposable
{
    private const string Dash = "-";

    private readonly string _shown;
    private readonly NewFile? _file;
    private readonly bool _force;

    private ResultFile(string shown, NewFile? file, bool force, Stream stream)
    {
        _shown = shown;
        _file = file;
        _force = force;
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
            return new ResultFile(output, null, force, standardOutput());
        }

        if (string.IsNullOrWhiteSpace(output))
        {
            throw Wrong.Input("--output", output, "name the file that the rows go into, or - for standard output");
        }

        string path = Target(output);
        if (input != Dash && IsSameFile(output, input))
        {
            throw Wrong.Input("--output", output, "this is the input, which is never overwritten; give the result another name");
        }

        if (Directory.Exists(path) || path.StartsWith("/dev/", StringComparison.Ordinal))
        {
            throw Wrong.Input("--output", output, "this is no file; name one, or - for standard output");
        }

        if (File.Exists(path) && !force)
        {
            throw Exists(output);
        }

        try
        {
            NewFile file = new(path);
            return new ResultFile(output, file, force, file.Stream);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            throw new WorkFailedException($"--output {Wrong.Shown(output)}: cannot be written ({fault.Message})", fault);
        }
    }

    /// <summary>Puts the finished output in its place.</summary>
    /// <exception cref="InputException">A file has come there meanwhile, and nobody said to replace it.</exception>
    internal void Keep()
    {
        if (_file is null)
        {
            Stream.Flush();
        }
        else if (!_file.Keep(_force))
        {
            throw Exists(_shown);
        }
    }

    /// <summary>Without <see cref="Keep"/>, what was written goes.</summary>
    public void Dispose()
    {
        _file?.Dispose();
    }

    /// <summary>True when two paths lead to one file, through links or without.</summary>
    internal static bool IsSameFile(string one, string other)
    {
        return string.Equals(Target(one), Target(other), OperatingSystem.IsWindows() ? StringComparison.OrdinalIgnoreCase : StringComparison.Ordinal);
    }

    private static InputException Exists(string output)
    {
        return Wrong.Input("--output", output, "this file exists already; give another name, or --force to replace it");
    }

    /// <summary>The file behind a path, through links, be it the file or a folder above it that is one.</summary>
    private static string Target(string path)
    {
        string full = Path.GetFullPath(path);
        full = File.Exists(full) ? File.ResolveLinkTarget(full, returnFinalTarget: true)?.FullName ?? full : full;
        string? folder = Path.GetDirectoryName(full);
        return folder is null ? full : Path.Combine(FolderBehind(folder), Path.GetFileName(full));
    }

    private static string FolderBehind(string folder)
    {
        string? above = Path.GetDirectoryName(folder);
        if (above is null)
        {
            return folder;
        }

        string here = Path.Combine(FolderBehind(above), Path.GetFileName(folder));
        return Directory.Exists(here) && Directory.ResolveLinkTarget(here, returnFinalTarget: true)?.FullName is string target ? FolderBehind(target) : here;
    }
}
