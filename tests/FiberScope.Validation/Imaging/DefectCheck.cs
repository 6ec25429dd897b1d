using FiberScope.Specimens;
using OpenCvSharp;

namespace FiberScope.Validation.Imaging;

/// <summary>Defects of one kind, found against true, over a family's fields.</summary>
/// <param name="Family">The family.</param>
/// <param name="Kind">The kind; <c>all</c> for all together.</param>
/// <param name="TrueShare">Share of the field that the defects truly cover where they are uppermost.</param>
/// <param name="ReadShare">Share that was flagged.</param>
/// <param name="Found">Share of the true defects of 300 pixels or more that a flagged region of any kind covers by a quarter at least.</param>
/// <param name="TrueCount">How many of those there are.</param>
/// <param name="ReadingsOn">Readings taken on shot, film or debris.</param>
internal sealed record DefectFigures(string Family, string Kind, double TrueShare, double ReadShare, double Found, int TrueCount, int ReadingsOn);

/// <summary>Sets flagged regions beside the true ones.</summary>
internal static class DefectCheck
{
    private const int SmallestPixels = 300;

    public static IReadOnlyList<DefectFigures> Of(FamilyCheck check)
    {
        var fields = check.Fields.Where(f => f.Measurement is not null).Select(f => (Field: f, Mask: Flagged(f))).ToArray();
        var pixels = fields.Sum(f => (double)f.Mask.Length);
        var rows = new List<DefectFigures>();
        foreach (var kind in Enum.GetValues<DefectForm>().Cast<DefectForm?>().Append(null))
        {
            double truly = 0, read = 0;
            var (found, count, on) = (0, 0, 0);
            foreach (var (field, mask) in fields)
            {
                var truth = field.Specimen.DefectMask;
                for (var i = 0; i < mask.Length; i++)
                {
                    truly += kind is null ? (truth[i] > 0 ? 1 : 0) : truth[i] == (byte)kind ? 1 : 0;
                    read += kind is null ? (mask[i] > 0 ? 1 : 0) : mask[i] == (byte)kind ? 1 : 0;
                }

                var large = field.Specimen.Truth.Defects.Where(d => (kind is null || d.Kind == kind) && d.AreaPixels >= SmallestPixels).ToArray();
                count += large.Length;
                found += large.Count(d => Covered(field.Specimen, mask, d) >= 0.25);
                on += field.Readings.Count(r => At(field.Specimen, r) is > 0 and not (byte)DefectForm.Rope && (kind is null || At(field.Specimen, r) == (byte)kind));
            }

            rows.Add(new(check.Family.Name, kind?.ToString().ToLowerInvariant() ?? "all", truly / pixels, read / pixels, count > 0 ? (double)found / count : double.NaN, count, on));
        }

        return rows;
    }

    private static byte At(SpecimenCase specimen, CheckedReading reading)
    {
        var (x, y) = ((int)reading.X, (int)reading.Y);
        return x >= 0 && y >= 0 && x < specimen.Width && y < specimen.Recipe.FieldRows ? specimen.DefectMask[(y * specimen.Width) + x] : (byte)0;
    }

    private static byte[] Flagged(FieldCheck field)
    {
        var specimen = field.Specimen;
        using var canvas = new Mat(specimen.Recipe.FieldRows, specimen.Width, MatType.CV_8UC1, Scalar.Black);
        foreach (var defect in field.Measurement!.Defects)
        {
            Cv2.FillPoly(canvas, [defect.Outline.Select(p => new Point(p.X, p.Y))], new Scalar((int)defect.Kind));
        }

        canvas.GetArray(out byte[] mask);
        return mask;
    }

    private static double Covered(SpecimenCase specimen, byte[] mask, TrueDefect defect)
    {
        using var canvas = new Mat(specimen.Recipe.FieldRows, specimen.Width, MatType.CV_8UC1, Scalar.Black);
        Cv2.FillPoly(canvas, [defect.Outline.Select(p => new Point((int)p.X, (int)p.Y))], new Scalar(1));
        canvas.GetArray(out byte[] own);
        var (area, covered) = (0, 0);
        for (var i = 0; i < own.Length; i++)
        {
            if (own[i] > 0 && specimen.DefectMask[i] == (byte)defect.Kind)
            {
                area++;
                covered += mask[i] > 0 ? 1 : 0;
            }
        }

        return area > 0 ? (double)covered / area : 0;
    }
}
