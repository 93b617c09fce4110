using CoreDesign.History.Drafts;

namespace CoreDesign.History.Tests.Drafts;

public sealed class DraftStoreTests
{
    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Draft_survives_a_restart_with_the_fields_as_typed()
    {
        using var first = new HistoryFile();
        var key = Guid.NewGuid();
        await first.Get<DraftStore>().PutAsync(key, """{"turns":"18,"}""", designId: 4, baseRevision: 2, Cancel);
        first.Stop();

        using var second = new HistoryFile(first.Settings.Folder);
        var draft = (await second.Get<DraftStore>().FindAsync(key, Cancel))!;

        Assert.Equal("""{"turns":"18,"}""", draft.Payload);
        Assert.Equal((4, 2), (draft.DesignId, draft.BaseRevision));
    }

    [Fact]
    public async Task Later_state_takes_the_place_of_the_earlier_one()
    {
        using var history = new HistoryFile();
        var drafts = history.Get<DraftStore>();
        var key = Guid.NewGuid();
        await drafts.PutAsync(key, "{}", cancel: Cancel);
        await drafts.PutAsync(key, """{"a":1}""", cancel: Cancel);

        Assert.Equal("""{"a":1}""", (await drafts.FindAsync(key, Cancel))!.Payload);
        await drafts.RemoveAsync(key, Cancel);
        Assert.Null(await drafts.FindAsync(key, Cancel));
    }

    [Fact]
    public async Task First_states_from_two_tabs_at_once_both_succeed()
    {
        using var history = new HistoryFile();
        var drafts = history.Get<DraftStore>();
        var key = Guid.NewGuid();

        await Task.WhenAll(Enumerable.Range(0, 8).Select(i => Task.Run(() => drafts.PutAsync(key, $"{i}", cancel: Cancel), Cancel)));

        Assert.NotNull(await drafts.FindAsync(key, Cancel));
    }

    [Fact]
    public async Task Draft_beyond_the_size_limit_is_refused()
    {
        using var history = new HistoryFile();
        var drafts = history.Get<DraftStore>();
        var limit = new string('x', DraftStore.LargestPayload_bytes);

        await drafts.PutAsync(Guid.NewGuid(), limit, cancel: Cancel);
        await Assert.ThrowsAsync<ArgumentException>(() => drafts.PutAsync(Guid.NewGuid(), limit + "x", cancel: Cancel));
    }

    [Fact]
    public async Task Start_drops_drafts_untouched_for_more_than_90_days_and_no_others()
    {
        using var first = new HistoryFile();
        var (old, young) = (Guid.NewGuid(), Guid.NewGuid());
        var start = first.Clock.Now;
        first.Clock.Now = start.AddDays(-90.5);
        await first.Get<DraftStore>().PutAsync(old, "{}", cancel: Cancel);
        first.Clock.Now = start.AddDays(-89.5);
        await first.Get<DraftStore>().PutAsync(young, "{}", cancel: Cancel);
        first.Stop();

        using var second = new HistoryFile(first.Settings.Folder);

        Assert.Null(await second.Get<DraftStore>().FindAsync(old, Cancel));
        Assert.NotNull(await second.Get<DraftStore>().FindAsync(young, Cancel));
    }
}
