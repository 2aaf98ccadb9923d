using ResourceCheck.Diagnostics;

namespace ResourceCheck.Resources;

/// <summary>Cause and cure of every code of prepared states.</summary>
internal static class StateCatalogue
{
    /// <summary>In order of code.</summary>
    public static IReadOnlyList<Explanation> All { get; } =
    [
        new("D001", "State not readable", "The file does not exist, is a folder, or may not be read.", "Check name, folder and permissions. Names in a conditions file count from its folder."),
        new("D002", "Unknown format of a state", "The ending of the name tells the format, and it is none of .npy, .mtx and .json.", "Save the state in one of these formats."),
        new("D003", "Text too large", "A .mtx or .json file is larger than 512 MiB.", "Save the state as .npy, which takes 16 bytes a number."),
        new("D004", "No .npy array", "The first bytes are not those of the format.", "Save one array of numbers rather than an archive or a pickle."),
        new("D005", "Unknown .npy version", "The array is of another version than 1.0 and 2.0.", "Save it again in one of these."),
        new("D006", "Header of .npy malformed", "The header is cut off, or deviates from the form that the format prescribes.", "Save the array again.", "{'descr': '<c16', 'shape': (27,), }"),
        new("D007", "Type of .npy not read", "The array holds something other than real or complex numbers of single or double precision. Objects would have to be unpickled, which can run foreign code.", "Convert the array to complex numbers.", "{'descr': '|O', 'fortran_order': False, 'shape': (27,), }"),
        new("D008", "Length of .npy wrong", "The file holds more or fewer bytes than its shape needs. Nothing is read then, so that a lying header takes no memory.", "Copy the file again."),
        new("D009", "Neither vector nor square matrix", "The array has more than two axes, or two of different lengths.", "Flatten the parties' axes, first party first."),
        new("D010", "Size is no N^N", "Files without stated levels must have N^N amplitudes or rows for N parties.", "Check the number of levels, or state `parties` and `levels` in JSON."),
        new("D011", "State too large", "Vectors are read up to 823543 amplitudes, density matrices up to 3125 rows.", "Take fewer parties or levels, or a vector in place of a matrix."),
        new("D012", "Number not finite", "The file holds NaN or infinite numbers.", "Find out where they were made."),
        new("D013", "Not Hermitian", "An entry is not the conjugate of its mirror image, beyond round-off.", "Correct the file, or mend the state when the deviation is small."),
        new("D014", "Trace not 1", "The diagonal does not add up to 1.", "Normalise the matrix where it is made, or mend it when the deviation is small."),
        new("D015", "Negative eigenvalue", "The matrix gives negative probabilities for some measurement, as linear reconstruction from counts often does.", "Mend the state when the deviation is small, or reconstruct it with positivity built in."),
        new("D016", "Norm not 1", "The squares of the amplitudes do not add up to 1.", "Normalise the vector, or mend it when the deviation is small."),
        new("D017", "Too large to be mended", "Mending needs all eigenvectors, which takes too long for this size.", "Mend the state where it is made."),
        new("D018", "State was mended", "The numbers were slightly no state, and the nearest one was asked for.", "Look at both columns of figures; certify nothing from the mended one."),
        new("D019", "Eigenvalues not computed", "For large matrices positivity is shown by a Cholesky factorisation, which bounds the lowest eigenvalue without computing it.", "Nothing needs to be done."),
        new("D020", "First line of .mtx", "The first line names another kind of matrix, or is missing.", "Begin with %%MatrixMarket matrix and the words that apply.", "%%MatrixMarket matrix coordinate pattern general"),
        new("D021", "Size line of .mtx", "The first line that is no comment must give rows, columns and, for coordinates, the number of entries.", "Write the size line.", "27 27"),
        new("D022", "Symmetric but not square", "Only square matrices are symmetric or hermitian.", "Call a vector general."),
        new("D023", "Entry of .mtx", "The line holds too few or too many words.", "Write one entry a line.", "1 2 0.5"),
        new("D024", "Number of .mtx", "A word is no finite decimal number.", "Write a point before the decimals and e before the exponent.", "1 2 0,5"),
        new("D025", "Place of an entry", "The entry lies outside, above the diagonal of a symmetric matrix, is given twice, or is not real on a Hermitian diagonal.", "Correct the row and column."),
        new("D026", "Number of entries", "The file has more or fewer entries than its size line announces.", "Copy the file again, or correct the size line."),
        new("D027", "More mistakes", "The list of findings was cut.", "Correct those shown, then run again."),
        new("D030", "No JSON", "The text deviates from JSON: a missing quote, comma or bracket, a comment, a comma too many, NaN.", "Correct it where the message points.", "{\"parties\": 2,}"),
        new("D031", "Unknown member of a state", "The object holds a name that states do not have.", "Use parties, levels, vector, density and terms.", "{\"partys\": 2}"),
        new("D032", "Given twice", "The same name stands twice in one object; which one counts would be a guess.", "Leave one out."),
        new("D033", "State missing or given twice over", "A file needs `parties` and exactly one of `vector`, `density` and `terms`.", "Add what is missing.", "{\"parties\": 2}"),
        new("D034", "Value does not fit", "A value is of another type than its place needs.", "Write what the message names.", "{\"parties\": \"two\"}"),
        new("D035", "Levels of a term", "The name of a term is no list of one level per party.", "Join the levels by -, first party first.", "{\"parties\": 3, \"terms\": {\"0-1\": 1}}"),
        new("D036", "Rows of different length", "The rows of a density matrix differ in length.", "Complete the row."),
        new("D037", "List too long", "A list exceeds the largest state that is read.", "Take fewer parties or levels."),
        new("D038", "Size differs from d^N", "The numbers given are not as many as `parties` and `levels` ask for.", "Correct one of them."),
        new("D040", "Too many parties", "All amplitudes of the ideal state would not fit into memory.", "Lower the number of parties."),
        new("D041", "Exchange beyond four", "One pulse gives all parties equal weight only up to four of them.", "Take a prepared state from a file."),
        new("D042", "Number of exchange steps", "N parties are built in N - 1 steps.", "Give one entry per step."),
        new("D043", "Exchange step malformed", "A step's errors or couplings are missing, not symmetric, or not finite.", "Give one coupling for every pair."),
        new("D044", "State of another size", "The file's parties or levels are not those of the protocol.", "Take another state or another number of parties."),
        new("D045", "Relaxation of too many", "Relaxation follows the density operator of all emitters.", "Lower the number of parties, or give the relaxed state as a file."),
        new("D046", "Nothing without a photon", "Heralding on no photon keeps nothing of this start.", "Leave `heralded` out, relax for a shorter time, or take another start."),
    ];
}
