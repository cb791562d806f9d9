using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;
using System.Text.Json;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Configuration;

/// <summary>
/// One value of a configuration file, with the place where it stands, so that every complaint can say line and column.
/// Built over the plain reader of JSON: nothing is found by reflection.
/// </summary>
internal sealed class ConfigurationNode
{
    private const int DeepestNesting = 8;

    private readonly Dictionary<string, ConfigurationNode>? _members;

    private ConfigurationNode(string place, string path, JsonTokenType kind, string text, Dictionary<string, ConfigurationNode>? members)
    {
        Place = place;
        Path = path;
        Kind = kind;
        Text = text;
        _members = members;
    }

    /// <summary><c>station.json line 7 column 15</c>.</summary>
    internal string Place { get; }

    /// <summary><c>salinity.value</c>; empty for the whole.</summary>
    internal string Path { get; }

    internal JsonTokenType Kind { get; }

    /// <summary>A string's content, or a number as it stands.</summary>
    internal string Text { get; }

    /// <summary>The beginning of a complaint about this value.</summary>
    internal string What => Path.Length == 0 ? Place + ":" : Place + ": " + Path;

    internal IEnumerable<string> Keys => _members!.Keys;

    /// <summary>Reads a whole file.</summary>
    /// <param name="name">What the file is called in messages.</param>
    /// <param name="bytes">Its content.</param>
    /// <exception cref="InputException">It is no JSON, or a key stands twice; the message says where.</exception>
    internal static ConfigurationNode Parse(string name, ReadOnlySpan<byte> bytes)
    {
        ReadOnlySpan<byte> content = bytes.StartsWith(Encoding.UTF8.Preamble) ? bytes[Encoding.UTF8.Preamble.Length..] : bytes;
        JsonReaderOptions options = new() { CommentHandling = JsonCommentHandling.Skip, AllowTrailingCommas = true, MaxDepth = DeepestNesting };
        Utf8JsonReader reader = new(content, options);
        try
        {
            if (!reader.Read() || reader.TokenType != JsonTokenType.StartObject)
            {
                throw new InputException(name + " line 1 column 1: a configuration is one JSON object; it begins with {");
            }

            ConfigurationNode root = ReadValue(ref reader, name, content, "");
            if (reader.Read())
            {
                throw new InputException(PlaceOf(name, content, reader.TokenStartIndex) + ": something stands behind the closing }");
            }

            return root;
        }
        catch (JsonException wrong)
        {
            string place = string.Create(CultureInfo.InvariantCulture, $"{name} line {wrong.LineNumber + 1} column {wrong.BytePositionInLine + 1}");
            throw new InputException(place + ": this is no JSON: " + FirstSentence(wrong.Message), wrong);
        }
        catch (InvalidOperationException wrong)
        {
            // The reader's way to say that the bytes of a string are no UTF-8.
            throw new InputException(PlaceOf(name, content, reader.TokenStartIndex) + ": the text is not UTF-8; save the file as UTF-8", wrong);
        }
    }

    /// <summary>Says that this is an object which may have these keys and no others.</summary>
    /// <exception cref="InputException">It is not, or it has another, whose nearest name is told.</exception>
    internal void AllowKeys(IReadOnlyList<string> known)
    {
        if (_members == null)
        {
            throw new InputException(What + ": an object { } belongs here, with " + string.Join(", ", known));
        }

        foreach ((string key, ConfigurationNode member) in _members)
        {
            if (!Contains(known, key))
            {
                throw new InputException(member.Place + ": there is no key " + Wrong.Shown(member.Path) + NearestName.DidYouMean(key, known) + "; " + (Path.Length == 0 ? "a configuration" : Path) + " takes " + string.Join(", ", known));
            }
        }
    }

    /// <summary>The member of that name, or null. The word null in the file is the same as nothing.</summary>
    internal ConfigurationNode? Find(string key)
    {
        return _members!.TryGetValue(key, out ConfigurationNode? member) && member.Kind != JsonTokenType.Null ? member : null;
    }

    /// <summary>The member of that name.</summary>
    /// <param name="key">Its name.</param>
    /// <param name="example">What would be right, for the message.</param>
    /// <exception cref="InputException">There is none.</exception>
    internal ConfigurationNode Require(string key, string example)
    {
        return Find(key) ?? throw new InputException(Place + ": " + Child(Path, key) + " is missing; write for example \"" + key + "\": " + example);
    }

