using System;
using System.Linq;
using System.Threading;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;
using Xunit;
using GasPhase = ProbeCal.Station.Equilibrium.GasPhase;

namespace ProbeCal.Station.Tests.Equilibrium;

/// <summary>The values of one equilibrium, and what they say of their own uncertainty.</summary>
public class GasAtEquilibriumTests
{
    private static readonly EquilibriumEntry _lake = new()
    {
        Temperature = "12.3",
        TemperatureUncertainty = "0.1K",
        Salinity = "8",
        SalinityUncertainty = "0.2",
        Pressure = "962hPa",
        PressureUncertainty = "2hPa",
        HumidityUncertainty = "3%",
    };

    // One of every way to say what stands over the water, how salty it is and what was measured.
    private static readonly string[] _cases = ["air O2", "air CO2", "air N2O by weiss-price-1980-moist-air", "mixture", "partial pressure", "conductivity", "own conductivity", "specific", "chlorinity",
        "measured mg", "measured umol", "measured kg", "measured mL", "measured and partial pressure", "pressed N2", "bunsen", "brine", "measured brine"];

    public static TheoryData<string> Cases => [.. _cases];

    private static EquilibriumEntry Entry(string name)
    {
        EquilibriumEntry fresh = _lake with { Salinity = null, SalinityUncertainty = null };
        return name switch
        {
            "air O2" => _lake with { Humidity = "80%" },
            "air CO2" => _lake with { Gas = "CO2", MoleFractionUncertainty = "5ppm" },
            "air N2O by weiss-price-1980-moist-air" => _lake with { Gas = "N2O", Equation = "weiss-price-1980-moist-air" },
            "mixture" => _lake with { Gas = "CH4", Mixture = "CH4=2%, N2=97%", MoleFractionWithin = "0.1%", Humidity = "40%" },
            "partial pressure" => _lake with { PartialPressure = "150hPa", PartialPressureUncertainty = "1hPa", HumidityUncertainty = null },
            "conductivity" => fresh with { Conductivity = "20mS/cm", ConductivityUncertainty = "0.1mS/cm" },
            "own conductivity" => fresh with { Gas = "Ar", Conductivity = "20mS/cm", ConductivityTemperature = "15", ConductivityTemperatureUncertainty = "0.3K" },
            "specific" => fresh with { SpecificConductance = "9mS/cm", ConductivityUncertainty = "0.1mS/cm" },
            "chlorinity" => fresh with { Chlorinity = "9", ChlorinityUncertainty = "0.05" },
            "measured mg" => _lake with { Concentration = "8.1mg/L", ConcentrationUncertainty = "0.1mg/L" },
            "measured umol" => _lake with { Gas = "CO2", Concentration = "30umol/L", ConcentrationUncertainty = "1umol/L", MoleFractionUncertainty = "5ppm" },
            "measured kg" => fresh with { Conductivity = "20mS/cm", ConductivityUncertainty = "0.1mS/cm", Concentration = "250umol/kg", ConcentrationUncertainty = "2umol/kg" },
            "measured mL" => _lake with { Gas = "N2", Concentration = "14mL/L", ConcentrationUncertainty = "0.1mL/L" },
            "measured and partial pressure" => _lake with { HumidityUncertainty = null, PartialPressure = "150hPa", PartialPressureUncertainty = "1hPa", Concentration = "8mg/L" },
            "pressed N2" => _lake with { Gas = "N2", Pressure = "4atm", Mixture = "N2=60%", Humidity = "10%", Concentration = "30mg/L" },
            "bunsen" => _lake with { Gas = "CO", Equation = "wiesenburg-guinasso-1979-bunsen", Concentration = "2nmol/L" },
            "brine" => fresh with { Ions = "Na+=0.6mol/L, Cl-=0.4mol/L, SO4--=0.1mol/L" },
            "measured brine" => fresh with { Gas = "CO2", Ions = "Mg2+=0.3mol/L, Cl-=0.6mol/L", Concentration = "25umol/L", ConcentrationUncertainty = "0.5umol/L", PressureWithin = "4hPa", PressureUncertainty = null },
            _ => throw new ArgumentOutOfRangeException(nameof(name)),
        };
    }

