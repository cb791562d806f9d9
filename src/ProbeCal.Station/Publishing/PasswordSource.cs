using System;
using System.IO;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Publishing;

/// <summary>A place where a password lies: a variable of the environment, or the first line of a file. Never the password itself.</summary>
internal sealed class PasswordSource
{
    private readonly string? _variable;
    private readonly string? _file;
    private readonly Func<string, string?> _environment;

    private PasswordSource(string? variable, string? file, Func<string, string?> environment)
    {
        _variable = variable;
        _file = file;
        _environment = environment;
    }

    /// <summary>In a variable of the environment.</summary>
    /// <param name="variable">Its name.</param>
    /// <param name="environment">Looks a variable up; tests hand in their own.</param>
    public static PasswordSource FromEnvironment(string variable, Func<string, string?> environment)
    {
        return new PasswordSource(variable, null, environment);
    }

    /// <summary>In the first line of a file.</summary>
    public static PasswordSource FromFile(string file)
    {
        return new PasswordSource(null, file, static _ => null);
    }

    /// <summary>Fetches it.</summary>
    /// <exception cref="InputException">It is not there. The message names the place and never the content.</exception>
    public string Fetch()
    {
        if (_variable != null)
        {
            return _environment(_variable) ?? throw new InputException("the environment variable " + _variable + " for the broker's password is not set; set it before the station starts");
        }

        try
        {
            using StreamReader reader = new(_file!);
            return reader.ReadLine() ?? throw new InputException(_file + ": the file for the broker's password is empty; its first line is taken");
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            throw new InputException(_file + ": the file for the broker's password cannot be read: " + fault.Message, fault);
        }
    }
}
