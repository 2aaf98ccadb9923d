namespace ResourceCheck.Numerics.Collective;

/// <summary>Everything that is unfit in a shape and its transitions, found in one pass.</summary>
internal static class GeometryCheck
{
    /// <summary>ξ below which 1/ξ³ is beyond 1e15 linewidths: no evolution could be followed.</summary>
    private const double SmallestXi = 1e-5;

    /// <summary>Relative difference of wavelengths below which transitions are taken to overlap: no dipole line of an emitter is narrower.</summary>
    private const double SameWavelength = 1e-9;

    /// <summary>Cosine from which dipoles count as not orthogonal: above rounding of components given in decimals.</summary>
    private const double NotOrthogonal = 1e-6;

    /// <summary>Faults that leave couplings without a value. Empty: the couplings can be built.</summary>
    public static IReadOnlyList<GeometryFinding> Of(EmitterShape shape, IReadOnlyList<Transition> transitions)
    {
        List<GeometryFinding> findings = [.. Positions(shape), .. transitions.SelectMany((t, j) => OfTransition(t, j + 1))];
        if (findings.Count == 0 && !shape.IsPoint)
            findings.AddRange(Coinciding(shape, transitions));
        return findings;
    }

    /// <summary>
    /// Pairs of transitions that would couple to each other if they were degenerate, as they are when their wavelengths are the same
    /// line of an emitter rather than figures that stand for nearly equal ones; only the reader of the input knows which.
    /// </summary>
    public static IEnumerable<GeometryFinding> Degenerate(IReadOnlyList<Transition> transitions)
    {
        for (int j = 0; j < transitions.Count; j++)
        {
            for (int l = j + 1; l < transitions.Count; l++)
            {
                double cosine = Lengths.Cosine(transitions[j].Dipole, transitions[l].Dipole);
                if (Same(transitions[j].Wavelength, transitions[l].Wavelength) && Math.Abs(cosine) > NotOrthogonal)
                    yield return new GeometryFinding(GeometryFault.CoupledTransitions, j + 1, l + 1, cosine);
            }
        }
    }

    private static bool Same(double a, double b) => Math.Abs(a - b) <= SameWavelength * Math.Max(a, b);

    private static IEnumerable<GeometryFinding> Positions(EmitterShape shape)
    {
        for (int i = 0; i < shape.Count; i++)
        {
            double[] place = shape.Positions[i];
            if (place.Length != 3 || !place.All(double.IsFinite))
                yield return new GeometryFinding(GeometryFault.Position, i, -1, place.FirstOrDefault(x => !double.IsFinite(x)));
        }
    }

    private static IEnumerable<GeometryFinding> OfTransition(Transition transition, int number)
    {
        if (!double.IsFinite(transition.Rate) || transition.Rate < 0)
            yield return new GeometryFinding(GeometryFault.Rate, number, -1, transition.Rate);
        if (!double.IsFinite(transition.Wavelength) || transition.Wavelength <= 0)
            yield return new GeometryFinding(GeometryFault.Wavelength, number, -1, transition.Wavelength);
        double length = Lengths.Of(transition.Dipole);
        if (transition.Dipole.Length != 3 || !double.IsFinite(length) || length == 0)
            yield return new GeometryFinding(GeometryFault.Dipole, number, -1, length);
    }

    private static IEnumerable<GeometryFinding> Coinciding(EmitterShape shape, IReadOnlyList<Transition> transitions)
    {
        double longest = transitions.Count == 0 ? 1 : transitions.Max(t => t.Wavelength);
        for (int i = 0; i < shape.Count; i++)
        {
            for (int k = i + 1; k < shape.Count; k++)
            {
                if (2 * Math.PI * shape.Distance(i, k) < SmallestXi * longest)
                    yield return new GeometryFinding(GeometryFault.Coinciding, i, k, shape.Distance(i, k));
            }
        }
    }
}
