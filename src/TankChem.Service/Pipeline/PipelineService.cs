namespace TankChem.Service.Pipeline;

/// <summary>Starts and stops the writer with the host; the host stops when the writer dies.</summary>
internal sealed class PipelineService(FarmPipeline pipeline, IHostApplicationLifetime lifetime, ILogger<PipelineService> logger) : IHostedService
{
    public Task StartAsync(CancellationToken cancellationToken)
    {
        pipeline.Start();
        _ = WatchAsync();
        return Task.CompletedTask;
    }

    public Task StopAsync(CancellationToken cancellationToken) => Task.Run(pipeline.Stop, CancellationToken.None);

    private async Task WatchAsync()
    {
        try
        {
            await pipeline.Finished.Task;
        }
#pragma warning disable CA1031 // Whatever ended the writer, nothing can be kept any more: say so and stop the service.
        catch (Exception e)
#pragma warning restore CA1031
        {
            logger.LogCritical(e, "The journal writer ended; the service stops");
            Environment.ExitCode = 1;
            lifetime.StopApplication();
        }
    }
}
