using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Assessment.Json;
using FiberScope.Statistics;

namespace FiberScope.Assessment.Auditing;

/// <summary>Sets a person's numbers beside the machine's.</summary>
/// <remarks>
/// Sources: Bland and Altman (1986), The Lancet 327, 307–310, for bias and limits of agreement, on the logarithm too where differences grow
/// with the value; Deming (1943) for the line with errors in both.
/// </remarks>
public static class AuditComparison
{
    /// <summary>Compares a filled table with the key beside it.</summary>
    /// <param name="sheet">The filled table.</param>
    /// <exception cref="InputException">The table or its key is wrong, or too few crops were filled in.</exception>
    public static AuditFinding Of(string sheet)
    {
        var path = Path.Combine(Path.GetDirectoryName(Path.GetFullPath(sheet))!, AuditKey.FileName);
        if (!File.Exists(path))
        {
            throw new InputException(File.Exists(sheet)
                ? $"{sheet}: has no {AuditKey.FileName} beside it; put the filled table back into the folder that 'audit draw' made"
                : $"{sheet}: no such file");
        }

        return Of(AuditKeyFile.Read(path), sheet);
    }

    private static AuditFinding Of(AuditKey key, string sheet)
    {
        var read = AuditSheet.Read(sheet, key);
        ImmutableArray<AuditPair> pairs = [.. key.Crops.Where(c => read.ContainsKey(c.Name)).Select(c => new AuditPair(c, read[c.Name]))];
        if (pairs.Length < AuditSample.Fewest)
        {
            throw new InputException(FormattableString.Invariant($"{sheet}: only {pairs.Length} of {key.Crops.Length} crops are filled in; at least {AuditSample.Fewest} are needed, and 30 or more tell something"));
        }

        double[] machine = [.. pairs.Select(p => p.MachineMicrometres)];
        double[] person = [.. pairs.Select(p => p.PersonMicrometres)];
        return new AuditFinding
        {
            Key = key,
            Pairs = pairs,
            Unfilled = [.. key.Crops.Where(c => !read.ContainsKey(c.Name)).Select(c => c.Name)],
            Micrometres = BlandAltman.Of(machine, person),
            Logarithm = BlandAltman.Of(Array.ConvertAll(machine, Math.Log), Array.ConvertAll(person, Math.Log)),
            Line = Line(person, machine, sheet),
        };
    }

    private static DemingRegression Line(double[] person, double[] machine, string sheet)
    {
        try
        {
            return DemingRegression.Fit(person, machine);
        }
        catch (ArgumentException e)
        {
            throw new InputException($"{sheet}: the person's diameters do not vary with the machine's at all, so no line can be fitted; are the numbers in the right lines?", e);
        }
    }
}
