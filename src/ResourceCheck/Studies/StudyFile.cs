using System.Globalization;
using ResourceCheck.Conditions;
using ResourceCheck.Conditions.Json;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Scripts;

namespace ResourceCheck.Studies;

/// <summary>Reads study files: keys, kinds and ranges of values, and the files they name. All mistakes in one run.</summary>
public sealed class StudyFile
{
    private readonly Findings _findings = new();
    private readonly List<Diagnostic> _ofFiles = [];
    private readonly Func<string, List<Diagnostic>, InputText?> _read;
    private readonly string _folder;

    private StudyFile(string name, Func<string, List<Diagnostic>, InputText?> read)
    {
        _read = read;
        _folder = Path.GetDirectoryName(name) ?? "";
    }

    /// <summary>Reads a study.</summary>
    /// <param name="file">The study file as read.</param>
    /// <param name="read">Reads a file that the study names; adds to the findings what stands against it.</param>
    public static Outcome<Study> Read(InputText file, Func<string, List<Diagnostic>, InputText?> read)
    {
        StudyFile reader = new(file.Name, read);
        SourceText source = new(file.Name, file.Text.TrimStart('\uFEFF'));
        Node? root = JsonTree.Read(source, false, reader._findings);
        Study? study = root is null ? null : reader.StudyOf(root, file);
        IReadOnlyList<Diagnostic> findings = [.. reader._findings.InOrder(file.Name), .. reader._ofFiles];
        return study is null || findings.Any(f => f.Severity == Severity.Error) ? Outcome<Study>.Failed(findings) : Outcome<Study>.From(study, findings);
    }

    private Study? StudyOf(Node root, InputText file)
    {
        if (ObjectOf(root, "a study", StudyKeys.OfStudy) is not { } study)
            return null;
        StudyPart?[] parts = [.. Items(study, StudyKeys.Parts).Select(PartOf)];
        if (study.Find(StudyKeys.Parts) is not ArrayNode { Items.Count: > 0 })
            _findings.Add(StudyFileMessages.Missing(study.Spot, StudyKeys.Parts, "a list with at least one part"));
        string title = Text(study, StudyKeys.Title) ?? Path.GetFileNameWithoutExtension(file.Name);
        return new Study(title, Text(study, StudyKeys.About), new InputFile(file.Name, file.Sha256), [.. parts.OfType<StudyPart>()]);
    }

    private StudyPart? PartOf(Node node)
    {
        if (ObjectOf(node, "a part", StudyKeys.OfPart) is not { } part)
            return null;
        InputText? script = FileOf(part, StudyKeys.Script), conditions = FileOf(part, StudyKeys.Conditions);
        if (part.Find(StudyKeys.Script) is null)
            _findings.Add(StudyFileMessages.Missing(part.Spot, StudyKeys.Script, "the name of a script"));
        List<KeyValuePair<string, string>> set = Pairs(part, StudyKeys.Set), parameters = Pairs(part, StudyKeys.Parameters);
        StudyTolerance[] tolerances = [.. Items(part, StudyKeys.Tolerances).Select(ToleranceOf).OfType<StudyTolerance>()];
        var sweeps = Items(part, StudyKeys.Sweeps).Select(SweepOf).OfType<IReadOnlyList<KeyValuePair<string, string>>>().ToArray();
        StudyCopies[] copies = [.. Items(part, StudyKeys.Copies).Select(CopiesOf).OfType<StudyCopies>()];
        bool budget = Truth(part, StudyKeys.Budget), uncertainty = Truth(part, StudyKeys.Uncertainty);
        string? title = Text(part, StudyKeys.Title), about = Text(part, StudyKeys.About);
        return script is null ? null : new StudyPart
        {
            Title = title ?? Path.GetFileNameWithoutExtension(script.Name),
            About = about,
            Request = new RunRequest
            {
                Script = script,
                Conditions = conditions,
                Overrides = set,
                Parameters = parameters,
                Uncertainty = uncertainty ? new UncertaintyRequest(UncertaintyRequest.DefaultSamples) : null,
            },
            Budget = budget,
            Tolerances = tolerances,
            Sweeps = sweeps,
            Copies = copies,
        };
    }

    private StudyTolerance? ToleranceOf(Node node)
    {
        if (ObjectOf(node, "a tolerance", StudyKeys.OfTolerance) is not { } tolerance)
            return null;
        List<KeyValuePair<string, string>> vary = Varied(tolerance, 1);
        string? goal = Text(tolerance, StudyKeys.Goal);
        return vary.Count == 1 ? new StudyTolerance(vary[0].Key, vary[0].Value, goal) : null;
    }

