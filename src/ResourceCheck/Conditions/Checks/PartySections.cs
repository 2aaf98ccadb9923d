using ResourceCheck.Conditions.Json;
using ResourceCheck.Conditions.Keys;
using ResourceCheck.Diagnostics;

namespace ResourceCheck.Conditions.Checks;

/// <summary>Tells whether a section is plain or per party, before any protocol is known.</summary>
internal static class PartySections
{
    /// <summary>A section is per party when it has <c>default</c> or an entry that can only be a party's.</summary>
    public static bool IsPerParty(GroupShape group, ObjectNode node) =>
        node.Members.Any(m => m.Name == KeyTable.Default || LooksLikeParty(group, m.Name, m.Value));

    /// <summary>An object under a name that is no key, nor close to one that holds an object.</summary>
    public static bool LooksLikeParty(GroupShape group, string name, Node value) =>
        value is ObjectNode && group.Find(name) is null
        && NearWords.Find(name, group.Keys.Where(k => k.Shape.Judges(value)).Select(k => k.Name)) is null;
}
