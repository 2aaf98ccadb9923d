namespace ResourceCheck.Resources.Formats;

/// <summary>The first line of a Matrix Market file.</summary>
/// <param name="IsSparse">Whether entries come with their row and column.</param>
/// <param name="IsComplex">Whether entries have two parts.</param>
/// <param name="Symmetry">Which entries are left out because they follow from others.</param>
internal sealed record MatrixMarketHeader(bool IsSparse, bool IsComplex, MatrixSymmetry Symmetry)
{
    /// <summary>Reads <c>%%MatrixMarket matrix coordinate|array real|integer|complex general|symmetric|hermitian</c>; null for anything else.</summary>
    public static MatrixMarketHeader? TryParse(string line) =>
        line.ToLowerInvariant().Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries) switch
        {
            ["%%matrixmarket", "matrix", ("coordinate" or "array") and var layout, "real" or "integer", ("general" or "symmetric") and var symmetry] =>
                new(layout == "coordinate", false, SymmetryOf(symmetry)),
            ["%%matrixmarket", "matrix", ("coordinate" or "array") and var layout, "complex", ("general" or "symmetric" or "hermitian") and var symmetry] =>
                new(layout == "coordinate", true, SymmetryOf(symmetry)),
            _ => null,
        };

    private static MatrixSymmetry SymmetryOf(string word) => word switch
    {
        "general" => MatrixSymmetry.General,
        "symmetric" => MatrixSymmetry.Symmetric,
        _ => MatrixSymmetry.Hermitian,
    };
}

/// <summary>How entries above the diagonal follow from those below.</summary>
internal enum MatrixSymmetry
{
    /// <summary>They are given.</summary>
    General,

    /// <summary>They are the same.</summary>
    Symmetric,

    /// <summary>They are the conjugates.</summary>
    Hermitian,
}
