using DiagnosticAccuracy.Roc;

namespace DiagnosticAccuracy;

/// <summary>
/// The empirical ROC curve of a test: sensitivity and specificity at every cutoff the data can tell apart.
/// </summary>
/// <remarks>
/// Subjects with equal scores change sides together, so a tie between the groups is one sloped step. No point is left out, and the
/// direction is the one stated with the sample.
/// </remarks>
public sealed class RocCurve
{
    private RocCurve(ScoredSample sample)
    {
        Sample = sample;
        Points = new LazyList<OperatingPoint>(sample.LevelCount + 1, PointAt);
        Area = AreaUnderCurve.Of(sample);
    }

    /// <summary>Gets the sample the curve was made from.</summary>
    public ScoredSample Sample { get; }

    /// <summary>
    /// Gets the points of the curve: first the cutoff beyond every score (nobody positive: sensitivity 0, specificity 1), then
    /// one for each distinct score from the one that speaks most for the condition to the one that speaks least (everybody positive).
    /// </summary>
    public IReadOnlyList<OperatingPoint> Points { get; }

    /// <summary>Gets the area under the curve.</summary>
    public AreaUnderCurve Area { get; }

    /// <summary>The empirical curve of a sample.</summary>
    /// <param name="sample">The sample.</param>
    /// <returns>The curve.</returns>
    /// <exception cref="ArgumentNullException"><paramref name="sample"/> is null.</exception>
    public static RocCurve Empirical(ScoredSample sample)
    {
        Guard.NotNull(sample);
        return new RocCurve(sample);
    }

    /// <summary>What the test does at any cutoff, whether or not a subject has that score.</summary>
    /// <param name="cutoff">The cutoff, in the direction of the sample.</param>
    /// <returns>The cutoff as given, with its four cells.</returns>
    /// <exception cref="ArgumentException">The cutoff's direction is not the sample's.</exception>
    public OperatingPoint At(Cutoff cutoff)
    {
        if (cutoff.Direction != Sample.Direction)
        {
            throw new ArgumentException(
                $"{nameof(cutoff)} is {cutoff}; allowed is a cutoff in the direction of the sample, {Sample.Direction}.", nameof(cutoff));
        }

        return new OperatingPoint(cutoff, TableAt(cutoff.Score is { } score ? LevelsPositiveAt(score) : 0));
    }

    /// <summary>The area in a part of the square that was stated beforehand.</summary>
    /// <param name="range">The part, which names the definition.</param>
    /// <returns>The partial area, raw and standardised; undefined, with the reason, when a group is empty.</returns>
    public PartialArea PartialArea(PartialAreaRange range) => PartialAreas.Of(Sample, range);

    /// <summary>The sensitivity at a specificity that was stated beforehand, with the error of a cutoff that is estimated.</summary>
    /// <param name="specificity">The specificity, from 0 to 1.</param>
    /// <returns>The greatest sensitivity on the curve at it; undefined, with the reason, when a group is empty.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="specificity"/> is NaN or not from 0 to 1.</exception>
    public FixedPoint SensitivityAtSpecificity(double specificity)
    {
        Guard.Probability(specificity);
        return FixedPoints.Of(this, FixedPointKind.SensitivityAtSpecificity, specificity);
    }

    /// <summary>The specificity at a sensitivity that was stated beforehand, with the error of a cutoff that is estimated.</summary>
    /// <param name="sensitivity">The sensitivity, from 0 to 1.</param>
    /// <returns>The greatest specificity on the curve at it; undefined, with the reason, when a group is empty.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="sensitivity"/> is NaN or not from 0 to 1.</exception>
    public FixedPoint SpecificityAtSensitivity(double sensitivity)
    {
        Guard.Probability(sensitivity);
        return FixedPoints.Of(this, FixedPointKind.SpecificityAtSensitivity, sensitivity);
    }

    /// <summary>The test that the scores do not tell the groups apart: Mann-Whitney, with ties.</summary>
    /// <param name="method">The method; the normal approximation with the variance corrected for ties unless said.</param>
    /// <param name="alternative">Two-sided unless said; greater means that the area is above one half.</param>
    /// <returns>The test; undefined, with the reason, when a group is empty.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An option is not a value of its type.</exception>
    /// <remarks>Sources: Mann and Whitney, Ann Math Stat 1947;18:50; Streitberg and Roehmel, Stat Softw Newsl 1986;12:10.</remarks>
    public ChanceTest TestOfChance(ChanceTestMethod method = ChanceTestMethod.Normal, Alternative alternative = Alternative.TwoSided) =>
        RankSumTest.Of(Sample, Area, method, alternative);

    /// <summary>For example "131 points, area 0.861438 (90 with, 51 without the condition)".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Display.Of(Points.Count)} points, area {Area}";

    /// <summary>The true positives when so many levels, counted from the most positive one, are positive.</summary>
    internal long TruePositives(int levelsPositive) => Sample.WithCondition - Sample.With.Below(Sample.LevelCount - levelsPositive);

    /// <summary>The false positives when so many levels, counted from the most positive one, are positive.</summary>
    internal long FalsePositives(int levelsPositive) => Sample.WithoutCondition - Sample.Without.Below(Sample.LevelCount - levelsPositive);

    /// <summary>The point at which so many levels, counted from the most positive one, are positive.</summary>
    internal OperatingPoint PointAt(int levelsPositive) => new(
        levelsPositive == 0
            ? Cutoff.Beyond(Sample.Direction)
            : Cutoff.At(Sample.Scores[Sample.LevelCount - levelsPositive], Sample.Direction),
        TableAt(levelsPositive));

    private ConfusionMatrix TableAt(int levelsPositive)
    {
        long truePositives = TruePositives(levelsPositive);
        long falsePositives = FalsePositives(levelsPositive);
        return new ConfusionMatrix(
            truePositives, falsePositives, Sample.WithCondition - truePositives, Sample.WithoutCondition - falsePositives);
    }

    // Scores run from least to most positive; the positive ones are those from the first that reaches the cutoff.
    private int LevelsPositiveAt(double score)
    {
        int low = 0;
        int high = Sample.LevelCount;
        while (low < high)
        {
            int middle = low + ((high - low) / 2);
            bool positive = Sample.Direction == ScoreDirection.HigherIsPositive
                ? Sample.Scores[middle] >= score
                : Sample.Scores[middle] <= score;
            if (positive)
            {
                high = middle;
            }
            else
            {
                low = middle + 1;
            }
        }

        return Sample.LevelCount - low;
    }
}
