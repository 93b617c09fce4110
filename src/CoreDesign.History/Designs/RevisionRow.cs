using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.History.Model;

namespace CoreDesign.History.Designs;

/// <summary>Makes the row of a new revision: the columns of a list are read off the study once, here.</summary>
internal static class RevisionRow
{
    public static Revision From(NewRevision saved, int number, DateTime at)
    {
        var estimate = saved.Study.Estimate;
        var order = estimate.Inputs.Order;
        var reference = order?.Reference ?? saved.Input.Order?.Reference ?? "";
        var rating = Rating(estimate.Inputs);
        return new Revision
        {
            Number = number,
            CreatedAt = at,
            Author = saved.Author,
            Title = saved.Title,
            Note = saved.Note,
            State = DesignState.Draft,
            KernelVersion = estimate.KernelVersion,
            SteelDataRevision = estimate.SteelDataRevision,
            Reference = reference,
            Rating = rating,
            Phases = order?.Phases ?? 0,
            RatedPower_kVA = order?.RatedPower_kVA ?? 0,
            Form = estimate.Geometry.Form,
            Steel = estimate.Steel.Grade,
            JointType = estimate.Joint.Type,
            JointPositions = estimate.Joint.Positions,
            LimbPeakFluxDensity_T = estimate.Parts.Where(p => p.Kind == "limb").Select(p => p.PeakFluxDensity_T).DefaultIfEmpty(0).Max(),
            NoLoadLoss_W = estimate.NoLoadLoss_W,
            AskedNoLoadLoss_W = order?.AskedNoLoadLoss_W,
            NoLoadCurrent_percent = estimate.NoLoadCurrent_percent,
            AskedNoLoadCurrent_percent = order?.AskedNoLoadCurrent_percent,
            Mass_kg = estimate.Mass_kg.Total,
            MarginAtRated_percent = estimate.Margin.AtRated_percent,
            MarginAtHighest_percent = estimate.Margin.AtHighest_percent,
            SearchText = HistoryText.ForSearch(reference, saved.Title, rating, estimate.Steel.Grade, estimate.Joint.Type, estimate.Geometry.Form, saved.Note, saved.Author),
            Content = new RevisionContent { Input = DesignJson.Write(saved.Input), Study = DesignJson.Write(saved.Study) },
        };
    }

    private static string Rating(DesignInput input)
    {
        var power = input.Order?.RatedPower_kVA is { } kVA ? string.Create(CultureInfo.InvariantCulture, $"{kVA:0.###} kVA") : "";
        var voltages = input.Order?.RatedVoltages_kV is { Count: > 0 } given
            ? string.Join('/', given.Select(u => u.ToString("0.###", CultureInfo.InvariantCulture))) + " kV"
            : input.ExcitedWinding?.LineVoltage_V is { } volts ? string.Create(CultureInfo.InvariantCulture, $"{volts / 1000:0.###} kV") : "";
        return string.Join(", ", new[] { power, voltages }.Where(p => p.Length > 0));
    }
}
