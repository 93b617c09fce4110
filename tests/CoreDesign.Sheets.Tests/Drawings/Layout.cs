using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Tests.Drawings;

/// <summary>What every drawing must keep: texts apart from one another, from the lines, and inside the picture.</summary>
internal static class Layout
{
    public static void HoldsApart(Scene scene, string which)
    {
        var texts = TextExtent.Texts(scene.Marks).Select(t => (t.Text, Box: TextExtent.Of(t).Grown(-0.4))).ToArray();
        var whole = new Box(0, 0, scene.Width, scene.Height).Grown(0.5);
        for (var i = 0; i < texts.Length; i++)
        {
            if (!whole.Holds(texts[i].Box))
            {
                Assert.Fail($"{which}: \"{texts[i].Text}\" leaves the picture: {texts[i].Box}");
            }

            for (var k = 0; k < i; k++)
            {
                if (texts[i].Box.Overlaps(texts[k].Box))
                {
                    Assert.Fail($"{which}: \"{texts[i].Text}\" overlaps \"{texts[k].Text}\": {texts[i].Box} {texts[k].Box}");
                }
            }
        }

        foreach (var path in Paths(scene.Marks).Where(p => p.Stroke != Paint.None && p.Part is not ("pt" or "pt2")))
        {
            var points = path.Closed ? [.. path.Points, path.Points[0]] : path.Points;
            for (var i = 1; i < points.Count; i++)
            {
                foreach (var (text, box) in texts)
                {
                    if (box.Meets(points[i - 1], points[i]))
                    {
                        Assert.Fail($"{which}: a line ({path.Part}) {points[i - 1]} {points[i]} runs through \"{text}\" {box}");
                    }
                }
            }
        }
    }

    public static IEnumerable<PathMark> Paths(IEnumerable<Mark> marks) => marks.SelectMany(m => m switch
    {
        PathMark p => [p],
        GroupMark g => Paths(g.Marks),
        _ => Enumerable.Empty<PathMark>(),
    });

    public static IEnumerable<GroupMark> Groups(Scene scene) => scene.Marks.OfType<GroupMark>();
}
