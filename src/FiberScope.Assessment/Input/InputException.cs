using System.Collections.Immutable;

namespace FiberScope.Assessment.Input;

/// <summary>Input that cannot be used; it lists every problem found, each on one line for people.</summary>
public sealed class InputException : Exception
{
    /// <summary>Makes the exception for problems found in files; at least one.</summary>
    public InputException(IEnumerable<InputProblem> problems)
        : this([.. problems])
    {
    }

    /// <summary>Makes the exception for one problem that lies in no file.</summary>
    public InputException(string message)
        : base(message) => Problems = [];

    /// <summary>Makes the exception for one problem that lies in no file, with its cause.</summary>
    public InputException(string message, Exception innerException)
        : base(message, innerException) => Problems = [];

    /// <summary>Makes the exception without a message of its own.</summary>
    public InputException() => Problems = [];

    private InputException(ImmutableArray<InputProblem> problems)
        : base(string.Join('\n', problems)) => Problems = problems;

    /// <summary>The problems, in the order of the file; empty when the message says it all.</summary>
    public ImmutableArray<InputProblem> Problems { get; }
}
