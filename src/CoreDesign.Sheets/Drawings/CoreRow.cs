using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Sheets.Drawings;

/// <summary>A limb as it stands in the front view; millimetres from the left edge of the core.</summary>
internal sealed record RowLimb(string Letter, double X_mm, double Width_mm, bool IsReturn)
{
    public double Right_mm => X_mm + Width_mm;

    public double Axis_mm => X_mm + (Width_mm / 2);
}

/// <summary>A window between two limbs, and whether it has the width of those beside a return limb.</summary>
internal sealed record RowWindow(double X_mm, double Width_mm, bool IsReturn)
{
    public double Right_mm => X_mm + Width_mm;
}

/// <summary>The row of limbs and windows from the left.</summary>
internal sealed class CoreRow
{
    private CoreRow(IReadOnlyList<RowLimb> limbs, bool returnWindows)
    {
        Limbs = limbs;
        Windows = [.. Enumerable.Range(0, limbs.Count - 1).Select(i =>
            new RowWindow(limbs[i].Right_mm, limbs[i + 1].X_mm - limbs[i].Right_mm, returnWindows && (limbs[i].IsReturn || limbs[i + 1].IsReturn)))];
    }

    public IReadOnlyList<RowLimb> Limbs { get; }

    public IReadOnlyList<RowWindow> Windows { get; }

    /// <summary>The window that the window's width and the limb pitch are shown at: the last between wound limbs.</summary>
    public int MainWindow => Enumerable.Range(0, Windows.Count).Last(i => !Windows[i].IsReturn);

    /// <summary>The limbs that a winding may stand on have the section that is drawn; a return limb has its own width.</summary>
    public int FirstWound => Enumerable.Range(0, Limbs.Count).First(i => !Limbs[i].IsReturn);

    /// <summary>The wound limb with the most room beside it; of several alike the last.</summary>
    public int Roomiest => Enumerable.Range(0, Limbs.Count).Reverse().Where(i => !Limbs[i].IsReturn).MaxBy(i => RoomBeside_mm(i));

    /// <summary>Width of the narrower window beside a limb.</summary>
    public double RoomBeside_mm(int limb) => new[] { limb - 1, limb }.Where(i => i >= 0 && i < Windows.Count).Min(i => Math.Round(Windows[i].Width_mm, 6));

    public static CoreRow Of(EstimateResult r)
    {
        var g = r.Geometry;
        if (g.Limbs.Count > 1)
        {
            var edge = g.Limbs[0].Axis_mm - (g.Limbs[0].Width_mm / 2);
            return new([.. g.Limbs.Select(l => new RowLimb(l.Name["limb".Length..], l.Axis_mm - (l.Width_mm / 2) - edge, l.Width_mm, l.IsReturn))], g.ReturnWindowWidth_mm is not null);
        }

        // Results kept from before there were return limbs: equal limbs at one pitch.
        var count = Math.Max(2, (int)Math.Round((g.OverallWidth_mm - g.LimbWidth_mm) / g.LimbPitch_mm) + 1);
        var letters = r.Limbs.Count == count ? r.Limbs.Select(l => l.Name["limb".Length..]) : Enumerable.Range(0, count).Select(i => ((char)('A' + i)).ToString());
        return new([.. letters.Select((letter, i) => new RowLimb(letter, i * g.LimbPitch_mm, g.LimbWidth_mm, false))], false);
    }
}
