using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// From what a transfer standard showed in the same water to the partial pressure. A concentration is taken back with the water's own salinity, so
/// that the standard must have counted it in; a percentage says which pressure it is of.
/// </summary>
internal static class TransferReference
{
    internal const string MilligramsPerLitre = "mg/L";
    internal const string MicromolesPerLitre = "umol/L";
    internal const string Hectopascal = "hPa";
    internal const string PercentLocal = "%local";
    internal const string PercentOneAtmosphere = "%1atm";

    internal static string[] Units { get; } = [MilligramsPerLitre, MicromolesPerLitre, Hectopascal, PercentLocal, PercentOneAtmosphere];

    internal static ReferenceSum Sum(References.Place at, RecordedTransfer transfer)
    {
        double shown = transfer.Shown.Value + (transfer.Correction?.Value ?? 0);
        ReferenceSum sum;
        double perHectopascal;
        double perMilligram;
        switch (transfer.Shown.Unit)
        {
            case Hectopascal:
                sum = OfPartialPressure(at, shown, 0, 0, 0, out perMilligram);
                perHectopascal = 1;
                break;
            case MilligramsPerLitre:
                RefuseTotal(at, transfer);
                sum = OfConcentration(at, shown, 0, out perHectopascal);
                perMilligram = 1;
                break;
            case MicromolesPerLitre:
                RefuseTotal(at, transfer);
                perMilligram = GasUnits.GramsPerMole(at.Gas) / 1000;
                sum = OfConcentration(at, shown * perMilligram, 0, out double perConcentration);
                perHectopascal = perMilligram * perConcentration;
                break;
            case PercentLocal:
            case PercentOneAtmosphere:
                RefuseTotal(at, transfer);
                bool local = transfer.Shown.Unit == PercentLocal;
                double pressure = local ? at.Pressure : PressureUnits.HectopascalPerAtmosphere;
                double fraction = DryAir.MoleFraction(at.Gas);
                at.Require(GasEquilibrium.PartialPressure(at.Gas, at.Celsius, at.Salinity, pressure, fraction, 100, RangeRule.Refuse, out double saturated));
                at.Require(GasEquilibrium.PartialPressureSensitivities(
                    at.Gas, at.Celsius, at.Salinity, pressure, fraction, 100, RangeRule.Refuse,
                    out double kelvin, out double salinity, out double ofPressure, out _, out _));
                double share = shown / 100;
                sum = OfPartialPressure(at, share * saturated, share * kelvin, share * salinity, local ? share * ofPressure : 0, out double perPartialPressure);
                perHectopascal = saturated / 100;
                perMilligram = perHectopascal * perPartialPressure;
                break;
            default:
                throw Wrong.Input("transfer standard, unit", transfer.Shown.Unit, $"there is no such unit of a standard{NearestName.DidYouMean(transfer.Shown.Unit, Units)}; there are {string.Join(", ", Units)}");
        }

        sum.Add(ReferenceInputs.Shown(transfer.Standard), transfer.Shown, perHectopascal, perMilligram);
        if (transfer.Correction is RecordedQuantity correction)
        {
            sum.Add(ReferenceInputs.Correction(transfer.Standard), correction, perHectopascal, perMilligram);
        }

        return sum;
    }

    /// <summary>A concentration, and the partial pressure that it is in this water.</summary>
    /// <param name="at">The place.</param>
    /// <param name="milligrams">Concentration at the temperature of the place, mg/L.</param>
    /// <param name="milligramsPerKelvin">How that concentration itself follows the temperature of the place, mg/L per K.</param>
    /// <param name="perMilligram">hPa per mg/L.</param>
    internal static ReferenceSum OfConcentration(References.Place at, double milligrams, double milligramsPerKelvin, out double perMilligram)
    {
        at.Require(GasEquilibrium.PartialPressureFromConcentration(
            at.Gas, at.Equation, at.Celsius, at.Salinity, at.Pressure, milligrams, RangeRule.Refuse, out double hectopascal));
        at.Require(GasEquilibrium.PartialPressureFromConcentrationSensitivities(
            at.Gas, at.Equation, at.Celsius, at.Salinity, at.Pressure, milligrams, RangeRule.Refuse,
            out double kelvin, out double salinity, out double pressure, out perMilligram));
        ReferenceSum sum = new() { Hectopascal = hectopascal, MilligramsPerLitre = milligrams };
        at.Add(sum, kelvin + (perMilligram * milligramsPerKelvin), milligramsPerKelvin, salinity, 0, pressure, 0);
        // Concentration is equation times partial pressure: what the equation has too much, the partial pressure has too little.
        at.AddEquation(sum, -hectopascal, 0);
        return sum;
    }

    /// <summary>A partial pressure with its own slopes, and the concentration that it is in this water.</summary>
    private static ReferenceSum OfPartialPressure(References.Place at, double hectopascal, double kelvin, double salinity, double pressure, out double ofPartialPressure)
    {
        ReferenceSum sum = new() { Hectopascal = hectopascal };
        if (at.IsTotalPressure)
        {
            ofPartialPressure = 0;
            return sum;
        }

        at.Require(GasEquilibrium.ConcentrationFromPartialPressure(
            at.Gas, at.Equation, at.Celsius, at.Salinity, at.Pressure, hectopascal, RangeRule.Refuse, out double milligrams));
        at.Require(GasEquilibrium.ConcentrationSensitivities(
            at.Gas, at.Equation, at.Celsius, at.Salinity, at.Pressure, hectopascal, RangeRule.Refuse,
            out double ofKelvin, out double ofSalinity, out double ofPressure, out ofPartialPressure));
        sum.MilligramsPerLitre = milligrams;
        at.Add(
            sum, kelvin, ofKelvin + (ofPartialPressure * kelvin), salinity, ofSalinity + (ofPartialPressure * salinity), pressure, ofPressure + (ofPartialPressure * pressure));
        at.AddEquation(sum, 0, milligrams);
        return sum;
    }

    private static void RefuseTotal(References.Place at, RecordedTransfer transfer)
    {
        if (at.IsTotalPressure)
        {
            throw References.Missing(at.Plan, $"{transfer.Shown.Unit} is no total gas pressure; write what the standard shows in hPa");
        }
    }
}
