using System.Runtime.CompilerServices;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Scripts;
using Xunit;

namespace ResourceCheck.Tests.ProtocolLibrary;

/// <summary>What every script under protocols must hold to.</summary>
public sealed class ProtocolLibraryTests
{
    public static TheoryData<string> Scripts => [.. Directory.GetFiles(Folder(), "*.protocol").Select(f => Path.GetFileName(f)).Order(StringComparer.Ordinal)];

    [Theory]
    [MemberData(nameof(Scripts))]
    public void Every_claim_is_proved_for_three_and_four_parties(string script)
    {
        Outcome<VerifyResult> outcome = Judge.Verify(Request(script, conditions: false));
        Assert.True(outcome.Succeeded, Texts(outcome.Findings));
        Assert.NotEmpty(outcome.Value!.Claims);
        Assert.All(outcome.Value.Claims, c => Assert.True(c.Verdict == ClaimVerdict.Proved, $"{c.Text} ({c.Parameters}): {c.Verdict}, {c.Left:R} against {c.Right:R}. {c.Reason}"));
    }

    [Theory]
    [MemberData(nameof(Scripts))]
    public void Ideal_conditions_give_fidelity_one_and_success_one_unless_somebody_intercepts(string script)
    {
        Outcome<RunResult> outcome = Judge.Run(Request(script, conditions: false));
        Assert.True(outcome.Succeeded, Texts(outcome.Findings));
        if (Text(script).Contains("outsider", StringComparison.Ordinal))
        {
            Assert.True(outcome.Value!.Cases[0].Metrics[0].Estimate.Value < 1);
            return;
        }

        // Thresholds on counts of finitely many copies are missed now and then.
        Assert.Equal(1, outcome.Value!.Cases[0].Metrics[0].Estimate.Value, outcome.Value.List is null ? 1e-10 : 0.03);
        Assert.All(outcome.Value.Checkpoints, c => Assert.Equal(1, c.Fidelity.Value, 1e-10));
    }

    [Theory]
    [MemberData(nameof(Scripts))]
    public void Demo_conditions_fit_and_reach_a_verdict(string script)
    {
        Outcome<RunResult> outcome = Judge.Run(Request(script, conditions: true, parameters: false));
        Assert.True(outcome.Succeeded, Texts(outcome.Findings));
        Assert.NotEqual(Verdict.NoGoals, outcome.Value!.Verdict);
        Assert.All(outcome.Value.Checkpoints, c => Assert.InRange(c.Loss!.Value, -1e-10, 1));
    }

    [Theory]
    [MemberData(nameof(Scripts))]
    public void Script_is_in_its_one_shape(string script)
    {
        string text = Text(script);
        (ResourceCheck.Scripts.Syntax.ScriptTree tree, IReadOnlyList<Diagnostic> findings) = Script.Parse(new SourceText(script, text));
        Assert.Empty(findings);
        Assert.Equal(text, Script.Print(tree));
    }

    [Theory]
    [MemberData(nameof(Scripts))]
    public void Script_has_a_page_in_the_docs_and_conditions_beside_it(string script)
    {
        string name = Path.GetFileNameWithoutExtension(script);
        Assert.True(File.Exists(Path.Combine(Folder(), name + ".conditions.json")));
        Assert.Contains($"{name}.protocol", File.ReadAllText(Path.Combine(Folder(), "..", "docs", "protocols", name + ".md")), StringComparison.Ordinal);
    }

    public static RunRequest Request(string script, bool conditions, bool parameters = true)
    {
        string name = Path.GetFileNameWithoutExtension(script), path = Path.Combine(Folder(), name + ".conditions.json");
        bool scales = Text(script).Contains("parameter n", StringComparison.Ordinal);
        return new RunRequest
        {
            Script = new InputText(Path.Combine(Folder(), script), Text(script), ""),
            Conditions = conditions ? new InputText(path, File.ReadAllText(path), "") : null,
            Parameters = parameters && scales ? [new("n", "3,4")] : [],
        };
    }

    public static string Text(string script) => File.ReadAllText(Path.Combine(Folder(), script));

    private static string Texts(IReadOnlyList<Diagnostic> findings) => string.Join("\n\n", findings);

    private static string Folder([CallerFilePath] string file = "") => Path.GetFullPath(Path.Combine(Path.GetDirectoryName(file)!, "..", "..", "..", "protocols"));
}
