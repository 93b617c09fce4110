using System.Globalization;
using System.Text;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Svg;

/// <summary>
/// Paints a scene as SVG. Inline, colours are the page's variables in presentation attributes, so light and dark follow the page,
/// any class may overrule them, and no inline style is needed. Standalone, the same with literal colours.
/// </summary>
public static class SvgWriter
{
    private const double HitWidth = 24;
    private const string Family = "'IBM Plex Sans', 'Segoe UI', system-ui, sans-serif";

    public static string Write(Scene scene, SvgOptions options)
    {
        ArgumentNullException.ThrowIfNull(scene);
        ArgumentNullException.ThrowIfNull(options);
        if (options.Id.Length == 0 || options.Id.Any(c => !char.IsAsciiLetterOrDigit(c) && c != '-'))
        {
            throw new ArgumentException($"SvgOptions.Id is \"{options.Id}\"; take ASCII letters, digits and dashes.", nameof(options));
        }

        var painter = new Painter(options);
        painter.Root(scene);
        return painter.Text;
    }

    private sealed class Painter(SvgOptions options)
    {
        private readonly StringBuilder _svg = new();

        public string Text => _svg.ToString();

        public void Root(Scene scene)
        {
            _svg.Append("<svg xmlns=\"http://www.w3.org/2000/svg\"");
            Attribute("class", options.Class.Length == 0 ? "scene" : "scene " + options.Class);
            Number("width", scene.Width);
            Number("height", scene.Height);
            _svg.Append(" viewBox=\"0 0 ").Append(Num(scene.Width)).Append(' ').Append(Num(scene.Height)).Append('"');
            if (options.Standalone)
            {
                Attribute("font-family", Family);
                Attribute("font-variant-numeric", "tabular-nums");
            }

            if (options.Decorative)
            {
                _svg.Append(" aria-hidden=\"true\">");
            }
            else
            {
                _svg.Append(" role=\"img\"");
                Attribute("aria-labelledby", $"{options.Id}-t {options.Id}-d");
                _svg.Append('>');
                _svg.Append("<title id=\"").Append(options.Id).Append("-t\">").Append(Escape(scene.Title)).Append("</title>");
                _svg.Append("<desc id=\"").Append(options.Id).Append("-d\">").Append(Escape(scene.Description)).Append("</desc>");
            }

            if (options.Standalone)
            {
                _svg.Append("<rect width=\"100%\" height=\"100%\"");
                Attribute("fill", InkColours.Of(Ink.Paper, options.Theme)!.Value.Hex);
                _svg.Append("/>");
            }

            Marks(scene.Marks);
            _svg.Append("</svg>");
        }

        private void Marks(IEnumerable<Mark> marks)
        {
            foreach (var mark in marks)
            {
                switch (mark)
                {
                    case PathMark path: Path(path); break;
                    case CircleMark circle: Circle(circle); break;
                    case TextMark text: TextLine(text); break;
                    case GroupMark group: Group(group); break;
                    default: throw new NotSupportedException($"No SVG for {mark.GetType().Name}.");
                }
            }
        }

        private void Path(PathMark mark)
        {
            if (mark.Points.Count == 0)
            {
                return;
            }

            _svg.Append("<path");
            Common(mark, mark.Stroke.Role != Ink.None ? mark.Stroke : mark.Fill);
            _svg.Append(" d=\"");
            for (var i = 0; i < mark.Points.Count; i++)
            {
                _svg.Append(i == 0 ? 'M' : 'L').Append(Num(mark.Points[i].X)).Append(' ').Append(Num(mark.Points[i].Y));
            }

            _svg.Append(mark.Closed ? "Z\"" : "\"");
            Paints(mark.Fill, mark.Stroke, mark.StrokeWidth, mark.Dash);
            Close(mark, "path");
        }

        private void Circle(CircleMark mark)
        {
            _svg.Append("<circle");
            Common(mark, mark.Stroke.Role != Ink.None ? mark.Stroke : mark.Fill);
            Number("cx", mark.Centre.X);
            Number("cy", mark.Centre.Y);
            Number("r", mark.Radius);
            Paints(mark.Fill, mark.Stroke, mark.StrokeWidth, mark.Dash);
            Close(mark, "circle");
        }

