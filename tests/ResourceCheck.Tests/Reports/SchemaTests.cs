using System.Text.Json;
using NJsonSchema;
using ResourceCheck.Reports;
using Xunit;

namespace ResourceCheck.Tests.Reports;

public sealed class SchemaTests
{
    [Theory]
    [InlineData("run-full", "result")]
    [InlineData("run-bare", "result")]
    [InlineData("run-odd", "result")]
    [InlineData("run-uncertain", "result")]
    [InlineData("verification", "verification")]
    [InlineData("inspection", "inspection")]
    [InlineData("state", "state")]
    [InlineData("storage", "storage")]
    [InlineData("relaxation", "relaxation")]
    [InlineData("budget", "budget")]
    [InlineData("sweep", "sweep")]
    [InlineData("tolerance", "tolerance")]
    [InlineData("copies", "copies")]
    [InlineData("copies-table", "copies-table")]
    public async Task Documents_fit_their_published_schema(string name, string schema)
    {
        JsonSchema published = await JsonSchema.FromJsonAsync(Schemas.Find(schema)!, TestContext.Current.CancellationToken);
        Assert.Empty(published.Validate(GoldenReportTests.Write(name, ReportFormat.Json)));
    }

    [Theory]
    [InlineData("\"label\": \"exact\"", "\"label\": \"certain\"")]
    [InlineData("\"margin\"", "\"slack\"")]
    [InlineData("\"duration\": 6.4E-05", "\"duration\": \"64 us\"")]
    [InlineData("\"kind\": \"result\"", "\"kind\": \"verification\"")]
    public async Task The_schema_refuses_other_documents(string right, string wrong)
    {
        JsonSchema published = await JsonSchema.FromJsonAsync(Schemas.Find("result")!, TestContext.Current.CancellationToken);
        string document = GoldenReportTests.Write("run-full", ReportFormat.Json);
        Assert.Contains(right, document, StringComparison.Ordinal);
        Assert.NotEmpty(published.Validate(document.Replace(right, wrong, StringComparison.Ordinal)));
    }

    [Fact]
    public void The_built_in_schemas_are_the_files_of_the_docs()
    {
        foreach (string name in Schemas.Names.Where(n => n != "conditions"))
            Assert.Equal(File.ReadAllText(Path.Combine(Golden.Root, "docs", "schema", $"{name}.schema.json")), Schemas.Find(name));
        Assert.Null(Schemas.Find("results"));
    }

    [Fact]
    public void Numbers_round_trip_through_the_document()
    {
        using JsonDocument document = JsonDocument.Parse(GoldenReportTests.Write("run-full", ReportFormat.Json));
        JsonElement success = document.RootElement.GetProperty("cases")[0].GetProperty("metrics")[0];
        Assert.Equal(0.94123456789, success.GetProperty("value").GetDouble());
        JsonElement bound = document.RootElement.GetProperty("checkpoints")[3].GetProperty("fidelity");
        Assert.Equal(("at least", JsonValueKind.Null), (bound.GetProperty("side").GetString(), bound.GetProperty("high").ValueKind));
    }

    [Fact]
    public void A_number_that_is_none_is_null_with_a_reason()
    {
        using JsonDocument document = JsonDocument.Parse(GoldenReportTests.Write("run-odd", ReportFormat.Json));
        JsonElement[] metrics = [.. document.RootElement.GetProperty("cases")[0].GetProperty("metrics").EnumerateArray()];
        Assert.Equal((JsonValueKind.Null, "undefined"), (metrics[0].GetProperty("value").ValueKind, metrics[0].GetProperty("reason").GetString()));
        Assert.Equal("infinite", metrics[1].GetProperty("reason").GetString());
    }
}
