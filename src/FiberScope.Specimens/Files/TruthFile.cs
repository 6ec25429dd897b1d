using System.Text.Encodings.Web;
using System.Text.Json;

namespace FiberScope.Specimens.Files;

/// <summary>Writes the truth about a specimen as JSON (<c>fiberscope/specimen-truth/1</c>).</summary>
public static class TruthFile
{
    /// <summary>Writes the truth.</summary>
    /// <param name="specimen">The specimen.</param>
    /// <param name="stream">Where to; left open.</param>
    /// <param name="withFibres">Whether every visible stretch of every fibre is written; else only the figures.</param>
    public static void Write(Specimen specimen, Stream stream, bool withFibres = true)
    {
        var options = new JsonWriterOptions { Indented = !withFibres, NewLine = "\n", Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };
        using var json = new Utf8JsonWriter(stream, options);
        json.WriteStartObject();
        json.WriteString("schema", "fiberscope/specimen-truth/1");
        json.WritePropertyName("recipe");
        RecipeFile.WriteInto(json, specimen.Recipe);
        json.WriteNumber("seed", specimen.Truth.Seed);
        Figures(json, specimen);
        if (withFibres)
        {
            Defects(json, specimen.Truth);
            Fibres(json, specimen.Truth);
            Sections(json, specimen.Truth);
        }

        json.WriteEndObject();
    }

    internal static void Figures(Utf8JsonWriter json, Specimen specimen)
    {
        var truth = specimen.Truth;
        var pixel = specimen.Recipe.PixelSize.Micrometers;
        json.WriteNumber("pixel_size_um", pixel);
        json.WriteNumber("width_px", specimen.Width);
        json.WriteNumber("height_px", specimen.Height);
        json.WriteNumber("field_rows_px", specimen.Recipe.FieldRows);
        Diameters(json, "visible", truth.Visible, pixel);
        Diameters(json, "both_edges", truth.BothEdges, pixel);
        Diameters(json, "mat", truth.Mat, pixel);
        json.WriteNumber("solidity", Round(truth.Solidity, 6));
        json.WriteNumber("basis_weight_g_m2", Round(truth.BasisWeight.GramsPerSquareMeter, 4));
        json.WriteNumber("thickness_um", Round(truth.Thickness.Micrometers, 4));
        json.WriteNumber("cover", Round(truth.Cover, 5));
        Orientation(json, "orientation", truth.Orientation);
        Orientation(json, "mat_orientation", truth.MatOrientation);
        json.WriteNumber("visible_depth_um", Round(truth.VisibleDepth.Micrometers, 3));
        json.WriteStartObject("defect_area_share");
        foreach (var kind in Enum.GetValues<DefectForm>())
        {
            var area = specimen.DefectMask.Count((byte)kind);
            json.WriteNumber(kind.ToString().ToLowerInvariant(), Round((double)area / specimen.DefectMask.Length, 6));
        }

        json.WriteEndObject();
    }

    private static void Diameters(Utf8JsonWriter json, string name, TrueDiameters figures, double pixel)
    {
        json.WriteStartObject(name);
        json.WriteNumber("length_um", Round(figures.LengthPixels * pixel, 2));
        json.WriteNumber("mean_um", Round(figures.Mean * pixel, 5));
        json.WriteNumber("sd_um", Round(figures.StandardDeviation * pixel, 5));
        json.WriteNumber("d10_um", Round(figures.D10 * pixel, 5));
        json.WriteNumber("d50_um", Round(figures.D50 * pixel, 5));
        json.WriteNumber("d90_um", Round(figures.D90 * pixel, 5));
        json.WriteEndObject();
    }

    private static void Orientation(Utf8JsonWriter json, string name, TrueOrientation orientation)
    {
        json.WriteStartObject(name);
        json.WriteNumber("principal_direction_deg", Round(orientation.PrincipalDirection.Degrees, 3));
        json.WriteNumber("order", Round(orientation.Order, 5));
        json.WriteEndObject();
    }

    private static void Defects(Utf8JsonWriter json, SpecimenTruth truth)
    {
        json.WriteStartArray("defects");
        foreach (var defect in truth.Defects)
        {
            json.WriteStartObject();
            json.WriteString("kind", defect.Kind.ToString().ToLowerInvariant());
            json.WriteNumber("area_px", defect.AreaPixels);
            json.WriteStartArray("outline_px");
            foreach (var (x, y) in defect.Outline)
            {
                Point(json, x, y);
            }

            json.WriteEndArray();
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void Fibres(Utf8JsonWriter json, SpecimenTruth truth)
    {
        json.WriteStartArray("fibres");
        foreach (var fibre in truth.Stations.GroupBy(s => s.Fibre))
        {
            json.WriteStartObject();
            json.WriteNumber("id", fibre.Key);
            json.WriteNumber("diameter_px", Round(truth.FibreDiameters[fibre.Key], 4));
            json.WriteStartArray("visible");
            foreach (var piece in Pieces([.. fibre]))
            {
                json.WriteStartObject();
                json.WriteBoolean("both_edges", piece[0].BothEdges);
                json.WriteStartArray("points_px");
                foreach (var station in piece.Where((_, i) => i % 4 == 0 || i == piece.Count - 1))
                {
                    Point(json, station.X, station.Y);
                }

                json.WriteEndArray();
                json.WriteEndObject();
            }

            json.WriteEndArray();
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static List<List<TrueStation>> Pieces(TrueStation[] stations)
    {
        var pieces = new List<List<TrueStation>>();
        for (var i = 0; i < stations.Length; i++)
        {
            var joins = i > 0 && stations[i].BothEdges == stations[i - 1].BothEdges
                && Math.Abs(stations[i].X - stations[i - 1].X) + Math.Abs(stations[i].Y - stations[i - 1].Y) < 3 * (stations[i].Length + 0.5);
            if (!joins)
            {
                pieces.Add([]);
            }

            pieces[^1].Add(stations[i]);
        }

        return pieces;
    }

    private static void Sections(Utf8JsonWriter json, SpecimenTruth truth)
    {
        json.WriteStartArray("sections");
        foreach (var cut in truth.Sections)
        {
            json.WriteStartObject();
            json.WriteNumber("x_px", Round(cut.X, 2));
            json.WriteNumber("y_px", Round(cut.Y, 2));
            json.WriteNumber("minor_px", Round(cut.Minor, 3));
            json.WriteNumber("major_px", Round(cut.Major, 3));
            json.WriteNumber("direction_deg", Round(cut.Direction * 180 / Math.PI, 2));
            json.WriteBoolean("whole", cut.Whole);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void Point(Utf8JsonWriter json, double x, double y)
    {
        json.WriteStartArray();
        json.WriteNumberValue(Round(x, 1));
        json.WriteNumberValue(Round(y, 1));
        json.WriteEndArray();
    }

    private static double Round(double value, int digits) => Math.Round(value, digits);
}
