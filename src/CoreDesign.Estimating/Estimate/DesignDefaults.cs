using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Values taken where a design leaves them open; the estimate lists each as derived. Common practice, no source.</summary>
public static class DesignDefaults
{
    public const double HighestVoltage_percent = 110;
    public const double Gap_mm = 0.3;
    public const double Interface_um = 8;
    public const int SheetsPerPosition = 1;
    public const int StepLapPositions = 5;
    public const double YokeAreaFactor = 1;
    public const double Temperature_C = 20;

    /// <summary>Shift between positions; a single overlap is longer than a step of a book.</summary>
    public static double Overlap_mm(JointKind kind) => kind == JointKind.StepLap ? 4 : 10;

    public static int Positions(JointKind kind) => kind == JointKind.StepLap ? StepLapPositions : 2;

    public const double ReturnLimbAreaFactor = 0.5;
    public const int WoundLimbs = 2;

    /// <summary>
    /// Zero-sequence magnetizing reactance over rated impedance through air and tank: 0.4 to 1.5 is published for three-limb cores; the same
    /// is taken for the air beside the return limbs of five (common practice, no source). It counts with an isolated star, and little otherwise.
    /// </summary>
    public const double ZeroSequenceReactance_pu = 0.6;
}
