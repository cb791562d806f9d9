using ProbeCal.Station.Storage;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>The SQLite file of the calibration log: what it is called, its number and its tables.</summary>
internal static class CalibrationLogFormat
{
    // "PClg" in ASCII.
    private const int ApplicationId = 0x50436C67;

    // Rows are only ever added. The insert trigger also closes the way round by INSERT OR REPLACE, whose hidden delete
    // fires no delete trigger (https://www.sqlite.org/lang_conflict.html).
    private const string Version1 = """
        CREATE TABLE log (
            only_one INTEGER PRIMARY KEY CHECK (only_one = 1),
            log_id TEXT NOT NULL,
            format TEXT NOT NULL
        ) STRICT;
        CREATE TABLE records (
            idx INTEGER PRIMARY KEY,
            calibration_id TEXT NOT NULL UNIQUE,
            probe_id TEXT NOT NULL,
            completed_us INTEGER NOT NULL,
            bytes BLOB NOT NULL,
            sha256 TEXT NOT NULL
        ) STRICT;
        CREATE TRIGGER log_once BEFORE INSERT ON log WHEN EXISTS (SELECT 1 FROM log)
            BEGIN SELECT RAISE(ABORT, 'the calibration log keeps its id'); END;
        CREATE TRIGGER log_no_update BEFORE UPDATE ON log
            BEGIN SELECT RAISE(ABORT, 'the calibration log keeps its id'); END;
        CREATE TRIGGER log_no_delete BEFORE DELETE ON log
            BEGIN SELECT RAISE(ABORT, 'the calibration log keeps its id'); END;
        CREATE TRIGGER records_in_order BEFORE INSERT ON records WHEN NEW.idx <> (SELECT coalesce(max(idx), 0) + 1 FROM records)
            BEGIN SELECT RAISE(ABORT, 'calibration records are only added at the end'); END;
        CREATE TRIGGER records_no_update BEFORE UPDATE ON records
            BEGIN SELECT RAISE(ABORT, 'calibration records are never changed'); END;
        CREATE TRIGGER records_no_delete BEFORE DELETE ON records
            BEGIN SELECT RAISE(ABORT, 'calibration records are never deleted'); END;
        """;

    /// <summary>Name of the format as the table <c>log</c> keeps it.</summary>
    public const string FormatName = "probecal-calibration-log";

    /// <summary>How the file is recognised and made.</summary>
    public static SqliteFormat File { get; } = new("the calibration log", ApplicationId, [Version1]);
}
