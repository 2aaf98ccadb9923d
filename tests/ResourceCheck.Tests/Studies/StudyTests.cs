using System.Xml.Linq;
using NJsonSchema;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Reports;
using ResourceCheck.Studies;
using ResourceCheck.Tests.Reports;
using Xunit;

namespace ResourceCheck.Tests.Studies;

public sealed class StudyTests
{
    private const string Odd = "50 % of <script>alert(1)</script> & a_b \\\\ \\\"c\\\"";

    private const string Script = """
        protocol "pair <b>&amp;_%"
        parties A, B
        resource antisymmetric on all
        checkpoint "after": fidelity with antisymmetric on A, B
        round "r"
          all measure level as v
        end
        success when distinct(v of all)
        goal "after" >= 0.8
        """;

    private const string Conditions = """{ "flight": { "length": "1 km", "speed": "2e8 m/s", "depolarising": "0.05(0.01)" }, "preparation": { "attempts": "1 kHz", "success": 0.5 } }""";

    private const string Whole = $$"""
        {
          "title": "{{Odd}}",
          "about": "about {{Odd}}",
          "parts": [
            {
              "title": "{{Odd}}", "script": "pair.protocol", "conditions": "pair.conditions.json", "uncertainty": true, "budget": true,
              "tolerances": [ { "vary": { "flight.depolarising": "0..0.5" } } ],
              "sweeps": [ { "vary": { "flight.depolarising": "0..0.5:3" } }, { "vary": { "flight.depolarising": "0..0.5:3", "flight.dephasing": "0..0.5:3" } } ]
            },
            { "script": "pair.protocol", "conditions": "pair.conditions.json", "copies": [ { "failure": 0.01 } ] }
          ]
        }
        """;

    [Fact]
    public void A_report_answers_in_the_order_of_a_referee_and_failures_do_not_stop_it()
    {
        StudyResult result = Compute(Whole);
        Assert.Equal(["copies for a failure of 0.01"], result.Parts[1].Failures.Select(f => f.What));
        Assert.Equal(["J012"], result.Parts[1].Failures[0].Findings.Select(f => f.Code));
        string html = StudyFiles.Of(result).Single(f => f.Name == "report.html").Text;
        string[] order = ["verdicts", "tolerances", "budget", "sensitivity", "rates", "curves", "timeline", "failures", "assumptions", "method", "references", "provenance"];
        int[] places = [.. order.Select(id => html.IndexOf($"<section id=\"{id}\"", StringComparison.Ordinal))];
        Assert.DoesNotContain(-1, places);
        Assert.Equal(places.Order(), places);
        // Depolarising p on each of two qubits leaves fidelity (1-p)² + (1 - (1-p)²)/4 of a singlet: 0.8 is met up to 1 - sqrt(11/15).
        Assert.Equal(1 - Math.Sqrt(11.0 / 15), result.Parts[0].Tolerances[0].Crossings.Single().Value, 1e-9);
    }

    [Fact]
    public void Text_from_inputs_is_escaped_everywhere()
    {
        IReadOnlyList<(string Name, string Text)> files = StudyFiles.Of(Compute(Whole));
        string html = files.Single(f => f.Name == "report.html").Text;
        Assert.DoesNotContain("<script>alert", html, StringComparison.Ordinal);
        Assert.Contains("50 % of &lt;script&gt;alert(1)&lt;/script&gt; &amp; a_b \\ &quot;c&quot;", html, StringComparison.Ordinal);
        Assert.DoesNotContain("pair <b>", html, StringComparison.Ordinal);
        Assert.DoesNotContain("//", html.Replace("http://www.w3.org/2000/svg", "", StringComparison.Ordinal), StringComparison.Ordinal); // nothing to fetch
        Assert.All(files.Where(f => f.Name.EndsWith(".svg", StringComparison.Ordinal)), f => XElement.Parse(f.Text));
        string latex = string.Concat(files.Where(f => f.Name.EndsWith(".tex", StringComparison.Ordinal)).Select(f => f.Text));
        Assert.Contains("50 \\% of \\textless{}script\\textgreater{}alert(1)\\textless{}/script\\textgreater{} \\& a\\_b \\textbackslash{} \\char34{}c\\char34{}", latex, StringComparison.Ordinal);
        string[] names = [.. files.Select(f => f.Name)];
        Assert.Equal(names.Length, names.Distinct().Count());
        Assert.All(names, n => Assert.Matches("^[a-z0-9./-]+$", n));
    }

