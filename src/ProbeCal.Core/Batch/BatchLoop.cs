using System;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;

namespace ProbeCal;

/// <summary>A scalar function of up to four numbers, as a batch calls it.</summary>
internal interface IBatchFunction
{
    /// <summary>The scalar call; a function of fewer numbers leaves the last ones unread.</summary>
    Status Scalar(double a, double b, double c, double d, RangeRule rule, out double value);
}

/// <summary>
/// A scalar function that has lanes, in up to three stages, each of which a block of values passes before the next begins: the steps of one value wait
/// for each other, and only while its piece of the formula is short does the processor have several values in hand at once.
/// </summary>
internal interface ILaneFunction : IBatchFunction
{
    /// <summary>Whether there is a <see cref="First"/> stage.</summary>
    static abstract bool HasFirst { get; }

    /// <summary>Whether there is a <see cref="Second"/> stage.</summary>
    static abstract bool HasSecond { get; }

    /// <summary>What the second stage takes in hand.</summary>
    static abstract TLanes First<TLanes>(TLanes a)
        where TLanes : struct, ILanes<TLanes>;

    /// <summary>What the last stage takes in hand.</summary>
    static abstract TLanes Second<TLanes>(TLanes first, TLanes a, TLanes b)
        where TLanes : struct, ILanes<TLanes>;

    /// <summary>
    /// The values of all lanes, and the mask of those that hold the bits of the scalar call and whose status is Ok. What the others hold does not
    /// matter: the scalar call is made for them. Without the stages before, there is nothing in hand.
    /// </summary>
    static abstract TLanes Last<TLanes>(TLanes inHand, TLanes a, TLanes b, TLanes c, TLanes d, out TLanes ok)
        where TLanes : struct, ILanes<TLanes>;
}

/// <summary>
/// The one loop of all batch calls. Lanes that are Ok take the lane formula, every other one the scalar call itself, so that values, statuses and the
/// count are the scalar's under every <see cref="RangeRule"/>.
/// </summary>
internal static class BatchLoop
{
    /// <summary>Values that pass one stage before the next begins: two kilobytes, which stay near the processor.</summary>
    internal const int BlockLength = 256;

    /// <summary>Runs a function over spans of one length, one value at a time. Unread inputs repeat the first.</summary>
    internal static int RunScalar<TFunction>(
        TFunction function, ReadOnlySpan<double> a, ReadOnlySpan<double> b, ReadOnlySpan<double> c, ReadOnlySpan<double> d, RangeRule rule,
        Span<double> values, Span<Status> statuses,
        [CallerArgumentExpression(nameof(a))] string nameA = "", [CallerArgumentExpression(nameof(b))] string nameB = "",
        [CallerArgumentExpression(nameof(c))] string nameC = "", [CallerArgumentExpression(nameof(d))] string nameD = "",
        [CallerArgumentExpression(nameof(values))] string nameOfValues = "")
        where TFunction : struct, IBatchFunction
    {
        Check(a, nameA, b, nameB, values, nameOfValues, statuses);
        Check(a, nameA, c, nameC, values, nameOfValues, statuses);
        Check(a, nameA, d, nameD, values, nameOfValues, statuses);
        return Tail(function, 0, a, b, c, d, rule, values, statuses);
    }

    /// <summary>Runs a function over spans of one length in lanes of the width given. Unread inputs repeat the first.</summary>
    internal static int Run<TFunction>(
        TFunction function, ReadOnlySpan<double> a, ReadOnlySpan<double> b, ReadOnlySpan<double> c, ReadOnlySpan<double> d, RangeRule rule,
        Span<double> values, Span<Status> statuses, LaneWidth width,
        [CallerArgumentExpression(nameof(a))] string nameA = "", [CallerArgumentExpression(nameof(b))] string nameB = "",
        [CallerArgumentExpression(nameof(c))] string nameC = "", [CallerArgumentExpression(nameof(d))] string nameD = "",
        [CallerArgumentExpression(nameof(values))] string nameOfValues = "")
        where TFunction : struct, ILaneFunction
    {
        Check(a, nameA, b, nameB, values, nameOfValues, statuses);
        Check(a, nameA, c, nameC, values, nameOfValues, statuses);
        Check(a, nameA, d, nameD, values, nameOfValues, statuses);
        return width switch
        {
            LaneWidth.Bits512 => InLanes<TFunction, Lanes512>(function, a, b, c, d, rule, values, statuses),
            LaneWidth.Bits256 => InLanes<TFunction, Lanes256>(function, a, b, c, d, rule, values, statuses),
            LaneWidth.Bits128 => InLanes<TFunction, Lanes128>(function, a, b, c, d, rule, values, statuses),
            _ => Tail(function, 0, a, b, c, d, rule, values, statuses),
        };
    }

