namespace ResourceCheck.Scripts.Binding;

/// <summary>The parties of a script by name and number.</summary>
internal sealed class PartyTable
{
    private readonly List<string> _names = [];
    private readonly Dictionary<string, int> _index = [];
    private readonly Dictionary<string, (int Least, int Most)> _families = [];
    private readonly HashSet<int> _outsiders = [];

    /// <summary>All names in order, outsiders last.</summary>
    public IReadOnlyList<string> Names => _names;

    /// <summary>Names of numbered families with their least and greatest number.</summary>
    public IReadOnlyDictionary<string, (int Least, int Most)> Families => _families;

    /// <summary>Indices of outsiders, ascending.</summary>
    public IReadOnlyList<int> Outsiders => [.. _outsiders.Order()];

    /// <summary>Indices of all who are no outsiders.</summary>
    public IEnumerable<int> Insiders => Enumerable.Range(0, _names.Count).Where(p => !_outsiders.Contains(p));

    /// <summary>Indices of those who hold a qudit at the start, ascending.</summary>
    public IReadOnlyList<int> Holders { get; set; } = [];

    /// <summary>Whether the parties were declared without a mistake, so that an unknown one is the mistake of the line that names it.</summary>
    public bool IsComplete { get; set; } = true;

    /// <summary>Whether the resource was declared without a mistake.</summary>
    public bool HasResource { get; set; } = true;

    /// <summary>Whether a party is an outsider.</summary>
    public bool IsOutsider(int party) => _outsiders.Contains(party);

    /// <summary>Index of a party, or -1.</summary>
    public int IndexOf(string name) => _index.GetValueOrDefault(name, -1);

    /// <summary>Name of a family's member.</summary>
    public static string Member(string family, int number) => $"{family}[{number}]";

    /// <summary>Adds a party; false when there is one of that name.</summary>
    public bool TryAdd(string name)
    {
        if (_families.ContainsKey(name) || !_index.TryAdd(name, _names.Count))
            return false;
        _names.Add(name);
        return true;
    }

    /// <summary>Adds members of a family; false when some are there already or a party bears the family's name.</summary>
    public bool TryAddFamily(string family, int from, int to)
    {
        if (_index.ContainsKey(family))
            return false;
        bool added = Enumerable.Range(from, to - from + 1).All(number => AddMember(Member(family, number)));
        (int least, int most) = _families.GetValueOrDefault(family, (from, to));
        _families[family] = (Math.Min(least, from), Math.Max(most, to));
        return added;
    }

    /// <summary>Adds an outsider; false when there is a party of that name.</summary>
    public bool TryAddOutsider(string name)
    {
        if (!TryAdd(name))
            return false;
        _outsiders.Add(_names.Count - 1);
        return true;
    }

    private bool AddMember(string name)
    {
        if (!_index.TryAdd(name, _names.Count))
            return false;
        _names.Add(name);
        return true;
    }
}
