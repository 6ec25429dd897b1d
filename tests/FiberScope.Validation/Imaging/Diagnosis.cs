using System.Globalization;
using System.Text;

namespace FiberScope.Validation.Imaging;

/// <summary>Tells where a family's error comes from: by true diameter, by kind of error, by field.</summary>
internal static class Diagnosis
{
    private static readonly double[] Bins = [0, 3, 4, 6, 9, 13, 20, 30, 50, 80, 1e9];

    public static string Of(FamilyCheck check)
    {
        var text = new StringBuilder();
        Summary(text, check);
        ByDiameter(text, check);
        ByField(text, check);
        Refusals(text, check);
        return text.ToString();
    }

    public static string Line(FamilyCheck c) => string.Create(
        CultureInfo.InvariantCulture,
        $"{c.Family.Name,-20} mean {c.MeanError,7:+0.0 %;-0.0 %} D10 {c.QuantileError(0.1),7:+0.0 %;-0.0 %} D50 {c.QuantileError(0.5),7:+0.0 %;-0.0 %} D90 {c.QuantileError(0.9),7:+0.0 %;-0.0 %} SD {c.SpreadError,7:+0.0 %;-0.0 %} KS {c.Distance:0.000} gross {c.GrossShare,6:0.0 %} read {c.ReadShare,5:0 %} n {c.Readings.Length,6} ({c.Fields.Average(f => f.Time.TotalSeconds):0.0} s a field)");

    private static void Summary(StringBuilder text, FamilyCheck c)
    {
        text.AppendLine(Line(c));
        var good = c.Readings.Where(r => !r.IsGross).ToArray();
        var weight = good.Sum(r => r.Weight);
        var edge = good.Sum(r => r.Weight * (r.Read - r.True)) / weight;
        var pull = good.Where(r => r.Uncertainty > 0).Select(r => Math.Abs(r.Read - r.True) / r.Uncertainty).Order().ToArray();
        var none = c.Readings.Count(r => r.Fibre < 0);
        text.AppendLine(CultureInfo.InvariantCulture, $"  mean's error = selection and weights {c.SelectionError:+0.0 %;-0.0 %} + edges of good readings {edge:+0.00;-0.00} px ({edge / c.Truth.Mean:+0.0 %;-0.0 %}) + gross errors, the rest");
        text.AppendLine(CultureInfo.InvariantCulture, $"  readings on no visible fibre {none} of {c.Readings.Length}; |error| / stated uncertainty: median {Quantile(pull, 0.5):0.00} (0.67 when honest), 95th percentile {Quantile(pull, 0.95):0.00} (1.96)");
    }

    private static void ByDiameter(StringBuilder text, FamilyCheck c)
    {
        text.AppendLine("  true px   visible  share:both-edges  read/both  weight/visible  readings  bias px  bias %  spread px   gross  too wide");
        for (var b = 1; b < Bins.Length; b++)
        {
            var (low, high) = (Bins[b - 1], Bins[b]);
            double visible = 0, both = 0, read = 0;
            foreach (var field in c.Fields)
            {
                for (var i = 0; i < field.IsRead.Length; i++)
                {
                    var s = field.Specimen.Truth.Stations[i];
                    if (s.Diameter >= low && s.Diameter < high)
                    {
                        visible += s.Length;
                        both += s.BothEdges ? s.Length : 0;
                        read += s.BothEdges && field.IsRead[i] ? s.Length : 0;
                    }
                }

                visible += field.Specimen.Truth.Sections.Where(s => s.Minor >= low && s.Minor < high).Sum(s => s.Major / s.Minor);
            }

            var mine = c.Readings.Where(r => r.True >= low && r.True < high).ToArray();
            if (visible > 0 || mine.Length > 0)
            {
                Row(text, c, low, high, visible, both, read, mine);
            }
        }
    }

    private static void Row(StringBuilder text, FamilyCheck c, double low, double high, double visible, double both, double read, CheckedReading[] mine)
    {
        var scale = c.Truth.TotalWeight / Math.Max(1e-9, c.Readings.Sum(r => r.Weight));
        var good = mine.Where(r => !r.IsGross).ToArray();
        var errors = good.Select(r => r.Read - r.True).Order().ToArray();
        var bias = Quantile(errors, 0.5);
        var spread = (Quantile(errors, 0.84) - Quantile(errors, 0.16)) / 2;
        var relative = good.Length == 0 ? double.NaN : good.Average(r => (r.Read / r.True) - 1);
        var label = high > 1e8 ? FormattableString.Invariant($"{low}+") : FormattableString.Invariant($"{low}-{high}");
        text.AppendLine(
            CultureInfo.InvariantCulture,
            $"  {label,-8} {visible / c.Truth.TotalWeight,7:0.0 %} {both / visible,17:0 %} {read / both,10:0 %} {mine.Sum(r => r.Weight) * scale / visible,15:0.00} {mine.Length,9} {bias,8:+0.00;-0.00} {relative,7:+0.0 %;-0.0 %} {spread,10:0.00} {mine.Count(r => r.IsGross) / (double)mine.Length,7:0.0 %} {mine.Count(r => r.IsGross && r.Read > r.True) / (double)mine.Length,9:0.0 %}");
    }

    private static void ByField(StringBuilder text, FamilyCheck c)
    {
        foreach (var (field, i) in c.Fields.Select((f, i) => (f, i)))
        {
            var alone = new FamilyCheck(c.Family, [field]);
            var blur = field.Measurement is { } m ? string.Create(CultureInfo.InvariantCulture, $"blur {m.BlurPixels:0.00} (recipe {field.Specimen.Recipe.Camera.BlurPixels:0.00}) limit {m.DetectionLimitPixels:0.0} px fit {(m.Fitness.IsFit ? "yes" : "no: " + string.Join(' ', m.Fitness.Checks.Where(k => !k.Passed).Select(k => k.Name)))}") : string.Empty;
            text.AppendLine(CultureInfo.InvariantCulture, $"  field {i}: true mean {alone.Truth.Mean:0.00} px, read {alone.Read?.Mean ?? 0:0.00} ({alone.MeanError:+0.0 %;-0.0 %}), n {field.Readings.Length}, rim {field.Specimen.Recipe.Electrons.RimHeight:0.00}, {blur}");
        }
    }

    private static void Refusals(StringBuilder text, FamilyCheck c)
    {
        var reasons = c.Fields.Where(f => f.Measurement is not null).SelectMany(f => f.Measurement!.Rejected)
            .GroupBy(r => r.Key, StringComparer.Ordinal).Select(g => (g.Key, Count: g.Sum(r => r.Value))).OrderByDescending(g => g.Count).ToArray();
        if (reasons.Length > 0)
        {
            text.AppendLine("  refused: " + string.Join(", ", reasons.Select(r => FormattableString.Invariant($"{r.Key} {r.Count}"))));
        }
    }

    private static double Quantile(double[] ascending, double share) =>
        ascending.Length == 0 ? double.NaN : ascending[Math.Min(ascending.Length - 1, (int)(share * ascending.Length))];
}
