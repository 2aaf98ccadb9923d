using System.Text;
using ResourceCheck.Scripts.Parsing;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Printing;

/// <summary>Writes expressions with the fewest brackets that keep the tree.</summary>
internal sealed class ExpressionPrinter
{
    private readonly StringBuilder _text = new();

    // A `v of Ada` would swallow a party behind the next comma, or the `of` that parts the arguments of some.
    private bool _guardOf;

    public static string Print(Expression expression)
    {
        ExpressionPrinter printer = new();
        printer.Write(expression, OperatorTable.Conditional);
        return printer._text.ToString();
    }

    /// <summary>A sum or what binds tighter, as in the ends of a range.</summary>
    public static string PrintSum(Expression expression)
    {
        ExpressionPrinter printer = new();
        printer.Write(expression, OperatorTable.Sum);
        return printer._text.ToString();
    }

    /// <summary>An item that a comma follows.</summary>
    public static string PrintBeforeComma(Expression expression)
    {
        ExpressionPrinter printer = new() { _guardOf = true };
        printer.Write(expression, OperatorTable.Conditional);
        return printer._text.ToString();
    }

    /// <summary>A basis in its own place, where a sum or what binds tighter fits, or a basis on some levels.</summary>
    public static string PrintBasis(Expression basis, bool beforeComma)
    {
        ExpressionPrinter printer = new() { _guardOf = beforeComma };
        printer.Write(basis, OperatorTable.FourierOn);
        return printer._text.ToString();
    }

    public static string PrintList(IReadOnlyList<Expression> items)
    {
        ExpressionPrinter printer = new();
        printer.WriteList(items);
        return printer._text.ToString();
    }

    public static string PrintParties(PartyList parties) => string.Join(", ", parties.Items.Select(PrintParty));

    public static string PrintParty(PartyRef party) => party switch
    {
        NamedParty named => named.Name,
        FamilyParty { To: { } to } range => $"{range.Family}[{Print(range.From)}..{Print(to)}]",
        FamilyParty member => $"{member.Family}[{Print(member.From)}]",
        CollectiveParty collective => collective.Others ? "others" : "all",
        _ => throw new ArgumentException($"Unknown kind of party {party.GetType().Name}.", nameof(party)),
    };

    public static string PrintQuoted(Quoted quoted) => $"\"{quoted.Text}\"";

    private void Write(Expression expression, int least)
    {
        bool brackets = PrecedenceOf(expression) < least || (_guardOf && expression is OfExpression);
        bool outer = _guardOf;
        if (brackets)
            _guardOf = false;
        _text.Append(brackets ? "(" : "");
        WriteBare(expression);
        _text.Append(brackets ? ")" : "");
        _guardOf = outer;
    }

    private static int PrecedenceOf(Expression expression) => expression switch
    {
        BinaryExpression binary => OperatorTable.Of(binary.Operator).Precedence,
        UnaryExpression { Operator: UnaryOperator.Not } => OperatorTable.Not,
        UnaryExpression => OperatorTable.Negation,
        IfExpression => OperatorTable.Conditional,
        BasisExpression { Kind: BasisKind.Fourier, Argument: not null } => OperatorTable.FourierOn,
        // An operator behind the last of several parties would make that party a value of its own.
        OfExpression { Parties.Items.Count: > 1 } => OperatorTable.PartyList,
        _ => OperatorTable.Whole,
    };

    private void WriteBare(Expression expression)
    {
        switch (expression)
        {
            case BinaryExpression binary:
                WriteBinary(binary);
                break;
            case UnaryExpression { Operator: UnaryOperator.Not } not:
                _text.Append("not ");
                Write(not.Operand, OperatorTable.Not);
                break;
            case UnaryExpression negation:
                _text.Append('-');
                Write(negation.Operand, OperatorTable.Negation);
                break;
            case IfExpression choice:
                WriteIf(choice);
                break;
            case CallExpression call:
                WriteCall(call);
                break;
            case BasisExpression basis:
                WriteBasis(basis);
                break;
            default:
                _text.Append(Leaf(expression));
                break;
        }
    }

    private static string Leaf(Expression expression) => expression switch
    {
        NumberExpression number => number.Text,
        TruthExpression truth => truth.Value ? "true" : "false",
        NoneExpression => "none",
        LabelExpression label => PrintQuoted(label.Label),
        NameExpression name => name.Text,
        PartyExpression party => PrintParty(party.Party),
        MemberExpression member => $"{PrintParty(member.Party)}.{member.Member.Text}",
        OfExpression of => $"{of.Member.Text} of {PrintParties(of.Parties)}",
        UnitaryExpression unitary => UnitaryPrinter.Print(unitary),
        _ => throw new ArgumentException($"Unknown kind of expression {expression.GetType().Name}.", nameof(expression)),
    };

    private void WriteBinary(BinaryExpression binary)
    {
        OperatorEntry entry = OperatorTable.Of(binary.Operator);
        // Comparisons do not group, so the left one needs brackets as well.
        Write(binary.Left, entry.IsComparison ? entry.Precedence + 1 : entry.Precedence);
        _text.Append(' ').Append(entry.Text).Append(' ');
        Write(binary.Right, entry.Precedence + 1);
    }

    private void WriteIf(IfExpression choice)
    {
        _text.Append("if ");
        Write(choice.Condition, OperatorTable.Conditional);
        _text.Append(" then ");
        Write(choice.Then, OperatorTable.Conditional);
        _text.Append(" else ");
        Write(choice.Else, OperatorTable.Conditional);
    }

    private void WriteCall(CallExpression call)
    {
        _text.Append(call.Function.Text);
        if (call.Function.Text == "harm" && call.Arguments is [LabelExpression label])
        {
            _text.Append(' ').Append(PrintQuoted(label.Label));
            return;
        }

        bool outer = _guardOf;
        _guardOf = call.Function.Text == "some";
        _text.Append('(');
        WriteList(call.Arguments);
        _guardOf = false;
        WriteSecond(call);
        _text.Append(')');
        _guardOf = outer;
    }

    private void WriteSecond(CallExpression call)
    {
        if (call.Separator is null)
            return;
        _text.Append(call.Separator == ";" ? "; " : $" {call.Separator} ");
        if (call.Over is { } parties)
            _text.Append(PrintParties(parties));
        else
            WriteList(call.Second);
    }

    private void WriteList(IReadOnlyList<Expression> items)
    {
        bool outer = _guardOf;
        for (int i = 0; i < items.Count; i++)
        {
            _guardOf = outer || i < items.Count - 1;
            _text.Append(i > 0 ? ", " : "");
            Write(items[i], OperatorTable.Conditional);
        }

        _guardOf = outer;
    }

    private void WriteBasis(BasisExpression basis)
    {
        switch (basis)
        {
            case { Kind: BasisKind.Fourier, Argument: { } size }:
                _text.Append("fourier on ");
                Write(size, OperatorTable.Sum);
                break;
            case { Kind: BasisKind.Phased, Argument: { } number }:
                _text.Append("phased(").Append(Print(number)).Append(')');
                break;
            case { Kind: BasisKind.Matrix, File: { } file }:
                _text.Append("matrix ").Append(PrintQuoted(file));
                break;
            default:
                _text.Append(basis.Kind == BasisKind.Fourier ? "fourier" : "level");
                break;
        }
    }
}
