using System;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// The error that a slip would put into readings: as found at this point, and in later readings at the same concentration after
/// the probe was adjusted here. The two have opposite signs: what makes a right probe look high gets it adjusted low. The one
/// place that knows the direction and its wording.
/// </summary>
public sealed record PossibleError
{
    private PossibleError()
    {
    }

    /// <summary>Reading less truth at this point before adjusting, mg/L; null when it cannot be said.</summary>
    public double? AsFound { get; private init; }

    /// <summary>Reading less truth after adjusting here, at the same concentration, mg/L; null when it cannot be said.</summary>
    public double? Later { get; private init; }

    /// <summary>Why no size can be given; null when there is one.</summary>
    public string? WhyUnknown { get; private init; }

    /// <summary>Size and direction for people, or why there is none.</summary>
    public string Words => AsFound is double asFound && Later is double later
        ? $"if so, the probe looks {Sized(asFound)} as found, and once adjusted here its later readings are {Sized(later)}"
        : WhyUnknown!;

    /// <summary>The same behind the error that it is the size of: "were it 1 hPa too high, …".</summary>
    public string WordsIfSo => AsFound is double asFound && Later is double later
        ? $"the probe would look {Sized(asFound)} as found, and once adjusted here its later readings would be {Sized(later)}"
        : WhyUnknown!;

    /// <summary>Size and direction as a record keeps them; null when it keeps none.</summary>
    /// <param name="finding">The finding.</param>
    public static string? WordsOf(RecordedFinding finding)
    {
        return finding.ErrorAsFoundMilligramsPerLitre is double asFound && finding.ErrorLaterMilligramsPerLitre is double later
            ? Known(asFound, later).Words
            : null;
    }

    /// <summary>The error of a reference that is computed wrongly, or of a point that is not what the reference takes it for.</summary>
    /// <param name="taken">The concentration that the reference says, mg/L.</param>
    /// <param name="right">The concentration that is there, mg/L.</param>
    internal static PossibleError OfReference(double taken, double right)
    {
        return Known(right - taken, taken - right);
    }

    /// <summary>The same, where one of the two may not be known.</summary>
    internal static PossibleError OfReference(double? taken, double? right)
    {
        return taken is double one && right is double other ? OfReference(one, other) : Unknown(NotYet);
    }

    /// <summary>The error of a reference that holds more than it says by a share of itself.</summary>
    /// <param name="concentration">Concentration that the reference says, mg/L; null when not known yet.</param>
    /// <param name="excessPercent">What is there in excess of it, %.</param>
    internal static PossibleError OfExcess(double? concentration, double excessPercent)
    {
        return OfReference(concentration, concentration * (1 + (excessPercent / 100)));
    }

    /// <summary>The error of a signal that is a share of what it should be at this point, while later signals are whole.</summary>
    /// <param name="concentration">Concentration at the point, mg/L; null when not known yet.</param>
    /// <param name="share">The signal as a share of the right one.</param>
    internal static PossibleError OfSignal(double? concentration, double share)
    {
        return concentration is double there ? Known(there * (share - 1), there * ((1 / share) - 1)) : Unknown(NotYet);
    }

    /// <summary>An error of which only the sizes are known.</summary>
    internal static PossibleError Known(double asFound, double later)
    {
        return double.IsFinite(asFound) && double.IsFinite(later)
            ? new PossibleError { AsFound = asFound, Later = later }
            : Unknown(NotYet);
    }

    /// <summary>An error without a size.</summary>
    /// <param name="why">Why it has none.</param>
    internal static PossibleError Unknown(string why)
    {
        return new PossibleError { WhyUnknown = why };
    }

    private const string NotYet = "the error in mg/L cannot be said here (temperature or pressure is not known yet, or out of range)";

    private static string Sized(double error)
    {
        double size = Math.Abs(error);
        string figure = Number.Fixed(size, size < 0.095 ? 3 : 2);
        return error == 0 ? "right" : $"{figure} mg/L too {(error < 0 ? "low" : "high")}";
    }
}