        private void TextLine(TextMark mark)
        {
            _svg.Append("<text");
            Common(mark, mark.Fill);
            if (mark.Angle == 0)
            {
                Number("x", mark.At.X);
                Number("y", mark.At.Y);
            }
            else
            {
                Attribute("transform", $"translate({Num(mark.At.X)} {Num(mark.At.Y)}) rotate({Num(-mark.Angle)})");
            }

            Number("font-size", mark.Size);
            if (mark.Anchor != Anchor.Start)
            {
                Attribute("text-anchor", mark.Anchor == Anchor.Middle ? "middle" : "end");
            }

            if (mark.Bold)
            {
                Attribute("font-weight", "600");
            }

            if (mark.Italic)
            {
                Attribute("font-style", "italic");
            }

            Attribute("fill", Colour(mark.Fill));
            _svg.Append('>').Append(Escape(mark.Text)).Append("</text>");
        }

        private void Group(GroupMark mark)
        {
            _svg.Append("<g");
            var part = mark.FieldKey is null ? mark.Part : mark.Part ?? "dim";
            if (part is not null)
            {
                Attribute("class", part);
            }

            if (mark.FieldKey is not null)
            {
                Attribute("data-field", mark.FieldKey);
            }

            _svg.Append('>');
            if (mark.Label is not null)
            {
                _svg.Append("<title>").Append(Escape(mark.Label)).Append("</title>");
            }

            if (mark.FieldKey is not null && mark.Hit is { Count: > 1 } hit && !options.Standalone)
            {
                _svg.Append("<path class=\"hit\" fill=\"none\" stroke=\"transparent\" pointer-events=\"stroke\"");
                Number("stroke-width", HitWidth);
                _svg.Append(" d=\"M").Append(string.Join('L', hit.Select(p => Num(p.X) + " " + Num(p.Y)))).Append("\"/>");
            }

            Marks(mark.Marks);
            _svg.Append("</g>");
        }

        private void Common(Mark mark, Paint main)
        {
            var role = main.Ramp is not null ? "ramp" : main.Role == Ink.None ? null : "ink-" + InkColours.Name(main.Role).Replace("ink-", "", StringComparison.Ordinal);
            var name = mark.Part is null ? role : role is null ? mark.Part : mark.Part + " " + role;
            if (name is not null)
            {
                Attribute("class", name);
            }

            if (mark.FieldKey is not null)
            {
                Attribute("data-field", mark.FieldKey);
            }
        }

        private void Paints(Paint fill, Paint stroke, double width, IReadOnlyList<double>? dash)
        {
            Attribute("fill", Colour(fill));
            if (stroke == Paint.None)
            {
                return;
            }

            Attribute("stroke", Colour(stroke));
            Number("stroke-width", width);
            if (dash is { Count: > 0 })
            {
                Attribute("stroke-dasharray", string.Join(' ', dash.Select(Num)));
            }
        }

        private string Colour(Paint paint)
        {
            if (InkColours.Of(paint, options.Theme) is not { } colour)
            {
                return "none";
            }

            return options.Standalone || paint.Ramp is not null || InkColours.IsFixed(paint.Role) ? colour.Hex : $"var(--{InkColours.Name(paint.Role)})";
        }

        private void Close(Mark mark, string element)
        {
            if (mark.Label is null)
            {
                _svg.Append("/>");
                return;
            }

            _svg.Append("><title>").Append(Escape(mark.Label)).Append("</title></").Append(element).Append('>');
        }

        private void Attribute(string name, string value) => _svg.Append(' ').Append(name).Append("=\"").Append(Escape(value)).Append('"');

        private void Number(string name, double value) => _svg.Append(' ').Append(name).Append("=\"").Append(Num(value)).Append('"');
    }

    private static string Num(double value) => double.IsFinite(value)
        ? (Math.Round(value, 2) + 0.0).ToString("0.##", CultureInfo.InvariantCulture)
        : throw new ArgumentException($"A scene holds the coordinate {value}, which can't be drawn.");

    /// <summary>XML text or attribute; characters that XML 1.0 doesn't allow become U+FFFD.</summary>
    private static string Escape(string text)
    {
        var safe = new StringBuilder(text.Length);
        for (var i = 0; i < text.Length; i++)
        {
            var c = text[i];
            if (char.IsHighSurrogate(c) && i + 1 < text.Length && char.IsLowSurrogate(text[i + 1]))
            {
                safe.Append(c).Append(text[++i]);
                continue;
            }

            safe.Append(c switch
            {
                '&' => "&amp;",
                '<' => "&lt;",
                '>' => "&gt;",
                '"' => "&quot;",
                '\'' => "&#39;",
                _ when char.IsSurrogate(c) || c is '\uFFFE' or '\uFFFF' || (c < ' ' && c is not ('\t' or '\n' or '\r')) => "\uFFFD",
                _ => c.ToString(),
            });
        }

        return safe.ToString();
    }
}
