using System;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>A service event as a person enters it: texts in, one entry of the log out.</summary>
public sealed record ServiceEntry
{
    /// <summary>Id of the probe.</summary>
    public required string Probe { get; init; }

    /// <summary>One of <see cref="ServiceRecord.Events"/>.</summary>
    public required string Event { get; init; }

    /// <summary>When it was done; now when not stated.</summary>
    public string? At { get; init; }

    /// <summary>Id of the membrane that came on.</summary>
    public string? Membrane { get; init; }

    /// <summary>Remarks.</summary>
    public string? Remarks { get; init; }

    /// <summary>Who did it.</summary>
    public string? By { get; init; }

    /// <summary>Reads the texts.</summary>
    /// <param name="now">The time by the clock; what lies after it was not done yet.</param>
    /// <param name="software">Program and version.</param>
    /// <exception cref="InputException">One of them is wrong.</exception>
    public ServiceRecord Read(DateTimeOffset now, string software)
    {
        if (!ServiceRecord.Events.Contains(Event))
        {
            throw Wrong.Input("event", Event, $"there is no such event{NearestName.DidYouMean(Event, ServiceRecord.Events)}; there are {string.Join(", ", ServiceRecord.Events)}");
        }

        DateTimeOffset at = At == null ? now : UtcTime.Parse("--at", At, offset: null);
        if (now < at)
        {
            throw Wrong.Input("--at", At!, "this lies in the future of this computer's clock; enter what was done once it was done");
        }

        if (Membrane != null && Event != ServiceRecord.MembraneChanged)
        {
            throw Wrong.Input("--membrane", Membrane, $"only {ServiceRecord.MembraneChanged} puts a membrane on; leave it out");
        }

        return new ServiceRecord
        {
            Probe = PlainText.Id("probe", Probe),
            Event = Event,
            At = at,
            Membrane = Membrane == null ? null : PlainText.Id("--membrane", Membrane),
            Remarks = Line("--remarks", Remarks),
            By = Line("--by", By),
            Software = software,
        };
    }

    private static string? Line(string what, string? text)
    {
        return string.IsNullOrWhiteSpace(text) ? null : PlainText.OneLine(what, text.Trim());
    }
}
