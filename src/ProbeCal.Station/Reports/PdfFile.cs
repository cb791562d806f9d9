using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.IO.Compression;
using System.Linq;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>
/// Writes pages as a PDF 1.7 file (ISO 32000-1) with both typefaces in it. Nothing random and no clock: the same pages and
/// time give the same bytes, which no library on offer does (decision 0022).
/// </summary>
internal static class PdfFile
{
    /// <summary>The file.</summary>
    /// <param name="pages">The pages.</param>
    /// <param name="title">Title of the document.</param>
    /// <param name="producer">Program and version.</param>
    /// <param name="made">When it was made, UTC.</param>
    internal static byte[] Write(IReadOnlyList<PdfPage> pages, string title, string producer, DateTimeOffset made)
    {
        Body body = new();
        int catalogue = body.Reserve();
        int tree = body.Reserve();
        int information = body.Add($"<< /Title {Text(title)} /Producer {Text(producer)} /Creator {Text(producer)} /CreationDate ({made.UtcDateTime.ToString("'D:'yyyyMMddHHmmss'Z'", CultureInfo.InvariantCulture)}) >>");
        int regular = Font(body, FontFile.Regular, pages.SelectMany(static page => page.Shown(FontFile.Regular)));
        int bold = Font(body, FontFile.Bold, pages.SelectMany(static page => page.Shown(FontFile.Bold)));
        List<int> kids = [];
        foreach (PdfPage page in pages)
        {
            int content = body.AddStream("", Encoding.ASCII.GetBytes(page.Content));
            kids.Add(body.Add($"<< /Type /Page /Parent {N(tree)} 0 R /MediaBox [0 0 {N(page.Width)} {N(page.Height)}] /Resources << /Font << /F0 {N(regular)} 0 R /F1 {N(bold)} 0 R >> >> /Contents {N(content)} 0 R >>"));
        }

        body.Set(tree, $"<< /Type /Pages /Count {N(kids.Count)} /Kids [{string.Join(' ', kids.Select(static kid => N(kid) + " 0 R"))}] >>");
        body.Set(catalogue, $"<< /Type /Catalog /Pages {N(tree)} 0 R /Lang (en) /ViewerPreferences << /DisplayDocTitle true >> >>");
        return body.Write(catalogue, information);
    }

    private static int Font(Body body, FontFile font, IEnumerable<Rune> shown)
    {
        // A glyph that stands for two characters is copied out as the first of them.
        SortedDictionary<ushort, Rune> used = [];
        foreach (Rune rune in shown)
        {
            used.TryAdd(font.Glyph(rune), rune);
        }

        int file = body.AddStream($"/Length1 {N(font.Bytes.Length)} ", font.Bytes);
        int descriptor = body.Add($"<< /Type /FontDescriptor /FontName /{font.Name} /Flags 32 /FontBBox [{string.Join(' ', font.Box.Select(Thousandths))}] /ItalicAngle 0 /Ascent {Thousandths(font.Ascent)} /Descent {Thousandths(font.Descent)} /CapHeight 729 /StemV 80 /FontFile2 {N(file)} 0 R >>");
        string widths = string.Join(' ', used.Keys.Select(glyph => $"{N(glyph)} [{Thousandths(font.Advance(glyph))}]"));
        int glyphs = body.Add($"<< /Type /Font /Subtype /CIDFontType2 /BaseFont /{font.Name} /CIDSystemInfo << /Registry (Adobe) /Ordering (Identity) /Supplement 0 >> /FontDescriptor {N(descriptor)} 0 R /CIDToGIDMap /Identity /DW 600 /W [{widths}] >>");
        int characters = body.AddStream("", Encoding.ASCII.GetBytes(ToUnicode(used)));
        return body.Add($"<< /Type /Font /Subtype /Type0 /BaseFont /{font.Name} /Encoding /Identity-H /DescendantFonts [{N(glyphs)} 0 R] /ToUnicode {N(characters)} 0 R >>");

        string Thousandths(int units)
        {
            return N(Math.Round(units * 1000.0 / font.UnitsPerEm));
        }
    }

