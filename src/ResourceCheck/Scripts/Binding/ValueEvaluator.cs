using System.Numerics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>
/// Value of a resolved expression. <c>none</c> equals only itself, makes order comparisons, <c>distinct</c> and <c>same</c> false,
/// spreads through arithmetic and counts as false in logic; arithmetic that is undefined gives <c>none</c>.
/// </summary>
internal static class ValueEvaluator
{
    /// <summary>Evaluates an expression.</summary>
    /// <param name="expression">What to evaluate.</param>
    /// <param name="slots">Contents of the protocol's slots; an empty slot holds <see cref="Value.None"/>.</param>
    /// <param name="levels">Levels of each qudit.</param>
    public static Value Evaluate(BoundExpression expression, Value[] slots, int levels) => expression switch
    {
        BoundLiteral literal => literal.Value,
        BoundSlot slot => slots[slot.Slot],
        BoundBinary binary => Binary(binary, slots, levels),
        BoundIf choice => Evaluate(Holds(choice.Condition, slots, levels) ? choice.Then : choice.Else, slots, levels),
        BoundUnary unary => Unary(unary.Operator, Evaluate(unary.Operand, slots, levels)),
        BoundCall call => Call(call, slots, levels),
        BoundBasis basis => Basis(basis, slots, levels),
        _ => Value.None,
    };

    /// <summary>Whether a condition holds; <c>none</c> does not.</summary>
    public static bool Holds(BoundExpression condition, Value[] slots, int levels) => IsTrue(Evaluate(condition, slots, levels));

    private static bool IsTrue(Value value) => value is TruthValue { Truth: true };

    private static Value Unary(UnaryOperator op, Value operand)
    {
        if (op == UnaryOperator.Not)
            return Value.Of(!IsTrue(operand));
        return operand is NumberValue number ? Number(-number.Number) : Value.None;
    }

    private static Value Binary(BoundBinary binary, Value[] slots, int levels)
    {
        Value left = Evaluate(binary.Left, slots, levels);
        switch (binary.Operator)
        {
            case BinaryOperator.And:
                return Value.Of(IsTrue(left) && Holds(binary.Right, slots, levels));
            case BinaryOperator.Or:
                return Value.Of(IsTrue(left) || Holds(binary.Right, slots, levels));
        }

        Value right = Evaluate(binary.Right, slots, levels);
        return binary.Operator switch
        {
            BinaryOperator.Equal => Value.Of(left.Equals(right)),
            BinaryOperator.Unequal => Value.Of(!left.Equals(right)),
            BinaryOperator.Less or BinaryOperator.LessOrEqual or BinaryOperator.Greater or BinaryOperator.GreaterOrEqual =>
                Value.Of(left is NumberValue a && right is NumberValue b && Ordered(binary.Operator, a.Number.CompareTo(b.Number))),
            _ => left is NumberValue x && right is NumberValue y ? Arithmetic(binary.Operator, x.Number, y.Number) : Value.None,
        };
    }

    private static bool Ordered(BinaryOperator op, int order) => op switch
    {
        BinaryOperator.Less => order < 0,
        BinaryOperator.LessOrEqual => order <= 0,
        BinaryOperator.Greater => order > 0,
        _ => order >= 0,
    };

    private static Value Arithmetic(BinaryOperator op, Rational x, Rational y) => op switch
    {
        BinaryOperator.Plus => Number(x + y),
        BinaryOperator.Minus => Number(x - y),
        BinaryOperator.Times => Number(x * y),
        BinaryOperator.Divide => y.Sign == 0 ? Value.None : Number(x / y),
        BinaryOperator.Modulo => y.Sign == 0 ? Value.None : Number(x % y),
        _ => Value.None,
    };

