using Xunit;
namespace ResourceCheck.Tests.Conditions;
public sealed class Regenerate
{
    [Fact] public void Now()
    {
        foreach (string f in Directory.GetFiles(ConditionsCase.Folder, "*.case"))
        {
            string t = File.ReadAllText(f); int i = t.IndexOf("--- findings\n", StringComparison.Ordinal);
            string found;
            try { found = ConditionsCase.Load(Path.GetFileName(f)).Findings(); } catch (Exception e) { found = "CRASH " + e; }
            File.WriteAllText(f, t[..i] + "--- findings\n" + found + "\n");
        }
    }
}
