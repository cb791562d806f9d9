using System;
using System.Collections.Generic;
using System.Text;

namespace ProbeCal.Host.Commands;

/// <summary>A command line as text that a shell reads back as the same words.</summary>
internal static class CommandLineText
{
    /// <summary>Words that no shell changes need no quotes.</summary>
    private const string Plain = "-_./:=@%+,";

    /// <summary>The words of a command of the program in one line that can be pasted.</summary>
    /// <param name="words">The words, unquoted.</param>
    /// <param name="windows">True for double quotes, as the shells of Windows want them; else single ones.</param>
    internal static string Of(IEnumerable<string> words, bool windows)
    {
        StringBuilder line = new("probecal");
        foreach (string word in words)
        {
            line.Append(' ').Append(Quoted(word, windows));
        }

        return line.ToString();
    }

    private static string Quoted(string word, bool windows)
    {
        bool plain = word.Length != 0;
        foreach (char c in word)
        {
            plain &= char.IsAsciiLetterOrDigit(c) || Plain.Contains(c, StringComparison.Ordinal);
        }

        if (plain)
        {
            return word;
        }

        return windows
            ? "\"" + word.Replace("\"", "\\\"", StringComparison.Ordinal) + "\""
            : "'" + word.Replace("'", "'\\''", StringComparison.Ordinal) + "'";
    }
}
