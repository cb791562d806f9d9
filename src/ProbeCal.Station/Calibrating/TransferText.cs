using System;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// What a transfer standard showed, as one line: <c>ID SHOWN u UNCERTAINTY [correction VALUE u UNCERTAINTY]</c>. Examples: <c>STD-3 8.41mg/L u 0.05mg/L</c>,
/// <c>STD-3 98.2%local u 0.5%local correction -0.3%local u 0.2%local</c>, <c>STD-3 152.1mmHg within 1mmHg</c>.
/// </summary>
/// <remarks>
/// Units: mg/L, µmol/L, a pressure (partial pressure of the gas; total pressure for a probe of total gas), <c>%local</c> (of saturation at the local pressure), <c>%1atm</c> (at one atmosphere). A bare % is
/// refused: at 500 m the two differ by 6 %. Without a correction, the register's for that id is taken, which must be in the unit of the reading. The option is <c>--transfer</c>, and the text behind
/// <c>transfer-standard:</c> of a further level.
/// </remarks>
internal static class TransferText
{
    private const string Wanted = "write ID SHOWN u UNCERTAINTY, for example 'STD-3 8.41mg/L u 0.05mg/L'";

    /// <summary>Reads a transfer or refuses it in one line.</summary>
    /// <param name="what">The option or key it was given for.</param>
    /// <param name="text">What was given.</param>
    /// <param name="register">Correction on a standard's certificate by its id; null from it for none, and null when there is no register.</param>
    /// <exception cref="InputException">Something of it is missing or wrong.</exception>
    public static RecordedTransfer Parse(string what, string text, Func<string, RecordedQuantity?>? register = null)
    {
        Clauses clauses = new(what, text, Wanted);
        string id = clauses.Next("");
        if (0 < Number.LeadingLength(id) && UnitOf(id[Number.LeadingLength(id)..]) != null)
        {
            throw clauses.Wrong($"the line begins with the id of the standard, and {id} is a reading");
        }

        id = PlainText.Id(what, id);
        RecordedQuantity shown = Read(clauses, "reading");
        bool given = clauses.Takes("correction");
        RecordedQuantity? correction = given ? Read(clauses, "correction") : register?.Invoke(id);
        if (correction != null && correction.Unit != shown.Unit)
        {
            throw clauses.Wrong(given
                ? $"the reading is in {shown.Unit} and the correction in {correction.Unit}; give both in one unit"
                : $"the register's correction of {id} is in {correction.Unit}; write the reading in that unit, or a correction in {shown.Unit}");
        }

        if (!clauses.IsAtEnd)
        {
            string word = clauses.Next("");
            throw clauses.Wrong($"'{Wrong.Shown(word)}' is not understood there{NearestName.DidYouMean(word, ["correction"])}");
        }

        return new RecordedTransfer { Standard = id, Shown = shown, Correction = correction };
    }

    /// <summary>The transfer as text that <see cref="Parse"/> reads back to the same values.</summary>
    public static string Print(RecordedTransfer transfer)
    {
        string text = transfer.Standard + " " + Of(transfer.Shown);
        return transfer.Correction is RecordedQuantity correction ? text + " correction " + Of(correction) : text;

        static string Of(RecordedQuantity quantity)
        {
            return $"{Number.Print(quantity.Value)}{quantity.Unit} u {Number.Print(quantity.StandardUncertainty)}{quantity.Unit}";
        }
    }

    private static RecordedQuantity Read(Clauses clauses, string name)
    {
        string word = clauses.Next($"the {name} is missing");
        int length = Number.LeadingLength(word);
        string unit = word[length..];
        (QuantityKind Kind, string Unit)? known = length == 0 ? null : UnitOf(unit);
        if (known is not (QuantityKind kind, string recorded))
        {
            throw clauses.Wrong(length == 0
                ? $"'{Wrong.Shown(word)}' is no {name}"
                : unit == "%"
                    ? $"{word}: % of what? Write %local (of saturation at the local pressure) or %1atm"
                    : unit.Length == 0
                        ? $"the {name} {word} has no unit; there are {string.Join(", ", TransferReference.Units)}"
                        : $"{Wrong.Shown(unit)} is no unit of a standard{NearestName.DidYouMean(unit, TransferReference.Units)}; there are {string.Join(", ", TransferReference.Units)}");
        }

        return clauses.Known(name, kind, clauses.Parse(name, kind, word), recorded, null, null);
    }

    private static (QuantityKind Kind, string Unit)? UnitOf(string unit)
    {
        switch (unit)
        {
            case TransferReference.PercentLocal:
                return (QuantityKind.PercentLocal, TransferReference.PercentLocal);
            case TransferReference.PercentOneAtmosphere:
                return (QuantityKind.PercentOneAtmosphere, TransferReference.PercentOneAtmosphere);
            default:
                return QuantityKind.MassConcentration.Unit(unit) != null ? (QuantityKind.MassConcentration, TransferReference.MilligramsPerLitre)
                    : QuantityKind.AmountConcentration.Unit(unit) != null ? (QuantityKind.AmountConcentration, TransferReference.MicromolesPerLitre)
                    : QuantityKind.Pressure.Unit(unit) != null ? (QuantityKind.Pressure, TransferReference.Hectopascal)
                    : null;
        }
    }
}
