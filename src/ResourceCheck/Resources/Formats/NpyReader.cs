using System.Buffers.Binary;
using System.Numerics;
using System.Text;
using ResourceCheck.Diagnostics;

namespace ResourceCheck.Resources.Formats;

/// <summary>
/// Reads arrays of numbers in the <c>.npy</c> format, versions 1 and 2: magic bytes, version, length of the header, header, numbers.
/// Nothing is taken on trust: type, shape and length of the file must agree before memory is taken, and no object is ever unpickled.
/// </summary>
internal static class NpyReader
{
    private static readonly byte[] Magic = [0x93, (byte)'N', (byte)'U', (byte)'M', (byte)'P', (byte)'Y'];

    /// <summary>A header describes at most two axes here; anything longer is no header of ours.</summary>
    private const int LongestHeader = 65536;

    private const int ChunkNumbers = 65536;

    /// <summary>Reads a state.</summary>
    public static Outcome<RawState> Read(string file, Stream stream)
    {
        if (ReadHeaderText(file, stream, out Diagnostic? wrong) is not { } text)
            return Outcome<RawState>.Failed([wrong!]);
        if (NpyHeader.TryParse(text) is not { } header)
            return Outcome<RawState>.Failed([StateMessages.NpyHeader(file)]);
        if (NpyType.From(header.Type) is not { } type)
            return Outcome<RawState>.Failed([StateMessages.NpyType(file, header.Type)]);
        Outcome<StateShape> shape = ArrayShape.From(file, header.Shape);
        if (shape.Value is not { } found)
            return Outcome<RawState>.Failed(shape.Findings);
        long present = stream.Length - stream.Position;
        return present == (long)found.Count * type.Size
            ? Outcome<RawState>.Of(new(found, ReadNumbers(stream, found, type, header.FortranOrder), type.IsSingle))
            : Outcome<RawState>.Failed([StateMessages.NpyLength(file, (long)found.Count * type.Size, present)]);
    }

    private static string? ReadHeaderText(string file, Stream stream, out Diagnostic? wrong)
    {
        byte[] head = new byte[12];
        wrong = StateMessages.NpyMagic(file);
        if (stream.ReadAtLeast(head.AsSpan(0, 8), 8, false) < 8 || !head.AsSpan(0, 6).SequenceEqual(Magic))
            return null;
        wrong = StateMessages.NpyVersion(file, head[6], head[7]);
        if (head[6] is not (1 or 2) || head[7] != 0)
            return null;
        wrong = StateMessages.NpyHeader(file);
        int lengthBytes = head[6] == 1 ? 2 : 4;
        if (stream.ReadAtLeast(head.AsSpan(8, lengthBytes), lengthBytes, false) < lengthBytes)
            return null;
        uint length = BinaryPrimitives.ReadUInt32LittleEndian(head.AsSpan(8));
        if (length > LongestHeader || length > stream.Length - stream.Position)
            return null;
        byte[] header = new byte[length];
        stream.ReadExactly(header);
        return Encoding.Latin1.GetString(header);
    }

    private static Complex[] ReadNumbers(Stream stream, StateShape shape, NpyType type, bool columnsFirst)
    {
        Complex[] numbers = new Complex[shape.Count];
        byte[] chunk = new byte[ChunkNumbers * type.Size];
        for (int next = 0; next < numbers.Length;)
        {
            int count = Math.Min(ChunkNumbers, numbers.Length - next);
            stream.ReadExactly(chunk.AsSpan(0, count * type.Size));
            for (int i = 0; i < count; i++)
                numbers[next++] = type.Read(chunk.AsSpan(i * type.Size));
        }

        if (columnsFirst && !shape.IsVector)
            Transpose(numbers, shape.Dimension);
        return numbers;
    }

    private static void Transpose(Complex[] numbers, int size)
    {
        for (int r = 0; r < size; r++)
        {
            for (int c = 0; c < r; c++)
                (numbers[r * size + c], numbers[c * size + r]) = (numbers[c * size + r], numbers[r * size + c]);
        }
    }
}
