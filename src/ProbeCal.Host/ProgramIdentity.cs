using System.Reflection;

namespace ProbeCal.Host;

/// <summary>Which program and build this is, in the one form that records and readings carry.</summary>
internal static class ProgramIdentity
{
    /// <summary>Name, version and, where it was built from a checkout, the commit.</summary>
    internal static string Text { get; } =
        "probecal " + (typeof(ProgramIdentity).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()?.InformationalVersion ?? "unknown");

    /// <summary>Name and version without the commit, for what must be the same bytes whenever one release makes it.</summary>
    internal static string Release { get; } = Text.Split('+')[0];
}
