using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>A classical value of a script at run time. Equality is equality of value; <see cref="NoneValue"/> equals only itself.</summary>
public abstract record Value
{
    /// <summary>No value.</summary>
    public static Value None { get; } = new NoneValue();

    /// <summary>Truth.</summary>
    public static Value True { get; } = new TruthValue(true);

    /// <summary>Falsehood.</summary>
    public static Value False { get; } = new TruthValue(false);

    /// <summary>A whole number; small ones are shared.</summary>
    public static Value Of(int number) => number is >= 0 and < 16 ? SmallNumbers[number] : new NumberValue(number);

    /// <summary>A truth value.</summary>
    public static Value Of(bool truth) => truth ? True : False;

    private static readonly Value[] SmallNumbers = [.. Enumerable.Range(0, 16).Select(n => new NumberValue(n))];
}

/// <summary><c>none</c>.</summary>
public sealed record NoneValue : Value
{
    /// <inheritdoc/>
    public override string ToString() => "none";
}

/// <summary>An exact number.</summary>
/// <param name="Number">The number.</param>
public sealed record NumberValue(Rational Number) : Value
{
    /// <inheritdoc/>
    public override string ToString() => Number.ToString();
}

/// <summary>A truth value.</summary>
/// <param name="Truth">The truth value.</param>
public sealed record TruthValue(bool Truth) : Value
{
    /// <inheritdoc/>
    public override string ToString() => Truth ? "true" : "false";
}

/// <summary>A party as a value.</summary>
/// <param name="Party">Index among the protocol's parties.</param>
/// <param name="Name">The party's name.</param>
public sealed record PartyValue(int Party, string Name) : Value
{
    /// <inheritdoc/>
    public override string ToString() => Name;
}

/// <summary>A measurement basis as a value.</summary>
/// <param name="Kind">Which kind.</param>
/// <param name="Argument">m of <c>fourier on m</c> (-1: all levels), j of <c>phased(j)</c>; -1 otherwise.</param>
/// <param name="File">File of <c>matrix</c>, as written in the script; null otherwise.</param>
public sealed record BasisValue(BasisKind Kind, int Argument, string? File) : Value
{
    /// <inheritdoc/>
    public override string ToString() => Kind switch
    {
        BasisKind.Level => "level",
        BasisKind.Fourier => Argument < 0 ? "fourier" : $"fourier on {Argument}",
        BasisKind.Phased => $"phased({Argument})",
        _ => $"matrix \"{File}\"",
    };
}
