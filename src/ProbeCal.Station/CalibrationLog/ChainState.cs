using System.Collections.Generic;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// What the walk over the log found. A whole chain shows that no entry was changed, inserted, reordered or taken out of
/// the middle by anyone who did not rewrite all that follows; entries cut off at the end, or a log rewritten from one
/// point to its end, it cannot show without a head kept elsewhere.
/// </summary>
/// <param name="Count">Number of entries.</param>
/// <param name="HeadSha256">Hash of the last entry; 64 zeros for an empty log.</param>
/// <param name="Faults">One for each fault; empty when the chain is whole.</param>
public sealed record ChainState(long Count, string HeadSha256, IReadOnlyList<ChainFault> Faults)
{
    /// <summary>True when no fault was found.</summary>
    public bool IsWhole => Faults.Count == 0;

    /// <summary>The hash over the bytes that stand at each place.</summary>
    internal IReadOnlyDictionary<long, string> Hashes { get; init; } = new Dictionary<long, string>();

    /// <summary>Count and hash as they are printed, published and compared: <c>12:4a9f…</c>.</summary>
    public string Head => new LogHead(Count, HeadSha256).ToString();
}

/// <summary>A fault of the chain.</summary>
/// <param name="Index">The place at which it shows.</param>
/// <param name="Kind">
/// <c>edited</c> (bytes do not give their hash), <c>gap</c> (a place is empty), <c>moved</c> (the entry states another place),
/// <c>link</c> (it continues another entry), <c>foreign</c> (it is of another log), <c>filed</c> (a column beside it was changed),
/// <c>unreadable</c>.
/// </param>
/// <param name="Text">One sentence.</param>
public sealed record ChainFault(long Index, string Kind, string Text)
{
    /// <inheritdoc/>
    public override string ToString()
    {
        return Text;
    }
}
