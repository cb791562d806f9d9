using System;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>Mixtures, transfers and titrations as people type them: what is read, and the one line for everything that is wrong.</summary>
public class MethodTextTests
{
    private const string Good = "8.02mL,8.05mL,8.03mL flask 300.2mL titrant 0.025mol/L u 0.0001mol/L drawn 20C";

    [Fact]
    public void Mixture_IsReadInAnyWayItIsWritten()
    {
        RecordedMixture dry = Mixture("cylinder CYL-21 20.95% u 0.02% dry");
        Assert.Equal("CYL-21", dry.Cylinder);
        Assert.Equal(0.2095, dry.MoleFraction.Value, 15);
        Assert.Equal(0.0002, dry.MoleFraction.StandardUncertainty, 15);
        Assert.Null(dry.MoleFraction.UncertaintySource);
        Assert.Equal(0, dry.RelativeHumidityPercent.Value);

        Assert.Equal(dry, Mixture("CYL-21 0.2095 u 0.0002 DRY"));
        Assert.Equal(dry, Mixture("CYL-21, 20.95 % u 0.02 %, dry"));
        RecordedMixture limits = Mixture("CYL-7 420ppm within 6ppm humid 97% u 1%");
        Assert.Equal(6e-6 / Math.Sqrt(3), limits.MoleFraction.StandardUncertainty, 15);
        Assert.Contains("rectangular", limits.MoleFraction.UncertaintySource, StringComparison.Ordinal);
        Assert.Equal(97, limits.RelativeHumidityPercent.Value);
        RecordedMixture humid = Mixture("CYL-7 5% u 0.1% humid");
        Assert.Equal(97.5, humid.RelativeHumidityPercent.Value);
        Assert.Equal(2.5 / Math.Sqrt(3), humid.RelativeHumidityPercent.StandardUncertainty, 12);
        Assert.Equal(MethodDefaults.HumidifiedSource, humid.RelativeHumidityPercent.UncertaintySource);
        Assert.Equal(0.20946, Mixture("air humid 95% u 2%").MoleFraction.Value);
    }

    [Fact]
    public void Mixture_OfTheRegister_NeedsNoFraction()
    {
        RecordedQuantity certified = new() { Value = 0.1002, Unit = "1", StandardUncertainty = 0.0002, Source = "register:CYL-9" };
        Assert.Same(certified, MixtureText.Parse("--mixture", "CYL-9 dry", Gas.Oxygen, id => id == "CYL-9" ? certified : null).MoleFraction);
        Refused(() => MixtureText.Parse("--mixture", "CYL-8 dry", Gas.Oxygen, static _ => null), "the register holds none for 'CYL-8'");
    }

    [Theory]
    [InlineData("", "there is nothing there")]
    [InlineData("CYL-21", "the mole fraction is missing")]
    [InlineData("20.95% u 0.02% dry", "begins with the id of its cylinder, and 20.95% is a fraction")]
    [InlineData("CYL-21 20.95% dry", "half of a certificate's U at k = 2")]
    [InlineData("CYL-21 20.95% u 0.02%", "dry or humid")]
    [InlineData("CYL-21 20.95% u dry", "uncertainty of mole fraction")]
    [InlineData("CYL-21 20.95% u", "the uncertainty of 'mole fraction' is missing")]
    [InlineData("CYL-21 20.95% u -0.02% dry", "an uncertainty of -0.0002 cannot be")]
    [InlineData("CYL-21 20.95 u 0.02 dry", "a mole fraction of 20.95 cannot be")]
    [InlineData("CYL-21 -1% u 0.02% dry", "a mole fraction of -0.01 cannot be")]
    [InlineData("CYL-21 20,95% u 0.02% dry", "a comma between digits is no decimal mark here")]
    [InlineData("CYL-21 20.95% u 0.02% drry", "did you mean dry?")]
    [InlineData("CYL-21 20.95% u 0.02% humid 120% u 1%", "a humidity of 120 % cannot be")]
    [InlineData("CYL-21 20.95% u 0.02% humid 0.97 u 1%", "carries its unit")]
    [InlineData("CYL-21 20.95% u 0.02% dry now", "'now' is too much")]
    [InlineData("CYL/21 20.95% u 0.02% dry", "an id has letters")]
    public void Mixture_ThatIsWrong_IsToldInOneLine(string text, string says)
    {
        Refused(() => Mixture(text), says);
    }

