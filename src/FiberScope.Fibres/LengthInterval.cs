using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>A range of lengths, both ends included.</summary>
/// <param name="Low">The lower end.</param>
/// <param name="High">The upper end; never below <paramref name="Low"/>.</param>
public readonly record struct LengthInterval(Length Low, Length High)
{
    /// <summary>Whether <paramref name="value"/> lies in the interval, its ends included.</summary>
    public bool Contains(Length value) => value >= Low && value <= High;
}
