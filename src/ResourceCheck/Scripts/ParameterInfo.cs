using ResourceCheck.Quantities;

namespace ResourceCheck.Scripts;

/// <summary>A declared parameter.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Default">Value when none is given.</param>
/// <param name="Values">All values of a listed or whole-number domain; null for a real range.</param>
/// <param name="From">Lower end.</param>
/// <param name="To">Upper end.</param>
public sealed record ParameterInfo(string Name, Rational Default, IReadOnlyList<Rational>? Values, Rational From, Rational To)
{
    /// <summary>Whether a value belongs to the domain.</summary>
    public bool Allows(Rational value) => Values?.Contains(value) ?? (value >= From && value <= To);
}
