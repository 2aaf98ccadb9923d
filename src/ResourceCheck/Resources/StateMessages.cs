using System.Globalization;
using System.Numerics;
using ResourceCheck.Diagnostics;
using ResourceCheck.Numerics.States;
using ResourceCheck.Quantities;
using ResourceCheck.Resources.Formats;

namespace ResourceCheck.Resources;

/// <summary>Texts of everything that can be wrong with a prepared state (codes D001 to D049).</summary>
internal static class StateMessages
{
    private const string MendCure = "ask for the nearest state to be taken (`mend`), or correct the file";

    private const string TooFarCure = "correct the file; only deviations up to 0.05 are mended";

    public static Diagnostic Unreadable(string file, Exception slip) => Error(
        "D001",
        $"`{file}` cannot be read: {Reason(slip)}.",
        "check the name, the folder it is looked for in, and the permissions",
        Place.Of(file));

    public static Diagnostic UnknownKind(string file) => Error(
        "D002",
        $"`{Path.GetFileName(file)}` has no ending that tells its format: .npy, .mtx or .json fit here.",
        "save the state in one of these formats, under a name that ends in it",
        Place.Of(file));

    public static Diagnostic TextTooLarge(string file, long length, long most) => Error(
        "D003",
        $"The text has {length} bytes; texts are read up to {most} bytes.",
        "save the state as .npy",
        Place.Of(file));

    public static Diagnostic NpyMagic(string file) => Error(
        "D004",
        "The file does not begin like an .npy array.",
        "save a plain array of numbers; archives of several arrays and pickles are not read",
        Place.Of(file));

    public static Diagnostic NpyVersion(string file, int major, int minor) => Error(
        "D005",
        $"The array has format version {major}.{minor}; versions 1.0 and 2.0 are read.",
        "save it in one of these versions",
        Place.Of(file));

    public static Diagnostic NpyHeader(string file) => Error(
        "D006",
        "The array's header does not state type, order and shape in the form that .npy prescribes, or is cut off.",
        "save the array again",
        Place.Of(file));

    public static Diagnostic NpyType(string file, string type) => Error(
        "D007",
        $"The array holds `{Short(type)}`; numbers of type <c16, <c8, <f8 or <f4, or the same with >, fit here.",
        "convert the array to complex numbers; objects, records and integers are not read",
        Place.Of(file));

    public static Diagnostic NpyLength(string file, long needed, long present) => Error(
        "D008",
        $"The array's shape needs {needed} bytes behind the header; the file has {present}.",
        "copy the file again, since it is cut off or something was added",
        Place.Of(file));

    public static Diagnostic NotVectorNorSquare(string file, IReadOnlyList<long> axes) => Error(
        "D009",
        $"The array has the shape {(axes.Count == 0 ? "of a single number" : string.Join(" × ", axes))}; a vector or a square matrix fits here.",
        "flatten the axes of the parties, first party first: to one axis for a vector, to two for a density matrix",
        Place.Of(file));

    public static Diagnostic NoPower(string file, long dimension, bool isVector) => Error(
        "D010",
        $"{(isVector ? "The vector has" : "The matrix has")} {dimension} {(isVector ? "amplitudes" : "rows")}; N parties with N levels have N^N: {Dimensions(isVector)}.",
        "check the number of levels; a state with other levels is read from JSON with `parties` and `levels`",
        Place.Of(file));

    public static Diagnostic TooLarge(string file, double dimension, bool isVector) => Error(
        "D011",
        $"{(isVector ? "A vector of" : "A density matrix with")} {Count(dimension)} {(isVector ? "amplitudes" : "rows")} is too large; up to {StateShape.Largest(isVector)} are read.",
        isVector ? "take fewer parties or levels" : "take fewer parties or levels, or a vector",
        Place.Of(file));

    public static Diagnostic NotFinite(string file, RawState state, int first, int count) => Error(
        "D012",
        $"{count} of the numbers {(count == 1 ? "is" : "are")} infinite or not a number, first {Position(state.Shape, first)}; every number must be finite.",
        "find out where the file's maker divided by zero",
        Place.Of(file));

    public static Diagnostic NotHermitian(string file, (double Deviation, int Row, int Column) asymmetry, double tolerance) => Error(
        "D013",
        $"The matrix is not Hermitian: row {asymmetry.Row + 1}, column {asymmetry.Column + 1} and its mirror image differ by {Text(asymmetry.Deviation)}; up to {Text(tolerance)} is round-off.",
        CureFor(asymmetry.Deviation),
        Place.Of(file));

    public static Diagnostic Trace(string file, Complex trace, double tolerance) => Error(
        "D014",
        $"The trace is {Text(trace.Real)}{(Math.Abs(trace.Imaginary) <= tolerance ? "" : $" with the imaginary part {Text(trace.Imaginary)}")}; a density matrix has 1, within {Text(tolerance)}.",
        CureFor(Complex.Abs(trace - 1)),
        Place.Of(file));

