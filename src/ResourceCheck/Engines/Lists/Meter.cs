using System.Globalization;

namespace ResourceCheck.Engines.Lists;

/// <summary>Counts transitions and states of an evaluation and ends it when there are too many.</summary>
internal sealed class Meter(ListLimits limits, CancellationToken cancellation)
{
    private const int TransitionsBetweenLooks = 1 << 16;

    private long _next = TransitionsBetweenLooks;

    public long Transitions { get; private set; }

    /// <summary>Paths less probable than this are left out.</summary>
    public double Negligible => limits.Negligible;

    public void Count(int transitions, CountTable table)
    {
        Transitions += transitions;
        if (Transitions < _next)
            return;
        _next = Transitions + TransitionsBetweenLooks;
        cancellation.ThrowIfCancellationRequested();
        if (Transitions > limits.Operations)
            throw new ListRefusalException(string.Create(CultureInfo.InvariantCulture, $"Too much work: counting needs more than {limits.Operations:0.#e0} transitions between states of counts."));
        if (table.Count > limits.States)
            throw new ListRefusalException(string.Create(CultureInfo.InvariantCulture, $"Too much work: counting needs more than {limits.States:0.#e0} states of counts at once."));
    }
}
