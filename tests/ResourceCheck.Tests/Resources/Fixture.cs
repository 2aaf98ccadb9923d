namespace ResourceCheck.Tests.Resources;

/// <summary>Committed fixtures, and files that live as long as a test.</summary>
internal static class Fixture
{
    /// <summary>Path of a fixture, found from the solution file above the test's output folder.</summary>
    public static string PathOf(string name)
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "ResourceCheck.sln")))
            folder = folder.Parent;
        return Path.Combine(folder!.FullName, "tests", "ResourceCheck.Tests", "Resources", "Fixtures", name);
    }

    /// <summary>Calls a function with the path of a new file, which is deleted afterwards.</summary>
    public static T With<T>(string ending, byte[] content, Func<string, T> use)
    {
        string path = Path.Combine(Path.GetTempPath(), $"{Guid.NewGuid():N}{ending}");
        File.WriteAllBytes(path, content);
        try
        {
            return use(path);
        }
        finally
        {
            File.Delete(path);
        }
    }

    /// <summary>The same with a text.</summary>
    public static T With<T>(string ending, string content, Func<string, T> use) => With(ending, System.Text.Encoding.UTF8.GetBytes(content), use);
}
