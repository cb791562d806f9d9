using System;
using System.IO;

namespace ProbeCal.Station.Tests.Storage;

/// <summary>A folder of its own for one test, gone afterwards.</summary>
public sealed class TemporaryFolder : IDisposable
{
    public TemporaryFolder()
    {
        Path = Directory.CreateTempSubdirectory("probecal-").FullName;
    }

    public string Path { get; }

    public string File(string name)
    {
        return System.IO.Path.Combine(Path, name);
    }

    public void Dispose()
    {
        Directory.Delete(Path, recursive: true);
    }
}
