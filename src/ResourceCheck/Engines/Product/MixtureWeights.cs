using ResourceCheck.Numerics.Antisymmetric;

namespace ResourceCheck.Engines.Product;

/// <summary>Sums for the antisymmetric state with white noise mixed in. White noise is a product state, for which every sum falls apart into factors.</summary>
internal sealed class MixtureWeights(double white) : IOutcomeWeights
{
    private readonly Dictionary<Key, RoundedSum> _known = [];

    public RoundedSum Of(IReadOnlyList<LocalOperator> operators)
    {
        Key key = new(operators);
        if (!_known.TryGetValue(key, out RoundedSum sum))
            _known[key] = sum = Mixed(MixedDiscriminant.Of(operators), operators.Aggregate(1.0, (product, a) => product * Uniform(a)));
        return sum;
    }

    public RoundedSum Distinct(IReadOnlyList<IReadOnlyList<LocalOperator>> effects, IReadOnlyList<LocalOperator> others)
    {
        RoundedSum pure = DistinctOutcomes.Of(effects, others);
        double rest = others.Aggregate(1.0, (product, a) => product * Uniform(a));
        return Mixed(pure, white == 0 ? 0 : rest * DistinctOutcomes.OfProduct([.. effects.Select(e => e.Select(Uniform).ToArray())]));
    }

    public RoundedSum[] Counts(IReadOnlyList<IReadOnlyList<(int Sets, LocalOperator Operator)>> parties, int sets) => OutcomeCounts.Of(parties, sets, Polynomial);

    public double[] Joint(IReadOnlyList<IReadOnlyList<LocalOperator>> effects)
    {
        double[] law = JointLaw.Of(effects);
        for (int i = 0; i < law.Length; i++)
            law[i] *= 1 - white;
        if (white > 0)
            AddProduct(effects, 0, 0, white, law);
        return law;
    }

    /// <summary>At complex points, which are not worth remembering; the product has complex factors there.</summary>
    private RoundedSum Polynomial(IReadOnlyList<LocalOperator> operators)
    {
        RoundedSum pure = MixedDiscriminant.Of(operators);
        return new RoundedSum(((1 - white) * pure.Value) + (white * operators.Aggregate(System.Numerics.Complex.One, (product, a) => product * a.Trace / a.Levels)), pure.Error);
    }

    private RoundedSum Mixed(RoundedSum pure, double product) => new(((1 - white) * pure.Value.Real) + (white * product), (1 - white) * pure.Error);

    private static void AddProduct(IReadOnlyList<IReadOnlyList<LocalOperator>> effects, int party, int offset, double weight, double[] law)
    {
        if (party == effects.Count)
        {
            law[offset] += weight;
            return;
        }

        for (int k = 0; k < effects[party].Count; k++)
            AddProduct(effects, party + 1, (offset * effects[party].Count) + k, weight * Uniform(effects[party][k]), law);
    }

    private static double Uniform(LocalOperator a) => a.Trace.Real / a.Levels;

    /// <summary>The same operator objects in the same places.</summary>
    private sealed class Key(IReadOnlyList<LocalOperator> operators) : IEquatable<Key>
    {
        private readonly LocalOperator[] _operators = [.. operators];

        public bool Equals(Key? other) => other is not null && _operators.AsSpan().SequenceEqual(other._operators, ReferenceEqualityComparer.Instance as IEqualityComparer<LocalOperator>);

        public override bool Equals(object? obj) => Equals(obj as Key);

        public override int GetHashCode() => _operators.Aggregate(17, (hash, a) => (hash * 31) + System.Runtime.CompilerServices.RuntimeHelpers.GetHashCode(a));
    }
}
