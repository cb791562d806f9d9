using System;
using System.Collections.Generic;
using System.Text;
using System.Threading;
using System.Threading.Channels;
using System.Threading.Tasks;
using ProbeCal.Station.Journal;
using ProbeCal.Station.Publishing;

namespace ProbeCal.Station.Tests.Publishing;

/// <summary>A link whose answers a test gives, and whose calls it reads one by one.</summary>
internal sealed class ScriptedLink : IBrokerLink
{
    private readonly Channel<string> _calls = Channel.CreateUnbounded<string>();
    private TaskCompletionSource _lost = new();

    public Queue<LinkResult> ConnectAnswers { get; } = new();

    public Func<Message, LinkResult> PublishAnswer { get; set; } = _ => LinkResult.Done;

    public LinkResult PingAnswer { get; set; } = LinkResult.Done;

    public string Description => "scripted";

    public Task Lost => _lost.Task;

    public async Task<string> NextCallAsync()
    {
        return await _calls.Reader.ReadAsync().AsTask().WaitAsync(Deadline.Generous);
    }

    public async Task ExpectAsync(params string[] calls)
    {
        foreach (string call in calls)
        {
            Xunit.Assert.Equal(call, await NextCallAsync());
        }
    }

    public void Lose()
    {
        _lost.TrySetResult();
    }

    public Task<LinkResult> ConnectAsync(CancellationToken cancellationToken)
    {
        LinkResult answer = ConnectAnswers.TryDequeue(out LinkResult given) ? given : LinkResult.Done;
        _lost = new TaskCompletionSource(TaskCreationOptions.RunContinuationsAsynchronously);
        _calls.Writer.TryWrite("connect");
        return Task.FromResult(answer);
    }

    public Task<LinkResult> PublishAsync(Message message, bool retain, CancellationToken cancellationToken)
    {
        LinkResult answer = PublishAnswer(message);
        _calls.Writer.TryWrite((retain ? "retain " : "publish ") + Encoding.UTF8.GetString(message.Payload.Span));
        return Task.FromResult(answer);
    }

    public Task<LinkResult> PingAsync(CancellationToken cancellationToken)
    {
        _calls.Writer.TryWrite("ping");
        return Task.FromResult(PingAnswer);
    }

    public Task DisconnectAsync(CancellationToken cancellationToken)
    {
        _calls.Writer.TryWrite("disconnect");
        return Task.CompletedTask;
    }

    public ValueTask DisposeAsync()
    {
        return ValueTask.CompletedTask;
    }
}
