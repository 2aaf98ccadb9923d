using System.Buffers.Binary;
using System.Numerics;

namespace ResourceCheck.Resources.Formats;

/// <summary>A type of number in <c>.npy</c> files: real or complex, single or double precision, either byte order.</summary>
/// <param name="IsComplex">Whether a real and an imaginary part follow each other.</param>
/// <param name="IsSingle">Whether parts have four bytes rather than eight.</param>
/// <param name="IsBigEndian">Whether the most significant byte comes first.</param>
internal sealed record NpyType(bool IsComplex, bool IsSingle, bool IsBigEndian)
{
    /// <summary>Bytes of one number.</summary>
    public int Size => (IsSingle ? 4 : 8) * (IsComplex ? 2 : 1);

    /// <summary>The type that a header names, such as <c>&lt;c16</c>; null for any other.</summary>
    public static NpyType? From(string name) => name is ['<' or '>', 'f' or 'c', ..] && Parts(name[1..]) is { } parts
        ? new(name[1] == 'c', parts == 4, name[0] == '>')
        : null;

    /// <summary>The number at the head of some bytes.</summary>
    public Complex Read(ReadOnlySpan<byte> bytes) =>
        IsComplex ? new(Part(bytes), Part(bytes[(Size / 2)..])) : new(Part(bytes), 0);

    private static int? Parts(string name) => name switch
    {
        "f4" or "c8" => 4,
        "f8" or "c16" => 8,
        _ => null,
    };

    private double Part(ReadOnlySpan<byte> bytes) => (IsSingle, IsBigEndian) switch
    {
        (true, true) => BinaryPrimitives.ReadSingleBigEndian(bytes),
        (true, false) => BinaryPrimitives.ReadSingleLittleEndian(bytes),
        (false, true) => BinaryPrimitives.ReadDoubleBigEndian(bytes),
        _ => BinaryPrimitives.ReadDoubleLittleEndian(bytes),
    };
}
