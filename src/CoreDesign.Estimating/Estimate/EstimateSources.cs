using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Estimating.Estimate;

/// <summary>What the figures of an estimate rest on, each with its standing.</summary>
internal static class EstimateSources
{
    public static IReadOnlyList<SourceResult> Of(CoreAtWork core)
    {
        var steel = core.Design.Steel;
        var sheet = core.Sheet.Sheet;
        var sources = new List<SourceResult>
        {
            new("steel.curves", $"Steel {steel.Name}: {steel.Rolling.Source}", steel.Standing),
            new("steel.split", FormattableString.Invariant($"Loss split at 1.5 T, {sheet.Frequency_Hz} Hz: hysteresis {100 * sheet.HysteresisShare:0} %, classical {100 * sheet.ClassicalShare:0} %, excess {100 * sheet.ExcessShare:0} %; the hysteresis share is a prior, the total is the catalogue's"), FigureStanding.FromMemory),
            new("steel.eddy", "Classical eddy term from thickness and resistivity; excess term after the statistical loss theory, IEEE Trans. Magn. 24 (1988) 621", FigureStanding.FromMemory),
            new("buildingFactor", core.Design.BuildingFactor.Source, core.Design.BuildingFactor.Standing),
            new("magneticConstant", "Magnetic constant, CODATA 2018", FigureStanding.FromMemory),
        };
        sources.Add(core.Joint is null
            ? new SourceResult("joint", "Joints: the works' effective gap across the limb section", FigureStanding.Works)
            : new SourceResult("joint", "Joints: sheet-by-sheet lattice, saw-tooth books, rotation stiffness 36 kJ/m³; current only, loss is in the building factor", FigureStanding.Derived));
        if (core.Design.Capacitance is not null)
        {
            sources.Add(new SourceResult("capacitance", "Capacitive current: capacitance as entered, earthed neutral, voltage rising evenly along the winding, w (C/3) U² per phase, fundamental only", FigureStanding.Derived));
        }

        if (core.Design.Temperature_C != 20)
        {
            sources.Add(new SourceResult("temperature", "No-load loss 0.065 % per kelvin (IEEE C57.12.90), saturation polarization 0.02 % per kelvin", FigureStanding.FromMemory));
        }

        return sources;
    }
}