    public static Diagnostic Negative(string file, double lowest, double tolerance) => Error(
        "D015",
        double.IsFinite(lowest)
            ? $"The lowest eigenvalue is {Text(lowest)}; a density matrix has none below 0, within {Text(tolerance)}."
            : $"An eigenvalue is below -{Text(tolerance)}; a density matrix has none below 0, within that tolerance.",
        double.IsFinite(lowest) ? CureFor(-lowest) : "mend the state where it is made, since it is too large to be mended here",
        Place.Of(file));

    public static Diagnostic Norm(string file, double square, double tolerance) => Error(
        "D016",
        $"The squares of the amplitudes add up to {Text(square)}; a state vector has 1, within {Text(tolerance)}.",
        CureFor(Math.Abs(square - 1)),
        Place.Of(file));

    public static Diagnostic MendTooLarge(string file, int size) => Error(
        "D017",
        $"A matrix with {size} rows is too large to be mended; that is done up to {HermitianMatrix.LargestDecomposed} rows.",
        "mend the state where it is made",
        Place.Of(file));

    public static Diagnostic Mended(string file, double by) => new(
        "D018",
        Severity.Warning,
        $"The numbers were no state; the nearest one, at trace distance {Text(by)}, is used instead.",
        "certify nothing from it; take more data or correct the file where the figures must stand",
        Place.Of(file));

    public static Diagnostic NotDecomposed(string file, int size, double tolerance) => new(
        "D019",
        Severity.Note,
        $"With {size} rows the eigenvalues are only shown to be above -{Text(tolerance)}; the lowest one, the entropy and the negativity are not computed.",
        null,
        Place.Of(file));

    public static Diagnostic MatrixBanner(Place place) => Error(
        "D020",
        "The first line names no matrix that fits here: a coordinate or array matrix of real, integer or complex numbers that is general, symmetric or (complex only) hermitian.",
        "begin with `%%MatrixMarket matrix coordinate complex hermitian`, or the words that apply",
        place);

    public static Diagnostic MatrixSize(Place place, bool isSparse) => Error(
        "D021",
        $"The size line must hold {(isSparse ? "three whole numbers: rows, columns and entries" : "two whole numbers: rows and columns")}.",
        "write the size behind the comment lines",
        place);

    public static Diagnostic MatrixNotSquare(Place place) => Error(
        "D022",
        "A symmetric or hermitian matrix is square; this one is not.",
        "call a vector `general`",
        place);

    public static Diagnostic MatrixEntry(Place place, bool isSparse, bool isComplex) => Error(
        "D023",
        $"An entry must hold {(isSparse ? "row, column and " : "")}{(isComplex ? "real and imaginary part" : "one number")}.",
        "write one entry a line, its numbers separated by blanks",
        place);

    public static Diagnostic MatrixNumber(Place place) => Error(
        "D024",
        "This is no finite decimal number such as -0.25 or 1.5e-3.",
        "write a point before the decimals, and e before the exponent",
        place);

    public static Diagnostic MatrixFault(Place place, MatrixEntryFault fault, int rows, int columns) => Error(
        "D025",
        fault switch
        {
            MatrixEntryFault.Outside => $"The entry lies outside the matrix; rows from 1 to {rows} and columns from 1 to {columns} fit here.",
            MatrixEntryFault.AboveDiagonal => "The entry lies above the diagonal; of a symmetric or hermitian matrix only the lower triangle is stored.",
            MatrixEntryFault.DiagonalNotReal => "The entry lies on the diagonal of a hermitian matrix and is not real.",
            _ => "The entry was given before; each row and column may come once.",
        },
        "correct the row and column, or the first line of the file",
        place);

    public static Diagnostic MatrixCount(string file, long announced, long read) => Error(
        "D026",
        $"The size line announces {announced} entries; the file has {read}.",
        "copy the file again if it is cut off, or correct the size line",
        Place.Of(file));

    public static Diagnostic MoreFindings(string file, int shown) => Error(
        "D027",
        $"There are more mistakes than the {shown} shown.",
        "correct these first",
        Place.Of(file));

    public static Diagnostic JsonSyntax(Place place) => Error(
        "D030",
        "The text stops being JSON here.",
        "look for a missing quote, comma or bracket, a comment, or a comma before a closing bracket",
        place);

    public static Diagnostic JsonKey(Place place, string name) => Error(
        "D031",
        $"`{Short(name)}` is no member of a state: parties, levels, vector, density and terms fit here.",
        "correct the name or leave the member out",
        place);

    public static Diagnostic JsonTwice(Place place, string name) => Error(
        "D032",
        $"`{Short(name)}` was given before.",
        "leave one of the two out",
        place);

    public static Diagnostic JsonMissing(string file, bool noParties, int states) => Error(
        "D033",
        $"A state needs `parties` and exactly one of `vector`, `density` and `terms`; {(noParties ? "`parties` is missing" : "")}{(noParties && states != 1 ? ", and " : "")}{(states == 1 ? "" : $"{states} of these three are given")}.",
        "write for example {\"parties\": 2, \"vector\": [0, 0.5, -0.5, 0]} with your numbers",
        Place.Of(file));

