using System.Globalization;
using FiberScope.Assessment.Input;
using FiberScope.Assessment.Measuring;
using FiberScope.Assessment.Predicting;

namespace FiberScope.Assessment;

/// <summary>Writes down what an assessment was made from.</summary>
internal static class RecipeKeeping
{
    public static Recipe Of(SwatchFile swatch, AssessmentSettings settings, IReadOnlyList<LayerFinding> layers, DateTimeOffset madeAt) => new()
    {
        Software = Software.Version,
        MadeAt = madeAt,
        SwatchFile = swatch.Name,
        FileHashes = swatch.FileHashes,
        Inputs = [.. swatch.Entries.Select(e => e with { Origin = $"{Path.GetFileName(swatch.Name)}, {e.Origin}" })],
        Settings = [.. Settings(swatch, settings), .. layers.SelectMany(Densities), .. layers.Zip(swatch.Layers).SelectMany(p => MeasuredTraits.Of(p.First, p.Second.Traits).Entries)],
        Images = [.. layers.SelectMany(l => l.Fields).Select(Image)],
    };

    private static ImageRecord Image(FieldFinding field)
    {
        var picture = field.Measurement.Micrograph;
        return new ImageRecord(field.Name, picture.Source.Sha256, picture.PixelSize, picture.Source.PixelSizeOrigin, field.Measurement.Algorithm);
    }

    private static IEnumerable<RecipeEntry> Settings(SwatchFile swatch, AssessmentSettings settings)
    {
        var standard = new MeasuringSettings();
        var m = settings.Measuring;
        yield return Entry("unfit fields", m.IncludeUnfit ? "counted" : "left out", m.IncludeUnfit == standard.IncludeUnfit);
        yield return Entry("pixel size, relative standard uncertainty unless told", Number(m.ScaleUncertainty), m.ScaleUncertainty == standard.ScaleUncertainty);
        yield return Entry("edge, common standard uncertainty in pixels", Number(m.EdgeUncertainty), m.EdgeUncertainty == standard.EdgeUncertainty);
        yield return Entry("selection of fibres, relative standard uncertainty", Number(m.SelectionUncertainty), m.SelectionUncertainty == standard.SelectionUncertainty);
        yield return Entry("bootstrap draws", Number(m.BootstrapDraws), m.BootstrapDraws == standard.BootstrapDraws);
        yield return Entry("seed", Number(m.Seed), m.Seed == standard.Seed);
        yield return Entry("basis weight, relative standard uncertainty unless told", Number(SolidityRoutes.BasisWeightUncertainty), isDefault: true);
        yield return Entry("thickness, relative standard uncertainty unless told", Number(SolidityRoutes.ThicknessUncertainty), isDefault: true);
        foreach (var (name, value, isDefault) in SettingText.Of(m.Fields, standard.Fields))
        {
            yield return Entry(name, value, isDefault);
        }

        yield return Entry("forecast, draws of the uncertain inputs", Number(new Filtration.ForecastSettings().Draws), isDefault: true);
        if (settings.Correlations is { } chosen)
        {
            yield return Entry("correlations", Words.Of(Words.Correlations, chosen), isDefault: false);
        }
        else if (swatch.Request.Calibration is { } calibration)
        {
            yield return new RecipeEntry("correlations", Words.Of(Words.Correlations, calibration.Correlations), "calibration");
        }
        else if (swatch.Correlations is null)
        {
            yield return Entry("correlations", Words.Of(Words.Correlations, new Filtration.ForecastSettings().Correlations), isDefault: true);
        }
    }

    private static IEnumerable<RecipeEntry> Densities(LayerFinding layer)
    {
        if (layer.FibreDensity is { } density)
        {
            var name = layer.Name.Length > 0 ? $"fibre density, {layer.Name}" : "fibre density";
            yield return new RecipeEntry(name, FormattableString.Invariant($"{density.KilogramsPerCubicMeter:G5} kg/m³"), layer.PolymerName == "density as given" ? "as given" : $"polymer table, {layer.PolymerName}");
        }
    }

    private static RecipeEntry Entry(string name, string value, bool isDefault) => new(name, value, isDefault ? "default" : "command line");

    private static string Number(double value) => value.ToString("G6", CultureInfo.InvariantCulture);
}
