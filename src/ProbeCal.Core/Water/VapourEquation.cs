namespace ProbeCal;

/// <summary>Published forms of the vapour pressure over water. Zero is none of them; the numbers never change: records keep them.</summary>
public enum VapourEquation
{
    /// <summary>Wagner and Pruss 1993: pure water, the reference (<see cref="VapourWagnerPruss1993"/>).</summary>
    WagnerPruss1993 = 1,
    /// <summary>Dickson, Sabine and Christian 2007: Wagner and Pruss lowered by sea salt (<see cref="VapourDickson2007"/>).</summary>
    Dickson2007 = 2,
    /// <summary>Weiss and Price 1980: fresh and sea water (<see cref="VapourWeissPrice1980"/>).</summary>
    WeissPrice1980 = 3,
    /// <summary>Benson and Krause 1980: fresh water, part of the oxygen pressure factor (<see cref="VapourBensonKrause1980"/>).</summary>
    BensonKrause1980 = 4,
    /// <summary>Green and Carritt 1967: fresh and sea water (<see cref="VapourGreenCarritt1967"/>).</summary>
    GreenCarritt1967 = 5,
    /// <summary>Hardy 1998: pure water (<see cref="VapourHardy1998"/>).</summary>
    Hardy1998 = 6,
    /// <summary>Buck 1981: pure water (<see cref="VapourBuck1981"/>).</summary>
    Buck1981 = 7,
    /// <summary>Buck 1996: pure water (<see cref="VapourBuck1996"/>).</summary>
    Buck1996 = 8,
    /// <summary>Sonntag 1990, the Magnus form of WMO-No. 8: pure water (<see cref="VapourSonntag1990"/>).</summary>
    Sonntag1990 = 9,
    /// <summary>Murray 1967: pure water (<see cref="VapourMurray1967"/>).</summary>
    Murray1967 = 10,
    /// <summary>The Antoine form of a field memorandum of 1981, No. 81.11: pure water (<see cref="VapourAntoine8111"/>).</summary>
    Antoine8111 = 11,
}
