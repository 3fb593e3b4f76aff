using System.Runtime.ExceptionServices;

namespace NetFault;

/// <summary>Runs independent steps on the cores there are.</summary>
internal static class SideBySide
{
    /// <summary>Runs the steps; a step's exception comes out as it is, not gathered in another.</summary>
    /// <param name="count">How many.</param>
    /// <param name="cancellation">Stops between steps.</param>
    /// <param name="step">A step, by its number from 0.</param>
    public static void Run(int count, CancellationToken cancellation, Action<int> step)
    {
        cancellation.ThrowIfCancellationRequested();
        try
        {
            Parallel.For(0, count, new ParallelOptions { CancellationToken = cancellation }, step);
        }
        catch (AggregateException gathered)
        {
            ExceptionDispatchInfo.Capture(gathered.InnerExceptions[0]).Throw();
        }
    }
}

/// <summary>Counts steps and tells of them in one go, so that the counts come in order from whatever thread.</summary>
internal sealed class StepCounter(IProgress<StudyProgress>? progress, int total)
{
    private int _done;

    /// <summary>One more is done.</summary>
    public void Done(string step)
    {
        if (progress is null)
            return;
        lock (progress)
            progress.Report(new StudyProgress(++_done, total, step));
    }
}
