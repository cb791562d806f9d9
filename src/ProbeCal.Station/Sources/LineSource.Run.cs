using System;
using System.Collections.Generic;
using System.Threading;
using System.Threading.Channels;
using System.Threading.Tasks;
using Microsoft.Extensions.Logging;

namespace ProbeCal.Station.Sources;

internal sealed partial class LineSource
{
    /// <summary>How often presence and silence are looked at while no bytes come.</summary>
    private static readonly TimeSpan WatchInterval = TimeSpan.FromSeconds(1);

    /// <summary>Bytes that come this long after the opening start a line: no device pauses so long within one.</summary>
    private static readonly TimeSpan QuietStart = TimeSpan.FromSeconds(1);

    private static readonly TimeSpan LongestClose = TimeSpan.FromSeconds(5);

    /// <summary>One enumeration of the source: what it needs to remember between one opening and the next.</summary>
    private sealed class Run(LineSource source, ChannelWriter<SourceEvent> events, CancellationToken stop)
    {
        private readonly Backoff _backoff = new();
        private string? _lastReason;
        private bool _openedOnce;

        internal async Task Async()
        {
            await ReportAsync(SourceState.Opening, source.Description).ConfigureAwait(false);
            while (true)
            {
                IByteChannel? channel = await TryOpenAsync().ConfigureAwait(false);
                if (channel is not null)
                {
                    string reason = await UseAsync(channel).ConfigureAwait(false);
                    if (source._opener.EndsForGood)
                    {
                        await ReportAsync(SourceState.Ended, reason).ConfigureAwait(false);
                        return;
                    }

                    await ReportAsync(SourceState.Lost, reason).ConfigureAwait(false);
                }

                await Task.Delay(_backoff.Next(), source._time, stop).ConfigureAwait(false);
            }
        }

        private async Task<IByteChannel?> TryOpenAsync()
        {
            try
            {
                IByteChannel channel = await source._opener.OpenAsync(stop).ConfigureAwait(false);
                _openedOnce = true;
                await ReportAsync(SourceState.Open, source.Description).ConfigureAwait(false);
                return channel;
            }
            catch (ChannelException fault)
            {
                if ((source._mustOpen && !_openedOnce) || source._opener.EndsForGood)
                {
                    throw new Entry.WorkFailedException(source.Description + ": " + fault.Message, fault);
                }

                // The same reason every half minute would only fill the log.
                if (_lastReason != fault.Message)
                {
                    await ReportAsync(SourceState.Lost, fault.Message).ConfigureAwait(false);
                }

                return null;
            }
        }

        private async Task<string> UseAsync(IByteChannel channel)
        {
            LineFramer framer = new(source._opener.MayStartInTheMiddle);
            try
            {
                string reason = await ReadLinesAsync(channel, framer).ConfigureAwait(false);
                await DeliverAsync(framer.End).ConfigureAwait(false);
                return reason;
            }
            finally
            {
                await CloseAsync(channel).ConfigureAwait(false);
            }
        }

        /// <summary>Reads until the channel is over and says why.</summary>
        private async Task<string> ReadLinesAsync(IByteChannel channel, LineFramer framer)
        {
            byte[] buffer = new byte[4096];
            long opened = source._time.GetTimestamp();
            long lastBytes = opened;
            bool suspect = false;
            Task<int> read = channel.ReadAsync(buffer, stop).AsTask();
            while (true)
            {
                if (!await ReadsWithinAsync(read).ConfigureAwait(false))
                {
                    if (!channel.IsPresent)
                    {
                        Abandon(read);
                        return "it is gone: pulled out or switched off";
                    }

                    if (!suspect && source._opener.Silence is TimeSpan silence && silence <= source._time.GetElapsedTime(lastBytes))
                    {
                        suspect = true;
                        await ReportAsync(SourceState.Suspect, "nothing has come for " + Entry.Number.Fixed(silence.TotalSeconds, 0) + " s").ConfigureAwait(false);
                    }

                    continue;
                }

                (int count, string? over) = await ResultAsync(read).ConfigureAwait(false);
                if (over is not null)
                {
                    return over;
                }

                if (lastBytes == opened && QuietStart <= source._time.GetElapsedTime(opened))
                {
                    framer.StartsWhole();
                }

                lastBytes = source._time.GetTimestamp();
                _backoff.Reset();
                if (suspect)
                {
                    suspect = false;
                    await ReportAsync(SourceState.Open, "it delivers again").ConfigureAwait(false);
                }

                await DeliverAsync(found => framer.Push(buffer.AsSpan(0, count), found)).ConfigureAwait(false);
                read = channel.ReadAsync(buffer, stop).AsTask();
            }
        }

