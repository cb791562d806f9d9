using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Security.Cryptography;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Peers.Tests.Parts;

/// <summary>A data folder with one calibration of a simulated probe in its log, and whether its files are still the same bytes.</summary>
public sealed class CalibratedFolder : IAsyncLifetime
{
    private readonly TemporaryFolder _folder = new();

    internal string Data => _folder["data"];

    internal string this[string name] => _folder[name];

    /// <summary>A complete calibration at an invented site; options named in <paramref name="other"/> take the place of the usual ones.</summary>
    internal static List<string> Calibrate(string data, params string[] other)
    {
        List<string> arguments = ["calibrate", "--unattended"];
        (string Name, string Value)[] usual =
        [
            ("--data", data), ("--source", "simulated?faster=0&phase=air-saturated-water&seed=3&pressure=939hPa"), ("--probe", "P-17"),
            ("--method", "air-saturated-water"), ("--pressure-source", "barometer:B-1"), ("--altitude", "640m"), ("--salinity", "0"),
            ("--stirring", "stirred"), ("--coefficient", "arrhenius 22kJ/mol at 25C fitted 0..35C"), ("--site", "Fern Pool (invented)"),
        ];
        foreach ((string name, string value) in usual)
        {
            if (!other.Contains(name))
            {
                arguments.AddRange([name, value]);
            }
        }

        return [.. arguments, .. other];
    }

    /// <summary>Every file in the folder with the hash of its bytes, but for the empty one that only serves as a lock.</summary>
    internal static string Fingerprint(string folder)
    {
        IEnumerable<string> files = Directory.GetFiles(folder, "*", SearchOption.AllDirectories).Where(static file => Path.GetFileName(file) != "lock" && !IsIdle(file)).Order(StringComparer.Ordinal);
        return string.Join('\n', files.Select(static file => file + " " + Convert.ToHexString(SHA256.HashData(File.ReadAllBytes(file)))));
    }

    /// <summary>
    /// What SQLite leaves beside a write-ahead log that was only read: an index without data of its own, and a log without a byte. The next writer
    /// takes both away (https://www.sqlite.org/wal.html).
    /// </summary>
    private static bool IsIdle(string file)
    {
        return file.EndsWith("-shm", StringComparison.Ordinal) || (file.EndsWith("-wal", StringComparison.Ordinal) && new FileInfo(file).Length == 0);
    }

    /// <summary>Runs to the end: exit code, and exactly one line that says why where it is not 0.</summary>
    internal static async Task<string> RefusedAsync(IEnumerable<string> arguments, int exitCode)
    {
        using OutsideProcess program = Programs.ProbeCal(arguments);
        int code = await program.ExitCodeAsync(StationSite.Deadline);
        Assert.True(code == exitCode, "exit code " + code + "\n" + program.Tail());
        Assert.Empty(program.Output());
        string line = Assert.Single(program.Error(), static text => text.StartsWith("probecal: ", StringComparison.Ordinal));
        Assert.DoesNotContain(program.Error(), static text => text.Contains("Exception", StringComparison.Ordinal) || text.Contains("   at ", StringComparison.Ordinal));
        return line;
    }

    public async Task InitializeAsync()
    {
        using OutsideProcess calibrate = Programs.ProbeCal(Calibrate(Data));
        Assert.True(await calibrate.ExitCodeAsync(StationSite.Deadline) == 0, calibrate.Tail());
    }

    public Task DisposeAsync()
    {
        _folder.Dispose();
        return Task.CompletedTask;
    }
}
