using System.Text;
using FiberScope.Cli;
using FiberScope.Cli.Console;

namespace FiberScope.Acceptance.Tests;

/// <summary>One run of the program through its front door, with what it said.</summary>
public sealed record CommandRun(int Code, string Out, string Error, ReadOnlyMemory<byte> Output)
{
    /// <summary>The time that results are stamped with in tests.</summary>
    public static readonly DateTimeOffset Now = new(2031, 5, 17, 8, 30, 0, TimeSpan.Zero);

    /// <summary>The complaints, line by line.</summary>
    public IReadOnlyList<string> ErrorLines => Error.Split('\n', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries);

    public static Task<CommandRun> OfAsync(params string[] arguments) => OfAsync([], TestContext.Current.CancellationToken, arguments);

    public static async Task<CommandRun> OfAsync(byte[] input, CancellationToken cancellation, params string[] arguments)
    {
        using var standardInput = new MemoryStream(input);
        using var standardOutput = new MemoryStream();
        using var output = new StringWriter();
        using var error = new StringWriter();
        var console = new CommandConsole { Input = standardInput, Output = standardOutput, Out = output, Error = error };
        var code = await FiberScopeProgram.RunAsync(arguments, console, new StoppedClock(), cancellation);
        return new CommandRun(code, output.ToString(), error.ToString(), standardOutput.ToArray());
    }

    public static Task<CommandRun> WithInputAsync(string input, params string[] arguments) =>
        OfAsync(Encoding.UTF8.GetBytes(input), TestContext.Current.CancellationToken, arguments);

    private sealed class StoppedClock : TimeProvider
    {
        public override DateTimeOffset GetUtcNow() => Now;
    }
}
