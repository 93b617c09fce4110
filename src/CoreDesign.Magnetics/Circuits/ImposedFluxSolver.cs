using MathNet.Numerics.LinearAlgebra;

namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// Circuits whose every flux follows from the windings' linkages (as many loops as windings, no resistance): fluxes and their rates are
/// exact, fields are evaluated point by point, currents follow from one constant matrix. No iteration.
/// </summary>
internal static class ImposedFluxSolver
{
    public static CircuitSolution Solve(MagneticCircuit circuit, CircuitTopology topology, SolverOptions options)
    {
        int n = options.PointsPerPeriod, b = circuit.Branches.Count, k = circuit.Windings.Count;
        var inverse = Matrix<double>.Build.DenseOfArray(topology.Linkages).Inverse();
        var fluxPerLinkage = (Matrix<double>.Build.DenseOfArray(topology.Loops) * inverse).ToArray();
        var linkage = circuit.Windings.Select(w => SupplyWaveform.Linkage(circuit.Supply, w.Phase, n)).ToArray();
        var voltage = circuit.Windings.Select(w => SupplyWaveform.Voltage(circuit.Supply, w.Phase, n)).ToArray();

        var flux = Combine(fluxPerLinkage, linkage, n);
        var rate = Combine(fluxPerLinkage, voltage, n);
        var evaluation = new BranchEvaluation(circuit, n);
        for (var i = 0; i < b; i++)
        {
            evaluation.Run(i, flux[i], rate[i]);
        }

        var current = new double[k][];
        for (var w = 0; w < k; w++)
        {
            current[w] = new double[n];
            for (var i = 0; i < b; i++)
            {
                var g = fluxPerLinkage[i, w];
                if (g == 0)
                {
                    continue;
                }

                var mmf = evaluation.Mmf_A[i];
                for (var t = 0; t < n; t++)
                {
                    current[w][t] += g * mmf[t];
                }
            }
        }

        return evaluation.Solution(flux, rate, current, voltage) with { FluxPerLinkage = fluxPerLinkage };
    }

    private static double[][] Combine(double[,] weights, double[][] waves, int n)
    {
        var result = new double[weights.GetLength(0)][];
        for (var i = 0; i < result.Length; i++)
        {
            var x = result[i] = new double[n];
            for (var w = 0; w < waves.Length; w++)
            {
                var g = weights[i, w];
                for (var t = 0; g != 0 && t < n; t++)
                {
                    x[t] += g * waves[w][t];
                }
            }
        }

        return result;
    }
}
