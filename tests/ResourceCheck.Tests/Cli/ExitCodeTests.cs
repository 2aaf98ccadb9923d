using System.Globalization;
using System.Text;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Tests.Reports;
using Xunit;

namespace ResourceCheck.Tests.Cli;

public sealed class ExitCodeTests : IDisposable
{
    private readonly Tool _tool = new();

    public void Dispose() => _tool.Dispose();

    [Theory]
    [InlineData(Verdict.Met, 0)]
    [InlineData(Verdict.NoGoals, 0)]
    [InlineData(Verdict.NotMet, 1)]
    [InlineData(Verdict.Undecided, 1)]
    public async Task Run_exits_by_its_verdict(Verdict verdict, int code)
    {
        _tool.Run = Outcome<RunResult>.Of(Samples.Full with { Verdict = verdict });
        Assert.Equal(code, (await _tool.Say("run", _tool.Script)).Code);
    }

    [Theory]
    [InlineData(ClaimVerdict.Proved, 0)]
    [InlineData(ClaimVerdict.Refuted, 1)]
    [InlineData(ClaimVerdict.NotVerified, 3)]
    [InlineData(ClaimVerdict.OutsideRequirements, 3)]
    public async Task Verify_exits_by_its_verdict(ClaimVerdict verdict, int code)
    {
        _tool.Verify = Outcome<VerifyResult>.Of(Samples.Verification with { Verdict = verdict });
        Assert.Equal(code, (await _tool.Say("verify", _tool.Script)).Code);
    }

    [Fact]
    public async Task Without_claims_there_is_nothing_to_fail()
    {
        _tool.Verify = Outcome<VerifyResult>.Of(Samples.Verification with { Claims = [], Verdict = ClaimVerdict.NotVerified });
        Assert.Equal(0, (await _tool.Say("verify", _tool.Script)).Code);
    }

    [Theory]
    [InlineData("S031", 2)]
    [InlineData("C002", 2)]
    [InlineData("E001", 3)]
    public async Task Findings_exit_by_their_family_and_leave_output_empty(string code, int exit)
    {
        _tool.Run = Outcome<RunResult>.Failed([new(code, Severity.Error, "Found something.", "mend it.", Place.Of("x")), new(code, Severity.Error, "And again.", null, null)]);
        Said said = await _tool.Say("run", _tool.Script);
        Assert.Equal((exit, ""), (said.Code, said.Output));
        string closing = exit == 3 ? "No trustworthy result could be had." : "2 mistakes; nothing was computed.";
        Assert.Equal($"Found something.\n  Cure: mend it.\n  at x ({code})\n\nAnd again.\n  at the input ({code})\n\n{closing}\n", said.Error);
    }

    [Fact]
    public async Task A_wrong_input_beside_an_engine_that_gave_up_is_a_wrong_input()
    {
        _tool.Run = Outcome<RunResult>.Failed([new("E001", Severity.Error, "a", null, null), new("S001", Severity.Error, "b", null, null)]);
        Assert.Equal(2, (await _tool.Say("run", _tool.Script)).Code);
    }

    [Fact]
    public async Task A_mistake_of_the_program_is_told_calmly()
    {
        _tool.BeforeRun = () => throw new InvalidOperationException("secret detail");
        Said said = await _tool.Say("run", _tool.Script);
        Assert.Equal((70, ""), (said.Code, said.Output));
        Assert.Contains("U099", said.Error, StringComparison.Ordinal);
        Assert.DoesNotContain("   at ", said.Error, StringComparison.Ordinal);
        _tool.Trace = true;
        Assert.Contains("secret detail", (await _tool.Say("run", _tool.Script)).Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Lack_of_memory_means_no_result()
    {
        _tool.BeforeRun = () => throw new InsufficientMemoryException();
        Assert.Equal(3, (await _tool.Say("run", _tool.Script)).Code);
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public async Task An_interruption_ends_a_long_computation_or_a_waiting_read_at_once(bool reading)
    {
        using CancellationTokenSource source = new();
        using ManualResetEventSlim forever = new();
        void Wait()
        {
            source.CancelAfter(TimeSpan.FromMilliseconds(50));
            forever.Wait(TimeSpan.FromSeconds(30));
        }

        _tool.BeforeRun = reading ? () => { } : Wait;
        _tool.BeforeInput = reading ? Wait : () => { };
        System.Diagnostics.Stopwatch watch = System.Diagnostics.Stopwatch.StartNew();
        Said said = await _tool.Say(source.Token, "run", reading ? "-" : _tool.Script);
        Assert.True(watch.Elapsed < TimeSpan.FromSeconds(10));
        forever.Set();
        Assert.Equal((130, "", "Interrupted; nothing was written.\n"), (said.Code, said.Output, said.Error));
    }

    [Theory]
    [InlineData(32, 0)]
    [InlineData(28, 2)]
    public async Task A_reader_that_left_is_no_mistake_but_a_full_disk_is(int error, int code)
    {
        _tool.Output = new RefusingWriter(error);
        Said said = await _tool.Say("run", _tool.Script, "--quiet");
        Assert.Equal(code, said.Code);
        Assert.Equal(code != 0, said.Error.Contains("U034", StringComparison.Ordinal));
    }

    [Fact]
    public async Task Format_check_exits_by_difference()
    {
        Assert.Equal(0, (await _tool.Say("format", _tool.Script, "--check")).Code);
        _tool.Printed = "other\n";
        Said said = await _tool.Say("format", _tool.Script, "--check");
        Assert.Equal((1, ""), (said.Code, said.Output));
        Assert.Contains("removal.protocol", said.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_culture_with_comma_decimals_reads_and_writes_the_same()
    {
        Said before = await _tool.Say("run", _tool.Script, "--memory", "1.5 GB", "--seed", "-7");
        CultureInfo culture = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = GoldenReportTests.CommaCulture();
            Assert.Equal(before, await _tool.Say("run", _tool.Script, "--memory", "1.5 GB", "--seed", "-7"));
            Assert.Equal((1.5e9, -7), (_tool.Asked!.MemoryLimit, _tool.Asked.Seed));
            Assert.Equal(2, (await _tool.Say("run", _tool.Script, "--memory", "1,5 GB")).Code);
        }
        finally
        {
            CultureInfo.CurrentCulture = culture;
        }
    }

    private sealed class RefusingWriter(int error) : TextWriter
    {
        public override Encoding Encoding => Encoding.UTF8;

        public override void Write(string? value) => throw new IOException("refused", error);

        public override void Write(char value) => throw new IOException("refused", error);

        public override void Flush() => throw new IOException("refused", error);
    }
}
