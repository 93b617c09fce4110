using CoreDesign.Estimating.Contracts;
using CoreDesign.History.Designs;
using CoreDesign.History.Model;
using Microsoft.EntityFrameworkCore;

namespace CoreDesign.History.Tests.Designs;

public sealed class DesignStoreTests : IDisposable
{
    private readonly HistoryFile _history = new();

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    public void Dispose() => _history.Dispose();

    [Fact]
    public async Task New_design_begins_as_draft_with_revision_1_and_the_columns_of_its_study()
    {
        var given = HistoryFile.Revision("Station transformer", "first try");

        var saved = await _history.Designs.CreateAsync(given, Cancel);
        var found = await _history.Designs.FindAsync(saved.Id, Cancel);

        var estimate = given.Study.Estimate;
        Assert.Equal(saved, found!.Current);
        Assert.Equal(1, saved.Revision);
        Assert.Equal(DesignState.Draft, saved.State);
        Assert.Equal(DateTimeKind.Utc, found.Current.CreatedAt.Kind);
        Assert.Equal("first try", saved.Note);
        Assert.Equal(estimate.Inputs.Order!.Reference, saved.Reference);
        Assert.Equal(estimate.NoLoadLoss_W, saved.NoLoadLoss_W);
        Assert.Equal(estimate.NoLoadCurrent_percent, saved.NoLoadCurrent_percent);
        Assert.Equal(estimate.Mass_kg.Total, saved.Mass_kg);
        Assert.Equal(estimate.Parts.Where(p => p.Kind == "limb").Max(p => p.PeakFluxDensity_T), saved.LimbPeakFluxDensity_T);
        Assert.Equal(estimate.KernelVersion, saved.KernelVersion);
        Assert.Contains("kVA", saved.Rating, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Save_adds_a_revision_and_leaves_the_one_before_as_it_was()
    {
        var first = await _history.Designs.CreateAsync(HistoryFile.Revision("One"), Cancel);

        var result = await _history.Designs.SaveAsync(first.Id, 1, HistoryFile.Revision("Two", change: e => e with { NoLoadLoss_W = 512.5 }), Cancel);

        var second = Assert.IsType<SaveResult.Saved>(result).Revision;
        Assert.Equal(2, second.Revision);
        Assert.Equal(512.5, second.NoLoadLoss_W);
        Assert.Equal(first, (await _history.Designs.FindRevisionAsync(first.Id, 1, Cancel))!.Info);
        Assert.Equal([2, 1], (await _history.Designs.FindAsync(first.Id, Cancel))!.Revisions.Select(r => r.Revision));
    }

    [Fact]
    public async Task Save_on_a_revision_that_is_no_longer_the_newest_stores_nothing_and_shows_the_newest()
    {
        var design = await _history.Designs.CreateAsync(HistoryFile.Revision("One"), Cancel);
        await _history.Designs.SaveAsync(design.Id, 1, HistoryFile.Revision("Theirs"), Cancel);

        var result = await _history.Designs.SaveAsync(design.Id, 1, HistoryFile.Revision("Yours"), Cancel);

        var conflict = Assert.IsType<SaveResult.Conflict>(result);
        Assert.Equal(2, conflict.Current.Info.Revision);
        Assert.Equal("Theirs", conflict.Current.Info.Title);
        Assert.Equal(2, (await _history.Designs.FindAsync(design.Id, Cancel))!.Revisions.Count);
    }

    [Fact]
    public async Task Saves_at_the_same_moment_from_the_same_revision_let_exactly_one_through()
    {
        var design = await _history.Designs.CreateAsync(HistoryFile.Revision(), Cancel);
        for (var expected = 1; expected <= 5; expected++)
        {
            using var start = new Barrier(4);
            var from = expected;
            var results = await Task.WhenAll(Enumerable.Range(1, 4).Select(desk => Task.Run(
                async () =>
                {
                    var mine = HistoryFile.Revision($"Desk {desk}");
                    start.SignalAndWait(Cancel);
                    return await _history.Designs.SaveAsync(design.Id, from, mine, Cancel);
                },
                Cancel)));

            var saved = Assert.Single(results.OfType<SaveResult.Saved>()).Revision;
            Assert.Equal(expected + 1, saved.Revision);
            Assert.Equal(3, results.OfType<SaveResult.Conflict>().Count(c => c.Current.Info == saved));
        }
    }

    [Fact]
    public async Task Save_that_lost_the_race_after_reading_is_stopped_by_the_database()
    {
        var design = await _history.Designs.CreateAsync(HistoryFile.Revision(), Cancel);
        await using var slow = _history.Open();
        var read = await slow.Designs.SingleAsync(d => d.Id == design.Id, Cancel);
        await _history.Designs.SaveAsync(design.Id, 1, HistoryFile.Revision("Quicker"), Cancel);

        read.CurrentRevision = 2;

        await Assert.ThrowsAsync<DbUpdateConcurrencyException>(() => slow.SaveChangesAsync(Cancel));
    }

    [Fact]
    public async Task Two_rows_of_the_same_revision_number_are_refused_by_the_database()
    {
        var design = await _history.Designs.CreateAsync(HistoryFile.Revision(), Cancel);
        await using var db = _history.Open();

        var twice = await Assert.ThrowsAsync<Microsoft.Data.Sqlite.SqliteException>(() => db.Database.ExecuteSqlAsync(
            $"""
            INSERT INTO "Revisions" SELECT 99, "DesignId", "Number", "CreatedAt", "Author", "Title", "Note", "State", "KernelVersion", "SteelDataRevision", "Reference",
            "Rating", "Phases", "RatedPower_kVA", "Form", "Steel", "JointType", "JointPositions", "LimbPeakFluxDensity_T", "NoLoadLoss_W", "AskedNoLoadLoss_W",
            "NoLoadCurrent_percent", "AskedNoLoadCurrent_percent", "Mass_kg", "MarginAtRated_percent", "MarginAtHighest_percent", "SearchText"
            FROM "Revisions" WHERE "DesignId" = {design.Id}
            """,
            Cancel));

        Assert.Contains("UNIQUE", twice.Message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Stored_revision_can_be_neither_changed_nor_deleted()
    {
        await _history.Designs.CreateAsync(HistoryFile.Revision(), Cancel);
        await using (var db = _history.Open())
        {
            (await db.Revisions.SingleAsync(Cancel)).NoLoadLoss_W = 1;
            await Assert.ThrowsAsync<InvalidOperationException>(() => db.SaveChangesAsync(Cancel));
        }

        await using (var db = _history.Open())
        {
            (await db.Contents.SingleAsync(Cancel)).Input = "{}";
            Assert.Throws<InvalidOperationException>(() => db.SaveChanges());
        }

        await using (var db = _history.Open())
        {
            db.Contents.Remove(await db.Contents.SingleAsync(Cancel));
            await Assert.ThrowsAsync<InvalidOperationException>(() => db.SaveChangesAsync(Cancel));
        }
    }

    [Fact]
    public async Task Input_and_study_come_back_to_the_bit()
    {
        // Doubles whose shortest decimal forms are long or at the ends of the range.
        double[] hard = [0.1 + 0.2, Math.PI, 1.0 / 3, double.Epsilon, double.MaxValue, -0.0, 5e-324, 1.7976931348623157e308, 123456789.12345679];
        var given = HistoryFile.Revision(change: e => e with { Lines = [.. e.Lines.Select(l => l with { Waveform_A = hard })], NoLoadLoss_W = 2.0 / 3 });

        var saved = await _history.Designs.CreateAsync(given, Cancel);
        var found = (await _history.Designs.FindRevisionAsync(saved.Id, 1, Cancel))!;

        Assert.Equal(hard.Select(BitConverter.DoubleToInt64Bits), found.Study.Estimate.Lines[0].Waveform_A.Select(BitConverter.DoubleToInt64Bits));
        Assert.Equal(2.0 / 3, found.Study.Estimate.NoLoadLoss_W);
        Assert.Equal(DesignJson.Write(given.Study), DesignJson.Write(found.Study));
        Assert.Equal(DesignJson.Write(given.Input), DesignJson.Write(found.Input));
    }

    [Fact]
    public async Task Study_with_a_number_that_is_none_is_not_stored_at_all()
    {
        await Assert.ThrowsAsync<ArgumentException>(() => _history.Designs.CreateAsync(HistoryFile.Revision(change: e => e with { NoLoadLoss_W = double.NaN }), Cancel));

        await using var db = _history.Open();
        Assert.Empty(db.Designs);
        Assert.Empty(db.Revisions);
    }

    [Fact]
    public async Task Copy_is_a_new_design_that_says_where_it_comes_from()
    {
        var from = await _history.Designs.CreateAsync(HistoryFile.Revision("Station transformer"), Cancel);

        var copy = await _history.Designs.CopyAsync(from.Id, 1, "this desk", cancel: Cancel);

        Assert.NotEqual(from.Id, copy!.Id);
        Assert.Equal(1, copy.Revision);
        Assert.Equal($"Copy of design {from.Id}, revision 1: Station transformer", copy.Note);
        Assert.Equal(from.NoLoadLoss_W, copy.NoLoadLoss_W);
        await using var db = _history.Open();
        Assert.Single(await db.Contents.Select(c => c.Input).Distinct().ToListAsync(Cancel));
        Assert.Single(await db.Contents.Select(c => c.Study).Distinct().ToListAsync(Cancel));
        Assert.Null(await _history.Designs.CopyAsync(from.Id, 2, "this desk", cancel: Cancel));
    }

    [Fact]
    public async Task Remarks_are_added_in_order_and_leave_the_revision_alone()
    {
        var saved = await _history.Designs.CreateAsync(HistoryFile.Revision(), Cancel);

        await _history.Designs.AddRemarkAsync(saved.Id, 1, "gap measured: 0.25 mm", "desk 2", Cancel);
        await _history.Designs.AddRemarkAsync(saved.Id, 1, "agreed", "desk 1", Cancel);

        var found = (await _history.Designs.FindRevisionAsync(saved.Id, 1, Cancel))!;
        Assert.Equal(saved, found.Info);
        Assert.Equal(["gap measured: 0.25 mm", "agreed"], found.Remarks.Select(r => r.Text));
        Assert.Null(await _history.Designs.AddRemarkAsync(saved.Id, 7, "nowhere", "desk 1", Cancel));
    }

    [Fact]
    public async Task Unknown_design_is_told_from_a_conflict()
    {
        Assert.Null(await _history.Designs.FindAsync(12345, Cancel));
        Assert.Null(await _history.Designs.FindRevisionAsync(12345, 1, Cancel));
        Assert.IsType<SaveResult.NoSuchDesign>(await _history.Designs.SaveAsync(12345, 1, HistoryFile.Revision(), Cancel));
    }
}
