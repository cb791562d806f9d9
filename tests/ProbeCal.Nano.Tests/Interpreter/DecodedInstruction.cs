namespace ProbeCal.Nano.Tests.Interpreter;

/// <summary>What a decoded instruction does. Integers of 32 bits are kept sign-extended, so that comparisons need no width.</summary>
internal enum Operation : byte
{
    Constant,
    ObjectConstant,
    MoveBits,
    MoveAll,
    Return,
    ReturnBits,
    ReturnAll,
    EnsureInitialised,

    Jump,
    JumpIfZero,
    JumpIfNotZero,
    JumpIfNull,
    JumpIfNotNull,
    JumpTable,

    AddDouble,
    SubtractDouble,
    MultiplyDouble,
    DivideDouble,
    DivideDoubleOrThrow,
    RemainderDouble,
    RemainderDoubleOrThrow,
    NegateDouble,

    Add32,
    Subtract32,
    Multiply32,
    Divide32,
    DivideUnsigned32,
    Remainder32,
    RemainderUnsigned32,
    ShiftLeft32,
    ShiftRight32,
    ShiftRightUnsigned32,
    Negate32,
    AddChecked32,
    SubtractChecked32,
    MultiplyChecked32,

    Add64,
    Subtract64,
    Multiply64,
    Divide64,
    DivideUnsigned64,
    Remainder64,
    RemainderUnsigned64,
    ShiftLeft64,
    ShiftRight64,
    ShiftRightUnsigned64,
    Negate64,

    And,
    Or,
    Xor,
    Not,

    ToSigned8,
    ToUnsigned8,
    ToSigned16,
    ToUnsigned16,
    To32,
    ZeroExtend32,
    DoubleFromSigned,
    DoubleFromUnsigned32,
    DoubleFromUnsigned64,

    /// <summary>The integer type wanted is in the immediate value.</summary>
    IntegerFromDouble,

    // Comparisons that leave 0 or 1. "Un" means: or unordered for doubles, unsigned for integers.
    EqualDouble,
    LessDouble,
    LessUnDouble,
    GreaterDouble,
    GreaterUnDouble,
    EqualInteger,
    LessInteger,
    LessUnInteger,
    GreaterInteger,
    GreaterUnInteger,
    EqualObject,
    NotEqualObject,

    /// <summary>Comparison of doubles by the device's order; the condition is in the immediate value.</summary>
    CompareByOrder,

    // The same as jumps.
    JumpEqualDouble,
    JumpNotEqualDouble,
    JumpLessDouble,
    JumpLessUnDouble,
    JumpLessEqualDouble,
    JumpLessEqualUnDouble,
    JumpGreaterDouble,
    JumpGreaterUnDouble,
    JumpGreaterEqualDouble,
    JumpGreaterEqualUnDouble,
    JumpEqualInteger,
    JumpNotEqualInteger,
    JumpLessInteger,
    JumpLessUnInteger,
    JumpLessEqualInteger,
    JumpLessEqualUnInteger,
    JumpGreaterInteger,
    JumpGreaterUnInteger,
    JumpGreaterEqualInteger,
    JumpGreaterEqualUnInteger,
    JumpEqualObject,
    JumpNotEqualObject,
    JumpByOrder,

    IsNaN,
    IsInfinity,
    IsPositiveInfinity,
    IsNegativeInfinity,

    AddressOfSlot,
    AddressOfField,
    AddressOfStatic,
    AddressOfElement,
    LoadBits,
    LoadAll,
    StoreBits,
    StoreAll,
    LoadFieldBits,
    LoadFieldAll,
    StoreFieldBits,
    StoreFieldAll,
    LoadStaticBits,
    LoadStaticAll,
    StoreStaticBits,
    StoreStaticAll,
    LoadElementBits,
    LoadElementAll,
    StoreElementBits,
    StoreElementAll,
    Length,
    NewArray,
    NewObject,
    IsInstance,
    CastClass,

    Call,
    CallVirtual,
    CallNative,
}

/// <summary>A condition on the device's order of two doubles (-1, 0 or +1).</summary>
internal enum OrderCondition
{
    Equal,
    NotEqual,
    Less,
    LessEqual,
    Greater,
    GreaterEqual,
}

/// <summary>
/// One decoded instruction. Slots are numbered within the frame: arguments, then locals, then the evaluation stack.
/// </summary>
internal struct DecodedInstruction
{
    public Operation Operation;

    /// <summary>The slot that takes the result; for a jump, the place to go on.</summary>
    public int Target;

    public int A;
    public int B;

    /// <summary>Constant, field or static slot, condition.</summary>
    public long Immediate;

    /// <summary>Method, type or object.</summary>
    public object? Object;
}
