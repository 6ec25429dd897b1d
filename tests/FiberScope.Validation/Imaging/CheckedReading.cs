namespace FiberScope.Validation.Imaging;

/// <summary>A reading beside the true fibre that it lies on. Pixels.</summary>
/// <param name="X">Where it is.</param>
/// <param name="Y">Where it is.</param>
/// <param name="Direction">Direction of the trace; radians.</param>
/// <param name="Read">The diameter read.</param>
/// <param name="Uncertainty">Its stated standard uncertainty.</param>
/// <param name="Weight">The length that it stands for.</param>
/// <param name="True">The true diameter there; NaN where no fibre lies.</param>
/// <param name="Fibre">The true fibre's number; −1 for none.</param>
/// <param name="Trace">The trace it is on, numbered through all fields.</param>
/// <param name="Field">The field it is in.</param>
internal readonly record struct CheckedReading(
    double X, double Y, double Direction, double Read, double Uncertainty, double Weight, double True, int Fibre, int Trace, int Field)
{
    /// <summary>Whether the reading is off by more than a quarter, or lies on no fibre.</summary>
    public bool IsGross => !(Math.Abs(Read - True) <= 0.25 * True);
}