    [Theory]
    [MemberData(nameof(Cases))]
    public void Every_sensitivity_is_the_slope_of_the_full_model(string name)
    {
        EquilibriumCase asked = Entry(name).Read();
        GasAtEquilibrium result = GasAtEquilibrium.Compute(asked);
        double[] inputs = [.. result.Inputs];
        EquilibriumModel model = new(asked);
        EquilibriumGradients gradients = new(asked, inputs);
        int compared = 0;
        foreach (EquilibriumQuantity quantity in result.Quantities)
        {
            double[] slopes = gradients.Of(quantity);
            double value = model.Value(quantity, inputs, RangeRule.NearEdge, out _);
            for (int i = 0; i < inputs.Length; i++)
            {
                if (double.IsNaN(inputs[i]))
                {
                    continue;
                }

                double step = 1e-4 * Math.Max(Math.Abs(inputs[i]), i == (int)EquilibriumInput.SalinityRelation ? 1 : 1e-9);
                double[] moved = [.. inputs];
                moved[i] = inputs[i] + step;
                double above = model.Value(quantity, moved, RangeRule.Extrapolate, out _);
                moved[i] = inputs[i] - step;
                double below = model.Value(quantity, moved, RangeRule.Extrapolate, out _);
                double slope = (above - below) / (2 * step);
                // A central difference of a smooth function is good to about step²; what is smaller than that part of the value is nothing.
                double tolerance = (1e-5 * Math.Abs(slope)) + (1e-7 * Math.Abs(value) / Math.Max(Math.Abs(inputs[i]), 1e-9));
                Assert.True(Math.Abs(slope - slopes[i]) <= tolerance, $"{quantity} by {(EquilibriumInput)i}: {slopes[i]:R}, by difference {slope:R}");
                compared += slope == 0 ? 0 : 1;
            }
        }

        Assert.True(20 <= compared, $"only {compared} slopes are not zero");
    }

    [Theory]
    [MemberData(nameof(Cases))]
    public void The_budget_agrees_with_random_trials_of_the_full_model(string name)
    {
        GasAtEquilibrium result = GasAtEquilibrium.Compute(Entry(name).Read());
        foreach (EquilibriumQuantity quantity in new[] { EquilibriumQuantity.MilligramsPerLitre, EquilibriumQuantity.MeasuredPartialPressure })
        {
            if (result.Find(quantity) is EquilibriumResult value)
            {
                EquilibriumCheck check = result.Check(quantity, 20_000, 3, null, CancellationToken.None);
                Assert.Equal(0, check.Refused);
                // 20 000 trials know their standard deviation to 0.5 %; four times that, and 1 % for what is not linear.
                Assert.InRange(check.StandardDeviation / value.StandardUncertainty, 0.97, 1.03);
                Assert.InRange((check.Mean - value.Value) / value.StandardUncertainty, -0.05, 0.05);
            }
        }
    }

    [Fact]
    public void Parts_of_a_budget_add_up_to_the_whole()
    {
        foreach (string name in _cases)
        {
            GasAtEquilibrium result = GasAtEquilibrium.Compute(Entry(name).Read());
            foreach (EquilibriumQuantity quantity in result.Quantities)
            {
                EquilibriumResult value = result.Value(quantity);
                Assert.Equal(value.StandardUncertainty, Math.Sqrt(value.Parts.Sum(static part => part.Part * part.Part)), 1e-9 * value.StandardUncertainty);
                // Nothing has no parts: a value measured and taken as exact.
                Assert.Equal(value.StandardUncertainty == 0 ? 0 : 1, value.Parts.Sum(static part => part.Share), 1e-9);
            }
        }
    }

    [Fact]
    public void A_thermometer_shared_with_the_conductivity_errs_in_both_together()
    {
        EquilibriumEntry shared = Entry("conductivity") with { TemperatureUncertainty = "0.5K", ConductivityUncertainty = null };
        EquilibriumEntry apart = shared with { ConductivityTemperature = shared.Temperature, ConductivityTemperatureUncertainty = "0.5K" };
        double together = GasAtEquilibrium.Compute(shared.Read()).Value(EquilibriumQuantity.MilligramsPerLitre).StandardUncertainty;
        double separately = GasAtEquilibrium.Compute(apart.Read()).Value(EquilibriumQuantity.MilligramsPerLitre).StandardUncertainty;
        // A temperature read too high makes the salinity too low, which takes back part of what it does to the oxygen.
        Assert.True(together < separately, $"{together} {separately}");
    }

