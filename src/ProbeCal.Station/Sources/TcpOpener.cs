using System;
using System.Globalization;
using System.Net.Sockets;
using System.Threading;
using System.Threading.Tasks;

namespace ProbeCal.Station.Sources;

/// <summary>Connects to a server that sends lines.</summary>
internal sealed class TcpOpener(TcpAddress address, TimeProvider time) : IByteChannelOpener
{
    private static readonly TimeSpan LongestConnect = TimeSpan.FromSeconds(10);

    public string Description => string.Create(CultureInfo.InvariantCulture, $"tcp {address.Host} port {address.Port}");

    public bool EndsForGood => false;

    /// <summary>A converter passes on whatever its serial line is in the middle of.</summary>
    public bool MayStartInTheMiddle => true;

    public TimeSpan? Silence => address.Silence;

    public async Task<IByteChannel> OpenAsync(CancellationToken cancellationToken)
    {
        Socket socket = new(SocketType.Stream, ProtocolType.Tcp);
        using CancellationTokenSource limit = new(LongestConnect, time);
        using CancellationTokenSource either = CancellationTokenSource.CreateLinkedTokenSource(cancellationToken, limit.Token);
        try
        {
            await socket.ConnectAsync(address.Host, address.Port, either.Token).ConfigureAwait(false);

            // A pulled network cable sends no goodbye: the system asks after 30 s of silence and gives up after three more.
            socket.SetSocketOption(SocketOptionLevel.Socket, SocketOptionName.KeepAlive, true);
            socket.SetSocketOption(SocketOptionLevel.Tcp, SocketOptionName.TcpKeepAliveTime, 30);
            socket.SetSocketOption(SocketOptionLevel.Tcp, SocketOptionName.TcpKeepAliveInterval, 10);
            socket.SetSocketOption(SocketOptionLevel.Tcp, SocketOptionName.TcpKeepAliveRetryCount, 3);
            return new StreamChannel(new NetworkStream(socket, ownsSocket: true));
        }
        catch (SocketException fault)
        {
            socket.Dispose();
            throw new ChannelException("no connection: " + Entry.Wrong.Shown(fault.Message), fault);
        }
        catch (OperationCanceledException) when (!cancellationToken.IsCancellationRequested)
        {
            socket.Dispose();
            throw new ChannelException("no answer within 10 s");
        }
        catch (OperationCanceledException)
        {
            socket.Dispose();
            throw;
        }
    }
}