        /// <summary>True when the read has completed within the watch interval.</summary>
        private async Task<bool> ReadsWithinAsync(Task<int> read)
        {
            if (read.IsCompleted)
            {
                return true;
            }

            using CancellationTokenSource enough = CancellationTokenSource.CreateLinkedTokenSource(stop);
            Task tick = Task.Delay(WatchInterval, source._time, enough.Token);
            await Task.WhenAny(read, tick).ConfigureAwait(false);
            await enough.CancelAsync().ConfigureAwait(false);
            if (stop.IsCancellationRequested)
            {
                Abandon(read);
                stop.ThrowIfCancellationRequested();
            }

            return read.IsCompleted;
        }

        private async Task<(int Count, string? Over)> ResultAsync(Task<int> read)
        {
            try
            {
                int count = await read.ConfigureAwait(false);
                return (count, count != 0 ? null : source._opener.EndsForGood ? "it is read to its end" : "the other side has ended");
            }
            catch (Exception fault) when (!stop.IsCancellationRequested)
            {
                // Ports of a lost device fault with anything from IOException to ObjectDisposedException: each means a loss.
                source._logger.LogDebug(SourceEventIds.Lost, fault, "{Source}: reading failed", source.Description);
                return (0, "it is lost: " + Entry.Wrong.Shown(fault.Message));
            }
        }

        private async Task DeliverAsync(Action<Action<FramedLine>> frame)
        {
            List<FramedLine> lines = [];
            frame(lines.Add);
            DateTimeOffset received = source._time.GetUtcNow();
            foreach (FramedLine line in lines)
            {
                SourceEvent happened = line.Defect is string defect
                    ? new RejectedLine(received, line.Text, defect)
                    : source._template.Read(line.Text, received);
                if (source._pace is ReplayPace pace && happened is RawSample { TimeFromLine: true } sample)
                {
                    await pace.WaitForAsync(sample.TimeUtc, source._time, stop).ConfigureAwait(false);
                    happened = sample with { ReceivedUtc = source._time.GetUtcNow() };
                }

                await DeliverAsync(happened).ConfigureAwait(false);
            }
        }

        private async Task ReportAsync(SourceState state, string reason)
        {
            _lastReason = reason;
            LogLevel level = state is SourceState.Lost or SourceState.Suspect ? LogLevel.Warning : LogLevel.Information;
            // Delivered first: whoever reads of it in the log and stops the stream finds it in the journal.
            await DeliverAsync(new SourceStateChanged(source._time.GetUtcNow(), state, reason)).ConfigureAwait(false);
            source._logger.Log(level, SourceEventIds.State, "{Source}: {State}: {Reason}", source.Description, state, reason);
        }

        /// <summary>What has happened is handed on even when the stop has come, as long as there is room; only waiting for room ends with it.</summary>
        private ValueTask DeliverAsync(SourceEvent happened)
        {
            return events.TryWrite(happened) ? ValueTask.CompletedTask : events.WriteAsync(happened, stop);
        }

        private async Task CloseAsync(IByteChannel channel)
        {
            Task close = Task.Run(() => channel.DisposeAsync().AsTask(), CancellationToken.None);
            try
            {
                await close.WaitAsync(LongestClose, source._time, CancellationToken.None).ConfigureAwait(false);
            }
            catch (TimeoutException)
            {
                source._logger.LogWarning(SourceEventIds.CloseHangs, "{Source}: it does not close; it is left behind and opened anew", source.Description);
                Abandon(close);
            }
            catch (Exception fault)
            {
                source._logger.LogDebug(SourceEventIds.CloseFailed, fault, "{Source}: closing failed", source.Description);
            }
        }

        /// <summary>Lets a task end on its own; its fault has been reported in another way.</summary>
        private static void Abandon(Task task)
        {
            _ = task.ContinueWith(
                static ended => _ = ended.Exception, CancellationToken.None, TaskContinuationOptions.OnlyOnFaulted, TaskScheduler.Default);
        }
    }
}
