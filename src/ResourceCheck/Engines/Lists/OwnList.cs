using System.Numerics;
using ResourceCheck.Numerics.Counting;

namespace ResourceCheck.Engines.Lists;

/// <summary>
/// How many positions of each kind a cheat's own list holds. Given these numbers the types of the positions it shows are independent of them,
/// so that a cheat that looks at its list first may take the best of the attacks that the list can afford.
/// </summary>
internal sealed class OwnList
{
    /// <summary>More kinds than this are too many lists to go through.</summary>
    private const int MostKinds = 3;

    /// <summary>Lists less probable than this are left out; they count as harmless.</summary>
    private const double Negligible = 1e-13;

    private readonly BigInteger[] _kinds;
    private readonly List<(int[] Counts, double Probability)> _lists = [];

    private OwnList(ListContext context, int copies, BigInteger[] kinds)
    {
        _kinds = kinds;
        Add(context, new int[kinds.Length], 0, copies, context.Weight(context.All), 1);
        _lists.Sort((a, b) => b.Probability.CompareTo(a.Probability));
    }

    /// <summary>The law of a list; null where kinds overlap or are too many.</summary>
    /// <param name="context">The task.</param>
    /// <param name="copies">Length of the list.</param>
    /// <param name="kinds">Sets of types that attacks take positions of.</param>
    public static OwnList? Of(ListContext context, int copies, IEnumerable<BigInteger> kinds)
    {
        BigInteger[] different = [.. kinds.Distinct().Order()];
        bool overlap = different.Where((a, i) => different.Take(i).Any(b => !(a & b).IsZero)).Any();
        return overlap || different.Length > MostKinds ? null : new OwnList(context, copies, different);
    }

    /// <summary>Probability that a list holds enough for an attack.</summary>
    public double Affords(Attack attack)
    {
        if (Needs(attack) is not { } needs)
            return 0;
        double sum = 0;
        foreach ((int[] counts, double probability) in _lists)
            sum += Covers(counts, needs) ? probability : 0;
        return sum;
    }

    /// <summary>Harm of a cheat that takes, for each list, the best of the attacks that it can afford, and does nothing where there is none.</summary>
    public double Average(IEnumerable<Attack> attacks)
    {
        List<(int[] Needs, double Harm)> front = Front(attacks);
        CompensatedSum sum = default;
        foreach ((int[] counts, double probability) in Enumerable.Reverse(_lists))
            sum.Add(probability * front.Find(a => Covers(counts, a.Needs)).Harm);
        return sum.Value;
    }

    /// <summary>The most harmful first, without those that need as much as a more harmful one.</summary>
    private List<(int[] Needs, double Harm)> Front(IEnumerable<Attack> attacks)
    {
        List<(int[] Needs, double Harm)> front = [];
        foreach (Attack attack in attacks.Where(a => a.Harm > 0).OrderByDescending(a => a.Harm))
        {
            if (Needs(attack) is { } needs && !front.Exists(a => Covers(needs, a.Needs)))
                front.Add((needs, attack.Harm));
        }

        return front;
    }

    private int[]? Needs(Attack attack) => attack.Needs is { } needs && needs.Keys.All(_kinds.Contains) ? [.. _kinds.Select(k => needs.GetValueOrDefault(k))] : null;

    private static bool Covers(int[] counts, int[] needs)
    {
        for (int i = 0; i < needs.Length; i++)
        {
            if (counts[i] < needs[i])
                return false;
        }

        return true;
    }

    private void Add(ListContext context, int[] counts, int kind, int left, double weightLeft, double probability)
    {
        if (kind == _kinds.Length)
        {
            _lists.Add(([.. counts], probability));
            return;
        }

        double weight = context.Weight(_kinds[kind]), rest = Math.Max(0, weightLeft - weight);
        BinomialRow row = Row(left, weight, rest);
        for (int i = 0; i < row.Probabilities.Length; i++)
        {
            double next = probability * row.Probabilities[i];
            if (next < Negligible)
                continue;
            counts[kind] = row.First + i;
            Add(context, counts, kind + 1, left - counts[kind], rest, next);
        }
    }

    private static BinomialRow Row(int trials, double weight, double rest) =>
        weight + rest > 0 ? BinomialRow.Of(trials, weight / (weight + rest), rest / (weight + rest)) : new BinomialRow(0, [1]);
}
