using System.Buffers.Binary;
using System.Text;
using ResourceCheck.Diagnostics;
using ResourceCheck.Resources;
using Xunit;

namespace ResourceCheck.Tests.Resources;

/// <summary>Files that are no state: each gives its findings, all at once, and never an exception.</summary>
public sealed class BadFileTests
{
    private const string GoodHeader = "{'descr': '<c16', 'fortran_order': False, 'shape': (4,), }";

    [Fact]
    public void A_missing_file_is_named() => Assert.Equal(["D001"], Codes(StateFile.Read("nowhere.npy", mend: false)));

    [Fact]
    public void A_folder_is_no_state() => Assert.Equal(["D001"], Codes(StateFile.Describe(Path.GetTempPath(), mend: false)));

    [Theory]
    [InlineData(".csv")]
    [InlineData(".pkl")]
    [InlineData("")]
    public void The_ending_must_tell_the_format(string ending) => Assert.Equal(["D002"], ReadText(ending, "0"));

    [Theory]
    [InlineData("{'descr': '|O', 'fortran_order': False, 'shape': (4,), }", "D007")]
    [InlineData("{'descr': '<i8', 'fortran_order': False, 'shape': (4,), }", "D007")]
    [InlineData("{'descr': '=c16', 'fortran_order': False, 'shape': (4,), }", "D007")]
    [InlineData("{'descr': [('a', '<f8')], 'fortran_order': False, 'shape': (4,), }", "D007")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (8,), }", "D010")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (27,), }", "D008")]
    [InlineData("{'descr': '<f8', 'fortran_order': False, 'shape': (4,), }", "D008")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (999999999999999999, 999999999999999999), }", "D011")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (46656, 46656), }", "D011")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (3125, 3125), }", "D008")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (2, 2, 1), }", "D009")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (4, 27), }", "D009")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (), }", "D009")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (0,), }", "D010")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (99999999999999999999999,), }", "D006")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (-4,), }", "D006")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (4), }", "D006")]
    [InlineData("{'descr': '<c16', 'fortran_order': 0, 'shape': (4,), }", "D006")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, }", "D006")]
    [InlineData("{'descr': '<c16', 'descr': '<c16', 'fortran_order': False, 'shape': (4,), }", "D006")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (4,), 'more': 1, }", "D006")]
    [InlineData("{'descr': '<c16', 'fortran_order': False, 'shape': (4,), } exit()", "D006")]
    [InlineData("{'descr': '<c16, 'fortran_order': False, 'shape': (4,), }", "D006")]
    [InlineData("", "D006")]
    public void Headers_that_lie_or_deviate_are_refused(string header, string code) =>
        Assert.Equal([code], ReadBytes(".npy", Npy(1, header, new byte[64])));

    [Fact]
    public void Every_cut_of_a_good_array_is_refused()
    {
        byte[] good = Npy(2, GoodHeader, Numbers(0, 0, Math.Sqrt(0.5), 0, -Math.Sqrt(0.5), 0, 0, 0));
        Assert.Empty(ReadBytes(".npy", good));
        Assert.All(Enumerable.Range(0, good.Length), length => Assert.Single(ReadBytes(".npy", good[..length])));
        Assert.Equal(["D008"], ReadBytes(".npy", [.. good, 0]));
    }

    [Theory]
    [InlineData(3, "D005")]
    [InlineData(0, "D005")]
    public void Other_versions_are_refused(byte version, string code) => Assert.Equal([code], ReadBytes(".npy", Npy(version, GoodHeader, new byte[64])));

    [Fact]
    public void A_header_longer_than_the_file_takes_no_memory()
    {
        byte[] file = Npy(2, GoodHeader, []);
        BinaryPrimitives.WriteUInt32LittleEndian(file.AsSpan(8), uint.MaxValue);
        Assert.Equal(["D006"], ReadBytes(".npy", file));
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void Numbers_that_are_not_finite_are_found_before_anything_is_computed(double number)
    {
        Outcome<PreparedState> read = Fixture.With(".npy", Npy(1, GoodHeader, Numbers(1, 0, 0, 0, 0, number, 0, 0)), path => StateFile.Read(path, mend: true));
        Assert.Equal(["D012"], Codes(read));
        Assert.Contains("amplitude 3", read.Findings[0].Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("[0.25, 0, 0, 0], [0, 0.25, 0, 0], [0, 0, 0, 0], [0, 0, 0, 0]", "D014")]
    [InlineData("[0.5, 0.1, 0, 0], [0, 0.5, 0, 0], [0, 0, 0, 0], [0, 0, 0, 0]", "D013")]
    [InlineData("[1.2, 0, 0, 0], [0, -0.2, 0, 0], [0, 0, 0, 0], [0, 0, 0, 0]", "D015")]
    [InlineData("[0, 0, 0, 0], [0, 0, 0, 0], [0, 0, 0, 0], [0, 0, 0, 0]", "D014")]
    [InlineData("[1.2, 0.1, 0, 0], [0, -0.3, 0, 0], [0, 0, 0, 0], [0, 0, 0, 0]", "D013", "D014", "D015")]
    public void Matrices_that_are_no_state_give_all_reasons_and_are_too_far_to_be_mended(string rows, params string[] codes)
    {
        string text = $"{{\"parties\": 2, \"density\": [{rows}]}}";
        Assert.Equal(codes, ReadText(".json", text));
        Assert.Equal(codes, Fixture.With(".json", text, path => Codes(StateFile.Read(path, mend: true))));
    }

    [Fact]
    public void A_zero_vector_is_no_state() => Assert.Equal(["D016"], ReadText(".json", "{\"parties\": 2, \"vector\": [0, 0, 0, 0]}"));

    [Fact]
    public void Arbitrary_bytes_never_throw()
    {
        Random random = new(3);
        byte[] good = Npy(1, GoodHeader, Numbers(0, 0, 1, 0, 0, 0, 0, 0));
        byte[] json = Encoding.UTF8.GetBytes("{\"parties\": 2, \"terms\": {\"0-1\": [0.6, 0], \"1-0\": [0, 0.8]}}");
        byte[] matrix = Encoding.UTF8.GetBytes("%%MatrixMarket matrix coordinate complex hermitian\n4 4 2\n2 2 0.5 0\n3 3 0.5 0\n");
        foreach ((string ending, byte[] file) in new[] { (".npy", good), (".json", json), (".mtx", matrix) })
        {
            Assert.Empty(ReadBytes(ending, file));
            for (int turn = 0; turn < 400; turn++)
            {
                byte[] changed = [.. file];
                changed[random.Next(file.Length)] = (byte)random.Next(256);
                Outcome<StateDescription> described = Fixture.With(ending, changed, path => StateFile.Describe(path, mend: turn % 2 == 0));
                Assert.Equal(described.Value is null, described.Findings.Any(f => f.Severity == Severity.Error));
                Assert.All(described.Value?.Figures ?? [], figure => Assert.True(double.IsFinite(figure.Value), figure.Name));
            }
        }
    }

    /// <summary>Amplitudes of 1e-160 have denormal products, of which decompositions make NaN.</summary>
    [Theory]
    [InlineData(1e-160)]
    [InlineData(1e-200)]
    [InlineData(1e-310)]
    public void Tiny_amplitudes_count_as_nothing(double tiny)
    {
        byte[] file = Npy(1, GoodHeader, Numbers(tiny, 0, 0, Math.Sqrt(0.5), Math.Sqrt(0.5), 0, 0, tiny));
        StateDescription described = Fixture.With(".npy", file, path => StateFile.Describe(path, mend: false)).Value!;
        Assert.Equal(0.5, described.Figures.Single(f => f.Name == "negativity 1 | 2").Value, 1e-12);
        Assert.Equal(0.5, described.Figures.Single(f => f.Name == "fidelity").Value, 1e-12);
        Assert.Equal(1, described.Figures.Single(f => f.Label == ResourceCheck.Engines.TruthLabel.Bound).Value, 1e-9);
    }

    private static string[] ReadText(string ending, string text) => ReadBytes(ending, Encoding.UTF8.GetBytes(text));

    private static string[] ReadBytes(string ending, byte[] bytes) => Fixture.With(ending, bytes, path => Codes(StateFile.Read(path, mend: false)));

    private static string[] Codes<T>(Outcome<T> outcome)
        where T : class => [.. outcome.Findings.Select(f => f.Code)];

    private static byte[] Npy(byte version, string header, byte[] numbers)
    {
        byte[] length = new byte[version == 1 ? 2 : 4];
        if (version == 1)
            BinaryPrimitives.WriteUInt16LittleEndian(length, (ushort)(header.Length + 1));
        else
            BinaryPrimitives.WriteUInt32LittleEndian(length, (uint)(header.Length + 1));
        return [0x93, .. "NUMPY"u8, version, 0, .. length, .. Encoding.ASCII.GetBytes($"{header}\n"), .. numbers];
    }

    private static byte[] Numbers(params double[] parts) => [.. parts.SelectMany(BitConverter.GetBytes)];
}
