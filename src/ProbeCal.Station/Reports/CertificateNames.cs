using System.Collections.Generic;

namespace ProbeCal.Station.Reports;

/// <summary>
/// Every field and column of a certificate: the id that docs/certificate.md maps onto the digital calibration certificate,
/// and the name in print. An id never changes its meaning.
/// </summary>
internal static class CertificateNames
{
    internal static readonly Dictionary<string, string> All = new()
    {
        ["record-id"] = "record",
        ["log-id"] = "log",
        ["verdict"] = "result",
        ["warning"] = "warning",
        ["purpose"] = "purpose",
        ["probe"] = "probe",
        ["model"] = "response model",
        ["gas"] = "gas",
        ["membrane"] = "membrane",
        ["thermometer"] = "thermometer",
        ["site"] = "site",
        ["altitude"] = "altitude",
        ["started"] = "begun (UTC)",
        ["completed"] = "complete (UTC)",
        ["by"] = "done by",
        ["previous"] = "calibration before",
        ["replaces"] = "replaces",
        ["imported-from"] = "imported from",
        ["software"] = "software",
        ["remarks"] = "remarks",
        ["method"] = "method",
        ["readings"] = "readings",
        ["steps"] = "procedure",
        ["equation"] = "solubility equation",
        ["formulas"] = "formulas",
        ["reference-state"] = "state of the reference",
        ["temperature"] = "temperature",
        ["pressure"] = "pressure, absolute",
        ["salinity"] = "salinity",
        ["stirring"] = "stirring",
        ["air-to-water"] = "air-to-water ratio",
        ["droplets"] = "droplets on membrane",
        ["temperature-coefficient"] = "temperature coefficient",
        ["coefficients"] = "coefficients",
        ["meter-settings"] = "set in the meter",
        ["no-equipment"] = "",
        ["equipment-id"] = "equipment",
        ["equipment-kind"] = "kind",
        ["equipment-description"] = "description",
        ["equipment-certificate"] = "certificate",
        ["equipment-value"] = "value",
        ["equipment-correction"] = "correction",
        ["equipment-last-day"] = "valid to",
        ["reference-point"] = "point",
        ["reference-basis"] = "what its reference rests on",
        ["reference-budget-point"] = "point",
        ["reference-budget-input"] = "input of the reference",
        ["reference-budget-value"] = "value",
        ["reference-budget-uncertainty"] = "u",
        ["reference-budget-distribution"] = "distribution",
        ["reference-budget-contribution"] = "hPa",
        ["reference-budget-source"] = "source",
        ["point-role"] = "point",
        ["point-method"] = "method",
        ["point-time"] = "time (UTC)",
        ["point-samples"] = "samples",
        ["point-signal"] = "signal",
        ["point-signal-uncertainty"] = "u",
        ["point-temperature"] = "°C",
        ["point-pressure"] = "hPa abs.",
        ["point-reference-pressure"] = "ref. hPa",
        ["point-reference-pressure-uncertainty"] = "u",
        ["point-reference"] = "ref. mg/L",
        ["point-reference-uncertainty"] = "u",
        ["point-reading"] = "reading mg/L",
        ["point-error"] = "error mg/L",
        ["point-reading-pressure"] = "reading hPa",
        ["point-error-pressure"] = "error hPa",
        ["point-read-by"] = "",
        ["point-residual"] = "resid. hPa",
        ["point-standardised"] = "resid. / s",
        ["point-windows"] = "",
        ["points-note"] = "",
        ["slope"] = "slope",
        ["zero"] = "zero",
        ["as-found"] = "as found",
        ["as-left"] = "as left",
        ["zero-error"] = "zero reading",
        ["fit"] = "fit",
        ["curvature"] = "curvature",
        ["fit-range"] = "range of the fit",
        ["fit-freedom"] = "degrees of freedom",
        ["fit-residual"] = "residual deviation",
        ["fit-chi-squared"] = "chi-squared",
        ["fit-lack"] = "lack of fit",
        ["residual-plot"] = "",
        ["reasons"] = "why not passed",
        ["limit-check"] = "judged",
        ["limit-found"] = "found",
        ["limit-expanded"] = "U",
        ["limit-coverage"] = "k",
        ["limit-limit"] = "limit",
        ["limit-guard-band"] = "guard band",
        ["limit-ratio"] = "limit/U",
        ["limit-verdict"] = "verdict",
        ["limit-source"] = "source",
        ["limit-sources"] = "",
        ["decision-rule"] = "decision rule",
        ["budget-input"] = "input",
        ["budget-value"] = "value",
        ["budget-uncertainty"] = "u",
        ["budget-unit"] = "unit",
        ["budget-distribution"] = "distribution",
        ["budget-sensitivity"] = "% of slope per unit",
        ["budget-contribution"] = "% of slope",
        ["budget-share"] = "share %",
        ["budget-source"] = "source",
        ["no-findings"] = "",
        ["finding-guard"] = "guard",
        ["finding-saw"] = "what it saw",
        ["finding-error-as-found"] = "as found mg/L",
        ["finding-error-later"] = "later mg/L",
        ["finding-what-to-do"] = "what to do",
        ["finding-reason"] = "reason for going on",
        ["signed-name"] = "name (typed)",
        ["signed-role"] = "role (typed)",
        ["signed-time"] = "made (UTC)",
        ["signature"] = "signature in ink",
        ["record-sha256"] = "SHA-256 of the record",
        ["log-head"] = "head of the log",
        ["statement"] = "",
    };

    /// <summary>A field of that id.</summary>
    internal static ReportField Field(string id, string value)
    {
        return new ReportField(id, All[id], value);
    }

    /// <summary>A column of words.</summary>
    internal static ReportColumn Words(string id)
    {
        return new ReportColumn(id, All[id], IsNumber: false);
    }

    /// <summary>A column of figures.</summary>
    internal static ReportColumn Figures(string id)
    {
        return new ReportColumn(id, All[id], IsNumber: true);
    }
}
