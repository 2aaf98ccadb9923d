namespace ResourceCheck.Engines.Lists;

/// <summary>
/// Numbers for what is known of a position's membership in a set: 0 when it is no member, 1 when it is one, else a number that is equal
/// for positions whose membership depends on later events in the same way.
/// </summary>
internal sealed class Signatures
{
    public const int No = 0;
    public const int Yes = 1;

    private readonly Dictionary<(string Kind, int Left, int Right), int> _known = [];
    private int _next = 2;

    public int Of(string kind, int left, int right)
    {
        if (!_known.TryGetValue((kind, left, right), out int signature))
            _known[(kind, left, right)] = signature = _next++;
        return signature;
    }

    public int And(int left, int right) => (left, right) switch
    {
        (No, _) or (_, No) => No,
        (Yes, _) => right,
        (_, Yes) => left,
        _ => Of("and", left, right),
    };

    public int Or(int left, int right) => (left, right) switch
    {
        (Yes, _) or (_, Yes) => Yes,
        (No, _) => right,
        (_, No) => left,
        _ => Of("or", left, right),
    };

    public int Without(int left, int right) => (left, right) switch
    {
        (No, _) or (_, Yes) => No,
        (_, No) => left,
        _ => Of("without", left, right),
    };

    /// <summary>One or the other, not yet known which.</summary>
    public int Either(int left, int right) => left == right ? left : Of("either", left, right);
}
