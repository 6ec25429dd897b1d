namespace FiberScope.Imaging.Sections;

/// <summary>The outline of one cut fibre as an ellipse.</summary>
/// <param name="X">Centre, to the right; pixels.</param>
/// <param name="Y">Centre, downwards; pixels.</param>
/// <param name="Minor">The shorter axis: the fibre's diameter; pixels.</param>
/// <param name="Major">The longer axis; pixels.</param>
/// <param name="Direction">Direction of the longer axis; radians in [0, π).</param>
/// <param name="Departure">Root-mean-square departure of the outline from the ellipse; pixels.</param>
/// <param name="Points">The number of outline points it rests on.</param>
internal readonly record struct SectionEllipse(double X, double Y, double Minor, double Major, double Direction, double Departure, int Points)
{
    /// <summary>Half the width of the box around it; pixels.</summary>
    public double HalfWidth => Math.Sqrt(Math.Pow(Major / 2 * Math.Cos(Direction), 2) + Math.Pow(Minor / 2 * Math.Sin(Direction), 2));

    /// <summary>Half the height of the box around it; pixels.</summary>
    public double HalfHeight => Math.Sqrt(Math.Pow(Major / 2 * Math.Sin(Direction), 2) + Math.Pow(Minor / 2 * Math.Cos(Direction), 2));
}
