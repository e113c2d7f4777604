#:project AccuracyReport/AccuracyReport.csproj

// The main job, end to end: scores and reference status in, accuracy statement out.
//
//     dotnet run docs/examples/accuracy-report.cs
//     dotnet run docs/examples/accuracy-report.cs -- --help
//
// The work is in AccuracyReport/: StudyReader reads the file, Statement writes the text.
return DiagnosticAccuracy.Examples.AccuracyReport.Run(args, Console.Out, Console.Error);
