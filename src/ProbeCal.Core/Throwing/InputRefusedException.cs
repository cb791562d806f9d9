using System;
using System.Globalization;

namespace ProbeCal;

/// <summary>An input that a function of Core refuses, for desktop callers who prefer an exception to a <see cref="ProbeCal.Status"/>.</summary>
public sealed class InputRefusedException : ArgumentException
{
    /// <summary>An exception without a known input.</summary>
    public InputRefusedException()
        : base("an input was refused")
    {
    }

    /// <summary>An exception with a message of the caller's.</summary>
    public InputRefusedException(string message)
        : base(message)
    {
    }

    /// <summary>An exception with a message of the caller's and its cause.</summary>
    public InputRefusedException(string message, Exception innerException)
        : base(message, innerException)
    {
    }

    /// <summary>One line that names the input, its value, what is wrong and what would be right.</summary>
    /// <param name="status">What the function said; not Ok.</param>
    /// <param name="value">The input that the status names; NaN is printed as NaN.</param>
    /// <param name="allowed">What the function takes.</param>
    public InputRefusedException(Status status, double value, string allowed)
        : base(StatusParts.Input(status).ToString() + " " + value.ToString("R", CultureInfo.InvariantCulture)
            + " is " + Fault(StatusParts.Reason(status)) + "; allowed: " + allowed)
    {
        Status = status;
    }

    /// <summary>The status that the function gave; Ok when the exception was not made from one.</summary>
    public Status Status { get; }

    private static string Fault(RefusalReason reason)
    {
        return reason switch
        {
            RefusalReason.NotFinite => "not a finite number",
            RefusalReason.BelowRange => "below the range",
            RefusalReason.AboveRange => "above the range",
            RefusalReason.JustBelowRange => "just below the range",
            RefusalReason.JustAboveRange => "just above the range",
            _ => "not known",
        };
    }
}
