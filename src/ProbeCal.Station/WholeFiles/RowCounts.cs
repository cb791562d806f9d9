using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;

namespace ProbeCal.Station.WholeFiles;

/// <summary>How many rows came out how.</summary>
internal sealed class RowCounts
{
    private readonly SortedDictionary<string, long> _flagged = new(StringComparer.Ordinal);
    private readonly SortedDictionary<string, long> _refused = new(StringComparer.Ordinal);

    internal long Rows { get; private set; }

    internal long Blank { get; set; }

    internal void Add(RowOutcome outcome)
    {
        Rows++;
        if (outcome.State == RowState.Computed)
        {
            return;
        }

        SortedDictionary<string, long> reasons = outcome.State == RowState.Refused ? _refused : _flagged;
        reasons[outcome.Reason] = reasons.GetValueOrDefault(outcome.Reason) + 1;
    }

    /// <summary>Tells them, the reasons one a line.</summary>
    internal void Tell(Action<string> say)
    {
        long refused = _refused.Values.Sum();
        long flagged = _flagged.Values.Sum();
        say(string.Create(CultureInfo.InvariantCulture, $"{Rows} rows: {Rows - refused} computed{(flagged == 0 ? "" : $", {flagged} of them flagged")}, {refused} refused{(Blank == 0 ? "" : $"; {Blank} blank lines")}"));
        foreach ((string word, SortedDictionary<string, long> reasons) in new[] { ("flagged", _flagged), ("refused", _refused) })
        {
            foreach ((string reason, long count) in reasons)
            {
                say(string.Create(CultureInfo.InvariantCulture, $"  {word}: {count} {(count == 1 ? "row" : "rows")}, {reason}"));
            }
        }
    }
}
