// Makes platelet-units.csv, the invented demo study: platelet units tested for bacterial growth before release, in an
// enriched (two-gate) validation study. Culture is the reference standard; a new optical assay and an older lactate assay
// were run on the same units. Nothing in it comes from real units.
//
//     dotnet run docs/examples/data/make-platelet-units.cs > docs/examples/data/platelet-units.csv
//
// The generator is written out here, so that the file comes out the same on every runtime.
using System.Globalization;

ulong state = 20260901;
Console.Out.NewLine = "\n";
Console.Out.WriteLine("unit,culture,optical,lactate");
for (int unit = 1; unit <= 400; unit++)
{
    // Three in ten were inoculated or grew in culture: far more than in practice.
    bool growth = Uniform() < 0.3;

    // What both assays see of a unit beside its status: the bacterial load with growth, the age of the unit without.
    double shared = Normal();
    double optical = Math.Exp(growth
        ? Math.Log(1.05) + (0.40 * shared) + (0.38 * Normal())
        : Math.Log(0.34) + (0.12 * shared) + (0.32 * Normal()));
    double lactate = growth
        ? 13.5 + (1.8 * shared) + (2.2 * Normal())
        : 9.5 + (0.8 * shared) + (1.9 * Normal());
    double chance = Uniform();
    string culture = chance < 0.015 ? "indeterminate" : growth ? "positive" : "negative";
    string opticalText = chance is >= 0.03 and < 0.04 ? "invalid" : Text(Math.Round(optical, 3));
    string lactateText = chance is >= 0.05 and < 0.06 ? "" : Text(Math.Round(lactate * 2, MidpointRounding.AwayFromZero) / 2);
    Console.Out.WriteLine($"P{unit.ToString("D4", CultureInfo.InvariantCulture)},{culture},{opticalText},{lactateText}");
}

string Text(double value) => value.ToString("R", CultureInfo.InvariantCulture);

double Normal() => Math.Sqrt(-2 * Math.Log(1 - Uniform())) * Math.Cos(2 * Math.PI * Uniform());

double Uniform() => (Next() >> 11) * (1.0 / (1UL << 53));

// SplitMix64 (Steele, Lea and Flood 2014).
ulong Next()
{
    state += 0x9E3779B97F4A7C15;
    ulong z = state;
    z = (z ^ (z >> 30)) * 0xBF58476D1CE4E5B9;
    z = (z ^ (z >> 27)) * 0x94D049BB133111EB;
    return z ^ (z >> 31);
}
