namespace CoreDesign.Magnetics.Geometry;

/// <summary>
/// A core that can't be built as asked. <see cref="PropertyName"/> is the argument at fault, with an index for a list
/// (<c>steps[2].limbWidth_m</c>); the message names its value, the range and the mend.
/// </summary>
public sealed class GeometryException : ArgumentException
{
    public GeometryException(string propertyName, string message)
        : base(message) => PropertyName = propertyName;

    public string PropertyName { get; }
}
