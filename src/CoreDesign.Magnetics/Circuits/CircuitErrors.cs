namespace CoreDesign.Magnetics.Circuits;

/// <summary>The circuit as given has no single answer, or is not a circuit; the message names the part and the mend.</summary>
public sealed class CircuitException : Exception
{
    public CircuitException()
    {
    }

    public CircuitException(string message)
        : base(message)
    {
    }

    public CircuitException(string message, Exception innerException)
        : base(message, innerException)
    {
    }
}

/// <summary>The solver stopped before its residual was small enough.</summary>
public sealed class NotConvergedException : Exception
{
    public NotConvergedException()
    {
    }

    public NotConvergedException(string message)
        : base(message)
    {
    }

    public NotConvergedException(string message, Exception innerException)
        : base(message, innerException)
    {
    }

    public NotConvergedException(string message, double residual)
        : base(message) => Residual = residual;

    /// <summary>Largest residual over its scale, dimensionless.</summary>
    public double Residual { get; }
}
