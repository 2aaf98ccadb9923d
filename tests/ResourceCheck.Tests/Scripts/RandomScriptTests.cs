using System.Text;
using FsCheck.Xunit;
using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Syntax;
using Xunit;

namespace ResourceCheck.Tests.Scripts;

public sealed class RandomScriptTests
{
    private static readonly string[] Pieces =
    [
        "protocol", "round", "discussion", "for", "when", "otherwise", "end", "dishonest", "instead", "of", "before", "choose", "harm", "goal", "claim",
        "report", "parties", "parameter", "input", "Ada", "P", "all", "others", "measures", "announce", "send", "apply", "wait", "set", "pick", "abort",
        "intercepts", "level", "fourier", "on", "phased", "matrix", "complement", "as", "to", "in", "from", "over", "given", "if", "then", "else", "not",
        "and", "or", "minus", "mod", "none", "true", "some", "count", "guess", "k", "\"x\"", "\"", "1", "2.5", "1e-6", "3..4", "..", "(", ")", "[", "]",
        "{", "}", ",", ";", ":", ".", "=", "<=", "-", "+", "*", "#", "\n", "\n", "\n  ", "\r\n", "\0", "ä", "§", "\ud83d\ude00", "\ud83d", "\t",
    ];

    [Property(MaxTest = 500)]
    public void Any_text_is_read_and_printed_without_exception(string? text) => ReadAndPrint(text ?? "");

    [Property(MaxTest = 500)]
    public void Any_row_of_words_is_read_and_printed_without_exception(int seed)
    {
        Random random = new(seed);
        StringBuilder text = new();
        for (int i = random.Next(200); i > 0; i--)
            text.Append(Pieces[random.Next(Pieces.Length)]).Append(random.Next(4) == 0 ? "" : " ");
        ReadAndPrint(text.ToString());
    }

    [Property(MaxTest = 500)]
    public void Any_mutation_of_a_script_is_read_and_printed_without_exception(int seed)
    {
        Random random = new(seed);
        StringBuilder text = new(ScriptCases.All[random.Next(ScriptCases.All.Count)].Source);
        for (int i = random.Next(1, 6); i > 0 && text.Length > 0; i--)
        {
            int at = random.Next(text.Length);
            if (random.Next(2) == 0)
                text.Remove(at, Math.Min(random.Next(1, 20), text.Length - at));
            else
                text.Insert(at, Pieces[random.Next(Pieces.Length)]);
        }

        ReadAndPrint(text.ToString());
    }

    [Property(MaxTest = 300)]
    public void One_unreadable_line_is_told_once_and_nothing_else(int seed)
    {
        Random random = new(seed);
        string[] lines = ScriptCases.All.First(c => c.Title == "removal, as a whole").Source.Split('\n');
        int[] simple = [.. Enumerable.Range(0, lines.Length).Where(i => lines[i] is not ("" or "end" or "round \"Dov leaves\""))];
        int chosen = simple[random.Next(simple.Length)];
        lines[chosen] = "  " + string.Concat(Enumerable.Range(0, random.Next(1, 5)).Select(_ => "= § ) "));
        Diagnostic finding = Assert.Single(Script.Parse(new SourceText("t", string.Join('\n', lines))).Findings);
        Assert.Equal(chosen + 1, finding.Place!.Line);
    }

    [Property(MaxTest = 500)]
    public void A_random_tree_parses_from_its_print_to_itself(int seed)
    {
        ScriptTree tree = new TreeMaker(new Random(seed)).Script();
        string printed = Script.Print(tree);
        var (again, findings) = Script.Parse(new SourceText("t", printed));
        Assert.True(findings.Count == 0, string.Join('\n', findings) + "\n" + printed);
        Assert.True(TreeComparer.Difference(tree, again) is not { } difference, TreeComparer.Difference(tree, again) + "\n" + printed);
        Assert.Equal(printed, Script.Print(again));
    }

    private static void ReadAndPrint(string text)
    {
        SourceText source = new("t", text);
        var (tree, findings) = Script.Parse(source);
        string printed = Script.Print(tree);
        Assert.All(findings, f => Assert.InRange(f.Place!.Line, 1, source.LineOf(text.Length)));
        Assert.All(findings, f => Assert.False(string.IsNullOrWhiteSpace(f.ToString())));
        Assert.NotNull(Script.ParametersOf(tree));
        if (findings.Count > 0)
            return;
        var (again, told) = Script.Parse(new SourceText("t", printed));
        Assert.Empty(told);
        Assert.Null(TreeComparer.Difference(tree, again));
        Assert.Equal(printed, Script.Print(again));
    }
}
