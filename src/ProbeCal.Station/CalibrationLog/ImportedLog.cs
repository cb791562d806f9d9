using System;
using System.Collections.Generic;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>A log made elsewhere, kept beside the local one with its own id and chain.</summary>
/// <param name="LogId">Its own id.</param>
/// <param name="Origin">The file it was first imported from, as it was named then.</param>
/// <param name="ImportedUtc">When it was first imported, UTC.</param>
/// <param name="Entries">Its entries, oldest first.</param>
/// <param name="Chain">What the verification on opening found.</param>
public sealed record ImportedLog(string LogId, string Origin, DateTimeOffset ImportedUtc, IReadOnlyList<StoredEntry> Entries, ChainState Chain);
