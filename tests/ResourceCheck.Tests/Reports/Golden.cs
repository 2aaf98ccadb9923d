using Xunit;

namespace ResourceCheck.Tests.Reports;

/// <summary>Compares with files that were reviewed by eye; RESOURCECHECK_UPDATE_GOLDEN=1 rewrites them.</summary>
internal static class Golden
{
    public static string Root { get; } = FindRoot(AppContext.BaseDirectory);

    public static void Compare(string path, string actual)
    {
        string file = Path.Combine(Root, path);
        if (Environment.GetEnvironmentVariable("RESOURCECHECK_UPDATE_GOLDEN") == "1")
            File.WriteAllText(file, actual);
        Assert.True(File.Exists(file), $"{path} is missing; RESOURCECHECK_UPDATE_GOLDEN=1 writes it.");
        Assert.Equal(File.ReadAllText(file), actual);
    }

    /// <summary>Compares one entry of a file whose entries begin with <c>$ TITLE</c>.</summary>
    public static void CompareEntry(string path, string title, string actual)
    {
        string file = Path.Combine(Root, path);
        string head = $"\n$ {title}\n";
        string text = File.ReadAllText(file);
        int start = text.IndexOf(head, StringComparison.Ordinal) + head.Length;
        int end = text.IndexOf("\n$ ", start - 1, StringComparison.Ordinal) + 1;
        string entry = end > 0 ? text[start..end] : text[start..];
        if (Environment.GetEnvironmentVariable("RESOURCECHECK_UPDATE_GOLDEN") == "1")
            File.WriteAllText(file, text[..start] + actual + (end > 0 ? text[end..] : ""));
        else
            Assert.Equal(entry, actual);
    }

    private static string FindRoot(string folder) =>
        File.Exists(Path.Combine(folder, "ResourceCheck.sln")) ? folder : FindRoot(Path.GetDirectoryName(folder.TrimEnd(Path.DirectorySeparatorChar))!);
}
