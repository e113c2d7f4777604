using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>The cross table of two ratings of the same subjects into the same categories.</summary>
/// <remarks>All coefficients here depend on how often the categories occur: they do not carry over to other people.</remarks>
public sealed class RatingTable
{
    private readonly long[] _counts;

    private RatingTable(long[] counts, int categories, long total)
    {
        _counts = counts;
        Categories = categories;
        Total = total;
    }

    /// <summary>Gets the number of categories.</summary>
    public int Categories { get; }

    /// <summary>Gets the number of subjects.</summary>
    public long Total { get; }

    /// <summary>Gets the share of subjects on whom both ratings agree. Undefined when there are no subjects.</summary>
    public Proportion ObservedAgreement
    {
        get
        {
            long same = 0;
            for (int i = 0; i < Categories; i++)
            {
                same += this[i, i];
            }

            return new Proportion(same, Total, UndefinedReason.NoSubjects);
        }
    }

    /// <summary>
    /// Gets the prevalence-adjusted and bias-adjusted kappa, (k p - 1) / (k - 1) with p the observed agreement (Byrt, Bishop and Carlin, J Clin
    /// Epidemiol 1993;46:423); its standard error is that of p on this scale.
    /// </summary>
    public Kappa PrevalenceAndBiasAdjustedKappa => KappaComputation.PrevalenceAndBiasAdjusted(this);

    /// <summary>
    /// Gets Scott's pi (Public Opin Q 1955;19:321): chance agreement from the mean share of each category, as if both ratings used the categories alike.
    /// Its value is the kappa of Fleiss for two ratings; its standard error is that of the delta method over the cells. Undefined when there are no
    /// subjects, or when both ratings use one category only.
    /// </summary>
    public Kappa ScottPi => KappaComputation.Scott(this);

    /// <summary>Gets Gwet's first-order agreement coefficient (AC1; Gwet, Br J Math Stat Psychol 2008;61:29).</summary>
    public Kappa FirstOrderAgreementCoefficient => KappaComputation.FirstOrderAgreement(this);

    /// <summary>Gets the number of subjects with a pair of ratings.</summary>
    /// <param name="first">The category of the first rating, from 0.</param>
    /// <param name="second">The category of the second rating, from 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">A category is not in the table.</exception>
    public long this[int first, int second]
    {
        get
        {
            _ = Category(first, Categories, nameof(first));
            _ = Category(second, Categories, nameof(second));
            return _counts[(first * Categories) + second];
        }
    }

    /// <summary>A table from its counts.</summary>
    /// <param name="counts">The counts row by row: rows are the first rating, columns the second.</param>
    /// <param name="categories">The number of categories, 2 or more.</param>
    /// <returns>The table. An empty one is allowed; what it does not define says so.</returns>
    /// <exception cref="ArgumentOutOfRangeException">A count is negative, or there are fewer than 2 categories.</exception>
    /// <exception cref="ArgumentException">The number of counts is not the square of the categories.</exception>
    /// <exception cref="OverflowException">The counts add up to more than <see cref="long.MaxValue"/>.</exception>
    public static RatingTable FromCounts(ReadOnlySpan<long> counts, int categories)
    {
        Guard.AtLeast(categories, 2);
        Guard.SameLength(counts.Length, checked(categories * categories), nameof(counts), "the square of the categories");
        long total = 0;
        for (int i = 0; i < counts.Length; i++)
        {
            Guard.CountAt(counts[i], i, nameof(counts));
            total = checked(total + counts[i]);
        }

        return new RatingTable(counts.ToArray(), categories, total);
    }

    /// <summary>A table of any sequence of rows.</summary>
    /// <typeparam name="T">The type of a row.</typeparam>
    /// <param name="rows">The rows, one a subject; they are read once.</param>
    /// <param name="first">Gives the category of the first rating, from 0.</param>
    /// <param name="second">Gives the category of the second rating, from 0.</param>
    /// <param name="categories">The number of categories, 2 or more.</param>
    /// <returns>The table; empty for no rows.</returns>
    /// <exception cref="ArgumentNullException">An argument is null.</exception>
    /// <exception cref="ArgumentOutOfRangeException">There are fewer than 2 categories, or a row is in none of them; the message says which row.</exception>
    public static RatingTable FromRows<T>(IEnumerable<T> rows, Func<T, int> first, Func<T, int> second, int categories)
    {
        Guard.NotNull(rows);
        Guard.NotNull(first);
        Guard.NotNull(second);
        Guard.AtLeast(categories, 2);
        long[] counts = new long[checked(categories * categories)];
        long total = 0;
        foreach (T row in rows)
        {
            int one = Category(first(row), categories, $"{nameof(first)} of row {Display.Of(total)}");
            int other = Category(second(row), categories, $"{nameof(second)} of row {Display.Of(total)}");
            counts[(one * categories) + other]++;
            total++;
        }

        return new RatingTable(counts, categories, total);
    }

