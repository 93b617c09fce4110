using CoreDesign.History;
using Microsoft.EntityFrameworkCore;
using Microsoft.Extensions.Diagnostics.HealthChecks;

namespace CoreDesign.Web.Features.Designs;

/// <summary>Ready means that the history answers a query.</summary>
internal sealed class HistoryCheck(IDbContextFactory<HistoryContext> contexts) : IHealthCheck
{
    public async Task<HealthCheckResult> CheckHealthAsync(HealthCheckContext context, CancellationToken cancellationToken = default)
    {
        await using var db = await contexts.CreateDbContextAsync(cancellationToken);
        await db.Designs.AnyAsync(cancellationToken);
        return HealthCheckResult.Healthy();
    }
}