    /// <summary>The content of a string that is not blank.</summary>
    /// <exception cref="InputException">It is something else.</exception>
    internal string AsText()
    {
        if (Kind != JsonTokenType.String)
        {
            throw new InputException(What + (_members == null ? " " + Text : "") + ": a text in double quotes belongs here");
        }

        return Text.AsSpan().Trim().IsEmpty ? throw new InputException(What + ": the text is empty") : PlainText.OneLine(What, Text);
    }

    /// <summary>A quantity as it stands: a text, or a bare number, whose unit the reader of quantities will ask for.</summary>
    /// <exception cref="InputException">It is something else.</exception>
    internal string AsQuantity()
    {
        return Kind == JsonTokenType.Number ? Text : AsText();
    }

    /// <summary>True or false.</summary>
    /// <exception cref="InputException">It is something else.</exception>
    internal bool AsFlag()
    {
        return Kind is JsonTokenType.True or JsonTokenType.False
            ? Kind == JsonTokenType.True
            : throw new InputException(What + " " + Wrong.Shown(Text) + ": this takes true or false, without quotes");
    }

    /// <summary>A whole number from <paramref name="least"/> to <paramref name="most"/>.</summary>
    /// <exception cref="InputException">It is something else.</exception>
    internal long AsWhole(long least, long most)
    {
        return Kind == JsonTokenType.Number
            ? Number.ParseWhole(What, Text, least, most)
            : throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{What} {Wrong.Shown(Text)}: this takes a whole number from {least} to {most}, without quotes"));
    }

    private static ConfigurationNode ReadValue(ref Utf8JsonReader reader, string name, ReadOnlySpan<byte> bytes, string path)
    {
        string place = PlaceOf(name, bytes, reader.TokenStartIndex);
        switch (reader.TokenType)
        {
            case JsonTokenType.StartObject:
                return new ConfigurationNode(place, path, JsonTokenType.StartObject, "", ReadMembers(ref reader, name, bytes, path));
            case JsonTokenType.StartArray:
                throw new InputException(place + ": " + path + ": no list belongs here");
            case JsonTokenType.String:
                return new ConfigurationNode(place, path, JsonTokenType.String, reader.GetString()!, null);
            default:
                return new ConfigurationNode(place, path, reader.TokenType, Encoding.UTF8.GetString(reader.ValueSpan), null);
        }
    }

    private static Dictionary<string, ConfigurationNode> ReadMembers(ref Utf8JsonReader reader, string name, ReadOnlySpan<byte> bytes, string path)
    {
        Dictionary<string, ConfigurationNode> members = new(StringComparer.Ordinal);
        while (reader.Read() && reader.TokenType != JsonTokenType.EndObject)
        {
            string key = reader.GetString()!;
            string place = PlaceOf(name, bytes, reader.TokenStartIndex);
            reader.Read();
            if (!members.TryAdd(key, ReadValue(ref reader, name, bytes, Child(path, key))))
            {
                throw new InputException(place + ": " + Child(path, key) + " stands here for the second time; leave one out");
            }
        }

        return members;
    }

    private static string Child(string path, string key)
    {
        return path.Length == 0 ? key : path + "." + key;
    }

    private static string PlaceOf(string name, ReadOnlySpan<byte> bytes, long position)
    {
        ReadOnlySpan<byte> before = bytes[..(int)position];
        int line = before.Count((byte)'\n') + 1;
        ReadOnlySpan<byte> inLine = before[(before.LastIndexOf((byte)'\n') + 1)..];
        return string.Create(CultureInfo.InvariantCulture, $"{name} line {line} column {Encoding.UTF8.GetCharCount(inLine) + 1}");
    }

    private static string FirstSentence(string message)
    {
        // The reader repeats the place behind its sentence, counted from 0.
        int end = message.IndexOf(" LineNumber:", StringComparison.Ordinal);
        return (end < 0 ? message : message[..end]).ReplaceLineEndings(" ");
    }

    private static bool Contains(IReadOnlyList<string> names, string name)
    {
        foreach (string each in names)
        {
            if (each == name)
            {
                return true;
            }
        }

        return false;
    }
}
