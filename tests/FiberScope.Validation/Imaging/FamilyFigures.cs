using FiberScope.Specimens;
using FiberScope.Statistics;

namespace FiberScope.Validation.Imaging;

/// <summary>The figures of one family measured one way, small enough to keep. Errors are relative to the truth.</summary>
internal sealed record FamilyFigures
{
    public required string Family { get; init; }

    public required string Method { get; init; }

    public required bool Reporting { get; init; }

    public required int Fields { get; init; }

    public required int UnfitFields { get; init; }

    public required int Readings { get; init; }

    public required double TrueMeanPixels { get; init; }

    public required double TrueCv { get; init; }

    public required double Mean { get; init; }

    public required double D10 { get; init; }

    public required double D50 { get; init; }

    public required double D90 { get; init; }

    public required double Spread { get; init; }

    public required double Distance { get; init; }

    public required double Gross { get; init; }

    public required double Read { get; init; }

    public required double Selection { get; init; }

    /// <summary>Root mean square of the fields' own errors of the mean.</summary>
    public required double FieldMeanScatter { get; init; }

    /// <summary>Measured less true principal direction, degrees; NaN where the truth has hardly any.</summary>
    public required double DirectionError { get; init; }

    public required double OrderError { get; init; }

    /// <summary>Relative error of the share of the field that fibre takes (section: area, light: cover); NaN where none was measured.</summary>
    public double FibreShareError { get; init; } = double.NaN;

    /// <summary>True share of the field that fibre takes.</summary>
    public double TrueFibreShare { get; init; } = double.NaN;

    public required double SecondsPerField { get; init; }

    /// <summary>The 1st to 99th percentile of truth and readings; pixels.</summary>
    public required double[] TruePercentiles { get; init; }

    public required double[] ReadPercentiles { get; init; }

    public static FamilyFigures Of(FamilyCheck check, string method, bool reporting)
    {
        var (direction, order) = OrientationErrors(check);
        return new FamilyFigures
        {
            Family = check.Family.Name,
            Method = method,
            Reporting = reporting,
            Fields = check.Fields.Count,
            UnfitFields = check.Fields.Count(f => f.Measurement is { Fitness.IsFit: false }),
            Readings = check.Readings.Length,
            TrueMeanPixels = check.Truth.Mean,
            TrueCv = check.Truth.StandardDeviation / check.Truth.Mean,
            Mean = check.MeanError,
            D10 = check.QuantileError(0.1),
            D50 = check.QuantileError(0.5),
            D90 = check.QuantileError(0.9),
            Spread = check.SpreadError,
            Distance = check.Distance,
            Gross = check.GrossShare,
            Read = check.ReadShare,
            Selection = check.SelectionError,
            FieldMeanScatter = Math.Sqrt(check.Fields.Select(f => new FamilyCheck(check.Family, [f]).MeanError).Average(e => e * e)),
            DirectionError = direction,
            OrderError = order,
            FibreShareError = FibreShareOf(check),
            TrueFibreShare = check.Fields.Average(f => f.Specimen.Truth.Cover),
            SecondsPerField = check.Fields.Average(f => f.Time.TotalSeconds),
            TruePercentiles = Percentiles(check.Truth),
            ReadPercentiles = check.Read is null ? [] : Percentiles(check.Read),
        };
    }

    private static double FibreShareOf(FamilyCheck check)
    {
        var shares = check.Fields.Where(f => f.Measurement is { FibreShare: not null }).Select(f => (Read: f.Measurement!.FibreShare!.Value, True: f.Specimen.Truth.Cover)).ToArray();
        return shares.Length == 0 ? double.NaN : (shares.Average(s => s.Read) / shares.Average(s => s.True)) - 1;
    }

    private static double[] Percentiles(WeightedSample sample) => [.. Enumerable.Range(1, 99).Select(p => sample.Quantile(p / 100.0))];

    private static (double Degrees, double Order) OrientationErrors(FamilyCheck check)
    {
        if (check.Fields.All(f => f.Specimen.Truth.Stations.Length == 0) || check.Readings.Length == 0 || check.Readings.Any(r => double.IsNaN(r.Direction)))
        {
            return (double.NaN, double.NaN);
        }

        var truth = TrueOrientation.Of(check.Fields.SelectMany(f => f.Specimen.Truth.Stations).Select(s => ((double)s.Direction, (double)s.Length)));
        var read = TrueOrientation.Of(check.Readings.Select(r => (r.Direction, r.Weight)));
        var turn = Math.IEEERemainder(read.PrincipalDirection.Degrees - truth.PrincipalDirection.Degrees, 180);
        return (truth.Order > 0.15 ? turn : double.NaN, read.Order - truth.Order);
    }
}
