namespace ResourceCheck.Quantities;

/// <summary>A unit: the base unit of its dimension times 10^<paramref name="PowerOfTen"/> times <paramref name="Factor"/>.</summary>
/// <param name="Symbol">As written behind a number.</param>
/// <param name="Dimension">What it measures.</param>
/// <param name="PowerOfTen">Decimal scale, kept apart so that it can be folded into the exponent before rounding.</param>
/// <param name="Factor">What is left when the scale is no power of ten.</param>
internal sealed record Unit(string Symbol, Dimension Dimension, int PowerOfTen, double Factor = 1);
