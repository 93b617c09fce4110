using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.Margins;

/// <summary>Reads what the margins are asked for; what only the finished core tells is filled in by <see cref="AirCoreOfDesign"/>.</summary>
internal sealed class MarginsReader(DesignResolver resolver)
{
    /// <summary>The lowest frequency; the rated one where it is left open.</summary>
    public double LowestFrequency(OrderInput order, double rated_Hz)
    {
        var lowest = resolver.Optional("order.lowestFrequency_Hz", order.LowestFrequency_Hz, rated_Hz);
        if (lowest > rated_Hz)
        {
            resolver.Say("order.lowestFrequency_Hz", string.Create(CultureInfo.InvariantCulture, $"Lowest frequency {lowest} Hz is above the rated frequency of {rated_Hz} Hz. Enter at most the rated one, or leave it open."));
            return double.NaN;
        }

        return lowest;
    }

    /// <summary>The inputs with the air-core inductance that follows from the core where none is given.</summary>
    public MarginsInput WithAirCore(MarginsInput read, CoreGeometry geometry, double turns, int woundLimbs)
    {
        if (read.Inrush!.AirCoreInductance_mH is not null)
        {
            return read;
        }

        resolver.Derive("margins.inrush.airCoreInductance_mH");
        return read with { Inrush = read.Inrush with { AirCoreInductance_mH = FourDigits(1000 * AirCoreOfDesign.Inductance_H(geometry, turns, woundLimbs)) } };
    }

    public MarginsInput Read(MarginsInput? given, double windingResistance_ohm)
    {
        var inrush = given?.Inrush;
        if (inrush?.AirCoreInductance_mH is { } inductance)
        {
            resolver.Needed("margins.inrush.airCoreInductance_mH", inductance);
        }

        return new MarginsInput
        {
            CurrentMultiple = resolver.Optional("margins.currentMultiple", given?.CurrentMultiple, MarginDefaults.CurrentMultiple),
            DcBias_A = resolver.Optional("margins.dcBias_A", given?.DcBias_A, MarginDefaults.DcBias_A),
            Inrush = new InrushInput
            {
                Residual_percent = resolver.Optional("margins.inrush.residual_percent", inrush?.Residual_percent, MarginDefaults.Residual_percent),
                SwitchingAngle_deg = resolver.Optional("margins.inrush.switchingAngle_deg", inrush?.SwitchingAngle_deg, MarginDefaults.SwitchingAngle_deg),
                SourceInductance_mH = resolver.Optional("margins.inrush.sourceInductance_mH", inrush?.SourceInductance_mH, MarginDefaults.SourceInductance_mH),
                AirCoreInductance_mH = inrush?.AirCoreInductance_mH,
                Resistance_ohm = resolver.Optional("margins.inrush.resistance_ohm", inrush?.Resistance_ohm, windingResistance_ohm),
            },
        };
    }

    // The winding's sizes are guessed; what is used is what is shown.
    private static double FourDigits(double x) => double.Parse(x.ToString("G4", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
}
