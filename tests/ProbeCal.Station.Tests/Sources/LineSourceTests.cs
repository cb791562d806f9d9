using System;
using System.IO;
using System.Linq;
using System.Threading.Tasks;
using Microsoft.Extensions.Logging.Abstractions;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Sources;
using Xunit;

namespace ProbeCal.Station.Tests.Sources;

public class LineSourceTests
{
    private readonly PacedTime _time = new(new DateTimeOffset(2026, 6, 1, 12, 0, 0, TimeSpan.Zero));

    [Fact]
    public async Task Lines_BecomeSamplesAndTheBadOnesAreKept()
    {
        FedChannel channel = new FedChannel().Give("1.5,18\n2.").Give("5,19\r\nrubbish\n\xFF\xFE\n").Give("3.5,20\n4.5,2").Give("");
        await using SourceWatch watch = Watch(new FedOpener(_time, channel) { EndsForGood = true });
        await watch.ToEndAsync();
        Assert.Equal([1.5, 2.5, 3.5], watch.Seen.OfType<RawSample>().Select(sample => sample.Signal));
        RejectedLine[] rejected = watch.Seen.OfType<RejectedLine>().ToArray();
        Assert.Equal(["rubbish", "ÿþ", "4.5,2"], rejected.Select(line => line.RawText));
        Assert.Equal(LineFramer.CutAtEnd, rejected[2].Reason);
        Assert.Equal([SourceState.Opening, SourceState.Open, SourceState.Ended], watch.Seen.OfType<SourceStateChanged>().Select(change => change.State));
        Assert.True(channel.IsClosed);
    }

    [Fact]
    public async Task Opening_IsTriedWithGrowingWaitsAndSaidOnce()
    {
        FedOpener opener = new(_time, "not there", "not there", "not there", "not there", "no permission", "not there", new FedChannel().Give("1,18\n"));
        await using SourceWatch watch = Watch(opener);
        await watch.SampleAsync();
        Assert.Equal([1, 2, 4, 8, 16, 30], opener.Attempts.Zip(opener.Attempts.Skip(1), (a, b) => Math.Round((b - a).TotalSeconds)));
        Assert.Equal(
            ["Opening fed", "Lost not there", "Lost no permission", "Lost not there", "Open fed"],
            watch.Seen.OfType<SourceStateChanged>().Select(change => change.State + " " + change.Reason));
    }

    [Fact]
    public async Task FirstOpening_ThatMustSucceedFailsInOneLine()
    {
        await using SourceWatch watch = new(new LineSource(new FedOpener(_time, "there is no such port"), Template, _time, NullLogger.Instance, mustOpen: true), _time);
        await watch.NextAsync();
        Assert.Equal("fed: there is no such port", (await Assert.ThrowsAsync<WorkFailedException>(watch.NextAsync)).Message);
    }

    /// <summary>A command that could open its port keeps to it when the cable is pulled later.</summary>
    [Fact]
    public async Task LaterLoss_IsAStateEvenWhereTheFirstOpeningMustSucceed()
    {
        FedOpener opener = new(_time, new FedChannel().Give("1,18\n").Break(new IOException("gone")), "not there", new FedChannel().Give("2,18\n"));
        await using SourceWatch watch = new(new LineSource(opener, Template, _time, NullLogger.Instance, mustOpen: true), _time);
        await watch.SampleAsync();
        Assert.Equal("it is lost: gone", (await watch.StateAsync(SourceState.Lost)).Reason);
        Assert.Equal(2, (await watch.SampleAsync()).Signal);
    }

