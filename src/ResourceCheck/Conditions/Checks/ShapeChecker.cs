using ResourceCheck.Conditions.Json;
using ResourceCheck.Conditions.Keys;

namespace ResourceCheck.Conditions.Checks;

/// <summary>Holds a JSON tree against the table of keys: unknown keys, wrong kinds, units and ranges. What is wrong is reported and left out.</summary>
internal sealed class ShapeChecker(Findings findings)
{
    private readonly ScalarChecker _scalars = new(findings);

    /// <summary>The checked file.</summary>
    public GroupSetting CheckRoot(ObjectNode root) => Group(root, KeyTable.Root, "");

    private Setting? Check(Node node, Shape shape, string path)
    {
        if (node is NullNode)
            return Refuse(ConditionsMessages.Null(node.Spot, path, shape));
        if (!shape.Judges(node))
            return Refuse(ConditionsMessages.WrongKind(node, path, shape));
        return shape switch
        {
            ChoiceShape choice => Check(node, choice.Options.First(o => o.Judges(node)), path),
            GroupShape group => Group((ObjectNode)node, group, path),
            PartyShape party => Party((ObjectNode)node, party, path),
            MapShape map => Map((ObjectNode)node, map, path),
            ListShape list => List((ArrayNode)node, list, path),
            _ => _scalars.Check(node, shape, path),
        };
    }

    private GroupSetting Group(ObjectNode node, GroupShape shape, string path)
    {
        List<Entry> entries = [];
        foreach (Member member in node.Members)
        {
            if (shape.Find(member.Name) is not { } key)
                findings.Add(ConditionsMessages.UnknownKey(member.NameSpot, member.Name, path, shape.Keys.Select(k => k.Name)));
            else if (Check(member.Value, key.Shape, Join(path, key.Name)) is { } value)
                entries.Add(new Entry(key.Name, member.NameSpot, value));
        }

        RefuseContradictions(node, shape, path);
        return new GroupSetting(node.Spot, path, shape, entries, IsWhole(node, entries));
    }

    private void RefuseContradictions(ObjectNode node, GroupShape shape, string path)
    {
        foreach (Alternative alternative in shape.Alternatives.Where(a => !a.MayMeet))
        {
            List<Member> given = [.. node.Members.Where(m => alternative.Names.Contains(m.Name))];
            if (given.Count > 1)
                findings.Add(ConditionsMessages.Exclusive(given[1].NameSpot, path, given[0].Name, given[1].Name));
        }
    }

    private GroupSetting Party(ObjectNode node, PartyShape shape, string path)
    {
        if (!PartySections.IsPerParty(shape.Group, node))
            return Group(node, shape.Group, path);
        List<Entry> entries = [];
        foreach (Member member in node.Members)
        {
            if (shape.Group.Find(member.Name) is not null)
                findings.Add(ConditionsMessages.KeyBesideParties(member.NameSpot, path, member.Name));
            else if (member.Name != KeyTable.Default && PartyName.Parse(member.Name) is null)
                findings.Add(ConditionsMessages.NoPartyName(member.NameSpot, member.Name));
            else if (Check(member.Value, shape.Group, Join(path, member.Name)) is { } value)
                entries.Add(new Entry(member.Name, member.NameSpot, value));
        }

        return new GroupSetting(node.Spot, path, shape, entries, IsWhole(node, entries));
    }

    private GroupSetting Map(ObjectNode node, MapShape shape, string path)
    {
        List<Entry> entries = [];
        HashSet<string> seen = [];
        foreach (Member member in node.Members)
        {
            if (MapKeys.Normalise(shape.Keys, member.Name) is not { } key)
                findings.Add(ConditionsMessages.BadMapKey(member.NameSpot, path, member.Name, shape));
            else if (!seen.Add(key))
                findings.Add(ConditionsMessages.PairTwice(member.NameSpot, path, member.Name));
            else if (Check(member.Value, shape.Item, Join(path, member.Name)) is { } value)
                entries.Add(new Entry(member.Name, member.NameSpot, value));
        }

        return new GroupSetting(node.Spot, path, shape, entries, IsWhole(node, entries));
    }

    private ListSetting? List(ArrayNode node, ListShape shape, string path)
    {
        if (node.Items.Count < shape.Least || node.Items.Count > shape.Most)
        {
            findings.Add(ConditionsMessages.ListLength(node, path, shape));
            return null;
        }

        List<Setting> items = [];
        for (int i = 0; i < node.Items.Count; i++)
        {
            if (Check(node.Items[i], shape.Item, $"{path}[{i}]") is { } item)
                items.Add(item);
        }

        // a list short of a refused item would be measured against the number of levels and give a second error
        return items.Count == node.Items.Count ? new ListSetting(node.Spot, path, items) : null;
    }

    private Setting? Refuse(Diagnostics.Diagnostic finding)
    {
        findings.Add(finding);
        return null;
    }

    private static bool IsWhole(ObjectNode node, List<Entry> entries) => entries.Count == node.Members.Count;

    private static string Join(string path, string name) => path.Length == 0 ? name : $"{path}.{name}";
}
