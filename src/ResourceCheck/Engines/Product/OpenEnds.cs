using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Product;

/// <summary>Lists all strings of a branch's open outcomes with what they make of the branch's values.</summary>
internal static class OpenEnds
{
    /// <summary>Strings less probable than this beside the likeliest are round-off of impossible ones: sums of minors are exact to about that.</summary>
    private const double Negligible = 1e-14;

    /// <summary>Values of kept copies and their probabilities, the branch's factor included.</summary>
    public static IEnumerable<(Value[] Slots, double Weight)> Of(ProductBranch branch, OpenLaw law, int levels)
    {
        double[] weights = law.Joint();
        IReadOnlyList<(int Slot, int Outcomes)> digits = law.Digits;
        double least = Negligible * weights.Max();
        for (int i = 0; i < weights.Length; i++)
        {
            if (weights[i] <= least)
                continue;
            Value[] slots = Filled(branch, law, digits, i, levels);
            if (branch.Conditions.All(c => ValueEvaluator.Holds(c, slots, levels)))
                yield return (slots, branch.Factor * weights[i]);
        }
    }

    private static Value[] Filled(ProductBranch branch, OpenLaw law, IReadOnlyList<(int Slot, int Outcomes)> digits, int index, int levels)
    {
        Value[] slots = [.. branch.Slots];
        for (int site = digits.Count - 1; site >= 0; site--)
        {
            (int slot, int outcomes) = digits[site];
            if (slot >= 0)
                slots[slot] = law.Value(index % outcomes);
            index /= outcomes;
        }

        for (int slot = 0; slot < slots.Length; slot++)
        {
            if (branch.Symbols[slot] is { } symbol and not BoundSlot)
                slots[slot] = ValueEvaluator.Evaluate(symbol, slots, levels);
        }

        return slots;
    }
}
