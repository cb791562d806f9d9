namespace ProbeCal.Station.Calibrating;

/// <summary>
/// What stands in at a reference where the person enters nothing, each with its source; docs/uncertainty.md lists them. A limit of ±a that is rectangular is a/√3.
/// </summary>
internal static class MethodDefaults
{
    /// <summary>Oxygen left in a fresh sulfite solution or under flowing nitrogen, standard uncertainty, mg/L.</summary>
    public const double ZeroMilligramsPerLitre = 0.02;

    /// <summary>Source of it.</summary>
    public const string ZeroSource = "oxygen left at zero, 0.02 mg/L (our choice, no source)";

    /// <summary>Burette: ±0.25 % of the titre, rectangular, as a share.</summary>
    public const double BuretteRelative = 0.0025 / 1.7320508075688772;

    /// <summary>Source of it.</summary>
    public const string BuretteSource = "0.25 % of the titre, rectangular (our choice, no source)";

    /// <summary>Blank that nobody determined: 0 ± 0.5 % of the titre, rectangular, as a share.</summary>
    public const double BlankRelative = 0.005 / 1.7320508075688772;

    /// <summary>Source of it.</summary>
    public const string BlankSource = "not determined: 0.5 % of the titre, rectangular (our choice, no source)";

    /// <summary>Flask or aliquot of known volume: ±0.1 %, rectangular, as a share.</summary>
    public const double VolumeRelative = 0.001 / 1.7320508075688772;

    /// <summary>Source of it.</summary>
    public const string VolumeSource = "0.1 % of a volume known by weighing, rectangular (our choice, no source)";

    /// <summary>Source of the uncertainty of an iodate standard that nobody stated, of the same size as that of a volume.</summary>
    public const string StandardSource = "0.1 % of a standard made up by weighing, rectangular (our choice, no source)";

    /// <summary>Reagents: 1 mL of each, together 2 mL.</summary>
    public const double DisplacedMillilitres = 2.0;

    /// <summary>Source of it.</summary>
    public const string DisplacedSource = "1 mL of each reagent (GO-SHIP cruise reports 2021)";

    /// <summary>Displaced volume: ±2 %, rectangular, as a share.</summary>
    public const double DisplacedRelative = 0.02 / 1.7320508075688772;

    /// <summary>Source of it.</summary>
    public const string DisplacedUncertaintySource = "2 % of a dispenser, rectangular (our choice, no source)";

    /// <summary>Source of the oxygen in the reagents.</summary>
    public const string ReagentOxygenSource = "0.0017 mL of gas in 1 mL of each reagent (Murray, Riley and Wilson 1968 as in WOCE, from memory)";

    /// <summary>Oxygen in the reagents: ±30 %, rectangular, as a share: it follows the temperature of the reagents and their strength.</summary>
    public const double ReagentOxygenRelative = 0.3 / 1.7320508075688772;

    /// <summary>Source of it.</summary>
    public const string ReagentOxygenUncertaintySource = "30 % for temperature and strength of the reagents, rectangular (our choice, no source)";

    /// <summary>Humidity of gas that was bubbled through water: 100 % less up to 5 %, taken as 97.5 %.</summary>
    public const double HumidifiedPercent = 97.5;

    /// <summary>Standard uncertainty of it: ±2.5 %, rectangular, %.</summary>
    public const double HumidifiedUncertaintyPercent = 2.5 / 1.7320508075688772;

    /// <summary>Source of it.</summary>
    public const string HumidifiedSource = "95 to 100 % after bubbling through water, rectangular (our choice, no source)";

    /// <summary>
    /// Student's t for 95 % over 1.96: what the standard deviation of a few titres is enlarged by, so that an interval of 1.96 standard uncertainties still holds 95 %. From the tables of the
    /// distribution (JCGM 100, table G.2, from memory); beyond ten titres up to 5 % too large.
    /// </summary>
    /// <param name="count">Number of titres, from 2.</param>
    internal static double FewTitres(int count)
    {
        double t = count switch
        {
            2 => 12.71,
            3 => 4.30,
            4 => 3.18,
            5 => 2.78,
            6 => 2.57,
            7 => 2.45,
            8 => 2.36,
            9 => 2.31,
            10 => 2.26,
            <= 15 => 2.23,
            <= 20 => 2.14,
            <= 30 => 2.09,
            _ => 2.04,
        };
        return t / 1.96;
    }
}

/// <summary>What is known about the reach of a method, as data for guards and screens.</summary>
internal static class MethodFacts
{
    /// <summary>Least oxygen that a titration is for, µmol/kg.</summary>
    public const double TitrationLowestMicromolesPerKilogram = 20;

    /// <summary>Source of it.</summary>
    public const string TitrationLowestSource = "OceanGliders oxygen SOP";

    /// <summary>Fewest titres of which a scatter can be told.</summary>
    public const int LeastTitres = 2;

    /// <summary>Samples that are drawn beside a probe, at least.</summary>
    public const int UsualTitres = 4;

    /// <summary>Source of the number of samples and their distance.</summary>
    public const string UsualTitresSource = "4 to 6 samples, 5 to 10 min apart (OceanGliders oxygen SOP)";

    /// <summary>What in the water spoils a titration.</summary>
    public static string[] TitrationInterferents { get; } =
    [
        "sulfite", "thiosulfate", "free chlorine", "free iodine", "nitrite (unless the reagent holds azide)", "iron and other matter that binds or frees iodine",
        "organic matter that breaks down in alkali", "colour or turbidity that hides the end point", "sludge and floc",
    ];

    /// <summary>Source of the list.</summary>
    public const string TitrationInterferentsSource = "EPA method 360.1; ISO 5814:2012; nitrite: Standard Methods 4500-O (from memory)";

    /// <summary>Longest time between the drawing of the samples and the end of the titration, h.</summary>
    public const double TitrateWithinHours = 12;

    /// <summary>Source of it.</summary>
    public const string TitrateWithinSource = "2 to 12 h after drawing (GO-SHIP cruise reports 2021)";
}
