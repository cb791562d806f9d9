using System;
using System.IO;
using System.Security.Cryptography;

namespace ProbeCal.Station.Correcting;

/// <summary>Bytes on their way to a file: one buffer, and the hash of all that went through.</summary>
internal sealed class ByteOutput : IDisposable
{
    private readonly Stream _output;
    private readonly IncrementalHash _hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
    private readonly byte[] _buffer = new byte[1 << 18];
    private int _filled;

    /// <param name="output">Where to; left open.</param>
    internal ByteOutput(Stream output)
    {
        _output = output;
    }

    internal void Write(ReadOnlySpan<byte> bytes)
    {
        if (_buffer.Length - _filled < bytes.Length)
        {
            Flush();
        }

        if (_buffer.Length < bytes.Length)
        {
            _hash.AppendData(bytes);
            _output.Write(bytes);
            return;
        }

        bytes.CopyTo(_buffer.AsSpan(_filled));
        _filled += bytes.Length;
    }

    internal void Write(byte value)
    {
        if (_filled == _buffer.Length)
        {
            Flush();
        }

        _buffer[_filled++] = value;
    }

    /// <summary>Writes a finite value as text; a NaN or an infinity leaves the cell empty.</summary>
    internal void Write(double value, int decimals, byte mark)
    {
        if (!double.IsFinite(value))
        {
            return;
        }

        if (_buffer.Length - _filled < FixedText.LongestText)
        {
            Flush();
        }

        _filled += FixedText.Write(value, decimals, mark, _buffer.AsSpan(_filled));
    }

    internal void Flush()
    {
        _hash.AppendData(_buffer, 0, _filled);
        _output.Write(_buffer, 0, _filled);
        _filled = 0;
    }

    /// <summary>SHA-256 of all that was written, lower-case hex; flushes.</summary>
    internal string Sha256()
    {
        Flush();
        return Convert.ToHexStringLower(_hash.GetHashAndReset());
    }

    public void Dispose()
    {
        _hash.Dispose();
    }
}
