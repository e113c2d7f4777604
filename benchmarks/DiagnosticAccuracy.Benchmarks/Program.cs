using BenchmarkDotNet.Columns;
using BenchmarkDotNet.Configs;
using BenchmarkDotNet.Diagnosers;
using BenchmarkDotNet.Exporters;
using BenchmarkDotNet.Jobs;
using BenchmarkDotNet.Loggers;
using BenchmarkDotNet.Running;
using BenchmarkDotNet.Toolchains.InProcess.NoEmit;

namespace DiagnosticAccuracy.Benchmarks;

internal static class Program
{
    // Short runs in this process: what counts is the ratio to the baseline of the same run, not the last percent.
    public static void Main(string[] args) =>
        BenchmarkSwitcher.FromAssembly(typeof(Program).Assembly).Run(
            args,
            ManualConfig.CreateEmpty()
                .AddJob(Job.ShortRun.WithToolchain(new InProcessNoEmitToolchain(TimeSpan.FromMinutes(30), logOutput: false)))
                .AddLogger(ConsoleLogger.Default)
                .AddColumnProvider(DefaultColumnProviders.Instance)
                .AddDiagnoser(MemoryDiagnoser.Default)
                .AddExporter(MarkdownExporter.GitHub)
                .WithOptions(ConfigOptions.DisableOptimizationsValidator));
}
