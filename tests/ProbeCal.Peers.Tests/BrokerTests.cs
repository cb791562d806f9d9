using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Threading.Tasks;
using ProbeCal.Peers.Tests.Parts;
using Xunit;

namespace ProbeCal.Peers.Tests;

/// <summary>A broker that is not there, one that refuses, and one that is not who it should be: a real mosquitto each time.</summary>
public class BrokerTests
{
    private const string Source = "simulated?faster=30&pressure=939hPa";
    private const string Wrong = "wrong-word-4711";
    private const string Right = "right-word-0815";

    private static readonly TimeSpan Deadline = StationSite.Deadline;

    [SkippableFact]
    public async Task What_waited_for_a_broker_that_was_not_there_goes_out_in_order_after_a_restart()
    {
        Mosquitto.SkipUnlessPresent();
        using StationSite site = new();
        site.Configure(Source, """{ "address": "mqtt://127.0.0.1:""" + Mosquitto.FreePort().ToString(CultureInfo.InvariantCulture) + "\" }");
        int before;
        using (OutsideProcess station = site.Start())
        {
            await station.WaitForErrorLineAsync("Connection refused; everything is kept", Deadline);
            await station.WaitForOutputAsync(static lines => lines.Count >= 30, "readings without a broker", Deadline);
            await StationSite.StopAsync(station);
            before = station.Output().Count;
            Assert.True(site.Number("SELECT count(*) FROM outbox") >= before);
        }

        using Mosquitto broker = await Mosquitto.StartAsync(site["broker"]);
        site.Configure(Source, """{ "address": "mqtt://""" + broker.Address + "\" }");
        using OutsideProcess subscriber = await SubscribeAsync(broker);
        using OutsideProcess again = site.Start();
        await AllArriveInOrderAsync(site, again, subscriber, before + 10);
    }

    [SkippableFact]
    public async Task A_wrong_password_is_told_and_not_shown_and_the_right_one_lets_everything_out()
    {
        Mosquitto.SkipUnlessPresent();
        Skip.If(Programs.Find("mosquitto_passwd") is null, "mosquitto_passwd is not installed");
        using StationSite site = new();
        await RunAsync("mosquitto_passwd", "-b", "-c", site["users"], "fern-pool", Right);
        using Mosquitto broker = await Mosquitto.StartAsync(site["broker"], passwordFile: site["users"]);
        await File.WriteAllTextAsync(site["password"], Wrong + "\n");
        site.Configure(Source, $$"""{ "address": "mqtt://{{broker.Address}}", "user": "fern-pool", "passwordFile": "password" }""");
        using OutsideProcess subscriber = await SubscribeAsync(broker, "-u", "fern-pool", "-P", Right);
        using OutsideProcess station = site.Start();
        await station.WaitForErrorLineAsync("as user fern-pool: user name or password is wrong", Deadline);
        await station.WaitForOutputAsync(static lines => lines.Count >= 30, "readings that wait", Deadline);
        Assert.Empty(subscriber.Output());
        Assert.True(site.Number("SELECT count(*) FROM outbox") >= 30);

        await File.WriteAllTextAsync(site["password"], Right + "\n");
        await AllArriveInOrderAsync(site, station, subscriber, 40);
        string said = string.Join('\n', station.Error().Concat(station.Output()));
        Assert.DoesNotContain(Wrong, said, StringComparison.Ordinal);
        Assert.DoesNotContain(Right, said, StringComparison.Ordinal);
    }

