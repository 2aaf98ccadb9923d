// Pure dephasing φ_ab of every pair of levels from coherence or dephasing times.
// The coherence (a,b) falls with exp(-(Γ_a+Γ_b)t/2 - φ_ab t), Γ_a the total rate out of level a. exp(-φ_ab t) is a positive
// semidefinite matrix for every t ≥ 0 exactly when φ is conditionally negative definite:
// I. J. Schoenberg, Trans. Am. Math. Soc. 44, 522 (1938).
using MathNet.Numerics.LinearAlgebra;
using ResourceCheck.Conditions.Checks;

namespace ResourceCheck.Conditions.Resolving;

/// <summary>Turns <c>coherence</c> and <c>dephasingTime</c> into pure dephasing rates, and refuses what no channel can do.</summary>
internal sealed class Coherences(LevelOrder order, Findings findings)
{
    /// <summary>Rounding allowed, relative to the largest rate: T2 = 2 T1 and matrices on the edge must pass.</summary>
    private const double RoundOff = 1e-9;

    /// <summary>φ in physical levels.</summary>
    public double[,] Dephasing(GroupSetting section, double[,] jumps, double[] leakage)
    {
        double[] outflow = [.. Enumerable.Range(0, order.Levels).Select(a => leakage[a] + Enumerable.Range(0, order.Levels).Sum(b => jumps[a, b]))];
        double[,] phi = new double[order.Levels, order.Levels];
        if (section.Find("coherence") is NumberSetting common)
            AddExcited(common, outflow, phi);
        foreach ((int a, int b, NumberSetting time) in PairsOf(section.Find("coherence")))
            Set(phi, a, b, Remaining(time, (outflow[a] + outflow[b]) / 2, $"levels {a} and {b}"));
        if (section.Find("dephasingTime") is NumberSetting all)
            AddAll(all, phi);
        foreach ((int a, int b, NumberSetting time) in PairsOf(section.Find("dephasingTime")))
            Set(phi, a, b, 1 / time.Value);
        CheckPositive(section, phi);
        return phi;
    }

    /// <summary>φ_0b = 1/T2 - Γ_0/2: what level b loses itself comes on top, so that all pairs with level 0 share one φ, as positivity demands.</summary>
    private void AddExcited(NumberSetting time, double[] outflow, double[,] phi)
    {
        if (order.Levels == 0)
            return;
        double rate = Remaining(time, outflow[0] / 2, "level 0 and the others");
        for (int b = 1; b < order.Levels; b++)
            Set(phi, 0, b, rate);
    }

    private void AddAll(NumberSetting time, double[,] phi)
    {
        for (int a = 0; a < order.Levels; a++)
        {
            for (int b = 0; b < a; b++)
                Set(phi, a, b, 1 / time.Value);
        }
    }

    private IEnumerable<(int A, int B, NumberSetting Time)> PairsOf(Setting? map)
    {
        foreach (Entry entry in (map as GroupSetting)?.Entries ?? [])
        {
            (int a, int b) = MapKeys.Pair(entry.Name, 0)!.Value;
            if (order.Check(b, entry.NameSpot, entry.Value.Path) is not null)
                yield return (a, b, (NumberSetting)entry.Value);
        }
    }

    private double Remaining(NumberSetting time, double byDecay, string pair)
    {
        double rate = (1 / time.Value) - byDecay;
        if (rate < -RoundOff / time.Value)
            findings.Add(ConditionsMessages.CoherenceTooLong(time.Spot, time.Path, time.Value, 1 / byDecay, pair));
        return Math.Max(0, rate);
    }

    private void CheckPositive(GroupSetting section, double[,] phi)
    {
        // one rate for all pairs, or for all pairs with level 0 and none else, is always realisable
        bool hasPairs = section.Find("coherence") is GroupSetting || section.Find("dephasingTime") is GroupSetting;
        if (!hasPairs || order.Levels < 2)
            return;
        Matrix<double> centre = Matrix<double>.Build.Dense(order.Levels, order.Levels, (a, b) => (a == b ? 1.0 : 0.0) - (1.0 / order.Levels));
        Matrix<double> form = -centre * Matrix<double>.Build.DenseOfArray(phi) * centre;
        double largest = phi.Cast<double>().Max();
        double lowest = largest == 0 || !double.IsFinite(largest) ? 0 : (form / largest).Evd(Symmetricity.Symmetric).EigenValues.Min(e => e.Real);
        if (lowest >= -RoundOff)
            return;
        Entry given = section.Find("dephasingTime") is GroupSetting ? section.EntryOf("dephasingTime")! : section.EntryOf("coherence")!;
        findings.Add(ConditionsMessages.NotRealisable(given.NameSpot, given.Value.Path));
    }

    private static void Set(double[,] phi, int a, int b, double rate) => phi[a, b] = phi[b, a] = rate;
}
