using System.Text.Encodings.Web;
using System.Text.Json;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>Parts that several result documents share. Numbers round-trip; what is no finite number is null, with the reason beside it.</summary>
internal static class JsonParts
{
    /// <summary>Raised whenever a field changes its meaning or goes away; new fields alone do not raise it.</summary>
    public const int DocumentVersion = 1;

    // The relaxed encoder keeps µ and quotes readable; control characters stay escaped. Documents are files, not parts of a web page.
    private static readonly JsonWriterOptions Options =
        new() { Indented = true, NewLine = "\n", Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    /// <summary>Writes a whole document: an object that opens with its kind and versions.</summary>
    public static void WriteDocument(TextWriter writer, string kind, string version, Action<Utf8JsonWriter> content)
    {
        using MemoryStream bytes = new();
        using (Utf8JsonWriter json = new(bytes, Options))
        {
            json.WriteStartObject();
            json.WriteString("kind", kind);
            json.WriteNumber("documentVersion", DocumentVersion);
            json.WriteString("version", version);
            content(json);
            json.WriteEndObject();
        }

        writer.Write(System.Text.Encoding.UTF8.GetString(bytes.ToArray()) + "\n");
    }

    /// <summary>A named array.</summary>
    public static void Array<T>(Utf8JsonWriter json, string name, IEnumerable<T> items, Action<T> write)
    {
        json.WriteStartArray(name);
        foreach (T item in items)
            write(item);
        json.WriteEndArray();
    }

    /// <summary>A named array of objects.</summary>
    public static void Objects<T>(Utf8JsonWriter json, string name, IEnumerable<T> items, Action<T> writeFields) => Array(json, name, items, item =>
    {
        json.WriteStartObject();
        writeFields(item);
        json.WriteEndObject();
    });

    /// <summary>A named object.</summary>
    public static void Object(Utf8JsonWriter json, string name, Action writeFields)
    {
        json.WriteStartObject(name);
        writeFields();
        json.WriteEndObject();
    }

    /// <summary>A number, or null where there is none or it is not finite.</summary>
    public static void Number(Utf8JsonWriter json, string name, double? value)
    {
        if (value is { } number && double.IsFinite(number))
            json.WriteNumber(name, number);
        else
            json.WriteNull(name);
    }

    /// <summary>The fields of an estimate.</summary>
    public static void EstimateFields(Utf8JsonWriter json, Estimate estimate)
    {
        Number(json, "value", estimate.Value);
        if (!double.IsFinite(estimate.Value))
            json.WriteString("reason", FigureText.NonFinite(estimate.Value));
        json.WriteString("label", Truth.Name(estimate.Label));
        json.WriteString("side", Truth.Side(estimate));
        Number(json, "low", estimate.Low);
        Number(json, "high", estimate.High);
        Number(json, "confidence", estimate.Confidence);
        Number(json, "present", estimate.Present);
    }

    /// <summary>The script's name, hash and title.</summary>
    public static void Protocol(Utf8JsonWriter json, InputFile protocol, string title) => Object(json, "protocol", () =>
    {
        json.WriteString("name", protocol.Name);
        json.WriteString("sha256", protocol.Sha256);
        json.WriteString("title", title);
    });

    /// <summary>Conditions: name and hash are null when ideal.</summary>
    public static void Conditions(Utf8JsonWriter json, InputFile? conditions, IReadOnlyList<KeyValuePair<string, string>> overrides) => Object(json, "conditions", () =>
    {
        json.WriteString("name", conditions?.Name);
        json.WriteString("sha256", conditions?.Sha256);
        Objects(json, "overrides", overrides, o =>
        {
            json.WriteString("path", o.Key);
            json.WriteString("value", o.Value);
        });
    });

    /// <summary>Engine, reason and cost.</summary>
    public static void Engine(Utf8JsonWriter json, EngineChoice engine) => Object(json, "engine", () =>
    {
        json.WriteString("name", engine.Name);
        json.WriteString("reason", engine.Reason);
        Number(json, "memoryBytes", engine.MemoryBytes);
        Number(json, "multiplications", engine.Work);
    });

    /// <summary>The fields of what a study varies.</summary>
    public static void Varied(Utf8JsonWriter json, Judgement.Studies.Variation varied)
    {
        json.WriteString("path", varied.Path);
        json.WriteString("unit", varied.Unit);
        Number(json, "from", varied.From);
        Number(json, "to", varied.To);
        json.WriteBoolean("logarithmic", varied.IsLogarithmic);
    }

    /// <summary>Parameters and the values used.</summary>
    public static void Parameters(Utf8JsonWriter json, IReadOnlyList<ParameterUse> parameters) => Objects(json, "parameters", parameters, p =>
    {
        json.WriteString("name", p.Name);
        Array(json, "values", p.Values, json.WriteStringValue);
        json.WriteBoolean("default", p.IsDefault);
    });

    /// <summary>Histories of outcomes.</summary>
    public static void Branches(Utf8JsonWriter json, string name, IReadOnlyList<BranchEvaluation> branches) => Objects(json, name, branches, b =>
    {
        Objects(json, "outcomes", b.Outcomes, o =>
        {
            json.WriteString("name", o.Key);
            json.WriteString("value", o.Value);
        });
        Number(json, "probability", b.Probability);
        Number(json, "fidelity", b.Fidelity);
    });

    /// <summary>The schedule, times in seconds.</summary>
    public static void Timeline(Utf8JsonWriter json, IReadOnlyList<ScheduleLine> lines) => Objects(json, "timeline", lines, l =>
    {
        Number(json, "start", l.Start);
        Number(json, "end", l.End);
        json.WriteString("party", l.Party);
        json.WriteString("kind", InspectReport.Name(l.Kind));
        json.WriteString("text", l.Text);
        json.WriteString("to", l.To);
    });

    /// <summary>Warnings and notes.</summary>
    public static void Warnings(Utf8JsonWriter json, IReadOnlyList<Diagnostic> warnings) => Objects(json, "warnings", warnings, w =>
    {
        json.WriteString("code", w.Code);
        json.WriteString("severity", w.Severity == Severity.Warning ? "warning" : w.Severity == Severity.Note ? "note" : "error");
        json.WriteString("message", w.Message);
        json.WriteString("cure", w.Cure);
        json.WriteString("place", w.Place is not { } place ? null : place.Line == 0 ? place.File : FormattableString.Invariant($"{place.File}:{place.Line}:{place.Column}"));
    });
}