    private static int InLanes<TFunction, TLanes>(
        TFunction function, ReadOnlySpan<double> a, ReadOnlySpan<double> b, ReadOnlySpan<double> c, ReadOnlySpan<double> d, RangeRule rule,
        Span<double> values, Span<Status> statuses)
        where TFunction : struct, ILaneFunction
        where TLanes : struct, ILanes<TLanes>
    {
        Span<double> inHand = stackalloc double[BlockLength];
        int notOk = 0;
        int index = 0;
        int inLanes = a.Length - (a.Length % TLanes.Count);
        while (index < inLanes)
        {
            int length = inLanes - index < BlockLength ? inLanes - index : BlockLength;
            ReadOnlySpan<double> blockA = a.Slice(index, length);
            ReadOnlySpan<double> blockB = b.Slice(index, length);
            if (TFunction.HasFirst) { FirstStage<TFunction, TLanes>(blockA, inHand[..length]); }
            if (TFunction.HasSecond) { SecondStage<TFunction, TLanes>(blockA, blockB, inHand[..length]); }
            notOk += LastStage<TFunction, TLanes>(
                function, inHand[..length], blockA, blockB, c.Slice(index, length), d.Slice(index, length), rule,
                values.Slice(index, length), statuses.Slice(index, length));
            index += length;
        }

        return notOk + Tail(function, index, a, b, c, d, rule, values, statuses);
    }

    // The stages are compiled in full at their first call: what the runtime would begin with is slower than one value at a time.
    // All spans of a stage have one length, a multiple of the lanes: no step leaves any of them.
    [MethodImpl(MethodImplOptions.AggressiveOptimization | MethodImplOptions.NoInlining)]
    private static void FirstStage<TFunction, TLanes>(ReadOnlySpan<double> a, Span<double> inHand)
        where TFunction : struct, ILaneFunction
        where TLanes : struct, ILanes<TLanes>
    {
        ref double firstA = ref MemoryMarshal.GetReference(a);
        ref double firstInHand = ref MemoryMarshal.GetReference(inHand);
        for (int i = 0; i < a.Length; i += TLanes.Count)
        {
            TFunction.First(TLanes.Load(in firstA, i)).Store(ref firstInHand, i);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization | MethodImplOptions.NoInlining)]
    private static void SecondStage<TFunction, TLanes>(ReadOnlySpan<double> a, ReadOnlySpan<double> b, Span<double> inHand)
        where TFunction : struct, ILaneFunction
        where TLanes : struct, ILanes<TLanes>
    {
        ref double firstA = ref MemoryMarshal.GetReference(a);
        ref double firstB = ref MemoryMarshal.GetReference(b);
        ref double firstInHand = ref MemoryMarshal.GetReference(inHand);
        for (int i = 0; i < a.Length; i += TLanes.Count)
        {
            TFunction.Second(TLanes.Load(in firstInHand, i), TLanes.Load(in firstA, i), TLanes.Load(in firstB, i)).Store(ref firstInHand, i);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization | MethodImplOptions.NoInlining)]
    private static int LastStage<TFunction, TLanes>(
        TFunction function, ReadOnlySpan<double> inHand, ReadOnlySpan<double> a, ReadOnlySpan<double> b, ReadOnlySpan<double> c,
        ReadOnlySpan<double> d, RangeRule rule, Span<double> values, Span<Status> statuses)
        where TFunction : struct, ILaneFunction
        where TLanes : struct, ILanes<TLanes>
    {
        ref double firstInHand = ref MemoryMarshal.GetReference(inHand);
        ref double firstA = ref MemoryMarshal.GetReference(a);
        ref double firstB = ref MemoryMarshal.GetReference(b);
        ref double firstC = ref MemoryMarshal.GetReference(c);
        ref double firstD = ref MemoryMarshal.GetReference(d);
        ref double firstValue = ref MemoryMarshal.GetReference(values);
        ref Status firstStatus = ref MemoryMarshal.GetReference(statuses);
        int notOk = 0;
        for (int i = 0; i < a.Length; i += TLanes.Count)
        {
            TLanes lanesA = TLanes.Load(in firstA, i);
            TLanes lanesB = TLanes.Load(in firstB, i);
            TLanes lanesC = TLanes.Load(in firstC, i);
            TLanes lanesD = TLanes.Load(in firstD, i);
            TLanes value = TFunction.Last(TLanes.Load(in firstInHand, i), lanesA, lanesB, lanesC, lanesD, out TLanes ok);
            value.Store(ref firstValue, i);
            TLanes.StoreOk(ref firstStatus, i);
            if (!LaneCheck.All(ok))
            {
                // The inputs come from the lanes: the output may have been written over them.
                notOk += Others(
                    function, ok.MaskBits(), lanesA, lanesB, lanesC, lanesD, rule, values.Slice(i, TLanes.Count), statuses.Slice(i, TLanes.Count));
            }
        }

        return notOk;
    }

