using System.Numerics;

namespace ResourceCheck.Engines.Lists;

/// <summary>
/// Positions that are alike: given their number, each is independently distributed as a single copy conditional on
/// <paramref name="Types"/>. Sets of types are bit masks.
/// </summary>
/// <param name="Types">Which types its positions may have.</param>
/// <param name="IsPool">Whether a draw that always finds enough may take from here without making it smaller.</param>
/// <param name="Drained">Types that such draws have taken from; their number is not defined any more.</param>
internal sealed record Cell(BigInteger Types, bool IsPool, BigInteger Drained);