    private static Value Call(BoundCall call, Value[] slots, int levels) => call.Function switch
    {
        ValueFunction.Distinct => Value.Of(AllDiffer(call.Arguments, slots, levels)),
        ValueFunction.Same => Value.Of(AllEqual(call.Arguments, slots, levels)),
        ValueFunction.Missing => Missing(call.Arguments, slots, levels),
        ValueFunction.Count => Count(call.Arguments, slots, levels),
        ValueFunction.Largest => Largest(call.Arguments, slots, levels),
        ValueFunction.Absolute => Absolute(Evaluate(call.Arguments[0], slots, levels)),
        _ => Value.None,
    };

    private static bool AllDiffer(IReadOnlyList<BoundExpression> arguments, Value[] slots, int levels)
    {
        for (int i = 0; i < arguments.Count; i++)
        {
            Value value = Evaluate(arguments[i], slots, levels);
            if (value is NoneValue)
                return false;
            for (int k = 0; k < i; k++)
            {
                if (value.Equals(Evaluate(arguments[k], slots, levels)))
                    return false;
            }
        }

        return true;
    }

    private static bool AllEqual(IReadOnlyList<BoundExpression> arguments, Value[] slots, int levels)
    {
        Value? first = null;
        for (int i = 0; i < arguments.Count; i++)
        {
            Value value = Evaluate(arguments[i], slots, levels);
            if (value is NoneValue || (first is not null && !value.Equals(first)))
                return false;
            first = value;
        }

        return true;
    }

    private static Value Missing(IReadOnlyList<BoundExpression> arguments, Value[] slots, int levels)
    {
        int missing = -1;
        for (int level = 0; level < levels; level++)
        {
            if (Contains(arguments, level, slots, levels))
                continue;
            if (missing >= 0)
                return Value.None;
            missing = level;
        }

        return missing < 0 ? Value.None : Value.Of(missing);
    }

    private static bool Contains(IReadOnlyList<BoundExpression> arguments, int level, Value[] slots, int levels)
    {
        for (int i = 0; i < arguments.Count; i++)
        {
            if (Evaluate(arguments[i], slots, levels) is NumberValue number && number.Number.IsWhole && number.Number.Numerator == level)
                return true;
        }

        return false;
    }

    private static Value Count(IReadOnlyList<BoundExpression> arguments, Value[] slots, int levels)
    {
        int count = 0;
        for (int i = 0; i < arguments.Count; i++)
        {
            if (Holds(arguments[i], slots, levels))
                count++;
        }

        return Value.Of(count);
    }

    private static Value Largest(IReadOnlyList<BoundExpression> arguments, Value[] slots, int levels)
    {
        NumberValue? largest = null;
        for (int i = 0; i < arguments.Count; i++)
        {
            if (Evaluate(arguments[i], slots, levels) is not NumberValue number)
                return Value.None;
            if (largest is null || number.Number > largest.Number)
                largest = number;
        }

        return largest ?? Value.None;
    }

    private static Value Absolute(Value value) => value is NumberValue number
        ? number.Number.Sign < 0 ? Number(-number.Number) : number
        : Value.None;

    private static Value Basis(BoundBasis basis, Value[] slots, int levels)
    {
        if (basis.Argument is null)
            return new BasisValue(basis.Kind, -1, basis.File);
        if (Evaluate(basis.Argument, slots, levels) is not NumberValue { Number.IsWhole: true } number)
            return Value.None;
        BigInteger argument = number.Number.Numerator;
        bool fourier = basis.Kind == BasisKind.Fourier;
        if (argument < (fourier ? 1 : 0) || argument > (fourier ? levels : levels - 1))
            return Value.None;
        // phased(0) and fourier on all levels are the Fourier basis, so that they equal it as values.
        bool plain = fourier ? argument == levels : argument.IsZero;
        return plain ? new BasisValue(BasisKind.Fourier, -1, null) : new BasisValue(basis.Kind, (int)argument, null);
    }

    private static Value Number(Rational number)
    {
        BigInteger numerator = number.Numerator;
        return number.IsWhole && numerator.Sign >= 0 && numerator < 16 ? Value.Of((int)numerator) : new NumberValue(number);
    }
}
