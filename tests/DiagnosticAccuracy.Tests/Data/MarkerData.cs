namespace DiagnosticAccuracy.Tests.Data;

/// <summary>The two open data sets, as scores and status.</summary>
internal static class MarkerData
{
    public static PairedScores Pancreatic() => Pair("pancreatic-markers.csv", "ca199", "ca125", row => row["d"] == "1");

    public static PairedScores Biopsy() => Pair("breast-biopsy.csv", "V1", "V6", row => row["class"] == "malignant");

    public static ScoredSample BiopsyFeature(string feature) =>
        ScoredSample.FromRows(
            ReferenceData.Csv("breast-biopsy.csv").Where(row => row[feature] != "NA"),
            row => row.Number(feature),
            row => row["class"] == "malignant",
            ScoreDirection.HigherIsPositive);

    private static PairedScores Pair(string file, string first, string second, Func<IReadOnlyDictionary<string, string>, bool> hasCondition) =>
        PairedScores.FromRows(
            ReferenceData.Csv(file),
            row => Score(row, first),
            ScoreDirection.HigherIsPositive,
            row => Score(row, second),
            ScoreDirection.HigherIsPositive,
            hasCondition);

    private static double? Score(IReadOnlyDictionary<string, string> row, string column) =>
        row[column] is "NA" ? null : row.Number(column);
}
