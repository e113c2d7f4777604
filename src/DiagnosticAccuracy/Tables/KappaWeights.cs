namespace DiagnosticAccuracy;

/// <summary>How much credit a pair of ratings gets in a weighted kappa: 1 for the same category, less the further apart they are.</summary>
public sealed class KappaWeights
{
    private readonly Func<int, int, int, double> _weight;
    private readonly int _categories;

    private KappaWeights(string name, int categories, Func<int, int, int, double> weight)
    {
        Name = name;
        _categories = categories;
        _weight = weight;
    }

    /// <summary>Gets 1 for the same category and 0 otherwise: Cohen's kappa.</summary>
    public static KappaWeights None { get; } = new("unweighted", 0, (i, j, _) => i == j ? 1 : 0);

    /// <summary>Gets 1 - |i - j| / (k - 1).</summary>
    public static KappaWeights Linear { get; } = new("linear weights", 0, (i, j, k) => 1 - (Math.Abs(i - j) / (double)(k - 1)));

    /// <summary>Gets 1 - (i - j)^2 / (k - 1)^2.</summary>
    public static KappaWeights Quadratic { get; } = new(
        "quadratic weights", 0, (i, j, k) => 1 - ((i - j) * (double)(i - j) / ((k - 1) * (double)(k - 1))));

    /// <summary>Gets the name of the weights.</summary>
    public string Name { get; }

    /// <summary>Weights of one's own.</summary>
    /// <param name="weights">A square matrix, row by row: 1 on the diagonal, finite and at most 1 elsewhere.</param>
    /// <param name="categories">The number of categories, 2 or more.</param>
    /// <returns>The weights.</returns>
    /// <exception cref="ArgumentOutOfRangeException">A weight is out of its range, or there are fewer than 2 categories.</exception>
    /// <exception cref="ArgumentException">The length is not the square of the categories.</exception>
    public static KappaWeights Own(ReadOnlySpan<double> weights, int categories)
    {
        Guard.AtLeast(categories, 2);
        Guard.SameLength(weights.Length, checked(categories * categories), nameof(weights), "the square of the categories");
        for (int i = 0; i < weights.Length; i++)
        {
            string name = $"{nameof(weights)}[{Display.Of(i)}]";
            Guard.Finite(weights[i], name);
            bool onDiagonal = i / categories == i % categories;
            if (onDiagonal ? weights[i] != 1 : weights[i] > 1)
            {
                throw Guard.OutOfRange(name, weights[i], onDiagonal ? "1 on the diagonal" : "at most 1");
            }
        }

        double[] copy = weights.ToArray();
        return new KappaWeights("own weights", categories, (i, j, k) => copy[(i * k) + j]);
    }

    /// <summary>Returns the name.</summary>
    /// <returns><see cref="Name"/>.</returns>
    public override string ToString() => Name;

    internal double Of(int first, int second, int categories) => _weight(first, second, categories);

    /// <summary>Gets the least kappa that these weights can give: -1 for those of the library; none for one's own.</summary>
    internal double LeastKappa => _categories == 0 ? -1 : double.NegativeInfinity;

    internal void CheckCategories(int categories, string name)
    {
        if (_categories != 0 && _categories != categories)
        {
            throw new ArgumentException(
                $"{name} are for {Display.Of(_categories)} categories and the table has {Display.Of(categories)}; they must be the same.", name);
        }
    }
}
