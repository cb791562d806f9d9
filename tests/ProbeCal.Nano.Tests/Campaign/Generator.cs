using System;
using System.Collections.Generic;
using System.Linq;
using System.Reflection;
using Mono.Cecil;
using ProbeCal.Nano.Tests.Interpreter;

namespace ProbeCal.Nano.Tests.Campaign;

/// <summary>How far from ordinary an argument may be.</summary>
internal enum Strangeness
{
    /// <summary>Inside the parameter's ordinary range.</summary>
    Ordinary,

    /// <summary>An end of a range or one step beside it, a special number, an undefined enumeration value, null.</summary>
    Special,

    /// <summary>Any number.</summary>
    Wide,
}

/// <summary>Makes arguments in pairs: one for the desktop, the same for the interpreter.</summary>
internal sealed class Generator
{
    private const int PoolSize = 256;

    /// <summary>How many of the special numbers, at their start, are not finite.</summary>
    private const int NotFinite = 3;

    private static readonly double[] SpecialNumbers =
    [
        double.NaN, double.PositiveInfinity, double.NegativeInfinity, 0.0, -0.0, double.Epsilon, -double.Epsilon,
        double.MaxValue, double.MinValue, 1.0, -1.0, 1e-308, 1e308, -273.15, 0.5, 1e15,
    ];

    private static readonly int[] SpecialIntegers = [0, 1, -1, 2, 31, 63, 64, 65, int.MaxValue, int.MinValue];

    private readonly Machine machine;
    private readonly Invoker invoker;
    private readonly Dictionary<TypeDefinition, List<Pair>> pools = [];
    private double[] ends = [];
    private double[] codeConstants = [];
    private Gas lastGas = Gas.Oxygen;

    public Generator(Machine machine)
    {
        this.machine = machine;
        invoker = new Invoker(machine);
    }

    /// <summary>Takes the ends of ranges from the code of the method that is tested next.</summary>
    public void Prepare(MethodDefinition method)
    {
        codeConstants = CodeConstants.Of(method);
        lastGas = Gas.Oxygen;
    }

    /// <summary>The parameters that this generator cannot make values for.</summary>
    public static IEnumerable<string> Unknown(MethodDefinition method)
    {
        foreach (ParameterDefinition parameter in method.Parameters)
        {
            TypeReference type = parameter.ParameterType is ByReferenceType reference ? reference.ElementType : parameter.ParameterType;
            bool isNumber = type.MetadataType is MetadataType.Double or MetadataType.Int32 or MetadataType.Int64 && !parameter.IsOut;
            if (isNumber && InputRanges.For(parameter.Name) == null)
            {
                yield return parameter.Name + " has no ordinary range";
            }
            else if (!isNumber && !IsKnown(type))
            {
                yield return parameter.Name + " is a " + type.FullName;
            }
        }
    }

    /// <summary>Every special value of one parameter, for the sweep that comes before the random inputs.</summary>
    public int SpecialCount(ParameterDefinition parameter)
    {
        switch (parameter.ParameterType.MetadataType)
        {
            case MetadataType.Double:
                SetEnds(parameter.Name);
                return SpecialNumbers.Length + (3 * ends.Length);
            case MetadataType.Int32 or MetadataType.Int64:
                return SpecialIntegers.Length;
            default:
                return 0;
        }
    }

    /// <summary>An argument; <paramref name="special"/> picks a certain special value, -1 any.</summary>
    public Pair Make(ParameterDefinition parameter, Strangeness strangeness, Random random, int special = -1)
    {
        if (parameter.IsOut)
        {
            return default;
        }
        TypeReference type = parameter.ParameterType is ByReferenceType reference ? reference.ElementType : parameter.ParameterType;
        switch (type.MetadataType)
        {
            case MetadataType.Double:
                double number = Number(parameter.Name, strangeness, random, special);
                return new Pair(number, Value.OfDouble(number));
            case MetadataType.Boolean:
                bool flag = random.Next(2) == 0;
                return new Pair(flag, Value.OfInteger(flag ? 1 : 0));
            case MetadataType.Int32:
                int integer = Integer(parameter.Name, strangeness, random, special);
                return new Pair(integer, Value.OfInteger(integer));
            case MetadataType.Int64:
                long large = strangeness == Strangeness.Wide ? random.NextInt64(long.MinValue, long.MaxValue) : Integer(parameter.Name, strangeness, random, special);
                return new Pair(large, Value.OfInteger(large));
            case MetadataType.ValueType:
                return EnumValue((TypeDefinition)type, strangeness, random);
            case MetadataType.Array:
                return ArrayValue(parameter, strangeness, random);
            default:
                return strangeness == Strangeness.Wide && random.Next(4) == 0 ? default : ObjectOf((TypeDefinition)type, random);
        }
    }

    /// <summary>A ready object of a class, or of a class that implements an interface.</summary>
    public Pair ObjectOf(TypeDefinition type, Random random)
    {
        if (!pools.TryGetValue(type, out List<Pair>? pool))
        {
            pool = type.IsInterface ? PoolOfImplementations(type, random) : MakePool(type, random);
            pools.Add(type, pool);
        }
        return pool[random.Next(pool.Count)];
    }

    private static bool IsKnown(TypeReference type)
    {
        return type.MetadataType is MetadataType.Double or MetadataType.Boolean or MetadataType.Int32 or MetadataType.Int64
            || type is TypeDefinition { IsEnum: true }
            || (type is ArrayType array && array.ElementType.MetadataType == MetadataType.Double)
            || (type is TypeDefinition { IsInterface: true } contract && Implementations(contract).Any())
            || (type is TypeDefinition { IsClass: true, IsValueType: false } definition && Makers(definition).Any());
    }

