using System.Globalization;
using System.Text;

namespace ResourceCheck.Reports;

/// <summary>Text and numbers in LaTeX.</summary>
internal static class LatexText
{
    private const char LastLatin = '\u00ff';

    private static readonly Dictionary<string, string> Units = new()
    {
        ["s"] = "\\second",
        ["ms"] = "\\milli\\second",
        ["us"] = "\\micro\\second",
        ["ns"] = "\\nano\\second",
        ["ps"] = "\\pico\\second",
        ["min"] = "\\minute",
        ["h"] = "\\hour",
        ["d"] = "\\day",
        ["/s"] = "\\per\\second",
        ["B"] = "\\byte",
        ["kB"] = "\\kilo\\byte",
        ["MB"] = "\\mega\\byte",
        ["GB"] = "\\giga\\byte",
        ["TB"] = "\\tera\\byte",
        ["Hz"] = "\\hertz",
        ["km"] = "\\kilo\\metre",
        ["m"] = "\\metre",
    };

    /// <summary>A text with every sign that means something to LaTeX spelled out.</summary>
    public static string Escape(string text)
    {
        StringBuilder escaped = new();
        foreach (char c in Visible.InLine(text))
            escaped.Append(Sign(c));
        return escaped.ToString();
    }

    /// <summary>A number, or a number and a unit, as people read it, in siunitx; anything else as text.</summary>
    public static string Quantity(string shown)
    {
        string[] parts = shown.Split(' ');
        if (!double.TryParse(parts[0], NumberStyles.Float, CultureInfo.InvariantCulture, out double value) || !double.IsFinite(value))
            return Escape(shown);
        return parts.Length == 1 ? $"\\num{{{parts[0]}}}"
            : parts.Length == 2 && Units.TryGetValue(parts[1], out string? unit) ? $"\\qty{{{parts[0]}}}{{{unit}}}"
            : $"\\num{{{parts[0]}}} {Escape(string.Join(' ', parts[1..]))}";
    }

    private static string Sign(char c) => c switch
    {
        '\\' => "\\textbackslash{}",
        '{' or '}' or '$' or '&' or '#' or '%' or '_' => $"\\{c}",
        '~' => "\\textasciitilde{}",
        '^' => "\\textasciicircum{}",
        '<' => "\\textless{}",
        '>' => "\\textgreater{}",
        '|' => "\\textbar{}",
        '"' => "\\char34{}",
        '[' or ']' => $"{{{c}}}", // else a row that begins with one would be read as an option of the row before
        '-' => "{-}", // else two of them would join to a dash
        '…' => "\\ldots{}",
        'Γ' => "$\\Gamma$",
        '√' => "$\\surd$",
        '−' => "$-$",
        > LastLatin => string.Create(CultureInfo.InvariantCulture, $"\\texttt{{U+{(int)c:X4}}}"),
        _ => c.ToString(),
    };
}
