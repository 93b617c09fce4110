using System.Globalization;
using System.Runtime.CompilerServices;
using System.Security.Cryptography;
using System.Text;

namespace CoreDesign.Estimating.Steels;

/// <summary>The built-in grades and a works' own, by name (upper or lower case alike).</summary>
public sealed class SteelCatalog
{
    // A grade never changes; its digest takes longer than a solve.
    private static readonly ConditionalWeakTable<SteelGrade, string> Revisions = [];

    private const double ThicknessReach_mm = 0.04;
    private readonly Dictionary<string, SteelGrade> _byName;

    /// <param name="works">The works' own steels; names must not repeat one another or a built-in grade.</param>
    /// <exception cref="ArgumentException">A name occurs twice.</exception>
    public SteelCatalog(IEnumerable<SteelGrade> works)
        : this(SteelLibrary.BuiltIn, works)
    {
    }

    internal SteelCatalog(IEnumerable<SteelGrade> builtIn, IEnumerable<SteelGrade> works)
    {
        ArgumentNullException.ThrowIfNull(works);
        All = [.. builtIn, .. works];
        _byName = new Dictionary<string, SteelGrade>(StringComparer.OrdinalIgnoreCase);
        foreach (var grade in All)
        {
            if (!_byName.TryAdd(grade.Name, grade))
            {
                throw new ArgumentException($"The steel name \"{grade.Name}\" occurs twice; rename the works' own steel.", nameof(works));
            }
        }

        Revision = Hash(All);
    }

    /// <summary>Built-in grades in the order of their tables, then the works' own.</summary>
    public IReadOnlyList<SteelGrade> All { get; }

    /// <summary>Changes whenever a figure, curve or name of any steel changes; 12 hexadecimal digits.</summary>
    public string Revision { get; }

    public bool TryFind(string? name, [System.Diagnostics.CodeAnalysis.NotNullWhen(true)] out SteelGrade? grade)
    {
        grade = null;
        return name is not null && _byName.TryGetValue(name.Trim(), out grade);
    }

    /// <summary>The <paramref name="count"/> names nearest to one that is not there, by edits, for the message about it.</summary>
    public IReadOnlyList<string> Nearest(string name, int count) => NameDistance.Nearest(name, All.Select(g => g.Name), count);

    /// <summary>
    /// The next better steel: the one with the highest 1.7 T, 50 Hz loss that is still below this one's, at most 0.04 mm thicker or
    /// thinner; of the same generation if there is one, else any that is not an older one. Null if there is none.
    /// </summary>
    public SteelGrade? NextBetter(SteelGrade grade)
    {
        ArgumentNullException.ThrowIfNull(grade);
        var loss = LossAt17T50(grade);
        if (loss is null)
        {
            return null;
        }

        var better = All
            .Where(g => Math.Abs(g.Thickness_mm.Value - grade.Thickness_mm.Value) <= ThicknessReach_mm + 1e-9)
            .Where(g => LossAt17T50(g) < loss - 1e-9)
            .OrderByDescending(LossAt17T50)
            .ThenBy(g => Math.Abs(g.Thickness_mm.Value - grade.Thickness_mm.Value))
            .ThenBy(g => g.Name, StringComparer.Ordinal)
            .ToList();
        return better.Find(g => g.Generation == grade.Generation) ?? better.Find(g => g.Generation != "older");
    }

    /// <summary>Short hash of one steel's data, to be kept with what was computed from it.</summary>
    public static string RevisionOf(SteelGrade grade) => Revisions.GetValue(grade, g => Hash([g]));

    private static double? LossAt17T50(SteelGrade grade) => grade.Rolling.Loss
        .Where(c => c.Frequency_Hz == 50)
        .SelectMany(c => c.Points)
        .Where(p => Math.Abs(p.B_T - 1.7) < 1e-9)
        .Select(p => (double?)p.Loss_W_per_kg)
        .FirstOrDefault();

    private static string Hash(IEnumerable<SteelGrade> grades)
    {
        var text = new StringBuilder();
        foreach (var g in grades)
        {
            Append(text, g);
        }

        return Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(text.ToString())))[..12];
    }

    private static void Append(StringBuilder text, SteelGrade g)
    {
        void Number(double? v) => text.Append(v?.ToString("R", CultureInfo.InvariantCulture) ?? "-").Append(' ');
        void Curves(SteelCurves c)
        {
            foreach (var p in c.Magnetization)
            {
                Number(p.B_T);
                Number(p.H_A_per_m);
            }

            foreach (var (f, b, value) in c.Loss.SelectMany(l => l.Points.Select(p => (l.Frequency_Hz, p.B_T, p.Loss_W_per_kg)))
                .Concat(c.ExcitingPower.SelectMany(l => l.Points.Select(p => (l.Frequency_Hz, p.B_T, p.Power_VA_per_kg)))))
            {
                Number(f);
                Number(b);
                Number(value);
            }

            text.Append('|');
        }

        text.Append(g.Name).Append('|').Append(g.Standing).Append('|');
        foreach (var figure in new[]
        {
            g.Thickness_mm, g.Density_kg_per_m3, g.Resistivity_ohm_m, g.SaturationPolarization_T, g.MinimumStackingFactor, g.Polarization800_T,
        })
        {
            Number(figure?.Value);
        }

        foreach (var a in g.LossAnchors)
        {
            Number(a.Loss_W_per_kg.Value);
        }

        Curves(g.Rolling);
        Curves(g.Transverse);
        text.Append('\n');
    }
}