    [Theory]
    [InlineData(typeof(IOException))]
    [InlineData(typeof(ObjectDisposedException))]
    [InlineData(typeof(InvalidOperationException))]
    [InlineData(typeof(OperationCanceledException))]
    [InlineData(typeof(UnauthorizedAccessException))]
    public async Task AnyFault_IsALossAndTheSourceComesBack(Type fault)
    {
        FedChannel first = new FedChannel().Give("1,18\n").Break((Exception)Activator.CreateInstance(fault, "gone")!);
        await using SourceWatch watch = Watch(new FedOpener(_time, first, new FedChannel().Give("2,18\n")));
        await watch.StateAsync(SourceState.Lost);
        Assert.Equal(2, (await watch.SampleAsync()).Signal);
        Assert.True(first.IsClosed);
    }

    /// <summary>The open handle of a pulled port may say nothing for ever: its absence is seen all the same.</summary>
    [Fact]
    public async Task Disappearance_IsSeenWhileAReadHangs()
    {
        FedChannel first = new FedChannel().Give("1,18\n");
        await using SourceWatch watch = Watch(new FedOpener(_time, first, new FedChannel().Give("2,18\n")));
        await watch.SampleAsync();
        DateTimeOffset pulled = _time.GetUtcNow();
        first.IsPresent = false;
        SourceStateChanged lost = await watch.StateAsync(SourceState.Lost);
        Assert.Equal("it is gone: pulled out or switched off", lost.Reason);
        Assert.InRange((lost.ReceivedUtc - pulled).TotalSeconds, 0, 5);
        Assert.Equal(2, (await watch.SampleAsync()).Signal);
    }

    [Fact]
    public async Task Close_ThatHangsIsLeftBehind()
    {
        FedChannel first = new() { HangingClose = new TaskCompletionSource() };
        first.Give("1,18\n").Break(new IOException("gone"));
        await using SourceWatch watch = Watch(new FedOpener(_time, first, new FedChannel().Give("2,18\n")));
        await watch.SampleAsync();
        Assert.Equal(2, (await watch.SampleAsync()).Signal);
        Assert.False(first.IsClosed);
        first.HangingClose!.SetResult();
    }

    [Fact]
    public async Task Silence_IsSuspectAndTheNextLineEndsIt()
    {
        FedChannel channel = new FedChannel().Give("1,18\n");
        await using SourceWatch watch = Watch(new FedOpener(_time, channel) { Silence = TimeSpan.FromSeconds(20) });
        RawSample first = await watch.SampleAsync();
        SourceStateChanged suspect = await watch.StateAsync(SourceState.Suspect);
        Assert.Equal("nothing has come for 20 s", suspect.Reason);
        Assert.InRange((suspect.ReceivedUtc - first.ReceivedUtc).TotalSeconds, 20, 25);
        channel.Give("2,18\n");
        Assert.Equal("it delivers again", (await watch.StateAsync(SourceState.Open)).Reason);
        Assert.Equal(2, (await watch.SampleAsync()).Signal);
    }

    [Fact]
    public async Task FirstLine_OfAPortThatWasSendingIsKeptAsRejected()
    {
        await using SourceWatch watch = Watch(new FedOpener(_time, new FedChannel().Give("2.5,18\n3.5,18\n")) { MayStartInTheMiddle = true });
        Assert.Equal(3.5, (await watch.SampleAsync()).Signal);
        Assert.Equal(new RejectedLine(_time.Start, "2.5,18", LineFramer.CutAtStart), Assert.Single(watch.Seen.OfType<RejectedLine>()) with { ReceivedUtc = _time.Start });
    }

    [Fact]
    public async Task FirstLine_AfterAQuietStartIsWhole()
    {
        FedChannel channel = new();
        await using SourceWatch watch = Watch(new FedOpener(_time, channel) { MayStartInTheMiddle = true, Silence = TimeSpan.FromSeconds(5) });
        await watch.StateAsync(SourceState.Suspect);
        channel.Give("2.5,18\n");
        Assert.Equal(2.5, (await watch.SampleAsync()).Signal);
    }

