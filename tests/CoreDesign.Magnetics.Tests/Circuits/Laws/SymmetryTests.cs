using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Excitation;

namespace CoreDesign.Magnetics.Tests.Circuits.Laws;

/// <summary>Half periods and shifted phases are solved once; solving all of them must change nothing.</summary>
public class SymmetryTests
{
    public static TheoryData<Frame, SupplyConnection, Ingredients> Cases
    {
        get
        {
            var cases = new TheoryData<Frame, SupplyConnection, Ingredients>();
            foreach (var with in (Ingredients[])[Ingredients.None, Ingredients.AllLosses | Ingredients.Joints])
            {
                cases.Add(Frame.TwoLimb, SupplyConnection.Single, with);
                cases.Add(Frame.Shell, SupplyConnection.Single, with);
                cases.Add(Frame.FourLimb, SupplyConnection.Single, with);
                foreach (var connection in (SupplyConnection[])[SupplyConnection.StarWithNeutral, SupplyConnection.StarIsolated, SupplyConnection.Delta])
                {
                    cases.Add(Frame.ThreeLimb, connection, with);
                    cases.Add(Frame.FiveLimb, connection, with);
                    cases.Add(Frame.Bank, connection, with);
                }
            }

            return cases;
        }
    }

    [Theory]
    [MemberData(nameof(Cases))]
    public void Without_it_everything_stays(Frame frame, SupplyConnection connection, Ingredients with)
    {
        for (var seed = RandomCircuit.FirstSeed; seed < RandomCircuit.FirstSeed + 3; seed++)
        {
            var circuit = new PreparedCircuit(RandomCircuit.Draw(frame, connection, with, seed));
            var half = circuit.Solve(new SolverOptions(96), TestContext.Current.CancellationToken);
            var whole = circuit.Solve(new SolverOptions(96) { UseSymmetry = false }, TestContext.Current.CancellationToken);

            // Marched waveforms settle to the tolerance of a march; the others are equal to rounding.
            var marched = connection == SupplyConnection.StarIsolated || frame is Frame.Shell or Frame.FourLimb or Frame.FiveLimb;
            var near = marched && with != Ingredients.None ? 1e-6 : 1e-9;
            for (var w = 0; w < whole.WindingCurrent_A.Length; w++)
            {
                var scale = Waveform.Peak(whole.WindingCurrent_A[w]);
                for (var t = 0; t < whole.Points; t++)
                {
                    Assert.True(Math.Abs(whole.WindingCurrent_A[w][t] - half.WindingCurrent_A[w][t]) <= near * scale, $"seed {seed}, winding {w}, point {t}: {whole.WindingCurrent_A[w][t]} A and {half.WindingCurrent_A[w][t]} A");
                }
            }

            Assert.Equal(whole.CoreLoss_W, half.CoreLoss_W, near * Math.Max(whole.CoreLoss_W, 1e-12));
        }
    }
}