    [Fact]
    public void Transfer_IsReadInEveryUnit()
    {
        RecordedTransfer plain = Transfer("STD-3 8.41mg/L u 0.05mg/L");
        Assert.Equal(("STD-3", 8.41, "mg/L", 0.05), (plain.Standard, plain.Shown.Value, plain.Shown.Unit, plain.Shown.StandardUncertainty));
        Assert.Null(plain.Correction);
        Assert.Equal("umol/L", Transfer("STD-3 262µmol/L u 1µmol/L").Shown.Unit);
        RecordedTransfer percent = Transfer("STD-3 98.2%local within 0.5%local correction -0.3%local u 0.2%local");
        Assert.Equal("%local", percent.Shown.Unit);
        Assert.Equal(-0.3, percent.Correction!.Value);
        RecordedTransfer pressure = Transfer("STD-3 150mmHg u 1mmHg");
        Assert.Equal("hPa", pressure.Shown.Unit);
        Assert.Equal(150 * 1013.25 / 760, pressure.Shown.Value, 12);
        Assert.Equal(1013.25 / 760, pressure.Shown.StandardUncertainty, 12);
    }

    /// <summary>A certificate's correction is taken unless one is given; in another unit it is neither taken nor left out in silence.</summary>
    [Fact]
    public void Transfer_TakesTheCorrectionOfTheRegister()
    {
        RecordedQuantity certified = new() { Value = 0.07, Unit = "mg/L", StandardUncertainty = 0.02, Source = "register:STD-3" };
        Assert.Same(certified, TransferText.Parse("--transfer", "STD-3 8.41mg/L u 0.05mg/L", id => id == "STD-3" ? certified : null).Correction);
        Assert.Null(TransferText.Parse("--transfer", "STD-4 8.41mg/L u 0.05mg/L", id => id == "STD-3" ? certified : null).Correction);
        Assert.Equal(0.01, TransferText.Parse("--transfer", "STD-3 8.41mg/L u 0.05mg/L correction 0.01mg/L u 0mg/L", _ => certified).Correction!.Value);
        Refused(() => TransferText.Parse("--transfer", "STD-3 165hPa u 1hPa", _ => certified), "the register's correction of STD-3 is in mg/L");
    }

    [Theory]
    [InlineData("", "there is nothing there")]
    [InlineData("STD-3", "the reading is missing")]
    [InlineData("8.41mg/L u 0.05mg/L", "begins with the id of the standard, and 8.41mg/L is a reading")]
    [InlineData("STD-3 8.41 u 0.05", "has no unit; there are mg/L")]
    [InlineData("STD-3 98% u 1%", "% of what? Write %local")]
    [InlineData("STD-3 8.41mg/l u 0.05mg/Q", "0.05mg/Q")]
    [InlineData("STD-3 8.41mgL u 0.05mg/L", "did you mean mg/L?")]
    [InlineData("STD-3 8.41mg/L", "how well is 'reading' known")]
    [InlineData("STD-3 8.41mg/L u -1mg/L", "an uncertainty of -1 cannot be")]
    [InlineData("STD-3 8.41mg/L u 0.1mg/L correction 1hPa u 1hPa", "the reading is in mg/L and the correction in hPa")]
    [InlineData("STD-3 8.41mg/L u 0.1mg/L corection 0.1mg/L u 0.1mg/L", "did you mean correction?")]
    [InlineData("STD-3 fine", "'fine' is no reading")]
    public void Transfer_ThatIsWrong_IsToldInOneLine(string text, string says)
    {
        Refused(() => Transfer(text), says);
    }

