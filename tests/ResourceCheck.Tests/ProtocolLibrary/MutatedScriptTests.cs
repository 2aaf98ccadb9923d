using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using Xunit;

namespace ResourceCheck.Tests.ProtocolLibrary;

/// <summary>Verification refutes protocols that are subtly wrong and names outcomes that break them.</summary>
public sealed class MutatedScriptTests
{
    [Theory]
    [InlineData("removal.protocol", "  Ada, Ben, Cyd apply complement(fourier, k)", "  Ada, Ben apply complement(fourier, k)", "missing correction", "\"after removal\" = 1")]
    [InlineData("removal.protocol", "complement(fourier, k)", "complement(level, k)", "wrong basis in a correction", "\"after removal\" = 1")]
    [InlineData("secret-sharing.protocol", "keep when same(b of all)", "keep when same(b of Dealer, P[1])", "wrong sifting rule", "success = 1")]
    [InlineData("secret-sharing.protocol", "all announce b", "all announce b\n  Dealer sends v as hint to P[1]\n  P[1] sets heard to hint", "leaked value", "\"one guesses\" = 1 / (n - 1)")]
    [InlineData("removal.protocol", "Dov announces k", "Dov announces (if k = 0 then 1 else if k = 1 then 0 else k) as said", "swapped outcome", "\"after removal\" = 1")]
    public void Mutated_script_is_refuted_with_outcomes_that_break_it(string script, string original, string mutated, string mutation, string claim)
    {
        string text = ProtocolLibraryTests.Text(script).Split("\ndishonest")[0]; // cheats need the lines that are mutated
        Assert.Contains(original, text, StringComparison.Ordinal);
        string changed = text.Replace(original, mutated, StringComparison.Ordinal);
        if (mutation == "swapped outcome")
            changed = changed.Replace("complement(fourier, k)", "complement(fourier, said)", StringComparison.Ordinal);
        if (mutation == "leaked value")
            changed = changed.Replace("guess(Dealer.v from P[1].v)", "guess(Dealer.v from P[1].v, P[1].heard)", StringComparison.Ordinal);
        RunRequest request = ProtocolLibraryTests.Request(script, conditions: false);
        Outcome<VerifyResult> outcome = Judge.Verify(request with { Script = request.Script with { Text = changed } });
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings) + "\n" + changed);
        ClaimResult refuted = outcome.Value!.Claims.First(c => c.Text == claim);
        Assert.Equal(ClaimVerdict.Refuted, refuted.Verdict);
        Assert.NotEmpty(refuted.Breaking);
        Assert.All(refuted.Breaking, b => Assert.InRange(b.Probability, 1e-9, 1));
        Assert.All(refuted.Breaking, b => Assert.NotEmpty(b.Outcomes));
    }
}
