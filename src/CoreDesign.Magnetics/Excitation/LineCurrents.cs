using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Excitation;

/// <summary>Currents of the supply lines from the winding currents, by the connection's rule.</summary>
public static class LineCurrents
{
    /// <summary>
    /// Delta: line A carries winding A less winding C, and so on round. Star: each line its winding. Single: line L the one winding.
    /// </summary>
    public static IReadOnlyList<(string Name, double[] Current_A)> Of(CircuitSolution solution)
    {
        ArgumentNullException.ThrowIfNull(solution);
        return Of(solution.Circuit, solution.WindingCurrent_A);
    }

    /// <summary>The same rule for currents of any span of time; first index is the winding.</summary>
    public static IReadOnlyList<(string Name, double[] Current_A)> Of(MagneticCircuit circuit, IReadOnlyList<double[]> current_A)
    {
        ArgumentNullException.ThrowIfNull(circuit);
        ArgumentNullException.ThrowIfNull(current_A);
        var windings = circuit.Windings;
        double[] Of(WindingPhase phase)
        {
            for (var w = 0; w < windings.Count; w++)
            {
                if (windings[w].Phase == phase)
                {
                    return current_A[w];
                }
            }

            throw new CircuitException($"There is no winding of phase {phase}.");
        }

        if (circuit.Supply.Connection == SupplyConnection.Single)
        {
            return [("L", Of(WindingPhase.Single))];
        }

        double[] a = Of(WindingPhase.A), b = Of(WindingPhase.B), c = Of(WindingPhase.C);
        return circuit.Supply.Connection == SupplyConnection.Delta
            ? [("A", Less(a, c)), ("B", Less(b, a)), ("C", Less(c, b))]
            : [("A", a), ("B", b), ("C", c)];
    }

    private static double[] Less(double[] x, double[] y) => [.. x.Select((v, i) => v - y[i])];
}
