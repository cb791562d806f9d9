using System;
using System.IO;
using System.Linq;
using System.Text;
using ProbeCal.Station.Calibrating;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>Holds the table of guards in docs/uncertainty.md to the code; with PROBECAL_UPDATE=1 writes it.</summary>
public class GuardDocumentTests
{
    private const string Begin = "<!-- guards: written by GuardDocumentTests -->\n";
    private const string End = "<!-- end of guards -->";

    [Fact]
    public void Table_IsThatOfTheCode()
    {
        string path = Path.Combine(Repository.Root, "docs", "uncertainty.md");
        string text = File.ReadAllText(path).ReplaceLineEndings("\n");
        int begin = text.IndexOf(Begin, StringComparison.Ordinal) + Begin.Length;
        int end = text.IndexOf(End, begin, StringComparison.Ordinal);
        if (Environment.GetEnvironmentVariable("PROBECAL_UPDATE") == "1")
        {
            File.WriteAllText(path, text[..begin] + Table() + text[end..]);
            return;
        }

        Assert.Equal(Table(), text[begin..end]);
    }

    private static string Table()
    {
        StringBuilder table = new("| guard | watches | limit | source | weight |\n|---|---|---|---|---|\n");
        foreach (Guard guard in Guards.All)
        {
            string weights = string.Join(", ", guard.Severities.Select(static severity => severity switch
            {
                FindingSeverity.Note => "note",
                FindingSeverity.NeedsReason => "needs a reason",
                _ => "refused",
            }));
            table.Append($"| `{guard.Name}` | {guard.Watches} | {guard.Limit} | {guard.Source} | {weights} |\n");
        }

        return table.ToString();
    }
}
