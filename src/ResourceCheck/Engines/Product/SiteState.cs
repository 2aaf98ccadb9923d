using System.Numerics;
using ResourceCheck.Numerics;
using ResourceCheck.Numerics.Antisymmetric;

namespace ResourceCheck.Engines.Product;

/// <summary>
/// What has happened to one party's qudit so far. Histories with the same past share one object, so that its pulled-back operators and
/// its channel are made once.
/// </summary>
internal sealed class SiteState
{
    private readonly OperatorBasis _basis;
    private readonly SiteMap? _map;
    private readonly Dictionary<SiteMap, SiteState> _next = new(ReferenceEqualityComparer.Instance as IEqualityComparer<SiteMap>);
    private readonly Dictionary<double[], LocalOperator> _pulled = new(ReferenceEqualityComparer.Instance as IEqualityComparer<double[]>);
    private LocalChannel? _channel;

    private SiteState(OperatorBasis basis, SiteMap? map, Complex[,]? frame) => (_basis, _map, Frame) = (basis, map, frame);

    /// <summary>The product of the unitaries applied; null when there was none.</summary>
    public Complex[,]? Frame { get; }

    /// <summary>The channel from the resource to now, without what ends in the sink.</summary>
    public LocalChannel Channel => _channel ??= LocalChannel.Of(_basis, _map ?? SiteMap.Identity(_basis.Dimension));

    /// <summary>A qudit as it leaves the source.</summary>
    public static SiteState Fresh(OperatorBasis basis) => new(basis, null, null);

    /// <summary>The qudit after a further map, which was a unitary if one is told.</summary>
    public SiteState After(SiteMap map, Complex[,]? unitary = null)
    {
        if (!_next.TryGetValue(map, out SiteState? next))
        {
            Complex[,]? frame = unitary is null ? Frame : Frame is null ? unitary : MatrixMath.Multiply(unitary, Frame);
            _next[map] = next = new SiteState(_basis, map.After(_map), frame);
        }

        return next;
    }

    /// <summary>The operator on the resource's levels whose expectation value is that of a functional now.</summary>
    public LocalOperator Pull(double[] functional)
    {
        if (!_pulled.TryGetValue(functional, out LocalOperator? pulled))
            _pulled[functional] = pulled = LocalOperator.Of(_basis, _map?.PullBack(functional) ?? functional);
        return pulled;
    }
}
