using System.Globalization;
using FsCheck;
using FsCheck.Fluent;
using Newtonsoft.Json.Linq;
using ResourceCheck.Conditions.Keys;
using ResourceCheck.Quantities;

namespace ResourceCheck.Tests.Conditions;

/// <summary>Random conditions files made from the table of keys: well formed by themselves, though what several keys say together may be wrong.</summary>
internal static class RandomConditions
{
    private static readonly string[] Parties = ["default", "Ada", "Ben", "P[1]", "P[2..4]"];

    /// <summary>A whole file.</summary>
    public static Gen<JObject> File { get; } = Group(KeyTable.Root, true).Select(g => (JObject)g);

    private static Gen<JToken> Of(Shape shape) => shape switch
    {
        GroupShape group => Group(group, true),
        PartyShape party => Gen.OneOf(Group(party.Group, true), Map(Gen.Constant("default"), Group(party.Group, true)), Map(Gen.Elements(Parties), Group(party.Group, true))),
        ListShape list => Gen.Choose(list.Least, Math.Min(list.Most, list.Least + 2)).SelectMany(n => Of(list.Item).ListOf(n)).Select(items => (JToken)new JArray(items.ToArray<object>())),
        MapShape map => Map(KeyOf(map.Keys), Of(map.Item)),
        ChoiceShape choice => Gen.OneOf(choice.Options.Select(Of)),
        QuantityShape quantity => Quantity(quantity),
        NumberShape number => Number(number.Bounds).Select(x => (JToken)x),
        LevelShape => Gen.Choose(0, 2).Select(x => (JToken)x),
        WordShape word => Gen.Elements(word.Words.ToArray()).Select(w => (JToken)w),
        FlagShape => Gen.Elements(true, false).Select(f => (JToken)f),
        TextShape { IsFile: true } => Gen.Elements("flip.json", "pauli-y.json").Select(f => (JToken)f),
        _ => Gen.Elements("winter", "Größe").Select(t => (JToken)t),
    };

    /// <summary>Each key with even odds, required ones always; of alternatives one is chosen.</summary>
    private static Gen<JToken> Group(GroupShape group, bool complete)
    {
        Key[] keys = [.. group.Keys];
        return Gen.Elements(true, false).ListOf(keys.Length).SelectMany(coins => Gen.Choose(0, 5).SelectMany(pick =>
        {
            HashSet<string> chosen = [.. keys.Where((k, i) => coins[i] || (complete && k.Required)).Select(k => k.Name)];
            foreach (Alternative alternative in group.Alternatives)
            {
                string[] open = [.. alternative.Names.Where(n => keys.Any(k => k.Name == n))];
                bool any = alternative.Required || open.Any(chosen.Contains);
                chosen.ExceptWith(open);
                if (any)
                    chosen.Add(open[pick % open.Length]);
            }

            return keys.Where(k => chosen.Contains(k.Name)).Aggregate(
                Gen.Constant(new JObject()),
                (so, key) => so.SelectMany(o => Of(key.Shape).Select(v => new JObject(o) { [key.Name] = v })));
        })).Select(o => (JToken)o);
    }

    private static Gen<JToken> Map(Gen<string> keys, Gen<JToken> values) =>
        Gen.Choose(0, 2).SelectMany(n => keys.Zip(values).ListOf(n)).Select(pairs => (JToken)new JObject(pairs.DistinctBy(p => p.Item1).Select(p => new JProperty(p.Item1, p.Item2))));

    private static Gen<string> KeyOf(MapKey kind) => kind switch
    {
        MapKey.Level => Gen.Elements("0", "1", "2"),
        MapKey.LevelPair => Gen.Elements("0-1", "1-2", "0-2"),
        MapKey.QuditPair => Gen.Elements("1-2", "2-3", "1-3"),
        _ => Gen.Elements("Ada-Ben", "Ben-P[1]"),
    };

    private static Gen<JToken> Quantity(QuantityShape shape) =>
        from number in Number(shape.Bounds)
        from unit in Gen.Elements(shape.Fits.SelectMany(UnitTable.SymbolsOf).ToArray())
        from uncertain in Gen.Elements("", "(3)")
        select (JToken)$"{number.ToString("0.###", CultureInfo.InvariantCulture)}{uncertain} {unit}";

    private static Gen<double> Number(Bounds bounds) => bounds switch
    {
        Bounds.Probability => Gen.Elements(0, 0.25, 1e-5, 1),
        Bounds.Positive => Gen.Elements(0.5, 1, 80, 2000),
        Bounds.NotNegative => Gen.Elements(0, 0.5, 3, 2000),
        _ => Gen.Elements(-2, 0, 0.5, 3),
    };
}