    [Fact]
    public void The_same_study_gives_the_same_bytes() => Assert.Equal(StudyFiles.Of(Compute(Whole)), StudyFiles.Of(Compute(Whole)));

    [Theory]
    [InlineData("{ \"title\": 3, \"prts\": [] }", "J023 J024 J025")]
    [InlineData("[]", "J024")]
    [InlineData("{ \"parts\": [] }", "J025")]
    [InlineData("{ \"parts\": [ { \"script\": \"none.protocol\" }, { \"conditions\": \"none.json\", \"budget\": 1 } ] }", "J024 J025 U020 U020")]
    [InlineData("{ \"parts\": [ { \"script\": \"pair.protocol\", \"tolerances\": [ {}, { \"vary\": { \"a\": \"1..2\", \"b\": \"1..2\" } } ], \"copies\": [ { \"failure\": 2 }, 3 ] } ] }", "J024 J024 J025 J025")]
    [InlineData("{ \"parts\": [ { \"script\": \"pair.protocol\", } ] }", "C003")]
    public void All_mistakes_of_a_study_are_told_in_one_run(string text, string codes) =>
        Assert.Equal(codes, string.Join(' ', Read(text).Findings.Select(f => f.Code).Order(StringComparer.Ordinal)));

    [Fact]
    public void Mistakes_of_scripts_conditions_and_ranges_are_told_before_anything_is_computed()
    {
        Study study = Read(Whole.Replace("0..0.5:3\" } },", "0.5..0:3\" } },", StringComparison.Ordinal).Replace("\"budget\": true", "\"parameters\": { \"m\": 3 }", StringComparison.Ordinal)).Value!;
        Outcome<StudyResult> outcome = Judge.Study(new StudyRequest(study, null, null, 0, 1, TestContext.Current.CancellationToken));
        Assert.Equal(["J003", "P001"], outcome.Findings.Select(f => f.Code).Distinct().Order(StringComparer.Ordinal));
    }

    [Fact]
    public async Task The_shipped_study_fits_its_schema_and_can_be_read()
    {
        string folder = Path.Combine(Golden.Root, "protocols"), text = await File.ReadAllTextAsync(Path.Combine(folder, "winter.study.json"), TestContext.Current.CancellationToken);
        JsonSchema schema = await JsonSchema.FromJsonAsync(Schemas.Find("study")!, TestContext.Current.CancellationToken);
        Assert.Empty(schema.Validate(text));
        Assert.NotEmpty(schema.Validate(text.Replace("\"script\"", "\"scrpt\"", StringComparison.Ordinal)));
        Outcome<Study> study = StudyFile.Read(new InputText(Path.Combine(folder, "winter.study.json"), text, ""), (name, _) => new InputText(name, File.ReadAllText(name), ""));
        Assert.Empty(study.Findings);
        Assert.Equal(4, study.Value!.Parts.Count);
    }

    private static StudyResult Compute(string text)
    {
        Outcome<StudyResult> outcome = Judge.Study(new StudyRequest(Read(text).Value!, null, null, 0, 1, TestContext.Current.CancellationToken));
        Assert.Empty(outcome.Findings);
        return outcome.Value!;
    }

    private static Outcome<Study> Read(string text) => StudyFile.Read(new InputText("a.study.json", text, "0123"), (name, findings) =>
    {
        if (name is "pair.protocol" or "pair.conditions.json")
            return new InputText(name, name == "pair.protocol" ? Script : Conditions, "4567");
        findings.Add(new Diagnostic("U020", Severity.Error, $"There is no file {name}.", "check the name", Place.Of(name)));
        return null;
    });
}
