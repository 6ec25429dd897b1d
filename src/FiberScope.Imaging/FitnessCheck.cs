namespace FiberScope.Imaging;

/// <summary>One thing about a field that decides whether it can be measured.</summary>
/// <param name="Name">What was checked: <c>focus</c>, <c>noise</c>, <c>saturation</c>, <c>charging</c>, <c>drift</c>, <c>resolution</c>, <c>usable-share</c>.</param>
/// <param name="Value">What was found; the unit is part of <paramref name="Meaning"/>.</param>
/// <param name="Limit">The value beyond which the field is unfit.</param>
/// <param name="Passed">Whether the field passes.</param>
/// <param name="Meaning">What the number is, with its unit.</param>
/// <param name="Advice">One plain sentence: what to do at the microscope when it fails.</param>
public sealed record FitnessCheck(string Name, double Value, double Limit, bool Passed, string Meaning, string Advice);
