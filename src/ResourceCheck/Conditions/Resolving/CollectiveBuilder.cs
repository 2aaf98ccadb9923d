using ResourceCheck.Numerics.Collective;
using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions.Resolving;

/// <summary>Builds emitters side by side from a <c>storage</c> or <c>resource.relaxed</c> section.</summary>
internal sealed class CollectiveBuilder(int emitters, Findings findings)
{
    private const double DefaultTolerance = 1e-12;

    /// <summary>The model; null when the geometry does not fit.</summary>
    /// <param name="section">The section.</param>
    /// <param name="timeKey">Key of its duration.</param>
    public CollectiveModel? Build(GroupSetting section, string timeKey)
    {
        double[] wavelengths = Wavelengths(section);
        if (Positions(section, wavelengths[0]) is not { } positions || positions.Any(p => p.Any(double.IsNaN)))
            return null;
        CollectiveModel model = new()
        {
            Positions = positions,
            IsPoint = (section.Find("shape") as TextSetting)?.Text == "point",
            Transitions = Transitions(section, wavelengths),
            Time = Duration.FromSeconds(section.Number(timeKey, 0)),
            Heralded = section.Flag("heralded"),
            Tolerance = section.Number("tolerance", DefaultTolerance),
        };
        return Fits(section, model) ? model : null;
    }

    /// <summary>In metres; all 1 where the file gives none, so that only ratios matter.</summary>
    private double[] Wavelengths(GroupSetting section) => PerTransition(section, "wavelength", 1) ?? [.. Enumerable.Repeat(1.0, emitters - 1)];

    private double[]? PerTransition(GroupSetting section, string key, double absent)
    {
        if (section.Find(key) is not ListSetting list)
            return [.. Enumerable.Repeat(section.Number(key, absent), Math.Max(emitters - 1, 1))];
        if (list.Items.Count == emitters - 1)
            return [.. list.Items.Cast<NumberSetting>().Select(n => n.Value)];
        findings.Add(ConditionsMessages.WrongCount(list.Spot, list.Path, list.Items.Count, emitters - 1, "transitions out of level 0"));
        return null;
    }

    private double[][]? Positions(GroupSetting section, double wavelength)
    {
        if (section.Find("positions") is not null && section.EntryOf("spacing") is { } needless)
            findings.Add(ConditionsMessages.Exclusive(needless.NameSpot, section.Path, "positions", "spacing"));
        if (section.Find("positions") is ListSetting list)
            return Explicit(section, list, wavelength);
        if (section.Find("shape") is not TextSetting shape)
            return null;
        if (shape.Text == "pair" && emitters != 2)
        {
            findings.Add(ConditionsMessages.PairOfTwo(shape.Spot, emitters));
            return null;
        }

        if (shape.Text == "point")
            return EmitterShape.Point(emitters).Positions;
        if (section.NumberOf("spacing") is not { } spacing)
        {
            findings.Add(ConditionsMessages.ShapeNeedsSpacing(section.Spot, section.Path, shape.Text));
            return null;
        }

        double distance = InWavelengths(section, spacing, wavelength);
        return (shape.Text == "ring" ? EmitterShape.Ring(emitters, distance) : EmitterShape.Chain(emitters, distance)).Positions;
    }

    private double[][]? Explicit(GroupSetting section, ListSetting list, double wavelength)
    {
        if (list.Items.Count == emitters)
            return [.. list.Items.Cast<ListSetting>().Select(p => p.Items.Cast<NumberSetting>().Select(c => InWavelengths(section, c, wavelength)).ToArray())];
        findings.Add(ConditionsMessages.WrongCount(list.Spot, list.Path, list.Items.Count, emitters, "emitters"));
        return null;
    }

    private double InWavelengths(GroupSetting section, NumberSetting length, double wavelength)
    {
        if (length.Dimension == Dimension.Wavelengths)
            return length.Value;
        if (section.Find("wavelength") is not null)
            return length.Value / wavelength;
        findings.Add(ConditionsMessages.WavelengthNeeded(length.Spot, length.Path));
        return double.NaN;
    }

    private TransitionModel[] Transitions(GroupSetting section, double[] wavelengths)
    {
        double[] linewidths = PerTransition(section, "linewidth", 0) ?? [.. wavelengths.Select(_ => 1.0)];
        double[][] dipoles = Dipoles(section);
        return [.. Enumerable.Range(0, emitters - 1).Select(j =>
            new TransitionModel(Rate.FromPerSecond(2 * Math.PI * linewidths[j]), wavelengths[j] / wavelengths[0], dipoles[j]))];
    }

    private double[][] Dipoles(GroupSetting section)
    {
        double[][] normal = [.. Enumerable.Range(0, emitters - 1).Select(_ => new double[] { 0, 0, 1 })];
        if (section.Find("dipoles") is not ListSetting list)
            return normal;
        if (list.Items.Count == emitters - 1)
            return [.. list.Items.Cast<ListSetting>().Select(v => v.Items.Cast<NumberSetting>().Select(c => c.Value).ToArray())];
        findings.Add(ConditionsMessages.WrongCount(list.Spot, list.Path, list.Items.Count, emitters - 1, "transitions out of level 0"));
        return normal;
    }

    private bool Fits(GroupSetting section, CollectiveModel model)
    {
        IReadOnlyList<Transition> transitions = CollectiveDecay.TransitionsOf(model);
        // wavelengths listed one by one are the lines themselves; one figure for all stands for nearly equal lines
        IEnumerable<GeometryFinding> degenerate = section.Find("wavelength") is ListSetting ? GeometryCheck.Degenerate(transitions) : [];
        GeometryFinding[] faults = [.. GeometryCheck.Of(CollectiveDecay.ShapeOf(model), transitions), .. degenerate];
        foreach (GeometryFinding fault in faults)
            findings.Add(Word(section, fault));
        return faults.Length == 0;
    }

    private static Diagnostics.Diagnostic Word(GroupSetting section, GeometryFinding fault) => fault.Kind switch
    {
        GeometryFault.Coinciding => ConditionsMessages.BadGeometry(
            section.Find("positions")?.Spot ?? section.Find("spacing")?.Spot ?? section.Spot,
            $"Emitters {fault.First + 1} and {fault.Second + 1} stand at one place, or so near that their exchange shift has no bound.",
            "move them apart, or take the shape `point`, the limit without exchange shifts"),
        GeometryFault.CoupledTransitions => ConditionsMessages.BadGeometry(
            section.Find("wavelength")?.Spot ?? section.Spot,
            $"Transitions {fault.First} and {fault.Second} have one wavelength and dipoles that are not orthogonal: they would couple to each other, which this model leaves out.",
            "give their wavelengths as they differ, or orthogonal dipoles"),
        GeometryFault.Dipole => ConditionsMessages.BadGeometry(
            section.Find("dipoles")?.Spot ?? section.Spot, $"The dipole of transition {fault.First} has length 0, so it has no direction.", "give it a direction such as [0, 0, 1]"),
        _ => ConditionsMessages.BadGeometry(section.Spot, "The geometry holds a number that is not finite or not positive.", "look at positions, linewidths and wavelengths"),
    };
}