    [Theory]
    [InlineData("O2=5%, N2=95%", 0.05, 0)]
    [InlineData("nitrogen=0.6; oxygen=0.3", 0.3, 0.1)]
    // Four figures of a per cent from different tables: 100.006 %.
    [InlineData("N2=78.084%, O2=20.946%, Ar=0.934%, CO2=0.042%", 0.20946, 0)]
    public void A_mixture_is_read(string text, double fraction, double unnamed)
    {
        GasPhase phase = (_lake with { Mixture = text }).Read().Phase;
        Assert.Equal(fraction, phase.MoleFraction.Value, 1e-15);
        Assert.Equal(unnamed, phase.Unnamed, 1e-12);
    }

    [Fact]
    public void A_brine_of_table_salt_holds_what_its_constants_leave()
    {
        // Weisenberger and Schumpe 1996, oxygen and sodium chloride at 25 °C: K = 0.1143 + 0.0318 = 0.1461 L/mol (ported value, second-hand).
        EquilibriumEntry fresh = _lake with { Temperature = "25", Salinity = "0" };
        EquilibriumEntry brine = fresh with { Salinity = null, SalinityUncertainty = null, Ions = "Na⁺=1mol/L; Cl-=1000mmol/L" };
        double ratio = GasAtEquilibrium.Compute(brine.Read()).Value(EquilibriumQuantity.MilligramsPerLitre).Value
            / GasAtEquilibrium.Compute(fresh.Read()).Value(EquilibriumQuantity.MilligramsPerLitre).Value;
        Assert.Equal(Math.Pow(10, -0.1461), ratio, 1e-9);
        Assert.Null(GasAtEquilibrium.Compute(brine.Read()).Find(EquilibriumQuantity.MicromolesPerKilogram));
        Assert.Empty(brine.Read().Notes);
        Assert.Contains("is an ion missing?", Assert.Single((brine with { Ions = "Na+=1mol/L" }).Read().Notes), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("SO4 2-")]
    [InlineData("SO42-")]
    [InlineData("SO4--")]
    [InlineData("so4^2-")]
    [InlineData("SO4²⁻")]
    public void An_ion_is_read_as_people_write_it(string text)
    {
        EquilibriumEntry brine = _lake with { Salinity = null, SalinityUncertainty = null, Ions = text + "=0.1mol/L" };
        Assert.Equal("SO4 2-", Assert.Single(brine.Read().Water.Brine!.Ions).Name);
    }

    [Fact]
    public void Salinity_from_conductivity_is_that_of_the_scale()
    {
        // UNESCO Tech. Pap. Mar. Sci. 44 (1983): R = 1, 15 °C (IPTS-68), surface is S 35 by definition; R = 1 is 42.914 mS/cm.
        string celsius = Number.Print(15 / 1.00024);
        EquilibriumEntry sea = _lake with { Salinity = null, SalinityUncertainty = null, Temperature = celsius, Conductivity = "4.2914S/m" };
        Assert.Equal(35.0, sea.Read().Water.Salinity, 1e-6);
    }

    [Fact]
    public void The_gas_phase_beside_a_given_partial_pressure_of_the_same_size_holds_the_same()
    {
        GasAtEquilibrium air = GasAtEquilibrium.Compute(_lake.Read());
        string partial = Number.Print(air.Value(EquilibriumQuantity.PartialPressure).Value) + "hPa";
        GasAtEquilibrium given = GasAtEquilibrium.Compute((_lake with { PartialPressure = partial, HumidityUncertainty = null }).Read());
        double expected = air.Value(EquilibriumQuantity.MilligramsPerLitre).Value;
        // θ at the local pressure in one chain, at 1 atm in the other (docs/decisions/0004): within 0.01 %.
        Assert.Equal(expected, given.Value(EquilibriumQuantity.MilligramsPerLitre).Value, 1e-4 * expected);
        Assert.Null(given.Find(EquilibriumQuantity.PercentOfOneAtmosphere));
    }
}
