namespace FiberScope.Conformity;

/// <summary>What can be said about a limit at the agreed risk.</summary>
public enum Decision
{
    /// <summary>The limit is kept: the risk that the true value breaks it is within the agreed maximum.</summary>
    Pass,

    /// <summary>The limit is broken: the risk that the true value keeps it all the same is within the agreed maximum.</summary>
    Fail,

    /// <summary>Neither can be said: the uncertainty reaches over the limit, or nothing was found.</summary>
    Undecided,
}
