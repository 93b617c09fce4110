using CoreDesign.History.Drafts;

namespace CoreDesign.Web.Features.Design;

/// <summary>Keeps the page's draft up to date, a moment after the last keystroke and once more when the page closes.</summary>
public sealed class DraftKeeper(DraftStore store) : IAsyncDisposable
{
    private static readonly TimeSpan Pause = TimeSpan.FromMilliseconds(300);
    private readonly SemaphoreSlim writing = new(1, 1);
    private (DraftPayload Payload, long? Design, int? Revision)? waiting;
    private bool closed;

    public Guid? Key { get; private set; }

    public void Use(Guid? key) => Key = key;

    /// <summary>Keeps a state; the first one makes the key.</summary>
    public async Task KeepAsync(DraftPayload payload, long? design, int? revision)
    {
        Key ??= Guid.NewGuid();
        waiting = (payload, design, revision);
        var mine = payload;
        await Task.Delay(Pause);
        if (!closed && ReferenceEquals(waiting?.Payload, mine))
        {
            await WriteAsync();
        }
    }

    /// <summary>The draft has become a revision.</summary>
    public async Task RemoveAsync()
    {
        waiting = null;
        if (Key is { } key)
        {
            Key = null;
            await store.RemoveAsync(key);
        }
    }

    public async ValueTask DisposeAsync()
    {
        if (closed)
        {
            return;
        }

        closed = true;
        await WriteAsync();
        writing.Dispose();
    }

    private async Task WriteAsync()
    {
        await writing.WaitAsync();
        try
        {
            if (waiting is { } state && Key is { } key)
            {
                waiting = null;
                await store.PutAsync(key, state.Payload.ToJson(), state.Design, state.Revision);
            }
        }
        finally
        {
            writing.Release();
        }
    }
}
