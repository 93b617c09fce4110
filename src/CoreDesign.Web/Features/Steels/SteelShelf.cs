using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;
using CoreDesign.History.Steels;

namespace CoreDesign.Web.Features.Steels;

/// <summary>
/// The steels that a design can use: the built-in grades and the works' own, read from the history at start and again after
/// each import. Whoever took <see cref="Current"/> keeps a catalog that doesn't change under the hand.
/// </summary>
public sealed partial class SteelShelf(SteelStore store, ILogger<SteelShelf> log) : IHostedService, IDisposable
{
    private readonly SemaphoreSlim _gate = new(1, 1);
    private volatile SteelCatalog _current = SteelLibrary.Catalog;

    public SteelCatalog Current => _current;

    /// <summary>Keeps a steel that was checked whole; with a name that is taken by other data, nothing is stored.</summary>
    public async Task<CoreDesign.History.Steels.SteelImport> KeepAsync(SteelGrade grade, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(grade);
        var kept = await store.AddAsync(grade.Name, DesignJson.Write(grade), cancel);
        if (!kept.NameTaken) await LoadAsync(cancel);
        return kept;
    }

    public Task StartAsync(CancellationToken cancellationToken) => LoadAsync(cancellationToken);

    public Task StopAsync(CancellationToken cancellationToken) => Task.CompletedTask;

    public void Dispose() => _gate.Dispose();

    private async Task LoadAsync(CancellationToken cancel)
    {
        await _gate.WaitAsync(cancel);
        try
        {
            var own = new List<SteelGrade>();
            foreach (var steel in await store.AllAsync(cancel))
            {
                // A later version may bring a built-in grade of the same name; stored revisions keep their own data either way.
                if (SteelLibrary.TryFind(steel.Name, out _)) LogShadowed(steel.Name);
                else own.Add(DesignJson.ReadStored<SteelGrade>(steel.Payload));
            }

            _current = new SteelCatalog(own);
        }
        finally
        {
            _gate.Release();
        }
    }

    [LoggerMessage(Level = LogLevel.Warning, Message = "The works' steel {Name} has the name of a built-in grade and is left out; import it under another name.")]
    private partial void LogShadowed(string name);
}
