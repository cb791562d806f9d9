namespace ProbeCal;

/// <summary>
/// Dissolved oxygen by iodometric titration (Winkler 1888; Carpenter 1965; azide modification): from volumes and concentrations to mg/L, and how the result answers to each of them.
/// Desktop only: a device titrates nothing.
/// </summary>
/// <remarks>
/// One mole of oxygen sets free two of iodine, which take four of thiosulfate: 31.9988/4 g per equivalent. The oxygen found is
/// m = 7999.7 mg/mol·c·(titre − blank), times flask/aliquot where only a part was titrated. The oxygen that the fixing reagents brought in is subtracted, and what is left was in
/// the flask's volume less what the reagents displaced: C = 1000·(m − m(reagents))/(flask − displaced). Displacement is corrected here and nowhere else: whoever titrates 201 mL of a
/// 300 mL bottle "to correct for 2 mL of reagents" enters 201, 300 and 2, and must not lower the titre besides. The acid added after the precipitate has settled displaces clear liquid without
/// iodine and does not count. In the form of Carpenter (1965) and WOCE (Culberson 1991) the same is written in mL of gas with 5598 mL per equivalent, which is 22 391.6/4.
/// Accuracy: the formula is exact; what is left is in the inputs.
/// </remarks>
public static class WinklerTitration
{
    /// <summary>Oxygen that one mole of thiosulfate stands for, mg: a quarter of 31 998.8.</summary>
    public const double MilligramsPerMole = OxygenUnits.GramsPerMole * 1000.0 / 4.0;
    /// <summary>
    /// Oxygen dissolved in 1 mL of manganese and 1 mL of alkaline iodide solution of Carpenter's strength, mg: 0.0017 mL of gas (Murray, Riley and Wilson 1968, Deep-Sea Res. 15, 237–238, as
    /// taken over by WOCE; from memory).
    /// </summary>
    public const double ReagentOxygenMilligrams = 0.0017 * OxygenUnits.MilligramsPerMillilitre;

    private const double Thousand = 1000.0;

    /// <summary>Amount concentration of thiosulfate from a titration of iodate or biiodate.</summary>
    /// <param name="standardMillilitres">Volume of the standard, mL, above zero.</param>
    /// <param name="standardNormality">Its concentration in equivalents, mol/L, above zero: six times that of KIO3, twelve times that of KH(IO3)2.</param>
    /// <param name="titreMillilitres">Thiosulfate used, mL, not negative and above the blank.</param>
    /// <param name="blankMillilitres">Blank of the standardisation, mL of thiosulfate, either sign.</param>
    /// <param name="molesPerLitre">Concentration, mol/L; NaN unless Ok.</param>
    /// <returns>
    /// <see cref="Status.VolumeBelowRange"/> for a volume that cannot be, <see cref="Status.ZeroAboveRange"/> for a titre that does not exceed its blank, or the input at fault.
    /// </returns>
    public static Status Titrant(
        double standardMillilitres, double standardNormality, double titreMillilitres, double blankMillilitres, out double molesPerLitre)
    {
        molesPerLitre = double.NaN;
        Status status = CheckTitre(titreMillilitres, blankMillilitres);
        if (status != Status.Ok) { return status; }
        if (titreMillilitres == blankMillilitres) { return Status.ZeroAboveRange; }
        if (InputCheck.NotFinite(standardMillilitres)) { return Status.VolumeNotFinite; }
        if (standardMillilitres <= 0.0) { return Status.VolumeBelowRange; }
        status = CheckConcentration(standardNormality);
        if (status != Status.Ok) { return status; }
        double net = titreMillilitres - blankMillilitres;
        return InputCheck.Deliver(standardMillilitres * standardNormality / net, status, Status.CoefficientAboveRange, out molesPerLitre);
    }

