using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using System.Text.Json;
using ResourceCheck.Engines;

namespace ResourceCheck.Judgement.Studies;

/// <summary>
/// Finished points of a sweep, a line each, on the disk before the next is begun to be told. A line that an interruption cut short is
/// left out when the file is read again.
/// </summary>
internal sealed class SweepJournal : IDisposable
{
    private readonly FileStream _file;
    private readonly Lock _lock = new();

    private SweepJournal(FileStream file, IReadOnlyDictionary<int, SweepPoint> finished)
    {
        _file = file;
        Finished = finished;
    }

    /// <summary>Points found in the file, by index.</summary>
    public IReadOnlyDictionary<int, SweepPoint> Finished { get; }

    /// <summary>What a sweep is told apart by: everything that its points depend on.</summary>
    public static string Identity(RunRequest request, IEnumerable<Variation> varied)
    {
        string all = string.Join('\n', new[] { Provenance.Version, request.Script.Sha256, request.Script.Text, request.Conditions?.Sha256, request.Conditions?.Text, request.Engine, request.Uncertainty is null ? null : "with uncertainties" }
            .Concat(request.Overrides.Concat(request.Parameters).Select(p => $"{p.Key}={p.Value}")).Concat(varied.Select(v => v.ToString())));
        return Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(all)));
    }

    /// <summary>Opens a journal, new or begun; null when it belongs to another sweep. Errors of the file system go through.</summary>
    public static SweepJournal? Open(string name, string identity)
    {
        FileStream file = new(name, FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.Read);
        try
        {
            using StreamReader reader = new(file, Encoding.UTF8, false, leaveOpen: true);
            string text = reader.ReadToEnd();
            string[] lines = text[..(text.LastIndexOf('\n') + 1)].Split('\n', StringSplitOptions.RemoveEmptyEntries);
            if (lines.Length > 0 && lines[0] != identity)
            {
                file.Dispose();
                return null;
            }

            file.SetLength(Encoding.UTF8.GetByteCount(string.Concat(lines.Select(l => l + "\n"))));
            file.Seek(0, SeekOrigin.End);
            SweepJournal journal = new(file, lines.Skip(1).Select(Read).ToDictionary(p => p.Index, p => p.Point));
            if (lines.Length == 0)
                journal.Write(identity);
            return journal;
        }
        catch
        {
            file.Dispose();
            throw;
        }
    }

    /// <summary>Adds a point; it is on the disk when this returns.</summary>
    public void Add(int index, SweepPoint point) => Write(JsonSerializer.Serialize(new Line(
        index,
        [.. point.Values.Select(Exact)],
        [.. point.Figures.Select(f => new Entry(f.Key, Exact(f.Value.Value), f.Value.Label, Exact(f.Value.Low), Exact(f.Value.High), Exact(f.Value.Confidence), Exact(f.Value.Present)))],
        point.GoalsMet,
        point.Failure,
        [.. point.Bands.Select(b => new BandEntry(b.Name, Exact(b.StandardUncertainty), Exact(b.Low), Exact(b.High)))],
        point.Undecided)));

    public void Dispose() => _file.Dispose();

    private static (int Index, SweepPoint Point) Read(string text)
    {
        Line line = JsonSerializer.Deserialize<Line>(text) ?? throw new IOException("a line of it is empty");
        return (line.Index, new SweepPoint(
            [.. line.Values.Select(Number)],
            [.. line.Figures.Select(f => KeyValuePair.Create(f.Name, new Estimate(Number(f.Value), f.Label, Number(f.Low), Number(f.High), Number(f.Confidence), Number(f.Present))))],
            line.GoalsMet,
            line.Failure)
        {
            Bands = [.. (line.Bands ?? []).Select(b => new PointBand(b.Name, Number(b.StandardUncertainty), Number(b.Low), Number(b.High)))],
            Undecided = line.Undecided,
        });
    }

    private void Write(string line)
    {
        lock (_lock)
        {
            _file.Write(Encoding.UTF8.GetBytes(line + "\n"));
            _file.Flush(flushToDisk: true);
        }
    }

    // Texts carry every number, infinities included.
    private static string Exact(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    private static double Number(string text) => double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);

    private sealed record Line(int Index, string[] Values, Entry[] Figures, bool? GoalsMet, string? Failure, BandEntry[]? Bands, bool Undecided);

    private sealed record BandEntry(string Name, string StandardUncertainty, string Low, string High);

    private sealed record Entry(string Name, string Value, TruthLabel Label, string Low, string High, string Confidence, string Present);
}
