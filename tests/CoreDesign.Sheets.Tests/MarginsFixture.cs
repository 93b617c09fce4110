using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Sheets.Tests;

/// <summary>Margins of the right shape and size for a study of the fixture; the figures are invented.</summary>
internal static class MarginsFixture
{
    public static MarginsResult Of(Study study)
    {
        var e = study.Estimate;
        var phases = e.Lines.Select(l => l.Phase).ToArray();
        double[] time = [.. Enumerable.Range(0, 241).Select(i => i * 0.25)];
        double[] Surge(int phase) => [.. time.Select(t => (phase == 0 ? 28_700 : -9_000) * Math.Pow(Math.Max(0, Math.Sin(Math.PI * ((t / 10) - 0.5 - (phase / 3.0)))), 3))];
        double[] Biased(int phase) => [.. Enumerable.Range(0, 288).Select(n => 2 + (30 * Math.Exp(-Math.Pow((n - 70 - (phase * 90)) / 14.0, 2))))];
        return new MarginsResult
        {
            FluxCurve = [.. Enumerable.Range(0, 7).Select(i => 70.0 + (10 * i)).Select(x => new FluxPointResult { VoltsPerHertz_percent = x, Frequency_Hz = 5000 / x, NoLoadLoss_W = e.NoLoadLoss_W * x / 100, NoLoadCurrent_percent = e.NoLoadCurrent_percent * Math.Pow(x / 100, 9), PeakFluxDensity_T = e.Margin.PeakAtRated_T * x / 100 })],
            FluxCurveDefinition = "Rated voltage at other frequencies.",
            OverVoltage = new() { CurrentMultiple = 5, Voltage_percent = 111.2, NoLoadCurrent_percent = 1.24, PeakFluxDensity_T = 1.875, HighestTried_percent = 150, MultipleAtHighest = 3480, Definition = "Voltage at which the current is a multiple." },
            Inrush = new()
            {
                Peak_A = 28_664,
                PeakOverRated = 14.04,
                PeakLine = phases[0],
                PeakTime_ms = 10,
                PeakOfPeriod_A = [28_664, 28_664, 28_664],
                StepHalving_percent = 3e-4,
                FormulaLossless_A = 29_169,
                FormulaWithResistance_A = 27_950,
                FormulaText = "A closed form.",
                Definition = "Highest current after closing.",
                Assumptions = "The first phase closes first.",
                Time_ms = time,
                Lines = [.. phases.Select((p, i) => new InrushLineResult(p, Surge(i)))],
            },
            DcBias = new()
            {
                Bias_A = 2.5,
                NoLoadLoss_W = e.NoLoadLoss_W,
                NoLoadCurrent_A = 9,
                NoLoadCurrent_percent = 0.62,
                PeakFluxDensity_T = 1.95,
                Margin_percent = 3.9,
                Offset_T = 0.26,
                WorstPart = "limbA",
                Definition = "Direct current in each phase.",
                Lines = [.. phases.Select((p, i) => new DcBiasLineResult { Phase = p, Rms_A = 9, Peak_A = 32, Harmonics = [.. Enumerable.Range(1, 13).Select(n => new HarmonicResult(n, 14.0 - n, 0))], Waveform_A = Biased(i) })],
            },
            Notes = [new NoteResult("protection", "For planning.")],
        };
    }
}
