using System;
using System.Diagnostics;
using System.Globalization;
using System.IO;
using System.Runtime.InteropServices;

namespace ProbeCal.Benchmarks;

/// <summary>
/// A Python that holds the same water and times one call of gsw's compiled code at a time, when asked. The call goes straight to the compiled
/// function over whole arrays, into an array that exists already: nothing of Python is in the time.
/// </summary>
internal sealed class GswPeer : IDisposable
{
    // The distribution's Python first: a second interpreter earlier in the path does not see distribution packages.
    private static readonly string[] Pythons = ["/usr/bin/python3", "python3"];

    private const string Program =
        """
        import sys, time, numpy, gsw
        from gsw._gsw_ufuncs import o2sol_sp_pt
        celsius, salinity = numpy.fromfile(sys.argv[1]).reshape(2, -1)
        out = numpy.empty_like(celsius)
        print(gsw.__version__, flush=True)
        for line in sys.stdin:
            if line.strip() == "time":
                start = time.perf_counter_ns()
                o2sol_sp_pt(salinity, celsius, out)
                print(time.perf_counter_ns() - start, flush=True)
            else:
                print(numpy.max(numpy.abs(numpy.fromfile(line.strip()) / out - 1.0)), flush=True)
        """;

    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-").FullName;
    private readonly Process _process;

    internal GswPeer(Water water)
    {
        string input = Path.Combine(_folder, "water");
        using (FileStream file = File.Create(input))
        {
            file.Write(MemoryMarshal.AsBytes<double>(water.Celsius));
            file.Write(MemoryMarshal.AsBytes<double>(water.Salinity));
        }

        ProcessStartInfo start = new(Array.Find(Pythons, File.Exists) ?? Pythons[^1])
        {
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
            ArgumentList = { "-c", Program, input },
        };
        _process = Process.Start(start) ?? throw new InvalidOperationException("cannot start " + start.FileName);
        Version = Answer();
    }

    internal string Version { get; }

    /// <summary>Time of one call over all values.</summary>
    internal TimeSpan Call()
    {
        return TimeSpan.FromTicks(long.Parse(Ask("time"), CultureInfo.InvariantCulture) / TimeSpan.NanosecondsPerTick);
    }

    /// <summary>Largest relative difference between the values given and those of the last call.</summary>
    internal double LargestDifference(double[] values)
    {
        string file = Path.Combine(_folder, "values");
        File.WriteAllBytes(file, MemoryMarshal.AsBytes<double>(values));
        return double.Parse(Ask(file), CultureInfo.InvariantCulture);
    }

    public void Dispose()
    {
        _process.StandardInput.Close();
        _process.WaitForExit();
        _process.Dispose();
        Directory.Delete(_folder, recursive: true);
    }

    private string Ask(string line)
    {
        _process.StandardInput.WriteLine(line);
        _process.StandardInput.Flush();
        return Answer();
    }

    private string Answer()
    {
        return _process.StandardOutput.ReadLine()
            ?? throw new InvalidOperationException("the Python with gsw ended: is the Debian package python3-gsw installed?");
    }
}
