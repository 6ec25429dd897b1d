using System.Text;
using Spectre.Console;

namespace FiberScope.Cli.Console;

/// <summary>Where a command reads from and writes to; tests pass their own.</summary>
public sealed record CommandConsole
{
    /// <summary>Standard input, for <c>-</c>.</summary>
    public required Stream Input { get; init; }

    /// <summary>Standard output as bytes, for <c>-</c>.</summary>
    public required Stream Output { get; init; }

    /// <summary>Where results for people go.</summary>
    public required TextWriter Out { get; init; }

    /// <summary>Where complaints and progress go.</summary>
    public required TextWriter Error { get; init; }

    /// <summary>Whether <see cref="Out"/> is a terminal that a person watches.</summary>
    public bool OutIsTerminal { get; init; }

    /// <summary>Whether <see cref="Error"/> is a terminal that a person watches.</summary>
    public bool ErrorIsTerminal { get; init; }

    /// <summary>The console of this process.</summary>
    public static CommandConsole OfProcess()
    {
        System.Console.OutputEncoding = new UTF8Encoding(encoderShouldEmitUTF8Identifier: false);
        return new CommandConsole
        {
            Input = System.Console.OpenStandardInput(),
            Output = System.Console.OpenStandardOutput(),
            Out = System.Console.Out,
            Error = System.Console.Error,
            OutIsTerminal = !System.Console.IsOutputRedirected,
            ErrorIsTerminal = !System.Console.IsErrorRedirected,
        };
    }

    /// <summary>The whole of standard input as text.</summary>
    public string ReadInput()
    {
        using var reader = new StreamReader(Input, Encoding.UTF8, leaveOpen: true);
        return reader.ReadToEnd();
    }

    /// <summary>A writer for people: colours and width of the terminal when there is one, plain text otherwise.</summary>
    internal static IAnsiConsole For(TextWriter writer, bool isTerminal)
    {
        var console = AnsiConsole.Create(new AnsiConsoleSettings
        {
            Out = new AnsiConsoleOutput(writer),
            Ansi = isTerminal ? AnsiSupport.Detect : AnsiSupport.No,
            ColorSystem = isTerminal ? ColorSystemSupport.Detect : ColorSystemSupport.NoColors,
            Interactive = InteractionSupport.No,
        });
        if (!isTerminal)
        {
            console.Profile.Width = 110;
        }

        return console;
    }
}
