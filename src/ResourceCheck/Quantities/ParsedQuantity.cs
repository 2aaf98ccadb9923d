namespace ResourceCheck.Quantities;

/// <summary>What became of reading a quantity's text.</summary>
internal enum QuantityProblem
{
    /// <summary>It was read.</summary>
    None,

    /// <summary>It does not begin with a number.</summary>
    NoNumber,

    /// <summary>It has a comma where a point is meant.</summary>
    Comma,

    /// <summary>The number is too large or too small to be held.</summary>
    OutOfRange,

    /// <summary>What follows the number is no unit of the table.</summary>
    UnknownUnit,
}

/// <summary>A quantity as read: value and standard uncertainty in the base unit of the unit's dimension.</summary>
/// <param name="Problem">Why it could not be read.</param>
/// <param name="Value">Value; 0 when it could not be read.</param>
/// <param name="Uncertainty">Standard uncertainty; null when none was written.</param>
/// <param name="Unit">The unit; null when it is not in the table.</param>
/// <param name="UnitText">What stands behind the number, as written.</param>
internal readonly record struct ParsedQuantity(QuantityProblem Problem, double Value, double? Uncertainty, Unit? Unit, string UnitText);
