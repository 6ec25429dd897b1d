using System.Collections.Immutable;
using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>How the fibre length of a mat is shared out over diameters: what filtration sees.</summary>
/// <remarks>Always length-weighted. Immutable; two distributions are equal when they hold the same classes.</remarks>
public sealed record DiameterDistribution
{
    /// <summary>The most classes that <see cref="FromReadings"/> makes unless told otherwise.</summary>
    public const int DefaultClassCount = 40;

    /// <summary>Takes the classes, in any order; their fractions are scaled to sum to one.</summary>
    /// <exception cref="ArgumentException">There are no classes, or a diameter or fraction is not above zero.</exception>
    public DiameterDistribution(IEnumerable<DiameterClass> classes)
    {
        var ascending = classes.OrderBy(c => c.Diameter.Meters).ToArray();
        var total = ascending.Sum(c => c.LengthFraction);
        if (ascending.Length == 0 || ascending.Any(c => !(c.Diameter.Meters > 0) || !(c.LengthFraction > 0)) || !double.IsFinite(total))
        {
            throw new ArgumentException("Needs at least one class, each with a diameter and a length fraction above zero.", nameof(classes));
        }

        Classes = [.. ascending.Select(c => c with { LengthFraction = c.LengthFraction / total })];
    }

    /// <summary>The classes, thinnest first; their length fractions sum to one.</summary>
    public ImmutableArray<DiameterClass> Classes { get; }

    /// <summary>The length-weighted arithmetic mean diameter.</summary>
    public Length Mean => Length.FromMeters(Classes.Sum(c => c.LengthFraction * c.Diameter.Meters));

    /// <summary>The length-weighted root-mean-square diameter, √(Σ n d²): the one that fixes fibre volume per length.</summary>
    public Length RootMeanSquare => Length.FromMeters(Math.Sqrt(Classes.Sum(c => c.LengthFraction * c.Diameter.Meters * c.Diameter.Meters)));

    /// <summary>A mat of one diameter.</summary>
    public static DiameterDistribution OfOneDiameter(Length diameter) => new([new DiameterClass(diameter, 1)]);

    /// <summary>A log-normal distribution of the fibre length over diameter.</summary>
    /// <param name="median">The length-weighted median diameter; above zero.</param>
    /// <param name="geometricStandardDeviation">GSD; dimensionless, 1 or above (1 is a single diameter).</param>
    /// <param name="classCount">How many classes stand for it, 2 or more.</param>
    /// <remarks>
    /// The classes are the nodes of equal-probability slices, each placed at the slice's root-mean-square diameter, so that
    /// the fibre volume is kept exactly.
    /// </remarks>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public static DiameterDistribution LogNormal(Length median, double geometricStandardDeviation, int classCount = DefaultClassCount) =>
        Mixture([new LogNormalComponent(1, median, geometricStandardDeviation)], classCount);

    /// <summary>A mixture of log-normal distributions, each with its share of the fibre length.</summary>
    /// <param name="components">The parts; their fractions are scaled to sum to one.</param>
    /// <param name="classesPerComponent">How many classes stand for each part, 2 or more.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public static DiameterDistribution Mixture(IEnumerable<LogNormalComponent> components, int classesPerComponent = DefaultClassCount)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(classesPerComponent, 2);
        return new(components.SelectMany(c => c.Slices(classesPerComponent)));
    }

    /// <summary>The distribution that readings show, each weighted by the length it stands for.</summary>
    /// <param name="readings">The readings, in any order; at least one.</param>
    /// <param name="maximumClasses">Readings are gathered into at most this many slices of equal length.</param>
    /// <remarks>Each slice is placed at its root-mean-square diameter, so that the fibre volume is kept.</remarks>
    /// <exception cref="ArgumentException">There are no readings.</exception>
    public static DiameterDistribution FromReadings(IEnumerable<DiameterReading> readings, int maximumClasses = DefaultClassCount)
    {
        var ascending = readings.OrderBy(r => r.Diameter.Meters).ToArray();
        var share = ascending.Sum(r => r.RepresentedLength.Meters) / maximumClasses;
        var classes = new List<DiameterClass>();
        double length = 0, square = 0;
        for (var i = 0; i < ascending.Length; i++)
        {
            var weight = ascending[i].RepresentedLength.Meters;
            length += weight;
            square += weight * ascending[i].Diameter.Meters * ascending[i].Diameter.Meters;
            if (length >= share * (1 - 1e-9) || i == ascending.Length - 1)
            {
                classes.Add(new DiameterClass(Length.FromMeters(Math.Sqrt(square / length)), length));
                (length, square) = (0, 0);
            }
        }

        return new DiameterDistribution(classes);
    }

    /// <inheritdoc/>
    public bool Equals(DiameterDistribution? other) => other is not null && Classes.SequenceEqual(other.Classes);

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(Classes.Length, Classes[0], Classes[^1]);
}
