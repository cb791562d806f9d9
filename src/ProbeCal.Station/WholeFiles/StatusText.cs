namespace ProbeCal.Station.WholeFiles;

/// <summary>The word in the status column, with its reason.</summary>
internal static class StatusText
{
    internal static string Of(RowOutcome outcome)
    {
        string word = Word(outcome.State);
        return outcome.Reason.Length == 0 ? word
            : outcome.Text.Length == 0 ? word + ": " + outcome.Reason
            : word + ": " + outcome.Reason + "; " + outcome.Text;
    }

    internal static string Word(RowState state)
    {
        return state switch
        {
            RowState.Computed => "ok",
            RowState.Flagged => "flagged",
            _ => "refused",
        };
    }
}
