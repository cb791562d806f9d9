using System;

namespace ProbeCal.Station.Equilibrium;

/// <summary>The unit that each value comes in.</summary>
public static class EquilibriumUnits
{
    /// <summary>The unit of a quantity, as it is printed.</summary>
    public static string Of(EquilibriumQuantity quantity)
    {
        return quantity switch
        {
            EquilibriumQuantity.VapourPressure or EquilibriumQuantity.PartialPressure or EquilibriumQuantity.MeasuredPartialPressure => "hPa",
            EquilibriumQuantity.MilligramsPerLitre or EquilibriumQuantity.MeasuredMilligramsPerLitre or EquilibriumQuantity.ExcessMilligramsPerLitre => "mg/L",
            EquilibriumQuantity.MicromolesPerLitre or EquilibriumQuantity.MeasuredMicromolesPerLitre => "µmol/L",
            EquilibriumQuantity.MicromolesPerKilogram or EquilibriumQuantity.MeasuredMicromolesPerKilogram => "µmol/kg",
            EquilibriumQuantity.MillilitresPerLitre or EquilibriumQuantity.MeasuredMillilitresPerLitre => "mL/L",
            EquilibriumQuantity.PercentOfOneAtmosphere or EquilibriumQuantity.PercentLocal or EquilibriumQuantity.PercentOneAtmosphere => "%",
            _ => throw new ArgumentOutOfRangeException(nameof(quantity)),
        };
    }
}
