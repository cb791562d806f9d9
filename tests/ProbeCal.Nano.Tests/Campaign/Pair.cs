using ProbeCal.Nano.Tests.Interpreter;

namespace ProbeCal.Nano.Tests.Campaign;

/// <summary>The same value as the desktop holds it and as the interpreter holds it.</summary>
internal readonly record struct Pair(object? Desktop, Value Device);
