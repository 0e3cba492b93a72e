namespace SurveyPlanner.Coverage;

/// <summary>
/// One part of a longer job: takes shares of the part from any thread and tells the whole job's progress, ever growing, one thread at a time.
/// </summary>
/// <param name="whole">Told the share of the whole job that is done, 0 to 1.</param>
/// <param name="from">Share that is done before this part.</param>
/// <param name="to">Share that is done after it.</param>
internal sealed class ProgressPart(IProgress<double> whole, double from, double to)
{
    // A bar on a terminal shows no finer step than a hundredth.
    private const double FinestStep = 0.005;

    private readonly Lock _lock = new();
    private double _done;
    private double _told;

    /// <summary>One of several equal parts; null where nobody wants to know.</summary>
    public static ProgressPart? Of(IProgress<double>? whole, int part, int parts)
        => whole is null ? null : new ProgressPart(whole, (double)part / parts, (part + 1.0) / parts);

    /// <summary>So much more of this part is done.</summary>
    public void Add(double share)
    {
        lock (_lock)
        {
            _done = Math.Min(1, _done + share);
            if ((_done - _told) * (to - from) >= FinestStep)
            {
                Tell();
            }
        }
    }

    /// <summary>All of it is done, whatever was added up.</summary>
    public void Finish()
    {
        lock (_lock)
        {
            _done = 1;
            Tell();
        }
    }

    private void Tell()
    {
        _told = _done;
        whole.Report(from + (_done * (to - from)));
    }
}
