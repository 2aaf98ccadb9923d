using System.Text.Json;
using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using ResourceCheck.Conditions;
using ResourceCheck.Conditions.Keys;
using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Binding;
using Xunit;

namespace ResourceCheck.Tests.Conditions;

/// <summary>Whatever comes in, findings or a world come out.</summary>
public sealed class RobustnessTests
{
    private static readonly Protocol Valleys = TestProtocol.Of(["Ada", "Ben", "P[1]"], ["Eve"]);

    private static readonly string[] Names = [.. Every(KeyTable.Root).Distinct(), "default", "Ada", "P[1..4]", "Eve", "0-1", "1-3", "Ada-Ben", "1"];

    private static readonly string[] Scalars =
        ["0", "1", "2", "-1", "0.5", "1e-5", "1e999", "true", "null", "\"5 km\"", "\"80(10) us\"", "\"20 /s\"", "\"6 MHz\"", "\"2e8 m/s\"", "\"1 dB\"", "\"0.2 dB/km\"", "\"clock\"", "\"flip.json\"", "\"0,5\"", "\"\"", "\"\\ud800\"", "[0, 1]", "[[0.5, 0.5], [0.5, 0.5]]", "{}", "[]"];

    [Property(MaxTest = 2000)]
    public void Random_text_never_throws(string? text) => Handle(text ?? "", []);

    [Property(MaxTest = 1000)]
    public Property Random_trees_of_known_words_never_throw() => Prop.ForAll(Tree(5).ToArbitrary(), text => Handle(text, []));

    [Property(MaxTest = 2000)]
    public Property Random_overrides_never_throw() => Prop.ForAll(
        Gen.Elements(Names).ListOf(3).Zip(Gen.Elements(Scalars)).ToArbitrary(),
        pair => Handle("""{ "flight": { "default": { "dephasing": 0.1 } }, "levels": { "decay": [] } }""", [KeyValuePair.Create(string.Join('.', pair.Item1), pair.Item2)]));

    [Property(MaxTest = 1000)]
    public void Random_paths_never_throw(string? path, string? value) => Handle("{}", [KeyValuePair.Create(path ?? "", value ?? "")]);

    [Property(MaxTest = 300)]
    public Property Files_made_from_the_table_never_throw() => Prop.ForAll(RandomConditions.File.ToArbitrary(), file => Handle(file.ToString(), []));

    [Property(MaxTest = 1000)]
    public Property Damaged_files_never_throw() => Prop.ForAll(
        Tree(4).Zip(Gen.Choose(0, 400)).Zip(Gen.Elements('"', '{', '}', '[', ',', ':', '/', '\n', 'µ', '0')).ToArbitrary(),
        t => Handle(t.Item1.Item1.Insert(Math.Min(t.Item1.Item2, t.Item1.Item1.Length), t.Item2.ToString()), []));

    private static void Handle(string text, IReadOnlyList<KeyValuePair<string, string>> overrides)
    {
        Outcome<ConditionsDocument> read = ConditionsFile.Read(Path.Combine(ConditionsCase.Folder, "x.conditions.json"), text, overrides);
        Assert.Equal(read.Value is null, read.Findings.Any(f => f.Severity == Severity.Error));
        Assert.All(read.Findings, f => Assert.EndsWith($"({f.Code})", f.ToString(), StringComparison.Ordinal));
        if (read.Value is null)
            return;
        Outcome<World> bound = ConditionsFile.Bind(read.Value, Valleys);
        Assert.Equal(bound.Value is null, bound.Findings.Any(f => f.Severity == Severity.Error));
        Assert.All(bound.Value?.Parties ?? [], p => Assert.True(Finite(p.Flight.Dynamics) && Finite(p.Waiting.Dynamics) && double.IsFinite(p.Flight.Time.Seconds)));
    }

    private static bool Finite(LocalDynamics d) => d.Jumps.Cast<double>().Concat(d.Dephasing.Cast<double>()).Concat(d.Leakage).All(x => double.IsFinite(x) && x >= 0);

    private static Gen<string> Tree(int depth) => depth == 0
        ? Gen.Elements(Scalars)
        : Gen.OneOf(
            Gen.Elements(Scalars),
            Tree(depth - 1).ListOf(2).Select(items => $"[{string.Join(',', items)}]"),
            Gen.Elements(Names).Zip(Tree(depth - 1)).ListOf(3).Select(m => $"{{{string.Join(',', m.DistinctBy(p => p.Item1).Select(p => $"{JsonSerializer.Serialize(p.Item1)}:{p.Item2}"))}}}"));

    private static IEnumerable<string> Every(Shape shape) => shape switch
    {
        GroupShape group => group.Keys.SelectMany(k => Every(k.Shape).Prepend(k.Name)),
        PartyShape party => Every(party.Group),
        ListShape list => Every(list.Item),
        MapShape map => Every(map.Item),
        ChoiceShape choice => choice.Options.SelectMany(Every),
        _ => [],
    };
}
