using ResourceCheck.Numerics.Antisymmetric;

namespace ResourceCheck.Engines.Product;

/// <summary>Sums over outcomes of independently read-out qudits of the resource, or what they would cost.</summary>
internal interface IOutcomeWeights
{
    /// <summary>Probability of one operator per party.</summary>
    public RoundedSum Of(IReadOnlyList<LocalOperator> operators);

    /// <summary>Probability that outcomes differ while the others' are settled.</summary>
    public RoundedSum Distinct(IReadOnlyList<IReadOnlyList<LocalOperator>> effects, IReadOnlyList<LocalOperator> others);

    /// <summary>Law of how many outcomes lie in each of some sets; see <see cref="OutcomeCounts"/>.</summary>
    public RoundedSum[] Counts(IReadOnlyList<IReadOnlyList<(int Sets, LocalOperator Operator)>> parties, int sets);

    /// <summary>Law of all strings; see <see cref="JointLaw"/>.</summary>
    public double[] Joint(IReadOnlyList<IReadOnlyList<LocalOperator>> effects);
}
