using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>Ratings of each subject by the same number of raters, who need not be the same people: for each subject, how many chose each category.</summary>
public sealed class MultipleRaters
{
    private readonly long[] _totals;
    private readonly double[] _disagreements;
    private readonly double[] _counts;

    private MultipleRaters(int categories, int raters, long[] totals, double[] disagreements, double[] counts)
    {
        Categories = categories;
        Raters = raters;
        _totals = totals;
        _disagreements = disagreements;
        _counts = counts;
    }

    /// <summary>Gets the number of categories.</summary>
    public int Categories { get; }

    /// <summary>Gets the number of ratings of each subject.</summary>
    public int Raters { get; }

    /// <summary>Gets the number of subjects.</summary>
    public int Subjects => _disagreements.Length;

    /// <summary>
    /// Gets the kappa of Fleiss (Psychol Bull 1971;76:378) with the null standard error of Fleiss, Nee and Landis (Psychol Bull 1979;86:974) and a
    /// jackknife standard error over subjects. Undefined when all ratings are of one category.
    /// </summary>
    public Kappa FleissKappa
    {
        get
        {
            const string method = "Wald with jackknife standard error over subjects";
            double n = Subjects;
            double m = Raters;
            double[] totals = Array.ConvertAll(_totals, t => (double)t);
            double observed = _disagreements.Sum();
            if (_totals.Any(t => t == (long)Subjects * Raters))
            {
                return KappaComputation.Undefined(
                    new UndefinedReason(UndefinedCause.ZeroOverZero, "all ratings are of one category"), method);
            }

            double kappa = Coefficient(observed, totals, n, m);
            double spread = 0;
            double cubic = 0;
            foreach (double total in totals)
            {
                double pq = total / (n * m) * (((n * m) - total) / (n * m));
                spread += pq;
                cubic += pq * (1 - (2 * total / (n * m)));
            }

            double nullVariance = 2 * ((spread * spread) - cubic) / (n * m * (m - 1) * spread * spread);
            return new Kappa(Quantity.Of(kappa), Jackknife(observed, totals), Quantity.Of(Math.Sqrt(Math.Max(0, nullVariance))), method);
        }
    }

    /// <summary>The ratings from counts.</summary>
    /// <param name="counts">For each subject, one after the other, how many raters chose each category.</param>
    /// <param name="categories">The number of categories, 2 or more.</param>
    /// <returns>The ratings.</returns>
    /// <exception cref="ArgumentOutOfRangeException">A count is negative, there are fewer than 2 categories, or fewer than 2 raters.</exception>
    /// <exception cref="ArgumentException">There are no subjects, the length is not a multiple of the categories, or a subject has another number of
    /// ratings than the first.</exception>
    public static MultipleRaters FromCounts(ReadOnlySpan<int> counts, int categories)
    {
        Guard.AtLeast(categories, 2);
        Guard.NotEmpty(counts.Length, nameof(counts));
        if (counts.Length % categories != 0)
        {
            throw new ArgumentException(
                $"{nameof(counts)} has {Display.Of(counts.Length)} elements; allowed is a multiple of the categories, {Display.Of(categories)}.", nameof(counts));
        }

        int subjects = counts.Length / categories;
        long[] totals = new long[categories];
        double[] disagreements = new double[subjects];
        double[] copy = new double[counts.Length];
        int raters = 0;
        for (int i = 0; i < subjects; i++)
        {
            int ratings = 0;
            long squares = 0;
            for (int j = 0; j < categories; j++)
            {
                int count = counts[(i * categories) + j];
                Guard.CountAt(count, (i * categories) + j, nameof(counts));
                ratings = checked(ratings + count);
                squares += (long)count * count;
                totals[j] += count;
                copy[(i * categories) + j] = count;
            }

            if (i == 0)
            {
                raters = ratings;
                Guard.AtLeast(raters, 2, "the number of ratings of a subject");
            }
            else if (ratings != raters)
            {
                throw new ArgumentException(
                    $"{nameof(counts)}: subject {Display.Of(i)} has {Display.Of(ratings)} ratings and the first has {Display.Of(raters)}; they must have the same number.",
                    nameof(counts));
            }

            disagreements[i] = (((long)raters * raters) - squares) / (raters * (raters - 1.0));
        }

        return new MultipleRaters(categories, raters, totals, disagreements, copy);
    }

    // Observed over expected disagreement, so that a category which nearly all ratings are of costs no digits.
    private static double Coefficient(double observed, double[] totals, double subjects, double raters)
    {
        double ratings = subjects * raters;
        double expected = 0;
        foreach (double total in totals)
        {
            expected += total / ratings * ((ratings - total) / ratings);
        }

        return expected == 0 ? double.NaN : (expected - (observed / subjects)) / expected;
    }

    private Quantity Jackknife(double observed, double[] totals)
    {
        if (Subjects < 2)
        {
            return Quantity.Undefined(UndefinedCause.TooFewSubjects, "one subject gives no variance");
        }

        double[] values = new double[Subjects];
        double[] rest = new double[Categories];
        for (int i = 0; i < Subjects; i++)
        {
            for (int j = 0; j < Categories; j++)
            {
                rest[j] = totals[j] - _counts[(i * Categories) + j];
            }

            values[i] = Coefficient(observed - _disagreements[i], rest, Subjects - 1, Raters);
            if (double.IsNaN(values[i]))
            {
                return Quantity.Undefined(UndefinedCause.TooFewSubjects, "without one of the subjects all ratings are of one category");
            }
        }

        double mean = values.Average();
        double squares = values.Sum(value => (value - mean) * (value - mean));
        return Quantity.Of(Math.Sqrt((Subjects - 1.0) / Subjects * squares));
    }
}
