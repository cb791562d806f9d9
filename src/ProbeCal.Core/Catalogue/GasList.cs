namespace ProbeCal;

/// <summary>The gases as data, in the order of their numbers.</summary>
internal static class GasList
{
    internal static readonly GasEntry[] All =
    [
        new(Gas.Oxygen, "O2", "oxygen", "O2", "dioxygen"),
        new(Gas.Nitrogen, "N2", "nitrogen", "N2", "dinitrogen"),
        new(Gas.Argon, "Ar", "argon", "Ar"),
        new(Gas.Neon, "Ne", "neon", "Ne"),
        new(Gas.Helium, "He", "helium", "He"),
        new(Gas.Krypton, "Kr", "krypton", "Kr"),
        new(Gas.Xenon, "Xe", "xenon", "Xe"),
        new(Gas.CarbonDioxide, "CO2", "carbon dioxide", "CO2", "carbon-dioxide"),
        new(Gas.NitrousOxide, "N2O", "nitrous oxide", "N2O", "nitrous-oxide", "dinitrogen monoxide"),
        new(Gas.Methane, "CH4", "methane", "CH4"),
        new(Gas.CarbonMonoxide, "CO", "carbon monoxide", "CO", "carbon-monoxide"),
        new(Gas.Hydrogen, "H2", "hydrogen", "H2", "dihydrogen"),
        new(Gas.SulfurHexafluoride, "SF6", "sulfur hexafluoride", "SF6", "sulfur-hexafluoride", "sulphur hexafluoride"),
        new(Gas.Cfc11, "CFC-11", "trichlorofluoromethane", "CCl3F", "CFC11", "CFCl3"),
        new(Gas.Cfc12, "CFC-12", "dichlorodifluoromethane", "CCl2F2", "CFC12", "CF2Cl2"),
        new(Gas.HydrogenSulfide, "H2S", "hydrogen sulfide", "H2S", "hydrogen-sulfide", "hydrogen sulphide"),
        new(Gas.Ozone, "O3", "ozone", "O3", "trioxygen"),
        new(Gas.Ammonia, "NH3", "ammonia", "NH3"),
        new(Gas.Ethane, "C2H6", "ethane", "C2H6"),
    ];
}
