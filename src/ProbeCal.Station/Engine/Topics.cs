namespace ProbeCal.Station.Engine;

/// <summary>The topics of one probe at one station. docs/protocols.md describes what is sent there.</summary>
internal sealed class Topics
{
    private readonly string _stem;

    /// <summary>Topics of a probe.</summary>
    public Topics(string station, string probe)
    {
        _stem = "probecal/v1/" + station + "/" + probe + "/";
    }

    /// <summary>Readings, one message each, not retained.</summary>
    public string Reading => _stem + "reading";

    /// <summary>Events of the stream, one message each, not retained.</summary>
    public string Event => _stem + "event";

    /// <summary>What the station is doing; retained, and the will.</summary>
    public string Status => _stem + "status";

    /// <summary>The calibration in use; retained.</summary>
    public string Calibration => _stem + "calibration";
}
