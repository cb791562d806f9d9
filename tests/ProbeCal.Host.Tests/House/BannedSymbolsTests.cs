using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.IO;
using System.Linq;
using System.Reflection;
using Xunit;

namespace ProbeCal.Host.Tests.House;

/// <summary>A symbol that is misspelled in a list of banned ones bans nothing, and nobody is told.</summary>
public class BannedSymbolsTests
{
    private static readonly Assembly[] _framework =
    [
        typeof(object).Assembly, typeof(Console).Assembly, typeof(Stopwatch).Assembly, typeof(Enumerable).Assembly, typeof(File).Assembly, Assembly.Load("System.Runtime"),
    ];

    public static TheoryData<string> Libraries => ["src/ProbeCal.Core", "src/ProbeCal.Station", "src/ProbeCal.Host"];

    [Theory]
    [MemberData(nameof(Libraries))]
    public void Every_banned_symbol_is_there_to_be_banned(string project)
    {
        List<string> unknown = [];
        foreach (string line in File.ReadLines(Path.Combine(Repository.Root, project, "BannedSymbols.txt")))
        {
            string[] parts = line.Split(';');
            Assert.True(parts.Length == 2 && parts[1].Length != 0, line + ": symbol;what to use instead");
            if (!Exists(parts[0]))
            {
                unknown.Add(parts[0]);
            }
        }

        Assert.Empty(unknown);
    }

    [Theory]
    [MemberData(nameof(Libraries))]
    public void Console_is_banned_everywhere_and_the_list_is_in_the_build(string project)
    {
        string[] banned = [.. File.ReadLines(Path.Combine(Repository.Root, project, "BannedSymbols.txt")).Select(static line => line.Split(';')[0])];
        Assert.Contains("T:System.Console", banned);
        string build = File.ReadAllText(Path.Combine(Repository.Root, project, Path.GetFileName(project) + ".csproj"));
        Assert.Contains("<AdditionalFiles Include=\"BannedSymbols.txt\" />", build, StringComparison.Ordinal);
        Assert.Contains("Microsoft.CodeAnalysis.BannedApiAnalyzers", build, StringComparison.Ordinal);
    }

    [Fact]
    public void One_file_alone_is_let_off()
    {
        string[] lines = File.ReadAllLines(Path.Combine(Repository.Root, ".editorconfig"));
        int[] at = [.. Enumerable.Range(0, lines.Length).Where(i => lines[i].Contains("RS0030", StringComparison.Ordinal))];
        Assert.Equal("[src/ProbeCal.Host/Terminal.cs]", lines[Assert.Single(at) - 1]);
        Assert.DoesNotContain(Repository.SourceFiles("src"), static path => File.ReadAllText(path).Contains("RS0030", StringComparison.Ordinal));
    }

    private static bool Exists(string symbol)
    {
        string name = symbol[2..];
        switch (symbol[0])
        {
            case 'N':
                return _framework.SelectMany(static each => each.GetExportedTypes()).Any(type => type.Namespace == name);
            case 'T':
                return TypeOf(name) is not null;
            default:
                int end = name.IndexOf('(', StringComparison.Ordinal);
                string path = end < 0 ? name : name[..end];
                int dot = path.Replace(".#", "!#", StringComparison.Ordinal).LastIndexOfAny(['.', '!']);
                Type? type = TypeOf(path[..dot]);
                return type is not null && type.GetMembers().Any(member => Id(member) == symbol);
        }
    }

    private static Type? TypeOf(string name)
    {
        return _framework.Select(each => each.GetType(name)).FirstOrDefault(static type => type is not null);
    }

    private static string Id(MemberInfo member)
    {
        string type = member.DeclaringType!.FullName!;
        return member switch
        {
            PropertyInfo => "P:" + type + "." + member.Name,
            MethodBase method => "M:" + type + "." + method.Name.Replace('.', '#') + Parameters(method),
            _ => "F:" + type + "." + member.Name,
        };
    }

    private static string Parameters(MethodBase method)
    {
        string[] names = [.. method.GetParameters().Select(static each => each.ParameterType.ToString().Replace('&', '@'))];
        return names.Length == 0 ? "" : "(" + string.Join(',', names) + ")";
    }
}
