using System;
using System.Collections.Generic;
using System.Linq;
using static ProbeCal.InputQuantity;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>Every function of the water and gas rooms that can refuse an input.</summary>
internal static class CoreFunctions
{
    private const double Low = 506.625;
    private const double High = 1114.575;
    private const double None = double.NaN;

    private static readonly Input Celsius = new(Temperature, 15.0, 0.0, 40.0);
    private static readonly Input SeaCelsius = new(Temperature, 15.0, None, 40.0);
    private static readonly Input AirCelsius = new(Temperature, 15.0, -2.0, 40.0);
    private static readonly Input Salt = new(Salinity, 20.0, 0.0, 40.0);
    private static readonly Input SeaSalt = new(Salinity, 20.0, 0.0, 42.0);
    private static readonly Input Total = new(Pressure, 980.0, Low, High);
    private static readonly Input Partial = new(PartialPressure, 190.0, None, High);
    private static readonly Input Milligrams = new(Concentration, 7.5, None, None);
    private static readonly Input Percent = new(InputQuantity.Saturation, 90.0, None, None);
    private static readonly Input Fraction = new(MoleFraction, 0.2, 0.0, 1.0);
    private static readonly Input Relative = new(Humidity, 60.0, 0.0, 100.0);
    private static readonly Input Altitude = new(InputQuantity.Altitude, 640.0, -610.0, 11000.0);
    private static readonly Input AnyPressure = new(Pressure, 940.0, None, None);
    private static readonly Input AnyPartial = new(PartialPressure, 190.0, None, None);
    private static readonly Input Constant = new(Coefficient, 1.26e-3, None, None);
    private static readonly Input Rho = new(Density, 998.0, None, None);
    private static readonly Input Spread = new(Uncertainty, 0.1, 0.0, None);

    private static readonly Input Boiling = new(Temperature, 15.0, 0.0, 100.0);
    private static readonly Input SaltCelsius = new(Temperature, 15.0, -2.0, 35.0);
    private static readonly Input Conductivity = new(Conductance, 21.0, 0.0, None);
    private static readonly Input Decibar = new(Depth, 120.0, 0.0, 10000.0);
    private static readonly Input OutdoorCelsius = new(Temperature, 11.0, -80.0, 60.0);
    private static readonly Input Delta = new(Pressure, 70.0, None, 10132.5);
    private static readonly Input Little = new(PartialPressure, 1.2, -1114.575, None);
    private static readonly Input Gauge = new(PartialPressure, 190.0, -1114.575, None);
    private static readonly Input Brine = new(Temperature, 35.0, 0.0, 90.0);
    private static readonly Input Molar = new(Concentration, 0.8, 0.0, 5.0);
    private static readonly Input Above = new(Depth, 2100.0, 0.0, 101325.0);

    private static readonly Lazy<Dictionary<string, CoreFunction>> ByName = new(() => All().ToDictionary(f => f.Name));

    internal static CoreFunction Find(string name)
    {
        return ByName.Value[name];
    }

