using System.Collections.Immutable;
using FiberScope.Statistics;

namespace FiberScope.Fibres;

/// <summary>A solidity found by one route, with its uncertainty.</summary>
/// <param name="Route">How it was found.</param>
/// <param name="Value">The estimate.</param>
/// <param name="StandardUncertainty">Its standard uncertainty; dimensionless, zero or above.</param>
/// <param name="Explanation">How it was worked out, in one sentence for people.</param>
public sealed record SolidityEstimate(SolidityRoute Route, Solidity Value, double StandardUncertainty, string Explanation)
{
    /// <summary>The 95 % interval, worked out on the logarithm so that it stays above zero, and cut at one.</summary>
    public Interval Interval95
    {
        get
        {
            var factor = Math.Exp(1.96 * StandardUncertainty / Value.Fraction);
            return new Interval(Value.Fraction / factor, Math.Min(1, Value.Fraction * factor));
        }
    }
}

/// <summary>The solidity of a mat by every route at hand, combined.</summary>
public sealed record SolidityFinding
{
    private SolidityFinding(SolidityEstimate combined, ImmutableArray<SolidityEstimate> routes, double agreement, ImmutableArray<Caveat> caveats)
    {
        Combined = combined;
        Routes = routes;
        AgreementProbability = agreement;
        Caveats = caveats;
    }

    /// <summary>The combined estimate; its route is that of the estimate that weighs most.</summary>
    public SolidityEstimate Combined { get; }

    /// <summary>Each route's estimate.</summary>
    public ImmutableArray<SolidityEstimate> Routes { get; }

    /// <summary>The probability of a quarrel between the routes at least this large by chance; 1 for a single route.</summary>
    public double AgreementProbability { get; }

    /// <summary>What a reader must know: routes that disagree, and which is off.</summary>
    public ImmutableArray<Caveat> Caveats { get; }

    /// <summary>Combines routes on the logarithm of solidity, where their uncertainties are relative.</summary>
    /// <param name="routes">The estimates, at least one.</param>
    /// <exception cref="ArgumentException">There are no estimates.</exception>
    public static SolidityFinding Combine(IEnumerable<SolidityEstimate> routes)
    {
        ImmutableArray<SolidityEstimate> all = [.. routes];
        if (all.Length <= 1)
        {
            return all.Length == 1 ? new(all[0], all, 1, []) : throw new ArgumentException("Needs at least one estimate.", nameof(routes));
        }

        const double LeastRelative = 1e-4;
        double[] relative = [.. all.Select(r => Math.Max(LeastRelative, r.StandardUncertainty / r.Value.Fraction))];
        var agreed = AgreedEstimate.Of([.. all.Select(r => Math.Log(r.Value.Fraction))], relative);
        var value = new Solidity(Math.Min(0.999, Math.Exp(agreed.Value)));
        var leading = all[Array.IndexOf(relative, relative.Min())].Route;
        var combined = new SolidityEstimate(leading, value, value.Fraction * agreed.StandardUncertainty, FormattableString.Invariant($"Combined from {all.Length} routes by their uncertainties."));
        return new(combined, all, agreed.AgreementProbability, agreed.Agrees ? [] : [Quarrel(all, agreed)]);
    }

    private static Caveat Quarrel(ImmutableArray<SolidityEstimate> all, AgreedEstimate agreed)
    {
        var list = string.Join(", ", all.Select(r => FormattableString.Invariant($"{r.Route} {r.Value.Fraction:F3}")));
        var off = all.Length > 2 ? FormattableString.Invariant($"; {all[agreed.FurthestOff].Route} stands furthest off") : "";
        return new Caveat("solidity-routes-disagree", FormattableString.Invariant($"The routes to solidity disagree ({list}; chance {agreed.AgreementProbability:P1}){off}: check its inputs. The interval was widened."));
    }
}
