using System;
using System.Buffers.Binary;
using System.IO;

namespace ProbeCal.Station.Storage;

/// <summary>
/// The first 100 bytes of a SQLite file, read as plain bytes: the one way to learn whose file it is and how new without
/// SQLite touching anything. After a crash the newest header may stand only in the write-ahead log, so that is read too.
/// Layouts: https://www.sqlite.org/fileformat.html, sections 1.3 and 4.1.
/// </summary>
internal sealed class SqliteHeader
{
    private const int Length = 100;
    private const int UserVersionOffset = 60;
    private const int ApplicationIdOffset = 68;

    private const int LogHeaderLength = 32;
    private const int FrameHeaderLength = 24;
    private const int LargestPage = 65536;

    private SqliteHeader(bool isSqlite, int applicationId, int userVersion)
    {
        IsSqlite = isSqlite;
        ApplicationId = applicationId;
        UserVersion = userVersion;
    }

    /// <summary>False when the file does not begin as a SQLite file does.</summary>
    internal bool IsSqlite { get; }

    internal int ApplicationId { get; }

    internal int UserVersion { get; }

    /// <summary>Reads the header; null when there is no file or nothing in it yet.</summary>
    internal static SqliteHeader? Read(string path)
    {
        if (!File.Exists(path))
        {
            return null;
        }

        byte[] bytes = new byte[Length];
        using FileStream file = OpenShared(path);
        int read = file.ReadAtLeast(bytes, Length, throwOnEndOfStream: false);
        if (read == 0)
        {
            return null;
        }

        if (read < Length || !IsHeader(bytes))
        {
            return new SqliteHeader(false, 0, 0);
        }

        if (HasLog(path))
        {
            using FileStream log = OpenShared(path + "-wal");
            ReadLog(log, bytes);
        }

        return new SqliteHeader(
            true,
            BinaryPrimitives.ReadInt32BigEndian(bytes.AsSpan(ApplicationIdOffset)),
            BinaryPrimitives.ReadInt32BigEndian(bytes.AsSpan(UserVersionOffset)));
    }

    /// <summary>True when commits may stand in the write-ahead log that are not in the file yet.</summary>
    internal static bool HasLog(string path)
    {
        FileInfo log = new(path + "-wal");
        return log.Exists && LogHeaderLength < log.Length;
    }

    private static bool IsHeader(ReadOnlySpan<byte> bytes)
    {
        return bytes.StartsWith("SQLite format 3\0"u8);
    }

    private static FileStream OpenShared(string path)
    {
        return new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite | FileShare.Delete);
    }

    /// <summary>
    /// Overwrites <paramref name="header"/> with the last committed copy in the log. Checksums are left to SQLite, which
    /// judges again after its own recovery; this look only has to keep it from starting on a newer file.
    /// </summary>
    private static void ReadLog(FileStream log, byte[] header)
    {
        byte[] start = new byte[LogHeaderLength];
        log.ReadExactly(start);
        uint pageSize = BinaryPrimitives.ReadUInt32BigEndian(start.AsSpan(8));
        if (pageSize is < 512 or > LargestPage)
        {
            return;
        }

        byte[] frame = new byte[FrameHeaderLength + Length];
        byte[]? pending = null;
        long stride = FrameHeaderLength + pageSize;
        for (long at = LogHeaderLength; at + stride <= log.Length; at += stride)
        {
            log.Position = at;
            log.ReadExactly(frame);
            if (!frame.AsSpan(8, 8).SequenceEqual(start.AsSpan(16, 8)))
            {
                // The salts differ: from here on it is what an earlier use of the log left behind.
                return;
            }

            if (BinaryPrimitives.ReadUInt32BigEndian(frame) == 1 && IsHeader(frame.AsSpan(FrameHeaderLength)))
            {
                pending = frame.AsSpan(FrameHeaderLength).ToArray();
            }

            bool commits = BinaryPrimitives.ReadUInt32BigEndian(frame.AsSpan(4)) != 0;
            if (commits && pending != null)
            {
                pending.CopyTo(header, 0);
                pending = null;
            }
        }
    }
}
