using System;
using System.IO;
using System.Text;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Storage;

namespace ProbeCal.Station.TableWriting;

/// <summary>Stores tables: never over a file that says something else, and never by halves.</summary>
public static class TableFile
{
    /// <summary>Writes a table into a folder, which is made if it is missing.</summary>
    /// <param name="folder">The folder.</param>
    /// <param name="table">The table.</param>
    /// <param name="force">Replace a file that differs.</param>
    /// <returns>True when it was written, false when the very same file was there.</returns>
    /// <exception cref="InputException">A file that differs is there, or the folder is a file.</exception>
    public static bool Write(string folder, WrittenTable table, bool force)
    {
        if (string.IsNullOrWhiteSpace(folder))
        {
            throw Wrong.Input("--output", folder, "name the folder that the table goes into, or - for standard output");
        }

        if (File.Exists(folder))
        {
            throw Wrong.Input("--output", folder, "this is a file; name the folder that the table goes into, or - for standard output");
        }

        string path = Path.Combine(folder, table.FileName);
        byte[] content = new UTF8Encoding(false).GetBytes(table.Content);
        if (Directory.Exists(path))
        {
            throw Wrong.Input("--output", folder, "a folder called " + table.FileName + " is in it");
        }

        if (File.Exists(path))
        {
            if (content.AsSpan().SequenceEqual(File.ReadAllBytes(path)))
            {
                return false;
            }

            if (!force)
            {
                throw Differs();
            }
        }

        Directory.CreateDirectory(folder);
        using NewFile file = new(path);
        file.Stream.Write(content);
        return file.Keep(force) ? true : throw Differs();

        InputException Differs() => Wrong.Input("--output", folder, table.FileName + " is there already and differs; another --name keeps both, --force replaces it");
    }
}
