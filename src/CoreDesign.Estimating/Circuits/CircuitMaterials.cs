using CoreDesign.Magnetics;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Estimating.Circuits;

/// <summary>Reads a material of a circuit case: a straight or tabled curve with the dynamic and hysteresis terms added to it.</summary>
internal static class CircuitMaterials
{
    private const int MaxStops = 100;

    public static SheetLaw? Read(string path, CaseMaterial? m, CircuitFindings findings)
    {
        if (m is null)
        {
            findings.Say(path, "The material is empty. Give mu_r, or B and H.");
            return null;
        }

        var before = findings.Errors.Count;
        MonotoneCurve? spine = null;
        if (m.MuR is { } mu)
        {
            if (m.B is not null || m.H is not null)
            {
                findings.Say(path, "Give either mu_r or the tables B and H, not both.");
            }

            var read = findings.Within($"{path}.mu_r", mu, 1, 1e7);
            if (findings.Errors.Count == before)
            {
                var slope = 1 / (read * MagneticConstants.Mu0_H_per_m);
                spine = new MonotoneCurve([1], [slope], slope);
            }
        }
        else if (m.B is null || m.H is null || m.B.Count != m.H.Count || m.B.Count == 0 || m.B.Count > 2000)
        {
            findings.Say(path, $"The tables B ({m.B?.Count ?? 0} values) and H ({m.H?.Count ?? 0} values) must have the same length, 1 to 2000; or give mu_r.");
        }
        else
        {
            try
            {
                spine = new MonotoneCurve(m.B, m.H, 1 / MagneticConstants.Mu0_H_per_m);
            }
            catch (ArgumentException e)
            {
                findings.Say(path, $"B and H must rise from above zero. {e.Message.Split(" (Parameter", StringSplitOptions.None)[0]}");
            }
        }

        if ((m.Sigma is null) != (m.D is null))
        {
            findings.Say(path, "The eddy term needs both sigma and d.");
        }

        var sigma = m.Sigma is { } s ? findings.Within($"{path}.sigma", s, 0, 1e8) : 0;
        var d = m.D is { } t ? findings.Within($"{path}.d", t, 0, 0.1) : 0;
        var k = m.KExc is { } ke ? findings.Within($"{path}.k_exc", ke, 0, 1e6) : 0;
        var s0 = findings.Within($"{path}.s0", m.S0 ?? 1, 1e-9, 1e6);
        var stops = new List<HysteresisStop>();
        if (m.Stops?.Count > MaxStops)
        {
            findings.Say($"{path}.stops", $"{m.Stops.Count} stops are more than {MaxStops}. Leave out the smallest.");
            return null;
        }

        for (var i = 0; i < (m.Stops?.Count ?? 0); i++)
        {
            stops.Add(new HysteresisStop(
                findings.Within($"{path}.stops[{i}].r", m.Stops![i]?.R, 1e-9, 10),
                findings.Within($"{path}.stops[{i}].w", m.Stops![i]?.W, 0, 1e9)));
        }

        return findings.Errors.Count > before || spine is null ? null : new SheetLaw(spine, sigma * d * d / 12, k, s0, stops);
    }
}
