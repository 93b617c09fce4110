namespace CoreDesign.Magnetics.Joints;

/// <summary>Root of a rising function inside a bracket: Newton steps, halving wherever a step leaves the bracket.</summary>
internal static class RisingRoot
{
    private const int MostSteps = 300;

    /// <param name="valueAndSlope">The function and its slope.</param>
    /// <param name="low">Where the function is zero or less.</param>
    /// <param name="high">Where it is zero or more.</param>
    /// <exception cref="ArithmeticException">The function gave something that is not a number.</exception>
    public static double Find(Func<double, (double Value, double Slope)> valueAndSlope, double low, double high)
    {
        var x = 0.5 * (low + high);
        for (var step = 0; step < MostSteps; step++)
        {
            var (value, slope) = valueAndSlope(x);
            if (double.IsNaN(value))
            {
                throw new ArithmeticException($"The function has no value at {x}.");
            }

            if (value > 0)
            {
                high = x;
            }
            else
            {
                low = x;
            }

            var next = x - (value / slope);
            if (!(next >= low && next <= high))
            {
                next = 0.5 * (low + high);
            }

            if (Math.Abs(next - x) <= 2e-16 * Math.Abs(x) || value == 0)
            {
                return next;
            }

            x = next;
        }

        // Only rounding is left: the last steps hop between neighbours of the root.
        return x;
    }
}
