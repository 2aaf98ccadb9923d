using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Engines.Dense;
using ResourceCheck.Engines.Product;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Resources;

namespace ResourceCheck.Judgement;

/// <summary>Chooses the cheapest exact engine that applies and fits in memory. Everything is estimated; nothing large is allocated.</summary>
internal static class EngineSelection
{
    public const string Dense = "dense";

    public const string Product = "product";

    /// <summary>Names that <c>--engine</c> takes.</summary>
    public static readonly string[] Names = [Dense, Product];

    /// <summary>Part of the machine's memory that an evaluation may take; the rest is for the system and the runtime.</summary>
    private const double UsableMemory = 0.8;

    /// <summary>Up to this many multiplications the dense engine answers at once, and nobody gains by another.</summary>
    private const double AtOnce = 5e8;

    /// <summary>The product engine must promise to be this much cheaper: both estimates are rough.</summary>
    private const double MuchCheaper = 10;

    /// <summary>The engine that would run; findings when none can.</summary>
    public static Outcome<EngineChoice> Of(Setting setting, RunRequest request)
    {
        if (request.Engine is { } name && !Names.Contains(name))
            return Outcome<EngineChoice>.Failed([JudgementMessages.UnknownEngine(name)]);
        if (setting.World.Storage is not null && setting.Protocol.Levels > RelaxedPrepared.MostParties)
            return Outcome<EngineChoice>.Failed([JudgementMessages.CollectiveTooLarge(setting.Protocol.Levels, RelaxedPrepared.MostParties)]);
        if (TooLong(setting.World) is { } tooLong)
            return Outcome<EngineChoice>.Failed([tooLong]);
        double limit = request.MemoryLimit ?? (GC.GetGCMemoryInfo().TotalAvailableMemoryBytes * UsableMemory);
        return request.Engine switch
        {
            Dense => Fitting(setting, DenseEngine.Estimate(setting.Plan, $"asked for; {Size(setting)} fit in memory as a density operator"), limit, request, null),
            Product => Applying(setting, limit, request),
            _ => Cheapest(setting, limit, request),
        };
    }

    private static Outcome<EngineChoice> Applying(Setting setting, double limit, RunRequest request)
    {
        if (ProductEngine.Refusal(setting.Plan, setting.Matrices) is { } refusal)
            return Outcome<EngineChoice>.Failed([JudgementMessages.DoesNotApply(Product, refusal)]);
        return Fitting(setting, ProductEngine.Estimate(setting.Plan, setting.Matrices, "asked for; all noise acts on each qudit by itself"), limit, request, null);
    }

    private static Outcome<EngineChoice> Cheapest(Setting setting, double limit, RunRequest request)
    {
        EngineChoice dense = DenseEngine.Estimate(setting.Plan, $"{Size(setting)} fit in memory as a density operator, so every outcome is followed exactly");
        bool fits = dense.MemoryBytes <= Math.Min(limit, DenseEngine.LargestMemory);
        if (fits && dense.Work <= AtOnce)
            return Outcome<EngineChoice>.Of(dense);
        if (ProductEngine.Refusal(setting.Plan, setting.Matrices) is { } refusal)
            return Fitting(setting, dense, limit, request, refusal);
        EngineChoice product = ProductEngine.Estimate(setting.Plan, setting.Matrices, ProductReason(setting, fits));
        return fits && (product.MemoryBytes > limit || product.Work * MuchCheaper > dense.Work) ? Outcome<EngineChoice>.Of(dense) : Fitting(setting, product, limit, request, null);
    }

    private static string ProductReason(Setting setting, bool denseFits) =>
        $"all noise acts on each qudit of the antisymmetric state by itself, so every figure is a sum over determinants, exact and {(denseFits ? "much cheaper than" : "possible without")} a density operator of {Size(setting)}";

    private static Outcome<EngineChoice> Fitting(Setting setting, EngineChoice choice, double limit, RunRequest request, string? others)
    {
        double most = choice.Name == Dense ? Math.Min(limit, DenseEngine.LargestMemory) : limit;
        return choice.MemoryBytes > most ? Outcome<EngineChoice>.Failed([JudgementMessages.DoesNotFit(choice, most, request.MemoryLimit is not null, setting.Plan.NeedsSink, others)]) : Outcome<EngineChoice>.Of(choice);
    }

    private static Diagnostic? TooLong(World world)
    {
        double storage = EvolutionCost.OfStorage(world), relaxed = EvolutionCost.OfPreparation(world);
        return Math.Max(storage, relaxed) <= EvolutionCost.Most ? null
            : storage >= relaxed ? JudgementMessages.TooLongToIntegrate("storage", storage) : JudgementMessages.TooLongToIntegrate("resource.relaxed", relaxed);
    }

    private static string Size(Setting setting) => $"{setting.Protocol.Holders.Count} qudits of {setting.Protocol.Levels} levels";
}
