using ResourceCheck.Conditions.Keys;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Conditions.Resolving;

/// <summary>Holds the party names of a conditions file against those of a protocol.</summary>
internal sealed class PartyNames
{
    private readonly Protocol _protocol;
    private readonly Findings _findings;
    private readonly PartyName?[] _parties;

    public PartyNames(Protocol protocol, Findings findings)
    {
        _protocol = protocol;
        _findings = findings;
        _parties = [.. protocol.Parties.Select(PartyName.Parse)];
    }

    /// <summary>Reports unknown parties of every section that is per party.</summary>
    public void Check(GroupSetting root)
    {
        foreach (GroupSetting section in root.Entries.Select(e => e.Value).OfType<GroupSetting>().Where(g => g.Shape is PartyShape))
        {
            foreach (Entry entry in section.Entries.Where(e => e.Name != KeyTable.Default))
                CheckEntry(entry, section.Path);
        }
    }

    /// <summary>Index of a single party; null with a finding when there is none, without an error when it is a family member above today's number.</summary>
    public int? IndexOf(string name, Entry entry, string section)
    {
        int index = IndexOf(name);
        if (index >= 0 && _protocol.Outsiders.Contains(index))
            _findings.Add(ConditionsMessages.Outsider(entry.NameSpot, name, section));
        if (index < 0)
            ReportAbsent(PartyName.Parse(name)!, name, entry, section);
        return index >= 0 ? index : null;
    }

    private int IndexOf(string name) => Enumerable.Range(0, _protocol.Parties.Count).FirstOrDefault(i => _protocol.Parties[i] == name, -1);

    private void CheckEntry(Entry entry, string section)
    {
        PartyName name = PartyName.Parse(entry.Name)!;
        int[] meant = [.. Enumerable.Range(0, _parties.Length).Where(i => _parties[i] is { } party && name.Covers(party))];
        if (meant.Length > 0 && meant.All(_protocol.Outsiders.Contains))
            _findings.Add(ConditionsMessages.Outsider(entry.NameSpot, entry.Name, section));
        if (name.From is null ? meant.Length == 0 : meant.Length <= name.To - name.From)
            ReportAbsent(name, entry.Name, entry, section);
    }

    /// <summary>A family grows with a parameter, so a member above today's last is no mistake; one below its first is.</summary>
    private void ReportAbsent(PartyName name, string written, Entry entry, string section)
    {
        int[] members = [.. _parties.Where(p => p?.Base == name.Base && p.From is not null).Select(p => p!.From!.Value)];
        if (name.From is not null && members.Length > 0 && name.From >= members.Min())
            _findings.Add(ConditionsMessages.MemberAbove(entry.NameSpot, written, section, $"{name.Base}[{members.Max()}]"));
        else if (name.From is null && members.Length > 0)
            _findings.Add(ConditionsMessages.FamilyName(entry.NameSpot, written, section, $"{written}[{members.Min()}..{members.Max()}]"));
        else
            _findings.Add(ConditionsMessages.UnknownParty(entry.NameSpot, written, section, [.. _protocol.Parties.Where((_, i) => !_protocol.Outsiders.Contains(i))]));
    }
}
