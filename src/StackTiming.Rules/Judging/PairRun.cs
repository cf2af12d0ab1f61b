namespace StackTiming.Rules.Judging;

/// <summary>How the two members of a pair run beside each other.</summary>
/// <param name="CoupledMetres">Length that they run side by side.</param>
/// <param name="ApartPositiveMetres">Trace length of the positive member elsewhere.</param>
/// <param name="ApartNegativeMetres">Trace length of the negative member elsewhere.</param>
/// <param name="WorstSkewSeconds">Largest difference of their delays at any point of the common run, s; not negative.</param>
/// <param name="WorstAtMetres">Where on the common run that is, from the driver.</param>
public readonly record struct PairRun(
    double CoupledMetres, double ApartPositiveMetres, double ApartNegativeMetres, double WorstSkewSeconds, double WorstAtMetres)
{
    /// <summary>
    /// Lays the coupled traces of both ways beside each other by the length that each has run coupled so far, and compares the delays from the
    /// drivers at both ends of every stretch. In between both grow linearly, so that nothing larger lies there.
    /// </summary>
    /// <param name="positive">Way of the positive member.</param>
    /// <param name="negative">Way of the negative member.</param>
    public static PairRun Of(ReceiverPath positive, ReceiverPath negative)
    {
        var (p, apartP) = Stretches(positive);
        var (n, apartN) = Stretches(negative);
        double worst = 0, at = 0, begin = 0;
        int i = 0, j = 0;
        while (i < p.Count && j < n.Count)
        {
            var end = Math.Min(p[i].EndMetres, n[j].EndMetres);
            Compare(begin);
            Compare(end);
            begin = end;
            if (p[i].EndMetres <= end)
                i++;
            if (j < n.Count && n[j].EndMetres <= end)
                j++;
        }
        return new PairRun(begin, apartP, apartN, worst, at);

        void Compare(double metres)
        {
            var skew = Math.Abs(p[i].DelayAt(metres) - n[j].DelayAt(metres));
            if (skew > worst)
                (worst, at) = (skew, metres);
        }
    }

    private static (List<Stretch> Coupled, double ApartMetres) Stretches(ReceiverPath path)
    {
        var coupled = new List<Stretch>();
        double delay = 0, length = 0, apart = 0;
        foreach (var piece in path.Pieces)
        {
            if (piece.Kind == PieceKind.Trace && piece.LengthMetres > 0)
            {
                if (piece.GapMetres > 0)
                {
                    coupled.Add(new Stretch(length, length + piece.LengthMetres, delay, piece.DelaySeconds / piece.LengthMetres));
                    length += piece.LengthMetres;
                }
                else
                {
                    apart += piece.LengthMetres;
                }
            }
            delay += piece.DelaySeconds;
        }
        return (coupled, apart);
    }

    private readonly record struct Stretch(double BeginMetres, double EndMetres, double BeginSeconds, double SecondsPerMetre)
    {
        public double DelayAt(double metres) => BeginSeconds + (metres - BeginMetres) * SecondsPerMetre;
    }
}
