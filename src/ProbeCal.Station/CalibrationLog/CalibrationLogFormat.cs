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

    // Other kinds of entries than calibrations stand in the same table and chain: calibration_id, probe_id and completed_us then
    // hold the id of the entry, what it is about and its time. Stored bytes and hashes stay as they are. Logs from elsewhere
    // keep their own chain in tables beside it; they grow at the end and by whole entries only.
    private const string Version2 = """
        ALTER TABLE records ADD COLUMN kind TEXT NOT NULL DEFAULT 'calibration';
        CREATE TABLE imported_logs (
            log_id TEXT PRIMARY KEY NOT NULL,
            origin TEXT NOT NULL,
            imported_us INTEGER NOT NULL
        ) STRICT;
        CREATE TABLE imported_records (
            log_id TEXT NOT NULL REFERENCES imported_logs,
            idx INTEGER NOT NULL,
            entry_id TEXT NOT NULL,
            kind TEXT NOT NULL,
            subject TEXT NOT NULL,
            at_us INTEGER NOT NULL,
            bytes BLOB NOT NULL,
            sha256 TEXT NOT NULL,
            PRIMARY KEY (log_id, idx)
        ) STRICT;
        CREATE TRIGGER imported_logs_no_update BEFORE UPDATE ON imported_logs
            BEGIN SELECT RAISE(ABORT, 'an imported log is never changed'); END;
        CREATE TRIGGER imported_logs_no_delete BEFORE DELETE ON imported_logs
            BEGIN SELECT RAISE(ABORT, 'an imported log is never deleted'); END;
        CREATE TRIGGER imported_records_in_order BEFORE INSERT ON imported_records
            WHEN NEW.idx <> (SELECT coalesce(max(idx), 0) + 1 FROM imported_records WHERE log_id = NEW.log_id)
            BEGIN SELECT RAISE(ABORT, 'imported records are only added at the end'); END;
        CREATE TRIGGER imported_records_no_update BEFORE UPDATE ON imported_records
            BEGIN SELECT RAISE(ABORT, 'imported records are never changed'); END;
        CREATE TRIGGER imported_records_no_delete BEFORE DELETE ON imported_records
            BEGIN SELECT RAISE(ABORT, 'imported records are never deleted'); END;
        """;

    /// <summary>Name of the format as the table <c>log</c> keeps it.</summary>
    public const string FormatName = "probecal-calibration-log";

    /// <summary>How the file is recognised and made.</summary>
    public static SqliteFormat File { get; } = new("the calibration log", ApplicationId, [Version1, Version2], OldestReadable: 1);
}
