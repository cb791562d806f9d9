using System.Globalization;

namespace ProbeCal.Host.Commands;

/// <summary>How a pressure that stands in for a barometer's is told.</summary>
internal static class PressureWords
{
    /// <summary>The sentence for a pressure that was not read on a barometer; null for one that was.</summary>
    /// <param name="source"><c>given</c>, <c>sea-level</c> or <c>altitude</c>.</param>
    /// <param name="uncertaintyHectopascal">Its standard uncertainty, hPa.</param>
    internal static string? Caution(string source, double uncertaintyHectopascal)
    {
        return source switch
        {
            "altitude" => string.Create(CultureInfo.InvariantCulture, $"pressure from the altitude alone: second best, taken as ± {uncertaintyHectopascal:G3} hPa; a barometer is better"),
            "sea-level" => string.Create(CultureInfo.InvariantCulture, $"pressure recovered from one reduced to sea level: second best, taken as ± {uncertaintyHectopascal:F1} hPa; a barometer is better"),
            _ => null,
        };
    }
}