    [Fact]
    public void Titration_IsReadWithItsDefaults()
    {
        RecordedTitration titration = Titration(Good);
        Assert.Equal([8.02, 8.05, 8.03], titration.TitreMillilitres);
        Assert.Equal(300.2, titration.Flask.Value);
        Assert.Equal(0.3002 / Math.Sqrt(3), titration.Flask.StandardUncertainty, 12);
        Assert.Equal(20, titration.DrawCelsius);
        Assert.Null(titration.Aliquot);
        double mean = 24.10 / 3;
        // Every default is there with its source, and in size what its source says.
        Assert.Equal((0.0, MethodDefaults.BlankSource), (titration.Blank.Value, titration.Blank.UncertaintySource));
        Assert.Equal(0.005 * mean / Math.Sqrt(3), titration.Blank.StandardUncertainty, 12);
        Assert.Equal(0.0025 * mean / Math.Sqrt(3), titration.BuretteStandardUncertaintyMillilitres, 12);
        Assert.Equal((2.0, MethodDefaults.DisplacedUncertaintySource), (titration.Displaced.Value, titration.Displaced.UncertaintySource));
        Assert.Equal((WinklerTitration.ReagentOxygenMilligrams, MethodDefaults.ReagentOxygenUncertaintySource), (titration.ReagentOxygenMilligrams.Value, titration.ReagentOxygenMilligrams.UncertaintySource));
        // Twice the reagents bring twice the oxygen.
        Assert.Equal(2 * WinklerTitration.ReagentOxygenMilligrams, Titration(Good + " displaced 4mL").ReagentOxygenMilligrams.Value, 15);
    }

    [Fact]
    public void Titration_TakesItsStandardisation()
    {
        RecordedTitration titration = Titration(
            "8.02 mL; 8.05 mL flask 300.2mL u 0.1mL drawn 68F burette within 0.01mL standard 10mL u 0.01mL normality 10mN u 0.01mN against 3.99mL 4.01mL standard-blank 0.01mL u 0.002mL aliquot 201mL");
        Assert.Equal(0.1 / (4.0 - 0.01), titration.Titrant.Value, 12);
        Assert.Equal("standardisation", titration.Titrant.Source);
        Assert.Equal([3.99, 4.01], titration.Standardisation!.TitreMillilitres);
        Assert.Equal(20, titration.DrawCelsius, 12);
        // Budget of the titrant by hand, relative: volume, normality, scatter (s 0.01414, t 12.71/1.96, root of 2), burette, blank.
        double relative = Math.Sqrt(
            Math.Pow(0.01 / 10, 2) + Math.Pow(0.01 / 10, 2) + Math.Pow(0.0141421 * 12.71 / 1.96 / Math.Sqrt(2) / 3.99, 2) + Math.Pow(0.01 / Math.Sqrt(3) / 3.99, 2) + Math.Pow(0.002 / 3.99, 2));
        Assert.Equal(relative, titration.Titrant.StandardUncertainty / titration.Titrant.Value, 6);
        RecordedQuantity known = new() { Value = 0.0251, Unit = "mol/L", StandardUncertainty = 0.0001, Source = "register:T-4" };
        Assert.Same(known, TitrationText.Parse("--titration", "8.02mL 8.05mL flask 300mL titrant T-4 drawn 20C", id => id == "T-4" ? known : null).Titrant);
    }

