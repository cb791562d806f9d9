using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Reflection;
using System.Text.RegularExpressions;
using System.Xml.Linq;
using ProbeCal.Station;
using Xunit;

namespace ProbeCal.Host.Tests.House;

/// <summary>The shape of the house: Host → Station → Core, Core imports nothing, Nano adds no file of its own.</summary>
public class RoomsTests
{
    [Fact]
    public void Core_references_only_the_framework()
    {
        IEnumerable<string> others = typeof(Status).Assembly.GetReferencedAssemblies().Select(static a => a.Name!)
            .Where(static name => !name.StartsWith("System", StringComparison.Ordinal) && name != "netstandard");
        Assert.Empty(others);
        // The one package is an analyzer, which leaves nothing in the assembly.
        Assert.DoesNotContain(References("src/ProbeCal.Core/ProbeCal.Core.csproj", "PackageReference"), static r => r.Attribute("PrivateAssets")?.Value != "all");
        Assert.Empty(References("src/ProbeCal.Core/ProbeCal.Core.csproj", "ProjectReference"));
    }

    [Fact]
    public void Station_references_Core_and_never_Host()
    {
        string[] ours = Ours(typeof(RawSample).Assembly);
        Assert.Equal(["ProbeCal.Core"], ours);
    }

    [Fact]
    public void Host_references_Station()
    {
        Assert.Contains("ProbeCal.Station", Ours(typeof(Program).Assembly));
        XElement[] projects = [.. References("src/ProbeCal.Host/ProbeCal.Host.csproj", "ProjectReference")];
        Assert.Single(projects);
        Assert.EndsWith("ProbeCal.Station.csproj", projects[0].Attribute("Include")!.Value, StringComparison.Ordinal);
    }

    [Fact]
    public void Nano_holds_no_source_of_its_own()
    {
        foreach (string project in (string[])["ProbeCal.Nano", "ProbeCal.Nano.Equilibrium", "ProbeCal.Nano.Calibration"])
        {
            Assert.Empty(Repository.SourceFiles("src/" + project));
        }

        Assert.Empty(References("src/ProbeCal.Nano/ProbeCal.Nano.csproj", "ProjectReference"));
        Assert.Empty(References("src/ProbeCal.Nano.Equilibrium/ProbeCal.Nano.Equilibrium.csproj", "ProjectReference"));
        XElement[] below = [.. References("src/ProbeCal.Nano.Calibration/ProbeCal.Nano.Calibration.csproj", "ProjectReference")];
        Assert.Single(below);
        Assert.EndsWith("ProbeCal.Nano.Equilibrium.csproj", below[0].Attribute("Include")!.Value, StringComparison.Ordinal);
    }

    /// <summary>Which room of Station may use which: data flows from sources to the broker, and nothing reaches back.</summary>
    private static readonly Dictionary<string, string[]> StationRooms = new()
    {
        ["Entry"] = [],
        ["Equilibrium"] = ["Entry", "Uncertainty"],
        ["WholeFiles"] = ["Entry", "Equilibrium", "Storage"],
        ["InWater"] = ["Entry", "Equilibrium"],
        ["Storage"] = ["Entry"],
        ["TableWriting"] = ["Entry", "Storage"],
        ["Uncertainty"] = [],
        ["Simulation"] = ["Entry", "Sources"],
        ["Sources"] = ["Entry", "Simulation"],
        ["CalibrationLog"] = ["Entry", "Storage"],
        ["PastCalibrations"] = ["Entry", "CalibrationLog", "WholeFiles"],
        ["Bracketing"] = ["Entry", "CalibrationLog", "Journal", "WholeFiles"],
        ["Configuration"] = ["Entry", "Sources"],
        ["Journal"] = ["Entry", "Storage"],
        ["Publishing"] = ["Entry", "Journal"],
        ["Calibrating"] = ["Entry", "CalibrationLog", "Uncertainty"],
        ["Characterising"] = ["Entry", "WholeFiles", "CalibrationLog", "Calibrating", "Uncertainty", "Storage"],
        ["Reports"] = ["Entry", "Storage", "Uncertainty", "CalibrationLog", "Calibrating"],
        ["Correcting"] = ["Entry", "CalibrationLog", "Engine", "Sources", "Storage", "WholeFiles"],
        ["Engine"] = ["Entry", "Sources", "CalibrationLog", "Configuration", "Journal", "Publishing"],
    };

    [Fact]
    public void Rooms_of_Station_use_only_the_rooms_they_may()
    {
        // By its full name, or by the short one that the shared namespace allows: Entry.Number.
        Regex uses = new(@"(?:\bProbeCal\.Station\.|(?<![\w.]))(" + string.Join('|', StationRooms.Keys) + @")\b(?=[.;])");
        List<string> breaches = [];
        HashSet<(string Room, string Other)> made = [];
        foreach (string path in Repository.SourceFiles("src/ProbeCal.Station"))
        {
            string relative = Path.GetRelativePath(Path.Combine(Repository.Root, "src/ProbeCal.Station"), path);
            if (!relative.Contains('/', StringComparison.Ordinal))
            {
                continue;
            }

            string room = relative[..relative.IndexOf('/', StringComparison.Ordinal)];
            Assert.True(StationRooms.ContainsKey(room), $"{relative}: the room {room} is not in the table of RoomsTests");
            foreach (Match use in uses.Matches(File.ReadAllText(path)))
            {
                string other = use.Groups[1].Value;
                made.Add((room, other));
                if (other != room && !StationRooms[room].Contains(other))
                {
                    breaches.Add($"{relative} uses {other}");
                }
            }
        }

        Assert.Empty(breaches.Distinct());
        // What nobody uses is not allowed in advance.
        Assert.Empty(StationRooms.SelectMany(static row => row.Value.Select(other => (row.Key, other))).Except(made));
    }

    [Fact]
    public void Core_uses_no_Math_clock_file_or_thread()
    {
        Regex outside = new(@"\b(Math|MathF|DateTime|DateTimeOffset|Console|File|Thread|Task|Random|Environment)\.\w|using System\.(IO|Linq|Threading)");
        Regex forbidden = new(outside + @"|using System\.Collections\.Generic");
        List<string> breaches = [];
        foreach (string path in Repository.SourceFiles("src/ProbeCal.Core"))
        {
            // The catalogue is for desktop programs alone: the device, which has no generics, never sees it.
            bool desktop = path.Contains("/Catalogue/", StringComparison.Ordinal);
            int number = 0;
            foreach (string line in File.ReadLines(path))
            {
                number++;
                if (!line.TrimStart().StartsWith("//", StringComparison.Ordinal) && (desktop ? outside : forbidden).IsMatch(line))
                {
                    breaches.Add($"{Path.GetFileName(path)}:{number}: {line.Trim()}");
                }
            }
        }

        Assert.Empty(breaches);
    }

    private static string[] Ours(Assembly assembly)
    {
        return [.. assembly.GetReferencedAssemblies().Select(static a => a.Name!).Where(static n => n.StartsWith("ProbeCal", StringComparison.OrdinalIgnoreCase)).Order()];
    }

    private static IEnumerable<XElement> References(string project, string kind)
    {
        return XDocument.Load(Path.Combine(Repository.Root, project)).Descendants(kind);
    }
}
