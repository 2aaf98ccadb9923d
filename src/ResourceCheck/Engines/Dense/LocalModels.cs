using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Numerics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;
using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Dense;

/// <summary>Maps and functionals of a plan's local actions, each built once and shared by all branches.</summary>
internal sealed class LocalModels(OperatorBasis basis, IReadOnlyDictionary<string, Complex[,]> matrices)
{
    private readonly Dictionary<SiteNoise, SiteMap> _noise = new(ReferenceEqualityComparer.Instance as IEqualityComparer<SiteNoise>);
    private readonly Dictionary<(UnitaryKey Key, OperationModel Model), SiteMap?> _unitaries = [];
    private readonly Dictionary<(UnitaryKey Key, OperationModel Model), Complex[,]?> _matrices = [];
    private readonly Dictionary<(BasisValue Basis, DetectionModel Model), double[][]> _effects = [];
    private readonly Dictionary<BasisValue, SiteMap[]> _projections = [];

    public OperatorBasis Basis { get; } = basis;

    /// <summary>Drops lost qudits; one object, so that histories can share what follows.</summary>
    public SiteMap Herald { get; } = basis.DropSink();

    public SiteMap Noise(SiteNoise noise)
    {
        if (!_noise.TryGetValue(noise, out SiteMap? map))
            _noise[noise] = map = LocalNoise.Map(Basis, noise);
        return map;
    }

    /// <summary>The map of an applied unitary with its imperfections; null when an argument is none or nothing is to be corrected.</summary>
    public SiteMap? Unitary(BoundUnitary unitary, OperationModel model, Value[] slots)
    {
        if (UnitaryKey.From(unitary, slots, Basis.Levels) is not { } key)
            return null;
        if (!_unitaries.TryGetValue((key, model), out SiteMap? map))
            _unitaries[(key, model)] = map = BuildUnitary(key, model);
        return map;
    }

    /// <summary>The matrix of an applied unitary as it was meant to be, over-rotation included and depolarising not; null when there is nothing to apply.</summary>
    public Complex[,]? UnitaryMatrix(BoundUnitary unitary, OperationModel model, Value[] slots)
    {
        if (UnitaryKey.From(unitary, slots, Basis.Levels) is not { } key)
            return null;
        if (!_matrices.TryGetValue((key, model), out Complex[,]? matrix))
            _matrices[(key, model)] = matrix = Turned(key, model);
        return matrix;
    }

    /// <summary>Functionals of the outcomes 0 … d-1 and, last, of no click. Confusion first, then efficiency, then dark counts.</summary>
    public double[][] Effects(BasisValue value, DetectionModel model)
    {
        if (!_effects.TryGetValue((value, model), out double[][]? effects))
            _effects[(value, model)] = effects = BuildEffects(value, model);
        return effects;
    }

    /// <summary>For each vector of a basis the map that projects on it; lost qudits are found nowhere.</summary>
    public SiteMap[] Projections(BasisValue value)
    {
        if (!_projections.TryGetValue(value, out SiteMap[]? maps))
        {
            Complex[,] vectors = BasisVectors.Of(value, Basis.Levels, matrices);
            _projections[value] = maps = [.. Enumerable.Range(0, Basis.Levels).Select(k => Basis.DropLost(Projector(vectors, k)))];
        }

        return maps;
    }

    private SiteMap? BuildUnitary(UnitaryKey key, OperationModel model)
    {
        if (Turned(key, model) is not { } unitary)
            return null;
        SiteMap map = Basis.FromUnitary(unitary);
        return model.Depolarising > 0 ? LocalNoise.Depolarising(Basis, model.Depolarising).After(map) : map;
    }

    private Complex[,]? Turned(UnitaryKey key, OperationModel model) =>
        Matrix(key) is { } unitary && model.OverRotation != 0 ? UnitaryPower.Of(unitary, 1 + model.OverRotation) : Matrix(key);

    private Complex[,]? Matrix(UnitaryKey key) => key.Kind switch
    {
        UnitaryKind.Shift => LocalUnitaries.Shift(Basis.Levels, key.First),
        UnitaryKind.Clock => LocalUnitaries.Clock(Basis.Levels, key.First),
        UnitaryKind.LevelSwap when !IsLevel(key.First) || !IsLevel(key.Second) => null,
        UnitaryKind.Fourier or UnitaryKind.InverseFourier when key.First == 0 || key.First > Basis.Levels => null,
        UnitaryKind.LevelSwap => LocalUnitaries.LevelSwap(Basis.Levels, key.First, key.Second),
        UnitaryKind.Fourier => BasisVectors.Fourier(Basis.Levels, key.First < 0 ? Basis.Levels : key.First),
        UnitaryKind.InverseFourier => MatrixMath.Adjoint(BasisVectors.Fourier(Basis.Levels, key.First < 0 ? Basis.Levels : key.First)),
        UnitaryKind.Complement => LocalUnitaries.Complement(key.Basis!, BasisVectors.Of(key.Basis!, Basis.Levels, matrices), key.First),
        _ => matrices[key.File!],
    };

    private bool IsLevel(int index) => index >= 0 && index < Basis.Levels;

    private double[][] BuildEffects(BasisValue value, DetectionModel model)
    {
        int d = Basis.Levels;
        Complex[,] vectors = BasisVectors.Of(value, d, matrices);
        double[][] ideal = [.. Enumerable.Range(0, d).Select(k => Basis.Functional(Projector(vectors, k), 0))];
        double[][] effects = new double[d + 1][];
        effects[d] = [.. Basis.Trace.Select((t, i) => (1 - model.Dark) * NoClick(model, t, i))];
        for (int k = 0; k < d; k++)
        {
            int outcome = k;
            effects[k] = [.. Basis.Trace.Select((t, i) =>
                (model.Dark / d * NoClick(model, t, i)) + (model.Efficiency * Enumerable.Range(0, d).Sum(l => model.Confusion[l, outcome] * ideal[l][i])))];
        }

        return effects;
    }

    /// <summary>Component of the functional that no qudit gave a click: inefficiency in the levels, certainty in the sink.</summary>
    private double NoClick(DetectionModel model, double trace, int component) =>
        component == Basis.OperatorCount ? 1 : (1 - model.Efficiency) * trace;

    private static Complex[,] Projector(Complex[,] vectors, int k)
    {
        int d = vectors.GetLength(0);
        Complex[,] projector = new Complex[d, d];
        for (int a = 0; a < d; a++)
        {
            for (int b = 0; b < d; b++)
                projector[a, b] = vectors[a, k] * Complex.Conjugate(vectors[b, k]);
        }

        return projector;
    }
}