    [Theory]
    [InlineData("", "there is nothing there")]
    [InlineData("flask 300mL", "the titres come first")]
    [InlineData("8.02mL flask 300mL titrant 0.025mol/L u 0.0001mol/L drawn 20C", "one titre has no scatter")]
    [InlineData("8.02,8.05 flask 300mL", "its unit behind every value")]
    [InlineData("8,02mL 8,05mL flask 300mL", "no decimal mark here")]
    [InlineData("8.02 8.05 flask 300mL", "carries its unit")]
    [InlineData("-0.5mL 8.05mL flask 300mL", "a titre of -0.5 mL cannot be; titres are zero or above")]
    [InlineData("8.02mL 8.05mL titrant 0.025mol/L u 0.0001mol/L drawn 20C", "the volume of the flask is missing")]
    [InlineData("8.02mL 8.05mL flask 0mL titrant 0.025mol/L u 0.0001mol/L drawn 20C", "'flask' 0 mL cannot be; it is above zero")]
    [InlineData("8.02mL 8.05mL flask 2mL titrant 0.025mol/L u 0.0001mol/L drawn 20C", "a flask of 2 mL from which the reagents displaced 2 mL holds no sample")]
    [InlineData("8.02mL 8.05mL flask 300mL titrant 0.025mol/L u 0.0001mol/L", "the temperature at which the samples were drawn is missing")]
    [InlineData("8.02mL 8.05mL flask 300mL drawn 20C", "the concentration of the titrant is missing")]
    [InlineData("8.02mL 8.05mL flask 300mL titrant 0.025mol/L drawn 20C", "how well is 'titrant' known?")]
    [InlineData("8.02mL 8.05mL flask 300mL titrant T-4 drawn 20C", "'T-4' is no concentration of a titrant")]
    [InlineData("8.02mL 8.05mL flask 300mL titrant -1mol/L u 0.1mol/L drawn 20C", "'titrant' -1 mol/L cannot be")]
    [InlineData(Good + " blank 8.04mL u 0.01mL", "a titre of 8.02 mL is below the blank of 8.04 mL")]
    [InlineData(Good + " aliquot 400mL", "an aliquot of 400 mL is more than the flask")]
    [InlineData(Good + " displaced -1mL", "'displaced' -1 mL cannot be")]
    [InlineData(Good + " flask 300mL", "'flask' is there twice")]
    [InlineData(Good + " flsk 300mL", "did you mean flask?")]
    [InlineData(Good + " burette 0.02mL", "how well is 'burette' known?")]
    [InlineData(Good + " standard 10mL normality 0.01N against 4mL 4mL", "give one of the two")]
    [InlineData("8.02mL 8.05mL flask 300mL drawn 20C standard 10mL normality 0.01N", "the titres of the standard are missing")]
    [InlineData("8.02mL 8.05mL flask 300mL drawn 20C standard 10mL against 4mL 4mL", "the normality of the standard is missing")]
    [InlineData("8.02mL 8.05mL flask 300mL drawn 20C normality 0.01N against 4mL 4mL", "the volume of the standard is missing")]
    [InlineData("8.02mL 8.05mL flask 300mL drawn 20C standard 10mL normality 0.01N against 4mL", "one titre has no scatter")]
    [InlineData("8.02mL 8.05mL flask 300mL drawn 20C standard 10mL normality 0.01N against 0mL 0mL", "gives no concentration of the titrant")]
    [InlineData("8.02mL 8.05mL flask 300mL drawn 20C standard 10mL normality 0.01N against 4mL 4mL standard-blank 5mL u 0.1mL", "below the blank of 5 mL")]
    public void Titration_ThatIsWrong_IsToldInOneLine(string text, string says)
    {
        Refused(() => Titration(text), says);
    }

