namespace FiberScope.Imaging.Edges;

/// <summary>Grey across a fibre, averaged along it.</summary>
/// <param name="Values">Grey at equal steps across; linear in electrons.</param>
/// <param name="First">Where the first value stands; pixels from the centre line.</param>
/// <param name="Step">Distance of the values; pixels.</param>
/// <param name="Noise">Standard deviation of the noise of one value; neighbours count as independent per pixel, not per value.</param>
/// <param name="Left">Where the left edge seems to be (steepest climb); pixels.</param>
/// <param name="Right">Where the right edge seems to be; pixels.</param>
internal sealed record FibreProfile(double[] Values, double First, double Step, double Noise, double Left, double Right)
{
    public double Width => Right - Left;

    public double At(int index) => First + (index * Step);
}
