using Bunit;
using CoreDesign.Web.Features.Handbook;

namespace CoreDesign.Web.Tests.HandbookPages;

public sealed class HandbookPageTests : BunitContext
{
    [Fact]
    public void Handbook_opens_at_its_first_chapter_with_the_contents_beside_it()
    {
        var page = Render<HandbookPage>();

        Assert.Equal(HandbookBook.Chapters[0].Title, page.Find("article h1").TextContent);
        Assert.Equal(HandbookBook.Chapters.Select(c => c.Title), page.FindAll("nav > ol > li > a").Select(a => a.TextContent));
        Assert.Equal(HandbookBook.Chapters[0].Title, Assert.Single(page.FindAll("[aria-current=page]")).TextContent);
    }

    [Fact]
    public void Every_chapter_shows_and_the_headings_beside_it_lead_into_it()
    {
        foreach (var chapter in HandbookBook.Chapters)
        {
            var page = Render<HandbookPage>(p => p.Add(x => x.Name, chapter.Name));

            Assert.Equal(chapter.Title, page.Find("article h1").TextContent);
            Assert.All(page.FindAll("nav ul a"), a => Assert.Single(page.FindAll($"article [id='{a.GetAttribute("href")!.Split('#')[1]}']")));
        }
    }

    [Fact]
    public void Links_from_chapter_to_chapter_lead_somewhere()
    {
        var links = HandbookBook.Chapters.SelectMany(c => Render<HandbookPage>(p => p.Add(x => x.Name, c.Name)).FindAll("article a[href^='handbook/']"));

        Assert.NotEmpty(links);
        Assert.All(links, a => Assert.NotNull(HandbookBook.Find(a.GetAttribute("href")!["handbook/".Length..].Split('#')[0])));
    }

    [Fact]
    public void Chapter_that_does_not_exist_is_said_to_be_missing()
    {
        var page = Render<HandbookPage>(p => p.Add(x => x.Name, "cooking"));

        Assert.Equal("There is no chapter of that name", page.Find("article h1").TextContent);
        Assert.Empty(page.FindAll("[aria-current=page]"));
    }
}
