namespace FiberScope.Filtration.Passage;

/// <summary>Solves for the argument at which a rising function reaches a value.</summary>
internal static class RisingRoot
{
    /// <summary>Bisection from zero to an upper bound at which the function is at least the wanted value.</summary>
    public static double Solve(Func<double, double> rising, double wanted, double upper)
    {
        var (low, high) = (0.0, upper);
        for (var i = 0; i < 100 && high - low > 1e-13 * high; i++)
        {
            var middle = 0.5 * (low + high);
            (low, high) = rising(middle) < wanted ? (middle, high) : (low, middle);
        }

        return 0.5 * (low + high);
    }
}
