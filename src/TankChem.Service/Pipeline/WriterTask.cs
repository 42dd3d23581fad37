namespace TankChem.Service.Pipeline;

/// <summary>Something a person asked for, to be run on the writer's thread and answered once it is on disk.</summary>
internal sealed class WriterTask(Action<FarmEngine, DateTimeOffset> run, Action complete, Action<Exception> fail)
{
    /// <summary>Runs it; false when it failed (it is then answered).</summary>
    public bool TryRun(FarmEngine engine, DateTimeOffset now)
    {
        try
        {
            run(engine, now);
            return true;
        }
#pragma warning disable CA1031 // It is handed to the caller who asked; the writer goes on.
        catch (Exception e)
#pragma warning restore CA1031
        {
            fail(e);
            return false;
        }
    }

    /// <summary>It is on disk.</summary>
    public void Complete() => complete();

    /// <summary>It is not.</summary>
    public void Fail(Exception why) => fail(why);
}
