using System;
using System.IO;
using System.Threading;
using System.Threading.Tasks;

namespace ProbeCal.Host.Tests;

/// <summary>One run of the program with its streams held in memory.</summary>
internal sealed record Run(int ExitCode, string Output, string Error)
{
    /// <summary>The single line that an error must be.</summary>
    internal string ErrorLine => Error.TrimEnd('\n', '\r');

    internal static Task<Run> OfAsync(params string[] arguments)
    {
        return InWindowAsync(null, arguments);
    }

    /// <summary>The same in a window so many characters wide.</summary>
    internal static Task<Run> InWindowAsync(int? width, params string[] arguments)
    {
        return AtAsync(TimeProvider.System, width, arguments);
    }

    /// <summary>The same by another clock.</summary>
    internal static async Task<Run> AtAsync(TimeProvider time, int? width, params string[] arguments)
    {
        StringWriter output = new();
        StringWriter error = new();
        Terminal terminal = new()
        {
            Input = TextReader.Null,
            Output = output,
            Error = error,
            Width = width,
            Time = time,
            Stop = CancellationToken.None,
        };
        int code = await Program.RunAsync(arguments, terminal);
        return new Run(code, output.ToString(), error.ToString());
    }
}
