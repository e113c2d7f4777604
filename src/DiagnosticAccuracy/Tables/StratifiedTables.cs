using DiagnosticAccuracy.Tables;

namespace DiagnosticAccuracy;

/// <summary>The confusion matrices of several strata (sites, batches, age groups): pooled measures, and whether the strata agree.</summary>
/// <remarks>
/// Adding the tables up can reverse what every stratum shows when the strata differ in prevalence; the pooled ratios here compare within
/// strata only.
/// </remarks>
public sealed class StratifiedTables
{
    private StratifiedTables(IReadOnlyList<ConfusionMatrix> strata) => Strata = strata;

    /// <summary>Gets the tables of the strata.</summary>
    public IReadOnlyList<ConfusionMatrix> Strata { get; }

    /// <summary>Gets the strata added up, cell by cell.</summary>
    /// <exception cref="OverflowException">The cells add up to more than <see cref="long.MaxValue"/>.</exception>
    public ConfusionMatrix Total
    {
        get
        {
            ConfusionMatrix total = default;
            foreach (ConfusionMatrix stratum in Strata)
            {
                total += stratum;
            }

            return total;
        }
    }

    /// <summary>
    /// Gets the positive likelihood ratio pooled by Mantel and Haenszel (J Natl Cancer Inst 1959;22:719), with the variance of Greenland and Robins
    /// (Biometrics 1985;41:55).
    /// </summary>
    public PooledRatio PositiveLikelihoodRatio => MantelHaenszel.Ratio(Strata, PooledKind.PositiveLikelihoodRatio);

    /// <summary>Gets the negative likelihood ratio pooled in the same way.</summary>
    public PooledRatio NegativeLikelihoodRatio => MantelHaenszel.Ratio(Strata, PooledKind.NegativeLikelihoodRatio);

    /// <summary>
    /// Gets the diagnostic odds ratio pooled by Mantel and Haenszel, with the variance of Robins, Breslow and Greenland (Biometrics 1986;42:311).
    /// </summary>
    public PooledRatio DiagnosticOddsRatio => MantelHaenszel.OddsRatio(Strata);

    /// <summary>
    /// Gets the test of Breslow and Day (Statistical Methods in Cancer Research I, 1980) of one odds ratio in all strata, with the correction of
    /// Tarone (Biometrika 1985;72:91). Strata with an empty margin have no odds ratio and take no part.
    /// </summary>
    public HomogeneityTest OddsRatioHomogeneity => StrataHomogeneity.BreslowDay(Strata, DiagnosticOddsRatio);

    /// <summary>Gets Pearson's chi-squared test of one sensitivity in all strata that have subjects with the condition.</summary>
    public HomogeneityTest SensitivityHomogeneity => StrataHomogeneity.Pearson([.. Strata.Select(table => table.Sensitivity)], "Pearson chi-squared, sensitivity");

    /// <summary>Gets Pearson's chi-squared test of one specificity in all strata that have subjects without the condition.</summary>
    public HomogeneityTest SpecificityHomogeneity => StrataHomogeneity.Pearson([.. Strata.Select(table => table.Specificity)], "Pearson chi-squared, specificity");

    /// <summary>The tables of several strata.</summary>
    /// <param name="strata">The tables, one a stratum, of different subjects; at least one.</param>
    /// <returns>The strata.</returns>
    /// <exception cref="ArgumentNullException"><paramref name="strata"/> is null.</exception>
    /// <exception cref="ArgumentException">There are no strata.</exception>
    public static StratifiedTables Create(IEnumerable<ConfusionMatrix> strata)
    {
        Guard.NotNull(strata);
        ConfusionMatrix[] tables = [.. strata];
        return tables.Length == 0
            ? throw new ArgumentException($"{nameof(strata)} is empty; at least one table is needed.", nameof(strata))
            : new StratifiedTables(Array.AsReadOnly(tables));
    }

    /// <summary>The sensitivity over the strata.</summary>
    /// <param name="weighting">The weights; by size unless said.</param>
    /// <returns>The weighted mean; undefined when no stratum has subjects with the condition.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="weighting"/> is not a value of its type.</exception>
    public StratifiedProportion Sensitivity(StratumWeighting weighting = StratumWeighting.BySize) =>
        Mean(table => table.Sensitivity, weighting);

    /// <summary>The specificity over the strata.</summary>
    /// <param name="weighting">The weights; by size unless said.</param>
    /// <returns>The weighted mean; undefined when no stratum has subjects without the condition.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="weighting"/> is not a value of its type.</exception>
    public StratifiedProportion Specificity(StratumWeighting weighting = StratumWeighting.BySize) =>
        Mean(table => table.Specificity, weighting);

    /// <summary>For example "3 strata: TP 90, FP 20, FN 10, TN 180 in all".</summary>
    /// <returns>The text, in the invariant culture.</returns>
    public override string ToString() => $"{Display.Of(Strata.Count)} strata: {Total} in all";

    private StratifiedProportion Mean(Func<ConfusionMatrix, Proportion> proportion, StratumWeighting weighting) =>
        weighting is StratumWeighting.BySize or StratumWeighting.Equal or StratumWeighting.InverseVariance
            ? new StratifiedProportion(Array.AsReadOnly(Strata.Select(proportion).ToArray()), weighting)
            : throw Guard.UnknownOption(weighting);
}
