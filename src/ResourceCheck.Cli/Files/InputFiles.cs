using System.Security.Cryptography;
using System.Text;
using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;

namespace ResourceCheck.Cli.Files;

/// <summary>Reads input files; whatever is wrong with one is a finding.</summary>
internal sealed class InputFiles(ToolHost host)
{
    /// <summary>The name that stands for standard input.</summary>
    public const string StandardInput = "-";

    /// <summary>A script of this size has some hundred thousand lines: a longer file is a wrong one.</summary>
    private const int MostBytes = 16_000_000;

    private static readonly UTF8Encoding Strict = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    /// <summary>Reads a text file; null when it could not be, with the reason added to the findings.</summary>
    public InputText? Read(string name, List<Diagnostic> findings)
    {
        string shown = name == StandardInput ? "standard input" : name;
        if (ReadBytes(name, shown, findings) is not { } bytes)
            return null;
        int mark = bytes.AsSpan().StartsWith(Encoding.UTF8.Preamble) ? Encoding.UTF8.Preamble.Length : 0;
        try
        {
            return new InputText(shown, Strict.GetString(bytes, mark, bytes.Length - mark), Convert.ToHexStringLower(SHA256.HashData(bytes)));
        }
        catch (DecoderFallbackException failure)
        {
            int offset = mark + failure.Index;
            findings.Add(Findings.NotUtf8(shown, 1 + bytes.AsSpan(0, Math.Clamp(offset, 0, bytes.Length)).Count((byte)'\n'), offset));
            return null;
        }
    }

    private byte[]? ReadBytes(string name, string shown, List<Diagnostic> findings)
    {
        try
        {
            using Stream stream = name == StandardInput ? host.OpenInput() : File.OpenRead(name);
            if (ReadUpTo(stream, MostBytes + 1) is { Length: <= MostBytes } bytes)
                return bytes;
            findings.Add(Findings.TooLarge(shown, MostBytes));
        }
        catch (Exception failure) when (failure is IOException or UnauthorizedAccessException or ArgumentException or NotSupportedException)
        {
            findings.Add(Explain(name, failure));
        }

        return null;
    }

    // The length that a file claims is not asked for: pipes have none, and some files lie.
    private static byte[] ReadUpTo(Stream stream, int most)
    {
        using MemoryStream read = new();
        byte[] buffer = new byte[81920];
        int count;
        while (read.Length < most && (count = stream.Read(buffer, 0, (int)Math.Min(buffer.Length, most - read.Length))) > 0)
            read.Write(buffer, 0, count);
        return read.ToArray();
    }

    private static Diagnostic Explain(string name, Exception failure) => failure switch
    {
        _ when Directory.Exists(name) => Findings.IsFolder(name),
        FileNotFoundException or DirectoryNotFoundException => Findings.NoSuchFile(name, NearName(name)),
        ArgumentException => Findings.NoSuchFile(name, null),
        _ => Findings.Unreadable(name, failure is UnauthorizedAccessException ? "access is denied" : failure.Message),
    };

    private static string? NearName(string name)
    {
        try
        {
            string folder = Path.GetDirectoryName(name) ?? "";
            string searched = folder.Length == 0 ? "." : folder;
            IEnumerable<string> names = Directory.Exists(searched) ? Directory.EnumerateFiles(searched).Select(f => Path.GetFileName(f)!) : [];
            return NearWords.Find(Path.GetFileName(name), names) is { } near ? Path.Combine(folder, near) : null;
        }
        catch (Exception failure) when (failure is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }
}
