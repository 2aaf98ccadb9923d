using System.Globalization;
using ResourceCheck.Conditions;
using ResourceCheck.Quantities;

namespace ResourceCheck.Judgement.Uncertain;

/// <summary>The uncertain values of conditions, and how they are moved.</summary>
internal static class UncertainInputs
{
    /// <summary>Values with an uncertainty above 0.</summary>
    public static IReadOnlyList<UncertainInput> Of(ConditionsDocument? document) =>
        [.. (document?.Uncertainties ?? []).Where(u => u.StandardUncertainty > 0).Select(Of)];

    /// <summary>The request with other values, in base units, put in for the inputs. An entry is moved as a whole, so what shares it moves together.</summary>
    public static RunRequest Into(RunRequest request, IEnumerable<(UncertainInput Input, double Base)> values) =>
        request with { Overrides = [.. request.Overrides, .. values.Select(v => KeyValuePair.Create(v.Input.Path, Text(v.Input, v.Base)))] };

    /// <summary>How many base units a unit is.</summary>
    public static double Scale(string unit) => UnitTable.Find(unit) is { } found ? found.Factor * Math.Pow(10, found.PowerOfTen) : 1;

    /// <summary>A value of base units in a unit, without the round-off of the division: nobody writes more than 15 digits.</summary>
    public static double In(double value, double scale) => double.Parse((value / scale).ToString("E14", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);

    private static UncertainInput Of(UncertainQuantity quantity)
    {
        double scale = Scale(quantity.Unit);
        return new UncertainInput(quantity.Path, In(quantity.Value, scale), In(quantity.StandardUncertainty, scale), quantity.Unit)
        {
            Base = quantity.Value,
            BaseUncertainty = quantity.StandardUncertainty,
            BaseUnit = quantity.BaseUnit,
        };
    }

    private static string Text(UncertainInput input, double value)
    {
        string number = value.ToString("R", CultureInfo.InvariantCulture);
        return input.BaseUnit.Length == 0 ? number : $"{number} {input.BaseUnit}";
    }
}
