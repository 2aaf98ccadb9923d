using System.Security.Cryptography;
using System.Text;
using ResourceCheck.Diagnostics;
using ResourceCheck.Resources.Formats;

namespace ResourceCheck.Resources;

/// <summary>Opens a state file and hands it to the reader of its format, which the ending of its name tells.</summary>
internal static class StateReader
{
    /// <summary>Text files are larger than their numbers; beyond this the binary format is the better one.</summary>
    private const long LargestText = 512L << 20;

    /// <summary>The numbers of a file, all finite.</summary>
    public static Outcome<RawState> Read(string file)
    {
        try
        {
            using FileStream stream = File.OpenRead(file);
            return Finite(file, ReadFormat(file, stream));
        }
        catch (Exception slip) when (slip is IOException or UnauthorizedAccessException or ArgumentException or NotSupportedException)
        {
            return Outcome<RawState>.Failed([StateMessages.Unreadable(file, slip)]);
        }
    }

    /// <summary>SHA-256 of the file's bytes in lower-case hexadecimal digits.</summary>
    public static string Hash(string file)
    {
        using FileStream stream = File.OpenRead(file);
        return Convert.ToHexStringLower(SHA256.HashData(stream));
    }

    private static Outcome<RawState> ReadFormat(string file, FileStream stream)
    {
        string kind = Path.GetExtension(file).ToLowerInvariant();
        if (kind is ".mtx" or ".json" && stream.Length > LargestText)
            return Outcome<RawState>.Failed([StateMessages.TextTooLarge(file, stream.Length, LargestText)]);
        switch (kind)
        {
            case ".npy":
                return NpyReader.Read(file, stream);
            case ".mtx":
                using (StreamReader reader = new(stream, Encoding.UTF8))
                    return MatrixMarketReader.Read(file, reader);
            case ".json":
                byte[] bytes = new byte[stream.Length];
                stream.ReadExactly(bytes);
                return JsonStateReader.Read(file, bytes);
            default:
                return Outcome<RawState>.Failed([StateMessages.UnknownKind(file)]);
        }
    }

    /// <summary>Checked before anything is computed: decompositions fail on NaN.</summary>
    private static Outcome<RawState> Finite(string file, Outcome<RawState> read)
    {
        if (read.Value is not { } state)
            return read;
        int count = state.Numbers.Count(number => !double.IsFinite(number.Real) || !double.IsFinite(number.Imaginary));
        int first = Array.FindIndex(state.Numbers, number => !double.IsFinite(number.Real) || !double.IsFinite(number.Imaginary));
        return count == 0 ? read : Outcome<RawState>.Failed([StateMessages.NotFinite(file, state, first, count)]);
    }
}
