using ProbeCal.Station.Storage;

namespace ProbeCal.Station.Journal;

/// <summary>The tables of <c>journal.db</c>. A released script is never edited: a change is a further one.</summary>
internal static class JournalFormat
{
    // "PCJ1" in ASCII.
    private const int ApplicationId = 0x50434A31;

    // Times are microseconds since 1970-01-01 UTC. The counter stands apart from the samples, so that a sequence number is
    // not given again after the sample that had it was deleted. SQLite has no NaN: what is not a number is NULL, and the
    // row says why. The outbox keeps the very bytes that are sent, so that a repeat is identical.
    private const string Version1 = """
        CREATE TABLE counter (
            station TEXT NOT NULL,
            probe TEXT NOT NULL,
            next_sequence INTEGER NOT NULL,
            PRIMARY KEY (station, probe)
        ) STRICT, WITHOUT ROWID;

        CREATE TABLE sample (
            id INTEGER PRIMARY KEY,
            station TEXT NOT NULL,
            probe TEXT NOT NULL,
            sequence INTEGER NOT NULL,
            time_us INTEGER NOT NULL,
            time_from_line INTEGER NOT NULL,
            received_us INTEGER NOT NULL,
            raw_text TEXT NOT NULL,
            signal REAL,
            temperature_celsius REAL,
            temperature_source TEXT NOT NULL,
            pressure_hectopascal REAL,
            pressure_source TEXT NOT NULL,
            salinity REAL,
            salinity_source TEXT NOT NULL,
            calibration_id TEXT,
            reading TEXT,
            no_reading_reason TEXT,
            UNIQUE (station, probe, sequence),
            CHECK ((reading IS NULL) <> (no_reading_reason IS NULL))
        ) STRICT;
        CREATE INDEX sample_received ON sample (received_us);

        CREATE TABLE rejected_line (
            id INTEGER PRIMARY KEY AUTOINCREMENT,
            received_us INTEGER NOT NULL,
            raw_text TEXT NOT NULL,
            reason TEXT NOT NULL
        ) STRICT;

        CREATE TABLE event (
            id INTEGER PRIMARY KEY AUTOINCREMENT,
            time_us INTEGER NOT NULL,
            kind TEXT NOT NULL,
            text TEXT NOT NULL
        ) STRICT;

        CREATE TABLE outbox (
            id INTEGER PRIMARY KEY AUTOINCREMENT,
            topic TEXT NOT NULL,
            content_type TEXT NOT NULL,
            payload BLOB NOT NULL
        ) STRICT;
        """;

    internal static readonly SqliteFormat Format = new("the journal", ApplicationId, [Version1]);
}