    [Fact]
    public async Task Stop_EndsTheStreamWithoutAFault()
    {
        FedChannel channel = new FedChannel().Give("1,18\n2,18\n");
        await using SourceWatch watch = Watch(new FedOpener(_time, channel));
        await watch.SampleAsync();
        watch.Stop();
        await watch.ToEndAsync();
        Assert.Equal([1, 2], watch.Seen.OfType<RawSample>().Select(sample => sample.Signal));
        Assert.True(channel.IsClosed);
    }

    [Fact]
    public async Task ConsumerThatLeaves_ClosesTheChannel()
    {
        FedChannel channel = new FedChannel().Give("1,18\n");
        SourceWatch watch = Watch(new FedOpener(_time, channel));
        await watch.SampleAsync();
        await watch.DisposeAsync();
        Assert.True(channel.IsClosed);
    }

    [Fact]
    public async Task Replay_KeepsToTheRecordedTimes()
    {
        FedChannel channel = new FedChannel().Give("2026-01-01T00:00:00Z,1\n2026-01-01T00:10:00Z,2\n2026-01-01T00:30:00Z,3\n").Give("");
        LineTemplate template = LineTemplate.Parse("l", "{time},{signal}");
        LineSource source = new(new FedOpener(_time, channel) { EndsForGood = true }, template, _time, NullLogger.Instance, false, new ReplayPace(10));
        await using SourceWatch watch = new(source, _time);
        RawSample first = await watch.SampleAsync();
        RawSample second = await watch.SampleAsync();
        RawSample third = await watch.SampleAsync();
        Assert.InRange((second.ReceivedUtc - first.ReceivedUtc).TotalSeconds, 60, 62);
        Assert.InRange((third.ReceivedUtc - first.ReceivedUtc).TotalSeconds, 180, 182);
        Assert.Equal(new DateTimeOffset(2026, 1, 1, 0, 30, 0, TimeSpan.Zero), third.TimeUtc);
    }

    [Fact]
    public async Task File_IsReadToItsEnd()
    {
        string path = Path.GetTempFileName();
        await File.WriteAllTextAsync(path, "\uFEFF1.5,18\r\n2.5,NaN\r\n8,3;20\r\n3.5,18\r\n4.5,1");
        await using (SourceWatch watch = new(SourceFactory.Create(new FileAddress(path), Template, _time, NullLogger.Instance), _time))
        {
            await watch.ToEndAsync();
            Assert.Equal([1.5, 2.5, 3.5], watch.Seen.OfType<RawSample>().Select(sample => sample.Signal));
            Assert.Equal(["8,3;20", "4.5,1"], watch.Seen.OfType<RejectedLine>().Select(line => line.RawText));
            Assert.Equal("it is read to its end", ((SourceStateChanged)watch.Seen[^1]).Reason);
        }

        File.Delete(path);
        Assert.Equal(
            $"source file:{path}: there is no such file; name one that holds lines",
            Assert.Throws<InputException>(() => SourceFactory.Create(new FileAddress(path), Template, _time, NullLogger.Instance)).Message);
    }

    [Fact]
    public async Task StandardInput_IsReadToItsEnd()
    {
        ISampleSource source = SourceFactory.Create(new StandardInputAddress(), Template, _time, NullLogger.Instance, new StringReader("1.5,18\n°\n2.5,18\n"));
        await using SourceWatch watch = new(source, _time);
        await watch.ToEndAsync();
        Assert.Equal([1.5, 2.5], watch.Seen.OfType<RawSample>().Select(sample => sample.Signal));
        Assert.Equal("°", Assert.Single(watch.Seen.OfType<RejectedLine>()).RawText);
        Assert.Throws<InputException>(() => SourceFactory.Create(new StandardInputAddress(), Template, _time, NullLogger.Instance));
    }

    private static LineTemplate Template { get; } = LineTemplate.Parse("--line", "{signal},{temperature}");

    private SourceWatch Watch(IByteChannelOpener opener)
    {
        return new SourceWatch(new LineSource(opener, Template, _time, NullLogger.Instance, mustOpen: false), _time);
    }
}