    public static Diagnostic JsonValue(Place place, string wanted) => Error(
        "D034",
        $"This does not fit here; {wanted.TrimEnd(',')} does.",
        "write numbers without quotes, and complex ones as [real, imaginary]",
        place);

    public static Diagnostic JsonLabel(Place place, string label, StateShape shape) => Error(
        "D035",
        $"`{Short(label)}` names no basis state: {shape.Parties} levels from 0 to {shape.Levels - 1}, joined by -, fit here.",
        $"write for example {string.Join('-', Enumerable.Range(0, shape.Parties).Select(i => i % shape.Levels))}",
        place);

    public static Diagnostic JsonRow(Place place, int row, int length, int first) => Error(
        "D036",
        $"Row {row} has {length} numbers, the first row has {first}; all rows must have the same length.",
        "complete the row",
        place);

    public static Diagnostic JsonTooLong(Place place, int most) => Error(
        "D037",
        $"This list is longer than the {most} entries that are read.",
        "take fewer parties or levels",
        place);

    public static Diagnostic JsonSize(string file, StateShape shape, int rows, int rowLength) => Error(
        "D038",
        $"{shape.Parties} parties with {shape.Levels} levels have {shape.Dimension} basis states; the file has "
        + (shape.IsVector ? $"{rows} amplitudes." : $"{rows} rows of {rowLength} numbers."),
        "correct `parties` or `levels`, or complete the numbers",
        Place.Of(file));

    public static Diagnostic TooManyParties(int parties) => Error(
        "D040",
        $"The antisymmetric state of {parties} parties has {parties}^{parties} amplitudes; they are laid out for up to {AntisymmetricState.MostParties} parties.",
        "lower the number of parties",
        Place.Of("number of parties"));

    public static Diagnostic ExchangeTooManyParties(int parties) => Error(
        "D041",
        $"Preparation by exchange pulses was asked for {parties} parties; it reaches {ExchangePulse.MostParties}, since no pulse time gives a fifth party an equal share.",
        "take `file` for a state prepared in another way, or lower the number of parties",
        Place.Of("resource.exchange"));

    public static Diagnostic ExchangeSteps(int steps, int parties) => Error(
        "D042",
        $"Preparation by exchange pulses has {steps} {(steps == 1 ? "step" : "steps")}; {parties} parties need {parties - 1}.",
        "give one entry per step 1→2, 2→3 and so on",
        Place.Of("resource.exchange"));

    public static Diagnostic ExchangeCouplings(int step, int size) => Error(
        "D043",
        $"Step {step} of the preparation by exchange pulses needs finite errors and {size}×{size} finite, symmetric couplings.",
        "give every pair of qudits of this step one coupling, nominally 1",
        Place.Of("resource.exchange"));

    public static Diagnostic OtherSize(string file, PreparedState state, int parties) => Error(
        "D044",
        $"The state has {state.Parties} parties with {state.Levels} levels each; the protocol needs {parties} parties with {parties} levels each.",
        "take a state of that size, or set the protocol's number of parties to the state's",
        Place.Of(file));

    public static Diagnostic RelaxedTooManyParties(int parties, int most) => new(
        "D045",
        Severity.Error,
        $"Relaxation was asked for {parties} parties; density operators are evolved for up to {most}, and {parties} would take {FigureText.Bytes(16 * Math.Pow(parties, 2 * parties))}.",
        $"lower the number of parties, give the relaxed state as a file, or look at relaxation alone: `resourcecheck relaxation FILE --parties {parties}`, for up to {AntisymmetricState.MostParties} emitters",
        Place.Of("resource.relaxed"));

    public static Diagnostic NothingWithoutPhoton() => new(
        "D046",
        Severity.Error,
        "No copy relaxes without a photon from this start, so heralding on none keeps nothing.",
        "leave `heralded` out, relax for a shorter time, or take another start",
        Place.Of("resource.relaxed"));

    private static Diagnostic Error(string code, string message, string cure, Place place) => new(code, Severity.Error, message, cure, place);

    private static string CureFor(double deviation) => deviation <= StateTolerances.Mendable ? MendCure : TooFarCure;

    private static string Count(double number) =>
        double.IsFinite(number) ? number.ToString(number < 1e15 ? "F0" : "g6", CultureInfo.InvariantCulture) : "more than 1e308";

    private static string Text(double value) => value.ToString("g6", CultureInfo.InvariantCulture);

    /// <summary>Names from files may be of any length.</summary>
    private static string Short(string name) => name.Length <= 40 ? name : $"{name[..40]}…";

    private static string Position(StateShape shape, int index) => shape.IsVector
        ? $"amplitude {index + 1}"
        : $"in row {index / shape.Dimension + 1}, column {index % shape.Dimension + 1}";

    private static string Dimensions(bool isVector) => isVector ? "4, 27, 256, 3125, 46656 or 823543" : "4, 27, 256 or 3125";

    private static string Reason(Exception slip) => slip switch
    {
        FileNotFoundException or DirectoryNotFoundException => "there is no such file",
        UnauthorizedAccessException => "it is a folder, or access is denied",
        _ => "the system gives no access to it",
    };
}
