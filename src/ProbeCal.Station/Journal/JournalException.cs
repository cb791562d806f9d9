using System;

namespace ProbeCal.Station.Journal;

/// <summary>The journal could not be read or written; nothing of the call took effect. A state to wait out, not the end of a stream.</summary>
internal sealed class JournalException : Exception
{
    /// <summary>Makes one.</summary>
    /// <param name="message">One line that names the file and what would help.</param>
    /// <param name="isDiskFull">True when there is no room left on the disk.</param>
    /// <param name="inner">The cause.</param>
    public JournalException(string message, bool isDiskFull, Exception inner)
        : base(message, inner)
    {
        IsDiskFull = isDiskFull;
    }

    /// <summary>True when there is no room left on the disk.</summary>
    public bool IsDiskFull { get; }
}
