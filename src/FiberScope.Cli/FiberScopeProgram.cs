using System.CommandLine;
using FiberScope.Assessment.Input;
using FiberScope.Cli.Commands;
using FiberScope.Cli.Console;
using FiberScope.Cli.Output;
using FiberScope.Imaging;

namespace FiberScope.Cli;

/// <summary>The front door: parses the command line, runs the command, and maps the outcome to an exit code.</summary>
public static class FiberScopeProgram
{
    /// <summary>Set to 1, this environment variable lets a fault of the program show where it arose.</summary>
    private const string FullFault = "FIBERSCOPE_FULL_FAULT";

    /// <summary>How long a cancelled command may take to clean up.</summary>
    private static readonly TimeSpan CleanUpTime = TimeSpan.FromSeconds(20);

    /// <summary>Runs the program.</summary>
    /// <param name="arguments">The command line.</param>
    /// <param name="console">Where to read from and write to.</param>
    /// <param name="clock">Tells the time that results are stamped with.</param>
    /// <param name="cancellation">Stops the program as Ctrl-C does.</param>
    /// <returns>One of <see cref="ExitCode"/>.</returns>
    public static async Task<int> RunAsync(string[] arguments, CommandConsole console, TimeProvider clock, CancellationToken cancellation)
    {
        var root = new RootCommand("FiberScope: from micrographs of filter media to fibre diameters, solidity and a filtration forecast.")
        {
            AssessCommand.Build(console, clock),
            MeasureCommand.Build(console),
            PredictCommand.Build(console),
            DesignCommand.Build(console),
            CalibrateCommand.Build(console),
            AuditCommand.Build(console),
            SpecimenCommand.Build(console),
        };
        var parsed = root.Parse(arguments);
        if (parsed.Errors.Count > 0)
        {
            foreach (var error in parsed.Errors)
            {
                await console.Error.WriteLineAsync(error.Message);
            }

            return ExitCode.BadInput;
        }

        var configuration = new InvocationConfiguration
        {
            Output = console.Out,
            Error = console.Error,
            EnableDefaultExceptionHandler = false,
            ProcessTerminationTimeout = CleanUpTime,
        };
        return await parsed.InvokeAsync(configuration, cancellation);
    }

    /// <summary>Runs a command's work off the calling thread, so that Ctrl-C reaches it, and turns bad news into a line and a code.</summary>
    internal static async Task<int> GuardAsync(CommandConsole console, Func<CancellationToken, int> work, CancellationToken cancellation)
    {
        try
        {
            return await Task.Run(() => work(cancellation), CancellationToken.None);
        }
        catch (OperationCanceledException)
        {
            await console.Error.WriteLineAsync("Stopped; nothing was written.");
            return ExitCode.Cancelled;
        }
        catch (Exception e) when (e is InputException or ImageRejectedException)
        {
            await console.Error.WriteLineAsync(e.Message);
            return ExitCode.BadInput;
        }
        catch (NotWritableException e)
        {
            await console.Error.WriteLineAsync(e.Message);
            return ExitCode.NotWritable;
        }
        catch (NativeImagingMissingException e)
        {
            await console.Error.WriteLineAsync(e.Message);
            return ExitCode.NativeLibraryMissing;
        }
#pragma warning disable CA1031 // The last line of defence: a fault of the program itself must not show people a stack trace.
        catch (Exception e) when (Environment.GetEnvironmentVariable(FullFault) is not "1")
        {
            await console.Error.WriteLineAsync($"A fault of FiberScope itself stopped this run; nothing was written: {e.GetType().Name}: {e.Message.ReplaceLineEndings(" ")} Please report it; {FullFault}=1 shows where it arose.");
            return ExitCode.OwnFault;
        }
#pragma warning restore CA1031
    }
}