    /// <summary>How often the first rating chose a category.</summary>
    /// <param name="category">The category, from 0.</param>
    /// <returns>The count.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The category is not in the table.</exception>
    public long FirstTotal(int category)
    {
        long sum = 0;
        for (int j = 0; j < Categories; j++)
        {
            sum += this[category, j];
        }

        return sum;
    }

    /// <summary>How often the second rating chose a category.</summary>
    /// <param name="category">The category, from 0.</param>
    /// <returns>The count of the second rating.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The category is not in the table.</exception>
    public long SecondTotal(int category)
    {
        long sum = 0;
        for (int i = 0; i < Categories; i++)
        {
            sum += this[i, category];
        }

        return sum;
    }

    /// <summary>
    /// Cohen's kappa (Educ Psychol Meas 1960;20:37), weighted when weights are given (Psychol Bull 1968;70:213), with the standard errors of Fleiss,
    /// Cohen and Everitt (Psychol Bull 1969;72:323).
    /// </summary>
    /// <param name="weights">The weights; none unless said.</param>
    /// <returns>The coefficient; undefined when there are no subjects, or when chance alone would agree fully.</returns>
    /// <exception cref="ArgumentException">The weights are for another number of categories.</exception>
    public Kappa CohenKappa(KappaWeights? weights = null) => KappaComputation.Cohen(this, weights ?? KappaWeights.None);

    /// <summary>
    /// Agreement on one category: of all ratings of that category, the share whose other rating agrees, 2 n(ii) / (n(i.) + n(.i)) (Cicchetti and
    /// Feinstein, J Clin Epidemiol 1990;43:551). It has the form of F1 and its interval.
    /// </summary>
    /// <param name="category">The category, from 0.</param>
    /// <returns>The specific agreement; undefined when neither rating ever chose the category.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The category is not in the table.</exception>
    public FMeasure SpecificAgreement(int category)
    {
        long both = this[category, category];
        return new FMeasure(both, FirstTotal(category) - both, SecondTotal(category) - both, 1);
    }

    /// <summary>
    /// How differently the two ratings use a category: the absolute difference of its shares. With two categories this is the bias
    /// index of Byrt, Bishop and Carlin (1993).
    /// </summary>
    /// <param name="category">The category, from 0; the first unless said.</param>
    /// <returns>The index, from 0 to 1; undefined when there are no subjects.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The category is not in the table.</exception>
    public Quantity BiasIndex(int category = 0)
    {
        _ = Category(category, Categories, nameof(category));
        return Total == 0
            ? Quantity.Undefined(UndefinedReason.NoSubjects)
            : Quantity.Of(Math.Abs(FirstTotal(category) - SecondTotal(category)) / (double)Total);
    }

    /// <summary>
    /// How unevenly two categories are agreed on: the absolute difference of n(ii) over the total. With two categories this is the
    /// prevalence index of Byrt, Bishop and Carlin (1993).
    /// </summary>
    /// <returns>The index, from 0 to 1; undefined when there are no subjects or more than two categories.</returns>
    public Quantity PrevalenceIndex()
    {
        if (Categories != 2)
        {
            return Quantity.Undefined(UndefinedCause.NotPartOfMethod, "the prevalence index is for two categories");
        }

        return Total == 0
            ? Quantity.Undefined(UndefinedReason.NoSubjects)
            : Quantity.Of(Math.Abs(this[0, 0] - this[1, 1]) / (double)Total);
    }

    /// <summary>For example "3 categories, 200 subjects, agreement on 140/200 = 0.7".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Display.Of(Categories)} categories, {Display.Of(Total)} subjects, agreement on {ObservedAgreement}";

    private static int Category(int category, int categories, string name) => category >= 0 && category < categories
        ? category
        : throw Guard.OutOfRange(name, category, $"a category from 0 to {Display.Of(categories - 1)}");
}