    /// <summary>The scalar call for the lanes that are not in the mask.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static int Others<TFunction, TLanes>(
        TFunction function, uint ok, TLanes a, TLanes b, TLanes c, TLanes d, RangeRule rule, Span<double> values, Span<Status> statuses)
        where TFunction : struct, ILaneFunction
        where TLanes : struct, ILanes<TLanes>
    {
        int notOk = 0;
        for (int lane = 0; lane < TLanes.Count; lane++)
        {
            if (((ok >> lane) & 1u) != 0u) { continue; }
            statuses[lane] = function.Scalar(a.Lane(lane), b.Lane(lane), c.Lane(lane), d.Lane(lane), rule, out values[lane]);
            if (statuses[lane] != Status.Ok) { notOk++; }
        }

        return notOk;
    }

    private static int Tail<TFunction>(
        TFunction function, int from, ReadOnlySpan<double> a, ReadOnlySpan<double> b, ReadOnlySpan<double> c, ReadOnlySpan<double> d, RangeRule rule,
        Span<double> values, Span<Status> statuses)
        where TFunction : struct, IBatchFunction
    {
        int notOk = 0;
        for (int i = from; i < a.Length; i++)
        {
            Status status = function.Scalar(a[i], b[i], c[i], d[i], rule, out double value);
            values[i] = value;
            statuses[i] = status;
            if (status != Status.Ok) { notOk++; }
        }

        return notOk;
    }

    private static void Check(
        ReadOnlySpan<double> first, string nameOfFirst, ReadOnlySpan<double> other, string nameOfOther, Span<double> values, string nameOfValues,
        Span<Status> statuses)
    {
        CheckLength(first.Length, nameOfFirst, other.Length, nameOfOther);
        CheckLength(first.Length, nameOfFirst, values.Length, nameOfValues);
        CheckLength(first.Length, nameOfFirst, statuses.Length, nameof(statuses));
        CheckOverlap(first, nameOfFirst, values, nameOfValues);
        CheckOverlap(other, nameOfOther, values, nameOfValues);
    }

    private static void CheckLength(int length, string name, int otherLength, string otherName)
    {
        if (otherLength == length) { return; }
        FormattableString text = $"{otherName} has {otherLength} values and {name} has {length}: all spans of a batch must have one length";
        throw new ArgumentException(FormattableString.Invariant(text), otherName);
    }

    private static void CheckOverlap(ReadOnlySpan<double> input, string name, Span<double> values, string nameOfValues)
    {
        if (!input.Overlaps(values, out int shift) || shift == 0) { return; }
        FormattableString text = $"{nameOfValues} lies {shift} values from the start of {name} in the same memory: it must be the very same span or lie apart";
        throw new ArgumentException(FormattableString.Invariant(text), nameOfValues);
    }
}
