using ResourceCheck.Cli.Commands;
using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;
using Xunit;

namespace ResourceCheck.Tests.Cli;

public sealed class StarterTests
{
    private static readonly SourceText Source = new("study.protocol", Starter.Script);

    [Fact]
    public void The_starting_script_has_no_mistakes_and_is_in_its_one_shape()
    {
        (Scripts.Syntax.ScriptTree tree, IReadOnlyList<Diagnostic> findings) = Script.Parse(Source);
        Assert.Empty(findings);
        Assert.Equal(Starter.Script, Script.Print(tree));
    }

    [Fact]
    public void The_starting_conditions_fit_the_starting_script()
    {
        Outcome<Protocol> protocol = Script.Bind(Script.Parse(Source).Tree, new Dictionary<string, Rational>());
        Assert.Empty(protocol.Findings);
        Outcome<ConditionsDocument> conditions = ConditionsFile.Read("study.conditions.json", Starter.Conditions, []);
        Assert.Empty(conditions.Findings);
        Assert.Empty(ConditionsFile.Bind(conditions.Value!, protocol.Value!).Findings);
    }
}
