namespace ProbeCal.Station.Engine;

/// <summary>
/// How far a quantity of a reading can be trusted: the integers of the IODE primary flags as the QARTOD manuals use them.
/// </summary>
internal enum Quality
{
    /// <summary>Nothing speaks against it.</summary>
    Pass = 1,

    /// <summary>Not looked at.</summary>
    NotEvaluated = 2,

    /// <summary>There is a value, and a reason to doubt it.</summary>
    Suspect = 3,

    /// <summary>What came makes no usable value.</summary>
    Fail = 4,

    /// <summary>Something it needs did not come.</summary>
    Missing = 9,
}

/// <summary>A flag with the reason for it; the reason is empty for a pass.</summary>
internal readonly record struct Judged(Quality Flag, string Reason)
{
    /// <summary>Nothing speaks against it.</summary>
    public static Judged Pass => new(Quality.Pass, "");
}
