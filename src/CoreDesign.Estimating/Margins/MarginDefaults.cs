namespace CoreDesign.Estimating.Margins;

/// <summary>Values taken where the margins' inputs are left open. Common practice, no source.</summary>
public static class MarginDefaults
{
    public const double CurrentMultiple = 5;
    public const double DcBias_A = 0;

    /// <summary>Of the peak flux: on the high side for a core with joints, whose gaps let most of it go.</summary>
    public const double Residual_percent = 80;

    /// <summary>At the zero of the voltage.</summary>
    public const double SwitchingAngle_deg = 0;

    /// <summary>A stiff supply: the peak is then the highest.</summary>
    public const double SourceInductance_mH = 0;
}
