namespace CoreDesign.Web.Features.Design;

/// <summary>Paths that the page treats by name. Those that start with <c>form.</c> are the page's own and never sent.</summary>
public static class FormPaths
{
    public const string Reference = "order.reference";
    public const string Phases = "order.phases";
    public const string Voltages = "order.ratedVoltages_kV";
    public const string Grade = "steel.grade";
    public const string Form = "core.form";
    public const string Units = "core.units";
    public const string WoundLimbs = "core.woundLimbs";
    public const string ReturnLimbFactor = "core.returnLimb.areaFactor";
    public const string ReturnWindowWidth = "core.returnWindowWidth_mm";
    public const string ZeroSequence = "model.zeroSequenceReactance_pu";
    public const string Tertiary = "tertiary.connection";
    public const string OtherConnection = "otherWinding.connection";
    public const string Diameter = "core.limb.diameter_mm";
    public const string StepCount = "core.limb.steps";
    public const string StockWidths = "core.limb.stockWidths_mm";
    public const string LimbSteps = "core.limbSteps";
    public const string YokeFactor = "core.yoke.areaFactor";
    public const string YokeWidths = "core.yoke.stepWidths_mm";
    public const string WindowHeight = "core.windowHeight_mm";
    public const string WindowWidth = "core.windowWidth_mm";
    public const string LimbPitch = "core.limbPitch_mm";
    public const string StackingFactor = "core.stackingFactor";
    public const string JointType = "joint.type";
    public const string EffectiveGap = "joint.effectiveGap_mm";
    public const string Connection = "excitedWinding.connection";
    public const string LineVoltage = "excitedWinding.lineVoltage_V";
    public const string Turns = "excitedWinding.turns";

    /// <summary>Height of the widest yoke plate; sent as the area factor that gives it.</summary>
    public const string YokeHeight = "form.yokeHeight_mm";

    /// <summary>The flux density that open turns are derived for.</summary>
    public const string WantedFluxDensity = "form.wantedFluxDensity_T";

    /// <summary>Where the circle and step count wait while the steps are typed by hand.</summary>
    public const string KeptDiameter = "form.kept.diameter_mm";
    public const string KeptStepCount = "form.kept.steps";

    public static string StepWidth(int i) => $"{LimbSteps}[{i}].width_mm";

    public static string StepStack(int i) => $"{LimbSteps}[{i}].stack_mm";

    public static string YokeWidth(int i) => $"{YokeWidths}[{i}]";
}
