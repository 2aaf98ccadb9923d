using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Printing;

/// <summary>Writes what stands behind <c>apply</c>.</summary>
internal static class UnitaryPrinter
{
    public static string Print(UnitaryExpression unitary) => unitary.Kind switch
    {
        UnitaryKind.Shift => $"shift({Argument(unitary.First)})",
        UnitaryKind.Clock => $"clock({Argument(unitary.First)})",
        UnitaryKind.LevelSwap => $"levelswap({ArgumentBeforeComma(unitary.First)}, {Argument(unitary.Second)})",
        UnitaryKind.Complement => $"complement({Basis(unitary.Basis)}, {Argument(unitary.First)})",
        UnitaryKind.Matrix => $"matrix \"{unitary.File?.Text}\"",
        UnitaryKind.InverseFourier => "inverse fourier" + Size(unitary.First),
        _ => "fourier" + Size(unitary.First),
    };

    private static string Size(Expression? size) => size is null ? "" : $" on {ExpressionPrinter.PrintSum(size)}";

    private static string Argument(Expression? argument) => argument is null ? "" : ExpressionPrinter.Print(argument);

    private static string ArgumentBeforeComma(Expression? argument) => argument is null ? "" : ExpressionPrinter.PrintBeforeComma(argument);

    private static string Basis(Expression? basis) => basis is null ? "" : ExpressionPrinter.PrintBasis(basis, true);
}
