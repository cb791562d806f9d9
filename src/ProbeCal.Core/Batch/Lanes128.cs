using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace ProbeCal;

/// <summary>Two doubles in one vector of 128 bits.</summary>
internal readonly struct Lanes128(Vector128<double> vector) : ILanes<Lanes128>
{
    private readonly Vector128<double> _vector = vector;

    public static int Count => Vector128<double>.Count;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static implicit operator Lanes128(double value)
    {
        return new(Vector128.Create(value));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator +(Lanes128 left, Lanes128 right)
    {
        return new(left._vector + right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator -(Lanes128 left, Lanes128 right)
    {
        return new(left._vector - right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator *(Lanes128 left, Lanes128 right)
    {
        return new(left._vector * right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator /(Lanes128 left, Lanes128 right)
    {
        return new(left._vector / right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator &(Lanes128 left, Lanes128 right)
    {
        return new(left._vector & right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator <=(Lanes128 left, Lanes128 right)
    {
        return new(Vector128.LessThanOrEqual(left._vector, right._vector));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator >=(Lanes128 left, Lanes128 right)
    {
        return new(Vector128.GreaterThanOrEqual(left._vector, right._vector));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 Sqrt(Lanes128 value)
    {
        return new(Vector128.Sqrt(value._vector));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 BitsPlus(Lanes128 value, long added)
    {
        return new((value._vector.AsInt64() + Vector128.Create(added)).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 BitsMinus(Lanes128 value, Lanes128 subtracted)
    {
        return new((value._vector.AsInt64() - subtracted._vector.AsInt64()).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 BitsUp(Lanes128 value, int places)
    {
        return new((value._vector.AsInt64() << places).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 BitsDown(Lanes128 value, int places)
    {
        return new((value._vector.AsInt64() >>> places).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 Load(ref readonly double first, int index)
    {
        return new(Vector128.LoadUnsafe(in first, (nuint)index));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static void StoreOk(ref Status first, int index)
    {
        Vector64<int>.Zero.StoreUnsafe(ref Unsafe.As<Status, int>(ref first), (nuint)index);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Store(ref double first, int index)
    {
        _vector.StoreUnsafe(ref first, (nuint)index);
    }

    public double Lane(int lane)
    {
        return _vector.GetElement(lane);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public uint MaskBits()
    {
        return (uint)_vector.ExtractMostSignificantBits();
    }
}
