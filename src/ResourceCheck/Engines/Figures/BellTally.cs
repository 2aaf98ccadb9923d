using System.Numerics;
using ResourceCheck.Engines.Dense;
using ResourceCheck.Numerics;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Figures;

/// <summary>Collects the states of the pairs whose CHSH value is reported, checkpoint by checkpoint; the last one counts.</summary>
internal sealed class BellTally
{
    private readonly OperatorBasis _basis;
    private readonly IReadOnlyList<string> _labels;
    private readonly double[][] _observables;
    private readonly Dictionary<BellFigure, Dictionary<string, double[]>> _states = new(ReferenceEqualityComparer.Instance as IEqualityComparer<BellFigure>);

    public BellTally(Protocol protocol, OperatorBasis basis, IReadOnlyList<string> labels)
    {
        _labels = labels;
        _basis = basis;
        _observables = [.. Observables(basis)];
        IEnumerable<Figure> figures = protocol.Reports.Select(r => r.Figure).Concat(protocol.Claims.SelectMany(c => new[] { c.Left, c.Right }));
        foreach (BellFigure figure in figures.SelectMany(FigureTally.Leaves).OfType<BellFigure>())
            _states[figure] = [];
    }

    /// <summary>Adds a branch's contribution at a checkpoint, if both parties still hold their qudits.</summary>
    public void Look(CheckpointPlanStep step, Branch waited)
    {
        foreach (BellFigure figure in _states.Keys)
        {
            if (waited.Tensor.Parties.Contains(figure.First) && waited.Tensor.Parties.Contains(figure.Second))
                AddCorrelations(waited, figure, SumOf(figure, step.Label));
        }
    }

    /// <summary>The pairs whose value is asked for.</summary>
    public IEnumerable<BellFigure> Pairs => _states.Keys;

    /// <summary>Adds expectation values of products of observables, the first party's and the second's by their functionals, at a checkpoint at which both hold their qudits.</summary>
    public void Look(BellFigure figure, string label, Func<double[], double[], double> expectation)
    {
        double[] sum = SumOf(figure, label);
        for (int i = 0; i < _observables.Length; i++)
        {
            for (int j = 0; j < _observables.Length; j++)
                sum[(i * _observables.Length) + j] += expectation(_observables[i], _observables[j]);
        }
    }

    private double[] SumOf(BellFigure figure, string label)
    {
        if (!_states[figure].TryGetValue(label, out double[]? sum))
            _states[figure][label] = sum = new double[_observables.Length * _observables.Length];
        return sum;
    }

    /// <summary>The CHSH value at the last checkpoint at which both held their qudits; undefined when there was none.</summary>
    public Estimate Of(BellFigure figure)
    {
        if (_labels.LastOrDefault(_states[figure].ContainsKey) is not { } last)
            return Estimate.Exact(double.NaN);
        double[] sums = _states[figure][last];
        double weight = sums[^1];
        return weight > 0 ? ChshOptimum.Of([.. sums.Select(s => s / weight)]) : Estimate.Exact(double.NaN);
    }

    /// <summary>Expectation values of σx, σy, σz on levels 0 and 1, of "anything else", and of the identity.</summary>
    private static IEnumerable<double[]> Observables(OperatorBasis basis)
    {
        int d = basis.Levels;
        Complex[,] x = new Complex[d, d], y = new Complex[d, d], z = new Complex[d, d], rest = new Complex[d, d];
        (x[0, 1], x[1, 0]) = (1, 1);
        (y[0, 1], y[1, 0]) = (-Complex.ImaginaryOne, Complex.ImaginaryOne);
        (z[0, 0], z[1, 1]) = (1, -1);
        for (int level = 2; level < d; level++)
            rest[level, level] = 1;
        return [basis.Functional(x, 0), basis.Functional(y, 0), basis.Functional(z, 0), basis.Functional(rest, 1), basis.Trace];
    }

    private void AddCorrelations(Branch branch, BellFigure figure, double[] sum)
    {
        SiteTensor pair = branch.Reduced([figure.First, figure.Second], _basis.Trace);
        for (int i = 0; i < _observables.Length; i++)
        {
            SiteTensor half = pair.Contract(figure.First, Pulled(branch, figure.First, i));
            for (int j = 0; j < _observables.Length; j++)
                sum[(i * _observables.Length) + j] += branch.Factor * half.Contract(figure.Second, Pulled(branch, figure.Second, j)).Data[0];
        }
    }

    private double[] Pulled(Branch branch, int party, int observable) => branch.Pending[party]?.PullBack(_observables[observable]) ?? _observables[observable];
}
