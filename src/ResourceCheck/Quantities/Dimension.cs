namespace ResourceCheck.Quantities;

/// <summary>What kind of quantity a unit measures.</summary>
internal enum Dimension
{
    /// <summary>A plain number.</summary>
    None,

    /// <summary>Time, held in s.</summary>
    Time,

    /// <summary>Length, held in m.</summary>
    Length,

    /// <summary>Length in wavelengths of the first transition.</summary>
    Wavelengths,

    /// <summary>Cycles per second, held in Hz.</summary>
    Frequency,

    /// <summary>Events or e-foldings per second, held in 1/s.</summary>
    Rate,

    /// <summary>Speed, held in m/s.</summary>
    Speed,

    /// <summary>Loss of power, held in dB.</summary>
    Loss,

    /// <summary>Loss of power per length, held in dB/m.</summary>
    LossPerLength,

    /// <summary>Angle, held in rad.</summary>
    Angle,
}
