using System;
using System.IO;
using System.Linq;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>register</c>, <c>service</c> and the commands of <c>calibrations</c> on a log that version 1 left behind: probes P-17 and M-3.</summary>
public sealed class LogCommandsTests : LogFolder
{
    [Fact]
    public async Task Register_KeepsTheNewestEntry_AndSaysWhatIsOverdue()
    {
        Run added = await Ok("register", "add", "B-12", "--kind", "barometer", "--certificate", "K-1182", "--correction", "-0.4hPa u 0.3hPa", "--due", "2026-11-30", "--description", "barometer of the boat");
        Assert.Contains("-0.4 hPa, u 0.3 hPa", added.Output, StringComparison.Ordinal);
        Assert.Contains("the copy before is", added.Error, StringComparison.Ordinal);
        await Ok("register", "add", "CYL-4", "--kind", "cylinder", "--value", "10.02% U 0.10% k 2");
        Run list = await Ok("register", "list");
        Assert.Contains("2026-11-30 OVERDUE", list.Output, StringComparison.Ordinal);
        Assert.Contains("10.02 %, u 0.05 %", list.Output, StringComparison.Ordinal);

        Time.Now += TimeSpan.FromDays(1);
        Run again = await Ok("register", "add", "B-12", "--due", "2027-11-30");
        Assert.Contains("takes the place of entry 8c6e44e20ee5-0003", again.Output, StringComparison.Ordinal);
        Assert.DoesNotContain("OVERDUE", (await Ok("register", "list")).Output, StringComparison.Ordinal);
        Assert.Contains("OVERDUE", (await Ok("register", "list", "--at", "2026-12-01T14:00Z")).Output, StringComparison.Ordinal);
        Assert.Contains("before: entry 8c6e44e20ee5-0003", (await Ok("register", "show", "B-12")).Output, StringComparison.Ordinal);
        JsonNode json = await Json("register", "register", "list", "--kind", "barometer");
        Assert.Equal("2027-11-30", (string?)json["equipment"]!.AsArray().Single()!["dueOn"]);
        Keep(json, "register");
    }

