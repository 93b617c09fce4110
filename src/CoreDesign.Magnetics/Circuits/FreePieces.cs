using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// The equations of the free fluxes laid out flat for the inner loop, part of the prepared circuit. Row j: sum over paths of PerFree[j] times MMF. Its linear part
/// is a constant matrix; each curved piece has B = base + sum of PerArea[j]·z[j] and adds Weight[j]·H(B).
/// </summary>
internal sealed class FreePieces
{
    public FreePieces(FluxPath[] paths, int freeCount)
    {
        FreeCount = freeCount;
        Reluctance = new double[freeCount * freeCount];
        var pieces = new List<(int Path, MonotoneCurve Curve, SheetLaw? Law, double Area, double Weight)>();
        for (var p = 0; p < paths.Length; p++)
        {
            var path = paths[p];
            if (!path.IsFree)
            {
                continue;
            }

            for (var i = 0; i < freeCount; i++)
            {
                for (var j = 0; j < freeCount; j++)
                {
                    Reluctance[(i * freeCount) + j] += path.PerFree[i] * path.Reluctance_A_per_Wb * path.PerFree[j];
                }
            }

            pieces.AddRange(path.Steel.Select(s => (p, s.Law.Spine, (SheetLaw?)s.Law, s.Area_m2, s.Length_m)));
            pieces.AddRange(path.Joints.Select(x => (p, x.Curve, (SheetLaw?)null, x.Area_m2, (double)x.Count)));
        }

        Count = pieces.Count;
        Path = [.. pieces.Select(x => x.Path)];
        Curve = [.. pieces.Select(x => x.Curve)];
        Rate = [.. pieces.Select(x => x.Law is { HasRate: true } law ? law : null)];
        Stops = [.. pieces.Select(x => x.Law is { Together.IsEmpty: false } law ? law.Together : null)];
        BasePerArea = [.. pieces.Select(x => 1 / x.Area)];
        PerArea = new double[Count * freeCount];
        Weight = new double[Count * freeCount];
        for (var i = 0; i < Count; i++)
        {
            for (var j = 0; j < freeCount; j++)
            {
                PerArea[(i * freeCount) + j] = paths[pieces[i].Path].PerFree[j] / pieces[i].Area;
                Weight[(i * freeCount) + j] = paths[pieces[i].Path].PerFree[j] * pieces[i].Weight;
            }
        }

        HasMemory = Array.Exists(Stops, s => s is not null);
        HasRate = Array.Exists(Rate, s => s is not null);
    }

    public int FreeCount { get; }

    /// <summary>Number of curved pieces.</summary>
    public int Count { get; }

    public bool HasMemory { get; }

    public bool HasRate { get; }

    /// <summary>Linear part, free by free, A/Wb.</summary>
    public double[] Reluctance { get; }

    /// <summary>Path of each piece.</summary>
    public int[] Path { get; }

    public MonotoneCurve[] Curve { get; }

    public SheetLaw?[] Rate { get; }

    public StopCurve?[] Stops { get; }

    public double[] BasePerArea { get; }

    /// <summary>Flux density of each piece per free flux, pieces by free.</summary>
    public double[] PerArea { get; }

    /// <summary>What a field strength of one gives to each row, pieces by free.</summary>
    public double[] Weight { get; }
}
