using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using Newtonsoft.Json.Linq;
using NJsonSchema;
using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using Xunit;

namespace ResourceCheck.Tests.Conditions;

/// <summary>The published schema against the reader: what one refuses by form, the other refuses.</summary>
public sealed class SchemaTests
{
    private static readonly JsonSchema Schema = JsonSchema.FromJsonAsync(ConditionsFile.Schema).GetAwaiter().GetResult();

    [Fact]
    public void The_published_file_is_what_the_program_prints() =>
        Assert.Equal(File.ReadAllText(Path.Combine(ConditionsCase.Folder, "..", "..", "..", "..", "docs", "schema", "conditions.schema.json")), ConditionsFile.Schema);

    [Theory]
    [InlineData("{}")]
    [InlineData("""{ "$schema": "conditions.schema.json", "about": "Winter" }""")]
    [InlineData("""{ "flight": { "length": "2 km", "speed": "2e8 m/s", "transmission": [1, 0.8] } }""")]
    [InlineData("""{ "flight": { "default": { "speed": "2e8 m/s" }, "P[2..3]": { "length": "2(1) km", "rotation": { "generator": "clock", "angle": "1 rad" } } } }""")]
    [InlineData("""{ "flight": { "default": { "rotation": { "generator": "clock", "angle": 1 } }, "Dov": { "rotation": { "angle": "3 mrad" } } } }""")]
    [InlineData("""{ "waiting": { "coherence": { "0-1": "5 ms" }, "dephasingTime": { "1-2": "5 ms" }, "thermal": { "levels": [0, 1], "rate": "3 /s", "ratio": 0.1 } } }""")]
    [InlineData("""{ "levels": { "decay": [ { "from": 0, "lifetime": "5 µs", "branching": { "1": 0.5, "2": 0.5 } } ] } }""")]
    [InlineData("""{ "detection": { "confusion": [[1, 0], [0, 1]], "efficiency": "0.92(1)" } }""")]
    [InlineData("""{ "resource": { "exchange": { "phaseError": -0.1, "couplings": { "1-2": 0.9 } }, "levels": [1, 0] } }""")]
    public void What_the_reader_takes_the_schema_takes(string text)
    {
        Assert.Empty(ConditionsFile.Read("x.conditions.json", text, []).Findings);
        Assert.Empty(Schema.Validate(text));
    }

    [Theory]
    [InlineData("""{ "flihgt": {} }""")]
    [InlineData("""{ "about": 3 }""")]
    [InlineData("""{ "storage": {} }""")]
    [InlineData("""{ "resource": { "white": 1.2 } }""")]
    [InlineData("""{ "resource": { "white": null } }""")]
    [InlineData("""{ "resource": { "file": "a.npy", "exchange": {} } }""")]
    [InlineData("""{ "resource": { "levels": [0.5, 1] } }""")]
    [InlineData("""{ "operations": { "duration": 2 } }""")]
    [InlineData("""{ "operations": { "duration": "2 km" } }""")]
    [InlineData("""{ "operations": { "duration": "-2 us" } }""")]
    [InlineData("""{ "operations": { "duration": "0,5 us" } }""")]
    [InlineData("""{ "waiting": { "depolarisingRate": "20 Hz" } }""")]
    [InlineData("""{ "flight": { "lenght": "2 km" } }""")]
    [InlineData("""{ "flight": { "default": { "lenght": "2 km" } } }""")]
    [InlineData("""{ "flight": { "default": {}, "dephasing": 0.1 } }""")]
    [InlineData("""{ "flight": { "Dov": 3 } }""")]
    [InlineData("""{ "flight": { "time": "1 us", "speed": "2e8 m/s" } }""")]
    [InlineData("""{ "flight": { "rotation": { "generator": "clok", "angle": 1 } } }""")]
    [InlineData("""{ "levels": { "decay": [ { "to": 1, "lifetime": "5 us" } ] } }""")]
    [InlineData("""{ "levels": { "coherence": { "0:1": "5 ms" } } }""")]
    [InlineData("""{ "preparation": { "success": 0.1 } }""")]
    public void What_the_reader_refuses_by_form_the_schema_refuses(string text)
    {
        Assert.NotEmpty(ConditionsFile.Read("x.conditions.json", text, []).Findings);
        Assert.NotEmpty(Schema.Validate(text));
    }

    [Property(MaxTest = 150)]
    public Property Files_made_from_the_table_fit_the_schema_and_are_refused_only_for_what_keys_say_together() => Prop.ForAll(RandomConditions.File.ToArbitrary(), file =>
    {
        Assert.Empty(Schema.Validate(file));
        Outcome<ConditionsDocument> read = ConditionsFile.Read(Path.Combine(ConditionsCase.Folder, "x.conditions.json"), file.ToString(), []);
        Assert.All(read.Findings, f => Assert.True(string.CompareOrdinal(f.Code, "C030") >= 0 && string.CompareOrdinal(f.Code, "C050") < 0, f.ToString()));
    });

    [Property(MaxTest = 300)]
    public Property A_key_that_no_table_has_is_refused_by_both_wherever_it_stands() => Prop.ForAll(RandomConditions.File.Zip(Gen.Choose(0, 1000)).ToArbitrary(), pair =>
    {
        JObject file = (JObject)pair.Item1.DeepClone();
        JObject[] groups = [file, .. file.Descendants().OfType<JObject>()];
        groups[pair.Item2 % groups.Length]["qqqqqq-"] = "x";
        Assert.NotEmpty(Schema.Validate(file));
        Assert.Null(ConditionsFile.Read(Path.Combine(ConditionsCase.Folder, "x.conditions.json"), file.ToString(), []).Value);
    });
}