    [SkippableFact]
    public async Task Only_a_broker_of_the_named_authority_gets_anything()
    {
        Mosquitto.SkipUnlessPresent();
        Skip.If(Programs.Find("openssl") is null, "openssl is not installed");
        using StationSite site = new();
        await MakeAuthorityAsync(site, "right");
        await MakeAuthorityAsync(site, "other");
        await RunAsync("openssl", "req", "-newkey", "ec", "-pkeyopt", "ec_paramgen_curve:P-256", "-nodes", "-subj", "/CN=broker (invented)", "-keyout", site["broker.key"], "-out", site["broker.csr"]);
        await File.WriteAllTextAsync(site["names"], "subjectAltName=IP:127.0.0.1\n");
        await RunAsync("openssl", "x509", "-req", "-in", site["broker.csr"], "-CA", site["right.pem"], "-CAkey", site["right.key"], "-CAcreateserial", "-days", "2", "-extfile", site["names"], "-out", site["broker.pem"]);
        string port = Mosquitto.FreePort().ToString(CultureInfo.InvariantCulture);
        string listener = $"listener {port} 127.0.0.1\ncertfile {site["broker.pem"]}\nkeyfile {site["broker.key"]}";
        using Mosquitto broker = await Mosquitto.StartAsync(site["broker"], extraListener: listener);
        using OutsideProcess subscriber = await SubscribeAsync(broker);

        File.Copy(site["other.pem"], site["authority.pem"]);
        site.Configure(Source, $$"""{ "address": "mqtts://127.0.0.1:{{port}}", "caFile": "authority.pem", "checkRevocation": false }""");
        using OutsideProcess station = site.Start();
        await station.WaitForErrorLineAsync("TLS failed, nothing was sent", Deadline);
        await station.WaitForOutputAsync(static lines => lines.Count >= 30, "readings that wait", Deadline);
        Assert.Empty(subscriber.Output());

        File.Copy(site["right.pem"], site["authority.pem"], overwrite: true);
        await AllArriveInOrderAsync(site, station, subscriber, 40);
    }

    /// <summary>Waits for so many readings, stops the station, and holds what arrived against what was journaled.</summary>
    private static async Task AllArriveInOrderAsync(StationSite site, OutsideProcess station, OutsideProcess subscriber, int least)
    {
        await station.WaitForErrorLineAsync(": connected", Deadline);
        await subscriber.WaitForOutputAsync(lines => lines.Count >= least, least + " readings at the subscriber", Deadline);
        await StationSite.StopAsync(station);
        long last = site.Number("SELECT max(sequence) FROM sample");
        await subscriber.WaitForOutputAsync(lines => StationSite.Sequences(lines).Contains(last), "the last reading", Deadline);
        Assert.Equal(Enumerable.Range(1, (int)last).Select(static i => (long)i), StationSite.Sequences(subscriber.Output()));
        Assert.Equal(0, site.Number("SELECT count(*) FROM outbox"));
        site.CheckJournal(station.Output());
    }

    /// <summary>An independent subscriber. Its session stands at the broker when this returns, so that nothing sent later is missed.</summary>
    private static async Task<OutsideProcess> SubscribeAsync(Mosquitto broker, params string[] more)
    {
        string[] arguments =
        [
            "-h", "127.0.0.1", "-p", broker.Port.ToString(CultureInfo.InvariantCulture), "-i", "independent", "-c", "-q", "1",
            "-t", "probecal/v1/+/+/reading", .. more,
        ];
        await RunAsync("mosquitto_sub", ["-E", .. arguments]);
        return OutsideProcess.Start(Programs.Find("mosquitto_sub")!, arguments);
    }

    private static Task MakeAuthorityAsync(StationSite site, string name)
    {
        return RunAsync("openssl", "req", "-x509", "-newkey", "ec", "-pkeyopt", "ec_paramgen_curve:P-256", "-nodes", "-days", "2", "-subj", "/CN=" + name + " authority (invented)", "-keyout", site[name + ".key"], "-out", site[name + ".pem"]);
    }

    private static async Task RunAsync(string program, params string[] arguments)
    {
        using OutsideProcess process = OutsideProcess.Start(Programs.Find(program)!, arguments);
        int code = await process.ExitCodeAsync(Deadline);
        Assert.True(code == 0, process.Tail());
    }
}