    internal static IEnumerable<CoreFunction> All()
    {
        yield return One("VapourBensonKrause1980.Pressure", [Celsius], (double[] x, RangeRule r, out double v) => VapourBensonKrause1980.Pressure(x[0], r, out v));
        yield return One("VapourWagnerPruss1993.Pressure", [new Input(Temperature, 15.0, 0.0, 373.946)], (double[] x, RangeRule r, out double v) => VapourWagnerPruss1993.Pressure(x[0], r, out v));
        yield return One("DensityEos80.Density", [AirCelsius, SeaSalt], (double[] x, RangeRule r, out double v) => DensityEos80.Density(x[0], x[1], r, out v));
        yield return new("DensityEos80.Sensitivities", true, [AirCelsius, SeaSalt], (x, r) => (DensityEos80.Sensitivities(x[0], x[1], r, out double a, out double b), [a, b]));
        yield return One("FreezingPoint.Celsius", [SeaSalt], (double[] x, RangeRule r, out double v) => FreezingPoint.Celsius(x[0], r, out v));
        yield return One("SpecificConductance.Salinity", [new Input(Conductance, 800.0, 0.0, 59000.0)], (double[] x, RangeRule r, out double v) => SpecificConductance.Salinity(x[0], r, out v));
        yield return One("DensityTanaka2001.Density", [Celsius], (double[] x, RangeRule r, out double v) => DensityTanaka2001.Density(x[0], r, out v));
        yield return One("DensityKell1975.Density", [new Input(Temperature, 15.0, 0.0, 150.0)], (double[] x, RangeRule r, out double v) => DensityKell1975.Density(x[0], r, out v));
        yield return One("VapourHardy1998.Pressure", [Boiling], (double[] x, RangeRule r, out double v) => VapourHardy1998.Pressure(x[0], r, out v));
        yield return One("VapourBuck1981.Pressure", [new Input(Temperature, 15.0, -20.0, 50.0)], (double[] x, RangeRule r, out double v) => VapourBuck1981.Pressure(x[0], r, out v));
        yield return One("VapourBuck1996.Pressure", [Boiling], (double[] x, RangeRule r, out double v) => VapourBuck1996.Pressure(x[0], r, out v));
        yield return One("VapourSonntag1990.Pressure", [new Input(Temperature, 15.0, -45.0, 60.0)], (double[] x, RangeRule r, out double v) => VapourSonntag1990.Pressure(x[0], r, out v));
        yield return One("VapourMurray1967.Pressure", [new Input(Temperature, 15.0, -20.0, 50.0)], (double[] x, RangeRule r, out double v) => VapourMurray1967.Pressure(x[0], r, out v));
        yield return One("VapourAntoine8111.Pressure", [new Input(Temperature, 15.0, 0.0, 60.0)], (double[] x, RangeRule r, out double v) => VapourAntoine8111.Pressure(x[0], r, out v));
        yield return One("VapourDickson2007.Pressure", [Celsius, Salt], (double[] x, RangeRule r, out double v) => VapourDickson2007.Pressure(x[0], x[1], r, out v));
        yield return One("VapourWeissPrice1980.Pressure", [Celsius, Salt], (double[] x, RangeRule r, out double v) => VapourWeissPrice1980.Pressure(x[0], x[1], r, out v));
        yield return One("VapourGreenCarritt1967.Pressure", [Celsius, Salt], (double[] x, RangeRule r, out double v) => VapourGreenCarritt1967.Pressure(x[0], x[1], r, out v));
        yield return One("VapourPressure.Hectopascal, WeissPrice1980", [Celsius, Salt], (double[] x, RangeRule r, out double v) => VapourPressure.Hectopascal(VapourEquation.WeissPrice1980, x[0], x[1], r, out v));
        yield return One("PracticalSalinity.FromConductivity", [Conductivity, SaltCelsius, Decibar], (double[] x, RangeRule r, out double v) => PracticalSalinity.FromConductivity(x[0], x[1], x[2], r, out v));
        yield return new("PracticalSalinity.Sensitivities", true, [Conductivity, SaltCelsius, Decibar], (x, r) => (PracticalSalinity.Sensitivities(x[0], x[1], x[2], r, out double a, out double b), [a, b]));
        yield return One("Chlorinity.Salinity", [new Input(Salinity, 8.0, 0.0, 42.0 / 1.80655)], (double[] x, RangeRule r, out double v) => Chlorinity.Salinity(x[0], r, out v));
        yield return One("ConductivityCompensation.Linear", [new Input(Conductance, 400.0, 0.0, None), Celsius], (double[] x, RangeRule r, out double v) => ConductivityCompensation.Linear(x[0], x[1], r, out v));
        yield return One("ConductivityCompensation.NaturalWater", [new Input(Conductance, 400.0, 60.0, 1000.0), new Input(Temperature, 15.0, 0.0, 35.0)], (double[] x, RangeRule r, out double v) => ConductivityCompensation.NaturalWater(x[0], x[1], r, out v));
        yield return Strict("SeaLevelReduction.StandardCelsius", [Altitude], (double[] x, RangeRule r, out double v) => SeaLevelReduction.StandardCelsius(x[0], out v));
        yield return Strict("SeaLevelReduction.StationPressure", [AnyPressure, Altitude, OutdoorCelsius], (double[] x, RangeRule r, out double v) => SeaLevelReduction.StationPressure(x[0], x[1], x[2], out v));
        yield return new("SeaLevelReduction.Sensitivities", false, [AnyPressure, Altitude, OutdoorCelsius], (x, r) => (SeaLevelReduction.Sensitivities(x[0], x[1], x[2], out double a, out double b, out double c), [a, b, c]));
        yield return Strict("SeaLevelReduction.StandardUncertainty", [AnyPressure, Altitude, OutdoorCelsius, Spread, Spread, Spread], (double[] x, RangeRule r, out double v) => SeaLevelReduction.StandardUncertainty(x[0], x[1], x[2], x[3], x[4], x[5], out v));
        yield return One("HydrostaticPressure.Hectopascal", [new Input(Depth, 12.0, 0.0, 1000.0), Rho], (double[] x, RangeRule r, out double v) => HydrostaticPressure.Hectopascal(x[0], x[1], r, out v));
        yield return One("Enns1965.Factor", [Celsius, Above], (double[] x, RangeRule r, out double v) => Enns1965.Factor(Gas.Oxygen, x[0], x[1], r, out v));
        yield return new("Enns1965.Sensitivities", true, [Celsius, Above], (x, r) => (Enns1965.Sensitivities(Gas.Nitrogen, x[0], x[1], r, out double a, out double b), [a, b]));
        yield return Strict("TotalDissolvedGas.Percent", [Delta, AnyPressure], (double[] x, RangeRule r, out double v) => TotalDissolvedGas.Percent(x[0], x[1], out v));
        yield return Strict("TotalDissolvedGas.CompensationDepth", [Delta, Rho], (double[] x, RangeRule r, out double v) => TotalDissolvedGas.CompensationDepth(x[0], x[1], out v));
        yield return Strict("TotalDissolvedGas.UncompensatedDelta", [Delta, new Input(Depth, 12.0, 0.0, 1000.0), Rho], (double[] x, RangeRule r, out double v) => TotalDissolvedGas.UncompensatedDelta(x[0], x[1], x[2], out v));
        yield return new("TotalDissolvedGas.NitrogenArgon", true, [Delta, Total, Celsius, Salt, Gauge, Little], (x, r) => (TotalDissolvedGas.NitrogenArgon(x[0], x[1], x[2], x[3], x[4], x[5], r, out double a, out double b), [a, b]));
        yield return new("TotalDissolvedGas.NitrogenArgonSensitivities", true, [Delta, Total, Celsius, Salt, Gauge, Little], (x, r) => (TotalDissolvedGas.NitrogenArgonSensitivities(x[0], x[1], x[2], x[3], x[4], x[5], r, out double a, out double b, out double c, out double d, out double e, out double f), [a, b, c, d, e, f]));
        yield return Strict("TotalDissolvedGasUncertainty.Percent", [Delta, AnyPressure, Spread, Spread], (double[] x, RangeRule r, out double v) => TotalDissolvedGasUncertainty.Percent(x[0], x[1], true, x[2], x[3], out v));
        yield return new("TotalDissolvedGasUncertainty.Components", true, [Delta, Total, Celsius, Salt, Milligrams, Little, Spread, Spread, Spread, Spread, Spread], (x, r) => (TotalDissolvedGasUncertainty.Components(SolubilityEquation.BensonKrause1984, x[0], x[1], x[2], x[3], x[4], x[5], false, x[6], x[7], x[8], x[9], x[10], r, out double a, out double b, out double c, out double d), [a, b, c, d]));
        yield return One("SaltingOutWeisenbergerSchumpe1996.Term", [Brine, Molar], (double[] x, RangeRule r, out double v) => SaltingOutWeisenbergerSchumpe1996.Term(Ion.Calcium, Gas.Methane, x[0], x[1], r, out v));
        yield return One("SaltingOutWeisenbergerSchumpe1996.Sensitivity", [Brine, Molar], (double[] x, RangeRule r, out double v) => SaltingOutWeisenbergerSchumpe1996.Sensitivity(Ion.Calcium, Gas.Methane, x[0], x[1], r, out v));
        yield return Strict("SaltingOutWeisenbergerSchumpe1996.Factor", [new Input(Coefficient, 0.1, None, None)], (double[] x, RangeRule r, out double v) => SaltingOutWeisenbergerSchumpe1996.Factor(x[0], out v));
        yield return Strict("StandardAtmosphere.Pressure", [Altitude], (double[] x, RangeRule r, out double v) => StandardAtmosphere.Pressure(x[0], out v));
        yield return Strict("StandardAtmosphere.ReduceToSeaLevel", [AnyPressure, Altitude], (double[] x, RangeRule r, out double v) => StandardAtmosphere.ReduceToSeaLevel(x[0], x[1], out v));
        yield return Strict("StandardAtmosphere.FromSeaLevel", [AnyPressure, Altitude], (double[] x, RangeRule r, out double v) => StandardAtmosphere.FromSeaLevel(x[0], x[1], out v));

        yield return One("BensonKrause1984.MilligramsPerLitre", [Celsius, Salt, Total], (double[] x, RangeRule r, out double v) => BensonKrause1984.MilligramsPerLitre(x[0], x[1], x[2], r, out v));
        yield return One("BensonKrause1984.PressureFactor", [Celsius, Total], (double[] x, RangeRule r, out double v) => BensonKrause1984.PressureFactor(x[0], x[1], r, out v));
        yield return new("BensonKrause1984.Sensitivities", true, [Celsius, Salt, Total], (x, r) => (BensonKrause1984.Sensitivities(x[0], x[1], x[2], r, out double a, out double b, out double c), [a, b, c]));
        yield return One("GarciaGordon1992.MicromolesPerKilogram", [SeaCelsius, SeaSalt, Total], (double[] x, RangeRule r, out double v) => GarciaGordon1992.MicromolesPerKilogram(x[0], x[1], x[2], r, out v));
        yield return new("GarciaGordon1992.Sensitivities", true, [SeaCelsius, SeaSalt, Total], (x, r) => (GarciaGordon1992.Sensitivities(x[0], x[1], x[2], r, out double a, out double b, out double c), [a, b, c]));

        yield return One("OxygenEquilibrium.PartialPressure", [AirCelsius, Total], (double[] x, RangeRule r, out double v) => OxygenEquilibrium.PartialPressure(x[0], x[1], r, out v));
        yield return new("OxygenEquilibrium.PartialPressureSensitivities", true, [AirCelsius, Total], (x, r) => (OxygenEquilibrium.PartialPressureSensitivities(x[0], x[1], r, out double a, out double b), [a, b]));
        foreach (CoreFunction function in Equilibrium(SolubilityEquation.BensonKrause1984, Celsius, Salt)) { yield return function; }
        foreach (CoreFunction function in Equilibrium(SolubilityEquation.GarciaGordon1992, SeaCelsius, SeaSalt)) { yield return function; }

        yield return One("Saturation.PercentLocal", [Partial, AirCelsius, Total], (double[] x, RangeRule r, out double v) => ProbeCal.Saturation.PercentLocal(x[0], x[1], x[2], r, out v));
        yield return One("Saturation.PercentOneAtmosphere", [Partial, AirCelsius], (double[] x, RangeRule r, out double v) => ProbeCal.Saturation.PercentOneAtmosphere(x[0], x[1], r, out v));
        yield return new("Saturation.PercentLocalSensitivities", true, [Partial, AirCelsius, Total], (x, r) => (ProbeCal.Saturation.PercentLocalSensitivities(x[0], x[1], x[2], r, out double a, out double b, out double c), [a, b, c]));
        yield return new("Saturation.PercentOneAtmosphereSensitivities", true, [Partial, AirCelsius], (x, r) => (ProbeCal.Saturation.PercentOneAtmosphereSensitivities(x[0], x[1], r, out double a, out double b), [a, b]));
        yield return One("Saturation.PartialPressureFromPercentLocal", [Percent, AirCelsius, Total], (double[] x, RangeRule r, out double v) => ProbeCal.Saturation.PartialPressureFromPercentLocal(x[0], x[1], x[2], r, out v));
        yield return One("Saturation.PartialPressureFromPercentOneAtmosphere", [Percent, AirCelsius], (double[] x, RangeRule r, out double v) => ProbeCal.Saturation.PartialPressureFromPercentOneAtmosphere(x[0], x[1], r, out v));

        yield return Strict("HenryLaw.MolesPerLitre", [Constant, AnyPartial], (double[] x, RangeRule r, out double v) => HenryLaw.MolesPerLitre(x[0], x[1], out v));
        yield return Strict("HenryLaw.GramsPerLitre", [Constant, AnyPartial, new Input(Coefficient, 32.0, None, None)], (double[] x, RangeRule r, out double v) => HenryLaw.GramsPerLitre(x[0], x[1], x[2], out v));
        yield return Strict("HenryLaw.PartialPressure", [Constant, new Input(Concentration, 2.0e-4, None, None)], (double[] x, RangeRule r, out double v) => HenryLaw.PartialPressure(x[0], x[1], out v));
        yield return Strict("OxygenUnits.MicromolesPerKilogramFromMilligramsPerLitre", [Milligrams, Rho], (double[] x, RangeRule r, out double v) => OxygenUnits.MicromolesPerKilogramFromMilligramsPerLitre(x[0], x[1], out v));
        yield return Strict("OxygenUnits.MilligramsPerLitreFromMicromolesPerKilogram", [Milligrams, Rho], (double[] x, RangeRule r, out double v) => OxygenUnits.MilligramsPerLitreFromMicromolesPerKilogram(x[0], x[1], out v));
        yield return Strict("OxygenUnits.MilligramsPerKilogramFromMilligramsPerLitre", [Milligrams, Rho], (double[] x, RangeRule r, out double v) => OxygenUnits.MilligramsPerKilogramFromMilligramsPerLitre(x[0], x[1], out v));
        foreach (Gas gas in Enum.GetValues<Gas>())
        {
            foreach (CoreFunction function in GasPhase(gas)) { yield return function; }
        }

        foreach ((Gas gas, SolubilityEquation equation) in Pairs())
        {
            foreach (CoreFunction function in GasPair(gas, equation)) { yield return function; }
        }

        yield return Strict("HenryConversion.Convert", [Constant, new Input(Temperature, 15.0, None, None), Rho], (double[] x, RangeRule r, out double v) => HenryConversion.Convert(HenryForm.Hcp, HenryForm.Kpx, x[0], x[1], x[2], out v));
        yield return One("OxygenUncertainty.PartialPressure", [AirCelsius, Total, Spread, Spread], (double[] x, RangeRule r, out double v) => OxygenUncertainty.PartialPressure(x[0], x[1], x[2], x[3], r, out v));
    }

