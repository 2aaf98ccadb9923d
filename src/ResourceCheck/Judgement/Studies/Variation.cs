using System.Globalization;
using System.Text.RegularExpressions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts;

namespace ResourceCheck.Judgement.Studies;

/// <summary>A conditions path or script parameter and the values it is to take.</summary>
/// <param name="Path">Path or name.</param>
/// <param name="IsParameter">Whether it is a parameter of the script.</param>
/// <param name="From">First value, in the unit.</param>
/// <param name="To">Last value.</param>
/// <param name="Unit">Unit as written; empty for plain numbers.</param>
/// <param name="Count">Number of values; null when none was asked for.</param>
/// <param name="IsLogarithmic">Whether values are spaced evenly in their logarithms.</param>
/// <param name="WholeOnly">Whether only whole numbers are allowed.</param>
public sealed partial record Variation(string Path, bool IsParameter, double From, double To, string Unit, int? Count, bool IsLogarithmic, bool WholeOnly)
{
    /// <summary>Points of a sweep when no number is given.</summary>
    private const int DefaultCount = 11;

    /// <summary>More points than this along one path make no curve any smoother.</summary>
    public const int MostPoints = 100_000;

    /// <summary>The values, ends included.</summary>
    public IReadOnlyList<double> Values
    {
        get
        {
            if (WholeOnly && Count is null)
                return [.. Enumerable.Range((int)Math.Ceiling(From), Math.Max(0, (int)Math.Floor(To) - (int)Math.Ceiling(From) + 1)).Select(v => (double)v)];
            int count = Count ?? DefaultCount;
            IEnumerable<double> values = Enumerable.Range(0, count).Select(i => At(count == 1 ? 0 : (double)i / (count - 1)));
            return WholeOnly ? [.. values.Select(v => Math.Round(v)).Distinct()] : [.. values];
        }
    }

    /// <summary>The value at a fraction of the way; the ends come out as written.</summary>
    public double At(double fraction) => fraction switch
    {
        0 => From,
        1 => To,
        _ => IsLogarithmic ? From * Math.Pow(To / From, fraction) : From + (fraction * (To - From)),
    };

    /// <summary>A value as a conditions file or <c>--parameter</c> takes it.</summary>
    public string Text(double value)
    {
        string number = IsParameter ? ((decimal)value).ToString(CultureInfo.InvariantCulture) : value.ToString("R", CultureInfo.InvariantCulture);
        return Unit.Length == 0 ? number : $"{number} {Unit}";
    }

    /// <summary>The request with the value put in.</summary>
    public RunRequest Into(RunRequest request, double value) => IsParameter
        ? request with { Parameters = [.. request.Parameters.Where(p => p.Key != Path), new(Path, Text(value))] }
        : request with { Overrides = [.. request.Overrides.Where(o => o.Key != Path), new(Path, Text(value))] };

    /// <summary>Reads <c>FROM..TO</c>, with <c>:COUNT</c> or <c>:log COUNT</c> behind it.</summary>
    /// <param name="path">Path or parameter.</param>
    /// <param name="text">The range.</param>
    /// <param name="parameters">Parameters of the script.</param>
    public static Outcome<Variation> Read(string path, string text, IReadOnlyList<ParameterInfo> parameters)
    {
        Match match = Form().Match(text);
        if (!match.Success)
            return Failed(StudyMessages.UnreadableRange(path, text));
        string unit = match.Groups["unit"].Value.Trim(), other = match.Groups["unit0"].Value.Trim();
        if (other.Length > 0 && unit.Length > 0 && other != unit)
            return Failed(StudyMessages.TwoUnits(path, other, unit));
        double from = Number(match.Groups["from"]), to = Number(match.Groups["to"]);
        bool log = match.Groups["log"].Success;
        if (!(from < to) || !double.IsFinite(from) || !double.IsFinite(to))
            return Failed(StudyMessages.EmptyRange(path, text));
        if (log && from <= 0)
            return Failed(StudyMessages.NoLogarithm(path, text));
        int? count = match.Groups["count"].Success ? (int)Math.Min(int.MaxValue, Number(match.Groups["count"])) : null;
        if (count is < 2 or > MostPoints)
            return Failed(StudyMessages.TooManyPoints(path, count.Value, MostPoints));
        ParameterInfo? parameter = parameters.FirstOrDefault(p => p.Name == path);
        Variation variation = new(path, parameter is not null, from, to, unit.Length > 0 ? unit : other, count, log, parameter?.Values is not null);
        return variation.Values.Count is 0 or > MostPoints ? Failed(StudyMessages.TooManyPoints(path, variation.Values.Count, MostPoints)) : Outcome<Variation>.Of(variation);
    }

    private static Outcome<Variation> Failed(Diagnostic finding) => Outcome<Variation>.Failed([finding]);

    private static double Number(Group group) => double.Parse(group.Value, NumberStyles.Float, CultureInfo.InvariantCulture);

    [GeneratedRegex(@"^\s*(?<from>[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?)\s*(?<unit0>[^\d.:+\-\s][^:.]*)?\s*\.\.\s*(?<to>[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?)\s*(?<unit>[^\d.:+\-\s][^:]*)?\s*(:\s*(?<log>log)?\s*(?<count>\d{1,9})\s*)?$", RegexOptions.CultureInvariant)]
    private static partial Regex Form();
}
