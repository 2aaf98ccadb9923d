namespace ResourceCheck.Timeline;

/// <summary>Where each party is in time while a plan is laid out: seconds from the end of preparation. Copied at branches.</summary>
internal sealed class Clock
{
    private readonly double[] _free;
    private readonly double[] _accounted;
    private readonly bool[] _holds;
    private readonly Dictionary<(int Party, int Slot), double> _arrivals;

    public Clock(int parties)
    {
        _free = new double[parties];
        _accounted = new double[parties];
        _holds = new bool[parties];
        _arrivals = [];
    }

    private Clock(Clock other)
    {
        _free = [.. other._free];
        _accounted = [.. other._accounted];
        _holds = [.. other._holds];
        _arrivals = new(other._arrivals);
    }

    public int Parties => _free.Length;

    public Clock Copy() => new(this);

    /// <summary>Moves this clock to where another one is.</summary>
    public void TakeFrom(Clock other)
    {
        other._free.CopyTo(_free, 0);
        other._accounted.CopyTo(_accounted, 0);
        other._holds.CopyTo(_holds, 0);
        foreach ((var key, double at) in other._arrivals)
            _arrivals[key] = at;
    }

    /// <summary>When a party is free.</summary>
    public double FreeAt(int party) => _free[party];

    /// <summary>Up to when the noise of waiting has been placed on a party's qudit.</summary>
    public double AccountedTo(int party) => _accounted[party];

    public bool Holds(int party) => _holds[party];

    public void Receive(int party, double at)
    {
        _holds[party] = true;
        _free[party] = at;
        _accounted[party] = at;
    }

    public void Release(int party) => _holds[party] = false;

    public void Advance(int party, double to) => _free[party] = Math.Max(_free[party], to);

    public void Account(int party, double to) => _accounted[party] = to;

    /// <summary>A value is known to a party from a time on; an earlier arrival stands.</summary>
    public void Know(int party, int slot, double at)
    {
        if (!_arrivals.TryGetValue((party, slot), out double earlier) || at < earlier)
            _arrivals[(party, slot)] = at;
    }

    /// <summary>When all of the values have reached a party; 0 for those it always knew.</summary>
    public double KnownAt(int party, IEnumerable<int> slots)
    {
        double latest = 0;
        foreach (int slot in slots)
            latest = Math.Max(latest, _arrivals.GetValueOrDefault((party, slot)));
        return latest;
    }

    public double Latest(IEnumerable<int> parties) => parties.Select(p => _free[p]).DefaultIfEmpty(0).Max();

    /// <summary>After a conditional block both branches' time has passed: everyone is as late as in the later branch.</summary>
    public static Clock Join(Clock a, Clock b)
    {
        Clock joined = a.Copy();
        for (int p = 0; p < a.Parties; p++)
        {
            joined._free[p] = Math.Max(a._free[p], b._free[p]);
            joined._accounted[p] = Math.Max(a._accounted[p], b._accounted[p]);
            joined._holds[p] = a._holds[p] && b._holds[p];
        }

        foreach (((int party, int slot) key, double at) in b._arrivals)
            joined._arrivals[key] = Math.Max(at, joined._arrivals.GetValueOrDefault(key));
        return joined;
    }
}
