using System;
using System.Buffers.Binary;
using System.Collections.Generic;
using System.IO;
using System.Text;

namespace ProbeCal.Station.Reports;

/// <summary>
/// A typeface that the program carries, so that a PDF looks the same on every system and offline: DejaVu Sans Condensed cut
/// down to Latin, Greek, Cyrillic and the signs that records use (Fonts/LICENSE.txt). Only what a page needs is read from
/// it: which glyph stands for a character, and how wide it is (OpenType specification, tables cmap, hmtx, head, hhea).
/// </summary>
internal sealed class FontFile
{
    private readonly ushort[] _advances;
    private readonly Dictionary<int, ushort> _glyphs = [];

    private FontFile(string name, byte[] bytes)
    {
        Name = name;
        Bytes = bytes;
        int head = Table("head");
        UnitsPerEm = Word(head + 18);
        Box = [Signed(head + 36), Signed(head + 38), Signed(head + 40), Signed(head + 42)];
        int hhea = Table("hhea");
        Ascent = Signed(hhea + 4);
        Descent = Signed(hhea + 6);
        _advances = new ushort[Word(hhea + 34)];
        int hmtx = Table("hmtx");
        for (int i = 0; i < _advances.Length; i++)
        {
            _advances[i] = Word(hmtx + (4 * i));
        }

        ReadCharacters(Table("cmap"));
    }

    /// <summary>The upright face.</summary>
    internal static FontFile Regular { get; } = Load("ReportSans");

    /// <summary>The bold face.</summary>
    internal static FontFile Bold { get; } = Load("ReportSans-Bold");

    /// <summary>Its name in a PDF.</summary>
    internal string Name { get; }

    /// <summary>The whole file.</summary>
    internal byte[] Bytes { get; }

    /// <summary>Units of the font in one em.</summary>
    internal int UnitsPerEm { get; }

    /// <summary>The box that holds every glyph: left, bottom, right, top, in units.</summary>
    internal int[] Box { get; }

    /// <summary>Height above the baseline, in units.</summary>
    internal int Ascent { get; }

    /// <summary>Depth below the baseline, in units, negative.</summary>
    internal int Descent { get; }

    /// <summary>True when the face has a glyph for the character.</summary>
    internal bool Has(Rune rune)
    {
        return _glyphs.ContainsKey(rune.Value);
    }

    /// <summary>The glyph of a character; 0, the empty box, when there is none.</summary>
    internal ushort Glyph(Rune rune)
    {
        return _glyphs.GetValueOrDefault(rune.Value);
    }

    /// <summary>Width of a glyph in units.</summary>
    internal int Advance(ushort glyph)
    {
        return _advances[Math.Min(glyph, _advances.Length - 1)];
    }

    /// <summary>Width of a text, points.</summary>
    internal double Width(string text, double size)
    {
        long units = 0;
        foreach (Rune rune in text.EnumerateRunes())
        {
            units += Advance(Glyph(rune));
        }

        return units * size / UnitsPerEm;
    }

    /// <summary>The text as this face can show it: what it has no glyph for is written as its code, <c>[U+05D0]</c>, so that nothing is lost.</summary>
    internal string Showable(string text)
    {
        StringBuilder shown = new(text.Length);
        foreach (Rune rune in PageText.Shown(text).EnumerateRunes())
        {
            shown.Append(Has(rune) ? rune.ToString() : PageText.Code(rune));
        }

        return shown.ToString();
    }

    private static FontFile Load(string name)
    {
        using Stream stream = typeof(FontFile).Assembly.GetManifestResourceStream("ProbeCal.Station.Reports.Fonts." + name + ".ttf")!;
        byte[] bytes = new byte[stream.Length];
        stream.ReadExactly(bytes);
        return new FontFile(name, bytes);
    }

    private int Table(string tag)
    {
        int count = Word(4);
        for (int i = 0; i < count; i++)
        {
            int entry = 12 + (16 * i);
            if (Encoding.ASCII.GetString(Bytes, entry, 4) == tag)
            {
                return (int)BinaryPrimitives.ReadUInt32BigEndian(Bytes.AsSpan(entry + 8));
            }
        }

        throw new InvalidDataException(Name + ": the typeface has no table " + tag);
    }

    private void ReadCharacters(int cmap)
    {
        int count = Word(cmap + 2);
        for (int i = 0; i < count; i++)
        {
            int table = cmap + (int)BinaryPrimitives.ReadUInt32BigEndian(Bytes.AsSpan(cmap + 8 + (8 * i)));
            if (Word(table) == 4)
            {
                ReadSegments(table);
                return;
            }
        }

        throw new InvalidDataException(Name + ": the typeface has no character table of format 4");
    }

    private void ReadSegments(int table)
    {
        int twice = Word(table + 6);
        int ends = table + 14;
        int starts = ends + twice + 2;
        int deltas = starts + twice;
        int offsets = deltas + twice;
        for (int at = 0; at < twice; at += 2)
        {
            int offset = Word(offsets + at);
            for (int character = Word(starts + at); character <= Word(ends + at) && character != 0xFFFF; character++)
            {
                int glyph = offset == 0 ? character : Word(offsets + at + offset + (2 * (character - Word(starts + at))));
                if (offset == 0 || glyph != 0)
                {
                    glyph = (glyph + Word(deltas + at)) & 0xFFFF;
                }

                if (glyph != 0)
                {
                    _glyphs[character] = (ushort)glyph;
                }
            }
        }
    }

    private ushort Word(int at)
    {
        return BinaryPrimitives.ReadUInt16BigEndian(Bytes.AsSpan(at));
    }

    private short Signed(int at)
    {
        return BinaryPrimitives.ReadInt16BigEndian(Bytes.AsSpan(at));
    }
}