    [Theory]
    [InlineData("--kind is missing", "register", "add", "X-1")]
    [InlineData("did you mean barometer", "register", "add", "X-1", "--kind", "barometre")]
    [InlineData("its uncertainty is missing", "register", "add", "X-1", "--kind", "cylinder", "--value", "10%")]
    [InlineData("needs its coverage factor", "register", "add", "X-1", "--kind", "cylinder", "--value", "10% U 0.1%")]
    [InlineData("write the day as", "register", "add", "X-1", "--kind", "cylinder", "--due", "1.3.2027")]
    [InlineData("give --made too", "register", "add", "X-1", "--kind", "membrane", "--life", "180d")]
    [InlineData("before --calibrated", "register", "add", "X-1", "--kind", "cylinder", "--calibrated", "2026-05-01", "--due", "2025-05-01")]
    [InlineData("an id has letters", "register", "add", "X 1", "--kind", "cylinder")]
    [InlineData("it is not in the register", "register", "show", "X-1")]
    [InlineData("did you mean cleaned", "service", "add", "P-17", "cleand")]
    [InlineData("lies in the future", "service", "add", "P-17", "cleaned", "--at", "2027-01-01T00:00Z")]
    [InlineData("does not say its offset", "service", "add", "P-17", "cleaned", "--at", "2026-06-01T12:00")]
    [InlineData("only membrane-changed", "service", "add", "P-17", "cleaned", "--membrane", "M-1")]
    [InlineData("did you mean 8c6e44e20ee5-0001", "calibrations", "withdraw", "8c6e44e20ee5-001", "--reason", "x")]
    [InlineData("--reason is missing", "calibrations", "withdraw", First)]
    [InlineData("say why", "calibrations", "withdraw", First, "--reason", " ")]
    [InlineData("write COUNT:HASH", "calibrations", "verify", "--head", "12:abc")]
    [InlineData("it was not imported here", "calibrations", "verify", "--log", "0123456789ab")]
    public async Task WrongInput_IsOneLine_AndAddsNothing(string says, params string[] arguments)
    {
        byte[] before = await File.ReadAllBytesAsync(LogFile);
        Run run = await Run(arguments);
        Assert.True(run.ExitCode == 2, run.Error);
        Assert.Contains(says, run.ErrorLine, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', run.ErrorLine);
        // Not even migrated.
        Assert.Equal(before, await File.ReadAllBytesAsync(LogFile));
        if (arguments[0] == "register" && arguments[1] == "add")
        {
            string none = Path.Combine(Folder, "none");
            Assert.Equal(2, (await RunAt(none, arguments)).ExitCode);
            Assert.False(Directory.Exists(none));
        }

        Assert.Contains("2 entries, chain whole", (await Ok("calibrations", "verify")).Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task AnIdKeepsItsKind()
    {
        await Ok("register", "add", "CYL-4", "--kind", "cylinder");
        Run run = await Run("register", "add", "CYL-4", "--kind", "titrant");
        Assert.Equal(2, run.ExitCode);
        Assert.Contains("CYL-4 is a cylinder in the register", run.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Service_IsListed_AndTakenBack()
    {
        await Ok("service", "add", "P-17", "membrane-changed", "--membrane", "M-17", "--at", "2026-11-30T09:20+02:00", "--remarks", "old one creased");
        await Ok("service", "add", "P-17", "cleaned");
        JsonNode json = await Json("service-list", "service", "list", "--probe", "P-17");
        Assert.Equal(["membrane-changed", "cleaned"], json["service"]!.AsArray().Select(static each => (string?)each!["event"]));
        Assert.Equal("2026-11-30T07:20:00+00:00", (string?)json["service"]![0]!["at"]);
        Keep(json, "service-list");
        await Ok("calibrations", "withdraw", "8c6e44e20ee5-0003", "--reason", "it was another probe");
        Run list = await Ok("service", "list");
        Assert.DoesNotContain("M-17", list.Output, StringComparison.Ordinal);
        Assert.Contains("cleaned", list.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Withdrawn_IsShownAsSuchEverywhere_AndNoLongerInForce()
    {
        Run withdrawn = await Ok("calibrations", "withdraw", First, "--reason", "wrong salinity", "--by", "bench 2");
        Assert.Contains("No calibration of P-17 is in force now.", withdrawn.Output, StringComparison.Ordinal);
        Assert.Contains("WITHDRAWN (wrong salinity)", Unfolded(await Ok("calibrations", "list")), StringComparison.Ordinal);
        Assert.Contains("WITHDRAWN by entry 8c6e44e20ee5-0003", (await Ok("calibrations", "show", First)).Output, StringComparison.Ordinal);
        Assert.Contains("withdrawal", (await Ok("calibrations", "list", "--all")).Output, StringComparison.Ordinal);
        JsonNode json = await Json("calibration-list", "calibrations", "list");
        Assert.Equal("8c6e44e20ee5-0003", (string?)json["calibrations"]![0]!["withdrawnBy"]);
        Keep(json, "calibration-list", 2);

        Run twice = await Run("calibrations", "withdraw", First, "--reason", "again");
        Assert.Equal(2, twice.ExitCode);
        Assert.Contains("withdrawn already by entry 8c6e44e20ee5-0003 (wrong salinity)", twice.Error, StringComparison.Ordinal);
        await Ok("calibrations", "withdraw", "8c6e44e20ee5-0003", "--reason", "the salinity was right after all");
        Assert.DoesNotContain("WITHDRAWN", (await Ok("calibrations", "show", First)).Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Verify_ComparesHeads_FromTextAndFromFiles()
    {
        Run alone = await Ok("calibrations", "verify");
        Assert.Contains("not excluded: the chain alone cannot show entries cut off", Unfolded(alone), StringComparison.Ordinal);
        Assert.Contains("head " + Head, alone.Output, StringComparison.Ordinal);

        await Ok("register", "add", "CYL-4", "--kind", "cylinder");
        string certificate = Path.Combine(Folder, "certificate.html");
        await File.WriteAllTextAsync(certificate, $"<p>log head <code>{Head}</code></p>");
        Run kept = await Ok("calibrations", "verify", "--head", Head, "--head", certificate);
        Assert.Contains("the first 2 entries are those of this head; 1 were added since", Unfolded(kept), StringComparison.Ordinal);
        Assert.DoesNotContain("not excluded", kept.Output, StringComparison.Ordinal);

        Run other = await Run("calibrations", "verify", "--head", Head.Replace('a', 'b'));
        Assert.Equal(1, other.ExitCode);
        Assert.Contains("HEAD DISAGREES: entry 2 is not the one of this head", other.Error, StringComparison.Ordinal);
        Run longer = await Run("calibrations", "verify", "--head", "7:" + new string('c', 64), "--format", "json");
        Assert.Equal(1, longer.ExitCode);
        JsonNode json = JsonNode.Parse(longer.Output)!;
        Assert.Equal("cut-off", (string?)json["logs"]![0]!["heads"]![0]!["kind"]);
        AssertValid("log-verification", longer.Output);
        Keep(json, "log-verification");

        await File.WriteAllTextAsync(certificate, "nothing of the kind");
        Assert.Contains("no head stands in this file", (await Run("calibrations", "verify", "--head", certificate)).Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task ABrokenChain_IsToldEverywhere_AndTakesNothingMore()
    {
        await Ok("register", "add", "CYL-4", "--kind", "cylinder");
        Raw("DROP TRIGGER records_no_update; UPDATE records SET bytes = CAST(replace(CAST(bytes AS TEXT), 'P-17', 'P-71') AS BLOB) WHERE idx = 1");
        Run verify = await Run("calibrations", "verify");
        Assert.Equal(1, verify.ExitCode);
        Assert.Contains("edited: record 1 was changed after it was stored", verify.Output, StringComparison.Ordinal);
        Assert.Contains("CHAIN BROKEN", verify.Error, StringComparison.Ordinal);
        foreach (string[] command in new[] { ["register", "add", "B-1", "--kind", "barometer"], new[] { "service", "add", "P-17", "cleaned" }, ["calibrations", "withdraw", First, "--reason", "x"] })
        {
            Run refused = await Run(command);
            Assert.Equal(1, refused.ExitCode);
            Assert.Contains("chain of calibration records is broken", refused.Error, StringComparison.Ordinal);
        }

        Assert.Equal(1, (await Run("register", "list")).ExitCode);
    }

    [Fact]
    public async Task AnOldLog_IsReadAsItStands()
    {
        byte[] before = await File.ReadAllBytesAsync(LogFile);
        Assert.Contains("2 records, chain whole", (await Ok("calibrations", "list")).Output, StringComparison.Ordinal);
        await Ok("calibrations", "verify", "--head", Head);
        Assert.Equal(before, await File.ReadAllBytesAsync(LogFile));
    }
}
