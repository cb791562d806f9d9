using System;
using System.IO;

namespace ProbeCal.Station.Storage;

/// <summary>
/// A file while it is being made: under a name of its own beside the one that is meant, whose place it takes at the end. Whoever pulls the plug, or fills the disk,
/// leaves the old file whole; two programs that make the same file do not write into one another.
/// </summary>
internal sealed class NewFile : IDisposable
{
    private readonly string _path;
    private readonly string _temporary;
    private bool _kept;

    /// <param name="path">The file that is meant, through no link.</param>
    /// <exception cref="IOException">It cannot be made there.</exception>
    /// <exception cref="UnauthorizedAccessException">It must not be made there.</exception>
    internal NewFile(string path)
    {
        _path = path;
        _temporary = path + "." + Path.GetRandomFileName() + ".partial";
        Stream = new FileStream(_temporary, FileMode.CreateNew, FileAccess.Write, FileShare.Read, 1 << 16);
    }

    /// <summary>Where to write.</summary>
    internal FileStream Stream { get; }

    /// <summary>Puts the finished file in its place.</summary>
    /// <param name="replace">False to leave a file that has come there meanwhile.</param>
    /// <returns>False when one has; the finished file then goes.</returns>
    internal bool Keep(bool replace)
    {
        Stream.Flush(flushToDisk: true);
        Stream.Dispose();
        try
        {
            File.Move(_temporary, _path, replace);
        }
        catch (IOException) when (!replace && File.Exists(_path))
        {
            return false;
        }

        return _kept = true;
    }

    /// <summary>Without <see cref="Keep"/>, what was written goes.</summary>
    public void Dispose()
    {
        try
        {
            Stream.Dispose();
        }
        finally
        {
            // On a full disk closing fails as writing did; what is there of the file goes all the same.
            if (!_kept)
            {
                File.Delete(_temporary);
            }
        }
    }
}
