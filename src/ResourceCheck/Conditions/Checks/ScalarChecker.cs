using System.Globalization;
using ResourceCheck.Conditions.Json;
using ResourceCheck.Conditions.Keys;
using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions.Checks;

/// <summary>Reads single values: quantities, numbers, levels, texts, flags.</summary>
internal sealed class ScalarChecker(Findings findings)
{
    /// <summary>Beyond this, in base units, products and quotients of conditions could overflow; no laboratory comes near it.</summary>
    private const double Largest = 1e30;

    /// <summary>The value; null when it is refused.</summary>
    public Setting? Check(Node node, Shape shape, string path) => shape switch
    {
        QuantityShape quantity => Quantity(node, quantity, path),
        NumberShape number => Number(node, number, path),
        LevelShape => Level((NumberNode)node, path),
        TextShape text => Text((TextNode)node, text, path),
        WordShape word => Word((TextNode)node, word, path),
        _ => new FlagSetting(node.Spot, path, ((TruthNode)node).Truth),
    };

    private NumberSetting? Quantity(Node node, QuantityShape shape, string path)
    {
        if (Parse(node, shape, path) is not { Problem: QuantityProblem.None } parsed)
            return null;
        Dimension found = parsed.Unit!.Dimension;
        if (found == Dimension.None && !shape.TakesBareNumbers)
            findings.Add(ConditionsMessages.UnitMissing(node.Spot, path, Written(node), shape));
        else if (found != Dimension.None && !shape.Fits.Contains(found))
            findings.Add(ConditionsMessages.WrongDimension(node.Spot, path, parsed, shape));
        else
            return Bounded(node, parsed, shape.Bounds, shape, path, found == Dimension.None ? shape.Fits[0] : found);
        return null;
    }

    private NumberSetting? Number(Node node, NumberShape shape, string path)
    {
        if (Parse(node, shape, path) is not { Problem: QuantityProblem.None } parsed)
            return null;
        if (parsed.Unit!.Dimension == Dimension.None)
            return Bounded(node, parsed, shape.Bounds, shape, path, Dimension.None);
        findings.Add(ConditionsMessages.UnitNotWanted(node.Spot, path, parsed.UnitText, shape));
        return null;
    }

    private ParsedQuantity? Parse(Node node, Shape shape, string path)
    {
        ParsedQuantity parsed = QuantityParser.Parse(Written(node));
        if (parsed.Problem == QuantityProblem.None)
            return parsed;
        findings.Add(parsed.Problem switch
        {
            QuantityProblem.Comma => ConditionsMessages.CommaInNumber(node.Spot, path, Written(node)),
            QuantityProblem.OutOfRange => ConditionsMessages.NotFinite(node.Spot, path, Written(node)),
            QuantityProblem.UnknownUnit => ConditionsMessages.UnknownUnit(node.Spot, path, parsed.UnitText, shape),
            _ => ConditionsMessages.NoNumber(node.Spot, path, Written(node), shape),
        });
        return null;
    }

    private NumberSetting? Bounded(Node node, ParsedQuantity parsed, Bounds bounds, Shape shape, string path, Dimension dimension)
    {
        if (Math.Abs(parsed.Value) > Largest || (bounds == Bounds.Positive && parsed.Value is > 0 and < 1 / Largest))
        {
            findings.Add(ConditionsMessages.NotFinite(node.Spot, path, Written(node)));
            return null;
        }

        bool fits = bounds switch
        {
            Bounds.NotNegative => parsed.Value >= 0,
            Bounds.Positive => parsed.Value > 0,
            Bounds.Probability => parsed.Value is >= 0 and <= 1,
            _ => true,
        };
        if (fits)
            return new NumberSetting(node.Spot, path, parsed.Value, parsed.Uncertainty, dimension, parsed.UnitText);
        findings.Add(ConditionsMessages.OutOfBounds(node.Spot, path, Written(node), bounds, shape));
        return null;
    }

    private LevelSetting? Level(NumberNode node, string path)
    {
        if (int.TryParse(node.Raw, NumberStyles.None, CultureInfo.InvariantCulture, out int level))
            return new LevelSetting(node.Spot, path, level);
        findings.Add(ConditionsMessages.NoLevel(node.Spot, path, node.Raw));
        return null;
    }

    private TextSetting? Text(TextNode node, TextShape shape, string path)
    {
        bool fits = shape.IsFile ? node.Text.Trim().Length > 0 && !node.Text.Any(char.IsControl) : !node.Text.Any(c => c is '\n' or '\r');
        if (fits)
            return new TextSetting(node.Spot, path, node.Text);
        findings.Add(ConditionsMessages.BadText(node.Spot, path, shape));
        return null;
    }

    private TextSetting? Word(TextNode node, WordShape shape, string path)
    {
        if (shape.Words.Contains(node.Text))
            return new TextSetting(node.Spot, path, node.Text);
        findings.Add(ConditionsMessages.NoSuchWord(node.Spot, path, node.Text, shape));
        return null;
    }

    private static string Written(Node node) => node is NumberNode number ? number.Raw : ((TextNode)node).Text;
}
