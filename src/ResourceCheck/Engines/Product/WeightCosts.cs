using ResourceCheck.Numerics.Antisymmetric;

namespace ResourceCheck.Engines.Product;

/// <summary>Counts what <see cref="MixtureWeights"/> would do, and does nothing. Equal noise and common eigenbases make sums cheaper than is said here.</summary>
internal sealed class WeightCosts : IOutcomeWeights
{
    private readonly HashSet<(int Observed, int Parties, int Hash)> _known = [];

    /// <summary>Complex multiplications so far.</summary>
    public double Work { get; private set; }

    /// <summary>Most bytes held at once.</summary>
    public double Bytes { get; private set; }

    public RoundedSum Of(IReadOnlyList<LocalOperator> operators)
    {
        int hash = operators.Aggregate(17, (h, a) => (h * 31) + System.Runtime.CompilerServices.RuntimeHelpers.GetHashCode(a)), observed = operators.Count(a => !a.IsScalar);
        if (_known.Add((observed, operators.Count, hash)))
            Work += MixedDiscriminant.Work(observed, operators.Count);
        return new RoundedSum(1, 0);
    }

    public RoundedSum Distinct(IReadOnlyList<IReadOnlyList<LocalOperator>> effects, IReadOnlyList<LocalOperator> others)
    {
        Work += DistinctOutcomes.Work(effects, others);
        return new RoundedSum(1, 0);
    }

    public RoundedSum[] Counts(IReadOnlyList<IReadOnlyList<(int Sets, LocalOperator Operator)>> parties, int sets)
    {
        int n = parties.Count;
        double points = Math.Pow(n + 1, sets);
        Work += points * MixedDiscriminant.Work(parties.Count(p => p.Count > 1 || !p[0].Operator.IsScalar), n);
        return new RoundedSum[(int)points];
    }

    public double[] Joint(IReadOnlyList<IReadOnlyList<LocalOperator>> effects)
    {
        int[] outcomes = [.. effects.Select(e => e.Count)];
        Work += JointLaw.Work(outcomes);
        Bytes = Math.Max(Bytes, JointLaw.Bytes(outcomes));
        return [];
    }

    /// <summary>An overlap at a look.</summary>
    public void Overlap(ChannelFidelity fidelity, double times)
    {
        Work += fidelity.Work * times;
        Bytes = Math.Max(Bytes, fidelity.Bytes);
    }

    /// <summary>What was counted inside an action, so many times.</summary>
    public void Repeat(double times, Action action)
    {
        double before = Work;
        action();
        Work = before + ((Work - before) * times);
    }
}
