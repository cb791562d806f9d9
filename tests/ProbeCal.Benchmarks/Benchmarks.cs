using BenchmarkDotNet.Attributes;

namespace ProbeCal.Benchmarks;

/// <summary>The elementary functions, one value at a time, over numbers such as the equations give them.</summary>
public class ElementaryFunctions
{
    private const int Count = 2000;

    private readonly Water _water = new(Count);

    /// <summary>e^x for x from 0 to 40.</summary>
    [Benchmark(OperationsPerInvoke = Count)]
    public void Exp()
    {
        for (int i = 0; i < Count; i++) { _water.Values[i] = Numerics.Exp(_water.Celsius[i]); }
    }

    /// <summary>ln x for x from 510 to 1110.</summary>
    [Benchmark(OperationsPerInvoke = Count)]
    public void Ln()
    {
        for (int i = 0; i < Count; i++) { _water.Values[i] = Numerics.Ln(_water.PressureHectopascal[i]); }
    }

    /// <summary>√x for x from 0 to 40.</summary>
    [Benchmark(OperationsPerInvoke = Count)]
    public void Sqrt()
    {
        for (int i = 0; i < Count; i++) { _water.Values[i] = Numerics.Sqrt(_water.Celsius[i]); }
    }
}

/// <summary>Oxygen, one call a value.</summary>
public class OneCallAValue
{
    private const int Count = 2000;

    private readonly Water _water = new(Count);

    /// <summary>Garcia and Gordon 1992 at 1 atm.</summary>
    [Benchmark(OperationsPerInvoke = Count)]
    public void GarciaGordon()
    {
        for (int i = 0; i < Count; i++)
        {
            _water.Statuses[i] = GarciaGordon1992.MicromolesPerKilogramAtOneAtmosphere(_water.Celsius[i], _water.Salinity[i], RangeRule.Refuse, out _water.Values[i]);
        }
    }

    /// <summary>Benson and Krause 1984 with pressure.</summary>
    [Benchmark(OperationsPerInvoke = Count)]
    public void BensonKrause()
    {
        for (int i = 0; i < Count; i++)
        {
            _water.Statuses[i] = BensonKrause1984.MilligramsPerLitre(
                _water.Celsius[i], _water.Salinity[i], _water.PressureHectopascal[i], RangeRule.Refuse, out _water.Values[i]);
        }
    }

    /// <summary>Partial pressure in air.</summary>
    [Benchmark(OperationsPerInvoke = Count)]
    public void PartialPressure()
    {
        for (int i = 0; i < Count; i++)
        {
            _water.Statuses[i] = OxygenEquilibrium.PartialPressure(_water.Celsius[i], _water.PressureHectopascal[i], RangeRule.Refuse, out _water.Values[i]);
        }
    }
}

/// <summary>Oxygen by the batch, in each width. One that the machine lacks is computed in software.</summary>
public class BatchByWidth
{
    private const int Count = 2000;

    private readonly Water _water = new(Count);

    /// <summary>Bits of a vector; 64 is one value at a time.</summary>
    [Params(64, 128, 256, 512)]
    public int Width { get; set; }

    /// <summary>Garcia and Gordon 1992 at 1 atm.</summary>
    [Benchmark(OperationsPerInvoke = Count)]
    public int GarciaGordon()
    {
        return BatchLoop.Run(
            default(OxygenFunctions.GarciaGordonAtOneAtmosphere), _water.Celsius, _water.Salinity, _water.Celsius, _water.Celsius, RangeRule.Refuse,
            _water.Values, _water.Statuses, (LaneWidth)Width);
    }

    /// <summary>Benson and Krause 1984 with pressure.</summary>
    [Benchmark(OperationsPerInvoke = Count)]
    public int BensonKrause()
    {
        return BatchLoop.Run(
            default(OxygenFunctions.MilligramsPerLitre<OxygenSolubility.BensonKrause1984Lanes>), _water.Celsius, _water.Salinity,
            _water.PressureHectopascal, _water.Celsius, RangeRule.Refuse, _water.Values, _water.Statuses, (LaneWidth)Width);
    }

    /// <summary>Garcia and Gordon 1992 in mg/L with pressure and density.</summary>
    [Benchmark(OperationsPerInvoke = Count)]
    public int GarciaGordonMilligrams()
    {
        return BatchLoop.Run(
            default(OxygenFunctions.MilligramsPerLitre<OxygenSolubility.GarciaGordon1992Lanes>), _water.Celsius, _water.Salinity,
            _water.PressureHectopascal, _water.Celsius, RangeRule.Refuse, _water.Values, _water.Statuses, (LaneWidth)Width);
    }
}
