using System;
using Microsoft.Data.Sqlite;

namespace ProbeCal.Station.Journal;

/// <summary>One SQL statement with positional parameters, compiled once and run many times on one connection.</summary>
internal sealed class Statement : IDisposable
{
    private readonly SqliteCommand _command;

    /// <param name="connection">Open for as long as this lives.</param>
    /// <param name="sql">One statement whose parameters are <c>$1</c>, <c>$2</c> and so on.</param>
    /// <param name="parameters">How many of them.</param>
    internal Statement(SqliteConnection connection, string sql, int parameters)
    {
        _command = connection.CreateCommand();
        _command.CommandText = sql;
        for (int i = 1; i <= parameters; i++)
        {
            SqliteParameter parameter = _command.CreateParameter();
            parameter.ParameterName = "$" + i.ToString(System.Globalization.CultureInfo.InvariantCulture);
            _command.Parameters.Add(parameter);
        }
    }

    /// <summary>Runs it; the number of rows it changed.</summary>
    internal int Run(SqliteTransaction? transaction, params ReadOnlySpan<object?> values)
    {
        Bind(transaction, values);
        return _command.ExecuteNonQuery();
    }

    /// <summary>Runs it; the first column of its first row, or null.</summary>
    internal object? Value(SqliteTransaction? transaction, params ReadOnlySpan<object?> values)
    {
        Bind(transaction, values);
        object? value = _command.ExecuteScalar();
        return value is DBNull ? null : value;
    }

    /// <summary>Runs it; its rows.</summary>
    internal SqliteDataReader Rows(params ReadOnlySpan<object?> values)
    {
        Bind(null, values);
        return _command.ExecuteReader();
    }

    public void Dispose()
    {
        _command.Dispose();
    }

    private void Bind(SqliteTransaction? transaction, ReadOnlySpan<object?> values)
    {
        _command.Transaction = transaction;
        for (int i = 0; i < values.Length; i++)
        {
            // SQLite has no NaN and no infinity; the caller's row says why the value is missing.
            object? value = values[i] is double number && !double.IsFinite(number) ? null : values[i];
            _command.Parameters[i].Value = value ?? DBNull.Value;
        }
    }
}