    private IReadOnlyList<KeyValuePair<string, string>>? SweepOf(Node node) => ObjectOf(node, "a sweep", StudyKeys.OfSweep) is { } sweep && Varied(sweep, 2) is { Count: > 0 } vary ? vary : null;

    private StudyCopies? CopiesOf(Node node)
    {
        if (ObjectOf(node, "an entry of copies", StudyKeys.OfCopies) is not { } copies)
            return null;
        double? failure = Probability(copies, StudyKeys.Failure), harm = Probability(copies, StudyKeys.Harm);
        if (copies.Find(StudyKeys.Failure) is null)
            _findings.Add(StudyFileMessages.Missing(copies.Spot, StudyKeys.Failure, "a probability such as 1e-6"));
        List<KeyValuePair<string, string>> vary = copies.Find(StudyKeys.Vary) is null ? [] : Varied(copies, 1);
        return failure is { } target ? new StudyCopies(target, harm ?? target, vary) : null;
    }

    private List<KeyValuePair<string, string>> Varied(ObjectNode of, int most)
    {
        List<KeyValuePair<string, string>> vary = Pairs(of, StudyKeys.Vary);
        if (vary.Count == 0 || vary.Count > most)
            _findings.Add(StudyFileMessages.Missing(of.Find(StudyKeys.Vary)?.Spot ?? of.Spot, StudyKeys.Vary, most == 1 ? "one path and its range, such as {\"flight.default.length\": \"1 km..20 km\"}" : "one or two paths and their ranges, such as {\"flight.default.length\": \"1 km..20 km:20\"}"));
        return vary;
    }

    private InputText? FileOf(ObjectNode of, string key)
    {
        if (Text(of, key) is not { } name)
            return null;
        List<Diagnostic> findings = [];
        InputText? text = _read(Path.Combine(_folder, name), findings);
        _ofFiles.AddRange(findings.Select(f => f with { Place = of.Find(key)!.Spot.ToPlace() }));
        return text;
    }

    private ObjectNode? ObjectOf(Node node, string what, IReadOnlyList<string> keys)
    {
        if (node is not ObjectNode found)
        {
            _findings.Add(StudyFileMessages.WrongKind(node, what, "an object in braces"));
            return null;
        }

        foreach (Member member in found.Members.Where(m => !keys.Contains(m.Name)))
            _findings.Add(StudyFileMessages.UnknownKey(member.NameSpot, member.Name, what, keys));
        return found;
    }

    private IReadOnlyList<Node> Items(ObjectNode of, string key)
    {
        if (of.Find(key) is not (null or ArrayNode) and { } other)
            _findings.Add(StudyFileMessages.WrongKind(other, key, "a list in brackets"));
        return of.Find(key) is ArrayNode list ? list.Items : [];
    }

    private string? Text(ObjectNode of, string key)
    {
        if (of.Find(key) is not (null or TextNode) and { } other)
            _findings.Add(StudyFileMessages.WrongKind(other, key, "a text in quotes"));
        return (of.Find(key) as TextNode)?.Text;
    }

    private bool Truth(ObjectNode of, string key)
    {
        if (of.Find(key) is not (null or TruthNode) and { } other)
            _findings.Add(StudyFileMessages.WrongKind(other, key, "true or false"));
        return of.Find(key) is TruthNode { Truth: true };
    }

    private double? Probability(ObjectNode of, string key)
    {
        if (of.Find(key) is not { } node)
            return null;
        if (node is NumberNode number && double.Parse(number.Raw, NumberStyles.Float, CultureInfo.InvariantCulture) is > 0 and <= 1 and var value)
            return value;
        _findings.Add(StudyFileMessages.WrongKind(node, key, "a probability above 0 and up to 1"));
        return null;
    }

    /// <summary>An object of texts and numbers, as <c>--set</c> and <c>--parameter</c> take them.</summary>
    private List<KeyValuePair<string, string>> Pairs(ObjectNode of, string key)
    {
        if (of.Find(key) is not { } node)
            return [];
        if (node is not ObjectNode pairs)
        {
            _findings.Add(StudyFileMessages.WrongKind(node, key, "an object of names and values"));
            return [];
        }

        List<KeyValuePair<string, string>> read = [];
        foreach (Member member in pairs.Members)
        {
            if (member.Value is TextNode text)
                read.Add(new(member.Name, text.Text));
            else if (member.Value is NumberNode number)
                read.Add(new(member.Name, number.Raw));
            else
                _findings.Add(StudyFileMessages.WrongKind(member.Value, member.Name, "a text in quotes or a number"));
        }

        return read;
    }
}
