namespace CoreDesign.Sheets.Scenes;

/// <summary>An upright rectangle, y down.</summary>
public readonly record struct Box(double X, double Y, double Width, double Height)
{
    public double Right => X + Width;

    public double Bottom => Y + Height;

    public XY Centre => new(X + (Width / 2), Y + (Height / 2));

    public Box Grown(double by) => new(X - by, Y - by, Width + (2 * by), Height + (2 * by));

    public bool Overlaps(Box other) => X < other.Right && other.X < Right && Y < other.Bottom && other.Y < Bottom;

    public bool Holds(Box other) => other.X >= X && other.Y >= Y && other.Right <= Right && other.Bottom <= Bottom;

    /// <summary>Whether a straight line from a to b passes through (Liang and Barsky's clipping).</summary>
    public bool Meets(XY a, XY b) => Clip(a, b) is not null;

    /// <summary>The part of a straight line that lies inside, or null.</summary>
    public (XY From, XY To)? Clip(XY a, XY b)
    {
        double dx = b.X - a.X, dy = b.Y - a.Y, enter = 0, leave = 1;
        foreach (var (p, q) in new[] { (-dx, a.X - X), (dx, Right - a.X), (-dy, a.Y - Y), (dy, Bottom - a.Y) })
        {
            if (p == 0)
            {
                if (q < 0)
                {
                    return null;
                }

                continue;
            }

            var t = q / p;
            enter = p < 0 ? Math.Max(enter, t) : enter;
            leave = p > 0 ? Math.Min(leave, t) : leave;
        }

        return enter < leave ? (new XY(a.X + (enter * dx), a.Y + (enter * dy)), new XY(a.X + (leave * dx), a.Y + (leave * dy))) : null;
    }

    public IReadOnlyList<XY> Corners() => [new(X, Y), new(Right, Y), new(Right, Bottom), new(X, Bottom)];
}
