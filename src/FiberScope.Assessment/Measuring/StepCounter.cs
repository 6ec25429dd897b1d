namespace FiberScope.Assessment.Measuring;

/// <summary>Counts steps that end on several threads and tells whoever watches.</summary>
internal sealed class StepCounter(IProgress<RunProgress>? progress, int total)
{
    private readonly Lock _gate = new();
    private int _total = total;
    private int _done;

    public void Extend(int more)
    {
        lock (_gate)
        {
            _total += more;
        }
    }

    public void Done(string what)
    {
        lock (_gate)
        {
            progress?.Report(new RunProgress(++_done, _total, what));
        }
    }
}
