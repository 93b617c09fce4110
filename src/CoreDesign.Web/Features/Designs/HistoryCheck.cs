using CoreDesign.History.Designs;
using Microsoft.Extensions.Diagnostics.HealthChecks;

namespace CoreDesign.Web.Features.Designs;

/// <summary>Ready means that the history answers a query; which design is asked for does not matter.</summary>
internal sealed class HistoryCheck(DesignStore designs) : IHealthCheck
{
    public async Task<HealthCheckResult> CheckHealthAsync(HealthCheckContext context, CancellationToken cancellationToken = default)
    {
        await designs.CurrentRevisionAsync(1, cancellationToken);
        return HealthCheckResult.Healthy();
    }
}
