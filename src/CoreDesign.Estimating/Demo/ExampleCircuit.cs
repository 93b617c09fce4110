namespace CoreDesign.Estimating.Demo;

/// <summary>An invented magnetic circuit to try the solver on, as the text that a person would type.</summary>
public static class ExampleCircuit
{
    public static string Json { get; } = Load();

    private static string Load()
    {
        using var stream = typeof(ExampleCircuit).Assembly.GetManifestResourceStream("CoreDesign.Estimating.Data.example_circuit.json")
            ?? throw new InvalidOperationException("The example circuit is missing from the assembly.");
        using var reader = new StreamReader(stream);
        return reader.ReadToEnd();
    }
}
