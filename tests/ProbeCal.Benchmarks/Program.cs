using System;
using System.Globalization;
using BenchmarkDotNet.Running;
using ProbeCal.Benchmarks;

// side-by-side [RUNS COUNT]: against gsw, for side-by-side.sh; correct [RUNS ROWS], for correct.sh. Anything else goes to BenchmarkDotNet.
if (args.Length == 0 || args[0] is not ("side-by-side" or "correct"))
{
    BenchmarkSwitcher.FromAssembly(typeof(Water).Assembly).Run(args);
    return 0;
}

int runs = 25, count = 1_000_000;
if (args.Length > 1
    && !(args.Length == 3
        && int.TryParse(args[1], NumberStyles.None, CultureInfo.InvariantCulture, out runs)
        && int.TryParse(args[2], NumberStyles.None, CultureInfo.InvariantCulture, out count)
        && runs > 0 && count > 0))
{
    Console.Error.WriteLine($"'{string.Join(' ', args[1..])}' is not a number of runs and a number of values, both above zero, for example: side-by-side 25 1000000");
    return 2;
}

return args[0] == "correct" ? Corrections.Run(runs, count) : SideBySide.Run(runs, count);
