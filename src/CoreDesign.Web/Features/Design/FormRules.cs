using System.Text.RegularExpressions;
using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Design;

/// <summary>Fields that answer the same question: typing one releases the others. Undo brings them back.</summary>
public static partial class FormRules
{
    public static DesignText Type(DesignText texts, string path, string text, GeometryResult? geometry)
    {
        // What is half typed displaces nothing: the other field answers until this one can.
        texts = Pin(texts, path, geometry);
        texts = (FormReader.IsValue(path, text) ? Displace(texts, path) : texts).With(path, text);
        return path is FormPaths.Form or FormPaths.Units ? MatchCore(texts) : texts;
    }

    /// <summary>Takes the derived step set as the start of one's own; the circle waits until the steps are released.</summary>
    public static DesignText PinSteps(DesignText texts, GeometryResult? geometry)
    {
        if (texts.HasItems(FormPaths.LimbSteps))
        {
            return texts;
        }

        texts = texts.With(FormPaths.KeptDiameter, texts[FormPaths.Diameter]).With(FormPaths.KeptStepCount, texts[FormPaths.StepCount])
            .Without(FormPaths.Diameter).Without(FormPaths.StepCount);
        var steps = geometry?.LimbSteps ?? [];
        for (var i = 0; i < steps.Count; i++)
        {
            texts = texts.With(FormPaths.StepWidth(i), Tenth(steps[i].Width_mm)).With(FormPaths.StepStack(i), Tenth(steps[i].Stack_mm));
        }

        return texts;
    }

    /// <summary>Gives the step set back to the circle that it came from, or to the circle around it.</summary>
    public static DesignText ReleaseSteps(DesignText texts, GeometryResult? geometry)
    {
        var diameter = texts[FormPaths.KeptDiameter];
        var count = texts[FormPaths.KeptStepCount];
        if (diameter.Length == 0 && geometry is not null)
        {
            diameter = NumberText.Exact(Math.Ceiling(geometry.CircleDiameter_mm - 1e-6));
            count = NumberText.Exact(geometry.LimbSteps.Count);
        }

        return texts.Without(FormPaths.LimbSteps).Without("form.kept").With(FormPaths.Diameter, diameter).With(FormPaths.StepCount, count);
    }

    /// <summary>True where the design goes on without the typed value, because a default or another field stands in for it.</summary>
    public static bool CanRelease(DesignText texts, string path) => path switch
    {
        FormPaths.Diameter => texts.HasItems(FormPaths.LimbSteps),
        FormPaths.WindowWidth => texts.Has(FormPaths.LimbPitch),
        FormPaths.LimbPitch => texts.Has(FormPaths.WindowWidth),
        FormPaths.Turns => texts.Has(FormPaths.WantedFluxDensity),
        _ => true,
    };

    /// <summary>Takes away one row of the hand-typed steps.</summary>
    public static DesignText RemoveStep(DesignText texts, int row)
    {
        var rows = StepRows(texts);
        for (var i = row; i < rows; i++)
        {
            texts = texts.With(FormPaths.StepWidth(i), texts[FormPaths.StepWidth(i + 1)]).With(FormPaths.StepStack(i), texts[FormPaths.StepStack(i + 1)]);
            texts = texts.HasItems(FormPaths.YokeWidths) ? texts.With(FormPaths.YokeWidth(i), texts[FormPaths.YokeWidth(i + 1)]) : texts;
        }

        return texts;
    }

    /// <summary>Rows of the hand-typed step table; 0 where the steps are derived.</summary>
    public static int StepRows(DesignText texts) =>
        texts.All.Select(p => StepCell().Match(p.Key)).Where(m => m.Success).Select(m => int.Parse(m.Groups["row"].Value, System.Globalization.CultureInfo.InvariantCulture) + 1).DefaultIfEmpty(0).Max();

    /// <summary>Cells without text among the hand-typed yoke widths.</summary>
    public static IEnumerable<string> OpenYokeWidths(DesignText texts)
    {
        var rows = texts.All.Select(p => YokeCell().Match(p.Key)).Where(m => m.Success).Select(m => int.Parse(m.Groups["row"].Value, System.Globalization.CultureInfo.InvariantCulture) + 1).DefaultIfEmpty(0).Max();
        return Enumerable.Range(0, rows).Select(FormPaths.YokeWidth).Where(path => !texts.Has(path));
    }

    /// <summary>The texts with the set pinned to which a path belongs, before anything is typed into it.</summary>
    public static DesignText Pin(DesignText texts, string path, GeometryResult? geometry) =>
        path.StartsWith(FormPaths.LimbSteps + "[", StringComparison.Ordinal) ? PinSteps(texts, geometry)
        : path.StartsWith(FormPaths.YokeWidths + "[", StringComparison.Ordinal) ? PinYoke(texts, geometry)
        : texts;

    private static DesignText PinYoke(DesignText texts, GeometryResult? geometry)
    {
        if (texts.HasItems(FormPaths.YokeWidths))
        {
            return texts;
        }

        texts = texts.Without(FormPaths.YokeFactor).Without(FormPaths.YokeHeight);
        var steps = geometry?.LimbSteps ?? [];
        for (var i = 0; i < steps.Count; i++)
        {
            texts = texts.With(FormPaths.YokeWidth(i), Tenth(steps[i].YokeWidth_mm));
        }

        return texts;
    }

    private static DesignText Displace(DesignText texts, string path) => path switch
    {
        FormPaths.WindowWidth => texts.Without(FormPaths.LimbPitch),
        FormPaths.LimbPitch => texts.Without(FormPaths.WindowWidth),
        FormPaths.YokeFactor => texts.Without(FormPaths.YokeHeight).Without(FormPaths.YokeWidths),
        FormPaths.YokeHeight => texts.Without(FormPaths.YokeFactor).Without(FormPaths.YokeWidths),
        FormPaths.Diameter or FormPaths.StepCount or FormPaths.StockWidths when texts.HasItems(FormPaths.LimbSteps) => ReleaseSteps(texts, null),
        FormPaths.JointType => texts.Without("joint.positions"),
        _ => texts,
    };

    /// <summary>Takes the connections to those of the core that is now chosen, and out what it has no place for.</summary>
    private static DesignText MatchCore(DesignText texts)
    {
        texts = FormFit.Keep(texts);
        var allowed = FormLayout.Connections(texts);
        foreach (var path in new[] { FormPaths.Connection, FormPaths.OtherConnection })
        {
            texts = texts[path].Length == 0 || allowed.Any(c => c.Value == texts[path]) ? texts : texts.With(path, allowed[0].Value);
        }

        return texts;
    }

    // A set that is typed is cut: tenths of a millimetre are what a works shears and stacks to (common practice, no source).
    private static string Tenth(double length_mm) => NumberText.Exact(Math.Max(0.2, Math.Round(length_mm, 1)));

    [GeneratedRegex(@"^core\.yoke\.stepWidths_mm\[(?<row>\d{1,3})\]$", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex YokeCell();

    [GeneratedRegex(@"^core\.limbSteps\[(?<row>\d{1,3})\]", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex StepCell();
}
