using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Resources;

namespace ResourceCheck.Reports;

/// <summary>Writes results. The same result gives the same text, whatever the machine's culture.</summary>
public static class ReportWriter
{
    /// <summary>Writes the result of <c>run</c>.</summary>
    /// <param name="result">What to write.</param>
    /// <param name="format">How.</param>
    /// <param name="writer">Where to.</param>
    /// <param name="colour">Whether text may mark the verdict by colour: only for a terminal.</param>
    public static void Write(RunResult result, ReportFormat format, TextWriter writer, bool colour = false) =>
        Write(format, writer, colour, () => RunReport.From(result), () => RunDocument.Write(result, writer));

    /// <summary>Writes the result of <c>verify</c>; parameters as for <see cref="Write(RunResult, ReportFormat, TextWriter, bool)"/>.</summary>
    public static void Write(VerifyResult result, ReportFormat format, TextWriter writer, bool colour = false) =>
        Write(format, writer, colour, () => VerifyReport.From(result), () => VerifyDocument.Write(result, writer));

    /// <summary>Writes the result of <c>inspect</c>; parameters as for <see cref="Write(RunResult, ReportFormat, TextWriter, bool)"/>.</summary>
    public static void Write(InspectResult result, ReportFormat format, TextWriter writer, bool colour = false) =>
        Write(format, writer, colour, () => InspectReport.From(result), () => InspectDocument.Write(result, writer));

    /// <summary>Writes the result of <c>state</c> with the program's version, which a state's description does not hold.</summary>
    public static void Write(StateDescription result, string version, ReportFormat format, TextWriter writer, bool colour = false) =>
        Write(format, writer, colour, () => StateReport.From(result, version), () => StateDocument.Write(result, version, writer));

    /// <summary>Writes the result of <c>storage</c>; parameters as for <see cref="Write(RunResult, ReportFormat, TextWriter, bool)"/>.</summary>
    public static void Write(StorageResult result, ReportFormat format, TextWriter writer, bool colour = false) =>
        Write(format, writer, colour, () => StorageReport.From(result), () => StorageDocument.Write(result, writer));

    /// <summary>Writes the result of <c>relaxation</c>; parameters as for <see cref="Write(RunResult, ReportFormat, TextWriter, bool)"/>.</summary>
    public static void Write(RelaxationResult result, ReportFormat format, TextWriter writer, bool colour = false) =>
        Write(format, writer, colour, () => RelaxationReport.From(result), () => RelaxationDocument.Write(result, writer));

    /// <summary>Writes the result of <c>budget</c>; parameters as for <see cref="Write(RunResult, ReportFormat, TextWriter, bool)"/>.</summary>
    public static void Write(BudgetResult result, ReportFormat format, TextWriter writer, bool colour = false) =>
        Write(format, writer, colour, () => BudgetReport.From(result), () => BudgetDocument.Write(result, writer));

    /// <summary>Writes the result of <c>sweep</c>; parameters as for <see cref="Write(RunResult, ReportFormat, TextWriter, bool)"/>.</summary>
    public static void Write(SweepResult result, ReportFormat format, TextWriter writer, bool colour = false) =>
        Write(format, writer, colour, () => SweepReport.From(result), () => SweepDocument.Write(result, writer));

    /// <summary>Writes the result of <c>tolerance</c>; parameters as for <see cref="Write(RunResult, ReportFormat, TextWriter, bool)"/>.</summary>
    public static void Write(ToleranceResult result, ReportFormat format, TextWriter writer, bool colour = false) =>
        Write(format, writer, colour, () => ToleranceReport.From(result), () => ToleranceDocument.Write(result, writer));

    /// <summary>Writes the result of <c>copies</c>; parameters as for <see cref="Write(RunResult, ReportFormat, TextWriter, bool)"/>.</summary>
    public static void Write(CopiesResult result, ReportFormat format, TextWriter writer, bool colour = false) =>
        Write(format, writer, colour, () => CopiesReport.From(result), () => CopiesDocument.Write(result, writer));

    /// <summary>Writes the result of <c>copies</c> for several targets; parameters as for <see cref="Write(RunResult, ReportFormat, TextWriter, bool)"/>.</summary>
    public static void Write(CopiesTable result, ReportFormat format, TextWriter writer, bool colour = false) =>
        Write(format, writer, colour, () => CopiesTableReport.From(result), () => CopiesTableDocument.Write(result, writer));

    private static void Write(ReportFormat format, TextWriter writer, bool colour, Func<Report> build, Action writeDocument)
    {
        switch (format)
        {
            case ReportFormat.Json:
                writeDocument();
                break;
            case ReportFormat.Csv:
                CsvReport.Write(build(), writer);
                break;
            case ReportFormat.Markdown:
                MarkdownReport.Write(build(), writer);
                break;
            case ReportFormat.Latex:
                LatexReport.Write(build(), writer);
                break;
            default:
                TextReport.Write(build(), writer, colour);
                break;
        }
    }
}
