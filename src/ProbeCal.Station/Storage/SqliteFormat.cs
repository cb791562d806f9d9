using System.Collections.Generic;

namespace ProbeCal.Station.Storage;

/// <summary>
/// One kind of SQLite file this project keeps: how it is recognised and how it came to its present shape. The version is
/// the number of migrations, so a released migration is never edited; a change is a further entry at the end.
/// </summary>
/// <param name="Name">What it is, for people, with its article: <c>the journal</c>.</param>
/// <param name="ApplicationId">The number that SQLite keeps in the file's header for its owner's use.</param>
/// <param name="Migrations">SQL scripts; entry <c>i</c> lifts a file from version <c>i</c> to version <c>i + 1</c>.</param>
/// <param name="OldestReadable">The oldest version that is read as it stands; null where only the newest is.</param>
internal sealed record SqliteFormat(string Name, int ApplicationId, IReadOnlyList<string> Migrations, int? OldestReadable = null)
{
    /// <summary>The version this program writes.</summary>
    public int Version => Migrations.Count;
}

/// <summary>What is done with a file that SQLite finds damaged.</summary>
internal enum DamagePolicy
{
    /// <summary>It is left alone and the work is refused: for records that nothing can replace.</summary>
    Refuse,

    /// <summary>It is renamed, kept, and a new one begun: for a stream that must go on.</summary>
    SetAside,
}
