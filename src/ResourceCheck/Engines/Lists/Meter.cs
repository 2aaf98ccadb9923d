using System.Globalization;
using System.Numerics;

namespace ResourceCheck.Engines.Lists;

/// <summary>Counts transitions and states of an evaluation and ends it when there are too many.</summary>
internal sealed class Meter(ListLimits limits, CancellationToken cancellation)
{
    private const int TransitionsBetweenLooks = 1 << 16;

    private long _next = TransitionsBetweenLooks;

    public long Transitions { get; private set; }

    /// <summary>Paths less probable than this are left out.</summary>
    public double Negligible => limits.Negligible;

    /// <summary>Whether something counted positions of which the cheat was taken to hold enough: what comes out then depends on how many there are.</summary>
    public bool CountedPool { get; set; }

    /// <summary>Most positions that each draw from a list taken to hold enough has asked for, by operation and types drawn from.</summary>
    public Dictionary<(int At, BigInteger Types), int> Needs { get; } = [];

    /// <summary>A draw from a list that is taken to hold enough.</summary>
    public void Need(int at, BigInteger types, int positions) => Needs[(at, types)] = Math.Max(positions, Needs.GetValueOrDefault((at, types)));

    public void Count(int transitions, CountTable table)
    {
        Transitions += transitions;
        if (Transitions < _next)
            return;
        _next = Transitions + TransitionsBetweenLooks;
        cancellation.ThrowIfCancellationRequested();
        if (Transitions > limits.Operations)
            throw new ListRefusalException(string.Create(CultureInfo.InvariantCulture, $"Too much work: counting needs more than {limits.Operations:0.#e0} transitions between states of counts.")) { TooMuchWork = true };
        if (table.Count > limits.States)
            throw new ListRefusalException(string.Create(CultureInfo.InvariantCulture, $"Too much work: counting needs more than {limits.States:0.#e0} states of counts at once.")) { TooMuchWork = true };
    }
}
