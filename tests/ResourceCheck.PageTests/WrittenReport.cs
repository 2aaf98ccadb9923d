using ResourceCheck.Judgement;
using ResourceCheck.Studies;

namespace ResourceCheck.PageTests;

/// <summary>A small report with every kind of section, in a folder of its own. Titles hold signs that mean something to HTML, CSS and LaTeX.</summary>
public sealed class WrittenReport : IDisposable
{
    private const string Script = """
        protocol "pair <b>&amp;_% \ $x^2$ ~#{}"
        parties A, B
        resource antisymmetric on all
        checkpoint "after": fidelity with antisymmetric on A, B
        round "r"
          all measure level as v
        end
        success when distinct(v of all)
        goal "after" >= 0.8
        goal success >= 0.7
        """;

    private const string Conditions = """
        { "flight": { "length": "1 km", "speed": "2e8 m/s", "depolarising": "0.05(0.01)", "dephasing": 0.02 }, "detection": { "duration": "2 us", "efficiency": 0.9 },
          "preparation": { "attempts": "1 kHz", "success": 0.5 } }
        """;

    private const string Text = """
        {
          "title": "50 % of <script>alert(1)</script> & a_b \\ ~#{}$^", "about": "An invented pair.",
          "parts": [
            {
              "title": "[first] <i>_&%\\", "script": "s", "conditions": "c", "uncertainty": true, "budget": true,
              "tolerances": [ { "vary": { "flight.depolarising": "0..0.5" } } ],
              "sweeps": [ { "vary": { "flight.depolarising": "0..0.5:5" } }, { "vary": { "flight.depolarising": "0..0.5:4", "flight.dephasing": "0..0.5:4" } } ]
            },
            { "script": "s", "copies": [ { "failure": 0.01 } ] }
          ]
        }
        """;

    public WrittenReport()
    {
        StudyResult result = Judge.Study(new StudyRequest(StudyFile.Read(new InputText("pair.study.json", Text, "00"), Read).Value!, null, null, 0, 1, default)).Value!;
        foreach ((string name, string text) in StudyFiles.Of(result))
        {
            string path = Path.Combine(Folder, name);
            Directory.CreateDirectory(Path.GetDirectoryName(path)!);
            File.WriteAllText(path, text);
        }
    }

    /// <summary>Where it is.</summary>
    public string Folder { get; } = Directory.CreateTempSubdirectory("report").FullName;

    public void Dispose() => Directory.Delete(Folder, recursive: true);

    private static InputText? Read(string name, List<Diagnostics.Diagnostic> findings) => new(name, name == "s" ? Script : Conditions, "11");
}
