namespace ProbeCal;

/// <summary>The gases that Core knows. Zero is none of them; the numbers never change: records keep them.</summary>
public enum Gas
{
    /// <summary>Oxygen, O2.</summary>
    Oxygen = 1,
    /// <summary>Nitrogen, N2.</summary>
    Nitrogen = 2,
    /// <summary>Argon, Ar.</summary>
    Argon = 3,
    /// <summary>Neon, Ne.</summary>
    Neon = 4,
    /// <summary>Helium, He.</summary>
    Helium = 5,
    /// <summary>Krypton, Kr.</summary>
    Krypton = 6,
    /// <summary>Xenon, Xe.</summary>
    Xenon = 7,
    /// <summary>Carbon dioxide, CO2: the undissociated gas and carbonic acid together, not total carbonate.</summary>
    CarbonDioxide = 8,
    /// <summary>Nitrous oxide, N2O.</summary>
    NitrousOxide = 9,
    /// <summary>Methane, CH4.</summary>
    Methane = 10,
    /// <summary>Carbon monoxide, CO.</summary>
    CarbonMonoxide = 11,
    /// <summary>Hydrogen, H2.</summary>
    Hydrogen = 12,
    /// <summary>Sulfur hexafluoride, SF6.</summary>
    SulfurHexafluoride = 13,
    /// <summary>Trichlorofluoromethane, CFC-11.</summary>
    Cfc11 = 14,
    /// <summary>Dichlorodifluoromethane, CFC-12.</summary>
    Cfc12 = 15,
    /// <summary>Hydrogen sulfide, H2S: the undissociated gas.</summary>
    HydrogenSulfide = 16,
    /// <summary>Ozone, O3.</summary>
    Ozone = 17,
    /// <summary>Ammonia, NH3: the undissociated gas.</summary>
    Ammonia = 18,
    /// <summary>Ethane, C2H6.</summary>
    Ethane = 19,
}
