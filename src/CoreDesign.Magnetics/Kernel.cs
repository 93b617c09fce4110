namespace CoreDesign.Magnetics;

/// <summary>Version of the kernel's figures; raised whenever any result changes beyond rounding.</summary>
public static class Kernel
{
    public const string Version = "1.1.0";
}
