using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Conformity;

/// <summary>How what is known about a true value spreads around the value found.</summary>
public enum UncertaintyScale
{
    /// <summary>Evenly to both sides.</summary>
    Linear,

    /// <summary>Evenly by factors: for values above zero whose uncertainty is relative, such as a penetration.</summary>
    Logarithmic,
}

/// <summary>The part of an uncertainty that more fields would make smaller.</summary>
/// <param name="StandardUncertainty">That part alone, one sigma, of the present mean over the fields.</param>
/// <param name="Fields">How many fields it rests on, 1 or more.</param>
public sealed record SamplingShare(IQuantity StandardUncertainty, int Fields);

/// <summary>What was found for a characteristic, and how sure it is.</summary>
public sealed record ObservedValue
{
    /// <summary>Takes a value with its standard uncertainty.</summary>
    /// <param name="value">The value found.</param>
    /// <param name="standardUncertainty">Its standard uncertainty (one sigma), zero or above; zero says 'known exactly'.</param>
    /// <exception cref="ArgumentException">The two are of different kinds.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A number is not finite, or the uncertainty is negative.</exception>
    public ObservedValue(IQuantity value, IQuantity standardUncertainty)
    {
        if (value.QuantityInfo.UnitType != standardUncertainty.QuantityInfo.UnitType)
        {
            throw new ArgumentException("A value and its uncertainty must be of one kind.", nameof(standardUncertainty));
        }

        Require.Finite((double)value.Value, nameof(value));
        Require.NotNegative((double)standardUncertainty.Value, nameof(standardUncertainty));
        Value = value;
        StandardUncertainty = standardUncertainty;
    }

    /// <summary>The value found.</summary>
    public IQuantity Value { get; }

    /// <summary>Its standard uncertainty, one sigma.</summary>
    public IQuantity StandardUncertainty { get; }

    /// <summary>The degrees of freedom of the uncertainty, 1 or more; infinite where it is well known. Default infinite.</summary>
    public double DegreesOfFreedom { get; init => field = value >= 1 ? value : throw new ArgumentOutOfRangeException(nameof(value)); } = double.PositiveInfinity;

    /// <summary>How the true value spreads around <see cref="Value"/>. Default linear.</summary>
    public UncertaintyScale Scale { get; init; } = UncertaintyScale.Linear;

    /// <summary>
    /// The lowest and highest value that other models give from the same inputs; null for a measured value. It is never mixed into
    /// the standard uncertainty: a decision must hold at both ends.
    /// </summary>
    public (IQuantity Low, IQuantity High)? ModelBand { get; init; }

    /// <summary>The part of the uncertainty that more fields would make smaller; null when fields do not matter.</summary>
    public SamplingShare? Sampling { get; init; }
}
