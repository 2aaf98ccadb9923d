using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Conditions.Checks;
using ResourceCheck.Conditions.Json;
using ResourceCheck.Diagnostics;
using ResourceCheck.Numerics;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement;

/// <summary>Reads the matrix files that a script names, relative to the script's folder: JSON rows of a d×d unitary whose columns are images of the levels or basis vectors.</summary>
internal static class ScriptMatrices
{
    /// <summary>How far U†U may be from 1.</summary>
    private const double Tolerance = 1e-9;

    public static (IReadOnlyDictionary<string, Complex[,]> Matrices, IReadOnlyList<Diagnostic> Findings) Read(Protocol protocol)
    {
        Dictionary<string, Complex[,]> matrices = [];
        Conditions.Findings findings = new();
        string folder = Path.GetDirectoryName(protocol.Source.Name) ?? "";
        foreach ((string file, Span span) in Named(protocol).DistinctBy(n => n.File))
        {
            Spot spot = new(protocol.Source, span, false);
            if (MatrixFile.Read(new TextSetting(spot, $"matrix \"{file}\"", file), folder, false, findings) is not [{ } matrix])
                continue;
            int size = matrix.GetLength(0);
            double defect = MatrixMath.DeviationFromUnitary(matrix);
            if (size != protocol.Levels)
                findings.Add(JudgementMessages.MatrixSize(protocol.Source.PlaceOf(span), file, size, protocol.Levels));
            else if (!(defect <= Tolerance))
                findings.Add(JudgementMessages.NotUnitary(protocol.Source.PlaceOf(span), file, defect));
            matrices[file] = matrix;
        }

        return (matrices, findings.InOrder(protocol.Source.Name));
    }

    private static IEnumerable<(string File, Span Span)> Named(Protocol protocol) => protocol.Steps.Concat(protocol.Dishonest.SelectMany(d => d.CopySteps)).SelectMany(Of);

    private static IEnumerable<(string File, Span Span)> Of(Step step) => step switch
    {
        MeasureStep measure => Of(measure.Basis),
        InterceptStep intercept => Of(intercept.Basis),
        PickStep pick => pick.Options.SelectMany(Of),
        SetStep set => Of(set.Value),
        SendStep send => Of(send.Value),
        ApplyStep { Unitary: { File: { } file } unitary } => [(file, unitary.Span)],
        ApplyStep { Unitary.Basis: { } basis } => Of(basis),
        WhenStep block => block.Then.Concat(block.Otherwise).SelectMany(Of),
        _ => [],
    };

    private static IEnumerable<(string File, Span Span)> Of(BoundExpression expression) => expression switch
    {
        BoundBasis { File: { } file } basis => [(file, basis.Span)],
        BoundLiteral { Value: BasisValue { File: { } file } } literal => [(file, literal.Span)],
        BoundIf choice => Of(choice.Then).Concat(Of(choice.Else)),
        _ => [],
    };
}