    private static IEnumerable<TypeDefinition> Implementations(TypeDefinition contract)
    {
        return DeviceAssembly.Nano.MainModule.Types.Where(t => t.IsPublic && !t.IsAbstract && t.Interfaces.Any(i => i.InterfaceType == contract));
    }

    /// <summary>Public constructors, and static functions of the class that give one back.</summary>
    private static IEnumerable<MethodDefinition> Makers(TypeDefinition type)
    {
        return type.Methods.Where(m => m.IsPublic && m.HasBody && ((m.IsConstructor && !m.IsStatic)
            || (m.IsStatic && (m.ReturnType == type || m.Parameters.Any(p => p.IsOut && ((ByReferenceType)p.ParameterType).ElementType == type)))));
    }

    private List<Pair> PoolOfImplementations(TypeDefinition contract, Random random)
    {
        return Implementations(contract).SelectMany(t => Enumerable.Range(0, PoolSize).Select(_ => ObjectOf(t, random))).ToList();
    }

    private List<Pair> MakePool(TypeDefinition type, Random random)
    {
        List<Member> makers = Surface.Members().Where(m => Makers(type).Contains(m.Device)).ToList();
        var pool = new List<Pair>();
        for (int attempt = 0; attempt < 20 * PoolSize && pool.Count < PoolSize; attempt++)
        {
            Member maker = makers[random.Next(makers.Count)];
            bool ordinary = random.Next(8) != 0;
            Pair[] arguments = maker.Device.Parameters.Select(p => Make(p, ordinary ? Strangeness.Ordinary : Strangeness.Special, random)).ToArray();
            Outcome outcome = invoker.Invoke(maker, default, arguments);
            Pair made = outcome.Objects.FirstOrDefault(o => o.Desktop?.GetType().FullName == type.FullName);
            if (made.Desktop != null && made.Device.R != null)
            {
                pool.Add(made);
            }
        }
        return pool.Count > 0 ? pool : throw new InvalidOperationException("no ordinary arguments make a " + type.FullName);
    }

    private void SetEnds(string name)
    {
        (double lowest, double highest) = InputRanges.For(name)!.Value;
        ends = [lowest, highest, .. codeConstants];
    }

    private double Number(string name, Strangeness strangeness, Random random, int special)
    {
        switch (strangeness)
        {
            case Strangeness.Ordinary:
                (double lowest, double highest) = InputRanges.For(name)!.Value;
                return Numbers.Between(random, lowest, highest);
            case Strangeness.Special:
                SetEnds(name);
                int count = SpecialNumbers.Length + (3 * ends.Length);
                int index = special >= 0 ? special : random.Next(6) switch
                {
                    0 => random.Next(NotFinite),
                    1 => random.Next(SpecialNumbers.Length),
                    _ => random.Next(count),
                };
                if (index < SpecialNumbers.Length)
                {
                    return SpecialNumbers[index];
                }
                double end = ends[(index - SpecialNumbers.Length) / 3];
                return ((index - SpecialNumbers.Length) % 3) switch
                {
                    0 => end,
                    1 => Math.BitIncrement(end),
                    _ => Math.BitDecrement(end),
                };
            default:
                return Numbers.Wide(random);
        }
    }

    private static int Integer(string name, Strangeness strangeness, Random random, int special)
    {
        (double lowest, double highest) = InputRanges.For(name)!.Value;
        return strangeness switch
        {
            Strangeness.Ordinary => random.Next((int)lowest, (int)highest + 1),
            Strangeness.Special => SpecialIntegers[special >= 0 ? special : random.Next(SpecialIntegers.Length)],
            _ => random.Next(int.MinValue, int.MaxValue),
        };
    }

    private Pair EnumValue(TypeDefinition type, Strangeness strangeness, Random random)
    {
        Type desktop = Surface.DesktopOf(type);
        Array values = Enum.GetValues(desktop);
        object value = strangeness == Strangeness.Wide && random.Next(2) == 0
            ? Enum.ToObject(desktop, random.Next(-2, 20))
            : values.GetValue(random.Next(values.Length))!;
        if (value is Gas gas) { lastGas = gas; }
        // Of all pairs of gas and equation one in six is published: every other ordinary equation is one that fits the gas before it (oxygen where none is named).
        if (value is SolubilityEquation && strangeness == Strangeness.Ordinary && random.Next(2) == 0)
        {
            value = lastGas == Gas.Oxygen && random.Next(2) == 0 ? SolubilityEquation.GarciaGordon1992 : GasDefaults.Equation(lastGas);
        }

        return new Pair(value, Value.OfInteger(Comparison.ToBits(value)));
    }

    private Pair ArrayValue(ParameterDefinition parameter, Strangeness strangeness, Random random)
    {
        int length = strangeness == Strangeness.Special ? random.Next(3) : random.Next(28, 65);
        double[] desktop = new double[length];
        for (int i = 0; i < length; i++)
        {
            bool strange = strangeness != Strangeness.Ordinary && random.Next(length) < 2;
            desktop[i] = Number(parameter.Name, strange ? strangeness : Strangeness.Ordinary, random, -1);
        }
        if (parameter.Name.StartsWith("times", StringComparison.Ordinal) && strangeness != Strangeness.Wide)
        {
            Array.Sort(desktop);
        }
        var device = new ArrayObject(((ArrayType)parameter.ParameterType).ElementType, length);
        for (int i = 0; i < length; i++)
        {
            device.Items[i] = Value.OfDouble(desktop[i]);
        }
        return new Pair(desktop, Value.OfObject(device));
    }
}
