using System.Globalization;
using System.Numerics;

namespace ResourceCheck.Quantities;

/// <summary>
/// An exact fraction of whole numbers, always in lowest terms with a positive denominator. The default value is 0.
/// Numbers in scripts are of this type, so that a count compared with a threshold is compared exactly.
/// </summary>
public readonly struct Rational : IEquatable<Rational>, IComparable<Rational>
{
    private readonly BigInteger _numerator;
    private readonly BigInteger _denominatorLessOne;

    private Rational(BigInteger numerator, BigInteger denominator)
    {
        _numerator = numerator;
        _denominatorLessOne = denominator - BigInteger.One;
    }

    /// <summary>Zero.</summary>
    public static Rational Zero => default;

    /// <summary>One.</summary>
    public static Rational One => new(BigInteger.One, BigInteger.One);

    /// <summary>Numerator; carries the sign.</summary>
    public BigInteger Numerator => _numerator;

    /// <summary>Denominator, at least 1.</summary>
    public BigInteger Denominator => _denominatorLessOne + BigInteger.One;

    /// <summary>Whether the value is a whole number.</summary>
    public bool IsWhole => _denominatorLessOne.IsZero;

    /// <summary>-1, 0 or 1.</summary>
    public int Sign => _numerator.Sign;

    /// <summary>A whole number.</summary>
    public static Rational From(BigInteger value) => new(value, BigInteger.One);

    /// <summary>A whole number.</summary>
    public static implicit operator Rational(int value) => From(value);

    /// <summary>A fraction, reduced. Throws <see cref="DivideByZeroException"/> for a zero denominator.</summary>
    public static Rational From(BigInteger numerator, BigInteger denominator)
    {
        if (denominator.IsZero)
            throw new DivideByZeroException();
        BigInteger divisor = BigInteger.GreatestCommonDivisor(numerator, denominator) * denominator.Sign;
        return new Rational(numerator / divisor, denominator / divisor);
    }

    /// <summary>Reads digits with an optional point and exponent, such as <c>0.25</c> or <c>1e-5</c>; exponents beyond ±400 are refused.</summary>
    public static bool TryParse(string text, out Rational value)
    {
        value = default;
        int e = text.IndexOfAny(['e', 'E']);
        string mantissa = e < 0 ? text : text[..e];
        int exponent = 0;
        if (e >= 0 && (!int.TryParse(text[(e + 1)..], NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out exponent) || Math.Abs(exponent) > 400))
            return false;
        int point = mantissa.IndexOf('.', StringComparison.Ordinal);
        string digits = point < 0 ? mantissa : mantissa.Remove(point, 1);
        if (digits.Length == 0 || !BigInteger.TryParse(digits, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out BigInteger whole))
            return false;
        int scale = exponent - (point < 0 ? 0 : mantissa.Length - point - 1);
        value = scale >= 0 ? From(whole * BigInteger.Pow(10, scale)) : From(whole, BigInteger.Pow(10, -scale));
        return true;
    }

    /// <summary>Nearest floating-point number.</summary>
    public double ToDouble()
    {
        if (IsWhole)
            return (double)_numerator;
        double n = (double)_numerator, d = (double)Denominator;
        return double.IsFinite(n) && double.IsFinite(d) ? n / d : Math.Exp(BigInteger.Log(BigInteger.Abs(_numerator)) - BigInteger.Log(Denominator)) * Sign;
    }

    /// <summary>Largest whole number not above the value.</summary>
    public BigInteger Floor()
    {
        BigInteger quotient = BigInteger.DivRem(_numerator, Denominator, out BigInteger rest);
        return rest.Sign < 0 ? quotient - 1 : quotient;
    }

    /// <summary>Smallest whole number not below the value.</summary>
    public BigInteger Ceiling() => -(-this).Floor();

    /// <summary>Sum.</summary>
    public static Rational operator +(Rational a, Rational b) =>
        a.IsWhole && b.IsWhole ? From(a._numerator + b._numerator) : From((a._numerator * b.Denominator) + (b._numerator * a.Denominator), a.Denominator * b.Denominator);

    /// <summary>Difference.</summary>
    public static Rational operator -(Rational a, Rational b) => a + (-b);

    /// <summary>Negation.</summary>
    public static Rational operator -(Rational a) => new(-a._numerator, a.Denominator);

    /// <summary>Product.</summary>
    public static Rational operator *(Rational a, Rational b) => From(a._numerator * b._numerator, a.Denominator * b.Denominator);

    /// <summary>Quotient. Throws <see cref="DivideByZeroException"/> when <paramref name="b"/> is zero.</summary>
    public static Rational operator /(Rational a, Rational b) => From(a._numerator * b.Denominator, a.Denominator * b._numerator);

    /// <summary>Remainder with the sign of the divisor. Throws <see cref="DivideByZeroException"/> when <paramref name="b"/> is zero.</summary>
    public static Rational operator %(Rational a, Rational b) => a - (b * From((a / b).Floor()));

    /// <summary>Equality of value.</summary>
    public static bool operator ==(Rational a, Rational b) => a.Equals(b);

    /// <summary>Inequality of value.</summary>
    public static bool operator !=(Rational a, Rational b) => !a.Equals(b);

    /// <summary>Less than.</summary>
    public static bool operator <(Rational a, Rational b) => a.CompareTo(b) < 0;

    /// <summary>Greater than.</summary>
    public static bool operator >(Rational a, Rational b) => a.CompareTo(b) > 0;

    /// <summary>Less than or equal.</summary>
    public static bool operator <=(Rational a, Rational b) => a.CompareTo(b) <= 0;

    /// <summary>Greater than or equal.</summary>
    public static bool operator >=(Rational a, Rational b) => a.CompareTo(b) >= 0;

    /// <inheritdoc/>
    public int CompareTo(Rational other) =>
        IsWhole && other.IsWhole ? _numerator.CompareTo(other._numerator) : (_numerator * other.Denominator).CompareTo(other._numerator * Denominator);

    /// <inheritdoc/>
    public bool Equals(Rational other) => _numerator == other._numerator && _denominatorLessOne == other._denominatorLessOne;

    /// <inheritdoc/>
    public override bool Equals(object? obj) => obj is Rational other && Equals(other);

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(_numerator, _denominatorLessOne);

    /// <summary>The value as <c>7</c> or <c>1/3</c>.</summary>
    public override string ToString() => IsWhole ? _numerator.ToString(CultureInfo.InvariantCulture) : $"{_numerator}/{Denominator}";
}
