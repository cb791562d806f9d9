using System;

namespace ProbeCal.Station.Entry;

/// <summary>
/// Something a person or a file gave is wrong. The message is one line that names what was given, what is wrong with it and
/// what would be right; Host prints it and exits with 2. Nothing has been changed when this is thrown.
/// </summary>
public sealed class InputException : Exception
{
    /// <summary>Makes one with its line.</summary>
    public InputException(string message) : base(message) { }

    /// <summary>Makes one with its line and the cause.</summary>
    public InputException(string message, Exception inner) : base(message, inner) { }
}

/// <summary>
/// The input was right and the work could not be done: a port that is gone, a full disk, a refused broker. The message is
/// one line; Host prints it and exits with 1.
/// </summary>
public sealed class WorkFailedException : Exception
{
    /// <summary>Makes one with its line.</summary>
    public WorkFailedException(string message) : base(message) { }

    /// <summary>Makes one with its line and the cause.</summary>
    public WorkFailedException(string message, Exception inner) : base(message, inner) { }
}
