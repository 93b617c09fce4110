using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;
using CoreDesign.History;
using CoreDesign.History.Designs;
using CoreDesign.History.Drafts;
using CoreDesign.Web.Features.Design;
using Microsoft.Extensions.DependencyInjection;

namespace CoreDesign.Web.Tests.Design;

/// <summary>The session on a real history file; the estimate is a stand-in whose loss is the window height, so that figures can be told apart.</summary>
public sealed class DesignSessionTests : IDisposable
{
    private readonly string folder = Directory.CreateTempSubdirectory("coredesign-session-").FullName;
    private readonly ServiceProvider services;

    public DesignSessionTests()
    {
        services = new ServiceCollection().AddHistory(_ => HistorySettings.From(folder, null)).BuildServiceProvider();
        HistoryStartup.Apply(services);
    }

    [Fact]
    public async Task What_was_typed_is_found_again_by_the_draft_key()
    {
        Guid key;
        await using (var first = Session())
        {
            await first.OpenAsync(null, null, null, null);
            first.State.Type(FormPaths.Diameter, "22,");
            await first.EditedAsync();
            key = first.DraftKey!.Value;
        }

        await using var again = Session();
        await again.OpenAsync(null, null, key, null);

        Assert.Equal("22,", again.State.Typed[FormPaths.Diameter]);
    }

    [Fact]
    public async Task Edit_in_the_last_moment_is_kept_when_the_page_closes()
    {
        Guid key;
        await using (var first = Session())
        {
            await first.OpenAsync(null, null, null, null);
            first.State.Type(FormPaths.Reference, "HR-1");
            var unfinished = first.EditedAsync();
            key = first.DraftKey!.Value;
            await first.DisposeAsync();
            await unfinished;
        }

        await using var again = Session();
        await again.OpenAsync(null, null, key, null);
        Assert.Equal("HR-1", again.State.Typed[FormPaths.Reference]);
    }

    [Fact]
    public async Task Two_people_saving_the_same_design_meet_and_nothing_is_overwritten()
    {
        var id = await SavedAsync("520");
        await using var mine = await OpenAsync(id);
        await using var theirs = await OpenAsync(id);
        await EditAsync(theirs, "530");
        Assert.IsType<SaveResult.Saved>(await theirs.SaveAsync("Theirs", "", "B"));
        await EditAsync(mine, "540");

        var conflict = Assert.IsType<SaveResult.Conflict>(await mine.SaveAsync("Mine", "", "A"));

        Assert.Equal(530, conflict.Current.Input.Core!.WindowHeight_mm);
        Assert.Equal("540", mine.State.Typed[FormPaths.WindowHeight]);
        var saved = Assert.IsType<SaveResult.Saved>(await mine.SaveAsync("Mine", "", "A", conflict.Current.Info.Revision));
        Assert.Equal(3, saved.Revision.Revision);
    }

    [Fact]
    public async Task Stored_revision_opens_with_its_own_figures_and_solves_nothing()
    {
        var id = await SavedAsync("520");
        await using var open = Session(_ => throw new InvalidOperationException("must not solve"));
        await open.OpenAsync(id, 1, null, null);

        Assert.Equal(520, open.State.Estimate!.NoLoadLoss_W);
        Assert.False(open.HasEdits);
    }

    [Fact]
    public async Task Old_revision_is_saved_on_top_of_the_newest()
    {
        var id = await SavedAsync("520");
        await using (var next = await OpenAsync(id))
        {
            await EditAsync(next, "530");
            await next.SaveAsync("Second", "", "A");
        }

        await using var old = Session();
        await old.OpenAsync(id, 1, null, null);
        await EditAsync(old, "525");

        Assert.Equal(3, Assert.IsType<SaveResult.Saved>(await old.SaveAsync("Back", "", "A")).Revision.Revision);
    }

    [Fact]
    public async Task Unknown_design_is_said_to_be_missing()
    {
        await using var session = Session();
        await session.OpenAsync(4711, null, null, null);

        Assert.True(session.NotFound);
    }

    public void Dispose()
    {
        services.Dispose();
        Microsoft.Data.Sqlite.SqliteConnection.ClearAllPools();
        Directory.Delete(folder, recursive: true);
    }

    private async Task<long> SavedAsync(string height)
    {
        await using var session = Session();
        await session.OpenAsync(null, null, null, null);
        session.State.Load(FormReader.Texts(Samples.Input));
        await EditAsync(session, height);
        return Assert.IsType<SaveResult.Saved>(await session.SaveAsync("First", "", "A")).Revision.Id;
    }

    private async Task<DesignSession> OpenAsync(long id)
    {
        var session = Session();
        await session.OpenAsync(id, null, null, null);
        return session;
    }

    private static Task EditAsync(DesignSession session, string height)
    {
        session.State.Type(FormPaths.WindowHeight, height);
        return session.State.Answered == session.State.Serial ? Task.CompletedTask : session.EditedAsync();
    }

    private DesignSession Session(Func<DesignInput, EstimateResult>? estimate = null)
    {
        estimate ??= d => Samples.Estimate with { NoLoadLoss_W = d.Core?.WindowHeight_mm ?? 0 };
        var engine = new DesignEngine
        {
            Estimate = (d, _) => Samples.Ok(estimate(d)),
            Levers = (_, _, _) => [],
            VoltageCurve = (_, _, _) => [],
            Margins = (_, _) => Samples.Margins,
            Steels = () => SteelLibrary.Catalog,
        };
        return new(engine, services.GetRequiredService<DesignStore>(), services.GetRequiredService<DraftStore>(), () => { });
    }
}
