namespace ResourceCheck.Numerics.Collective;

/// <summary>One thing that makes a geometry unfit, as plain values; whoever read the input words it.</summary>
/// <param name="Kind">What is wrong.</param>
/// <param name="First">Emitter (from 0) or transition (from 1), as the kind says.</param>
/// <param name="Second">The other emitter or transition, else -1.</param>
/// <param name="Value">The number found: distance, length, rate or cosine.</param>
internal sealed record GeometryFinding(GeometryFault Kind, int First, int Second, double Value);

/// <summary>Kinds of unfit geometry.</summary>
internal enum GeometryFault
{
    /// <summary>Two emitters at one place, or so near that shifts overflow: First and Second are emitters, Value their distance.</summary>
    Coinciding,

    /// <summary>A coordinate is missing or not finite: First is the emitter.</summary>
    Position,

    /// <summary>A dipole without direction, or not of three finite components: First is the transition, Value its length.</summary>
    Dipole,

    /// <summary>A rate that is negative or not finite: First is the transition.</summary>
    Rate,

    /// <summary>A wavelength that is not positive and finite: First is the transition.</summary>
    Wavelength,

    /// <summary>
    /// Two transitions of one wavelength whose dipoles are not orthogonal: they would couple to each other, which the model leaves out.
    /// First and Second are transitions, Value the cosine of their dipoles.
    /// </summary>
    CoupledTransitions,
}
