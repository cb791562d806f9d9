using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.Json;
using System.Xml.Linq;
using Xunit;

namespace ProbeCal.Nano.Tests;

/// <summary>Core's portable files on disk, the compile gate and the device projects name the same files.</summary>
public class FileListTests
{
    private static readonly string[] DesktopOnlyRooms = ["Batch", "Catalogue", "Fitting", "Throwing", "Titration"];
    private static readonly string CoreFolder = Path.Combine(DeviceAssembly.Root, "src", "ProbeCal.Core");

    public static TheoryData<string> Parts => new(DeviceAssembly.PartNames);

    [Fact]
    public void The_compile_gate_compiles_exactly_the_portable_files()
    {
        Assert.Equal(OnDisk(), CompiledBy("ProbeCal.Nano"));
    }

    [Fact]
    public void The_parts_together_compile_every_portable_file_once()
    {
        Assert.Equal(OnDisk(), DeviceAssembly.PartNames.SelectMany(CompiledBy).Order(StringComparer.Ordinal));
    }

    [Theory]
    [MemberData(nameof(Parts))]
    public void A_device_project_lists_exactly_the_files_of_its_part(string part)
    {
        List<string> compiled = CompiledBy(part);
        if (DeviceAssembly.UpdateRequested)
        {
            WriteDeviceProject(part, compiled);
        }
        List<string> listed = ListedForTheDevice(part);
        if (!compiled.SequenceEqual(listed))
        {
            Assert.Fail("src/" + part + "/" + part + ".nfproj is behind Core (" +
                string.Join(", ", compiled.Except(listed).Select(f => "+" + f).Concat(listed.Except(compiled).Select(f => "-" + f))) +
                "). Run these tests once with PROBECAL_UPDATE=1, or paste into the group labelled Core:\n" + Items(compiled));
        }
    }

    [Theory]
    [MemberData(nameof(Parts))]
    public void Every_item_of_a_device_project_has_a_link_with_the_place_it_has_in_Core(string part)
    {
        foreach (XElement item in CoreItems(part))
        {
            string include = item.Attribute("Include")!.Value;
            XNamespace ns = item.Name.Namespace;
            Assert.Equal(@"..\ProbeCal.Core\" + item.Element(ns + "Link")?.Value, include);
        }
    }

    [Theory]
    [MemberData(nameof(Parts))]
    public void A_device_project_takes_the_mscorlib_that_the_compile_gate_takes(string part)
    {
        const string Package = "nanoFramework.CoreLibrary";
        string central = XDocument.Load(Path.Combine(DeviceAssembly.Root, "Directory.Packages.props")).Descendants("PackageVersion")
            .Single(e => e.Attribute("Include")!.Value == Package).Attribute("Version")!.Value;
        string device = XDocument.Load(Path.Combine(Folder(part), "packages.config")).Descendants("package")
            .Single(e => e.Attribute("id")!.Value == Package).Attribute("version")!.Value;
        Assert.Equal(central, device);
        Assert.Contains($"{Package}.{central}", File.ReadAllText(DeviceProject(part)), StringComparison.Ordinal);
    }

    private static string Folder(string project)
    {
        return Path.Combine(DeviceAssembly.Root, "src", project);
    }

    private static string DeviceProject(string part)
    {
        return Path.Combine(Folder(part), part + ".nfproj");
    }

    private static List<string> OnDisk()
    {
        return Directory.EnumerateFiles(CoreFolder, "*.cs", SearchOption.AllDirectories)
            .Select(path => Path.GetRelativePath(CoreFolder, path).Replace('\\', '/'))
            .Where(path => !path.StartsWith("bin/", StringComparison.Ordinal) && !path.StartsWith("obj/", StringComparison.Ordinal))
            .Where(path => !DesktopOnlyRooms.Contains(path.Split('/')[0]))
            .Order(StringComparer.Ordinal).ToList();
    }

    private static List<string> CompiledBy(string project)
    {
        string dotnet = Environment.GetEnvironmentVariable("DOTNET_HOST_PATH") ?? "dotnet";
        var start = new ProcessStartInfo(dotnet)
        {
            WorkingDirectory = Folder(project),
            RedirectStandardOutput = true,
            UseShellExecute = false,
        };
        foreach (string argument in new[] { "msbuild", project + ".csproj", "-getItem:Compile", "-nologo" })
        {
            start.ArgumentList.Add(argument);
        }
        using Process process = Process.Start(start)!;
        string json = process.StandardOutput.ReadToEnd();
        process.WaitForExit();
        Assert.True(process.ExitCode == 0, json);
        using JsonDocument document = JsonDocument.Parse(json);
        return document.RootElement.GetProperty("Items").GetProperty("Compile").EnumerateArray()
            .Select(item => Path.GetRelativePath(CoreFolder, item.GetProperty("FullPath").GetString()!).Replace('\\', '/'))
            .Order(StringComparer.Ordinal).ToList();
    }

    private static List<XElement> CoreItems(string part)
    {
        XDocument project = XDocument.Load(DeviceProject(part));
        XNamespace ns = project.Root!.Name.Namespace;
        return project.Descendants(ns + "Compile").ToList();
    }

    private static List<string> ListedForTheDevice(string part)
    {
        return CoreItems(part).Select(item => item.Attribute("Include")!.Value.Replace('\\', '/'))
            .Select(path => path.StartsWith("../ProbeCal.Core/", StringComparison.Ordinal) ? path["../ProbeCal.Core/".Length..] : path)
            .ToList();
    }

    private static string Items(IEnumerable<string> files)
    {
        var text = new StringBuilder();
        foreach (string file in files)
        {
            string path = file.Replace('/', '\\');
            text.Append("    <Compile Include=\"..\\ProbeCal.Core\\").Append(path).Append("\">\n      <Link>")
                .Append(path).Append("</Link>\n    </Compile>\n");
        }
        return text.ToString();
    }

    private static void WriteDeviceProject(string part, IEnumerable<string> files)
    {
        const string Start = "  <ItemGroup Label=\"Core\">\n";
        const string End = "  </ItemGroup>";
        string text = File.ReadAllText(DeviceProject(part));
        int start = text.IndexOf(Start, StringComparison.Ordinal) + Start.Length;
        int end = text.IndexOf(End, start, StringComparison.Ordinal);
        File.WriteAllText(DeviceProject(part), text[..start] + Items(files) + text[end..]);
    }
}
