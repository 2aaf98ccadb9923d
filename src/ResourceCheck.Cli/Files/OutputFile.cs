using System.Text;
using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;

namespace ResourceCheck.Cli.Files;

/// <summary>Writes files whole or not at all: beside the target first, then renamed into its place.</summary>
internal static class OutputFile
{
    private static readonly UTF8Encoding Utf8 = new(encoderShouldEmitUTF8Identifier: false);

    /// <summary>What would prevent writing, told before anything is computed; null when nothing is in sight.</summary>
    public static Diagnostic? Check(string name)
    {
        if (name.Length == 0)
            return Findings.NotWritten(name, "the name is empty");
        if (Directory.Exists(name))
            return Findings.IsFolder(name);
        string folder = FolderOf(name);
        return Directory.Exists(folder) ? null : Findings.NoFolder(name, folder);
    }

    /// <summary>Writes files; null when all are written. All are prepared before the first is put in place, and a new one is taken back when a later one fails.</summary>
    public static Diagnostic? Write(IReadOnlyList<(string Name, string Text)> files)
    {
        List<(string Temporary, string Target)> prepared = [];
        List<string> made = [];
        string current = "";
        try
        {
            foreach ((string name, string text) in files)
            {
                current = name;
                if (IsDevice(name))
                    File.WriteAllText(name, text, Utf8);
                else
                    prepared.Add(Prepare(name, text));
            }

            foreach ((string temporary, string target) in prepared)
            {
                bool isNew = !File.Exists(target);
                File.Move(temporary, target, overwrite: true);
                if (isNew)
                    made.Add(target);
            }

            return null;
        }
        catch (Exception failure) when (failure is IOException or UnauthorizedAccessException or ArgumentException or NotSupportedException)
        {
            made.ForEach(Discard);
            return Findings.NotWritten(current, failure is UnauthorizedAccessException ? "access is denied" : failure.Message);
        }
        finally
        {
            foreach ((string temporary, _) in prepared)
                Discard(temporary);
        }
    }

    private static (string Temporary, string Target) Prepare(string name, string text)
    {
        // A link keeps pointing where it did; the file behind it is replaced.
        FileInfo named = new(name);
        string target = (named.LinkTarget is null ? null : named.ResolveLinkTarget(returnFinalTarget: true)?.FullName) ?? named.FullName;
        string temporary = Path.Combine(Path.GetDirectoryName(target)!, $".{Path.GetFileName(target)}.{Guid.NewGuid():N}.part");
        try
        {
            File.WriteAllText(temporary, text, Utf8);
            if (!OperatingSystem.IsWindows() && File.Exists(target))
                File.SetUnixFileMode(temporary, File.GetUnixFileMode(target));
        }
        catch
        {
            Discard(temporary);
            throw;
        }

        return (temporary, target);
    }

    private static void Discard(string temporary)
    {
        try
        {
            File.Delete(temporary);
        }
        catch (Exception failure) when (failure is IOException or UnauthorizedAccessException)
        {
            // The first failure is the one worth telling.
        }
    }

    // Renaming onto a device would replace it by a file.
    private static bool IsDevice(string name) =>
        Path.GetFullPath(name) is { } path && (path.StartsWith("/dev/", StringComparison.Ordinal) || path.StartsWith("/proc/", StringComparison.Ordinal));

    private static string FolderOf(string name) => Path.GetDirectoryName(name) is { Length: > 0 } folder ? folder : ".";
}
