using CoreDesign.Estimating.Circuits;

namespace CoreDesign.Estimating.Tests.CrossCheck;

public sealed class SettlingTests
{
    /// <summary>
    /// Drawn circuits whose return loops kept a remanent flux for ever when each half period simply followed the one before. The state of a core that
    /// was demagnetised has no direct flux, so no direct current and no even harmonics.
    /// </summary>
    [Theory]
    [InlineData("D", 17)]
    [InlineData("YN", 17)]
    [InlineData("Y", 3)]
    [InlineData("Y", 11)]
    public void Hysteresis_of_free_loops_settles_without_remanence(string connection, int seed)
    {
        var circuit = RandomCircuit.Draw("fiveLimb", connection, eddy: true, stops: true, new Random(seed));

        var outcome = SolveCircuit.Run(circuit.Case, cancel: TestContext.Current.CancellationToken);

        Assert.True(outcome.Ok, outcome.Unsolvable?.Reason);
        Assert.All(outcome.Value!.Waveforms.B.Values, wave => Assert.Equal(0, wave.Average(), 1e-6));
        Assert.InRange(outcome.Value.EnergyBalanceResidualOverVA, -1e-3, 1e-3);
    }
}
