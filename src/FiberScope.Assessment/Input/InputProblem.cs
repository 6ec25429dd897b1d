namespace FiberScope.Assessment.Input;

/// <summary>One thing wrong with a text file that a person wrote.</summary>
/// <param name="File">The file as the user named it.</param>
/// <param name="Line">The line, from 1; 0 when the problem has no line.</param>
/// <param name="Message">What is wrong and how to mend it, on one line.</param>
public sealed record InputProblem(string File, int Line, string Message)
{
    /// <summary>The problem on one line for people: <c>swatch.yaml:12: …</c>.</summary>
    public override string ToString() =>
        Line > 0 ? FormattableString.Invariant($"{File}:{Line}: {Message}") : $"{File}: {Message}";
}
