using System.Collections.Immutable;
using FiberScope.Statistics;

namespace FiberScope.Fibres;

/// <summary>The diameter readings of one swatch and what they say, with the uncertainty that their clusters allow.</summary>
/// <remarks>
/// Readings on one fibre, and fibres in one field, are not independent: intervals come from fields and fibres, never from the
/// count of readings.
/// </remarks>
public sealed record DiameterSurvey
{
    /// <summary>The readings, in the order given.</summary>
    public required ImmutableArray<DiameterReading> Readings { get; init; }

    /// <summary>The figures in which every length of fibre counts the same.</summary>
    public required DiameterStatistics LengthWeighted { get; init; }

    /// <summary>The figures in which every trace counts once, with its own length-weighted mean diameter.</summary>
    public required DiameterStatistics NumberWeighted { get; init; }

    /// <summary>How many traces carry readings.</summary>
    public required int FibreCount { get; init; }

    /// <summary>How many fields carry readings.</summary>
    public required int FieldCount { get; init; }

    /// <summary>The uncertainty of the length-weighted mean, part by part.</summary>
    public required UncertaintyBudget Budget { get; init; }

    /// <summary>The 95 % interval of the length-weighted mean: sampling, scale and edge together.</summary>
    public required LengthInterval MeanInterval95 { get; init; }

    /// <summary>The 95 % interval of the number-weighted mean.</summary>
    public required LengthInterval NumberMeanInterval95 { get; init; }

    /// <summary>The 95 % interval of the length-weighted standard deviation, from sampling.</summary>
    public required LengthInterval StandardDeviationInterval95 { get; init; }

    /// <summary>The 95 % interval of the length-weighted D10, from sampling.</summary>
    public required LengthInterval D10Interval95 { get; init; }

    /// <summary>The 95 % interval of the length-weighted D50, from sampling.</summary>
    public required LengthInterval D50Interval95 { get; init; }

    /// <summary>The 95 % interval of the length-weighted D90, from sampling.</summary>
    public required LengthInterval D90Interval95 { get; init; }

    /// <summary>Shapes fitted to the length-weighted diameters (in metres); null when all readings are equal.</summary>
    public required ShapeComparison? Shapes { get; init; }

    /// <summary>What a reader must know before relying on the figures.</summary>
    public required ImmutableArray<Caveat> Caveats { get; init; }

    /// <summary>The length-weighted distribution that filtration sees.</summary>
    public DiameterDistribution Distribution => DiameterDistribution.FromReadings(Readings);

    /// <summary>Works out a survey from readings.</summary>
    /// <param name="readings">The readings of one swatch; at least one. Field numbers tell fields apart, fibre numbers traces within a field.</param>
    /// <param name="settings">Scale and edge uncertainty, bootstrap draws and seed.</param>
    /// <exception cref="ArgumentException">There are no readings, or one has a diameter or length that is not above zero.</exception>
    public static DiameterSurvey From(IEnumerable<DiameterReading> readings, SurveySettings settings) =>
        new SurveyCalculation([.. readings], settings).Run();

    /// <summary>How many fields in all would bring the 95 % interval of the mean to ± a share of the mean.</summary>
    /// <param name="relativeHalfWidth">The wanted half-width over the mean; dimensionless, above zero.</param>
    /// <returns>The number of fields, or null when scale and edge alone are already wider, or one field cannot tell.</returns>
    public int? FieldsNeededFor(double relativeHalfWidth) => MeasuringPlan.FieldsNeeded(this, Require.Positive(relativeHalfWidth));

    /// <inheritdoc/>
    public bool Equals(DiameterSurvey? other) => other is not null && Readings.SequenceEqual(other.Readings) && MeanInterval95 == other.MeanInterval95;

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(Readings.Length, LengthWeighted.Mean);
}
