using System;
using System.IO;
using System.Linq;
using System.Threading.Tasks;
using ProbeCal.Peers.Tests.Parts;
using Xunit;

namespace ProbeCal.Peers.Tests;

/// <summary>
/// Wrong values on the command line and in a configuration, given to the real program beside a folder that holds a
/// calibration: one line, the right exit code, nothing on standard output, and not a byte of the folder changed.
/// </summary>
public class BadInputTests(CalibratedFolder calibrated) : IClassFixture<CalibratedFolder>
{
    [Theory]
    [InlineData("--pressure 760: a pressure carries its unit", "--temperature", "20", "--pressure", "760")]
    [InlineData("--pressure 1013hPa is not possible at 2000m", "--temperature", "20", "--altitude", "2000m", "--pressure", "1013hPa")]
    [InlineData("--temperature 68 °C is outside", "--temperature", "68", "--pressure", "760mmHg")]
    [InlineData("--temperature NaN: NaN and infinity are no values here", "--temperature", "NaN", "--pressure", "760mmHg")]
    [InlineData("--temperature 8,3: a comma is no decimal mark here; write 8.3", "--temperature", "8,3", "--pressure", "760mmHg")]
    [InlineData("--temperature", "--temperature", "20", "--temperature", "21", "--pressure", "760mmHg")]
    [InlineData("'\\x1B[2J'", "--temperature", "20", "--pressure", "760mmHg", "\u001b[2J")]
    public async Task A_wrong_value_of_equilibrium_is_named_in_one_line(string said, params string[] arguments)
    {
        string line = await CalibratedFolder.RefusedAsync(["equilibrium", "--salinity", "0", .. arguments], 2);
        Assert.Contains(said, line, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(2, "--pressure 742: a pressure carries its unit", "--pressure", "742")]
    [InlineData(2, "pressure-at-altitude", "--pressure", "1013hPa")]
    [InlineData(2, "write 68F", "--temperature", "68")]
    [InlineData(2, "NaN and infinity are no values here", "--temperature", "nan")]
    [InlineData(2, "--salinity 0,5: a comma is no decimal mark", "--salinity", "0,5")]
    [InlineData(2, "--coefficient", "--coefficient", "3%/K")]
    [InlineData(2, "--pressure-source sea-level: no such source of a pressure", "--pressure-source", "sea-level")]
    [InlineData(2, "--probe a/b: an id has letters", "--probe", "a/b")]
    [InlineData(2, "--probe \\x1B[A", "--probe", "\u001b[A")]
    [InlineData(2, "--site x\\x0Ay: this is one line", "--site", "x\ny")]
    [InlineData(2, "--membrane-installed", "--membrane-installed", "2026-05-01")]
    [InlineData(2, "--data ''", "--data", "")]
    public async Task A_wrong_value_of_calibrate_leaves_the_log_as_it_was(int exitCode, string said, params string[] arguments)
    {
        await UnchangedAsync(CalibratedFolder.Calibrate(calibrated.Data, arguments), exitCode, said);
    }

    /// <summary>The steps before the first point are done when the source is opened; they are kept to go on with, and nothing else is left.</summary>
    [Theory]
    [InlineData("there is no such port", "--source", "serial:/dev/no-such-port")]
    [InlineData("Connection refused", "--source", "tcp:127.0.0.1:1")]
    public async Task A_source_that_does_not_open_leaves_the_log_as_it_was_and_the_steps_that_were_done(string said, params string[] arguments)
    {
        string before = CalibratedFolder.Fingerprint(calibrated.Data);
        string line = await CalibratedFolder.RefusedAsync(CalibratedFolder.Calibrate(calibrated.Data, arguments), 1);
        Assert.Contains(said, line, StringComparison.Ordinal);
        string state = Assert.Single(Directory.GetFiles(calibrated.Data, "*", SearchOption.AllDirectories), static file => Path.GetFileName(Path.GetDirectoryName(file)) == "sessions");
        File.Delete(state);
        Assert.Equal(before, CalibratedFolder.Fingerprint(calibrated.Data));
    }

    [Theory]
    [InlineData("this is no JSON", "\"stirring\": \"stirred\"", "\"stirring\": \"stir")]
    [InlineData("line 5 column", "\"site\"", "\"sites\"")]
    [InlineData("there is no key sites (did you mean site?)", "\"site\"", "\"sites\"")]
    [InlineData("site.altitude 640: an altitude carries its unit", "\"640 m\"", "640")]
    [InlineData("site.altitude 640000 m", "\"640 m\"", "\"640000 m\"")]
    [InlineData("site: an object { } belongs here", "{ \"name\": \"Fern Pool (invented)\", \"altitude\": \"640 m\" }", "\"Fern Pool\"")]
    [InlineData("version 2: this program knows up to version 1", "\"version\": 1", "\"version\": 2")]
    [InlineData("a comma is no decimal mark here", "\"value\": \"0\"", "\"value\": \"0,5\"")]
    [InlineData("NaN and infinity are no values here", "\"value\": \"0\"", "\"value\": \"NaN\"")]
    [InlineData("an id has letters", "fern-pool", "fern/+/#")]
    [InlineData("this is one line without control characters", "Fern Pool", "\\u001b[2JPool")]
    [InlineData("source serial:\\x00", "\"simulated\", \"line\"", "\"serial:\\u0000\", \"line\"")]
    public async Task A_damaged_configuration_is_refused_with_its_place(string said, string good, string bad)
    {
        using StationSite site = new() { Data = calibrated.Data };
        site.Configure("simulated");
        string text = await File.ReadAllTextAsync(site.Configuration);
        Assert.Contains(good, text, StringComparison.Ordinal);
        int at = text.IndexOf(good, StringComparison.Ordinal);
        // A cut file ends where the replacement ends.
        string end = bad.Count(static c => c == '"') % 2 == 1 ? "" : text[(at + good.Length)..];
        await File.WriteAllTextAsync(site.Configuration, text[..at] + bad + end);
        await UnchangedAsync(["station", "--config", site.Configuration, "--data", calibrated.Data], 2, said);
    }

    [Theory]
    [InlineData(2, "there is no command 'calibrat' (did you mean calibrate?)", "calibrat")]
    [InlineData(2, "--config", "station")]
    [InlineData(2, "--count 0", "simulate", "--count", "0")]
    [InlineData(2, "--duration -5s", "simulate", "--duration", "-5s")]
    [InlineData(2, "faster", "simulate", "--faster", "1e-300")]
    [InlineData(2, "--pty ''", "simulate", "--pty", "")]
    [InlineData(2, "--output ''", "tables", "--format", "csv", "--temperature", "0..40C", "--salinity", "0", "--pressure", "1atm", "--error", "1mg/L", "--output", "")]
    [InlineData(2, "--temperature-step 1e40K", "tables", "--format", "csv", "--temperature", "0..40C", "--salinity", "0", "--pressure", "1atm", "--temperature-step", "1e40K")]
    [InlineData(2, "--input ''", "equilibrium", "--input", "", "--output", "-", "--column", "temperature=T", "--salinity", "0", "--pressure", "1atm")]
    [InlineData(2, "/dev/null: there is no header", "equilibrium", "--input", "/dev/null", "--output", "-", "--column", "temperature=T", "--salinity", "0", "--pressure", "1atm")]
    [InlineData(2, "--mixture O2 NaN: NaN and infinity", "equilibrium", "--temperature", "20", "--salinity", "0", "--pressure", "1atm", "--mixture", "O2=NaN")]
    [InlineData(2, "--mixture O2=5%,,N2=95%: write each gas", "equilibrium", "--temperature", "20", "--salinity", "0", "--pressure", "1atm", "--mixture", "O2=5%,,N2=95%")]
    [InlineData(2, "--ions Na+ 1e9mol/L: the salting-out constants", "equilibrium", "--temperature", "20", "--pressure", "1atm", "--ions", "Na+=1e9mol/L")]
    [InlineData(2, "--ions Na+ \u22121mol/L: the minus sign is another character", "equilibrium", "--temperature", "20", "--pressure", "1atm", "--ions", "Na+=\u22121mol/L")]
    [InlineData(2, "--monte-carlo 1e9: this takes a whole number from 1000", "equilibrium", "--temperature", "20", "--salinity", "0", "--pressure", "1atm", "--monte-carlo", "1e9")]
    [InlineData(2, "--pressure 1e400hPa: the number is too large", "total-gas", "--delta-p", "1hPa", "--temperature", "20", "--salinity", "0", "--pressure", "1e400hPa")]
    [InlineData(2, "--salinity -1: ", "water", "--temperature", "20", "--salinity", "-1")]
    [InlineData(2, "--data ''", "calibrations", "list", "--data", "")]
    public async Task Other_wrong_command_lines_end_with_one_line(int exitCode, string said, params string[] arguments)
    {
        Assert.Contains(said, await CalibratedFolder.RefusedAsync(arguments, exitCode), StringComparison.Ordinal);
    }

    private async Task UnchangedAsync(System.Collections.Generic.IEnumerable<string> arguments, int exitCode, string said)
    {
        string before = CalibratedFolder.Fingerprint(calibrated.Data);
        string line = await CalibratedFolder.RefusedAsync(arguments, exitCode);
        Assert.Contains(said, line, StringComparison.Ordinal);
        Assert.Equal(before, CalibratedFolder.Fingerprint(calibrated.Data));
    }
}
