using ResourceCheck.Diagnostics;

namespace ResourceCheck.Reports;

/// <summary>Cause and cure of the messages about command lines and files.</summary>
public static class UsageCatalogue
{
    /// <summary>All of them, in order of code.</summary>
    public static IReadOnlyList<Explanation> All { get; } =
    [
        new("U001", "unknown command", "The first word is no command, or there is none.", "Use one of the commands that resourcecheck --help lists.", "resourcecheck rnu removal.protocol"),
        new("U002", "unknown option", "A word that begins with a dash is no option of this command.", "See the command's --help. A file name that begins with a dash goes behind a lone --.", "resourcecheck run removal.protocol --unter winter.conditions.json"),
        new("U003", "one word too many", "The command takes fewer words than were given.", "Remove the word, or put quotes around a name with blanks.", "resourcecheck run removal.protocol winter.conditions.json"),
        new("U004", "option without a value", "An option that takes a value stands last, or before another option.", "Give the value behind the option.", "resourcecheck run removal.protocol --under"),
        new("U005", "option given twice", "An option that takes one value was given several times.", "Keep one of them. Only --set and --parameter may be repeated.", "resourcecheck run removal.protocol --seed 1 --seed 2"),
        new("U006", "missing word", "The command needs a file or a name that was not given.", "Add it behind the command.", "resourcecheck run"),
        new("U007", "unknown choice", "The option knows a fixed list of values, and this is none of them.", "Use one of the values that the message names.", "resourcecheck run removal.protocol --format pdf"),
        new("U008", "not of the form name=value", "--set and --parameter take a name, an equals sign and a value.", "Write --set flight.Dov.length=\"5 km\" or --parameter n=4.", "resourcecheck run removal.protocol --parameter n"),
        new("U009", "not a whole number that fits", "The option takes a whole number in decimal digits.", "Write it without point, unit or separators.", "resourcecheck run removal.protocol --threads two"),
        new("U010", "not a memory size", "--memory takes a number and a unit of bytes.", "Write 4 GB or 512 MiB.", "resourcecheck run removal.protocol --memory 4"),
        new("U011", "options that exclude each other", "Two options ask for different things.", "Leave out one of the two.", "resourcecheck format removal.protocol --check --write"),
        new("U012", "name given twice", "The same parameter or path was set twice on the command line.", "Keep one of them; a list such as n=3,4 asks for several values.", "resourcecheck run removal.protocol --parameter n=3 --parameter n=4"),
        new("U014", "no time", "The option takes a time with its unit.", "Write for example \"5 ns\" or \"2 us\".", "resourcecheck storage winter.conditions.json --until 5"),
        new("U020", "no such file", "The file does not exist, or a folder on its way does not.", "Check the spelling; names are relative to the folder you are in.", "resourcecheck run remval.protocol"),
        new("U021", "a folder where a file is needed", "The name is that of a folder.", "Name a file in it.", "resourcecheck run protocols"),
        new("U022", "file cannot be read", "The system refused to read the file.", "Check its permissions and the disk."),
        new("U023", "not UTF-8 text", "The file holds bytes that are no UTF-8; often it was saved in another encoding, or is no text at all.", "Save it as UTF-8."),
        new("U024", "file too large", "Scripts and conditions are a few pages long; this file is far beyond that and most likely a wrong one.", "Name the right file. Data belong into files that the conditions name."),
        new("U025", "standard input used twice", "The name - stands for standard input, which can be read only once.", "Give one of the two as a file.", "resourcecheck run - --under -"),
        new("U030", "no such folder for the output", "The folder of the output file does not exist.", "Make the folder first, or choose another."),
        new("U031", "output cannot be written", "The system refused to write the output file. Nothing of it was left behind.", "Check permissions and free space, or choose another name."),
        new("U032", "file exists", "new writes no file over another.", "Choose another name, or add --force to replace the files."),
        new("U033", "unfit name for new files", "The name is empty or ends with a separator.", "Give a name such as study or work/study.", "resourcecheck new work/"),
        new("U034", "standard output cannot be written", "The system refused to take the result, most likely for lack of space.", "Free some space, or send the result elsewhere with --out."),
        new("U035", "output over an input", "The file named with --out or --figure is the script, conditions or state that the command reads.", "Choose another name for the result.", "resourcecheck run removal.protocol --out removal.protocol"),
        new("U040", "unknown code", "There is no message with this code.", "resourcecheck explain lists all codes.", "resourcecheck explain S999"),
        new("U041", "unknown schema", "There is no schema of this name.", "Use one of the names that the message lists.", "resourcecheck schema results"),
        new("U042", "no probability", "A target is a number above 0 and up to 1.", "Write for example 1e-6 or 0.001.", "resourcecheck copies protocols/liar-detection.protocol --failure 2"),
        new("U043", "no drift", "A drift is a fraction of runs and the conditions that they are under.", "Write the fraction, a colon and the name of a conditions file.", "resourcecheck run protocols/removal.protocol --drift 1%"),
        new("U047", "no name for a figure", "Figures are written as SVG, and their numbers beside them in a file that ends in .dat.", "Give a name that ends in .svg.", "resourcecheck sweep protocols/removal.protocol --vary flight.depolarising=0..0.1 --figure curve.png"),
        new("U048", "a file where a folder is needed", "A report is a folder of files.", "Name another folder with --folder.", "resourcecheck report winter.study.json --folder winter.study.json"),
        new("U090", "out of memory", "The work needs more memory than there is.", "Use a smaller case, or set --memory so that a leaner engine is chosen."),
        new("U099", "mistake of the program", "The program met a state that its authors thought impossible. Your input need not be wrong.", "Report it with the command line, the input files and the version. RESOURCECHECK_TRACE=1 in the environment shows details for the report."),
    ];
}
