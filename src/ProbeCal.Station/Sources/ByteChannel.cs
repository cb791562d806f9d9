using System;
using System.IO;
using System.Threading;
using System.Threading.Tasks;

namespace ProbeCal.Station.Sources;

/// <summary>An open way in for bytes. Disposing may hang when a device has gone: see <see cref="LineSource"/>.</summary>
internal interface IByteChannel : IAsyncDisposable
{
    /// <summary>False once the thing behind it has visibly gone, though the open handle may not know it yet.</summary>
    bool IsPresent { get; }

    /// <summary>Waits for bytes; 0 when the other side has ended.</summary>
    ValueTask<int> ReadAsync(Memory<byte> buffer, CancellationToken cancellationToken);
}

/// <summary>Knows how to open a channel, as often as it takes.</summary>
internal interface IByteChannelOpener
{
    /// <summary>What it opens, for people.</summary>
    string Description { get; }

    /// <summary>True when the end of the bytes is the end of the source; false when it is a loss and opened again.</summary>
    bool EndsForGood { get; }

    /// <summary>True when bytes may be under way before it is opened, so that the first line may be half a line.</summary>
    bool MayStartInTheMiddle { get; }

    /// <summary>Silence after which the source is suspect; null where silence means nothing.</summary>
    TimeSpan? Silence { get; }

    /// <summary>Opens the channel.</summary>
    /// <exception cref="ChannelException">It cannot be opened now.</exception>
    Task<IByteChannel> OpenAsync(CancellationToken cancellationToken);
}

/// <summary>Why a channel could not be opened, as one clause for people.</summary>
internal sealed class ChannelException : Exception
{
    internal ChannelException(string reason) : base(reason) { }

    internal ChannelException(string reason, Exception inner) : base(reason, inner) { }
}

/// <summary>A channel over a stream.</summary>
internal sealed class StreamChannel(Stream stream) : IByteChannel
{
    public bool IsPresent => true;

    public ValueTask<int> ReadAsync(Memory<byte> buffer, CancellationToken cancellationToken)
    {
        return stream.ReadAsync(buffer, cancellationToken);
    }

    public ValueTask DisposeAsync()
    {
        return stream.DisposeAsync();
    }
}
