using FiberScope.Assessment.Auditing;

namespace FiberScope.Cli.Console;

/// <summary>An audit on one screen.</summary>
internal static class AuditSummary
{
    private const double Far = 0.25;
    private const int MostNamed = 8;

    public static void Print(TextWriter output, AuditFinding finding)
    {
        output.WriteLine(finding.Sentence);
        var (absolute, limits, line) = (finding.Micrometres, finding.RelativeLimits, finding.Line);
        output.WriteLine(FormattableString.Invariant($"  limits of agreement: {limits.Low * 100:+0.0;−0.0} to {limits.High * 100:+0.0;−0.0} %"));
        output.WriteLine(FormattableString.Invariant($"  in micrometres: bias {absolute.Bias:G3} ({absolute.BiasInterval95.Low:G3} to {absolute.BiasInterval95.High:G3}), limits of agreement {absolute.LowerLimit:G3} to {absolute.UpperLimit:G3}"));
        output.WriteLine(FormattableString.Invariant($"  Deming's line: slope {line.Slope:F3} ({line.SlopeInterval95.Low:F3} to {line.SlopeInterval95.High:F3}), intercept {line.Intercept:G3} µm ({line.InterceptInterval95.Low:G3} to {line.InterceptInterval95.High:G3})"));
        if (!finding.Unfilled.IsEmpty)
        {
            output.WriteLine(FormattableString.Invariant($"  {finding.Unfilled.Length} of {finding.Key.Crops.Length} crops left empty"));
        }

        string[] far = [.. finding.Pairs.Where(p => Math.Abs(Math.Log(p.Ratio)) > Math.Log(1 + Far)).Select(p => p.Crop.Name)];
        if (far.Length > 0)
        {
            output.WriteLine(FormattableString.Invariant($"  {far.Length} differ by more than {Far * 100:F0} %, look at them: {string.Join(", ", far.Take(MostNamed))}{(far.Length > MostNamed ? ", …" : "")}"));
        }
    }
}
