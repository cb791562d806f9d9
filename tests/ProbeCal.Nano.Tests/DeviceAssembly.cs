using System;
using System.IO;
using System.Linq;
using Mono.Cecil;
using Mono.Cecil.Cil;

namespace ProbeCal.Nano.Tests;

/// <summary>The device assembly as it was built, the mscorlib it was built against, and the folder the sources are in.</summary>
internal static class DeviceAssembly
{
    /// <summary>The assemblies that a device gets; the later ones refer to the earlier.</summary>
    public static readonly string[] PartNames = ["ProbeCal.Nano.Equilibrium", "ProbeCal.Nano.Calibration"];

    private static readonly Lazy<AssemblyDefinition> BuiltAssembly = new(() => Read("ProbeCal.Nano.dll", symbols: true));
    private static readonly Lazy<AssemblyDefinition> MscorlibAssembly = new(() => Read("mscorlib.dll", symbols: false));
    private static readonly Lazy<AssemblyDefinition[]> PartAssemblies = new(() => [.. PartNames.Select(name => Read(name + ".dll", symbols: false))]);
    private static readonly Lazy<AssemblyDefinition> ThisAssembly = new(ReadThisAssembly);

    /// <summary>The parts as they were built, in the order of <see cref="PartNames"/>.</summary>
    public static AssemblyDefinition[] Parts => PartAssemblies.Value;

    /// <summary>ProbeCal.Nano.dll, all of Core's portable files in one, with its symbols.</summary>
    public static AssemblyDefinition Nano => BuiltAssembly.Value;

    /// <summary>The microcontroller's mscorlib.</summary>
    public static AssemblyDefinition Mscorlib => MscorlibAssembly.Value;

    /// <summary>This test assembly, for its fixtures.</summary>
    public static AssemblyDefinition Tests => ThisAssembly.Value;

    /// <summary>The folder that holds the solution.</summary>
    public static string Root { get; } = FindRoot();

    /// <summary>Whether files that list what was found are to be written anew instead of compared.</summary>
    public static bool UpdateRequested => Environment.GetEnvironmentVariable("PROBECAL_UPDATE") == "1";

    private static AssemblyDefinition Read(string name, bool symbols)
    {
        string folder = Path.Combine(AppContext.BaseDirectory, "device");
        var resolver = new DefaultAssemblyResolver();
        resolver.AddSearchDirectory(folder);
        return AssemblyDefinition.ReadAssembly(Path.Combine(folder, name), new ReaderParameters
        {
            AssemblyResolver = resolver,
            ReadSymbols = symbols,
            SymbolReaderProvider = symbols ? new PortablePdbReaderProvider() : null,
            InMemory = true,
        });
    }

    private static AssemblyDefinition ReadThisAssembly()
    {
        string path = typeof(DeviceAssembly).Assembly.Location;
        var resolver = new DefaultAssemblyResolver();
        resolver.AddSearchDirectory(Path.GetDirectoryName(path));
        resolver.AddSearchDirectory(Path.GetDirectoryName(typeof(object).Assembly.Location));
        return AssemblyDefinition.ReadAssembly(path, new ReaderParameters
        {
            AssemblyResolver = resolver,
            ReadSymbols = true,
            SymbolReaderProvider = new PortablePdbReaderProvider(),
            InMemory = true,
        });
    }

    private static string FindRoot()
    {
        for (DirectoryInfo? folder = new(AppContext.BaseDirectory); folder != null; folder = folder.Parent)
        {
            if (File.Exists(Path.Combine(folder.FullName, "ProbeCal.sln")))
            {
                return folder.FullName;
            }
        }
        throw new InvalidOperationException("the folder of ProbeCal.sln is not above " + AppContext.BaseDirectory);
    }
}
