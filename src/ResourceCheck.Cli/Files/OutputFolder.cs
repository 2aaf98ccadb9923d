using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;

namespace ResourceCheck.Cli.Files;

/// <summary>Folders for results of several files.</summary>
internal static class OutputFolder
{
    /// <summary>Makes a folder with folders in it; a finding when that is refused.</summary>
    public static Diagnostic? Make(string folder, IEnumerable<string> inside)
    {
        try
        {
            foreach (string name in inside)
                Directory.CreateDirectory(Path.Combine(folder, name));
            return null;
        }
        catch (Exception failure) when (failure is IOException or UnauthorizedAccessException or ArgumentException or NotSupportedException)
        {
            return Findings.NotWritten(folder, failure is UnauthorizedAccessException ? "access is denied" : failure.Message);
        }
    }

    /// <summary>Takes folders back that hold nothing.</summary>
    public static void RemoveEmpty(string folder, IEnumerable<string> inside)
    {
        foreach (string path in inside.Select(name => Path.Combine(folder, name)).Append(folder))
        {
            if (Directory.Exists(path) && !Directory.EnumerateFileSystemEntries(path).Any())
                Directory.Delete(path);
        }
    }
}
