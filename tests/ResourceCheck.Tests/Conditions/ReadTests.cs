using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using Xunit;

namespace ResourceCheck.Tests.Conditions;

public sealed class ReadTests
{
    [Fact]
    public void Uncertainties_are_kept_with_path_and_SI_value()
    {
        ConditionsDocument document = Read("""{ "levels": { "decay": [ { "from": 0, "to": 1, "lifetime": "80(10) us" } ] }, "detection": { "efficiency": "0.92(1)" } }""");
        Assert.Equal(["levels.decay[0].lifetime", "detection.efficiency"], document.Uncertainties.Select(u => u.Path));
        Assert.Equal([80e-6, 0.92], document.Uncertainties.Select(u => u.Value));
        Assert.Equal([10e-6, 0.01], document.Uncertainties.Select(u => u.StandardUncertainty));
    }

    [Fact]
    public void Numbers_are_listed_with_paths_that_set_takes_back()
    {
        const string text = """{ "flight": { "default": { "length": "2.5 km", "speed": "2e8 m/s" }, "P[2..3]": { "dephasing": 0.1 } }, "levels": { "coherence": { "0-1": "5 ms" } }, "detection": { "confusion": [[0.9, 0.1], [0.2, 0.8]] } }""";
        ConditionsDocument document = Read(text);
        Assert.Equal(
            ["flight.default.length", "flight.default.speed", "flight.P[2..3].dephasing", "levels.coherence.0-1", "detection.confusion[0][0]", "detection.confusion[0][1]", "detection.confusion[1][0]", "detection.confusion[1][1]"],
            document.Numbers.Select(n => n.Path));
        Assert.Equal(new NumericPath("flight.default.length", 2500, "m"), document.Numbers[0]);
        Assert.All(document.Numbers, number =>
        {
            ConditionsDocument again = Read(text, (number.Path, $"{number.Value:R} {number.Unit}"));
            Assert.Equal(document.Numbers, again.Numbers);
        });
    }

    [Fact]
    public void Overrides_replace_and_add_values()
    {
        const string text = """{ "levels": { "decay": [ { "from": 0, "to": 1, "lifetime": "100 us" } ] }, "flight": { "speed": "2e8 m/s", "length": "1 km" } }""";
        ConditionsDocument document = Read(text, ("levels.decay[0].lifetime", "5 us"), ("flight.Dov.length", "\"5 km\""), ("detection.efficiency", "0.9"), ("flight.P[3].dephasing", "0.1"));
        Assert.Equal(
            [("levels.decay[0].lifetime", 5e-6), ("flight.default.speed", 2e8), ("flight.default.length", 1000), ("flight.Dov.length", 5000), ("flight.P[3].dephasing", 0.1), ("detection.efficiency", 0.9)],
            document.Numbers.Select(n => (n.Path.Replace("flight.speed", "flight.default.speed").Replace("flight.length", "flight.default.length"), n.Value)));
        Assert.Equal(4, document.Overrides.Count);
    }

    [Fact]
    public void A_later_override_wins() =>
        Assert.Equal(3, Read("{}", ("resource.white", "0.1"), ("operations.overRotation", "2"), ("operations.overRotation", "3")).Numbers[^1].Value);

    [Fact]
    public void Hashes_are_of_the_bytes_before_overrides()
    {
        // SHA-256 of "{}": any implementation of FIPS 180-4 gives it
        Assert.Equal("44136fa355b3678a1146ad16f7e8649e94fb4fc21fe77e8310c060f61caaff8a", Read("{}", ("resource.white", "0.1")).Sha256);
    }

    [Fact]
    public void A_byte_order_mark_and_a_schema_address_are_let_pass() =>
        Assert.Empty(Read("\uFEFF{ \"$schema\": \"conditions.schema.json\", \"about\": \"Größe\" }").Numbers);

    [Fact]
    public void A_place_counts_characters_not_bytes()
    {
        Diagnostic finding = Assert.Single(Findings("{ \"about\": \"µµµ\", \"abuot\": 1 }"));
        Assert.Equal((1, 19), (finding.Place!.Line, finding.Place.Column));
    }

    [Fact]
    public void Nesting_beyond_need_is_one_error_at_any_depth()
    {
        Assert.Equal("C006", Assert.Single(Findings(string.Concat(Enumerable.Repeat("{\"a\":", 40)) + "1" + new string('}', 40))).Code);
        Assert.Equal("C006", Assert.Single(Findings(new string('[', 100000))).Code);
    }

    [Fact]
    public void Huge_texts_are_refused_unread() => Assert.Equal("C007", Assert.Single(Findings(new string(' ', (4 * 1024 * 1024) + 1))).Code);

    [Fact]
    public void Thousands_of_mistakes_end_with_a_count()
    {
        IReadOnlyList<Diagnostic> findings = Findings("{" + string.Join(',', Enumerable.Range(0, 5000).Select(i => $"\"x{i}\":1")) + "}");
        Assert.Equal(201, findings.Count);
        Assert.Contains(findings, f => f.Code == "C008");
    }

    [Fact]
    public void A_slip_that_removes_a_speed_does_not_also_count_as_a_missing_speed() =>
        Assert.Equal("C010", Assert.Single(Findings("""{ "flight": { "length": "2 km", "sped": "2e8 m/s" } }""")).Code);

    [Fact]
    public void Every_conditions_file_that_the_project_ships_is_read_without_a_finding()
    {
        string root = Path.Combine(ConditionsCase.Folder, "..", "..", "..", "..");
        string[] files = [.. Directory.GetFiles(Path.Combine(root, "protocols"), "*.conditions.json"), .. Directory.GetFiles(Path.Combine(root, "tests", "reference", "cases"), "*.conditions.json")];
        Assert.NotEmpty(files);
        Assert.All(files, file => Assert.Equal("", string.Join("\n", ConditionsFile.Read(file, File.ReadAllText(file), []).Findings)));
    }

    private static ConditionsDocument Read(string text, params (string Path, string Value)[] overrides)
    {
        Outcome<ConditionsDocument> outcome = ConditionsFile.Read("valley.conditions.json", text, [.. overrides.Select(o => KeyValuePair.Create(o.Path, o.Value))]);
        Assert.Equal("", string.Join("\n", outcome.Findings));
        return outcome.Value!;
    }

    private static IReadOnlyList<Diagnostic> Findings(string text)
    {
        Outcome<ConditionsDocument> outcome = ConditionsFile.Read("valley.conditions.json", text, []);
        Assert.Null(outcome.Value);
        return outcome.Findings;
    }
}
