namespace ProbeCal;

/// <summary>How the coefficients of an equation came into this library. No journal paper was read in full.</summary>
public enum EvidenceGrade
{
    /// <summary>Recalled or derived, found in no document: it may be right, it is not evidence.</summary>
    Memory = 0,
    /// <summary>Seen in one place that quotes the paper.</summary>
    OnePlace = 1,
    /// <summary>Seen in two or more places that quote the paper; the places may share an ancestor.</summary>
    SecondHand = 2,
    /// <summary>Read in the document named.</summary>
    Read = 3,
}

/// <summary>What speaks for an equation as it stands here: where its coefficients were seen, and whether a published value comes out of it.</summary>
public sealed class Evidence
{
    internal Evidence(EvidenceGrade grade, int places, string check)
    {
        Grade = grade;
        Places = places;
        Check = check;
    }

    /// <summary>The grade.</summary>
    public EvidenceGrade Grade { get; }

    /// <summary>In how many places the coefficients were seen besides memory.</summary>
    public int Places { get; }

    /// <summary>Which published or independent value comes out of it, in words.</summary>
    public string Check { get; }

    /// <summary>Grade and check in one line of plain words.</summary>
    public string Words
    {
        get
        {
            string coefficients = Grade switch
            {
                EvidenceGrade.Read => "read in the document",
                EvidenceGrade.SecondHand => "second-hand, " + CatalogueText.Number(Places) + " places",
                EvidenceGrade.OnePlace => "second-hand, one place",
                _ => "from memory",
            };
            return coefficients + "; " + Check;
        }
    }
}