    /// <summary>How <see cref="Titrant"/> answers to each of its inputs.</summary>
    /// <param name="standardMillilitres">Volume of the standard, mL, above zero.</param>
    /// <param name="standardNormality">Its concentration in equivalents, mol/L, above zero.</param>
    /// <param name="titreMillilitres">Thiosulfate used, mL.</param>
    /// <param name="blankMillilitres">Blank of the standardisation, mL; its sensitivity is the titre's with the other sign.</param>
    /// <param name="perStandardMillilitre">∂c/∂(volume of the standard), mol/L per mL; NaN unless Ok.</param>
    /// <param name="perStandardNormality">∂c/∂(its concentration), mol/L per mol/L; NaN unless Ok.</param>
    /// <param name="perTitreMillilitre">∂c/∂titre, mol/L per mL, negative; NaN unless Ok.</param>
    /// <returns>As <see cref="Titrant"/>.</returns>
    public static Status TitrantSensitivities(
        double standardMillilitres, double standardNormality, double titreMillilitres, double blankMillilitres,
        out double perStandardMillilitre, out double perStandardNormality, out double perTitreMillilitre)
    {
        perStandardMillilitre = double.NaN;
        perStandardNormality = double.NaN;
        perTitreMillilitre = double.NaN;
        Status status = Titrant(standardMillilitres, standardNormality, titreMillilitres, blankMillilitres, out double concentration);
        if (status != Status.Ok) { return status; }
        double net = titreMillilitres - blankMillilitres;
        perStandardMillilitre = standardNormality / net;
        perStandardNormality = standardMillilitres / net;
        perTitreMillilitre = -concentration / net;
        return status;
    }

    /// <summary>Concentration of oxygen in the sample.</summary>
    /// <param name="titreMillilitres">Thiosulfate used, mL, not negative and not below the blank.</param>
    /// <param name="blankMillilitres">Blank, mL of thiosulfate, either sign.</param>
    /// <param name="titrantMolesPerLitre">Amount concentration of the thiosulfate, mol/L (its normality), above zero.</param>
    /// <param name="flaskMillilitres">Volume of the stoppered flask, mL, above what the reagents displaced.</param>
    /// <param name="aliquotMillilitres">Volume that was titrated, mL, above zero and at most the flask; NaN when it was the whole flask.</param>
    /// <param name="displacedMillilitres">Sample displaced by the fixing reagents, mL, not negative.</param>
    /// <param name="reagentOxygenMilligrams">Oxygen brought in by them, mg in the whole flask, not negative; it is subtracted.</param>
    /// <param name="milligramsPerLitre">Concentration at the temperature at which the flask was filled, mg/L; NaN unless Ok.</param>
    /// <returns>
    /// <see cref="Status.VolumeBelowRange"/> or <see cref="Status.VolumeAboveRange"/> for volumes that cannot be, <see cref="Status.ZeroAboveRange"/> for a titre below its blank,
    /// <see cref="Status.ConcentrationBelowRange"/> when the reagents brought in more oxygen than was found, or the input at fault.
    /// </returns>
    public static Status MilligramsPerLitre(
        double titreMillilitres, double blankMillilitres, double titrantMolesPerLitre, double flaskMillilitres, double aliquotMillilitres,
        double displacedMillilitres, double reagentOxygenMilligrams, out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        Status status = Check(
            titreMillilitres, blankMillilitres, titrantMolesPerLitre, flaskMillilitres, aliquotMillilitres, displacedMillilitres, reagentOxygenMilligrams);
        if (status != Status.Ok) { return status; }
        double found = Found(titreMillilitres - blankMillilitres, titrantMolesPerLitre, flaskMillilitres, aliquotMillilitres);
        double value = (found - reagentOxygenMilligrams) * Thousand / (flaskMillilitres - displacedMillilitres);
        if (value < 0.0) { return Status.ConcentrationBelowRange; }
        return InputCheck.Deliver(value, status, Status.ConcentrationAboveRange, out milligramsPerLitre);
    }

