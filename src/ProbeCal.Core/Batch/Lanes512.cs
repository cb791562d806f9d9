using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace ProbeCal;

/// <summary>Eight doubles in one vector of 512 bits.</summary>
internal readonly struct Lanes512(Vector512<double> vector) : ILanes<Lanes512>
{
    private readonly Vector512<double> _vector = vector;

    public static int Count => Vector512<double>.Count;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static implicit operator Lanes512(double value)
    {
        return new(Vector512.Create(value));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator +(Lanes512 left, Lanes512 right)
    {
        return new(left._vector + right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator -(Lanes512 left, Lanes512 right)
    {
        return new(left._vector - right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator *(Lanes512 left, Lanes512 right)
    {
        return new(left._vector * right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator /(Lanes512 left, Lanes512 right)
    {
        return new(left._vector / right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator &(Lanes512 left, Lanes512 right)
    {
        return new(left._vector & right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator <=(Lanes512 left, Lanes512 right)
    {
        return new(Vector512.LessThanOrEqual(left._vector, right._vector));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator >=(Lanes512 left, Lanes512 right)
    {
        return new(Vector512.GreaterThanOrEqual(left._vector, right._vector));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 Sqrt(Lanes512 value)
    {
        return new(Vector512.Sqrt(value._vector));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 BitsPlus(Lanes512 value, long added)
    {
        return new((value._vector.AsInt64() + Vector512.Create(added)).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 BitsMinus(Lanes512 value, Lanes512 subtracted)
    {
        return new((value._vector.AsInt64() - subtracted._vector.AsInt64()).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 BitsUp(Lanes512 value, int places)
    {
        return new((value._vector.AsInt64() << places).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 BitsDown(Lanes512 value, int places)
    {
        return new((value._vector.AsInt64() >>> places).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 Load(ref readonly double first, int index)
    {
        return new(Vector512.LoadUnsafe(in first, (nuint)index));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static void StoreOk(ref Status first, int index)
    {
        Vector256<int>.Zero.StoreUnsafe(ref Unsafe.As<Status, int>(ref first), (nuint)index);
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
