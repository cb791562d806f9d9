using System;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>The <c>--format</c> of commands that print for people or for programs.</summary>
internal static class OutputShape
{
    private static readonly string[] Shapes = ["text", "json"];

    /// <summary>True for JSON; text when nothing is said.</summary>
    /// <exception cref="InputException">It is neither text nor json.</exception>
    internal static bool IsJson(string? shape)
    {
        return Array.IndexOf(Shapes, shape ?? Shapes[0]) switch
        {
            0 => false,
            1 => true,
            _ => throw Wrong.Input("--format", shape!, $"there is no such form{NearestName.DidYouMean(shape!, Shapes)}; there are text and json"),
        };
    }
}
