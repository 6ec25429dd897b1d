using MathNet.Numerics.Distributions;
using UnitsNet;

namespace FiberScope.Conformity;

/// <summary>The strip inside a limit in which conformity is not proven, and its use.</summary>
/// <remarks>
/// On the linear scale the width is g = z u, with z the quantile of the normal law (or Student's t) at one minus the maximum risk: the
/// risk of a value on the edge of the acceptance zone is then exactly the maximum. With z = 2 this is the usual g = U; z = 1.645 goes
/// with 5 %. Source: JCGM 106:2012, section 8.3 (from memory). For a two-sided limit the width is that of one side alone, which holds
/// while the limits stand several uncertainties apart; the decision itself always uses both sides.
/// </remarks>
public sealed record GuardBand
{
    private GuardBand(double factor, IQuantity? acceptedFrom, IQuantity? acceptedTo)
    {
        Factor = factor;
        AcceptedFrom = acceptedFrom;
        AcceptedTo = acceptedTo;
    }

    /// <summary>The width of the guard band over the standard uncertainty; dimensionless, above zero.</summary>
    public double Factor { get; }

    /// <summary>The smallest value found that would be accepted; null without a lower limit.</summary>
    public IQuantity? AcceptedFrom { get; }

    /// <summary>The largest value found that would be accepted; null without an upper limit.</summary>
    public IQuantity? AcceptedTo { get; }

    internal static GuardBand Of(Limit limit, ObservedValue observed)
    {
        var z = Quantile(1 - limit.MaximumRisk, observed.DegreesOfFreedom);
        var characteristic = limit.Characteristic;
        var uncertainty = characteristic.In(observed.StandardUncertainty);
        var value = characteristic.In(observed.Value);
        double Moved(double bound, int direction) => observed.Scale == UncertaintyScale.Logarithmic && value > 0
            ? bound * Math.Exp(direction * z * uncertainty / value)
            : bound + (direction * z * uncertainty);
        return new GuardBand(
            z,
            limit.AtLeast is null ? null : characteristic.Of(Moved(limit.Lower, 1)),
            limit.AtMost is null ? null : characteristic.Of(Moved(limit.Upper, -1)));
    }

    private static double Quantile(double probability, double degreesOfFreedom) => degreesOfFreedom > 1e6
        ? Normal.InvCDF(0, 1, probability)
        : StudentT.InvCDF(0, 1, degreesOfFreedom, probability);
}
