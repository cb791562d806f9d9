namespace ProbeCal;

/// <summary>
/// Several doubles computed with at once. The lane formulas are written once against this and compiled for each width; every operation rounds
/// each lane as IEEE 754 rounds a single double, and none joins a product and a sum, so that a lane has the bits of the scalar formula.
/// </summary>
internal interface ILanes<TSelf>
    where TSelf : struct, ILanes<TSelf>
{
    /// <summary>How many lanes there are.</summary>
    static abstract int Count { get; }

    /// <summary>The same number in every lane.</summary>
    static abstract implicit operator TSelf(double value);

    static abstract TSelf operator +(TSelf left, TSelf right);

    static abstract TSelf operator -(TSelf left, TSelf right);

    static abstract TSelf operator *(TSelf left, TSelf right);

    static abstract TSelf operator /(TSelf left, TSelf right);

    /// <summary>The lanes that are in both masks.</summary>
    static abstract TSelf operator &(TSelf left, TSelf right);

    /// <summary>The mask of the lanes where left is no larger than right; a NaN is in no mask.</summary>
    static abstract TSelf operator <=(TSelf left, TSelf right);

    /// <summary>The mask of the lanes where left is no smaller than right; a NaN is in no mask.</summary>
    static abstract TSelf operator >=(TSelf left, TSelf right);

    /// <summary>Square roots: IEEE 754 rounds them correctly, and so does <see cref="Numerics.Sqrt"/>.</summary>
    static abstract TSelf Sqrt(TSelf value);

    /// <summary>The 64 bits of each lane as an integer, plus a number.</summary>
    static abstract TSelf BitsPlus(TSelf value, long added);

    /// <summary>The 64 bits of each lane as an integer, minus those of another.</summary>
    static abstract TSelf BitsMinus(TSelf value, TSelf subtracted);

    /// <summary>The 64 bits of each lane moved up.</summary>
    static abstract TSelf BitsUp(TSelf value, int places);

    /// <summary>The 64 bits of each lane moved down, zeros moving in.</summary>
    static abstract TSelf BitsDown(TSelf value, int places);

    /// <summary>The lanes that stand from an index on.</summary>
    static abstract TSelf Load(ref readonly double first, int index);

    /// <summary>Writes <see cref="Status.Ok"/> for every lane.</summary>
    static abstract void StoreOk(ref Status first, int index);

    /// <summary>Writes the lanes from an index on.</summary>
    void Store(ref double first, int index);

    /// <summary>One lane.</summary>
    double Lane(int lane);

    /// <summary>A mask as bits, lane 0 lowest.</summary>
    uint MaskBits();
}
