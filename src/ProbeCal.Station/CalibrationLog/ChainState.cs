using System.Collections.Generic;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// What the walk over the log found. A whole chain shows that no record was changed, inserted, reordered or taken out of
/// the middle by anyone who did not rewrite all that follows; records cut off at the end, or a log rewritten from one
/// point to its end, it cannot show without a head kept elsewhere.
/// </summary>
/// <param name="Count">Number of records.</param>
/// <param name="HeadSha256">Hash of the last record; 64 zeros for an empty log.</param>
/// <param name="Faults">One sentence for each fault; empty when the chain is whole.</param>
public sealed record ChainState(long Count, string HeadSha256, IReadOnlyList<string> Faults)
{
    /// <summary>True when no fault was found.</summary>
    public bool IsWhole => Faults.Count == 0;
}