    /// <summary>Every gas with every equation that covers it.</summary>
    internal static IEnumerable<(Gas Gas, SolubilityEquation Equation)> Pairs()
    {
        foreach (Gas gas in Enum.GetValues<Gas>())
        {
            foreach (SolubilityEquation equation in Enum.GetValues<SolubilityEquation>())
            {
                if (GasSolubility.Covers(gas, equation)) { yield return (gas, equation); }
            }
        }
    }

    private static IEnumerable<CoreFunction> GasPhase(Gas gas)
    {
        Input total = Total with { Highest = GasEquilibrium.HighestHectopascal(gas) };
        Input[] inputs = [AirCelsius, SeaSalt, total, Fraction, Relative];
        yield return One("GasEquilibrium.PartialPressure, " + gas, inputs, (double[] x, RangeRule r, out double v) => GasEquilibrium.PartialPressure(gas, x[0], x[1], x[2], x[3], x[4], r, out v));
        yield return new("GasEquilibrium.PartialPressureSensitivities, " + gas, true, inputs, (x, r) => (GasEquilibrium.PartialPressureSensitivities(gas, x[0], x[1], x[2], x[3], x[4], r, out double a, out double b, out double c, out double d, out double e), [a, b, c, d, e]));
    }

    private static IEnumerable<CoreFunction> GasPair(Gas gas, SolubilityEquation e)
    {
        double highestSalinity = GasSolubility.HighestSalinity(e);
        double ordinarySalinity = highestSalinity / 2.0;
        double highest = GasEquilibrium.HighestHectopascal(gas);
        // The lower end of Garcia and Gordon moves with the salinity: it is the one at the ordinary salinity.
        Input t = new(Temperature, 15.0, GasSolubility.LowestCelsius(gas, e, ordinarySalinity), GasSolubility.HighestCelsius(e));
        Input s = new(Salinity, ordinarySalinity, 0.0, highestSalinity);
        Input total = Total with { Highest = highest };
        Input partial = Partial with { Highest = highest };
        GasEquilibrium.ConcentrationFromPartialPressure(gas, e, 15.0, ordinarySalinity, 980.0, 190.0, RangeRule.Refuse, out double ordinary);
        Input amount = Milligrams with { Ordinary = ordinary };
        string pair = ", " + gas + " " + e;
        Input[] mixture = [t, s, total, Fraction, Relative];
        Input[] given = [t, s, total, partial];
        Input[] found = [t, s, total, amount];
        yield return One("GasEquilibrium.MilligramsPerLitre" + pair, mixture, (double[] x, RangeRule r, out double v) => GasEquilibrium.MilligramsPerLitre(gas, e, x[0], x[1], x[2], x[3], x[4], r, out v));
        yield return new("GasEquilibrium.MilligramsPerLitreSensitivities" + pair, true, mixture, (x, r) => (GasEquilibrium.MilligramsPerLitreSensitivities(gas, e, x[0], x[1], x[2], x[3], x[4], r, out double a, out double b, out double c, out double d, out double f), [a, b, c, d, f]));
        yield return One("GasEquilibrium.ConcentrationFromPartialPressure" + pair, given, (double[] x, RangeRule r, out double v) => GasEquilibrium.ConcentrationFromPartialPressure(gas, e, x[0], x[1], x[2], x[3], r, out v));
        yield return new("GasEquilibrium.ConcentrationSensitivities" + pair, true, given, (x, r) => (GasEquilibrium.ConcentrationSensitivities(gas, e, x[0], x[1], x[2], x[3], r, out double a, out double b, out double c, out double d), [a, b, c, d]));
        yield return One("GasEquilibrium.PartialPressureFromConcentration" + pair, found, (double[] x, RangeRule r, out double v) => GasEquilibrium.PartialPressureFromConcentration(gas, e, x[0], x[1], x[2], x[3], r, out v));
        yield return new("GasEquilibrium.PartialPressureFromConcentrationSensitivities" + pair, true, found, (x, r) => (GasEquilibrium.PartialPressureFromConcentrationSensitivities(gas, e, x[0], x[1], x[2], x[3], r, out double a, out double b, out double c, out double d), [a, b, c, d]));
        yield return One("GasUncertainty.EquationRelative" + pair, [t, s, total], (double[] x, RangeRule r, out double v) => GasUncertainty.EquationRelative(gas, e, x[0], x[1], x[2], r, out v));
        yield return One("HenryLaw.Constant" + pair, [t, s], (double[] x, RangeRule r, out double v) => HenryLaw.Constant(gas, e, x[0], x[1], r, out v));
    }