    private static string ToUnicode(SortedDictionary<ushort, Rune> used)
    {
        StringBuilder map = new("/CIDInit /ProcSet findresource begin\n12 dict begin\nbegincmap\n/CIDSystemInfo << /Registry (Adobe) /Ordering (UCS) /Supplement 0 >> def\n/CMapName /Adobe-Identity-UCS def\n/CMapType 2 def\n1 begincodespacerange\n<0000> <FFFF>\nendcodespacerange\n");
        // A block may hold a hundred pairs.
        foreach (KeyValuePair<ushort, Rune>[] block in used.Chunk(100))
        {
            map.Append(CultureInfo.InvariantCulture, $"{block.Length} beginbfchar\n");
            foreach ((ushort glyph, Rune rune) in block)
            {
                map.Append(CultureInfo.InvariantCulture, $"<{glyph:X4}> <{Convert.ToHexString(Encoding.BigEndianUnicode.GetBytes(rune.ToString()))}>\n");
            }

            map.Append("endbfchar\n");
        }

        return map.Append("endcmap\nCMapName currentdict /CMap defineresource pop\nend\nend\n").ToString();
    }

    private static string Text(string text)
    {
        return "<FEFF" + Convert.ToHexString(Encoding.BigEndianUnicode.GetBytes(PageText.Shown(text))) + ">";
    }

    private static string N(double value)
    {
        return Number.Print(Math.Round(value, 2));
    }

    /// <summary>The numbered objects and where each begins.</summary>
    private sealed class Body
    {
        private readonly List<byte[]?> _objects = [];

        internal int Reserve()
        {
            _objects.Add(null);
            return _objects.Count;
        }

        internal int Add(string text)
        {
            _objects.Add(Encoding.ASCII.GetBytes(text));
            return _objects.Count;
        }

        internal void Set(int number, string text)
        {
            _objects[number - 1] = Encoding.ASCII.GetBytes(text);
        }

        internal int AddStream(string entries, byte[] bytes)
        {
            using MemoryStream packed = new();
            using (ZLibStream zlib = new(packed, CompressionLevel.Optimal, leaveOpen: true))
            {
                zlib.Write(bytes);
            }

            using MemoryStream whole = new();
            whole.Write(Encoding.ASCII.GetBytes($"<< {entries}/Length {N(packed.Length)} /Filter /FlateDecode >>\nstream\n"));
            whole.Write(packed.ToArray());
            whole.Write("\nendstream"u8);
            _objects.Add(whole.ToArray());
            return _objects.Count;
        }

        internal byte[] Write(int catalogue, int information)
        {
            using MemoryStream file = new();
            // The second line tells programs that the file is binary.
            file.Write([.. "%PDF-1.7\n%"u8, 0xE2, 0xE3, 0xCF, 0xD3, (byte)'\n']);
            List<long> starts = [];
            for (int i = 0; i < _objects.Count; i++)
            {
                starts.Add(file.Position);
                file.Write(Encoding.ASCII.GetBytes($"{N(i + 1)} 0 obj\n"));
                file.Write(_objects[i]);
                file.Write("\nendobj\n"u8);
            }

            long table = file.Position;
            StringBuilder end = new();
            end.Append(CultureInfo.InvariantCulture, $"xref\n0 {starts.Count + 1}\n0000000000 65535 f \n");
            foreach (long start in starts)
            {
                end.Append(CultureInfo.InvariantCulture, $"{start:0000000000} 00000 n \n");
            }

            end.Append(CultureInfo.InvariantCulture, $"trailer\n<< /Size {starts.Count + 1} /Root {catalogue} 0 R /Info {information} 0 R >>\nstartxref\n{table}\n%%EOF\n");
            file.Write(Encoding.ASCII.GetBytes(end.ToString()));
            return file.ToArray();
        }
    }
}
