using System.Collections.Generic;

namespace ProbeCal.Station.Calibrating;

/// <summary>What a step of a procedure asks for.</summary>
public enum StepKind
{
    /// <summary>Something to do or look at; a person says when it is done.</summary>
    Do,

    /// <summary>Something to write down, which the record keeps.</summary>
    Enter,

    /// <summary>A point: wait until temperature and signal are steady, then take it.</summary>
    Point,

    /// <summary>The look for droplets on membrane and thermometer.</summary>
    Droplets,
}

/// <summary>
/// One step of a guided procedure, as data: what to do, wait for, look for and write down, and what to beware of. The command
/// line and the page show the same.
/// </summary>
/// <param name="Id">Name of the step, which records use: <c>aerate</c>, <c>point-span</c>, <c>rinse</c>.</param>
/// <param name="Kind">What it asks for.</param>
/// <param name="Title">A few words: what this step is.</param>
public sealed record ProcedureStep(string Id, StepKind Kind, string Title)
{
    /// <summary>Role of the point that the step takes; none for other steps.</summary>
    public string? Role { get; init; }

    /// <summary>What to do, one sentence each.</summary>
    public IReadOnlyList<string> Do { get; init; } = [];

    /// <summary>What to look for, one sentence each.</summary>
    public IReadOnlyList<string> LookFor { get; init; } = [];

    /// <summary>What to write down: what the note of this step should say; none when nothing is asked.</summary>
    public string? WriteDown { get; init; }

    /// <summary>Cautions, one sentence each.</summary>
    public IReadOnlyList<string> Cautions { get; init; } = [];

    /// <summary>Shortest usual wait, min; none when there is none.</summary>
    public double? LeastMinutes { get; init; }

    /// <summary>Longest usual wait, min; none when there is none.</summary>
    public double? MostMinutes { get; init; }

    /// <summary>Where wait, order and limits come from.</summary>
    public string? Source { get; init; }
}
