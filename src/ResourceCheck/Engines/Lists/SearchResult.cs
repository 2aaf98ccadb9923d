namespace ResourceCheck.Engines.Lists;

/// <summary>How much to search.</summary>
/// <param name="ExhaustiveUpTo">All points are evaluated when there are at most this many.</param>
/// <param name="GridPoints">Most points of the grid.</param>
/// <param name="Climbs">Climbs from the grid's best points.</param>
/// <param name="RandomClimbs">Climbs from random points.</param>
/// <param name="Sweeps">Most sweeps of every number through its range.</param>
/// <param name="Hopeless">A sweep ends where the value falls below this part of the best one.</param>
/// <param name="Exchanges">Climbs from the best exchanges between two numbers, after each sweep.</param>
/// <param name="Corners">Corners of the plateau at the best point from which exchanges are tried.</param>
/// <param name="ExchangeSizes">Most sizes of an exchange tried.</param>
/// <param name="Seed">Fixes the random points.</param>
public sealed record SearchOptions(int ExhaustiveUpTo = 1000, int GridPoints = 1100, int Climbs = 6, int RandomClimbs = 4, int Sweeps = 6, double Hopeless = 0.02, int Exchanges = 8, int Corners = 8, int ExchangeSizes = 40, ulong Seed = 1)
{
    /// <summary>A shorter search, for a question beside the main one.</summary>
    public SearchOptions Milder() => this with { GridPoints = GridPoints / 4, Climbs = 3, RandomClimbs = 2, Sweeps = 1, Corners = 1 };
}

/// <summary>How far to climb from points that are thought to be good.</summary>
/// <param name="Climbs">Climbs from the best of the points.</param>
/// <param name="Step">First step of a climb; it is halved down to 1.</param>
/// <param name="Enough">A value that ends the search, because nobody asks how much larger it gets.</param>
public sealed record NearbyOptions(int Climbs = 3, int Step = 8, double Enough = double.PositiveInfinity);

/// <summary>State of a search.</summary>
/// <param name="Evaluations">Points evaluated so far.</param>
/// <param name="Best">Largest value so far.</param>
public sealed record SearchProgress(int Evaluations, double Best);

/// <summary>What a search found.</summary>
/// <param name="Choices">The best numbers.</param>
/// <param name="Value">Their value.</param>
/// <param name="Evaluations">Points evaluated.</param>
/// <param name="Exhaustive">Whether all points were evaluated, which proves the maximum.</param>
/// <param name="Check">How the search was checked, in words.</param>
public sealed record SearchResult(IReadOnlyList<int> Choices, double Value, int Evaluations, bool Exhaustive, string Check);
