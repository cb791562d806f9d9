using System;
using System.Linq;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>An input of a function under test: its quantity, an ordinary value, and the ends of its range (NaN: none).</summary>
internal sealed record Input(InputQuantity Quantity, double Ordinary, double Lowest, double Highest);

/// <summary>A function of Core seen as inputs → status and values, so that one test can hold every function to the same rules.</summary>
internal sealed record CoreFunction(
    string Name, bool Extrapolates, Input[] Inputs, Func<double[], RangeRule, (Status Status, double[] Values)> Call)
{
    internal double[] Ordinary => Inputs.Select(i => i.Ordinary).ToArray();

    public override string ToString()
    {
        return Name;
    }
}
