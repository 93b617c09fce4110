namespace CoreDesign.Benchmarks.Race;

internal static class GrowthProgram
{
    public static void Run(string folder) => throw new NotImplementedException(folder);
}
