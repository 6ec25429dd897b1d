namespace FiberScope.Filtration.Uncertainty;

/// <summary>An input that is not known exactly.</summary>
/// <param name="Name">Its stable name.</param>
/// <param name="Layer">Index of its layer; null for the conditions of use.</param>
internal readonly record struct UncertainInput(string Name, int? Layer)
{
    public const string DiameterScale = "diameter-scale";
    public const string DiameterDistribution = "diameter-distribution";
    public const string Solidity = "solidity";
    public const string BasisWeight = "basis-weight";
    public const string Thickness = "thickness";
    public const string Inhomogeneity = "inhomogeneity";
    public const string Charge = "charge";
    public const string FaceVelocity = "face-velocity";
    public const string Temperature = "temperature";
    public const string AirPressure = "air-pressure";

    /// <summary>The inputs of a medium and its use that have an uncertainty.</summary>
    public static UncertainInput[] Of(IReadOnlyList<MediaLayer> layers, OperatingPoint point) =>
        [.. layers.SelectMany((layer, i) => Names(layer).Select(name => new UncertainInput(name, i))), .. Names(point).Select(name => new UncertainInput(name, null))];

    private static IEnumerable<string> Names(MediaLayer layer)
    {
        if (layer.Uncertainty is not { } u)
        {
            yield break;
        }

        if (u.DiameterScale > 0)
        {
            yield return DiameterScale;
        }

        if (u.IndependentFibres is not null && layer.Diameters.Classes.Length > 1)
        {
            yield return DiameterDistribution;
        }

        if (u.Solidity > 0)
        {
            yield return u.SolidityByWeighing ? BasisWeight : Solidity;
        }

        if (u.Thickness > 0)
        {
            yield return Thickness;
        }

        if (u.Inhomogeneity > 0 && layer.InhomogeneityFactor is not null)
        {
            yield return Inhomogeneity;
        }

        if (u.Charge > 0 && layer.Charge is not null)
        {
            yield return Charge;
        }
    }

    private static IEnumerable<string> Names(OperatingPoint point)
    {
        if (point.Uncertainty is not { } u)
        {
            yield break;
        }

        if (u.FaceVelocity > 0)
        {
            yield return FaceVelocity;
        }

        if (u.Temperature.Kelvins > 0)
        {
            yield return Temperature;
        }

        if (u.AirPressure > 0)
        {
            yield return AirPressure;
        }
    }
}
