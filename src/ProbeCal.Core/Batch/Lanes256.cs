using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace ProbeCal;

/// <summary>Four doubles in one vector of 256 bits.</summary>
internal readonly struct Lanes256(Vector256<double> vector) : ILanes<Lanes256>
{
    private readonly Vector256<double> _vector = vector;

    public static int Count => Vector256<double>.Count;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static implicit operator Lanes256(double value)
    {
        return new(Vector256.Create(value));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator +(Lanes256 left, Lanes256 right)
    {
        return new(left._vector + right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator -(Lanes256 left, Lanes256 right)
    {
        return new(left._vector - right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator *(Lanes256 left, Lanes256 right)
    {
        return new(left._vector * right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator /(Lanes256 left, Lanes256 right)
    {
        return new(left._vector / right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator &(Lanes256 left, Lanes256 right)
    {
        return new(left._vector & right._vector);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator <=(Lanes256 left, Lanes256 right)
    {
        return new(Vector256.LessThanOrEqual(left._vector, right._vector));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator >=(Lanes256 left, Lanes256 right)
    {
        return new(Vector256.GreaterThanOrEqual(left._vector, right._vector));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 Sqrt(Lanes256 value)
    {
        return new(Vector256.Sqrt(value._vector));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 BitsPlus(Lanes256 value, long added)
    {
        return new((value._vector.AsInt64() + Vector256.Create(added)).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 BitsMinus(Lanes256 value, Lanes256 subtracted)
    {
        return new((value._vector.AsInt64() - subtracted._vector.AsInt64()).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 BitsUp(Lanes256 value, int places)
    {
        return new((value._vector.AsInt64() << places).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 BitsDown(Lanes256 value, int places)
    {
        return new((value._vector.AsInt64() >>> places).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 Load(ref readonly double first, int index)
    {
        return new(Vector256.LoadUnsafe(in first, (nuint)index));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static void StoreOk(ref Status first, int index)
    {
        Vector128<int>.Zero.StoreUnsafe(ref Unsafe.As<Status, int>(ref first), (nuint)index);
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