    [Fact]
    public void Texts_AreReadAlikeInEveryCulture()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            foreach (string culture in new[] { "de-DE", "fr-FR", "ar-SA", "tr-TR" })
            {
                CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
                Assert.Equal(0.2095, Mixture("CYL-21 20.95% u 0.02% dry").MoleFraction.Value, 15);
                Assert.Equal(8.41, Transfer("STD-3 8.41mg/L u 0.05mg/L").Shown.Value);
                Assert.Equal(8.05, Titration(Good).TitreMillilitres[1]);
                Assert.Equal("CYL-21 0.2095 u 0.0002 dry", MixtureText.Print(Mixture("CYL-21 0.2095 u 0.0002 dry")));
                Refused(() => Titration(Good + " blank 8.04mL u 0.01mL"), "a titre of 8.02 mL is below the blank of 8.04 mL");
            }
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    /// <summary>What is printed is read back to the same bits.</summary>
    [Theory]
    [InlineData("CYL-21 20.95% u 0.02% dry")]
    [InlineData("CYL-7 420ppm within 6ppm humid")]
    [InlineData("air humid 96.3% u 1.1%")]
    public void Mixture_GoesToTextAndBack(string text)
    {
        RecordedMixture read = Mixture(text);
        RecordedMixture again = Mixture(MixtureText.Print(read));
        Assert.Equal((read.Cylinder, read.MoleFraction.Value, read.MoleFraction.StandardUncertainty), (again.Cylinder, again.MoleFraction.Value, again.MoleFraction.StandardUncertainty));
        Assert.Equal((read.RelativeHumidityPercent.Value, read.RelativeHumidityPercent.StandardUncertainty), (again.RelativeHumidityPercent.Value, again.RelativeHumidityPercent.StandardUncertainty));
    }

    [Theory]
    [InlineData("STD-3 8.41mg/L u 0.05mg/L")]
    [InlineData("STD-3 150mmHg within 1mmHg correction -0.4mmHg u 0.3mmHg")]
    public void Transfer_GoesToTextAndBack(string text)
    {
        RecordedTransfer read = Transfer(text);
        RecordedTransfer again = Transfer(TransferText.Print(read));
        Assert.Equal((read.Standard, read.Shown.Value, read.Shown.StandardUncertainty, read.Shown.Unit), (again.Standard, again.Shown.Value, again.Shown.StandardUncertainty, again.Shown.Unit));
        Assert.Equal((read.Correction?.Value, read.Correction?.StandardUncertainty), (again.Correction?.Value, again.Correction?.StandardUncertainty));
    }

    /// <summary>Any garbage is refused in one line or read; nothing else is ever thrown.</summary>
    [Fact]
    public void Garbage_IsRefusedAndNothingElse()
    {
        string[] words = ["8.02mL", "8.05mL", "flask", "300mL", "titrant", "0.025mol/L", "u", "within", "drawn", "20C", "CYL-1", "dry", "humid", "97%", "20.95%", "STD-3", "8mg/L", "%", "-1", "1e400mL", "\u0007", "correction", "air", "against", "standard", ""];
        Random random = new(20260601);
        int readable = 0;
        for (int i = 0; i < 20_000; i++)
        {
            string text = string.Join(' ', Enumerable.Range(0, random.Next(0, 9)).Select(_ => words[random.Next(words.Length)]));
            foreach (Action parse in new Action[] { () => Mixture(text), () => Transfer(text), () => Titration(text) })
            {
                try
                {
                    parse();
                    readable++;
                }
                catch (InputException refused)
                {
                    Assert.DoesNotContain('\n', refused.Message);
                    Assert.DoesNotContain('\u0007', refused.Message);
                }
            }
        }

        // Some of it makes sense by chance, or this test tries nothing.
        Assert.InRange(readable, 5, 20_000);
    }

    private static RecordedMixture Mixture(string text)
    {
        return MixtureText.Parse("--mixture", text, Gas.Oxygen);
    }

    private static RecordedTransfer Transfer(string text)
    {
        return TransferText.Parse("--transfer", text);
    }

    private static RecordedTitration Titration(string text)
    {
        return TitrationText.Parse("--titration", text);
    }

    private static void Refused(Action parse, string says)
    {
        string said = Assert.Throws<InputException>(parse).Message;
        Assert.Contains(says, said, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', said);
    }
}
