using ResourceCheck.Numerics;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Dense;

/// <summary>
/// One classical history and the state that goes with it. Maps on a qudit are only collected until it is measured or looked at,
/// so that most of them never touch the whole tensor.
/// </summary>
internal sealed class Branch
{
    public required SiteTensor Tensor { get; init; }

    /// <summary>Map collected on each party's site; null is the identity.</summary>
    public required SiteMap?[] Pending { get; init; }

    public required Value[] Slots { get; init; }

    /// <summary>Probability of the classical choices made, times what the tensor's own trace does not hold.</summary>
    public double Factor { get; init; } = 1;

    /// <summary>Parties that gave up, as bits.</summary>
    public ulong Aborted { get; init; }

    /// <summary>Whether a party has given up; what it makes from then on is none.</summary>
    public bool HasAborted(int party) => (Aborted & (1UL << party)) != 0;

    public Branch With(int slot, Value value)
    {
        Value[] slots = [.. Slots];
        slots[slot] = value;
        return new Branch { Tensor = Tensor, Pending = Pending, Slots = slots, Factor = Factor, Aborted = Aborted };
    }

    public Branch Holding(SiteTensor tensor) => new() { Tensor = tensor, Pending = Pending, Slots = Slots, Factor = Factor, Aborted = Aborted };

    public Branch Scaled(double factor) => new() { Tensor = Tensor, Pending = Pending, Slots = Slots, Factor = Factor * factor, Aborted = Aborted };

    public Branch WithAborted(int party) => new() { Tensor = Tensor, Pending = Pending, Slots = Slots, Factor = Factor, Aborted = Aborted | (1UL << party) };

    public Branch Acting(int party, SiteMap map)
    {
        SiteMap?[] pending = [.. Pending];
        pending[party] = map.After(pending[party]);
        return new Branch { Tensor = Tensor, Pending = pending, Slots = Slots, Factor = Factor, Aborted = Aborted };
    }

    /// <summary>The branch after a party's site has been read out with a functional.</summary>
    public Branch Reading(int party, double[] functional)
    {
        double[] pulled = Pending[party]?.PullBack(functional) ?? functional;
        return new Branch { Tensor = Tensor.Contract(party, pulled), Pending = Pending, Slots = Slots, Factor = Factor, Aborted = Aborted };
    }

    /// <summary>Probability of this history.</summary>
    public double Weight(double[] trace) => Factor * Reduced([], trace).Data[0];

    /// <summary>The tensor of some parties' sites, the others traced out; collected maps on the sites that stay are not applied.</summary>
    public SiteTensor Reduced(IReadOnlyList<int> staying, double[] trace)
    {
        SiteTensor tensor = Tensor;
        foreach (int party in Tensor.Parties)
        {
            if (!staying.Contains(party))
                tensor = tensor.Contract(party, Pending[party]?.PullBack(trace) ?? trace);
        }

        return tensor;
    }
}
