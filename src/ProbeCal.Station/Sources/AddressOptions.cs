using System;
using System.Collections.Generic;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Sources;

/// <summary>The <c>key=value&amp;key=value</c> part of a source address, taken key by key; what nobody takes is refused.</summary>
internal sealed class AddressOptions
{
    internal string What { get; }

    private readonly string _address;
    private readonly Dictionary<string, string> _values = new(StringComparer.Ordinal);
    private string[] _allowed = [];

    private AddressOptions(string what, string address)
    {
        What = what;
        _address = address;
    }

    internal static AddressOptions Parse(string what, string address, string query)
    {
        AddressOptions options = new(what, address);
        foreach (string part in query.Split('&', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries))
        {
            int equals = part.IndexOf('=', StringComparison.Ordinal);
            if (equals <= 0)
            {
                throw Wrong.Input(what, address, $"'{Wrong.Shown(part)}' is no setting; write key=value");
            }

            if (!options._values.TryAdd(part[..equals], part[(equals + 1)..]))
            {
                throw Wrong.Input(what, address, $"{Wrong.Shown(part[..equals])} is given twice; leave one out");
            }
        }

        return options;
    }

    internal static string SilenceText(TimeSpan silence)
    {
        return silence == SourceAddress.UsualSilence ? "" : "&silence=" + Entry.Number.Print(silence.TotalSeconds) + "s";
    }

    /// <summary>Refuses at once what is not among the keys, with the nearest name.</summary>
    internal void Allow(string[] keys)
    {
        _allowed = keys;
        RefuseLeftOver();
    }

    internal void RefuseLeftOver()
    {
        foreach (string key in _values.Keys)
        {
            if (Array.IndexOf(_allowed, key) < 0)
            {
                string known = _allowed.Length == 0 ? "it takes none" : "it takes " + string.Join(", ", _allowed);
                throw Wrong.Input(What, _address, $"there is no setting {Wrong.Shown(key)}{NearestName.DidYouMean(key, _allowed)}; {known}");
            }
        }
    }

    internal string? Text(string key)
    {
        return _values.GetValueOrDefault(key);
    }

    internal long Whole(string key, long usual, long least, long most)
    {
        return Text(key) is string text ? Entry.Number.ParseWhole(Name(key), text, least, most) : usual;
    }

    internal double Number(string key, double usual, double least, double most)
    {
        if (Text(key) is not string text)
        {
            return usual;
        }

        double value = Entry.Number.Parse(Name(key), text);
        return value < least || most < value
            ? throw Wrong.Input(Name(key), text, $"this takes a number from {Entry.Number.Print(least)} to {Entry.Number.Print(most)}")
            : value;
    }

    internal double Quantity(QuantityKind kind, string key, double usual)
    {
        return Text(key) is string text ? Entry.Quantity.Parse(kind, Name(key), text) : usual;
    }

    internal TimeSpan Duration(string key, TimeSpan usual)
    {
        return Text(key) is string text ? Entry.Quantity.Duration(Name(key), text) : usual;
    }

    internal T Choice<T>(string key, T usual, params (string Name, T Value)[] choices)
    {
        if (Text(key) is not string text)
        {
            return usual;
        }

        foreach ((string name, T value) in choices)
        {
            if (name == text)
            {
                return value;
            }
        }

        string[] names = Array.ConvertAll(choices, choice => choice.Name);
        throw Wrong.Input(Name(key), text, $"this takes {string.Join(", ", names)}{NearestName.DidYouMean(text, names)}");
    }

    internal string Name(string key)
    {
        return What + " " + key;
    }
}
