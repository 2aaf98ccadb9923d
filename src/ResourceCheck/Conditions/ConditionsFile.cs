using System.Security.Cryptography;
using System.Text;
using ResourceCheck.Conditions.Checks;
using ResourceCheck.Conditions.Json;
using ResourceCheck.Conditions.Keys;
using ResourceCheck.Conditions.Resolving;
using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Conditions;

/// <summary>The steps from a conditions file to the world of a protocol.</summary>
public static class ConditionsFile
{
    /// <summary>Reads a conditions file's text, overrides applied: form, units, ranges and everything that needs no protocol is checked. All mistakes in one run.</summary>
    /// <param name="name">File name as the user gave it; relative file names inside are resolved against its folder.</param>
    /// <param name="text">The file's content.</param>
    /// <param name="overrides">Pairs of path and value as given with <c>--set</c>; the value is JSON or a bare text such as <c>5 km</c>.</param>
    public static Outcome<ConditionsDocument> Read(string name, string text, IReadOnlyList<KeyValuePair<string, string>> overrides)
    {
        Findings findings = new();
        SourceText source = new(name, text.TrimStart('\uFEFF'));
        if (RootOf(source, findings) is not { } root)
            return Outcome<ConditionsDocument>.Failed(findings.InOrder(name));
        foreach ((string path, string value) in overrides)
            root = Overrides.Apply(root, path, value, findings);
        GroupSetting settings = new ShapeChecker(findings).CheckRoot(root);
        new ConsistencyChecker(findings).Check(settings);
        ConditionsDocument document = new()
        {
            Name = name,
            Sha256 = Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(text))),
            Overrides = [.. overrides],
            Uncertainties = [.. SettingWalk.NumbersOf(settings).Where(n => n.Uncertainty is not null).Select(n => new UncertainQuantity(n.Path, n.Value, n.Uncertainty!.Value) { Unit = n.UnitText, BaseUnit = UnitTable.BaseSymbolOf(n.Dimension) })],
            Root = settings,
            Matrices = new MatrixFiles(FolderOf(name), findings).ReadAll(settings),
        };
        return Outcome<ConditionsDocument>.From(document, findings.InOrder(name));
    }

    /// <summary>Resolves conditions for a protocol: parties, levels, complete positivity. Unknown parties and levels are errors.</summary>
    public static Outcome<World> Bind(ConditionsDocument document, Protocol protocol)
    {
        Findings findings = new();
        World world = new WorldBuilder(document, protocol, findings).Build();
        return Outcome<World>.From(world, findings.InOrder(document.Name));
    }

    /// <summary>The storage section for a number of emitters; a finding when there is none.</summary>
    public static Outcome<CollectiveModel> Storage(ConditionsDocument document, int emitters)
    {
        Findings findings = new();
        if (document.Root.Find("storage") is not GroupSetting storage)
            return Outcome<CollectiveModel>.Failed([ConditionsMessages.NoStorage(document.Name)]);
        CollectiveModel? model = new CollectiveBuilder(emitters, findings).Build(storage, "duration");
        return model is null || findings.HasErrors ? Outcome<CollectiveModel>.Failed(findings.InOrder(document.Name)) : Outcome<CollectiveModel>.Of(model);
    }

    /// <summary>The <c>resource.relaxed</c> section for a number of emitters; a finding when there is none.</summary>
    public static Outcome<RelaxedPreparation> Relaxation(ConditionsDocument document, int emitters)
    {
        Findings findings = new();
        if (document.Root.Find("resource") is not GroupSetting resource || resource.Find("relaxed") is not GroupSetting relaxed)
            return Outcome<RelaxedPreparation>.Failed([ConditionsMessages.NoRelaxation(document.Name)]);
        RelaxedPreparation? preparation = new ResourceBuilder(emitters, FolderOf(document.Name), findings).Relaxed(relaxed);
        return preparation is null || findings.HasErrors ? Outcome<RelaxedPreparation>.Failed(findings.InOrder(document.Name)) : Outcome<RelaxedPreparation>.Of(preparation);
    }

    /// <summary>The JSON schema of conditions files, as published.</summary>
    public static string Schema => SchemaWriter.Write(KeyTable.Root);

    private static ObjectNode? RootOf(SourceText source, Findings findings)
    {
        Node? node = JsonTree.Read(source, false, findings);
        if (node is not null and not ObjectNode)
            findings.Add(ConditionsMessages.RootNoObject(node));
        return node as ObjectNode;
    }

    /// <summary>The folder that relative names inside a file refer to; empty for the current one.</summary>
    internal static string FolderOf(string name) => Path.GetDirectoryName(name) ?? "";
}
