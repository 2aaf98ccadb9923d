using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Quantities;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Judgement;

/// <summary>One parameter assignment, ready to be evaluated.</summary>
/// <param name="Assignment">The parameters that were chosen; empty when all take their default.</param>
/// <param name="Protocol">The checked protocol.</param>
/// <param name="World">The world it runs in.</param>
/// <param name="Plan">Protocol and world on the clock.</param>
/// <param name="Matrices">The script's matrix files by name.</param>
internal sealed record Setting(
    IReadOnlyDictionary<string, Rational> Assignment, Protocol Protocol, World World, Plan Plan, IReadOnlyDictionary<string, Complex[,]> Matrices)
{
    /// <summary>The assignment in words, such as <c>n = 4, t = 1/3</c>; empty when nothing was chosen.</summary>
    public string Words => string.Join(", ", Assignment.Select(a => $"{a.Key} = {a.Value}"));

    /// <summary>Whether nothing bad happens to it anyway.</summary>
    public bool IsIdeal { get; private init; }

    /// <summary>The same protocol with nothing bad happening to it.</summary>
    public Setting Idealised()
    {
        World ideal = World.Ideal(Protocol.Parties.Count, Protocol.Levels);
        return this with { World = ideal, Plan = Planner.Lay(Protocol, ideal), IsIdeal = true };
    }

    /// <summary>Every combination of values of the private inputs; one empty one when there are none.</summary>
    public IEnumerable<IReadOnlyList<Value>> InputAssignments()
    {
        IEnumerable<IReadOnlyList<Value>> combinations = [[]];
        foreach (InputValues input in Protocol.Inputs)
            combinations = combinations.SelectMany(c => input.Values.Select(v => (IReadOnlyList<Value>)[.. c, v]));
        return combinations;
    }
}
