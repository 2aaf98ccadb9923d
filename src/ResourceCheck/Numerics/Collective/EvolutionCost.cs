using ResourceCheck.Conditions;

namespace ResourceCheck.Numerics.Collective;

/// <summary>What an evolution would cost, from the couplings alone; nothing is allocated. Shifts grow as the inverse cube of the spacing, and steps with them.</summary>
internal static class EvolutionCost
{
    /// <summary>Beyond this many multiplications an evolution takes hours on one core.</summary>
    public const double Most = 1e13;

    /// <summary>Products for unit h‖B‖ at the default tolerance: 30 for a step of 6.</summary>
    private const double ProductsPerUnit = 5;

    /// <summary>A product of few amplitudes takes as long as this many multiplications, for calls and loops.</summary>
    private const double Fewest = 1000;

    /// <summary>Real multiplications of a complex one.</summary>
    private const double Real = 4;

    /// <summary>Multiplications of |S_N⟩ without a photon over a time, s.</summary>
    public static double WithoutPhoton(CollectiveModel model, double time)
    {
        Couplings couplings = CollectiveDecay.CouplingsOf(model);
        return Products(couplings, time) * Math.Max(Fewest, WordBlock.Multinomial(LevelGroups.Of(couplings).Counts) * couplings.Emitters * Real);
    }

    /// <summary>Multiplications that storage under a protocol takes; 0 without it.</summary>
    public static double OfStorage(World world) => world.Storage is { } stored ? OfOperator(stored, anyStart: world.Resource != ResourceModel.Ideal) : 0;

    /// <summary>Multiplications that preparation by relaxation takes; 0 without it.</summary>
    public static double OfPreparation(World world) => world.Resource.Preparation is RelaxedPreparation { Decay: var decay } ? OfOperator(decay, anyStart: true) : 0;

    /// <summary>Multiplications of the density operator over the model's time.</summary>
    /// <param name="model">The emitters.</param>
    /// <param name="anyStart">False for |S_N⟩, which occupies two kinds of blocks; true for a start with entries everywhere on the diagonal.</param>
    private static double OfOperator(CollectiveModel model, bool anyStart)
    {
        Couplings couplings = CollectiveDecay.CouplingsOf(model);
        int n = couplings.Emitters;
        double permutations = States.AntisymmetricState.Factorial(n);
        double entries = anyStart ? Math.Pow(n, 2 * n) / n : permutations * permutations * (1 + ((n - 1) / 4.0));
        double excitations = anyStart ? n / 2.0 : 1;
        return 2 * excitations * Products(couplings, model.Time.Seconds) * Math.Max(Fewest, entries * 2 * n * Real);
    }

    /// <summary>One excited emitter swaps with every other one, by whichever transition couples them most.</summary>
    private static double Products(Couplings couplings, double time)
    {
        double largest = 0;
        for (int i = 0; i < couplings.Emitters; i++)
        {
            double row = couplings.TotalRate / 2;
            for (int k = 0; k < couplings.Emitters; k++)
                row += i == k ? 0 : Enumerable.Range(0, couplings.Levels - 1).Max(j => Math.Abs(couplings.Shift[j][i, k]) + (Math.Abs(couplings.Decay[j][i, k]) / 2));
            largest = Math.Max(largest, row);
        }

        return 1 + (ProductsPerUnit * largest * time);
    }
}
