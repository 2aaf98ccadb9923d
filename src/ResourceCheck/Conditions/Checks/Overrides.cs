using ResourceCheck.Conditions.Json;
using ResourceCheck.Conditions.Keys;
using ResourceCheck.Scripts;

namespace ResourceCheck.Conditions.Checks;

/// <summary>Puts the values of <c>--set</c> into the tree before it is checked, so that they are checked like the file's own.</summary>
internal sealed class Overrides
{
    private readonly Findings _findings;
    private readonly string _path;
    private readonly Spot _spot;
    private readonly IReadOnlyList<PathPart> _parts;
    private readonly Node _value;

    private Overrides(string path, IReadOnlyList<PathPart> parts, Spot spot, Node value, Findings findings)
    {
        _path = path;
        _parts = parts;
        _spot = spot;
        _value = value;
        _findings = findings;
    }

    /// <summary>The tree with one override; the tree as it was when the path leads nowhere, which the findings then tell.</summary>
    public static ObjectNode Apply(ObjectNode root, string path, string value, Findings findings)
    {
        SourceText source = new($"--set {path}", value);
        Spot spot = new(source, new Span(0, value.Length), true);
        if (OverridePath.Parse(path) is not { } parts)
        {
            findings.Add(ConditionsMessages.MalformedPath(spot, path));
            return root;
        }

        if (ValueOf(source, spot, findings) is not { } node)
            return root;
        return (ObjectNode?)new Overrides(path, parts, spot, node, findings).Put(root, KeyTable.Root, 0) ?? root;
    }

    /// <summary>JSON where it is JSON, else a bare text, because shells eat quotes.</summary>
    private static Node? ValueOf(SourceText source, Spot spot, Findings findings)
    {
        Findings own = new();
        if (JsonTree.Read(source, true, own) is { } node && !own.HasErrors)
            return node;
        if (source.Text.Length <= JsonTree.MaxLength && !"{[\"".Contains(source.Text.TrimStart().FirstOrDefault(), StringComparison.Ordinal))
            return new TextNode(spot, source.Text.Trim());
        foreach (Diagnostics.Diagnostic finding in own.InOrder(source.Name))
            findings.Add(finding);
        return null;
    }

    private Node? Put(Node? current, Shape? shape, int depth)
    {
        if (depth == _parts.Count)
            return _value;
        return (current ?? new ObjectNode(_spot, [])) switch
        {
            ObjectNode node => PutMember(node, shape, depth),
            ArrayNode list => Refuse(ConditionsMessages.PathIntoList(_spot, _path, Upto(depth), list.Items.Count)),
            { } single => Refuse(ConditionsMessages.PathIntoValue(_spot, _path, Upto(depth), single.Kind)),
        };
    }

    private Node? PutMember(ObjectNode node, Shape? shape, int depth)
    {
        PathPart part = _parts[depth];
        if (shape is PartyShape section)
        {
            bool isKey = section.Group.Find(part.Name) is not null;
            bool isPerParty = PartySections.IsPerParty(section.Group, node);
            if (isKey && isPerParty)
                return Refuse(ConditionsMessages.PathNeedsParty(_spot, _path, Upto(depth), string.Join('.', _parts.Skip(depth).Select(p => p.Text))));
            bool isParty = !isKey && (isPerParty || part.Name == KeyTable.Default || PartySections.LooksLikeParty(section.Group, part.Text, Ahead(depth)));
            if (isParty && !isPerParty && node.Members.Count > 0)
                node = new ObjectNode(node.Spot, [new Member(KeyTable.Default, node.Spot, node)]);
            return Replace(node, part.Text, isParty ? [] : part.Indices, isParty ? section.Group : section.Group.Find(part.Name)?.Shape, depth, isParty ? part.Text : part.Name);
        }

        if (shape is MapShape map)
            return Replace(node, part.Text, [], map.Item, depth, part.Text);
        return Replace(node, part.Text, part.Indices, (shape as GroupShape)?.Find(part.Name)?.Shape, depth, part.Name);
    }

    /// <summary>What will stand under this part: the value itself, or an object that leads to it.</summary>
    private Node Ahead(int depth) => depth + 1 < _parts.Count ? new ObjectNode(_spot, []) : _value;

    private ObjectNode? Replace(ObjectNode node, string text, IReadOnlyList<int>? indices, Shape? shape, int depth, string name)
    {
        if (indices is null)
            return Refuse<ObjectNode>(ConditionsMessages.MalformedPath(_spot, _path));
        Node? old = node.Find(name);
        Node? put = PutItem(old, shape, indices, 0, depth, name);
        if (put is null)
            return null;
        return old is null
            ? new ObjectNode(node.Spot, [.. node.Members, new Member(name, _spot, put)])
            : new ObjectNode(node.Spot, [.. node.Members.Select(m => m.Name == name ? m with { Value = put } : m)]);
    }

    private Node? PutItem(Node? current, Shape? shape, IReadOnlyList<int> indices, int used, int depth, string text)
    {
        Shape? chosen = shape is ChoiceShape choice ? choice.Options.FirstOrDefault(o => o.Judges(current ?? Wanted(indices, used))) : shape;
        if (used == indices.Count)
            return Put(current, chosen, depth + 1);
        if (current is not ArrayNode list || indices[used] >= list.Items.Count)
            return Refuse(ConditionsMessages.NoSuchItem(_spot, _path, text, indices[used], (current as ArrayNode)?.Items.Count ?? 0));
        Node? item = PutItem(list.Items[indices[used]], (chosen as ListShape)?.Item, indices, used + 1, depth, text);
        return item is null ? null : list with { Items = [.. list.Items.Select((old, i) => i == indices[used] ? item : old)] };
    }

    private Node Wanted(IReadOnlyList<int> indices, int used) => used < indices.Count ? new ArrayNode(_spot, []) : new ObjectNode(_spot, []);

    private string Upto(int depth) => string.Join('.', _parts.Take(depth).Select(p => p.Text));

    private Node? Refuse(Diagnostics.Diagnostic finding) => Refuse<Node>(finding);

    private T? Refuse<T>(Diagnostics.Diagnostic finding)
        where T : Node
    {
        _findings.Add(finding);
        return null;
    }
}
