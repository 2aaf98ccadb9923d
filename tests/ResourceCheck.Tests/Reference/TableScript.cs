using System.Globalization;

namespace ResourceCheck.Tests.Reference;

/// <summary>The script whose figure a table row tabulates, and which figure that is.</summary>
internal static class TableScript
{
    public const string Figure = "figure";

    /// <summary>Script text; the figure is the report or checkpoint "figure", or the yield.</summary>
    public static string Of(TableRow row) => Head(row) + row.Kind switch
    {
        "fidelity" => Checkpoint("all"),
        "prepared-fidelity" => Checkpoint("all"),
        "removal" => Removal(row) + Checkpoint($"P[1..{row.N - 1}]"),
        "probability" => Removal(row),
        "pair" => Chain(row.N, keep: false) + Checkpoint("P[1], P[2]"),
        "leak-probability" or "pair-without-leaks" => Chain(row.N, keep: true) + Checkpoint("P[1], P[2]"),
        "bell" => (row.N > 2 ? Chain(row.N, keep: false) : "") + "checkpoint \"end\": fidelity with antisymmetric on P[1], P[2]\n" + Report("bellvalue(P[1], P[2])"),
        "same-value" => Chain(row.N, keep: false) + Pair(row.Name.EndsWith("level", StringComparison.Ordinal) ? "level" : "fourier on 2") + Report("probability(same(v of P[1], P[2]))"),
        "key-fraction" => (row.N > 2 ? Chain(row.N, keep: false) : "") + KeyFraction,
        "symbol-error" when row.Parameters.ContainsKey("victim") => Sharing(row) + Report(SymbolError(row.N)),
        "symbol-error" => Sharing(row) + Report(SymbolError(row.N)),
        "yield" => Sharing(row),
        "guess-dealer" => Sharing(row) + Report($"guess(P[1].v from {Group(row)})"),
        "information-dealer" => Sharing(row) + Report($"information(P[1].v; {Group(row)})"),
        "guess-victim-by-outsider" => Sharing(row, sift: false) + Report($"guess(P[{Victim(row)}].v from Eve.e, Eve.g, P[{Victim(row)}].b)"),
        _ => Measured(row) + Report(OfOutcomes(row)),
    } + "success when true\n";

    private static string Head(TableRow row)
    {
        string outsider = row.Parameters.ContainsKey("victim") ? "outsider Eve\n" : "";
        return $"protocol \"row\"\nparties P[1..{row.N}]\n{outsider}resource antisymmetric on all\n";
    }

    private static string Checkpoint(string parties) => $"checkpoint \"{Figure}\": fidelity with antisymmetric on {parties}\n";

    private static string Report(string expression) => $"report \"{Figure}\" = {expression}\n";

    private static string Basis(string name) => name.StartsWith("phased-", StringComparison.Ordinal) ? $"phased({name[7..]})" : name;

    private static string Removal(TableRow row)
    {
        string basis = Basis(row.Parameters["basis"]), others = $"P[1..{row.N - 1}]";
        string keep = row.Name switch { "removal-sees-0" => "keep when k = 0\n", "removal-sees-other" => "keep when k != 0\n", _ => "" };
        return $"round \"leave\"\nP[{row.N}] measures {basis} as k\nP[{row.N}] announces k\n{others} apply complement({basis}, k)\n{others} wait 1 s\nend\n{keep}";
    }

    private static string Chain(int n, bool keep) =>
        $"for m from {n} down to 3\nround \"leave\"\nP[m] measures fourier on m as k\nP[m] announces k\nP[1..m-1] apply complement(fourier on m, k)\nend\n{(keep ? "keep when k < m\n" : "")}end\n";

    private static string Pair(string basis) => $"round \"use\"\nP[1], P[2] measure {basis} as v\nend\n";

    private const string KeyFraction = """
        round "use"
        P[1], P[2] pick b from level, fourier on 2
        P[1], P[2] measure b as v
        P[1], P[2] announce b
        end
        keep when same(b of P[1], P[2])
        report "figure" = 1 - entropy(probability(P[1].v = P[2].v given P[1].b = level)) - entropy(probability(P[1].v = P[2].v given P[1].b = fourier on 2))

        """;

    private static string Victim(TableRow row) => (int.Parse(row.Parameters["victim"], CultureInfo.InvariantCulture) + 1).ToString(CultureInfo.InvariantCulture);

    private static string Sharing(TableRow row, bool sift = true)
    {
        string eve = row.Parameters.ContainsKey("victim") ? $"Eve picks e from level, fourier\nEve intercepts P[{Victim(row)}] in e as g\n" : "";
        return $"round \"share\"\n{eve}all pick b from level, fourier\nall measure b as v\nall announce b\nend\n{(sift ? "keep when same(b of all)\n" : "")}";
    }

    private static string SymbolError(int n) => $"probability(P[1].v != missing(v of P[2..{n}]))";

    private static string Group(TableRow row)
    {
        int size = row.Name.Split('-') is [.., var k, "of", _] ? int.Parse(k, CultureInfo.InvariantCulture) : 0;
        return string.Join(", ", Enumerable.Range(2, size).Select(p => $"P[{p}].v"));
    }

    private static string Measured(TableRow row) => $"round \"read\"\nall measure {Basis(row.Parameters["basis"])} as v\nend\n";

    private static string OfOutcomes(TableRow row) => row.Kind switch
    {
        "all-distinct" => "probability(distinct(v of all))",
        "one-leader" => "probability(count(v = 0 over all) = 1)",
        "first-leads" => "probability(P[1].v = 0)",
        "guess-first-from-second" => "guess(P[1].v from P[2].v)",
        "seen" => "1",
        _ => throw new InvalidOperationException($"No script for {row.Kind}."),
    };
}
