using ResourceCheck.Engines.Lists;

namespace ResourceCheck.Tests.Lists;

/// <summary>Goes through all random events of a program: every run takes the next path through its tree of alternatives.</summary>
internal sealed class EveryChance : IChance
{
    private readonly List<(int Taken, double[] Weights)> _path = [];
    private int _depth;

    /// <summary>Probability of the path of the last run.</summary>
    public double Probability => _path.Take(_depth).Aggregate(1.0, (product, step) => product * step.Weights[step.Taken] / step.Weights.Sum());

    public int Pick(ReadOnlySpan<double> weights)
    {
        if (_depth == _path.Count)
            _path.Add((FirstPossible(weights.ToArray(), 0), weights.ToArray()));
        return _path[_depth++].Taken;
    }

    /// <summary>Runs something on every path.</summary>
    public void ForEach(Action run)
    {
        do
        {
            _depth = 0;
            run();
        }
        while (Advance());
    }

    private bool Advance()
    {
        while (_path.Count > 0)
        {
            (int taken, double[] weights) = _path[^1];
            _path.RemoveAt(_path.Count - 1);
            if (FirstPossible(weights, taken + 1) is int next && next < weights.Length)
            {
                _path.Add((next, weights));
                return true;
            }
        }

        return false;
    }

    private static int FirstPossible(double[] weights, int from)
    {
        while (from < weights.Length && weights[from] == 0)
            from++;
        return from;
    }
}
