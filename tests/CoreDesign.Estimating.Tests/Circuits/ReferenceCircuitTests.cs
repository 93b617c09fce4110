using System.Numerics;
using System.Text.Json;
using System.Text.Json.Nodes;
using CoreDesign.Estimating.Circuits;
using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Estimating.Tests.Circuits;

/// <summary>Source: Reference/circuits (ORIGIN.md), solved by methods independent of ours.</summary>
public class ReferenceCircuitTests
{
    private static readonly string Folder = Path.Combine(AppContext.BaseDirectory, "Reference", "circuits");

    public static TheoryData<string> Cases() =>
        [.. Directory.EnumerateFiles(Folder, "*.json").Select(f => Path.GetFileNameWithoutExtension(f)).Order(StringComparer.Ordinal)];

    [Fact]
    public void Folder_holds_all_given_cases() => Assert.Equal(21, Cases().Count);

    [Theory]
    [MemberData(nameof(Cases))]
    public void Circuit_agrees_with_independent_methods(string name)
    {
        var (@case, expected, tolerance) = Load(name);
        var outcome = SolveCircuit.Run(@case, cancel: TestContext.Current.CancellationToken);
        Assert.True(outcome.Ok, outcome.Unsolvable?.Reason ?? string.Join("; ", outcome.Errors.Select(e => $"{e.Path}: {e.Message}")));
        Assert.Empty(Differences(JsonNode.Parse(DesignJson.Write(outcome.Value))!, expected, tolerance));
    }

    [Fact]
    public void Comparison_sees_a_wrong_current()
    {
        var (@case, expected, tolerance) = Load("g07_3limb_YN_250kVA");
        var answer = JsonNode.Parse(DesignJson.Write(SolveCircuit.Run(@case, cancel: TestContext.Current.CancellationToken).Value))!;
        answer["windings"]!["A"]!["rms"] = 1.002 * (double)answer["windings"]!["A"]!["rms"]!;
        Assert.NotEmpty(Differences(answer, expected, tolerance));
    }

    private static (CircuitCase Case, JsonNode Expected, JsonNode Tolerance) Load(string name)
    {
        var node = JsonNode.Parse(File.ReadAllText(Path.Combine(Folder, name + ".json")))!.AsObject();
        var expected = node["expected"]!;
        var tolerance = node["tolerance"]!;
        node.Remove("expected");
        var read = DesignJson.Read<CircuitCase>(node.ToJsonString());
        Assert.True(read.Ok, string.Join("; ", read.Errors.Select(e => e.Path + " " + e.Message)));
        return (read.Value!, expected, tolerance);
    }

    private static List<string> Differences(JsonNode got, JsonNode expected, JsonNode tolerance)
    {
        double Tol(string key) => (double)tolerance[key]!;
        var bad = new List<string>();
        foreach (var group in new[] { "windings", "lines" })
        {
            foreach (var (name, x) in expected[group]?.AsObject() ?? [])
            {
                var y = got[group]![name] ?? throw new InvalidOperationException($"{group} {name} is missing");
                Relative($"{group} {name} rms", (double)x!["rms"]!, (double)y["rms"]!, Tol("rms_rel"));
                Relative($"{group} {name} peak", (double)x["peak"]!, (double)y["peak"]!, Tol("peak_rel"));
                CompareHarmonics($"{group} {name}", x["harmonics"]!.AsObject(), y["harmonics"]!);
            }
        }

        foreach (var special in new[] { "neutral", "delta_circulating" })
        {
            if (expected[special] is { } x)
            {
                Relative(special + " rms", (double)x["rms"]!, (double)got[special]!["rms"]!, 5 * Tol("rms_rel"));
            }
        }

        var power = (double)expected["terminal_power_W"]!;
        var allowed = (Tol("power_rel") * Math.Abs(power)) + (Tol("power_over_VA_when_lossless") * (double)expected["apparent_VA"]!);
        foreach (var key in new[] { "terminal_power_W", "core_loss_W" })
        {
            if (Math.Abs((double)got[key]! - (double)expected[key]!) > allowed)
            {
                bad.Add($"{key} {got[key]} for {expected[key]}");
            }
        }

        foreach (var (name, b) in expected["B_peak"]!.AsObject())
        {
            if (Math.Abs((double)got["B_peak"]![name]! - (double)b!) > Tol("B_peak_T"))
            {
                bad.Add($"B_peak {name} {got["B_peak"]![name]} for {b}");
            }
        }

        CompareWaves("i", Tol("waveform_i_over_peak"), true);
        CompareWaves("B", Tol("waveform_B_T"), false);
        return bad;

        void Relative(string what, double want, double have, double limit)
        {
            if (want != 0 && Math.Abs((have / want) - 1) > limit)
            {
                bad.Add($"{what} {have:G7} for {want:G7}");
            }
        }

        void CompareHarmonics(string what, JsonObject want, JsonNode have)
        {
            var largest = want.Max(h => (double)h.Value![0]!);
            foreach (var (order, h) in want)
            {
                double m = (double)h![0]!, phase = (double)h[1]!;
                var d = Complex.FromPolarCoordinates(m, phase * Math.PI / 180)
                    - Complex.FromPolarCoordinates((double)have[order]![0]!, (double)have[order]![1]! * Math.PI / 180);
                if (d.Magnitude > (Tol("harmonic_abs_over_largest") * largest) + (m * Tol("phase_deg_if_above_2pct") * Math.PI / 180))
                {
                    bad.Add($"{what} harmonic {order}: off by {d.Magnitude:G4} of {largest:G4}");
                }
            }
        }

        void CompareWaves(string key, double limit, bool overPeak)
        {
            foreach (var (name, wave) in expected["waveforms"]![key]!.AsObject())
            {
                var want = wave!.AsArray().Select(v => (double)v!).ToArray();
                var have = got["waveforms"]![key]![name]!.AsArray().Select(v => (double)v!).ToArray();
                var scale = overPeak ? want.Max(Math.Abs) : 1;
                var worst = want.Zip(have, (x, y) => Math.Abs(x - y)).Max();
                if (worst > limit * scale)
                {
                    bad.Add($"waveform {key} {name}: off by {worst:G4}");
                }
            }
        }
    }
}
