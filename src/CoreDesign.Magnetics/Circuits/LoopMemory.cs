using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// Hysteresis field of a sheet along any path of flux density: the points of return that still count, after the rules of wiping out
/// (a path that passes an earlier point of return forgets the loop between) and of Masing. Starts demagnetised. The same field as the stops one by one.
/// </summary>
internal sealed class LoopMemory(StopCurve stops)
{
    // A path that comes this near to a point of return has closed its loop.
    private const double Closed_T = 1e-12;
    private double[] _b = new double[8];
    private double[] _h = new double[8];
    private int _count;
    private int _direction;
    private double _lastB;
    private double _lastH;

    /// <summary>Field at the last accepted flux density.</summary>
    public double Last_A_per_m => _lastH;

    /// <summary>Field if the flux density went to <paramref name="b"/> from the last accepted one, and its slope; nothing is remembered.</summary>
    public double Field(double b, out double slope)
    {
        var move = b - _lastB;
        var way = move > 0 ? 1 : move < 0 ? -1 : _direction;
        var top = Branch(b, way, out var fromB, out var fromH);
        if (top < 0)
        {
            return Math.CopySign(1, b) * stops.Field(Math.Abs(b), out slope);
        }

        return fromH + (way * 2 * stops.Field(Math.Abs(b - fromB) / 2, out slope));
    }

    /// <summary>Moves to <paramref name="b"/> and returns the heat of the way, J/m3.</summary>
    public double Accept(double b)
    {
        var move = b - _lastB;
        if (move == 0)
        {
            return 0;
        }

        var way = move > 0 ? 1 : -1;
        if (_direction != 0 && way != _direction)
        {
            Push();
        }

        _direction = way;
        var heat = 0.0;
        var at = _lastB;
        while (_count > 0)
        {
            var end = Closing(_count, way);
            var reached = way * (b - end) >= -Closed_T;
            var to = reached ? end : b;
            heat += 2 * (stops.Heat(Math.Abs(to - _b[_count - 1]) / 2) - stops.Heat(Math.Abs(at - _b[_count - 1]) / 2));
            if (!reached)
            {
                break;
            }

            at = to;
            _count = Math.Max(0, _count - 2);
        }

        if (_count == 0)
        {
            // Along the first curve: heat grows away from zero only.
            heat += stops.Heat(Math.Abs(b)) - stops.Heat(Math.Abs(at));
            _lastH = Math.CopySign(1, b) * stops.Field(Math.Abs(b), out _);
        }
        else
        {
            _lastH = _h[_count - 1] + (way * 2 * stops.Field(Math.Abs(b - _b[_count - 1]) / 2, out _));
        }

        _lastB = b;
        return heat;
    }

    /// <summary>The same state with every sign turned.</summary>
    public void Turn()
    {
        for (var i = 0; i < _count; i++)
        {
            (_b[i], _h[i]) = (-_b[i], -_h[i]);
        }

        (_lastB, _lastH, _direction) = (-_lastB, -_lastH, -_direction);
    }

    public void Demagnetise() => (_count, _direction, _lastB, _lastH) = (0, 0, 0, 0);

    /// <summary>The point of return from which the way to <paramref name="b"/> comes: its place on the stack, or -1 on the first curve.</summary>
    private int Branch(double b, int way, out double fromB, out double fromH)
    {
        var count = _count;
        if (_direction != 0 && way != _direction)
        {
            // A new return at the last point, not on the stack; it closes where the present branch began.
            var end = count > 0 ? _b[count - 1] : -_lastB;
            if (way * (b - end) < -Closed_T)
            {
                (fromB, fromH) = (_lastB, _lastH);
                return count;
            }

            count--;
        }

        while (count > 0 && way * (b - Closing(count, way)) >= -Closed_T)
        {
            count -= 2;
        }

        (fromB, fromH) = count > 0 ? (_b[count - 1], _h[count - 1]) : (0, 0);
        return count > 0 ? count - 1 : -1;
    }

    /// <summary>Where the branch from the point of return below <paramref name="count"/> ends: at the one before it, or opposite the first.</summary>
    private double Closing(int count, int way) => count >= 2 ? _b[count - 2] : way * Math.Abs(_b[0]);

    private void Push()
    {
        if (_count == _b.Length)
        {
            Array.Resize(ref _b, 2 * _count);
            Array.Resize(ref _h, 2 * _count);
        }

        (_b[_count], _h[_count]) = (_lastB, _lastH);
        _count++;
    }
}