    /// <summary>How <see cref="MilligramsPerLitre"/> answers to each of its inputs.</summary>
    /// <param name="titreMillilitres">Thiosulfate used, mL.</param>
    /// <param name="blankMillilitres">Blank, mL; its sensitivity is the titre's with the other sign.</param>
    /// <param name="titrantMolesPerLitre">Amount concentration of the thiosulfate, mol/L.</param>
    /// <param name="flaskMillilitres">Volume of the flask, mL.</param>
    /// <param name="aliquotMillilitres">Volume that was titrated, mL; NaN for the whole flask.</param>
    /// <param name="displacedMillilitres">Sample displaced by the reagents, mL.</param>
    /// <param name="reagentOxygenMilligrams">Oxygen brought in by them, mg.</param>
    /// <param name="perTitreMillilitre">∂C/∂titre, mg/L per mL; NaN unless Ok.</param>
    /// <param name="perTitrant">∂C/∂c, mg/L per mol/L; NaN unless Ok.</param>
    /// <param name="perFlaskMillilitre">∂C/∂flask, mg/L per mL; NaN unless Ok.</param>
    /// <param name="perAliquotMillilitre">∂C/∂aliquot, mg/L per mL; 0 for the whole flask; NaN unless Ok.</param>
    /// <param name="perDisplacedMillilitre">∂C/∂displaced, mg/L per mL; NaN unless Ok.</param>
    /// <param name="perReagentMilligram">∂C/∂(oxygen of the reagents), mg/L per mg, negative; NaN unless Ok.</param>
    /// <returns>As <see cref="MilligramsPerLitre"/>.</returns>
    public static Status MilligramsPerLitreSensitivities(
        double titreMillilitres, double blankMillilitres, double titrantMolesPerLitre, double flaskMillilitres, double aliquotMillilitres,
        double displacedMillilitres, double reagentOxygenMilligrams,
        out double perTitreMillilitre, out double perTitrant, out double perFlaskMillilitre, out double perAliquotMillilitre,
        out double perDisplacedMillilitre, out double perReagentMilligram)
    {
        perTitreMillilitre = double.NaN;
        perTitrant = double.NaN;
        perFlaskMillilitre = double.NaN;
        perAliquotMillilitre = double.NaN;
        perDisplacedMillilitre = double.NaN;
        perReagentMilligram = double.NaN;
        Status status = MilligramsPerLitre(
            titreMillilitres, blankMillilitres, titrantMolesPerLitre, flaskMillilitres, aliquotMillilitres, displacedMillilitres, reagentOxygenMilligrams,
            out double value);
        if (status != Status.Ok) { return status; }
        double net = titreMillilitres - blankMillilitres;
        double litre = Thousand / (flaskMillilitres - displacedMillilitres);
        double found = Found(net, titrantMolesPerLitre, flaskMillilitres, aliquotMillilitres);
        bool whole = double.IsNaN(aliquotMillilitres);
        double share = whole ? 1.0 : flaskMillilitres / aliquotMillilitres;
        double perSample = value / (flaskMillilitres - displacedMillilitres);
        perTitreMillilitre = MilligramsPerMole * titrantMolesPerLitre * share / Thousand * litre;
        perTitrant = MilligramsPerMole * net * share / Thousand * litre;
        perFlaskMillilitre = (whole ? 0.0 : found / flaskMillilitres * litre) - perSample;
        perAliquotMillilitre = whole ? 0.0 : -found / aliquotMillilitres * litre;
        perDisplacedMillilitre = perSample;
        perReagentMilligram = -litre;
        return status;
    }

    /// <summary>Oxygen in the whole flask, mg, the reagents' included.</summary>
    private static double Found(double netMillilitres, double molesPerLitre, double flaskMillilitres, double aliquotMillilitres)
    {
        double share = double.IsNaN(aliquotMillilitres) ? 1.0 : flaskMillilitres / aliquotMillilitres;
        return MilligramsPerMole * molesPerLitre * netMillilitres / Thousand * share;
    }

    private static Status Check(
        double titre, double blank, double titrant, double flask, double aliquot, double displaced, double reagentOxygen)
    {
        Status status = CheckTitre(titre, blank);
        if (status != Status.Ok) { return status; }
        status = CheckConcentration(titrant);
        if (status != Status.Ok) { return status; }
        if (InputCheck.NotFinite(flask) || InputCheck.NotFinite(displaced) || double.IsInfinity(aliquot)) { return Status.VolumeNotFinite; }
        if (displaced < 0.0 || flask <= displaced || aliquot <= 0.0) { return Status.VolumeBelowRange; }
        if (flask < aliquot) { return Status.VolumeAboveRange; }
        if (InputCheck.NotFinite(reagentOxygen)) { return Status.ConcentrationNotFinite; }
        return reagentOxygen < 0.0 ? Status.ConcentrationBelowRange : Status.Ok;
    }

    private static Status CheckTitre(double titre, double blank)
    {
        if (InputCheck.NotFinite(titre)) { return Status.VolumeNotFinite; }
        if (InputCheck.NotFinite(blank)) { return Status.ZeroNotFinite; }
        if (titre < 0.0) { return Status.VolumeBelowRange; }
        return titre < blank ? Status.ZeroAboveRange : Status.Ok;
    }

    private static Status CheckConcentration(double molesPerLitre)
    {
        if (InputCheck.NotFinite(molesPerLitre)) { return Status.CoefficientNotFinite; }
        return molesPerLitre <= 0.0 ? Status.CoefficientBelowRange : Status.Ok;
    }
}
