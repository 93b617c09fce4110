namespace CoreDesign.Magnetics.Joints;

/// <summary>
/// How finely the lattice divides the way across the joint line. Cells are fine at the edges of gaps, where saturated sheets
/// share flux within a tenth of a millimetre, and grow from there.
/// </summary>
public sealed record JointGrid
{
    /// <summary>Cell at the edge of a gap, m.</summary>
    public double FinestCell_m { get; init; } = 25e-6;

    /// <summary>Ratio of a cell to its finer neighbour.</summary>
    public double Growth { get; init; } = 1.35;

    /// <summary>Cells between two neighbouring gaps are at most this part of the distance between positions.</summary>
    public double LargestCellOfShift { get; init; } = 0.125;

    /// <summary>Length of plain limb beyond the outermost gap, in decay lengths of the slowest exchange between sheets.</summary>
    public double TailDecayLengths { get; init; } = 4;

    internal void Check()
    {
        JointLimits.Hold(nameof(FinestCell_m), "Finest cell", FinestCell_m * 1e6, 1, 500, "µm");
        JointLimits.Hold(nameof(Growth), "Growth of cells", Growth, 1.05, 2, "");
        JointLimits.Hold(nameof(LargestCellOfShift), "Largest cell", LargestCellOfShift, 0.01, 0.5, "of the shift");
        JointLimits.Hold(nameof(TailDecayLengths), "Tail", TailDecayLengths, 1, 20, "decay lengths");
    }
}
