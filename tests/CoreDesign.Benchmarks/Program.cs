using BenchmarkDotNet.Configs;
using BenchmarkDotNet.Jobs;
using BenchmarkDotNet.Running;
using BenchmarkDotNet.Toolchains.InProcess.Emit;
using CoreDesign.Benchmarks.Race;

// "race": our solver, a circuit simulator and the bare evaluation, side by side in one run. "growth": cost against size, with its plot. Else: BenchmarkDotNet.
switch (args.FirstOrDefault())
{
    case "race":
        RaceProgram.Run();
        break;
    case "growth":
        GrowthProgram.Run(args.ElementAtOrDefault(1) ?? "tests/CoreDesign.Benchmarks/Results");
        break;
    default:
        // In this process: a program of its own for each run would build the whole solution again, longer than a small machine is given for it.
        BenchmarkSwitcher.FromAssembly(typeof(Program).Assembly)
            .Run(args, DefaultConfig.Instance.AddJob(Job.Default.WithToolchain(InProcessEmitToolchain.Instance).AsDefault()));
        break;
}
