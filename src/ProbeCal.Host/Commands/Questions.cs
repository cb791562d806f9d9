using System;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>Asks a person one thing at a time. What cannot be understood gets one line, and the question comes again.</summary>
internal sealed class Questions
{
    private readonly Terminal _terminal;

    internal Questions(Terminal terminal)
    {
        _terminal = terminal;
    }

    /// <summary>Asks until the answer can be read.</summary>
    /// <param name="question">The question, with what a right answer looks like.</param>
    /// <param name="read">Reads an answer; an <see cref="InputException"/> of it is shown and the question comes again.</param>
    /// <param name="cancellationToken">Stops waiting.</param>
    /// <exception cref="InputException">The input ended before an answer came.</exception>
    internal async Task<T> AskAsync<T>(string question, Func<string, T> read, CancellationToken cancellationToken)
    {
        while (true)
        {
            _terminal.Error.Write(question + " ");
            _terminal.Error.Flush();
            string answer = (await LineAsync(cancellationToken).ConfigureAwait(false)).Trim();
            try
            {
                return read(answer);
            }
            catch (InputException wrong)
            {
                _terminal.Error.WriteLine(wrong.Message);
            }
        }
    }

    /// <summary>Waits for the Enter key.</summary>
    internal async Task EnterAsync(string prompt, CancellationToken cancellationToken)
    {
        _terminal.Error.Write(prompt + " ");
        _terminal.Error.Flush();
        await LineAsync(cancellationToken).ConfigureAwait(false);
    }

    private async Task<string> LineAsync(CancellationToken cancellationToken)
    {
        // A console blocks the thread that reads it, and a live source is read on meanwhile.
        string? line = null;
        try
        {
            line = await Task.Run(_terminal.Input.ReadLine, cancellationToken).WaitAsync(cancellationToken).ConfigureAwait(false);
        }
        finally
        {
            if (line == null)
            {
                // What is said next does not belong behind the question.
                _terminal.Error.WriteLine();
            }
        }

        return line ?? throw new InputException("the input ended before the question was answered; answer it, or give every option and --unattended");
    }
}
