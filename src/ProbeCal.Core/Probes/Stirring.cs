namespace ProbeCal;

/// <summary>How the water moves past the membrane. An amperometric probe consumes oxygen, and in still water reads low.</summary>
public enum Stirring
{
    /// <summary>Stirred, pumped or in a steady current.</summary>
    Stirred = 1,
    /// <summary>Still water: the film before the membrane is depleted, 10–50 % low (from memory).</summary>
    Still = 2,
    /// <summary>The probe does not need stirring.</summary>
    FlowInsensitive = 3,
}
