using CoreDesign.History.Steels;
using Microsoft.EntityFrameworkCore;

namespace CoreDesign.History.Tests.Steels;

public sealed class SteelStoreTests : IDisposable
{
    private readonly HistoryFile _history = new();

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    public void Dispose() => _history.Dispose();

    [Fact]
    public async Task Steel_is_found_by_name_whatever_the_case()
    {
        var steels = _history.Get<SteelStore>();
        await steels.AddAsync("Coil 4711", """{"a":1}""", Cancel);

        var found = (await steels.FindAsync("coil 4711", Cancel))!;

        Assert.Equal("Coil 4711", found.Name);

        // From sha256sum (coreutils) over the seven bytes {"a":1}.
        Assert.StartsWith("015abd7f5cc5", found.Fingerprint, StringComparison.Ordinal);
        Assert.Equal("015abd7f5cc5", found.Revision);
        Assert.Single(await steels.AllAsync(Cancel));
    }

    [Fact]
    public async Task Same_name_with_other_content_is_refused_and_with_the_same_content_adds_nothing()
    {
        var steels = _history.Get<SteelStore>();
        await steels.AddAsync("Coil", """{"a":1}""", Cancel);

        Assert.False((await steels.AddAsync("Coil", """{"a":1}""", Cancel)).NameTaken);
        var other = await steels.AddAsync("COIL", """{"a":2}""", Cancel);

        Assert.True(other.NameTaken);
        Assert.Equal("""{"a":1}""", other.Steel.Payload);
        Assert.Single(await steels.AllAsync(Cancel));
    }

    [Fact]
    public async Task Stored_steel_never_changes()
    {
        await _history.Get<SteelStore>().AddAsync("Coil", "{}", Cancel);
        await using var db = _history.Open();
        (await db.Steels.SingleAsync(Cancel)).Payload = "{ }";

        await Assert.ThrowsAsync<InvalidOperationException>(() => db.SaveChangesAsync(Cancel));
    }
}
