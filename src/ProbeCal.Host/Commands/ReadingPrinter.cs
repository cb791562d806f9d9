using System;
using System.IO;
using System.Text;
using Microsoft.Extensions.Logging;

namespace ProbeCal.Host.Commands;

/// <summary>Prints readings that are on the disk already. Nobody taking them is told once and never holds up the stream.</summary>
internal sealed partial class ReadingPrinter(TextWriter output, ILogger log)
{
    private bool _failing;

    internal void Print(ReadOnlyMemory<byte> payload)
    {
        try
        {
            output.WriteLine(Encoding.UTF8.GetString(payload.Span));
            output.Flush();
            _failing = false;
        }
        catch (IOException fault)
        {
            if (!_failing)
            {
                NotPrinted(log, fault.Message);
            }

            _failing = true;
        }
    }

    [LoggerMessage(EventId = 2301, Level = LogLevel.Warning, Message = "readings cannot be printed: {Reason}; they are journaled and sent all the same")]
    private static partial void NotPrinted(ILogger log, string reason);
}
