using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Losses;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Tests.Circuits;

/// <summary>
/// Source: A. E. Fitzgerald, C. Kingsley, S. D. Umans, Electric Machinery, 6th ed., chapter 1, examples 1.1, 1.7 and 1.8; inputs and printed results
/// from memory, arithmetic recomputed. The circuits are solved under a sine voltage whose peak flux is the example's.
/// </summary>
public class WorkedExampleTests
{
    private const double Mu0 = MagneticConstants.Mu0_H_per_m;

    [Fact]
    public void Example_1_1_linear_core_with_gap_draws_the_printed_current()
    {
        // Ac = Ag = 9 cm2, g = 0.050 cm, lc = 30 cm, N = 500, mu_r = 70 000, B = 1.0 T.
        var s = GappedCore(SheetLaw.Linear(70_000));
        var coreReluctance = s.Mmf_A[0].Max() / s.Flux_Wb[0].Max();
        var gapReluctance = s.Mmf_A[1].Max() / s.Flux_Wb[1].Max();
        Assert.Equal(3.79e3, coreReluctance, 5.0);
        Assert.Equal(4.42e5, gapReluctance, 500.0);
        Assert.Equal(9e-4, s.Flux_Wb[0].Max(), 1e-7);
        Assert.Equal(0.80, Waveform.Peak(s.WindingCurrent_A[0]), 0.005);
    }

    [Fact]
    public void Example_1_7_real_steel_draws_the_printed_current()
    {
        // The circuit of 1.1 with sheet that needs 11 A/m at 1 T.
        var s = GappedCore(SheetLaw.Lossless(new MonotoneCurve([1], [11], 1 / Mu0)));
        Assert.Equal(3.3, s.Mmf_A[0].Max(), 0.005);

        // Printed 396 A, with a rounded reluctance; B g/mu0 is 397.9 A.
        Assert.Equal(396, s.Mmf_A[1].Max(), 0.01 * 396);
        Assert.Equal(0.80, Waveform.Peak(s.WindingCurrent_A[0]), 0.005);
    }

    [Fact]
    public void Example_1_8_stacked_core_at_60_Hz_gives_printed_voltage_current_and_loss()
    {
        // 2 in x 2 in, fill 0.94, mean path 28 in, N = 200, 1.5 T peak at 60 Hz; 7.65 g/cm3; 36 A/m peak, 1.2 W/kg at 1.5 T.
        const double area = 2 * 0.0254 * 2 * 0.0254 * 0.94, length = 28 * 0.0254, turns = 200, b = 1.5, f = 60;
        var data = new SteelData
        {
            Name = "example 1.8",
            SheetThickness_m = 0.30e-3,
            Density_kg_m3 = 7650,
            Resistivity_ohm_m = 0.48e-6,
            SaturationPolarization_T = 2.03,
            Magnetization = [new(0.5, 9), new(1.0, 15), new(1.3, 22), new(1.5, 36), new(1.7, 120), new(1.8, 400), new(1.9, 1500)],
            Loss = [new LossCurve(f, [new(0.5, 0.15), new(1.0, 0.55), new(1.5, 1.2), new(1.7, 1.75)])],
        };
        var voltage = Math.Sqrt(2) * Math.PI * f * turns * area * b;
        var s = Solve(SheetLawCalibration.Fit(data, f).Law, area, length, turns, voltage, f, gap: 0);
        var mass = area * length * data.Density_kg_m3;
        Assert.Equal(274, Math.Sqrt(2) * voltage, 0.5);
        Assert.Equal(194, voltage, 0.5);
        Assert.Equal(13.2, mass, 0.05);
        Assert.Equal(16, s.CoreLoss_W, 0.5);

        // The example takes the current at the loop's tip, where the flux peaks and no rate term acts.
        var tip = Array.IndexOf(s.Flux_Wb[0], s.Flux_Wb[0].Max());
        Assert.Equal(0.13, s.WindingCurrent_A[0][tip], 0.005);

        // 1.5 VA/kg is the sheet's figure in the example: 20 VA and 0.10 A follow by arithmetic alone.
        Assert.Equal(20, 1.5 * mass, 0.5);
        Assert.Equal(0.10, 1.5 * mass / voltage, 0.005);
    }

    /// <summary>Common practice, no source: a gap adds B g/mu0 and lifts the current of a good core by more than two orders of magnitude.</summary>
    [Fact]
    public void One_millimetre_of_gap_adds_its_mmf_and_lifts_the_current_a_hundredfold()
    {
        var steel = SheetLaw.Lossless(new MonotoneCurve([0.5, 1.0, 1.3, 1.5, 1.6, 1.7], [8, 14, 20, 30, 42, 75], 1 / Mu0));
        const double area = 0.01, length = 0.24, turns = 100, b = 1.5, f = 50;
        var voltage = Math.Sqrt(2) * Math.PI * f * turns * area * b;
        var closed = Waveform.Peak(Solve(steel, area, length, turns, voltage, f, 0).WindingCurrent_A[0]);
        var gapped = Waveform.Peak(Solve(steel, area, length, turns, voltage, f, 1e-3).WindingCurrent_A[0]);
        Assert.True(gapped > 100 * closed, $"{gapped} A against {closed} A");
        Assert.Equal(b * 1e-3 / Mu0, turns * (gapped - closed), 1e-6 * b * 1e-3 / Mu0);
    }

    private static CircuitSolution GappedCore(SheetLaw steel)
    {
        const double area = 9e-4, turns = 500, f = 60;
        return Solve(steel, area, 0.30, turns, Math.Sqrt(2) * Math.PI * f * turns * area * 1.0, f, 0.5e-3);
    }

    private static CircuitSolution Solve(SheetLaw steel, double area, double length, double turns, double voltage, double f, double gap) =>
        CircuitSolver.Solve(new MagneticCircuit(
            new Supply(SupplyConnection.Single, voltage, f),
            [
                new CircuitBranch { Name = "core", From = "p", To = "q", Area_m2 = area, Length_m = length, Steel = steel },
                new CircuitBranch { Name = "gap", From = "q", To = "p", Area_m2 = area, Reluctance_A_per_Wb = gap / (Mu0 * area) },
            ],
            [new Winding("W", WindingPhase.Single, [new Coil("core", turns)])]));
}