    private static IEnumerable<CoreFunction> Equilibrium(SolubilityEquation e, Input t, Input s)
    {
        yield return One("OxygenEquilibrium.MilligramsPerLitre, " + e, [t, s, Total], (double[] x, RangeRule r, out double v) => OxygenEquilibrium.MilligramsPerLitre(e, x[0], x[1], x[2], r, out v));
        yield return new("OxygenEquilibrium.MilligramsPerLitreSensitivities, " + e, true, [t, s, Total], (x, r) => (OxygenEquilibrium.MilligramsPerLitreSensitivities(e, x[0], x[1], x[2], r, out double a, out double b, out double c), [a, b, c]));
        yield return One("OxygenEquilibrium.ConcentrationFromPartialPressure, " + e, [t, s, Total, Partial], (double[] x, RangeRule r, out double v) => OxygenEquilibrium.ConcentrationFromPartialPressure(e, x[0], x[1], x[2], x[3], r, out v));
        yield return new("OxygenEquilibrium.ConcentrationSensitivities, " + e, true, [t, s, Total, Partial], (x, r) => (OxygenEquilibrium.ConcentrationSensitivities(e, x[0], x[1], x[2], x[3], r, out double a, out double b, out double c, out double d), [a, b, c, d]));
        yield return One("OxygenEquilibrium.PartialPressureFromConcentration, " + e, [t, s, Total, Milligrams], (double[] x, RangeRule r, out double v) => OxygenEquilibrium.PartialPressureFromConcentration(e, x[0], x[1], x[2], x[3], r, out v));
        yield return new("OxygenEquilibrium.PartialPressureFromConcentrationSensitivities, " + e, true, [t, s, Total, Milligrams], (x, r) => (OxygenEquilibrium.PartialPressureFromConcentrationSensitivities(e, x[0], x[1], x[2], x[3], r, out double a, out double b, out double c, out double d), [a, b, c, d]));
        yield return One("OxygenUncertainty.EquationRelative, " + e, [s], (double[] x, RangeRule r, out double v) => OxygenUncertainty.EquationRelative(e, x[0], r, out v));
        yield return One("OxygenUncertainty.MilligramsPerLitre, " + e, [t, s, Total, Spread, Spread, Spread], (double[] x, RangeRule r, out double v) => OxygenUncertainty.MilligramsPerLitre(e, x[0], x[1], x[2], x[3], x[4], x[5], r, out v));
    }

    private delegate Status Single(double[] inputs, RangeRule rule, out double value);

    private static CoreFunction One(string name, Input[] inputs, Single call)
    {
        return new CoreFunction(name, true, inputs, (x, r) => (call(x, r, out double v), [v]));
    }

    private static CoreFunction Strict(string name, Input[] inputs, Single call)
    {
        return new CoreFunction(name, false, inputs, (x, r) => (call(x, r, out double v), [v]));
    }
}
