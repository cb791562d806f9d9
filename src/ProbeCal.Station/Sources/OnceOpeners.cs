using System;
using System.IO;
using System.Text;
using System.Threading;
using System.Threading.Tasks;

namespace ProbeCal.Station.Sources;

/// <summary>Opens a file that is read once.</summary>
internal sealed class FileOpener(FileAddress address) : IByteChannelOpener
{
    public string Description => "file " + address.Path;

    public bool EndsForGood => true;

    public bool MayStartInTheMiddle => false;

    public TimeSpan? Silence => null;

    public Task<IByteChannel> OpenAsync(CancellationToken cancellationToken)
    {
        try
        {
            return Task.FromResult<IByteChannel>(new StreamChannel(
                new FileStream(address.Path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite, 4096, useAsync: true)));
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            throw new ChannelException(Entry.Wrong.Shown(fault.Message), fault);
        }
    }
}

/// <summary>Standard input, which Host hands in as the reader that its tests replace.</summary>
internal sealed class StandardInputOpener(TextReader input) : IByteChannelOpener
{
    public string Description => "standard input";

    public bool EndsForGood => true;

    public bool MayStartInTheMiddle => false;

    public TimeSpan? Silence => null;

    public Task<IByteChannel> OpenAsync(CancellationToken cancellationToken)
    {
        return Task.FromResult<IByteChannel>(new ReaderChannel(input));
    }

    private sealed class ReaderChannel(TextReader input) : IByteChannel
    {
        private readonly char[] _chars = new char[1024];
        private readonly Encoder _encoder = Encoding.UTF8.GetEncoder();

        public bool IsPresent => true;

        public async ValueTask<int> ReadAsync(Memory<byte> buffer, CancellationToken cancellationToken)
        {
            int bytes = 0;
            int count = 1;
            while (bytes == 0 && count != 0)
            {
                // The console's reader blocks even when asked not to; a thread of the pool waits in its place, and a stop leaves it behind.
                count = await Task.Run(() => input.Read(_chars, 0, Math.Min(_chars.Length, buffer.Length / 4)), CancellationToken.None).ConfigureAwait(false);
                bytes = _encoder.GetBytes(_chars.AsSpan(0, count), buffer.Span, flush: count == 0);
            }

            return bytes;
        }

        public ValueTask DisposeAsync()
        {
            return ValueTask.CompletedTask;
        }
    }
}
