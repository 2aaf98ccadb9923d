using ResourceCheck.Conditions;
using ResourceCheck.Conditions.Keys;
using ResourceCheck.Quantities;

namespace ResourceCheck.Tests.Conditions;

/// <summary>The key tables of docs/conditions.md, made from the table that the reader uses.</summary>
internal static class KeyTableMarkdown
{
    /// <summary>All tables, the whole file first.</summary>
    public static string Write()
    {
        List<string> lines = [];
        HashSet<string> written = [];
        Queue<(string Title, GroupShape Group)> open = new([("The file", KeyTable.Root)]);
        while (open.TryDequeue(out (string Title, GroupShape Group) next))
        {
            if (!written.Add(next.Group.Name))
                continue;
            lines.AddRange(["", $"### {next.Title}", "", "| key | value | when absent | meaning |", "| --- | --- | --- | --- |"]);
            foreach (Key key in next.Group.Keys)
            {
                lines.Add($"| `{key.Name}` | {Cell(ValueOf(key.Shape))} | {Cell(key.Required ? "must be given" : key.Default)} | {Cell(key.Meaning)} |");
                foreach (GroupShape group in GroupsIn(key.Shape))
                    open.Enqueue((next.Group == KeyTable.Root ? $"`{key.Name}`" : $"`{key.Name}` in `{next.Group.Name}`", group));
            }
        }

        return string.Join('\n', lines).Trim('\n') + "\n";
    }

    /// <summary>The unit table.</summary>
    public static string WriteUnits()
    {
        IEnumerable<string> rows = Enum.GetValues<Dimension>().Where(d => d != Dimension.None)
            .Select(d => $"| {UnitTable.NameOf(d)} | {string.Join(", ", UnitTable.SymbolsOf(d).Select(s => $"`{s}`"))} | `{UnitTable.BaseSymbolOf(d)}` |");
        return string.Join('\n', ["| what | units | held in |", "| --- | --- | --- |", .. rows]) + "\n";
    }

    private static string ValueOf(Shape shape) => shape switch
    {
        PartyShape => "an object, plain or per party",
        GroupShape => "an object",
        QuantityShape q => $"{UnitTable.NameOf(q.Fits[0])}{RangeOf(q.Bounds)}, `\"{q.Example}\"`{(q.TakesBareNumbers ? " or a bare number in rad" : "")}",
        NumberShape { Bounds: Bounds.Probability } n => $"0 to 1, `{n.InWords.Split(' ')[^1]}`",
        NumberShape n => $"a number{RangeOf(n.Bounds)}, `{n.InWords.Split(' ')[^1]}`",
        MapShape map => $"an object of {map.Keys switch { MapKey.Level => "levels", MapKey.LevelPair => "pairs of levels", MapKey.QuditPair => "pairs of qudits", _ => "pairs of parties" }}, `{{\"{map.KeyExample}\": …}}`",
        ChoiceShape choice => string.Join("; or ", choice.Options.Select(ValueOf)),
        _ => shape.InWords,
    };

    private static string RangeOf(Bounds bounds) => bounds switch
    {
        Bounds.NotNegative => " from 0",
        Bounds.Positive => " above 0",
        _ => "",
    };

    private static IEnumerable<GroupShape> GroupsIn(Shape shape) => shape switch
    {
        GroupShape group => [group],
        PartyShape party => [party.Group],
        ListShape list => GroupsIn(list.Item),
        MapShape map => GroupsIn(map.Item),
        ChoiceShape choice => choice.Options.SelectMany(GroupsIn),
        _ => [],
    };

    private static string Cell(string text) => text.Replace("|", "\\|", StringComparison.Ordinal);
}
