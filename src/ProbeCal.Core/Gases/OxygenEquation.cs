namespace ProbeCal;

/// <summary>The published equations for oxygen in equilibrium with air. Zero is none of them, so that none is taken by default.</summary>
public enum OxygenEquation
{
    /// <summary>Benson and Krause 1984, Eq. 32: mg/L. The default of the library; behind the tables of the public field standards.</summary>
    BensonKrause1984 = 1,
    /// <summary>Garcia and Gordon 1992, Benson–Krause column: µmol/kg. Also below 0 °C in sea water.</summary>
    GarciaGordon1992 = 2,
}
