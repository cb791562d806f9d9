using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Text.RegularExpressions;
using Xunit;

namespace ProbeCal.Host.Tests.House;

/// <summary>What stands at the top of the repository, and what must stand nowhere in it.</summary>
public class TopLevelTests
{
    private static readonly string[] Allowed =
    [
        "README.md", "DEVELOPERS.md", "ProbeCal.sln", "src", "tests", "hardware", "calibration-tables", "docs", "LICENSE",
        "Directory.Build.props", "Directory.Packages.props", "global.json",
    ];

    [Fact]
    public void Top_level_holds_what_it_should_and_no_more()
    {
        string[] top = [.. Repository.TrackedFiles().Select(static f => f.Split('/')[0]).Distinct()];
        Assert.DoesNotContain(top, static name => !Allowed.Contains(name) && name[0] != '.');
        Assert.Empty(Allowed.Except(top));
    }

    [Fact]
    public void No_path_of_a_machine_is_committed()
    {
        // Spelled in two parts so that this file does not find itself.
        Regex machine = new("/(wo" + "rk|fa" + "rm|ro" + "ot)/|/tm" + "p/pc");
        List<string> found = [];
        foreach (string file in Repository.TrackedFiles().Where(IsText))
        {
            int number = 0;
            foreach (string line in File.ReadLines(Path.Combine(Repository.Root, file)))
            {
                number++;
                if (machine.IsMatch(line))
                {
                    found.Add($"{file}:{number}");
                }
            }
        }

        Assert.Empty(found);
    }

    [Fact]
    public void Readme_stays_under_two_screens()
    {
        // Two screens of a laptop's editor: 2 × 55 lines.
        Assert.InRange(File.ReadLines(Path.Combine(Repository.Root, "README.md")).Count(), 20, 110);
    }

    [Fact]
    public void Links_between_documents_lead_somewhere()
    {
        List<string> broken = [];
        foreach (string file in Repository.TrackedFiles().Where(static f => f.EndsWith(".md", StringComparison.Ordinal)))
        {
            string text = File.ReadAllText(Path.Combine(Repository.Root, file));
            foreach (Match link in Regex.Matches(text, @"\]\(([^)#\s]+)(#[^)]*)?\)"))
            {
                string target = link.Groups[1].Value;
                string path = Path.Combine(Repository.Root, Path.GetDirectoryName(file)!, target);
                if (!target.Contains("://", StringComparison.Ordinal) && !File.Exists(path) && !Directory.Exists(path))
                {
                    broken.Add($"{file} -> {target}");
                }
            }
        }

        Assert.Empty(broken);
    }

    private static bool IsText(string file)
    {
        return Path.GetExtension(file) is ".cs" or ".md" or ".sh" or ".json" or ".props" or ".csproj" or ".nfproj" or ".csv" or ".txt" or ".py" or ".svg" or ""
            && !file.EndsWith("TopLevelTests.cs", StringComparison.Ordinal) && File.Exists(Path.Combine(Repository.Root, file));
    }
}
