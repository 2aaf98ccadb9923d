using System.Numerics;

namespace ResourceCheck.Engines.Lists;

/// <summary>What a cheat does with certain numbers when its list holds enough positions for them.</summary>
/// <param name="Point">The numbers, as the search counts them.</param>
/// <param name="Harm">Harm; what was left out of it counts as harmless.</param>
/// <param name="Needs">
/// Positions that it takes of each set of types. Null when anything counts positions that were taken to be enough: the harm then depends
/// on how many there are.
/// </param>
internal sealed record Attack(int[] Point, double Harm, IReadOnlyDictionary<BigInteger, int>? Needs);
