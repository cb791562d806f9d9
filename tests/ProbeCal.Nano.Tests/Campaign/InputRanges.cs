using System;
using System.Collections.Generic;
using System.Linq;
using System.Text.RegularExpressions;

namespace ProbeCal.Nano.Tests.Campaign;

/// <summary>
/// Where the ordinary values of a parameter lie, by its name. The ranges need not be those of the equations: their ends are
/// taken from the constants in the code itself. They only see to it that most inputs are answered and not refused.
/// </summary>
internal static class InputRanges
{
    /// <summary>The first pattern that fits the name decides.</summary>
    private static readonly (string Pattern, double Lowest, double Highest)[] Rows =
    [
        ("[uU]ncertainty", 0.0, 0.5),
        ("^(lowest|first)Celsius$", -5.0, 5.0),
        ("^(highest|last)Celsius$", 30.0, 50.0),
        ("^firstSalinity$", 0.0, 5.0),
        ("^lastSalinity$", 30.0, 42.0),
        ("^c0$", 0.002, 0.004),
        ("^c1$", 5e-5, 2e-4),
        ("^c2$", 0.0, 3e-6),
        ("^c3$", 60.0, 80.0),
        ("^c4$", -0.2, -0.05),
        ("^c5$", -15.0, -10.0),
        ("^c6$", 1.1, 1.4),
        ("^c7$", -1e-3, 1e-3),
        ("^phasePerThousandDecibar$", 0.0, 0.2),
        ("^lifetimePerKelvin$", -0.006, 0.0),
        ("^lifetimePerSquareKelvin$", -2e-5, 2e-5),
        ("^zeroPerKelvin$", -0.5, 0.5),
        ("^perKelvin$", -0.005, 0.005),
        ("^lowestHectopascal$", 0.5, 50.0),
        ("^highestHectopascal$", 150.0, 300.0),
        ("^variance", 0.01, 0.04),
        ("^covariance", -0.005, 0.005),
        ("^curvature$", -1e-4, 1e-4),
        ("^(zero|slope|curvature)Per(Kelvin|Coefficient)$", -0.01, 0.01),
        ("^first$", 0.01, 0.05),
        ("^second(Coefficient)?$", -4e-4, 4e-4),
        ("^third(Coefficient)?$", -4e-6, 4e-6),
        ("^pressureCoefficient$", -0.005, 0.005),
        ("^residualSignal$", 0.0, 1.0),
        ("^residualPerKelvin$", 0.0, 0.06),
        ("^stillFactor$", 0.7, 1.0),
        ("^firstHectopascal$", 500.0, 700.0),
        ("^lastHectopascal$", 900.0, 1200.0),
        ("^columns$", 1.0, 8.0),
        ("[cC]elsius$", 0.0, 40.0),
        ("[sS]alinity", 0.0, 42.0),
        ("^hydrostaticHectopascal$", 0.0, 6000.0),
        ("^deltaHectopascal$", -100.0, 300.0),
        ("^carbonDioxideHectopascal$", 0.0, 3.0),
        ("^partialPressure|^reference.*Hectopascal$|^oxygen.*Hectopascal$", 0.0, 250.0),
        ("^moleFraction$", 0.0, 1.0),
        ("^from(Temperature|Salinity|Pressure|MoleFraction|Humidity|Equation)$", -0.5, 0.5),
        ("[hH]ectopascal$", 520.0, 1110.0),
        ("[kK]ilopascal$", 52.0, 111.0),
        ("^bar$|[aA]tmospheres$", 0.52, 1.1),
        ("[mM]illimetresOfMercury$", 390.0, 830.0),
        ("[iI]nchesOfMercury$", 15.0, 33.0),
        ("^psi$|[pP]oundsPerSquareInch$", 7.5, 16.0),
        ("[aA]ltitudeMetres$", -600.0, 11000.0),
        ("[mM]illigramsPerLitre(PerSignal)?$|[mM]illilitresPerLitre$|[mM]illigramsPerKilogram$", 0.0, 15.0),
        ("[mM]icromolesPer(Litre|Kilogram)$", 0.0, 450.0),
        ("^molesPerLitre$", 0.0, 0.1),
        ("^sumOfTerms$", -0.5, 1.0),
        ("^molesPerLitreAtmosphere$", 1e-4, 0.1),
        ("^gramsPerMole$", 2.0, 100.0),
        ("[dD]ensity", 990.0, 1030.0),
        ("^conductivityMicrosiemensPerCentimetre$", 60.0, 1000.0),
        ("[mM]icrosiemensPerCentimetre$", 0.0, 59000.0),
        ("^millisiemensPerCentimetre$", 0.0, 50.0),
        ("[dD]ecibar$", 0.0, 200.0),
        ("^gramsPerKilogram$", 0.0, 23.0),
        ("[dD]epthMetres$", 0.0, 60.0),
        ("[pP]ercent$", 0.0, 120.0),
        ("^moleFraction$", 0.0, 1.0),
        ("^from(Temperature|Salinity|Pressure|MoleFraction|Humidity|Equation)$", 0.0, 0.5),
        ("^constant$", 1e-6, 1e3),
        ("^coefficient$", 0.005, 0.06),
        ("^ratePerKelvin$", 0.005, 0.06),
        ("^ratePerDay$", 0.0, 0.01),
        ("^days$", 0.0, 400.0),
        ("^gain$", 0.3, 3.0),
        ("^flow|^airToWaterRatio$", 0.8, 1.2),
        ("^slope$", 0.05, 5.0),
        ("^zero$|^zeroResponse$", -1.0, 1.0),
        ("^signal$|^response$", 0.0, 250.0),
        ("^limitPerSecond$", 1e-5, 3e-3),
        ("^timeConstantSeconds$", 0.0, 120.0),
        ("^seconds(Before|After|Between)$", 1.0, 60.0),
        ("^(before|middle|after|last)$", 100.0, 200.0),
        ("^windowSeconds$", 10.0, 300.0),
        ("^kelvin$", 0.01, 0.5),
        ("^resolution$", 1e-4, 0.1),
        ("^lowest$", -5.0, 0.0),
        ("^highest$", 200.0, 300.0),
        ("^timesSeconds$", 0.0, 600.0),
        ("^values$", 10.0, 20.0),
        ("^start$", 0.0, 8.0),
        ("^count$", 4.0, 20.0),
        ("^leastCount$", 2.0, 40.0),
        ("^x$", 0.1, 20.0),
        ("^y$", -5.0, 5.0),
    ];

    private static readonly Dictionary<string, (double Lowest, double Highest)?> Known = [];

    public static (double Lowest, double Highest)? For(string name)
    {
        if (!Known.TryGetValue(name, out (double, double)? range))
        {
            (string Pattern, double Lowest, double Highest) row = Rows.FirstOrDefault(r => Regex.IsMatch(name, r.Pattern, RegexOptions.CultureInvariant));
            range = row.Pattern == null ? null : (row.Lowest, row.Highest);
            Known.Add(name, range);
        }
        return range;
    }
}
